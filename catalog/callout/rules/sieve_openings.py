"""Openings of test sieves: which of them bring the standard's nominal wire."""

import re

from catalog.callout.rules.claims import length_claim
from catalog.callout.rules.draft import POSSIBLE, USUAL, Draft, Option
from catalog.callout.rules.sieve_senses import (
    sieve_claims,
    sieve_near,
)
from catalog.callout.text.items import Item

BRINGS_WIRE = re.compile(r"3310|E\s?-?\s?11|410", re.IGNORECASE)
"""Standards of test sieves, whose cloth has a nominal wire; a list of openings alone has none."""


def sieve_opening(draft: Draft, number: Item) -> bool:
    """'250 µm ISO 3310-1': the opening of a sieve brings the standard's nominal wire; a stated wire goes before it."""
    if any("sieve" in (o.standard or "") or "mesh number" in (o.standard or "") for c in draft.choices for o in c):
        return False
    sieve = sieve_near(number.length())
    if sieve is None:
        draft.problem(
            "E_NOT_UNDERSTOOD",
            f"{number.text} {number.unit} is no opening of the standard's series; say whether a test sieve is meant.",
            number,
        )
        return False
    if not any(BRINGS_WIRE.search(s) for s in draft.standards) and not any(
        n.slot == "wire" for n in draft.all_numbers()
    ):
        opening = length_claim("aperture", [number])
        claims = sieve_claims(sieve, number)
        draft.choices.append(
            [
                Option("sieve cloth with the standard's nominal wire", claims, USUAL, sense="sieve or opening"),
                Option("opening only, wire open", (opening,), POSSIBLE, sense="sieve or opening"),
            ]
        )
        return True
    draft.claims += sieve_claims(sieve, number)
    draft.note(
        f"opening of the sieve series; wire {float(sieve.wire_mm):g} mm is the standard's nominal one"
        if not any(n.slot == "wire" for n in draft.all_numbers())
        else "opening of the sieve series"
    )
    return True
