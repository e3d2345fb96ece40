"""Why a plan takes the lots that it takes, in sentences; what is proven is told from what wasn't found."""

from collections.abc import Sequence

from catalog.stock.cutting_reasons import why_not
from catalog.stock.lots import Lot
from catalog.stock.plan_choice import Choice, Chooser, heat_of, is_roll, usable_m2


def reasons(chooser: Chooser, lots: Sequence[Lot], choice: Choice) -> tuple[str, ...]:
    """One sentence for each step of the choice."""
    said = [_answer(chooser, choice)]
    if not choice.is_complete or not choice.taken:
        return (*said, *_missing(chooser, lots, choice))
    said += [_heats(chooser, lots, choice), _number(chooser, lots, choice)]
    said += _rolls(chooser, lots, choice)
    unknown = [lot.id for lot, _ in choice.taken if lot.heat is None]
    if unknown:
        said.append(f"No heat is on record for {', '.join(unknown)}: each counts as a heat of its own.")
    return tuple(said)


def _answer(chooser: Chooser, choice: Choice) -> str:
    asked, missing = sum(chooser.asked), sum(choice.missing) if choice.taken else sum(chooser.asked)
    if not choice.taken:
        return f"No: none of the {asked} pieces comes out of these lots."
    names = ", ".join(f"{lot.id} ({sum(counts)})" for lot, counts in choice.taken)
    if not missing:
        return f"Yes: {asked} pieces come out of {_lots(len(choice.taken))}: {names}."
    return f"Not all: {asked - missing} of {asked} pieces come out of {_lots(len(choice.taken))}: {names}."


def _heats(chooser: Chooser, lots: Sequence[Lot], choice: Choice) -> str:
    heats = choice.heats
    if len(heats) == 1:
        return f"All of one heat: {heats[0]}."
    if len(heats) <= chooser.least_heats(lots):
        return f"{len(heats)} heats, {', '.join(heats)}: fewer can't do it, their area is too small."
    return f"{len(heats)} heats, {', '.join(heats)}: no layout was found with fewer."


def _number(chooser: Chooser, lots: Sequence[Lot], choice: Choice) -> str:
    pool = [lot for lot in lots if heat_of(lot) in choice.heats]
    number = len(choice.taken)
    if number == 1:
        return "One lot is enough."
    if number <= chooser.least_lots(pool):
        return f"Fewer than {_lots(number)} of that can't do it: their area is too small."
    return f"No layout was found with fewer than {_lots(number)}."


def _rolls(chooser: Chooser, lots: Sequence[Lot], choice: Choice) -> list[str]:
    broken = [lot for lot, _ in choice.taken if is_roll(lot)]
    if not broken:
        spared = any(is_roll(lot) for lot in lots)
        return ["No roll is broken: remnants and panels are enough."] if spared else []
    names = ", ".join(lot.id for lot in broken)
    loose = [lot for lot in lots if not is_roll(lot)]
    said = f"{'Roll' if len(broken) == 1 else 'Rolls'} {names} {'is' if len(broken) == 1 else 'are'} broken"
    if sum(map(usable_m2, loose)) < chooser.area(chooser.asked):
        return [f"{said}: remnants alone have too little area."]
    other = chooser.cover(loose, starts=1)
    if not other.is_complete:
        return [f"{said}: no layout was found in remnants alone."]
    ids = ", ".join(lot.id for lot, _ in other.taken)
    heats = f"{len(other.heats)} heats" if len(other.heats) > 1 else "one heat"
    return [f"{said}; without breaking one, {_lots(len(other.taken))} of {heats} would do it: {ids}."]


def _missing(chooser: Chooser, lots: Sequence[Lot], choice: Choice) -> list[str]:
    missing = choice.missing if choice.taken else chooser.asked
    said = []
    for piece, number in zip(chooser.pieces, missing, strict=True):
        if not number:
            continue
        why = [why_not(lot, piece) for lot in lots]
        if lots and all(why):
            widest = max(lots, key=lambda lot: (lot.usable_width_mm, lot.free_length_mm))
            said.append(f"{number} × {piece.size_text} missing. {why_not(widest, piece)} No other lot is wider.")
        else:
            said.append(f"{number} × {piece.size_text} missing: the lots are full.")
    return said


def _lots(number: int) -> str:
    return "1 lot" if number == 1 else f"{number} lots"
