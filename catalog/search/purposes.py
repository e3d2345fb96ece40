"""Which way a deviation hurts, purpose by purpose: each a small function from facts to how it stands."""

from collections.abc import Callable, Mapping
from dataclasses import dataclass
from enum import IntEnum
from fractions import Fraction

from catalog.search.comparison import Comparison, Direction
from catalog.search.rules import HouseRules
from catalog.target import Purpose

HURTS_LARGER = (Purpose.RETAIN, Purpose.GUARD)
BEYOND_T_ONLY = (Purpose.FLOW, Purpose.STRENGTH)
HURTS_EITHER = (Purpose.SIZE, Purpose.FLOW, Purpose.STRENGTH)


class Reach(IntEnum):
    """Where an aperture lies against its tolerance T, from best to worst."""

    WITHIN = 0
    HARMLESS = 1
    """Beyond T, to the side that doesn't hurt, near enough."""
    RISK = 2
    """Beyond T, to the side that hurts, at most 2T."""
    BEYOND = 3


class Stand(IntEnum):
    """How what the purpose is about stands against its own line."""

    MET = 0
    SHORT = 1
    FAILED = 2
    UNKNOWN = 3


@dataclass(frozen=True, slots=True)
class Aspect:
    """What a purpose is about besides the aperture."""

    stand: Stand
    about: str = ""
    """'open area', 'section' or '' where it is about the aperture alone."""
    ratio: Fraction | None = None


def harm(purpose: Purpose, off: Fraction) -> bool:
    """True where an aperture off by *off* (found less asked) lies to the side that hurts."""
    if purpose in HURTS_EITHER:
        return off != 0
    return off > 0 if purpose in HURTS_LARGER else off < 0


def reach(purpose: Purpose, d: Direction, rules: HouseRules) -> Reach:
    """Where one direction's aperture lies. Needs an asked aperture and a tolerance."""
    assert d.aperture_off is not None
    assert d.tolerance is not None
    assert d.asked_aperture is not None
    off = abs(d.aperture_off)
    if off <= d.tolerance:
        return Reach.WITHIN
    if harm(purpose, d.aperture_off):
        return Reach.RISK if off <= 2 * d.tolerance else Reach.BEYOND
    near = max(rules.harmless * d.asked_aperture, 2 * d.tolerance)
    return Reach.HARMLESS if off <= near else Reach.BEYOND


def worst_reach(purpose: Purpose, c: Comparison, rules: HouseRules) -> Reach:
    """The worse direction counts; for a sphere the short side is judged and the long side may lie within 2T."""
    by_side = [reach(purpose, d, rules) for d in c.directions]
    spheres = c.target.particle_is_sphere and purpose in (Purpose.RETAIN, Purpose.PASS)
    if not spheres or c.directions[0].asked_aperture == c.directions[1].asked_aperture:
        return max(by_side)
    short = min((0, 1), key=lambda i: c.directions[i].asked_aperture or Fraction(0))
    long = c.directions[1 - short]
    assert long.aperture_off is not None
    assert long.tolerance is not None
    keeps = abs(long.aperture_off) <= 2 * long.tolerance
    return by_side[short] if keeps else max(by_side[short], Reach.HARMLESS)


def is_to_harm_side(purpose: Purpose, c: Comparison) -> bool:
    """True where an aperture lies to the side that hurts by more than rounding.

    Flow and strength mind the aperture only beyond T, so within it nothing is to be marked for them.
    """
    return purpose not in BEYOND_T_ONLY and any(
        d.aperture_off is not None and harm(purpose, d.aperture_off) and abs(d.aperture_off) > d.aperture_rounding
        for d in c.directions
    )


def _against(ratio: Fraction | None, lines: tuple[Fraction, Fraction], about: str) -> Aspect:
    if ratio is None:
        return Aspect(Stand.UNKNOWN, about)
    stand = Stand.MET if ratio >= lines[0] else Stand.SHORT if ratio >= lines[1] else Stand.FAILED
    return Aspect(stand, about, ratio)


def about_open_area(c: Comparison, rules: HouseRules) -> Aspect:
    """Flow: offered to asked open area."""
    asked = c.asked_open
    return _against(None if not asked else c.found_open / asked, rules.flow, "open area")


def about_section(c: Comparison, rules: HouseRules) -> Aspect:
    """Strength: offered to asked section d²/p, the weaker direction."""
    return _against(c.section, rules.strength, "section")


def about_aperture(c: Comparison, rules: HouseRules) -> Aspect:
    """Retaining, passing and sizing are about the aperture, which is judged by its reach."""
    return Aspect(Stand.MET)


ABOUT: Mapping[Purpose, Callable[[Comparison, HouseRules], Aspect]] = {
    Purpose.RETAIN: about_aperture,
    Purpose.PASS: about_aperture,
    Purpose.SIZE: about_aperture,
    Purpose.GUARD: about_aperture,
    Purpose.FLOW: about_open_area,
    Purpose.STRENGTH: about_section,
}
