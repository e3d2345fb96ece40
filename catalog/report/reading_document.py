"""The JSON document of a reading, key by key as scripts rely on it."""

from typing import Any

from catalog.callout.reading import Form, Reading, Side, Understanding
from catalog.reference import alloys
from catalog.units import Length

SCHEMA = 1
Document = dict[str, Any]


def reading_document(understanding: Understanding, line: int | None = None) -> Document:
    """Everything that a text was understood to say; *line* is its number in a file."""
    return {
        "schema": SCHEMA,
        "text": understanding.text,
        "line": line,
        "status": understanding.status.value,
        "question": understanding.question,
        "readings": [
            {"label": r.label, "likelihood": r.likelihood.value} | reading_fields(r) for r in understanding.readings
        ],
        "missing": list(understanding.missing),
        "problems": [{"code": p.code, "message": p.message, "column": p.column} for p in understanding.problems],
    }


def reading_fields(reading: Reading) -> Document:
    """One reading's fields; unknown is null, filter cloth has no aperture."""
    rating = reading.rating
    return {
        "weave": reading.weave.value if reading.weave else None,
        "warp": _side(reading.warp),
        "weft": _side(reading.weft),
        "alloy": _table_id(reading.alloy),
        "alloy_grade": reading.alloy,
        "material": reading.material,
        "finish": reading.finish,
        "crimp": reading.crimp,
        "grade": reading.grade,
        "standard": reading.standard,
        "certificate": reading.certificate,
        "rating": {"um": rating.um, "kind": rating.kind} if rating else None,
        "open_area_pct": reading.open_area_pct,
        "mass_kg_m2": reading.mass_kg_m2,
        "limits": {key: list(bounds) for key, bounds in reading.limits.items()},
        "form": _form(reading.form),
        "derived": list(reading.derived),
        "notes": list(reading.notes),
    }


def _table_id(alloy_id: str | None) -> str | None:
    """The alloy that scripts know: 1.4435 is a kind of 316L; which kind stands in alloy_grade."""
    known = alloys.alloy(alloy_id) if alloy_id else None
    return known.within or alloy_id if known else alloy_id


def _side(side: Side) -> Document:
    count = side.count_per_in
    return {
        "count_per_in": None if count is None else round(float(count), 5),
        "pitch_mm": _mm(side.pitch),
        "wire_mm": _mm(side.wire),
        "aperture_mm": _mm(side.aperture),
    }


def _mm(length: Length | None) -> float | None:
    return None if length is None else round(float(length.mm), 6)


def _form(form: Form | None) -> Document | None:
    if form is None:
        return None
    return {
        "kind": form.kind,
        "width_mm": form.width_mm,
        "length_mm": form.length_mm,
        "diameter_mm": form.diameter_mm,
        "quantity": form.quantity,
        "area_m2": form.area_m2,
    }
