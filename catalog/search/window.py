"""Where the cloths within a radius of a point can lie: windows on the axes of search.axes. No SQL.

With a radius r, a pair of figures of weight w each lies within 2w·Δmean² ≤ r² (see search.axes; the rest of
d² is never negative). Bands of the leading mean are cut out one by one, each with the stretch of mean wire
that its remaining distance leaves, so that together they hug the ellipse around the point.

Every cloth nearer than r is inside; what else is inside is sorted out by its distance.
"""

from collections.abc import Mapping
from dataclasses import dataclass
from math import ceil, expm1, floor, inf, log, sqrt

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


@dataclass(frozen=True, slots=True)
class Bounds:
    """Where there is anything to find: the catalogue's own edges and what filters imply."""

    lead: Stretch = EVERYWHERE
    wire: Stretch = EVERYWHERE
    wire_over_lead: float = inf
    """Most of (mean wire − mean aperture), in logarithms."""

    def meet(self, other: "Bounds") -> "Bounds":
        """What lies in both."""
        return Bounds(
            (max(self.lead[0], other.lead[0]), min(self.lead[1], other.lead[1])),
            (max(self.wire[0], other.wire[0]), min(self.wire[1], other.wire[1])),
            min(self.wire_over_lead, other.wire_over_lead),
        )

    @property
    def is_empty(self) -> bool:
        """True where nothing can lie inside."""
        return self.lead[0] > self.lead[1] or self.wire[0] > self.wire[1]


@dataclass(frozen=True, slots=True)
class Window:
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
        return Layout(lead, f"{opening}_band", wire)
    if point.is_filter and point.rating_um is not None:
        return Layout(Axis("ln_rating", log(point.rating_um), RATING_WEIGHT))
    if not point.is_filter and point.open_area_pct is not None:
        return Layout(Axis("ln_open_area", log(point.open_area_pct), OPEN_AREA_WEIGHT))
    return Layout(wire) if wire is not None else None


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
    least_open = ranges.get("open_area_pct", (None, None))[0]
    if plan.band != "aperture_band" or least_open is None:
        return Bounds(lead, wire)
    return Bounds(lead, wire, most_wire_over_aperture(least_open))


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
        return sqrt(lead_gap)
    straight = lead_gap + plan.wire.weight * _gap(plan.wire.asked, bounds.wire) ** 2
    over = max(0.0, plan.wire.asked - plan.lead.asked - bounds.wire_over_lead)
    slanted = over**2 / (1 / plan.lead.weight + 1 / plan.wire.weight) if over < inf else inf
    return sqrt(max(straight, slanted))


def largest_radius(plan: Layout, bounds: Bounds) -> float:
    """The windows of this radius hold everything inside *bounds*."""
    squared = plan.lead.weight * _reach(plan.lead.asked, bounds.lead) ** 2
    if plan.wire is not None:
        squared += plan.wire.weight * _reach(plan.wire.asked, bounds.wire) ** 2
    return sqrt(squared) * (1 + SLACK) + SLACK


def windows(plan: Layout, bounds: Bounds, radius: float) -> list[Window]:
    """What to look at for everything within *radius*; *bounds* must be finite. May be empty."""
    radius = radius * (1 + SLACK) + SLACK
    low, high = _around(plan.lead, radius**2, bounds.lead)
    if plan.band is None:
        return [Window(0, low, high)] if low <= high else []
    bands = range(floor(low / BAND), ceil(high / BAND) + 1) if low <= high else range(0)
    cut = (_window(plan, bounds, radius**2, band) for band in bands)
    return [window for window in cut if window.low <= window.high]


def _window(plan: Layout, bounds: Bounds, squared: float, band: int) -> Window:
    stretch = (band * BAND - SLACK, (band + 1) * BAND + SLACK)
    left = squared - plan.lead.weight * _gap(plan.lead.asked, stretch) ** 2
    if left < 0:
        return Window(band, inf, -inf)
    most = min(bounds.wire[1], stretch[1] + bounds.wire_over_lead)
    around = bounds.wire if plan.wire is None else _around(plan.wire, left, bounds.wire)
    return Window(band, around[0], min(around[1], most))


def _around(axis: Axis, squared: float, bounds: Stretch) -> Stretch:
    half = sqrt(squared / axis.weight) + SLACK
    return max(bounds[0], axis.asked - half), min(bounds[1], axis.asked + half)


def _gap(asked: float, stretch: Stretch) -> float:
    """How far *asked* lies outside *stretch*; 0 inside."""
    return max(0.0, stretch[0] - asked, asked - stretch[1])


def _reach(asked: float, stretch: Stretch) -> float:
    return max(abs(stretch[0] - asked), abs(stretch[1] - asked))
