"""The JSON documents of naming a roll and of receiving one: keys are added, never renamed."""

from collections.abc import Sequence
from typing import Any

from catalog.callout.reading import Understanding
from catalog.report.documents import SCHEMA, cloth_document
from catalog.search.candidate import Finding
from catalog.search.identify import Identification, Identified
from catalog.search.improving import Better
from catalog.search.measured import Count, Scalar
from catalog.search.outcome import Outcome
from catalog.search.receipt import Check, Receipt
from catalog.search.separating import Next

Document = dict[str, Any]


def identify_document(result: Identification) -> Document:
    """What a roll may be: candidates with odds and misfits, what to measure next, warnings."""
    return {
        "schema": SCHEMA,
        "measured": {name: _measured(m) for name, m in result.evidence.measured.items() if m is not None},
        "candidates": [_candidate(one) for one in result.candidates],
        "set95": [one.cloth.id for one in result.survivors],
        "next": _next(result.next) if result.next else None,
        "looked_at": result.looked_at,
        "assumed": [name for name, m in result.evidence.measured.items() if isinstance(m, Scalar) and m.is_assumed],
        "warnings": list(result.warnings),
        "notes": list(result.notes),
    }


def receipt_document(receipt: Receipt, text: str) -> Document:
    """A receipt check of *text*, the callout: one verdict, each figure with its sum, what would decide."""
    return {
        "schema": SCHEMA,
        "text": text,
        "reading": receipt.target.reading.label,
        "verdict": receipt.outcome.value,
        "measured": {name: _measured(m) for name, m in receipt.evidence.measured.items() if m is not None},
        "checks": [_check(check) for check in receipt.checks],
        "findings": [_finding(finding) for finding in receipt.findings],
        "notes": list(receipt.notes),
    }


def receipts_document(receipts: Sequence[Receipt], verdict: Outcome, understanding: Understanding) -> Document:
    """The check of a callout that may have more readings than one: the first in full, all under 'readings'."""
    documents = [receipt_document(receipt, understanding.text) for receipt in receipts]
    keys = ("reading", "verdict", "checks", "findings")
    return documents[0] | {
        "verdict": verdict.value,
        "question": understanding.question,
        "readings": [{key: document[key] for key in keys} for document in documents],
    }


def _candidate(one: Identified) -> Document:
    extra = {"name", "demo", "weave", "alloy", "declared", "warp", "weft"}
    cloth = {key: value for key, value in cloth_document(one.cloth, one.turned).items() if key in extra}
    return {
        "cloth": one.cloth.id,
        "odds": round(one.odds, 6),
        "misfit": {name: _rounded(value, 3) for name, value in one.misfit.items()},
        "ruled_out_by": one.ruled_out_by,
        "in_95_set": one.is_in_set,
        "turned": one.turned,
        "reason": one.reason,
    } | cloth


def _next(step: Next) -> Document:
    return {
        "measure": step.measure,
        "over_mm": step.over_mm,
        "resolution_mm": step.resolution_mm,
        "why": step.why,
        "expected": dict(step.expected),
    }


def _measured(measured: Count | Scalar) -> Document:
    """As written, with the ± that counts and whether it was assumed."""
    if isinstance(measured, Count):
        return {
            "written": measured.written,
            "value": round(float(measured.pitch_mm), 6),
            "unit": "mm",
            "limit": round(measured.pitch_limit_mm, 6),
            "uncertainty": round(measured.pitch_expanded_mm, 6),
            "assumed": False,
        }
    return {
        "written": measured.written,
        "value": round(float(measured.value), 6),
        "unit": "kg/m²" if measured.instrument == "balance" else "mm",
        "limit": None,
        "uncertainty": round(measured.plus_minus, 6),
        "assumed": measured.is_assumed,
    }


def _check(check: Check) -> Document:
    figure, weak = check.figure, check.figure.weak_link
    return {
        "quantity": figure.quantity,
        "unit": figure.unit,
        "asked": _rounded(check.asked, 6),
        "found": round(figure.value, 6),
        "uncertainty": round(figure.expanded, 6),
        "tolerance": _rounded(check.allowed, 6),
        "bounds": [_rounded(bound, 6) for bound in check.bounds],
        "source": check.source,
        "verdict": check.outcome.value,
        "reach": _rounded(check.reach, 6),
        "parts": {part.quantity: round(part.expanded, 6) for part in figure.parts},
        "weak_link": weak.quantity,
        "better": _better(check.better) if check.better else None,
        "message": check.message,
    }


def _better(better: Better) -> Document:
    steps = [{"measure": s.measure, "over_mm": s.over_mm, "resolution_mm": s.resolution_mm} for s in better.steps]
    return {"steps": steps, "needed": round(better.needed, 6), "expanded": _rounded(better.expanded, 6)}


def _finding(finding: Finding) -> Document:
    return {"rule": finding.rule, "ok": finding.ok, "message": finding.message, "source": finding.source or None}


def _rounded(value: float | None, digits: int) -> float | None:
    return None if value is None else round(value, digits)
