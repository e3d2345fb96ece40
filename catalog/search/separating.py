"""The measurement that best tells the survivors apart, with the length or resolution that it needs."""

from collections.abc import Mapping, Sequence
from dataclasses import dataclass, field
from fractions import Fraction
from itertools import combinations

from catalog.search.evidence import Evidence
from catalog.search.measured import Count
from catalog.search.suspicion import Suspect
from catalog.search.trials import LENGTHS_MM, Trial, trials

MOST_COMPARED = 12
GOOD_ENOUGH = 0.9
"""A lighter measurement is preferred where it tells nine tenths of what the best would."""
WORTHWHILE = 0.02
SURE_MISFIT = 5.0
CLOSE_MISFIT = 4.0
MOST_RIVALS = 4
HOW: Mapping[str, str] = {
    "weave": "look at the weave",
    "finish": "look at the finish",
    "magnet": "hold a magnet to it",
    "count": "count spaces",
    "count_weft": "count spaces the other way",
    "wire": "measure the wire",
    "wire_weft": "measure the other set's wire",
    "aperture": "measure the aperture",
    "aperture_weft": "measure the aperture the other way",
    "thickness": "measure the thickness",
    "swatch": "weigh a swatch, 100 cm² or more",
    "alloy": "have the alloy tested, or find its certificate",
}


@dataclass(frozen=True, slots=True)
class Next:
    """What to measure next."""

    measure: str
    """As in `trials.Trial`, or 'none' where the survivors are alike in everything that is on record."""
    over_mm: float | None
    """Length to count over."""
    resolution_mm: float | None
    """Expanded uncertainty (k = 2) that is needed."""
    why: str
    expected: Mapping[str, str] = field(default_factory=dict)
    """Cloth id → what it would show."""


def next_measurement(suspects: Sequence[Suspect], evidence: Evidence) -> Next | None:
    """What to measure next: to part the survivors, or to make sure of one where others lie close."""
    alive = [s for s in suspects if s.is_in_set]
    if len(alive) > 1:
        return _parting(alive[:MOST_COMPARED], evidence)
    return _confirming(alive[0], suspects, evidence) if alive else None


def _parting(alive: Sequence[Suspect], evidence: Evidence) -> Next:
    scored = [(trial, _score(trial, alive)) for trial in trials(evidence)]
    by_make = [(trial, score) for trial, score in scored if trial.measure != "alloy" and score >= WORTHWHILE]
    useful = by_make or [(trial, score) for trial, score in scored if score > 0]
    if not useful:
        return Next("none", None, None, _alike(alive))
    most = max(score for _, score in useful)
    chosen = min((t for t, score in useful if score >= GOOD_ENOUGH * most), key=lambda trial: trial.effort)
    expected = {s.cloth.id: _outcome(chosen, s) for s in alive}
    return Next(chosen.measure, chosen.over_mm, chosen.resolution_mm, _why(chosen, alive), expected)


def _score(trial: Trial, alive: Sequence[Suspect]) -> float:
    """Share of the pairs, weighed by their odds, that the trial tells apart."""
    pairs = [(a.odds * b.odds, trial.separates(a, b)) for a, b in combinations(alive, 2)]
    total = sum(weight for weight, _ in pairs)
    return sum(weight for weight, parted in pairs if parted) / total if total else 0.0


def _alike(alive: Sequence[Suspect]) -> str:
    names = " and ".join(s.cloth.id for s in alive[:3])
    if any(s.made != alive[0].made for s in alive):
        return f"No measurement that can be made on the rack tells {names} apart."
    return f"{names} are alike in everything that is on record: one cloth listed more than once?"


def _why(trial: Trial, alive: Sequence[Suspect]) -> str:
    one, other = next((a, b) for a, b in combinations(alive, 2) if trial.separates(a, b))
    setting = f" over {trial.over_mm:g} mm" if trial.over_mm else ""
    setting += f" to ±{trial.resolution_mm:g} mm" if trial.resolution_mm else ""
    shown = f"{one.cloth.id} would show {_outcome(trial, one)}, {other.cloth.id} {_outcome(trial, other)}"
    return f"{HOW[trial.measure].capitalize()}{setting}: {shown}{_misfit_words(trial, one, other)}."


def _misfit_words(trial: Trial, one: Suspect, other: Suspect) -> str:
    """'; 118 in 50 mm puts the other at 7.6': what the count would do to the other cloth."""
    if not trial.measure.startswith("count") or trial.over_mm is None:
        return ""
    suffix = trial.measure.removeprefix("count")
    counted = _counted(one, suffix, trial.over_mm)
    off = _off(counted, other, suffix)
    return f"; {float(counted.spaces):g} in {trial.over_mm:g} mm puts the latter at {off:.1f} times the ±"


def _counted(suspect: Suspect, suffix: str, over_mm: float) -> Count:
    """The count that this cloth shows over a length: the nearest whole number of spaces."""
    spaces = max(1, round(over_mm / float(suspect.side(suffix).pitch_mm)))
    return Count(Fraction(spaces), Fraction(over_mm))


def _off(counted: Count, suspect: Suspect, suffix: str) -> float:
    return counted.fit(float(suspect.side(suffix).pitch_mm)).misfit or 0.0


def _outcome(trial: Trial, suspect: Suspect) -> str:
    shown = trial.shows(suspect)
    if shown is None:
        return "what can't be told beforehand"
    if isinstance(shown, str):
        return shown
    digits = ".1f" if trial.unit == "spaces" else ".4g"
    return f"{(shown[0] + shown[1]) / 2:{digits}} {trial.unit}"


def _confirming(leader: Suspect, suspects: Sequence[Suspect], evidence: Evidence) -> Next | None:
    """Where one fits and others are out by their pitch alone, and not by much: the length that makes sure."""
    if evidence.count is None:
        return None
    rivals = [s for s in suspects if not s.is_in_set and _is_close(s)][:MOST_RIVALS]
    lengths = [length for length in LENGTHS_MM if length > evidence.count.length_mm]
    for length in lengths if rivals else []:
        counted = _counted(leader, "", length)
        misfits = [_off(counted, rival, "") for rival in rivals]
        if min(misfits) >= SURE_MISFIT:
            return _sure(leader, rivals, counted, misfits)
    return None


def _is_close(suspect: Suspect) -> bool:
    fits = dict(suspect.stand.fits)
    pitch = fits.pop("pitch")
    return 1 < (pitch.misfit or 0) <= CLOSE_MISFIT and all(fit.is_within for fit in fits.values())


def _sure(leader: Suspect, rivals: Sequence[Suspect], counted: Count, misfits: Sequence[float]) -> Next:
    over = float(counted.length_mm)
    names = ", ".join(f"{rival.cloth.id} at {off:.1f}" for rival, off in zip(rivals, misfits, strict=True))
    why = (
        f"{leader.cloth.id} alone fits. To be surer, count over {over:g} mm: "
        f"{float(counted.spaces):g} in {over:g} mm would put {names} times the ±."
    )
    expected = {s.cloth.id: f"{over / float(s.side('').pitch_mm):.1f} spaces" for s in (leader, *rivals)}
    return Next("count", over, None, why, expected)
