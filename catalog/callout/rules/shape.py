"""The shape of a row of numbers. W whole number, D decimal, F vulgar fraction, L length with a unit, G gauge."""

from catalog.callout.rules.draft import Draft
from catalog.callout.text.items import Item

THICKEST_MM = 30
"""A length from here on is no wire beside an opening, but a size."""


def shape_of(numbers: list[Item]) -> str:
    """One letter a number: 'WWD' for 60 x 60 x .0075."""
    return "".join(_letter(n) for n in numbers)


def _letter(number: Item) -> str:
    if number.unit in ("gauge", "aught"):
        return "G"
    if number.is_length:
        return "L"
    if number.unit is not None or number.number is None:
        return "?"
    return {"integer": "W", "fraction": "F"}.get(number.number.kind, "D")


def knows_wire(draft: Draft) -> bool:
    """True where the wire is claimed already."""
    return draft.has_slot("wire")


def states_opening(draft: Draft) -> bool:
    """True where a number is taken as the opening; a sieve's name alone brings an opening that nobody stated."""
    return any(n.taken == "aperture" for n in draft.all_numbers())


def has_free_wire(draft: Draft, numbers: list[Item]) -> bool:
    """True where a decimal, a gauge or a named wire stands beside the product."""
    others = [n for n in draft.numbers() if n not in numbers and n.slot is None]
    return knows_wire(draft) or any(
        shape_of([n]) in "DG" or (n.is_length and n.length().mm < THICKEST_MM) for n in others
    )
