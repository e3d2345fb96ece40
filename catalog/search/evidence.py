"""Everything that was measured on an unknown roll, and how one cloth fits it, either way round."""

from collections.abc import Mapping
from dataclasses import dataclass
from math import exp, inf, log

from catalog.cloth import Cloth
from catalog.construction import Construction, Weave, Wires
from catalog.physics import geometry
from catalog.reference import alloys
from catalog.search.measured import Count, Fit, Scalar, combined
from catalog.search.measurement import parse_count, parse_length, parse_magnet
from catalog.search.swatch import parse_swatch

MASS_MODEL = 0.05
"""Expanded uncertainty (k = 2) of a computed mass, as a share: house figure, for crimp and density."""
SURE = 0.98
"""How surely a magnet tells what the alloy table says; where the table says nothing, yes and no are alike."""


@dataclass(frozen=True, slots=True)
class Evidence:
    """What is known of a roll. The plain names belong to one direction, those with weft to the other."""

    count: Count | None = None
    count_weft: Count | None = None
    wire: Scalar | None = None
    wire_weft: Scalar | None = None
    aperture: Scalar | None = None
    aperture_weft: Scalar | None = None
    thickness: Scalar | None = None
    mass: Scalar | None = None
    """kg/m²."""
    magnetic: bool | None = None
    weave: Weave | None = None
    made_within_pct: float = 0.0
    """How far cloth may be made off its nominal pitch and wire, k = 2, percent; 0 takes nominal figures as exact."""

    @property
    def is_empty(self) -> bool:
        """True where nothing was measured."""
        return all(value is None for value in (*self.measured.values(), self.magnetic, self.weave))

    @property
    def is_one_way(self) -> bool:
        """True where warp or weft alone was measured."""
        sides = [[self.count, self.wire, self.aperture], [self.count_weft, self.wire_weft, self.aperture_weft]]
        return any(side == [None, None, None] for side in sides) and sides[0] != sides[1]

    @property
    def measured(self) -> Mapping[str, Count | Scalar | None]:
        """Quantity → what was measured of it."""
        return {
            "pitch": self.count,
            "wire": self.wire,
            "aperture": self.aperture,
            "pitch_weft": self.count_weft,
            "wire_weft": self.wire_weft,
            "aperture_weft": self.aperture_weft,
            "thickness": self.thickness,
            "mass": self.mass,
        }


def evidence_of(
    count: str | None = None,
    count_weft: str | None = None,
    wire: str | None = None,
    wire_weft: str | None = None,
    aperture: str | None = None,
    aperture_weft: str | None = None,
    thickness: str | None = None,
    swatch: str | None = None,
    magnetic: str | None = None,
    weave: Weave | None = None,
    made_within_pct: float = 0.0,
) -> Evidence:
    """Read measurements as they are written. Raises InputError for the first that can't be read."""
    return Evidence(
        count=None if count is None else parse_count(count),
        count_weft=None if count_weft is None else parse_count(count_weft),
        wire=None if wire is None else parse_length(wire, "wire"),
        wire_weft=None if wire_weft is None else parse_length(wire_weft, "wire"),
        aperture=None if aperture is None else parse_length(aperture, "aperture"),
        aperture_weft=None if aperture_weft is None else parse_length(aperture_weft, "aperture"),
        thickness=None if thickness is None else parse_length(thickness, "thickness"),
        mass=None if swatch is None else parse_swatch(swatch),
        magnetic=None if magnetic is None else parse_magnet(magnetic),
        weave=weave,
        made_within_pct=made_within_pct,
    )


@dataclass(frozen=True, slots=True)
class Stand:
    """How one cloth stands against the evidence, the better way round."""

    cloth: Cloth
    turned: bool
    fits: Mapping[str, Fit]
    log_likelihood: float
    """Of both ways round, each as likely as the other before."""

    @property
    def is_out(self) -> bool:
        """True where a single figure rules the cloth out."""
        return any(fit.is_out for fit in self.fits.values())

    @property
    def worst(self) -> str | None:
        """The quantity that speaks most against the cloth; None where nothing was measured of it.

        Of figures that rule it out, the one off by the most; else the one that costs the most odds.
        """
        ranked = sorted(self.fits.items(), key=lambda item: _against(item[1]), reverse=True)
        return ranked[0][0] if ranked else None

    @property
    def roughness(self) -> float:
        """Sum of the squared misfits: the order among cloths that are ruled out. inf where one has no number."""
        return sum(inf if fit.misfit is None and fit.is_out else (fit.misfit or 0.0) ** 2 for fit in self.fits.values())


