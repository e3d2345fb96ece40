"""Asked and offered cloth drawn to one scale: plan and section as simple shapes, for whoever puts ink on paper.

Pure data. Paper millimetres, origin top left, y downwards; shapes may reach over a panel's edge: clip them.
"""

from collections.abc import Iterator
from dataclasses import dataclass
from fractions import Fraction
from itertools import pairwise
from math import ceil, cos, pi

from catalog.construction import Construction, Weave

PANEL_WIDTH, PLAN_HEIGHT, SECTION_HEIGHT = 84.0, 30.0, 11.0
PITCHES_SHOWN = 3.0
MOST_WIRES = 60
"""Wires of one direction in a panel; more can't be told apart on paper."""
PREFERRED = tuple(step * 10.0**power for power in range(-4, 4) for step in (1, 2, 5))
"""Scales of ISO 5455 (from memory): 1, 2, 5 and their decimal multiples."""
STEPS = 12
INK = {"warp": "#8496a8", "weft": "#e4dcc8"}
"""Colours that stay apart in black and white: warp dark, weft light."""


@dataclass(frozen=True, slots=True)
class Bar:
    """A straight wire seen from the side, or a stretch of it; its long edges are outlined."""

    x: float
    y: float
    width: float
    height: float
    part: str
    """'warp' or 'weft'."""
    is_upright: bool


@dataclass(frozen=True, slots=True)
class Disc:
    """A wire cut across."""

    x: float
    y: float
    radius: float
    part: str


@dataclass(frozen=True, slots=True)
class Ribbon:
    """A wire along its wave: the middle line and the wire's thickness."""

    points: tuple[tuple[float, float], ...]
    thickness: float
    part: str


Shape = Bar | Disc | Ribbon


@dataclass(frozen=True, slots=True)
class Panel:
    """One picture; *note* says why it is empty, where it is."""

    title: str
    width: float
    height: float
    shapes: tuple[Shape, ...] = ()
    note: str = ""


@dataclass(frozen=True, slots=True)
class Drawing:
    """Plan and section of each cloth, all to one scale."""

    plans: tuple[Panel, ...]
    sections: tuple[Panel, ...]
    scale: float
    """Paper over cloth: 20 means 20 : 1. 0 where nothing could be drawn."""
    bar_mm: float
    """Length of the scale bar on the cloth, mm."""

    @property
    def bar_on_paper(self) -> float:
        """Length of the scale bar on paper, mm."""
        return self.bar_mm * self.scale

    @property
    def scale_words(self) -> str:
        """'Scale 20 : 1, bar 1 mm (0.0394 in); warp dark, weft light'."""
        if not self.scale:
            return "Nothing to draw"
        ratio = f"{self.scale:g} : 1" if self.scale >= 1 else f"1 : {1 / self.scale:g}"
        return f"Scale {ratio}, bar {self.bar_mm:g} mm ({self.bar_mm / 25.4:.3g} in); warp dark, weft light"


def draw(cloths: tuple[tuple[str, Construction | None], ...]) -> Drawing:
    """Draw each (title, construction); None stands for a cloth of which too little was asked."""
    known = [made for _, made in cloths if made is not None]
    if not known:
        return Drawing(tuple(_empty(title, PLAN_HEIGHT) for title, _ in cloths), (), 0.0, 0.0)
    scale = _scale(known)
    plans = tuple(plan(title, made, scale) for title, made in cloths)
    sections = tuple(section(made, scale) for _, made in cloths)
    bar = max(step for step in PREFERRED if step * scale <= PANEL_WIDTH / 3)
    return Drawing(plans, sections, scale, bar)


def plan(title: str, made: Construction | None, scale: float) -> Panel:
    """Seen from above: warp upright, weft across, each on top where the weave has it."""
    if made is None:
        return _empty(title, PLAN_HEIGHT)
    if _is_too_fine(made, scale):
        return Panel(title, PANEL_WIDTH, PLAN_HEIGHT, (), "too fine to be drawn at this scale")
    return Panel(title, PANEL_WIDTH, PLAN_HEIGHT, tuple(_plan_shapes(made, scale)))


def section(made: Construction | None, scale: float) -> Panel:
    """Cut along one weft, across the warp; reverse Dutch is cut along one warp, across the weft."""
    turned = made is not None and made.weave is Weave.REVERSE_PLAIN_DUTCH
    title = "section across the weft" if turned else "section across the warp"
    if made is None or _is_too_fine(made, scale):
        return Panel(title, PANEL_WIDTH, SECTION_HEIGHT)
    return Panel(title, PANEL_WIDTH, SECTION_HEIGHT, tuple(_section_shapes(made, scale)))


