"""Manners towards the terminal: bytes that are no UTF-8, signals, and screens that hold ASCII only."""

import codecs
from functools import lru_cache
from typing import TYPE_CHECKING

from rich.segment import Segment
from rich.style import Style
from textual.color import Color
from textual.filter import LineFilter

from tui.presenting import plain

if TYPE_CHECKING:
    from textual.driver import Driver


class AsciiOnly(LineFilter):
    """A net under everything that is drawn: whatever is not ASCII becomes one ASCII character a cell."""

    def apply(self, segments: list[Segment], background: Color) -> list[Segment]:
        """Replace what is left."""
        return [
            segment if segment.text.isascii() else Segment(_cell_by_cell(segment.text), segment.style)
            for segment in segments
        ]


@lru_cache(4096)
def _cell_by_cell(text: str) -> str:
    from rich.cells import cell_len

    return "".join(_one(char, cell_len(char)) for char in text)


def _one(char: str, cells: int) -> str:
    if char in "─━═╌╴╶▔▁▀▄":
        return "-"
    if char in "│┃║▎▏▊▌▐█":
        return "|"
    return (plain(char) or "?")[0].ljust(cells, "?")[:cells] if cells else ""


class Colourless(LineFilter):
    """Drops every colour; bold, underlined and reversed text stay."""

    def apply(self, segments: list[Segment], background: Color) -> list[Segment]:
        """Strip the colours."""
        return [Segment(s.text, _without_colour(s.style), s.control) for s in segments]


@lru_cache(1024)
def _without_colour(style: Style | None) -> Style | None:
    return style.without_color if style is not None else None


def forgiving_driver() -> "type[Driver]":
    """The terminal driver with a decoder that replaces bytes which are no UTF-8, where the strict one ends it."""
    from textual.drivers import linux_driver

    def forgiving(encoding: str) -> object:
        return lambda: codecs.getincrementaldecoder(encoding)(errors="replace")

    linux_driver.getincrementaldecoder = forgiving  # type: ignore[attr-defined,assignment]
    return linux_driver.LinuxDriver
