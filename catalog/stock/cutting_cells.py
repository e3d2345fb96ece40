"""A layout as a tree of straight cuts: every cut runs from edge to edge of the part it divides.

Sizes are whole micrometres *with one kerf added to both sides* of every part and of the cloth itself: a row of n
pieces of size a with kerf k between them takes n(a + k) − k, so n(a + k) of a width of W + k. Parts then lie side by
side without gaps, and a last piece that just fits needs no cut beside it.
"""

from collections.abc import Iterator
from dataclasses import dataclass, field
from typing import TypeAlias


@dataclass(frozen=True, slots=True)
class Grid:
    """*columns* × *rows* equal pieces (or the squares of discs) filling a part without rest."""

    kind: int
    width: int
    length: int
    columns: int
    rows: int
    is_turned: bool = False

    @property
    def count(self) -> int:
        """How many pieces."""
        return self.columns * self.rows


@dataclass(frozen=True, slots=True)
class Stagger:
    """A block that discs lie in by offset rows; *corners* are those of their squares, from the block's corner."""

    kind: int
    size: int
    corners: tuple[tuple[int, int], ...]
    pitch: int
    """From disc to disc in a row."""
    rise: int
    """From row to row."""
    offset: int
    """What every other row is moved aside."""
    is_along: bool = False
    """Rows run along the cloth instead of across it."""

    @property
    def count(self) -> int:
        """How many discs."""
        return len(self.corners)


Content: TypeAlias = Grid | Stagger


@dataclass(slots=True, eq=False)
class Cell:
    """A rectangular part: whole (with content, or left over), or cut in two."""

    x: int
    y: int
    width: int
    length: int
    content: Content | None = None
    parts: tuple["Cell", "Cell"] | None = field(default=None, repr=False)
    is_cut_across: bool = True

    def cut_across(self, length: int) -> tuple["Cell", "Cell"]:
        """Cut from side to side at *length* from this part's beginning."""
        first = Cell(self.x, self.y, self.width, length)
        second = Cell(self.x, self.y + length, self.width, self.length - length)
        self.parts, self.is_cut_across = (first, second), True
        return self.parts

    def cut_along(self, width: int) -> tuple["Cell", "Cell"]:
        """Cut from end to end at *width* from this part's left side."""
        first = Cell(self.x, self.y, width, self.length)
        second = Cell(self.x + width, self.y, self.width - width, self.length)
        self.parts, self.is_cut_across = (first, second), False
        return self.parts

    def leaves(self) -> Iterator["Cell"]:
        """Every part that isn't cut any further, in the order of the cuts."""
        open_parts = [self]  # a stack, since a long list cuts deeper than calls may nest
        while open_parts:
            part = open_parts.pop()
            if part.parts is None:
                yield part
            else:
                open_parts.extend(reversed(part.parts))


def place(cell: Cell, width: int, length: int, content: Content, is_across_first: bool) -> list[Cell]:
    """Cut a part of *width* × *length* out of *cell*'s corner for *content*; returns what is left of the cell."""
    rest: list[Cell] = []
    for is_across in (is_across_first, not is_across_first):
        if is_across and length < cell.length:
            cell, left = cell.cut_across(length)
            rest.append(left)
        elif not is_across and width < cell.width:
            cell, left = cell.cut_along(width)
            rest.append(left)
    cell.content = content
    return rest


def clip(root: Cell, length: int) -> Cell:
    """A copy of *root* without what lies beyond *length*, where no piece does."""
    whole = _clipped(root, length)
    open_parts = [whole]
    while open_parts:
        made = open_parts.pop()
        while made.parts is not None and made.parts[1].y >= length:
            first = made.parts[0]
            made.content, made.parts, made.is_cut_across = first.content, first.parts, first.is_cut_across
        if made.parts is not None:
            first, second = made.parts
            made.parts = _clipped(first, length), _clipped(second, length)
            open_parts += made.parts
    return whole


def _clipped(cell: Cell, length: int) -> Cell:
    end = min(cell.length, length - cell.y)
    return Cell(cell.x, cell.y, cell.width, end, cell.content, cell.parts, cell.is_cut_across)
