"""Warp and weft: the first figure is the warp's, and what follows where that may be the other way round."""

from dataclasses import dataclass, replace

from catalog.callout.deciding.combining import Combined
from catalog.callout.reading import Likelihood, Side
from catalog.callout.rules.draft import Draft
from catalog.callout.rules.gauge_senses import SYSTEMS
from catalog.construction import Weave
from catalog.reference import gauges
from catalog.units import MM_PER_INCH, Length

GAUGES = range(6, 45)


@dataclass(frozen=True, slots=True)
class Turned:
    """A combination in one direction of reading."""

    made: Combined
    label: str
    likelihood: Likelihood
    weave: Weave | None = None
    notes: tuple[str, ...] = ()
    is_quiet: bool = False
    """True where it only turns another reading and needs no question."""


def senses_of_direction(draft: Draft, made: Combined) -> list[Turned]:
    """A combination as written, and turned where the order can't be trusted."""
    plain = Turned(made, made.label, made.likelihood)
    if draft.is_dutch:
        return _dutch(draft, made, plain)
    if _figures(made.warp) == _figures(made.weft):
        return [plain]
    told = any(n.side for n in draft.all_numbers())
    if told:
        return [plain]
    note = "the first figure is taken as the warp's; the same cloth turned by 90° is the other order"
    as_written = replace(plain, notes=(note,))
    if made.warp.wire or made.weft.wire:
        return [as_written]
    other = Turned(
        _turn(made),
        f"{made.label or 'as written'}, turned",
        made.likelihood if made.warp.aperture else Likelihood.POSSIBLE,
        is_quiet=True,
    )
    return [as_written, other, *_gauge_behind(draft, made)]


def _figures(side: Side) -> tuple[object, ...]:
    return tuple(length and length.mm for length in (side.pitch, side.wire, side.aperture))


def _turn(made: Combined) -> Combined:
    names = {"warp": "weft", "weft": "warp"}
    derived = tuple(f"{names[d.split('.')[0]]}.{d.split('.')[1]}" for d in made.derived)
    return replace(made, warp=made.weft, weft=made.warp, derived=derived)


def _gauge_behind(draft: Draft, made: Combined) -> list[Turned]:
    """'2 x 14 mesh' may be 2 mesh of 14 gauge wire, where that can be woven."""
    if not (made.warp.by_count and made.warp.pitch and made.weft.pitch):
        return []
    number = MM_PER_INCH / made.weft.pitch.mm
    if number.denominator != 1 or int(number) not in GAUGES or made.weft.pitch.mm >= made.warp.pitch.mm:
        return []
    found: dict[object, Turned] = {}
    for system in SYSTEMS:
        inches = gauges.diameter_in(system, str(number))
        wire = Length(inches * MM_PER_INCH) if inches else None
        if wire is None or not 0.03 < wire.mm / made.warp.pitch.mm < 0.577:
            continue
        side = Side(made.warp.pitch, wire, Length(made.warp.pitch.mm - wire.mm), True)
        label = f"{float(MM_PER_INCH / made.warp.pitch.mm):g} mesh of {number} gauge ({gauges.system_name(system)})"
        found.setdefault(
            wire.mm,
            Turned(
                replace(made, warp=side, weft=side, derived=("warp.aperture_mm", "weft.aperture_mm")),
                label,
                Likelihood.POSSIBLE,
            ),
        )
    return list(found.values())


def _dutch(draft: Draft, made: Combined, plain: Turned) -> list[Turned]:
    """Dutch cloth has more weft than warp, reverse Dutch more warp; written the other way,
    the order or the word is wrong.
    """
    warp, weft = made.warp.pitch, made.weft.pitch
    if warp is not None and weft is not None and warp.mm == weft.mm:
        draft.problem_at(
            "E_NOT_UNDERSTOOD", "A Dutch weave has two counts, and one is stated: which is the other?", None
        )
    if warp is None or weft is None or warp.mm == weft.mm:
        return [replace(plain, weave=draft.weave)]
    more_weft = weft.mm < warp.mm
    if any(n.side for n in draft.all_numbers()):
        return [replace(plain, weave=draft.weave or _by_packing(made))]
    if draft.weave is Weave.REVERSE_PLAIN_DUTCH:
        return [plain] if not more_weft else _swapped(made, Weave.REVERSE_PLAIN_DUTCH, Weave.PLAIN_DUTCH)
    if draft.weave is None:
        return _unnamed_dutch(made, plain, more_weft)
    if more_weft:
        return [plain]
    return _swapped(made, draft.weave, Weave.REVERSE_PLAIN_DUTCH if draft.weave is Weave.PLAIN_DUTCH else None)


def _swapped(made: Combined, named: Weave, other: Weave | None) -> list[Turned]:
    note = f"the counts stand the other way round for {named.words}: the order was taken as swapped"
    found = [Turned(_turn(made), "counts in swapped order", Likelihood.USUAL, named, (note,))]
    if other is not None:
        has_wire = made.warp.wire is not None
        found.append(
            Turned(made, f"{other.words}, in the order written", Likelihood.POSSIBLE, other, is_quiet=not has_wire)
        )
    return found


def _unnamed_dutch(made: Combined, plain: Turned, more_weft: bool) -> list[Turned]:
    """'Dutch' alone: a weft packed beyond 1.35 is twilled, one packed less may be either; the counts tell reverse."""
    if not more_weft:
        return [
            replace(plain, label="reverse plain Dutch", weave=Weave.REVERSE_PLAIN_DUTCH),
            Turned(_turn(made), "plain Dutch, counts in swapped order", Likelihood.POSSIBLE, Weave.PLAIN_DUTCH),
        ]
    weave = _by_packing(made)
    if weave is None:
        return [plain]
    note = f"which Dutch weave isn't said; the weft packs as in {weave.words}"
    found = [replace(plain, label=weave.words, weave=weave, notes=(note,))]
    if weave is Weave.PLAIN_DUTCH:
        found.append(replace(plain, label="twilled Dutch", weave=Weave.TWILLED_DUTCH, likelihood=Likelihood.POSSIBLE))
    return found


def _by_packing(made: Combined) -> Weave | None:
    if not (made.weft.wire and made.weft.pitch) or made.weft.pitch.mm <= 0:
        return None
    return Weave.PLAIN_DUTCH if made.weft.wire.mm / made.weft.pitch.mm < 1.35 else Weave.TWILLED_DUTCH
