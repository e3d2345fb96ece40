"""Which number a comparison bounds."""

from catalog.callout.joining.measuring import peek
from catalog.callout.joining.neighbours import first_of
from catalog.callout.joining.separators import is_separator
from catalog.callout.text.items import Item

SIGN_BOUNDS = {"≤": "most", "≥": "least", "<": "under", ">": "over"}


def bounded(items: list[Item]) -> list[Item]:
    """Give every comparison its number: '≥ 40 %' the next, '0.8 mm max' the one before,
    'or finer' always the one before.
    """
    for at, item in enumerate(items):
        bound = SIGN_BOUNDS.get(item.text) if item.kind == "sign" else item.senses.get("compare")
        if bound is None or item.taken:
            continue
        before, after = _near(items, at, -1), _near(items, at, +1)
        holder = _bound_holder(items, at, item, before, after)
        if holder is not None:
            for number in holder.members or [holder]:
                number.bound = bound
            item.taken = "limit"
    return items


def _bound_holder(items: list[Item], at: int, item: Item, before: int | None, after: int | None) -> Item | None:
    earlier = None if before is None else items[before]
    later = None if after is None else items[after]
    if item.text.lower().startswith(("or ", "and ", "oder ")) or later is None:
        return earlier
    if item.kind == "sign" or earlier is None or earlier.bound:
        return later
    own = peek(items, (after or 0) + 1)
    leads = "label before" in first_of(later).senses and not (own is not None and own.has("compare"))
    return later if leads or item.senses["compare"] not in ("least", "most") else earlier


def _near(items: list[Item], at: int, step: int) -> int | None:
    """The place of the nearest number on one side, within the clause."""
    at += step
    while 0 <= at < len(items) and not is_separator(items[at]):
        item = items[at]
        if item.is_number or item.kind == "chain":
            return at
        if item.has("compare") or (item.kind == "sign" and item.text in "≤≥<>"):
            return None
        at += step
    return None
