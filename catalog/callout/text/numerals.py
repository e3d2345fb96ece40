"""Numbers as they are written: decimals with point or comma, fractions of the inch, thousands, feet and inches."""

import re
from fractions import Fraction
from math import gcd

from catalog.callout.text.items import Item
from catalog.units import Number, parse_number

GROUP = re.compile(r"\d{1,3}(?:,\d{3})+(?:\.\d+)?")
SIZE_UNIT = re.compile(r"\s?(?:mm|lbs?|pcs|m|ft)\b", re.IGNORECASE)
INCH_PARTS = (2, 4, 8, 16, 32, 64)
NUMBER = re.compile(
    r"""(?:(?P<mixed>\d{1,2}(?:[ ]|-)\d{1,2}/(?:2|4|8|16|32|64)(?![\d.,]\d|\d))
    |(?P<vulgar>\d{1,2}/(?:2|4|8|16|32|64)(?![\d.,]\d|\d|/))
    |(?P<thirds>[12]/3(?![\d.,/]))
    |(?P<hundredths>\d{1,3}/100?(?![\d.,/]))
    |(?P<aught>\d/0(?!\d))
    |[1-9]\d{0,2}(?:,\d{3})++(?:\.\d+)?(?![\d,])
    |[1-9]\d{0,2}(?:\.\d{3})++,\d++(?![\d.])
    |\d++\.\d++(?:[eE][-+]?\d{1,3}(?!\w))?
    |\d++,\d++(?!\.\d)(?:[eE][-+]?\d{1,3}(?!\w))?
    |\d++[eE][-+]\d{1,3}(?!\w)
    |[.,]\d++(?:[eE][-+]?\d{1,3}(?!\w))?
    |\d++)""",
    re.VERBOSE,
)
FEET_INCHES = re.compile(r"(\d{1,3})\s?(?:'|ft\.?)\s?-?\s?(\d{1,2})\s?(?:\"|in\b)")


def numeral(text: str, start: int, lists: bool) -> Item | None:
    """The number that stands at *start*; *lists*: commas part items. None where there is none."""
    found = NUMBER.match(text, start)
    if not found or (found.group()[0] in ".," and start and not _may_lead(found.group()[0], text[start - 1])):
        return None
    if both := FEET_INCHES.match(text, start):
        return _feet(both)
    written, kind = found.group(), found.lastgroup
    if kind in ("mixed", "vulgar") and not _is_inch_part(written):
        written = re.match(r"\d+", written).group()  # type: ignore[union-attr]
    if lists and "," in written[1:] and not (GROUP.fullmatch(written) and SIZE_UNIT.match(text, found.end())):
        written = written.partition(",")[0]
    if kind == "aught":
        aught = Number(Fraction(0), Fraction(0), "fraction", written)
        return Item("number", written, start, found.end(), unit="aught", number=aught)
    number = parse_number(written)
    if number is None:
        return Item("word", written, start, start + len(written))
    item = Item("number", written, start, start + len(written), number=number)
    if kind == "hundredths":
        item.unit = "hundredths"
    return item


def _may_lead(point: str, before: str) -> bool:
    """A point may stand for '0.' behind a letter, a comma only behind a space or sign: ',304' in a list is 304."""
    return not before.isdecimal() and before != "." and (point == "." or not before.isalpha())


def _is_inch_part(written: str) -> bool:
    """True for the fractions of an inch: 3/16, 1-1/2; 16/18 and 2/4 are pairs of numbers."""
    top, bottom = (int(part) for part in re.split(r"[ -]", written)[-1].split("/"))
    return bottom in INCH_PARTS and top < bottom and gcd(top, bottom) == 1


def _feet(found: re.Match[str]) -> Item:
    """Feet and inches: 3' 6\" is 42 in."""
    inches = int(found[1]) * 12 + int(found[2])
    number = parse_number(str(inches))
    assert isinstance(number, Number)
    return Item("number", found.group(), found.start(), found.end(), number=number, unit="in")
