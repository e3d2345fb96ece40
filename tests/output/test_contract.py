"""What scripts rely on: commands, exit codes, JSON keys. Keys are added, never renamed."""

import os
import shutil
import sqlite3
from pathlib import Path

import pytest
from conftest import Program, Said

from tui.cli import main

SIFTER = "0,25/0,16 1.4404 plain"
SIDE = {"count_per_in", "pitch_mm", "wire_mm", "aperture_mm"}
READING = {
    *("label", "likelihood", "weave", "warp", "weft", "alloy", "finish", "crimp", "grade", "standard", "certificate"),
    *("rating", "open_area_pct", "mass_kg_m2", "limits", "form", "derived", "notes"),
}
CANDIDATE = {
    *("cloth", "name", "demo", "weave", "alloy", "warp", "weft", "turned", "open_area_pct", "mass_kg_m2"),
    *("mass_geometric_kg_m2", "distance", "deviation", "verdict", "by_purpose", "harm_side", "penalty"),
    *("findings", "stock"),
}


def test_a_reading_has_the_keys_of_the_contract(crosscloth: Program) -> None:
    said = crosscloth("read", SIFTER, "--json")
    assert said.code == 0
    document = said.json
    assert {"schema", "text", "line", "status", "question", "readings", "missing", "problems"} <= set(document)
    assert document["schema"] == 1
    assert set(document["readings"][0]) >= READING
    assert set(document["readings"][0]["warp"]) >= SIDE
    assert document["readings"][0]["warp"]["aperture_mm"] == pytest.approx(0.25)
    assert document["readings"][0]["warp"]["pitch_mm"] == pytest.approx(0.41)
    assert document["readings"][0]["alloy"] == "316L"


def test_a_match_has_the_keys_of_the_contract(crosscloth: Program) -> None:
    said = crosscloth("match", SIFTER, "--json")
    assert said.code == 0
    document = said.json
    assert {"schema", "text", "question", "purpose", "target", "candidates"} <= set(document)
    read = READING - {"label", "likelihood"}
    assert {"tolerance_um", "tolerance_source", "origin"} | read <= set(document["target"])
    assert document["target"]["tolerance_um"] == pytest.approx(12.5)
    for candidate in document["candidates"]:
        assert set(candidate) >= CANDIDATE
        assert set(candidate["deviation"]) >= {"warp", "weft", "open_area_points", "mass_pct", "section_pct"}
        assert set(candidate["penalty"]) >= {"total", "aperture", "wire", "open_area"}
        for finding in candidate["findings"]:
            assert set(finding) >= {"rule", "ok", "message", "source"}
        for lot in candidate["stock"]:
            assert set(lot) >= {
                *("lot", "location", "width_mm", "usable_width_mm", "length_mm", "available_m2", "heat"),
                *("certificate", "fits"),
            }


EXPECTED = {  # worked example, exact sums: see tests/unit/test_judging.py
    "62 x 62 mesh, .0065 in, 316L": ("interchangeable", "interchangeable"),
    "60 x 60 mesh, .0065 in, 316L": ("interchangeable", "interchangeable"),
    "0.25/0.14 mm, 1.4404": ("near-safe", "near-safe"),
    "60 x 60 mesh, .0075 in, 316L": ("near-safe", "near-risk"),
    "60 x 60 mesh, .0045 in, 316": ("not-equivalent", "not-equivalent"),
    "0.25/0.16 mm, 1.4301": ("not-equivalent", "not-equivalent"),
}
HARM_SIDE = {"retain": {"60 x 60 mesh, .0065 in, 316L"}, "pass": {"62 x 62 mesh, .0065 in, 316L"}}


