"""A scrolling view of lines that are composed for the width at hand."""

from collections.abc import Callable, Sequence

from rich.style import Style
from textual.events import Resize
from textual.geometry import Region, Size
from textual.scroll_view import ScrollView
from textual.strip import Strip

from tui.presenting import Line
from tui.widgets.inks import strip_of, styles, text_of

Composer = Callable[[int], Sequence[Line]]


class Inked(ScrollView, inherit_bindings=False):
    """A scroll view that draws with the theme's inks."""

    @property
    def inks(self) -> dict[str, Style]:
        """The styles by ink in the present theme."""
        return styles(self.app.current_theme.dark, self.app.no_color)


class LineView(Inked, can_focus=False, inherit_bindings=False):
    """Shows what a composer makes of the width; composed again when the width changes."""

    def __init__(
        self,
        composer: Composer | None = None,
        *,
        id: str | None = None,  # noqa: A002
        classes: str = "",
        has_band: bool = False,
    ) -> None:
        super().__init__(id=id, classes=classes)
        self._has_band = has_band
        self._composer: Composer = composer or (lambda width: ())
        self._lines: Sequence[Line] = ()
        self._width = 0

    @property
    def text(self) -> str:
        """What is shown, as plain text."""
        return text_of(self._lines)

    def show(self, composer: Composer, keep_place: bool = False) -> None:
        """Show something else, from its top unless *keep_place*."""
        self._composer = composer
        self._compose_lines()
        if not keep_place and self.scroll_offset.y:
            self.scroll_to(y=0, animate=False)

    def _compose_lines(self) -> None:
        width = self.scrollable_content_region.width or self.size.width
        if width <= 0:
            return
        self._width = width
        before, self._lines = self._lines, self._composer(width)
        self.virtual_size = Size(width, len(self._lines))
        is_auto = self.styles.height is not None and self.styles.height.is_auto
        if is_auto and len(before) != len(self._lines):
            self.refresh(layout=True)
        else:
            self._refresh_changed(before)

    def _refresh_changed(self, before: Sequence[Line]) -> None:
        """Only the lines that differ: a link may be slow."""
        if len(before) != len(self._lines):
            self.refresh()
            return
        top = self.scroll_offset.y
        for row, (old, new) in enumerate(zip(before, self._lines, strict=True)):
            if list(old) != list(new):
                self.refresh(Region(0, row - top, self.size.width, 1))

    def on_resize(self, event: Resize) -> None:
        """Compose again for the new width."""
        if (self.scrollable_content_region.width or self.size.width) != self._width or not self._lines:
            self._compose_lines()

    def get_content_height(self, container: Size, viewport: Size, width: int) -> int:
        """As many rows as there are lines."""
        return len(self._composer(max(1, width)))

    def render_line(self, y: int) -> Strip:
        """One line of what is shown."""
        row = y + self.scroll_offset.y
        line: Line = self._lines[row] if row < len(self._lines) else ()
        under = self.inks["band"] if self._has_band and row == 0 and self._lines else None
        return strip_of(line, self.size.width, self.inks, under)
