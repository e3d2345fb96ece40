"""Ranges: from the lower to the higher figure."""

from catalog.callout.joining.measuring import join, peek, rewrite
from catalog.callout.joining.products import is_times
from catalog.callout.text.items import Item


def ranges(items: list[Item]) -> list[Item]:
    """'40-60 mesh', '0.1 to 0.2 mm', '0.5..0.8 mm', 'between 0.5 and 0.8 mm': from the lower to the higher figure."""

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        if items[at].has("between") and _joined(peek(items, at + 2), ("and", "und", "et", "y", "e", "-", "to", "bis")):
            return _range(items, at, peek(items, at + 1), peek(items, at + 3), at + 4)
        low, middle = items[at], peek(items, at + 1)
        if not low.is_number or middle is None or is_times(peek(items, at - 1)):
            return None
        if middle.text == "." and peek(items, at + 2) and items[at + 2].text == ".":
            return _range(items, at, low, peek(items, at + 3), at + 4)
        if (
            middle.has("range")
            or middle.text == "…"
            or (middle.text == "-" and (middle.glued or _is_label(items, at + 3)))
        ):
            return _range(items, at, low, peek(items, at + 2), at + 3)
        return None

    return rewrite(items, rule)


def _joined(item: Item | None, words: tuple[str, ...]) -> bool:
    return item is not None and item.text.lower() in words


def _is_label(items: list[Item], at: int) -> bool:
    item = peek(items, at)
    return item is not None and item.senses.get("slot") in ("mesh", "count", "aperture", "pitch", "wire")


def _range(items: list[Item], at: int, low: Item | None, high: Item | None, end: int) -> tuple[Item, int] | None:
    if not (low and high and low.is_number and high.is_number and low.number and high.number):
        return None
    if low.unit not in (None, high.unit) or high.bound or high.unit in ("pieces", "designation"):
        return None
    if not low.number.value < high.number.value or is_times(peek(items, end)):
        return None
    low.unit, low.system, low.upto = high.unit, high.system, high
    return join(items[at], high, low), end
