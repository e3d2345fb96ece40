"""Inks: what a name like 'risk' looks like in the present theme. One table a theme; the contrast is tested."""

from collections.abc import Iterable, Mapping

from rich.segment import Segment
from rich.style import Style
from textual.strip import Strip

from tui.presenting import Line

DARK: Mapping[str, str] = {
    "paper": "#14181c", "panel": "#20272d", "text": "#dfe4e6", "muted": "#9aa7ad", "head": "#8fb8c8",
    "strong": "#ffffff", "good": "#8fce9a", "near": "#a9c78a", "risk": "#e8bd6a", "ask": "#b9b1e6",
    "bad": "#f0938b", "count": "#8ec7e8", "wire": "#e6b57a", "aperture": "#8fd6c0", "alloy": "#cdaee0",
    "weave": "#d9d08a", "form": "#a8b8e8", "limit": "#e8a7c0", "other": "#c2cdd2", "cursor": "#263c47",
    "line": "#4a565d", "warn": "#f2c879",
}  # fmt: skip
LIGHT: Mapping[str, str] = {
    "paper": "#fbfaf6", "panel": "#e9e7df", "text": "#20262a", "muted": "#565f64", "head": "#1f5870",
    "strong": "#000000", "good": "#1d6330", "near": "#3f5a12", "risk": "#7d4e00", "ask": "#4b3f96",
    "bad": "#a3221a", "count": "#0f5580", "wire": "#824700", "aperture": "#00604b", "alloy": "#6a2f86",
    "weave": "#5e5300", "form": "#314590", "limit": "#8c1f4d", "other": "#3d484d", "cursor": "#c9dbe2",
    "line": "#8d958f", "warn": "#7d4e00",
}  # fmt: skip
BOLD = frozenset({"strong", "head", "risk", "bad", "warn"})
UNDERLINED = frozenset({"link"})


def ink_table(is_dark: bool) -> Mapping[str, str]:
    """The colours by ink."""
    return DARK if is_dark else LIGHT


_STYLES: dict[tuple[bool, bool], dict[str, Style]] = {}


def styles(is_dark: bool, no_color: bool) -> dict[str, Style]:
    """Rich styles by ink. Without colour, weight and reverse video carry what colour did."""
    key = (is_dark, no_color)
    if key not in _STYLES:
        _STYLES[key] = _bare() if no_color else _coloured(ink_table(is_dark))
    return _STYLES[key]


def _coloured(table: Mapping[str, str]) -> dict[str, Style]:
    found = {name: Style(color=colour, bold=name in BOLD or None) for name, colour in table.items()}
    found["cursor"] = Style(bgcolor=table["cursor"], bold=True)
    found["cursor-away"] = Style(bgcolor=table["panel"])
    found["band"] = Style(bgcolor=table["panel"])
    found["key"] = Style(color=table["head"], bold=True)
    found["here"] = Style(color=table["paper"], bgcolor=table["head"], bold=True)
    found["demo"] = Style(color=table["paper"], bgcolor=table["warn"], bold=True)
    found["title"] = Style(color=table["head"], bold=True, underline=True)
    return found


def _bare() -> dict[str, Style]:
    found = {name: Style(bold=name in BOLD or None) for name in DARK}
    found |= {
        "cursor": Style(reverse=True),
        "cursor-away": Style(underline=True),
        "band": Style(underline=True),
        "key": Style(bold=True),
    }
    found |= {"here": Style(reverse=True), "demo": Style(reverse=True), "title": Style(bold=True, underline=True)}
    return found


def strip_of(line: Line, width: int, table: Mapping[str, Style], under: Style | None = None) -> Strip:
    """A line as a strip of exactly *width* cells; *under* lies beneath every piece."""
    plain = table["text"]
    segments = [
        Segment(text, _style(ink, table, plain) + under if under else _style(ink, table, plain))
        for text, ink in line
        if text
    ]
    strip = Strip(segments).simplify()
    fill = under if under is not None else Style()
    return strip.adjust_cell_length(width, fill)


def _style(ink: str, table: Mapping[str, Style], plain: Style) -> Style:
    return table.get(ink, plain)


def text_of(lines: Iterable[Line]) -> str:
    """Lines as plain text, for copying and files."""
    return "\n".join("".join(text for text, _ in line).rstrip() for line in lines)
