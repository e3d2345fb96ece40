"""What stands beside a word: the number before and the number after."""

from catalog.callout.text.items import Item

EQUALS = frozenset("=:≤≥<>~")
PASSED_OVER = ("material", "harmless", "finish", "galvanised", "tolerance word", "number sign")


def last_of(item: Item) -> Item:
    """The number itself, or the last of a product."""
    return item.members[-1] if item.kind == "chain" else item


def first_of(item: Item) -> Item:
    """The number itself, or the first of a product."""
    return item.members[0] if item.kind == "chain" else item


def next_figure(items: list[Item], at: int) -> Item | None:
    """The next number of the clause, over '=', 'of', comparisons and words that don't count."""
    while at < len(items):
        item = items[at]
        if item.is_number or item.kind == "chain":
            return item
        if (
            item.text in EQUALS
            or item.text == "."
            or item.has("compare")
            or item.has("side")
            or any(map(item.has, PASSED_OVER))
        ):
            at += 1
            continue
        return None
    return None
