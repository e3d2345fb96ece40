"""A line to type in: one row, a still cursor, nothing but printable text in it."""

from typing import Any

from textual import events
from textual.widgets import Input

from tui.presenting import harmless

LONGEST = 4000


class LineInput(Input):
    """A compact input. What is pasted comes in as one harmless line."""

    def __init__(self, value: str = "", *, id: str | None = None, placeholder: str = "") -> None:  # noqa: A002
        rest: dict[str, Any] = {"compact": True, "select_on_focus": False}
        super().__init__(harmless(value, LONGEST), id=id, placeholder=placeholder, max_length=LONGEST, **rest)
        self.cursor_blink = False

    async def _on_key(self, event: events.Key) -> None:
        """Esc and a quick letter come as one key through some terminals: that is no text."""
        if event.key.startswith("alt+"):
            event.prevent_default()

    def _on_paste(self, event: events.Paste) -> None:
        """Put the pasted lines in as one."""
        text = harmless(" ".join(event.text[: 4 * LONGEST].splitlines()), LONGEST)
        if text:
            selection = self.selection
            if selection.is_empty:
                self.insert_text_at_cursor(text)
            else:
                self.replace(text, *selection)
        event.prevent_default()
        event.stop()

    @property
    def text_offset(self) -> int:
        """How many cells the text has moved to the left."""
        return int(self.scroll_offset.x)
