"""The sentences of a receipt check: the sum, the weak link, what would decide, what wasn't measured."""

from collections.abc import Collection

from catalog.errors import InputError
from catalog.search.bench_figures import BenchFigure
from catalog.search.evidence import Evidence
from catalog.search.improving import Better
from catalog.search.outcome import Outcome
from catalog.search.reader import Range
from catalog.target import Target

SMALL_MM = 1.0


def sentence(
    figure: BenchFigure,
    asked: float | None,
    bounds: Range,
    allowed: float | None,
    outcome: Outcome,
    better: Better | None,
) -> str:
    """'Warp aperture 258.7 ± 5.4 µm, asked 250.0 ± 12.5: 8.7 + 5.4 = 14.1 > 12.5: not proven. …'"""
    scale, unit = _scale(figure, bounds)
    value, u = figure.value * scale, figure.expanded * scale
    found = f"{name_of(figure.quantity)} {value:.{_digits(unit)}f} ± {u:.{_digits(unit)}f} {unit}"
    if asked is None or allowed is None:
        low, high = (None if bound is None else f"{bound * scale:.4g}" for bound in bounds)
        limit = f"{low} to {high}" if low and high else f"at least {low}" if low else f"at most {high}"
        return f"{found}, limit {limit} {unit}: {outcome.words}.{_weak(figure, scale, unit, outcome, better)}"
    text = f"{found}, asked {asked * scale:.{_digits(unit)}f} ± {allowed * scale:.{_digits(unit)}f}: "
    text += _sum(abs(figure.value - asked) * scale, u, allowed * scale, outcome, _digits(unit))
    return text + _weak(figure, scale, unit, outcome, better)


def _sum(off: float, u: float, allowed: float, outcome: Outcome, digits: int) -> str:
    def said(value: float) -> str:
        return f"{value:.{digits}f}"

    if outcome is Outcome.FAILS:
        return f"{said(off)} − {said(u)} = {said(off - u)} > {said(allowed)}: fails."
    sign = "≤" if outcome is Outcome.CONFORMS else ">"
    return f"{said(off)} + {said(u)} = {said(off + u)} {sign} {said(allowed)}: {outcome.words}."


def _weak(figure: BenchFigure, scale: float, unit: str, outcome: Outcome, better: Better | None) -> str:
    """The weak link and the way out, where nothing is proven."""
    if outcome is not Outcome.NOT_PROVEN:
        return ""
    weak = figure.weak_link
    others = [
        f"the {_measure(p.quantity)} (±{p.expanded * scale:.{_digits(unit)}f})" for p in figure.parts if p is not weak
    ]
    text = f" The weak link is the {_measure(weak.quantity)} (±{weak.expanded * scale:.{_digits(unit)}f})"
    text += f", not {' or '.join(others)}." if others else "."
    if better is None:
        return text
    if not better.steps or better.expanded is None:
        return text + " No measurement that can usually be had would decide: the value lies too near the limit."
    steps = " and ".join(step.words for step in better.steps)
    steps = steps[0].upper() + steps[1:]
    return text + f" {steps} would decide (± {better.expanded * scale:.{_digits(unit)}f} {unit}), if the value stays."


def _scale(figure: BenchFigure, bounds: Range) -> tuple[float, str]:
    """Lengths below a millimetre in µm."""
    if figure.unit == "mm" and max(figure.value, *(bound or 0.0 for bound in bounds)) < SMALL_MM:
        return 1000.0, "µm"
    return 1.0, figure.unit


def _digits(unit: str) -> int:
    return {"mm": 3, "kg/m²": 3}.get(unit, 1)


def _measure(quantity: str) -> str:
    return quantity.replace("_weft", " of the weft")


def name_of(quantity: str) -> str:
    """'Warp aperture', 'Open area'."""
    return quantity.replace(".", " ").replace("_", " ").capitalize()


def is_square(target: Target) -> bool:
    """True where both directions are asked alike, so that one may stand for the other, with a note."""
    warp, weft = target.warp, target.weft
    return warp.aperture is None or weft.aperture is None or warp.aperture.mm == weft.aperture.mm


def missing_words(target: Target, judged: Collection[str], limits: Collection[str]) -> tuple[str, ...]:
    """What was asked and not measured; *limits* are the quantities of limits that weren't."""
    sides = [name for name, side in (("warp", target.warp), ("weft", target.weft)) if side.aperture is not None]
    measured = [name for name in sides if f"{name}.aperture" in judged]
    stands_in = f": assumed to be like the {measured[0]} aperture" if measured and is_square(target) else ""
    said = [f"The {name} aperture wasn't measured{stands_in}." for name in sides if name not in measured]
    if any(side.wire for side in (target.warp, target.weft)) and not {"warp.wire", "weft.wire"} & {*judged}:
        said.append("The wire wasn't measured: the verdict is about the rest.")
    if not sides and not target.limits:
        said.append("No opening and no limit was asked for: what was measured proves nothing of the whole cloth.")
    return (*said, *(f"The limit on {name.replace('_', ' ')} can't be judged: it wasn't measured." for name in limits))


def refuse_impossible(evidence: Evidence) -> None:
    """Raise InputError where a wire as measured leaves no opening at the pitch as counted."""
    for count, wire in ((evidence.count, evidence.wire), (evidence.count_weft, evidence.wire_weft)):
        if count and wire and wire.value >= count.pitch_mm:
            raise InputError(
                f"A wire of {float(wire.value):.4g} mm leaves no opening at a pitch of {float(count.pitch_mm):.4g} mm: "
                "was the micrometer set on a knuckle? Unravel a wire, measure it alone, and count again.",
                "E_IMPOSSIBLE",
            )


def notes_of(evidence: Evidence) -> tuple[str, ...]:
    """What was taken for granted."""
    said = ["One place was measured: it speaks for that place, not for the whole roll."]
    for name, measured in evidence.measured.items():
        if getattr(measured, "is_assumed", False):
            said.append(f"The ± of the {name.replace('_', ' ')} is the house's usual figure for the instrument.")
        said.extend(getattr(measured, "notes", ()))
    return tuple(said)


def nothing_to_judge(target: Target, figures: Collection[str]) -> str:
    """Why nothing can be said, and what to measure."""
    measured = ", ".join(name_of(name).lower() for name in figures) or "nothing of use"
    if target.reading.is_filter:
        return f"Filter cloth has no aperture to receive by, and no limit was stated that {measured} could be held to."
    if target.warp.aperture is None and not target.limits:
        return "The callout states no aperture and no limits, so there is no tolerance to judge by: state the aperture."
    return f"What was measured ({measured}) can't be judged: measure the aperture, or a count and the wire."
