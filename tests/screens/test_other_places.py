"""Catalogue, stock and tables; and the ways between them."""

from piloting import browser
from small_catalogue import SmallStore
from textual.widgets import Input

from catalog.search.list_reader import ListReader


async def test_the_catalogue_is_ordered_by_aperture_and_says_how_many() -> None:
    async with browser() as d:
        await d.press("f3")
        names = [str((d.desk.place.table.rows.cells(r) or ())[0]) for r in range(6)]
        # apertures by hand: 0.2328, 0.2446, 0.25, 0.25, 0.2582, 0.3090 mm; ties by id
        assert names == [
            "60 × .0075 316L",
            "62 × .0065 316L",
            "0.25/0.14 1.4404",
            "0.25/0.16 1.4301",
            "60 × .0065 316L",
            "60 × .0045 316",
        ]
        assert "1 of 6" in d.text


async def test_limits_in_words_narrow_the_catalogue() -> None:
    async with browser() as d:
        await d.press("f3", "slash")
        d.desk.place.line.value = "open area >= 40 %"  # type: ignore[union-attr]
        await d.settle()
        assert d.desk.place.table.rows.total == 2  # 41.1 and 53.3 % by hand
        assert "open area at least 40 %" in d.text


async def test_a_cloth_without_stock_says_so_and_shows_the_way_back() -> None:
    async with browser() as d:
        await d.press("f", *"light", "escape")
        await d.press("down", "down", "L")
        assert d.desk.place_id == "stock"
        assert "lies on the rack" in d.text
        await d.press("escape")
        assert d.desk.place_id == "match"
        assert d.desk.place.table.cursor == 2


async def test_stock_is_listed_by_location_with_the_usable_width() -> None:
    async with browser() as d:
        await d.press("f4")
        cells = d.desk.place.table.rows.cells(0) or ()
        assert cells[0] == "A-01-2"
        assert "1190" in cells  # 1220 mm less 15 mm of selvedge on each side
        assert "3 of 3 lots" in d.text


async def test_words_find_a_lot_by_its_heat() -> None:
    async with browser() as d:
        await d.press("f4", "slash")
        await d.type("H103")
        await d.press("enter")
        assert d.desk.place.table.rows.total == 1
        assert "B-07-3" in d.highlighted


async def test_words_that_no_lot_holds_say_what_to_do() -> None:
    async with browser() as d:
        await d.press("f4", "slash")
        await d.type("nowhere")
        assert "No lot holds these words." in d.text


async def test_an_empty_store_is_said_to_hold_nothing() -> None:
    class Empty(SmallStore):
        def __init__(self) -> None:
            ListReader.__init__(self, ())

    async with browser(opener=Empty) as d:
        await d.press("f3")
        assert "No cloth lies inside all of these limits." in d.text
        await d.press("f4")
        assert "Nothing lies on the rack" in d.text


async def test_a_gauge_is_looked_up_in_every_system() -> None:
    async with browser() as d:
        await d.press("f5", "slash")
        await d.type("swg 28")
        await d.press("enter")
        # British standard wire gauge 28 is .0148 in by law (Order in Council 1883)
        rows = [d.desk.place.table.rows.cells(r) or () for r in range(d.desk.place.table.rows.total)]
        assert any(row[0] == "SWG" and row[1] == "28" and "0.0148" in row for row in rows)


async def test_inch_and_metric_cloth_of_one_opening_are_set_against_each_other() -> None:
    async with browser() as d:
        await d.press("f5", "t", "t", "t", "t")
        assert "[equivalents]" in d.text
        assert "computed from this store" in d.text
        await d.press("t")
        assert "[lookalikes]" in d.text


async def test_back_returns_to_where_one_was() -> None:
    async with browser() as d:
        await d.press("down", "f3", "down", "f4", "escape")
        assert d.desk.place_id == "catalogue"
        assert d.desk.place.table.cursor == 1
        await d.press("escape")
        assert d.desk.place_id == "match"
        assert d.desk.place.table.cursor == 1


async def test_function_keys_change_the_place_while_typing() -> None:
    async with browser() as d:
        await d.press("slash")
        assert isinstance(d.app.focused, Input)
        await d.press("f4")
        assert d.desk.place_id == "stock"
