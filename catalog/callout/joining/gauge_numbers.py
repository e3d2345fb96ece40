"""Gauges that are named before their number."""

from catalog.callout.joining.measuring import join, peek, rewrite, unit_of
from catalog.callout.text.items import Item


def gauges_named_first(items: list[Item]) -> list[Item]:
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
        if not number or not number.is_number or (after and unit_of(after)) or not _is_gauge_number(number):
            return None
        number.unit, number.system = "gauge", name.senses["gauge"]
        return join(name, number, number), behind + 1

    return rewrite(items, rule)


def _is_gauge_number(number: Item) -> bool:
    return number.unit == "aught" or bool(number.number and number.number.is_integer and number.number.value <= 80)
