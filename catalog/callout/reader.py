"""From a text to an understanding. Reading never fails: what isn't understood is said with its place."""

from collections.abc import Sequence
from dataclasses import replace

from catalog.callout.bounds import bounds
from catalog.callout.deciding import Decided, decide
from catalog.callout.draft import Draft
from catalog.callout.grades import grade_wires
from catalog.callout.items import Item
from catalog.callout.labelled import labelled_figures, tolerances
from catalog.callout.labels import bounded, labelled, letters, sided
from catalog.callout.leftovers import bands, dates, leftovers, part_numbers, steel_codes
from catalog.callout.measures import measured
from catalog.callout.metals import metals
from catalog.callout.reading import Likelihood, Problem, Reading, Side, Status, Understanding, Word
from catalog.callout.repair import Repaired, repair
from catalog.callout.shapes import unnamed_figures
from catalog.callout.sizes import bare_sizes, sizes
from catalog.callout.status import status_of
from catalog.callout.structure import structured
from catalog.callout.tokens import tokenize
from catalog.callout.words import words

LONGEST = 4000
"""Characters that are read; what comes after is no callout."""
MOST_ITEMS = 300
"""Words, numbers and signs that are read: work and time stay in proportion to the length."""


def read(text: str) -> Understanding:
    """Understand *text*: every reading, what speaks against it, one question, what is missing. Never raises."""
    repaired = repair(text[:LONGEST])
    tokens = tokenize(repaired.text)
    items = _pieces(tokens[:MOST_ITEMS])
    parts = _alternatives(items)
    understood = _understand(Draft(parts[0]), repaired, text)
    if len(parts) > 1:
        understood = _with_alternative(understood, _understand(Draft(parts[1]), repaired, text))
    if len(text) > LONGEST or len(tokens) > MOST_ITEMS:
        return _too_long(understood, min(LONGEST, repaired.place(items[-1].end) if items else 0))
    return understood


def _pieces(tokens: list[Item]) -> list[Item]:
    return bounded(sided(labelled(letters(structured(measured(tokens))))))


def _alternatives(items: list[Item]) -> list[list[Item]]:
    """'… / alt. 40 mesh .0095': a second cloth, where both sides hold the figures of one."""
    for at, item in enumerate(items):
        if item.has("equal"):
            item.taken = "kind of goods"
        elif item.has("alternative") and _has_cloth(items[:at]) and _has_cloth(items[at:]):
            item.taken = "alternative"
            return [items[: at + 1], items[at + 1 :]]
    return [items]


def _has_cloth(items: Sequence[Item]) -> bool:
    numbers = [n for i in items for n in (i.members if i.kind == "chain" else [i] if i.is_number else [])]
    named = any(
        n.slot in ("mesh", "count", "aperture", "pitch") or n.unit in ("mesh sign", "/in", "/cm", "M") for n in numbers
    )
    return named or any(i.kind == "chain" for i in items)


def _understand(draft: Draft, repaired: Repaired, text: str) -> Understanding:
    """Apply the grammar in order: names first, then sizes and limits, then figures, then what is left."""
    for note in repaired.notes:
        draft.note(note)
    words(draft, repaired.text)
    bands(draft)
    dates(draft)
    steel_codes(draft)
    metals(draft)
    sizes(draft)
    bounds(draft)
    labelled_figures(draft)
    unnamed_figures(draft)
    grade_wires(draft)
    tolerances(draft)
    bare_sizes(draft)
    part_numbers(draft)
    leftovers(draft)
    decided = decide(draft) if draft.outside is None else Decided()
    return _placed(status_of(draft, decided, text), draft, repaired)


def _placed(understood: Understanding, draft: Draft, repaired: Repaired) -> Understanding:
    """The same with every place counted in the text as it came."""
    problems = tuple(
        replace(p, column=None if p.column is None else repaired.place(p.column) + 1) for p in understood.problems
    )
    readings = tuple(_reading(r, repaired) for r in understood.readings) if repaired.places else understood.readings
    return replace(understood, problems=problems, readings=readings, words=_words(draft, repaired))


def _reading(reading: Reading, repaired: Repaired) -> Reading:
    return replace(reading, warp=_side(reading.warp, repaired), weft=_side(reading.weft, repaired))


def _side(side: Side, repaired: Repaired) -> Side:
    moved = {
        name: replace(length, span=repaired.span(*length.span))
        for name in ("pitch", "wire", "aperture")
        if (length := getattr(side, name)) is not None and length.span is not None
    }
    return replace(side, **moved)


def _words(draft: Draft, repaired: Repaired) -> tuple[Word, ...]:
    found: list[Word] = []
    for item in draft.items:
        for part in item.members or [item]:
            if part.kind != "sign" and part.taken:
                start, end = repaired.span(part.start, part.end)
                if not found or start >= found[-1].end:
                    found.append(Word(start, end, part.taken))
    return tuple(found)


def _with_alternative(first: Understanding, other: Understanding) -> Understanding:
    """The first choice, and the alternative that the text accepts; what the alternative leaves out is as in the first."""
    mains = [r for r in first.readings if r.likelihood is not Likelihood.RULED_OUT]
    extra = [_inherit(mains[0], r) for r in other.surviving[:1]] if mains else []
    mains = (
        [replace(r, alloy=r.alloy or extra[0].alloy, weave=r.weave or extra[0].weave) for r in mains]
        if extra
        else mains
    )
    asks = (
        Status.ASK in (first.status, other.status)
        or not extra
        or other.status in (Status.OUT_OF_SCOPE, Status.INCOMPLETE)
    )
    status = Status.ASK if asks else Status.NOTED if first.status is Status.CLEAR else first.status
    problems = first.problems + tuple(p for p in other.problems if p not in first.problems)
    if not extra and not problems:
        problems = (Problem("E_NOT_UNDERSTOOD", "The alternative isn't understood.", None),)
    words = tuple(sorted((*first.words, *other.words), key=lambda w: w.start))
    readings = (*mains, *extra, *(r for r in first.readings if r.likelihood is Likelihood.RULED_OUT))
    return replace(
        first,
        status=status,
        readings=readings,
        problems=problems,
        words=words,
        question=first.question or other.question,
    )


def _inherit(main: Reading, other: Reading) -> Reading:
    filled = {
        key: getattr(main, key)
        for key in ("weave", "alloy", "finish", "crimp", "certificate", "form")
        if getattr(other, key) is None
    }
    return replace(other, label=f"stated alternative: {other.label}", likelihood=Likelihood.USUAL, **filled)


def _too_long(understood: Understanding, end: int) -> Understanding:
    message = f"The text is too long for a callout: what follows column {end} was not read."
    note = "only the beginning of the text was read"
    readings = tuple(replace(r, likelihood=Likelihood.RULED_OUT, notes=(*r.notes, note)) for r in understood.readings)
    problem = Problem("E_NOT_UNDERSTOOD", message, end + 1)
    return replace(
        understood,
        status=Status.OUT_OF_SCOPE,
        readings=readings,
        question=None,
        problems=(problem, *understood.problems),
    )
