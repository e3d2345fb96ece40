"""From numbers to claims: what a number says of pitch, wire or aperture, exact, with its spelling."""

from fractions import Fraction
from math import isqrt

from catalog.callout.rules.draft import Claim
from catalog.callout.text.items import Item
from catalog.reference import gauges
from catalog.units import MM_PER_INCH, Length

CM = Fraction(10)
COUNT_UNITS: dict[str | None, Fraction] = {
    **dict.fromkeys((None, "/in", "mesh sign", "M", "designation"), MM_PER_INCH),
    "/cm": CM,
}
SQUARE_UNITS = {"/in2": MM_PER_INCH, "/cm2": CM}
ROOT_SCALE = 10**12


def pitch_of_count(number: Item, unit: str | None = None) -> Length | None:
    """The pitch that a count makes: whole counts are exact, a decimal one has the rounding of its spelling.

    Counts per square inch or centimetre are the square of the count: 3600 per square inch are 60.
    """
    if number.number is None or number.number.value <= 0:
        return None
    value = number.number.value
    unit = unit or number.unit
    if unit == "per length":
        over = Fraction(number.system or 1)
    elif unit in SQUARE_UNITS:
        over, value = SQUARE_UNITS[unit], _root(value)
    else:
        over = COUNT_UNITS.get(unit, MM_PER_INCH)
    exact = number.number.is_integer or number.number.kind == "fraction"
    half = Fraction(0) if exact else over / value * number.number.half_unit / value
    return Length(over / value, half, number.text, (number.start, number.end))


def _root(value: Fraction) -> Fraction:
    """The square root, exact where there is one, else to twelve digits."""
    whole = isqrt(int(value))
    return Fraction(whole) if whole * whole == value else Fraction(isqrt(int(value * ROOT_SCALE**2)), ROOT_SCALE)


def pair(
    slot: str, numbers: list[Item], lengths: list[Length], by_count: bool = False, by_custom: bool = False
) -> Claim:
    """One figure for both directions, two for warp and weft in the order written, or one for the side that it names."""
    first, last = lengths[0], lengths[-1]
    side = numbers[0].side if numbers else None
    if side == "weft" and len(lengths) == 2:
        first, last = last, first
    if side and len(lengths) == 1:
        return Claim(slot, first if side == "warp" else None, first if side == "weft" else None, by_count, by_custom)
    return Claim(slot, first, last, by_count, by_custom)


def count_claim(numbers: list[Item], unit: str | None = None) -> Claim | None:
    """The claim of one count or of a pair."""
    pitches = [p for n in numbers if (p := pitch_of_count(n, unit)) is not None]
    return pair("pitch", numbers, pitches, by_count=True) if pitches and len(pitches) == len(numbers) else None


def length_claim(slot: str, numbers: list[Item], unit: str | None = None) -> Claim:
    """The claim of one length or of a pair; *unit* serves those that have none."""
    return pair(slot, numbers, [n.length(unit) for n in numbers])


def gauge_name(number: Item) -> str:
    """A gauge's number as the table has it: '28', '2/0'."""
    return number.number.written.lstrip("0") or "0" if number.number else number.text


def gauge_length(number: Item, system: str) -> Length | None:
    """The diameter of a gauge in a system, exact; None where the system has no such number."""
    inches = gauges.diameter_in(system, gauge_name(number))
    if inches is None:
        return None
    return Length(inches * MM_PER_INCH, Fraction(0), number.text, (number.start, number.end))


def written_agrees(one: Length, other: Length) -> bool:
    """True where two spellings of one length differ by rounding only, inclusive."""
    return abs(one.mm - other.mm) <= one.rounding_mm + other.rounding_mm
