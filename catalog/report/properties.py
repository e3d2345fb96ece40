"""A cloth in service as named figures, each with its method: sieving, flow, strength, coating, mass, guards."""

from collections.abc import Iterator
from dataclasses import dataclass, field
from typing import Any

from catalog.cloth import Cloth
from catalog.construction import Weave
from catalog.physics import filter_cloth, mass, sieving, strength
from catalog.physics.coating import coated
from catalog.physics.domain import OutOfDomainError
from catalog.reference import alloys, safety, sieves
from catalog.search.duty import breaking_loads, loss_of, loss_words, pore_mm
from catalog.target import Duty

ZINC_WORDS = {True: "after weaving", False: "before weaving"}


@dataclass(frozen=True, slots=True)
class Service:
    """What is known of the service; None leaves the figures out that need it. mm, %."""

    duty: Duty | None = None
    particle_mm: float | None = None
    coating_mm: float | None = None
    coated_after_weaving: bool = True
    area_m2: float | None = None
    mass_spread_pct: float = 5.0
    oversize_mm: float | None = None


@dataclass(frozen=True, slots=True)
class Property:
    """One line: what, how much in words, by which method, and the bare numbers."""

    name: str
    words: str
    source: str
    values: dict[str, Any] = field(default_factory=dict)


def properties(cloth: Cloth, service: Service) -> list[Property]:
    """Every figure that *service* and the alloy table allow."""
    found: list[Property] = []
    for group in (_sieving, _particle, _flow, _strength, _coating, _mass, _guard, _sphere, _magnet):
        found += group(cloth, service)
    return found


def _sieving(cloth: Cloth, service: Service) -> Iterator[Property]:
    made = cloth.construction
    if not made.is_square:
        return
    aperture = made.warp.aperture_mm
    near = sieves.nearest(aperture, 2)
    said = ", ".join(f"{_sieve_words(s)} {float(aperture / s.opening_mm - 1) * 100:+.1f} %" for s in near)
    names = [{"opening_mm": float(s.opening_mm), "e11": s.e11_name} for s in near]
    yield Property("nearest sieves", said.replace("-", "−"), sieves.SOURCE, {"sieves": names})
    edition = "ISO 3310-1:2016" if cloth.standard and "3310" in cloth.standard else None
    if edition:
        um = float(aperture) * 1000
        y, largest = sieving.average_tolerance_um(um, edition), sieving.largest_opening_um(um, edition)
        e11 = sieving.largest_opening_um(um, "E11-17")
        words = f"average ±{y:.1f} µm, one opening up to {largest:.0f} µm ({edition}); up to {e11:.0f} µm by E11-17"
        yield Property("sieve tolerance", words, edition, {"y_um": y, "largest_um": largest, "largest_e11_um": e11})


def _sieve_words(sieve: sieves.Sieve) -> str:
    name = f" ({sieve.e11_name})" if sieve.e11_name else ""
    return f"{float(sieve.opening_mm):g} mm{name}"


def _particle(cloth: Cloth, service: Service) -> Iterator[Property]:
    figures, made = cloth.figures, cloth.construction
    w1, w2, x = figures.warp_aperture_mm, figures.weft_aperture_mm, service.particle_mm
    if w1 is None or w2 is None:
        return
    if not made.is_square:
        for shape in ("sphere", "flake"):
            governing = sieving.governing_dimension(w1, w2, shape)
            yield Property(f"{shape}s", governing.words, "derived", {"governing_mm": governing.aperture_mm})
    if x is not None:
        chance = sieving.passing_probability(x, w1, w2, float(made.warp.pitch_mm), float(made.weft.pitch_mm))
        words = f"a sphere of {x:g} mm passes with probability {chance:.3f} a try at right angles"
        yield Property("passing", words, "Gaudin 1939, from memory", {"particle_mm": x, "probability": chance})


def _flow(cloth: Cloth, service: Service) -> Iterator[Property]:
    if service.duty is None:
        return
    pore = pore_mm(cloth) if cloth.construction.is_filter else None
    loss = loss_of(cloth.construction, service.duty, pore)
    if loss is None:
        yield Property("flow", "no model: the pore of this weave has no geometric estimate", "")
        return
    notes = " ".join(loss.notes)
    values: dict[str, Any] = {"K": loss.K, "pressure_drop_pa": loss.pressure_drop_pa, "in_range": loss.in_range}
    values |= {"method": loss.method, "uncertainty_pct": loss.uncertainty_pct}
    yield Property("flow", f"{service.duty.words}: {loss_words(loss)}. {notes}".strip(), loss.method, values)


def _strength(cloth: Cloth, service: Service) -> Iterator[Property]:
    made = cloth.construction
    from catalog.physics.geometry import section_mm2_per_mm

    sections = [section_mm2_per_mm(float(s.pitch_mm), float(s.wire_mm)) for s in (made.warp, made.weft)]
    stiff = [strength.stiffness_index_mm3(float(s.pitch_mm), float(s.wire_mm)) for s in (made.warp, made.weft)]
    words = f"warp {sections[0] * 1000:.4g}, weft {sections[1] * 1000:.4g} mm² per m of width"
    yield Property(
        "metal section", words, "derived", {"warp_mm2_per_m": sections[0] * 1000, "weft_mm2_per_m": sections[1] * 1000}
    )
    words = f"warp {stiff[0]:.3g}, weft {stiff[1]:.3g} mm³ (d⁴/p: for comparing cloths only)"
    yield Property("stiffness index", words, "derived", {"warp_mm3": stiff[0], "weft_mm3": stiff[1]})
    loads = breaking_loads(made)
    if loads is None:
        yield Property("breaking load", "no tensile range on record for this alloy", "")
        return
    alloy = alloys.alloy(made.alloy or "")
    (a, b), (e, f) = loads
    words = f"warp {a:.3g} to {b:.3g}, weft {e:.3g} to {f:.3g} kN/m; no load to design by"
    source = alloy.tensile_source if alloy else ""
    yield Property("breaking load", words, source, {"warp_kn_m": [a, b], "weft_kn_m": [e, f]})


