"""The status of a callout, in one function, and the checks of stated open area and mass."""

from dataclasses import replace
from fractions import Fraction

from catalog.callout.bounds import figures_of
from catalog.callout.deciding import Decided, question
from catalog.callout.draft import Draft
from catalog.callout.reading import Likelihood, Problem, Reading, Side, Status, Understanding
from catalog.callout.sieve_senses import sieve_claims
from catalog.physics.mass import mass_nominal_kg_m2
from catalog.reference import alloys, sieves
from catalog.units import MM_PER_INCH, Length

MASS_SHARE = 0.10
"""A stated mass may be off the nominal one by so much: densities and crimp differ."""
COMMON_METALS = ("304", "CS", "CuZn30", "CuSn6", "Cu-ETP", "Al5056", "400", "TiGr2")
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
        _check_open_area(draft, reading)
        _check_mass(draft, reading)
    readings, alone = _bare_count(draft, readings, alive)
    missing = tuple(dict.fromkeys((*_missing(draft, readings), *draft.missing)))
    asked = decided.question or (question(readings) if alone else None)
    status = _status(draft, readings, decided.must_ask or alone, missing)
    if status is Status.ASK and asked is None and not draft.problems:
        asked = _rating_question(draft)
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


def _bare_count(draft: Draft, readings: list[Reading], alive: list[Reading]) -> tuple[list[Reading], bool]:
    """'4 mesh' and nothing else: a count, a sieve's number, or millimetres by metric habit."""
    if len(alive) != 1 or not _is_count_only(alive[0]) or draft.limits or draft.grade or draft.weave:
        return readings, False
    pitch = alive[0].warp.pitch
    number = MM_PER_INCH / pitch.mm if pitch else Fraction(0)
    sieve = sieves.by_number(str(number)) if number.denominator == 1 else None
    if sieve is None or alive[0].warp != alive[0].weft:
        return readings, False
    if draft.alloy or draft.form or draft.terms("material") or any(i.taken == "alloy" for i in draft.items):
        note = f"{number} is a sieve's number too: No. {number} opens {float(sieve.opening_mm):.4g} mm"
        return [replace(r, notes=(*r.notes, note)) if r is alive[0] else r for r in readings], False
    aperture, wire = sieve_claims(sieve)
    side = Side(Length(sieve.opening_mm + sieve.wire_mm), wire.warp, aperture.warp)
    named = replace(
        alive[0],
        label=f"sieve No. {number}",
        likelihood=Likelihood.POSSIBLE,
        warp=side,
        weft=side,
        standard=f"sieve designation No. {number}",
        derived=("warp.pitch_mm", "weft.pitch_mm"),
    )
    extra = [named]
    if number <= 25:
        opening = Side(aperture=Length(number))
        extra.append(
            replace(
                alive[0],
                label=f"{number} mm mesh, by metric habit",
                likelihood=Likelihood.POSSIBLE,
                warp=opening,
                weft=opening,
            )
        )
    return [*readings, *extra], True


def _is_count_only(reading: Reading) -> bool:
    return reading.warp.by_count and not any(
        (reading.warp.wire, reading.warp.aperture, reading.weft.wire, reading.weft.aperture)
    )


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


def _is_whole(reading: Reading) -> bool:
    """True where warp and weft are both known: pitch and wire, for square and rectangular cloth the opening by itself."""
    return all(side.pitch and side.wire for side in (reading.warp, reading.weft))


def _status(draft: Draft, readings: list[Reading], must_ask: bool, missing: tuple[str, ...]) -> Status:
    alive = [r for r in readings if r.likelihood is not Likelihood.RULED_OUT]
    if draft.problems or must_ask:
        return Status.ASK
    if not alive or not _is_whole(alive[0]):
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


def _rating_question(draft: Draft) -> str | None:
    rating = draft.rating
    if rating is None:
        return None
    return f"By which method are {rating.um:g} µm {rating.kind if rating.kind != 'unstated' else 'rated'}, and for which counts and wires?"


def _check_open_area(draft: Draft, reading: Reading) -> None:
    """A stated open area has to agree with the construction, rounding for rounding."""
    stated = draft.open_area
    if (
        stated is None
        or stated.number is None
        or reading.open_area_pct is None
        or "open_area_pct" not in reading.derived
    ):
        return
    warp, pitch = reading.warp.wire, reading.warp.pitch
    slack = float(stated.number.half_unit)
    if warp and pitch:
        slack += 2 * float(warp.rounding_mm / pitch.mm) * 100
    off = abs(reading.open_area_pct - float(stated.number.value))
    if off > max(slack, 0.1):
        draft.problem(
            "E_INCONSISTENT",
            f"Open area is stated as {stated.text} %, but the construction has {reading.open_area_pct:.1f} %.",
            stated,
        )


def _check_mass(draft: Draft, reading: Reading) -> None:
    """A stated mass has to fit the alloy, or some common metal where none is named."""
    if draft.mass is None or draft.is_dutch or not _is_whole(reading) or draft.mass.number is None:
        return
    stated = float(figures_of(draft.mass, "mass")[0][0])
    slack = float(draft.mass.number.half_unit / draft.mass.number.value) if draft.mass.number.value else 0.0
    names = (draft.alloy,) if draft.alloy and alloys.density_kg_m3(draft.alloy) else COMMON_METALS
    masses = {name: _mass(reading, alloys.density_kg_m3(name) or 0.0) for name in names}
    if any(abs(stated / m - 1) <= max(MASS_SHARE, slack) for m in masses.values() if m):
        return
    shown = ", ".join(f"{m:.2g} in {name}" for name, m in list(masses.items())[:1] if m)
    draft.problem(
        "E_INCONSISTENT",
        f"A mass of {stated:.3g} kg/m² fits no {'cloth of the alloy' if draft.alloy else 'common metal'}: this construction weighs {shown}.",
        draft.mass,
    )


def _mass(reading: Reading, density: float) -> float:
    warp, weft = reading.warp, reading.weft
    assert warp.pitch and weft.pitch and warp.wire and weft.wire
    return mass_nominal_kg_m2(
        float(warp.pitch.mm), float(weft.pitch.mm), float(warp.wire.mm), float(weft.wire.mm), density
    )
