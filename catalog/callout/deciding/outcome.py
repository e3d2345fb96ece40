"""What becomes of a callout: readings kept and ruled out, repairs offered."""

from collections.abc import Sequence
from dataclasses import dataclass, field, replace

from catalog.callout.deciding.asking import question
from catalog.callout.deciding.combining import Combined, combinations
from catalog.callout.deciding.feasible import Fault, fault_of
from catalog.callout.deciding.making import figures_of_side, make_reading
from catalog.callout.deciding.mending import Mended, clash_message, mend_clash, mend_unit
from catalog.callout.deciding.turning import Turned, senses_of_direction
from catalog.callout.reading import Likelihood, Reading
from catalog.callout.rules.draft import Draft
from catalog.construction import Weave
from catalog.units import Length

QUIET_SENSES = ("opening x wire or rectangle",)
"""Senses that stay possible without a question, since custom is plain."""


@dataclass(slots=True)
class Decided:
    """The outcome, before the status is put together."""

    readings: list[Reading] = field(default_factory=list)
    must_ask: bool = False
    question: str | None = None


@dataclass(frozen=True, slots=True)
class Tried:
    """A reading in one direction, and what speaks against it."""

    turned: Turned
    fault: Fault | None

    @property
    def made(self) -> Combined:
        """The combination of senses."""
        return self.turned.made


def decide(draft: Draft) -> Decided:
    """Generate every reading, rule out what is no cloth, offer repairs where nothing is left."""
    turned = [t for made in _distinct(combinations(draft)) for t in senses_of_direction(draft, made)]
    tried = [Tried(t, fault_of(t.made, t.weave or draft.weave, draft.is_dutch)) for t in turned]
    alive = [t for t in tried if t.fault is None and not t.made.clashes]
    best = min((t.made.rank for t in alive), default=0)
    alive = [t for t in alive if t.made.rank == best]
    lost = [t.made for t in tried if t.made.clashes and t.fault is None and t.made.rank <= best and _is_usual(t)]
    if lost and not any(_is_usual(t) for t in alive):
        return _contradiction(draft, [m for m in lost if m.rank == min(x.rank for x in lost)], alive)
    if alive:
        return _survivors(draft, alive, [t for t in tried if t.fault and _is_worth_saying(t)], best)
    clashing = [t.made for t in tried if t.fault is None]
    clashing = [made for made in clashing if made.rank == min(m.rank for m in clashing)]
    return _contradiction(draft, clashing) if clashing else _no_cloth(draft, tried)


def _lengths(made: Combined) -> list[Length | None]:
    """The figures that a fault is about, the wire first."""
    return [made.warp.wire, made.weft.wire, made.warp.aperture, made.warp.pitch]


def place_of(lengths: Sequence[Length | None]) -> int | None:
    """Where the first figure stands that the text states."""
    return next((x.span[0] for x in lengths if x is not None and x.span is not None and x.written), None)


def _is_usual(tried: Tried) -> bool:
    return tried.turned.likelihood is Likelihood.USUAL


def _is_worth_saying(tried: Tried) -> bool:
    """What is ruled out is shown, unless it was but the other unit of a bare number."""
    made = tried.made
    return made.rank == 0 and not made.is_inferred and not any(o.sense.startswith("unit") for o in made.options)


def _survivors(draft: Draft, alive: list[Tried], ruled_out: list[Tried], rank: int) -> Decided:
    done = Decided()
    turned = [t.turned for t in alive]
    done.readings = [make_reading(draft, t.made, t.label, t.likelihood, weave=t.weave, notes=t.notes) for t in turned]
    done.readings += [_ruled_out(draft, t) for t in ruled_out]
    sought = all(t.likelihood is Likelihood.POSSIBLE for t in turned)
    asked = [t for t in turned if not t.is_quiet and (sought or not _is_customary(t))]
    usual_lost = [t for t in ruled_out if _is_usual(t)]
    done.must_ask = len(asked) > 1 or rank > 1 or (sought and bool(usual_lost))
    if done.must_ask and len(asked) < 2 and ruled_out and ruled_out[0].fault:
        draft.problem_at(ruled_out[0].fault.code, ruled_out[0].fault.message, place_of(_lengths(ruled_out[0].made)))
    if done.must_ask:
        done.question = question(done.readings)
        if done.question is None and not draft.problems:
            said = next((n for o in turned[0].made.options for n in o.notes), turned[0].label or "the figures")
            message = f"{said[:1].upper()}{said[1:]}; taken otherwise it makes no cloth: is that meant?"
            draft.problem_at("E_UNIT", message, place_of(_lengths(turned[0].made)))
    return done


