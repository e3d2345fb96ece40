"""What a roll may be, in lines: what was measured, what fits, what is ruled out by what, what to measure next."""

from collections.abc import Iterator, Sequence
from typing import TYPE_CHECKING

from tui.commandline.measuring import measured_lines
from tui.commandline.reading_text import length_text
from tui.commandline.wrapping import wrapped
from tui.exit_codes import one_line

if TYPE_CHECKING:
    from catalog.construction import Wires
    from catalog.search.identify import Identification, Identified

MARGIN = " " * 10
SURE, HARDLY = 0.995, 0.005


def identify_lines(result: "Identification", most_out: int, units: str, has_demo: bool) -> Iterator[str]:
    """The whole answer in lines of at most 80 columns; of what is ruled out, the *most_out* nearest."""
    for number, line in enumerate(measured_lines(result.evidence)):
        yield from wrapped(line, MARGIN if number else "Measured  ", MARGIN + "  ")
    yield ""
    yield from _fitting(result.survivors, units)
    yield from _ruled_out([one for one in result.candidates if not one.is_in_set], most_out)
    yield ""
    if result.next:
        yield from wrapped(result.next.why, "Next      ", MARGIN)
    for warning in result.warnings:
        yield from wrapped(one_line(warning), "CAUTION   ", MARGIN)
    for note in result.notes:
        yield from wrapped(one_line(note), "Note      ", MARGIN)
    if has_demo and any(one.cloth.demo for one in result.candidates):
        yield from wrapped("Lines marked 'demo' are invented.", "Note      ", MARGIN)


def _fitting(survivors: "Sequence[Identified]", units: str) -> Iterator[str]:
    if not survivors:
        yield "Nothing in this catalogue fits what was measured."
        return
    lines = "1 line fits" if len(survivors) == 1 else f"{len(survivors)} lines fit"
    yield f"{lines} (at least 95 % of the odds, all cloths held alike beforehand):"
    for one in survivors:
        yield from wrapped(_name(one), f"  {_odds(one.odds):>6}  ", MARGIN)
        for name, wires in _sides(one):
            opening = "" if one.cloth.construction.is_filter else f"aperture {length_text(wires.aperture_mm, units)}, "
            said = f"{name}{float(wires.count_per_in):.4g}/in, {opening}wire {length_text(wires.wire_mm, units)}"
            yield from wrapped(said, MARGIN, MARGIN)
        yield from wrapped(one_line(one.reason), MARGIN, MARGIN)


def _ruled_out(out: "Sequence[Identified]", most: int) -> Iterator[str]:
    if not out or most == 0:
        return
    yield ""
    shown = out[:most]
    yield f"Not this, nearest first ({len(shown)} shown):"
    for one in shown:
        yield from wrapped(f"{_name(one)}: {one_line(one.reason)}", "  x ", "    ")


def _name(one: "Identified") -> str:
    turned = ", turned" if one.turned else ""
    demo = " demo" if one.cloth.demo else ""
    return f"{one_line(one.cloth.name)} [{one_line(one.cloth.id)}]{demo}{turned}"


def _sides(one: "Identified") -> Iterator[tuple[str, "Wires"]]:
    made = one.cloth.construction.turned() if one.turned else one.cloth.construction
    if made.warp == made.weft:
        yield "", made.warp
        return
    yield "as measured: ", made.warp
    yield "other way: ", made.weft


def _odds(odds: float) -> str:
    if odds > SURE:
        return ">99 %"
    return "<1 %" if odds < HARDLY else f"{odds:.0%}".replace("%", " %")
