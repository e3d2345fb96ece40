"""`receipt`: a measured roll against what was ordered: conforms, fails, or not proven."""

import argparse
from collections.abc import Sequence
from typing import TYPE_CHECKING, Any

from catalog.errors import InputError
from tui.commandline.measuring import add_measurements, evidence_from
from tui.commandline.options import Setting
from tui.exit_codes import ExitCode

if TYPE_CHECKING:
    from catalog.callout.reading import Reading, Understanding
    from catalog.search.evidence import Evidence
    from catalog.search.outcome import Outcome
    from catalog.search.receipt import Receipt


def add(commands: "argparse._SubParsersAction[argparse.ArgumentParser]", **rest: Any) -> None:
    """Declare the command."""
    parser = commands.add_parser("receipt", help="a measured roll against what was ordered", **rest)
    parser.add_argument("callout", metavar="CALLOUT", help="what was ordered")
    parser.add_argument("--tolerance", metavar="PCT|e11|iso3310", help="what the aperture may be off by")
    add_measurements(parser)
    parser.set_defaults(run=run)


def run(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    """Judge the roll; exit 0 only where it conforms."""
    from catalog import callout

    evidence = evidence_from(arguments)
    understanding = callout.read(arguments.callout)
    receipts = receipts_of(understanding, evidence, arguments.tolerance)
    verdict = verdict_of(understanding, receipts)
    if setting.json:
        from catalog.report.identify_document import receipts_document

        setting.write_json(receipts_document(receipts, verdict, understanding))
    else:
        from tui.commandline.receipt_text import receipt_lines

        setting.write(receipt_lines(receipts, verdict, understanding))
    return ExitCode.DONE if verdict.value == "conforms" else ExitCode.NOTHING_WITHIN_LIMITS


def receipts_of(understanding: "Understanding", evidence: "Evidence", tolerance: str | None) -> "list[Receipt]":
    """A check for every reading that can be judged. Raises InputError where none can."""
    from catalog.crossref import readings_to_match

    found: list[Receipt] = []
    refused: list[InputError] = []
    for reading in readings_to_match(understanding):
        try:
            found.append(_receipt(reading, evidence, tolerance))
        except InputError as error:
            refused.append(error)
    if not found:
        raise refused[0]
    return found


def _receipt(reading: "Reading", evidence: "Evidence", tolerance: str | None) -> "Receipt":
    from catalog.aiming import aim
    from catalog.search.receipt import check_receipt

    return check_receipt(aim(reading, stated_tolerance=tolerance), evidence)


def verdict_of(understanding: "Understanding", receipts: "Sequence[Receipt]") -> "Outcome":
    """One verdict: of alternatives that will all do, the best; of open readings, what every one agrees on."""
    from catalog.callout.reading import Status
    from catalog.crossref import readings_to_match
    from catalog.search.outcome import Outcome

    said = {receipt.outcome for receipt in receipts}
    if understanding.status is not Status.ASK:
        return min(said, key=list(Outcome).index)
    every_one = len(receipts) == len(readings_to_match(understanding))
    return said.pop() if len(said) == 1 and every_one else Outcome.NOT_PROVEN
