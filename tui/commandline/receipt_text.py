"""A receipt check in lines: the verdict, each sum with its weak link, what would decide, what was assumed."""

from collections.abc import Iterator, Sequence
from typing import TYPE_CHECKING

from tui.commandline.measuring import measured_lines
from tui.commandline.wrapping import wrapped
from tui.exit_codes import one_line

if TYPE_CHECKING:
    from catalog.callout.reading import Understanding
    from catalog.search.outcome import Outcome
    from catalog.search.receipt import Receipt

MARGIN = " " * 10
MARKS = {"conforms": "·", "fails": "!", "not-proven": "?"}
GATES = {True: "·", False: "!", None: "?"}


def receipt_lines(receipts: "Sequence[Receipt]", verdict: "Outcome", understanding: "Understanding") -> Iterator[str]:
    """The whole check in lines of at most 80 columns."""
    yield from wrapped(one_line(understanding.text), "Ordered   ", MARGIN)
    for number, line in enumerate(measured_lines(receipts[0].evidence)):
        yield from wrapped(line, MARGIN if number else "Measured  ", MARGIN + "  ")
    yield f"Verdict   {verdict.words.upper()}"
    if understanding.question:
        yield from wrapped(one_line(understanding.question), "QUESTION  ", MARGIN)
    for receipt in receipts:
        yield ""
        yield from wrapped(f"{one_line(receipt.target.reading.label)}: {receipt.outcome.words}", "Read as   ", MARGIN)
        yield from _checks(receipt)
    yield ""
    for note in dict.fromkeys(note for receipt in receipts for note in receipt.notes):
        yield from wrapped(one_line(note), "Note      ", MARGIN)


def _checks(receipt: "Receipt") -> Iterator[str]:
    for check in receipt.checks:
        yield from wrapped(check.message, f"  {MARKS[check.outcome.value]} ", "    ")
        yield from wrapped(f"permitted by: {one_line(check.source)}", "    ", "      ")
    for finding in receipt.findings:
        yield from wrapped(one_line(finding.message), f"  {GATES[finding.ok]} ", "    ")
