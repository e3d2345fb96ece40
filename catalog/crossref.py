"""The sentence: read, target, fetch, judge, rank, return. Given a Reader, so that it runs on a list as well."""

from collections.abc import Sequence
from dataclasses import dataclass, replace

from catalog import callout
from catalog.aiming import aim
from catalog.callout.reading import Likelihood, Reading, Status, Understanding
from catalog.construction import Weave
from catalog.errors import InputError
from catalog.search.candidate import Candidate, Finding, Verdict
from catalog.search.cautions import cautions
from catalog.search.judging import Assessed, assess, describe, rank
from catalog.search.pool import gather
from catalog.search.reader import Reader
from catalog.search.rules import HOUSE_RULES, HouseRules
from catalog.target import Duty, Need, Purpose, Target

ACCEPTED_ALTERNATIVE = "alternative"


@dataclass(frozen=True, slots=True)
class Request:
    """What somebody asks: a callout and how it is to be judged."""

    text: str
    purposes: tuple[Purpose, ...] = ()
    tolerance: str | None = None
    """A percentage, 'e11', 'iso3310', or None: the rules of the house decide."""
    alloy_rule: str = "same"
    weave: Weave | None = None
    min_open_area_pct: float | None = None
    need: Need | None = None
    in_stock: bool = False
    limit: int = 50
    particle_is_sphere: bool | None = None
    oversize_mm: float | None = None
    duty: Duty | None = None
    reading: str | None = None
    """Label of the one reading to take, where the callout's question has been answered."""


@dataclass(frozen=True, slots=True)
class Answer:
    """What came of it."""

    request: Request
    understanding: Understanding
    targets: tuple[Target, ...]
    candidates: tuple[Candidate, ...]
    question: str | None = None
    cautions: tuple[str, ...] = ()

    @property
    def is_served(self) -> bool:
        """True where a candidate from 'same' to 'near-risk' is there."""
        return any(c.verdict.rank <= Verdict.NEAR_RISK.rank for c in self.candidates)


def match(request: Request, reader: Reader, rules: HouseRules = HOUSE_RULES) -> Answer:
    """Find the nearest equivalents of a callout. Raises InputError where no reading survives."""
    understanding = callout.read(request.text)
    readings = _taken(understanding, request.reading) or readings_to_match(understanding)
    metal_is_open = any(p.code == "E_MATERIAL" for p in understanding.problems)
    targets = tuple(replace(_aim(reading, request, rules), alloy_is_open=metal_is_open) for reading in readings)
    judged = [(target, _judge_all(target, reader, request, rules)) for target in targets]
    any_will_do = understanding.status is not Status.ASK
    merged = _merge(judged, any_will_do, rules)
    shown = sorted(merged, key=lambda assessed: rank(assessed.candidate))[: request.limit]
    lots = reader.lots([assessed.candidate.cloth.id for assessed in shown])
    described = tuple(describe(one, lots.get(one.candidate.cloth.id, ()), rules) for one in shown)
    said = dict.fromkeys(line for target in targets for line in cautions(target, request.text))
    return Answer(request, understanding, targets, described, _question(understanding), tuple(said))


def _taken(understanding: Understanding, label: str | None) -> tuple[Reading, ...]:
    """The surviving reading that was answered with; none where nothing was answered."""
    return tuple(r for r in understanding.surviving if r.label == label)[:1]


def _question(understanding: Understanding) -> str | None:
    """The one question; where there is none and an answer is needed, what is wrong."""
    if understanding.question is None and understanding.status is Status.ASK and understanding.problems:
        return understanding.problems[0].message
    return understanding.question


def readings_to_match(understanding: Understanding) -> tuple[Reading, ...]:
    """The readings that a match has to serve. Raises InputError, with the problem, where there are none."""
    alive = understanding.surviving
    if not alive:
        raise refusal(understanding)
    if understanding.status is Status.ASK:
        return alive
    accepted = [r for r in alive[1:] if r.likelihood is Likelihood.USUAL and ACCEPTED_ALTERNATIVE in r.label]
    return (alive[0], *accepted)


def refusal(understanding: Understanding) -> InputError:
    """The error that says why nothing can be matched."""
    text = understanding.text
    if understanding.problems:
        first = understanding.problems[0]
        return InputError(first.message, first.code, first.column, text)
    return InputError("There is no cloth in this text.", "E_NO_CLOTH", None, text)


def _aim(reading: Reading, request: Request, rules: HouseRules) -> Target:
    return aim(
        reading,
        request.purposes,
        request.tolerance,
        request.alloy_rule,
        request.weave,
        request.min_open_area_pct,
        request.need,
        request.particle_is_sphere,
        request.oversize_mm,
        request.duty,
        rules.aperture,
    )


def _judge_all(target: Target, reader: Reader, request: Request, rules: HouseRules) -> list[Assessed]:
    found = gather(target, reader, request.limit, request.in_stock, rules)
    return [assess(target, cloth, distance, turned, rules) for cloth, distance, turned in found]


def _merge(
    judged: Sequence[tuple[Target, Sequence[Assessed]]], any_will_do: bool, rules: HouseRules
) -> Sequence[Assessed]:
    """One candidate a cloth: accepted alternatives give the better verdict, open readings must agree."""
    if len(judged) == 1:
        return judged[0][1]
    by_id = [(target, {one.candidate.cloth.id: one for one in found}) for target, found in judged]
    every = {cid: one.candidate for _, found in reversed(by_id) for cid, one in found.items()}
    merged = []
    for cid, known in every.items():
        views = [found.get(cid) or assess(target, known.cloth, None, known.turned, rules) for target, found in by_id]
        best = min(views, key=lambda view: view.candidate.verdict.rank)
        merged.append(best if any_will_do else _agreed(views))
    return merged


def _agreed(views: Sequence[Assessed]) -> Assessed:
    """The first view where all agree; else nobody can say, and each reading's verdict is told."""
    first = views[0].candidate
    if len({view.candidate.verdict for view in views}) == 1:
        return views[0]
    said = "; ".join(f"{v.comparison.target.reading.label}: {v.candidate.verdict}" for v in views)
    text = f"The readings disagree: {said}."
    open_ = replace(
        first,
        verdict=Verdict.CANNOT_SAY,
        by_purpose=dict.fromkeys(first.by_purpose, Verdict.CANNOT_SAY),
        harm_side=False,
        findings=(Finding("readings", None, text, ""),),
        reason=text,
    )
    return replace(views[0], candidate=open_)
