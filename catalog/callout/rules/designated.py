"""Designations, 'No. 60': a sieve's name, unless it is a count."""

from dataclasses import replace

from catalog.callout.rules.claims import length_claim
from catalog.callout.rules.draft import POSSIBLE, USUAL, Draft
from catalog.callout.rules.sieve_senses import (
    count_in_german,
    count_option,
    is_opening_of,
    sieve_option,
)
from catalog.callout.text.items import Item


def designation_figures(draft: Draft) -> None:
    """'No. 60' is a sieve's name, unless it is a count; 'Nr. 20' on German lists counts per centimetre."""
    for number in draft.numbers():
        if number.unit != "designation" or number.slot not in (None, "mesh"):
            continue
        number.taken = "count"
        sieve, count = sieve_option(draft, number), count_option(number)
        is_german = (draft.is_metric_tongue or number.system == "Nr") and not draft.standards
        german = count_in_german(draft, number) if is_german else None
        if german and count:
            named = [replace(sieve, likelihood=POSSIBLE)] if draft.is_sieve and sieve else []
            draft.choices.append([german, *named, count])
        elif draft.is_sieve and sieve:
            draft.choices.append([sieve])
        elif sieve and count:
            draft.choices.append(
                [sieve, replace(count, likelihood=POSSIBLE)]
                if number.slot is None
                else [replace(count, likelihood=USUAL), replace(sieve, likelihood=POSSIBLE)]
            )
        elif count and not draft.is_sieve:
            draft.choices.append([replace(count, likelihood=USUAL)])
        else:
            draft.problem("E_NOT_UNDERSTOOD", f"There is no sieve No. {number.text}.", number)
        for again in number.restated:
            _restated_opening(draft, number, again)


def _restated_opening(draft: Draft, number: Item, again: Item) -> None:
    """A length in brackets behind a designation is its opening."""
    again.taken = "aperture"
    if again.is_length:
        length = again.length()
        if is_opening_of(number, length) and draft.is_sieve:
            return
        draft.claims.append(length_claim("aperture", [again]))
