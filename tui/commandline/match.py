"""`match`: the nearest equivalents of a callout, judged, with what lies on the rack."""

import argparse
import sys
from typing import TYPE_CHECKING, Any

from catalog.errors import InputError, NotFoundError
from catalog.target import Duty, Need, Purpose
from tui.commandline.options import Setting
from tui.exit_codes import ExitCode, complain

if TYPE_CHECKING:
    from catalog.construction import Weave
    from catalog.crossref import Request
    from catalog.search.reader import Reader


def add(commands: "argparse._SubParsersAction[argparse.ArgumentParser]", **rest: Any) -> None:
    """Declare the command."""
    parser = commands.add_parser("match", help="the nearest equivalents of a callout", **rest)
    parser.add_argument("callout", nargs="?", metavar="CALLOUT")
    parser.add_argument("--from", dest="source", metavar="FILE", help="a callout a line, or CSV/XLSX with --column")
    parser.add_argument("--column", metavar="NAME", help="the column of a CSV or XLSX file that holds the callouts")
    add_judgement(parser)
    parser.add_argument("--in-stock", action="store_true", help="only what lies on the rack")
    parser.add_argument("--limit", type=int, default=50, metavar="N", help="how many to list (default 50)")
    parser.set_defaults(run=run)


def add_judgement(parser: argparse.ArgumentParser) -> None:
    """The options that say how cloth is to be judged."""
    parser.add_argument("--purpose", default="", metavar="P", help="retain, pass, size, flow, strength, guard; commas")
    parser.add_argument("--alloy", default="same", metavar="same|any|NAME", help="which alloy will do")
    parser.add_argument("--weave", metavar="WEAVE", help="plain, twilled, plain-dutch, reverse-plain-dutch, …")
    parser.add_argument("--min-open-area", type=float, metavar="PCT", help="at least so much open area")
    parser.add_argument("--tolerance", metavar="PCT|e11|iso3310", help="what the aperture may be off by")
    parser.add_argument("--need", metavar="TEXT", help="how much: '4 pcs 1200x2400 mm', '12 discs 350 mm'")
    parser.add_argument("--particle", choices=("sphere", "any"), help="what meets rectangular openings")
    parser.add_argument("--flow", metavar="TEXT", help="fluid and face velocity: 'air 20 C 2 m/s' (purpose flow)")
    parser.add_argument("--oversize", metavar="MM", type=float, help="largest single oversize you vouch for (guards)")


def request_of(text: str, arguments: argparse.Namespace) -> "Request":
    """The request that the options make of a callout. Raises InputError."""
    from catalog.aiming import parse_need
    from catalog.crossref import Request

    need: Need | None = parse_need(arguments.need) if arguments.need else None
    share = arguments.min_open_area
    if share is not None and not 0 < share < 100:
        raise InputError(f"An open area of {share:g} % can't be had: state more than 0 and less than 100.")
    if arguments.oversize is not None and not 0 <= arguments.oversize < 1000:
        raise InputError(f"An oversize of {arguments.oversize:g} mm can't be judged: state 0 or more.")
    return Request(
        text=text,
        purposes=purposes_of(arguments.purpose),
        tolerance=arguments.tolerance,
        alloy_rule=arguments.alloy,
        weave=weave_of(arguments.weave),
        min_open_area_pct=share,
        need=need,
        in_stock=getattr(arguments, "in_stock", False),
        limit=getattr(arguments, "limit", 50),
        particle_is_sphere=True if arguments.particle == "sphere" else None,
        oversize_mm=arguments.oversize,
        duty=duty_of(arguments.flow),
    )


def duty_of(text: str | None) -> "Duty | None":
    """The flow that an option states. Raises InputError."""
    if text is None:
        return None
    from catalog.search.duty import parse_duty

    return parse_duty(text)


def purposes_of(text: str) -> tuple[Purpose, ...]:
    """The purposes in a list with commas. Raises InputError with the names that are known."""
    names = [name.strip().lower() for name in text.split(",") if name.strip()]
    try:
        return tuple(dict.fromkeys(Purpose(name) for name in names))
    except ValueError as error:
        known = ", ".join(p.value for p in Purpose)
        raise InputError(f"{error}: the purposes are {known}.".replace("Purpose", "purpose")) from None


def weave_of(text: str | None) -> "Weave | None":
    """The weave of that name. Raises InputError with the names that are known."""
    from catalog.construction import Weave

    if text is None:
        return None
    try:
        return Weave(text.strip().lower().replace(" ", "-"))
    except ValueError:
        raise InputError(f"No weave is called {text!r}: they are {', '.join(Weave)}.") from None


def run(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    """Match one callout, or every line of a file."""
    if arguments.limit < 1:
        raise InputError(f"--limit takes 1 or more, not {arguments.limit}.")
    if arguments.source:
        return _many(arguments, setting)
    if arguments.callout is None:
        raise InputError("Nothing to match: give a callout, as in: crosscloth match '0,25/0,16 1.4404 plain'.")
    from catalog import callout
    from catalog.crossref import match, readings_to_match

    request = request_of(arguments.callout, arguments)
    readings_to_match(callout.read(request.text))  # what can't be read needs no store

    with setting.open() as store:
        answer = match(request, store)
        has_demo = store.has_demo
    if setting.json:
        from catalog.report.documents import match_document

        setting.write_json(match_document(answer))
    else:
        from tui.commandline.match_text import match_lines

        setting.write(match_lines(answer, setting.units, has_demo))
    return ExitCode.DONE if answer.is_served else ExitCode.NOTHING_WITHIN_LIMITS


def _many(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    from tui.commandline.sources import callouts_from

    with setting.open() as store:
        for number, text in callouts_from(arguments.source, arguments.column):
            _one_of_many(number, text, arguments, setting, store)
    sys.stdout.flush()
    return ExitCode.DONE


def _one_of_many(number: int, text: str, arguments: argparse.Namespace, setting: Setting, store: "Reader") -> None:
    from catalog.crossref import match
    from catalog.report.documents import error_document, match_document

    request = request_of(text, arguments)
    try:
        document = match_document(match(request, store), number)
    except (InputError, NotFoundError) as error:
        if not setting.json:
            complain(type(error)(f"line {number}: {error.message}"))
        document = error_document(error) | {"text": text, "line": number}
    setting.write_json(document, indent=None)
