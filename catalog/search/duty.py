"""What a cloth does in service: flow through it, load it bears, what passes; from figures, with method and range."""

import re
from collections.abc import Iterator
from functools import lru_cache

from catalog.cloth import Cloth
from catalog.construction import Construction, Weave, Wires
from catalog.errors import InputError
from catalog.physics import filter_cloth, strength
from catalog.physics.domain import OutOfDomainError
from catalog.physics.flow import FlowLoss, flow_loss, loss_ratio
from catalog.physics.flow_bed import Bed, dutch_bed, square_bed
from catalog.physics.fluid_properties import Fluid, air, water
from catalog.reference import alloys
from catalog.search.candidate import Finding
from catalog.search.comparison import Comparison
from catalog.target import Duty, Purpose

WAYS = ("warp", "weft")
FLOW_SOURCE = "Armour and Cannon 1968; round-wire screen: Blevins 1984; clean cloth only"
STRENGTH_SOURCE = "section times the tensile range of the alloy table; no load to design by"


NUMBER = r"(\d+(?:[.,]\d+)?(?:e-?\d+)?)"
VELOCITY = re.compile(rf"{NUMBER}\s*(m/s|cm/s|mm/s|ft/s)", re.IGNORECASE)
NAMED = re.compile(rf"\b(air|water)\b(?:\s*(?:at\s*)?(-?{NUMBER})\s*°?\s*c)?", re.IGNORECASE)
GIVEN = re.compile(rf"{NUMBER}\s*kg/m(?:3|³)\D{{1,3}}{NUMBER}\s*Pa[ .·]?s", re.IGNORECASE)
PER_SECOND = {"m/s": 1.0, "cm/s": 0.01, "mm/s": 0.001, "ft/s": 0.3048}
ROOM_C = 20.0


def parse_duty(text: str) -> Duty:
    """Read 'air 20 C 2 m/s', 'water 60C 5 cm/s' or '1.2 kg/m3 1.8e-5 Pa.s 1 m/s'. Raises InputError.

    A temperature that isn't written is taken as 20 °C, which the fluid's name then says.
    """
    speed = VELOCITY.search(text)
    if not speed:
        raise InputError(f"A flow needs a face velocity, as in 'air 20 C 2 m/s'; {text!r} has none.")
    velocity = _number(speed[1]) * PER_SECOND[speed[2].lower()]
    named, given = NAMED.search(text), GIVEN.search(text)
    if velocity <= 0 or not (named or given):
        raise InputError(f"A flow is written like 'air 20 C 2 m/s' or '1.2 kg/m3 1.8e-5 Pa.s 1 m/s', not {text!r}.")
    if named is None and given is not None:
        density, viscosity = _number(given[1]), _number(given[2])
        return Duty(Fluid(f"{density:g} kg/m³, {viscosity:g} Pa·s", density, viscosity), velocity)
    assert named is not None
    temperature = float(named[2].replace(",", ".")) if named[2] else ROOM_C
    return Duty((air if named[1].lower() == "air" else water)(temperature), velocity)


def _number(text: str) -> float:
    return float(text.replace(",", "."))


@lru_cache(maxsize=1)
def usual_duty() -> Duty:
    """Air at 20 °C and 1 m/s, where nothing was stated; marked as assumed."""
    return Duty(air(ROOM_C), 1.0, assumed=True)


def bed_of(made: Construction, pore_mm: float | None = None) -> Bed | None:
    """The cloth as a bed of wires. Filter cloth needs its pore; None where it isn't known or doesn't fit."""
    pitches = float(made.warp.pitch_mm), float(made.weft.pitch_mm)
    wires = float(made.warp.wire_mm), float(made.weft.wire_mm)
    try:
        if not made.is_filter:
            return square_bed(*pitches, *wires)
        return dutch_bed(made.weave.value, *pitches, *wires, pore_mm) if pore_mm else None
    except OutOfDomainError:
        return None


def pore_mm(cloth: Cloth) -> float | None:
    """The pore of filter cloth: its largest sphere, computed where it isn't stored; None for reverse Dutch."""
    sphere = cloth.figures.sphere_um
    if sphere is None and cloth.construction.weave is Weave.TWILLED_DUTCH:
        sphere = twilled_sphere_um(cloth.construction.warp, cloth.construction.weft)
    return None if sphere is None else sphere / 1000


@lru_cache(maxsize=256)
def twilled_sphere_um(warp: Wires, weft: Wires) -> float | None:
    """Largest sphere through twilled Dutch cloth, µm, at ±2 %; takes a second. None where it doesn't converge."""
    try:
        found = filter_cloth.sphere_twilled_dutch_um(
            float(warp.pitch_mm), float(weft.pitch_mm), float(warp.wire_mm), float(weft.wire_mm)
        )
    except OutOfDomainError:
        return None
    return found.sphere_um if found.converged else None


