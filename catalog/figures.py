"""The figures that follow from a construction, in one place: what is stored is what is computed here."""

from catalog.cloth import Figures
from catalog.construction import Construction, Weave
from catalog.physics import filter_cloth, geometry, mass

Pair = tuple[float, float]
DERIVATION_VERSION = 1
"""Raised when a formula changes; a store with another version is recomputed."""


def figures(construction: Construction, density_kg_m3: float | None) -> Figures:
    """Compute apertures (mm), open area (%), masses (kg/m²), thickness (mm).

    Mass is None where *density_kg_m3* is. Filter cloth has no aperture and no open area; its mass is the
    geometric estimate. The twilled Dutch sphere is filled in later: it takes seconds.
    """
    warp, weft = construction.warp, construction.weft
    pitches = float(warp.pitch_mm), float(weft.pitch_mm)
    wires = float(warp.wire_mm), float(weft.wire_mm)
    if construction.is_filter:
        return _filter_figures(construction.weave, pitches, wires, density_kg_m3)
    apertures = float(warp.aperture_mm), float(weft.aperture_mm)
    nominal = geometric = None
    if density_kg_m3 is not None:
        twilled = construction.weave is Weave.TWILLED
        nominal = mass.mass_nominal_kg_m2(*pitches, *wires, density_kg_m3)
        geometric = mass.mass_geometric_kg_m2(*pitches, *wires, density_kg_m3, twilled)
    return Figures(
        warp_aperture_mm=apertures[0],
        weft_aperture_mm=apertures[1],
        open_area_pct=geometry.open_area_pct(*apertures, *pitches),
        mass_kg_m2=nominal,
        mass_geometric_kg_m2=geometric,
        thickness_mm=geometry.thickness_least_mm(*wires),
    )


def _filter_figures(weave: Weave, pitches: Pair, wires: Pair, density_kg_m3: float | None) -> Figures:
    thickness = filter_cloth.thickness_mm(weave.value, *wires)
    mass_kg_m2 = porosity = sphere_um = None
    if density_kg_m3 is not None:
        mass_kg_m2 = filter_cloth.mass_kg_m2(weave.value, *pitches, *wires, density_kg_m3)
        porosity = filter_cloth.porosity(mass_kg_m2, thickness, density_kg_m3)
    if weave is Weave.PLAIN_DUTCH:
        sphere_um = filter_cloth.sphere_plain_dutch_um(*pitches, *wires)
    return Figures(None, None, None, mass_kg_m2, mass_kg_m2, thickness, porosity, sphere_um)
