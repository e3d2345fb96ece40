"""Filter cloth (Dutch weaves): mass, thickness, porosity, how tightly the fine wires are packed, largest sphere.

Symbols: P warp pitch, s weft pitch, D warp wire, d weft wire. The coarse warp lies straight; the weft runs over
and under it along arcs and tangents with sin θ = (D + d)/P. In reverse cloth the parts are exchanged: the weft
is the coarse, straight set. Weaves go by the codes 'plain-dutch', 'reverse-plain-dutch', 'twilled-dutch'.
A largest sphere is a geometric estimate of ideal cloth, neither upper nor lower bound of what real cloth holds
back (its weft is beaten up and flattened), and never a certified rating.
"""

from dataclasses import dataclass
from math import asin, pi, sin, sqrt, tan

from catalog.physics.domain import OutOfDomainError, require_between, require_positive
from catalog.physics.dutch_wires import DutchWeave

WEAVES = ("plain-dutch", "reverse-plain-dutch", "twilled-dutch")
NO_SPHERE_REASON = (
    "No sphere is shown for reverse Dutch cloth: its wires are packed so closely that the geometric model breaks, "
    "and no check value is known."
)
CLOSE_PACKING_RANGE = (0.8, 1.35)
"""Ratios met in customary filter cloth, with some room: 0.87 to 1.27 in thirteen quoted constructions."""


def mass_kg_m2(
    weave: str,
    warp_pitch_mm: float,
    weft_pitch_mm: float,
    warp_wire_mm: float,
    weft_wire_mm: float,
    density_kg_m3: float,
) -> float:
    """Geometric mass per area of filter cloth.

    m = ρ·π/4 · (D²/P + d²/s · L/P) / 1000, l = (D + d)·(cot θ + θ); L = l in plain Dutch,
    L = (P + l)/2 · √(1 + (s/P)²) in twilled Dutch; reverse Dutch with warp and weft exchanged.

    Parameters:
        weave: 'plain-dutch', 'reverse-plain-dutch' or 'twilled-dutch' [-]
        warp_pitch_mm: pitch of the warp wires, P [mm], at least D + d (reverse: above 0)
        weft_pitch_mm: pitch of the weft wires, s [mm], above 0 (reverse: at least D + d)
        warp_wire_mm: warp wire diameter, D [mm], above 0
        weft_wire_mm: weft wire diameter, d [mm], above 0
        density_kg_m3: density of the wire, ρ [kg/m³], above 0
    Returns: mass per area [kg/m²]. Scalars only.
    Raises: OutOfDomainError where the weave isn't known or the wires don't fit between the coarse wires.
    Valid: as woven, round wires; real weft is a little shorter where it is flattened.
    **Source**: derived: arc and tangent of a wire over straight ones (Peirce 1937 with one set straight); in the
        twill one of two pitches is crossed and pairs move sideways by s from warp to warp.
    **Check value**: 2.8979 kg/m² plain Dutch 24 × 110, D 0.36, d 0.26 mm, 7900 kg/m³ (source: sum done
        separately, tests/published/data/check_values.csv).

    >>> round(mass_kg_m2("plain-dutch", 25.4 / 24, 25.4 / 110, 0.36, 0.26, 7900), 4)
    2.8979
    """
    require_positive(density_kg_m3=density_kg_m3)
    P, s, D, d = _coarse_and_fine(weave, warp_pitch_mm, weft_pitch_mm, warp_wire_mm, weft_wire_mm)
    crimp = fine_wire_crimp(weave, warp_pitch_mm, weft_pitch_mm, warp_wire_mm, weft_wire_mm)
    return density_kg_m3 * pi / 4.0 * (D * D / P + d * d / s * (1.0 + crimp)) / 1000.0


