"""A question for one line of text, at the foot of the screen."""

from typing import ClassVar

from textual.app import ComposeResult
from textual.binding import Binding, BindingType
from textual.screen import ModalScreen
from textual.widgets import Input

from tui.keyboard import Settled
from tui.presenting import fit, plain
from tui.widgets.box import Box
from tui.widgets.callout_input import LineInput
from tui.widgets.line_view import LineView


class Prompt(ModalScreen[str | None]):
    """Gives the text back on Enter, nothing on Esc."""

    BINDINGS: ClassVar[list[BindingType]] = [Binding("escape", "leave", "Leave", show=False)]

    def __init__(self, label: str, value: str, ascii_only: bool) -> None:
        super().__init__()
        self.is_ready = False
        self._label = plain(label) if ascii_only else label
        self._value = value

    def compose(self) -> ComposeResult:
        """The label and the line."""
        with Box(id="prompt"):
            view = LineView(lambda width: [((fit(f" {self._label}: ", width), "key"),)], id="prompt-label")
            view.styles.width = len(self._label) + 3
            yield view
            yield LineInput(self._value, id="prompt-line")

    def on_mount(self) -> None:
        """Type at once."""
        line = self.query_one(LineInput)
        self.set_focus(line)
        line.select_all()
        self.is_ready = True
        self.app.post_message(Settled())

    def on_input_submitted(self, event: Input.Submitted) -> None:
        """Done."""
        event.stop()
        self.dismiss(event.value)

    def action_leave(self) -> None:
        """Never mind."""
        self.dismiss(None)
