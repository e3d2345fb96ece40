"""How rules join items: each is tried at every place, once."""

from collections.abc import Callable

from catalog.callout.text.items import Item

SIGNS = {'"': "in", "'": "ft", "%": "%", "#": "mesh sign"}


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


def unit_of(item: Item) -> str | None:
    """The unit that a sign or a word stands for; None where it is none."""
    if item.kind == "sign":
        return SIGNS.get(item.text)
    if item.has("slot") and item.text.startswith("%"):
        return "%"
    return item.senses.get("unit")
