"""Counts by their unit: per inch, per centimetre, per square, over a length."""

import re

from catalog.callout.rules.claims import count_claim
from catalog.callout.rules.draft import USUAL, Claim, Draft, Option
from catalog.callout.rules.taking import said_again, take, with_twin
from catalog.callout.text.items import Item

COUNT_UNITS = ("/in", "/cm", "/in2", "/cm2", "mesh sign", "per length")

PER_WHAT = re.compile(r"n$|masch|faden|nombre|numero", re.IGNORECASE)
"""Words for a count that says not per what: n of a formula, Maschenzahl, nombre de mailles."""


def count_figures(draft: Draft) -> None:
    """'24/cm', '60#', '47 in 20 mm', 'count 60 x 60', '3600 per square inch': counts, exact."""
    for item in draft.items:
        members = item.members if item.kind == "chain" else [item] if item.is_number else []
        row = [
            m
            for m in members
            if not m.taken and (m.slot == "count" or m.unit in COUNT_UNITS or (m.unit == "M" and not _metres(draft, m)))
        ]
        if not row:
            continue
        if len(row) == 1 and item.kind == "chain":
            row = with_twin(members, row[0])
        if claim := count_claim(row, row[-1].unit if row[-1].unit != "M" else None):
            take(row, "count")
            if all(n.unit is None for n in row) and any(PER_WHAT.match(n.senses.get("named", "")) for n in row):
                draft.choices.append(_per_inch_or_cm(row, claim))
            else:
                draft.claims.append(claim)
            said_again(draft, "count", row)


def _per_inch_or_cm(row: list[Item], claim: Claim) -> list[Option]:
    """'n = 20' and 'Maschenzahl 20' count per inch or per centimetre, as their author is used to."""
    options = [Option(f"{row[0].text} per inch", (claim,), USUAL, sense="per inch or per cm")]
    if other := count_claim(row, "/cm"):
        options.append(Option(f"{row[0].text} per cm", (other,), USUAL, sense="per inch or per cm"))
    return options


def _metres(draft: Draft, number: Item) -> bool:
    """'60M' is mesh where no other count stands in the text."""
    return any(n is not number and n.slot in ("mesh", "count") for n in draft.all_numbers()) or not number.is_number
