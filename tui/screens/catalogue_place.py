"""Catalogue: every cloth by its figures; limits typed in words narrow the list."""

from collections.abc import Mapping, Sequence
from typing import TYPE_CHECKING, Any

from textual.app import ComposeResult
from textual.widgets import Input

from tui.commands import CATALOGUE
from tui.presenting import Line, fit, harmless, phrases, plain
from tui.screens.place import Place
from tui.screens.store_pages import StorePages
from tui.widgets.box import Box
from tui.widgets.callout_input import LineInput
from tui.widgets.inks import text_of
from tui.widgets.line_view import LineView
from tui.widgets.paged_table import PagedTable

if TYPE_CHECKING:
    from catalog.callout.reading import Reading, Understanding
    from catalog.cloth import Cloth
    from catalog.search.limit_report import LimitReport
    from catalog.search.reader import Filters, Range
    from catalog.stock.lots import Lot

SORTS: Mapping[str, str] = {
    "aperture": "apert-mm", "wire": "wire-mm", "open-area": "open", "mass": "mass", "id": "id",
}  # fmt: skip
HINT = "limits in words:  aperture <= 0.8 mm, open area >= 45 %, wire >= 0.35 mm, 304"


class CataloguePlace(Place):
    """All cloths, or those inside limits."""

    where = CATALOGUE
    title = "Catalogue"

    def __init__(self, *, id: str) -> None:  # noqa: A002
        super().__init__(id=id)
        self.understanding: Understanding | None = None
        self.weave: str | None = None
        self.alloy: str | None = None
        self.stocked = False
        self.total: int | None = None
        self.lots: dict[str, Sequence[Lot]] = {}

    def awaits(self) -> bool:
        """True while an answer for the list is on its way."""
        return self.desk.door.awaits("count", "page 0", "page 1")

    def compose(self) -> ComposeResult:
        """The line for limits, what is shown, the list, the highlighted cloth."""
        with Box(classes="typing"):
            yield LineView(lambda width: [((" Limits  ", "key"),)], classes="typing-label")
            yield LineInput(id="limits", placeholder=HINT)
        yield LineView(self._status_line, id="status", classes="status")
        with Box(id="lower"):
            yield PagedTable(id="candidates", sign=self.spelled("›"))
            yield LineView(self._detail_lines, id="detail", has_band=True)

    def on_mount(self) -> None:
        """Ask, where the store is open already."""
        self.say_in_list(("Opening the store…", "muted"))
        if self.desk.door.is_open:
            self._count()

    def store_opened(self) -> None:
        """Ask for the list."""
        self._count()

    @property
    def sort(self) -> str:
        """What the list is ordered by."""
        return self.desk.memory.sort if self.desk.memory.sort in SORTS else "aperture"

    @property
    def cloth(self) -> "Cloth | None":
        """The highlighted cloth, once its page is there."""
        rows = self.table.rows
        return rows.cloth(self.table.cursor) if isinstance(rows, StorePages) and rows.total else None

    @property
    def reading(self) -> "Reading | None":
        """How the typed limits were read."""
        alive = self.understanding.surviving if self.understanding else ()
        return alive[0] if alive else None

    def limits(self) -> "dict[str, Range]":
        """The typed limits that figures of the catalogue can be held against."""
        from catalog.search.limit_report import FIGURES

        return {key: b for key, b in self.reading.limits.items() if key in FIGURES} if self.reading else {}

    def scope(self) -> "Filters":
        """Weave, alloy and stock."""
        from catalog.construction import Weave
        from catalog.search.reader import Filters

        reading = self.reading
        weave = self.weave or (reading.weave.value if reading and reading.weave else None)
        alloy = self.alloy or (reading.alloy if reading else None)
        return Filters(
            alloys=frozenset({alloy} if alloy else ()),
            weaves=frozenset({Weave(weave)} if weave else ()),
            in_stock=self.stocked,
        )

    def filters(self) -> "Filters":
        """All of it, as the store understands it."""
        from catalog.search.limit_report import filters_of

        return filters_of(self.limits(), self.scope())

    def on_input_changed(self, event: Input.Changed) -> None:
        """Read the limits again."""
        event.stop()
        from catalog import callout

        text = harmless(event.value, 4000)
        self.understanding = callout.read(text) if text.strip() else None
        self._count()

    def _count(self) -> None:
        filters = self.filters()
        self.desk.door.ask("count", lambda store: store.count(filters), self._counted, self._failed)

    def _counted(self, total: int) -> None:
        from tui.widgets.cloth_lines import cloth_cells, cloth_columns

        self.total = total
        columns = self.chosen(cloth_columns(self.desk.units))
        if not total:
            self._explain_nothing()
        else:
            rows = StorePages(
                self.desk.door,
                self.filters(),
                self.sort,
                total,
                lambda cloth: cloth_cells(cloth, columns),
                self._arrived,
                self._failed,
            )
            self.table.sorted_by = SORTS[self.sort]
            self.table.show(columns, rows)
        self._redraw()

    def _explain_nothing(self) -> None:
        """Say what each limit removed and what falls just short."""
        limits, scope, units = self.limits(), self.scope(), self.desk.units
        way_on = ("Widen one: e and a show every weave and alloy, s shows more than the rack.", "muted")
        self.say_in_list(("No cloth lies inside all of these limits.", "risk"), way_on)

        def work(store: Any) -> "LimitReport":
            from catalog.search.limit_report import limit_report

            return limit_report(limits, scope, store)

        def got(report: "LimitReport") -> None:
            from tui.widgets.limit_lines import limit_lines

            if not self.total:
                self.say_in_list(*limit_lines(report, units), way_on)

        self.desk.door.ask("limits", work, got, self._failed)

    def _arrived(self) -> None:
        self.table.forget()
        self._about_cloth()

    def _failed(self, sentence: str) -> None:
        self.say_in_list((f"! {sentence}", "bad"), ("Press F7 to ask again.", "muted"))
        self._redraw()

    def _redraw(self) -> None:
        self.query_one("#status", LineView).show(self._status_line)
        self.query_one("#detail", LineView).show(self._detail_lines)

    def on_paged_table_moved(self, event: PagedTable.Moved) -> None:
        """The detail is about the highlighted cloth."""
        event.stop()
        self._about_cloth()

    def on_paged_table_chosen(self, event: PagedTable.Chosen) -> None:
        """The cloth gets the whole place."""
        event.stop()
        self.open_up()
        self._redraw()

    def leave_inner(self) -> bool:
        """Back to the list."""
        if not self.is_opened:
            return False
        self.close_up()
        self._redraw()
        return True

    def _about_cloth(self) -> None:
        cloth = self.cloth
        self.query_one("#detail", LineView).show(self._detail_lines)
        self.query_one("#status", LineView).show(self._status_line)
        if cloth is None or cloth.id in self.lots:
            return
        cloth_id = cloth.id

        def got(found: Mapping[str, Sequence["Lot"]]) -> None:
            if len(self.lots) > 500:
                self.lots.clear()
            self.lots[cloth_id] = found.get(cloth_id, ())
            self.query_one("#detail", LineView).show(self._detail_lines)

        self.desk.door.ask("lots", lambda store: store.lots([cloth_id]), got, self.desk.say)

    def look_changed(self) -> None:
        """Other columns."""
        cursor = self.table.cursor
        if self.total:
            self._counted(self.total)
            self.table.move_to(cursor)
        self._redraw()

    def _status_line(self, width: int) -> Sequence[Line]:
        filters = self.filters() if self.is_mounted else None
        said = [f"by {self.sort.replace('-', ' ')}"]
        if filters:
            said.append(" ".join(w.words for w in filters.weaves) or "all weaves")
            said.append(" ".join(sorted(harmless(a) for a in filters.alloys)) or "all alloys")
        if self.stocked:
            said.append("on the rack only")
        said += self._limits_said()
        right = f"{self.table.cursor + 1:,} of {self.total:,} ".replace(",", " ") if self.total else ""
        parts = phrases([self.spelled(x) for x in said], self.spelled(" · "), width - len(right) - 2)
        first = fit(f" {parts[0]}", max(0, width - len(right) - 1)) + right
        return self.spelled_lines([((first + " ", "muted"),), *(((f" {part}", "muted"),) for part in parts[1:2])])

    def _limits_said(self) -> list[str]:
        from tui.widgets.reading_lines import limit_words

        understanding = self.understanding
        if understanding is None:
            return []
        if not understanding.surviving:
            problem = understanding.problems[0].message if understanding.problems else "not understood"
            return [f"! {harmless(problem)}"]
        limits, used = understanding.surviving[0].limits, self.limits()
        left_out = [key for key in limits if key not in used]
        words = limit_words(used, self.desk.units)
        if left_out:
            words.append("! not used here: " + ", ".join(left_out))
        if not limits and understanding.surviving[0].warp.wire is not None:
            words.append("! a callout: F2 matches it")
        return words

    def _detail_lines(self, width: int) -> Sequence[Line]:
        from tui.widgets.cloth_lines import FIGURES_WIDTH, cloth_heading, figure_lines, lot_lines, sheet_lines
        from tui.widgets.detail_lines import beside

        cloth = self.cloth if self.is_mounted else None
        if cloth is None:
            return []
        lots, units = self.lots.get(cloth.id), self.desk.units
        height = self.query_one("#detail").size.height
        if self.is_opened or self.screen.has_class("-wide"):
            return self.spelled_lines(sheet_lines(cloth, lots, width, height, units, self.desk.ascii_only))
        if width < 76:
            return self.spelled_lines(figure_lines(cloth, units, width))
        left = figure_lines(cloth, units, FIGURES_WIDTH)
        right = lot_lines(lots or (), width - FIGURES_WIDTH - 2, units)
        return self.spelled_lines([cloth_heading(cloth), *beside(left, right, FIGURES_WIDTH)])

    def _narrow(self) -> None:
        self._count()
        self.query_one("#status", LineView).show(self._status_line)

    def action_sort(self) -> None:
        """The next order."""
        names = list(SORTS)
        self.desk.memory.sort = names[(names.index(self.sort) + 1) % len(names)]
        self._narrow()

    def action_weave(self) -> None:
        """The next weave, or all."""
        from catalog.construction import Weave

        names: list[str | None] = [None, *(w.value for w in Weave)]
        self.weave = names[(names.index(self.weave) + 1) % len(names)]
        self._narrow()

    def action_family(self) -> None:
        """One alloy by any of its names, or all."""
        self.desk.ask_line("Alloy by any of its names (empty: all)", self.alloy or "", self._take_alloy)

    def _take_alloy(self, name: str) -> None:
        from catalog.reference import alloys

        known = alloys.find(name) if name.strip() else None
        if name.strip() and known is None:
            self.desk.say(f"No alloy is called {name!r}: F6 lists them.")
            return
        self.alloy = known.id if known else None
        self._narrow()

    def action_stocked(self) -> None:
        """Only what lies on the rack, or all."""
        self.stocked = not self.stocked
        self._narrow()

    async def action_as_callout(self) -> None:
        """Match the highlighted cloth."""
        if self.cloth is not None:
            await self.desk.go("match", callout_of(self.cloth))

    async def action_cloth_lots(self) -> None:
        """To the lots of the highlighted cloth."""
        if self.cloth is not None:
            await self.desk.go("stock", self.cloth)

    def arrive(self, carried: object = None) -> None:
        """A cloth may be carried along: it is highlighted where the list holds it."""
        self.settle()

    def copied(self) -> str:
        """The highlighted cloth in words."""
        from tui.widgets.cloth_lines import figure_lines

        if self.cloth is None:
            return ""
        text = f"{harmless(self.cloth.name)}\n{text_of(figure_lines(self.cloth, self.desk.units, 100))}"
        return plain(text) if self.desk.ascii_only else text

    def action_row_down(self) -> None:
        """Next row, or further down in what is open."""
        self._scroll(1) if self.is_opened else super().action_row_down()

    def action_row_up(self) -> None:
        """Row before, or further up in what is open."""
        self._scroll(-1) if self.is_opened else super().action_row_up()

    def _scroll(self, rows: int) -> None:
        view: Any = self.query_one("#detail", LineView)
        view.scroll_to(y=view.scroll_offset.y + rows, animate=False)


def callout_of(cloth: "Cloth") -> str:
    """A cloth as one would type it, in the units that it is sold in."""
    from catalog.callout import writing

    made = cloth.construction
    return writing.compact_inch(made) if cloth.unit_system == "inch" else writing.compact_metric(made)
