"""The rectangle of a lot in which pieces may lie, in whole micrometres."""

from collections.abc import Sequence
from dataclasses import dataclass, replace
from math import hypot

from catalog.stock.cutting_filling import Kind
from catalog.stock.cutting_pieces import UM_PER_MM, Piece, to_um
from catalog.stock.lots import Lot


@dataclass(frozen=True, slots=True)
class Room:
    """A rectangle in the lot, and the kinds that are laid out in it."""

    x: int
    y: int
    width: int
    length: int
    kinds: tuple[Kind, ...]


def kinds_of(pieces: Sequence[Piece], kerf: int, wanted: Sequence[int]) -> tuple[Kind, ...]:
    """*wanted* of each piece in micrometres, with one kerf added to each side; none for those not wanted."""
    numbered = enumerate(zip(pieces, wanted, strict=True))
    return tuple(_kind(index, piece, kerf, number) for index, (piece, number) in numbered if number)


def rooms(lot: Lot, kinds: Sequence[Kind], kerf: int) -> list[Room]:
    """The rectangles to try. A roll, remnant or panel has one; in a disc it may have several proportions."""
    kinds = tuple(kinds)
    width, length = lot.usable_width_mm * UM_PER_MM, lot.free_length_mm * UM_PER_MM
    if width <= 0 or length <= 0:
        return []
    if lot.form != "disc":
        return [Room(0, 0, width, length, kinds)]
    inside = min(width, length)
    sides = {(1, 1)} | {shape[:2] for kind in kinds for shape in kind.shapes}
    found = [_inscribed(inside, a, b, kinds) for a, b in sorted(sides)]
    return found + [_one_disc(inside, kind, kerf) for kind in kinds if kind.is_disc]


def _kind(index: int, piece: Piece, kerf: int, number: int) -> Kind:
    across, along = to_um(piece.across_mm) + kerf, to_um(piece.along_mm) + kerf
    is_square = across == along
    turned = () if piece.warp_bound or is_square else ((along, across, True),)
    return Kind(index, ((across, along, False), *turned), number, piece.is_disc)


def _inscribed(diameter: int, across: int, along: int, kinds: tuple[Kind, ...]) -> Room:
    """The rectangle of these proportions in a disc."""
    diagonal = hypot(across, along)
    width, length = int(diameter * across / diagonal), int(diameter * along / diagonal)
    return Room((diameter - width) // 2, (diameter - length) // 2, width, length, kinds)


def _one_disc(diameter: int, kind: Kind, kerf: int) -> Room:
    """A single disc out of the middle of a disc."""
    side = kind.shapes[0][0] - kerf if kind.shapes[0][0] - kerf <= diameter else 0
    start = (diameter - side) // 2
    return Room(start, start, side, side, (replace(kind, quantity=1),))
