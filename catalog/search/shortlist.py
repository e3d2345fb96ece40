"""Which cloths of a store are set against the evidence: all of a small one, boxes about the evidence of a large one."""

from collections.abc import Mapping, Sequence
from dataclasses import replace

from catalog.cloth import Cloth
from catalog.errors import InputError
from catalog.search.evidence import MASS_MODEL, Evidence
from catalog.search.filtering import NO_FILTERS
from catalog.search.measured import DECISIVE, Count, K, Scalar, combined
from catalog.search.reader import Filters, Point, Range, Reader

SMALL = 5_000
"""So many cloths are looked at one by one."""
PLENTY = 200
"""So many that could be named need no rivals around them."""
ENOUGH = 10
DECISIVE_REACH = 1.01 * (2 * DECISIVE) ** 0.5 / K
"""In units of ±: beyond it a figure rules the cloth out, so the box holds every cloth that could be named."""
RIVAL_REACH = 6.0
"""In units of ±: what is ruled out within it is worth showing."""
OPENING_REACH = 0.15
PLUS_MINUS_REACH = 8.0
WIRE_REACH = (0.4, 1.3)
"""A knuckle reads twice the wire, zinc a quarter more."""
THICKNESS_REACH = (0.5, 1.0)
"""What is on record is the least thickness; up to twice that where one set lies straight."""
APERTURE_SPREAD = 10
"""Spread of an aperture over that of pitch and wire: a difference multiplies it, down to a seventh of the pitch."""
MASS_REACH = (0.7, 1.4)
"""What is on record is the nominal mass; the geometric one and the swatch lie about it."""


def shortlist(reader: Reader, evidence: Evidence, scope: Filters = NO_FILTERS) -> Sequence[Cloth]:
    """Fetch every cloth that *evidence* could mean, inside *scope* (stock, alloys), with rivals where there is room.

    Raises InputError where only a magnet or a weave is known and the catalogue is too long to list.
    """
    within = replace(scope, weaves=frozenset([evidence.weave])) if evidence.weave else scope
    size = reader.count(within)
    if size <= SMALL:
        return reader.select(within)
    if all(measured is None for measured in evidence.measured.values()):
        raise InputError(
            f"That leaves {size} cloths and names none: count spaces over a length, or measure the wire, as well."
        )
    likely = _boxed(reader, evidence, ranges_within(evidence, DECISIVE_REACH), within)
    if len(likely) >= PLENTY:
        return likely
    rivals = _boxed(reader, evidence, ranges_within(evidence, RIVAL_REACH), within) if likely else ()
    return rivals if len(rivals) >= ENOUGH else _slips(reader, evidence, within)


def _slips(reader: Reader, evidence: Evidence, within: Filters) -> Sequence[Cloth]:
    """The generous box, where a slip at the bench may have put the roll; three times as wide where it holds little."""
    found = _boxed(reader, evidence, ranges_of(evidence), within)
    return found if len(found) >= ENOUGH else _boxed(reader, evidence, ranges_of(evidence, 3.0), within)


def ranges_within(evidence: Evidence, reach: float) -> Mapping[str, Range]:
    """Bounds so many times their ± about the figures that were measured; exact for a count's limit."""
    made = evidence.made_within_pct / 100
    ranges: dict[str, Range] = {}
    for side, suffix in (("warp", ""), ("weft", "_weft")):
        for quantity, spread in (("pitch", made), ("wire", made), ("aperture", APERTURE_SPREAD * made)):
            measured = evidence.measured[f"{quantity}{suffix}"]
            if isinstance(measured, Count):
                ranges[f"{side}_{quantity}_mm"] = _counted(measured, reach, spread)
            elif measured:
                ranges[f"{side}_{quantity}_mm"] = _scaled(measured, (1.0, 1.0), reach, spread)
    if evidence.thickness:
        ranges["thickness_mm"] = _scaled(evidence.thickness, THICKNESS_REACH, reach, made)
    if evidence.mass and not ranges:  # beside other figures it would lose the cloths whose density isn't known
        ranges["mass_kg_m2"] = _scaled(evidence.mass, MASS_REACH, reach, combined(MASS_MODEL, 2 * made))
    return ranges


def _counted(count: Count, reach: float, spread: float) -> Range:
    """Pitches from which so many spaces could have been counted: L/(n + a) to L/(n − a), and *spread* about it."""
    at = count.figures
    slack = reach * combined(at.length_share, spread)
    rivals = max(0.0, reach - DECISIVE_REACH) * at.pitch_limit_mm
    least, most = at.length_mm / (at.spaces + at.limit), at.length_mm / (at.spaces - at.limit)
    return max(0.0, least * (1 - slack) - rivals), most * (1 + slack) + rivals


def _scaled(measured: Scalar, share: tuple[float, float], reach: float, spread: float) -> Range:
    """The value, *reach* times its ± either way; *spread* is a share of a cloth's figure, which may be larger."""
    value, unit = float(measured.value), measured.plus_minus
    half = reach * combined(unit, 1.5 * spread * (value + 1.5 * unit))
    return max(0.0, share[0] * (value - half)), share[1] * (value + half)


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
