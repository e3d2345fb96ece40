"""The match place: what a person types and sees, in good times and bad."""

import threading
from dataclasses import replace
from pathlib import Path

import pytest
from piloting import browser
from small_catalogue import ASKED, CLOTHS, LOTS, SmallStore
from textual import events
from textual.widgets import Input

from catalog.errors import StoreError
from catalog.search.list_reader import ListReader


async def test_the_dairys_callout_gets_its_six_verdicts() -> None:
    # worked by hand, T = 12.5 µm: see the verdicts' lines in the judgement tests
    async with browser(size=(80, 30)) as d:
        await d.press("p")  # for retain
        rows = {}
        for row in range(6):
            cells = d.desk.place.table.rows.cells(row) or ()
            rows[str(cells[1])] = cells[0][0]
        assert rows["62 × .0065 316L"] == "≈ interchangeable"
        assert rows["60 × .0065 316L"] == "≈ interchangeable"
        assert rows["0.25/0.14 1.4404"] == "+ near, safe side"
        assert rows["60 × .0075 316L"] == "+ near, safe side"
        assert rows["60 × .0045 316"] == "× not equivalent"
        assert rows["0.25/0.16 1.4301"] == "× not equivalent"


async def test_both_units_stand_side_by_side() -> None:
    async with browser() as d:
        assert "0.25 mm (.00984 in)" in d.text
        assert "0.2446   .00963" in d.text


async def test_letters_that_are_typed_are_text_and_not_commands() -> None:
    async with browser(callout="") as d:
        assert isinstance(d.app.focused, Input)
        await d.type("ptalsvqujk")
        assert d.desk.place.line.value == "ptalsvqujk"  # type: ignore[union-attr]
        assert d.desk.memory.purposes == []
        assert d.app.return_code is None


async def test_arrows_move_in_the_list_while_typing() -> None:
    async with browser() as d:
        await d.press("slash", "down")
        assert isinstance(d.app.focused, Input)
        assert d.desk.place.table.cursor == 1


async def test_the_reading_follows_as_one_types() -> None:
    async with browser(callout="") as d:
        assert "Type what the drawing says" in d.text
        await d.type(ASKED)
        assert "aperture 0,25" in d.text
        assert "wire 0,16" in d.text
        assert "alloy 1.4404" in d.text
        assert "weave plain" in d.text
        assert "62 × .0065 316L" in d.text


async def test_what_is_not_understood_has_a_caret_under_it() -> None:
    async with browser(callout="0,25/0,16 zzyx") as d:
        line = d.lines[1]
        caret = d.lines[2]
        assert caret.index("^") == line.index("zzyx")


async def test_what_is_typed_stays_where_the_store_fails_and_comes_through_when_it_opens() -> None:
    tries = []

    def opener() -> SmallStore:
        tries.append(1)
        if len(tries) == 1:
            raise StoreError("The file here.sqlite3 is not a database.")
        return SmallStore()

    async with browser(opener=opener) as d:
        assert "! The file here.sqlite3 is not a database." in d.text
        assert "Press F7 to try again" in d.text
        assert ASKED in d.text
        assert "aperture 0.25 mm" in d.text  # the reading needs no store
        await d.press("f5")
        assert "[gauges]" in d.text  # nor do the tables
        await d.press("f2", "f7")
        await d.until(lambda: d.desk.door.is_open)
        await d.settle()
        assert "62 × .0065 316L" in d.text


async def test_leaving_with_a_store_that_never_opened_says_so_in_the_status() -> None:
    def opener() -> SmallStore:
        raise StoreError("The store is locked.")

    async with browser(opener=opener) as d:
        await d.press("q")
        await d.until(lambda: d.app.return_code is not None)
        assert d.app.return_code == 3


async def test_a_store_that_vanishes_gives_a_sentence_and_a_way_on() -> None:
    class Vanishing(SmallStore):
        is_gone = False

        def nearest(self, *rest: object) -> object:  # type: ignore[override]
            if self.is_gone:
                raise StoreError("The store has gone: its file can't be read.")
            return super().nearest(*rest)  # type: ignore[arg-type]

    store = Vanishing()
    async with browser(opener=lambda: store) as d:
        store.is_gone = True
        await d.press("t")
        assert "! The store has gone" in d.text
        store.is_gone = False
        await d.press("r")
        assert "62 × .0065 316L" in d.text


async def test_the_first_frame_is_there_before_the_store_opens() -> None:
    gate = threading.Event()

    def opener() -> SmallStore:
        gate.wait(20)
        return SmallStore()

    from tui.app import CrossclothApp

    app = CrossclothApp(opener)
    app.memory.callout = ASKED
    async with app.run_test(size=(80, 24)) as pilot:
        await pilot.pause()
        shown = "\n".join(s.text for s in app.screen._compositor.render_strips())
        assert "Opening the store" in shown
        assert "aperture 0.25 mm" in shown
        gate.set()


async def test_an_older_answer_that_comes_late_is_dropped() -> None:
    async with browser() as d:
        place, door = d.desk.place, d.desk.door
        seen: list[str] = []
        gate = threading.Event()
        door.ask("x", lambda store: gate.wait(10) and "older", seen.append, seen.append)
        door.ask("x", lambda store: "newer", seen.append, seen.append)
        gate.set()
        await d.settle()
        assert seen == ["newer"]
        assert place.table.rows.total == 6


