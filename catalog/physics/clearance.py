"""Clearance between a point and wires: at the point, over a box around it, and along a straight step.

The distance to a straight piece of wire is a convex function. Its tangent therefore bounds it from below; it
bends by no more than one over the distance to the axis, which bounds it from above. A point between two or
three wires is never further from the nearest of them than the mean of its distances to all.
"""

from itertools import combinations
from math import dist, inf, sqrt

from catalog.physics.dutch_wires import Piece, Point

Slope = tuple[float, float, float, float, float]
"""Distance to a wire's surface, mm; its gradient in x, y, z; distance to the wire's axis, mm."""
GROUP = 5
"""Wires tried together for the upper bound."""


def slope(point: Point, piece: Piece) -> Slope:
    """Distance from a point to a wire's surface, negative inside, with its gradient (0 on the axis)."""
    ax, ay, az, u, v, w, inverse, radius, _ = piece
    x, y, z = point[0] - ax, point[1] - ay, point[2] - az
    t = (x * u + y * v + z * w) * inverse
    t = 0.0 if t < 0.0 else 1.0 if t > 1.0 else t
    x, y, z = x - t * u, y - t * v, z - t * w
    away = sqrt(x * x + y * y + z * z)
    if away == 0.0:
        return -radius, 0.0, 0.0, 0.0, 0.0
    return away - radius, x / away, y / away, z / away, away


Ball = tuple[Point, float, float]
"""Middle of a piece of wire, radius of a ball around all of it, radius of the wire. mm."""


def ball(piece: Piece) -> Ball:
    """The ball around a piece of wire."""
    x, y, z, u, v, w, inverse, radius, _ = piece
    return (x + u / 2.0, y + v / 2.0, z + w / 2.0), sqrt(1.0 / inverse) / 2.0 + radius, radius


def within_reach(point: Point, every: list[Piece], balls: list[Ball], reach: float) -> list[Piece]:
    """Pieces that can lie within *reach* of the clearance at a point, judged by the balls around them."""
    least = reach + min(dist(point, middle) - radius for middle, _, radius in balls)
    return [p for p, (middle, outer, _) in zip(every, balls, strict=True) if dist(point, middle) - outer <= least]


def least_in_box(slopes: list[Slope], half: Point) -> float:
    """Lower bound of the clearance in a box of half edges *half* around the point, mm."""
    hx, hy, hz = half
    return min(d - abs(gx) * hx - abs(gy) * hy - abs(gz) * hz for d, gx, gy, gz, _ in slopes)


def most_in_box(slopes: list[Slope], half: Point) -> float:
    """Upper bound of the clearance in a box of half edges *half* around the point, mm. One slope per wire."""
    hx, hy, hz = half
    square = hx * hx + hy * hy + hz * hz
    reach = sqrt(square)
    nearest = sorted(slopes)[:GROUP]
    most = nearest[0][0] + reach
    far = [s for s in nearest if s[4] > 2.0 * reach]
    for size in (1, 2, 3):
        for group in combinations(far, size):
            d, gx, gy, gz, _ = map(sum, zip(*group, strict=True))
            tilt = abs(gx) * hx + abs(gy) * hy + abs(gz) * hz
            bend = square / 2.0 / (min(s[4] for s in group) - reach)
            most = min(most, (d + tilt) / size + bend)
    return most


def least_on_step(start: Point, end: Point, near: list[Piece]) -> float:
    """Lower bound of the clearance along a straight step, mm: two tangents of a convex function meet."""
    u, v, w = end[0] - start[0], end[1] - start[1], end[2] - start[2]
    least = inf
    for piece in near:
        a, ax, ay, az, _ = slope(start, piece)
        b, bx, by, bz, _ = slope(end, piece)
        falls, climbs = ax * u + ay * v + az * w, bx * u + by * v + bz * w
        if falls >= 0.0:
            least = min(least, a)
        elif climbs <= 0.0:
            least = min(least, b)
        else:
            least = min(least, a + falls * min(max((b - climbs - a) / (falls - climbs), 0.0), 1.0))
    return least
