"""The house's rules of judgement: numbers that a user may edit, each with its name."""

from dataclasses import dataclass
from fractions import Fraction


@dataclass(frozen=True, slots=True)
class HouseRules:
    """Lines between verdicts. Fractions, so that a value on the line lies inside."""

    aperture: Fraction = Fraction(5, 100)
    """House tolerance on the aperture, of the asked; at least the sieve edition's average tolerance Y."""
    wire: Fraction = Fraction(10, 100)
    open_area_points: Fraction = Fraction(3)
    section_least: Fraction = Fraction(85, 100)
    section_bounds: tuple[Fraction, Fraction] = (Fraction(1, 2), Fraction(2))
    """Outside these the cloth is another cloth."""
    much_lighter: Fraction = Fraction(70, 100)
    harmless: Fraction = Fraction(15, 100)
    """How far to the harmless side a near cloth may lie, or 2T where that is wider."""
    same_aperture: Fraction = Fraction(5, 1000)
    same_wire: Fraction = Fraction(1, 100)
    flow: tuple[Fraction, Fraction] = (Fraction(95, 100), Fraction(90, 100))
    """Offered to asked open area: interchangeable from the first, near-risk from the second."""
    strength: tuple[Fraction, Fraction] = (Fraction(95, 100), Fraction(85, 100))
    """Offered to asked section d²/p: interchangeable from the first, near-risk from the second."""
    filter_make: Fraction = Fraction(2, 100)
    """Counts and wires of filter cloth."""
    filter_rating: Fraction = Fraction(20, 100)


HOUSE_RULES = HouseRules()
