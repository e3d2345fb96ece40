"""Loss coefficient and pressure drop of a clean cloth at a face velocity."""

from dataclasses import dataclass
from math import log

from catalog.physics.domain import OutOfDomainError, require_between, require_positive
from catalog.physics.flow_bed import Bed
from catalog.physics.fluid_properties import Fluid

ARMOUR_CANNON, ROUND_WIRE, BLENDED = (
    "Armour-Cannon",
    "round-wire screen",
    "Armour-Cannon and round-wire screen, blended",
)
RE_RANGE, POROSITY_RANGE, PORE_RANGE_MM = (0.1, 1000.0), (0.35, 0.76), (0.005, 0.55)
OPEN_AREA_RANGE = (0.05, 0.8)
SCREEN_RE = (20.0, 30.0, 40.0, 60.0, 80.0, 100.0, 200.0, 400.0)
SCREEN_BETA = (1.3, 1.1, 0.95, 0.83, 0.75, 0.7, 0.6, 0.52)
FINE_BLEND_RE, COARSE_BLEND_RE = (100.0, 200.0), (20.0, 40.0)
"""Reynolds numbers over which one relation gives way to the other, so that no step appears between them."""
UNCERTAINTY_PCT = 30.0
CLEAN = "Clean cloth only."
VISCOUS = "At low speed through plain square cloth the relation may lie some 60 % high, by independent simulation."
DUTCH = "For plain Dutch cloth the relation may lie some 35 % low, by independent simulation."


@dataclass(frozen=True, slots=True)
class FlowLoss:
    """A loss with its method and how far it can be trusted."""

    K: float
    """2·Δp/(ρ·u²), against the face velocity."""
    pressure_drop_pa: float
    method: str
    in_range: bool
    """Whether the method's stated range holds."""
    uncertainty_pct: float | None
    """±; None outside the range, where nobody has stated one."""
    notes: tuple[str, ...] = ()


def bed_reynolds(bed: Bed, velocity_m_s: float, fluid: Fluid) -> float:
    """Reynolds number of a cloth taken as a bed of wires.

    Re = ρ·u / (µ·a²·Dp)

    Parameters:
        bed: the cloth's bed, from square_bed or dutch_bed [mm, 1/m]
        velocity_m_s: face velocity, before the cloth, u [m/s], above 0
        fluid: density and viscosity [kg/m³, Pa·s]
    Returns: Reynolds number [-]. Scalars only.
    Raises: OutOfDomainError where the velocity isn't above 0.
    Valid: any clean cloth.
    **Source**: Armour and Cannon, Fluid flow through woven screens, AIChE J. 14 (1968) 415.
    **Check value**: 24.386 for w 1.0, d 0.4 mm, air 1.204 kg/m³, 1.813e-5 Pa·s, 2 m/s (source: sum done
        separately, tests/published/data/check_values.csv).

    >>> from catalog.physics.flow_bed import square_bed
    >>> round(bed_reynolds(square_bed(1.4, 1.4, 0.4, 0.4), 2.0, Fluid("air", 1.204, 1.813e-5)), 3)
    24.386
    """
    require_positive(velocity_m_s=velocity_m_s)
    return fluid.density_kg_m3 * velocity_m_s / (fluid.viscosity_pa_s * bed.surface_per_m**2 * bed.pore_mm / 1000.0)


def armour_cannon_loss(bed: Bed, velocity_m_s: float, fluid: Fluid) -> float:
    """Loss coefficient of a clean cloth by the packed-bed relation of Armour and Cannon.

    Δp = Q·B·ρ·u²/(ε²·Dp) · (8.61/Re + 0.52), K = 2·Δp/(ρ·u²)

    Parameters:
        bed: the cloth's bed, from square_bed or dutch_bed [mm, 1/m]
        velocity_m_s: face velocity, u [m/s], above 0
        fluid: density and viscosity [kg/m³, Pa·s]
    Returns: K against the face velocity [-]. Scalars only.
    Raises: OutOfDomainError where the velocity isn't above 0.
    Valid: Re 0.1 to 1000, porosity 0.35 to 0.76, pores 5 to 550 µm; computed beyond, flagged by flow_loss.
    **Source**: Armour and Cannon, Fluid flow through woven screens, AIChE J. 14 (1968) 415.
    **Check value**: 2.3769 for w 1.0, d 0.4 mm, air 1.204 kg/m³, 1.813e-5 Pa·s, 2 m/s; outside the stated range,
        checks the formula only (source: sum done separately, tests/published/data/check_values.csv).

    >>> from catalog.physics.flow_bed import square_bed
    >>> round(armour_cannon_loss(square_bed(1.4, 1.4, 0.4, 0.4), 2.0, Fluid("air", 1.204, 1.813e-5)), 4)
    2.3769
    """
    reynolds = bed_reynolds(bed, velocity_m_s, fluid)
    per_pore = bed.path_factor * bed.thickness_mm / (bed.porosity**2 * bed.pore_mm)
    return 2.0 * per_pore * (8.61 / reynolds + 0.52)


