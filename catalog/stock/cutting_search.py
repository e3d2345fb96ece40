"""The best of many attempts to lay a cut list into one rectangle.

Most pieces first, then most area, then the least length, then what is left in the largest parts. Attempts follow
fixed rules and then rules drawn at random from a fixed seed: the same question always has the same answer. It is a
search, not a proof: a better layout may exist.

Sizes are whole micrometres with one kerf added (see cutting_cells).
"""

from collections.abc import Callable, Iterator, Sequence
from dataclasses import dataclass, replace
from itertools import islice
from random import Random
from typing import TypeAlias

from catalog.stock.cutting_filling import (
    BLOCK,
    FITS,
    ROW,
    SINGLE,
    SPLITS,
    Attempt,
    Fit,
    Kind,
    Split,
    fill,
    straight_rows,
)
from catalog.stock.cutting_uniform import blocks

SEED = 1195
SINGLE_PIECES_UP_TO = 40
"""Longer lists are placed by rows and blocks only."""
MANY_SIZES = 20
"""Beyond so many sizes attempts become fewer."""


@dataclass(frozen=True, slots=True)
class Effort:
    """How long to look: attempts by random rules, how often the length is halved in on, attempts by fixed rules."""

    random_attempts: int
    halvings: int
    fixed_attempts: int = 6
    by_area: bool = False
    """Most area before most pieces: right where other lots take what is missing."""

    @property
    def is_quick(self) -> bool:
        """Whether it is one look only, without a comparison with straight rows."""
        return not self.random_attempts

    def attempts(self, sizes: int) -> int:
        """Attempts by random rules for a list of so many sizes: fewer for long lists, where each takes longer."""
        return self.random_attempts * MANY_SIZES // max(sizes, MANY_SIZES)

    def worth(self, attempt: Attempt) -> tuple[int, int, int]:
        """What the better attempt has more of."""
        first = (attempt.area, attempt.count) if self.by_area else (attempt.count, attempt.area)
        return *first, -attempt.length


QUICK = Effort(0, 0)
THOROUGH = Effort(150, 6)

Key: TypeAlias = Callable[[Kind], float]
Rules: TypeAlias = tuple[Sequence[Kind], Fit, Split, int]

KEYS: tuple[Key, ...] = (
    lambda kind: -kind.area,
    lambda kind: -max(kind.shapes[0][:2]),
    lambda kind: -min(kind.shapes[0][:2]),
    lambda kind: kind.area,
)
FIXED = ((0, 2, 0, BLOCK), (0, 0, 1, BLOCK), (1, 2, 0, BLOCK), (2, 1, 1, ROW), (3, 2, 0, BLOCK), (3, 0, 1, BLOCK))
"""Order, fit, split and grain of the attempts that are always made."""


def search(width: int, length: int, kinds: Sequence[Kind], effort: Effort = THOROUGH) -> Attempt:
    """The best layout of *kinds* in *width* × *length*.

    Offset rows of discs are used only where they hold more pieces than straight ones: straight cuts can't part them.
    """
    kinds = [kind for kind in kinds if _lies_in(kind, width, length)]
    best = _most(width, length, kinds, effort, staggered=False)
    if best.count == _asked(kinds):
        return _shortest(width, best, kinds, effort) if best.count else best
    if any(kind.is_disc for kind in kinds):
        offset = _most(width, length, kinds, effort, staggered=True)
        best = offset if effort.worth(offset)[:2] > effort.worth(best)[:2] else best
    return best


def is_better(one: Attempt, other: Attempt, effort: Effort = THOROUGH) -> bool:
    """Whether *one* is the better layout of the same list in the same cloth."""
    plain, plain_other = effort.worth(one), effort.worth(other)
    return plain > plain_other or (plain == plain_other and _togetherness(one) > _togetherness(other))


def _togetherness(attempt: Attempt) -> int:
    """Large where what is left hangs together."""
    return sum((leaf.width * leaf.length) ** 2 for leaf in attempt.root.leaves() if leaf.content is None)


