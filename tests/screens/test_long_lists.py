"""Long lists: only what is on the screen is drawn and only the pages that are looked at are read."""

from collections.abc import Sequence
from dataclasses import replace

from piloting import browser
from small_catalogue import CLOTHS, SmallStore
from textual.app import App, ComposeResult

from catalog.cloth import Cloth
from catalog.search.reader import Filters
from tui.widgets.paged_table import Column, PagedTable

MILLION = 1_000_000
COLUMNS = (Column("n", "number", 9, fixed=True), Column("sq", "square", 14))


class Squares:
    """A million rows that count how often they are asked."""

    total = MILLION

    def __init__(self) -> None:
        self.asked: set[int] = set()

    def cells(self, row: int) -> Sequence[str]:
        self.asked.add(row)
        return (str(row), str(row * row))


class Listing(App[None]):
    CSS = "PagedTable { scrollbar-size: 0 0; overflow: hidden auto; }"

    def __init__(self) -> None:
        super().__init__()
        self.rows = Squares()

    def compose(self) -> ComposeResult:
        yield PagedTable(id="list")

    def on_mount(self) -> None:
        self.query_one(PagedTable).show(COLUMNS, self.rows)


async def test_of_a_million_rows_only_the_screen_is_drawn() -> None:
    app = Listing()
    async with app.run_test(size=(80, 24)) as pilot:
        await pilot.pause()
        assert len(app.rows.asked) <= 48
        table = app.query_one(PagedTable)
        table.move_to(MILLION - 1)
        await pilot.pause()
        assert table.cursor == MILLION - 1
        assert len(app.rows.asked) <= 96
        shown = "\n".join(s.text for s in app.screen._compositor.render_strips())
        assert "999998000001" in shown  # 999 999 squared


async def test_a_cursor_that_moves_by_one_redraws_two_rows() -> None:
    app = Listing()
    async with app.run_test(size=(80, 24)) as pilot:
        await pilot.pause()
        app.rows.asked.clear()
        app.query_one(PagedTable).move(1)
        await pilot.pause()
        assert app.rows.asked <= {0, 1}


async def test_the_highlighted_row_has_a_sign_as_well_as_a_colour() -> None:
    async with browser() as d:
        await d.press("down")
        marked = [line for line in d.lines if line.startswith("›")]
        assert len(marked) == 1
        assert "60 × .0065 316L" in marked[0]


class Paged(SmallStore):
    """A store of many cloths that keeps account of the pages it was asked for."""

    def __init__(self) -> None:
        super().__init__()
        self.pages: list[int] = []

    def count(self, filters: Filters) -> int:
        return 200_000

    def page(self, filters: Filters, sort: str, offset: int, limit: int) -> Sequence[Cloth]:
        self.pages.append(offset)
        return [replace(CLOTHS[0], id=f"c{n}", name=f"cloth {n}") for n in range(offset, offset + limit)]


async def test_the_catalogue_reads_only_the_pages_that_are_looked_at() -> None:
    store = Paged()
    async with browser(opener=lambda: store) as d:
        await d.press("f3")
        assert "1 of 200 000" in d.text
        assert "cloth 0" in d.highlighted
        await d.press("end")
        assert "cloth 199999" in d.highlighted
        assert "200 000 of 200 000" in d.text
        assert len(store.pages) <= 4
