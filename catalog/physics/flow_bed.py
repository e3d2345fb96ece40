"""What a flow meets in a cloth: thickness, pore, porosity, wetted surface, path factor; square and Dutch."""

from dataclasses import dataclass
from math import pi, sqrt

from catalog.physics.domain import OutOfDomainError, require_positive, require_wire_below_pitch
from catalog.physics.filter_cloth import WEAVES, fine_wire_crimp, mass_kg_m2, porosity, thickness_mm

PATH_FACTOR_SQUARE, PATH_FACTOR_DUTCH = 1.0, 1.3


@dataclass(frozen=True, slots=True)
class Bed:
    """A cloth as a bed of wires."""

    thickness_mm: float
    """B."""
    pore_mm: float
    """Dp: the largest sphere that passes."""
    porosity: float
    """ε, a fraction."""
    surface_per_m: float
    """a: wire surface per volume of the cloth, m²/m³."""
    path_factor: float
    """Q: length of the way through over the thickness."""
    open_area: float | None = None
    """Fraction seen from above; None for filter cloth."""
    wire_mm: float | None = None
    """Thicker wire; None for filter cloth."""
    notes: tuple[str, ...] = ()


def square_bed(warp_pitch_mm: float, weft_pitch_mm: float, warp_wire_mm: float, weft_wire_mm: float) -> Bed:
    """Bed of square or rectangular cloth.

    B = d1 + d2, Dp = min(w1, w2), ε = 1 − (π/4)·(d1²·n1·l1 + d2²·n2·l2)/B, a = π·(d1·n1·l1 + d2·n2·l2)/B,
    l1 = √(1 + n2²·d2²), l2 = √(1 + n1²·d1²), n = 1/p; square: ε = 1 − (π/4)·n·d·√(1 + n²d²), a = 4(1 − ε)/d

    Parameters:
        warp_pitch_mm: pitch of the warp wires, p1 [mm], above d1
        weft_pitch_mm: pitch of the weft wires, p2 [mm], above d2
        warp_wire_mm: warp wire diameter, d1 [mm], above 0
        weft_wire_mm: weft wire diameter, d2 [mm], above 0
    Returns: the bed [mm, 1/m, fractions]. Scalars only.
    Raises: OutOfDomainError where a wire isn't thinner than its pitch, or solid wire fills the cloth.
    Valid: plain square cloth; unequal directions are an extension of ours, and are noted so.
    **Source**: Armour and Cannon, Fluid flow through woven screens, AIChE J. 14 (1968) 415; unequal wires derived.
    **Check value**: ε 0.76662, a 2333.8 1/m for w 1.0, d 0.4 mm (source: sum done separately,
        tests/published/data/check_values.csv).

    >>> bed = square_bed(1.4, 1.4, 0.4, 0.4)
    >>> round(bed.porosity, 5), round(bed.surface_per_m, 1)
    (0.76662, 2333.8)
    """
    require_wire_below_pitch(warp_pitch_mm, warp_wire_mm)
    require_wire_below_pitch(weft_pitch_mm, weft_wire_mm)
    n1, n2, d1, d2 = 1.0 / warp_pitch_mm, 1.0 / weft_pitch_mm, warp_wire_mm, weft_wire_mm
    long1, long2 = sqrt(1.0 + (n2 * d2) ** 2), sqrt(1.0 + (n1 * d1) ** 2)
    thick = d1 + d2
    solid = pi / 4.0 * (d1 * d1 * n1 * long1 + d2 * d2 * n2 * long2) / thick
    if solid >= 1.0:
        raise OutOfDomainError("The wires fill the whole cloth: a wider pitch was expected.")
    surface = pi * (d1 * n1 * long1 + d2 * n2 * long2) / thick * 1000.0
    w1, w2 = warp_pitch_mm - d1, weft_pitch_mm - d2
    alike = abs(d1 - d2) <= 1e-9 * d1 and abs(w1 - w2) <= 1e-9 * w1
    notes = () if alike else ("The relation was measured on square cloth; unequal directions are our extension of it.",)
    return Bed(thick, min(w1, w2), 1.0 - solid, surface, PATH_FACTOR_SQUARE, w1 * w2 * n1 * n2, max(d1, d2), notes)


def dutch_bed(
    weave: str,
    warp_pitch_mm: float,
    weft_pitch_mm: float,
    warp_wire_mm: float,
    weft_wire_mm: float,
    pore_mm: float,
) -> Bed:
    """Bed of filter cloth.

    B = D + 2d, Q = 1.3, ε = 1 − solid volume/B, a = π·(D/P + d/s·L/P)/B

    Parameters:
        weave: 'plain-dutch', 'reverse-plain-dutch' or 'twilled-dutch' [-]
        warp_pitch_mm: pitch of the warp wires, P [mm], at least D + d (reverse: above 0)
        weft_pitch_mm: pitch of the weft wires, s [mm], above 0 (reverse: at least D + d)
        warp_wire_mm: warp wire diameter, D [mm], above 0
        weft_wire_mm: weft wire diameter, d [mm], above 0
        pore_mm: pore, measured, stated or the geometric estimate, Dp [mm], above 0
    Returns: the bed [mm, 1/m, fractions]. Scalars only.
    Raises: OutOfDomainError where a figure is outside its range.
    Valid: plain and twilled Dutch; reverse Dutch was not among the cloths measured, and is noted so.
    **Source**: Armour and Cannon 1968 for B and Q; ε and a derived from the wire lengths.
    **Check value**: ε 0.5831 for plain Dutch 24 × 110, D 0.36, d 0.26 mm (source: sum done separately,
        tests/published/data/check_values.csv).

    >>> round(dutch_bed("plain-dutch", 25.4 / 24, 25.4 / 110, 0.36, 0.26, 0.14).porosity, 4)
    0.5831
    """
    require_positive(pore_mm=pore_mm)
    if weave not in WEAVES:
        raise OutOfDomainError(f"{weave!r} is no filter cloth that is computed; known are {', '.join(WEAVES)}.")
    sides = (warp_pitch_mm, weft_pitch_mm, warp_wire_mm, weft_wire_mm)
    thick = thickness_mm(weave, warp_wire_mm, weft_wire_mm)
    empty = porosity(mass_kg_m2(weave, *sides, 1000.0), thick, 1000.0)
    P, s, D, d = sides if weave != "reverse-plain-dutch" else (sides[1], sides[0], sides[3], sides[2])
    surface = pi * (D / P + d / s * (1.0 + fine_wire_crimp(weave, *sides))) / thick * 1000.0
    notes: tuple[str, ...] = ("The pore decides: an estimated pore makes an estimated pressure drop.",)
    if weave == "reverse-plain-dutch":
        notes += ("Reverse Dutch cloth was not among the cloths that the relation was fitted to.",)
    return Bed(thick, pore_mm, empty, surface, PATH_FACTOR_DUTCH, notes=notes)
