"""Does it cut, and the sheet that gets signed, as a person meets them on the command line.

Worked example: remnant R-117, 1.195 × 2.40 m, selvedge 15 mm a side, kerf 5: usable 1165 mm, 3 discs Ø 350 across;
12 discs take 1420 mm and leave 1165 × 980 mm (sums by hand).
"""

from pathlib import Path

import pytest
from conftest import Program

SIFTER = "0,25/0,16 1.4404 plain"
SIXTY = "60 x 60 mesh, .0065 in, 316L"


@pytest.fixture
def sixty(crosscloth: Program) -> str:
    found = crosscloth("match", SIFTER, "--json").json["candidates"]
    return str(next(c["cloth"] for c in found if c["name"] == SIXTY))


def test_twelve_discs_come_out_of_the_remnant(crosscloth: Program, sixty: str) -> None:
    words = ["cut", sixty, "--lot", "R-117", "--need", "12 discs 350 mm", "--kerf", "5"]
    said = crosscloth(*words, "--json")
    assert said.code == 0
    (cut,) = said.json["cuts"]
    assert said.json["complete"]
    assert cut["taken_mm"] == 1420
    assert cut["remnants"] == [{"width_mm": 1165, "length_mm": 980}]
    text = crosscloth(*words)
    assert "1165 × 980 mm" in text.out
    assert max(map(len, text.out.splitlines())) <= 80
    assert crosscloth(*words, "--ascii").out.isascii()


def test_a_disc_wider_than_every_roll_is_refused_with_what_it_is_short_of(crosscloth: Program, sixty: str) -> None:
    said = crosscloth("cut", sixty, "--need", "1 disc 1240 mm")
    assert said.code == 1
    assert "short" in said.out


@pytest.mark.parametrize(
    "words",
    [
        ["--need", "12 discs 350"],
        ["--need", "1 disc 350 mm", "--kerf", "-1"],
        ["--need", "1 disc 350 mm", "--lot", "X"],
    ],
)
def test_what_cannot_be_cut_is_one_line(crosscloth: Program, sixty: str, words: list[str]) -> None:
    said = crosscloth("cut", sixty, *words)
    assert said.code == 2
    assert len(said.err.splitlines()) == 1


@pytest.mark.parametrize(("ending", "starts"), [(".pdf", b"%PDF"), (".html", b"<!DOCTYPE"), (".md", b"# Subst")])
def test_the_sheet_is_written_whole_in_the_format_of_its_name(
    crosscloth: Program, sixty: str, tmp_path: Path, ending: str, starts: bytes
) -> None:
    target = tmp_path / f"sheet{ending}"
    said = crosscloth("sheet", SIFTER, sixty, "-o", str(target), "--purpose", "retain", "--number", "7", "--json")
    assert said.code == 0
    assert said.json["verdict"] == "interchangeable"
    assert target.read_bytes().lower().startswith(starts.lower())
    assert [p.name for p in tmp_path.iterdir()] == [target.name]


def test_the_sheet_says_what_is_invented_what_hurts_and_who_decides(
    crosscloth: Program, sixty: str, tmp_path: Path
) -> None:
    target = tmp_path / "sheet.md"
    crosscloth("sheet", SIFTER, sixty, "-o", str(target), "--purpose", "retain", "--kind", "concession")
    text = target.read_text(encoding="utf-8")
    assert "INVENTED" in text
    assert "harm side for retain" in text
    assert "concession" in text
    assert "house rule" in text


def test_a_sheet_that_cannot_be_written_leaves_nothing(crosscloth: Program, sixty: str, tmp_path: Path) -> None:
    for output in (tmp_path / "no" / "sheet.pdf", tmp_path / "sheet.doc"):
        said = crosscloth("sheet", SIFTER, sixty, "-o", str(output))
        assert said.code == 2
        assert len(said.err.splitlines()) == 1
    assert not list(tmp_path.iterdir())
    assert crosscloth("sheet", SIFTER, "no-such-cloth", "-o", str(tmp_path / "s.md")).code == 2
