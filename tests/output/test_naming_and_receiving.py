"""`identify` and `receipt` as a script meets them. Figures: the worked examples of the trade, sums by hand.

47 spaces in 20 mm: pitch 20/47 = 0.4255 mm, within 0.4255/94 = 0.0045. 60 per inch is 0.4233 mm, 62 is 0.4097 mm.
118 in 50 mm less a wire of 0.165 mm: 258.7 µm; U = √((1.155 × 1.80)² + 5²) = 5.4 µm, or 2.9 with a wire to 2 µm.
"""

import pytest
from conftest import Program

ROLL = ("--count", "47 in 20 mm", "--wire", "0.165±0.005 mm")
ORDER = "0,25/0,16 1.4404 plain"
LONG = ("--count", "118 in 50 mm")


def test_the_roll_is_named_with_odds_and_the_others_with_what_rules_them_out(crosscloth: Program) -> None:
    said = crosscloth("identify", *ROLL, "--json")
    assert said.code == 0
    document = said.json
    assert {"schema", "candidates", "next", "set95", "assumed", "warnings", "notes"} <= set(document)
    best = document["candidates"][0]
    assert {"cloth", "odds", "misfit", "ruled_out_by"} <= set(best)
    assert best["odds"] > 0.95
    assert document["set95"] == [best["cloth"]]
    assert best["warp"]["count_per_in"] == pytest.approx(60)
    assert best["misfit"] == {"pitch": pytest.approx(0.5, abs=0.05), "wire": pytest.approx(0, abs=0.05)}
    by_name = {one["name"]: one for one in document["candidates"]}
    assert by_name["60 x 60 mesh, .0075 in, 316L"]["ruled_out_by"] == "wire"
    assert by_name["62 x 62 mesh, .0065 in, 316L"]["ruled_out_by"] == "pitch"
    assert by_name["62 x 62 mesh, .0065 in, 316L"]["misfit"]["pitch"] == pytest.approx(3.5, abs=0.05)


def test_the_next_measurement_comes_with_its_length(crosscloth: Program) -> None:
    step = crosscloth("identify", *ROLL, "--json").json["next"]
    assert {"measure", "over_mm", "resolution_mm", "why"} <= set(step)
    assert (step["measure"], step["over_mm"]) == ("count", 50)
    assert "118 in 50 mm" in step["why"]
    assert "7.6" in step["why"]
    assert "7.8" in step["why"]


def test_what_is_assumed_is_said(crosscloth: Program) -> None:
    document = crosscloth("identify", "--count", "60 per in", "--wire", ".0065 in", "--json").json
    assert document["assumed"] == ["wire"]
    assert any("assumed" in note and "wire" in note for note in document["notes"])


def test_a_figure_beyond_two_limits_is_out_by_the_worse(crosscloth: Program) -> None:
    """2/0.9 mm cloth against 8 per inch and .032 in wire: pitch 1.4 times its limit, wire 5.9 times its ±."""
    document = crosscloth("identify", "--count", "8 per in", "--wire", ".032 in", "--json").json
    sieve = next(one for one in document["candidates"] if one["cloth"] == "iso3310-2")
    assert sieve["misfit"]["wire"] > sieve["misfit"]["pitch"] > 1
    assert sieve["ruled_out_by"] == "wire"


def test_nothing_that_fits_is_exit_1_and_the_knuckle_is_suspected(crosscloth: Program) -> None:
    said = crosscloth("identify", "--count", "47 in 20 mm", "--wire", "0.33 mm")
    assert said.code == 1
    assert "Nothing in this catalogue fits" in said.out
    assert "knuckle" in said.out


@pytest.mark.parametrize(
    ("words", "column"),
    [(("--count", "47 mm"), 4), (("--wire", "0.165"), 6), (("--swatch", "1.92 g"), 7), (("--magnetic", "maybe"), None)],
)
def test_a_measurement_that_cannot_be_read_is_exit_2_with_its_column(
    words: tuple[str, str], column: int | None, crosscloth: Program
) -> None:
    said = crosscloth("identify", *words, "--json")
    assert said.code == 2
    assert said.json["error"]["column"] == column
    assert said.err.startswith("crosscloth: ")


@pytest.mark.parametrize("command", [("identify",), ("receipt", ORDER)])
def test_nothing_measured_is_exit_2_and_says_what_to_give(command: tuple[str, ...], crosscloth: Program) -> None:
    said = crosscloth(*command)
    assert said.code == 2
    assert "--count" in said.err


