"""A candidate against what was asked, as lines: figures side by side, reasons, stock, drawing."""

from collections.abc import Sequence
from itertools import zip_longest
from typing import TYPE_CHECKING

from catalog.callout.reading import Side
from catalog.construction import Construction, Weave, Wires
from catalog.search.candidate import Candidate, Deviation, StockLine
from catalog.target import Target
from tui.presenting import (
    SEALS,
    Line,
    Piece,
    alloy_words,
    both,
    fit,
    harmless,
    inch,
    mass,
    mm,
    number,
    signed,
    significant,
    width_of,
    wrapped,
)
from tui.widgets.cloth_drawing import draw

if TYPE_CHECKING:
    from catalog.crossref import Answer

Lines = list[Line]
VIEWS = ("figures", "reasons", "stock", "drawing")
SIDE_BY_SIDE_FROM = 76
FIGURES_WIDTH = 50
ROOM_FOR_UNITS = 22
DRAWING_ROWS = (10, 24)
LOT_WORDS = {"roll": "roll", "remnant": "remnant", "panel": "panel", "disc": "disc"}


def asked_construction(target: Target) -> Construction | None:
    """What was asked, where pitch and wire are known both ways; plain where no weave was named."""
    sides: list[Wires] = []
    for side in (target.warp, target.weft):
        if side.pitch is None or side.wire is None:
            return None
        sides.append(Wires(side.pitch.mm, side.wire.mm))
    return Construction(target.weave or Weave.PLAIN, sides[0], sides[1], target.reading.alloy)


def offered_construction(candidate: Candidate) -> Construction:
    """The cloth as it is offered, turned where it is."""
    made = candidate.cloth.construction
    return made.turned() if candidate.turned else made


def sealed(verdict: str, ascii_only: bool) -> Piece:
    """A verdict by symbol and word."""
    seal = SEALS[verdict]
    return f"{seal.ascii_symbol if ascii_only else seal.symbol} {seal.word}", seal.ink


def heading(candidate: Candidate, ascii_only: bool = False) -> Line:
    """The verdict by symbol and word, and the name."""
    pieces: list[Piece] = [
        sealed(candidate.verdict, ascii_only),
        (f"  {harmless(candidate.cloth.name, 60)}", "strong"),
    ]
    if candidate.cloth.demo:
        pieces += [("  ", "text"), (" demo ", "demo")]
    return pieces


def purpose_line(candidate: Candidate, ascii_only: bool) -> Lines:
    """What each purpose says, where they don't say the same; and that the aperture lies to the harm side."""
    harm: Piece = ("harm side: measure the roll   ", "risk")
    if len(set(candidate.by_purpose.values())) < 2:
        return [[harm]] if candidate.harm_side else []
    pieces: list[Piece] = [("harm side   ", "risk")] if candidate.harm_side else []
    for name, verdict in candidate.by_purpose.items():
        pieces += [(f"for {name} ", "muted"), sealed(verdict, ascii_only), ("   ", "text")]
    return [pieces]


def summary_lines(answer: "Answer", candidate: Candidate, width: int, units: str, ascii_only: bool) -> Lines:
    """Verdict, reason, figures; beside them, where there is room, what lies on the rack."""
    lines: Lines = [heading(candidate, ascii_only), *purpose_line(candidate, ascii_only)]
    lines += [((part, "text"),) for part in wrapped(harmless(candidate.reason), width)[:2]]
    figures = figure_lines(answer, candidate, FIGURES_WIDTH if width >= SIDE_BY_SIDE_FROM else width, units)
    if width < SIDE_BY_SIDE_FROM:
        return lines + figures
    stock = stock_lines(candidate, width - FIGURES_WIDTH - 2, units)
    return lines + beside(figures, stock, FIGURES_WIDTH)


