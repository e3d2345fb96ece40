"""`read`: how callouts are understood."""

import argparse
import sys
from collections.abc import Iterator

from catalog import callout
from catalog.callout.reading import Understanding
from catalog.crossref import refusal
from catalog.report.reading_document import reading_document
from tui.commandline.options import Setting
from tui.commandline.reading_text import reading_lines
from tui.commandline.sources import callouts_from
from tui.exit_codes import ExitCode, complain


def add(commands: "argparse._SubParsersAction[argparse.ArgumentParser]", **rest: object) -> None:
    """Declare the command."""
    parser = commands.add_parser("read", help="how each callout is understood", **rest)  # type: ignore[arg-type]
    parser.add_argument("callout", nargs="*", metavar="CALLOUT")
    parser.add_argument("--from", dest="source", metavar="FILE", help="a callout a line, or CSV/XLSX with --column")
    parser.add_argument("--column", metavar="NAME", help="the column of a CSV or XLSX file that holds the callouts")
    parser.set_defaults(run=run)


def run(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    """Read what was given; JSON Lines where there are several."""
    if arguments.source:
        return _many(_numbered(arguments), setting, ExitCode.DONE)
    if not arguments.callout:
        from catalog.errors import InputError

        raise InputError("Nothing to read: give a callout, as in: crosscloth read '60 x 60 mesh, .0075 wire, 304'.")
    if len(arguments.callout) > 1:
        return _many(enumerate(arguments.callout, 1), setting, None)
    understanding = callout.read(arguments.callout[0])
    if setting.json:
        setting.write_json(reading_document(understanding))
    else:
        setting.write(reading_lines(understanding, setting.units))
    return _code(understanding)


def _numbered(arguments: argparse.Namespace) -> Iterator[tuple[int, str]]:
    return callouts_from(arguments.source, arguments.column)


def _code(understanding: Understanding) -> ExitCode:
    if understanding.surviving:
        return ExitCode.DONE
    complain(refusal(understanding))
    return ExitCode.BAD_INPUT


def _many(lines: Iterator[tuple[int, str]] | enumerate[str], setting: Setting, forced: ExitCode | None) -> ExitCode:
    worst = ExitCode.DONE
    for number, text in lines:
        understanding = callout.read(text)
        setting.write_json(reading_document(understanding, number), indent=None)
        if not understanding.surviving:
            worst = ExitCode.BAD_INPUT
    sys.stdout.flush()
    return worst if forced is None else forced
