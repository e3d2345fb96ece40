"""Which way each comparison bounds which figure: finer cloth has the higher count, heavier wire the lower gauge."""

from fractions import Fraction

from catalog.callout.rules.draft import Draft
from catalog.callout.text.items import Item
from catalog.reference import gauges
from catalog.units import MM_PER_INCH, MM_PER_UNIT

Range = tuple[float | None, float | None]
LEAST, MOST = "least", "most"
THICKER = {"heavier": LEAST, "lighter": MOST, "not heavier": MOST, "not lighter": LEAST}
LARGER = {"over": LEAST, "under": MOST, "not larger": MOST, "not smaller": LEAST}
NARROWER = {"finer": MOST, "coarser": LEAST, "not finer": LEAST, "not coarser": MOST}
SIDE_OF: dict[str, dict[str, str]] = {
    "count": {**LARGER, "finer": LEAST, "coarser": MOST, "not finer": MOST, "not coarser": LEAST},
    "wire": {**THICKER, **LARGER, **NARROWER},
    "aperture": {**LARGER, **NARROWER},
    "": {**LARGER, **THICKER},
}
"""Figure → comparison → the side that it bounds."""
KEYS = {
    "count": "count_per_in",
    "wire": "wire_mm",
    "aperture": "aperture_mm",
    "pitch": "pitch_mm",
    "open_area": "open_area_pct",
    "mass": "mass_kg_m2",
}
MASS_UNITS = {
    "kg/m2": Fraction(1),
    "g/m2": Fraction(1, 1000),
    "lb/ft2": Fraction(45359237, 100000000) / Fraction(9290304, 100000000),
}


def figure_of(number: Item) -> str | None:
    """What a compared number is of: its label, else what its unit tells."""
    if number.slot in ("mesh", "count"):
        return "count" if not number.is_length else "aperture"
    if number.slot in KEYS:
        return number.slot
    if number.unit in ("/in", "/cm", "mesh sign", "per length", "designation", "M"):
        return "count"
    if number.unit in MASS_UNITS:
        return "mass"
    return {"gauge": "wire", "%": "open_area", "um": "aperture"}.get(number.unit or "")


def figures_of(number: Item, figure: str) -> tuple[list[Fraction], str]:
    """The values in the limit's unit, several where a gauge's system is open, and the system's note."""
    assert number.number or number.unit == "aught" or number.unit == "gauge"
    if number.unit == "gauge":
        name = number.number.written if number.number else number.text
        sizes = gauges.readings(name)
        systems = ("SWG", "USSWG", "BWG", "AWG") if number.system == "?" else (number.system or "",)
        return [sizes[s] * MM_PER_INCH for s in systems if s in sizes], "/".join(systems)
    assert number.number
    value = number.number.value
    if figure == "count":
        if number.unit == "per length":
            return [value * MM_PER_INCH / Fraction(number.system or 1)], ""
        return [value * (MM_PER_INCH / 10 if number.unit == "/cm" else 1)], ""
    if figure == "mass":
        return [value * MASS_UNITS.get(number.unit or "", Fraction(1))], ""
    if figure == "open_area":
        return [value], ""
    return [value * MM_PER_UNIT[number.unit if number.is_length and number.unit else unit_without(number)]], ""


def unit_without(number: Item) -> str:
    """The unit of a bare length: a dropped zero or a vulgar fraction is of the inch, all else of the millimetre."""
    assert number.number
    return "in" if number.number.written[0] == "." or number.number.kind == "fraction" else "mm"


def limit(draft: Draft, key: str, side: str, value: float) -> None:
    """Narrow a limit."""
    low, high = draft.limits.get(key, (None, None))
    if side == LEAST:
        low = value if low is None else max(low, value)
    else:
        high = value if high is None else min(high, value)
    draft.limits[key] = (low, high)


def side_of(bound: str, figure: str) -> str:
    """'least' or 'most' for a comparison of a figure."""
    return SIDE_OF.get(figure, {}).get(bound) or SIDE_OF[""].get(bound) or bound