def loss_of(made: Construction, duty: Duty, pore: float | None = None) -> FlowLoss | None:
    """Loss coefficient and pressure drop; None where the pore of filter cloth isn't known."""
    bed = bed_of(made, pore)
    return None if bed is None else flow_loss(bed, duty.velocity_m_s, duty.fluid)


def loss_words(loss: FlowLoss) -> str:
    """'K 12.3, 7.4 Pa by Armour-Cannon, ±30 %'."""
    trust = f"±{loss.uncertainty_pct:g} %" if loss.uncertainty_pct else "outside the stated range"
    return f"K {loss.K:.3g}, {loss.pressure_drop_pa:.3g} Pa by {loss.method}, {trust}"


def breaking_loads(made: Construction) -> tuple[tuple[float, float], tuple[float, float]] | None:
    """Breaking load per width along warp and weft, kN/m, as ranges; None where no tensile range is on record."""
    alloy = alloys.alloy(made.alloy) if made.alloy else None
    if alloy is None or alloy.tensile_mpa is None:
        return None
    warp, weft = (
        strength.breaking_load_n_per_mm(float(s.pitch_mm), float(s.wire_mm), *alloy.tensile_mpa)
        for s in (made.warp, made.weft)
    )
    return warp, weft


def duty_findings(c: Comparison, duty: Duty | None) -> Iterator[Finding]:
    """What a change of cloth does to flow and strength, where that is the purpose; shown, not judged."""
    purposes = c.target.purposes
    asked = _asked_construction(c)
    if asked is None or c.made.is_filter:
        return
    if Purpose.FLOW in purposes:
        yield from _flow_finding(asked, c.made, duty or usual_duty())
    if Purpose.STRENGTH in purposes:
        yield from _strength_finding(asked, c.made)


def _asked_construction(c: Comparison) -> Construction | None:
    warp, weft = c.directions
    if not (warp.asked_pitch and warp.asked_wire and weft.asked_pitch and weft.asked_wire):
        return None
    if c.target.reading.is_filter:
        return None
    sides = Wires(warp.asked_pitch, warp.asked_wire), Wires(weft.asked_pitch, weft.asked_wire)
    return Construction(c.target.weave or Weave.PLAIN, *sides, c.target.reading.alloy)


def _flow_finding(asked: Construction, offered: Construction, duty: Duty) -> Iterator[Finding]:
    before, after = loss_of(asked, duty), loss_of(offered, duty)
    if before is None or after is None:
        return
    ratio = loss_ratio(before, after)
    text = (
        f"Pressure drop in {duty.words}: {after.pressure_drop_pa:.3g} Pa "
        f"against {before.pressure_drop_pa:.3g} Pa asked, "
        f"× {ratio:.2f} ({loss_words(after)})."
    )
    yield Finding("pressure drop", True, text, FLOW_SOURCE)


def _strength_finding(asked: Construction, offered: Construction) -> Iterator[Finding]:
    yield Finding("stiffness", True, _stiffness_words(asked, offered), "d⁴/p, for comparing cloths only")
    before, after = breaking_loads(asked), breaking_loads(offered)
    if after is None:
        text = f"No tensile range is on record for {offered.alloy or 'this alloy'}: only the sections are compared."
        yield Finding("breaking load", True, text, STRENGTH_SOURCE)
        return
    words = "; ".join(
        f"{name} {low:.3g} to {high:.3g} kN/m" for name, (low, high) in zip(("warp", "weft"), after, strict=True)
    )
    said = ""
    if before is not None:
        asked_words = zip(("warp", "weft"), before, strict=True)
        said = "; asked: " + "; ".join(f"{name} {low:.3g} to {high:.3g} kN/m" for name, (low, high) in asked_words)
    yield Finding("breaking load", True, f"Breaking load per width: {words}{said}.", STRENGTH_SOURCE)


def _stiffness_words(asked: Construction, offered: Construction) -> str:
    """How section and stiffness change, each way."""
    said = []
    for name, one, other in zip(WAYS, (asked.warp, asked.weft), (offered.warp, offered.weft), strict=True):
        sides = float(one.pitch_mm), float(one.wire_mm), float(other.pitch_mm), float(other.wire_mm)
        said.append(f"{name} × {strength.section_ratio(*sides):.2f} and × {strength.stiffness_ratio(*sides):.2f}")
    return f"Metal section and stiffness index against the asked: {'; '.join(said)}."