def _coating(cloth: Cloth, service: Service) -> Iterator[Property]:
    made, coat = cloth.construction, service.coating_mm
    if coat is None or made.is_filter:
        return
    pitches = float(made.warp.pitch_mm), float(made.weft.pitch_mm)
    wires = float(made.warp.wire_mm), float(made.weft.wire_mm)
    density = alloys.density_kg_m3(made.alloy) if made.alloy else None
    found = coated(*pitches, *wires, coat, service.coated_after_weaving, wire_density_kg_m3=density or 7850.0)
    words = (
        f"{coat:g} mm a side {ZINC_WORDS[service.coated_after_weaving]}: "
        f"aperture {found.warp_aperture_mm:.4g} mm ({found.warp_aperture_change_pct:+.1f} %), "
        f"open area {found.open_area_pct:.1f} %, "
        f"zinc {found.coating_kg_m2:.2f} kg/m², mass {found.mass_change_kg_m2:+.2f} kg/m²"
    )
    values = {"open_area_pct": found.open_area_pct, "coating_kg_m2": found.coating_kg_m2}
    yield Property(
        "coating", words.replace(" -", " −").replace("(-", "(−"), "annulus, zinc 7140 kg/m³ from memory", values
    )


def _mass(cloth: Cloth, service: Service) -> Iterator[Property]:
    estimates = tuple(m for m in (cloth.figures.mass_kg_m2, cloth.figures.mass_geometric_kg_m2) if m is not None)
    if service.area_m2 is None or not estimates:
        return
    low, high = mass.net_mass_band_kg(service.area_m2, estimates, service.mass_spread_pct)
    spread = f"both estimates ±{service.mass_spread_pct:g} % (stated, no standard)"
    words = f"{service.area_m2:g} m²: {low:.3g} to {high:.3g} kg net, {spread}"
    yield Property("net mass", words, "ISO 9044 and Peirce estimates", {"least_kg": low, "most_kg": high})


def _guard(cloth: Cloth, service: Service) -> Iterator[Property]:
    figures = cloth.figures
    if figures.warp_aperture_mm is None or figures.weft_aperture_mm is None or service.oversize_mm is None:
        return
    short, long = sorted((figures.warp_aperture_mm, figures.weft_aperture_mm))
    shape = "square" if long - short < 1e-9 else "slot"
    over = service.oversize_mm
    at = safety.distance_mm(short, shape, long)
    largest = safety.distance_mm(short + over, shape, long + over)
    if at is None or largest is None:
        yield Property("guard", "the table of safety distances ends at 120 mm", safety.SOURCE)
        return
    words = f"safety distance {at:g} mm at nominal, {largest:g} mm with {over:g} mm oversize, {shape} opening"
    yield Property("guard", words, safety.SOURCE, {"distance_mm": at, "distance_largest_mm": largest})


def _sphere(cloth: Cloth, service: Service) -> Iterator[Property]:
    made = cloth.construction
    if made.weave is Weave.REVERSE_PLAIN_DUTCH:
        reason = filter_cloth.sphere_reverse_dutch_um()[1]
        yield Property("largest sphere", f"none shown: {reason[:1].lower()}{reason[1:]}", "")
    if made.weave is Weave.TWILLED_DUTCH:
        yield from _twilled_sphere(cloth)


def _twilled_sphere(cloth: Cloth) -> Iterator[Property]:
    made = cloth.construction
    if cloth.figures.sphere_um is not None:
        words = f"{cloth.figures.sphere_um:.1f} µm ± 2 %: a geometric estimate, no rating"
        yield Property("largest sphere", words, "numeric, widest path", {"sphere_um": cloth.figures.sphere_um})
        return
    pitches = float(made.warp.pitch_mm), float(made.weft.pitch_mm)
    wires = float(made.warp.wire_mm), float(made.weft.wire_mm)
    try:
        found = filter_cloth.sphere_twilled_dutch_um(*pitches, *wires)
    except OutOfDomainError as error:
        yield Property("largest sphere", f"no model: {error.message}", "")
        return
    state = "converged" if found.converged else "not converged"
    words = f"{found.sphere_um:.1f} ± {found.resolution_um:.1f} µm ({state}): a geometric estimate, no rating"
    values = {"sphere_um": found.sphere_um, "resolution_um": found.resolution_um, "converged": found.converged}
    yield Property("largest sphere", words, "numeric, widest path", values)


def _magnet(cloth: Cloth, service: Service) -> Iterator[Property]:
    alloy = alloys.alloy(cloth.construction.alloy) if cloth.construction.alloy else None
    if alloy is not None:
        words = f"{alloy.density_kg_m3:g} kg/m³ is used ({alloy.basis})"
        yield Property("density", words, alloy.basis, {"density_kg_m3": alloy.density_kg_m3})
        yield Property("magnet", alloy.magnetic, "common practice")
