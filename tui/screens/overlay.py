"""Lines to read, over whatever is in front: help, sums."""

from collections.abc import Sequence
from typing import ClassVar

from textual.app import ComposeResult
from textual.binding import Binding, BindingType
from textual.screen import ModalScreen

from tui.keyboard import Settled
from tui.presenting import Line
from tui.widgets.line_view import LineView


class Overlay(ModalScreen[None]):
    """Scrolls with arrows and page keys; Esc closes."""

    BINDINGS: ClassVar[list[BindingType]] = [
        Binding("escape,q,f1,question_mark,enter", "leave", "Close", show=False),
        Binding("down,j", "scroll_by(1)", "Down", show=False),
        Binding("up,k", "scroll_by(-1)", "Up", show=False),
        Binding("pagedown,space", "scroll_by(15)", "Page down", show=False),
        Binding("pageup", "scroll_by(-15)", "Page up", show=False),
        Binding("home", "scroll_by(-1000)", "First", show=False),
        Binding("end", "scroll_by(1000)", "Last", show=False),
    ]

    is_ready = False

    def lines(self, width: int) -> Sequence[Line]:
        """What is to be read, for this width."""
        raise NotImplementedError

    def compose(self) -> ComposeResult:
        """One view."""
        yield LineView(self.lines, id="overlay")

    def on_mount(self) -> None:
        """Keys that waited may go on."""
        self.is_ready = True
        self.app.post_message(Settled())

    def action_scroll_by(self, rows: int) -> None:
        """Scroll."""
        view = self.query_one(LineView)
        view.scroll_to(y=view.scroll_offset.y + rows, animate=False)

    def action_leave(self) -> None:
        """Close."""
        self.dismiss(None)
