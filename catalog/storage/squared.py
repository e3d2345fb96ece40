"""d² of search.distance as an expression over the stored axes (see search.axes for the identities)."""

from math import log

from catalog.search.axes import mean_and_skew
from catalog.search.distance import APERTURE_WEIGHT, OPEN_AREA_WEIGHT, RATING_WEIGHT, WIRE_WEIGHT
from catalog.search.reader import Point

Pair = tuple[str, float, float | None, float | None]
"""Quantity, weight, warp and weft asked in mm."""


def squared_distance(point: Point) -> str:
    """The expression, on cloth `c`, for the better way round; '0' for a point that asks nothing.

    Where both directions are asked of each quantity, the two ways round differ only in the sign of one sum:
    Σ 2w·(skew ∓ asked)² = Σ 2w·(skew² + asked²) ∓ Σ 4w·asked·skew.
    """
    pairs = [pair for pair in _pairs(point) if pair[2] is not None or pair[3] is not None]
    alike = _alike(point)
    if all(warp is not None and weft is not None for _, _, warp, weft in pairs):
        parts, crossed = [alike], []
        for name, weight, warp, weft in pairs:
            whole, cross = _whole_pair(name, weight, warp or 0.0, weft or 0.0)
            parts.append(whole)
            crossed.append(cross)
        sign = f" - ABS({' + '.join(filter(None, crossed))})" if any(crossed) else ""
        return f"({' + '.join(filter(None, parts)) or '0.0'}{sign})"
    ways = [" + ".join([_one_way(pair, turned) for pair in pairs] + [alike or "0.0"]) for turned in (False, True)]
    return f"(CASE WHEN {ways[0]} <= {ways[1]} THEN {ways[0]} ELSE {ways[1]} END)"


def _pairs(point: Point) -> list[Pair]:
    found: list[Pair] = [("wire", WIRE_WEIGHT, point.warp_wire_mm, point.weft_wire_mm)]
    warp = None if point.is_filter else point.warp_aperture_mm
    weft = None if point.is_filter else point.weft_aperture_mm
    found.append(("aperture", APERTURE_WEIGHT, warp, weft))
    pitches = (point.warp_pitch_mm if warp is None else None, point.weft_pitch_mm if weft is None else None)
    found.append(("pitch", APERTURE_WEIGHT, *pitches))
    return found


def _alike(point: Point) -> str:
    """The figure that is the same both ways round."""
    if point.is_filter:
        return _term(RATING_WEIGHT, "c.ln_rating", log(point.rating_um)) if point.rating_um is not None else ""
    if point.open_area_pct is None:
        return ""
    return _term(OPEN_AREA_WEIGHT, "c.ln_open_area", log(point.open_area_pct))


def _whole_pair(name: str, weight: float, warp: float, weft: float) -> tuple[str, str]:
    """What is the same both ways round, and what changes its sign ('' where nothing does)."""
    mean, skew = mean_and_skew(warp, weft)
    column = f"c.ln_{name}_skew"
    common = f"{_term(2 * weight, f'c.ln_{name}_mean', mean)} + {2 * weight!r} * {column} * {column}"
    if skew == 0:
        return common, ""
    return f"{common} + {2 * weight * skew**2!r}", f"({4 * weight * skew!r}) * {column}"


def _one_way(pair: Pair, turned: bool) -> str:
    name, weight, warp, weft = pair
    mean, skew = f"c.ln_{name}_mean", f"c.ln_{name}_skew"
    found = {"warp": f"({mean} + {skew})", "weft": f"({mean} - {skew})"}
    asked = {"weft" if turned else "warp": warp, "warp" if turned else "weft": weft}
    return " + ".join(_term(weight, found[side], log(mm)) for side, mm in asked.items() if mm is not None)


def _term(weight: float, column: str, asked: float) -> str:
    delta = f"({column} - ({asked!r}))"
    return f"{weight!r} * {delta} * {delta}"
