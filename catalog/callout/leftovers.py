"""What no other rule has claimed: particle bands, dates that were fractions, codes, numbers and words not understood."""

import re

from catalog.callout.claims import length_claim
from catalog.callout.designations import GOST_MESH
from catalog.callout.draft import USUAL, Claim, Draft, Option
from catalog.callout.items import Item
from catalog.callout.measures import number_from, peek
from catalog.callout.reading import Problem
from catalog.units import Length, parse_number

MONTHS = {
    "jan": 1,
    "feb": 2,
    "mar": 3,
    "mär": 3,
    "mrz": 3,
    "apr": 4,
    "may": 5,
    "mai": 5,
    "jun": 6,
    "jul": 7,
    "aug": 8,
    "sep": 9,
    "oct": 10,
    "okt": 10,
    "nov": 11,
    "dec": 12,
    "dez": 12,
}
GOST_SIEVE = re.compile(r"сетк", re.IGNORECASE)
MOST_PROBLEMS = 5
ROLES = {
    "slot": "label", "side": "direction", "unit": "unit", "compare": "limit", "harmless": "ignored", "number sign": "ignored", "range": "ignored", "between": "ignored",
    "by": "ignored", "tolerance word": "limit", "delivery": "ignored", "part number": "ignored", "purpose": "limit", "equal": "ignored", "negation": "ignored", "form": "form", "band": "ignored",
}  # fmt: skip


def bands(draft: Draft) -> None:
    """'-40+60 mesh', 'passing 40 mesh, retained on 60': a band of particles, by what passes one sieve and stays on another."""
    signed = [n for n in draft.numbers() if n.bound in ("passing", "held")]
    for word in draft.terms("band"):
        number = peek(draft.items, word.at + 1)
        if number is not None and number.is_number and not number.taken and not number.is_length:
            word.taken = "particle size"
            number.bound = "passing" if word.text.lower() in ("passing", "minus", "undersize", "through") else "held"
            signed.append(number)
    if not signed:
        return
    for number in signed:
        number.taken = "particle size"
    names = " and ".join(f"{'-' if n.bound == 'passing' else '+'}{n.text}" for n in signed)
    message = f"{names} names a band of particle sizes, not a cloth: say which sieve cloth is wanted."
    draft.outside = draft.outside or Problem("E_NO_CLOTH", message, signed[0].start)


def dates(draft: Draft) -> None:
    """'16-Mar' and '04-Jan' are 3/16 and 1/4 that a spreadsheet took for dates; beside a whole cloth a date is a date."""
    for item in draft.kinds("date"):
        before = peek(draft.items, item.at - 1)
        item.taken = "date"
        if before is not None and before.has("delivery"):
            draft.note(f"{item.text}: taken as a date of delivery")
            continue
        fraction = _fraction_of(item.text)
        if fraction is None:
            draft.problem(
                "E_DATE", f"'{item.text}' is a date; it may have been a fraction that a spreadsheet changed.", item
            )
            continue
        draft.problem("E_DATE", f"A spreadsheet turned {fraction} into the date '{item.text}'.", item)
        number = parse_number(fraction)
        if number is not None and not draft.numbers():
            length = number.length("in", (item.start, item.end))
            draft.choices.append(
                [
                    Option(f"{fraction} in {name}", (Claim(slot, length, length),), USUAL, sense="opening or pitch")
                    for slot, name in (("pitch", "pitch"), ("aperture", "opening"))
                ]
            )


def _fraction_of(text: str) -> str | None:
    """The fraction of an inch that a date was: month over day, or day over month where only that is one."""
    month = next((n for name, n in MONTHS.items() if name in text.lower()), None)
    numbers = [int(n) for n in re.findall(r"\d+", text)]
    if month is None and len(numbers) >= 3:
        numbers, month = (
            [numbers[2]] if numbers[0] > 31 else [numbers[1]],
            numbers[1] if numbers[0] > 31 else numbers[0],
        )
    if not numbers or month is None:
        return None
    for top, bottom in ((month, numbers[0]), (numbers[0], month)):
        if bottom in (2, 4, 8, 16, 32, 64) and top < bottom and top % 2:
            return f"{top}/{bottom}"
    return None


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
            f"{item.text}: opening {_pointed(found['aperture'])} mm, wire {_pointed(found['wire'])} mm; a leading zero is the zero before the point"
        )


def _pointed(digits: str) -> str:
    return f"0.{digits[1:]}" if digits[0] == "0" and len(digits) > 1 and digits.isdecimal() else digits


def part_numbers(draft: Draft) -> None:
    """A number behind 'P/N' or 'art. no.' names an article. A scheme that nobody explains is a question, never decoded."""
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


def leftovers(draft: Draft) -> None:
    """Every number has to play a part and every word to be known; what doesn't is said with its place."""
    for at, item in enumerate(draft.items):
        for part in item.members or [item]:
            if not part.taken:
                _leftover(draft, part, at)


def _leftover(draft: Draft, item: Item, at: int) -> None:
    if item.kind == "sign" or (item.kind == "word" and item.text in "xX"):
        return
    if item.is_number:
        item.taken = "unknown"
        _unclear(draft, item, f"The figure {_shown(item)} has no part in a cloth that is understood.")
    elif item.kind == "term":
        _loose_term(draft, item, at)
    elif item.kind in ("word", "split"):
        item.taken = "unknown"
        _unclear(draft, item, f"'{item.text[:40]}' isn't understood.")
    else:
        item.taken = item.kind


def _shown(item: Item) -> str:
    unit = {"gauge": "gauge", None: "", "mesh sign": "#"}.get(item.unit, item.unit or "")
    return f"{item.text} {unit}".strip()


def _loose_term(draft: Draft, item: Item, at: int) -> None:
    """A word of the trade that nothing could be done with: a limit without figure and a lone 'not' carry meaning."""
    role = next((r for r in ROLES if item.has(r)), "unknown")
    item.taken = ROLES.get(role, "unknown")
    after = peek(draft.items, at + 1)
    unit = item.senses.get("unit", "")
    if unit.startswith("/") or (len(item.text) > 2 and unit and not item.has("harmless")):
        _unclear(draft, item, f"'{item.text}' has no figure before it.")
    elif item.has("compare") and not item.has("harmless"):
        _unclear(draft, item, f"'{item.text}' has no figure that it limits.")
    elif item.has("gauge") and not item.has("unit") and len(item.text) > 1:
        _unclear(draft, item, f"'{item.text}' has no number.")
    elif item.has("alternative") and not item.has("harmless") and len(item.text) > 1:
        _unclear(draft, item, f"What '{item.text}' offers as an alternative isn't understood.")
    elif (
        item.text.lower() in ("not", "nicht", "kein", "keine", "never", "instead of")
        and after is not None
        and not after.has("harmless")
    ):
        _unclear(draft, item, f"What '{item.text}' excludes isn't understood.")
    elif item.has("band") and draft.numbers():
        _unclear(draft, item, f"'{item.text}' speaks of particles, not of a cloth.")
    elif item.taken == "unknown":
        _unclear(draft, item, f"'{item.text}' isn't understood here.")


def _unclear(draft: Draft, item: Item, message: str) -> None:
    if sum(p.code == "E_NOT_UNDERSTOOD" for p in draft.problems) < MOST_PROBLEMS:
        draft.problem("E_NOT_UNDERSTOOD", message, item)


def has_length(length: Length | None) -> bool:
    """True where there is a length."""
    return length is not None
