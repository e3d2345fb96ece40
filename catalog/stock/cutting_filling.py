"""Filling one rectangle with pieces in a given order: one quick attempt that a search repeats with other rules.

Sizes are whole micrometres with one kerf added (see cutting_cells).
"""

from collections.abc import Callable, Sequence
from dataclasses import dataclass, replace
from typing import TypeAlias

from catalog.stock import discs
from catalog.stock.cutting_cells import Cell, Content, Grid, place

Shape: TypeAlias = tuple[int, int, bool]
"""Width, length, and whether that is the turned way."""


@dataclass(frozen=True, slots=True)
class Kind:
    """One size of piece: the ways it may lie, and how many are asked."""

    index: int
    shapes: tuple[Shape, ...]
    quantity: int
    is_disc: bool

    @property
    def area(self) -> int:
        """Area of one piece's rectangle with its kerf."""
        return self.shapes[0][0] * self.shapes[0][1]

    def times(self, quantity: int) -> "Kind":
        """The same size in another number."""
        return Kind(self.index, self.shapes, quantity, self.is_disc)


@dataclass(frozen=True, slots=True)
class Attempt:
    """What one attempt placed."""

    root: Cell
    count: int
    area: int
    length: int
    """How far the pieces reach along the cloth."""


Fit: TypeAlias = Callable[[Cell, int, int], tuple[int, int]]
Split: TypeAlias = Callable[[Cell, int, int], bool]

FITS: tuple[Fit, ...] = (
    lambda c, w, h: (c.width * c.length - w * h, 0),
    lambda c, w, h: (min(c.width - w, c.length - h), max(c.width - w, c.length - h)),
    lambda c, w, h: (c.y + h, c.x),
    lambda c, w, h: (c.width - w, c.length - h),
    lambda c, w, h: (c.length - h, c.width - w),
    lambda c, w, h: (max(c.width - w, c.length - h), c.y),
)
"""Where a piece goes: the part for which this is least."""

SPLITS: tuple[Split, ...] = (
    lambda c, w, h: True,
    lambda c, w, h: c.width - w > c.length - h,
    lambda c, w, h: c.width - w <= c.length - h,
    lambda c, w, h: (c.width - w) * h < w * (c.length - h),
    lambda c, w, h: (c.width - w) * h >= w * (c.length - h),
    lambda c, w, h: False,
)
"""Whether the first cut that frees a piece runs across the part."""

BLOCK, ROW, SINGLE = 2, 1, 0
"""How much of one kind is placed at a time."""
ROW_STEPS = 25
"""Where rows are many, so large a part of them goes at a time."""


def fill(
    width: int, length: int, order: Sequence[Kind], fit: Fit, split: Split, grain: int, staggered: bool = False
) -> Attempt:
    """Place *order* one after the other, each where *fit* is least; what fits nowhere is passed over."""
    root = Cell(0, 0, width, length)
    free = [root]
    least = min((min(kind.shapes[0][:2]) for kind in order), default=0)
    count = area = reach = 0
    for kind in order:
        wanted = kind.quantity
        while wanted:
            found = _best(free, kind, fit)
            if found is None:
                break
            place_of, shape = found
            cell = free.pop(place_of)
            w, h, content = _cluster(cell, kind, shape, wanted, grain, staggered)
            reach = max(reach, cell.y + h)
            left = place(cell, w, h, content, split(cell, w, h))
            free += [part for part in left if part.width >= least and part.length >= least]
            wanted -= content.count
            count += content.count
            area += content.count * kind.area
    return Attempt(root, count, area, reach)


def _best(free: list[Cell], kind: Kind, fit: Fit) -> tuple[int, Shape] | None:
    """Where *kind* goes: which of the free parts, and the way it lies."""
    best: tuple[int, Shape] | None = None
    least: tuple[int, int] | None = None
    for shape in kind.shapes:
        w, h, _ = shape
        for place_of, cell in enumerate(free):
            if w <= cell.width and h <= cell.length:
                score = fit(cell, w, h)
                if least is None or score < least:
                    least, best = score, (place_of, shape)
    return best


def _cluster(
    cell: Cell, kind: Kind, shape: Shape, wanted: int, grain: int, staggered: bool
) -> tuple[int, int, Content]:
    """As many of *kind* as go into the corner at a time: one, a row, whole rows, or an offset block."""
    w, h, is_turned = shape
    if staggered and kind.is_disc and wanted > 1:
        found = discs.best_block(kind.index, w, cell.width, cell.length, wanted)
        if found:
            return discs.block_width(found), discs.block_length(found), found
    columns = 1 if grain == SINGLE else min(cell.width // w, wanted)
    most = min(cell.length // h, wanted // columns)
    rows = {SINGLE: 1, ROW: max(1, most // ROW_STEPS), BLOCK: most}[grain]
    return columns * w, rows * h, Grid(kind.index, w, h, columns, rows, is_turned)


def straight_rows(width: int, length: int, kinds: Sequence[Kind]) -> Attempt:
    """One kind after the other in straight rows from side to side: what a person lays out without a plan."""
    order = [replace(kind, shapes=(_way(width, length, kind),)) for kind in kinds]
    return fill(width, length, order, FITS[2], SPLITS[0], BLOCK)


def _way(width: int, length: int, kind: Kind) -> tuple[int, int, bool]:
    """The way to lie that takes the least length for the list, or gives most pieces."""
    ways = [shape for shape in kind.shapes if shape[0] <= width and shape[1] <= length]

    def worth(shape: tuple[int, int, bool]) -> tuple[int, int]:
        columns = width // shape[0]
        rows = min(length // shape[1], -(-kind.quantity // columns))
        return min(kind.quantity, columns * rows), -rows * shape[1]

    return max(ways, key=worth)
