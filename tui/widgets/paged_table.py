"""A table that draws only the lines on the screen, over rows that are read in pages as they are needed."""

from collections import OrderedDict
from collections.abc import Sequence
from dataclasses import dataclass
from typing import Protocol

from rich.style import Style
from textual.events import Click, Resize
from textual.geometry import Region, Size
from textual.message import Message
from textual.reactive import reactive
from textual.strip import Strip

from tui.presenting import Line, Piece, fit
from tui.widgets.inks import strip_of
from tui.widgets.line_view import Inked

STRIPS_KEPT = 400
HEADER = 1


@dataclass(frozen=True, slots=True)
class Column:
    """One column: what it is called, how many cells it takes."""

    key: str
    title: str
    width: int
    align: str = "right"
    fixed: bool = False
    """True where it stays while the others move sideways."""
    ink: str = "text"


class Rows(Protocol):
    """Where a table's rows come from."""

    total: int

    def cells(self, row: int) -> Sequence[str | Piece] | None:
        """One cell a column, or None while the page is on its way."""
        ...


class NoRows:
    """Nothing to show."""

    total = 0

    def cells(self, row: int) -> Sequence[str | Piece] | None:
        """There are none."""
        return None


class PagedTable(Inked, can_focus=True, inherit_bindings=False):
    """Rows of any number; the cursor's row carries a sign as well as a colour."""

    cursor = reactive(0, repaint=False)

    class Moved(Message):
        """The cursor is on another row. Read the row from the table: a later move may have followed."""

        def __init__(self, table: "PagedTable") -> None:
            super().__init__()
            self.table = table

        @property
        def control(self) -> "PagedTable":
            """The table."""
            return self.table

    class Chosen(Moved):
        """The row under the cursor was opened."""

    def __init__(self, *, id: str | None = None, sign: str = "›", empty: str = "") -> None:  # noqa: A002
        super().__init__(id=id)
        self.sign = sign
        self.columns: tuple[Column, ...] = ()
        self.rows: Rows = NoRows()
        self.marked: frozenset[int] = frozenset()
        self.empty: Sequence[Line] = (((empty, "muted"),),)
        self.sorted_by = ""
        self.first_column = 0
        self._strips: OrderedDict[tuple[int, int], Strip] = OrderedDict()

    def show(self, columns: Sequence[Column], rows: Rows, cursor: int = 0) -> None:
        """Show these rows, with the cursor on *cursor*."""
        self.columns, self.rows = tuple(columns), rows
        self.first_column = min(self.first_column, max(0, len(self._moving) - 1))
        self.forget()
        self.set_reactive(PagedTable.cursor, max(0, min(cursor, rows.total - 1)))
        self._keep_cursor_seen()
        self.post_message(self.Moved(self))

    def forget(self) -> None:
        """Draw every line afresh: rows, marks, units or colours have changed."""
        self._strips.clear()
        self.virtual_size = Size(self.size.width, self.rows.total + HEADER)
        self.refresh()

    def mark(self, rows: frozenset[int]) -> None:
        """Mark these rows with a sign."""
        self.marked = rows
        self.forget()

    @property
    def page(self) -> int:
        """Rows that fit."""
        return max(1, self.size.height - HEADER)

    @property
    def _moving(self) -> list[int]:
        return [i for i, c in enumerate(self.columns) if not c.fixed]

    def on_resize(self, event: Resize) -> None:
        """Other widths, other strips."""
        self.forget()
        self._keep_cursor_seen()

    def validate_cursor(self, row: int) -> int:
        """A row that is there."""
        return max(0, min(row, self.rows.total - 1))

    def watch_cursor(self, before: int, now: int) -> None:
        """Redraw the two lines that changed and say so."""
        if before == now:
            return
        if not self._keep_cursor_seen():
            for row in (before, now):
                self._strips.pop((row, self.first_column), None)
                y = row + HEADER - self.scroll_offset.y
                self.refresh(Region(0, y, self.size.width, 1))
        self.post_message(self.Moved(self))

    def _keep_cursor_seen(self) -> bool:
        """Scroll so that the cursor's row is on the screen; True where that moved everything."""
        top = self.scroll_offset.y
        if self.cursor < top:
            wanted = self.cursor
        elif self.cursor >= top + self.page:
            wanted = self.cursor - self.page + 1
        else:
            return False
        self.scroll_to(y=wanted, animate=False, immediate=True)
        self.refresh()
        return True

    def move(self, by: int) -> None:
        """Move the cursor by so many rows."""
        self.cursor += by

    def move_to(self, row: int) -> None:
        """Move the cursor to a row."""
        self.cursor = row

    def shift(self, by: int) -> None:
        """Move the columns sideways."""
        moving = self._moving
        self.first_column = max(0, min(self.first_column + by, len(moving) - 1)) if moving else 0
        self.forget()

    def choose(self) -> None:
        """Open the row under the cursor."""
        if self.rows.total:
            self.post_message(self.Chosen(self))

    def on_click(self, event: Click) -> None:
        """Put the cursor where the pointer is; a second click opens."""
        row = event.y - HEADER + self.scroll_offset.y
        if event.y < HEADER or row >= self.rows.total:
            return
        if row == self.cursor and event.chain > 1:
            self.choose()
        self.cursor = row

    def on_focus(self) -> None:
        """The cursor's row shows where the keys go."""
        self.refresh()

    on_blur = on_focus

    def visible_columns(self) -> list[int]:
        """The columns that fit, the fixed ones first."""
        room = self.size.width - 2
        shown: list[int] = []
        order = [i for i, c in enumerate(self.columns) if c.fixed] + self._moving[self.first_column :]
        for index in order:
            room -= self.columns[index].width + 1
            if room < -1:
                break
            shown.append(index)
        return shown

    def render_line(self, y: int) -> Strip:
        """The header, a row, or what is said where there are no rows."""
        width = self.size.width
        if self.rows.total == 0:
            line: Line = self.empty[y] if y < len(self.empty) else ()
            return strip_of(line, width, self.inks)
        if y == 0:
            return strip_of(self._header(), width, self.inks)
        row = y - HEADER + self.scroll_offset.y
        if row >= self.rows.total:
            return strip_of((), width, self.inks)
        return self._row_strip(row, width)

    def _header(self) -> Line:
        pieces: list[Piece] = [("  ", "head")]
        shown = self.visible_columns()
        for index in shown:
            column = self.columns[index]
            title = column.title + ("*" if column.key == self.sorted_by and column.key else "")
            pieces.append((fit(title, column.width, column.align) + " ", "head"))
        if len(shown) < len(self.columns):
            pieces.append((">", "head"))
        return pieces

    def _row_strip(self, row: int, width: int) -> Strip:
        here = row == self.cursor
        if not here and (kept := self._strips.get((row, self.first_column))) is not None:
            return kept
        cells = self.rows.cells(row)
        under = self._under() if here else None
        strip = strip_of(self._row(row, cells, here), width, self.inks, under)
        if cells is not None and not here:
            self._keep((row, self.first_column), strip)
        return strip

    def _under(self) -> Style:
        return self.inks["cursor" if self.has_focus else "cursor-away"]

    def _keep(self, key: tuple[int, int], strip: Strip) -> None:
        self._strips[key] = strip
        if len(self._strips) > STRIPS_KEPT:
            self._strips.popitem(last=False)

    def _row(self, row: int, cells: Sequence[str | Piece] | None, here: bool) -> Line:
        pieces: list[Piece] = [
            (self.sign if here else " ", "strong"),
            ("*" if row in self.marked else " ", "strong"),
        ]
        if cells is None:
            return [*pieces, ("…", "muted")]
        for index in self.visible_columns():
            column, cell = self.columns[index], cells[index]
            text, ink = (cell, column.ink) if isinstance(cell, str) else cell
            pieces.append((fit(text, column.width, column.align) + " ", ink))
        return pieces
