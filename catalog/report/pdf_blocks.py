"""Blocks of a PDF page: each knows its height before it is drawn, so that a page can be fitted first.

All measures are points (1/72 in), y upwards as PDF has it; a block is drawn from its top left corner down.
"""

from collections.abc import Callable, Sequence
from dataclasses import dataclass
from typing import Any

from catalog.report.pdf_letters import BOLD, REGULAR, printable

LEADING = 1.22
PAD = 1.6
LINE = 0.4
Canvas = Any
"""The PDF library's canvas; it comes without types."""


@dataclass(frozen=True, slots=True)
class Block:
    """Something of a height, to be drawn at (canvas, left, top)."""

    height: float
    draw: Callable[[Canvas, float, float], None]


def text_width(text: str, font: str, size: float) -> float:
    """Width of a line, points."""
    from reportlab.pdfbase.pdfmetrics import stringWidth  # type: ignore[import-untyped]

    return float(stringWidth(text, font, size))


def wrapped(text: str, font: str, size: float, width: float) -> list[str]:
    """*text* in lines of at most *width*; a word that is longer than a line is broken."""
    lines: list[str] = []
    line = ""
    for word in printable(text).split():
        longer = f"{line} {word}" if line else word
        if text_width(longer, font, size) <= width:
            line = longer
            continue
        if line:
            lines.append(line)
        *whole, line = _broken(word, font, size, width)
        lines += whole
    return [*lines, line] if line or not lines else lines


def _broken(word: str, font: str, size: float, width: float) -> list[str]:
    parts = [""]
    for char in word:
        if parts[-1] and text_width(parts[-1] + char, font, size) > width:
            parts.append("")
        parts[-1] += char
    return parts


def text_block(text: str, size: float, width: float, font: str = REGULAR, is_boxed: bool = False) -> Block:
    """A paragraph; boxed where it must be seen."""
    inset = 3.0 if is_boxed else 0.0
    lines = wrapped(text, font, size, width - 2 * inset)
    height = len(lines) * size * LEADING + 2 * inset

    def draw(canvas: Canvas, left: float, top: float) -> None:
        _write(canvas, lines, font, size, left + inset, top - inset)
        if is_boxed:
            canvas.setLineWidth(1.2)
            canvas.rect(left, top - height, width, height)

    return Block(height, draw)


def table_block(
    cells: Sequence[Sequence[str]],
    widths: Sequence[float],
    size: float,
    *,
    has_head: bool,
    least: float = 0.0,
    bold: tuple[int, ...] = (0,),
) -> Block:
    """A ruled table; its first row in bold where it has a head, its *bold* columns always.

    Rows below the head are at least *least* high.
    """
    laid = [
        _row(row, widths, size, range(len(row)) if number == 0 and has_head else bold)
        for number, row in enumerate(cells)
    ]
    heights = [max(len(lines) for lines, _ in row) * size * LEADING + PAD for row in laid]
    heights = [height if n == 0 and has_head else max(least, height) for n, height in enumerate(heights)]

    def draw(canvas: Canvas, left: float, top: float) -> None:
        canvas.setLineWidth(LINE)
        for row, height in zip(laid, heights, strict=True):
            x = left
            for (lines, font), width in zip(row, widths, strict=True):
                canvas.rect(x, top - height, width, height)
                _write(canvas, lines, font, size, x + PAD, top - PAD / 2)
                x += width
            top -= height

    return Block(sum(heights), draw)


def _row(row: Sequence[str], widths: Sequence[float], size: float, bold: Sequence[int]) -> list[tuple[list[str], str]]:
    fonts = [BOLD if column in bold else REGULAR for column in range(len(row))]
    cells = zip(row, fonts, widths, strict=True)
    return [(wrapped(text, font, size, width - 2 * PAD), font) for text, font, width in cells]


def _write(canvas: Canvas, lines: Sequence[str], font: str, size: float, left: float, top: float) -> None:
    canvas.setFont(font, size)
    for number, line in enumerate(lines):
        canvas.drawString(left, top - size * (0.95 + LEADING * number), line)


def stacked(blocks: Sequence[Block], gap: float = 0.0) -> Block:
    """Blocks one under the other."""

    def draw(canvas: Canvas, left: float, top: float) -> None:
        for block in blocks:
            block.draw(canvas, left, top)
            top -= block.height + gap

    return Block(sum(block.height for block in blocks) + gap * max(0, len(blocks) - 1), draw)
