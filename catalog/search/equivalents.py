"""The catalogue inch against metric: for each cloth of one system, the nearest of the other, by aperture."""

from bisect import bisect_left
from collections.abc import Iterable, Iterator
from dataclasses import dataclass, replace
from math import inf, log
from typing import NamedTuple

from catalog.aiming import aim
from catalog.callout.reading import Reading, Side
from catalog.cloth import Cloth
from catalog.construction import Weave
from catalog.search.candidate import Candidate
from catalog.search.judging import assess
from catalog.units import Length

APERTURE_WEIGHT = 4.0
"""Of Δln(aperture)²: 2 for warp and 2 for weft, as in the distance of the search."""


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
    """Pair each square inch cloth with the nearest metric one of its weave, fine to coarse; ties by id.

    Alloys are left aside: any will do. A make that is listed in several alloys is judged once.
    """
    square = sorted((_placed(c) for c in cloths if c.construction.is_square), key=_by_aperture)
    shelves = {weave: Shelf(p for p in square if p.is_metric(weave)) for weave in Weave if not weave.is_filter}
    known: dict[tuple[Weave, float, float], Equivalent] = {}
    for place in square:
        shelf = shelves[place.cloth.construction.weave]
        if place.cloth.unit_system == "inch" and not shelf.is_empty:
            make = (place.cloth.construction.weave, place.ln_aperture, place.ln_wire)
            if make not in known:
                known[make] = _paired(place.cloth, shelf.nearest(place).cloth)
            yield replace(known[make], inch=place.cloth)


class Place(NamedTuple):
    """A square cloth by the logarithms that the distance is made of."""

    cloth: Cloth
    ln_aperture: float
    ln_wire: float
    ln_open_area: float

    def is_metric(self, weave: Weave) -> bool:
        """True for metric cloth of this weave."""
        return self.cloth.unit_system == "metric" and self.cloth.construction.weave is weave


class Shelf:
    """Cloths in order of aperture, each make once: the one with the least id."""

    def __init__(self, ascending: Iterable[Place]) -> None:
        makes: dict[tuple[float, float], Place] = {}
        for place in ascending:
            makes.setdefault((place.ln_aperture, place.ln_wire), place)
        self._places = list(makes.values())
        self._keys = [place.ln_aperture for place in self._places]

    @property
    def is_empty(self) -> bool:
        """True where there is nothing to be near to."""
        return not self._places

    def nearest(self, place: Place) -> Place:
        """The nearest by the distance of the search: outwards from the aperture until it alone is too far."""
        at = bisect_left(self._keys, place.ln_aperture)
        best: tuple[float, str, int] = (inf, "", 0)
        for way in (range(at, len(self._places)), range(at - 1, -1, -1)):
            for index in way:
                apart = self._keys[index] - place.ln_aperture
                if APERTURE_WEIGHT * apart * apart > best[0]:
                    break
                other = self._places[index]
                best = min(best, (_distance(place, other), other.cloth.id, index))
        return self._places[best[2]]


def _placed(cloth: Cloth) -> Place:
    wire = float(cloth.construction.warp.wire_mm)
    return Place(cloth, log(cloth.figures.warp_aperture_mm or 1), log(wire), log(cloth.figures.open_area_pct or 1))


def _by_aperture(place: Place) -> tuple[float, str]:
    return (place.ln_aperture, place.cloth.id)


def _distance(one: Place, other: Place) -> float:
    """The distance of the search for square cloth: 4 Δln(w)² + 2 Δln(d)² + Δln(A)²."""
    w, d, a = other.ln_aperture - one.ln_aperture, other.ln_wire - one.ln_wire, other.ln_open_area - one.ln_open_area
    return APERTURE_WEIGHT * w * w + 2 * d * d + a * a


def _paired(inch: Cloth, metric: Cloth) -> Equivalent:
    target = aim(reading_of(inch), alloy_rule="any")
    judged = assess(target, metric, None, False).candidate
    aperture = (metric.figures.warp_aperture_mm or 0) / (inch.figures.warp_aperture_mm or 1) - 1
    wire = float(metric.construction.warp.wire_mm / inch.construction.warp.wire_mm) - 1
    points = (metric.figures.open_area_pct or 0) - (inch.figures.open_area_pct or 0)
    return Equivalent(inch, metric, judged, aperture * 100, wire * 100, points)
