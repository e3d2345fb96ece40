"""The help screen: every command of the one list, those of the place in front first."""

from collections.abc import Mapping
from typing import ClassVar

from textual.app import ComposeResult
from textual.binding import Binding, BindingType
from textual.screen import ModalScreen

from tui.commands import EVERYWHERE, LIST, PLACES, at, key_words
from tui.presenting import SEALS, Line, plain, width_of, wrapped
from tui.widgets.line_view import LineView

HEADS = {EVERYWHERE: "Everywhere", LIST: "In lists"}


def help_lines(place: str, keys: Mapping[str, str], width: int, ascii_only: bool) -> list[Line]:
    """Every key and what it does, and what the signs mean."""
    lines: list[Line] = [(("Keys", "title"), ("   Esc closes; arrows and page keys scroll", "muted"))]
    for where in (place, LIST, EVERYWHERE, *(p for p in PLACES if p != place)):
        if not at(where):
            continue
        lines += [(), ((HEADS.get(where, f"In {where}"), "head"),)]
        for command in at(where):
            names = key_words(command, keys)
            column = max(14, width_of(names) + 1)
            parts = wrapped(command.help, max(20, width - column - 2))
            lines.append(((" " + names.ljust(column), "key"), (parts[0], "text")))
            lines += [((" " * (column + 1) + part, "text"),) for part in parts[1:]]
    lines += [(), (("Verdicts", "head"),)]
    for seal in SEALS.values():
        sign = seal.ascii_symbol if ascii_only else seal.symbol
        lines.append(((f" {sign} ", seal.ink), (seal.word, seal.ink)))
    lines += [(), (("In lists * marks a marked row; D marks demo data, which is invented.", "muted"),)]
    return [[(plain(t), ink) for t, ink in line] for line in lines] if ascii_only else lines


class Help(ModalScreen[None]):
    """Shown over whatever is in front."""

    BINDINGS: ClassVar[list[BindingType]] = [
        Binding("escape,q,f1,question_mark,enter", "leave", "Close", show=False),
        Binding("down,j", "scroll_by(1)", "Down", show=False),
        Binding("up,k", "scroll_by(-1)", "Up", show=False),
        Binding("pagedown,space", "scroll_by(15)", "Page down", show=False),
        Binding("pageup", "scroll_by(-15)", "Page up", show=False),
        Binding("home", "scroll_by(-1000)", "First", show=False),
        Binding("end", "scroll_by(1000)", "Last", show=False),
    ]

    def __init__(self, place: str, keys: Mapping[str, str], ascii_only: bool) -> None:
        super().__init__()
        self._place, self._keys, self._ascii = place, keys, ascii_only

    def compose(self) -> ComposeResult:
        """One view."""
        yield LineView(lambda width: help_lines(self._place, self._keys, width, self._ascii), id="help")

    def action_scroll_by(self, rows: int) -> None:
        """Scroll."""
        view = self.query_one(LineView)
        view.scroll_to(y=view.scroll_offset.y + rows, animate=False)

    def action_leave(self) -> None:
        """Close."""
        self.dismiss(None)
