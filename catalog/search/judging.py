"""A cloth, judged: gates, comparison, findings, verdicts, penalty and lots in one candidate."""

from collections.abc import Sequence
from dataclasses import dataclass, replace

from catalog.cloth import Cloth
from catalog.search.candidate import Candidate, Finding, Fit, StockLine, Verdict
from catalog.search.comparison import Comparison, compare
from catalog.search.deviations import deviations
from catalog.search.filter_comparison import decide_filter
from catalog.search.findings import findings, reason
from catalog.search.gates import gate_findings
from catalog.search.guard import guard_findings
from catalog.search.penalty import penalty
from catalog.search.purposes import is_to_harm_side
from catalog.search.rules import HOUSE_RULES, HouseRules
from catalog.search.verdict import decide
from catalog.stock.fitting import Wanted, fit
from catalog.stock.lots import Lot
from catalog.target import Purpose, Target

SIDE_BY_SIDE = (Purpose.RETAIN, Purpose.PASS)
GOOD = (Verdict.INTERCHANGEABLE, Verdict.NEAR_SAFE, Verdict.NEAR_RISK)


@dataclass(frozen=True, slots=True)
class Assessed:
    """A candidate with its verdict, and the comparison and gates that its words will be made of."""

    candidate: Candidate
    comparison: Comparison
    gates: list[Finding]


def judge(
    target: Target,
    cloth: Cloth,
    distance: float | None = None,
    turned: bool = False,
    lots: Sequence[Lot] = (),
    rules: HouseRules = HOUSE_RULES,
) -> Candidate:
    """Set *cloth* against *target* and say what differs and whether it matters."""
    return describe(assess(target, cloth, distance, turned, rules), lots, rules)


def assess(
    target: Target, cloth: Cloth, distance: float | None, turned: bool, rules: HouseRules = HOUSE_RULES
) -> Assessed:
    """The verdict and penalty alone: enough to order a list by, at a fraction of the cost of the words."""
    c = compare(target, cloth, turned, rules)
    purposes = target.purposes or SIDE_BY_SIDE
    gates = gate_findings(c)
    by_purpose = _verdicts(c, purposes, gates, rules)
    verdict = max((by_purpose[p.value] for p in purposes), key=lambda v: v.rank)
    harmed = verdict in GOOD and any(is_to_harm_side(p, c) for p in purposes if not cloth.construction.is_filter)
    candidate = Candidate(
        cloth=cloth,
        distance=distance,
        verdict=verdict,
        by_purpose=by_purpose,
        harm_side=harmed,
        turned=turned,
        penalty=penalty(c, purposes, rules),
    )
    return Assessed(candidate, c, gates)


def describe(assessed: Assessed, lots: Sequence[Lot] = (), rules: HouseRules = HOUSE_RULES) -> Candidate:
    """Add deviations, findings in sentences, the one reason and the lots to an assessed candidate."""
    candidate, c, target = assessed.candidate, assessed.comparison, assessed.comparison.target
    details = _details(c, assessed.gates, target.purposes or SIDE_BY_SIDE, rules)
    found = [*candidate.findings, *assessed.gates, *details]
    return replace(
        candidate,
        deviations=deviations(c, rules),
        findings=tuple(found),
        reason=candidate.reason or reason(found, c),
        stock=stock_lines(lots, target),
    )


def _is_about_filter_cloth(c: Comparison) -> bool:
    return c.target.reading.is_filter or c.made.is_filter


def _verdicts(
    c: Comparison, purposes: tuple[Purpose, ...], gates: list[Finding], rules: HouseRules
) -> dict[str, Verdict]:
    """Retain and pass always, and each purpose that was named."""
    wanted = dict.fromkeys((*SIDE_BY_SIDE, *purposes))
    if _is_about_filter_cloth(c):
        held = decide_filter(c, gates, rules)[0]
        guard = held if held is Verdict.NOT_EQUIVALENT else Verdict.CANNOT_SAY  # its openings have no table
        return {p.value: guard if p is Purpose.GUARD else held for p in wanted}
    return {p.value: decide(p, c, gates, rules) for p in wanted}


def _details(c: Comparison, gates: list[Finding], purposes: tuple[Purpose, ...], rules: HouseRules) -> list[Finding]:
    if _is_about_filter_cloth(c):
        said = decide_filter(c, gates, rules)[1]
        text = "Safety distances are tabled for openings; filter cloth has none: ask who is responsible for the guard."
        return [Finding("guard", None, text, ""), *said] if Purpose.GUARD in purposes else said
    guards = guard_findings(c) if Purpose.GUARD in purposes else []
    return guards + findings(c, purposes, rules) + _in_service(c, purposes)


def _in_service(c: Comparison, purposes: tuple[Purpose, ...]) -> list[Finding]:
    """Pressure drop and breaking load, where that is what it is for; their physics are imported only then."""
    if Purpose.FLOW not in purposes and Purpose.STRENGTH not in purposes:
        return []
    from catalog.search.duty import duty_findings

    return list(duty_findings(c, c.target.duty))


def stock_lines(lots: Sequence[Lot], target: Target) -> tuple[StockLine, ...]:
    """Each lot with whether it serves the need: those that do come first."""
    lines = [_stock_line(lot, target) for lot in lots]
    return tuple(sorted(lines, key=lambda line: line.fit.ok is False))


def _stock_line(lot: Lot, target: Target) -> StockLine:
    need = target.need
    wanted = Wanted(certificate=target.certificate)
    if need is not None:
        wanted = Wanted(need.pieces, need.width_mm, need.length_mm, need.diameter_mm, target.certificate)
    found = fit(lot, wanted)
    return StockLine(lot, Fit(found.ok, found.why))


def rank(candidate: Candidate) -> tuple[int, float, str]:
    """Best verdict first, then the penalty, then id."""
    return (candidate.verdict.rank, round(candidate.penalty.total, 9), candidate.cloth.id)