def fine_wire_crimp(
    weave: str, warp_pitch_mm: float, weft_pitch_mm: float, warp_wire_mm: float, weft_wire_mm: float
) -> float:
    """Crimp of the fine wires of filter cloth (weft; in reverse Dutch the warp): L/P − 1.

    l = (D + d)·(cot θ + θ), sin θ = (D + d)/P; L = l plain, (P + l)/2·√(1 + (s/P)²) twilled

    Parameters:
        weave: 'plain-dutch', 'reverse-plain-dutch' or 'twilled-dutch' [-]
        warp_pitch_mm: pitch of the warp wires, P [mm], at least D + d (reverse: above 0)
        weft_pitch_mm: pitch of the weft wires, s [mm], above 0 (reverse: at least D + d)
        warp_wire_mm: warp wire diameter, D [mm], above 0
        weft_wire_mm: weft wire diameter, d [mm], above 0
    Returns: crimp as a fraction [-], 0 or more. Scalars only.
    Raises: OutOfDomainError where the weave isn't known or the wires don't fit between the coarse wires.
    Valid: the coarse wires lie straight.
    **Source**: derived: Peirce 1937 with one set straight (h = D); sideways shift of twilled pairs as a slope.
    **Check value**: 17.71 % plain Dutch 24 × 110, D 0.36, d 0.26 mm (source: sum done separately,
        tests/published/data/check_values.csv).

    >>> round(fine_wire_crimp("plain-dutch", 25.4 / 24, 25.4 / 110, 0.36, 0.26), 4)
    0.1771
    """
    P, s, D, d = _coarse_and_fine(weave, warp_pitch_mm, weft_pitch_mm, warp_wire_mm, weft_wire_mm)
    theta = asin((D + d) / P)
    length = (D + d) * (1.0 / tan(theta) + theta)
    if weave == "twilled-dutch":
        length = (P + length) / 2.0 * sqrt(1.0 + (s / P) ** 2)
    return length / P - 1.0


def _coarse_and_fine(
    weave: str, warp_pitch: float, weft_pitch: float, warp_wire: float, weft_wire: float
) -> tuple[float, float, float, float]:
    """P, s, D, d with the coarse, straight set first; refuses unknown weaves and wires that don't fit."""
    if weave not in WEAVES:
        raise OutOfDomainError(f"{weave!r} is no filter cloth that is computed; known are {', '.join(WEAVES)}.")
    if weave == "reverse-plain-dutch":
        warp_pitch, weft_pitch, warp_wire, weft_wire = weft_pitch, warp_pitch, weft_wire, warp_wire
    DutchWeave(warp_pitch, weft_pitch, warp_wire, weft_wire, weave == "twilled-dutch")
    return warp_pitch, weft_pitch, warp_wire, weft_wire


def thickness_mm(weave: str, warp_wire_mm: float, weft_wire_mm: float) -> float:
    """Thickness of filter cloth as woven: the coarse wire with a fine one on either side.

    T = D + 2d; reverse Dutch d + 2D

    Parameters:
        weave: 'plain-dutch', 'reverse-plain-dutch' or 'twilled-dutch' [-]
        warp_wire_mm: warp wire diameter, D [mm], above 0
        weft_wire_mm: weft wire diameter, d [mm], above 0
    Returns: thickness [mm]. Scalars only.
    Raises: OutOfDomainError where the weave isn't known or a wire isn't above 0.
    Valid: as woven; calendered cloth is thinner.
    **Source**: derived: the coarse wires lie straight in the middle.
    **Check value**: 0.88 mm for D 0.36, d 0.26 mm (source: sum by hand).

    >>> round(thickness_mm("plain-dutch", 0.36, 0.26), 2)
    0.88
    """
    require_positive(warp_wire_mm=warp_wire_mm, weft_wire_mm=weft_wire_mm)
    if weave not in WEAVES:
        raise OutOfDomainError(f"{weave!r} is no filter cloth that is computed; known are {', '.join(WEAVES)}.")
    if weave == "reverse-plain-dutch":
        return weft_wire_mm + 2.0 * warp_wire_mm
    return warp_wire_mm + 2.0 * weft_wire_mm


