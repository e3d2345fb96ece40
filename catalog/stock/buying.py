"""How much has to be bought, so that a cut list comes out of it."""

from collections.abc import Sequence
from dataclasses import dataclass, replace
from decimal import Decimal
from typing import Protocol

from catalog.stock.cutting import Cutting, cut_lot
from catalog.stock.cutting_pieces import Piece, mm_text
from catalog.stock.cutting_reasons import why_not
from catalog.stock.cutting_search import THOROUGH
from catalog.stock.layout import LotCut
from catalog.stock.lots import Lot

STEP_MM = 10
"""Lengths are bought in whole centimetres."""
MOST_ROLLS = 50


class Size(Protocol):
    """What is known of a roll size."""

    @property
    def width_mm(self) -> int:
        """Overall, mm."""

    @property
    def length_mm(self) -> int:
        """Whole roll, or the longest in one piece, mm."""

    @property
    def is_cut_to_length(self) -> bool:
        """Whether less than the whole can be bought."""

    @property
    def selvedge_mm(self) -> int:
        """Lost on each side, mm."""

    @property
    def text(self) -> str:
        """The size in words."""


@dataclass(frozen=True, slots=True)
class Purchase:
    """Lengths of one width to be bought, with the layouts that need them."""

    size: Size
    lengths_mm: tuple[int, ...]
    cuts: tuple[LotCut, ...]

    @property
    def area_m2(self) -> Decimal:
        """Over the whole width, selvedges paid with it, m²."""
        return Decimal(self.size.width_mm) * sum(self.lengths_mm) / 1_000_000

    @property
    def text(self) -> str:
        """'2 rolls 1219 mm × 30.48 m', '1.43 m of 1219 mm width'."""
        if self.size.is_cut_to_length:
            parts = " + ".join(mm_text(length / 1000) for length in self.lengths_mm)
            return f"{parts} m of {self.size.width_mm} mm width"
        return f"{len(self.lengths_mm)} roll{'s' if len(self.lengths_mm) > 1 else ''} {self.size.text}"


def least_purchase(sizes: Sequence[Size], pieces: Sequence[Piece], how: Cutting) -> tuple[Purchase | None, str]:
    """The roll size of which the least area has to be bought; or None and why."""
    made = [_purchase(size, pieces, how) for size in sizes]
    found = [purchase for purchase in made if isinstance(purchase, Purchase)]
    if found:
        return min(found, key=lambda purchase: purchase.area_m2), ""
    return None, " ".join(reason for reason in made if isinstance(reason, str))


def _purchase(size: Size, pieces: Sequence[Piece], how: Cutting) -> Purchase | str:
    name = f"a roll {size.text}"
    roll = Lot(name, "", "roll", size.width_mm, size.selvedge_mm, size.length_mm, 0, "")
    reasons = [reason for reason in (why_not(roll, piece) for piece in pieces) if reason]
    if reasons:
        return " ".join(reasons)
    wanted = tuple(piece.quantity for piece in pieces)
    cuts: list[LotCut] = []
    while any(wanted) and len(cuts) < MOST_ROLLS:
        cut = cut_lot(roll, pieces, replace(how, effort=replace(how.effort or THOROUGH, by_area=True)), wanted)
        wanted = cut.missing
        cuts.append(cut)
    if any(wanted):
        return f"No: more than {MOST_ROLLS} of {name} would be needed."
    return Purchase(size, tuple(_length(cut, size) for cut in cuts), tuple(cuts))


def _length(cut: LotCut, size: Size) -> int:
    """What is bought of one roll: all of it, or what the cut takes, rounded up."""
    if not size.is_cut_to_length:
        return size.length_mm
    end = max(placement.y_mm + placement.length_mm for placement in cut.placements)
    return min(size.length_mm, -int(-end // STEP_MM) * STEP_MM)
