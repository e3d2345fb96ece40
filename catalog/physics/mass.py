"""Mass per area of square and rectangular cloth, nominal and geometric, and of a roll or a cut."""

from math import pi

from catalog.physics.crimp import crimps
from catalog.physics.domain import OutOfDomainError, require_positive, require_wire_below_pitch

ISO_9044_DIVISOR = 618.1
"""Straight round wire would give 2000/π = 636.62: the difference is a fixed 3.0 % for crimp."""


def mass_nominal_kg_m2(
    warp_pitch_mm: float, weft_pitch_mm: float, warp_wire_mm: float, weft_wire_mm: float, density_kg_m3: float
) -> float:
    """Nominal mass per area of square or rectangular cloth, the figure certificates quote.

    m = ρ / (2·618.1) · (d1²/p1 + d2²/p2); square: ρ·d² / (618.1·p)

    Parameters:
        warp_pitch_mm: pitch of the warp wires, p1 [mm], above d1
        weft_pitch_mm: pitch of the weft wires, p2 [mm], above d2
        warp_wire_mm: warp wire diameter, d1 [mm], above 0
        weft_wire_mm: weft wire diameter, d2 [mm], above 0
        density_kg_m3: density of the wire, ρ [kg/m³], above 0
    Returns: mass per area [kg/m²]. Scalars only.
    Raises: OutOfDomainError where a figure isn't above 0 or a wire isn't thinner than its pitch.
    Valid: woven cloth, uncoated; crimp is a fixed 3.0 %, too little above d/p 0.34 plain.
    **Source**: ISO 9044 (formula from memory).
    **Check value**: 2.13018 kg/m² for w 1 mm, d 0.5 mm, 7900 kg/m³ (source: sum done separately from the
        formula, tests/published/data/check_values.csv).

    >>> round(mass_nominal_kg_m2(1.5, 1.5, 0.5, 0.5, 7900), 5)
    2.13018
    """
    require_wire_below_pitch(warp_pitch_mm, warp_wire_mm)
    require_wire_below_pitch(weft_pitch_mm, weft_wire_mm)
    require_positive(density_kg_m3=density_kg_m3)
    sections = warp_wire_mm**2 / warp_pitch_mm + weft_wire_mm**2 / weft_pitch_mm
    return density_kg_m3 / (2.0 * ISO_9044_DIVISOR) * sections


def mass_straight_kg_m2(
    warp_pitch_mm: float, weft_pitch_mm: float, warp_wire_mm: float, weft_wire_mm: float, density_kg_m3: float
) -> float:
    """Mass per area if all wires lay straight: the least that the cloth can weigh.

    m = ρ·π/4 · (d1²/p1 + d2²/p2) / 1000

    Parameters:
        warp_pitch_mm: pitch of the warp wires, p1 [mm], above 0
        weft_pitch_mm: pitch of the weft wires, p2 [mm], above 0
        warp_wire_mm: warp wire diameter, d1 [mm], above 0
        weft_wire_mm: weft wire diameter, d2 [mm], above 0
        density_kg_m3: density of the wire, ρ [kg/m³], above 0
    Returns: mass per area [kg/m²]. Scalars only.
    Raises: OutOfDomainError where a figure isn't above 0.
    Valid: a lower bound for any weave.
    **Source**: definition: length of wire per area times section times density.
    **Check value**: 2.06822 kg/m² for w 1 mm, d 0.5 mm, 7900 kg/m³ (source: sum done separately from the
        definition, tests/published/data/check_values.csv).

    >>> round(mass_straight_kg_m2(1.5, 1.5, 0.5, 0.5, 7900), 5)
    2.06822
    """
    require_positive(warp_pitch_mm=warp_pitch_mm, weft_pitch_mm=weft_pitch_mm, density_kg_m3=density_kg_m3)
    require_positive(warp_wire_mm=warp_wire_mm, weft_wire_mm=weft_wire_mm)
    sections = warp_wire_mm**2 / warp_pitch_mm + weft_wire_mm**2 / weft_pitch_mm
    return density_kg_m3 * pi / 4.0 * sections / 1000.0