def wire_reynolds(bed: Bed, velocity_m_s: float, fluid: Fluid) -> float:
    """Reynolds number of the wires of square or rectangular cloth, at the speed in the openings.

    Re' = u·d·ρ / (α·µ)

    Parameters:
        bed: bed of square or rectangular cloth, from square_bed [mm, fractions]
        velocity_m_s: face velocity, u [m/s], above 0
        fluid: density and viscosity [kg/m³, Pa·s]
    Returns: Reynolds number [-]. Scalars only.
    Raises: OutOfDomainError where the velocity isn't above 0 or the cloth is filter cloth.
    Valid: cloth with open area; unequal wires by the thicker one.
    **Source**: definition, as the round-wire screen relation uses it.
    **Check value**: 104.1 for w 1.0, d 0.4 mm, air 1.204 kg/m³, 1.813e-5 Pa·s, 2 m/s (source: sum by hand).

    >>> from catalog.physics.flow_bed import square_bed
    >>> round(wire_reynolds(square_bed(1.4, 1.4, 0.4, 0.4), 2.0, Fluid("air", 1.204, 1.813e-5)), 1)
    104.1
    """
    require_positive(velocity_m_s=velocity_m_s)
    if bed.open_area is None or bed.wire_mm is None:
        raise OutOfDomainError("Filter cloth has no open area: the round-wire screen relation doesn't hold for it.")
    return velocity_m_s * bed.wire_mm / 1000.0 * fluid.density_kg_m3 / (bed.open_area * fluid.viscosity_pa_s)


def round_wire_screen_loss(open_area: float, reynolds: float) -> float:
    """Loss coefficient of a screen of round wires.

    K = β(Re')·(1 − α²)/α², β interpolated in a table from 1.3 at 20 to 0.52 at 400 and above

    Parameters:
        open_area: open area as a fraction, α [-], 0.05 to 0.8
        reynolds: Re' = u·d·ρ/(α·µ) [-], 20 or more
    Returns: K against the face velocity [-]. Scalars only.
    Raises: OutOfDomainError where α is outside 0.05 to 0.8 or Re' below 20.
    Valid: flow at right angles, no compression.
    **Source**: Blevins, Applied Fluid Dynamics Handbook (1984), round-wire screen, table of β.
    **Check value**: 2.1 at α 0.5, Re' 100 (source: documentation of the fluids library, round_edge_screen).

    >>> round(round_wire_screen_loss(0.5, 100), 6)
    2.1
    """
    require_between(*OPEN_AREA_RANGE, open_area=open_area)
    require_between(SCREEN_RE[0], float("inf"), reynolds=reynolds)
    beta = SCREEN_BETA[-1]
    for k in range(len(SCREEN_RE) - 1):
        low, high = SCREEN_RE[k], SCREEN_RE[k + 1]
        if low <= reynolds <= high:
            beta = SCREEN_BETA[k] + (SCREEN_BETA[k + 1] - SCREEN_BETA[k]) * (reynolds - low) / (high - low)
            break
    return beta * (1.0 - open_area**2) / open_area**2


