"""From a text to an understanding. Reading never fails: what isn't understood is said with its place."""

from dataclasses import replace

from catalog.callout.alternatives import alternatives, with_alternative
from catalog.callout.deciding.outcome import Decided, decide
from catalog.callout.deciding.status import status_of
from catalog.callout.joining.comparisons import bounded
from catalog.callout.joining.directions import sided
from catalog.callout.joining.labels import labelled
from catalog.callout.joining.letters import letters
from catalog.callout.joining.measures import measured
from catalog.callout.joining.structure import structured
from catalog.callout.reading import Likelihood, Problem, Reading, Side, Status, Understanding, Word
from catalog.callout.rules.bands import bands
from catalog.callout.rules.bare_sizes import bare_sizes
from catalog.callout.rules.bounds import bounds
from catalog.callout.rules.codes import part_numbers, steel_codes
from catalog.callout.rules.dates import dates
from catalog.callout.rules.draft import Draft
from catalog.callout.rules.grades import grade_wires
from catalog.callout.rules.labelled import labelled_figures
from catalog.callout.rules.leftovers import leftovers
from catalog.callout.rules.metals import metals
from catalog.callout.rules.shapes import unnamed_figures
from catalog.callout.rules.sizes import sizes
from catalog.callout.rules.tolerances import tolerances
from catalog.callout.rules.words import words
from catalog.callout.text.items import Item
from catalog.callout.text.repair import Repaired, repair
from catalog.callout.text.tokens import tokenize

LONGEST = 4000
"""Characters that are read; what comes after is no callout."""
MOST_CLAIMS, MOST_CHOICES = 12, 6
MOST_ITEMS = 300
"""Words, numbers and signs that are read: work and time stay in proportion to the length."""


def read(text: str) -> Understanding:
    """Understand *text*: every reading, what speaks against it, one question, what is missing. Never raises."""
    repaired = repair(text[:LONGEST])
    tokens = tokenize(repaired.text)
    items = _pieces(tokens[:MOST_ITEMS])
    parts = alternatives(items)
    understood = _understand(Draft(parts[0]), repaired, text)
    if len(parts) > 1:
        understood = with_alternative(understood, _understand(Draft(parts[1]), repaired, text))
    if len(text) > LONGEST or len(tokens) > MOST_ITEMS:
        return _too_long(understood, min(LONGEST, repaired.place(items[-1].end) if items else 0))
    return understood


def _pieces(tokens: list[Item]) -> list[Item]:
    return bounded(sided(labelled(letters(structured(measured(tokens))))))


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
    _keep_to_one_cloth(draft)
    decided = decide(draft) if draft.outside is None else Decided()
    return _placed(status_of(draft, decided, text), draft, repaired)


def _keep_to_one_cloth(draft: Draft) -> None:
    """A cloth has few figures: a text with more holds a list, and isn't combined into every cloth that it could be."""
    if len(draft.claims) > MOST_CLAIMS or len(draft.choices) > MOST_CHOICES:
        draft.problem("E_NOT_UNDERSTOOD", "The text holds more figures than one cloth has.")
        del draft.claims[MOST_CLAIMS:], draft.choices[MOST_CHOICES:]


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
