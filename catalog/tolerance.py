"""Permissible deviations of the aperture: which rule, which edition, what it allows at a nominal."""

from dataclasses import dataclass
from fractions import Fraction

from catalog.physics.sieving import average_tolerance_um

E11 = "E11-17"
ISO_3310_1 = "ISO 3310-1:2016"
HOUSE_RULE = "house rule: the wider of Y of ASTM E11-17 and {percent} % of the aperture"


@dataclass(frozen=True, slots=True)
class Allowance:
    """What one aperture may be off by, mm, and who says so."""

    mm: Fraction
    source: str


def by_edition(aperture_mm: Fraction, edition: str) -> Allowance:
    """Average tolerance Y of a test-sieve *edition* at a nominal aperture.

    Shape: scalar. Source: the edition's formula (see physics.sieving). Valid 0.02–125 mm.
    """
    y_um = average_tolerance_um(float(aperture_mm * 1000), edition)
    return Allowance(Fraction(round(y_um * 1e6), 10**9), f"Y of {edition}, test-sieve cloth")


def by_percent(aperture_mm: Fraction, percent: Fraction) -> Allowance:
    """A tolerance that somebody stated, in percent of the aperture."""
    return Allowance(aperture_mm * percent / 100, f"stated: ±{float(percent):g} %")


def by_house_rule(aperture_mm: Fraction, share: Fraction) -> Allowance:
    """The wider of Y of E11-17 and the house's *share* of the aperture; no standard says this."""
    source = HOUSE_RULE.format(percent=f"{float(share * 100):g}")
    if not Fraction(20, 1000) <= aperture_mm <= 125:
        return Allowance(aperture_mm * share, source)
    return Allowance(max(by_edition(aperture_mm, E11).mm, aperture_mm * share), source)