def flow_loss(bed: Bed, velocity_m_s: float, fluid: Fluid) -> FlowLoss:
    """Loss coefficient and pressure drop of a clean cloth by the method that holds there.

    Armour-Cannon inside its stated range; the round-wire screen relation for coarser cloth from Re' 40 and for
    any square cloth from Re' 200 on. Over a factor of two below (20–40, 100–200) both are blended, in the logarithm
    of Re'. Where neither holds, Armour-Cannon is carried on and flagged.

    Parameters:
        bed: the cloth's bed, from square_bed or dutch_bed [mm, 1/m, fractions]
        velocity_m_s: face velocity, u [m/s], above 0
        fluid: density and viscosity, from air, water or given [kg/m³, Pa·s]
    Returns: K [-], pressure drop [Pa], method, whether in range, ± [%] or None, notes. Scalars only.
    Raises: OutOfDomainError where the velocity isn't above 0.
    Valid: clean, dry cloth at right angles to the flow; gas far below the speed of sound.
    **Source**: Armour and Cannon, AIChE J. 14 (1968) 415; Blevins, Applied Fluid Dynamics Handbook (1984); the
        blending is ours.
    **Check value**: K 46.5685 and 28.03 Pa for w 0.075, d 0.05 mm, air 1.204 kg/m³, 1.813e-5 Pa·s, 1 m/s
        (source: sum done separately, tests/published/data/check_values.csv).

    >>> from catalog.physics.flow_bed import square_bed
    >>> loss = flow_loss(square_bed(0.125, 0.125, 0.05, 0.05), 1.0, Fluid("air", 1.204, 1.813e-5))
    >>> round(loss.K, 4), round(loss.pressure_drop_pa, 2), loss.in_range
    (46.5685, 28.03, True)
    """
    reynolds = bed_reynolds(bed, velocity_m_s, fluid)
    fits = _is_between(bed.porosity, POROSITY_RANGE) and _is_between(bed.pore_mm, PORE_RANGE_MM)
    in_range = fits and _is_between(reynolds, RE_RANGE)
    share = _screen_share(bed, velocity_m_s, fluid, fits)
    K = armour_cannon_loss(bed, velocity_m_s, fluid)
    method = ARMOUR_CANNON
    if share > 0.0 and bed.open_area is not None:
        screen = round_wire_screen_loss(bed.open_area, wire_reynolds(bed, velocity_m_s, fluid))
        K = (1.0 - share) * K + share * screen
        method = ROUND_WIRE if share == 1.0 else BLENDED
        in_range = share == 1.0 or in_range
    pressure = K * fluid.density_kg_m3 * velocity_m_s**2 / 2.0
    return FlowLoss(K, pressure, method, in_range, UNCERTAINTY_PCT if in_range else None, _notes(bed, method, in_range))


def _is_between(value: float, ends: tuple[float, float]) -> bool:
    return ends[0] <= value <= ends[1]


def _screen_share(bed: Bed, velocity_m_s: float, fluid: Fluid, fits_bed: bool) -> float:
    """How much the round-wire screen relation counts, 0 to 1."""
    if bed.open_area is None or not _is_between(bed.open_area, OPEN_AREA_RANGE):
        return 0.0
    low, high = FINE_BLEND_RE if fits_bed else COARSE_BLEND_RE
    reynolds = wire_reynolds(bed, velocity_m_s, fluid)
    return min(max(log(reynolds / low) / log(high / low), 0.0), 1.0)


def _notes(bed: Bed, method: str, in_range: bool) -> tuple[str, ...]:
    notes = [CLEAN, *bed.notes]
    if method != ROUND_WIRE:
        notes.append(VISCOUS if bed.open_area is not None else DUTCH)
    if not in_range:
        notes.append("Outside the range that any relation held here states: an extrapolation without a stated ±.")
    return tuple(notes)


def loss_ratio(asked: FlowLoss, offered: FlowLoss) -> float:
    """Pressure drop of an offered cloth as a multiple of that of the asked one, at the same flow.

    Δp offered / Δp asked

    Parameters:
        asked: loss of the cloth asked for [Pa]
        offered: loss of the cloth offered, same fluid and face velocity [Pa]
    Returns: ratio [-], above 1 where the offered cloth resists more. Scalars only.
    Raises: OutOfDomainError where a pressure drop isn't above 0.
    Valid: errors that both share (the method's) cancel in part.
    **Source**: definition.
    **Check value**: 1 for a cloth against itself (source: definition).

    >>> a = FlowLoss(1.0, 10.0, ARMOUR_CANNON, True, 30.0)
    >>> loss_ratio(a, a)
    1.0
    """
    require_positive(asked_pa=asked.pressure_drop_pa, offered_pa=offered.pressure_drop_pa)
    return offered.pressure_drop_pa / asked.pressure_drop_pa
