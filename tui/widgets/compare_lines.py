"""Two to four candidates beside what was asked, one column each."""

from collections.abc import Sequence
from itertools import zip_longest
from typing import TYPE_CHECKING

from catalog.search.candidate import Candidate
from tui.presenting import Piece, fit, harmless, shortened, significant, wrapped
from tui.widgets.detail_lines import Lines, figure_rows, sealed

if TYPE_CHECKING:
    from catalog.crossref import Answer

LABEL = 10
ASKED = 13


def compare_lines(answer: "Answer", candidates: Sequence[Candidate], width: int, units: str, ascii_only: bool) -> Lines:
    """Each figure of each candidate with its difference from the asked one beneath it."""
    column = max(12, (width - LABEL - ASKED - 2) // max(1, len(candidates)) - 1)
    asked = min(ASKED + 8, column) if column > ASKED + 8 else ASKED
    widths = (LABEL, asked, *[column] * len(candidates))
    names = [f"{shortened(harmless(c.cloth.name, 60), column)}{' demo' if c.cloth.demo else ''}" for c in candidates]
    lines = _block([("", "muted"), ("asked", "head"), *((name, "strong") for name in names)], widths)
    verdicts = [sealed(c.verdict, ascii_only) for c in candidates]
    lines += [*_block([("verdict", "muted"), ("", "text"), *verdicts], widths), ()]
    lines += _figures(answer, candidates, units, widths)
    return lines + _rack(candidates, widths)


def _block(cells: Sequence[Piece], widths: Sequence[int]) -> Lines:
    """One row of cells; a cell that is too long goes on in the next line."""
    parts = [wrapped(text, width)[:2] for (text, _), width in zip(cells, widths, strict=True)]
    return [
        [(fit(part, width) + " ", ink) for part, (_, ink), width in zip(row, cells, widths, strict=True)]
        for row in zip_longest(*parts, fillvalue="")
    ]


def _figures(answer: "Answer", candidates: Sequence[Candidate], units: str, widths: Sequence[int]) -> Lines:
    tables = [{row[0]: row for row in figure_rows(answer, c, units, min(widths[1:]))} for c in candidates]
    lines: Lines = []
    for label in dict.fromkeys(label for table in tables for label in table):
        rows = [table.get(label) for table in tables]
        asked = next(row[1] for row in rows if row is not None)
        found = [(row[2] if row else "–", "strong") for row in rows]
        lines += _block([(label, "muted"), (asked, "text"), *found], widths)
        if any(row and row[3] for row in rows):
            off = [(row[3] if row else "", row[4] if row else "text") for row in rows]
            lines += _block([("", "text"), ("", "text"), *off], widths)
    return lines


def _rack(candidates: Sequence[Candidate], widths: Sequence[int]) -> Lines:
    free = [sum(line.lot.available_m2 for line in c.stock) for c in candidates]
    areas = [f"{significant(m2, 3)} m²" if c.stock else "nothing" for m2, c in zip(free, candidates, strict=True)]
    first = [harmless(c.stock[0].lot.location, 14) if c.stock else "" for c in candidates]
    lines = _block([("rack", "muted"), ("", "text"), *((area, "text") for area in areas)], widths)
    return lines + _block([("", "text"), ("", "text"), *((place, "text") for place in first)], widths)
