"""A roll measured against what was ordered: conforms, fails, or not proven, by the guard band rule."""

from collections.abc import Iterator, Mapping
from dataclasses import dataclass

from catalog.callout.reading import Side
from catalog.errors import InputError
from catalog.search.bench_figures import BenchFigure, bench_figures
from catalog.search.candidate import Finding
from catalog.search.evidence import Evidence
from catalog.search.improving import Better, improvement
from catalog.search.make_findings import make_findings
from catalog.search.outcome import Outcome, worst
from catalog.search.reader import Range
from catalog.search.receipt_words import (
    is_square,
    missing_words,
    notes_of,
    nothing_to_judge,
    refuse_impossible,
    sentence,
)
from catalog.search.rules import HOUSE_RULES, HouseRules
from catalog.target import Target
from catalog.units import MM_PER_INCH

EDGE = 1e-12
COUNT = "count_per_in"
LIMITED: Mapping[str, str] = {
    "aperture_mm": "aperture",
    "wire_mm": "wire",
    "pitch_mm": "pitch",
    COUNT: "pitch",
    "open_area_pct": "open_area",
    "mass_kg_m2": "mass",
    "thickness_mm": "thickness",
}


@dataclass(frozen=True, slots=True)
class Check:
    """One figure against its bounds."""

    figure: BenchFigure
    asked: float | None
    """The asked value, where there is one; None for a bare limit."""
    bounds: Range
    """Least and most that is permitted, inclusive."""
    allowed: float | None
    """T, where the bounds lie evenly about the asked value."""
    source: str
    """Who says what is permitted."""
    outcome: Outcome
    reach: float | None
    """|found − asked| + U, to set beside T; None for a bare limit."""
    better: Better | None
    """What would decide; only where nothing is proven."""

    @property
    def message(self) -> str:
        """The sum in words, the weak link, and what would decide."""
        return sentence(self.figure, self.asked, self.bounds, self.allowed, self.outcome, self.better)


@dataclass(frozen=True, slots=True)
class Receipt:
    """The whole check."""

    target: Target
    evidence: Evidence
    outcome: Outcome
    checks: tuple[Check, ...]
    findings: tuple[Finding, ...]
    """Weave and magnet."""
    notes: tuple[str, ...]


def check_receipt(target: Target, evidence: Evidence, rules: HouseRules = HOUSE_RULES) -> Receipt:
    """Judge *evidence* against *target*. Raises InputError where nothing can be judged, or none could be woven so.

    Conforms where |found − asked| + U ≤ T, fails where |found − asked| − U > T, else not proven.
    Source: guard band of width U (k = 2) on both sides of the tolerance, as in ISO 14253-1 (from memory).
    """
    if not target.reading.is_filter:
        refuse_impossible(evidence)
    figures = {figure.quantity: figure for figure in bench_figures(evidence)}
    checks = tuple(_checks(target, figures, rules))
    findings = tuple(make_findings(target, evidence))
    if not checks and not any(finding.ok is False for finding in findings):
        raise InputError(nothing_to_judge(target, figures))
    outcome = worst([check.outcome for check in checks] + [Outcome.FAILS for f in findings if f.ok is False])
    judged_names = {check.figure.quantity for check in checks}
    unmeasured = [limit for limit in _stated_limits(target) if not judged_names.intersection(_figures_of(limit))]
    missing = missing_words(target, judged_names, [LIMITED.get(limit, limit) for limit in unmeasured])
    if outcome is Outcome.CONFORMS and (unmeasured or not _is_enough(target, judged_names)):
        outcome = Outcome.NOT_PROVEN
    return Receipt(target, evidence, outcome, checks, findings, (*missing, *notes_of(evidence)))


def _is_enough(target: Target, judged_names: set[str]) -> bool:
    """True where every aperture that was asked for was judged; in square cloth one direction stands for both.

    Where none was asked for, wires alone prove nothing: a limit has to be judged.
    """
    asked = {f"{name}.aperture" for name, side in (("warp", target.warp), ("weft", target.weft)) if side.aperture}
    if not asked:
        return bool(_stated_limits(target))
    return bool(asked & judged_names) if is_square(target) else asked <= judged_names


def _stated_limits(target: Target) -> list[str]:
    return [limit for limit, bounds in target.limits.items() if bounds != (None, None)]


def _figures_of(limit: str) -> tuple[str, ...]:
    quantity = LIMITED.get(limit, "")
    return quantity, f"warp.{quantity}", f"weft.{quantity}"


def _checks(target: Target, figures: Mapping[str, BenchFigure], rules: HouseRules) -> Iterator[Check]:
    for name, side in (("warp", target.warp), ("weft", target.weft)):
        yield from _side_checks(name, side, target, figures, rules)
    for limit in _stated_limits(target):
        bounds = target.limits[limit]
        for key in _figures_of(limit):
            if key in figures:
                yield judged(figures[key], None, as_pitch(bounds) if limit == COUNT else bounds, "limit as stated")


def as_pitch(count_per_in: Range) -> Range:
    """Bounds on a count as bounds on the pitch, mm: p = 25.4/N, so least and most change places."""
    least, most = (None if count is None else float(MM_PER_INCH) / count for count in count_per_in)
    return most, least


def _side_checks(
    name: str, side: Side, target: Target, figures: Mapping[str, BenchFigure], rules: HouseRules
) -> Iterator[Check]:
    aperture, wire = figures.get(f"{name}.aperture"), figures.get(f"{name}.wire")
    if aperture and side.aperture and target.tolerance:
        allowed = target.tolerance.warp_mm if name == "warp" else target.tolerance.weft_mm
        yield about(aperture, float(side.aperture.mm), allowed, target.tolerance.source)
    if wire and side.wire:
        share = rules.wire
        source = f"house rule: {float(share * 100):g} % of the wire"
        yield about(wire, float(side.wire.mm), float(side.wire.mm * share), source)


def about(figure: BenchFigure, asked: float, allowed: float, source: str) -> Check:
    """Judge a figure against asked ± allowed."""
    return judged(figure, asked, (asked - allowed, asked + allowed), source, allowed)


def judged(figure: BenchFigure, asked: float | None, bounds: Range, source: str, allowed: float | None = None) -> Check:
    """Judge a figure against bounds, inclusive, with a guard band of U inside them."""
    margin = _margin(figure.value, bounds)
    u = figure.expanded
    decided = abs(margin) >= u - EDGE if margin >= 0 else -margin > u + EDGE
    outcome = Outcome.NOT_PROVEN if not decided else Outcome.CONFORMS if margin >= 0 else Outcome.FAILS
    better = improvement(figure, abs(margin)) if outcome is Outcome.NOT_PROVEN and figure.unit == "mm" else None
    reach = None if asked is None else abs(figure.value - asked) + u
    return Check(figure, asked, bounds, allowed, source, outcome, reach, better)


def _margin(value: float, bounds: Range) -> float:
    """How far inside the nearer bound; below 0 outside."""
    low, high = bounds
    inside = [] if low is None else [value - low]
    inside += [] if high is None else [high - value]
    return min(inside)
