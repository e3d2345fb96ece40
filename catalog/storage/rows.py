"""Rows ↔ values. Exact pitches and wires travel as text rationals: '127/300'."""

from collections.abc import Mapping, Sequence
from dataclasses import asdict, dataclass, fields
from fractions import Fraction
from functools import lru_cache
from typing import Any

from catalog.cloth import Cloth, Figures, Rating
from catalog.construction import Construction, Weave, Wires
from catalog.search.axes import axes
from catalog.stock.lots import Lot

FIGURE_NAMES = tuple(field.name for field in fields(Figures))
STATED = ("stated_open_area_pct", "stated_mass_kg_m2", "stated_aperture_mm", "stated_count_per_in")
CLOTH_COLUMNS = (
    *("id", "name", "weave", "warp_pitch", "warp_wire", "weft_pitch", "weft_wire", "alloy", "crimp", "finish"),
    *("declared", "unit_system", "source", "rating_um", "rating_kind", "rating_method", "grade", "standard"),
    *("demo", *STATED),
    *FIGURE_NAMES,
)
"""What reading a cloth takes, in the order that cloth_of_row expects."""
FIGURES_FROM = len(CLOTH_COLUMNS) - len(FIGURE_NAMES)
LOT_COLUMNS = tuple(field.name for field in fields(Lot))


@dataclass(frozen=True, slots=True)
class Declared:
    """How a cloth's figures were written by whoever sells it: texts with their units."""

    by: str
    """What the texts are: 'count', 'pitch' or 'aperture'."""
    warp: str
    weft: str
    unit: str
    warp_wire: str
    weft_wire: str
    wire_unit: str


@lru_cache(maxsize=4096)
def rational(text: str) -> Fraction:
    """Read '127/300' or '5'. Raises ValueError. Faster than Fraction(text), which serves every spelling."""
    over, _, under = text.partition("/")
    return Fraction(int(over), int(under or 1))


def cloth_of_row(row: Sequence[Any]) -> Cloth:
    """The cloth in a row of CLOTH_COLUMNS."""
    (cid, name, weave, warp_pitch, warp_wire, weft_pitch, weft_wire, alloy, crimp, finish) = row[:10]
    (declared, unit_system, source, um, kind, method, grade, standard, demo) = row[10:19]
    return Cloth(
        id=cid,
        name=name,
        construction=Construction(
            Weave(weave),
            Wires(rational(warp_pitch), rational(warp_wire)),
            Wires(rational(weft_pitch), rational(weft_wire)),
            alloy,
            crimp,
            finish,
        ),
        figures=Figures(*row[FIGURES_FROM:]),
        declared=declared,
        unit_system=unit_system,
        source=source,
        rating=None if um is None else Rating(um, kind, method),
        grade=grade,
        standard=standard,
        demo=bool(demo),
        **dict(zip(STATED, row[19:FIGURES_FROM], strict=True)),
    )


def row_of_cloth(cloth: Cloth, declared: Declared, derivation: int) -> dict[str, Any]:
    """The whole row of *cloth*, derived columns included."""
    make = cloth.construction
    rating = cloth.rating
    return {
        "id": cloth.id,
        "name": cloth.name,
        "weave": make.weave.value,
        "alloy": make.alloy,
        "crimp": make.crimp,
        "finish": make.finish,
        "declared": cloth.declared,
        "unit_system": cloth.unit_system,
        "rating_um": rating.um if rating else None,
        "rating_kind": rating.kind if rating else None,
        "rating_method": rating.method if rating else None,
        "grade": cloth.grade,
        "standard": cloth.standard,
        **{name: getattr(cloth, name) for name in STATED},
        "source": cloth.source,
        "demo": cloth.demo,
        **_declared_columns(declared),
        **_exact_columns(make),
        **derived_columns(make, cloth.figures, rating, derivation),
    }


def derived_columns(make: Construction, figures: Figures, rating: Rating | None, derivation: int) -> dict[str, Any]:
    """The columns that are computed, with the version of the derivation."""
    return {**asdict(figures), **asdict(axes(make, figures, rating)), "derivation": derivation}


def _declared_columns(declared: Declared) -> dict[str, str]:
    return {
        "declared_by": declared.by,
        "warp_text": declared.warp,
        "weft_text": declared.weft,
        "unit": declared.unit,
        "warp_wire_text": declared.warp_wire,
        "weft_wire_text": declared.weft_wire,
        "wire_unit": declared.wire_unit,
    }


def _exact_columns(make: Construction) -> dict[str, Any]:
    columns: dict[str, Any] = {}
    for name, side in (("warp", make.warp), ("weft", make.weft)):
        columns[f"{name}_pitch"], columns[f"{name}_wire"] = str(side.pitch_mm), str(side.wire_mm)
        columns[f"{name}_pitch_mm"], columns[f"{name}_wire_mm"] = float(side.pitch_mm), float(side.wire_mm)
    return columns


def lot_of_row(row: Sequence[Any]) -> Lot:
    """The lot in a row of LOT_COLUMNS."""
    facts = dict(zip(LOT_COLUMNS, row, strict=True))
    facts["demo"] = bool(facts["demo"])
    return Lot(**facts)


def row_of_lot(lot: Lot, source: str) -> Mapping[str, Any]:
    """The whole row of *lot*."""
    return {**asdict(lot), "source": source, "version": 1}
