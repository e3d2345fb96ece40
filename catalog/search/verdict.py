"""The one function that decides, for one purpose, on facts and gate findings."""

from collections.abc import Sequence

from catalog.search.candidate import Finding, Verdict
from catalog.search.comparison import Comparison
from catalog.search.guard import guard_on_limits, guard_verdict
from catalog.search.purposes import ABOUT, Aspect, Reach, Stand, worst_reach
from catalog.search.rules import HouseRules
from catalog.target import Purpose


def decide(purpose: Purpose, c: Comparison, gates: Sequence[Finding], rules: HouseRules) -> Verdict:
    """Return the first verdict that applies, in the order: gates, unknown, same, then nearness."""
    if any(gate.ok is False for gate in gates) or _is_another_cloth(c, rules):
        return Verdict.NOT_EQUIVALENT
    if any(gate.ok is None for gate in gates):
        return Verdict.CANNOT_SAY
    if not c.asks_aperture:
        held = _without_aperture(c)
        return guard_on_limits(c, held) if purpose is Purpose.GUARD else held
    if purpose is Purpose.GUARD:
        return guard_verdict(c, rules)
    aspect = ABOUT[purpose](c, rules)
    if aspect.stand is Stand.UNKNOWN:
        return Verdict.CANNOT_SAY
    if all(d.is_same for d in c.directions):
        return Verdict.SAME
    return _by_nearness(worst_reach(purpose, c, rules), aspect, _lies_within_lines(c, aspect, rules))


def _is_another_cloth(c: Comparison, rules: HouseRules) -> bool:
    low, high = rules.section_bounds
    return any(d.section is not None and not low <= d.section <= high for d in c.directions)


def _without_aperture(c: Comparison) -> Verdict:
    """A count alone leaves the opening open; limits alone were met, or a gate would have failed."""
    asked = c.target.reading
    something = any(s.pitch or s.wire or s.aperture for s in (asked.warp, asked.weft))
    return Verdict.INTERCHANGEABLE if c.target.limits and not something else Verdict.CANNOT_SAY


def _lies_within_lines(c: Comparison, aspect: Aspect, rules: HouseRules) -> bool:
    """Wire, open area and section inside the lines; what wasn't asked isn't judged."""
    for d in c.directions:
        if d.wire_off is not None and d.asked_wire and abs(d.wire_off) > rules.wire * d.asked_wire:
            return False
    if c.open_points is not None and abs(c.open_points) > rules.open_area_points:
        return False
    return c.section is None or c.section >= rules.section_least


def _by_nearness(reach: Reach, aspect: Aspect, within_lines: bool) -> Verdict:
    if reach is Reach.BEYOND or aspect.stand is Stand.FAILED:
        return Verdict.NOT_EQUIVALENT
    if reach is Reach.RISK or aspect.stand is Stand.SHORT:
        return Verdict.NEAR_RISK
    if reach is Reach.WITHIN and within_lines:
        return Verdict.INTERCHANGEABLE
    return Verdict.NEAR_SAFE
