"""Lengths as written: exact in millimetres, beside the spelling they came from."""

from dataclasses import dataclass
from fractions import Fraction

MM_PER_INCH = Fraction(127, 5)
MM_PER_UNIT: dict[str, Fraction] = {
    "mm": Fraction(1),
    "cm": Fraction(10),
    "m": Fraction(1000),
    "um": Fraction(1, 1000),
    "in": MM_PER_INCH,
    "ft": 12 * MM_PER_INCH,
    "thou": MM_PER_INCH / 1000,
}
LARGEST_ROUNDING = Fraction(25, 1000)  # a written decimal stands for at most ±2.5 % of itself


@dataclass(frozen=True, slots=True)
class Length:
    """A length, exact, with the spelling that it came from."""

    mm: Fraction
    """The value in millimetres."""
    half_unit_mm: Fraction = Fraction(0)
    """Half of the last written unit, in millimetres; 0 where counts or vulgar fractions are exact."""
    written: str = ""
    """The spelling, as in the text."""
    span: tuple[int, int] | None = None
    """Where it stands in the text, as offsets [from, to)."""

    @property
    def rounding_mm(self) -> Fraction:
        """What the spelling may be off by, in millimetres: half its last unit, at most 2.5 %."""
        return min(self.half_unit_mm, abs(self.mm) * LARGEST_ROUNDING)
