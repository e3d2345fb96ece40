"""Sieving: tolerances of test-sieve cloth by edition, the chance to pass, and what governs at a slot."""

from dataclasses import dataclass
from math import sqrt

from catalog.physics.domain import OutOfDomainError, require_between, require_positive

EDITIONS = {"E11-17": 1.0, "ISO 3310-1:2000": 1.0, "ISO 3310-1:2016": 0.9}
"""Editions and the share of the E11-17 figures that they allow; a sieve passes an edition: name it.

The 0.9 of ISO 3310-1:2016 rests on one source only, the tables of a general-purpose library.
"""
LEAST_UM, MOST_UM = 20.0, 125_000.0


def average_tolerance_um(opening_um: float, edition: str) -> float:
    """Permissible deviation Y of the average opening of test-sieve cloth.

    Y = k · (w^0.98 / 27 + 1.6), w in µm

    Parameters:
        opening_um: nominal opening, w [µm], 20 to 125 000
        edition: 'E11-17', 'ISO 3310-1:2000' (k = 1) or 'ISO 3310-1:2016' (k = 0.9) [-]
    Returns: the average may lie this far above or below the nominal [µm]. Scalars only.
    Raises: OutOfDomainError where the edition isn't known or the opening is outside its range.
    Valid: test-sieve cloth of the edition; industrial cloth is under no such limit.
    **Source**: ASTM E11-17 and ISO 3310-1:2000, note to the table of tolerances; for 2016 a single source.
    **Check value**: 4.148 µm at 75 µm (source: sum done separately, tests/published/data/check_values.csv).

    >>> round(average_tolerance_um(75, "E11-17"), 3)
    4.148
    """
    share = _share(opening_um, edition)
    return share * (float(opening_um**0.98) / 27.0 + 1.6)


def largest_oversize_um(opening_um: float, edition: str) -> float:
    """Permissible oversize X of the largest single opening of test-sieve cloth.

    X = k · (2·w^0.75 / 3 + 4·w^0.25), w in µm

    Parameters:
        opening_um: nominal opening, w [µm], 20 to 125 000
        edition: 'E11-17', 'ISO 3310-1:2000' (k = 1) or 'ISO 3310-1:2016' (k = 0.9) [-]
    Returns: no single opening may exceed the nominal by more [µm]. Scalars only.
    Raises: OutOfDomainError where the edition isn't known or the opening is outside its range.
    Valid: test-sieve cloth of the edition; industrial cloth is under no such limit.
    **Source**: ASTM E11-17 and ISO 3310-1:2000, note to the table of tolerances; for 2016 a single source.
    **Check value**: 28.762 µm at 75 µm (source: sum done separately, tests/published/data/check_values.csv).

    >>> round(largest_oversize_um(75, "E11-17"), 3)
    28.762
    """
    share = _share(opening_um, edition)
    return share * (2.0 * float(opening_um**0.75) / 3.0 + 4.0 * float(opening_um**0.25))


def largest_opening_um(opening_um: float, edition: str) -> float:
    """Largest single opening that test-sieve cloth may hold.

    w + X

    Parameters:
        opening_um: nominal opening, w [µm], 20 to 125 000
        edition: 'E11-17', 'ISO 3310-1:2000' or 'ISO 3310-1:2016' [-]
    Returns: largest opening that still conforms [µm]. Scalars only.
    Raises: OutOfDomainError where the edition isn't known or the opening is outside its range.
    Valid: as largest_oversize_um.
    **Source**: as largest_oversize_um.
    **Check value**: a 250 µm sieve may hold one opening of 308 µm (source: 250 + X of ASTM E11-17 by hand).

    >>> round(largest_opening_um(250, "E11-17"))
    308
    """
    return opening_um + largest_oversize_um(opening_um, edition)


def _share(opening_um: float, edition: str) -> float:
    if edition not in EDITIONS:
        raise OutOfDomainError(f"No tolerances are held for {edition!r}; known are {', '.join(EDITIONS)}.")
    require_between(LEAST_UM, MOST_UM, opening_um=opening_um)
    return EDITIONS[edition]


def passing_probability(
    particle_mm: float,
    warp_aperture_mm: float,
    weft_aperture_mm: float,
    warp_pitch_mm: float,
    weft_pitch_mm: float,
    presentations: int = 1,
) -> float:
    """Probability that a sphere meeting square or rectangular cloth at right angles passes.

    P = (w1 − x)·(w2 − x) / (p1·p2); in n independent tries 1 − (1 − P)^n

    Parameters:
        particle_mm: sphere diameter, x [mm], above 0
        warp_aperture_mm: clear width between warp wires, w1 [mm], above 0, below p1
        weft_aperture_mm: clear width between weft wires, w2 [mm], above 0, below p2
        warp_pitch_mm: pitch of the warp wires, p1 [mm]
        weft_pitch_mm: pitch of the weft wires, p2 [mm]
        presentations: how often the sphere meets the cloth, n [-], 1 or more
    Returns: probability [-], 0 to 1; 0 from x = min(w1, w2) on. Scalars only.
    Raises: OutOfDomainError where a figure is outside its range.
    Valid: single spheres, no rebound from a wire into an opening, no bed of material.
    **Source**: Gaudin, Principles of Mineral Dressing (1939): ((w − x)/(w + d))² (from memory).
    **Check value**: 1/9 for x 0.5, w 1, d 0.5 mm (source: the formula by hand).

    >>> round(passing_probability(0.5, 1.0, 1.0, 1.5, 1.5), 4)
    0.1111
    """
    require_positive(particle_mm=particle_mm, warp_aperture_mm=warp_aperture_mm, weft_aperture_mm=weft_aperture_mm)
    if warp_aperture_mm >= warp_pitch_mm or weft_aperture_mm >= weft_pitch_mm or presentations < 1:
        raise OutOfDomainError("Apertures below their pitches and at least one presentation were expected.")
    free = max(warp_aperture_mm - particle_mm, 0.0) * max(weft_aperture_mm - particle_mm, 0.0)
    once = free / (warp_pitch_mm * weft_pitch_mm)
    return float(1.0 - (1.0 - once) ** presentations) if presentations > 1 else once


