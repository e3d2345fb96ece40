"""What is asked for: a reading, a purpose, a tolerance, a need; every field with its origin."""

from collections.abc import Mapping
from dataclasses import dataclass, field
from enum import StrEnum
from typing import TYPE_CHECKING

from catalog.callout.reading import Form, Limits, Reading, Side
from catalog.cloth import Rating
from catalog.construction import Weave

if TYPE_CHECKING:
    from catalog.physics.fluid_properties import Fluid


class Purpose(StrEnum):
    """What the cloth is for, which decides which deviation hurts."""

    RETAIN = "retain"
    PASS = "pass"
    SIZE = "size"
    FLOW = "flow"
    STRENGTH = "strength"
    GUARD = "guard"


@dataclass(frozen=True, slots=True)
class Need:
    """How much is wanted: so many pieces of a width by a length, or discs of a diameter. mm."""

    pieces: int = 1
    width_mm: float | None = None
    length_mm: float | None = None
    diameter_mm: float | None = None
    written: str = ""


@dataclass(frozen=True, slots=True)
class Tolerance:
    """What the aperture may be off by, mm in each direction, and the rule it comes from."""

    warp_mm: float
    weft_mm: float
    source: str


@dataclass(frozen=True, slots=True)
class Duty:
    """A fluid at a face velocity."""

    fluid: "Fluid"
    velocity_m_s: float
    assumed: bool = False

    @property
    def words(self) -> str:
        """'air at 20 °C, 1 m/s (assumed)'."""
        return f"{self.fluid.name}, {self.velocity_m_s:g} m/s" + (" (assumed)" if self.assumed else "")


@dataclass(frozen=True, slots=True)
class Target:
    """One reading with purpose, tolerance and need. Nothing in it is a quiet guess: see *origin*."""

    reading: Reading
    purposes: tuple[Purpose, ...] = ()
    """Empty: none was named, so retain and pass are judged side by side."""
    tolerance: Tolerance | None = None
    """None where no aperture was asked for."""
    alloy_rule: str = "same"
    """'same' (the alloy ladder decides), 'any', or the name of another alloy to ask for."""
    alloy_is_open: bool = False
    """True where the text contradicts itself on the metal: nobody can say whether an alloy will do."""
    weave: Weave | None = None
    limits: Limits = field(default_factory=dict)
    need: Need | None = None
    certificate: str | None = None
    particle_is_sphere: bool | None = None
    """None: no particle shape was stated, so in rectangular cloth the worse direction counts."""
    oversize_mm: float | None = None
    """Largest single oversize of an opening that the user vouches for; guards are judged with it."""
    duty: Duty | None = None
    """Fluid and face velocity that were stated; None: usual ones are assumed where flow is the purpose."""
    origin: Mapping[str, str] = field(default_factory=dict)
    """Field → 'stated', 'derived' or 'assumed'."""

    @property
    def warp(self) -> Side:
        """What is asked of the warp direction."""
        return self.reading.warp

    @property
    def weft(self) -> Side:
        """What is asked of the weft direction."""
        return self.reading.weft

    @property
    def rating(self) -> Rating | None:
        """The filter rating asked for."""
        return self.reading.rating

    @property
    def form(self) -> Form | None:
        """The size that the text states."""
        return self.reading.form
