"""Dates that were fractions before a spreadsheet saw them."""

import re

from catalog.callout.joining.measuring import peek
from catalog.callout.rules.draft import USUAL, Claim, Draft, Option
from catalog.units import parse_number

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


def dates(draft: Draft) -> None:
    """'16-Mar' and '04-Jan' are 3/16 and 1/4 that a spreadsheet took for dates;
    beside a whole cloth a date is a date.
    """
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
