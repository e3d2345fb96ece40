"""Figures that follow from measurements at the bench, each with the parts of its uncertainty."""

from collections.abc import Iterator
from dataclasses import dataclass

from catalog.search.evidence import Evidence
from catalog.search.measured import Count, Scalar, combined


@dataclass(frozen=True, slots=True)
class Part:
    """One measurement's share in an uncertainty."""

    quantity: str
    """'count', 'wire', 'aperture', 'count_weft', …"""
    expanded: float
    """What it alone contributes, k = 2, in the unit of the figure."""
    measured: Count | Scalar


@dataclass(frozen=True, slots=True)
class BenchFigure:
    """A figure as found: mm, %, kg/m²."""

    quantity: str
    """'warp.aperture', 'weft.wire', 'open_area', 'mass', 'thickness', 'warp.pitch'."""
    value: float
    parts: tuple[Part, ...]
    unit: str = "mm"

    @property
    def expanded(self) -> float:
        """Expanded uncertainty, k = 2. Source: JCGM 100:2008 (GUM), 5.1.2 and 6.2.1."""
        return combined(*(part.expanded for part in self.parts))

    @property
    def weak_link(self) -> Part:
        """The part that contributes most."""
        return max(self.parts, key=lambda part: part.expanded)


def bench_figures(evidence: Evidence) -> tuple[BenchFigure, ...]:
    """Every figure that the measurements give."""
    found: list[BenchFigure] = []
    sides = (("warp", ""), ("weft", "_weft"))
    for side, suffix in sides:
        found += _side(side, suffix, evidence)
    open_area = _open_area(evidence)
    found += [open_area] if open_area else []
    if evidence.mass:
        part = Part("swatch", evidence.mass.plus_minus, evidence.mass)
        found.append(BenchFigure("mass", float(evidence.mass.value), (part,), "kg/m²"))
    if evidence.thickness:
        part = Part("thickness", evidence.thickness.plus_minus, evidence.thickness)
        found.append(BenchFigure("thickness", float(evidence.thickness.value), (part,)))
    return tuple(found)


def _side(side: str, suffix: str, evidence: Evidence) -> Iterator[BenchFigure]:
    count, wire = pitch_and_wire(evidence, suffix)
    aperture = aperture_of(evidence, suffix)
    if aperture:
        yield BenchFigure(f"{side}.aperture", aperture[0], aperture[1])
    if wire:
        yield BenchFigure(f"{side}.wire", float(wire.value), (Part(f"wire{suffix}", wire.plus_minus, wire),))
    if count:
        part = Part(f"count{suffix}", count.pitch_expanded_mm, count)
        yield BenchFigure(f"{side}.pitch", float(count.pitch_mm), (part,))


def pitch_and_wire(evidence: Evidence, suffix: str) -> tuple[Count | None, Scalar | None]:
    """What was measured of one direction."""
    return (evidence.count_weft, evidence.wire_weft) if suffix else (evidence.count, evidence.wire)


def aperture_of(evidence: Evidence, suffix: str) -> tuple[float, tuple[Part, ...]] | None:
    """The aperture of one direction, mm: measured, or pitch less wire, whichever is the more certain."""
    direct = evidence.aperture_weft if suffix else evidence.aperture
    count, wire = pitch_and_wire(evidence, suffix)
    ways: list[tuple[float, tuple[Part, ...]]] = []
    if direct:
        ways.append((float(direct.value), (Part(f"aperture{suffix}", direct.plus_minus, direct),)))
    if count and wire:
        parts = (Part(f"count{suffix}", count.pitch_expanded_mm, count), Part(f"wire{suffix}", wire.plus_minus, wire))
        ways.append((float(count.pitch_mm - wire.value), parts))
    return min(ways, key=lambda way: combined(*(p.expanded for p in way[1])), default=None)


def _open_area(evidence: Evidence) -> BenchFigure | None:
    """Open area, %, from count and wire: A = 100·Π(1 − d/p); one direction measured stands for square cloth.

    dA/A = −(dd/p − d·dp/p²)/(1 − d/p). Source: derived from the definition; JCGM 100:2008 (GUM), 5.1.2.
    """
    sides = [(s, *pitch_and_wire(evidence, s)) for s in ("", "_weft")]
    known = [(suffix, count, wire) for suffix, count, wire in sides if count and wire]
    if not known:
        return None
    if any(wire.value >= count.pitch_mm for _, count, wire in known):
        return None
    power = 3 - len(known)
    share = 1.0
    parts: list[Part] = []
    for suffix, count, wire in known:
        p, d = float(count.pitch_mm), float(wire.value)
        share *= (1 - d / p) ** power
        by_count = power * d * count.pitch_expanded_mm / (p * p) / (1 - d / p)
        parts.append(Part(f"count{suffix}", by_count, count))
        parts.append(Part(f"wire{suffix}", power * wire.plus_minus / p / (1 - d / p), wire))
    scaled = tuple(Part(part.quantity, 100 * share * part.expanded, part.measured) for part in parts)
    return BenchFigure("open_area", 100 * share, scaled, "%")
