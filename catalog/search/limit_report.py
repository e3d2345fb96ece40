"""Limits that explain themselves: what each removed, what falls just short of which, and the window that is left."""

from collections.abc import Mapping, Sequence
from dataclasses import dataclass, replace
from math import sqrt

from catalog.cloth import Cloth
from catalog.search.distance import FIGURES as GETTERS
from catalog.search.reader import Filters, Range, Reader

RELAXED = 0.30
"""How far outside a limit, of its value, a near miss may lie."""
MOST_NEAR = 8
FIGURES = {
    "aperture_mm": ("warp_aperture_mm", "weft_aperture_mm"),
    "wire_mm": ("warp_wire_mm", "weft_wire_mm"),
    "open_area_pct": ("open_area_pct",),
    "mass_kg_m2": ("mass_kg_m2",),
    "thickness_mm": ("thickness_mm",),
    "rating_um": ("rating_um",),
}


@dataclass(frozen=True, slots=True)
class Removed:
    """How many cloths would be listed but for one limit."""

    limit: str
    removed: int


@dataclass(frozen=True, slots=True)
class Short:
    """A limit that a cloth misses, and by how much: mm, points or kg/m², always above 0."""

    limit: str
    by: float


@dataclass(frozen=True, slots=True)
class NearMiss:
    """A cloth that falls just short."""

    cloth: Cloth
    short_of: tuple[Short, ...]


@dataclass(frozen=True, slots=True)
class Window:
    """Apertures and wires of square cloth inside all limits. mm; None where there is no such pair."""

    aperture: tuple[float, float | None]
    wire: tuple[float, float | None]
    wire_per_aperture: float | None
    """Most wire as a share of the aperture, from the least open area."""

    @property
    def is_empty(self) -> bool:
        """True where no square cloth can satisfy the limits."""
        low, high = self.aperture
        return high is not None and low > high


@dataclass(frozen=True, slots=True)
class LimitReport:
    """What the limits did."""

    removed: tuple[Removed, ...]
    near: tuple[NearMiss, ...]
    window: Window | None


def filters_of(limits: Mapping[str, Range], scope: Filters) -> Filters:
    """The filters that hold *limits* within *scope*."""
    ranges = {name: bounds for limit, bounds in limits.items() for name in FIGURES[limit]}
    return replace(scope, ranges=ranges)


def limit_report(limits: Mapping[str, Range], scope: Filters, reader: Reader) -> LimitReport:
    """Explain *limits* (keys as in FIGURES) over the cloths inside *scope* (alloys, weaves, stock)."""
    inside = reader.count(filters_of(limits, scope))
    removed = []
    for limit in limits:
        others = {name: bounds for name, bounds in limits.items() if name != limit}
        removed.append(Removed(limit, reader.count(filters_of(others, scope)) - inside))
    for flag, wider in _without_flags(scope):
        removed.append(Removed(flag, reader.count(filters_of(limits, wider)) - inside))
    return LimitReport(tuple(removed), _near(limits, scope, reader), window(limits))


def _without_flags(scope: Filters) -> list[tuple[str, Filters]]:
    found = []
    if scope.alloys:
        found.append(("alloy", replace(scope, alloys=frozenset())))
    if scope.weaves:
        found.append(("weave", replace(scope, weaves=frozenset())))
    if scope.in_stock:
        found.append(("in stock", replace(scope, in_stock=False)))
    return found


def _near(limits: Mapping[str, Range], scope: Filters, reader: Reader) -> tuple[NearMiss, ...]:
    wider = {limit: _relaxed(bounds) for limit, bounds in limits.items()}
    misses = [NearMiss(c, shortfalls(c, limits)) for c in reader.select(filters_of(wider, scope))]
    missing = [miss for miss in misses if miss.short_of]
    missing.sort(key=lambda miss: (len(miss.short_of), _badness(miss, limits), miss.cloth.id))
    return tuple(missing[:MOST_NEAR])


def _relaxed(bounds: Range) -> Range:
    low, high = bounds
    return (None if low is None else low * (1 - RELAXED), None if high is None else high * (1 + RELAXED))


def _badness(miss: NearMiss, limits: Mapping[str, Range]) -> float:
    def size(limit: str) -> float:
        low, high = limits[limit]
        return (low if low is not None else high) or 1.0

    return sum(short.by / size(short.limit) for short in miss.short_of)


def shortfalls(cloth: Cloth, limits: Mapping[str, Range]) -> tuple[Short, ...]:
    """By how much *cloth* misses each limit; empty where it is inside all. Limits are inclusive."""
    found = []
    for limit, (low, high) in limits.items():
        values = [value for name in FIGURES[limit] if (value := GETTERS[name](cloth)) is not None]
        over = max((value - high for value in values), default=0.0) if high is not None else 0.0
        under = max((low - value for value in values), default=0.0) if low is not None else 0.0
        by = max(over, under)
        if by > 1e-9:
            found.append(Short(limit, by))
    return tuple(found)


def window(limits: Mapping[str, Range]) -> Window | None:
    """The window of square cloth inside limits on aperture, wire, thickness and open area.

    From A = (w/(w+d))² follows d ≤ w·(1/√A − 1), so a least wire asks a least aperture; thickness is 2d at least.
    None where no such limit is set, and where a limit on mass or a most open area would cut into the window:
    then a pair inside it needn't satisfy. Source: derived from the definition of open area.
    """
    low_w, high_w = limits.get("aperture_mm", (None, None))
    low_d, high_d = _wires(limits)
    least_open, most_open = limits.get("open_area_pct", (None, None))
    if all(bound is None for bound in (low_w, high_w, low_d, high_d, least_open)):
        return None
    ratio = 1 / sqrt(least_open / 100) - 1 if least_open else None
    needed = low_d / ratio if low_d is not None and ratio else 0.0
    found = Window((max(low_w or 0.0, needed), high_w), (low_d or 0.0, high_d), ratio)
    is_cut = most_open is not None or "mass_kg_m2" in limits
    return None if is_cut and not found.is_empty else found


def _wires(limits: Mapping[str, Range]) -> Range:
    """Bounds on the wire, mm: its own, and half the thickness's."""
    low, high = limits.get("wire_mm", (None, None))
    thin, thick = limits.get("thickness_mm", (None, None))
    lows = [low, None if thin is None else thin / 2]
    highs = [high, None if thick is None else thick / 2]
    return (
        max((bound for bound in lows if bound is not None), default=None),
        min((bound for bound in highs if bound is not None), default=None),
    )


def come_and_go(before: Sequence[Cloth], after: Sequence[Cloth]) -> tuple[tuple[Cloth, ...], tuple[Cloth, ...]]:
    """Which lines come and which go when a limit is moved."""
    had, has = {c.id for c in before}, {c.id for c in after}
    return tuple(c for c in after if c.id not in had), tuple(c for c in before if c.id not in has)
