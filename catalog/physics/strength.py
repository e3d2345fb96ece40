"""Strength and stiffness of cloth, direction by direction: what the metal alone would bear, and ratios.

Crimp, crossings and welds or selvedges are not in these figures; they compare cloths, they design nothing.
"""

from catalog.physics.domain import OutOfDomainError, require_positive
from catalog.physics.geometry import section_mm2_per_mm


def breaking_load_n_per_mm(
    pitch_mm: float, wire_mm: float, tensile_least_mpa: float, tensile_most_mpa: float
) -> tuple[float, float]:
    """Breaking load of the wires of one direction per width of cloth, as a range.

    F = Rm·π·d² / (4·p); 1 N/mm is 1 kN/m

    Parameters:
        pitch_mm: pitch of the wires, p [mm], above 0
        wire_mm: their diameter, d [mm], above 0
        tensile_least_mpa: least tensile strength of the wire as woven, Rm [MPa], above 0
        tensile_most_mpa: greatest tensile strength [MPa], at least the least
    Returns: least and most load [N/mm]. Scalars only.
    Raises: OutOfDomainError where a figure isn't above 0 or the range runs backwards.
    Valid: all wires share the load evenly; crimped wire and clamps bear less. No load to design by.
    **Source**: definition of tensile strength, ISO 6892-1; wire sections add up.
    **Check value**: 78.5 N/mm for d 0.5 mm at p 1.5 mm and 600 MPa (source: 600·π/24 by hand).

    >>> [round(f, 1) for f in breaking_load_n_per_mm(1.5, 0.5, 600, 800)]
    [78.5, 104.7]
    """
    require_positive(tensile_least_mpa=tensile_least_mpa)
    if tensile_most_mpa < tensile_least_mpa:
        raise OutOfDomainError(f"The tensile range {tensile_least_mpa:g} to {tensile_most_mpa:g} MPa runs backwards.")
    section = section_mm2_per_mm(pitch_mm, wire_mm)
    return section * tensile_least_mpa, section * tensile_most_mpa


def stiffness_index_mm3(pitch_mm: float, wire_mm: float) -> float:
    """Index of the bending stiffness of the wires of one direction per width of cloth.

    I = d⁴ / p (π/64 of it is the second moment of area per width)

    Parameters:
        pitch_mm: pitch of the wires, p [mm], above 0
        wire_mm: their diameter, d [mm], above 0
    Returns: index [mm³]; only ratios of it mean anything. Scalars only.
    Raises: OutOfDomainError where a figure isn't above 0.
    Valid: comparing cloths of the same metal; crimp and friction at crossings are left out.
    **Source**: second moment of area of a circle, π·d⁴/64 (any handbook of mechanics), times wires per width.
    **Check value**: wire twice as thick at the same pitch is 16 times as stiff (source: fourth power, by hand).

    >>> stiffness_index_mm3(4.0, 2.0) / stiffness_index_mm3(4.0, 1.0)
    16.0
    """
    require_positive(pitch_mm=pitch_mm, wire_mm=wire_mm)
    return wire_mm**4 / pitch_mm


def section_ratio(
    asked_pitch_mm: float, asked_wire_mm: float, offered_pitch_mm: float, offered_wire_mm: float
) -> float:
    """Metal section of an offered cloth in one direction as a multiple of the asked one.

    (d²/p offered) / (d²/p asked)

    Parameters:
        asked_pitch_mm: pitch asked for [mm], above 0
        asked_wire_mm: wire asked for [mm], above 0
        offered_pitch_mm: pitch offered [mm], above 0
        offered_wire_mm: wire offered [mm], above 0
    Returns: ratio [-], 1 for equal metal. Scalars only.
    Raises: OutOfDomainError where a figure isn't above 0.
    Valid: any round wires.
    **Source**: definition of the section, as section_mm2_per_mm.
    **Check value**: 107 % for 62 × .0065 in offered for 0.25/0.16 mm (source: sum by hand).

    >>> round(section_ratio(0.41, 0.16, 25.4 / 62, 0.0065 * 25.4), 3)
    1.066
    """
    return section_mm2_per_mm(offered_pitch_mm, offered_wire_mm) / section_mm2_per_mm(asked_pitch_mm, asked_wire_mm)


def stiffness_ratio(
    asked_pitch_mm: float, asked_wire_mm: float, offered_pitch_mm: float, offered_wire_mm: float
) -> float:
    """Bending stiffness of an offered cloth in one direction as a multiple of the asked one.

    (d⁴/p offered) / (d⁴/p asked)

    Parameters:
        asked_pitch_mm: pitch asked for [mm], above 0
        asked_wire_mm: wire asked for [mm], above 0
        offered_pitch_mm: pitch offered [mm], above 0
        offered_wire_mm: wire offered [mm], above 0
    Returns: ratio [-], 1 for equal stiffness. Scalars only.
    Raises: OutOfDomainError where a figure isn't above 0.
    Valid: the same metal both times.
    **Source**: as stiffness_index_mm3.
    **Check value**: wire 10 % thicker at the same pitch is 1.4641 times as stiff (source: 1.1⁴ by hand).

    >>> round(stiffness_ratio(1.0, 0.1, 1.0, 0.11), 4)
    1.4641
    """
    offered = stiffness_index_mm3(offered_pitch_mm, offered_wire_mm)
    return offered / stiffness_index_mm3(asked_pitch_mm, asked_wire_mm)
