"""Which cloths of a store are set against the evidence: all of a small one, a generous box of a large one."""

from collections.abc import Mapping, Sequence
from dataclasses import replace

from catalog.cloth import Cloth
from catalog.search.evidence import Evidence
from catalog.search.filtering import NO_FILTERS
from catalog.search.measured import Scalar
from catalog.search.reader import Filters, Point, Range, Reader

SMALL = 5_000
"""So many cloths are looked at one by one."""
OPENING_REACH = 0.15
PLUS_MINUS_REACH = 8.0
"""At eight times its ± (k = 2) a cloth's odds are below exp(−128): nothing that could be named is left out."""
WIRE_REACH = (0.4, 1.3)
"""A knuckle reads twice the wire, zinc a quarter more."""
THICKNESS_REACH = (0.6, 1.1)
"""What is on record is the least thickness; half as much again where one set lies straight."""
MASS_REACH = (0.7, 1.4)
ENOUGH = 10


def shortlist(reader: Reader, evidence: Evidence, scope: Filters = NO_FILTERS) -> Sequence[Cloth]:
    """Fetch what *evidence* could mean, inside *scope* (stock, alloys). Wider where the box holds next to nothing."""
    within = replace(scope, weaves=frozenset([evidence.weave])) if evidence.weave else scope
    if reader.count(within) <= SMALL:
        return reader.select(within)
    for widening in (1.0, 3.0):
        ranges = ranges_of(evidence, widening)
        found = _boxed(reader, evidence, ranges, within) if ranges else reader.select(within)
        if len(found) >= ENOUGH:
            return found
    return reader.select(within)


def ranges_of(evidence: Evidence, widening: float = 1.0) -> Mapping[str, Range]:
    """Bounds on the figures that were measured; the plain names stand for the warp, and the box looks turned too."""
    ranges: dict[str, Range] = {}
    spread = 3 * evidence.made_within_pct / 100
    sides = (
        ("warp", evidence.count, evidence.wire, evidence.aperture),
        ("weft", evidence.count_weft, evidence.wire_weft, evidence.aperture_weft),
    )
    for side, count, wire, aperture in sides:
        if count:
            reach = (OPENING_REACH, count.pitch_limit_mm)
            ranges[f"{side}_pitch_mm"] = _about(float(count.pitch_mm), reach, spread, widening)
        if wire:
            ranges[f"{side}_wire_mm"] = _between(wire, WIRE_REACH, widening)
        if aperture:
            reach = (OPENING_REACH, aperture.plus_minus)
            ranges[f"{side}_aperture_mm"] = _about(float(aperture.value), reach, spread, widening)
    if evidence.thickness:
        ranges["thickness_mm"] = _between(evidence.thickness, THICKNESS_REACH, widening)
    if evidence.mass:
        ranges["mass_kg_m2"] = _between(evidence.mass, MASS_REACH, widening)
    return ranges


def _about(value: float, reach: tuple[float, float], spread: float, widening: float) -> Range:
    half = widening * (max(reach[0] * value, PLUS_MINUS_REACH * reach[1]) + spread * value)
    return max(0.0, value - half), value + half


def _between(measured: Scalar, share: tuple[float, float], widening: float) -> Range:
    value, limit = float(measured.value), PLUS_MINUS_REACH * measured.plus_minus
    low, high = min(share[0] * value, value - limit), max(share[1] * value, value + limit)
    return max(0.0, low / widening), high * widening


def _boxed(reader: Reader, evidence: Evidence, ranges: Mapping[str, Range], scope: Filters) -> list[Cloth]:
    """Cloth of both kinds in the box; filter cloth has no aperture that could have been measured."""
    kinds = (False,) if evidence.aperture or evidence.aperture_weft else (False, True)
    return [cloth for kind in kinds for cloth, _, _ in reader.box(Point(is_filter=kind), ranges, scope)]
