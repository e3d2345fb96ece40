"""Callouts composed from practice, with the readings that a competent person would give: none may be silently wrong.

The lines and readings in data/callouts_from_practice.jsonl were composed by hand, not taken from the program.
"""

import json
from pathlib import Path
from typing import Any

import pytest

from catalog import callout
from catalog.report.reading_document import reading_document

LINES = [
    json.loads(line)
    for line in (Path(__file__).parent / "data" / "callouts_from_practice.jsonl").read_text("utf-8").splitlines()
]
SURE = {"clear", "noted"}
WHY_ENOUGH = {"E_IMPOSSIBLE", "E_JAMMED", "E_DATE", "E_UNIT"}
FIGURES = [(side, key) for side in ("warp", "weft") for key in ("pitch_mm", "aperture_mm", "wire_mm")]


def pairs(expected: dict[str, Any], answer: dict[str, Any]) -> list[tuple[float, float | None]]:
    found = [((expected.get(side) or {}).get(key), answer[side][key]) for side, key in FIGURES]
    return [(want, got) for want, got in found if want is not None]


def is_near(want: float, got: float | None) -> bool:
    return got is not None and abs(got - want) <= 0.005 * abs(want) + 1e-9


def words_fit(expected: dict[str, Any], answer: dict[str, Any]) -> bool:
    return all(
        answer[key] in {expected[key], expected.get(f"{key}_also")}
        for key in ("alloy", "weave")
        if expected.get(key) is not None
    )


def agrees(expected: dict[str, Any], answer: dict[str, Any]) -> bool:
    return words_fit(expected, answer) and all(is_near(want, got) for want, got in pairs(expected, answer))


def usual(line: dict[str, Any]) -> list[dict[str, Any]]:
    return [r for r in line["readings"] if r["likelihood"] == "usual"] or line["readings"][:1]


def alive(answer: dict[str, Any]) -> list[dict[str, Any]]:
    return [r for r in answer["readings"] if r["likelihood"] != "ruled-out"]


def bounds_hold(line: dict[str, Any], answer: dict[str, Any]) -> bool:
    got = alive(answer)[0]["limits"]
    return all(
        want is None or is_near(want, got.get(key, [None, None])[end])
        for key, wanted in line["bounds"].items()
        for end, want in enumerate(wanted)
    )


@pytest.mark.parametrize("line", LINES, ids=[line["id"] for line in LINES])
def test_a_line_from_practice_is_read_as_a_competent_person_reads_it(line: dict[str, Any]) -> None:
    answer = reading_document(callout.read(line["text"]))
    assert answer["status"] == line["status"] or {answer["status"], line["status"]} <= SURE
    if line["status"] in SURE:
        assert any(agrees(r, alive(answer)[0]) for r in usual(line))
    elif line["status"] == "limits":
        assert bounds_hold(line, answer)
    elif line["status"] == "ask":
        assert answer["question"] or answer["problems"]
        if line["error_code"] not in WHY_ENOUGH:
            assert all(any(agrees(r, a) for a in alive(answer)) for r in usual(line))
    elif line["status"] == "incomplete":
        assert any(agrees(r, a) for r in usual(line) for a in alive(answer))
