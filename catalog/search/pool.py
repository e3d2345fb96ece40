"""Which cloths are judged: the nearest, and every one in the box in which a near cloth can lie."""

from collections.abc import Mapping, Sequence
from typing import NamedTuple

from catalog.callout.reading import Side
from catalog.cloth import Cloth
from catalog.reference import alloys
from catalog.search.reader import Filters, Point, Range, Reader
from catalog.search.rules import HouseRules
from catalog.target import Target

LEAST_POOL = 50
Found = tuple[Cloth, float | None, bool]
RANGE_OF_LIMIT = {
    "aperture_mm": ("warp_aperture_mm", "weft_aperture_mm"),
    "pitch_mm": ("warp_pitch_mm", "weft_pitch_mm"),
    "wire_mm": ("warp_wire_mm", "weft_wire_mm"),
    "open_area_pct": ("open_area_pct",),
    "mass_kg_m2": ("mass_kg_m2",),
}


def point_of(target: Target) -> Point:
    """Where *target* lies in the design's distance."""
    is_filter = target.reading.is_filter or (target.rating is not None and target.warp.aperture is None)
    warp, weft = (_figures_of(side, by_pitch=is_filter) for side in (target.warp, target.weft))
    point = Point(
        is_filter=is_filter,
        warp_aperture_mm=warp.aperture,
        weft_aperture_mm=weft.aperture,
        warp_pitch_mm=warp.pitch,
        weft_pitch_mm=weft.pitch,
        warp_wire_mm=warp.wire,
        weft_wire_mm=weft.wire,
        open_area_pct=None if is_filter else _open_area(target),
        rating_um=target.rating.um if is_filter and target.rating else None,
    )
    return _limits_point(target) if point == Point() else point


class _Figures(NamedTuple):
    aperture: float | None
    pitch: float | None
    wire: float | None


def _figures_of(side: Side, by_pitch: bool) -> _Figures:
    """Aperture where there is one and it counts, else the pitch; and the wire. mm."""
    aperture = float(side.aperture.mm) if side.aperture and not by_pitch else None
    pitch = float(side.pitch.mm) if side.pitch and aperture is None else None
    return _Figures(aperture, pitch, float(side.wire.mm) if side.wire else None)


def _open_area(target: Target) -> float | None:
    share = 100.0
    for side in (target.warp, target.weft):
        if side.aperture is None or side.pitch is None:
            return None
        share *= float(side.aperture.mm / side.pitch.mm)
    return share


def _limits_point(target: Target) -> Point:
    """The corner of stated limits, so that the near misses are those nearest to them."""
    corner = {key: low if low is not None else high for key, (low, high) in target.limits.items()}
    count = corner.get("count_per_in")
    pitch = corner.get("pitch_mm") or (25.4 / count if count else None)
    aperture, wire = corner.get("aperture_mm"), corner.get("wire_mm")
    pitch = None if aperture is not None else pitch
    return Point(
        warp_aperture_mm=aperture,
        weft_aperture_mm=aperture,
        warp_pitch_mm=pitch,
        weft_pitch_mm=pitch,
        warp_wire_mm=wire,
        weft_wire_mm=wire,
        open_area_pct=corner.get("open_area_pct"),
    )


def box_of(target: Target, rules: HouseRules) -> Mapping[str, Range]:
    """The bounds within which every same, interchangeable and near cloth lies; empty where there are none."""
    ranges: dict[str, Range] = {}
    if target.reading.is_filter:
        for name, side in (("warp", target.warp), ("weft", target.weft)):
            if side.pitch:
                pitch, share = float(side.pitch.mm), float(rules.filter_make)
                ranges[f"{name}_pitch_mm"] = (pitch * (1 - share), pitch * (1 + share))
        return ranges
    allowed = target.tolerance
    for name, side in (("warp", target.warp), ("weft", target.weft)):
        if side.aperture is not None and allowed is not None:
            aperture = float(side.aperture.mm)
            reach = max(aperture * float(rules.harmless), 2 * getattr(allowed, f"{name}_mm"))
            ranges[f"{name}_aperture_mm"] = (max(0.0, aperture - reach), aperture + reach)
    return ranges


def gather(target: Target, reader: Reader, limit: int, in_stock: bool, rules: HouseRules) -> Sequence[Found]:
    """Fetch the pool of *target*: each cloth once, with its distance and which way round it lies."""
    point = point_of(target)
    filters = Filters(in_stock=in_stock)
    found: dict[str, Found] = {}
    nearest = reader.nearest(point, max(LEAST_POOL, limit), filters) if point != Point() else ()
    ranges = box_of(target, rules)
    boxed = reader.box(point, ranges, filters) if ranges else ()
    for cloth, distance, turned in (*nearest, *boxed):
        found.setdefault(cloth.id, (cloth, distance, turned))
    if target.limits and not ranges:
        for cloth in reader.select(_within_limits(target, in_stock), "id", max(LEAST_POOL, limit)):
            found.setdefault(cloth.id, (cloth, None, False))
    return list(found.values())


def _within_limits(target: Target, in_stock: bool) -> Filters:
    """What lies inside stated limits and may pass the alloy gate: of these any number is as good as another."""
    limits = dict(target.limits)
    if "count_per_in" in limits:
        low, high = limits.pop("count_per_in")
        limits["pitch_mm"] = (25.4 / high if high else None, 25.4 / low if low else None)
    ranges = {name: bounds for key, bounds in limits.items() for name in RANGE_OF_LIMIT.get(key, ())}
    return Filters(ranges=ranges, in_stock=in_stock, alloys=_passing_alloys(target))


def _passing_alloys(target: Target) -> frozenset[str]:
    asked = target.reading.alloy if target.alloy_rule == "same" else target.alloy_rule
    if asked is None or asked == "any" or alloys.alloy(asked) is None:
        return frozenset()
    return frozenset(a.id for a in alloys.alloys() if alloys.gate(asked, a.id).outcome != "blocked")
