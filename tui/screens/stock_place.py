"""Stock: the lots by location; a word narrows them; a cloth may be carried along from another place."""

from collections.abc import Mapping, Sequence
from typing import TYPE_CHECKING, Any

from textual.app import ComposeResult
from textual.widgets import Input

from tui.commands import STOCK
from tui.presenting import Line, Piece, fit, harmless, shortened, significant
from tui.screens.place import Place
from tui.widgets.box import Box
from tui.widgets.callout_input import LineInput
from tui.widgets.line_view import LineView
from tui.widgets.paged_table import Column, PagedTable

if TYPE_CHECKING:
    from catalog.cloth import Cloth
    from catalog.stock.lots import Lot

SORTS = ("location", "cloth", "width", "length", "area")


def lot_columns(units: str) -> tuple[Column, ...]:
    """The columns of the list of lots."""
    width, length = ("width in", "free ft") if units == "inch" else ("width mm", "free m")
    return (
        Column("location", "location", 10, "left", fixed=True, ink="strong"),
        Column("name", "cloth", 22, "left", fixed=True),
        Column("demo", "", 1, "left", fixed=True),
        Column("width", width, 8),
        Column("length", length, 8),
        Column("area", "m²", 6),
        Column("form", "form", 8, "left"),
        Column("held", "reserved", 8),
        Column("heat", "heat", 10, "left"),
        Column("cert", "cert", 4, "left"),
        Column("lot", "lot", 12, "left"),
    )


class LotRows:
    """Lots with their cloths as rows."""

    def __init__(self, lots: "Sequence[tuple[Lot, Cloth]]", units: str, columns: Sequence[Column]) -> None:
        self.lots, self._inch = lots, units == "inch"
        self._columns = columns
        self.total = len(lots)

    def cells(self, row: int) -> Sequence[str | Piece]:
        """A row's cells."""
        cells = self._all_cells(row)
        return [cells[column.key] for column in self._columns]

    def _all_cells(self, row: int) -> Mapping[str, str | Piece]:
        lot, cloth = self.lots[row]
        per_width, per_length = (25.4, 304.8) if self._inch else (1.0, 1000.0)
        width = lot.usable_width_mm / per_width
        return {
            "location": harmless(lot.location, 20),
            "name": shortened(harmless(cloth.name, 60), 22),
            "demo": ("D", "warn") if lot.demo else "",
            "width": f"{width:.1f}" if self._inch else f"{width:.0f}",
            "length": f"{lot.free_length_mm / per_length:.2f}",
            "area": significant(lot.available_m2, 3),
            "form": harmless(lot.form, 10),
            "held": f"{lot.reserved_mm / per_length:.2f}" if lot.reserved_mm else "",
            "heat": harmless(lot.heat or "–", 20),
            "cert": harmless(lot.certificate or "–", 6),
            "lot": harmless(lot.id, 20),
        }


