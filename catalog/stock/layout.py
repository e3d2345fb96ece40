"""A lot with its pieces laid out: where each lies, what is left, what is lost, and what that weighs."""

from dataclasses import dataclass
from decimal import Decimal

from catalog.stock.cutting_pieces import Piece, mm_text
from catalog.stock.lots import Lot


@dataclass(frozen=True, slots=True)
class Placement:
    """One piece in place, mm: x from the inner edge of the left selvedge, y from the end where cutting begins."""

    piece: int
    """Which of the cut list, counted from 0."""
    x_mm: float
    y_mm: float
    width_mm: float
    length_mm: float
    is_turned: bool = False
    is_disc: bool = False
    block: int = 0
    """Which block of offset rows a disc lies in, counted from 1; 0 where straight cuts free the piece."""

    @property
    def is_offset(self) -> bool:
        """A disc in offset rows: no straight cut frees it."""
        return self.block > 0


@dataclass(frozen=True, slots=True)
class Rest:
    """A rectangle left over, mm; *is_full_width* where it still has both selvedges."""

    x_mm: float
    y_mm: float
    width_mm: float
    length_mm: float
    is_full_width: bool = False

    @property
    def area_m2(self) -> Decimal:
        """Area between the selvedges, m²."""
        return Decimal(str(self.width_mm)) * Decimal(str(self.length_mm)) / 1_000_000

    @property
    def text(self) -> str:
        """'1165 × 980 mm'."""
        return f"{mm_text(self.width_mm)} × {mm_text(self.length_mm)} mm"


@dataclass(frozen=True, slots=True)
class Masses:
    """What the parts of a cut weigh, kg."""

    pieces_kg: float
    waste_kg: float
    remnants_kg: float


@dataclass(frozen=True, slots=True)
class LotCut:
    """One lot cut: the answer, its figures and its sentences."""

    lot: Lot
    pieces: tuple[Piece, ...]
    kerf_mm: float
    width_mm: float
    """Of the cloth that is laid out: between the selvedges."""
    length_mm: float
    """Of the cloth that is laid out: what is free of the lot."""
    placements: tuple[Placement, ...]
    remnants: tuple[Rest, ...]
    """Worth keeping, the largest first."""
    scraps: tuple[Rest, ...]
    """Rectangles too small to keep."""
    taken_mm: float
    """Off the lot's length, the last cut with it."""
    steps: tuple[str, ...]
    """The straight cuts in words, in their order."""
    notes: tuple[str, ...]
    """What was assumed, and what to look at."""
    wanted: tuple[int, ...]
    """How many of each piece were to come out of this lot."""
    why_missing: tuple[str, ...] = ()
    """For each piece that doesn't come out at all, why."""

    @property
    def placed(self) -> tuple[int, ...]:
        """How many of each piece come out."""
        counts = [0] * len(self.pieces)
        for placement in self.placements:
            counts[placement.piece] += 1
        return tuple(counts)

    @property
    def missing(self) -> tuple[int, ...]:
        """How many of each piece don't come out."""
        return tuple(asked - count for asked, count in zip(self.wanted, self.placed, strict=True))

    @property
    def is_complete(self) -> bool:
        """Whether every piece comes out."""
        return not any(self.missing)

    @property
    def pieces_m2(self) -> Decimal:
        """Area of the pieces that come out, m²."""
        return sum((p.area_m2 * n for p, n in zip(self.pieces, self.placed, strict=True)), Decimal(0))

    @property
    def used_m2(self) -> Decimal:
        """Usable area that the cut takes: all of it without the remnants, m²."""
        if not self.placements:
            return Decimal(0)
        return self._whole_m2() - sum((rest.area_m2 for rest in self.remnants), Decimal(0))

    def _whole_m2(self) -> Decimal:
        if self.lot.form == "disc":
            return Piece(diameter_mm=min(self.lot.usable_width_mm, self.lot.free_length_mm)).area_m2
        return Rest(0, 0, self.width_mm, self.length_mm).area_m2

    @property
    def waste_m2(self) -> Decimal:
        """Kerfs, scraps and what lies round discs, m²; selvedges aren't counted."""
        return self.used_m2 - self.pieces_m2

    @property
    def waste_pct(self) -> float:
        """Waste as a share of what the cut takes, %."""
        return float(100 * self.waste_m2 / self.used_m2) if self.used_m2 else 0.0

    def masses(self, mass_kg_m2: float) -> Masses:
        """Masses at *mass_kg_m2*, kg."""
        left = float(sum((rest.area_m2 for rest in self.remnants), Decimal(0)))
        return Masses(float(self.pieces_m2) * mass_kg_m2, float(self.waste_m2) * mass_kg_m2, left * mass_kg_m2)


def letter(index: int) -> str:
    """The mark of a piece on drawings and in words: A to Z, then AA, AB …"""
    more, last = divmod(index, 26)
    return (letter(more - 1) if more else "") + chr(ord("A") + last)
