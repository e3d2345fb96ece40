"""Which lots together: a search that fills lots one after the other and prefers few, and remnants before rolls."""

from collections.abc import Iterator, Sequence
from dataclasses import dataclass

from catalog.stock.cutting import most_of
from catalog.stock.cutting_filling import Kind
from catalog.stock.cutting_pieces import Piece, to_um
from catalog.stock.cutting_room import kinds_of
from catalog.stock.cutting_search import Effort
from catalog.stock.lots import Lot

FILLING = Effort(0, 0, fixed_attempts=2, by_area=True)
"""One look at a lot while choosing: large pieces first, what doesn't fit goes to the next lot."""
CAREFUL = Effort(12, 0, by_area=True)
"""The same for short lists, for which there is time."""
SHORT_LIST = 40
COUNTING = Effort(0, 0)
LOOKS = 400
"""Looks at lots, after which choosing takes what it has."""
HOPELESS = 0.05
"""Where more of the list is missing, another beginning won't help."""
SLOW_SIZES = 50
"""So many sizes in the list make a look count once more: it takes longer."""
COMPLETING_LOOKS = 12
STARTS = 3

Counts = tuple[int, ...]


@dataclass(frozen=True, slots=True)
class Choice:
    """Lots in the order in which they are cut, what comes out of each, and what is missing."""

    taken: tuple[tuple[Lot, Counts], ...]
    missing: Counts

    @property
    def is_complete(self) -> bool:
        """Whether nothing is missing."""
        return not any(self.missing)

    @property
    def rolls(self) -> int:
        """How many rolls are broken."""
        return sum(lot.form == "roll" for lot, _ in self.taken)

    @property
    def heats(self) -> tuple[str, ...]:
        """Heats of the lots, in their order, each once."""
        return tuple(dict.fromkeys(heat_of(lot) for lot, _ in self.taken))


def heat_of(lot: Lot) -> str:
    """The heat; a lot without one on record is a heat of its own, since nothing shows that it is the same."""
    return lot.heat or f"unknown ({lot.id})"


def usable_m2(lot: Lot) -> float:
    """Area in which pieces may lie, m²."""
    return max(0, lot.usable_width_mm) * max(0, lot.free_length_mm) / 1e6


