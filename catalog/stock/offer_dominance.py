"""Offers that another one outdoes: it is no dearer, no later and no worse, and better in one of the three."""

from collections.abc import Mapping, Sequence
from dataclasses import replace
from typing import TYPE_CHECKING

if TYPE_CHECKING:
    from catalog.stock.offers import Quote


def outdone(quotes: Sequence["Quote"], ranks: Mapping[str, int]) -> list["Quote"]:
    """Mark each quote that another one outdoes, with the sentence; by the cheapest of them."""
    marked = []
    for quote in quotes:
        better = [other for other in quotes if outdoes(other, quote, ranks)]
        if better:
            by = min(better, key=lambda other: (other.cost or 0, other.offer.article))
            quote = replace(quote, outdone_by=by.offer.article, why_outdone=_sentence(quote, by))
        marked.append(quote)
    return marked


def outdoes(one: "Quote", other: "Quote", ranks: Mapping[str, int]) -> bool:
    """Whether *one* is at least as good in cost, lead time and cloth, and better in one of them.

    Other currencies, unstated lead times and cloths without a rank can't be compared: then it isn't. An offer that
    can't supply the list is outdone by none: it is no offer.
    """
    if one is other or one.cost is None or other.cost is None or one.offer.currency != other.offer.currency:
        return False
    soon, late = one.offer.lead_days, other.offer.lead_days
    cloths = _ranks(one.offer.cloth, other.offer.cloth, ranks)
    if soon is None or late is None or cloths is None:
        return False
    no_worse = one.cost <= other.cost and soon <= late and cloths[0] <= cloths[1]
    return no_worse and (one.cost < other.cost or soon < late or cloths[0] < cloths[1])


def _ranks(one: str, other: str, ranks: Mapping[str, int]) -> tuple[int, int] | None:
    if one == other:
        return 0, 0
    return (ranks[one], ranks[other]) if one in ranks and other in ranks else None


def _sentence(quote: "Quote", by: "Quote") -> str:
    costs = "costs the same" if by.cost == quote.cost else f"costs {by.cost} instead of {quote.cost}"
    days = by.offer.lead_days, quote.offer.lead_days
    soon = f"comes as soon ({days[0]} days)" if days[0] == days[1] else f"comes in {days[0]} instead of {days[1]} days"
    cloth = "is the same cloth" if by.offer.cloth == quote.offer.cloth else "its cloth serves no worse"
    return (
        f"Outdone by {by.offer.article} of {by.offer.seller}: it {costs} {quote.offer.currency}, {soon}, and {cloth}."
    )
