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
from catalog.search.judging import judge, order, stock_lines
from catalog.search.pool import Found, gather
from catalog.search.reader import Reader
from catalog.search.rules import HOUSE_RULES, HouseRules
from catalog.target import Need, Purpose, Target

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
    targets = tuple(_aim(reading, request, rules) for reading in readings)
    judged = [_judge_all(target, reader, request, rules) for target in targets]
    any_will_do = understanding.status is not Status.ASK
    merged = judged[0] if len(judged) == 1 else _merge(targets, judged, any_will_do, rules)
    shown = order(merged)[: request.limit]
    with_stock = _with_stock(shown, targets, reader)
    said = dict.fromkeys(line for target in targets for line in cautions(target, request.text))
    return Answer(request, understanding, targets, tuple(with_stock), understanding.question, tuple(said))


def _taken(understanding: Understanding, label: str | None) -> tuple[Reading, ...]:
    """The surviving reading that was answered with; none where nothing was answered."""
    return tuple(r for r in understanding.surviving if r.label == label)[:1]


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
        rules.aperture,
    )


def _judge_all(target: Target, reader: Reader, request: Request, rules: HouseRules) -> list[Candidate]:
    found = gather(target, reader, request.limit, request.in_stock, rules)
    return [_judge(target, one, rules) for one in found]


def _judge(target: Target, found: Found, rules: HouseRules) -> Candidate:
    cloth, distance, turned = found
    return judge(target, cloth, distance, turned, (), rules)


def _merge(
    targets: Sequence[Target],
    judged: Sequence[Sequence[Candidate]],
    any_will_do: bool,
    rules: HouseRules,
) -> list[Candidate]:
    """One candidate a cloth: accepted alternatives give the better verdict, open readings must agree."""
    by_id = [{c.cloth.id: c for c in candidates} for candidates in judged]
    every = {cid: c for found in by_id for cid, c in found.items()}
    merged = []
    for cid, known in every.items():
        views = [
            found.get(cid) or judge(target, known.cloth, None, known.turned, (), rules)
            for target, found in zip(targets, by_id, strict=True)
        ]
        merged.append(min(views, key=lambda c: c.verdict.rank) if any_will_do else _agreed(targets, views))
    return merged


def _agreed(targets: Sequence[Target], views: Sequence[Candidate]) -> Candidate:
    first = views[0]
    if len({view.verdict for view in views}) == 1:
        return first
    said = "; ".join(
        f"as {target.reading.label}: {view.verdict}" for target, view in zip(targets, views, strict=True)
    )
    text = f"The readings disagree: {said}."
    finding = Finding("readings", None, text, "")
    by_purpose = dict.fromkeys(first.by_purpose, Verdict.CANNOT_SAY)
    return replace(
        first,
        verdict=Verdict.CANNOT_SAY,
        by_purpose=by_purpose,
        harm_side=False,
        findings=(finding, *first.findings),
        reason=text,
    )


def _with_stock(shown: Sequence[Candidate], targets: Sequence[Target], reader: Reader) -> list[Candidate]:
    lots = reader.lots([c.cloth.id for c in shown])
    return [replace(c, stock=stock_lines(lots.get(c.cloth.id, ()), targets[0])) for c in shown]
