"""A cloth under suspicion: its odds, whether it is in the 95 % set, and the sentence that says why."""

from dataclasses import dataclass

from catalog.cloth import Cloth
from catalog.construction import Construction, Wires
from catalog.search.evidence import Evidence, Stand, mass_range_kg_m2, thickness_range_mm
from catalog.search.measured import Count, Scalar

NAMES = {
    "pitch": "pitch",
    "pitch_weft": "pitch of the weft",
    "wire": "wire",
    "wire_weft": "wire of the weft",
    "aperture": "aperture",
    "aperture_weft": "aperture of the weft",
    "thickness": "thickness",
    "mass": "mass",
    "magnet": "magnet",
}


@dataclass(frozen=True, slots=True)
class Suspect:
    """A cloth that was set against the evidence."""

    stand: Stand
    odds: float
    is_in_set: bool

    @property
    def cloth(self) -> Cloth:
        """The cloth."""
        return self.stand.cloth

    @property
    def made(self) -> Construction:
        """Its construction the way round that fits better."""
        made = self.stand.cloth.construction
        return made.turned() if self.stand.turned else made

    def side(self, suffix: str) -> Wires:
        """The wires of the direction that was measured under the plain names, or under those with weft."""
        return self.made.weft if suffix else self.made.warp


def reason_of(suspect: Suspect, against: str | None, evidence: Evidence) -> str:
    """One sentence: what fits, or what speaks against it with both figures."""
    turned = " turned, warp and weft exchanged" if suspect.stand.turned else ""
    if against is not None:
        return _against(suspect, against, evidence)
    numbers = [f"{NAMES[n]} {fit.misfit:.1f}" for n, fit in suspect.stand.fits.items() if fit.misfit is not None]
    within = f" ({', '.join(numbers)} of the ±)" if numbers else ""
    if suspect.is_in_set:
        return f"Fits{turned}{within}."
    return f"Not ruled out, but much less likely than the others{within}."


def _against(suspect: Suspect, name: str, evidence: Evidence) -> str:
    if name == "magnet":
        pulled = "was attracted" if evidence.magnetic else "was not attracted"
        return f"Out by the magnet: it {pulled}, and {suspect.made.alloy} says otherwise."
    measured = evidence.measured[name]
    if name.startswith("aperture") and suspect.made.is_filter:
        return "Out by aperture: filter cloth has no straight opening to measure."
    misfit = suspect.stand.fits[name].misfit or 0.0
    return f"Out by {NAMES[name]}: {_found(suspect, name)} against {_said(measured)}, {misfit:.1f} times the ±."


def _said(measured: Count | Scalar | None) -> str:
    if isinstance(measured, Count):
        return f"{float(measured.pitch_mm):.4f} ± {measured.pitch_limit_mm:.4f} mm"
    if measured is None:
        return "nothing"
    unit = "kg/m²" if measured.instrument == "balance" else "mm"
    return f"{float(measured.value):.4g} ± {measured.plus_minus:.2g} {unit}"


def _found(suspect: Suspect, name: str) -> str:
    quantity, _, suffix = name.partition("_")
    wires = suspect.side(suffix)
    if quantity == "thickness":
        least, most = thickness_range_mm(suspect.cloth)
        return f"{least:.4g} mm" if least == most else f"{least:.4g} to {most:.4g} mm"
    if quantity == "mass":
        least, most = mass_range_kg_m2(suspect.cloth) or (0.0, 0.0)
        return f"{most:.3g} kg/m²"
    value = {"pitch": wires.pitch_mm, "wire": wires.wire_mm, "aperture": wires.aperture_mm}[quantity]
    return f"{float(value):.4g} mm"
