"""A cut lot drawn in lines of text: the cloth lies with its length from left to right, its width from top to bottom."""

from dataclasses import dataclass

from catalog.stock.cutting_pieces import mm_text
from catalog.stock.layout import LotCut, Placement, Rest, letter

COLUMNS = 80
ROWS = 20
CELL_HEIGHT = 2.0
"""A character is about twice as high as wide."""
NEVER_WIDER_THAN = 3.0
"""Rows are stretched where a scale alike both ways would leave fewer than a third of them."""
UP, DOWN, LEFT, RIGHT = 1, 2, 4, 8
STROKES = " ╵╷│╴┘┐┤╶└┌├─┴┬┼"
ASCII_STROKES = " |||-+++-+++-+++"


@dataclass(frozen=True, slots=True)
class Scale:
    """What one character stands for, mm."""

    column_mm: float
    row_mm: float

    @property
    def is_alike(self) -> bool:
        """Whether both ways have one scale."""
        return abs(self.row_mm / self.column_mm / CELL_HEIGHT - 1) < 0.05


def drawing(cut: LotCut, columns: int = COLUMNS, rows: int = ROWS, is_ascii: bool = False) -> tuple[str, ...]:
    """The part of the lot that the cut takes, with its pieces by letter, remnants by size; then scale and legend.

    No line is longer than *columns*; the picture has at most *rows* + 1 lines, scale and legend come below it.
    """
    length = _drawn_length(cut)
    if not cut.placements or length <= 0:
        return (f"{cut.lot.id}: nothing to draw.",)
    scale = _scale(length, cut.width_mm, columns - 1, rows)
    canvas = _Canvas(columns, round(cut.width_mm / scale.row_mm) + 1)
    canvas.box(_cells(Rest(0, 0, cut.width_mm, length), scale, canvas))
    for rest in (*cut.remnants, *cut.scraps):
        canvas.box(_cells(_clipped(rest, length), scale, canvas))
    for placement in cut.placements:
        _draw(canvas, placement, scale)
    for rest in cut.remnants:
        canvas.write(_cells(_clipped(rest, length), scale, canvas), f"rest {rest.text}")
    picture = canvas.lines(is_ascii)
    return tuple(_plain(line) if is_ascii else line for line in (*picture, *_below(cut, scale, length, columns)))


def _drawn_length(cut: LotCut) -> float:
    """All of the lot, unless what is taken would be squeezed: then a quarter of the picture is left for the rest."""
    return min(cut.length_mm, cut.taken_mm * 4 / 3) if cut.taken_mm < cut.length_mm / 2 else cut.length_mm


def _scale(length: float, width: float, columns: int, rows: int) -> Scale:
    column = max(length / columns, width / (rows * CELL_HEIGHT))
    row = max(column * CELL_HEIGHT, width / rows)
    if width / row < rows / NEVER_WIDER_THAN:
        row = width * NEVER_WIDER_THAN / rows
    return Scale(column, row)


def _clipped(rest: Rest, length: float) -> Rest:
    return Rest(rest.x_mm, rest.y_mm, rest.width_mm, max(0.0, min(rest.length_mm, length - rest.y_mm)))


Cells = tuple[int, int, int, int]
"""Left, top, right, bottom."""


def _cells(part: Rest | Placement, scale: Scale, canvas: "_Canvas") -> Cells:
    left, right = part.y_mm / scale.column_mm, (part.y_mm + part.length_mm) / scale.column_mm
    top, bottom = part.x_mm / scale.row_mm, (part.x_mm + part.width_mm) / scale.row_mm
    return (
        min(round(left), canvas.columns - 1),
        min(round(top), canvas.rows - 1),
        min(round(right), canvas.columns - 1),
        min(round(bottom), canvas.rows - 1),
    )


def _draw(canvas: "_Canvas", placement: Placement, scale: Scale) -> None:
    cells = _cells(placement, scale, canvas)
    mark = letter(placement.piece)
    if not placement.is_offset:
        canvas.box(cells)
    canvas.write(cells, f"({mark})" if placement.is_disc else mark)


class _Canvas:
    """Characters made of strokes that join where boxes share an edge, and words over them."""

    def __init__(self, columns: int, rows: int) -> None:
        self.columns, self.rows = columns, rows
        self._strokes = [[0] * columns for _ in range(rows)]
        self._words: dict[tuple[int, int], str] = {}

    def box(self, cells: Cells) -> None:
        """Outline; a box that is less than a character wide or high is a line."""
        left, top, right, bottom = cells
        for row in {top, bottom}:
            for column in range(left, right):
                self._strokes[row][column] |= RIGHT
                self._strokes[row][column + 1] |= LEFT
        for column in {left, right}:
            for row in range(top, bottom):
                self._strokes[row][column] |= DOWN
                self._strokes[row + 1][column] |= UP

    def write(self, cells: Cells, words: str) -> None:
        """*words* in the middle; the first letter alone, or nothing, where there is no room."""
        left, top, right, bottom = cells
        for text in (words, words.strip("()")[:1] if len(words) <= 4 else ""):
            if text and len(text) < right - left and bottom - top > 1:
                start, row = (left + right + 1 - len(text)) // 2, (top + bottom) // 2
                self._words.update({(row, start + i): sign for i, sign in enumerate(text)})
                return

    def lines(self, is_ascii: bool) -> list[str]:
        """The picture, without spaces at line ends."""
        signs = ASCII_STROKES if is_ascii else STROKES
        return [
            "".join(self._sign(row, column, signs) for column in range(self.columns)).rstrip()
            for row in range(self.rows)
        ]

    def _sign(self, row: int, column: int, signs: str) -> str:
        return self._words.get((row, column)) or signs[self._strokes[row][column]]


def _below(cut: LotCut, scale: Scale, length: float, columns: int) -> list[str]:
    said = [f"One column is {scale.column_mm:.3g} mm along the cloth, one line {scale.row_mm:.3g} mm across it."]
    if not scale.is_alike:
        said.append("The width is drawn larger than the length.")
    if length < cut.length_mm:
        said.append(f"Drawn: the first {mm_text(round(length))} of {mm_text(cut.length_mm)} mm.")
    for index, (piece, count) in enumerate(zip(cut.pieces, cut.placed, strict=True)):
        if count:
            label = f", {piece.label}" if piece.label else ""
            said.append(f"{letter(index)}  {count} × {piece.size_text}{label}")
    return [line if len(line) <= columns else line[: columns - 1] + "…" for line in said]


def _plain(line: str) -> str:
    for sign, plain in (("×", "x"), ("Ø ", "dia "), ("Ø", "dia"), ("…", "."), ("²", "2")):
        line = line.replace(sign, plain)
    return line.encode("ascii", "replace").decode("ascii")
