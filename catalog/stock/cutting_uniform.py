"""One size of rectangle that may be turned: blocks of upright and of turned pieces in one cloth.

Sizes are whole micrometres with one kerf added (see cutting_cells).
"""

from bisect import bisect_left

from catalog.stock.cutting_cells import Cell, Grid, place
from catalog.stock.cutting_filling import Attempt, Kind

DEEP = ((40, 3), (400, 2))
"""Up to so many pieces by area, so many cuts lie between blocks; one beyond that."""
MIXED_ENDS_UP_TO = 20_000


class Blocks:
    """How many pieces of *kind* come out of a part, cut up to *depth* times where rows of either way end."""

    def __init__(self, kind: Kind, depth: int) -> None:
        self.kind = kind
        self.depth = depth
        self.known: dict[tuple[int, int, int], tuple[int, tuple[bool, int] | None]] = {}

    def count(self, width: int, length: int) -> int:
        """Pieces out of *width* × *length*."""
        return self._best(width, length, self.depth)[0]

    def lay(self, cell: Cell, depth: int | None = None) -> None:
        """Cut *cell* accordingly."""
        depth = self.depth if depth is None else depth
        _, cut = self._best(cell.width, cell.length, depth)
        if cut is None:
            self._lay_rows(cell)
            return
        is_across, at = cut
        for part in cell.cut_across(at) if is_across else cell.cut_along(at):
            self.lay(part, depth - 1)

    def _best(self, width: int, length: int, depth: int) -> tuple[int, tuple[bool, int] | None]:
        key = width, length, depth
        if key not in self.known:
            self.known[key] = self._search(width, length, depth)
        return self.known[key]

    def _search(self, width: int, length: int, depth: int) -> tuple[int, tuple[bool, int] | None]:
        most = max((width // w) * (length // h) for w, h, _ in self.kind.shapes)
        best: tuple[int, tuple[bool, int] | None] = (most, None)
        ceiling = width * length // self.kind.area
        if not depth or not most:
            return best
        for is_across, at in self._places(width, length):
            if best[0] >= ceiling:
                break
            parts = ((width, at), (width, length - at)) if is_across else ((at, length), (width - at, length))
            count = sum(self._best(*part, depth - 1)[0] for part in parts)
            if count > best[0]:
                best = count, (is_across, at)
        return best

    def _places(self, width: int, length: int) -> list[tuple[bool, int]]:
        across = [(True, i * h) for _, h, _ in self.kind.shapes for i in range(1, (length - 1) // h + 1)]
        along = [(False, i * w) for w, _, _ in self.kind.shapes for i in range(1, (width - 1) // w + 1)]
        return across + along

    def _lay_rows(self, cell: Cell) -> None:
        w, h, is_turned = max(self.kind.shapes, key=lambda shape: (cell.width // shape[0]) * (cell.length // shape[1]))
        columns, rows = cell.width // w, cell.length // h
        if columns and rows:
            place(cell, columns * w, rows * h, Grid(self.kind.index, w, h, columns, rows, is_turned), True)


def blocks(width: int, length: int, kind: Kind) -> Attempt:
    """As many of *kind* as come out of the cloth by blocks, in the least length where all of them do."""
    size = width * length // kind.area
    solver = Blocks(kind, next((depth for most, depth in DEEP if size <= most), 1))
    lengths = _row_ends(length, kind)
    if solver.count(width, length) >= kind.quantity:
        length = lengths[bisect_left(lengths, kind.quantity, key=lambda end: solver.count(width, end))]
    root = Cell(0, 0, width, length)
    solver.lay(root)
    _drop(root, sum(leaf.content.count for leaf in root.leaves() if leaf.content) - kind.quantity)
    laid = [leaf for leaf in root.leaves() if leaf.content]
    count = sum(leaf.content.count for leaf in laid if leaf.content)
    return Attempt(root, count, count * kind.area, max((leaf.y + leaf.length for leaf in laid), default=0))


def _row_ends(length: int, kind: Kind) -> list[int]:
    """Lengths at which rows of either way can end, and the whole *length*; of one way only where rows are many."""
    (_, a, _), (_, b, _) = kind.shapes[0], kind.shapes[-1]
    if (length // a) * (length // b) > MIXED_ENDS_UP_TO:
        return sorted({*range(0, length, a), *range(0, length, b), length})
    ends = {i * a + j * b for i in range(length // a + 1) for j in range((length - i * a) // b + 1)}
    return sorted(ends | {length})


def _drop(root: Cell, surplus: int) -> None:
    """Leave out *surplus* pieces, the last of the cloth first."""
    filled = [leaf for leaf in root.leaves() if isinstance(leaf.content, Grid)]
    for leaf in sorted(filled, key=lambda leaf: (-(leaf.y + leaf.length), -leaf.x)):
        if surplus <= 0:
            return
        grid = leaf.content
        assert isinstance(grid, Grid)
        leaf.content = None
        _lay_some(leaf, grid, max(0, grid.count - surplus))
        surplus -= grid.count


def _lay_some(cell: Cell, grid: Grid, count: int) -> None:
    rows, more = divmod(count, grid.columns)
    if rows:
        whole = Grid(grid.kind, grid.width, grid.length, grid.columns, rows, grid.is_turned)
        left = place(cell, cell.width, rows * grid.length, whole, True)
        if not left:
            return
        cell = left[0]
    if more:
        some = Grid(grid.kind, grid.width, grid.length, more, 1, grid.is_turned)
        place(cell, more * grid.width, grid.length, some, True)