def mass_geometric_kg_m2(
    warp_pitch_mm: float,
    weft_pitch_mm: float,
    warp_wire_mm: float,
    weft_wire_mm: float,
    density_kg_m3: float,
    is_twilled: bool = False,
) -> float | None:
    """Geometric mass per area of plain or 2/2 twilled cloth: straight wire times crimp, direction by direction.

    m = ρ·π/4 · (d1²/p1·(1 + c1) + d2²/p2·(1 + c2)) / 1000

    Parameters:
        warp_pitch_mm: pitch of the warp wires, p1 [mm], above d1
        weft_pitch_mm: pitch of the weft wires, p2 [mm], above d2
        warp_wire_mm: warp wire diameter, d1 [mm], above 0
        weft_wire_mm: weft wire diameter, d2 [mm], above 0
        density_kg_m3: density of the wire, ρ [kg/m³], above 0
        is_twilled: whether the weave is a 2/2 twill [-]
    Returns: mass per area [kg/m²]; None where the wires are jammed and the geometry has no answer. Scalars only.
    Raises: OutOfDomainError where a figure isn't above 0 or a wire isn't thinner than its pitch.
    Valid: round wires that keep their section, crowns flush where the pitches allow.
    **Source**: Peirce, The geometry of cloth structure, J. Textile Inst. 28 (1937) T45, for the crimps.
    **Check value**: 2.18916 kg/m² for w 1 mm, d 0.5 mm, 7900 kg/m³, plain (source: sum done separately from
        Peirce's equations, tests/published/data/check_values.csv).

    >>> round(mass_geometric_kg_m2(1.5, 1.5, 0.5, 0.5, 7900) or 0, 5)
    2.18916
    """
    require_wire_below_pitch(warp_pitch_mm, warp_wire_mm)
    require_wire_below_pitch(weft_pitch_mm, weft_wire_mm)
    require_positive(density_kg_m3=density_kg_m3)
    try:
        warp, weft = crimps(warp_pitch_mm, weft_pitch_mm, warp_wire_mm, weft_wire_mm, is_twilled)
    except OutOfDomainError:
        return None
    sections = warp_wire_mm**2 / warp_pitch_mm * (1 + warp) + weft_wire_mm**2 / weft_pitch_mm * (1 + weft)
    return density_kg_m3 * pi / 4.0 * sections / 1000.0


def net_mass_band_kg(area_m2: float, masses_kg_m2: tuple[float, ...], spread_pct: float) -> tuple[float, float]:
    """Net mass of a roll or a cut as an honest band: least and most of the estimates, widened by a spread.

    least = A·min(m)·(1 − k), most = A·max(m)·(1 + k), k = spread/100

    Parameters:
        area_m2: area of the roll or cut [m²], above 0
        masses_kg_m2: every estimate of the mass per area to be covered [kg/m²], at least one, each above 0
        spread_pct: allowance for wire, count and crimp that the user states [%], 0 to 50
    Returns: least and most net mass, without core or packing [kg]. Scalars only.
    Raises: OutOfDomainError where there is no estimate or a figure is outside its range.
    Valid: a bare estimate; no published tolerance of the mass of industrial cloth could be confirmed, so the
        spread is the user's and is to be named as such.
    **Source**: definition; an allowance on wire diameter counts twice in mass (m ∝ d²).
    **Check value**: 30 m² at 2 to 2.1 kg/m², ±5 %: 57.0 to 66.15 kg (source: sum by hand).

    >>> [round(kg, 2) for kg in net_mass_band_kg(30.0, (2.0, 2.1), 5.0)]
    [57.0, 66.15]
    """
    require_positive(area_m2=area_m2)
    if not masses_kg_m2 or not 0 <= spread_pct <= 50:
        raise OutOfDomainError(f"At least one mass and a spread of 0 to 50 % were expected, not {spread_pct:g} %.")
    for mass in masses_kg_m2:
        require_positive(mass_kg_m2=mass)
    share = spread_pct / 100.0
    return area_m2 * min(masses_kg_m2) * (1 - share), area_m2 * max(masses_kg_m2) * (1 + share)
