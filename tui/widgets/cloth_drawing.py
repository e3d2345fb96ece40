"""Cloth drawn to scale as lines of text: plan view and section, asked and offered to one scale.

Pure: constructions in, text out. Braille dots (two by four to a character) or plain ASCII.
"""

from collections.abc import Callable, Sequence
from dataclasses import dataclass
from math import ceil, cos, floor, hypot, log10, pi, sqrt

from catalog.construction import Construction, Weave

DOT_BITS = ((0x01, 0x08), (0x02, 0x10), (0x04, 0x20), (0x40, 0x80))
BRAILLE = 0x2800
GAP = 3
PITCHES_SHOWN = 2.6
OUTLINED_FROM_PX = 3.0
OPENING, WARP, WEFT, PARTICLE = 0, 1, 2, 3
Raster = list[list[tuple[int, int]]]
"""Rows of (kind, number of the wire)."""


@dataclass(frozen=True, slots=True)
class Figure:
    """A construction in floats, with how far its wires swing. mm."""

    weave: Weave
    warp_pitch: float
    weft_pitch: float
    warp_wire: float
    weft_wire: float

    @property
    def swing(self) -> tuple[float, float]:
        """How far warp and weft leave the middle plane: crowns flush, or one set straight in filter cloth."""
        if self.weave in (Weave.PLAIN_DUTCH, Weave.TWILLED_DUTCH):
            return 0.0, (self.warp_wire + self.weft_wire) / 2
        if self.weave is Weave.REVERSE_PLAIN_DUTCH:
            return (self.warp_wire + self.weft_wire) / 2, 0.0
        return self.weft_wire / 2, self.warp_wire / 2

    @property
    def thickness(self) -> float:
        """Over all, mm."""
        warp, weft = self.swing
        return 2 * max(warp + self.warp_wire / 2, weft + self.weft_wire / 2)

    def weft_is_over(self, warp: int, weft: int) -> bool:
        """True where the weft lies on top at this crossing."""
        if self.weave in (Weave.TWILLED, Weave.TWILLED_DUTCH):
            return (warp - weft) % 4 in (0, 1)
        return (warp + weft) % 2 == 0


def figure(construction: Construction) -> Figure:
    """The numbers that a drawing needs."""
    warp, weft = construction.warp, construction.weft
    return Figure(
        construction.weave, float(warp.pitch_mm), float(weft.pitch_mm), float(warp.wire_mm), float(weft.wire_mm)
    )


def draw(
    panels: Sequence[tuple[str, Construction]],
    width: int,
    height: int,
    *,
    ascii_only: bool = False,
    particle_mm: float | None = None,
) -> list[str]:
    """Draw one or two constructions, each under its title, in at most *width* × *height* characters.

    All to one scale, which a bar at the foot states. A particle of *particle_mm* is drawn in an opening.
    Too small a place gives an empty list.
    """
    room = (width - GAP * (len(panels) - 1)) // max(1, len(panels))
    if not panels or room < 12 or height < 8:
        return []
    canvas = ASCII if ascii_only else DOTS
    figures = [figure(c) for _, c in panels]
    section_rows, scale = _scale(figures, room, height - 3, canvas)
    plan_rows = height - 3 - section_rows
    drawn = [
        _panel(title, one, room, plan_rows, section_rows, scale, canvas, particle_mm)
        for (title, _), one in zip(panels, figures, strict=True)
    ]
    lines = [(" " * GAP).join(parts).rstrip() for parts in zip(*drawn, strict=True)]
    return [*lines, _bar(scale, room, canvas)]


@dataclass(frozen=True, slots=True)
class Canvas:
    """How pixels become characters."""

    columns: int
    """Pixels to a character sideways."""
    rows: int
    tall: float
    """Height of a pixel over its width."""
    write: Callable[[Raster], list[str]]
    bar: tuple[str, str, str]


