"""A place: a line to type in perhaps, a list, and what the list's highlighted row is about."""

from collections.abc import Sequence
from typing import TYPE_CHECKING, ClassVar, cast

from textual.widget import Widget
from textual.widgets import Input

from tui.presenting import Line, plain
from tui.widgets.box import Box
from tui.widgets.line_view import LineView
from tui.widgets.paged_table import Column, PagedTable

if TYPE_CHECKING:
    from catalog.cloth import Cloth
    from tui.screens.desk import Desk


class Place(Box):
    """What every place does: its list's keys, copying, coming back to where one was."""

    where: ClassVar[str] = ""
    title: ClassVar[str] = ""

    @property
    def desk(self) -> "Desk":
        """The screen that all places lie on."""
        return cast("Desk", self.app.screen_stack[0] if self.app.screen.is_modal else self.screen)

    @property
    def table(self) -> PagedTable:
        """The place's list."""
        return self.query_one(PagedTable)

    @property
    def line(self) -> Input | None:
        """The line to type in, where the place has one."""
        found = self.query(Input)
        return found.first() if found else None

    def arrive(self, carried: object = None) -> None:
        """The place comes to the front, with what is carried along from another."""
        self.settle()

    def settle(self) -> None:
        """Put the focus where work goes on."""
        self.focus_on(self.table)

    def focus_on(self, widget: Widget) -> None:
        """Move the focus at once: the next key must find it there."""
        self.desk.set_focus(widget)

    def awaits(self) -> bool:
        """True while what the list is to show is on its way, so that keys for the list have to wait."""
        return False

    def on_input_submitted(self, event: Input.Submitted) -> None:
        """The line has been read: on to the list."""
        event.stop()
        self.line_read()

    def line_read(self) -> None:
        """Keys that waited for the line may go on."""
        self.focus_on(self.table)
        self.desk.line_was_read()

    def leave_inner(self) -> bool:
        """Close what is open within the place; False where nothing is."""
        return False

    def store_opened(self) -> None:
        """The store is open now."""

    def store_shut(self, sentence: str) -> None:
        """The store can't be opened, and why."""
        self.say_in_list((f"! {sentence}", "bad"), ("Press F7 to try again; what you typed stays.", "muted"))

    @property
    def is_opened(self) -> bool:
        """True where one thing has the whole place."""
        return self.has_class("-opened")

    def open_up(self) -> None:
        """Give the whole place to the detail; the keys go there, as the list is hidden."""
        detail = self.query_one("#detail", LineView)
        detail.can_focus = True
        self.add_class("-opened")
        self.focus_on(detail)

    def close_up(self) -> None:
        """Back to the list."""
        self.query_one("#detail", LineView).can_focus = False
        self.remove_class("-opened")
        self.focus_on(self.table)

    def look_changed(self) -> None:
        """Units or theme have changed."""
        self.table.forget()

    def copied(self) -> str:
        """What the copy key takes: the highlighted row in words."""
        return ""

    def written(self) -> list[str]:
        """What the write key puts into a file: the place's list and what belongs to it."""
        table = self.table
        lines = ["\t".join(c.title for c in table.columns)]
        for row in range(min(table.rows.total, 10_000)):
            cells = table.rows.cells(row) or ()
            lines.append("\t".join(c if isinstance(c, str) else c[0] for c in cells))
        return lines

    def say_in_list(self, *lines: tuple[str, str]) -> None:
        """Words in the place of the list: empty, loading, failed. They say what to do next."""
        from tui.presenting import harmless, wrapped
        from tui.widgets.paged_table import NoRows

        width = max(20, (self.table.size.width or 80) - 2)
        said: list[Line] = [((f" {part}", ink),) for text, ink in lines for part in wrapped(harmless(text), width)]
        self.table.empty = said
        self.table.show(self.table.columns, NoRows())

    def spelled(self, text: str) -> str:
        """*text* as this terminal is to have it."""
        return plain(text) if self.desk.ascii_only else text

    def spelled_lines(self, lines: Sequence[Line]) -> Sequence[Line]:
        """Lines as this terminal is to have them."""
        if not self.desk.ascii_only:
            return lines
        return [[(plain(text), ink) for text, ink in line] for line in lines]

    def action_row_down(self) -> None:
        """Next row."""
        self.table.move(1)

    def action_row_up(self) -> None:
        """Row before."""
        self.table.move(-1)

    def action_page_down(self) -> None:
        """A page down."""
        self.table.move(self.table.page)

    def action_page_up(self) -> None:
        """A page up."""
        self.table.move(-self.table.page)

    def action_first_row(self) -> None:
        """First row."""
        self.table.move_to(0)

    def action_last_row(self) -> None:
        """Last row."""
        self.table.move_to(self.table.rows.total - 1)

    def action_columns_right(self) -> None:
        """Columns further right."""
        self.table.shift(1)

    def action_columns_left(self) -> None:
        """Columns further left."""
        self.table.shift(-1)

    def action_open(self) -> None:
        """Open the highlighted row."""
        self.table.choose()

    def chosen(self, columns: Sequence[Column]) -> tuple[Column, ...]:
        """Of a list's columns those that the user chose, in that order, behind the fixed ones."""
        own = self.desk.memory.columns.get(self.where)
        if not own:
            return tuple(columns)
        moving = {c.key: c for c in columns if not c.fixed}
        return (*(c for c in columns if c.fixed), *(moving[key] for key in own if key in moving))

    def action_columns(self) -> None:
        """Choose the columns by name."""
        shown = " ".join(c.key for c in self.table.columns if not c.fixed)
        self.desk.ask_line("Columns (empty: all)", shown, self._choose_columns)

    def _choose_columns(self, text: str) -> None:
        self.desk.memory.columns.pop(self.where, None)
        self.look_changed()
        known = [c.key for c in self.table.columns if not c.fixed]
        wanted = [word for word in text.replace(",", " ").split() if word in known]
        unknown = [word for word in text.replace(",", " ").split() if word not in known]
        if wanted:
            self.desk.memory.columns[self.where] = wanted
            self.look_changed()
        if unknown:
            self.desk.say(f"No column is called {unknown[0]}: they are {' '.join(known)}.")

    @property
    def cloth(self) -> "Cloth | None":
        """The cloth that the highlighted row is about."""
        return None

    def action_sums(self) -> None:
        """The sums behind its figures."""
        from tui.screens.sums import Sums

        if self.cloth is None:
            self.desk.say("There is no cloth here to lay out sums for.")
            return
        self.app.push_screen(Sums(self.cloth, self.desk.ascii_only))

    def action_find(self) -> None:
        """Find a row by a word in it."""
        self.desk.ask_line("Find", self.desk.finding, self._find)

    def action_find_next(self) -> None:
        """The next row with the word."""
        if self.desk.finding:
            self._seek(self.desk.finding, self.table.cursor + 1)

    def _find(self, word: str) -> None:
        self.desk.finding = word
        self._seek(word, self.table.cursor)

    def _seek(self, word: str, start: int) -> None:
        """Go to the first row from *start* on, round the end, that holds the word."""
        rows, wanted = self.table.rows, word.casefold()
        for step in range(rows.total):
            row = (start + step) % rows.total
            cells = rows.cells(row) or ()
            if any(wanted in (c if isinstance(c, str) else c[0]).casefold() for c in cells):
                self.table.move_to(row)
                return
        self.desk.say(f"Nothing here holds “{word}”.")
