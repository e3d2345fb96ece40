"""The JSON documents of the command line: keys are added, never renamed, within a schema number."""

from collections.abc import Mapping, Sequence
from typing import Any

from catalog.cloth import Cloth
from catalog.construction import Construction, Wires
from catalog.crossref import Answer
from catalog.errors import CrossclothError, InputError, StoreError
from catalog.report.reading_document import reading_fields
from catalog.search.candidate import Candidate, Finding, StockLine
from catalog.search.limit_report import LimitReport
from catalog.stock.lots import Lot
from catalog.target import Target

SCHEMA = 1
Document = dict[str, Any]


def error_document(error: CrossclothError) -> Document:
    """A failure: code, message, column."""
    if isinstance(error, InputError):
        code = error.code
    else:
        code = "E_STORE" if isinstance(error, StoreError) else "E_NOT_FOUND"
    column = error.column if isinstance(error, InputError) else None
    return {"schema": SCHEMA, "error": {"code": code, "message": error.message, "column": column}}


def match_document(answer: Answer, line: int | None = None) -> Document:
    """A match, whole."""
    request = answer.request
    document: Document = {"schema": SCHEMA, "text": request.text, "status": answer.understanding.status.value}
    if line is not None:
        document["line"] = line
    return document | {
        "question": answer.question,
        "purpose": [p.value for p in request.purposes],
        "target": target_document(answer.targets[0]),
        "targets": [target_document(target) for target in answer.targets],
        "problems": [{"code": p.code, "message": p.message, "column": p.column} for p in answer.understanding.problems],
        "cautions": list(answer.cautions),
        "candidates": [candidate_document(c) for c in answer.candidates],
    }


def target_document(target: Target) -> Document:
    """A reading with what was assumed for it."""
    allowed = target.tolerance
    document = reading_fields(target.reading)
    document["limits"] = {key: list(bounds) for key, bounds in target.limits.items()}
    if target.weave is not None:
        document["weave"] = target.weave.value
    return document | {
        "tolerance_um": _rounded(allowed.warp_mm * 1000, 3) if allowed else None,
        "tolerance_weft_um": _rounded(allowed.weft_mm * 1000, 3) if allowed else None,
        "tolerance_source": allowed.source if allowed else None,
        "origin": dict(target.origin),
    }


def candidate_document(candidate: Candidate) -> Document:
    """A cloth with what differs, the verdict, its reasons and the lots."""
    return cloth_document(candidate.cloth, candidate.turned) | {
        "turned": candidate.turned,
        "distance": _rounded(candidate.distance, 6),
        "deviation": _deviation(candidate),
        "verdict": candidate.verdict.value,
        "by_purpose": {name: verdict.value for name, verdict in candidate.by_purpose.items()},
        "harm_side": candidate.harm_side,
        "penalty": _penalty(candidate),
        "reason": candidate.reason,
        "findings": [_finding(f) for f in candidate.findings],
        "stock": [stock_document(line) for line in candidate.stock],
    }


def cloth_document(cloth: Cloth, turned: bool = False) -> Document:
    """A cloth by its figures. For filter cloth the apertures and the open area are null."""
    made = cloth.construction.turned() if turned else cloth.construction
    figures = cloth.figures
    rating = cloth.rating
    return {
        "cloth": cloth.id,
        "name": cloth.name,
        "demo": cloth.demo,
        "weave": made.weave.value,
        "alloy": made.alloy,
        "finish": made.finish,
        "crimp": made.crimp,
        "grade": cloth.grade,
        "standard": cloth.standard,
        "declared": cloth.declared,
        "unit_system": cloth.unit_system,
        "source": cloth.source,
        "warp": wires_document(made.warp, made),
        "weft": wires_document(made.weft, made),
        "open_area_pct": _rounded(figures.open_area_pct, 4),
        "mass_kg_m2": _rounded(figures.mass_kg_m2, 5),
        "mass_geometric_kg_m2": _rounded(figures.mass_geometric_kg_m2, 5),
        "thickness_mm": _rounded(figures.thickness_mm, 5),
        "porosity": _rounded(figures.porosity, 4),
        "sphere_um": _rounded(figures.sphere_um, 2),
        "rating": {"um": rating.um, "kind": rating.kind, "method": rating.method or None} if rating else None,
    }


def wires_document(wires: Wires, made: Construction) -> Document:
    """One direction: count per inch, pitch, wire, aperture (null in filter cloth)."""
    return {
        "count_per_in": _rounded(float(wires.count_per_in), 5),
        "pitch_mm": _rounded(float(wires.pitch_mm), 6),
        "wire_mm": _rounded(float(wires.wire_mm), 6),
        "aperture_mm": None if made.is_filter else _rounded(float(wires.aperture_mm), 6),
    }


def lot_document(lot: Lot) -> Document:
    """A lot as it lies."""
    return {
        "lot": lot.id,
        "form": lot.form,
        "location": lot.location,
        "width_mm": lot.width_mm,
        "usable_width_mm": lot.usable_width_mm,
        "length_mm": lot.length_mm,
        "free_length_mm": lot.free_length_mm,
        "available_m2": _rounded(lot.available_m2, 4),
        "heat": lot.heat,
        "certificate": lot.certificate,
        "seams": lot.seams,
        "demo": lot.demo,
    }


def stock_document(line: StockLine) -> Document:
    """A lot and whether it serves the need; 'ok' is null where no need was stated."""
    return lot_document(line.lot) | {"fits": {"ok": line.fit.ok, "why": line.fit.why}}


def list_document(
    total: int, cloths: Sequence[Cloth], limits: LimitReport | None, lots: Mapping[str, Sequence[Lot]]
) -> Document:
    """The catalogue by figures, with what each limit removed and what falls just short."""
    return {
        "schema": SCHEMA,
        "total": total,
        "shown": len(cloths),
        "cloths": [cloth_document(c) | {"stock": [lot_document(lot) for lot in lots.get(c.id, ())]} for c in cloths],
        "limits": [{"limit": r.limit, "removed": r.removed} for r in limits.removed] if limits else [],
        "near": [
            {"cloth": n.cloth.id, "short_of": [{"limit": s.limit, "by": s.by} for s in n.short_of]} for n in limits.near
        ]
        if limits
        else [],
    }


def _finding(finding: Finding) -> Document:
    return {"rule": finding.rule, "ok": finding.ok, "message": finding.message, "source": finding.source or None}


def _penalty(candidate: Candidate) -> Document:
    parts = candidate.penalty
    return {
        "total": _rounded(parts.total, 4),
        "aperture": _rounded(parts.aperture, 4),
        "wire": _rounded(parts.wire, 4),
        "open_area": _rounded(parts.open_area, 4),
    }


def _deviation(candidate: Candidate) -> Document:
    def off(name: str) -> float | None:
        deviation = candidate.deviation(name)
        return _rounded(deviation.difference, 3) if deviation else None

    return {
        side: {"aperture_pct": off(f"{side}.aperture"), "wire_pct": off(f"{side}.wire")} for side in ("warp", "weft")
    } | {"open_area_points": off("open_area"), "mass_pct": off("mass"), "section_pct": off("section")}


def _rounded(value: float | None, digits: int) -> float | None:
    return None if value is None else round(value, digits)