def _is_customary(turned: Turned) -> bool:
    """True for a sense that custom leaves unasked, though it is possible."""
    return any(o.sense in QUIET_SENSES for o in turned.made.options if o.likelihood is Likelihood.POSSIBLE)


def _distinct(made: list[Combined]) -> list[Combined]:
    """Combinations that differ in a figure or a word; the nearest at hand of those that don't."""
    kept: dict[object, Combined] = {}
    for one in sorted(made, key=lambda m: (m.rank, m.likelihood is not Likelihood.USUAL)):
        extra = tuple((o.rating, o.alloy, o.form, o.grade, o.missing) for o in one.options)
        kept.setdefault((figures_of_side(one.warp), figures_of_side(one.weft), extra), one)
    return list(kept.values())


def _ruled_out(draft: Draft, tried: Tried) -> Reading:
    assert tried.fault
    made, weave = tried.made, tried.turned.weave
    label = tried.turned.label or "as written"
    return make_reading(draft, made, label, Likelihood.RULED_OUT, weave=weave, notes=(tried.fault.message,))


def _contradiction(draft: Draft, clashing: Sequence[Combined], others: Sequence[Tried] = ()) -> Decided:
    """Figures that disagree beyond rounding: every repair is a reading, and the question shows them."""
    first = clashing[0]
    draft.problem_at("E_INCONSISTENT", clash_message(first.clashes[0]), place_of(first.clashes[0].lengths[1:]))
    repairs = [m for made in clashing[:4] for m in mend_clash(draft, made)]
    readings = _mended_readings(draft, repairs, Likelihood.USUAL)
    readings += [make_reading(draft, t.made, t.turned.label, Likelihood.POSSIBLE, t.turned.weave) for t in others]
    if not readings:
        readings = [
            make_reading(draft, first, "as written", Likelihood.RULED_OUT, notes=(clash_message(first.clashes[0]),))
        ]
    return Decided(readings, True, question(readings))


def _mended_readings(draft: Draft, repairs: Sequence[Mended], likelihood: Likelihood) -> list[Reading]:
    seen: dict[object, Reading] = {}
    for m in repairs:
        key = (figures_of_side(m.made.warp), figures_of_side(m.made.weft))
        made = make_reading(draft, m.made, m.label, likelihood, notes=m.notes)
        seen.setdefault(key, replace(made, standard=m.standard or made.standard))
    return list(seen.values())


def _no_cloth(draft: Draft, tried: Sequence[Tried]) -> Decided:
    """Nothing can be woven as written: say why, and offer a slip of the unit,
    a twill or a Dutch weave that explains it.
    """
    fault = tried[0].fault
    assert fault is not None
    repairs = [m for one in tried[:4] for m in mend_unit(draft, one.made)]
    place = place_of(_lengths(tried[0].made))
    if repairs:
        draft.problem_at("E_UNIT", f"{fault.message.rstrip('.')}; {repairs[0].label}?", place)
    else:
        draft.problem_at(fault.code, fault.message, place)
    readings = _mended_readings(draft, repairs, Likelihood.POSSIBLE)
    readings += _other_weaves(draft, tried)
    readings += [_ruled_out(draft, one) for one in tried[:4] if one.fault and not one.made.is_inferred]
    return Decided(readings, True, question(readings))


def _other_weaves(draft: Draft, tried: Sequence[Tried]) -> list[Reading]:
    found = []
    for made, fault in ((t.made, t.fault) for t in tried[:4]):
        if fault and fault.twill_only and draft.weave is None and not made.is_inferred:
            found.append(
                make_reading(draft, made, "2/2 twill, its wires lying paired", Likelihood.POSSIBLE, Weave.TWILLED)
            )
        elif fault and fault.code == "E_IMPOSSIBLE" and not draft.is_dutch and _packs_like_dutch(made):
            warp, weft = replace(made.warp, aperture=None), replace(made.weft, aperture=None)
            bare = replace(made, warp=warp, weft=weft, derived=())
            label = "plain Dutch, the word left out"
            found.append(make_reading(draft, bare, label, Likelihood.POSSIBLE, Weave.PLAIN_DUTCH))
    return found


def _packs_like_dutch(made: Combined) -> bool:
    """Only a Dutch weave packs its weft so that wire and pitch are about one."""
    warp, weft = made.warp, made.weft
    if not (warp.pitch and warp.wire and weft.pitch and weft.wire) or warp.pitch.mm <= weft.pitch.mm:
        return False
    return warp.wire.mm < warp.pitch.mm and weft.pitch.mm <= weft.wire.mm <= weft.pitch.mm * 14 / 10
