"""Aperture against open area: the catalogue as dots, the target with its tolerance box, candidates by letter.

Pure: points in, lines out. The aperture's axis is logarithmic.
"""

from collections.abc import Sequence
from dataclasses import dataclass
from math import exp, log

from tui.presenting import Line, Piece, fit, significant

LETTERS = "abcdefghijklmnopqrstuvwxyz"
BRAILLE = 0x2800
DOT_BITS = ((0x01, 0x08), (0x02, 0x10), (0x04, 0x20), (0x40, 0x80))
LEFT = 5
FOOT = 2


@dataclass(frozen=True, slots=True)
class Spot:
    """A cloth in the plane of aperture (mm) and open area (%)."""

    aperture_mm: float
    open_area_pct: float
    name: str
    letter: str = ""
    ink: str = "muted"


@dataclass(frozen=True, slots=True)
class Frame:
    """Which part of the plane is shown, on how many cells."""

    x0: float
    x1: float
    y0: float
    y1: float
    columns: int
    rows: int

    def cell(self, aperture_mm: float, open_area_pct: float) -> tuple[float, float] | None:
        """Column and row, as fractions of cells from the upper left; None outside."""
        x = (log(aperture_mm) - log(self.x0)) / (log(self.x1) - log(self.x0))
        y = (self.y1 - open_area_pct) / (self.y1 - self.y0)
        if not (0 <= x < 1 and 0 <= y < 1):
            return None
        return x * self.columns, y * self.rows


@dataclass(frozen=True, slots=True)
class Aim:
    """What is asked: where it lies and how far its aperture may be off. mm, %."""

    aperture_mm: float
    open_area_pct: float | None
    tolerance_mm: float
    open_area_points: float = 3.0


def frame_of(aim: Aim, spots: Sequence[Spot], columns: int, rows: int) -> Frame:
    """A part of the plane that holds the aim and the lettered spots, with some room around."""
    lettered = [s for s in spots if s.letter] or list(spots)
    xs = [aim.aperture_mm, *(s.aperture_mm for s in lettered)]
    ys = [*(s.open_area_pct for s in lettered)]
    if aim.open_area_pct is not None:
        ys.append(aim.open_area_pct)
    x0, x1 = min(*xs, aim.aperture_mm - 2 * aim.tolerance_mm), max(*xs, aim.aperture_mm + 2 * aim.tolerance_mm)
    room = max(1.05, (x1 / x0) ** 0.08)
    y0, y1 = max(0.0, min(ys, default=0.0) - 4), min(100.0, max(ys, default=100.0) + 4)
    return Frame(x0 / room, x1 * room, y0, y1, columns, rows)


def plot_lines(
    aim: Aim, spots: Sequence[Spot], chosen: Spot | None, width: int, height: int, ascii_only: bool
) -> list[Line]:
    """The plot in *width* × *height* characters, with axes and one line about the chosen spot."""
    columns, rows = width - LEFT - 1, height - FOOT - 1
    if columns < 20 or rows < 6:
        return [(("Too little room for a plot: make the window larger.", "muted"),)]
    frame = frame_of(aim, spots, columns, rows)
    cells: list[list[Piece]] = [[(" ", "text")] * columns for _ in range(rows)]
    _put_dots(cells, frame, [s for s in spots if not s.letter], ascii_only)
    _put_box(cells, frame, aim, ascii_only)
    for spot in reversed([s for s in spots if s.letter]):
        _put(cells, frame, spot.aperture_mm, spot.open_area_pct, (spot.letter, spot.ink))
    if aim.open_area_pct is not None:
        _put(cells, frame, aim.aperture_mm, aim.open_area_pct, ("O", "strong"))
    if chosen is not None:
        _put(cells, frame, chosen.aperture_mm, chosen.open_area_pct, (chosen.letter or "@", "cursor"))
    lines: list[Line] = []
    for row, line in enumerate(cells):
        lines.append([(_y_label(frame, row), "muted"), ("|" if ascii_only else "│", "line"), *line])
    return [*lines, *_x_axis(frame, ascii_only), _legend(chosen, width)]


def _put(cells: list[list[Piece]], frame: Frame, aperture: float, open_area: float, piece: Piece) -> None:
    if (at := frame.cell(aperture, open_area)) is not None:
        cells[int(at[1])][int(at[0])] = piece


