"""Safety distances behind an opening, for persons of 14 and over."""

from collections.abc import Mapping
from functools import cache

from catalog.reference.rows import rows_of

SOURCE = "ISO 13857, table 4, age 14 and over; check the edition in force and local law"
SHAPES = ("slot", "square", "round")
SHORT_SLOT_MM = 65.0


@cache
def rows() -> tuple[Mapping[str, float | str | None], ...]:
    """The table: over_mm < opening <= to_mm, distances by shape, mm."""
    return tuple(
        {
            "over_mm": float(row["over_mm"]),
            "to_mm": float(row["to_mm"]),
            "slot_mm": float(row["slot_mm"]),
            "square_mm": float(row["square_mm"]),
            "round_mm": float(row["round_mm"]),
            "slot_up_to_65_mm": float(row["slot_up_to_65_mm"]) if row["slot_up_to_65_mm"] else None,
            "source": row["source"],
        }
        for row in rows_of("safety_distances")
    )


def _row(opening_mm: float) -> Mapping[str, float | str | None] | None:
    for row in rows():
        over, to = row["over_mm"], row["to_mm"]
        if isinstance(over, float) and isinstance(to, float) and over < opening_mm <= to:
            return row
    return None


def distance_mm(opening_mm: float, shape: str, slot_length_mm: float | None = None) -> float | None:
    """Safety distance, mm, behind an opening of *shape* 'slot', 'square' or 'round' and short side *opening_mm*.

    A step holds for a < e <= b. None beyond 120 mm, where the table does not apply.
    Raises ValueError for another shape. Source: ISO 13857, table 4, age 14 and over.
    """
    if shape not in SHAPES:
        raise ValueError(f"an opening is a slot, square or round, not {shape!r}")
    row = _row(opening_mm)
    if row is None:
        return None
    short = row["slot_up_to_65_mm"]
    if shape == "slot" and short is not None and slot_length_mm is not None and slot_length_mm <= SHORT_SLOT_MM:
        return float(short)
    return float(row[f"{shape}_mm"] or 0)


def step(opening_mm: float) -> tuple[float, float] | None:
    """The step (over, up to) in mm that an opening falls in; None beyond the table."""
    row = _row(opening_mm)
    return None if row is None else (float(row["over_mm"] or 0), float(row["to_mm"] or 0))
