"""The sheet as a PDF on one page of A4 or Letter: letters shrink first, then long lists are cut, and it says so."""

from collections import Counter
from collections.abc import Iterator, Sequence
from dataclasses import astuple, dataclass
from io import BytesIO
from itertools import chain

from catalog.errors import InputError
from catalog.report import pdf_letters
from catalog.report.fingerprint import grouped
from catalog.report.pdf_blocks import Block, stacked, table_block, text_block
from catalog.report.pdf_drawing import MM, drawing_block
from catalog.report.sheet import DEMO, Line, Sheet

PAPERS = {"A4": (210 * MM, 297 * MM), "Letter": (215.9 * MM, 279.4 * MM)}
MARGIN = 11 * MM
GAP = 3.2
WHOLE = 10_000
SIGNING_HEIGHT = 6.5 * MM
SENTENCE = 3
"""So many times longer than a name may a sentence be."""
CUT_NOTE = "“… [+151]” stands for so many more characters: see the JSON."
NO_ROOM = "No room on this page: see the sheet as HTML."


@dataclass(frozen=True, slots=True)
class Cut:
    """How much is shown, and how large."""

    size: float
    """Points."""
    longest: int = WHOLE
    """Characters of a name; a sentence may have three times as many."""
    findings: int = WHOLE
    lots: int = WHOLE
    has_drawing: bool = True


CUTS = (
    *(Cut(size) for size in (8.0, 7.5, 7.0, 6.5, 6.0)),
    *(Cut(6.0, longest, 20, lots) for longest, lots in ((200, 8), (120, 4), (80, 2))),
    *(Cut(5.5, 80, findings, 2) for findings in (15, 12, 9)),
    *(Cut(5.5, 50, findings, 1) for findings in (15, 12, 9, 6, 4, 2)),
    Cut(5.5, 50, 2, 1, has_drawing=False),
)
"""Tried in this order. Verdict and cautions are never cut."""


def to_pdf(sheet: Sheet, paper: str = "A4") -> bytes:
    """Write *sheet* on one page of *paper*, 'A4' or 'Letter'. The same sheet gives the same bytes.

    Raises InputError for another paper.
    """
    if paper not in PAPERS:
        raise InputError(f"The sheet is printed on {' or '.join(PAPERS)}, not on {paper[:40]!r}.")
    width, height = PAPERS[paper]
    pdf_letters.register()
    room = height - 2 * MARGIN
    page = _fitted(sheet, width - 2 * MARGIN, room)
    return _printed(sheet, page, (width, height), min(1.0, room / page.height))


def _printed(sheet: Sheet, page: Block, size: tuple[float, float], shrunk: float) -> bytes:
    from reportlab.pdfgen.canvas import Canvas  # type: ignore[import-untyped]

    file = BytesIO()
    canvas = Canvas(file, pagesize=size, invariant=1, pageCompression=1, initialFontName=pdf_letters.REGULAR)
    canvas.setTitle(pdf_letters.printable(f"{sheet.title} {sheet.heading[0].text}"))
    canvas.setSubject(f"fingerprint {sheet.fingerprint}")
    canvas.setAuthor("")
    canvas.translate(MARGIN, size[1] - MARGIN)
    canvas.scale(shrunk, shrunk)
    page.draw(canvas, 0, 0)
    canvas.showPage()
    canvas.save()
    return file.getvalue()


def _fitted(sheet: Sheet, width: float, room: float) -> Block:
    """The first cut that fits; the last one, which has no drawing, is shrunk where even that is too high."""
    for cut in CUTS:
        page = stacked([block for block in _blocks(sheet, cut, width) if block.height], GAP)
        if page.height <= room:
            break
    return page


def _blocks(sheet: Sheet, cut: Cut, width: float) -> Iterator[Block]:
    size = cut.size
    yield text_block(sheet.title, size + 3, width, pdf_letters.BOLD)
    if sheet.is_demo:
        yield text_block(DEMO, size + 1.5, width, pdf_letters.BOLD, is_boxed=True)
    yield _pairs(sheet.heading, cut, width)
    yield _said("Verdict", [sheet.verdict, sheet.reason], cut, width)
    yield _named(sheet, cut, width)
    yield _comparison(sheet, cut, width)
    yield _said("Findings", _findings(sheet, cut), cut, width)
    yield _said("Cautions", sheet.cautions or ["None."], cut, width)
    yield _stock(sheet, cut, width)
    yield _pairs(sheet.order, cut, width)
    yield _said("Assumed", _assumed(sheet, cut), cut, width)
    yield _signatures(sheet, cut, width)
    yield drawing_block(sheet.drawing) if cut.has_drawing else _said("Drawings", [NO_ROOM], cut, width)
    yield _foot(sheet, cut, width)


