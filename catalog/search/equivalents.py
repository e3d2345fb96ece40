"""The catalogue inch against metric: for each cloth of one system, the nearest of the other, by aperture."""

from bisect import bisect_left
from collections.abc import Iterable, Iterator
from dataclasses import dataclass
from math import log
from typing import NamedTuple

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
    square = [_placed(c) for c in cloths if c.construction.is_square]
    inch = sorted((p for p in square if p.cloth.unit_system == "inch"), key=_by_aperture)
    metric = sorted((p for p in square if p.cloth.unit_system == "metric"), key=_by_aperture)
    if not metric:
        return
    keys = [p.ln_aperture for p in metric]
    for place in inch:
        at = bisect_left(keys, place.ln_aperture)
        near = metric[max(0, at - NEIGHBOURS) : at + NEIGHBOURS]
        yield _paired(place.cloth, min(near, key=lambda other: (_distance(place, other), other.cloth.id)).cloth)


class _Place(NamedTuple):
    cloth: Cloth
    ln_aperture: float
    ln_wire: float
    ln_open_area: float


def _placed(cloth: Cloth) -> _Place:
    wire = float(cloth.construction.warp.wire_mm)
    return _Place(cloth, log(cloth.figures.warp_aperture_mm or 1), log(wire), log(cloth.figures.open_area_pct or 1))


def _by_aperture(place: _Place) -> tuple[float, str]:
    return (place.ln_aperture, place.cloth.id)


def _distance(one: _Place, other: _Place) -> float:
    """The distance of the search for square cloth: 4 Δln(w)² + 2 Δln(d)² + Δln(A)²."""
    w, d, a = other.ln_aperture - one.ln_aperture, other.ln_wire - one.ln_wire, other.ln_open_area - one.ln_open_area
    return 4 * w * w + 2 * d * d + a * a


def _paired(inch: Cloth, metric: Cloth) -> Equivalent:
    target = aim(reading_of(inch), alloy_rule="any")
    judged = assess(target, metric, None, False).candidate
    aperture = (metric.figures.warp_aperture_mm or 0) / (inch.figures.warp_aperture_mm or 1) - 1
    wire = float(metric.construction.warp.wire_mm / inch.construction.warp.wire_mm) - 1
    points = (metric.figures.open_area_pct or 0) - (inch.figures.open_area_pct or 0)
    return Equivalent(inch, metric, judged, aperture * 100, wire * 100, points)
