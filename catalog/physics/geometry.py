"""Plan and section of square and rectangular cloth: counts, open area, thickness, metal section, jam limit.

Symbols: p pitch (centre to centre), w aperture (clear, measured mid-side), d wire diameter; 1 warp, 2 weft.
"""

from math import pi, sqrt

from catalog.physics.domain import require_positive, require_wire_below_pitch

MM_PER_INCH = 25.4


def count_per_inch(pitch_mm: float) -> float:
    """Wires per inch of square or rectangular cloth.

    n = 25.4 / p

    Parameters:
        pitch_mm: distance of neighbouring wires, centre to centre [mm], above 0
    Returns: wires per inch [1/in], above 0. Scalars only.
    Raises: OutOfDomainError where the pitch isn't above 0.
    Valid: any cloth with evenly spaced wires.
    **Source**: definition; the inch is 25.4 mm exactly (international yard and pound agreement, 1959).
    **Check value**: 16.933 per inch for w 1 mm, d 0.5 mm (source: sum done by hand from the definition).

    >>> round(count_per_inch(1.5), 3)
    16.933
    """
    require_positive(pitch_mm=pitch_mm)
    return MM_PER_INCH / pitch_mm


def count_per_cm(pitch_mm: float) -> float:
    """Wires per centimetre of square or rectangular cloth.

    n = 10 / p

    Parameters:
        pitch_mm: distance of neighbouring wires, centre to centre [mm], above 0
    Returns: wires per centimetre [1/cm], above 0. Scalars only.
    Raises: OutOfDomainError where the pitch isn't above 0.
    Valid: any cloth with evenly spaced wires.
    **Source**: definition.
    **Check value**: 23.62 per cm for 60 per inch (source: 60 / 2.54 by hand).

    >>> round(count_per_cm(25.4 / 60), 2)
    23.62
    """
    require_positive(pitch_mm=pitch_mm)
    return 10.0 / pitch_mm


def open_area_pct(
    warp_aperture_mm: float, weft_aperture_mm: float, warp_pitch_mm: float, weft_pitch_mm: float
) -> float:
    """Open area of square or rectangular cloth seen from above.

    A0 = 100 · w1·w2 / (p1·p2)

    Parameters:
        warp_aperture_mm: clear width between warp wires, w1 [mm], above 0 and below p1
        weft_aperture_mm: clear width between weft wires, w2 [mm], above 0 and below p2
        warp_pitch_mm: pitch of the warp wires, p1 [mm]
        weft_pitch_mm: pitch of the weft wires, p2 [mm]
    Returns: share of the surface that is open [%], between 0 and 100. Scalars only.
    Raises: OutOfDomainError where an aperture isn't above 0 or not below its pitch.
    Valid: plain and twilled square or rectangular cloth; filter cloth has no open area in this sense.
    **Source**: ISO 9044, terms (definition).
    **Check value**: 44.444 % for w 1 mm, d 0.5 mm (source: (1/1.5)² by hand).

    >>> round(open_area_pct(1.0, 1.0, 1.5, 1.5), 3)
    44.444
    """
    require_wire_below_pitch(warp_pitch_mm, warp_aperture_mm)
    require_wire_below_pitch(weft_pitch_mm, weft_aperture_mm)
    return 100.0 * (warp_aperture_mm * weft_aperture_mm) / (warp_pitch_mm * weft_pitch_mm)


def thickness_least_mm(warp_wire_mm: float, weft_wire_mm: float) -> float:
    """Thickness of plain or twilled cloth whose warp and weft crowns lie flush.

    T = d1 + d2

    Parameters:
        warp_wire_mm: warp wire diameter, d1 [mm], above 0
        weft_wire_mm: weft wire diameter, d2 [mm], above 0
    Returns: least thickness of the cloth as woven [mm]. Scalars only.
    Raises: OutOfDomainError where a wire isn't above 0.
    Valid: not calendered; rolled cloth is thinner.
    **Source**: derived: at a crossing the wires touch, so each sweeps d1 + d2 when both crimp alike.
    **Check value**: 1.0 mm for two wires of 0.5 mm (source: twice the wire, by hand).

    >>> thickness_least_mm(0.5, 0.5)
    1.0
    """
    require_positive(warp_wire_mm=warp_wire_mm, weft_wire_mm=weft_wire_mm)
    return warp_wire_mm + weft_wire_mm


