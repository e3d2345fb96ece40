"""The drawing as a block of a PDF page, true to its scale on paper."""

from catalog.report.drawing_vector import INK, Bar, Disc, Drawing, Panel, Ribbon, Shape
from catalog.report.pdf_blocks import Block, Canvas, text_block
from catalog.report.pdf_letters import REGULAR

MM = 72 / 25.4
GAP, TITLE, FOOT = 6.0 * MM, 9.0, 12.0
FONT_SIZE = 5.5
EDGE_WIDTH = 0.4


def drawing_block(drawing: Drawing) -> Block:
    """Plans side by side, sections below, the scale bar at the foot."""
    rows = [panels for panels in (drawing.plans, drawing.sections) if panels]
    heights = [max(panel.height for panel in panels) * MM + TITLE for panels in rows]

    def draw(canvas: Canvas, left: float, top: float) -> None:
        for panels, height in zip(rows, heights, strict=True):
            _draw_row(canvas, panels, left, top)
            top -= height
        _draw_scale(canvas, drawing, left, top)

    return Block(sum(heights) + FOOT, draw)


def _draw_row(canvas: Canvas, panels: tuple[Panel, ...], left: float, top: float) -> None:
    for panel in panels:
        text_block(panel.title, FONT_SIZE, panel.width * MM).draw(canvas, left, top - 1.0)
        _draw_panel(canvas, panel, left, top - TITLE - panel.height * MM)
        left += panel.width * MM + GAP


def _draw_panel(canvas: Canvas, panel: Panel, left: float, foot: float) -> None:
    canvas.saveState()
    canvas.translate(left, foot)
    frame = canvas.beginPath()
    frame.rect(0, 0, panel.width * MM, panel.height * MM)
    canvas.clipPath(frame, stroke=0, fill=0)
    for shape in panel.shapes:
        _draw_shape(canvas, shape, panel.height)
    canvas.restoreState()
    canvas.setLineWidth(EDGE_WIDTH)
    canvas.rect(left, foot, panel.width * MM, panel.height * MM)
    if panel.note:
        text_block(panel.note, FONT_SIZE, panel.width * MM).draw(canvas, left + 4, foot + panel.height * MM / 2)


def _draw_shape(canvas: Canvas, shape: Shape, height: float) -> None:
    canvas.setLineWidth(EDGE_WIDTH)
    canvas.setFillColor(INK[shape.part])
    if isinstance(shape, Bar):
        _draw_bar(canvas, shape, height)
    elif isinstance(shape, Disc):
        canvas.circle(shape.x * MM, (height - shape.y) * MM, shape.radius * MM, stroke=1, fill=1)
    else:
        _draw_ribbon(canvas, shape, height)


def _draw_bar(canvas: Canvas, bar: Bar, height: float) -> None:
    x, right = bar.x * MM, (bar.x + bar.width) * MM
    top, foot = (height - bar.y) * MM, (height - bar.y - bar.height) * MM
    canvas.rect(x, foot, right - x, top - foot, stroke=0, fill=1)
    edges = [(x, foot, x, top), (right, foot, right, top)]
    canvas.lines(edges if bar.is_upright else [(x, top, right, top), (x, foot, right, foot)])


def _draw_ribbon(canvas: Canvas, ribbon: Ribbon, height: float) -> None:
    """A thick dark line with a thinner light one on it: the wire with its edges."""
    for thickness, colour in ((0.0, "#000000"), (2 * EDGE_WIDTH, INK[ribbon.part])):
        path = canvas.beginPath()
        (x, y), *rest = ribbon.points
        path.moveTo(x * MM, (height - y) * MM)
        for x, y in rest:
            path.lineTo(x * MM, (height - y) * MM)
        canvas.setStrokeColor(colour)
        canvas.setLineWidth(max(0.0, ribbon.thickness * MM - thickness))
        canvas.drawPath(path, stroke=1, fill=0)
    canvas.setStrokeColor("#000000")


def _draw_scale(canvas: Canvas, drawing: Drawing, left: float, top: float) -> None:
    if not drawing.scale:
        return
    length = drawing.bar_on_paper * MM
    canvas.setLineWidth(0.8)
    canvas.lines([(left, top - 3, left, top - 9), (left, top - 6, left + length, top - 6)])
    canvas.line(left + length, top - 3, left + length, top - 9)
    canvas.setFillColor("#000000")
    canvas.setFont(REGULAR, FONT_SIZE)
    canvas.drawString(left + length + 6, top - 8, drawing.scale_words)
