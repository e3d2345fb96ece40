"""Whether pieces come out of one lot, how they lie, how they are cut, and what is left."""

from collections import Counter
from collections.abc import Sequence
from dataclasses import dataclass, replace

from catalog.errors import InputError
from catalog.stock import cutting_search
from catalog.stock.cutting_cells import Cell, Grid, Stagger, clip
from catalog.stock.cutting_filling import Attempt, Kind
from catalog.stock.cutting_notes import notes
from catalog.stock.cutting_pieces import UM_PER_MM, Piece, to_um
from catalog.stock.cutting_reasons import why_not
from catalog.stock.cutting_room import Room, kinds_of, rooms
from catalog.stock.cutting_search import THOROUGH, Effort
from catalog.stock.cutting_steps import steps
from catalog.stock.layout import LotCut, Placement, Rest
from catalog.stock.lots import Lot


@dataclass(frozen=True, slots=True)
class Cutting:
    """How cutting is done. mm."""

    kerf_mm: float = 0.0
    """Lost between neighbours."""
    least_remnant_mm: float = 200.0
    """Left-overs with both sides at least so long are kept."""
    effort: Effort | None = None
    """How long to look; None leaves it to what is asked: longer for one lot, less for each of many."""

    def within(self, effort: Effort) -> "Cutting":
        """The same, with *effort* where none is set."""
        return self if self.effort else replace(self, effort=effort)

    def __post_init__(self) -> None:
        if not 0 <= self.kerf_mm < 1000 or self.least_remnant_mm < 0:
            raise InputError(f"A kerf of {self.kerf_mm:g} mm can't be cut: state 0 or a few millimetres.")


def cut_lot(
    lot: Lot, pieces: Sequence[Piece], how: Cutting | None = None, wanted: Sequence[int] | None = None
) -> LotCut:
    """Lay *pieces* out in the free part of *lot*; *wanted* of each, where that isn't the whole quantity.

    Every cut runs from edge to edge of the part it divides; discs are cut out of their squares, or out of one block
    where only offset rows hold as many as are asked. Most pieces come first, then the least length of cloth. Raises
    InputError for an empty list.
    """
    how = (how or Cutting()).within(THOROUGH)
    effort = how.effort or THOROUGH
    if not pieces:
        raise InputError("The cut list is empty: state what is to be cut.")
    kerf = to_um(how.kerf_mm)
    asked = tuple(wanted) if wanted is not None else tuple(piece.quantity for piece in pieces)
    found = [(_searched(room, kerf, effort), room) for room in rooms(lot, kinds_of(pieces, kerf, asked), kerf)]
    if not found:
        return _result(lot, tuple(pieces), asked, how, Room(0, 0, 0, 0, ()), Cell(0, 0, 0, 0))
    attempt, room = max(found, key=lambda item: effort.worth(item[0]))
    root = _with_whole_rest(attempt, room, kerf, how)
    return _result(lot, tuple(pieces), asked, how, room, root)


def most_of(lot: Lot, kinds: Sequence[Kind], kerf: int, effort: Effort) -> Counter[int]:
    """How many of each kind the search lays out in *lot*, by index; nothing else is worked out."""
    found = [_searched(room, kerf, effort) for room in rooms(lot, kinds, kerf)]
    counts: Counter[int] = Counter()
    for leaf in max(found, key=effort.worth).root.leaves() if found else ():
        if leaf.content is not None:
            counts[leaf.content.kind] += leaf.content.count
    return counts


def _searched(room: Room, kerf: int, effort: Effort) -> Attempt:
    return cutting_search.search(room.width + kerf, room.length + kerf, room.kinds, effort)