def swing_mm(made: Construction) -> tuple[float, float]:
    """How far warp and weft leave the middle plane, mm: crowns flush, or the stiff wire straight in filter cloth."""
    warp, weft = float(made.warp.wire_mm), float(made.weft.wire_mm)
    if made.weave in (Weave.PLAIN_DUTCH, Weave.TWILLED_DUTCH):
        return 0.0, (warp + weft) / 2
    if made.weave is Weave.REVERSE_PLAIN_DUTCH:
        return (warp + weft) / 2, 0.0
    return weft / 2, warp / 2


def is_weft_over(weave: Weave, warp: int, weft: int) -> bool:
    """True where the weft lies on top at this crossing: 1/1 in plain, 2/2 in twilled weaves."""
    if weave in (Weave.TWILLED, Weave.TWILLED_DUTCH):
        return (warp - weft) % 4 in (0, 1)
    return (warp + weft) % 2 == 0


def _empty(title: str, height: float) -> Panel:
    return Panel(title, PANEL_WIDTH, height, (), "not drawn: not asked in full (pitch and wire both ways)")


def _scale(known: list[Construction]) -> float:
    across = max(float(made.warp.pitch_mm) for made in known)
    along = max(float(made.weft.pitch_mm) for made in known)
    thick = max(_thickness(made) for made in known)
    fitting = min(
        PANEL_WIDTH / across / PITCHES_SHOWN, PLAN_HEIGHT / along / PITCHES_SHOWN * 1.5, SECTION_HEIGHT / thick
    )
    return max((step for step in PREFERRED if step <= fitting), default=PREFERRED[0])


def _thickness(made: Construction) -> float:
    warp, weft = swing_mm(made)
    return max(2 * warp + float(made.warp.wire_mm), 2 * weft + float(made.weft.wire_mm))


def _is_too_fine(made: Construction, scale: float) -> bool:
    return _many(PANEL_WIDTH, made.warp.pitch_mm, scale) > MOST_WIRES or (
        _many(PLAN_HEIGHT, made.weft.pitch_mm, scale) > MOST_WIRES
    )


def _many(room: float, pitch_mm: Fraction, scale: float) -> int:
    return ceil(room / (float(pitch_mm) * scale)) + 1


def _plan_shapes(made: Construction, scale: float) -> Iterator[Shape]:
    p1, d1 = float(made.warp.pitch_mm) * scale, float(made.warp.wire_mm) * scale
    p2, d2 = float(made.weft.pitch_mm) * scale, float(made.weft.wire_mm) * scale
    warps = range(_many(PANEL_WIDTH, made.warp.pitch_mm, scale))
    wefts = range(_many(PLAN_HEIGHT, made.weft.pitch_mm, scale))
    for j in wefts:
        yield Bar(0.0, (j + 0.5) * p2 - d2 / 2, PANEL_WIDTH, d2, "weft", False)
    for i in warps:
        yield Bar((i + 0.5) * p1 - d1 / 2, 0.0, d1, PLAN_HEIGHT, "warp", True)
    for j in wefts:
        for i in warps:
            if is_weft_over(made.weave, i, j):
                reach = max(p1, d1)
                yield Bar((i + 0.5) * p1 - reach / 2, (j + 0.5) * p2 - d2 / 2, reach, d2, "weft", False)


def _section_shapes(made: Construction, scale: float) -> Iterator[Shape]:
    turned = made.weave is Weave.REVERSE_PLAIN_DUTCH
    cut, along = (made.weft, made.warp) if turned else (made.warp, made.weft)
    names = ("weft", "warp") if turned else ("warp", "weft")
    swings = swing_mm(made)[::-1] if turned else swing_mm(made)
    pitch, middle = float(cut.pitch_mm) * scale, SECTION_HEIGHT / 2
    wires = range(-1, _many(PANEL_WIDTH, cut.pitch_mm, scale) + 1)
    signs = [1.0 if is_weft_over(made.weave, i, 0) else -1.0 for i in wires]
    points = tuple(_wave(signs, pitch, swings[1] * scale, middle))
    yield Ribbon(points, float(along.wire_mm) * scale, names[1])
    for i, sign in zip(wires, signs, strict=True):
        centre = middle + sign * swings[0] * scale
        yield Disc((i + 0.5) * pitch, centre, float(cut.wire_mm) * scale / 2, names[0])


def _wave(signs: list[float], pitch: float, swing: float, middle: float) -> Iterator[tuple[float, float]]:
    """Points from crossing to crossing, on a half cosine between crowns."""
    for i, (start, end) in enumerate(pairwise(signs), -1):
        for step in range(STEPS):
            share = step / STEPS
            rise = start + (end - start) * (1 - cos(pi * share)) / 2
            yield (i + 0.5 + share) * pitch, middle - rise * swing
