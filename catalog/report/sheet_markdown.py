"""The sheet as Markdown; text from outside is escaped, so that it stays text."""

import re
from collections.abc import Iterable, Iterator, Sequence

from catalog.report.fingerprint import grouped
from catalog.report.sheet import DEMO, TO_FILL_IN, Line, Sheet

MARKUP = re.compile(r"([\\`*_{}\[\]<>#|~&!$@])")
LEADING = re.compile(r"^(\d*)([-+=.)])(?=[-=]*(?:\s|$))")
LINKED = re.compile(r"(?i)\b(https?|ftp|mailto|xmpp)(:)|\b(www)(\.)")


def to_markdown(sheet: Sheet) -> str:
    """Write *sheet* as Markdown (tables as GitHub has them)."""
    return "\n".join(_lines(sheet)) + "\n"


def escaped(text: str) -> str:
    """*text* so that Markdown shows it as it is: no emphasis, tag, table, list or link comes of it."""
    shown = MARKUP.sub(r"\\\1", text)
    shown = LINKED.sub(lambda m: f"{m[1] or m[3]}\\{m[2] or m[4]}", shown)
    return LEADING.sub(r"\1\\\2", shown)


def _lines(sheet: Sheet) -> Iterator[str]:
    yield from (f"# {escaped(sheet.title)}", "")
    if sheet.is_demo:
        yield from (f"**{DEMO}**", "")
    yield from (f"{_line(line)}  " for line in sheet.heading)
    yield from ("", f"**Verdict:** {escaped(sheet.verdict)}", "")
    if sheet.reason:
        yield from (escaped(sheet.reason), "")
    yield from _section("Required and offered", _comparison(sheet))
    yield from _section("Differences", _differences(sheet))
    yield from _section("Findings", (f"- **{n.stand}:** {escaped(n.text)}{_source(n.source)}" for n in sheet.findings))
    yield from _section("Cautions", (f"- {escaped(text)}" for text in sheet.cautions) if sheet.cautions else ["None."])
    yield from _section("Stock and certificate", _stock(sheet))
    yield from _section("Use, quantity and validity", (f"- {_line(line)}" for line in sheet.order))
    yield from _section("Assumed", (f"- {escaped(text)}" for text in sheet.assumed))
    yield from _section("Signatures", _signatures(sheet.signatures))
    yield from _section("Drawings", [f"{sheet.drawing.scale_words}: see the HTML or PDF sheet."])
    yield from (escaped(sheet.deference), "")
    yield f"Catalogue of {escaped(sheet.catalogue_date)}. Fingerprint of the compared data (SHA-256): "
    yield f"`{grouped(sheet.fingerprint)}`"


def _line(line: Line) -> str:
    return f"**{escaped(line.name)}:** {_blank(line.text)}"


def _blank(text: str) -> str:
    return escaped(text) if text.strip("_") else TO_FILL_IN


def _source(source: str) -> str:
    return f" \\[{escaped(source)}\\]" if source else ""


def _section(title: str, body: Iterable[str]) -> Iterator[str]:
    yield from (f"## {title}", "", *body, "")


def _table(names: Sequence[str], cells: Iterable[Sequence[str]]) -> Iterator[str]:
    yield f"| {' | '.join(names)} |"
    yield f"|{'---|' * len(names)}"
    for row in cells:
        yield f"| {' | '.join(cell if cell == TO_FILL_IN else escaped(cell) for cell in row)} |"


def _comparison(sheet: Sheet) -> Iterator[str]:
    yield from _table(("", "Required", "Offered"), ((r.name, r.required, r.offered) for r in sheet.named))


def _differences(sheet: Sheet) -> Iterator[str]:
    names = ("", "Required", "Offered", "Difference", "Limit", "What it hurts")
    cells = ((r.name, r.required, r.offered, r.difference, r.limit, r.hurts) for r in sheet.figures)
    return _table(names, cells)


def _stock(sheet: Sheet) -> Iterator[str]:
    if not sheet.lots:
        yield "None on the rack."
        return
    names = ("Lot", "Where", "Usable and free", "Heat", "Certificate", "For this need")
    yield from _table(names, ((r.lot, r.where, r.size, r.heat, r.certificate, r.serves) for r in sheet.lots))


def _signatures(lines: Sequence[Line]) -> Iterator[str]:
    cells = ((line.name, line.text or TO_FILL_IN, TO_FILL_IN, TO_FILL_IN) for line in lines)
    return _table(("", "Name", "Date", "Signature"), cells)
