"""The status of a callout, in one function."""

from dataclasses import replace

from catalog.callout.deciding.asking import question
from catalog.callout.deciding.bare_count import bare_count
from catalog.callout.deciding.outcome import Decided
from catalog.callout.deciding.stated_checks import check_mass, check_open_area, is_whole
from catalog.callout.reading import Likelihood, Problem, Reading, Status, Understanding
from catalog.callout.rules.draft import Draft

CARRIES_NO_CLOTH = frozenset({"E_NOT_UNDERSTOOD"})


def status_of(draft: Draft, decided: Decided, text: str) -> Understanding:
    """Put the understanding together."""
    if draft.outside is not None:
        return Understanding(text, Status.OUT_OF_SCOPE, problems=(draft.outside, *draft.problems))
    readings = [r for r in decided.readings if not _is_empty(r)]
    if not readings and not draft.limits:
        return _nothing(draft, text)
    if not readings:
        readings = [replace(decided.readings[0], label="limits only")] if decided.readings else []
    alive = [r for r in readings if r.likelihood is not Likelihood.RULED_OUT]
    for reading in alive[:1]:
        check_open_area(draft, reading)
        check_mass(draft, reading)
    readings, alone = bare_count(draft, readings, alive)
    missing = tuple(dict.fromkeys((*_missing(draft, readings), *draft.missing)))
    asked = decided.question or (question(readings) if alone else None)
    status = _status(draft, readings, decided.must_ask or alone, missing)
    if status is Status.ASK and asked is None and not draft.problems:
        asked = _rating_question(readings) or f"What is meant for {', '.join(missing) or 'the cloth'}?"
    if (
        status in (Status.ASK, Status.NOTED, Status.CLEAR, Status.LIMITS, Status.INCOMPLETE)
        and asked is None
        and draft.questions
    ):
        asked = draft.questions[0]
    return Understanding(text, status, tuple(readings), asked, missing, tuple(draft.problems))


def _is_empty(reading: Reading) -> bool:
    sides = (reading.warp, reading.weft)
    if reading.label.startswith("alloy "):
        return False
    return (
        reading.rating is None
        and all(x is None for s in sides for x in (s.pitch, s.wire, s.aperture))
        and not _only_size(reading)
    )


def _only_size(reading: Reading) -> bool:
    return "a size" in reading.label


def _nothing(draft: Draft, text: str) -> Understanding:
    """No figure of a cloth in the text: an unknown part number or a date is a question, all else is out of scope."""
    only_figures = bool(draft.all_numbers()) and all(i.kind not in ("word", "term") for i in draft.items)
    asks = [p for p in draft.problems if "part number" in p.message or p.code == "E_DATE" or only_figures]
    missing = tuple(draft.missing)
    if asks:
        return Understanding(
            text, Status.ASK, question=asks[0].message, missing=missing, problems=tuple(draft.problems)
        )
    what = "It points to something that isn't here: " if "refers elsewhere" in missing else ""
    said = Problem(
        "E_NO_CLOTH", f"{what}there is no figure of a cloth in the text: no count, opening or wire.".capitalize(), None
    )
    readings: tuple[Reading, ...] = ()
    if draft.form is not None or draft.alloy or draft.weave:
        readings = (
            Reading(
                "no cloth data",
                Likelihood.RULED_OUT,
                draft.weave,
                alloy=draft.alloy,
                form=draft.form,
                notes=tuple(draft.notes),
            ),
        )
    return Understanding(text, Status.OUT_OF_SCOPE, readings, missing=missing, problems=(said, *draft.problems))


def _missing(draft: Draft, readings: list[Reading]) -> list[str]:
    """What would make the first reading a whole cloth."""
    alive = [r for r in readings if r.likelihood is not Likelihood.RULED_OUT]
    if not alive:
        return []
    first, found = alive[0], []
    if not (first.warp.pitch or first.warp.aperture) or not (first.weft.pitch or first.weft.aperture):
        found.append("count" if draft.is_dutch or first.rating else "count or opening")
    if not first.warp.wire or not first.weft.wire:
        found.append("wire")
    if draft.alloy is None and "material grade" not in draft.missing:
        found.append("material")
    return found


def _status(draft: Draft, readings: list[Reading], must_ask: bool, missing: tuple[str, ...]) -> Status:
    alive = [r for r in readings if r.likelihood is not Likelihood.RULED_OUT]
    if draft.problems or must_ask:
        return Status.ASK
    if not alive or not is_whole(alive[0]):
        if draft.limits and not _is_rated(alive):
            return Status.LIMITS
        if alive and _is_rated(alive) and alive[0].rating and alive[0].rating.kind != "absolute":
            return Status.ASK
        return Status.INCOMPLETE
    if "refers elsewhere" in missing:
        return Status.ASK
    noted = alive[0].notes or len(readings) > 1 or draft.weave is None or missing or draft.limits
    return Status.NOTED if noted else Status.CLEAR


def _is_rated(alive: list[Reading]) -> bool:
    return bool(alive) and alive[0].rating is not None and alive[0].warp.pitch is None


def _rating_question(readings: list[Reading]) -> str | None:
    rating = next((r.rating for r in readings if r.rating), None)
    if rating is None:
        return None
    kind = rating.kind if rating.kind != "unstated" else "rated"
    return f"By which method are {rating.um:g} µm {kind}, and for which counts and wires?"
