"""A label for a roll: what the tag says, with the lot number as QR and, where it can be, as Code 128."""

from dataclasses import dataclass
from io import BytesIO
from typing import Any

from catalog.cloth import Cloth
from catalog.report import pdf_letters
from catalog.report.outside_text import tame
from catalog.report.pdf_blocks import Block, Canvas, stacked, text_block
from catalog.report.roll_tag import DEMO, TagRow, is_demo, tag_rows
from catalog.stock.lots import Lot

MM = 72 / 25.4
WIDTH, HEIGHT, MARGIN = 100 * MM, 75 * MM, 3 * MM
CODE_SIDE = 30 * MM
QUIET_MODULES = 4
"""Blank modules around a QR code (ISO/IEC 18004)."""
BAR_HEIGHT = 9 * MM
BAR_WIDTHS = tuple(mils * 0.0254 * MM for mils in (13, 10, 7.5))
"""Narrow bars that common scanners read: 13, 10, 7.5 thousandths of an inch (common practice)."""
QUIET_BARS = 10
"""Blank narrow bars on each side of a Code 128 (ISO/IEC 15417)."""
SIZES = (8.0, 7.5, 7.0, 6.5, 6.0, 5.5, 5.0)
LONGEST = (200, 80, 40)


@dataclass(frozen=True, slots=True)
class Codes:
    """What is encoded on a label."""

    qr: str
    bars: str | None
    """None where Code 128 can't hold the number, or not within the label's width."""


def label_pdf(lot: Lot, cloth: Cloth) -> bytes:
    """A label of 100 × 75 mm as PDF. The same roll gives the same bytes."""
    from reportlab.pdfgen.canvas import Canvas as Page  # type: ignore[import-untyped]

    pdf_letters.register()
    file = BytesIO()
    canvas = Page(file, (WIDTH, HEIGHT), invariant=1, pageCompression=1, initialFontName=pdf_letters.REGULAR)
    canvas.setTitle(pdf_letters.printable(f"Lot {tame(lot.id)}"))
    codes = label_codes(lot)
    _draw_text(canvas, lot, cloth, bool(codes.bars))
    _draw_qr(canvas, codes.qr)
    if codes.bars:
        bars = _bars(codes.bars)
        bars.drawOn(canvas, (WIDTH - bars.width) / 2, MARGIN)
    canvas.showPage()
    canvas.save()
    return file.getvalue()


def label_codes(lot: Lot) -> Codes:
    """What the codes of a label hold: the lot number as it is typed. QR takes every letter, Code 128 ASCII."""
    number = tame(lot.id)
    return Codes(number, number if number.isascii() and number and _bars(number) else None)


def _bars(number: str) -> Any:
    """The widest Code 128 that fits the label, or None."""
    from reportlab.graphics.barcode.code128 import Code128  # type: ignore[import-untyped]

    for width in BAR_WIDTHS:
        bars = Code128(
            number, barWidth=width, barHeight=BAR_HEIGHT, quiet=1, lquiet=QUIET_BARS * width, rquiet=QUIET_BARS * width
        )
        if bars.width <= WIDTH - 2 * MM:
            return bars
    return None


def _draw_qr(canvas: Canvas, number: str) -> None:
    from reportlab.graphics.barcode.qr import QrCodeWidget  # type: ignore[import-untyped]

    code = QrCodeWidget(number, barLevel="M").qr
    code.make()
    side = CODE_SIDE / (code.getModuleCount() + 2 * QUIET_MODULES)
    left, top = WIDTH - MARGIN - CODE_SIDE + QUIET_MODULES * side, HEIGHT - MARGIN - QUIET_MODULES * side
    for row, modules in enumerate(code.modules):
        for column, is_dark in enumerate(modules):
            if is_dark:
                canvas.rect(left + column * side, top - (row + 1) * side, side, side, stroke=0, fill=1)


def _draw_text(canvas: Canvas, lot: Lot, cloth: Cloth, has_bars: bool) -> None:
    width = WIDTH - 2 * MARGIN - CODE_SIDE
    room = HEIGHT - 2 * MARGIN - (BAR_HEIGHT + 2 * MM if has_bars else 0)
    for longest in LONGEST:
        for size in SIZES:
            text = _text(lot, cloth, size, width, longest)
            if text.height <= room:
                text.draw(canvas, MARGIN, HEIGHT - MARGIN)
                return
    canvas.saveState()
    canvas.translate(MARGIN, HEIGHT - MARGIN)
    canvas.scale(room / text.height, room / text.height)
    text.draw(canvas, 0, 0)
    canvas.restoreState()


def _text(lot: Lot, cloth: Cloth, size: float, width: float, longest: int) -> Block:
    blocks = [text_block(DEMO, size, width, pdf_letters.BOLD, is_boxed=True)] if is_demo(lot, cloth) else []
    blocks.append(text_block(tame(lot.id, longest), size + 5, width, pdf_letters.BOLD))
    blocks.append(text_block(tame(cloth.name, longest), size, width, pdf_letters.BOLD))
    blocks += [text_block(_row_text(row, longest), size, width) for row in tag_rows(lot, cloth)]
    return stacked(blocks, 0.6)


def _row_text(row: TagRow, longest: int) -> str:
    inch = f" ({row.inch})" if row.inch else ""
    return f"{row.name}: {tame(row.metric, longest)}{inch}"
