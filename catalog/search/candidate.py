"""A cloth set against what is asked: deviations, findings, one verdict, a penalty that shows its parts."""

from collections.abc import Mapping
from dataclasses import dataclass, field
from enum import StrEnum

from catalog.cloth import Cloth
from catalog.stock.lots import Lot


class Verdict(StrEnum):
    """The six verdicts, best first."""

    SAME = "same"
    INTERCHANGEABLE = "interchangeable"
    NEAR_SAFE = "near-safe"
    NEAR_RISK = "near-risk"
    CANNOT_SAY = "cannot-say"
    NOT_EQUIVALENT = "not-equivalent"

    @property
    def rank(self) -> int:
        """0 for the best."""
        return list(Verdict).index(self)


@dataclass(frozen=True, slots=True)
class Deviation:
    """One property asked and found. Limits are inclusive."""

    name: str
    """'warp.aperture', 'weft.wire', 'open_area', 'mass', 'warp.section', 'warp.count', …"""
    asked: float | None
    found: float | None
    difference: float | None
    """In *unit*: percent of the asked, or points for the open area."""
    unit: str
    limit: float | None = None
    inside: bool | None = None
    """None where it isn't judged."""


@dataclass(frozen=True, slots=True)
class Finding:
    """A gate or rule with its outcome in plain words."""

    rule: str
    ok: bool | None
    """None: can't be decided; the message says what to ask."""
    message: str
    source: str = ""


@dataclass(frozen=True, slots=True)
class Penalty:
    """How far a candidate is off, in parts that add up."""

    aperture: float = 0.0
    wire: float = 0.0
    open_area: float = 0.0

    @property
    def total(self) -> float:
        """The sum of the parts."""
        return self.aperture + self.wire + self.open_area


@dataclass(frozen=True, slots=True)
class Fit:
    """Whether a lot serves the need: width, cut, certificate."""

    ok: bool | None
    """None where no need was stated."""
    why: str


@dataclass(frozen=True, slots=True)
class StockLine:
    """A lot and whether it fits the need."""

    lot: Lot
    fit: Fit


@dataclass(frozen=True, slots=True)
class Candidate:
    """A cloth, judged."""

    cloth: Cloth
    distance: float | None
    verdict: Verdict
    by_purpose: Mapping[str, Verdict]
    harm_side: bool = False
    turned: bool = False
    deviations: tuple[Deviation, ...] = ()
    findings: tuple[Finding, ...] = ()
    penalty: Penalty = Penalty()
    stock: tuple[StockLine, ...] = field(default=())
    reason: str = ""
    """The one sentence for a list."""

    def deviation(self, name: str) -> Deviation | None:
        """The deviation called *name*, or None."""
        return next((d for d in self.deviations if d.name == name), None)
