"""Sieve designations: a number that is a name. No opening is computed from it; the table says it, or nobody does."""

from fractions import Fraction

from catalog.callout.reading import Likelihood
from catalog.callout.rules.british_sieves import opening_mm
from catalog.callout.rules.draft import POSSIBLE, USUAL, Claim, Draft, Option
from catalog.callout.text.items import Item
from catalog.reference import sieves
from catalog.reference.sieves import Sieve
from catalog.units import Length

OLD_OPENINGS_SHARE = Fraction(2, 100)
"""Older editions rounded otherwise: 74 µm is No. 200, 149 µm No. 100. What is nearer than 2 % is the same sieve."""


def sieve_option(draft: Draft, number: Item, likelihood: Likelihood = USUAL) -> Option | None:
    """The reading of a number as a sieve's; British where BS 410 is named. None where no sieve has it."""
    if number.number is None or not (number.number.is_integer or number.number.kind == "fraction"):
        return None
    name = number.number.written.lstrip("0").replace("-", " ")
    british = any("410" in s for s in draft.standards)
    opening = opening_mm(int(number.number.value)) if british else None
    sieve = sieves.by_opening(opening) if opening else None if british else sieves.by_number(name)
    if sieve is None:
        return None
    label = f"{'British mesh number' if british else 'sieve No.'} {name}"
    notes: tuple[str, ...] = (
        f"{label}: opening {_mm(sieve.opening_mm)} and the standard's nominal wire {_mm(sieve.wire_mm)}",
    )
    if british:
        notes += ("British mesh numbers are from memory",)
    standard = f"BS 410 mesh number {name}" if british else f"sieve designation No. {name}"
    return Option(
        label, sieve_claims(sieve, number), likelihood, notes=notes, standard=standard, sense="sieve or count"
    )


def sieve_claims(sieve: Sieve, number: Item | None = None) -> tuple[Claim, Claim]:
    """Opening and nominal wire of a sieve."""
    span = None if number is None else (number.start, number.end)
    written = number.text if number else ""
    opening = Length(sieve.opening_mm, Fraction(0), written, span)
    wire = Length(sieve.wire_mm, Fraction(0), "", span)
    return Claim("aperture", opening, opening), Claim("wire", wire, wire, by_custom=True)


def sieve_near(length: Length) -> Sieve | None:
    """The sieve whose opening a written length names, old editions' figures too."""
    near = sieves.nearest(length.mm, 1) if length.mm > 0 else ()
    if near and abs(near[0].opening_mm - length.mm) <= max(
        length.rounding_mm, near[0].opening_mm * OLD_OPENINGS_SHARE / 2
    ):
        return near[0]
    return None


def is_opening_of(number: Item, length: Length) -> bool:
    """True where *length* is the opening of the sieve with this number: 75 µm and No. 200."""
    sieve = sieves.by_number(number.number.written.lstrip("0")) if number.number and number.number.is_integer else None
    if sieve is None:
        return False
    off = abs(sieve.opening_mm - length.mm)
    return off <= max(length.rounding_mm, sieve.opening_mm * OLD_OPENINGS_SHARE)


def count_in_german(draft: Draft, number: Item) -> Option | None:
    """'Nr. 20' of old German lists: wires per centimetre."""
    from catalog.callout.rules.claims import count_claim

    claim = count_claim([number], "/cm")
    written = number.number.written if number.number else ""
    return (
        Option(f"old German number: {written} wires per cm", (claim,), USUAL, sense="per inch or per cm")
        if claim
        else None
    )


def count_option(number: Item, likelihood: Likelihood = POSSIBLE) -> Option | None:
    """The number as a count per inch."""
    from catalog.callout.rules.claims import count_claim

    claim = count_claim([number], None if number.unit == "designation" else number.unit)
    written = number.number.written if number.number else ""
    return Option(f"{written} per inch", (claim,), likelihood, sense="sieve or count") if claim else None


def _mm(value: Fraction) -> str:
    return f"{float(value):.4g} mm"
