"""What was measured, with its uncertainty: values with ± (k = 2), counts with a rectangular limit, and their fit.

A misfit is a difference in units of the ± that is shown; the odds come from the density of the error.
"""

from dataclasses import dataclass, field
from fractions import Fraction
from math import erfc, exp, hypot, inf, isinf, log, pi, sqrt

K = 2
"""Coverage factor of every ± that isn't called a limit."""
DECISIVE = 4.5
"""A drop of the log density that rules out: three standard uncertainties, exp(−3²/2)."""
DOUBTFUL = 2.0
"""A drop that is worth naming: one ± at k = 2, exp(−2²/2)."""
EDGE = 1e-9


def expanded_of_limit(limit: float) -> float:
    """Expanded uncertainty (k = 2) of an error that lies anywhere within ±limit with equal probability.

    U = 2·a/√3 = 1.155·a, in the unit of *limit*. Source: JCGM 100:2008 (GUM), 4.3.7, variance a²/3.
    """
    return K * limit / sqrt(3)


def combined(*expanded: float) -> float:
    """Expanded uncertainty of a sum or difference of independent figures, in their unit.

    Source: JCGM 100:2008 (GUM), 5.1.2, with every sensitivity ±1 and one coverage factor.
    """
    return hypot(*expanded)


def log_density(off: float, limit: float, sigma: float) -> float:
    """Log of the density at *off* of an error rectangular within ±*limit* plus a normal one of *sigma*.

    [Φ((x + a)/σ) − Φ((x − a)/σ)]/(2a); −inf outside the limit where σ is 0. All in one unit.
    Source: convolution of the two densities, derived. Raises nothing; one of the two must be above 0.
    """
    off = abs(off)
    if limit <= 1e-6 * sigma:
        return -0.5 * (off / sigma) ** 2 - log(sigma * sqrt(2 * pi))
    if sigma == 0:
        return -log(2 * limit) if off <= limit * (1 + EDGE) else -inf
    near, far = (off - limit) / sigma, (off + limit) / sigma
    share = (erfc(near / sqrt(2)) - erfc(far / sqrt(2))) / 2
    if share > 0:
        return log(share / (2 * limit))
    return -0.5 * near * near - log(near * sqrt(2 * pi)) - log(2 * limit)


@dataclass(frozen=True, slots=True)
class Fit:
    """How one figure of a cloth fits what was measured."""

    misfit: float | None
    """Difference over the ± shown; None where the figure is no number or isn't known."""
    log_likelihood: float
    drop: float = 0.0
    """How far that lies below the best there could be; inf outside a hard limit."""

    @property
    def is_out(self) -> bool:
        """True where this figure alone rules the cloth out."""
        return self.drop > DECISIVE

    @property
    def is_within(self) -> bool:
        """True where it lies inside the ± shown, the edge included, and isn't ruled out."""
        return not self.is_out and (self.misfit or 0.0) <= 1 + EDGE


@dataclass(frozen=True, slots=True)
class Scalar:
    """A measured length (mm) or mass per area (kg/m²)."""

    value: Fraction
    plus_minus: float
    """Expanded uncertainty, k = 2, in the unit of the value."""
    written: str = ""
    instrument: str = ""
    """'micrometer', 'optical', 'calliper', 'steel rule', 'balance' or '' where ± was written without one."""
    is_assumed: bool = False
    """True where the ± is the house's default for the instrument."""

    def unit_of_misfit(self, spread: float = 0.0) -> float:
        """The ± with a cloth's own *spread* (k = 2) beside it."""
        return combined(self.plus_minus, spread)

    def fit(self, least: float, most: float | None = None, spread: float = 0.0) -> Fit:
        """How a true value anywhere from *least* to *most* fits; *spread* is the cloth's own, k = 2."""
        top = least if most is None else most
        value, unit = float(self.value), self.unit_of_misfit(spread)
        outside = max(least - value, value - top, 0.0)
        middle, half, sigma = (least + top) / 2, (top - least) / 2, unit / K
        found = log_density(value - middle, half, sigma)
        return Fit(outside / unit, found, max(0.0, log_density(0.0, half, sigma) - found))

    def unknown(self) -> Fit:
        """The fit of a cloth whose figure isn't known: as likely as one that lies one ± off, ruled out by nothing."""
        return Fit(None, log_density(self.plus_minus, 0.0, self.plus_minus / K), 0.0)


@dataclass(frozen=True, slots=True)
class Count:
    """Spaces counted over a length. From n spaces follow n + 1 wires."""

    spaces: Fraction
    length_mm: Fraction
    limit: Fraction = Fraction(1, 2)
    """Rectangular: the true number lies within ± this, in spaces."""
    length_plus_minus_mm: float = 0.0
    """Expanded uncertainty of the length, k = 2."""
    written: str = ""
    notes: tuple[str, ...] = ()

    figures: "CountFigures" = field(init=False, repr=False, compare=False)
    """The same as floats, worked out once: a catalogue is long."""

    def __post_init__(self) -> None:
        """Work out the floats."""
        object.__setattr__(self, "figures", CountFigures.of(self))

    @property
    def pitch_mm(self) -> Fraction:
        """Length over spaces."""
        return self.length_mm / self.spaces

    @property
    def pitch_limit_mm(self) -> float:
        """± of the pitch that is shown, mm: the limit p·a/n, with the length's ± where it has one."""
        return self.figures.pitch_limit_mm

    @property
    def pitch_expanded_mm(self) -> float:
        """Expanded uncertainty of the pitch, k = 2, mm: 1.155 times its limit, with the length's."""
        at = self.figures
        limit = expanded_of_limit(at.pitch_mm * at.limit / at.spaces)
        return combined(limit, at.pitch_mm * at.length_share)

    def fit(self, pitch_mm: float, spread_mm: float = 0.0) -> Fit:
        """How a true pitch fits. The likelihood is taken in spaces, which are what was counted."""
        at = self.figures
        misfit = abs(pitch_mm - at.pitch_mm) / combined(at.pitch_limit_mm, spread_mm)
        expected = at.length_mm / pitch_mm
        sigma = expected * combined(at.length_share, spread_mm / pitch_mm) / K
        found = log_density(expected - at.spaces, at.limit, sigma)
        return Fit(misfit, found, max(0.0, log_density(0.0, at.limit, sigma) - found))


@dataclass(frozen=True, slots=True)
class CountFigures:
    """A count as floats: spaces, mm, shares."""

    spaces: float
    limit: float
    length_mm: float
    length_share: float
    pitch_mm: float
    pitch_limit_mm: float

    @classmethod
    def of(cls, count: Count) -> "CountFigures":
        """Work them out."""
        spaces, length = float(count.spaces), float(count.length_mm)
        limit, share = float(count.limit), count.length_plus_minus_mm / length
        pitch = length / spaces
        return cls(spaces, limit, length, share, pitch, combined(pitch * limit / spaces, pitch * share))


def odds_of(log_likelihoods: list[float]) -> list[float]:
    """Normalise: shares of 1, all before alike; 0 throughout where nothing is possible."""
    best = max(log_likelihoods, default=-inf)
    if isinf(best):
        return [0.0] * len(log_likelihoods)
    weights = [exp(value - best) for value in log_likelihoods]
    total = sum(weights)
    return [weight / total for weight in weights]