def beside(left: Sequence[Line], right: Sequence[Line], left_width: int, gap: int = 2) -> Lines:
    """Two blocks of lines side by side."""
    lines: Lines = []
    for one, other in zip_longest(left, right, fillvalue=()):
        used = sum(width_of(text) for text, _ in one)
        lines.append([*one, (" " * (max(0, left_width - used) + gap), "text"), *other])
    return lines


def figure_lines(answer: "Answer", candidate: Candidate, width: int, units: str) -> Lines:
    """Asked and offered, figure by figure, with the difference and its limit."""
    label, differs = 10, 8
    column = max(10, (width - label - differs - 2) // 2)
    heads = " mm/in" if units == "both" and column < ROOM_FOR_UNITS else ""
    lines: Lines = [
        (
            (fit("", label) + fit("asked" + heads, column) + " " + fit("offered" + heads, column) + " ", "head"),
            (fit("differs", differs), "head"),
        )
    ]
    for name, asked, found, off, ink in figure_rows(answer, candidate, units, column):
        lines.append(
            (
                (fit(name, label), "muted"),
                (fit(asked, column) + " ", "text"),
                (fit(found, column) + " ", "strong"),
                (fit(off, differs), ink),
            )
        )
    return lines


Row = tuple[str, str, str, str, str]
"""(name, asked, offered, difference, ink of the difference)."""


def figure_rows(answer: "Answer", candidate: Candidate, units: str, column: int = 18) -> list[Row]:
    """Every figure that is compared: aperture, wire, count, open area, mass, section, alloy, weave."""
    target, made = answer.targets[0], offered_construction(candidate)
    rows: list[Row] = []
    alike = made.warp == made.weft and _same_side(target.warp, target.weft)
    for side in ("warp",) if alike else ("warp", "weft"):
        rows += _side_rows(candidate, target, made, side, "" if alike else side, units, column)
    rows += _cloth_rows(candidate, target, units, column)
    rows.append(("alloy", _alloy(target.reading.alloy, column), _alloy(made.alloy, column), "", "text"))
    asked_weave = target.weave.words if target.weave else "open"
    assumed = " (assumed)" if target.weave and target.origin.get("weave") == "assumed" else ""
    rows.append(("weave", asked_weave + assumed, made.weave.words, "", "text"))
    return rows


def _alloy(alloy_id: str | None, column: int) -> str:
    return "open" if alloy_id is None else alloy_words(alloy_id)


def _same_side(one: Side, other: Side) -> bool:
    return (one.pitch and one.pitch.mm, one.wire and one.wire.mm) == (
        other.pitch and other.pitch.mm,
        other.wire and other.wire.mm,
    )


def _side_rows(
    candidate: Candidate, target: Target, made: Construction, side: str, prefix: str, units: str, column: int
) -> list[Row]:
    asked: Side = getattr(target, side)
    found: Wires = getattr(made, side)
    rows: list[Row] = []
    for short, name in (("apert", "aperture"), ("wire", "wire")):
        deviation = candidate.deviation(f"{side}.{name}")
        if deviation is None:
            continue
        label = f"{prefix} {short}" if prefix else name
        asked_words, found_words = (_length(v, units, column) for v in (deviation.asked, deviation.found))
        rows.append((label, asked_words, found_words, *_off(deviation)))
    count = float(asked.count_per_in) if asked.count_per_in else None
    label = f"{prefix} /in" if prefix else "per inch"
    pitch = candidate.deviation(f"{side}.pitch")
    off = -100 * pitch.difference / (100 + pitch.difference) if pitch and pitch.difference is not None else None
    asked_count, found_count = (_count(v, units, column) for v in (count, float(found.count_per_in)))
    rows.append((label, asked_count, found_count, signed(off), "muted"))
    return rows


def _count(value: float | None, units: str, column: int) -> str:
    if value is None:
        return "not asked"
    per_cm = f"{significant(value / 2.54)}/cm"
    if units == "metric":
        return per_cm
    long = f"{significant(value)} ({per_cm})"
    return long if units == "both" and width_of(long) <= column else significant(value)


def _cloth_rows(candidate: Candidate, target: Target, units: str, column: int) -> list[Row]:
    rows: list[Row] = []
    if open_area := candidate.deviation("open_area"):
        rows.append(("open area", _pct(open_area.asked), _pct(open_area.found), *_off(open_area, unit="pt")))
    if weight := candidate.deviation("mass"):
        rows.append(("mass", _mass(weight.asked, units, column), _mass(weight.found, units, column), *_off(weight)))
    section = candidate.deviation("section")
    if section and section.found is not None:
        rows.append(("section", "100 %", _pct(section.found), *_off(section)))
    rating = candidate.cloth.rating
    if rating or target.rating:
        rows.append(("rating", _rating(target.rating), _rating(rating), "", "text"))
    return rows


def _rating(rating: object) -> str:
    um, kind = getattr(rating, "um", None), getattr(rating, "kind", "")
    return "–" if um is None else f"{significant(um)} µm {harmless(kind)}"


def _length(value: float | None, units: str, column: int) -> str:
    if value is None:
        return "not asked"
    long = both(value, units)
    return long if width_of(long) <= column else f"{mm(value)} {inch(value)}" if units == "both" else long


def _mass(value: float | None, units: str, column: int) -> str:
    if value is None:
        return "–"
    long = mass(value, units)
    return long if width_of(long) <= column else mass(value, "metric" if units == "both" else units)


def _pct(value: float | None) -> str:
    return "not asked" if value is None else f"{number(value)} %"


def _off(deviation: Deviation, unit: str = "%") -> tuple[str, str]:
    """The difference and how it stands: '!' beside it where it lies outside its limit."""
    text = signed(deviation.difference, unit)
    if deviation.inside is False:
        return f"{text} !", "risk"
    return text, "good" if deviation.inside else "muted"


def reason_lines(answer: "Answer", candidate: Candidate, width: int) -> Lines:
    """Cautions first, then every finding as a sentence with the source of its limit."""
    lines: Lines = []
    for caution in answer.cautions:
        lines += [((part, "warn"),) for part in wrapped(f"! {harmless(caution)}", width, 2)]
    signs = {True: ("·", "text"), False: ("×", "bad"), None: ("?", "ask")}
    for finding in candidate.findings:
        sign, ink = signs[finding.ok]
        source = f" [{harmless(finding.source)}]" if finding.source else ""
        for index, part in enumerate(wrapped(f"{sign} {harmless(finding.message)}{source}", width, 2)):
            lines.append(((part[:1], ink), (part[1:], "text")) if index == 0 else ((part, "text"),))
    lines += _assumed(answer.targets[0], width)
    return lines or [(("Nothing differs.", "muted"),)]


def _assumed(target: Target, width: int) -> Lines:
    said = []
    if target.tolerance:
        said.append(f"tolerance ±{significant(target.tolerance.warp_mm * 1000)} µm: {target.tolerance.source}")
    assumed = [name for name, origin in target.origin.items() if origin == "assumed" and name != "tolerance"]
    said += [f"{name} assumed" for name in assumed]
    return [((part, "muted"),) for part in wrapped("Taken as: " + "; ".join(said), width, 2)] if said else []


def stock_lines(candidate: Candidate, width: int, units: str) -> Lines:
    """What lies on the rack: place, usable width, free length, and whether it serves the need."""
    if not candidate.stock:
        return [(("on the rack", "head"),), (("Nothing lies on the rack.", "muted"),)]
    total = sum(line.lot.available_m2 for line in candidate.stock)
    count = f"{len(candidate.stock)} lot{'s' if len(candidate.stock) > 1 else ''}"
    lines: Lines = [((f"on the rack: {count}, {significant(total, 3)} m²", "head"),)]
    for each in candidate.stock:
        lines += _lot(each, width, units)
    return lines


def _lot(line: StockLine, width: int, units: str) -> Lines:
    lot, ok = line.lot, line.fit.ok
    sign, ink = {True: ("+", "good"), False: ("×", "bad"), None: (" ", "text")}[ok]
    size = f"{lot.usable_width_mm} mm × {lot.free_length_mm / 1000:.2f} m"
    if units == "inch":
        size = f"{lot.usable_width_mm / 25.4:.1f} in × {lot.free_length_mm / 304.8:.1f} ft"
    elif units == "both" and width >= 60:
        size += f" ({lot.usable_width_mm / 25.4:.1f} in × {lot.free_length_mm / 304.8:.1f} ft)"
    words = f"{harmless(lot.location, 12)}  {size}"
    if lot.form != "roll" and width_of(words) + 8 <= width:
        words += f" {LOT_WORDS.get(lot.form, harmless(lot.form, 10))}"
    if width >= 60:
        words += f"  {harmless(lot.id, 16)}  heat {harmless(lot.heat or 'not on record', 16)}"
        words += f"  cert {harmless(lot.certificate or 'none', 6)}"
        words += f"  {lot.reserved_mm / 1000:.2f} m reserved" if lot.reserved_mm else ""
    lines: Lines = [((f"{sign} ", ink), (fit(words, max(8, width - 2)).rstrip(), "text"))]
    if ok is not None and line.fit.why:
        lines += [((part, ink),) for part in wrapped("    " + harmless(line.fit.why), width - 4, 0)[:1]]
    return lines


def drawing_lines(answer: "Answer", candidate: Candidate, width: int, height: int, ascii_only: bool) -> Lines:
    """Asked and offered to one scale; the offered alone where what was asked can't be drawn."""
    offered = offered_construction(candidate)
    asked = asked_construction(answer.targets[0])
    panels = [("asked", asked)] if asked else []
    panels.append(("offered: " + harmless(candidate.cloth.name, 40), offered))
    drawn = draw(panels, width, height, ascii_only=ascii_only)
    if not drawn:
        return [(("Too little room to draw: make the window larger, or press Enter.", "muted"),)]
    last = len(drawn) - 1
    plain_lines = [i in (0, last) or line.startswith("section") for i, line in enumerate(drawn)]
    return [((line, "muted" if said else "text"),) for line, said in zip(drawn, plain_lines, strict=True)]


def view_lines(
    view: str, answer: "Answer", candidate: Candidate, width: int, height: int, units: str, ascii_only: bool
) -> Lines:
    """The lower part of the match place, by the name of the view."""
    if view == "reasons":
        head = [heading(candidate, ascii_only), *purpose_line(candidate, ascii_only)]
        return [*head, *reason_lines(answer, candidate, width)]
    if view == "stock":
        return [heading(candidate, ascii_only), *stock_lines(candidate, width, units)]
    if view == "drawing":
        return drawing_lines(answer, candidate, width, height, ascii_only)
    return summary_lines(answer, candidate, width, units, ascii_only)


def whole_lines(answer: "Answer", candidate: Candidate, width: int, height: int, units: str, ascii_only: bool) -> Lines:
    """Everything about a candidate, one part under the other."""
    blank: Line = ()
    parts = [heading(candidate, ascii_only), *purpose_line(candidate, ascii_only), blank]
    parts += [*figure_lines(answer, candidate, min(width, 78), units), blank]
    parts += [*stock_lines(candidate, width, units), blank]
    parts += [(("why", "title"),), *reason_lines(answer, candidate, width), blank]
    left = height - len(parts) - 1
    rows = left if DRAWING_ROWS[0] <= left <= DRAWING_ROWS[1] else DRAWING_ROWS[left > DRAWING_ROWS[1]]
    parts += [(("to scale", "title"),), *drawing_lines(answer, candidate, min(width, 110), rows, ascii_only)]
    cloth = candidate.cloth
    said = f"{harmless(cloth.declared)}   source: {harmless(cloth.source)}   id {harmless(cloth.id)}"
    return [*parts, blank, *(((part, "muted"),) for part in wrapped(said, width))]