def thickness_most_mm(warp_wire_mm: float, weft_wire_mm: float) -> float:
    """Thickness of plain or twilled cloth in which one set of wires lies straight.

    T = d1 + d2 + max(d1, d2)

    Parameters:
        warp_wire_mm: warp wire diameter, d1 [mm], above 0
        weft_wire_mm: weft wire diameter, d2 [mm], above 0
    Returns: greatest thickness of the cloth as woven [mm]. Scalars only.
    Raises: OutOfDomainError where a wire isn't above 0.
    Valid: any share of the crimp between warp and weft gives a thickness between least and this.
    **Source**: derived: the crimped wire lies on both faces of the straight one, d + 2·(the other).
    **Check value**: 1.5 mm for two wires of 0.5 mm (source: three wires on top of each other, by hand).

    >>> thickness_most_mm(0.5, 0.5)
    1.5
    """
    require_positive(warp_wire_mm=warp_wire_mm, weft_wire_mm=weft_wire_mm)
    return warp_wire_mm + weft_wire_mm + max(warp_wire_mm, weft_wire_mm)


def section_mm2_per_mm(pitch_mm: float, wire_mm: float) -> float:
    """Metal section of the wires of one direction per width of cloth.

    S = π·d² / (4·p)

    The design's yardstick of strength, d²/p, is the same in proportion.

    Parameters:
        pitch_mm: pitch of the wires, p [mm], above 0
        wire_mm: their diameter, d [mm], above 0
    Returns: metal section [mm²/mm]. Scalars only.
    Raises: OutOfDomainError where a figure isn't above 0.
    Valid: round wire, any weave; wires of filter cloth may be thicker than their pitch.
    **Source**: definition: area of one wire's circle times wires per width.
    **Check value**: 0.1309 mm²/mm for d 0.5 mm at p 1.5 mm (source: π/24 by hand).

    >>> round(section_mm2_per_mm(1.5, 0.5), 4)
    0.1309
    """
    require_positive(pitch_mm=pitch_mm, wire_mm=wire_mm)
    return pi * wire_mm**2 / (4.0 * pitch_mm)


def jam_pitch_mm(wire_mm: float, other_wire_mm: float) -> float:
    """Least pitch of wires that another wire crosses one after the other, crowns flush.

    p = √(D² − d2²), D = d1 + d2; for equal wires √3·d.

    Parameters:
        wire_mm: diameter of the wires whose pitch it is, d1 [mm], above 0
        other_wire_mm: diameter of the wire that crosses them, d2 [mm], above 0
    Returns: pitch below which the crossing wire has no straight part left [mm]. Scalars only.
    Raises: OutOfDomainError where a wire isn't above 0.
    Valid: plain weave with the crowns of warp and weft flush, round wires that keep their section.
    **Source**: Peirce, The geometry of cloth structure, J. Textile Inst. 28 (1937), jammed cloth: p = D·sin θ
        with crimp height D·(1 − cos θ) = d1.
    **Check value**: p/D = 0.866 for equal wires (source: Peirce 1937, jammed square cloth).

    >>> round(jam_pitch_mm(1.0, 1.0) / 2.0, 3)
    0.866
    """
    require_positive(wire_mm=wire_mm, other_wire_mm=other_wire_mm)
    return sqrt((wire_mm + other_wire_mm) ** 2 - other_wire_mm**2)


def is_jammed(pitch_mm: float, wire_mm: float, other_wire_mm: float, twilled: bool = False) -> bool:
    """Whether wires stand too close to be crossed by another wire, crowns flush.

    Plain: p < √(D² − d2²). 2/2 twill: p < (√(D² − d2²) + d1) / 2, its wires lying in touching pairs.

    Parameters:
        pitch_mm: pitch of the wires, p [mm], above 0
        wire_mm: their diameter, d1 [mm], above 0
        other_wire_mm: diameter of the wire that crosses them, d2 [mm], above 0
        twilled: whether the weave is a 2/2 twill [-]
    Returns: True where the cloth can't be woven so [-]. Scalars only.
    Raises: OutOfDomainError where a figure isn't above 0.
    Valid: one direction by itself; cloth that isn't square may shift its crimp, see cannot_be_woven.
    **Source**: plain: Peirce 1937, jammed cloth; twill: derived: of two pitches one has a crossing and the
        other none, so the second may shrink to one wire.
    **Check value**: equal wires jam at d/p 0.577 plain and about 0.73 twilled (source: 1/√3 after Peirce 1937;
        2/(1 + √3) by hand).

    >>> is_jammed(25.4 / 12, 0.063 * 25.4, 0.063 * 25.4), is_jammed(1.0, 0.5, 0.5)
    (True, False)
    """
    least = jam_pitch_mm(wire_mm, other_wire_mm)
    require_positive(pitch_mm=pitch_mm)
    return pitch_mm < ((least + wire_mm) / 2.0 if twilled else least)


