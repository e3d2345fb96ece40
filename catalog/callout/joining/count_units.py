"""Counts whose unit stands apart: over a length, behind the word mesh."""

from catalog.callout.joining.measuring import join, peek, rewrite
from catalog.callout.text.items import Item
from catalog.units import MM_PER_INCH

MILLIMETRES_OF_INCHES = (MM_PER_INCH * 98 / 100, MM_PER_INCH * 102 / 100)
COUNTING = ("mesh", "count", "aperture", "wire")
"""Words that may stand between a count and its unit: meshes, maschen, openings, wires."""


def counted_over_a_length(items: list[Item]) -> list[Item]:
    """'47 in 20 mm' counts 47 spaces in 20 mm; '30 per 25 mm' likewise. '36 in 914 mm' says one length twice."""

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        parts = items[at : at + 4]
        if len(parts) < 4 or not (parts[0].is_number and parts[2].is_number and parts[3].has("unit")):
            return None
        count, word, over, unit = parts
        if word.text.lower() not in ("in", "per", "auf", "je", "pro", "par") or unit.senses["unit"] not in ("mm", "cm"):
            return None
        assert count.number
        assert over.number
        scale = 10 if unit.senses["unit"] == "cm" else 1
        span = over.number.value * scale
        if not count.number.is_integer or not span or not count.number.value:
            return None
        if MILLIMETRES_OF_INCHES[0] <= span / count.number.value <= MILLIMETRES_OF_INCHES[1]:
            return None
        count.unit, count.system = "per length", str(span)
        return join(count, unit, count), at + 4

    return rewrite(items, rule)


def counts_with_units(items: list[Item]) -> list[Item]:
    """'24 Maschen/cm', '60 mesh per inch', '3600 meshes per square inch':
    the unit behind the word belongs to the count.
    """

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