def porosity(mass_kg_m2: float, thickness_mm: float, density_kg_m3: float) -> float:
    """Share of the volume of a cloth that is empty.

    ε = 1 − m / (ρ·T)

    Parameters:
        mass_kg_m2: mass per area, m [kg/m²], above 0
        thickness_mm: thickness, T [mm], above 0
        density_kg_m3: density of the wire, ρ [kg/m³], above 0
    Returns: porosity as a fraction [-], 0 to 1. Scalars only.
    Raises: OutOfDomainError where a figure isn't above 0 or the mass exceeds that of solid metal.
    Valid: any cloth; depends on which thickness is meant.
    **Source**: definition.
    **Check value**: 0.5831 at 2.8979 kg/m², 0.88 mm, 7900 kg/m³ (source: sum done separately,
        tests/published/data/check_values.csv).

    >>> round(porosity(2.8979, 0.88, 7900), 3)
    0.583
    """
    require_positive(mass_kg_m2=mass_kg_m2, thickness_mm=thickness_mm, density_kg_m3=density_kg_m3)
    share = mass_kg_m2 / (density_kg_m3 * thickness_mm / 1000.0)
    require_between(0.0, 1.0, mass_over_solid_metal=share)
    return 1.0 - share


def close_packing_ratio(
    weave: str, warp_pitch_mm: float, weft_pitch_mm: float, warp_wire_mm: float, weft_wire_mm: float
) -> float:
    """Room of the fine wires of filter cloth, as a multiple of their thickness.

    s/d in plain Dutch, 2s/d in twilled Dutch (two layers), P/D in reverse Dutch; 1 is wire touching wire.

    Parameters:
        weave: 'plain-dutch', 'reverse-plain-dutch' or 'twilled-dutch' [-]
        warp_pitch_mm: pitch of the warp wires, P [mm], above 0
        weft_pitch_mm: pitch of the weft wires, s [mm], above 0
        warp_wire_mm: warp wire diameter, D [mm], above 0
        weft_wire_mm: weft wire diameter, d [mm], above 0
    Returns: ratio [-]; about 0.87 to 1.27 in customary cloth. Scalars only.
    Raises: OutOfDomainError where the weave isn't known or a figure isn't above 0.
    Valid: a check of stated figures: far outside CLOSE_PACKING_RANGE a count or a wire is likely wrong. Below 1
        beaten-up wires overlap in the ideal model; real ones give way sideways and flatten.
    **Source**: derived: neighbours of one layer cross or lie side by side.
    **Check value**: 0.888 for plain Dutch 24 × 110, d 0.26 mm (source: 25.4/110/0.26 by hand).

    >>> round(close_packing_ratio("plain-dutch", 25.4 / 24, 25.4 / 110, 0.36, 0.26), 3)
    0.888
    """
    require_positive(warp_pitch_mm=warp_pitch_mm, weft_pitch_mm=weft_pitch_mm)
    require_positive(warp_wire_mm=warp_wire_mm, weft_wire_mm=weft_wire_mm)
    if weave == "plain-dutch":
        return weft_pitch_mm / weft_wire_mm
    if weave == "twilled-dutch":
        return 2.0 * weft_pitch_mm / weft_wire_mm
    if weave == "reverse-plain-dutch":
        return warp_pitch_mm / warp_wire_mm
    raise OutOfDomainError(f"{weave!r} is no filter cloth that is computed; known are {', '.join(WEAVES)}.")


def sphere_plain_dutch_um(
    warp_pitch_mm: float, weft_pitch_mm: float, warp_wire_mm: float, weft_wire_mm: float
) -> float:
    """Largest rigid sphere through plain Dutch cloth, a geometric estimate.

    (r + d/2)² = ((P − D)/2 − r)²·sin²θ + (s/2)², sin θ = (D + d)/P; sphere 2r

    Parameters:
        warp_pitch_mm: pitch of the warp wires, P [mm], at least D + d
        weft_pitch_mm: pitch of the weft wires, s [mm], above 0
        warp_wire_mm: warp wire diameter, D [mm], above 0
        weft_wire_mm: weft wire diameter, d [mm], above 0
    Returns: sphere diameter [µm], 0 where the model leaves no way, at most P − D. Scalars only.
    Raises: OutOfDomainError where a figure isn't above 0 or the weft doesn't fit between warp wires.
    Valid: ideal round wires at even pitches; neither an upper nor a lower bound of real cloth.
    **Source**: derived: the sphere touches a warp wire and the two neighbouring wefts that cross beside it.
    **Check value**: 140.26 µm for 24 × 110, D 0.36, d 0.26 mm (source: sum done separately, and a widest-path
        solver, tests/published/data/filter_cloth_checks.csv).

    >>> round(sphere_plain_dutch_um(25.4 / 24, 25.4 / 110, 0.36, 0.26), 2)
    140.26
    """
    weave = DutchWeave(warp_pitch_mm, weft_pitch_mm, warp_wire_mm, weft_wire_mm, is_twilled=False)
    gap, squared, d = (warp_pitch_mm - warp_wire_mm) / 2.0, sin(weave.angle_rad) ** 2, weft_wire_mm
    a, b = 1.0 - squared, d + 2.0 * gap * squared
    c = d * d / 4.0 - squared * gap * gap - weft_pitch_mm**2 / 4.0
    if c >= 0.0:
        return 0.0
    radius = -2.0 * c / (b + sqrt(b * b - 4.0 * a * c))
    return 2000.0 * min(radius, gap)


