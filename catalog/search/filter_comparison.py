"""Filter cloth against filter cloth: counts, wires and rating; no opening, no open area."""

from collections.abc import Sequence
from fractions import Fraction

from catalog.search.candidate import Finding, Verdict
from catalog.search.comparison import Comparison, Direction
from catalog.search.rules import HouseRules

EQUAL_RATING = Fraction(5, 1000)
"""Ratings are equal to rounding within 0.5 %."""


def decide_filter(c: Comparison, gates: Sequence[Finding], rules: HouseRules) -> tuple[Verdict, list[Finding]]:
    """Verdict and findings for a filter target, whatever the purpose."""
    if any(gate.ok is False for gate in gates):
        return Verdict.NOT_EQUIVALENT, []
    rating, rating_finding = _rating(c, rules)
    findings = [rating_finding, *_make_findings(c)]
    if rating is False:
        return Verdict.NOT_EQUIVALENT, findings
    if any(gate.ok is None for gate in gates) or rating is None or not _asks_make(c):
        return Verdict.CANNOT_SAY, findings
    if _agree(c, Fraction(0)) and rating == "equal":
        return Verdict.SAME, findings
    if _agree(c, rules.filter_make):
        return Verdict.INTERCHANGEABLE, findings
    return Verdict.CANNOT_SAY, findings


def _asks_make(c: Comparison) -> bool:
    return all(d.asked_pitch is not None and d.asked_wire is not None for d in c.directions)


def _agree(c: Comparison, share: Fraction) -> bool:
    return all(_near(d, share) for d in c.directions)


def _near(d: Direction, share: Fraction) -> bool:
    """Counts exact to *share*; wires to *share* or the rounding of their spelling."""
    assert d.asked_pitch is not None
    assert d.asked_wire is not None
    pitch_off = abs(d.found.pitch_mm - d.asked_pitch)
    wire_off = abs(d.found.wire_mm - d.asked_wire)
    return pitch_off <= share * d.asked_pitch and wire_off <= max(share * d.asked_wire, d.wire_rounding)


def _rating(c: Comparison, rules: HouseRules) -> tuple[str | bool | None, Finding]:
    """'equal', False where it is another rating, None where it can't be compared; with the words."""
    asked, found = c.target.rating, c.cloth.rating
    if asked is None:
        said = f"{found.um:g} µm {found.kind}" if found else "none"
        text = f"No rating was asked; the rating on record is {said}."
        return "equal", Finding("rating", True, text)
    if found is None:
        return None, Finding("rating", None, f"Asked {asked.um:g} µm; no rating on record: ask the supplier.")
    words = f"Asked {asked.um:g} µm {asked.kind}, on record {found.um:g} µm {found.kind}"
    words += f" ({found.method})" if found.method else ""
    if asked.kind != found.kind or (asked.method and asked.method != found.method):
        return None, Finding("rating", None, f"{words}: other kinds of rating don't compare; ask for the method.")
    off = abs(Fraction(found.um) - Fraction(asked.um)) / Fraction(asked.um)
    if off > rules.filter_rating:
        return False, Finding("rating", False, f"{words}: over {float(rules.filter_rating * 100):g} % apart.")
    if off > rules.filter_make:
        return None, Finding("rating", None, f"{words}: ask whether that will do.")
    return "equal" if off <= EQUAL_RATING else "near", Finding("rating", True, f"{words}.")


def _make_findings(c: Comparison) -> list[Finding]:
    found = []
    for d in c.directions:
        parts = []
        if d.asked_pitch is not None:
            parts.append(f"count {25.4 / float(d.asked_pitch):.4g} asked, {float(d.found.count_per_in):.4g} found")
        if d.asked_wire is not None:
            parts.append(f"wire {float(d.asked_wire):.4g} mm asked, {float(d.found.wire_mm):.4g} mm found")
        if parts:
            found.append(Finding(f"{d.name} make", _make_ok(d), f"{d.name.capitalize()}: {'; '.join(parts)}."))
    return found


def _make_ok(d: Direction) -> bool | None:
    if d.asked_pitch is None or d.asked_wire is None:
        return None
    return _near(d, Fraction(2, 100))
