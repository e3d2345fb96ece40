"""A cut lot in a few sentences: what comes out, what it takes, what is left and lost."""

from dataclasses import dataclass, replace

from catalog.stock.cutting import Cutting, cut_lot
from catalog.stock.cutting_pieces import Piece, mm_text
from catalog.stock.fitting import straight_rows
from catalog.stock.layout import LotCut
from catalog.stock.lots import Lot


@dataclass(frozen=True, slots=True)
class Capacity:
    """The most of one piece that comes out of a lot."""

    across: int
    """Side by side in straight rows, the way that gives more."""
    rows: int
    most: int
    """The best layout found."""
    is_offset: bool
    """That layout has discs in offset rows."""

    @property
    def text(self) -> str:
        """'at most 18 in straight rows (3 across × 6 rows), 21 with rows offset'."""
        straight = self.across * self.rows
        said = f"at most {straight} in straight rows ({self.across} across × {self.rows} rows)"
        if self.most > straight:
            said += f", {self.most} with rows offset" if self.is_offset else f", {self.most} with pieces both ways"
        return said


def capacity(lot: Lot, piece: Piece, how: Cutting | None = None) -> Capacity:
    """How many of *piece* come out of *lot*, its quantity aside."""
    how = how or Cutting()
    ways = [straight_rows(lot, piece.across_mm, piece.along_mm, how.kerf_mm)]
    if not piece.warp_bound:
        ways.append(straight_rows(lot, piece.along_mm, piece.across_mm, how.kerf_mm))
    across, rows = max(ways, key=lambda way: way[0] * way[1])
    ceiling = int(lot.usable_width_mm * lot.free_length_mm / 1e6 / float(piece.area_m2)) + 1
    cut = cut_lot(lot, [replace(piece, quantity=ceiling)], how)
    return Capacity(across, rows, len(cut.placements), any(p.is_offset for p in cut.placements))


def summary(cut: LotCut, mass_kg_m2: float | None = None) -> tuple[str, ...]:
    """The answer first; then what is left, what is lost, and, given *mass_kg_m2*, what it weighs."""
    said = [f"{cut.lot.id}: {_answer(cut)}", *cut.why_missing]
    if cut.placements:
        said += [_left(cut), f"Waste {cut.waste_m2:.3f} m², {cut.waste_pct:.1f} % of what the cut takes."]
    if cut.placements and mass_kg_m2 is not None:
        masses = cut.masses(mass_kg_m2)
        said.append(
            f"At {mass_kg_m2:.3g} kg/m²: pieces {masses.pieces_kg:.2f} kg, waste {masses.waste_kg:.2f} kg, "
            f"remnants {masses.remnants_kg:.2f} kg."
        )
    return tuple(said)


def _answer(cut: LotCut) -> str:
    if cut.is_complete:
        return f"yes, {'; '.join(piece.text for piece in cut.pieces)}."
    if not cut.placements:
        return "no, nothing of the cut list comes out."
    pairs = zip(cut.pieces, cut.placed, strict=True)
    return f"not all: {'; '.join(f'{count} of {piece.text}' for piece, count in pairs)}."


def _left(cut: LotCut) -> str:
    left = ", ".join(rest.text for rest in cut.remnants) or "nothing worth keeping"
    return f"They take {mm_text(cut.taken_mm)} mm of its length and leave {left}."