def _put_dots(cells: list[list[Piece]], frame: Frame, spots: Sequence[Spot], ascii_only: bool) -> None:
    bits: dict[tuple[int, int], int] = {}
    for spot in spots:
        at = frame.cell(spot.aperture_mm, spot.open_area_pct)
        if at is not None:
            column, row = int(at[0]), int(at[1])
            bit = DOT_BITS[int((at[1] - row) * 4)][int((at[0] - column) * 2)]
            bits[row, column] = bits.get((row, column), 0) | bit
    for (row, column), value in bits.items():
        cells[row][column] = ("." if ascii_only else chr(BRAILLE + value), "muted")


def _put_box(cells: list[list[Piece]], frame: Frame, aim: Aim, ascii_only: bool) -> None:
    """The tolerance on the aperture, and on the open area where one was asked."""
    low = max(aim.aperture_mm - aim.tolerance_mm, frame.x0 * 1.0001)
    high = min(aim.aperture_mm + aim.tolerance_mm, frame.x1 * 0.9999)
    middle = aim.open_area_pct if aim.open_area_pct is not None else (frame.y0 + frame.y1) / 2
    reach = aim.open_area_points if aim.open_area_pct is not None else (frame.y1 - frame.y0) / 2
    top, bottom = min(middle + reach, frame.y1 - 1e-6), max(middle - reach, frame.y0 + 1e-6)
    left, right = (frame.cell(x, middle) for x in (low, high))
    upper, lower = (frame.cell(aim.aperture_mm, y) for y in (top, bottom))
    if not (left and right and upper and lower):
        return
    down, across = (":", "-") if ascii_only else ("┊", "┄")
    for row in range(int(upper[1]), int(lower[1]) + 1):
        for column in (int(left[0]), int(right[0])):
            cells[row][column] = (down, "head")
    for column in range(int(left[0]) + 1, int(right[0])):
        for row in (int(upper[1]), int(lower[1])):
            cells[row][column] = (across, "head")


def _y_label(frame: Frame, row: int) -> str:
    if row % 4:
        return " " * LEFT
    value = frame.y1 - (row + 0.5) / frame.rows * (frame.y1 - frame.y0)
    return fit(f"{value:.0f}%", LEFT - 1, "right") + " "


def _x_axis(frame: Frame, ascii_only: bool) -> list[Line]:
    marks = [" "] * (frame.columns + LEFT + 1)
    for share in (0.0, 0.25, 0.5, 0.75):
        text = significant(exp(log(frame.x0) + share * (log(frame.x1) - log(frame.x0))), 3)
        start = LEFT + 1 + int(share * frame.columns)
        marks[start : start + len(text)] = list(text)
    unit = "mm aperture"
    marks[-len(unit) :] = list(unit)
    rule = ("+" if ascii_only else "└") + ("-" if ascii_only else "─") * frame.columns
    return [((" " * LEFT + rule, "line"),), (("".join(marks), "muted"),)]


def _legend(chosen: Spot | None, width: int) -> Line:
    if chosen is None:
        return ((fit("O asked, box its tolerance; letters: candidates in order; arrows move", width), "muted"),)
    where = f"{significant(chosen.aperture_mm)} mm, {chosen.open_area_pct:.1f} % open"
    name = f"{chosen.letter}: {chosen.name}" if chosen.letter else chosen.name
    return ((fit(f"{name}  {where}   Enter takes it", width), "strong"),)


def next_spot(spots: Sequence[Spot], frame: Frame, chosen: Spot | None, across: int, up: int) -> Spot | None:
    """The nearest spot in the direction of an arrow key; the present one where there is none."""
    placed = [(spot, at) for spot in spots if (at := frame.cell(spot.aperture_mm, spot.open_area_pct))]
    if not placed:
        return None
    here = next((at for spot, at in placed if spot == chosen), None)
    if here is None:
        return placed[0][0]
    best, found = float("inf"), chosen
    for spot, (x, y) in placed:
        ahead = (x - here[0]) * across / 2 - (y - here[1]) * up
        aside = abs(y - here[1]) if across else abs(x - here[0]) / 2
        if spot != chosen and ahead > 1e-9 and ahead + 2 * aside < best:
            best, found = ahead + 2 * aside, spot
    return found
