"""A weighed swatch as people write it: '1.92 g / 100 cm2', '1.92±0.02 g / 100x100 mm'."""

import re
from fractions import Fraction

from catalog.search.measure_cursor import NUMBER, PLUS_MINUS, Cursor, PlusMinus
from catalog.search.measured import Scalar, combined, expanded_of_limit
from catalog.search.measurement import OVER
from catalog.units import LARGEST_ROUNDING, MM_PER_UNIT, Number

AREA_SHARE = 0.01
"""± of a hand-cut swatch's area (k = 2), as a share: common practice, no source."""
SIDES_M = {unit: MM_PER_UNIT[unit] / 1000 for unit in ("mm", "cm", "m", "in")} | {"dm": Fraction(1, 10)}
MASSES_KG = {"g": Fraction(1, 1000), "mg": Fraction(1, 10**6), "kg": Fraction(1)}

MASS = re.compile(r"(?:mg|kg|g)\b", re.IGNORECASE)
AREA = re.compile(r"(?:sq\.?\s*)?(mm|cm|dm|m|in)(?:2|²|\^2)?(?![a-z\d])", re.IGNORECASE)
SQUARED = re.compile(r"2|²|\^2|sq", re.IGNORECASE)
TIMES = re.compile(r"[x×*]", re.IGNORECASE)


def parse_swatch(text: str) -> Scalar:
    """Read a weighed swatch as mass per area, kg/m²: '1.92 g / 100 cm2', '1.92±0.02 g / 100x100 mm', '0.19 kg/m2'.

    Without ± the balance reads to its last written digit and the area is good to 1 %. Raises InputError.
    """
    here = Cursor(text, "swatch", "'1.92 g / 100 cm2', '1.92 g / 100x100 mm' or '0.19 kg/m2'")
    number = here.number()
    error = here.plus_minus()
    unit = here.take(MASS)
    if unit is None:
        raise here.complaint("the unit of mass is missing: write g, mg or kg")
    error = error if error.number else here.plus_minus()
    if here.take(OVER) is None:
        raise here.complaint("of what area? '/' and an area were expected here")
    area_m2, area_share = _area(here)
    here.end()
    kg_m2 = number.value * MASSES_KG[unit.lower()] / area_m2
    share = combined(_mass_share(number, error), AREA_SHARE if area_share is None else area_share)
    if share >= 1:
        raise here.complaint("the uncertainty isn't smaller than the value", 0)
    is_assumed = error.number is None or area_share is None
    return Scalar(kg_m2, float(kg_m2) * share, text.strip(), "balance", is_assumed)


def _mass_share(number: Number, error: PlusMinus) -> float:
    """± of the mass as a share: as stated, else what the last written digit leaves open."""
    stated = error.of(number.value, Fraction(1))
    if stated is not None:
        return float(stated / number.value)
    return expanded_of_limit(float(min(number.half_unit / number.value, LARGEST_ROUNDING)))


def _area(here: Cursor) -> tuple[Fraction, float | None]:
    """Square metres and their ± as a share, None where it isn't written: '100 cm2', '100x100 mm', 'm2'."""
    if here.at < len(here.text) and not NUMBER.match(here.text, here.at):
        return _unit_m2(here, must_be_squared=True), None
    first, back = here.number().value, here.at
    unit = here.unit()
    if here.take(TIMES):
        return first * here.number().value * _same_unit_m2(here, unit), None
    here.at = back
    error = here.number().value if here.take(PLUS_MINUS) else None
    return first * _unit_m2(here, must_be_squared=True), None if error is None else float(error / first)


def _same_unit_m2(here: Cursor, unit: str | None) -> Fraction:
    """The unit behind the second side; one that stood behind the first has to be the same."""
    start = here.at
    side_m2 = _unit_m2(here, must_be_squared=False)
    if unit is not None and side_m2 != (MM_PER_UNIT[unit] / 1000) ** 2:
        raise here.complaint("both sides were expected in one unit", start)
    return side_m2


def _unit_m2(here: Cursor, must_be_squared: bool) -> Fraction:
    start = here.at
    found = AREA.match(here.text, here.at)
    if not found or not here.take(AREA):
        raise here.complaint("the unit of area is missing: write cm2, m2, mm2 or in2", start)
    if bool(SQUARED.search(found[0])) != must_be_squared:
        expected = "cm2" if must_be_squared else "a length, as in 100x100 mm,"
        raise here.complaint(f"{found[0].strip()} is no unit here: {expected} was expected", start)
    return SIDES_M[found[1].lower()] ** 2
