"""Wire alloys: designations, density with its basis, and the ladder that says what may stand in for what."""

from catalog.reference.alloy_ladder import OUTCOMES, Gate, gate
from catalog.reference.alloy_names import find
from catalog.reference.alloy_rows import Alloy, alloy, alloys

SOURCE = "designations and densities as marked in each row; what is from memory wants confirming against the standard"

__all__ = ["OUTCOMES", "SOURCE", "Alloy", "Gate", "alloy", "alloys", "density_kg_m3", "find", "gate"]


def density_kg_m3(alloy_id: str) -> float | None:
    """Density, kg/m³; None where the alloy isn't in the table."""
    known = alloy(alloy_id)
    return known.density_kg_m3 if known else None
