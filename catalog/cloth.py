"""A catalogued cloth: a construction with its names, what was stated of it and where that comes from."""

from dataclasses import dataclass

from catalog.construction import Construction


@dataclass(frozen=True, slots=True)
class Rating:
    """What filter cloth is said to hold back. Never computed here: a supplier's or a laboratory's figure."""

    um: float
    """Particle size, µm."""
    kind: str
    """'nominal', 'absolute' or 'unstated'."""
    method: str = ""
    """'glass bead', 'bubble point', 'computed' or '' where it isn't stated."""


@dataclass(frozen=True, slots=True)
class Figures:
    """What follows from a construction. mm, %, kg/m²; None where the quantity has no meaning."""

    warp_aperture_mm: float | None
    weft_aperture_mm: float | None
    open_area_pct: float | None
    mass_kg_m2: float | None
    """ISO 9044 nominal; for filter cloth the geometric estimate. None where the alloy's density is unknown."""
    mass_geometric_kg_m2: float | None
    thickness_mm: float
    """Crowns flush, the least: d1 + d2; filter cloth D + 2d."""
    porosity: float | None = None
    sphere_um: float | None = None
    """Largest rigid sphere, µm: geometric estimate for Dutch weaves; None where there is no model."""


@dataclass(frozen=True, slots=True)
class Cloth:
    """A cloth in the catalogue."""

    id: str
    """Stable text id."""
    name: str
    construction: Construction
    figures: Figures
    declared: str
    """How it is sold, as written: '60 × 60 mesh, .0065 in'."""
    unit_system: str
    """'inch' or 'metric': the system it is sold in."""
    source: str
    rating: Rating | None = None
    grade: str | None = None
    standard: str | None = None
    demo: bool = False
    stated_open_area_pct: float | None = None
    stated_mass_kg_m2: float | None = None
    stated_aperture_mm: float | None = None
    """Where a list states an aperture beside count and wire; what is computed is in *figures*."""
    stated_count_per_in: float | None = None
    """Where a list states a count beside aperture and wire."""
