"""Where the cloths within a radius of a point can lie: windows on the axes of search.axes. No SQL.

With a radius r, a pair of figures of weight w each lies within 2w·Δmean² ≤ r² (see search.axes; the rest of
d² is never negative). Bands of the leading mean are cut out one by one, each with the stretch of mean wire
that its remaining distance leaves, so that together they hug the ellipse around the point. What every cloth is
off in open area at least is taken off beforehand.

Every cloth nearer than r is inside; what else is inside is sorted out by its distance.
"""

from collections.abc import Mapping
from dataclasses import dataclass
from math import ceil, exp, expm1, floor, inf, log, sqrt
from typing import NamedTuple

from catalog.search.axes import BAND
from catalog.search.distance import APERTURE_WEIGHT, OPEN_AREA_WEIGHT, RATING_WEIGHT, WIRE_WEIGHT
from catalog.search.reader import Filters, Point, Range

SLACK = 1e-9
"""Relative and absolute widening against rounding."""
Stretch = tuple[float, float]
EVERYWHERE: Stretch = (-inf, inf)


@dataclass(frozen=True, slots=True)
class Axis:
    """A column of logarithms: a cloth lies at least √weight·|its value − asked| away."""

    column: str
    asked: float
    weight: float


@dataclass(frozen=True, slots=True)
class Layout:
    """How a point is searched: along *lead*, in bands where the catalogue has them, and along the wire."""

    lead: Axis
    band: str | None = None
    wire: Axis | None = None
    open_area: Axis | None = None


@dataclass(frozen=True, slots=True)
class Bounds:
    """Where there is anything to find: the catalogue's own edges and what filters imply."""

    lead: Stretch = EVERYWHERE
    wire: Stretch = EVERYWHERE
    wire_over_lead: float = inf
    """Most of (mean wire − mean aperture), in logarithms."""
    open_area: Stretch = EVERYWHERE

    def meet(self, other: "Bounds") -> "Bounds":
        """What lies in both."""
        return Bounds(
            _common(self.lead, other.lead),
            _common(self.wire, other.wire),
            min(self.wire_over_lead, other.wire_over_lead),
            _common(self.open_area, other.open_area),
        )

    @property
    def is_empty(self) -> bool:
        """True where nothing can lie inside."""
        return any(low > high for low, high in (self.lead, self.wire, self.open_area))


def _common(one: Stretch, other: Stretch) -> Stretch:
    return max(one[0], other[0]), min(one[1], other[1])


class Window(NamedTuple):
    """One band with the stretch of mean wire to look at; without bands, a stretch of the lead itself."""

    band: int
    low: float
    high: float


def layout(point: Point) -> Layout | None:
    """How to search *point*; None where it has no whole pair and no other figure to go by."""
    wire = _pair(point, "wire", WIRE_WEIGHT)
    opening = "pitch" if point.is_filter or _pair(point, "aperture", 1.0) is None else "aperture"
    lead = _pair(point, opening, APERTURE_WEIGHT)
    if lead is not None and _takes_whole(point, opening):
        return Layout(lead, f"{opening}_band", wire, _open_area(point) if opening == "aperture" else None)
    if point.is_filter and point.rating_um is not None:
        return Layout(Axis("ln_rating", log(point.rating_um), RATING_WEIGHT))
    alone = _open_area(point) or wire
    return Layout(alone) if alone is not None else None


def _open_area(point: Point) -> Axis | None:
    if point.is_filter or point.open_area_pct is None:
        return None
    return Axis("ln_open_area", log(point.open_area_pct), OPEN_AREA_WEIGHT)


def _takes_whole(point: Point, opening: str) -> bool:
    """Pitches count in both directions only where no aperture takes their place."""
    return point.is_filter or opening == "aperture" or point.warp_aperture_mm is point.weft_aperture_mm is None


def _pair(point: Point, quantity: str, weight: float) -> Axis | None:
    warp, weft = (getattr(point, f"{side}_{quantity}_mm") for side in ("warp", "weft"))
    if warp is None or weft is None:
        return None
    return Axis(f"ln_{quantity}_mean", (log(warp) + log(weft)) / 2, 2 * weight)


def implied(filters: Filters, plan: Layout) -> Bounds:
    """What *filters* say about the axes of *plan*; they are checked one by one all the same."""
    ranges = filters.ranges
    wire = _mean_stretch(ranges, "wire")
    opening = plan.lead.column.removeprefix("ln_").removesuffix("_mean")
    lead = _mean_stretch(ranges, opening) if plan.band else EVERYWHERE
    if plan.band != "aperture_band":
        return Bounds(lead, wire)
    least, most = ranges.get("open_area_pct", (None, None))
    low = -inf if least is None or least <= 0 else log(least) - SLACK
    high = inf if most is None else log(most) + SLACK if most > 0 else -inf
    return Bounds(lead, wire, most_wire_over_aperture(exp(low)), (low, high))


