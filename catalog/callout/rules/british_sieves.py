"""British and old sieve numbers: names like the ASTM ones, with their own openings. From memory, and said so."""

from fractions import Fraction

BRITISH_MM: dict[int, str] = {
    5: "3.35", 6: "2.8", 7: "2.36", 8: "2", 10: "1.7", 12: "1.4", 14: "1.18", 16: "1", 18: "0.85", 22: "0.71",
    25: "0.6", 30: "0.5", 36: "0.425", 44: "0.355", 52: "0.3", 60: "0.25", 72: "0.212", 85: "0.18", 100: "0.15",
    120: "0.125", 150: "0.106", 170: "0.09", 200: "0.075", 240: "0.063", 300: "0.053", 350: "0.045", 400: "0.038",
}  # fmt: skip
"""BS 410 mesh number → opening, mm. From memory."""


def opening_mm(number: int) -> Fraction | None:
    """The opening of a British mesh number, mm; None where there is none."""
    text = BRITISH_MM.get(number)
    return Fraction(text) if text else None
