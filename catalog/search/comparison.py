"""A cloth set against a target, direction by direction, in exact millimetres: facts, no judgement."""

from dataclasses import dataclass, replace
from fractions import Fraction
from typing import NamedTuple

from catalog.callout.reading import Side
from catalog.cloth import Cloth
from catalog.construction import Construction, Wires
from catalog.search.rules import HouseRules
from catalog.target import Target

ZERO = Fraction(0)


def _rounding(side: Side, name: str) -> Fraction:
    """What the spelling of a figure leaves open, mm; a figure completed by arithmetic carries its sources'."""
    if name == "aperture" and side.aperture and side.pitch and side.wire and not side.aperture.written:
        return side.pitch.rounding_mm + side.wire.rounding_mm
    length = side.aperture if name == "aperture" else side.wire
    return length.rounding_mm if length else ZERO


@dataclass(frozen=True, slots=True)
class Direction:
    """Warp or weft: what is asked, what is found, what may differ. mm, exact."""

    name: str
    asked_aperture: Fraction | None
    asked_wire: Fraction | None
    asked_pitch: Fraction | None
    found: Wires
    tolerance: Fraction | None
    aperture_rounding: Fraction
    """Half the last written unit, within the rule for 'same'."""
    wire_rounding: Fraction
    aperture_off: Fraction | None
    """Found less asked."""
    wire_off: Fraction | None
    """Found less asked."""
    section: Fraction | None
    """Offered d²/p over asked d²/p."""

    @property
    def is_same(self) -> bool:
        """Aperture and wire both asked and equal to rounding."""
        if self.aperture_off is None or self.wire_off is None:
            return False
        return abs(self.aperture_off) <= self.aperture_rounding and abs(self.wire_off) <= self.wire_rounding


@dataclass(frozen=True, slots=True)
class Comparison:
    """Everything that judgement needs to know of a cloth and a target."""

    target: Target
    cloth: Cloth
    made: Construction
    """The cloth's construction, turned where it is offered turned."""
    turned: bool
    directions: tuple[Direction, Direction]
    section: Fraction | None
    """The weaker direction's section ratio."""
    asked_open: Fraction | None
    """Open area that follows from the asked apertures and pitches, as a share; None where not asked."""
    found_open: Fraction
    """Open area of the cloth, as a share."""
    open_points: Fraction | None
    """Found less asked open area, in points."""

    @property
    def asks_wire(self) -> bool:
        """True where wires were asked both ways."""
        return all(d.asked_wire is not None for d in self.directions)

    @property
    def asks_aperture(self) -> bool:
        """True where apertures were asked both ways."""
        return all(d.asked_aperture is not None for d in self.directions)


Pair = tuple[Fraction | None, Fraction | None]


def _open(warp: Pair, weft: Pair) -> Fraction | None:
    """Open share of (aperture, pitch) both ways."""
    if warp[0] is None or warp[1] is None or weft[0] is None or weft[1] is None:
        return None
    share = warp[0] / warp[1]
    return share**2 if warp == weft else share * (weft[0] / weft[1])


@dataclass(frozen=True, slots=True)
class _Asked:
    """One side of the target, worked out once for all cloths."""

    aperture: Fraction | None
    wire: Fraction | None
    pitch: Fraction | None
    section: Fraction | None
    tolerance: Fraction | None
    aperture_rounding: Fraction
    wire_rounding: Fraction


def _asked(side: Side, tolerance: float | None, rules: HouseRules) -> _Asked:
    aperture = side.aperture.mm if side.aperture else None
    wire = side.wire.mm if side.wire else None
    pitch = side.pitch.mm if side.pitch else None
    return _Asked(
        aperture,
        wire,
        pitch,
        wire**2 / pitch if wire is not None and pitch else None,
        None if tolerance is None else Fraction(round(tolerance * 1e9), 10**9),
        min(_rounding(side, "aperture"), (aperture or ZERO) * rules.same_aperture),
        min(_rounding(side, "wire"), (wire or ZERO) * rules.same_wire),
    )


class _Sides(NamedTuple):
    """What a target asks, worked out once for all the cloths that are set against it."""

    target: Target
    rules: HouseRules
    warp: _Asked
    weft: _Asked
    alike: bool
    open_share: Fraction | None


_newest: list[_Sides] = []
"""The sides of the newest target: a pool is judged target by target. Only ever replaced whole."""


def _asked_of(target: Target, rules: HouseRules) -> _Sides:
    known = _newest[-1] if _newest else None
    if known is not None and known.target is target and known.rules is rules:
        return known
    allowed = target.tolerance
    warp = _asked(target.warp, allowed.warp_mm if allowed else None, rules)
    weft = _asked(target.weft, allowed.weft_mm if allowed else None, rules)
    open_share = _open((warp.aperture, warp.pitch), (weft.aperture, weft.pitch)) or _stated_open(target)
    sides = _Sides(target, rules, warp, weft, warp == weft, open_share)
    _newest[:] = [sides]
    return sides


def _stated_open(target: Target) -> Fraction | None:
    """The open area that the text itself states, as a share; where figures give one, theirs counts."""
    stated = target.reading.open_area_pct
    if stated is None or "open_area_pct" in target.reading.derived:
        return None
    return Fraction(round(stated * 1e6), 10**8)


def _direction(name: str, asked: _Asked, found: Wires) -> Direction:
    section = None if not asked.section else found.wire_mm**2 / found.pitch_mm / asked.section
    return Direction(
        name,
        asked.aperture,
        asked.wire,
        asked.pitch,
        found,
        asked.tolerance,
        asked.aperture_rounding,
        asked.wire_rounding,
        None if asked.aperture is None else found.aperture_mm - asked.aperture,
        None if asked.wire is None else found.wire_mm - asked.wire,
        section,
    )


def compare(target: Target, cloth: Cloth, turned: bool, rules: HouseRules) -> Comparison:
    """Set *cloth* against *target*, warp to warp, or warp to weft where it is offered *turned*."""
    made = cloth.construction.turned() if turned else cloth.construction
    sides = _asked_of(target, rules)
    warp = _direction("warp", sides.warp, made.warp)
    alike = sides.alike and made.warp == made.weft
    weft = replace(warp, name="weft") if alike else _direction("weft", sides.weft, made.weft)
    sections = [d.section for d in (warp, weft) if d.section is not None]
    asked_open = sides.open_share
    found_open = _open((made.warp.aperture_mm, made.warp.pitch_mm), (made.weft.aperture_mm, made.weft.pitch_mm)) or ZERO
    points = None if asked_open is None else (found_open - asked_open) * 100
    section = min(sections) if sections else None
    return Comparison(target, cloth, made, turned, (warp, weft), section, asked_open, found_open, points)
