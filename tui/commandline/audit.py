"""`audit`: contradictions and oddities in the catalogue."""

import argparse
from typing import Any

from tui.commandline.options import Setting
from tui.exit_codes import ExitCode, one_line


def add(commands: "argparse._SubParsersAction[argparse.ArgumentParser]", **rest: Any) -> None:
    """Declare the command."""
    parser = commands.add_parser("audit", help="contradictions and oddities in the catalogue", **rest)
    parser.set_defaults(run=run)


def run(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    """Run every rule over every cloth."""
    from dataclasses import asdict

    from catalog.search.audit import RULES, audit
    from catalog.search.reader import Filters

    with setting.open() as store:
        cloths = store.select(Filters(), "id")
    found = list(audit(cloths))
    if setting.json:
        setting.write_json({"schema": 1, "cloths": len(cloths), "found": [asdict(oddity) for oddity in found]})
        return ExitCode.DONE
    setting.write(
        f"{oddity.cloth:<14} {oddity.rule}: {one_line(oddity.value)}; {one_line(oddity.repair)}" for oddity in found
    )
    setting.write([f"{len(found)} oddities in {len(cloths)} cloths, by {len(RULES) + 1} rules."])
    return ExitCode.DONE
