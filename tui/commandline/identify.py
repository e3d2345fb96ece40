"""`identify`: which cloth a roll is, from what was measured on it, and what to measure next."""

import argparse
from typing import TYPE_CHECKING, Any

from catalog.errors import InputError
from tui.commandline.measuring import add_measurements, evidence_from
from tui.commandline.options import Setting
from tui.exit_codes import ExitCode

if TYPE_CHECKING:
    from catalog.search.identify import Identification

OUT_SHOWN = 8
"""So many of those that are ruled out, the nearest first; --limit and --json give more."""
WIDEST_SPREAD_PCT = 20.0


def add(commands: "argparse._SubParsersAction[argparse.ArgumentParser]", **rest: Any) -> None:
    """Declare the command."""
    parser = commands.add_parser("identify", help="what is this roll? From counts, wires, a swatch, a magnet", **rest)
    add_measurements(parser)
    parser.add_argument("--made-within", type=float, default=0.0, metavar="PCT",
                        help="how far pitch and wire may be made off nominal, k = 2 (default 0)")  # fmt: skip
    parser.add_argument("--in-stock", action="store_true", help="only what lies on the rack")
    parser.add_argument("--limit", type=int, metavar="N", help="how many to list (default 50; all that fit always)")
    parser.set_defaults(run=run)


def run(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    """Name the roll; nothing that fits is exit 1."""
    if arguments.limit is not None and arguments.limit < 1:
        raise InputError(f"--limit takes 1 or more, not {arguments.limit}.")
    if not 0 <= arguments.made_within <= WIDEST_SPREAD_PCT:
        raise InputError(f"--made-within takes 0 to {WIDEST_SPREAD_PCT:g} percent, not {arguments.made_within:g}.")
    result, has_demo = _identified(arguments, setting)
    if setting.json:
        from catalog.report.identify_document import identify_document

        setting.write_json(identify_document(result))
    else:
        from tui.commandline.identify_text import identify_lines

        setting.write(identify_lines(result, arguments.limit or OUT_SHOWN, setting.units, has_demo))
    return ExitCode.DONE if result.survivors else ExitCode.NOTHING_WITHIN_LIMITS


def _identified(arguments: argparse.Namespace, setting: Setting) -> "tuple[Identification, bool]":
    from catalog.search.identify import identify
    from catalog.search.reader import Filters
    from catalog.search.shortlist import shortlist

    evidence = evidence_from(arguments, arguments.made_within)
    with setting.open() as store:
        cloths = shortlist(store, evidence, Filters(in_stock=arguments.in_stock))
        has_demo = store.has_demo
    return identify(cloths, evidence, arguments.limit or 50), has_demo
