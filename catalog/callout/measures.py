"""Numbers with their units: the first rules of the language. Each takes the items and returns them, joined."""

from collections.abc import Callable

from catalog.callout.items import Item
from catalog.units import MM_PER_INCH, parse_number

MILLIMETRES_OF_INCHES = (MM_PER_INCH * 98 / 100, MM_PER_INCH * 102 / 100)
SIGNS = {'"': "in", "'": "ft", "%": "%", "#": "mesh sign"}
COUNTING = ("mesh", "count", "aperture", "wire")
"""Words that may stand between a count and its unit: meshes, maschen, openings, wires."""
MOST_PIECES = 100_000


def measured(items: list[Item]) -> list[Item]:
    """Join every number with the unit, gauge or sign that belongs to it."""
    for rule in (
        _counted_over_a_length,
        _counts_with_units,
        _gauges_named_first,
        _numbers_with_units,
        _numbers_behind_signs,
    ):
        items = rule(items)
    return items


def join(first: Item, last: Item, number: Item) -> Item:
    """*number* grown to the stretch from *first* to *last*."""
    number.start, number.end, number.glued = min(first.start, number.start), max(last.end, number.end), first.glued
    return number


def rewrite(items: list[Item], rule: Callable[[list[Item], int], tuple[Item, int] | None]) -> list[Item]:
    """Apply *rule* at each place: it returns an item and the place behind what it swallowed, or None."""
    out: list[Item] = []
    at = 0
    while at < len(items):
        made = rule(items, at)
        out.append(made[0] if made else items[at])
        at = made[1] if made else at + 1
    return out


def peek(items: list[Item], at: int) -> Item | None:
    """The item at a place, or None behind the end."""
    return items[at] if 0 <= at < len(items) else None


def _counted_over_a_length(items: list[Item]) -> list[Item]:
    """'47 in 20 mm' counts 47 spaces in 20 mm; '30 per 25 mm' likewise. '36 in 914 mm' says one length twice."""

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        parts = items[at : at + 4]
        if len(parts) < 4 or not (parts[0].is_number and parts[2].is_number and parts[3].has("unit")):
            return None
        count, word, over, unit = parts
        if word.text.lower() not in ("in", "per", "auf", "je", "pro", "par") or unit.senses["unit"] not in ("mm", "cm"):
            return None
        assert count.number and over.number
        scale = 10 if unit.senses["unit"] == "cm" else 1
        span = over.number.value * scale
        if not count.number.is_integer or not span or not count.number.value:
            return None
        if MILLIMETRES_OF_INCHES[0] <= span / count.number.value <= MILLIMETRES_OF_INCHES[1]:
            return None
        count.unit, count.system = "per length", str(span)
        return join(count, unit, count), at + 4

    return rewrite(items, rule)


def _counts_with_units(items: list[Item]) -> list[Item]:
    """'24 Maschen/cm', '60 mesh per inch', '3600 meshes per square inch': the unit behind the word belongs to the count."""

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        number, label, unit = items[at], peek(items, at + 1), peek(items, at + 2)
        if not (number.is_number and label and label.senses.get("slot") in COUNTING and unit):
            return None
        name = unit.senses.get("unit", "")
        if not name.startswith("/") or number.unit is not None:
            return None
        number.unit, number.slot = name, "count"
        return join(number, unit, number), at + 3

    return rewrite(items, rule)


def _gauges_named_first(items: list[Item]) -> list[Item]:
    """'SWG 28', 'gauge no. 16' name the gauge before its number, where no number stands before the name."""

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        before, name = peek(items, at - 1), items[at]
        if not name.has("gauge") or (before and before.is_number and before.unit in (None, "aught")):
            return None
        behind = at + 1
        while (item := peek(items, behind)) and (item.has("number sign") or item.text in ".:=#"):
            behind += 1
        number = peek(items, behind)
        after = peek(items, behind + 1)
        if not number or not number.is_number or (after and _unit_of(after)) or not _is_gauge_number(number):
            return None
        number.unit, number.system = "gauge", name.senses["gauge"]
        return join(name, number, number), behind + 1

    return rewrite(items, rule)


def _is_gauge_number(number: Item) -> bool:
    return number.unit == "aught" or bool(number.number and number.number.is_integer and number.number.value <= 80)


def _unit_of(item: Item) -> str | None:
    if item.kind == "sign":
        return SIGNS.get(item.text)
    if item.has("slot") and item.text.startswith("%"):
        return "%"
    return item.senses.get("unit")


def _numbers_with_units(items: list[Item]) -> list[Item]:
    """A unit stands behind its number: '0.5 mm', '36\"', '16 ga', '24/cm', '60#', '6 pcs'. 'in' before a size is a word."""

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        number, behind = items[at], peek(items, at + 1)
        if not number.is_number or behind is None or number.unit in ("gauge", "per length"):
            return None
        if behind.has("gauge") and not (behind.has("unit") and not behind.glued):
            number.unit, number.system = "gauge", behind.senses["gauge"]
            return join(number, behind, number), at + 2
        unit = _unit_of(behind)
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
    """'6 pcs', '2 rolls', '1 off': a whole number before a word for goods."""
    if not behind.has("form") or not number.number or not number.number.is_integer or number.number.value > MOST_PIECES:
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
        if not number or not number.is_number or number.number is None or not number.number.is_integer:
            return None
        if number.unit is None:
            number.unit = "designation"
            number.system = "Nr" if sign.text.lower().startswith("nr") else None
        return join(sign, number, number), behind + 1

    return rewrite(items, rule)


def number_from(text: str) -> Item:
    """A number item made of *text*, for codes that hold several."""
    return Item("number", text, 0, 0, number=parse_number(text))
