"""How far off a candidate is, in parts that add up and are shown."""

from catalog.search.candidate import Penalty
from catalog.search.comparison import Comparison, Direction
from catalog.search.purposes import harm
from catalog.search.rules import HouseRules
from catalog.target import Purpose


def penalty(c: Comparison, purposes: tuple[Purpose, ...], rules: HouseRules) -> Penalty:
    """|Δw|/T, twice on the side that hurts, plus 0.5·|Δd|/10 % plus 0.5·|ΔA|/3 points; worse direction each."""
    aperture = max(_aperture_part(d, purposes) for d in c.directions)
    wire = max(_wire_part(d, float(rules.wire)) for d in c.directions)
    points = c.open_points if not c.made.is_filter else None
    return Penalty(aperture, wire, 0.0 if points is None else abs(float(points)) / float(rules.open_area_points) * 0.5)


def _wire_part(d: Direction, share: float) -> float:
    if d.wire_off is None or not d.asked_wire:
        return 0.0
    return abs(float(d.wire_off)) / float(d.asked_wire) / share * 0.5


def _aperture_part(d: Direction, purposes: tuple[Purpose, ...]) -> float:
    off = d.aperture_off
    if off is None or not d.tolerance:
        return 0.0
    twice = 2 if any(harm(purpose, off) for purpose in purposes) else 1
    return abs(float(off)) / float(d.tolerance) * twice
