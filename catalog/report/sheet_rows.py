"""Required beside offered, line by line: figures with sign, limit, and which purpose a difference hurts."""

from collections.abc import Callable, Iterator
from dataclasses import dataclass, replace
from fractions import Fraction

from catalog.cloth import Cloth, Rating
from catalog.report.outside_text import tame
from catalog.report.roll_tag import LB_FT2
from catalog.search.candidate import Candidate
from catalog.search.comparison import Comparison, Direction
from catalog.search.purposes import harm
from catalog.search.wording import both, pct, points, signed_pct
from catalog.target import Need, Purpose, Target

NOT_ASKED = "not asked"
LEAST_POINTS = Fraction(5, 100)
"""Less than this is printed as 0.0 points."""
MINUS = str.maketrans("-", "−")


@dataclass(frozen=True, slots=True)
class Row:
    """One property. Every field is text that is fit to be printed; '' where there is nothing to say."""

    name: str
    required: str
    offered: str
    difference: str = ""
    """Offered less required, with its sign."""
    limit: str = ""
    """The limit, and whether the difference lies within it."""
    hurts: str = ""
    """Which purposes the difference hurts, or that it doesn't."""


def need_words(need: Need) -> str:
    """'12 discs Ø 350 mm (13.78 in)', '4 pieces 1200 × 2400 mm (47.24 × 94.49 in)'."""
    if need.diameter_mm is not None:
        noun = "disc" if need.pieces == 1 else "discs"
        return f"{need.pieces} {noun} Ø {need.diameter_mm:g} mm ({need.diameter_mm / 25.4:.4g} in)"
    sizes = [size for size in (need.width_mm, need.length_mm) if size is not None]
    noun = "piece" if need.pieces == 1 else "pieces"
    if not sizes:
        return f"{need.pieces} {noun}"
    metric = " × ".join(f"{size:g}" for size in sizes)
    inches = " × ".join(f"{size / 25.4:.4g}" for size in sizes)
    return f"{need.pieces} {noun} {metric} mm ({inches} in)"


def named_rows(text: str, c: Comparison) -> Iterator[Row]:
    """What has a name and no figure: as written, cloth, weave, alloy, finish, grade, standard, limits."""
    target, cloth, made = c.target, c.cloth, c.made
    yield Row("As written", tame(text), tame(cloth.declared))
    yield Row("Cloth", "", tame(f"{cloth.name} [{cloth.id}]"))
    yield Row("Weave", target.weave.words if target.weave else NOT_ASKED, made.weave.words)
    yield Row("Alloy", _alloy(target), tame(made.alloy or "not on record"))
    reading = target.reading
    pairs = (
        ("Finish", reading.finish, made.finish),
        ("Crimp", reading.crimp, made.crimp),
        ("Grade", reading.grade, cloth.grade),
        ("Standard", reading.standard, cloth.standard),
        ("Filter rating", _rating(reading.rating), _rating(cloth.rating)),
    )
    for name, asked, found in pairs:
        if asked or found:
            yield Row(name, tame(asked or NOT_ASKED), tame(found or "none on record"))
    for key, (least, most) in target.limits.items():
        yield Row("Limit", _limit_words(key, least, most), "see the findings")
    if c.turned:
        yield Row("Turned", "", "offered turned by 90°: its warp lies along the weft asked for")


def _alloy(target: Target) -> str:
    asked = tame(target.reading.alloy or NOT_ASKED)
    if target.alloy_rule == "same":
        return asked
    return f"{asked}; any will do" if target.alloy_rule == "any" else f"{asked}; {tame(target.alloy_rule)} will do"


def _rating(rating: Rating | None) -> str:
    if rating is None:
        return ""
    return f"{rating.um:g} µm {rating.kind}, {rating.method or 'method not stated'}"


def _limit_words(key: str, least: float | None, most: float | None) -> str:
    name = {"count_per_in": "count per inch", "open_area_pct": "open area %", "mass_kg_m2": "mass kg/m²"}
    said = [f"at least {least:g}" if least is not None else "", f"at most {most:g}" if most is not None else ""]
    return f"{name.get(key, key.replace('_', ' '))} {', '.join(filter(None, said))}"


def figure_rows(c: Comparison, candidate: Candidate, purposes: tuple[Purpose, ...]) -> Iterator[Row]:
    """The figures with their differences: apertures, wires, counts, open area, section, mass, thickness."""
    yield from _of_filter(c, candidate) if c.made.is_filter else _of_openings(c, candidate, purposes)
    yield _mass(candidate)
    yield Row("Thickness", "", f"{both(c.cloth.figures.thickness_mm)}, at least")


def _of_openings(c: Comparison, candidate: Candidate, purposes: tuple[Purpose, ...]) -> Iterator[Row]:
    for prefix, d in _sides(c):
        yield _aperture(prefix, d, purposes)
        yield _wire(prefix, d, candidate, purposes)
        yield _count(prefix, d)
    yield _open_area(c, candidate, purposes)
    yield _section(c, candidate, purposes)


def _of_filter(c: Comparison, candidate: Candidate) -> Iterator[Row]:
    """Counts and wires; filter cloth is judged in its findings, by other limits than cloth with openings."""
    for prefix, d in _sides(c):
        yield _count(prefix, d)
        yield replace(_wire(prefix, d, candidate, ()), limit="", hurts="")


