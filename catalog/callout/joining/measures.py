"""Numbers with their units: the first rules of the language. Each takes the items and returns them, joined."""

from catalog.callout.joining.count_units import counted_over_a_length, counts_with_units
from catalog.callout.joining.gauge_numbers import gauges_named_first
from catalog.callout.joining.measuring import join, peek, rewrite, unit_of
from catalog.callout.text.items import Item
from catalog.callout.vocabulary.materials import BARE_NUMBERS
from catalog.units import Number, parse_number

MOST_PIECES = 100_000


def measured(items: list[Item]) -> list[Item]:
    """Join every number with the unit, gauge or sign that belongs to it."""
    for rule in (
        counted_over_a_length,
        counts_with_units,
        gauges_named_first,
        _numbers_with_units,
        _numbers_behind_signs,
    ):
        items = rule(items)
    for item in items:
        if item.unit == "aught":
            item.kind, item.unit = "word", None
    return items


def _numbers_with_units(items: list[Item]) -> list[Item]:
    """A unit stands behind its number: '0.5 mm', '36\"', '16 ga', '24/cm', '60#', '6 pcs'.
    'in' before a size is a word.
    """

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        number, behind = items[at], peek(items, at + 1)
        if not number.is_number or behind is None or number.unit in ("gauge", "per length"):
            return None
        if behind.has("gauge") and not (behind.has("unit") and not behind.glued):
            number.unit, number.system = "gauge", behind.senses["gauge"]
            return join(number, behind, number), at + 2
        hyphened = peek(items, at + 2) if behind.text == "-" and behind.glued else None
        if hyphened is not None and hyphened.glued and hyphened.has("unit") and number.number is not None:
            return _with_unit(items, at + 1, number, hyphened, hyphened.senses["unit"])
        unit = None if number.unit == "aught" else unit_of(behind)
        if unit is None or _is_preposition(items, at + 1):
            return _pieces(number, behind, at)
        return _with_unit(items, at, number, behind, unit)

    return rewrite(items, rule)


def _with_unit(items: list[Item], at: int, number: Item, behind: Item, unit: str) -> tuple[Item, int]:
    end = at + 2
    number.unit = unit
    if behind.text == "M" and number.number and number.number.is_integer:
        number.unit = "M"
    if behind.has("slot") and unit == "%":
        number.slot = behind.senses["slot"]
    joined = join(number, behind, number)
    point = peek(items, end)
    if point and point.text == "." and point.glued and behind.kind == "term":
        joined, end = join(joined, point, joined), end + 1
    return joined, end


def _is_preposition(items: list[Item], at: int) -> bool:
    """'in' before 'stock', 'warp': not inches there."""
    word, after = items[at], peek(items, at + 1)
    if word.text.lower() not in ("in", "a", "ml"):
        return False
    return after is not None and after.text.lower() in ("stock", "warp", "weft", "chaine", "kette")


def _pieces(number: Item, behind: Item, at: int) -> tuple[Item, int] | None:
    """'6 pcs', '2 rolls', '1 off': a whole number before a word for goods; '304 disc' names the steel."""
    if not behind.has("form") or not number.number or not number.number.is_integer or number.number.value > MOST_PIECES:
        return None
    if number.number.value in BARE_NUMBERS and behind.senses["form"] != "piece":
        return None
    number.unit, number.system = "pieces", behind.senses["form"]
    return join(number, behind, number), at + 2


def _numbers_behind_signs(items: list[Item]) -> list[Item]:
    """'No. 60', 'Nr. 20', '#60': a designation, which is a sieve's number or a count."""

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        sign = items[at]
        if not (sign.has("number sign") or sign.text == "#"):
            return None
        behind = at + 1
        while (item := peek(items, behind)) and item.text in ".:°":
            behind += 1
        number = peek(items, behind)
        if not number or not number.is_number or number.number is None or not _is_designating(number.number):
            return None
        if number.unit is None:
            number.unit = "designation"
            number.system = "Nr" if sign.text.lower().startswith("nr") else None
        return join(sign, number, number), behind + 1

    return rewrite(items, rule)


def _is_designating(number: Number) -> bool:
    """True for what can be a sieve's number: whole, or 2 1/2 and 3 1/2."""
    return number.is_integer or (number.kind == "fraction" and number.value > 1)


def number_from(text: str) -> Item:
    """A number item made of *text*, for codes that hold several."""
    return Item("number", text, 0, 0, number=parse_number(text))
