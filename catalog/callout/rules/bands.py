"""Bands of particle sizes, which are no cloth."""

from catalog.callout.joining.measuring import peek
from catalog.callout.reading import Problem
from catalog.callout.rules.draft import Draft


def bands(draft: Draft) -> None:
    """'-40+60 mesh', 'passing 40 mesh, retained on 60': a band of particles,
    by what passes one sieve and stays on another.
    """
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
