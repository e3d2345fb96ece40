"""Differences, property by property: asked, found, off by, inside or not."""

from collections.abc import Iterator
from fractions import Fraction
from functools import lru_cache

from catalog.construction import Construction, Weave, Wires
from catalog.figures import figures
from catalog.reference import alloys
from catalog.search.candidate import Deviation
from catalog.search.comparison import Comparison, Direction
from catalog.search.rules import HouseRules


def deviations(c: Comparison, rules: HouseRules) -> tuple[Deviation, ...]:
    """Every deviation of a cloth. A figure that wasn't asked is shown and not judged (inside is None)."""
    found = [d for direction in c.directions for d in _of_direction(direction, c, rules)]
    if not c.made.is_filter:
        found.append(_open_area(c, rules))
    found.append(_section(c, rules))
    found.append(_mass(c))
    return tuple(found)


def _of_direction(d: Direction, c: Comparison, rules: HouseRules) -> Iterator[Deviation]:
    if not c.made.is_filter:
        limit = None if d.tolerance is None or not d.asked_aperture else d.tolerance / d.asked_aperture * 100
        yield _relative(f"{d.name}.aperture", d.asked_aperture, d.found.aperture_mm, limit)
    share = rules.filter_make if c.made.is_filter else rules.wire
    yield _relative(f"{d.name}.wire", d.asked_wire, d.found.wire_mm, share * 100)
    yield _relative(f"{d.name}.pitch", d.asked_pitch, d.found.pitch_mm, None)


def _relative(name: str, asked: Fraction | None, found: Fraction, limit: Fraction | None) -> Deviation:
    if not asked:
        return Deviation(name, None, float(found), None, "%")
    off = (found - asked) / asked * 100
    inside = None if limit is None else abs(off) <= limit
    return Deviation(name, float(asked), float(found), float(off), "%", _float(limit), inside)


def _float(value: Fraction | None) -> float | None:
    return None if value is None else float(value)


def _open_area(c: Comparison, rules: HouseRules) -> Deviation:
    asked, found, off = c.asked_open, float(c.found_open * 100), c.open_points
    if asked is None or off is None:
        return Deviation("open_area", None, found, None, "points")
    limit = rules.open_area_points
    return Deviation("open_area", float(asked * 100), found, float(off), "points", float(limit), abs(off) <= limit)


def _section(c: Comparison, rules: HouseRules) -> Deviation:
    if c.section is None:
        return Deviation("section", None, None, None, "%")
    off = float((c.section - 1) * 100)
    limit = float((rules.section_least - 1) * 100)
    return Deviation("section", 100.0, float(c.section * 100), off, "%", limit, c.section >= rules.section_least)


def _mass(c: Comparison) -> Deviation:
    found = c.cloth.figures.mass_kg_m2
    asked = asked_mass_kg_m2(c)
    if asked is None or found is None:
        return Deviation("mass", asked, found, None, "%")
    return Deviation("mass", asked, found, (found / asked - 1) * 100, "%")


def asked_mass_kg_m2(c: Comparison) -> float | None:
    """Mass per area of what is asked, kg/m²; in the offered alloy's density where no known alloy was asked."""
    alloy = c.target.reading.alloy
    density = alloys.density_kg_m3(alloy) if alloy else None
    if density is None and c.made.alloy:
        density = alloys.density_kg_m3(c.made.alloy)
    warp, weft = c.directions
    if not (warp.asked_pitch and warp.asked_wire and weft.asked_pitch and weft.asked_wire) or density is None:
        return None
    wires = Wires(warp.asked_pitch, warp.asked_wire), Wires(weft.asked_pitch, weft.asked_wire)
    return _mass_of(c.target.weave or Weave.PLAIN, *wires, density)


@lru_cache(maxsize=64)
def _mass_of(weave: Weave, warp: Wires, weft: Wires, density_kg_m3: float) -> float | None:
    return figures(Construction(weave, warp, weft), density_kg_m3).mass_kg_m2
