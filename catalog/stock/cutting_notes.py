"""What a layout assumes, and what to look at before the first cut."""

from collections.abc import Sequence

from catalog.stock.cutting_pieces import Piece, mm_text
from catalog.stock.layout import Placement
from catalog.stock.lots import Lot


def notes(
    lot: Lot, pieces: Sequence[Piece], placements: Sequence[Placement], least_remnant_mm: float, kerf_mm: float
) -> tuple[str, ...]:
    """One sentence each."""
    said = [
        f"Usable between the selvedges: {lot.usable_width_mm} mm of {lot.width_mm} mm "
        f"({lot.selvedge_mm} mm off each side); kerf {mm_text(kerf_mm)} mm between neighbours.",
        "Every cut runs from edge to edge of the part it divides.",
    ]
    if any(piece.is_disc for piece in pieces):
        said.append(_discs(placements))
    said.append(f"Left-overs of at least {mm_text(least_remnant_mm)} mm both ways are kept, smaller ones are waste.")
    if any(not piece.warp_bound and not piece.is_disc for piece in pieces):
        said.append("Pieces may be turned, unless their warp is asked along the length.")
    return (*said, *_of_lot(lot))


def _discs(placements: Sequence[Placement]) -> str:
    if any(placement.is_offset for placement in placements):
        return "Discs in offset rows are cut one by one out of their block: no straight cut parts them."
    return "Each disc is cut out of its own square."


def _of_lot(lot: Lot) -> list[str]:
    said = []
    if lot.reserved_mm:
        said.append(f"{lot.reserved_mm} mm of {lot.id} are reserved and taken to lie at its far end.")
    if lot.seams:
        seams = "a seam" if lot.seams == 1 else f"{lot.seams} seams"
        said.append(f"{lot.id} has {seams} whose place isn't on record: see that no piece lies over one.")
    if lot.form == "disc":
        said.append(f"{lot.id} is a disc: pieces lie in a rectangle inside it, what lies outside that is waste.")
    return said