@pytest.mark.parametrize("purpose", ["retain", "pass"])
def test_the_sifter_deck_on_the_demo_rack(crosscloth: Program, purpose: str) -> None:
    document = crosscloth("match", SIFTER, "--purpose", purpose, "--json").json
    found = {c["name"]: c for c in document["candidates"] if c["name"] in EXPECTED}
    assert set(found) == set(EXPECTED)
    at = ("retain", "pass").index(purpose)
    assert {name: c["verdict"] for name, c in found.items()} == {name: v[at] for name, v in EXPECTED.items()}
    interchangeable = {name: c for name, c in found.items() if c["verdict"] == "interchangeable"}
    assert {name for name, c in interchangeable.items() if c["harm_side"]} == HARM_SIDE[purpose]
    assert all(c["demo"] and c["stock"] for c in found.values())
    gate = [f for f in found["0.25/0.16 mm, 1.4301"]["findings"] if f["rule"] == "alloy"]
    assert gate
    assert gate[0]["ok"] is False
    ranks = ["same", "interchangeable", "near-safe", "near-risk", "cannot-say", "not-equivalent"]
    order = [ranks.index(c["verdict"]) for c in document["candidates"]]
    assert order == sorted(order)


def test_the_text_answer_says_the_same_in_words(crosscloth: Program) -> None:
    said = crosscloth("match", SIFTER, "--purpose", "retain")
    assert said.code == 0
    assert "house rule" in said.out
    assert "demo" in said.out
    assert "interchangeable, harm side: measure the roll" in said.out
    assert "near, safe side" in said.out
    assert max(len(line) for line in said.out.splitlines()) <= 80


BAD = {
    "nonsense": "the quick brown fox",
    "wire not smaller than pitch": "60 mesh wire 0.45 mm",
    "not weavable": "12 mesh .063 steel",
    "empty": "",
    "noise": "x7#" * 3400,
    "control characters": "\x1b[31m\x07\x00\x1b]0;x\x07",
}


@pytest.mark.parametrize("text", BAD.values(), ids=BAD.keys())
def test_bad_input_ends_with_one_clear_line(crosscloth: Program, text: str) -> None:
    for command in ("read", "match"):
        said = crosscloth(command, text)
        assert said.code == 2
        assert len(said.err.splitlines()) == 1
        assert said.err.startswith("crosscloth: ")
        assert "Traceback" not in said.err + said.out
        assert "\x1b" not in said.err + said.out


def test_failures_as_json_stand_beside_the_sentence(crosscloth: Program) -> None:
    said = crosscloth("match", "12 mesh .063 steel", "--json")
    assert said.code == 2
    assert said.json["schema"] == 1
    assert set(said.json["error"]) == {"code", "message", "column"}
    assert said.json["error"]["code"] == "E_JAMMED"
    assert said.err


@pytest.mark.parametrize(
    "words", [["match"], ["read"], ["bogus"], ["list", "--aper", "1mm"], ["match", "x", "--purpose", "y"]]
)
def test_wrong_usage_is_one_line_and_2(crosscloth: Program, words: list[str]) -> None:
    said = crosscloth(*words)
    assert said.code == 2
    assert len(said.err.splitlines()) == 1


def test_options_count_before_and_after_the_command(crosscloth: Program) -> None:
    assert crosscloth("--json", "read", SIFTER).json == crosscloth("read", SIFTER, "--json").json


def test_several_callouts_are_one_object_a_line(crosscloth: Program) -> None:
    said = crosscloth("read", SIFTER, "60 x .0075 304")
    assert [line["text"] for line in said.lines] == [SIFTER, "60 x .0075 304"]


def test_a_text_file_is_a_callout_a_line_whatever_it_holds(crosscloth: Program, tmp_path: Path) -> None:
    source = tmp_path / "callouts.txt"
    source.write_text("# 60 x .0075 304\n\n0,25/0,16 1.4404 plain\nsame as last time\n", encoding="utf-8")
    said = crosscloth("read", "--from", str(source))
    assert said.code == 0
    assert [(line["line"], line["text"][:6]) for line in said.lines] == [(1, "# 60 x"), (3, "0,25/0"), (4, "same a")]
    matched = crosscloth("match", "--from", str(source), "--json")
    assert matched.code == 0
    assert [line["line"] for line in matched.lines] == [1, 3, 4]
    assert "error" in matched.lines[2]