class Chooser:
    """Looks at lots for one cut list and remembers what it saw."""

    def __init__(self, pieces: Sequence[Piece], kerf_mm: float) -> None:
        self.pieces = pieces
        self.kerf = to_um(kerf_mm)
        self.asked: Counts = tuple(piece.quantity for piece in pieces)
        self._kinds = kinds_of(pieces, self.kerf, self.asked)
        self.filling = CAREFUL if sum(self.asked) <= SHORT_LIST else FILLING
        self.looks = 0
        self._seen: dict[tuple[object, ...], Counts] = {}
        self._areas = [float(piece.area_m2) for piece in pieces]

    @property
    def is_spent(self) -> bool:
        """Whether the looks are used up."""
        return self.looks >= LOOKS

    def area(self, counts: Counts) -> float:
        """Area of so many pieces, m²."""
        return sum(area * number for area, number in zip(self._areas, counts, strict=True))

    def look(self, lot: Lot, wanted: Counts, effort: Effort | None = None) -> Counts:
        """What comes out of *lot*."""
        effort = effort or self.filling
        key = (lot.form == "disc", lot.usable_width_mm, lot.free_length_mm, wanted, effort.by_area)
        if key not in self._seen:
            self.looks += 1 + len(self.pieces) // SLOW_SIZES
            found = most_of(lot, self._wanted(wanted), self.kerf, effort)
            self._seen[key] = tuple(found[index] for index in range(len(self.pieces)))
        return self._seen[key]

    def _wanted(self, counts: Counts) -> list[Kind]:
        return [kind.times(number) for kind, number in zip(self._kinds, counts, strict=True) if number]

    def completing(self, lots: Sequence[Lot], wanted: Counts, number: int = 1) -> list[Lot]:
        """Up to *number* lots each of which holds all that is wanted: remnants first, then the smallest."""
        needed = self.area(wanted)
        found: list[Lot] = []
        large = sorted(
            (lot for lot in lots if usable_m2(lot) >= needed), key=lambda lot: (is_roll(lot), usable_m2(lot))
        )
        for lot in _spread(large, COMPLETING_LOOKS):
            if len(found) == number or (found and is_roll(lot) > is_roll(found[0])):
                break
            if self.look(lot, wanted) == wanted:
                found.append(lot)
        return found

    def cover(self, lots: Sequence[Lot], starts: int = STARTS) -> Choice:
        """Lots that hold the list, as few as the search finds from *starts* beginnings."""
        best: Choice | None = None
        for start in range(starts):
            choice = self._greedy(lots, start)
            if best is None or rank(choice) < rank(best):
                best = choice
            if self._is_settled(best, lots):
                break
        assert best is not None
        return best

    def _is_settled(self, best: Choice, lots: Sequence[Lot]) -> bool:
        """Whether other beginnings are not worth a look."""
        if best.is_complete:
            return len(best.taken) <= self.least_lots(lots) or self.is_spent
        return self.is_spent or self.area(best.missing) > HOPELESS * self.area(self.asked)

    def least_lots(self, lots: Sequence[Lot]) -> int:
        """No fewer lots can hold the list, by their area."""
        return _least([usable_m2(lot) for lot in lots], self.area(self.asked))

    def least_heats(self, lots: Sequence[Lot]) -> int:
        """No fewer heats can hold the list, by their area."""
        sizes: dict[str, float] = {}
        for lot in lots:
            sizes[heat_of(lot)] = sizes.get(heat_of(lot), 0.0) + usable_m2(lot)
        return _least(list(sizes.values()), self.area(self.asked))

    def _greedy(self, lots: Sequence[Lot], start: int, effort: Effort | None = None) -> Choice:
        """Fill lot after lot, each time the one that takes most; the first is the one that takes *start*-th most."""
        wanted, left = self.asked, list(lots)
        taken: list[tuple[Lot, Counts]] = []
        while any(wanted) and left:
            last = self.completing(left, wanted) if effort is None else []
            lot = last[0] if last else self._largest(left, wanted, 0 if taken else start, effort)
            counts = self.look(lot, wanted, effort)
            left.remove(lot)
            if not any(counts):
                break
            taken.append((lot, counts))
            wanted = tuple(n - m for n, m in zip(wanted, counts, strict=True))
        return Choice(tuple(taken), wanted)

    def partial(self, lots: Sequence[Lot]) -> Choice:
        """As many pieces as all lots give: by area and by number, whichever gives more pieces."""
        found = [self._greedy(lots, 0), self._greedy(lots, 0, COUNTING)]
        return min(found, key=lambda choice: (sum(choice.missing), rank(choice)))

    def _largest(self, lots: Sequence[Lot], wanted: Counts, place: int, effort: Effort | None) -> Lot:
        """The lot that takes most of what is wanted (remnants before rolls where equal), or the *place*-th after it."""
        worth: list[tuple[float, int, Lot]] = []
        for lot in sorted(lots, key=lambda lot: -usable_m2(lot)):
            if len(worth) > place and usable_m2(lot) < worth[place][0]:
                break
            worth.append((self.area(self.look(lot, wanted, effort)), -is_roll(lot), lot))
            worth.sort(key=lambda item: (-item[0], -item[1]))
        return worth[min(place, len(worth) - 1)][2]


def is_roll(lot: Lot) -> int:
    """1 for a roll, which is broken last."""
    return int(lot.form == "roll")


def rank(choice: Choice) -> tuple[int, int, int, int]:
    """Less is better: missing pieces, heats, lots, rolls broken."""
    return sum(choice.missing), len(choice.heats), len(choice.taken), choice.rolls


def _least(areas: list[float], needed: float) -> int:
    """How many of *areas*, the largest first, make up *needed*; one more than there are where all don't."""
    for number, area in enumerate(sorted(areas, reverse=True), 1):
        needed -= area
        if needed <= 0:
            return number
    return len(areas) + 1


def _spread(lots: Sequence[Lot], number: int) -> Iterator[Lot]:
    """All lots where they are few, else *number* of them, evenly through the order."""
    step = max(1.0, len(lots) / number)
    yield from (lots[int(i * step)] for i in range(min(number, len(lots))))
