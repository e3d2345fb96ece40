"""Sheets to test: the worked example of a sifter deck, made through the whole line of flow on a list of cloths."""

import base64
import re
import zlib
from dataclasses import replace
from datetime import date
from fractions import Fraction as F
from typing import Any

from catalog.cloth import Cloth
from catalog.construction import Construction, Weave, Wires
from catalog.crossref import Answer, Request, match
from catalog.figures import figures
from catalog.report.sheet import Details, Sheet, build_sheet
from catalog.search.candidate import Candidate
from catalog.search.list_reader import ListReader
from catalog.stock.lots import Lot
from catalog.target import Purpose

INCH = F(127, 5)
DECK = "0,25/0,16 1.4404 plain, 12 discs Ø 350"
DETAILS = Details(
    number="S-0001",
    dated=date(2026, 12, 1),
    reference="MD-4471",
    use="sifter deck, spray dryer 2",
    requested_by="J. Holt",
    valid_until=date(2027, 3, 31),
    catalogue_date=date(2026, 11, 30),
)


def by_count(count: int, wire_in: str, alloy: str = "316L", **more: Any) -> Cloth:
    """A square plain cloth by its count per inch."""
    wires = Wires(INCH / count, F(wire_in) * INCH)
    made = Construction(Weave.PLAIN, wires, wires, alloy)
    name = f"{count} x {count} mesh, {wire_in} in"
    return replace(Cloth(f"c{count}", name, made, figures(made, 8000.0), name, "inch", "measured"), **more)


SIXTY = by_count(60, "0.0065")
REMNANT = Lot("R-117", "c60", "remnant", 1195, 15, 2400, 0, "B-04-2", "H47110", "3.1")
ROLL = Lot("L-9", "c60", "roll", 1219, 10, 21000, 5000, "A-01-1")


def asked(
    cloth: Cloth = SIXTY, text: str = DECK, *purposes: Purpose, lots: tuple[Lot, ...] = (REMNANT, ROLL)
) -> tuple[Answer, Candidate]:
    """The answer on one cloth."""
    answer = match(Request(text, purposes or (Purpose.RETAIN,)), ListReader([cloth], lots))
    return answer, answer.candidates[0]


def sheet(cloth: Cloth = SIXTY, text: str = DECK, *purposes: Purpose, **details: Any) -> Sheet:
    """The sheet on one cloth."""
    answer, candidate = asked(cloth, text, *purposes)
    return build_sheet(answer, candidate, replace(DETAILS, **details))


def pages(pdf: bytes) -> int:
    """How many pages a PDF has."""
    return len(re.findall(rb"/Type\s*/Page\b(?!s)", pdf))


def inside(pdf: bytes) -> str:
    """The drawing commands of a one-page PDF; ASCII text stands in them as it is."""
    packed = re.findall(rb"/ASCII85Decode.*?stream\s(.*?)endstream", pdf, re.DOTALL)
    opened = [zlib.decompress(base64.a85decode(b"<~" + one.strip(), adobe=True)).decode("latin-1") for one in packed]
    return next(commands for commands in opened if " Tm " in commands)


def shown(pdf: bytes) -> str:
    """The text of a one-page PDF, line by line; letters beyond ASCII are garbled."""
    lines = re.findall(r"\((.*?)(?<!\\)\) Tj", inside(pdf))
    return "\n".join(re.sub(r"\\([()\\])", r"\1", line) for line in lines)
