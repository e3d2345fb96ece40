"""A cloth set against a target, direction by direction, in exact millimetres: facts, no judgement."""

from dataclasses import dataclass
from fractions import Fraction

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
    """Warp or weft: what is asked, what is found, what may differ. mm."""

    name: str
    asked_aperture: Fraction | None
    asked_wire: Fraction | None
    asked_pitch: Fraction | None
    found: Wires
    tolerance: Fraction | None
    aperture_rounding: Fraction
    """Half the last written unit, within the rule for 'same'."""
    wire_rounding: Fraction

    @property
    def aperture_off(self) -> Fraction | None:
        """Found less asked."""
        return None if self.asked_aperture is None else self.found.aperture_mm - self.asked_aperture

    @property
    def wire_off(self) -> Fraction | None:
        """Found less asked."""
        return None if self.asked_wire is None else self.found.wire_mm - self.asked_wire

    @property
    def section(self) -> Fraction | None:
        """Offered d²/p over asked d²/p."""
        if self.asked_wire is None or self.asked_pitch is None:
            return None
        return (self.found.wire_mm**2 / self.found.pitch_mm) / (self.asked_wire**2 / self.asked_pitch)

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

    @property
    def section(self) -> Fraction | None:
        """The weaker direction's section ratio."""
        ratios = [d.section for d in self.directions if d.section is not None]
        return min(ratios) if ratios else None

    @property
    def asked_open(self) -> Fraction | None:
        """Open area that follows from the asked apertures and pitches, as a share; None where not asked."""
        return _open([(d.asked_aperture, d.asked_pitch) for d in self.directions])

    @property
    def found_open(self) -> Fraction:
        """Open area of the cloth, as a share."""
        share = _open([(d.found.aperture_mm, d.found.pitch_mm) for d in self.directions])
        return share if share is not None else ZERO

    @property
    def open_points(self) -> Fraction | None:
        """Found less asked open area, in points."""
        asked = self.asked_open
        return None if asked is None else (self.found_open - asked) * 100

    @property
    def asks_wire(self) -> bool:
        """True where wires were asked both ways."""
        return all(d.asked_wire is not None for d in self.directions)

    @property
    def asks_aperture(self) -> bool:
        """True where apertures were asked both ways."""
        return all(d.asked_aperture is not None for d in self.directions)


def _open(pairs: list[tuple[Fraction | None, Fraction | None]]) -> Fraction | None:
    share = Fraction(1)
    for aperture, pitch in pairs:
        if aperture is None or pitch is None:
            return None
        share *= aperture / pitch
    return share


def _direction(name: str, side: Side, found: Wires, tolerance: float | None, rules: HouseRules) -> Direction:
    aperture = side.aperture.mm if side.aperture else None
    wire = side.wire.mm if side.wire else None
    return Direction(
        name=name,
        asked_aperture=aperture,
        asked_wire=wire,
        asked_pitch=side.pitch.mm if side.pitch else None,
        found=found,
        tolerance=None if tolerance is None else Fraction(tolerance).limit_denominator(10**9),
        aperture_rounding=min(_rounding(side, "aperture"), (aperture or ZERO) * rules.same_aperture),
        wire_rounding=min(_rounding(side, "wire"), (wire or ZERO) * rules.same_wire),
    )


def compare(target: Target, cloth: Cloth, turned: bool, rules: HouseRules) -> Comparison:
    """Set *cloth* against *target*, warp to warp, or warp to weft where it is offered *turned*."""
    made = cloth.construction.turned() if turned else cloth.construction
    allowed = target.tolerance
    warp = _direction("warp", target.warp, made.warp, allowed.warp_mm if allowed else None, rules)
    weft = _direction("weft", target.weft, made.weft, allowed.weft_mm if allowed else None, rules)
    return Comparison(target, cloth, made, turned, (warp, weft))
