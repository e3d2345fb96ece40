"""How far a cloth lies from what is asked: the distance, in plain Python. This is the definition of correct.

d² = 2·Δln(aperture warp)² + 2·Δln(aperture weft)² + Δln(wire warp)² + Δln(wire weft)² + Δln(open area)²,
over the figures that the point has. Pitches stand in for the apertures in filter cloth, and where only
counts are asked; filter cloth adds Δln(rating)². Source: derived; opening weighs twice as much as wire.

Cloth of the other kind (filter cloth against square and rectangular) is not comparable and is never returned.
A cloth that lacks a figure the point has (filter cloth without a rating) comes after all that have every
figure; among themselves these are ordered by the distance over the figures they do have.
"""

from collections.abc import Callable, Mapping, Sequence
from dataclasses import dataclass
from math import fsum, log, sqrt

from catalog.cloth import Cloth
from catalog.search.reader import Point

APERTURE_WEIGHT = 2.0
WIRE_WEIGHT = 1.0
OPEN_AREA_WEIGHT = 1.0
RATING_WEIGHT = 1.0

Getter = Callable[[Cloth], float | None]
FIGURES: Mapping[str, Getter] = {
    "warp_aperture_mm": lambda cloth: cloth.figures.warp_aperture_mm,
    "weft_aperture_mm": lambda cloth: cloth.figures.weft_aperture_mm,
    "warp_pitch_mm": lambda cloth: float(cloth.construction.warp.pitch_mm),
    "weft_pitch_mm": lambda cloth: float(cloth.construction.weft.pitch_mm),
    "warp_wire_mm": lambda cloth: float(cloth.construction.warp.wire_mm),
    "weft_wire_mm": lambda cloth: float(cloth.construction.weft.wire_mm),
    "open_area_pct": lambda cloth: cloth.figures.open_area_pct,
    "mass_kg_m2": lambda cloth: cloth.figures.mass_kg_m2,
    "thickness_mm": lambda cloth: cloth.figures.thickness_mm,
    "rating_um": lambda cloth: cloth.rating.um if cloth.rating else None,
}
"""Every figure that a search can compare or bound, by name."""


@dataclass(frozen=True, slots=True)
class Term:
    """One summand: weight × (ln asked − ln found)²; turned, it compares with the other direction's figure."""

    weight: float
    asked_ln: float
    straight: str
    turned: str


@dataclass(frozen=True, slots=True)
class Nearness:
    """Where a cloth lies. *missing* counts the asked figures that it lacks."""

    missing: int
    distance: float
    turned: bool

    def order(self, cloth_id: str) -> tuple[bool, float, str]:
        """The sort key: complete ones first, then by distance, then by id."""
        return self.missing > 0, self.distance, cloth_id


def terms(point: Point) -> tuple[Term, ...]:
    """The summands that *point* calls for. Figures must be above 0; raises ValueError otherwise."""
    found = []
    for side, other in (("warp", "weft"), ("weft", "warp")):
        opening = "pitch" if point.is_filter or getattr(point, f"{side}_aperture_mm") is None else "aperture"
        found.append((APERTURE_WEIGHT, f"{side}_{opening}_mm", f"{other}_{opening}_mm"))
        found.append((WIRE_WEIGHT, f"{side}_wire_mm", f"{other}_wire_mm"))
    alike = ("rating_um", RATING_WEIGHT) if point.is_filter else ("open_area_pct", OPEN_AREA_WEIGHT)
    found.append((alike[1], alike[0], alike[0]))
    asked = ((weight, name, other, getattr(point, name)) for weight, name, other in found)
    return tuple(Term(weight, log(mm), name, other) for weight, name, other, mm in asked if mm is not None)


def is_comparable(point: Point, cloth: Cloth) -> bool:
    """True where both are filter cloth or neither is."""
    return cloth.construction.is_filter == point.is_filter


class Yardstick:
    """Places cloths as seen from one point; what can be known beforehand is."""

    def __init__(self, point: Point) -> None:
        summands = terms(point)
        names = sorted({name for term in summands for name in (term.straight, term.turned)})
        self._getters = [FIGURES[name] for name in names]
        self._straight = [(term.weight, term.asked_ln, names.index(term.straight)) for term in summands]
        self._turned = [(term.weight, term.asked_ln, names.index(term.turned)) for term in summands]

    def place(self, cloth: Cloth) -> Nearness:
        """Place a comparable *cloth*, by the better of the two ways round; ties are not turned."""
        figures = [getter(cloth) for getter in self._getters]
        found_ln = [None if figure is None else log(figure) for figure in figures]
        straight, turned = _sum(self._straight, found_ln), _sum(self._turned, found_ln)
        is_turned = turned < straight
        missing, squared = turned if is_turned else straight
        return Nearness(missing, sqrt(squared), is_turned)


def _sum(summands: Sequence[tuple[float, float, int]], found_ln: Sequence[float | None]) -> tuple[int, float]:
    """Count of missing figures and d². fsum rounds once, so that mirrored cloths tie exactly."""
    pairs = [(weight, asked, found_ln[place]) for weight, asked, place in summands]
    parts = [weight * (asked - found) ** 2 for weight, asked, found in pairs if found is not None]
    return len(pairs) - len(parts), fsum(parts)