def _scale(figures: Sequence[Figure], room: int, rows: int, canvas: Canvas) -> tuple[int, float]:
    """Rows for the section and millimetres a pixel, so that some pitches show of every figure."""
    across = max(f.warp_pitch for f in figures) * PITCHES_SHOWN / (room * canvas.columns)
    along = max(f.weft_pitch for f in figures) * PITCHES_SHOWN / (rows * 0.62 * canvas.rows * canvas.tall)
    scale = max(across, along)
    thick = max(f.thickness for f in figures)
    needed = ceil(thick / (scale * canvas.tall * canvas.rows))
    most = max(1, rows // 2)
    if needed > most:
        return most, thick / (most * canvas.rows * canvas.tall)
    return needed, scale


def _panel(
    title: str,
    one: Figure,
    room: int,
    plan_rows: int,
    section_rows: int,
    scale: float,
    canvas: Canvas,
    particle_mm: float | None,
) -> list[str]:
    plan = plan_raster(one, room * canvas.columns, plan_rows * canvas.rows, scale, canvas.tall, particle_mm)
    section = section_raster(one, room * canvas.columns, section_rows * canvas.rows, scale, canvas.tall)
    cut = "section across the weft" if one.weave is Weave.REVERSE_PLAIN_DUTCH else "section across the warp"
    lines = [title[:room], *canvas.write(plan), cut[:room], *canvas.write(section)]
    return [line.ljust(room) for line in lines]


def _wave(signs: Callable[[int], bool], place: float, pitch: float) -> float:
    """Height between −1 and 1 of a wire that passes crossings every *pitch*, over or under."""
    number = floor(place / pitch)
    start, end = (1.0 if signs(number) else -1.0), (1.0 if signs(number + 1) else -1.0)
    share = place / pitch - number
    return start + (end - start) * (1 - cos(pi * share)) / 2


def plan_raster(
    one: Figure, columns: int, rows: int, scale: float, tall: float = 1.0, particle_mm: float | None = None
) -> Raster:
    """What is seen from above: at each pixel the wire on top, or the opening. Scale in mm a pixel."""
    raster: Raster = []
    for row in range(rows):
        y = (row + 0.5) * scale * tall
        raster.append([_top(one, (column + 0.5) * scale, y) for column in range(columns)])
    if particle_mm:
        _put_particle(raster, one, scale, tall, particle_mm)
    return raster


def _top(one: Figure, x: float, y: float) -> tuple[int, int]:
    """The wire whose surface is highest at this point. Wires lie half a pitch in from the corner."""
    warp_swing, weft_swing = one.swing
    best, found = -1e9, (OPENING, 0)
    for warp in _near(x, one.warp_pitch, one.warp_wire):
        off = x - (warp + 0.5) * one.warp_pitch
        rise = -warp_swing * _along_warp(one, warp, y)
        height = rise + sqrt(max(0.0, (one.warp_wire / 2) ** 2 - off * off))
        if height > best:
            best, found = height, (WARP, warp)
    for weft in _near(y, one.weft_pitch, one.weft_wire):
        off = y - (weft + 0.5) * one.weft_pitch
        rise = weft_swing * _along_weft(one, weft, x)
        height = rise + sqrt(max(0.0, (one.weft_wire / 2) ** 2 - off * off))
        if height > best:
            best, found = height, (WEFT, weft)
    return found


def _along_warp(one: Figure, warp: int, y: float) -> float:
    return _wave(lambda weft: one.weft_is_over(warp, weft), y - one.weft_pitch / 2, one.weft_pitch)


def _along_weft(one: Figure, weft: int, x: float) -> float:
    return _wave(lambda warp: one.weft_is_over(warp, weft), x - one.warp_pitch / 2, one.warp_pitch)


def _near(place: float, pitch: float, wire: float) -> list[int]:
    """The wires that cover *place*: none, one, or several where they overlap."""
    first = ceil((place - wire / 2) / pitch - 0.5)
    last = floor((place + wire / 2) / pitch - 0.5)
    return list(range(first, last + 1))


def _put_particle(raster: Raster, one: Figure, scale: float, tall: float, particle_mm: float) -> None:
    """A ring of the particle's diameter in the opening next to the middle."""
    columns, rows = len(raster[0]), len(raster)
    x0 = round(columns * scale / 2 / one.warp_pitch) * one.warp_pitch
    y0 = round(rows * scale * tall / 2 / one.weft_pitch) * one.weft_pitch
    for row in range(rows):
        for column in range(columns):
            gone = hypot((column + 0.5) * scale - x0, (row + 0.5) * scale * tall - y0)
            if abs(gone - particle_mm / 2) <= scale * max(1.0, tall) * 0.6:
                raster[row][column] = (PARTICLE, 0)


def section_raster(one: Figure, columns: int, rows: int, scale: float, tall: float = 1.0) -> Raster:
    """A cut across the warp (reverse Dutch: across the weft) along the middle of one crossing wire."""
    turned = one.weave is Weave.REVERSE_PLAIN_DUTCH
    pitch, thick = (one.weft_pitch, one.weft_wire) if turned else (one.warp_pitch, one.warp_wire)
    thin = one.warp_wire if turned else one.weft_wire
    swing = one.swing if not turned else one.swing[::-1]
    ends, runs = (WEFT, WARP) if turned else (WARP, WEFT)
    middle = rows * scale * tall / 2

    def over(i: int) -> bool:
        return one.weft_is_over(i, 0)

    raster: Raster = []
    for row in range(rows):
        z = middle - (row + 0.5) * scale * tall
        line: list[tuple[int, int]] = []
        for column in range(columns):
            x = (column + 0.5) * scale
            line.append(_cut_at(x, z, pitch, thick, thin, swing, over, ends, runs, scale))
        raster.append(line)
    return raster


def _cut_at(
    x: float,
    z: float,
    pitch: float,
    thick: float,
    thin: float,
    swing: tuple[float, float],
    over: Callable[[int], bool],
    ends: int,
    runs: int,
    scale: float,
) -> tuple[int, int]:
    for wire in _near(x, pitch, thick):
        centre = -swing[0] * (1.0 if over(wire) else -1.0)
        if hypot(x - (wire + 0.5) * pitch, z - centre) <= thick / 2:
            return ends, wire
    rise = swing[1] * _wave(over, x - pitch / 2, pitch)
    slope = (swing[1] * _wave(over, x + scale - pitch / 2, pitch) - rise) / scale
    return (runs, 0) if abs(z - rise) <= thin / 2 * sqrt(1 + min(slope * slope, 3.0)) else (OPENING, 0)


def _is_edge(raster: Raster, row: int, column: int) -> bool:
    """True where the next pixel right or below belongs to another wire: left blank, so that wires part."""
    here = raster[row][column]
    right = raster[row][column + 1] if column + 1 < len(raster[row]) else here
    below = raster[row + 1][column] if row + 1 < len(raster) else here
    return any(other != here and other[0] != OPENING for other in (right, below))


def write_dots(raster: Raster) -> list[str]:
    """Braille characters, two by four pixels each; rows and columns are padded with nothing."""
    lines = []
    for top in range(0, len(raster), 4):
        line = []
        for left in range(0, len(raster[top]), 2):
            line.append(chr(BRAILLE + _dots(raster, top, left)))
        lines.append("".join(line))
    return lines


def _dots(raster: Raster, top: int, left: int) -> int:
    bits = 0
    for row in range(4):
        for column in range(2):
            inside = top + row < len(raster) and left + column < len(raster[top])
            if inside and raster[top + row][left + column][0] != OPENING:
                kind = raster[top + row][left + column][0]
                if kind == PARTICLE or not _is_edge(raster, top + row, left + column):
                    bits |= DOT_BITS[row][column]
    return bits


def write_ascii(raster: Raster) -> list[str]:
    """One character a pixel: '|' warp, '=' weft, 'o' particle, blank opening."""
    return ["".join(" |=o"[kind] for kind, _ in line) for line in raster]


def _bar(scale: float, room: int, canvas: Canvas) -> str:
    """A bar of a round length, about a third of a panel long, with its length in both units."""
    target = room * canvas.columns * scale / 3
    power = 10.0 ** floor(log10(target))
    length = max(step * power for step in (1, 2, 5) if step * power <= target)
    cells = max(3, round(length / scale / canvas.columns))
    left, line, right = canvas.bar
    drawn = length if cells == round(length / scale / canvas.columns) else cells * canvas.columns * scale
    inches = f"{drawn / 25.4:.3g}"
    inches = inches[1:] if inches.startswith("0.") else inches
    return f"{left}{line * (cells - 2)}{right} {drawn:.3g} mm ({inches} in)"


DOTS = Canvas(2, 4, 1.0, write_dots, ("├", "─", "┤"))
ASCII = Canvas(1, 1, 2.0, write_ascii, ("|", "-", "|"))