def _against(fit: Fit) -> tuple[bool, float, float]:
    misfit = inf if fit.misfit is None and fit.is_out else fit.misfit or 0.0
    return (True, misfit, fit.drop) if fit.is_out else (False, fit.drop, misfit)


def stand(cloth: Cloth, evidence: Evidence) -> Stand:
    """Set *cloth* against *evidence*, as it lies and turned."""
    ways = [_way(cloth, evidence, False)]
    if cloth.construction.warp != cloth.construction.weft:
        ways.append(_way(cloth, evidence, True))
    best = max(ways, key=lambda way: (way.log_likelihood, -way.roughness))
    return Stand(cloth, best.turned, best.fits, _mixed([way.log_likelihood for way in ways]))


def _mixed(logs: list[float]) -> float:
    best = max(logs)
    return best if best == -inf else best + log(sum(exp(value - best) for value in logs) / len(logs))


def _way(cloth: Cloth, evidence: Evidence, turned: bool) -> Stand:
    made = cloth.construction.turned() if turned else cloth.construction
    share = evidence.made_within_pct / 100
    fits = _side(made, made.warp, (evidence.count, evidence.wire, evidence.aperture), share, "")
    fits |= _side(made, made.weft, (evidence.count_weft, evidence.wire_weft, evidence.aperture_weft), share, "_weft")
    for name, measured, judge in (
        ("thickness", evidence.thickness, thickness_fit),
        ("mass", evidence.mass, mass_fit),
    ):
        if measured is not None:
            fits[name] = judge(cloth, measured, share)
    if evidence.magnetic is not None:
        fits["magnet"] = magnet_fit(made, evidence.magnetic)
    return Stand(cloth, turned, fits, sum(fit.log_likelihood for fit in fits.values()))


Measured = tuple[Count | None, Scalar | None, Scalar | None]


def _side(made: Construction, wires: Wires, measured: Measured, share: float, suffix: str) -> dict[str, Fit]:
    """Pitch, wire and aperture of one direction."""
    count, wire, aperture = measured
    fits: dict[str, Fit] = {}
    pitch_mm, wire_mm = float(wires.pitch_mm), float(wires.wire_mm)
    if count is not None:
        fits[f"pitch{suffix}"] = count.fit(pitch_mm, pitch_mm * share)
    if wire is not None:
        fits[f"wire{suffix}"] = wire.fit(wire_mm, spread=wire_mm * share)
    if aperture is not None:
        spread = combined(pitch_mm * share, wire_mm * share)
        open_fit = aperture.fit(pitch_mm - wire_mm, spread=spread)
        fits[f"aperture{suffix}"] = Fit(None, -inf, inf) if made.is_filter else open_fit
    return fits


def thickness_fit(cloth: Cloth, measured: Scalar, share: float) -> Fit:
    """Thickness from flush crowns to one set straight; for filter cloth the one figure there is."""
    least, most = thickness_range_mm(cloth)
    return measured.fit(least, most, spread=most * share)


def thickness_range_mm(cloth: Cloth) -> tuple[float, float]:
    """Least and most thickness, mm: d1 + d2, and the thicker wire more where one set lies straight."""
    made = cloth.construction
    if made.is_filter:
        return cloth.figures.thickness_mm, cloth.figures.thickness_mm
    warp, weft = float(made.warp.wire_mm), float(made.weft.wire_mm)
    return geometry.thickness_least_mm(warp, weft), geometry.thickness_most_mm(warp, weft)


def mass_fit(cloth: Cloth, measured: Scalar, share: float) -> Fit:
    """Mass between the nominal and the geometric figure, each good to 5 %; unknown where the density is."""
    masses = mass_range_kg_m2(cloth)
    if masses is None:
        return measured.unknown()
    least, most = masses
    return measured.fit(least, most, spread=most * combined(MASS_MODEL, 2 * share))


def mass_range_kg_m2(cloth: Cloth) -> tuple[float, float] | None:
    """The smaller and the larger of the masses that are computed, kg/m²; None where there is none."""
    figures = cloth.figures
    known = [mass for mass in (figures.mass_kg_m2, figures.mass_geometric_kg_m2) if mass is not None]
    return (min(known), max(known)) if known else None


def magnet_fit(made: Construction, attracted: bool) -> Fit:
    """What a magnet says for the alloy: a hint. A pull doesn't rule out drawn austenitic wire."""
    pulls = attracts(made)
    chance = 0.5 if pulls is None else SURE if pulls is attracted else 1 - SURE
    return Fit(None, log(chance), 0.0 if pulls is None else log(SURE / chance))


def attracts(made: Construction) -> bool | None:
    """Whether the alloy attracts a magnet; None where that can't be told."""
    known = alloys.alloy(made.alloy) if made.alloy else None
    return known.attracts_magnet if known else None
