"""Density and viscosity of air and water at a temperature, from published correlations."""

from dataclasses import dataclass

from catalog.physics.domain import require_between, require_positive

ATMOSPHERE_PA = 101_325.0
ZERO_C_K = 273.15
GAS_CONSTANT = 8.314462618
"""J/(mol·K), SI definition of 2019."""
DRY_AIR_KG_MOL = 0.0289644
"""Molar mass of dry air, US Standard Atmosphere 1976."""
KELL = (999.83952, 16.945176, -7.9870401e-3, -46.170461e-6, 105.56302e-9, -280.54253e-12)
"""Factors of rising powers of t in °C."""
WATER_VISCOSITY = ((280.68, -1.9), (511.45, -7.7), (61.131, -19.6), (0.45903, -40.0))


@dataclass(frozen=True, slots=True)
class Fluid:
    """What flows through the cloth."""

    name: str
    density_kg_m3: float
    viscosity_pa_s: float

    def __post_init__(self) -> None:
        require_positive(density_kg_m3=self.density_kg_m3, viscosity_pa_s=self.viscosity_pa_s)


def air(temperature_c: float, pressure_pa: float = ATMOSPHERE_PA) -> Fluid:
    """Dry air at a temperature: density as an ideal gas, viscosity by Sutherland's formula.

    ρ = p·M / (R·T), µ = 1.458e-6 · T^1.5 / (T + 110.4)

    Parameters:
        temperature_c: temperature [°C], −100 to 500
        pressure_pa: absolute pressure [Pa], above 0; ideal up to about 1 MPa
    Returns: density [kg/m³] and dynamic viscosity [Pa·s]. Scalars only.
    Raises: OutOfDomainError where a figure is outside its range.
    Valid: dry air; damp air is up to 1 % lighter at room temperature.
    **Source**: US Standard Atmosphere 1976, equations 42 and 51 (ideal gas; Sutherland's constants).
    **Check value**: 1.204 kg/m³ and 1.813e-5 Pa·s at 20 °C (source: handbook value, from memory; the fluids
        library's standard atmosphere agrees).

    >>> a = air(20)
    >>> round(a.density_kg_m3, 3), round(a.viscosity_pa_s * 1e5, 3)
    (1.204, 1.813)
    """
    require_between(-100.0, 500.0, temperature_c=temperature_c)
    require_positive(pressure_pa=pressure_pa)
    kelvin = temperature_c + ZERO_C_K
    density = pressure_pa * DRY_AIR_KG_MOL / (GAS_CONSTANT * kelvin)
    viscosity = 1.458e-6 * kelvin * kelvin**0.5 / (kelvin + 110.4)
    return Fluid(f"air at {temperature_c:g} °C", density, viscosity)


def water(temperature_c: float) -> Fluid:
    """Liquid water at a temperature and one atmosphere.

    ρ by Kell's ratio of polynomials in t; µ = 1e-6·Σ a·(T/300 K)^b over four pairs a, b

    Parameters:
        temperature_c: temperature, t (T in kelvin) [°C], 0 to 100
    Returns: density [kg/m³] and dynamic viscosity [Pa·s]. Scalars only.
    Raises: OutOfDomainError where the temperature is outside 0 to 100 °C.
    Valid: pure, free of air, at about 101 kPa.
    **Source**: density: Kell, J. Chem. Eng. Data 20 (1975) 97; viscosity: Huber et al., J. Phys. Chem. Ref. Data
        38 (2009) 101, the correlation for 0.1 MPa (IAPWS SR6-08).
    **Check value**: 997.05 kg/m³ and 0.890e-3 Pa·s at 25 °C (source: IAPWS release on viscosity 2008, table of
        check values, 889.735 µPa·s; density from handbooks, from memory).

    >>> w = water(25)
    >>> round(w.density_kg_m3, 2), round(w.viscosity_pa_s * 1e3, 3)
    (997.04, 0.89)
    """
    require_between(0.0, 100.0, temperature_c=temperature_c)
    t, scaled = temperature_c, (temperature_c + ZERO_C_K) / 300.0
    above = 0.0
    for factor in reversed(KELL):
        above = above * t + factor
    viscosity = 1e-6 * sum(a * scaled**b for a, b in WATER_VISCOSITY)
    return Fluid(f"water at {t:g} °C", above / (1.0 + 16.879850e-3 * t), viscosity)