def _most(width: int, length: int, kinds: Sequence[Kind], effort: Effort, staggered: bool) -> Attempt:
    """The attempt with the most pieces; looks no further once a bound by area is reached."""
    best = fill(width, length, *next(_fixed(kinds)), staggered)
    ceiling = _asked(kinds) if staggered or effort.by_area else _ceiling(width * length, kinds)
    more = [] if effort.is_quick else [straight_rows(width, length, kinds)]
    if len(kinds) == 1 and not staggered and not effort.is_quick:
        more.append(blocks(width, length, kinds[0]))
    for rules in islice(_fixed(kinds), 1, effort.fixed_attempts):
        more.append(fill(width, length, *rules, staggered))
    for found in more:
        best = found if is_better(found, best, effort) else best
    rng = Random(SEED)
    for _ in range(effort.attempts(len(kinds))):
        if len(kinds) == 1 or best.count >= ceiling:
            break
        found = fill(width, length, *_drawn(kinds, best.count, rng), staggered)
        best = found if is_better(found, best, effort) else best
    return best


def _shortest(width: int, best: Attempt, kinds: Sequence[Kind], effort: Effort) -> Attempt:
    """The same pieces in less length, where attempts in a shorter cloth succeed."""
    low = max(-(-best.area // width), max(min(h for _, h, _ in kind.shapes) for kind in kinds))
    tried = replace(effort, random_attempts=effort.random_attempts // 3)
    for _ in range(effort.halvings):
        if low >= best.length or len(kinds) == 1:
            break
        middle = (low + best.length) // 2
        fitting = [kind for kind in kinds if _lies_in(kind, width, middle)]
        found = _most(width, middle, fitting, tried, staggered=False) if len(fitting) == len(kinds) else None
        if found is not None and found.count == best.count:
            best = found
        else:
            low = middle + 1
    return best


def _fixed(kinds: Sequence[Kind]) -> Iterator[Rules]:
    for key, fit, split, grain in FIXED:
        yield sorted(kinds, key=KEYS[key]), FITS[fit], SPLITS[split], grain


def _drawn(kinds: Sequence[Kind], reached: int, rng: Random) -> Rules:
    """Rules drawn at random; every other time for one piece more than was reached, the smallest of the list."""
    asked = _asked(kinds)
    grain = rng.choice((SINGLE, SINGLE, ROW, BLOCK)) if asked <= SINGLE_PIECES_UP_TO else rng.choice((ROW, BLOCK))
    if reached < asked and rng.random() < 0.5:
        kinds = _smallest(kinds, reached + 1)
    if grain == SINGLE:
        kinds = [kind.times(1) for kind in kinds for _ in range(kind.quantity)]
    key, noise = rng.choice(KEYS), rng.choice((0.0, 0.2, 0.6, 1.0))
    order = sorted(kinds, key=lambda kind: key(kind) * (1 + noise * (rng.random() - 0.5)))
    return order, rng.choice(FITS), rng.choice(SPLITS), grain


def _smallest(kinds: Sequence[Kind], number: int) -> list[Kind]:
    kept: list[Kind] = []
    for kind in sorted(kinds, key=lambda kind: kind.area):
        quantity = min(kind.quantity, number - _asked(kept))
        if quantity:
            kept.append(kind.times(quantity))
    return kept


def _asked(kinds: Sequence[Kind]) -> int:
    return sum(kind.quantity for kind in kinds)


def _ceiling(area: int, kinds: Sequence[Kind]) -> int:
    """No layout holds more pieces: the smallest ones fill the area."""
    count = 0
    for kind in sorted(kinds, key=lambda kind: kind.area):
        fitting = min(kind.quantity, area // kind.area)
        count, area = count + fitting, area - fitting * kind.area
    return count


def _lies_in(kind: Kind, width: int, length: int) -> bool:
    return any(w <= width and h <= length for w, h, _ in kind.shapes)
