"""Numbers as they are claimed, with what is written in brackets behind them."""

from collections.abc import Sequence

from catalog.callout.rules.claims import count_claim, length_claim
from catalog.callout.rules.draft import Draft
from catalog.callout.rules.sieve_senses import (
    is_opening_of,
)
from catalog.callout.text.items import Item


def take(numbers: Sequence[Item], role: str) -> None:
    """Mark numbers as claimed."""
    for number in numbers:
        number.taken = role


def with_twin(members: list[Item], number: Item) -> list[Item]:
    """The whole number before a count in a product is the other direction's count."""
    at = members.index(number)
    twin = members[at - 1] if at else None
    return (
        [twin, number] if twin is not None and twin.is_count_like and twin.slot is None and not twin.taken else [number]
    )


def said_again(draft: Draft, slot: str, row: list[Item]) -> None:
    """What stands in brackets behind figures: the same in another unit; behind a count or a sieve's number,
    its opening.
    """
    pairs = list(zip(*(n.restated for n in row), strict=False)) if len(row) > 1 else [(a,) for a in row[0].restated]
    if len(row) > 1 and not pairs:
        pairs = [(again,) for again in row[-1].restated]
    for numbers in pairs:
        again = list(numbers)
        take(again, "pitch" if slot == "count" else slot)
        _claim_again(draft, slot, row, again)


def _claim_again(draft: Draft, slot: str, row: list[Item], again: list[Item]) -> None:
    first = again[0]
    if first.is_length:
        draft.claims.append(length_claim("aperture" if slot == "count" else slot, again))
    elif slot == "aperture" and first.unit == "designation":
        if row[0].is_length and not is_opening_of(first, row[0].length()):
            message = f"No. {first.text} doesn't open {row[0].text} {row[0].unit}."
            draft.problem("E_INCONSISTENT", message, first)
    elif slot in ("pitch", "count") and (claim := count_claim(again)):
        draft.claims.append(claim)
    elif first.unit != "gauge":
        message = f"What {first.text} in brackets says of {row[0].text} isn't understood."
        draft.problem("E_NOT_UNDERSTOOD", message, first)
