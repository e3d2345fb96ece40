"""Measurements that could be made next: what each would show for a cloth, and which cloths it tells apart."""

from collections.abc import Callable, Iterator
from dataclasses import dataclass

from catalog.search.evidence import Evidence, attracts, mass_range_kg_m2, thickness_range_mm
from catalog.search.measured import combined
from catalog.search.suspicion import Suspect

LENGTHS_MM = (10, 20, 25, 50, 100, 200, 300)
RESOLUTIONS_MM = (0.05, 0.02, 0.01, 0.005, 0.002, 0.001)
"""Expanded uncertainties (k = 2) that can be had, from calliper to microscope: common practice."""
MOST_SPACES = 500
"""Nobody counts more without a slip: common practice."""
SWATCH_SHARE = 0.05
WEIGHING_SHARE = 0.01

Interval = tuple[float, float]


@dataclass(frozen=True, slots=True)
class Trial:
    """One measurement at one setting."""

    measure: str
    """'weave', 'finish', 'magnet', 'count', 'count_weft', 'wire', 'wire_weft', 'aperture', …, 'swatch', 'alloy'."""
    effort: float
    over_mm: float | None
    resolution_mm: float | None
    shows: Callable[[Suspect], Interval | str | None]
    """What a cloth would show: an interval that holds the outcome, a word, or None where it can't be told."""
    unit: str = ""

    def separates(self, one: Suspect, other: Suspect) -> bool:
        """True where the outcomes can't be taken for each other."""
        a, b = self.shows(one), self.shows(other)
        if a is None or b is None:
            return False
        if isinstance(a, str) or isinstance(b, str):
            return a != b
        return a[1] < b[0] or b[1] < a[0]


def trials(evidence: Evidence) -> Iterator[Trial]:
    """Every measurement that would add to *evidence*."""
    if evidence.weave is None:
        yield Trial("weave", 0.0, None, None, lambda s: s.made.weave.words)
    yield Trial("finish", 0.5, None, None, lambda s: s.made.finish or "bare wire")
    if evidence.magnetic is None:
        yield Trial("magnet", 1.0, None, None, _pull)
    for suffix, penalty in (("", 0.0), ("_weft", 0.05)):
        yield from _counts(evidence, suffix, 2.0 + penalty)
        yield from _gauged(evidence, "wire", suffix, 3.0 + penalty)
        yield from _gauged(evidence, "aperture", suffix, 4.0 + penalty)
    yield from _thicknesses(evidence)
    if evidence.mass is None:
        yield Trial("swatch", 6.0, None, None, _swatch, "kg/m²")
    yield Trial("alloy", 9.0, None, None, lambda s: s.made.alloy or None)


def _pull(suspect: Suspect) -> str | None:
    pulls = attracts(suspect.made)
    return None if pulls is None else "a pull" if pulls else "no pull"


def _counts(evidence: Evidence, suffix: str, effort: float) -> Iterator[Trial]:
    done = evidence.measured[f"pitch{suffix}"]
    least = float(getattr(done, "length_mm", 0))
    for step, length in enumerate(LENGTHS_MM):
        if length > least:
            yield Trial(f"count{suffix}", effort + step / 10, length, None, _spaces(suffix, length), "spaces")


def _spaces(suffix: str, length_mm: float) -> Callable[[Suspect], Interval | None]:
    def shows(suspect: Suspect) -> Interval | None:
        expected = length_mm / float(suspect.side(suffix).pitch_mm)
        return (expected - 0.5, expected + 0.5) if 1 <= expected <= MOST_SPACES else None

    return shows


def _gauged(evidence: Evidence, quantity: str, suffix: str, effort: float) -> Iterator[Trial]:
    done = evidence.measured[f"{quantity}{suffix}"]
    reached = getattr(done, "plus_minus", 1.0)
    for step, resolution in enumerate(RESOLUTIONS_MM):
        if resolution < reached:
            shows = _length(quantity, suffix, resolution)
            yield Trial(f"{quantity}{suffix}", effort + step / 10, None, resolution, shows, "mm")


def _length(quantity: str, suffix: str, resolution: float) -> Callable[[Suspect], Interval | None]:
    def shows(suspect: Suspect) -> Interval | None:
        if quantity == "aperture" and suspect.made.is_filter:
            return None
        wires = suspect.side(suffix)
        value = float(wires.wire_mm if quantity == "wire" else wires.aperture_mm)
        return value - resolution, value + resolution

    return shows


def _thicknesses(evidence: Evidence) -> Iterator[Trial]:
    reached = evidence.thickness.plus_minus if evidence.thickness else 1.0

    def shows(resolution: float) -> Callable[[Suspect], Interval]:
        def interval(suspect: Suspect) -> Interval:
            least, most = thickness_range_mm(suspect.cloth)
            return least - resolution, most + resolution

        return interval

    for step, resolution in enumerate(RESOLUTIONS_MM[:4]):
        if resolution < reached:
            yield Trial("thickness", 5.0 + step / 10, None, resolution, shows(resolution), "mm")


def _swatch(suspect: Suspect) -> Interval | None:
    masses = mass_range_kg_m2(suspect.cloth)
    if masses is None:
        return None
    spread = masses[1] * combined(SWATCH_SHARE, WEIGHING_SHARE)
    return masses[0] - spread, masses[1] + spread
