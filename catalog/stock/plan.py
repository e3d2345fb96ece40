"""A cut list out of several lots: fewest heats, then fewest lots, then remnants before rolls, then least waste."""

from collections.abc import Iterator, Sequence
from dataclasses import dataclass, replace
from decimal import Decimal
from itertools import combinations, islice

from catalog.errors import InputError
from catalog.stock.cutting import Cutting, cut_lot
from catalog.stock.cutting_pieces import Piece
from catalog.stock.cutting_search import Effort
from catalog.stock.layout import LotCut
from catalog.stock.lots import Lot
from catalog.stock.plan_choice import STARTS, Choice, Chooser, heat_of, rank, usable_m2
from catalog.stock.plan_reasons import reasons

FINAL = Effort(24, 3)
ALIKE = 4
FINAL_CUTS = 12
"""Choices alike in heats, lots and rolls of which the waste is compared."""
GROUPS = {1: 60, 2: 12, 3: 4}
"""Sets of heats tried for each number of heats, the largest first; beyond three the largest heats only."""


@dataclass(frozen=True, slots=True)
class Plan:
    """Lots cut one after the other for one list."""

    pieces: tuple[Piece, ...]
    cuts: tuple[LotCut, ...]
    why: tuple[str, ...]
    """Why these lots, one sentence each."""

    @property
    def missing(self) -> tuple[int, ...]:
        """How many of each piece no lot gave."""
        placed = [sum(counts) for counts in zip(*(cut.placed for cut in self.cuts), strict=True)] or [0] * len(
            self.pieces
        )
        return tuple(piece.quantity - count for piece, count in zip(self.pieces, placed, strict=True))

    @property
    def is_complete(self) -> bool:
        """Whether every piece comes out."""
        return not any(self.missing)

    @property
    def heats(self) -> tuple[str, ...]:
        """Heat numbers used; a lot without one on record counts as a heat of its own."""
        return tuple(dict.fromkeys(heat_of(cut.lot) for cut in self.cuts))

    @property
    def waste_m2(self) -> Decimal:
        """Waste of all lots, m²."""
        return sum((cut.waste_m2 for cut in self.cuts), Decimal(0))


def plan(lots: Sequence[Lot], pieces: Sequence[Piece], how: Cutting | None = None) -> Plan:
    """Choose lots for *pieces* and cut them.

    It is a search, not a proof: what the words call impossible is shown by area or width, the rest was not found.
    Raises InputError for an empty list, or lots of several cloths.
    """
    if not pieces:
        raise InputError("The cut list is empty: state what is to be cut.")
    if len({lot.cloth for lot in lots}) > 1:
        raise InputError("The lots are of several cloths: plan each cloth by itself.")
    how = (how or Cutting()).within(FINAL)
    chooser = Chooser(tuple(pieces), how.kerf_mm)
    usable = [lot for lot in lots if usable_m2(lot) > 0]
    choices = _choices(chooser, usable)
    few = choices[: max(1, FINAL_CUTS // max(1, len(choices[0].taken)))] if choices else []
    made = [(choice, _cut(choice, chooser, how)) for choice in few]
    best, cuts = min(made, key=lambda item: sum(cut.waste_m2 for cut in item[1])) if made else (Choice((), ()), ())
    return Plan(tuple(pieces), cuts, reasons(chooser, usable, best))


def _choices(chooser: Chooser, lots: Sequence[Lot]) -> list[Choice]:
    """The best choices found, alike in everything but waste; one incomplete choice where none is complete."""
    if not lots:
        return []
    groups: dict[str, list[Lot]] = {}
    for lot in lots:
        groups.setdefault(heat_of(lot), []).append(lot)
    for number in _numbers(chooser.least_heats(lots), len(groups)):
        found = [choice for pool in _pools(chooser, groups, number) for choice in _complete(chooser, pool)]
        if found:
            least = min(rank(choice) for choice in found)
            return [choice for choice in found if rank(choice) == least][:ALIKE]
    whole = chooser.cover(lots)
    return [whole if whole.is_complete else chooser.partial(lots)]


def _numbers(least: int, most: int) -> Iterator[int]:
    """Numbers of heats to try, in wider steps where they are many."""
    number = least
    while number <= most:
        yield number
        number += 1 + number // 8


def _pools(chooser: Chooser, groups: dict[str, list[Lot]], number: int) -> Iterator[list[Lot]]:
    """Lots of *number* heats together, where their area suffices, the largest first."""
    needed = chooser.area(chooser.asked)
    sizes = {heat: sum(map(usable_m2, lots)) for heat, lots in groups.items()}
    ordered = sorted(groups, key=lambda heat: -sizes[heat])
    large = (heats for heats in combinations(ordered, number) if sum(sizes[heat] for heat in heats) >= needed)
    for heats in islice(large, GROUPS.get(number, 1)):
        if chooser.is_spent:
            return
        yield [lot for heat in heats for lot in groups[heat]]


def _complete(chooser: Chooser, pool: Sequence[Lot]) -> list[Choice]:
    """Complete choices out of *pool*: single lots where one holds all, else the fewest found."""
    single = chooser.completing(pool, chooser.asked, ALIKE)
    if single:
        nothing = (0,) * len(chooser.asked)
        return [Choice(((lot, chooser.asked),), nothing) for lot in single]
    choice = chooser.cover(pool, STARTS if len({heat_of(lot) for lot in pool}) <= max(GROUPS) else 1)
    return [choice] if choice.is_complete else []


def _cut(choice: Choice, chooser: Chooser, how: Cutting) -> tuple[LotCut, ...]:
    """Lay every lot out once more with more care; as it was chosen where care finds no way."""
    wanted, cuts = chooser.asked, []
    for lot, counts in choice.taken:
        cut = cut_lot(lot, chooser.pieces, how, counts)
        if not cut.is_complete:
            cut = cut_lot(lot, chooser.pieces, replace(how, effort=chooser.filling), wanted)
        wanted = tuple(n - m for n, m in zip(wanted, cut.placed, strict=True))
        cuts.append(cut)
    return tuple(cuts)
