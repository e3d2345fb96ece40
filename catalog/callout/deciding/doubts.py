"""What is easily turned round is asked: a last look at answers that are sure of themselves.

Each doubt is a small function from what was understood to the problem it sees; one is enough to ask.
"""

import re
from collections.abc import Callable
from dataclasses import replace

from catalog.callout.reading import Likelihood, Problem, Status, Understanding
from catalog.construction import Weave

SURE = (Status.CLEAR, Status.NOTED, Status.LIMITS)
Doubt = Callable[[Understanding], Problem | None]
NEGATION = re.compile(
    r"\b(?:no|not|never|without|kein\w*|nicht|ohne|pas|sans|ningun\w*|sin|senza|nessun\w*)\b", re.IGNORECASE
)
PLAIN_NEGATION = re.compile(
    r"\b(?:not?|nicht)\s+(?:finer|coarser|less|more|fewer|under|over|below|above|smaller|larger|bigger|thinner|thicker"
    r"|heavier|lighter|greater|exceeding|weniger|mehr|unter|über|feiner|gröber|kleiner|größer|dünner|dicker)\b"
    r"(?:\s+(?:than|als))?",
    re.IGNORECASE,
)
MODAL = re.compile(r"\b(?:shall|must|should|may|can|darf|soll|muss)\s+not\b", re.IGNORECASE)
NUMBER_SIGN = re.compile(r"\bno\.?\s*\d", re.IGNORECASE)
PER_AREA = re.compile(
    r"(?:per|/|je|pro)\s*(?:sq|square|quadrat)\b|(?:per|/|je|pro)\s*\.?\s*(?:cm|in|inch)\s?(?:²|2\b|\^2)|\bsq\b",
    re.IGNORECASE,
)
BY_DIRECTION = re.compile(r"\b(?:warp|kette|kett\w*|cha[iî]ne|ordito|urdimbre)\b(?!\s*(?:×|x)\s)", re.IGNORECASE)
SIZE_OF_MESH = re.compile(r"\b(?:larger|bigger|greater|smaller)\s+than\s+[\d.,]+\s*(?:mesh|#)", re.IGNORECASE)
OWN_SENTENCE = "Woven wire"
"""How a construction is written back, direction by direction."""
STEELS = (302, 303, 304, 309, 310, 314, 316, 317, 321, 347, 410, 430, 904)


def negated_bound(understood: Understanding) -> Problem | None:
    """'no opening larger than 6 mm' bounds the other way than 'larger than 6 mm': only plain forms are read."""
    if not any(r.limits for r in understood.surviving):
        return None
    text = PLAIN_NEGATION.sub(" ", NUMBER_SIGN.sub(" ", understood.text))
    found = MODAL.search(understood.text) or NEGATION.search(text)
    if found is None:
        return None
    message = f"'{found.group()}' turns a limit round: say it as 'at least' or 'at most'."
    return Problem("E_NOT_UNDERSTOOD", message, understood.text.find(found.group()) + 1)


def count_per_area_as_bound(understood: Understanding) -> Problem | None:
    """A bound on openings per area is no bound on a count per length."""
    found = PER_AREA.search(understood.text)
    if found is None or not any("count_per_in" in r.limits for r in understood.surviving):
        return None
    return Problem(
        "E_NOT_UNDERSTOOD", "A limit on openings per area: state the count per inch or cm.", found.start() + 1
    )


def size_of_a_mesh(understood: Understanding) -> Problem | None:
    """'larger than 20 mesh' is a larger number to one and a larger hole to another."""
    found = SIZE_OF_MESH.search(understood.text)
    if found is None or not any("count_per_in" in r.limits for r in understood.surviving):
        return None
    message = f"'{found.group()}': a larger number or a larger opening? Say 'finer than' or 'coarser than'."
    return Problem("E_NOT_UNDERSTOOD", message, found.start() + 1)


def steel_as_bound(understood: Understanding) -> Problem | None:
    """'304 max 1 kg/m²': the number before the limit is a steel's, not a count's."""
    for reading in understood.surviving:
        for value in reading.limits.get("count_per_in", ()):
            if value in STEELS:
                message = f"Is {value:g} the steel or a limit on the count? Put a comma between alloy and limit."
                return Problem("E_NOT_UNDERSTOOD", message, understood.text.find(f"{value:g}") + 1)
    return None


def wires_by_direction(understood: Understanding) -> Problem | None:
    """Figures named for warp and weft one by one, where one direction came out unlike any cloth."""
    found = BY_DIRECTION.search(understood.text)
    if found is None or understood.text.startswith(OWN_SENTENCE):
        return None
    for reading in understood.surviving:
        wires = [side.wire.mm for side in (reading.warp, reading.weft) if side.wire is not None]
        if len(wires) == 2 and max(wires) > 2 * min(wires):
            message = "Figures for warp and weft: which belongs to which isn't certain; write them as warp x weft."
            return Problem("E_NOT_UNDERSTOOD", message, found.start() + 1)
    return None


def far_apart(understood: Understanding) -> Problem | None:
    """'1 x 5 mm' is seldom one wire per inch of 5 mm: a slot is as likely."""
    for reading in understood.surviving[:1]:
        pitch, wire = reading.warp.pitch, reading.warp.wire
        named = re.search(
            r"mesh|count|/\s*in|per\s+in|wire|draht|fil|hilo|filo|ga\b|swg", understood.text, re.IGNORECASE
        )
        if pitch and wire and reading.warp.by_count and pitch.mm > 12 and wire.mm >= 3 and not named:
            return Problem("E_NOT_UNDERSTOOD", "Is this a slot, or a count with a wire? Name the figures.", 1)
    return None


def swapped_dutch(understood: Understanding) -> Problem | None:
    """Dutch cloth written fine count first, with both wires: which wire goes with which is a question."""
    for reading in understood.surviving[:1]:
        if understood.text.startswith(OWN_SENTENCE):
            break
        if reading.weave not in (Weave.PLAIN_DUTCH, Weave.TWILLED_DUTCH):
            continue
        warp, weft = reading.warp, reading.weft
        if warp.wire and weft.wire and warp.pitch and weft.pitch and warp.wire.mm < weft.wire.mm:
            message = "The warp of Dutch cloth is the thicker wire: are counts and wires in the same order?"
            return Problem("E_NOT_UNDERSTOOD", message, 1)
    return None


SPOILING: tuple[Doubt, ...] = (
    negated_bound,
    count_per_area_as_bound,
    size_of_a_mesh,
    steel_as_bound,
    wires_by_direction,
)
"""Where one of these holds, what was read is likely wrong: nothing is to be matched with it."""
OPEN: tuple[Doubt, ...] = (far_apart, swapped_dutch)
"""Where one of these holds, what was read is one way to take it."""


def doubted(understood: Understanding) -> Understanding:
    """The same, or a question where something is easily turned round."""
    if understood.status not in SURE:
        return understood
    spoilt = _seen(SPOILING, understood)
    problems = spoilt + _seen(OPEN, understood)
    if not problems:
        return understood
    readings = understood.readings
    if spoilt:
        readings = tuple(
            replace(r, likelihood=Likelihood.RULED_OUT, notes=(*r.notes, spoilt[0].message)) for r in readings
        )
    return replace(
        understood,
        status=Status.ASK,
        readings=readings,
        question=problems[0].message,
        problems=(*problems, *understood.problems),
    )


def _seen(doubts: tuple[Doubt, ...], understood: Understanding) -> tuple[Problem, ...]:
    return tuple(problem for doubt in doubts if (problem := doubt(understood)) is not None)
