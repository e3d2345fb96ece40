"""What a callout said: readings with each value's spelling and place, problems, one question.

A reading is completed by arithmetic only, and names what was completed. It holds no defaults.
"""

from collections.abc import Mapping
from dataclasses import dataclass, field
from enum import StrEnum
from fractions import Fraction

from catalog.cloth import Rating
from catalog.construction import Weave
from catalog.units import MM_PER_INCH, Length


class Likelihood(StrEnum):
    """How a competent person would take a reading."""

    USUAL = "usual"
    POSSIBLE = "possible"
    RULED_OUT = "ruled-out"


class Status(StrEnum):
    """What became of a callout."""

    CLEAR = "clear"
    NOTED = "noted"
    ASK = "ask"
    INCOMPLETE = "incomplete"
    LIMITS = "limits"
    OUT_OF_SCOPE = "out-of-scope"


@dataclass(frozen=True, slots=True)
class Side:
    """What is known of one direction. Each may be missing."""

    pitch: Length | None = None
    wire: Length | None = None
    aperture: Length | None = None
    by_count: bool = False
    """True where the pitch was written as a count, which is exact and is what was asked."""

    @property
    def count_per_in(self) -> Fraction | None:
        """Wires per inch, where the pitch is known and is one."""
        return MM_PER_INCH / self.pitch.mm if self.pitch and self.pitch.mm > 0 else None


@dataclass(frozen=True, slots=True)
class Form:
    """Roll, piece, disc: the size and number asked for. mm."""

    kind: str | None = None
    width_mm: float | None = None
    length_mm: float | None = None
    diameter_mm: float | None = None
    quantity: int | None = None
    area_m2: float | None = None


Limits = Mapping[str, tuple[float | None, float | None]]
"""Key as in the JSON contract → (least, most); inclusive."""


@dataclass(frozen=True, slots=True)
class Reading:
    """One way to take the text."""

    label: str
    likelihood: Likelihood = Likelihood.USUAL
    weave: Weave | None = None
    warp: Side = Side()
    weft: Side = Side()
    alloy: str | None = None
    """Id in the alloy table where known, else as written; None where open."""
    material: str | None = None
    """The family where the text names one and leaves the grade open: 'stainless', 'brass', 'bronze', …"""
    finish: str | None = None
    crimp: str | None = None
    grade: str | None = None
    standard: str | None = None
    certificate: str | None = None
    """'2.1', '2.2', '3.1' or '3.2'."""
    rating: Rating | None = None
    open_area_pct: float | None = None
    """As stated in the text, or following from the construction (then named in derived)."""
    mass_kg_m2: float | None = None
    limits: Limits = field(default_factory=dict)
    form: Form | None = None
    derived: tuple[str, ...] = ()
    """What arithmetic completed: 'warp.aperture_mm', …"""
    notes: tuple[str, ...] = ()

    @property
    def is_filter(self) -> bool:
        """True where the text names a filter weave."""
        return self.weave is not None and self.weave.is_filter


@dataclass(frozen=True, slots=True)
class Problem:
    """What is wrong with the text; codes as in the JSON contract; the column counts from 1."""

    code: str
    message: str
    column: int | None = None


@dataclass(frozen=True, slots=True)
class Word:
    """A stretch of the text and the part it plays, for the screen: [start, end)."""

    start: int
    end: int
    role: str
    """'count', 'wire', 'aperture', 'pitch', 'alloy', 'weave', 'form', 'limit', …, or 'unknown'."""


@dataclass(frozen=True, slots=True)
class Understanding:
    """Everything that a text was understood to say."""

    text: str
    status: Status
    readings: tuple[Reading, ...] = ()
    question: str | None = None
    missing: tuple[str, ...] = ()
    problems: tuple[Problem, ...] = ()
    words: tuple[Word, ...] = ()

    @property
    def surviving(self) -> tuple[Reading, ...]:
        """The readings that haven't been ruled out, the usual ones first."""
        alive = [r for r in self.readings if r.likelihood is not Likelihood.RULED_OUT]
        return tuple(sorted(alive, key=lambda r: r.likelihood is not Likelihood.USUAL))
