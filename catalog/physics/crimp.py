"""Crimp: how much longer a wire is than the cloth it runs through, by Peirce's flexible-thread geometry.

Peirce (1937) takes a wire as straight parts joined by arcs that lie on the wires it crosses. D = d1 + d2.
"""

from math import atan2, sqrt

from catalog.physics.domain import OutOfDomainError, require_between, require_positive

ROUNDING = 1e-9


def arc_length_mm(pitch_mm: float, wires_mm: float, crimp_height_mm: float) -> float:
    """Length of wire from one crossing to the next.

    l = s + D·θ, straight part s = √(p² + (D − h)² − D²), the same as (h − D·(1 − cos θ)) / sin θ

    Parameters:
        pitch_mm: pitch of the wires that are crossed, p [mm], above 0
        wires_mm: sum of both diameters, D [mm], above 0
        crimp_height_mm: how far the wire's axis rises from crossing to crossing, h [mm], 0 to D
    Returns: length of the wire's axis over one pitch [mm], at least the pitch. Scalars only.
    Raises: OutOfDomainError where h is outside 0 to D or the wires are jammed (no straight part is left).
    Valid: round wires that bend without stiffness and keep their section.
    **Source**: Peirce, The geometry of cloth structure, J. Textile Inst. 28 (1937) T45.
    **Check value**: crimp 0.2092, θ 60° for p/D 0.866, h = D/2 (source: Peirce 1937, jammed square cloth).

    >>> from math import sqrt
    >>> round(arc_length_mm(sqrt(3) / 2, 1.0, 0.5) / (sqrt(3) / 2) - 1, 4)
    0.2092
    """
    straight, theta = _straight_and_angle(pitch_mm, wires_mm, crimp_height_mm)
    return straight + wires_mm * theta


def weave_angle_rad(pitch_mm: float, wires_mm: float, crimp_height_mm: float) -> float:
    """Steepest angle of a crimped wire's axis against the plane of the cloth.

    θ = atan2(D, s) − atan2(D − h, p), s = √(p² + (D − h)² − D²)

    Parameters:
        pitch_mm: pitch of the wires that are crossed, p [mm], above 0
        wires_mm: sum of both diameters, D [mm], above 0
        crimp_height_mm: how far the wire's axis rises from crossing to crossing, h [mm], 0 to D
    Returns: angle [rad], 0 to π/2. Scalars only.
    Raises: OutOfDomainError where h is outside 0 to D or the wires are jammed.
    Valid: as arc_length_mm.
    **Source**: Peirce 1937: D − h = D·cos θ − s·sin θ and p = s·cos θ + D·sin θ, solved for θ.
    **Check value**: 60° for p/D 0.866, h = D/2 (source: Peirce 1937, jammed square cloth).

    >>> from math import degrees, sqrt
    >>> round(degrees(weave_angle_rad(sqrt(3) / 2, 1.0, 0.5)), 3)
    60.0
    """
    return _straight_and_angle(pitch_mm, wires_mm, crimp_height_mm)[1]


def _straight_and_angle(p: float, D: float, h: float) -> tuple[float, float]:
    require_positive(pitch_mm=p, wires_mm=D)
    require_between(0.0, D, crimp_height_mm=h)
    # p² + (D − h)² − D², written so that nothing cancels where h is small
    squared = p * p - h * (2.0 * D - h)
    if squared < -ROUNDING * D * D:
        raise OutOfDomainError(
            f"Wires of {D:g} mm together are jammed at a pitch of {p:g} mm and a crimp height of {h:g} mm: "
            "a wider pitch was expected."
        )
    straight = sqrt(max(squared, 0.0))
    return straight, max(atan2(D, straight) - atan2(D - h, p), 0.0)


