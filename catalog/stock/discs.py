"""Discs in offset rows: closer than in squares, but not to be parted by straight cuts.

Sizes are whole micrometres with one kerf added, as in cutting_cells: two discs keep their kerf where their centres lie
at least *size* (diameter and kerf) apart.
"""

from dataclasses import dataclass
from math import isqrt

from catalog.stock.cutting_cells import Stagger

STEP = 100
"""Rows stand whole tenths of a millimetre apart, rounded up: nobody marks out less."""


@dataclass(frozen=True, slots=True)
class Rows:
    """A way of offset rows: *long_row* discs at *pitch*, then *short_row* discs moved by *offset*, *rise* apart."""

    size: int
    long_row: int
    short_row: int
    pitch: int
    offset: int
    rise: int

    def count(self, length: int) -> int:
        """How many discs lie in *length*."""
        if length < self.size:
            return 0
        rows = (length - self.size) // self.rise + 1
        return (rows + 1) // 2 * self.long_row + rows // 2 * self.short_row

    def length_for(self, count: int) -> int:
        """Length that *count* discs take."""
        pairs, left = divmod(count, self.long_row + self.short_row)
        rows = 2 * pairs + (0 if not left else 1 if left <= self.long_row else 2)
        return self.size + (rows - 1) * self.rise

    def corners(self, count: int) -> tuple[tuple[int, int], ...]:
        """Corners of the squares about the first *count* discs."""
        found: list[tuple[int, int]] = []
        row = 0
        while len(found) < count:
            start, number = (self.offset, self.short_row) if row % 2 else (0, self.long_row)
            found += [(start + i * self.pitch, row * self.rise) for i in range(number)]
            row += 1
        return tuple(found[:count])


def offset_rows(size: int, width: int) -> list[Rows]:
    """The ways that offset rows of discs can lie in *width*: equal rows moved to and fro, and n with n − 1 between.

    Rows stand sqrt(size² − dx²) apart, dx being the sidewise distance of neighbours in adjoining rows, but at least
    half a size, where the row after next would touch. Source: derived (right triangle between the centres).
    """
    most = width // size
    if most < 1:
        return []
    ways = [_equal_rows(size, width, most)]
    if most > 1:
        ways.append(_alternating(size, width, most))
    return [way for way in ways if way.offset > 0]


def best_block(kind: int, size: int, width: int, length: int, wanted: int) -> Stagger | None:
    """The block of offset rows, across or along, that holds most of *wanted* discs; None unless it beats squares."""
    straight = min(wanted, (width // size) * (length // size))
    ways = [(way, way.count(length), False) for way in offset_rows(size, width)]
    ways += [(way, way.count(width), True) for way in offset_rows(size, length)]
    most = min(wanted, max((count for _, count, _ in ways), default=0))
    if most <= straight:
        return None
    enough = [(way, is_along) for way, count, is_along in ways if count >= most]
    way, is_along = min(enough, key=lambda item: (item[1], item[0].length_for(most)))
    corners = way.corners(most)
    turned = tuple((y, x) for x, y in corners) if is_along else corners
    return Stagger(kind, size, turned, way.pitch, way.rise, way.offset, is_along)


def block_width(stagger: Stagger) -> int:
    """Width that the block really takes."""
    return max(x for x, _ in stagger.corners) + stagger.size


def block_length(stagger: Stagger) -> int:
    """Length that the block really takes."""
    return max(y for _, y in stagger.corners) + stagger.size


def _equal_rows(size: int, width: int, most: int) -> Rows:
    slack = width - most * size
    stretch = max(0, (2 * slack - size) // (2 * most - 1))
    pitch = size + stretch
    offset = min(slack - (most - 1) * stretch, pitch // 2 if most > 1 else slack)
    return Rows(size, most, most, pitch, offset, _rise(size, offset))


def _alternating(size: int, width: int, most: int) -> Rows:
    pitch = (width - size) // (most - 1)
    offset = pitch // 2
    return Rows(size, most, most - 1, pitch, offset, _rise(size, offset))


def _rise(size: int, aside: int) -> int:
    """Least whole distance of rows whose neighbours lie *aside* sidewise; half a size keeps the row after next off."""
    square = size * size - aside * aside
    root = isqrt(square) if square > 0 else 0
    least = max(root + (root * root < square), -(-size // 2))
    return -(-least // STEP) * STEP
