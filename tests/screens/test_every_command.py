"""Each command of the one list does what its help says; a command without a proof here fails."""

from collections.abc import Awaitable, Callable
from pathlib import Path

import pytest
from piloting import Driver, browser
from textual.widgets import Input

from tui.commands import CATALOGUE, COMMANDS, STOCK, TABLES, Command
from tui.screens.help import Help
from tui.screens.palette import Palette

Proof = Callable[[Driver, str], Awaitable[None]]
PROOFS: dict[str, Proof] = {}
PLACE_KEYS = {CATALOGUE: "f3", STOCK: "f4", TABLES: "f5"}


def proof(command_id: str) -> Callable[[Proof], Proof]:
    """Register the proof of a command."""

    def register(function: Proof) -> Proof:
        PROOFS[command_id] = function
        return function

    return register


@pytest.mark.parametrize("command", COMMANDS, ids=lambda c: c.id)
async def test_a_command_does_what_it_says(command: Command, tmp_path: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    monkeypatch.chdir(tmp_path)
    async with browser() as driver:
        if command.where in PLACE_KEYS:
            await driver.press(PLACE_KEYS[command.where])
        await PROOFS[command.id](driver, command.keys[0])


def test_no_proof_is_left_over() -> None:
    assert set(PROOFS) == {command.id for command in COMMANDS}


@proof("help")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert isinstance(d.app.screen, Help)
    assert "Change what the cloth is for" in d.text
    await d.press("escape")
    assert d.app.screen is d.desk


def _goes_to(place: str) -> Proof:
    async def go(d: Driver, key: str) -> None:
        await d.press("f4" if place != "stock" else "f5")
        assert d.desk.place_id != place
        await d.press(key)
        assert d.desk.place_id == place
        assert d.desk.place.display

    return go


for _place in ("match", "catalogue", "stock", "tables"):
    PROOFS[f"go_{_place}"] = _goes_to(_place)


@proof("back")
async def _(d: Driver, key: str) -> None:
    await d.press("f4")
    await d.press(key)
    assert d.desk.place_id == "match"
    await d.press("slash")
    assert isinstance(d.app.focused, Input)
    await d.press(key)
    assert d.app.focused is d.desk.place.table


@proof("input")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert d.app.focused is d.desk.place.line


@proof("units")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert ".00984 in" in d.text
    assert "0.25 mm" not in d.text
    await d.press(key)
    assert "0.25 mm" in d.text
    assert ".00984" not in d.text


@proof("copy")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert "62 × .0065 316L" in d.app.clipboard
    assert "interchangeable" in d.app.clipboard


@proof("write")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    await d.press("enter")
    written = Path("crosscloth-match.txt").read_text("utf-8")
    assert "0,25/0,16 1.4404 plain" in written
    assert "60 × .0075 316L" in written
    await d.press(key, "enter")
    assert "nothing written" in d.text


@proof("commands")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert isinstance(d.app.screen, Palette)
    await d.type("stock")
    await d.press("enter")
    assert d.desk.place_id == "stock"


@proof("theme")
async def _(d: Driver, key: str) -> None:
    before = d.app.current_theme.dark
    await d.press(key)
    assert d.app.current_theme.dark is not before


@proof("retry")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert "62 × .0065 316L" in d.text


@proof("quit")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    await d.until(lambda: d.app.return_code is not None)
    assert d.app.return_code == 0


@proof("row_down")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert d.desk.place.table.cursor == 1


@proof("row_up")
async def _(d: Driver, key: str) -> None:
    await d.press("down", "down", key)
    assert d.desk.place.table.cursor == 1


@proof("page_down")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert d.desk.place.table.cursor == d.desk.place.table.rows.total - 1


@proof("page_up")
async def _(d: Driver, key: str) -> None:
    await d.press("end", key)
    assert d.desk.place.table.cursor == 0


@proof("first_row")
async def _(d: Driver, key: str) -> None:
    await d.press("down", "down", key)
    assert d.desk.place.table.cursor == 0


@proof("last_row")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert d.desk.place.table.cursor == d.desk.place.table.rows.total - 1


@proof("columns_right")
async def _(d: Driver, key: str) -> None:
    assert "m² here" not in d.text
    await d.press(*[key] * 6)
    assert "m² here" in d.text


@proof("columns_left")
async def _(d: Driver, key: str) -> None:
    await d.press("right", "right", key)
    assert d.desk.place.table.first_column == 1


@proof("open")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert d.desk.place.has_class("-opened")
    await d.press("pagedown")
    assert "why" in d.text
    await d.press("escape")
    assert not d.desk.place.has_class("-opened")


@proof("sort")
async def _(d: Driver, key: str) -> None:
    await d.press("f4")
    first = d.highlighted
    await d.press(key, key, key, key)
    assert "by area" in d.text
    assert d.highlighted == first  # the roll at the first location is the largest as well
    await d.press("down")
    assert "R-102" in d.highlighted


@proof("find")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    await d.type(".0045")
    await d.press("enter")
    assert "60 × .0045 316" in d.highlighted


@proof("find_next")
async def _(d: Driver, key: str) -> None:
    await d.press("f")
    await d.type("316L")
    await d.press("enter")
    first = d.highlighted
    await d.press(key)
    assert "316L" in d.highlighted
    assert d.highlighted != first


@proof("columns")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    await d.type("mass rack")
    await d.press("enter")
    titles = [c.title for c in d.desk.place.table.columns if not c.fixed]
    assert titles == ["kg/m²", "m² here"]
    assert d.desk.memory.columns["match"] == ["mass", "rack"]


@proof("sums")
async def _(d: Driver, key: str) -> None:
    await d.press("down", "down", key)
    assert "w = p − d" in d.text
    assert "0.39 − 0.14 = 0.25" in d.text
    await d.press("escape")
    assert d.app.screen is d.desk


@proof("purpose")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert d.desk.memory.purposes == ["retain"]
    assert "for retain ·" in d.text


@proof("tolerance")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert d.desk.memory.tolerance == "1"
    assert "T ±2.5 µm" in d.text  # one per cent of 0.25 mm


@proof("alloy")
async def _(d: Driver, key: str) -> None:
    assert "not equivalent  0.25/0.16 1.4301" in d.text
    await d.press(key)
    assert "same            0.25/0.16 1.4301" in d.text


@proof("limit_open_area")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    await d.type("40")
    await d.press("enter")
    assert "open ≥ 40 %" in d.text
    assert "interchangeable" not in d.highlighted
    await d.press(key)
    await d.type("x")
    await d.press("enter")
    assert "the limit stays" in d.text


@proof("in_stock")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert d.desk.place.table.rows.total == 2
    assert "on the rack only" in d.text


@proof("view")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert "Taken as:" in d.text
    await d.press(key)
    assert "heat H101" in d.text
    await d.press(key)
    assert "section across the warp" in d.text


@proof("mark")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert d.desk.place.table.marked == {0}
    assert d.desk.place.table.cursor == 1
    await d.press("up", key)
    assert not d.desk.place.table.marked


@proof("compare")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert "Mark two to four" in d.text
    await d.press("space", "space", key)
    assert "62 × .0065 316L" in d.text
    assert "60 × .0065 316L" in d.text
    assert "asked" in d.text


@proof("plot")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert "mm aperture" in d.text
    await d.press("right", "right", "enter")
    assert not d.desk.place.has_class("-opened")


@proof("answer")
async def _(d: Driver, key: str) -> None:
    await d.press("slash")
    d.desk.place.line.value = "60"  # type: ignore[union-attr]
    await d.settle()
    assert "2 opens 0.25 mm" in d.text
    alive = d.desk.place.understanding.surviving  # type: ignore[attr-defined]
    assert len(alive) > 1
    await d.press("escape", key)
    assert d.desk.place.taken == 0  # type: ignore[attr-defined]
    assert len(d.desk.place.answer.targets) == 1  # type: ignore[attr-defined]
    await d.press(key)
    assert d.desk.place.taken is None  # type: ignore[attr-defined]


@proof("lots")
async def _(d: Driver, key: str) -> None:
    await d.press("down", key)
    assert d.desk.place_id == "stock"
    assert "lots of 60 × .0065 316L" in d.text
    assert d.desk.place.table.rows.total == 2


@proof("weave")
async def _(d: Driver, key: str) -> None:
    await d.press(key, key)
    assert "twilled" in d.text
    assert "No cloth lies inside all of these limits." in d.text
    assert "Without the limit on weave: 6" in d.text


@proof("family")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    await d.type("1.4301")
    await d.press("enter")
    assert d.desk.place.table.rows.total == 1
    assert "0.25/0.16 1.4301" in d.highlighted


@proof("stocked")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert d.desk.place.table.rows.total == 2


@proof("as_callout")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert d.desk.place_id == "match"
    assert "same" in d.highlighted
    assert "60 × .0075 316L" in d.highlighted


@proof("cloth_lots")
async def _(d: Driver, key: str) -> None:
    await d.press("down", key)
    assert d.desk.place_id == "stock"
    assert "lots of 62 × .0065 316L" in d.text


@proof("all_lots")
async def _(d: Driver, key: str) -> None:
    await d.press("f2", "L")
    assert d.desk.place.table.rows.total == 1
    await d.press(key)
    assert d.desk.place.table.rows.total == 3


@proof("lot_cloth")
async def _(d: Driver, key: str) -> None:
    await d.press(key)
    assert d.desk.place_id == "match"
    assert "62 × .0065 316L" in d.highlighted
    assert "same" in d.highlighted


@proof("next_table")
async def _(d: Driver, key: str) -> None:
    assert "[gauges]" in d.text
    await d.press(key)
    assert "[sieves]" in d.text
    assert "No. 60" in "".join(str(d.desk.place.table.rows.cells(r)) for r in range(99))