def sphere_reverse_dutch_um() -> tuple[None, str]:
    """Largest rigid sphere through reverse plain Dutch cloth: there is no model.

    Returns: None and the reason in words [-]. Scalars only.
    Raises: nothing.
    Valid: always; a measured or a supplier's rating is data of its own.
    **Source**: derived: the fine warp wires stand closer than their thickness, which the geometry can't follow.
    **Check value**: none exists (source: no published value is known; that is why no figure is given).

    >>> sphere_reverse_dutch_um()[0] is None
    True
    """
    return None, NO_SPHERE_REASON


@dataclass(frozen=True, slots=True)
class SphereEstimate:
    """A numeric estimate with its honesty."""

    sphere_um: float
    """Diameter of the largest sphere, µm; 0 where the model is closed."""
    resolution_um: float
    """The model's answer lies within ± this, µm."""
    converged: bool
    """Whether the wanted resolution was reached."""


def sphere_twilled_dutch_um(
    warp_pitch_mm: float,
    weft_pitch_mm: float,
    warp_wire_mm: float,
    weft_wire_mm: float,
    resolution_pct: float = 2.0,
    most_boxes: int = 60_000,
) -> SphereEstimate:
    """Largest rigid sphere through twilled Dutch cloth (2/2 twill), a numeric geometric estimate.

    Widest path through the distance field of the wires, enclosed between a diameter that no path allows and
    one that a path was found for.

    Parameters:
        warp_pitch_mm: pitch of the warp wires, P [mm], at least D + d
        weft_pitch_mm: pitch of the weft wires, s [mm], above 0
        warp_wire_mm: warp wire diameter, D [mm], above 0
        weft_wire_mm: weft wire diameter, d [mm], above 0
        resolution_pct: wanted ± of the answer in percent of it [%], 1 to 25
        most_boxes: boxes after which the search gives up unconverged [-]
    Returns: sphere diameter with its ± [µm] and whether that is as fine as wanted. Scalars only.
    Raises: OutOfDomainError where a figure is outside its range or the weft doesn't fit between warp wires.
    Valid: ideal round wires, weft pairs spread evenly in two layers; real cloth may lie above or below.
    **Source**: derived: bottleneck (maximin) path over an adaptive division of space, bounds by convexity of the
        distance to a straight piece of wire.
    **Check value**: 41.0 ± 2.9 µm for 80 × 700, D 0.1, d 0.076 mm (source: another solver on an even grid,
        tests/published/data/filter_cloth_checks.csv).

    >>> found = sphere_twilled_dutch_um(25.4 / 80, 25.4 / 700, 0.1, 0.076, resolution_pct=10)
    >>> found.converged, abs(found.sphere_um - 41.0) < 2.9 + found.resolution_um
    (True, True)
    """
    # the solver is large and seldom needed
    from catalog.physics.widest_path import sphere_bounds_mm

    require_between(1.0, 25.0, resolution_pct=resolution_pct)
    weave = DutchWeave(warp_pitch_mm, weft_pitch_mm, warp_wire_mm, weft_wire_mm, is_twilled=True)
    least, most = sphere_bounds_mm(weave, resolution_pct / 100.0, most_boxes)
    sphere, half = (least + most) / 2.0, (most - least) / 2.0
    return SphereEstimate(1000.0 * sphere, 1000.0 * half, half <= resolution_pct / 100.0 * sphere * (1 + 1e-9))
