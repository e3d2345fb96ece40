"""Which numbers are the warp's and which the weft's."""

from catalog.callout.joining.measuring import peek
from catalog.callout.joining.neighbours import EQUALS, last_of, next_figure
from catalog.callout.joining.separators import is_separator
from catalog.callout.text.items import Item


def give_side(items: list[Item], at: int, word: Item, last: Item | None) -> None:
    """Give a word for warp or weft its number: the one before it, or the one that it leads."""
    side = word.senses["side"]
    holder = (
        last
        if last is not None and last_of(last).side is None and not _points_on(items, at)
        else _ahead_over_labels(items, at + 1)
    )
    if holder is None:
        return
    for number in holder.members or [holder]:
        number.side = number.side or side
    word.taken = word.taken or "direction"
    if holder is not last and not word.has("slot"):
        word.senses["leads"] = ""


def sided(items: list[Item]) -> list[Item]:
    """What stands in a clause that names warp or weft is of that direction: 'weft 110/in wire .010'."""
    side: str | None = None
    for item in items:
        if is_separator(item):
            side = None
        elif item.has("side"):
            side = item.senses["side"] if item.has("leads") else None
        elif side is not None:
            both = item.kind == "chain" and all(m.is_count_like for m in item.members)
            for number in [] if both else item.members or ([item] if item.is_number else []):
                number.side = number.side or side
    return items


def _points_on(items: list[Item], at: int) -> bool:
    """True where the word leads its number: '=' or a label behind it, or a clause that begins with it."""
    after, before = peek(items, at + 1), peek(items, at - 1)
    return (after is not None and (after.text in EQUALS or after.senses.get("slot") == "wire")) or is_separator(before)


def _ahead_over_labels(items: list[Item], at: int) -> Item | None:
    while (item := peek(items, at)) and item.has("slot"):
        at += 1
    return next_figure(items, at)
