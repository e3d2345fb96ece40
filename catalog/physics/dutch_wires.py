"""Wires of Dutch weaves in space, as straight pieces, for the passage solver.

x runs along the weft, y along the warp, z through the cloth. The warp lies straight at x = j·P. A weft wire
goes over and under it along arcs of radius H = (D + d)/2 joined by tangents, sin θ = (D + d)/P. In a 2/2
twill neighbours on one face lie closer than a wire's thickness if nothing moves: each pair spreads by half a
pitch either way, so that the wires of a face lie evenly at 2s. One step of a warp pitch along x and of one
weft pitch back along y repeats the weave.
"""

from dataclasses import dataclass
from itertools import pairwise
from math import asin, cos, sin

from catalog.physics.domain import OutOfDomainError, require_positive

CHORDS = 12
"""Straight pieces in an arc, laid half inside, half outside it."""

Point = tuple[float, float, float]
Piece = tuple[float, float, float, float, float, float, float, float, int]
"""Start x, y, z; vector x, y, z; 1/length²; radius of the wire; which wire it is of. mm."""


@dataclass(frozen=True, slots=True)
class DutchWeave:
    """Counts and wires of a Dutch weave. mm."""

    warp_pitch_mm: float
    weft_pitch_mm: float
    warp_wire_mm: float
    weft_wire_mm: float
    is_twilled: bool

    def __post_init__(self) -> None:
        require_positive(warp_pitch_mm=self.warp_pitch_mm, weft_pitch_mm=self.weft_pitch_mm)
        require_positive(warp_wire_mm=self.warp_wire_mm, weft_wire_mm=self.weft_wire_mm)
        if 2 * self.half_height_mm > self.warp_pitch_mm:
            raise OutOfDomainError(
                f"Warp and weft wire together ({2 * self.half_height_mm:g} mm) exceed the warp pitch "
                f"({self.warp_pitch_mm:g} mm): the weft can't pass between neighbouring warp wires."
            )

    @property
    def half_height_mm(self) -> float:
        """H: distance of warp and weft axes where they cross, mm."""
        return (self.warp_wire_mm + self.weft_wire_mm) / 2.0

    @property
    def angle_rad(self) -> float:
        """θ: steepest angle of the weft, sin θ = (D + d)/P."""
        return asin(2.0 * self.half_height_mm / self.warp_pitch_mm)

    @property
    def repeat(self) -> int:
        """Weft wires after which the weave repeats along the warp."""
        return 4 if self.is_twilled else 2

    @property
    def chord_error_mm(self) -> float:
        """How far a straight piece lies off its arc at most, mm."""
        return self.half_height_mm * (1.0 - cos(self.angle_rad / CHORDS / 2.0)) / 2.0


def pieces(weave: DutchWeave) -> list[Piece]:
    """Every straight piece that can matter to points with 0 ≤ x ≤ P, 0 ≤ y ≤ repeat·s."""
    P, s, n = weave.warp_pitch_mm, weave.weft_pitch_mm, weave.repeat
    far = n // 2 + 1  # a wire half a repeat further along y has a twin that is nearer
    found: list[Piece] = []
    for warp in (-1, 0, 1, 2):
        ends = (warp * P, -n * s, 0.0), (warp * P, 2 * n * s, 0.0)
        found.append(_piece(*ends, weave.warp_wire_mm / 2.0, warp))
    for weft in range(-far, n + far + 1):
        for warp in (-1, 0, 1):
            path = _weft_path(weave, weft, warp)
            wire = 10 + far + weft
            found += [_piece(a, b, weave.weft_wire_mm / 2.0, wire) for a, b in pairwise(path)]
    return found


def _weft_path(weave: DutchWeave, weft: int, warp: int) -> list[Point]:
    """Axis of weft wire *weft* from warp wire *warp* to the next."""
    P, H = weave.warp_pitch_mm, weave.half_height_mm
    (y0, up0), (y1, up1) = _station(weave, weft, warp), _station(weave, weft, warp + 1)
    if up0 == up1:
        flat = [(0.0, H), (P, H)]
    else:
        arc = [weave.angle_rad * k / CHORDS for k in range(CHORDS + 1)]
        R = H + weave.chord_error_mm
        flat = [(R * sin(a), R * cos(a)) for a in arc]
        flat += [(P - R * sin(a), -R * cos(a)) for a in reversed(arc)]
    side = 1.0 if up0 else -1.0
    return [(warp * P + x, y0 + (y1 - y0) * x / P, side * z) for x, z in flat]


def _station(weave: DutchWeave, weft: int, warp: int) -> tuple[float, bool]:
    """Where a weft wire crosses a warp wire: y, and whether above it."""
    s, phase = weave.weft_pitch_mm, (weft + warp) % weave.repeat
    if not weave.is_twilled:
        return weft * s, phase == 0
    return weft * s + (0.5 * s if phase % 2 else -0.5 * s), phase < 2


def _piece(a: Point, b: Point, radius: float, wire: int) -> Piece:
    u, v, w = b[0] - a[0], b[1] - a[1], b[2] - a[2]
    return (*a, u, v, w, 1.0 / (u * u + v * v + w * w), radius, wire)
