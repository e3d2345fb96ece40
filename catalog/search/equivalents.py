"""The catalogue inch against metric: for each cloth of one system, the nearest of the other, by aperture."""

from bisect import bisect_left
from collections.abc import Iterable, Iterator, Sequence
from dataclasses import dataclass
from math import log

from catalog.aiming import aim
from catalog.callout.reading import Reading, Side
from catalog.cloth import Cloth
from catalog.search.candidate import Candidate
from catalog.search.judging import assess
from catalog.units import Length

NEIGHBOURS = 12
"""Cloths looked at each way along the aperture; the nearest by the distance of the search wins."""


@dataclass(frozen=True, slots=True)
class Equivalent:
    """An inch cloth, the metric one nearest to it, and how that one stands."""

    inch: Cloth
    metric: Cloth
    judged: Candidate
    aperture_pct: float
    wire_pct: float
    open_area_points: float


def reading_of(cloth: Cloth) -> Reading:
    """A cloth as something that is asked for: its own weave, alloy, pitches and wires, exact."""
    made = cloth.construction
    sides = [
        Side(Length(w.pitch_mm), Length(w.wire_mm), None if made.is_filter else Length(w.aperture_mm))
        for w in (made.warp, made.weft)
    ]
    return Reading(cloth.declared, weave=made.weave, warp=sides[0], weft=sides[1], alloy=made.alloy)


def equivalents(cloths: Iterable[Cloth]) -> Iterator[Equivalent]:
    """Pair square cloth of the inch and the metric system, fine to coarse. Alloys are left aside: any will do."""
    square = [c for c in cloths if c.construction.is_square]
    inch = sorted((c for c in square if c.unit_system == "inch"), key=_key)
    metric = sorted((c for c in square if c.unit_system == "metric"), key=_key)
    if not metric:
        return
    keys = [_key(c)[0] for c in metric]
    for cloth in inch:
        yield _paired(cloth, _nearest(cloth, metric, bisect_left(keys, _key(cloth)[0])))


def _key(cloth: Cloth) -> tuple[float, str]:
    return (cloth.figures.warp_aperture_mm or 0.0, cloth.id)


def _nearest(cloth: Cloth, metric: Sequence[Cloth], at: int) -> Cloth:
    near = metric[max(0, at - NEIGHBOURS) : at + NEIGHBOURS]
    return min(near, key=lambda other: (_distance(cloth, other), other.id))


def _distance(one: Cloth, other: Cloth) -> float:
    """The distance of the search for square cloth: 4 Δln(w)² + 2 Δln(d)² + Δln(A)²."""
    w = log((other.figures.warp_aperture_mm or 1) / (one.figures.warp_aperture_mm or 1))
    d = log(float(other.construction.warp.wire_mm / one.construction.warp.wire_mm))
    a = log((other.figures.open_area_pct or 1) / (one.figures.open_area_pct or 1))
    return 4 * w * w + 2 * d * d + a * a


def _paired(inch: Cloth, metric: Cloth) -> Equivalent:
    target = aim(reading_of(inch), alloy_rule="any")
    judged = assess(target, metric, None, False).candidate
    aperture = (metric.figures.warp_aperture_mm or 0) / (inch.figures.warp_aperture_mm or 1) - 1
    wire = float(metric.construction.warp.wire_mm / inch.construction.warp.wire_mm) - 1
    points = (metric.figures.open_area_pct or 0) - (inch.figures.open_area_pct or 0)
    return Equivalent(inch, metric, judged, aperture * 100, wire * 100, points)
