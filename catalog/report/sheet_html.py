"""The sheet as one HTML file: no script, no link, nothing fetched; text from outside is escaped."""

from collections.abc import Iterable, Iterator, Sequence
from html import escape

from catalog.report.drawing_svg import to_svg
from catalog.report.fingerprint import grouped
from catalog.report.sheet import DEMO, Line, Sheet

STYLE = """
body{font:9pt/1.3 sans-serif;max-width:190mm;margin:8mm auto;color:#000;background:#fff}
h1{font-size:13pt;margin:0 0 2mm}h2{font-size:10pt;margin:3mm 0 1mm}
table{border-collapse:collapse;width:100%}th,td{border:.2mm solid #666;padding:.4mm 1mm;text-align:left;
vertical-align:top}td,th,li,p,dd{unicode-bidi:isolate;overflow-wrap:anywhere}ul{margin:0;padding-left:5mm}
dl{margin:0;display:grid;grid-template-columns:max-content 1fr;column-gap:3mm}dd{margin:0}
.demo{border:.6mm solid #000;padding:1mm;font-weight:bold}.sign td{height:9mm}svg{max-width:100%;height:auto}
code{font-size:8pt}@media print{body{margin:0;font-size:7.5pt}}@page{margin:10mm}
"""
POLICY = "default-src 'none'; style-src 'unsafe-inline'"


def to_html(sheet: Sheet) -> str:
    """Write *sheet* as a whole HTML document with its drawings inside."""
    return "\n".join(_lines(sheet)) + "\n"


def _lines(sheet: Sheet) -> Iterator[str]:
    title = escape(sheet.title)
    yield '<!DOCTYPE html>\n<html lang="en"><head><meta charset="utf-8">'
    yield f'<meta http-equiv="Content-Security-Policy" content="{POLICY}">'
    yield f"<title>{title}</title><style>{STYLE}</style></head><body>\n<h1>{title}</h1>"
    if sheet.is_demo:
        yield f'<p class="demo">{escape(DEMO)}</p>'
    yield _pairs(sheet.heading)
    yield f"<p><strong>Verdict:</strong> {escape(sheet.verdict)}</p>"
    if sheet.reason:
        yield f"<p>{escape(sheet.reason)}</p>"
    yield from _comparison(sheet)
    notes = (f"<strong>{n.stand}:</strong> {escape(n.text)}{_source(n.source)}" for n in sheet.findings)
    yield f"<h2>Findings</h2>{_list(notes)}"
    yield f"<h2>Cautions</h2>{_list(map(escape, sheet.cautions)) if sheet.cautions else '<p>None.</p>'}"
    yield from _stock(sheet)
    yield f"<h2>Use, quantity and validity</h2>{_pairs(sheet.order)}"
    yield f"<h2>Assumed</h2>{_list(map(escape, sheet.assumed))}"
    yield from _signatures(sheet.signatures)
    yield f"<h2>To scale</h2>{to_svg(sheet.drawing)}"
    yield f"<p>{escape(sheet.deference)}</p>"
    yield f"<p>Catalogue of {escape(sheet.catalogue_date)}. Fingerprint of the compared data (SHA-256): "
    yield f"<code>{grouped(sheet.fingerprint)}</code></p>\n</body></html>"


def _source(source: str) -> str:
    return f" <em>[{escape(source)}]</em>" if source else ""


def _pairs(lines: Sequence[Line]) -> str:
    return f"<dl>{''.join(f'<dt>{escape(p.name)}</dt><dd>{escape(p.text)}</dd>' for p in lines)}</dl>"


def _list(items: Iterable[str]) -> str:
    return f"<ul>{''.join(f'<li>{item}</li>' for item in items)}</ul>"


def _table(names: Sequence[str], cells: Iterable[Sequence[str]], kind: str = "") -> Iterator[str]:
    head = "".join(f'<th scope="col">{escape(name)}</th>' for name in names)
    yield f"<table{kind}><thead><tr>{head}</tr></thead><tbody>"
    for first, *rest in cells:
        row = "".join(f"<td>{escape(cell)}</td>" for cell in rest)
        yield f'<tr><th scope="row">{escape(first)}</th>{row}</tr>'
    yield "</tbody></table>"


def _comparison(sheet: Sheet) -> Iterator[str]:
    yield "<h2>Required and offered</h2>"
    yield from _table(("", "Required", "Offered"), ((r.name, r.required, r.offered) for r in sheet.named))
    yield "<h2>Differences</h2>"
    names = ("", "Required", "Offered", "Difference", "Limit", "What it hurts")
    yield from _table(names, ((r.name, r.required, r.offered, r.difference, r.limit, r.hurts) for r in sheet.figures))


def _stock(sheet: Sheet) -> Iterator[str]:
    yield "<h2>Stock and certificate</h2>"
    if not sheet.lots:
        yield "<p>None on the rack.</p>"
        return
    names = ("Lot", "Where", "Usable and free", "Heat", "Certificate", "For this need")
    yield from _table(names, ((r.lot, r.where, r.size, r.heat, r.certificate, r.serves) for r in sheet.lots))


def _signatures(lines: Sequence[Line]) -> Iterator[str]:
    yield "<h2>Signatures</h2>"
    cells = ((line.name, line.text, "", "") for line in lines)
    yield from _table(("", "Name", "Date", "Signature"), cells, ' class="sign"')
