"""Numbers that name a metal: 304, 316, and 80/20 beside brass."""

from catalog.callout.joining.measuring import peek
from catalog.callout.rules.draft import Draft
from catalog.callout.text.items import Item
from catalog.callout.vocabulary.materials import BARE_NUMBERS, BRASS_SPLITS

STEELS = ("CS", "stainless")


def brass_splits(draft: Draft) -> list[tuple[str, Item]]:
    """'80/20' beside brass is copper and zinc: CuZn20; without brass it is two numbers."""
    found = []
    has_brass = any(i.senses.get("material") in ("brass", "bronze") for i in draft.terms("material"))
    for item in draft.kinds("split"):
        copper, zinc = (int(part) for part in item.text.replace(" ", "").split("/"))
        name = BRASS_SPLITS.get((copper, zinc))
        if name and has_brass:
            found.append((name, item))
    return found


def bare_numbers(draft: Draft) -> list[tuple[str, Item]]:
    """304, 316 … alone are steels where something else is the count; '316 mesh 100' is 100 mesh of 316."""
    found = []
    for item in list(draft.items):
        if item.taken or not item.is_number or not item.number or item.unit is not None or item.bound or item.tolerance:
            continue
        if not item.number.is_integer or item.number.value not in BARE_NUMBERS or item.slot not in (None, "mesh"):
            continue
        if item.slot == "mesh" and not _yields_the_count(draft, item):
            continue
        if item.slot is None and not (_other_count(draft, item) or _beside_steel(draft, item)):
            continue
        found.append((item.number.written, item))
    for chain in draft.kinds("chain"):
        if (
            all(
                m.is_count_like and m.slot is None and m.number and m.number.value in BARE_NUMBERS
                for m in chain.members
            )
            and chain.joins[0] == "/"
        ):
            found += [(m.number.written, m) for m in chain.members if m.number]
    return found


def _yields_the_count(draft: Draft, item: Item) -> bool:
    """True where the word mesh behind 316 belongs to another number, which then is the count."""
    at = item.at
    after = [i for i in draft.items[at + 1 : at + 3] if i.is_count_like and i.slot is None]
    if after and after[0].number and after[0].number.value not in BARE_NUMBERS:
        after[0].slot = "mesh"
        return True
    return any(_is_count(i) for i in draft.all_numbers() if i is not item)


def _is_count(item: Item) -> bool:
    return item.slot in ("mesh", "count") or item.unit in ("mesh sign", "/in", "/cm", "M", "designation", "per length")


def _other_count(draft: Draft, item: Item) -> bool:
    """True where another number is, or can be, the count or the opening."""
    others = [n for n in draft.all_numbers() if n is not item and n.unit != "pieces"]
    return len(others) > 1 or any(n.slot or n.unit or n.is_count_like for n in others)


def _beside_steel(draft: Draft, item: Item) -> bool:
    at = item.at
    around = (peek(draft.items, at - 1), peek(draft.items, at + 1))
    return any(i is not None and i.senses.get("material") in STEELS for i in around)
