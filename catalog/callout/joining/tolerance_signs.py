"""Signs before numbers: tolerances, and bands of particles."""

from catalog.callout.joining.measuring import join, peek, rewrite
from catalog.callout.joining.products import name_number
from catalog.callout.text.items import Item


def signed_numbers(items: list[Item]) -> list[Item]:
    """A sign glued before a number and free on its left: '-40+60' says what passes and what is held."""

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        sign, number, before = items[at], peek(items, at + 1), peek(items, at - 1)
        if sign.text not in "+-" or not number or not number.is_number or not number.glued:
            return None
        earlier = peek(items, at - 2) if before is not None and before.text == "/" else before
        follows = earlier is not None and earlier.is_number and earlier.bound in ("passing", "held")
        if (sign.glued and not follows) or (before and before.text == "±"):
            return None
        number.bound = "passing" if sign.text == "-" else "held"
        return join(sign, number, number), at + 2

    return rewrite(items, rule)


def tolerances(items: list[Item]) -> list[Item]:
    """'0.25 mm ±5%', '.0075 ±.0003', '0.25 +0.02/-0.01 mm': what a figure may be off by; a unit behind serves both."""

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        number, sign, off = items[at], peek(items, at + 1), peek(items, at + 2)
        if not number.is_number or not sign:
            return None
        if sign.text == "±" and off and off.is_number:
            return _tolerance(number, off, off), at + 3
        behind = peek(items, at + 3)
        if sign.has("slot") and off and off.text == "±" and behind and behind.is_number:
            name_number(number, sign)
            return _tolerance(number, behind, behind), at + 4
        skip = 3 if off and off.text == "/" else 2
        minus = peek(items, at + skip)
        if sign.is_number and sign.bound == "held" and minus and minus.is_number and minus.bound == "passing":
            return _tolerance(number, sign, minus), at + skip + 1
        return None

    return rewrite(items, rule)


def _tolerance(number: Item, plus: Item, minus: Item) -> Item:
    unit = minus.unit or plus.unit
    if number.unit is None and unit != "%":
        number.unit = unit
    for off in (plus, minus):
        off.unit, off.bound = off.unit or unit, None
    number.tolerance = (plus, minus)
    return join(number, minus, number)