def _mean_stretch(ranges: Mapping[str, Range], quantity: str) -> Stretch:
    low = high = 0.0
    for side in ("warp", "weft"):
        least, most = ranges.get(f"{side}_{quantity}_mm", (None, None))
        if most is not None and most <= 0:
            return inf, -inf
        low += -inf if least is None or least <= 0 else log(least) / 2
        high += inf if most is None else log(most) / 2
    return low - SLACK, high + SLACK


def most_wire_over_aperture(open_area_pct: float) -> float:
    """Upper bound of ln(mean wire/mean aperture), geometric means, where the open area is at least so much.

    ln(open share) = −Σ ln(1 + exp t) over both directions, t = ln(wire/aperture). ln(1 + exp t) is convex, so
    the sum is at least twice its value at the mean t: t ≤ ln(exp(−½·ln share) − 1). Source: derived.
    """
    if open_area_pct <= 0:
        return inf
    excess = expm1(-log(open_area_pct / 100) / 2)
    return log(excess) + SLACK if excess > 0 else -inf


def least_radius(plan: Layout, bounds: Bounds) -> float:
    """No cloth inside *bounds* is nearer than this."""
    lead_gap = plan.lead.weight * _gap(plan.lead.asked, bounds.lead) ** 2
    if plan.wire is None:
        return sqrt(lead_gap + _open_gap(plan, bounds))
    straight = lead_gap + plan.wire.weight * _gap(plan.wire.asked, bounds.wire) ** 2
    over = max(0.0, plan.wire.asked - plan.lead.asked - bounds.wire_over_lead)
    slanted = over**2 / (1 / plan.lead.weight + 1 / plan.wire.weight)
    return sqrt(max(straight, slanted) + _open_gap(plan, bounds))


def _open_gap(plan: Layout, bounds: Bounds) -> float:
    """What the open area adds to d² at least."""
    return 0.0 if plan.open_area is None else plan.open_area.weight * _gap(plan.open_area.asked, bounds.open_area) ** 2


def largest_radius(plan: Layout, bounds: Bounds) -> float:
    """The windows of this radius hold everything inside *bounds*."""
    squared = plan.lead.weight * _reach(plan.lead.asked, bounds.lead) ** 2 + _open_gap(plan, bounds)
    if plan.wire is not None:
        squared += plan.wire.weight * _reach(plan.wire.asked, bounds.wire) ** 2
    return sqrt(squared) * (1 + SLACK) + SLACK


def windows(plan: Layout, bounds: Bounds, radius: float) -> list[Window]:
    """What to look at for everything within *radius*; *bounds* must be finite. May be empty."""
    squared = (radius * (1 + SLACK) + SLACK) ** 2 - _open_gap(plan, bounds)
    if squared < 0:
        return []
    low, high = _around(plan.lead, squared, bounds.lead)
    if plan.band is None:
        return [Window(0, low, high)] if low <= high else []
    bands = range(floor(low / BAND), ceil(high / BAND) + 1) if low <= high else range(0)
    return _bands(plan, bounds, squared, bands)


def _bands(plan: Layout, bounds: Bounds, squared: float, bands: range) -> list[Window]:
    """The windows that aren't empty. There may be a thousand, so the loop is kept lean."""
    lead, lead_weight = plan.lead.asked, plan.lead.weight
    wire, wire_weight = (plan.wire.asked, plan.wire.weight) if plan.wire else (0.0, inf)
    (least, most), over = bounds.wire, bounds.wire_over_lead + SLACK
    found = []
    for band in bands:
        start, end = band * BAND - SLACK, (band + 1) * BAND + SLACK
        gap = start - lead if start > lead else lead - end if end < lead else 0.0
        left = squared - lead_weight * gap * gap
        if left < 0:
            continue
        low, high = least, min(most, end + over)
        if plan.wire:
            half = sqrt(left / wire_weight) + SLACK
            low, high = max(low, wire - half), min(high, wire + half)
        if low <= high:
            found.append(Window(band, low, high))
    return found


def _around(axis: Axis, squared: float, bounds: Stretch) -> Stretch:
    half = sqrt(squared / axis.weight) + SLACK
    return max(bounds[0], axis.asked - half), min(bounds[1], axis.asked + half)


def _gap(asked: float, stretch: Stretch) -> float:
    """How far *asked* lies outside *stretch*; 0 inside."""
    return max(0.0, stretch[0] - asked, asked - stretch[1])


def _reach(asked: float, stretch: Stretch) -> float:
    return max(abs(stretch[0] - asked), abs(stretch[1] - asked))