def test_a_table_needs_its_column_named(crosscloth: Program, tmp_path: Path) -> None:
    source = tmp_path / "callouts.csv"
    source.write_text("No.;Callout\n1;0,25/0,16 1.4404 plain\n", encoding="utf-8")
    assert crosscloth("read", "--from", str(source)).code == 2
    assert crosscloth("read", "--from", str(source), "--column", "callout").lines[0]["line"] == 2


def test_nothing_within_limits_is_1(crosscloth: Program) -> None:
    assert (
        crosscloth("list", "--aperture", "..0.8mm", "--min-open-area", "45", "--wire", "0.35..mm", "--in-stock").code
        == 1
    )
    assert crosscloth("match", "60 mesh").code == 1  # a count alone: cannot say


def test_the_list_has_the_keys_of_the_contract(crosscloth: Program) -> None:
    document = crosscloth("list", "--aperture", "0.2..0.26mm", "--alloy", "316L", "--json").json
    assert {"schema", "total", "shown", "cloths", "limits", "near"} <= set(document)
    assert document["total"] == document["shown"] == len(document["cloths"]) > 3
    assert all(0.2 <= c["warp"]["aperture_mm"] <= 0.26 for c in document["cloths"])
    assert all(c["alloy"] == "316L" for c in document["cloths"])


def test_the_tables_have_the_keys_of_the_contract(crosscloth: Program) -> None:
    for name, first in {"gauges": ["system", "gauge", "diameter_mm"], "sieves": ["opening_mm"]}.items():
        document = crosscloth("tables", name, "--json").json
        assert set(document) == {"schema", "name", "source", "rows"}
        assert list(document["rows"][0])[: len(first)] == first
        assert isinstance(document["rows"][0][first[-1]], int | float)
    for name in ("alloys", "equivalents", "lookalikes", "guards"):
        assert crosscloth("tables", name, "--json").json["rows"]


def test_a_cloth_is_shown_by_the_id_that_match_gives(crosscloth: Program) -> None:
    cloth = crosscloth("match", SIFTER, "--json").json["candidates"][0]["cloth"]
    assert crosscloth("show", cloth, "--json").json["cloth"] == cloth
    text = crosscloth("show", cloth, "--explain").out
    assert "127/5" in text
    assert "ISO 9044" in text
    unknown = crosscloth("show", cloth + "x")
    assert unknown.code == 2
    assert cloth in unknown.err


def test_ascii_output_is_ascii(crosscloth: Program) -> None:
    for words in (["match", SIFTER], ["show", "iso3310-0.25", "--explain"], ["read", SIFTER], ["tables", "sieves"]):
        assert crosscloth(*words, "--ascii").out.isascii()


# -- stores that aren't as they should be ------------------------------------------------------------------------------


def _with(store: Path, capsys: pytest.CaptureFixture[str], *words: str) -> Said:
    return Program(store, capsys)(*words)


@pytest.mark.parametrize("content", [b"not a database at all" * 50, b"", b"SQLite format 3\x00" + b"\xff" * 200])
def test_a_file_that_is_no_store_is_left_as_it_is(
    tmp_path: Path, capsys: pytest.CaptureFixture[str], content: bytes
) -> None:
    path = tmp_path / "x.sqlite3"
    path.write_bytes(content)
    said = _with(path, capsys, "match", SIFTER)
    assert said.code == 3
    assert len(said.err.splitlines()) == 1
    assert path.read_bytes() == content
    assert [p.name for p in tmp_path.iterdir()] == ["x.sqlite3"]


