"""Tables: gauges, sieves, alloys, safety distances, each with its source."""

from collections.abc import Sequence
from typing import TYPE_CHECKING, Any

from textual.app import ComposeResult
from textual.widgets import Input

from tui.commands import TABLES
from tui.presenting import Line, Piece, fit, harmless, inch, significant, width_of
from tui.screens.place import Place
from tui.widgets.box import Box
from tui.widgets.callout_input import LineInput
from tui.widgets.line_view import LineView
from tui.widgets.paged_table import Column, PagedTable

if TYPE_CHECKING:
    from catalog.report.tables import Row, Table

NAMES = ("gauges", "sieves", "alloys", "guards", "equivalents", "lookalikes")
OVER_STORE = ("equivalents", "lookalikes")
WIDEST = 34
MEASURED_ROWS = 200


class TableRows:
    """Rows of a reference table as cells."""

    def __init__(self, rows: "Sequence[Row]", keys: Sequence[str]) -> None:
        self._rows, self._keys = rows, keys
        self.total = len(rows)

    def cells(self, row: int) -> Sequence[str | Piece]:
        """A row's cells."""
        return [spelled(self._rows[row].get(key)) for key in self._keys]


def spelled(value: Any) -> str:
    """A table's value as text."""
    if value is None:
        return "–"
    if isinstance(value, bool):
        return "yes" if value else "no"
    if isinstance(value, (int, float)):
        return significant(float(value), 6)
    return harmless(str(value), 200)


def with_inches(rows: "Sequence[Row]") -> "list[Row]":
    """Rows with an inch figure behind each length in mm that has none."""
    widened = []
    for row in rows:
        new: Row = {}
        for key, value in row.items():
            new[key] = value
            other = key.replace("_mm", "_in")
            if key.endswith("_mm") and other not in row and isinstance(value, (int, float)):
                new[other] = inch(float(value))
        widened.append(new)
    return widened


class TablesPlace(Place):
    """One table at a time."""

    where = TABLES
    title = "Tables"

    def __init__(self, *, id: str) -> None:  # noqa: A002
        super().__init__(id=id)
        self.name_of_table = NAMES[0]
        self._tables: dict[str, Table] = {}

    def awaits(self) -> bool:
        """True while an answer for the list is on its way."""
        return self.desk.door.awaits("table")

    def compose(self) -> ComposeResult:
        """The line for words, which table, the list, its source."""
        with Box(classes="typing"):
            yield LineView(lambda width: [((" Words   ", "key"),)], classes="typing-label")
            yield LineInput(id="words", placeholder="part of a row: 30, SWG, 1.4404, No. 60")
        yield LineView(self._which_line, id="status", classes="status")
        yield PagedTable(id="rows", sign=self.spelled("›"))
        yield LineView(self._source_line, id="source")

    def on_mount(self) -> None:
        """The first table."""
        self._list()

    def store_shut(self, sentence: str) -> None:
        """Most tables need no store."""
        self._list()

    def store_opened(self) -> None:
        """Tables that are made of the store are made afresh."""
        for name in OVER_STORE:
            self._tables.pop(name, None)
        self._list()

    def _table(self) -> "Table | None":
        """The table in front; None while it is being made of the store."""
        from catalog.report.tables import REFERENCE

        name = self.name_of_table
        if name not in self._tables and name not in OVER_STORE:
            self._tables[name] = REFERENCE[name]()
        return self._tables.get(name)

    def _make(self, name: str) -> None:
        """Have a table made of the store."""
        words = "Comparing the whole catalogue…" if self.desk.door.is_open else "Opening the store…"
        self.say_in_list((f"! {self.desk.trouble}", "bad") if self.desk.trouble else (words, "muted"))

        def work(store: Any) -> "Table":
            from catalog.report.tables import OVER_STORE as MAKERS

            return MAKERS[name](store)

        def got(table: "Table") -> None:
            self._tables[name] = table
            if name == self.name_of_table:
                self._list()

        self.desk.door.ask("table", work, got, lambda sentence: self.say_in_list((f"! {sentence}", "bad")))

    def _list(self) -> None:
        table = self._table()
        self.query_one("#status", LineView).show(self._which_line)
        self.query_one("#source", LineView).show(self._source_line)
        if table is None:
            self._make(self.name_of_table)
            return
        rows = self._passing(with_inches(table.rows))
        keys = list(dict.fromkeys(key for row in rows[:MEASURED_ROWS] for key in row))
        if rows:
            columns = self.chosen([_column(key, rows, index == 0) for index, key in enumerate(keys)])
            self.table.show(columns, TableRows(rows, [column.key for column in columns]))
        else:
            what_next = "Change the line above; t shows the next table."
            self.say_in_list(("No row holds these words.", "risk"), (what_next, "muted"))
        self.query_one("#status", LineView).show(self._which_line)
        self.query_one("#source", LineView).show(self._source_line)

    def _passing(self, rows: "list[Row]") -> "list[Row]":
        words = self.query_one("#words", LineInput).value.casefold().split()
        return [
            row
            for row in rows
            if all(any(word in spelled(value).casefold() for value in row.values()) for word in words)
        ]

    def on_input_changed(self, event: Input.Changed) -> None:
        """Narrow the table."""
        event.stop()
        self._list()

    def look_changed(self) -> None:
        """Other colours or columns."""
        self._list()

    def _which_line(self, width: int) -> Sequence[Line]:
        pieces: list[Piece] = [(" ", "text")]
        for name in NAMES:
            here = name == self.name_of_table
            pieces.append((f"[{name}] ", "head") if here else (f" {name}  ", "muted"))
        total = self.table.rows.total if self.is_mounted else 0
        right = f"{self.table.cursor + 1} of {total} " if total else ""
        used = sum(width_of(text) for text, _ in pieces)
        return self.spelled_lines([[*pieces, (right.rjust(max(0, width - used)), "muted")]])

    def _source_line(self, width: int) -> Sequence[Line]:
        table = self._table() if self.is_mounted else None
        source = harmless(table.source) if table else ""
        return self.spelled_lines([((fit(f" Source: {source}", width), "muted"),)])

    def on_paged_table_moved(self, event: PagedTable.Moved) -> None:
        """Say which row."""
        event.stop()
        self.query_one("#status", LineView).show(self._which_line)

    def action_next_table(self) -> None:
        """The next table."""
        self.name_of_table = NAMES[(NAMES.index(self.name_of_table) + 1) % len(NAMES)]
        self.table.first_column = 0
        self._list()

    def action_open(self) -> None:
        """A row has nothing more to show: the columns move instead."""
        self.action_columns_right()

    def copied(self) -> str:
        """The highlighted row."""
        cells = self.table.rows.cells(self.table.cursor) if self.table.rows.total else None
        return "" if cells is None else "  ".join(self.spelled(c if isinstance(c, str) else c[0]) for c in cells)


def _column(key: str, rows: "Sequence[Row]", first: bool) -> Column:
    title = key.replace("_mm", " mm").replace("_in", " in").replace("_kg_m3", " kg/m³").replace("_", " ")
    texts = [spelled(row.get(key)) for row in rows[:MEASURED_ROWS]]
    width = min(WIDEST, max(width_of(title) + 1, *(width_of(text) for text in texts)))
    is_number = all(text[:1].isdigit() or text[:1] in ".–-" for text in texts)
    return Column(key, title, width, "right" if is_number else "left", fixed=first)
