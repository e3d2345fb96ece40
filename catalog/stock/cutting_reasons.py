"""Why a piece doesn't come out of a lot, in a sentence with the millimetres that are short."""

from math import hypot

from catalog.stock.cutting_pieces import Piece, mm_text
from catalog.stock.lots import Lot


def why_not(lot: Lot, piece: Piece) -> str | None:
    """The reason; None where one such piece comes out of the free part of *lot*."""
    if lot.form == "disc":
        return _why_not_of_disc(lot, piece)
    ways = [(piece.across_mm, piece.along_mm)]
    if not piece.warp_bound:
        ways.append((piece.along_mm, piece.across_mm))
    width, length = lot.usable_width_mm, lot.free_length_mm
    if any(across <= width and along <= length for across, along in ways):
        return None
    reason = _narrow(lot, piece, min(across for across, _ in ways))
    if reason is None:
        along = min(along for across, along in ways if across <= width)
        held = f", {lot.reserved_mm} mm of it reserved" if lot.reserved_mm else ""
        reason = f"{lot.id} is {lot.length_mm} mm long{held}, {mm_text(along - length)} mm short"
    if piece.warp_bound and piece.along_mm <= width and piece.across_mm <= length:
        reason += "; turned it would come out, but its warp is to lie along the length"
    return f"No {piece.size_text}: {reason}."


def _narrow(lot: Lot, piece: Piece, across: float) -> str | None:
    if across > lot.width_mm:
        before = f" before its selvedges of {lot.selvedge_mm} mm each side are taken off" if lot.selvedge_mm else ""
        return f"{lot.id} is {lot.width_mm} mm wide, {mm_text(across - lot.width_mm)} mm short{before}"
    if across > lot.usable_width_mm:
        short = mm_text(across - lot.usable_width_mm)
        return f"{lot.id} is {lot.usable_width_mm} mm wide between its selvedges, {short} mm short"
    return None


def _why_not_of_disc(lot: Lot, piece: Piece) -> str | None:
    inside = min(lot.usable_width_mm, lot.free_length_mm)
    across = piece.across_mm if piece.is_disc else hypot(piece.across_mm, piece.along_mm)
    short = across - inside
    if short <= 0:
        return None
    what = "" if piece.is_disc else " over the piece's diagonal"
    return f"No {piece.size_text}: {lot.id} is a disc of {inside} mm usable, {mm_text(round(short, 1))} mm short{what}."
