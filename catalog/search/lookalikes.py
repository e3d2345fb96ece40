"""Names that mislead: look-alikes on one rack, one spoken name for many cloths, one cloth listed twice."""

from bisect import bisect_right
from collections import defaultdict
from collections.abc import Iterable, Iterator
from dataclasses import dataclass
from fractions import Fraction
from itertools import combinations

from catalog.cloth import Cloth

APART = 0.05
"""Openings further apart than this are another cloth to whoever uses it: house rule."""
COUNT_ROUNDING = Fraction(1, 200)
SAME_APERTURE = Fraction(5, 1000)
SAME_WIRE = Fraction(1, 100)
ROUNDING = 1e-9


@dataclass(frozen=True, slots=True)
class Pair:
    """Two cloths that are taken for each other, or are the same."""

    one: Cloth
    other: Cloth
    apart_pct: float
    """Aperture of the other against the one."""


@dataclass(frozen=True, slots=True)
class Spoken:
    """Everything that goes by one count."""

    name: str
    cloths: tuple[Cloth, ...]


def _is_square(cloth: Cloth) -> bool:
    return cloth.construction.is_square


def spoken_count(cloth: Cloth) -> int | None:
    """The whole count per inch that people call a square cloth by; None where it has none.

    Test-sieve cloth goes by its number: that is what people ask for.
    """
    if not _is_square(cloth):
        return None
    if cloth.standard and "(No. " in cloth.name:
        number = cloth.name.partition("(No. ")[2].partition(")")[0]
        return int(number) if number.isdigit() else None
    count = cloth.construction.warp.count_per_in
    whole = round(count)
    return whole if whole and abs(count - whole) <= COUNT_ROUNDING * whole else None


def by_spoken_name(cloths: Iterable[Cloth]) -> Iterator[Spoken]:
    """Group square cloth by what people call it, names with more than one opening first to last by count."""
    groups: dict[int, list[Cloth]] = defaultdict(list)
    for cloth in cloths:
        if (count := spoken_count(cloth)) is not None:
            groups[count].append(cloth)
    for count in sorted(groups):
        if len(groups[count]) > 1:
            yield Spoken(str(count), tuple(sorted(groups[count], key=_by_aperture)))


def called(count: int, cloths: Iterable[Cloth]) -> list[Cloth]:
    """Every square cloth that goes by *count*, the finest opening first."""
    return sorted((c for c in cloths if spoken_count(c) == count), key=_by_aperture)


def _by_aperture(cloth: Cloth) -> tuple[float, str]:
    return (cloth.figures.warp_aperture_mm or 0.0, cloth.id)


def lookalikes(cloths: Iterable[Cloth]) -> Iterator[Pair]:
    """Pairs of one spoken name whose openings lie over 5 % apart; each opening once, the finer first."""
    for group in by_spoken_name(cloths):
        distinct = list({round(_by_aperture(c)[0], 6): c for c in reversed(group.cloths)}.values())[::-1]
        for one, other in combinations(distinct, 2):
            apart = _by_aperture(other)[0] / _by_aperture(one)[0] - 1
            if abs(apart) > APART:
                yield Pair(one, other, apart * 100)


def listed_twice(cloths: Iterable[Cloth]) -> Iterator[Pair]:
    """One cloth under two unit systems: same weave and alloy, apertures within 0.5 %, wires within 1 %."""
    groups: dict[tuple[str, str | None], list[Cloth]] = defaultdict(list)
    for cloth in cloths:
        if not cloth.construction.is_filter:
            groups[cloth.construction.weave.value, cloth.construction.alloy].append(cloth)
    for group in groups.values():
        yield from _twice_in(sorted(group, key=_by_aperture))


def _twice_in(ascending: list[Cloth]) -> Iterator[Pair]:
    """Pairs across the unit systems; figures as floats, with some slack, spare most of the exact comparisons."""
    rows = [(_by_aperture(c)[0], float(c.construction.warp.wire_mm), c.unit_system == "inch", c) for c in ascending]
    apertures = [row[0] for row in rows]
    for at, (aperture, wire, is_inch, one) in enumerate(rows):
        end = bisect_right(apertures, aperture * (1 + float(SAME_APERTURE)) * (1 + ROUNDING), at + 1)
        slack = wire * 2 * float(SAME_WIRE)
        for its_aperture, its_wire, its_inch, other in rows[at + 1 : end]:
            if is_inch is not its_inch and abs(its_wire - wire) <= slack and _agree(one, other):
                yield Pair(one, other, (its_aperture / aperture - 1) * 100)


def _agree(one: Cloth, other: Cloth) -> bool:
    a, b = one.construction, other.construction
    sides = ((a.warp, b.warp), (a.weft, b.weft))
    return all(
        abs(y.aperture_mm - x.aperture_mm) <= SAME_APERTURE * x.aperture_mm
        and abs(y.wire_mm - x.wire_mm) <= SAME_WIRE * x.wire_mm
        for x, y in sides
    )