async def test_keys_sent_back_to_back_leave_the_detail_on_the_highlighted_row() -> None:
    async with browser() as d:
        for _ in range(5):
            d.app.post_message(events.Key("down", None))
        d.app.post_message(events.Key("up", None))
        d.app.post_message(events.Key("v", "v"))
        await d.settle()
        await d.until(lambda: d.desk.place.table.cursor == 4)
        await d.settle()
        shown = d.desk.place.candidate.cloth.name  # type: ignore[attr-defined]
        assert shown in d.desk.place.detail.text  # type: ignore[attr-defined]


async def test_nothing_in_the_data_can_steer_the_screen() -> None:
    nasty = ("[s]struck[/s] [/x]", "\x1b[31mred\x1b]0;t\x07", "a\u202etxt.exe", "金網" * 30, "y" * 10_000)
    cloths = [replace(c, name=name) for c, name in zip(CLOTHS, nasty, strict=False)]
    store = SmallStore()
    ListReader.__init__(store, cloths, LOTS)
    async with browser(opener=lambda: store) as d:
        for place in ("f2", "f3", "f4"):
            await d.press(place)
            assert "\x1b" not in d.text
            assert "\u202e" not in d.text
            await d.press("end", "home")
        await d.press("f2")
        assert "[s]struck[/s]" in d.text


async def test_nothing_within_limits_says_what_to_loosen() -> None:
    class Empty(SmallStore):
        def __init__(self) -> None:
            ListReader.__init__(self, ())

    async with browser(opener=Empty) as d:
        assert "Nothing lies within the limits." in d.text
        assert "any alloy" in d.text


async def test_what_was_typed_comes_back_at_the_next_start(tmp_path: Path) -> None:
    async with browser(directory=tmp_path) as d:
        await d.press("p", "u", "f4")
    async with browser(callout="", directory=tmp_path) as d:
        assert d.desk.place_id == "stock"
        await d.press("f2")
        assert d.desk.place.line.value == ASKED  # type: ignore[union-attr]
        assert d.desk.memory.purposes == ["retain"]
        assert d.desk.units == "inch"


async def test_a_spoilt_memory_is_no_memory(tmp_path: Path) -> None:
    (tmp_path / "browser.json").write_text('{"callout": 5, "place": ["x"], "units": null')
    async with browser(directory=tmp_path) as d:
        assert d.desk.place_id == "match"


async def test_keys_can_be_changed() -> None:
    async with browser(keys={"purpose": "Y,f7"}) as d:
        await d.press("p")
        assert d.desk.memory.purposes == []
        await d.press("f7")
        assert d.desk.memory.purposes == ["retain"]
        await d.press("question_mark")
        assert "Y or F7" in d.text


async def test_ascii_means_ascii_on_every_screen() -> None:
    async with browser(ascii_only=True) as d:
        for key in ("v", "v", "v", "enter", "escape", "g", "escape", "f1", "escape", "f9", "escape", "f3", "f4", "f5"):
            await d.press(key)
            assert d.text.isascii(), (key, [c for c in d.text if not c.isascii()])


async def test_without_colour_there_is_none(monkeypatch: pytest.MonkeyPatch) -> None:
    monkeypatch.setenv("NO_COLOR", "1")
    async with browser() as d:
        strips = d.app.screen._compositor.render_strips()
        styles = [segment.style for strip in strips for segment in strip if segment.style]
        assert all(style.color is None and style.bgcolor is None for style in styles)
        cursor = next(strip for strip in strips if strip.text.startswith("›"))
        assert any(segment.style and segment.style.reverse for segment in cursor)


async def test_demo_data_is_marked_as_such() -> None:
    async with browser() as d:
        assert "demo data" in d.lines[0]
        assert " D " in next(line for line in d.lines if "62 × .0065" in line)
        for place in ("f3", "f4"):
            await d.press(place)
            assert " D " in next(line for line in d.lines if line.startswith("›"))


async def test_a_wide_screen_shows_everything_at_once() -> None:
    async with browser(size=(140, 40)) as d:
        for words in ("asked", "why", "on the rack", "section across the warp"):
            assert words in d.text


async def test_the_screen_follows_a_smaller_window() -> None:
    async with browser(size=(140, 40)) as d:
        await d.pilot.resize_terminal(60, 20)
        await d.settle()
        assert max(map(len, d.lines)) <= 60
        assert "62 × .0065 316L" in d.text


async def test_a_caution_is_said_where_the_callout_names_the_use() -> None:
    async with browser(callout=f"{ASKED} dairy") as d:
        assert "! Food or pharmaceutical contact" in d.text


async def test_an_answer_to_a_question_that_was_withdrawn_is_dropped() -> None:
    gate = threading.Event()

    class Slow(SmallStore):
        def nearest(self, *rest: object) -> object:  # type: ignore[override]
            gate.wait(10)
            return super().nearest(*rest)  # type: ignore[arg-type]

    async with browser(callout="", opener=Slow) as d:
        d.desk.place.line.value = ASKED  # type: ignore[union-attr]
        await d.pilot.pause()
        d.desk.place.line.value = "zzyx"  # type: ignore[union-attr]
        await d.pilot.pause()
        gate.set()
        await d.settle()
        await d.pilot.pause(0.05)
        assert "Nothing can be matched yet." in d.text
        assert d.desk.place.table.rows.total == 0


async def test_several_readings_are_answered_with_one_key() -> None:
    async with browser(callout="60") as d:
        assert "1 60 per in" in d.text
        assert "2 opens 0.25 mm" in d.text
        await d.press("2")
        assert ">2 opens 0.25 mm" in d.text
        first = d.desk.place.table.rows.cells(0) or ()
        assert first[0] == ("= same", "good")
        assert first[1] == "0.25/0.16 1.4301"  # opening and wire of sieve No. 60, ISO 3310-1 and ASTM E11
