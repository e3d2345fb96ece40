"""A match in plain lines: how it was read, then each candidate with what differs and what lies where."""

import textwrap
from collections.abc import Iterator

from catalog.callout.reading import Status
from catalog.cloth import Cloth
from catalog.crossref import Answer
from catalog.search.candidate import Candidate, StockLine, Verdict
from catalog.target import Target
from tui.commandline.reading_text import describe, limit_words
from tui.exit_codes import one_line
from tui.signs import verdict_sign, verdict_words

WIDTH = 80
LOTS_SHOWN = 4
NOTHING = 0.05
"""A difference that would print as 0.0."""


def match_lines(answer: Answer, units: str, has_demo: bool) -> Iterator[str]:
    """The whole answer in lines of at most 80 columns where the text allows."""
    yield from _head(answer, units)
    listed = [c for c in answer.candidates if c.verdict is not Verdict.NOT_EQUIVALENT]
    rest = [c for c in answer.candidates if c.verdict is Verdict.NOT_EQUIVALENT]
    for number, candidate in enumerate(listed, 1):
        yield ""
        yield from candidate_lines(number, candidate, units)
    if rest:
        yield ""
        yield f"Not equivalent, nearest first ({len(rest)}):"
        for candidate in rest:
            sign = verdict_sign(candidate.verdict)
            yield from _wrapped(f"{candidate_name(candidate)}: {candidate.reason}", f"  {sign} ", "    ")
    if not answer.candidates:
        yield ""
        yield "Nothing in this catalogue lies within these limits: widen them, or match without --in-stock."
    if has_demo:
        yield ""
        yield from _wrapped(
            "Lines and lots marked 'demo' are invented: 'crosscloth store drop-demo' removes them.", "", ""
        )


def _head(answer: Answer, units: str) -> Iterator[str]:
    for target in answer.targets:
        yield from _wrapped(one_line(target.reading.label), "Read as   ", " " * 10)
        make = describe(target.reading, units)
        if make:
            yield from _wrapped(make, " " * 10, " " * 10)
        yield from _wrapped("; ".join(_asked(target)), " " * 10, " " * 10)
        for note in target.reading.notes:
            yield from _wrapped(f"note: {one_line(note)}", " " * 10, " " * 12)
    first = answer.targets[0]
    if first.tolerance:
        text = f"±{first.tolerance.warp_mm * 1000:.1f} µm on the aperture; {first.tolerance.source}"
        yield from _wrapped(text, "Tolerance ", " " * 10)
    purposes = ", ".join(p.value for p in first.purposes)
    yield f"Purpose   {purposes or 'none named: retain and pass side by side, the worse counts'}"
    for problem in answer.understanding.problems:
        yield from _wrapped(one_line(problem.message), "Problem   ", " " * 10)
    if answer.question:
        yield from _wrapped(one_line(answer.question), "QUESTION  ", " " * 10)
    if answer.understanding.status is Status.ASK and len(answer.targets) > 1:
        yield from _wrapped("Matched for each reading; where they disagree, the verdict is open.", " " * 10, " " * 10)
    for caution in answer.cautions:
        yield from _wrapped(caution, "CAUTION   ", " " * 10)


def _asked(target: Target) -> Iterator[str]:
    if target.weave:
        yield f"{target.weave.words} weave" + (" (assumed)" if target.origin.get("weave") == "assumed" else "")
    instead = f" ({target.alloy_rule} asked for instead)"
    rule = {"same": "", "any": " (any alloy will do)"}.get(target.alloy_rule, instead)
    yield f"alloy {one_line(target.reading.alloy or 'not stated')}{rule}"
    if target.reading.finish:
        yield one_line(target.reading.finish)
    if target.rating:
        yield f"rating {target.rating.um:g} µm {target.rating.kind}"
    for key, bounds in target.limits.items():
        yield limit_words(key, bounds)
    if target.certificate:
        yield f"certificate {target.certificate}"


def candidate_name(candidate: Candidate) -> str:
    """The line's name with its id and, where it is one, the word demo."""
    cloth = candidate.cloth
    return f"{one_line(cloth.name)} [{cloth.id}]" + (" demo" if cloth.demo else "")