@pytest.mark.parametrize(
    ("wire", "verdict", "reach", "code"),
    [("0.165±0.005 mm", "not-proven", 14.1, 1), ("0.165±0.002 mm", "conforms", 11.6, 0)],
)
def test_a_better_micrometer_decides(wire: str, verdict: str, reach: float, code: int, crosscloth: Program) -> None:
    said = crosscloth("receipt", ORDER, *LONG, "--wire", wire, "--json")
    assert said.code == code
    document = said.json
    assert document["verdict"] == verdict
    aperture = next(check for check in document["checks"] if check["quantity"] == "warp.aperture")
    assert aperture["found"] * 1000 == pytest.approx(258.7, abs=0.05)
    assert aperture["tolerance"] * 1000 == pytest.approx(12.5)
    assert aperture["reach"] * 1000 == pytest.approx(reach, abs=0.05)
    assert aperture["verdict"] == verdict


def test_the_weak_link_is_the_micrometer_not_the_count(crosscloth: Program) -> None:
    said = crosscloth("receipt", ORDER, *LONG, "--wire", "0.165±0.005 mm")
    flat = " ".join(said.out.split())
    assert "8.7 + 5.4 = 14.1 > 12.5: not proven" in flat
    assert "The weak link is the wire" in flat
    assert "would decide" in flat


def test_a_roll_that_is_far_too_open_fails(crosscloth: Program) -> None:
    """50 per inch with a .009 in wire opens 279.4 µm: 29.4 off, against 12.5 allowed."""
    said = crosscloth("receipt", ORDER, "--count", "100 in 50.8 mm", "--wire", "0.2286±0.002 mm", "--json")
    assert (said.code, said.json["verdict"]) == (1, "fails")


def test_a_wire_alone_does_not_prove_an_opening(crosscloth: Program) -> None:
    said = crosscloth("receipt", ORDER, "--wire", "0.16±0.002 mm", "--json")
    assert (said.code, said.json["verdict"]) == (1, "not-proven")
    assert any("aperture wasn't measured" in note for note in said.json["notes"])


def test_wires_alone_do_not_prove_filter_cloth(crosscloth: Program) -> None:
    """24 × 110 plain Dutch, .015/.010: the wire is as ordered, and nothing says what it holds back."""
    said = crosscloth("receipt", "24 x 110 plain dutch .015/.010", "--wire", "0.381±0.005 mm", "--json")
    assert (said.code, said.json["verdict"]) == (1, "not-proven")
    assert [check["verdict"] for check in said.json["checks"]] == ["conforms"]


def test_a_wire_thicker_than_its_pitch_is_a_slip_not_a_verdict(crosscloth: Program) -> None:
    said = crosscloth("receipt", ORDER, "--count", "47 in 20 mm", "--wire", "0.5 mm", "--json")
    assert said.code == 2
    assert said.json["error"]["code"] == "E_IMPOSSIBLE"
    assert "knuckle" in said.err


def test_a_limit_on_the_count_is_judged_by_the_pitch(crosscloth: Program) -> None:
    """At least 30 per inch is a pitch of at most 25.4/30 = 0.8467 mm; 25 per inch is 1.016 mm."""
    close, open_ = (
        crosscloth("receipt", "at least 30 mesh", "--count", count, "--json")
        for count in ("100 in 80 mm", "25 in 1 in")
    )
    assert close.json["checks"][0]["bounds"] == [None, pytest.approx(25.4 / 30, abs=1e-6)]
    assert (close.code, close.json["verdict"]) == (0, "conforms")
    assert (open_.code, open_.json["verdict"]) == (1, "fails")


def test_an_open_question_leaves_the_receipt_unproven(crosscloth: Program) -> None:
    """'60 mesh' may be the count or sieve No. 60; the first states no opening, so it can't be agreed on."""
    said = crosscloth("receipt", "60 mesh", "--count", "123 in 50.43 mm", "--wire", "0.160±0.001 mm", "--json")
    assert (said.code, said.json["verdict"]) == (1, "not-proven")
    assert said.json["question"]


def test_a_callout_without_a_cloth_is_exit_2(crosscloth: Program) -> None:
    assert crosscloth("receipt", "qqq", *LONG).code == 2


@pytest.mark.parametrize(
    "words",
    [
        ("identify", *ROLL),
        ("identify", "--count", "60 per in", "--swatch", "1.92 g / 100 cm2", "--magnetic", "no"),
        ("receipt", ORDER, *LONG, "--wire", "0.165±0.005 mm"),
    ],
)
def test_lines_stay_within_80_columns_and_ascii_is_ascii(words: tuple[str, ...], crosscloth: Program) -> None:
    wide = crosscloth(*words)
    assert wide.out
    assert max(map(len, wide.out.splitlines())) <= 80
    assert crosscloth(*words, "--ascii").out.isascii()