def _sides(c: Comparison) -> Iterator[tuple[str, Direction]]:
    warp, weft = c.directions
    asked = [(d.asked_aperture, d.asked_wire, d.asked_pitch, d.found, d.tolerance) for d in c.directions]
    if asked[0] == asked[1]:
        yield "", warp
    else:
        yield from (("Warp ", warp), ("Weft ", weft))


def _aperture(prefix: str, d: Direction, purposes: tuple[Purpose, ...]) -> Row:
    name = f"{prefix}aperture".capitalize()
    off, asked = d.aperture_off, d.asked_aperture
    if off is None or not asked:
        return Row(name, NOT_ASKED, both(d.found.aperture_mm))
    difference = f"{signed_pct(off / asked)} ({_signed_um(off)})"
    limit = ""
    if d.tolerance is not None:
        limit = f"±{float(d.tolerance * 1000):.4g} µm: {'within' if abs(off) <= d.tolerance else 'beyond'}"
    hurts = "equal to rounding"
    if abs(off) > d.aperture_rounding:
        hurts = _hurts(purposes, lambda purpose: harm(purpose, off))
    return Row(name, both(asked), both(d.found.aperture_mm), difference, limit, hurts)


def _wire(prefix: str, d: Direction, candidate: Candidate, purposes: tuple[Purpose, ...]) -> Row:
    name = f"{prefix}wire".capitalize()
    off, asked = d.wire_off, d.asked_wire
    if off is None or not asked:
        return Row(name, NOT_ASKED, both(d.found.wire_mm))
    hurts = "equal to rounding"
    if abs(off) > d.wire_rounding:
        thinner = off < 0
        hurts = _hurts(purposes, lambda purpose: thinner and purpose in (Purpose.STRENGTH, Purpose.GUARD))
    limit = _limit(candidate, f"{d.name}.wire")
    return Row(name, both(asked), both(d.found.wire_mm), f"{signed_pct(off / asked)}", limit, hurts)


def _count(prefix: str, d: Direction) -> Row:
    name = f"{prefix}count".capitalize()
    found = _per_in(d.found.pitch_mm)
    if not d.asked_pitch:
        return Row(name, NOT_ASKED, found)
    return Row(name, _per_in(d.asked_pitch), found, signed_pct(d.asked_pitch / d.found.pitch_mm - 1))


def _per_in(pitch_mm: Fraction) -> str:
    return f"{25.4 / float(pitch_mm):.4g} per in ({10 / float(pitch_mm):.4g} per cm)"


def _open_area(c: Comparison, candidate: Candidate, purposes: tuple[Purpose, ...]) -> Row:
    found = pct(c.found_open * 100)
    off = c.open_points
    if c.asked_open is None or off is None:
        return Row("Open area", NOT_ASKED, found)
    hurts = _hurts(purposes, lambda purpose: off < 0 and purpose is Purpose.FLOW) if abs(off) >= LEAST_POINTS else ""
    return Row("Open area", pct(c.asked_open * 100), found, points(off), _limit(candidate, "open_area"), hurts)


def _section(c: Comparison, candidate: Candidate, purposes: tuple[Purpose, ...]) -> Row:
    if c.section is None:
        return Row("Section d²/p", NOT_ASKED, "")
    less = c.section < 1
    hurts = _hurts(purposes, lambda purpose: less and purpose in (Purpose.STRENGTH, Purpose.GUARD))
    return Row(
        "Section d²/p",
        "100 %",
        f"{float(c.section * 100):.0f} %",
        signed_pct(c.section - 1),
        _limit(candidate, "section"),
        hurts if c.section != 1 else "",
    )


def _mass(candidate: Candidate) -> Row:
    deviation = candidate.deviation("mass")
    cloth: Cloth = candidate.cloth
    found = _per_m2(cloth.figures.mass_kg_m2) if cloth.figures.mass_kg_m2 else "density not on record"
    kind = "Mass, estimate" if cloth.construction.is_filter else "Mass, ISO 9044"
    if deviation is None or deviation.asked is None or deviation.difference is None:
        return Row(kind, NOT_ASKED, found)
    return Row(kind, _per_m2(deviation.asked), found, signed_pct(deviation.difference / 100))


def _per_m2(kg_m2: float) -> str:
    return f"{kg_m2:.3g} kg/m² ({kg_m2 * LB_FT2:.3g} lb/ft²)"


def _limit(candidate: Candidate, name: str) -> str:
    deviation = candidate.deviation(name)
    if deviation is None or deviation.limit is None or deviation.inside is None:
        return ""
    unit = "points" if deviation.unit == "points" else "%"
    sign = "" if deviation.limit < 0 else "±"
    return f"{sign}{deviation.limit:.3g} {unit}: {'within' if deviation.inside else 'outside'}".translate(MINUS)


def _signed_um(off: Fraction) -> str:
    return f"{float(off) * 1000:+.1f} µm".translate(MINUS)


def _hurts(purposes: tuple[Purpose, ...], is_harmed: Callable[[Purpose], bool]) -> str:
    harmed = [purpose.value for purpose in purposes if is_harmed(purpose)]
    return f"hurts {', '.join(harmed)}" if harmed else "to the harmless side"
