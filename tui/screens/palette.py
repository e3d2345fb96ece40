"""Commands by name: type a part of one, Enter runs it."""

from collections.abc import Mapping, Sequence
from typing import ClassVar

from textual.app import ComposeResult
from textual.binding import Binding, BindingType
from textual.screen import ModalScreen
from textual.widgets import Input

from tui.commands import EVERYWHERE, LIST, Command, at, key_words
from tui.keyboard import Settled
from tui.presenting import Piece, plain
from tui.widgets.box import Box
from tui.widgets.callout_input import LineInput
from tui.widgets.paged_table import Column, PagedTable


class CommandRows:
    """Commands as rows."""

    def __init__(self, commands: Sequence[Command], keys: Mapping[str, str]) -> None:
        self.commands, self._keys = commands, keys
        self.total = len(commands)

    def cells(self, row: int) -> Sequence[str | Piece]:
        """Words, key, help."""
        command = self.commands[row]
        return (command.words, (key_words(command, self._keys), "key"), command.help)


COLUMNS = (
    Column("words", "Command", 16, "left", ink="strong"),
    Column("key", "Key", 10, "left"),
    Column("help", "What it does", 46, "left"),
)


class Palette(ModalScreen[str | None]):
    """Gives back the id of the command that was chosen."""

    BINDINGS: ClassVar[list[BindingType]] = [
        Binding("escape", "leave", "Leave", show=False),
        Binding("down", "move(1)", "Down", show=False),
        Binding("up", "move(-1)", "Up", show=False),
        Binding("pagedown", "move(10)", "Page down", show=False),
        Binding("pageup", "move(-10)", "Page up", show=False),
    ]

    def __init__(self, place: str, keys: Mapping[str, str], ascii_only: bool) -> None:
        super().__init__()
        self.is_ready = False
        self._keys, self._ascii = keys, ascii_only
        self._all = at(place, EVERYWHERE, LIST)

    def compose(self) -> ComposeResult:
        """The line and the list."""
        with Box(id="palette"):
            yield LineInput(id="palette-line", placeholder="part of a command's name")
            sign = ">" if self._ascii else "›"
            yield PagedTable(id="palette-list", sign=sign, empty="No command is called that.")

    def on_mount(self) -> None:
        """Type at once."""
        self._list("")
        self.set_focus(self.query_one(LineInput))
        self.is_ready = True
        self.app.post_message(Settled())

    def _list(self, text: str) -> None:
        wanted = text.casefold().split()
        found = [c for c in self._all if all(w in f"{c.words} {c.help} {c.id}".casefold() for w in wanted)]
        self.query_one(PagedTable).show(COLUMNS, CommandRows(found, self._keys))

    def on_input_changed(self, event: Input.Changed) -> None:
        """Narrow the list."""
        event.stop()
        self._list(plain(event.value))

    def on_input_submitted(self, event: Input.Submitted) -> None:
        """Run the highlighted one."""
        event.stop()
        self._choose()

    def on_paged_table_chosen(self, event: PagedTable.Chosen) -> None:
        """A double click runs it as well."""
        event.stop()
        self._choose()

    def _choose(self) -> None:
        table = self.query_one(PagedTable)
        if isinstance(table.rows, CommandRows) and table.rows.total:
            self.dismiss(table.rows.commands[table.cursor].id)

    def action_move(self, rows: int) -> None:
        """Move the highlight."""
        self.query_one(PagedTable).move(rows)

    def action_leave(self) -> None:
        """Never mind."""
        self.dismiss(None)
