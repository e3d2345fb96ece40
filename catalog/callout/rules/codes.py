"""Codes: part numbers, which are never decoded, and the numbers of steel sieve cloth."""

import re

from catalog.callout.joining.measures import number_from
from catalog.callout.rules.claims import length_claim
from catalog.callout.rules.draft import Draft
from catalog.callout.text.designations import GOST_MESH

GOST_SIEVE = re.compile(r"сетк", re.IGNORECASE)


def steel_codes(draft: Draft) -> None:
    """'Сетка 2-04-025': group, opening and wire with the point left out: 0.4 and 0.25 mm."""
    if not any(GOST_SIEVE.search(i.text) for i in draft.items):
        return
    for item in draft.kinds("code"):
        found = GOST_MESH.fullmatch(item.text)
        if found is None:
            continue
        sizes = [number_from(_pointed(found[name])) for name in ("aperture", "wire")]
        if any(s.number is None for s in sizes):
            continue
        for size in sizes:
            size.start, size.end, size.unit = item.start, item.end, "mm"
        item.taken = "aperture"
        draft.claims += [length_claim("aperture", sizes[:1]), length_claim("wire", sizes[1:])]
        draft.standards.append("GOST 3826 style")
        draft.note(
            f"{item.text}: opening {_pointed(found['aperture'])} mm, wire {_pointed(found['wire'])} mm; "
            "a leading zero is the zero before the point"
        )


def _pointed(digits: str) -> str:
    return f"0.{digits[1:]}" if digits[0] == "0" and len(digits) > 1 and digits.isdecimal() else digits


def part_numbers(draft: Draft) -> None:
    """A number behind 'P/N' or 'art. no.' names an article. A scheme that nobody explains is a question,
    never decoded.
    """
    for item in draft.kinds("code"):
        before = draft.items[max(0, item.at - 3) : item.at]
        item.taken = "code"
        if any(b.has("part number") or b.has("number sign") for b in before):
            draft.note(f"{item.text}: an article or order number, not read")
        else:
            draft.problem(
                "E_NOT_UNDERSTOOD",
                f"'{item.text}' looks like a part number whose scheme isn't known: what cloth is it?",
                item,
            )
