"""What a cloth is made of: weave, wires both ways, alloy; and the figures that follow from it."""

from dataclasses import dataclass
from enum import StrEnum
from fractions import Fraction

from catalog.units import MM_PER_INCH


class Weave(StrEnum):
    """The weaves that are computed. The values are the codes of the JSON contract."""

    PLAIN = "plain"
    TWILLED = "twilled"
    PLAIN_DUTCH = "plain-dutch"
    REVERSE_PLAIN_DUTCH = "reverse-plain-dutch"
    TWILLED_DUTCH = "twilled-dutch"

    @property
    def is_filter(self) -> bool:
        """True for filter cloth, whose pores are no straight openings."""
        return self not in (Weave.PLAIN, Weave.TWILLED)

    @property
    def words(self) -> str:
        """The trade's name."""
        return self.value.replace("-", " ").replace("dutch", "Dutch")


@dataclass(frozen=True, slots=True)
class Wires:
    """The wires of one direction: how far apart, how thick."""

    pitch_mm: Fraction
    """Centre to centre, mm."""
    wire_mm: Fraction
    """Diameter, mm."""

    @property
    def aperture_mm(self) -> Fraction:
        """Clear distance between neighbouring wires, mm: p − d (a definition). Negative in filter cloth."""
        return self.pitch_mm - self.wire_mm

    @property
    def count_per_in(self) -> Fraction:
        """Wires per inch: 25.4/p."""
        return MM_PER_INCH / self.pitch_mm


@dataclass(frozen=True, slots=True)
class Construction:
    """A cloth by its make. Warp runs along the roll; the warp aperture is measured across the roll."""

    weave: Weave
    warp: Wires
    weft: Wires
    alloy: str | None = None
    """Id in the alloy table, or as written where the table doesn't know it."""
    crimp: str | None = None
    finish: str | None = None

    @property
    def is_filter(self) -> bool:
        """True for filter cloth."""
        return self.weave.is_filter

    @property
    def is_square(self) -> bool:
        """True where both directions are alike."""
        return not self.is_filter and self.warp == self.weft

    @property
    def kind(self) -> str:
        """'square', 'rectangular' or 'filter cloth'."""
        if self.is_filter:
            return "filter cloth"
        return "square" if self.warp.aperture_mm == self.weft.aperture_mm else "rectangular"

    def turned(self) -> "Construction":
        """The same cloth with warp and weft exchanged."""
        return Construction(self.weave, self.weft, self.warp, self.alloy, self.crimp, self.finish)