@dataclass(frozen=True, slots=True)
class Governing:
    """Which side of an opening holds back a particle, and by which of the particle's own measures."""

    aperture_mm: float
    """The side of the opening that decides, mm."""
    side: str
    """'short', 'long' or 'either' (square opening)."""
    particle_measure: str
    """'diameter', 'width' or 'thickness' of the particle."""
    words: str


def governing_dimension(warp_aperture_mm: float, weft_aperture_mm: float, particle: str) -> Governing:
    """Side of an opening that governs which particles pass, by the particle's shape.

    Parameters:
        warp_aperture_mm: clear width between warp wires [mm], above 0
        weft_aperture_mm: clear width between weft wires [mm], above 0
        particle: 'sphere' (or rounded grain), 'flake' (flat) or 'needle' (long and thin) [-]
    Returns: the governing side [mm] and the particle's measure that it stops. Scalars only.
    Raises: OutOfDomainError where an aperture isn't above 0 or the shape isn't known.
    Valid: rigid single particles.
    **Source**: derived: a body passes where one of its shadows fits; a sphere has one shadow, a flake on edge
        shows width by thickness, a needle end-on its diameter.
    **Check value**: a 2 × 6 mm slot stops spheres at 2 mm (source: by hand).

    >>> governing_dimension(2.0, 6.0, "sphere").aperture_mm
    2.0
    """
    require_positive(warp_aperture_mm=warp_aperture_mm, weft_aperture_mm=weft_aperture_mm)
    short, long = sorted((warp_aperture_mm, weft_aperture_mm))
    side = "either" if long - short <= 1e-9 * long else "short"
    if particle == "sphere":
        return Governing(
            short, side, "diameter", "A sphere has to clear the short side; the long side adds speed only."
        )
    if particle == "needle":
        words = "A needle passes end-on: its diameter meets the short side, its length stops nothing for certain."
        return Governing(short, side, "diameter", words)
    if particle != "flake":
        raise OutOfDomainError(f"Particle shape {particle!r} isn't known: sphere, flake or needle was expected.")
    if side == "either":
        words = "A flake on edge turns into the diagonal: its width may exceed the side by up to two fifths."
        return Governing(short, side, "width", words)
    words = "A slot sorts flakes by thickness at its short side, as long as their width stays below the long side."
    return Governing(short, side, "thickness", words)


def does_flake_pass(
    flake_width_mm: float, flake_thickness_mm: float, warp_aperture_mm: float, weft_aperture_mm: float
) -> bool:
    """Whether a rigid flake on edge passes square or rectangular cloth.

    A p × q rectangle (p ≥ q) fits an a × b one (a ≥ b) where p ≤ a and q ≤ b, or where p > a, q ≤ b and
    b ≥ (2pqa + (p² − q²)·√(p² + q² − a²)) / (p² + q²).

    Parameters:
        flake_width_mm: lesser of the two broad measures of the flake [mm], above 0
        flake_thickness_mm: its thickness [mm], above 0
        warp_aperture_mm: clear width between warp wires [mm], above 0
        weft_aperture_mm: clear width between weft wires [mm], above 0
    Returns: True where it can pass at some turn [-]. Scalars only.
    Raises: OutOfDomainError where a figure isn't above 0.
    Valid: rigid flake that stands upright on the cloth; how likely that is, is another question.
    **Source**: Carver, Solution to problem E1225, American Mathematical Monthly 64 (1957) 114 (from memory).
    **Check value**: a sheet of no thickness passes a 1 mm square up to 1.414 mm wide (source: its diagonal).

    >>> does_flake_pass(1.41, 0.001, 1.0, 1.0), does_flake_pass(1.42, 0.001, 1.0, 1.0)
    (True, False)
    """
    require_positive(flake_width_mm=flake_width_mm, flake_thickness_mm=flake_thickness_mm)
    require_positive(warp_aperture_mm=warp_aperture_mm, weft_aperture_mm=weft_aperture_mm)
    q, p = sorted((flake_width_mm, flake_thickness_mm))
    b, a = sorted((warp_aperture_mm, weft_aperture_mm))
    if p <= a:
        return q <= b
    needed = (2 * p * q * a + (p**2 - q**2) * sqrt(p**2 + q**2 - a**2)) / (p**2 + q**2)
    return q <= b and b >= needed