def _short(text: str, cut: Cut, times: int = 1) -> str:
    longest = cut.longest * times
    return text if len(text) <= longest else f"{text[:longest].rstrip()}… [+{len(text) - longest}]"


def _source(source: str) -> str:
    return f" [{source}]" if source else ""


def _findings(sheet: Sheet, cut: Cut) -> list[str]:
    """As many as the page takes, and a line that counts the others by how they stand."""
    shown = [
        f"{note.stand.upper()}: {_short(note.text, cut, SENTENCE)}{_source(note.source)}"
        for note in sheet.findings[: cut.findings]
    ]
    left = Counter(note.stand for note in sheet.findings[cut.findings :])
    if left:
        stands = ", ".join(f"{number} {stand}" for stand, number in left.items())
        shown.append(f"{left.total()} more findings ({stands}): see the JSON.")
    return shown


def _assumed(sheet: Sheet, cut: Cut) -> list[str]:
    shown = [_short(text, cut, SENTENCE) for text in sheet.assumed[: cut.findings]]
    left = len(sheet.assumed) - cut.findings
    return [*shown, f"{left} more assumptions: see the JSON."] if left > 0 else shown


def _said(title: str, texts: Sequence[str], cut: Cut, width: float) -> Block:
    shown = [text_block(f"{title}:", cut.size, width, pdf_letters.BOLD)]
    shown += [text_block(f"• {text}", cut.size, width) for text in texts if text]
    return stacked(shown)


def _pairs(lines: Sequence[Line], cut: Cut, width: float) -> Block:
    """Names and texts, two pairs to a row."""
    cells = [(line.name, _short(line.text, cut)) for line in lines]
    if len(cells) % 2:
        cells.append(("", ""))
    rows = [tuple(chain(*pair)) for pair in zip(cells[::2], cells[1::2], strict=True)]
    name = 26 * MM
    return table_block(rows, (name, width / 2 - name, name, width / 2 - name), cut.size, has_head=False, bold=(0, 2))


def _named(sheet: Sheet, cut: Cut, width: float) -> Block:
    cells = [(row.name, _short(row.required, cut), _short(row.offered, cut)) for row in sheet.named]
    shares = (0.115, 0.4425, 0.4425)
    return table_block(
        [("", "Required", "Offered"), *cells], [share * width for share in shares], cut.size, has_head=True
    )


def _comparison(sheet: Sheet, cut: Cut, width: float) -> Block:
    head = ("", "Required", "Offered", "Difference", "Limit", "What it hurts")
    cells = [tuple(_short(text, cut) for text in astuple(row)) for row in sheet.figures]
    shares = (0.115, 0.225, 0.225, 0.14, 0.135, 0.16)
    return table_block([head, *cells], [share * width for share in shares], cut.size, has_head=True)


def _stock(sheet: Sheet, cut: Cut, width: float) -> Block:
    if not sheet.lots:
        return _said("Stock and certificate", ["None on the rack."], cut, width)
    head = ("Lot", "Where", "Usable and free", "Heat", "Certificate", "For this need")
    cells = [tuple(_short(text, cut) for text in astuple(lot)) for lot in sheet.lots[: cut.lots]]
    shares = (0.12, 0.15, 0.27, 0.1, 0.12, 0.24)
    table = table_block([head, *cells], [share * width for share in shares], cut.size, has_head=True)
    left = len(sheet.lots) - cut.lots
    return stacked([table, text_block(f"{left} more lots: see the JSON.", cut.size, width)]) if left > 0 else table


def _signatures(sheet: Sheet, cut: Cut, width: float) -> Block:
    cells = [(line.name, _short(line.text, cut), "", "") for line in sheet.signatures]
    rows = [("Signatures", "Name", "Date", "Signature"), *cells]
    shares = (0.3, 0.3, 0.13, 0.27)
    return table_block(rows, [s * width for s in shares], cut.size, has_head=True, least=SIGNING_HEIGHT)


def _foot(sheet: Sheet, cut: Cut, width: float) -> Block:
    printed = f"Catalogue of {sheet.catalogue_date}. Fingerprint of the compared data (SHA-256): "
    texts = [sheet.deference, printed + grouped(sheet.fingerprint)]
    if cut.longest < WHOLE:
        texts.append(CUT_NOTE)
    if _has_foreign_letters(sheet):
        texts.append(pdf_letters.NOTE)
    return stacked([text_block(text, 5.5, width) for text in texts])


def _has_foreign_letters(sheet: Sheet) -> bool:
    return any(pdf_letters.printable(text) != text for text in _texts(astuple(sheet)))


def _texts(value: object) -> Iterator[str]:
    """Every text within nested tuples."""
    if isinstance(value, str):
        yield value
    elif isinstance(value, tuple):
        for entry in value:
            yield from _texts(entry)