def cannot_be_woven(
    warp_pitch_mm: float, weft_pitch_mm: float, warp_wire_mm: float, weft_wire_mm: float, is_twilled: bool = False
) -> bool:
    """Whether no share of the crimp between warp and weft lets these wires be woven.

    √(D² − p1²) + √(D² − p2²) > D, a term with p > D being 0; in 2/2 twill with 2p − d for p.

    Parameters:
        warp_pitch_mm: pitch of the warp wires, p1 [mm], above 0
        weft_pitch_mm: pitch of the weft wires, p2 [mm], above 0
        warp_wire_mm: warp wire diameter, d1 [mm], above 0
        weft_wire_mm: weft wire diameter, d2 [mm], above 0
        is_twilled: whether the weave is a 2/2 twill [-]
    Returns: True where the cloth is tighter than jammed [-]. Scalars only.
    Raises: OutOfDomainError where a figure isn't above 0.
    Valid: square and rectangular cloth of round wires that keep their section.
    **Source**: Peirce 1937, cloth jammed both ways: cos θ1 + cos θ2 = 1; twill derived as in is_jammed.
    **Check value**: square cloth at p/D 0.866, θ 60° both ways, is just jammed (source: Peirce 1937).

    >>> cannot_be_woven(1.73, 1.73, 1.0, 1.0), cannot_be_woven(1.74, 1.74, 1.0, 1.0)
    (True, False)
    """
    require_positive(warp_pitch_mm=warp_pitch_mm, weft_pitch_mm=weft_pitch_mm)
    require_positive(warp_wire_mm=warp_wire_mm, weft_wire_mm=weft_wire_mm)
    D = warp_wire_mm + weft_wire_mm
    pitches = (warp_pitch_mm, weft_pitch_mm)
    if is_twilled:
        pitches = (2 * warp_pitch_mm - warp_wire_mm, 2 * weft_pitch_mm - weft_wire_mm)
    return min(pitches) <= 0 or sum(sqrt(max(D**2 - p**2, 0.0)) for p in pitches) > D * (1 + 1e-12)


def opening_shape(warp_aperture_mm: float, weft_aperture_mm: float) -> str:
    """Trade's name of the shape of an opening.

    Width is the clear distance between warp wires, length that between weft wires (along the warp).

    Parameters:
        warp_aperture_mm: width between warp wires [mm], above 0
        weft_aperture_mm: length between weft wires [mm], above 0
    Returns: 'square', 'oblong' (longer than wide) or 'broad' (wider than long) [-]. Scalars only.
    Raises: OutOfDomainError where an aperture isn't above 0.
    Valid: square and rectangular cloth; figures that differ only by float noise (1 in 10⁹) count as equal.
    **Source**: common practice, no printed source.
    **Check value**: 2 mm between warp and 6 mm between weft wires is oblong (source: common practice).

    >>> opening_shape(2.0, 6.0)
    'oblong'
    """
    require_positive(warp_aperture_mm=warp_aperture_mm, weft_aperture_mm=weft_aperture_mm)
    if abs(warp_aperture_mm - weft_aperture_mm) <= 1e-9 * max(warp_aperture_mm, weft_aperture_mm):
        return "square"
    return "oblong" if weft_aperture_mm > warp_aperture_mm else "broad"


def longest_sphere_mm(warp_aperture_mm: float, weft_aperture_mm: float) -> float:
    """Diameter of the largest rigid sphere through square or rectangular cloth.

    x = min(w1, w2)

    Parameters:
        warp_aperture_mm: width between warp wires, w1 [mm], above 0
        weft_aperture_mm: length between weft wires, w2 [mm], above 0
    Returns: sphere diameter [mm]. Scalars only.
    Raises: OutOfDomainError where an aperture isn't above 0.
    Valid: nominal openings; one opening of a real cloth may be larger.
    **Source**: definition: the sphere has to clear both pairs of wires.
    **Check value**: 2 mm for an opening of 2 × 6 mm (source: by hand).

    >>> longest_sphere_mm(2.0, 6.0)
    2.0
    """
    require_positive(warp_aperture_mm=warp_aperture_mm, weft_aperture_mm=weft_aperture_mm)
    return min(warp_aperture_mm, weft_aperture_mm)
