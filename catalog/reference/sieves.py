"""Test sieves: openings with the names that editions give them. A number is a name, not a count."""

from bisect import bisect_left
from dataclasses import dataclass
from fractions import Fraction
from functools import cache

from catalog.reference.rows import rows_of

SOURCE = "ISO 3310-1:2016 and ASTM E11-17, openings, series and wires as in the library fluids 1.3.1"


@dataclass(frozen=True, slots=True)
class Sieve:
    """A test-sieve opening with its nominal wire. mm, exact."""

    opening_mm: Fraction
    series: str
    e11_name: str | None
    """'No. 60', '1/4 in.' or None where ASTM E11 has no such sieve."""
    wire_mm: Fraction
    wire_min_mm: Fraction
    wire_max_mm: Fraction
    in_e11: bool
    wire_min_is_verified: bool = True


@cache
def sieves() -> tuple[Sieve, ...]:
    """Every opening, coarse to fine, as a stack stands."""
    return tuple(
        Sieve(
            Fraction(row["opening_mm"]),
            row["series"],
            row["e11_name"] or None,
            Fraction(row["wire_mm"]),
            Fraction(row["wire_min_mm"]),
            Fraction(row["wire_max_mm"]),
            row["in_e11"] == "1",
            not row["wire_min_flag"],
        )
        for row in rows_of("sieves")
    )


@cache
def _by_name() -> dict[str, Sieve]:
    return {sieve.e11_name: sieve for sieve in sieves() if sieve.e11_name}


def by_number(number: str) -> Sieve | None:
    """The sieve called 'No. *number*' in ASTM E11; None where there is none."""
    return _by_name().get(f"No. {number.strip()}")


def by_name(name: str) -> Sieve | None:
    """The sieve with this ASTM E11 designation: 'No. 60', '1/4 in.'."""
    return _by_name().get(name)


@cache
def _by_opening() -> dict[Fraction, Sieve]:
    return {sieve.opening_mm: sieve for sieve in sieves()}


def by_opening(opening_mm: Fraction | str) -> Sieve | None:
    """The sieve with exactly this opening, mm."""
    return _by_opening().get(Fraction(opening_mm))


def nearest(opening_mm: Fraction | float, n: int = 2) -> tuple[Sieve, ...]:
    """The *n* sieves nearest to an opening by ratio, the nearest first."""
    ascending = sieves()[::-1]
    at = bisect_left([s.opening_mm for s in ascending], opening_mm)
    near = ascending[max(0, at - n) : at + n]
    ratio = Fraction(opening_mm)
    return tuple(sorted(near, key=lambda s: max(s.opening_mm / ratio, ratio / s.opening_mm)))[:n]
