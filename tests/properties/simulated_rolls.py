"""Rolls of known make measured with known errors, the same each time: for checking odds against frequencies."""

import random
from collections.abc import Sequence
from dataclasses import dataclass
from fractions import Fraction

from catalog.cloth import Cloth
from catalog.reference.rows import rows_of
from catalog.search.evidence import Evidence, attracts, mass_range_kg_m2, thickness_range_mm
from catalog.search.identify import identify
from catalog.search.measured import Count, Scalar
from catalog.storage.seed_rows import cloth_of, read_all

LENGTHS_MM = (10.0, 20.0, 25.4, 50.0)
LEAST_SPACES = 3


@dataclass(frozen=True)
class Calibration:
    """How often the true cloth was in the 95 % set, and how large that was on average."""

    rolls: int
    inside: int
    mean_set: float

    @property
    def share(self) -> float:
        return self.inside / self.rolls


def seed_cloths() -> list[Cloth]:
    """The catalogue that comes with the program."""
    return [cloth for cloth, _ in read_all("cloths", rows_of("cloths"), cloth_of)]


def measure(cloth: Cloth, dice: random.Random, worse: float = 1.0) -> Evidence:
    """Count and measure one direction, and some of the rest, with errors as stated.

    A count is the nearest whole number: its error is rectangular within half a space. Others are normal with
    half their ± (k = 2); crimp and density of the true roll vary as far as the product says that they may.
    *worse* times larger errors than stated show whether a check would notice.
    """
    made = cloth.construction.turned() if dice.random() < 0.5 else cloth.construction
    masses, attracted = mass_range_kg_m2(cloth), attracts(made)
    direct = dice.random() < 0.3 and not made.is_filter
    felt = dice.random() < 0.5 if attracted is None else attracted is (dice.random() < 0.98)
    return Evidence(
        count=_count(float(made.warp.pitch_mm), dice),
        wire=_scalar(float(made.warp.wire_mm), 0.005, dice, worse) if dice.random() < 0.8 else None,
        count_weft=_count(float(made.weft.pitch_mm), dice) if dice.random() < 0.3 else None,
        aperture=_scalar(float(made.warp.aperture_mm), 0.002, dice, worse) if direct else None,
        thickness=_scalar(dice.uniform(*thickness_range_mm(cloth)), 0.005, dice) if dice.random() < 0.3 else None,
        mass=_mass(masses, dice) if masses and dice.random() < 0.3 else None,
        magnetic=felt if dice.random() < 0.3 else None,
    )


def _count(pitch_mm: float, dice: random.Random) -> Count:
    length = max(dice.choice(LENGTHS_MM), LEAST_SPACES * pitch_mm)
    return Count(Fraction(round(length / pitch_mm)), Fraction(length))


def _scalar(true: float, plus_minus: float, dice: random.Random, worse: float = 1.0) -> Scalar:
    u = min(plus_minus, true / 10)
    return Scalar(Fraction(max(dice.gauss(true, worse * u / 2), true / 100)), u)


def _mass(masses: tuple[float, float], dice: random.Random) -> Scalar:
    true = dice.uniform(*masses) * dice.gauss(1.0, 0.025)
    return Scalar(Fraction(dice.gauss(true, true * 0.005)), true * 0.01)


def calibrate(cloths: Sequence[Cloth], rolls: int, seed: int, worse: float = 1.0) -> Calibration:
    """Measure *rolls* cloths taken at random and see whether the 95 % set holds the true one."""
    dice = random.Random(seed)
    inside, sizes = 0, 0
    for _ in range(rolls):
        true = dice.choice(cloths)
        survivors = identify(cloths, measure(true, dice, worse), limit=1).survivors
        inside += any(one.cloth.id == true.id for one in survivors)
        sizes += len(survivors)
    return Calibration(rolls, inside, sizes / rolls)
