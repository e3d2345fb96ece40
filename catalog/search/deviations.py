"""Differences, property by property: asked, found, off by, inside or not."""

from dataclasses import replace
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
    warp, weft = c.directions
    found = _of_direction(warp, c, rules)
    is_alike = replace(warp, name="weft") == weft
    found += [replace(d, name=f"weft{d.name[4:]}") for d in found] if is_alike else _of_direction(weft, c, rules)
    if not c.made.is_filter:
        found.append(_open_area(c, rules))
    found.append(_section(c, rules))
    found.append(_mass(c))
    return tuple(found)


def _of_direction(d: Direction, c: Comparison, rules: HouseRules) -> list[Deviation]:
    found = []
    if not c.made.is_filter:
        found.append(
            _relative(f"{d.name}.aperture", d.asked_aperture, d.found.aperture_mm, d.aperture_off, d.tolerance)
        )
    share = rules.filter_make if c.made.is_filter else rules.wire
    most = None if d.asked_wire is None else share * d.asked_wire
    found.append(_relative(f"{d.name}.wire", d.asked_wire, d.found.wire_mm, d.wire_off, most))
    pitch_off = None if d.asked_pitch is None else d.found.pitch_mm - d.asked_pitch
    found.append(_relative(f"{d.name}.pitch", d.asked_pitch, d.found.pitch_mm, pitch_off, None))
    return found


def _relative(
    name: str, asked: Fraction | None, found: Fraction, off: Fraction | None, most: Fraction | None
) -> Deviation:
    """In percent of the asked for the eye; inside or not by the exact figures, *off* and *most* in mm."""
    if not asked or off is None:
        return Deviation(name, None, float(found), None, "%")
    base = float(asked)
    limit = None if most is None else float(most) / base * 100
    inside = None if most is None else abs(off) <= most
    return Deviation(name, base, float(found), float(off) / base * 100, "%", limit, inside)


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
