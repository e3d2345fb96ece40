"""The unit cell of a Dutch weave cut into boxes, each with bounds of the clearance in it; boxes can be halved."""

from collections.abc import Iterator
from dataclasses import dataclass, field
from itertools import product
from math import sqrt

from catalog.physics.clearance import Slope, ball, least_in_box, least_on_step, most_in_box, slope, within_reach
from catalog.physics.dutch_wires import DutchWeave, Piece, Point, pieces

Box = tuple[int, int, int, int]
"""Level (each halves the edges), then place along x, y, z."""


@dataclass(frozen=True, slots=True)
class Clearance:
    """What is known of a box. mm."""

    middle: Point
    centre_mm: float
    """Clearance at the middle."""
    least_mm: float
    most_mm: float
    near: list[Piece]
    """Every piece of wire that can be the nearest to some point of the box."""


@dataclass(slots=True)
class Passage:
    """Boxes from the open space over the cloth to that beneath it, periodic along x and y."""

    weave: DutchWeave
    shape: tuple[int, int, int] = field(init=False)
    """Boxes of level 0 along x, y, z."""
    edges: Point = field(init=False)
    diagonal_mm: float = field(init=False)
    boxes: dict[Box, Clearance] = field(default_factory=dict)
    beside: dict[Box, list[Box]] = field(default_factory=dict)

    def __post_init__(self) -> None:
        weave, repeat = self.weave, self.weave.repeat
        x, y = weave.warp_pitch_mm, repeat * weave.weft_pitch_mm
        z = weave.warp_wire_mm + 4.0 * weave.weft_wire_mm
        edge = min(y / 4.0, weave.weft_wire_mm)
        self.shape = (
            max(3, round(x / edge)),
            repeat * max(4 // repeat, round(y / edge / repeat)),
            round(z / edge),
        )
        self.edges = (x / self.shape[0], y / self.shape[1], z / self.shape[2])
        self.diagonal_mm = sqrt(sum(edge * edge for edge in self.edges))
        every = pieces(weave)
        balls = [ball(piece) for piece in every]
        for i, j, k in product(*(range(n) for n in self.shape)):
            box = (0, i, j, k)
            self._add(box, within_reach(self._middle(box), every, balls, self.diagonal_mm))

    def half_diagonal_mm(self, box: Box) -> float:
        """Greatest distance from a box's middle to a point of it, mm."""
        return self.diagonal_mm / (2 << box[0])

    def halve(self, box: Box) -> None:
        """Cut a box into eight."""
        for other in self.neighbours(box):
            self.beside.pop(other, None)
        self.beside.pop(box, None)
        near = self.boxes.pop(box).near
        for inner in _inner(box):
            self._add(inner, near)

    def neighbours(self, box: Box) -> list[Box]:
        """Boxes that share a face with a box."""
        if box not in self.beside:
            faces = product((0, 1, 2), (-1, 1))
            self.beside[box] = [other for axis, step in faces for other in self._across(box, axis, step)]
        return self.beside[box]

    def is_top(self, box: Box) -> bool:
        """Whether a box touches the open space over the cloth."""
        return box[3] == (self.shape[2] << box[0]) - 1

    def least_between(self, box: Box, other: Box) -> float:
        """Lower bound of the clearance on the straight way between the middles of neighbours, mm."""
        here, there = self.boxes[box], self.boxes[other]
        way = self._way(here.middle, there.middle)
        share = 2.0 ** other[0] / (2.0 ** box[0] + 2.0 ** other[0])
        out, rest = [share * v for v in way], [(1.0 - share) * v for v in way]
        (x, y, z), (a, b, c) = here.middle, there.middle
        first = least_on_step((x, y, z), (x + out[0], y + out[1], z + out[2]), here.near)
        return min(first, least_on_step((a - rest[0], b - rest[1], c - rest[2]), (a, b, c), there.near))

    def _way(self, start: Point, end: Point) -> Point:
        """The shortest way between two points of the periodic weave."""
        P, s, n = self.weave.warp_pitch_mm, self.weave.weft_pitch_mm, self.weave.repeat
        turns = round((end[0] - start[0]) / P)
        along = end[1] - start[1] + turns * s
        return end[0] - start[0] - turns * P, along - n * s * round(along / (n * s)), end[2] - start[2]

    def _middle(self, box: Box) -> Point:
        x, y, z = ((n + 0.5) * edge / 2 ** box[0] for n, edge in zip(box[1:], self.edges, strict=True))
        return x, y, z - self.shape[2] * self.edges[2] / 2.0

    def _add(self, box: Box, candidates: list[Piece]) -> None:
        middle = self._middle(box)
        slopes = [slope(middle, piece) for piece in candidates]
        centre = min(slopes)[0]
        reach = centre + 2.0 * self.half_diagonal_mm(box)
        near = [(piece, at) for piece, at in zip(candidates, slopes, strict=True) if at[0] <= reach]
        wires: dict[int, Slope] = {}
        for piece, at in near:
            wires[piece[8]] = min(at, wires.get(piece[8], at))
        hx, hy, hz = (edge / 2.0 / 2 ** box[0] for edge in self.edges)
        least = least_in_box([at for _, at in near], (hx, hy, hz))
        most = most_in_box(list(wires.values()), (hx, hy, hz))
        self.boxes[box] = Clearance(middle, centre, least, most, [piece for piece, _ in near])

    def _across(self, box: Box, axis: int, step: int) -> Iterator[Box]:
        """The boxes beyond one face: one of the same size or larger, or several smaller ones."""
        level = box[0]
        place = list(box[1:])
        place[axis] += step
        nx, ny, nz = (n << level for n in self.shape)
        if not 0 <= place[2] < nz:
            return
        turns, x = divmod(place[0], nx)
        found = (level, x, (place[1] + turns * (ny // self.weave.repeat)) % ny, place[2])
        larger = found
        while larger not in self.boxes and larger[0]:
            larger = (larger[0] - 1, larger[1] // 2, larger[2] // 2, larger[3] // 2)
        if larger in self.boxes:
            yield larger
        else:
            yield from self._on_face(found, axis, 0 if step > 0 else 1)

    def _on_face(self, box: Box, axis: int, side: int) -> Iterator[Box]:
        """Boxes inside *box* that touch its face on one side of an axis."""
        for inner in _inner(box):
            if inner[axis + 1] % 2 != side:
                continue
            if inner in self.boxes:
                yield inner
            else:
                yield from self._on_face(inner, axis, side)


def _inner(box: Box) -> list[Box]:
    level, i, j, k = box
    return [(level + 1, 2 * i + a, 2 * j + b, 2 * k + c) for a, b, c in product((0, 1), repeat=3)]
