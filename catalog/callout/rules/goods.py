"""Goods that are no woven wire cloth, and what the cloth is called."""

import re

from catalog.callout.joining.measuring import peek
from catalog.callout.reading import Problem
from catalog.callout.rules.draft import Draft
from catalog.callout.text.items import Item


def _negated(draft: Draft, item: Item) -> bool:
    before = peek(draft.items, item.at - 1)
    return before is not None and before.has("negation") and not before.has("number sign")


def not_woven(draft: Draft) -> None:
    """Welded, knitted, expanded, perforated goods are no woven cloth; 'not welded' says that it is."""
    for item in draft.terms("not woven"):
        kind, at = item.senses["not woven"], item.at
        item.taken = "kind of goods"
        after = peek(draft.items, at + 1)
        if _negated(draft, item):
            draft.items[at - 1].taken = "kind of goods"
            draft.note(f"not {kind}, as the text says")
        elif after is not None and re.match(r"edge|frame|seam|border|selv|ends|rand|naht", after.text, re.IGNORECASE):
            draft.note(f"{item.text} {after.text}: made up after weaving, not part of the cloth")
            after.taken = "finish"
        else:
            message = f"'{item.text}' is no woven wire cloth: {kind} goods aren't in this catalogue."
            draft.outside = draft.outside or Problem("E_NOT_WOVEN", message, item.start)


def not_metal(draft: Draft) -> None:
    """Nylon, polyester, silk, glass: the cloth isn't of metal. 'PVC coated' is a finish and read as such."""
    for item in draft.terms("not metal"):
        item.taken = "material"
        if _negated(draft, item):
            draft.items[item.at - 1].taken = "material"
        else:
            message = f"'{item.text}' is no metal: only wire cloth is in this catalogue."
            draft.outside = draft.outside or Problem("E_NOT_METAL", message, item.start)


def references(draft: Draft) -> None:
    """'Same as last time', 'as usual', 'per drawing': what is meant stands elsewhere."""
    for item in draft.terms("reference"):
        if item.text.lower() in ("do", "same", "usual") and draft.numbers():
            continue
        item.taken = "reference"
        draft.note(f"'{item.text}' points to something that isn't in the text")
        if "refers elsewhere" not in draft.missing:
            draft.missing.append("refers elsewhere")


def kinds_of_goods(draft: Draft) -> None:
    """Sieve, slot, hardware cloth and what else the goods are called."""
    for item in draft.terms("sieve"):
        item.taken = "kind of goods"
        draft.is_sieve = True
    for item in draft.items:
        if item.has("slot") and re.match(r"slot|oblong|rect", item.text, re.IGNORECASE):
            draft.is_slotted = True
            item.taken = item.taken or "kind of goods"
    for item in draft.terms("hardware"):
        item.taken, draft.is_hardware = "kind of goods", True
    for item in draft.terms("product"):
        draft.is_slotted = draft.is_slotted or bool(re.match(r"oblong|rectang", item.text, re.IGNORECASE))
        item.taken = "kind of goods"