def test_a_store_of_a_newer_version_is_refused_and_left(
    seeded: Path, tmp_path: Path, capsys: pytest.CaptureFixture[str]
) -> None:
    path = tmp_path / "newer.sqlite3"
    shutil.copy(seeded, path)
    with sqlite3.connect(path) as connection:
        connection.execute("UPDATE alembic_version SET version_num = '9999'")
    connection.close()
    before = path.read_bytes()
    said = _with(path, capsys, "match", SIFTER)
    assert said.code == 3
    assert "newer" in said.err
    assert len(said.err.splitlines()) == 1
    assert path.read_bytes() == before


def test_a_store_that_cannot_be_written_is_read_all_the_same(
    seeded: Path, tmp_path: Path, capsys: pytest.CaptureFixture[str]
) -> None:
    path = tmp_path / "locked" / "store.sqlite3"
    path.parent.mkdir()
    shutil.copy(seeded, path)
    os.chmod(path, 0o444)
    os.chmod(path.parent, 0o555)
    before = path.read_bytes()
    try:
        assert _with(path, capsys, "match", SIFTER).code == 0
        said = _with(path, capsys, "store", "drop-demo")
        assert said.code == 3
        assert len(said.err.splitlines()) == 1
        assert path.read_bytes() == before
    finally:
        os.chmod(path.parent, 0o755)


def test_a_store_without_the_invented_rows_can_be_made(tmp_path: Path, capsys: pytest.CaptureFixture[str]) -> None:
    path = tmp_path / "real.sqlite3"
    assert _with(path, capsys, "store", "new", "--without-demo").code == 0
    document = _with(path, capsys, "match", SIFTER, "--json").json
    assert not any(c["demo"] for c in document["candidates"])
    again = _with(path, capsys, "store", "new")
    assert again.code == 2
    assert "nothing was changed" in again.err


def test_the_invented_rows_can_be_taken_out(seeded: Path, tmp_path: Path, capsys: pytest.CaptureFixture[str]) -> None:
    path = tmp_path / "mixed.sqlite3"
    shutil.copy(seeded, path)
    assert _with(path, capsys, "store", "drop-demo").code == 0
    assert _with(path, capsys, "store", "where", "--json").json["demo"] is False
    assert "demo" not in _with(path, capsys, "list").out


def test_where_the_store_is_follows_option_then_environment(
    tmp_path: Path, monkeypatch: pytest.MonkeyPatch, capsys: pytest.CaptureFixture[str]
) -> None:
    monkeypatch.setenv("CROSSCLOTH_STORE", str(tmp_path / "env.sqlite3"))
    assert main(["store", "where"]) == 0
    assert "env.sqlite3" in capsys.readouterr().out
    assert main(["--store", str(tmp_path / "option.sqlite3"), "store", "where"]) == 0
    assert "option.sqlite3" in capsys.readouterr().out
    assert not list(tmp_path.iterdir())


def test_a_text_that_names_two_metals_is_same_to_nothing(crosscloth: Program) -> None:
    document = crosscloth("match", "20 mesh .016 304 or 316", "--json").json
    assert document["question"]
    assert not [c["name"] for c in document["candidates"] if c["verdict"] in ("same", "interchangeable")]


def test_a_bare_bronze_matches_no_other_metal(crosscloth: Program) -> None:
    document = crosscloth("match", "16 x 18 mesh .011 bronze", "--json").json
    fits = [c["alloy"] for c in document["candidates"] if c["verdict"] in ("same", "interchangeable", "near-safe")]
    assert not fits
    assert any(c["alloy"] == "CuSn5" and c["verdict"] == "cannot-say" for c in document["candidates"])


@pytest.mark.parametrize(
    "words", [["bogus", "--json"], ["match", "x", "--frobnicate", "--json"], ["show", "nope", "--json"]]
)
def test_wrong_usage_answers_as_json_where_json_was_asked(crosscloth: Program, words: list[str]) -> None:
    said = crosscloth(*words)
    assert said.code == 2
    assert set(said.json["error"]) == {"code", "message", "column"}
    assert said.err
