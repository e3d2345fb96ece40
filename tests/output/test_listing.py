"""The catalogue by figures: limits that explain themselves, one limit moved, one name for many cloths.

Worked example: w ≤ 0.80 mm, open area ≥ 45 %, wire ≥ 0.35 mm, stainless, on the rack.
"""

import pytest
from conftest import Program

LIMITS = ["--aperture", "..0.8mm", "--min-open-area", "45", "--wire", "0.35..mm", "--alloy", "stainless", "--in-stock"]


def test_an_empty_list_names_the_near_misses_and_what_they_are_short_of(crosscloth: Program) -> None:
    said = crosscloth("list", *LIMITS, "--json")
    assert said.code == 1
    document = said.json
    assert document["cloths"] == []
    names = {c["cloth"]: c["name"] for c in crosscloth("list", "--json").json["cloths"]}
    short = {names[near["cloth"]]: {s["limit"]: s["by"] for s in near["short_of"]} for near in document["near"]}
    assert short["24 x 24 mesh, .014 in, 304"] == {"open_area_pct": pytest.approx(0.91, abs=0.01)}
    assert short["0.8/0.32 mm, 1.4301"] == {"wire_mm": pytest.approx(0.03)}
    assert short["20 x 20 mesh, .016 in, 304"] == {"aperture_mm": pytest.approx(0.0636)}
    removed = {r["limit"]: r["removed"] for r in document["limits"]}
    assert removed["aperture_mm"] > 0
    assert removed["wire_mm"] > 0
    assert removed["open_area_pct"] > 0


def test_the_window_that_would_satisfy_is_told(crosscloth: Program) -> None:
    assert "0.713 ≤ w ≤ 0.800 mm and 0.35 ≤ d ≤ 0.4907 w" in crosscloth("list", *LIMITS).out


def test_moving_one_limit_says_which_lines_come_and_go(crosscloth: Program) -> None:
    wider = crosscloth("list", *LIMITS, "--move", "min-open-area=44", "--json").json["moved"]
    assert wider["come"]
    assert not wider["go"]
    tighter = crosscloth("list", "--aperture", "0.2..0.3mm", "--move", "aperture=0.2..0.25mm", "--json").json["moved"]
    assert tighter["go"]
    assert not tighter["come"]


@pytest.mark.parametrize("move", ["x=1", "min-open-area", "min-open-area=much", "aperture=wide"])
def test_a_move_that_is_none_is_refused(crosscloth: Program, move: str) -> None:
    said = crosscloth("list", "--aperture", "0.2..0.3mm", "--move", move)
    assert said.code == 2
    assert len(said.err.splitlines()) == 1


def test_sixty_names_cloths_a_third_apart(crosscloth: Program) -> None:
    """Market grade 0.2328, sieve No. 60 0.2500, bolting cloth 0.3090 mm: sums from counts and wires."""
    document = crosscloth("list", "--called", "60", "--json").json
    apertures = {round(c["warp"]["aperture_mm"], 4) for c in document["cloths"]}
    assert {0.2328, 0.25, 0.309} <= apertures
    pairs = crosscloth("tables", "lookalikes", "--json").json["rows"]
    assert any(row["called"] == "60" and row["apart_pct"] > 30 for row in pairs)


@pytest.mark.parametrize(
    "words",
    [
        ["--aperture", "0.3..0.2mm"],
        ["--aperture", "0.2"],
        ["--aperture", "wide"],
        ["--min-open-area", "140"],
        ["--max-loss", "5"],
        ["--max-price", "cheap"],
        ["--alloy", "unobtainium"],
        ["--weave", "knitted"],
        ["--limit", "0"],
    ],
)
def test_limits_that_make_no_sense_are_refused_in_one_line(crosscloth: Program, words: list[str]) -> None:
    said = crosscloth("list", *words)
    assert said.code == 2
    assert len(said.err.splitlines()) == 1
