"""Inch grades: a count with the wire that custom gives it. From memory, and marked so."""

from collections.abc import Mapping
from fractions import Fraction
from functools import cache

from catalog.reference.rows import rows_of

SOURCE = "from memory, as commonly tabulated; not verified against ASTM E2016"


@cache
def _table() -> dict[tuple[str, Fraction], Fraction]:
    return {(row["grade"], Fraction(row["mesh_per_in"])): Fraction(row["wire_in"]) for row in rows_of("inch_grades")}


def wire_in(grade: str, count: Fraction | int | str) -> Fraction | None:
    """Customary wire, inches, of 'market grade' or 'tensile bolting cloth' at *count* per inch; None if unknown."""
    return _table().get((grade, Fraction(count)))


def grades_of(count: Fraction | int | str) -> Mapping[str, Fraction]:
    """Every grade that has this count, with its wire in inches."""
    wanted = Fraction(count)
    return {grade: wire for (grade, mesh), wire in _table().items() if mesh == wanted}


def rows() -> tuple[Mapping[str, str], ...]:
    """The whole table, as text."""
    return rows_of("inch_grades")