def crimp(pitch_mm: float, wires_mm: float, crimp_height_mm: float) -> float:
    """Crimp of a wire in plain weave: its length over the cloth's, less one.

    c = l / p − 1

    Parameters:
        pitch_mm: pitch of the wires that are crossed, p [mm], above 0
        wires_mm: sum of both diameters, D [mm], above 0
        crimp_height_mm: how far the wire's axis rises from crossing to crossing, h [mm], 0 to D
    Returns: crimp as a fraction [-], 0 or more. Scalars only.
    Raises: OutOfDomainError as arc_length_mm.
    Valid: plain weave; a 2/2 twill crosses once in two pitches and has half of it.
    **Source**: Peirce 1937 (definition).
    **Check value**: 0.2092 for jammed square cloth, p/D 0.866 (source: Peirce 1937).

    >>> from math import sqrt
    >>> round(crimp(sqrt(3) / 2, 1.0, 0.5), 4)
    0.2092
    """
    return arc_length_mm(pitch_mm, wires_mm, crimp_height_mm) / pitch_mm - 1.0


def crimps(
    warp_pitch_mm: float, weft_pitch_mm: float, warp_wire_mm: float, weft_wire_mm: float, is_twilled: bool = False
) -> tuple[float, float]:
    """Crimp of warp and of weft wires of square or rectangular cloth, crowns flush where the pitches allow.

    h1 = d2, h2 = d1 (flush), shifted no further than needed where one set would jam; h1 + h2 = D. In 2/2
    twill one of two pitches has a crossing: c = (l − pc) / 2p with pc = p, or the least that the crossing
    needs where the wires have to lie in pairs.

    Parameters:
        warp_pitch_mm: pitch of the warp wires, p1 [mm], above 0
        weft_pitch_mm: pitch of the weft wires, p2 [mm], above 0
        warp_wire_mm: warp wire diameter, d1 [mm], above 0
        weft_wire_mm: weft wire diameter, d2 [mm], above 0
        is_twilled: whether the weave is a 2/2 twill [-]
    Returns: crimp of the warp and of the weft as fractions [-], 0 or more. Scalars only.
    Raises: OutOfDomainError where the wires can't be woven so tight.
    Valid: round wires that keep their section; flush crowns are an assumption, true of balanced cloth.
    **Source**: Peirce 1937; the shift and the pairing in twill are derived from his jamming condition.
    **Check value**: 14.35 % plain, 7.1751 % twilled for equal wires at d/p 0.5 (source: crimp table worked
        separately from Peirce's equations, tests/published/data/crimp_checks.csv).

    >>> [round(100 * c, 2) for c in crimps(1.0, 1.0, 0.5, 0.5)]
    [14.35, 14.35]
    """
    D = warp_wire_mm + weft_wire_mm
    require_positive(warp_wire_mm=warp_wire_mm, weft_wire_mm=weft_wire_mm)
    require_positive(warp_pitch_mm=warp_pitch_mm, weft_pitch_mm=weft_pitch_mm)
    reach1, reach2 = warp_pitch_mm, weft_pitch_mm
    if is_twilled:
        reach1, reach2 = 2 * warp_pitch_mm - warp_wire_mm, 2 * weft_pitch_mm - weft_wire_mm
    h1 = _warp_crimp_height_mm(reach1, reach2, D, weft_wire_mm)
    warp = _crimp_over(weft_pitch_mm, D, h1, is_twilled)
    return warp, _crimp_over(warp_pitch_mm, D, D - h1, is_twilled)


def _warp_crimp_height_mm(reach1: float, reach2: float, D: float, flush: float) -> float:
    """The height nearest *flush* at which neither set jams: √(D² − p1²) ≤ h1 ≤ D − √(D² − p2²)."""
    if min(reach1, reach2) <= 0:
        raise OutOfDomainError("The wires overlap: a pitch above the wire's diameter was expected.")
    least = sqrt(max(D**2 - reach1**2, 0.0))
    most = D - sqrt(max(D**2 - reach2**2, 0.0))
    if least > most + ROUNDING * D:
        raise OutOfDomainError(
            "The wires are jammed: no share of the crimp between warp and weft lets them be woven so tight; "
            "a wider pitch or a thinner wire was expected."
        )
    return min(max(flush, least), most)


def _crimp_over(pitch: float, D: float, h: float, is_twilled: bool) -> float:
    if not is_twilled:
        return crimp(pitch, D, h)
    crossing = max(pitch, sqrt(D**2 - (D - h) ** 2))
    return (arc_length_mm(crossing, D, h) - crossing) / (2.0 * pitch)