def candidate_lines(number: int, candidate: Candidate, units: str) -> Iterator[str]:
    """One candidate: verdict, figures with differences, the reasons, the lots."""
    words = verdict_words(candidate)
    yield f"{number:>2} {verdict_sign(candidate.verdict)} {words}"
    yield from _wrapped(candidate_name(candidate), "     ", "     ")
    for line in figure_lines(candidate, units):
        yield from (f"     {part}" for part in _by_parts(line, WIDTH - 5))
    if len({*candidate.by_purpose.values()}) > 1:
        said = "; ".join(f"{name}: {verdict.value}" for name, verdict in candidate.by_purpose.items())
        yield from _wrapped(said, "     by purpose ", "     ")
    for finding in candidate.findings:
        mark = {True: "·", False: "!", None: "?"}[finding.ok]
        yield from _wrapped(finding.message, f"     {mark} ", "       ")
    yield from stock_text(candidate.stock)


def stock_text(stock: tuple[StockLine, ...]) -> Iterator[str]:
    """The lots of a candidate, the fitting ones first."""
    if not stock:
        yield "     none on the rack"
    for line in stock[:LOTS_SHOWN]:
        lot = line.lot
        fit = "" if line.fit.ok is None else f"  {'fits' if line.fit.ok else 'no'}: {line.fit.why}"
        certificate = f" cert {lot.certificate}" if lot.certificate else ""
        demo = " demo" if lot.demo else ""
        text = f"{lot.location} {lot.id} {lot.form} {lot.usable_width_mm} mm usable × {lot.free_length_mm / 1000:.2f} m"
        yield from _wrapped(f"{text}{certificate}{demo}{fit}", "     lot ", "         ")
    if len(stock) > LOTS_SHOWN:
        yield f"     and {len(stock) - LOTS_SHOWN} more lots"


def figure_lines(candidate: Candidate, units: str) -> Iterator[str]:
    """Aperture and wire in the wanted units with their differences, then open area and mass."""
    cloth = candidate.cloth
    made = cloth.construction.turned() if candidate.turned else cloth.construction
    sides = [("warp", made.warp)] if made.warp == made.weft else [("warp", made.warp), ("weft", made.weft)]
    for name, wires in sides:
        prefix = "" if len(sides) == 1 else f"{name} "
        parts = [f"{prefix}{float(wires.count_per_in):.4g}/in"]
        if not made.is_filter:
            parts.append(f"aperture {_length(float(wires.aperture_mm), units)}{_off(candidate, f'{name}.aperture')}")
        parts.append(f"wire {_length(float(wires.wire_mm), units)}{_off(candidate, f'{name}.wire')}")
        yield "  ".join(parts)
    yield "  ".join(_whole(cloth, candidate))


def _whole(cloth: Cloth, candidate: Candidate) -> Iterator[str]:
    figures = cloth.figures
    if figures.open_area_pct is not None:
        yield f"open {figures.open_area_pct:.1f} %{_off(candidate, 'open_area')}"
    if figures.mass_kg_m2 is not None:
        kind = "geometric" if cloth.construction.is_filter else "ISO 9044"
        yield f"{figures.mass_kg_m2:.3g} kg/m² {kind}{_off(candidate, 'mass')}"
    if cloth.rating:
        yield f"rated {cloth.rating.um:g} µm {cloth.rating.kind}"
    if cloth.construction.alloy:
        yield cloth.construction.alloy


def _length(mm: float, units: str) -> str:
    metric, inch = f"{mm:.4g} mm", f"{mm / 25.4:.4f} in"
    return {"metric": metric, "inch": inch}.get(units, f"{metric} {inch}")


def _off(candidate: Candidate, name: str) -> str:
    deviation = candidate.deviation(name)
    if deviation is None or deviation.difference is None:
        return ""
    unit = " pts" if deviation.unit == "points" else " %"
    if abs(deviation.difference) < NOTHING:
        return f" ±0{unit}"
    return f" {deviation.difference:+.1f}{unit}".replace("-", "−")


def _by_parts(line: str, width: int) -> Iterator[str]:
    """Break between figures only, which stand two spaces apart."""
    held = ""
    for part in line.split("  "):
        joined = f"{held}  {part}" if held else part
        if held and len(joined) > width:
            yield held
            joined = f"  {part}"
        held = joined
    yield held


def _wrapped(text: str, first: str, rest: str) -> list[str]:
    if len(first) + len(text) <= WIDTH:
        return [first + text]
    return textwrap.wrap(
        text, WIDTH, initial_indent=first, subsequent_indent=rest, break_long_words=True, break_on_hyphens=False
    ) or [first]
