"""The drawing as inline SVG, in true millimetres where it is printed."""

from collections.abc import Iterator
from html import escape

from catalog.report.drawing_vector import INK, Bar, Disc, Drawing, Panel, Ribbon, Shape

EDGE = "#333"
LINE = 0.18
GAP, TITLE, BAR = 6.0, 5.0, 8.0


def to_svg(drawing: Drawing) -> str:
    """The drawing as one <svg> element: plans side by side, sections below, the scale bar at the foot."""
    width = sum(panel.width for panel in drawing.plans) + GAP * (len(drawing.plans) - 1)
    body = [*_row(drawing.plans, 0.0, "p"), *_row(drawing.sections, _height(drawing.plans), "s")]
    foot = _height(drawing.plans) + _height(drawing.sections)
    body += _scale_bar(drawing, foot)
    size = f'width="{width:g}mm" height="{foot + BAR:g}mm" viewBox="0 0 {width:g} {foot + BAR:g}"'
    label = escape(f"Required and offered cloth. {drawing.scale_words}", quote=True)
    return f'<svg xmlns="http://www.w3.org/2000/svg" {size} role="img" aria-label="{label}">{"".join(body)}</svg>'


def _height(panels: tuple[Panel, ...]) -> float:
    return max((panel.height for panel in panels), default=0.0) + TITLE if panels else 0.0


def _row(panels: tuple[Panel, ...], top: float, name: str) -> Iterator[str]:
    left = 0.0
    for number, panel in enumerate(panels):
        yield _text(left, top + TITLE - 1.5, panel.title)
        yield f'<svg x="{left:g}" y="{top + TITLE:g}" width="{panel.width:g}" height="{panel.height:g}">'
        yield from (_shape(shape) for shape in panel.shapes)
        if panel.note:
            yield _text(2.0, panel.height / 2, panel.note)
        frame = f'width="{panel.width:g}" height="{panel.height:g}"'
        yield f'<rect id="{name}{number}" {frame} fill="none" stroke="{EDGE}" stroke-width="0.3"/></svg>'
        left += panel.width + GAP


def _shape(shape: Shape) -> str:
    if isinstance(shape, Bar):
        return _bar(shape)
    if isinstance(shape, Disc):
        place = f'cx="{shape.x:.3f}" cy="{shape.y:.3f}" r="{shape.radius:.3f}"'
        return f'<circle {place} fill="{INK[shape.part]}" stroke="{EDGE}" stroke-width="{LINE}"/>'
    return _ribbon(shape)


def _bar(bar: Bar) -> str:
    x, y, right, foot = bar.x, bar.y, bar.x + bar.width, bar.y + bar.height
    edges = f"M{x:.3f} {y:.3f}V{foot:.3f}M{right:.3f} {y:.3f}V{foot:.3f}"
    if not bar.is_upright:
        edges = f"M{x:.3f} {y:.3f}H{right:.3f}M{x:.3f} {foot:.3f}H{right:.3f}"
    size = f'x="{x:.3f}" y="{y:.3f}" width="{bar.width:.3f}" height="{bar.height:.3f}"'
    return f'<rect {size} fill="{INK[bar.part]}"/><path d="{edges}" stroke="{EDGE}" stroke-width="{LINE}"/>'


def _ribbon(ribbon: Ribbon) -> str:
    points = " ".join(f"{x:.3f},{y:.3f}" for x, y in ribbon.points)
    outer = f'fill="none" stroke="{EDGE}" stroke-width="{ribbon.thickness:.3f}"'
    inner = f'fill="none" stroke="{INK[ribbon.part]}" stroke-width="{max(0.0, ribbon.thickness - 2 * LINE):.3f}"'
    return f'<polyline points="{points}" {outer}/><polyline points="{points}" {inner}/>'


def _text(x: float, y: float, text: str) -> str:
    return f'<text x="{x:g}" y="{y:g}" font-size="3" font-family="sans-serif">{escape(text)}</text>'


def _scale_bar(drawing: Drawing, top: float) -> Iterator[str]:
    if drawing.scale:
        length = drawing.bar_on_paper
        yield f'<path d="M0.2 {top + 1:g}v2h{length:.3f}v-2" fill="none" stroke="{EDGE}" stroke-width="0.4"/>'
        yield _text(length + 3, top + 3, drawing.scale_words)