class StockPlace(Place):
    """What lies where."""

    where = STOCK
    title = "Stock"

    def __init__(self, *, id: str) -> None:  # noqa: A002
        super().__init__(id=id)
        self.lots: Sequence[tuple[Lot, Cloth]] | None = None
        self.only: Cloth | None = None
        self.sort = "location"

    def awaits(self) -> bool:
        """True while an answer for the list is on its way."""
        return self.desk.door.awaits("all lots")

    def compose(self) -> ComposeResult:
        """The line for words, what is shown, the list."""
        with Box(classes="typing"):
            yield LineView(lambda width: [((" Words   ", "key"),)], classes="typing-label")
            yield LineInput(id="words", placeholder="part of a location, cloth, heat number, form or lot")
        yield LineView(self._status_line, id="status", classes="status")
        yield PagedTable(id="lots", sign=self.spelled("›"))

    def on_mount(self) -> None:
        """Ask, where the store is open already."""
        self.say_in_list(("Opening the store…", "muted"))
        if self.desk.door.is_open:
            self.store_opened()

    def store_opened(self) -> None:
        """Ask for the lots."""
        self.desk.door.ask("all lots", _all_lots, self._got, self._failed)

    def arrive(self, carried: object = None) -> None:
        """A cloth that is carried along narrows the list to its lots; what was received meanwhile shows."""
        if carried is not None and hasattr(carried, "construction"):
            self.only = carried  # type: ignore[assignment]
            self.query_one("#words", LineInput).value = ""
        if self.desk.door.is_open:
            self.store_opened()
        self.settle()

    def _got(self, lots: "Sequence[tuple[Lot, Cloth]]") -> None:
        self.lots = lots
        self._list()

    def _failed(self, sentence: str) -> None:
        self.say_in_list((f"! {sentence}", "bad"), ("Press F7 to ask again.", "muted"))

    def on_input_changed(self, event: Input.Changed) -> None:
        """Narrow the list."""
        event.stop()
        self._list()

    def _list(self) -> None:
        if self.lots is None:
            return
        shown = self._sorted(self._passing(self.lots))
        self.table.sorted_by = {"cloth": "name"}.get(self.sort, self.sort)
        if shown:
            columns = self.chosen(lot_columns(self.desk.units))
            self.table.show(columns, LotRows(shown, self.desk.units, columns), self.table.cursor)
        elif not self.lots:
            self.say_in_list(
                ("Nothing lies on the rack in this store.", "risk"),
                ("Lots show here as soon as the store holds any.", "muted"),
            )
        elif self.only is not None and not self.query_one("#words", LineInput).value:
            self.say_in_list(
                (f"Nothing of {self.only.name} lies on the rack.", "risk"),
                ("x shows every lot; Esc goes back.", "muted"),
            )
        else:
            self.say_in_list(
                ("No lot holds these words.", "risk"), ("Change the line above, or x for every lot.", "muted")
            )
        self.query_one("#status", LineView).show(self._status_line)

    def _passing(self, lots: "Sequence[tuple[Lot, Cloth]]") -> "list[tuple[Lot, Cloth]]":
        words = self.query_one("#words", LineInput).value.casefold().split()
        only = self.only.id if self.only else None
        return [
            (lot, cloth)
            for lot, cloth in lots
            if (only is None or cloth.id == only) and all(word in _searched(lot, cloth) for word in words)
        ]

    def _sorted(self, lots: "list[tuple[Lot, Cloth]]") -> "list[tuple[Lot, Cloth]]":
        keys: dict[str, Any] = {
            "location": lambda pair: (pair[0].location, pair[0].id),
            "cloth": lambda pair: (pair[1].name, pair[0].location, pair[0].id),
            "width": lambda pair: (-pair[0].usable_width_mm, pair[0].id),
            "length": lambda pair: (-pair[0].free_length_mm, pair[0].id),
            "area": lambda pair: (-pair[0].available_m2, pair[0].id),
        }
        return sorted(lots, key=keys[self.sort])

    def look_changed(self) -> None:
        """Other units."""
        self._list()

    def _status_line(self, width: int) -> Sequence[Line]:
        shown = self.table.rows.total if self.is_mounted else 0
        what = f"lots of {harmless(self.only.name, 40)}" if self.only else "all lots"
        rows = self.table.rows if self.is_mounted else None
        area = sum(lot.available_m2 for lot, _ in rows.lots) if isinstance(rows, LotRows) else 0.0
        right = f"{shown} of {len(self.lots)} lots, {significant(area, 3)} m² free " if self.lots else ""
        left = fit(self.spelled(f" {what} · by {self.sort}"), max(0, width - len(right) - 1))
        return self.spelled_lines([((left + " ", "muted"), (right, "muted"))])

    @property
    def cloth(self) -> "Cloth | None":
        """The cloth of the highlighted lot."""
        rows = self.table.rows
        return rows.lots[self.table.cursor][1] if isinstance(rows, LotRows) and rows.total else None

    def action_sort(self) -> None:
        """The next order."""
        self.sort = SORTS[(SORTS.index(self.sort) + 1) % len(SORTS)]
        self._list()

    def action_all_lots(self) -> None:
        """Every lot again."""
        self.only = None
        self.query_one("#words", LineInput).value = ""
        self._list()

    async def action_lot_cloth(self) -> None:
        """Match the cloth of the highlighted lot."""
        if self.cloth is not None:
            from tui.screens.catalogue_place import callout_of

            await self.desk.go("match", callout_of(self.cloth))

    def action_open(self) -> None:
        """A lot has nothing more to show than its row: its columns move instead."""
        self.action_columns_right()

    def copied(self) -> str:
        """The highlighted lot."""
        cells = self.table.rows.cells(self.table.cursor) if self.table.rows.total else None
        if cells is None:
            return ""
        return "  ".join(self.spelled(c if isinstance(c, str) else c[0]) for c in cells if c)


def _searched(lot: "Lot", cloth: "Cloth") -> str:
    words = (lot.location, lot.id, lot.form, lot.heat or "", lot.certificate or "", cloth.name, cloth.id)
    return " ".join(words).casefold()


def _all_lots(store: Any) -> "list[tuple[Lot, Cloth]]":
    """Every lot with its cloth, by way of the cloths that have any."""
    from catalog.search.reader import Filters

    cloths = {cloth.id: cloth for cloth in store.select(Filters(in_stock=True), "id")}
    found = store.lots(cloths)
    return [(lot, cloths[cloth_id]) for cloth_id, lots in found.items() for lot in lots]