def _with_whole_rest(attempt: Attempt, room: Room, kerf: int, how: Cutting) -> Cell:
    """The pieces cut off the cloth first, so that the rest keeps its full width, where that rest is worth keeping."""
    width, length = room.width + kerf, room.length + kerf
    kept = min(room.width, length - attempt.length - kerf)
    inside = clip(attempt.root, attempt.length)
    root = Cell(0, 0, width, length)
    if not attempt.count:
        return root
    if kept < to_um(how.least_remnant_mm) and attempt.root.length == length:
        return attempt.root
    root.cut_across(attempt.length)
    assert root.parts is not None
    root.parts = inside, root.parts[1]
    return root if root.parts[1].length else inside


def _result(
    lot: Lot, pieces: tuple[Piece, ...], wanted: tuple[int, ...], how: Cutting, room: Room, root: Cell
) -> LotCut:
    kerf = to_um(how.kerf_mm)
    placements = tuple(sorted(_placements(root, room, pieces, kerf), key=lambda p: (p.y_mm, p.x_mm)))
    left = sorted(_rests(lot, root, room, kerf), key=lambda rest: (-rest.area_m2, rest.y_mm, rest.x_mm))
    kept = [rest for rest in left if min(rest.width_mm, rest.length_mm) >= how.least_remnant_mm]
    whole = max((rest.length_mm for rest in kept if rest.is_full_width), default=0.0)
    has_pieces = bool(placements)
    missing = [why_not(lot, piece) for piece, number in zip(pieces, wanted, strict=True) if number]
    return LotCut(
        lot=lot,
        pieces=pieces,
        kerf_mm=how.kerf_mm,
        width_mm=room.width / UM_PER_MM,
        length_mm=room.length / UM_PER_MM,
        placements=placements,
        remnants=tuple(kept) if has_pieces else (),
        scraps=tuple(rest for rest in left if rest not in kept) if has_pieces else (),
        taken_mm=room.length / UM_PER_MM - whole if has_pieces else 0.0,
        steps=steps(root, pieces, kerf) if has_pieces else (),
        wanted=wanted,
        notes=notes(lot, pieces, placements, how.least_remnant_mm, how.kerf_mm),
        why_missing=tuple(reason for reason in missing if reason),
    )


def _placements(root: Cell, room: Room, pieces: Sequence[Piece], kerf: int) -> list[Placement]:
    found: list[Placement] = []
    block = 0
    for leaf in root.leaves():
        content = leaf.content
        if content is None:
            continue
        block += isinstance(content, Stagger)
        for x, y in _corners(content):
            place = (room.x + leaf.x + x, room.y + leaf.y + y)
            found.append(_placement(content, place, kerf, pieces[content.kind].is_disc, block))
    return found


def _placement(content: Grid | Stagger, place: tuple[int, int], kerf: int, is_disc: bool, block: int) -> Placement:
    sizes = (content.size, content.size) if isinstance(content, Stagger) else (content.width, content.length)
    return Placement(
        piece=content.kind,
        x_mm=place[0] / UM_PER_MM,
        y_mm=place[1] / UM_PER_MM,
        width_mm=(sizes[0] - kerf) / UM_PER_MM,
        length_mm=(sizes[1] - kerf) / UM_PER_MM,
        is_turned=isinstance(content, Grid) and content.is_turned,
        is_disc=is_disc,
        block=block if isinstance(content, Stagger) else 0,
    )


def _corners(content: Grid | Stagger) -> Sequence[tuple[int, int]]:
    if isinstance(content, Stagger):
        return content.corners
    across, along = range(content.columns), range(content.rows)
    return [(column * content.width, row * content.length) for row in along for column in across]


def _rests(lot: Lot, root: Cell, room: Room, kerf: int) -> list[Rest]:
    found: list[Rest] = []
    for leaf in root.leaves():
        width, length = leaf.width - kerf, leaf.length - kerf
        if leaf.content is None and width > 0 and length > 0:
            x, y, across, along = (size / UM_PER_MM for size in (room.x + leaf.x, room.y + leaf.y, width, length))
            found.append(Rest(x, y, across, along, width == room.width and lot.form != "disc"))
    return found
