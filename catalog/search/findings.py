"""What differs and whether it matters, in sentences; each with the source of its limit."""

from collections.abc import Iterator

from catalog.search.candidate import Finding
from catalog.search.comparison import Comparison, Direction
from catalog.search.purposes import ABOUT, BEYOND_T_ONLY, Stand, harm
from catalog.search.rules import HouseRules
from catalog.search.wording import both, pct, points, signed_pct, um
from catalog.target import Purpose

HOUSE = "house rule"
WAY = {True: "larger", False: "smaller"}


def findings(c: Comparison, purposes: tuple[Purpose, ...], rules: HouseRules) -> list[Finding]:
    """Sentences on aperture, wire, open area, section, the purpose's own line and a turned cloth."""
    found = list(_apertures(c, purposes))
    found += _wires(c, rules)
    found += _open_area(c, rules)
    found += _section(c, rules)
    found += _purpose_lines(c, purposes, rules)
    if c.turned:
        text = "Offered turned by 90°: its warp lies along your weft, so width and strength directions change."
        found.append(Finding("turned", True, text))
    return found


def _sides(c: Comparison) -> Iterator[tuple[str, Direction]]:
    """One line where both directions say the same, else one each."""
    warp, weft = c.directions
    alike = (warp.asked_aperture, warp.asked_wire, warp.found) == (
        weft.asked_aperture,
        weft.asked_wire,
        weft.found,
    )
    yield ("" if alike else "Warp ", warp)
    if not alike:
        yield "Weft ", weft


def _named(prefix: str, noun: str) -> str:
    return f"{prefix}{noun}" if prefix else noun.capitalize()


def _apertures(c: Comparison, purposes: tuple[Purpose, ...]) -> Iterator[Finding]:
    for prefix, d in _sides(c):
        off = d.aperture_off
        label = _named(prefix, "aperture")
        if off is None or not d.asked_aperture or d.tolerance is None:
            if "aperture_mm" not in c.target.limits:
                yield Finding("aperture", True, f"{label} {both(d.found.aperture_mm)}: not asked, not judged.")
            continue
        if abs(off) <= d.aperture_rounding:
            yield Finding("aperture", True, f"{label} {both(d.found.aperture_mm)} equals the asked one to rounding.")
            continue
        within = abs(off) <= d.tolerance
        text = (
            f"{label} {both(d.found.aperture_mm)} is {um(abs(off))} {WAY[off > 0]} "
            f"({signed_pct(off / d.asked_aperture)}), {'within' if within else 'beyond'} T = {um(d.tolerance)}"
        )
        hurt = [p.value for p in purposes if harm(p, off)]
        marked = [p.value for p in purposes if p.value in hurt and p not in BEYOND_T_ONLY]
        if marked and within:
            text += f"; harm side for {' and '.join(marked)}: measure the roll"
        elif hurt and not within:
            text += f"; this hurts {' and '.join(hurt)}"
        source = c.target.tolerance.source if c.target.tolerance else ""
        yield Finding("aperture", within, text + ".", source)


def _wires(c: Comparison, rules: HouseRules) -> Iterator[Finding]:
    for prefix, d in _sides(c):
        label = _named(prefix, "wire")
        off = d.wire_off
        if off is None or not d.asked_wire:
            if "wire_mm" not in c.target.limits:
                yield Finding("wire", True, f"{label} {both(d.found.wire_mm)}: not asked, not judged.")
        elif abs(off) > d.wire_rounding:
            within = abs(off) <= rules.wire * d.asked_wire
            line = f"{'within' if within else 'outside'} {float(rules.wire * 100):g} %"
            text = f"{label} {both(d.found.wire_mm)}: {signed_pct(off / d.asked_wire)}, {line}."
            yield Finding("wire", within, text, HOUSE)


def _open_area(c: Comparison, rules: HouseRules) -> Iterator[Finding]:
    off = c.open_points
    if off is None and "open_area_pct" in c.target.limits:
        return
    if off is None:
        yield Finding("open area", True, f"Open area {pct(c.found_open * 100)}: not asked, not judged.")
    elif abs(off) > rules.open_area_points:
        line = f"outside {float(rules.open_area_points):g} points"
        asked = pct((c.asked_open or 0) * 100)
        text = f"Open area {pct(c.found_open * 100)} against {asked}: {points(off)}, {line}."
        yield Finding("open area", False, text, HOUSE)


def _section(c: Comparison, rules: HouseRules) -> Iterator[Finding]:
    if c.section is None or c.section >= rules.section_least:
        return
    low = rules.section_bounds[0]
    weight = "another cloth" if c.section < low else (
        "much lighter cloth" if c.section < rules.much_lighter else "lighter cloth")  # fmt: skip
    text = f"Section d²/p is {float(c.section * 100):.0f} % of the asked one: {weight}."
    yield Finding("section", False, text, HOUSE)


def _purpose_lines(c: Comparison, purposes: tuple[Purpose, ...], rules: HouseRules) -> Iterator[Finding]:
    words = {Stand.SHORT: "short of the line", Stand.FAILED: "too little"}
    for purpose in purposes:
        aspect = ABOUT[purpose](c, rules)
        if aspect.stand is Stand.UNKNOWN:
            text = f"For {purpose.value}, the {aspect.about} has to be asked: state the wire as well."
            yield Finding(purpose.value, None, text, HOUSE)
        elif aspect.stand is not Stand.MET and aspect.ratio is not None:
            text = (
                f"For {purpose.value}: {aspect.about} is {float(aspect.ratio * 100):.1f} % of the asked one, "
                f"{words[aspect.stand]}."
            )
            yield Finding(purpose.value, False, text, HOUSE)


def reason(all_findings: list[Finding], c: Comparison) -> str:
    """One sentence for a list: the first failed gate, else what is open, else what differs most."""
    for wanted in (False, None):
        chosen = [f for f in all_findings if f.ok is wanted]
        if chosen:
            first = chosen[0].message
            more = len(chosen) - 1
            return first if not more else f"{first} {chosen[1].message}"
    said = {f.rule: f.message for f in reversed(all_findings)}
    for rule in ("aperture", "rating", "warp make"):
        if rule in said:
            return said[rule]
    return f"{c.made.kind.capitalize()}, {c.made.weave.words}."
