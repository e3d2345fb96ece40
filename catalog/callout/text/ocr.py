"""Scanner's damage: letters that were digits, and words whose letters ran together."""

import re
from collections.abc import Callable

DAMAGE = (
    r"(?<![A-WYZa-wyz\d.,/-])(?:[Tt]-?)?[.,]?[\dOolI]++(?:[.,][\dOolISB]++)?"
    r"(?=$|[^A-Za-z\d.,]|[.,](?![\dA-Za-z])|[xX]\s*[\d.,OIl]|(?:L|M|SS|SST|mm|in|um|ga)\b)"
)
"""A word of digits and of the letters that look like them: 6O, 3l6, .OO75, T3O4, lOO."""

LOOK_ALIKE = str.maketrans("OolISB", "001158")
LOW_CARBON = re.compile(r"[Tt]?-?\d{3}l")
BLIND = re.compile(r"[lI][Oo]{1,3}")
SLIPS = (("rn", "m"), ("vv", "w"), ("0", "o"), ("1", "l"), ("ii", "u"), ("cl", "d"))


def mended(word: str) -> str | None:
    """The number that a damaged *word* stood for; None where it is no damaged number.

    Needs a digit (or the shape of 10, 100, 1000), so that 'o' and 'Il' stay words; 316l is an alloy's name.
    """
    if word[-1] in "SB" or LOW_CARBON.fullmatch(word) or not any(letter in "OolISB" for letter in word.lstrip("Tt")):
        return None
    if not any(c.isdecimal() for c in word) and not BLIND.fullmatch(word):
        return None
    head = word[0] if word[0] in "Tt" else ""
    return head + word[len(head) :].translate(LOOK_ALIKE)


def likely_word(word: str, is_known: Callable[[str], bool]) -> str | None:
    """The known word that *word* becomes by undoing one usual slip: rnesh → mesh, vvire → wire, c1oth → cloth."""
    for seen, meant in SLIPS:
        if seen in word and is_known(repaired := word.replace(seen, meant)):
            return repaired
    return None
