"""`sheet`: the substitution sheet that an engineer signs, as PDF, HTML or Markdown."""

import argparse
from datetime import date
from pathlib import Path
from typing import TYPE_CHECKING, Any

from catalog.errors import InputError, NotFoundError
from tui.commandline.match import add_judgement, request_of
from tui.commandline.options import Setting
from tui.exit_codes import ExitCode

if TYPE_CHECKING:
    from catalog.crossref import Answer
    from catalog.report.sheet import Details, Sheet
    from catalog.search.candidate import Candidate

ENDINGS = (".pdf", ".html", ".md")
EVERY_CANDIDATE = 10_000


def add(commands: "argparse._SubParsersAction[argparse.ArgumentParser]", **rest: Any) -> None:
    """Declare the command."""
    parser = commands.add_parser("sheet", help="the substitution sheet for signature", **rest)
    parser.add_argument("callout", metavar="CALLOUT")
    parser.add_argument("cloth", metavar="CLOTH", help="the id that match shows in brackets")
    parser.add_argument("-o", "--output", required=True, metavar="FILE", help="ends in .pdf, .html or .md")
    parser.add_argument("--paper", choices=("A4", "Letter"), default="A4")
    parser.add_argument("--kind", choices=("permit", "concession"), default="permit", help="before or after supply")
    parser.add_argument("--number", default="", metavar="TEXT", help="number of the sheet")
    parser.add_argument("--reference", default="", metavar="TEXT", help="order, drawing or position")
    parser.add_argument("--use", default="", metavar="TEXT", help="what the cloth is for")
    parser.add_argument("--requested-by", default="", metavar="NAME")
    parser.add_argument("--quantity", default="", metavar="TEXT", help="else the need")
    parser.add_argument("--valid-until", metavar="YYYY-MM-DD", type=_day)
    parser.add_argument("--lot", action="append", default=[], metavar="LOT", help="a lot that is offered; repeatable")
    add_judgement(parser)
    parser.set_defaults(run=run)


def _day(text: str) -> date:
    try:
        return date.fromisoformat(text)
    except ValueError:
        raise argparse.ArgumentTypeError(f"{text!r} is no date like 2027-01-31") from None


def run(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    """Match, take the cloth that was named, and write the sheet whole or not at all."""
    from dataclasses import replace

    from catalog.crossref import match
    from catalog.report.sheet import build_sheet

    target = Path(arguments.output)
    if target.suffix.lower() not in ENDINGS:
        raise InputError(f"A sheet is written as {', '.join(ENDINGS)}: {arguments.output!r} ends in none of them.")
    request = replace(request_of(arguments.callout, arguments), limit=EVERY_CANDIDATE)
    with setting.open() as store:
        answer = match(request, store)
    candidate = candidate_of(answer, arguments.cloth)
    sheet = build_sheet(answer, candidate, details_of(arguments))
    write_whole(target, content_of(sheet, target.suffix.lower(), arguments.paper))
    if setting.json:
        setting.write_json(
            {
                "schema": 1,
                "file": str(target),
                "cloth": candidate.cloth.id,
                "verdict": candidate.verdict.value,
                "fingerprint": sheet.fingerprint,
            }
        )
    else:
        setting.write([f"{target} written: {candidate.cloth.id}, {candidate.verdict.value}; {sheet.fingerprint}"])
    return ExitCode.DONE


def candidate_of(answer: "Answer", cloth_id: str) -> "Candidate":
    """The candidate with this id. Raises NotFoundError."""
    for candidate in answer.candidates:
        if candidate.cloth.id == cloth_id:
            return candidate
    raise NotFoundError(f"{cloth_id!r} is none of the cloths near to this callout: 'crosscloth match' lists them.")


def details_of(arguments: argparse.Namespace) -> "Details":
    """What the comparison doesn't know."""
    from catalog.report.sheet import Details, DeviationKind

    return Details(
        kind=DeviationKind.PERMIT if arguments.kind == "permit" else DeviationKind.CONCESSION,
        number=arguments.number,
        dated=date.today(),
        reference=arguments.reference,
        use=arguments.use,
        requested_by=arguments.requested_by,
        quantity=arguments.quantity,
        valid_until=arguments.valid_until,
        lots=tuple(arguments.lot),
    )


def content_of(sheet: "Sheet", ending: str, paper: str) -> bytes:
    """The sheet in the format that the file's name asks for."""
    if ending == ".pdf":
        from catalog.report.sheet_pdf import to_pdf

        return to_pdf(sheet, paper)
    if ending == ".html":
        from catalog.report.sheet_html import to_html

        return to_html(sheet).encode()
    from catalog.report.sheet_markdown import to_markdown

    return to_markdown(sheet).encode()


def write_whole(target: Path, content: bytes) -> None:
    """Write *content* under another name in the same folder and rename it. Raises InputError."""
    draft = target.with_name(f".{target.name}.new")
    try:
        draft.write_bytes(content)
        draft.replace(target)
    except OSError as error:
        draft.unlink(missing_ok=True)
        raise InputError(f"{target} can't be written: {(error.strerror or str(error)).lower()}.") from None
