"""The nearest cloths of a store, exactly as search.distance defines them, reading as little as it can.

Two stages: ids with their d² from a covering index, inside windows that grow until they hold the k-th nearest
for certain; then the rows of those few. The order of the answer is made by search.distance itself; the d² of
the statement is trusted to a HAIR, and whoever lies that close to the k-th is looked at.
"""

from collections.abc import Iterable
from dataclasses import dataclass, replace
from math import hypot, inf, sqrt

from sqlalchemy import Connection

from catalog.cloth import Cloth
from catalog.construction import Weave
from catalog.search.distance import Yardstick
from catalog.search.reader import Filters, Point
from catalog.search.window import Bounds, Layout, implied, largest_radius, layout, least_radius, windows
from catalog.storage.conditions import Conditions, add_filters, add_kinds, weaves_asked
from catalog.storage.edges import edges
from catalog.storage.selecting import cloths_by_id
from catalog.storage.sources import EVERYTHING, Source, source
from catalog.storage.squared import squared_distance

Found = tuple[Cloth, float, bool]
Near = tuple[str, float]
HAIR = 1e-11
"""d² of the statement and of Python agree to this."""
SPARE = 14
"""Rows asked for beyond k, in case several lie as far as the k-th."""
MANY = 3000
"""Rows that may be read without another thought."""
WIDE = 48
"""Windows beyond which rows are counted before they are read: a catalogue is a strip (thick wire goes with wide
apertures), so that a wider look may find nothing new or nearly everything."""
FIRST_REACH = 0.02
"""How far beyond the nearest possible cloth is looked at first: 1 % in aperture."""


class Experience:
    """How far earlier searches had to look, so that the next begins there. It never changes an answer."""

    def __init__(self) -> None:
        self._reach: dict[object, float] = {}

    def reach(self, kind: object) -> float | None:
        """What searches of this *kind* needed lately; None where there was none."""
        return self._reach.get(kind)

    def learn(self, kind: object, reach: float) -> None:
        """Keep a running (geometric) mean."""
        self._reach[kind] = reach**0.3 * self._reach.get(kind, reach) ** 0.7


def nearest_cloths(
    connection: Connection, point: Point, k: int, filters: Filters, experience: Experience
) -> list[Found]:
    """The *k* nearest inside *filters*; those without a rating that is asked for come last."""
    if not point.is_filter or point.rating_um is None:
        return _nearest(connection, point, k, filters, experience)
    rated = _nearest(connection, point, k, filters, experience, "c.ln_rating IS NOT NULL")
    unrated = replace(point, rating_um=None)
    return rated + _nearest(connection, unrated, k - len(rated), filters, experience, "c.ln_rating IS NULL")


def _nearest(
    connection: Connection, point: Point, k: int, filters: Filters, experience: Experience, only: str = ""
) -> list[Found]:
    weaves = weaves_asked(filters, point.is_filter)
    if k <= 0 or not weaves:
        return []
    conditions = Conditions()
    conditions.add(only)
    add_filters(conditions, filters, weaves)
    kinds = Conditions()
    add_kinds(kinds, filters, weaves)
    ids = Search(connection, point, conditions, kinds, k, experience).run(layout(point), weaves, filters)
    return ranked(point, cloths_by_id(connection, ids))[:k]


def ranked(point: Point, cloths: Iterable[Cloth]) -> list[Found]:
    """Comparable *cloths* in order, each with its distance and whether it lies turned."""
    yardstick = Yardstick(point)
    placed = [(cloth, yardstick.place(cloth)) for cloth in cloths]
    placed.sort(key=lambda pair: pair[1].order(pair[0].id))
    return [(cloth, near.distance, near.turned) for cloth, near in placed]


@dataclass(slots=True)
class Search:
    """One search in one snapshot: the point, what a cloth must fulfil, how many are wanted."""

    connection: Connection
    point: Point
    conditions: Conditions
    kinds: Conditions
    """The weaves and alloys alone, which are read past without looking at a row."""
    k: int
    experience: Experience

    def run(self, plan: Layout | None, weaves: frozenset[Weave], filters: Filters) -> list[str]:
        """Ids of the *k* nearest and of whoever lies as far as the last of them, in no order."""
        if plan is None:
            return self._cut(EVERYTHING, self._near(EVERYTHING))
        kind = (plan.lead.column, plan.wire is None, weaves, filters.alloys, tuple(filters.ranges.items()))
        reach = self.experience.reach(kind)
        if reach is None and self._rows(EVERYTHING, MANY) < MANY:
            return self._cut(EVERYTHING, self._near(EVERYTHING))
        bounds = edges(self.connection, plan, weaves, filters.alloys).meet(implied(filters, plan))
        if bounds.is_empty:
            return []
        ids, needed = self._grow(plan, bounds, reach or FIRST_REACH)
        self.experience.learn(kind, max(needed, FIRST_REACH / 4))
        return ids

    def _grow(self, plan: Layout, bounds: Bounds, first: float) -> tuple[list[str], float]:
        """Widen until the k-th nearest is inside for certain, or everything is; and the reach that took."""
        nearest, furthest = least_radius(plan, bounds), largest_radius(plan, bounds)
        reach, safe, enough, budget = first, 0.0, inf, MANY
        while True:
            radius = min(hypot(nearest, reach), enough, furthest)
            cut = windows(plan, bounds, radius)
            read = source(plan, cut)
            if len(cut) > WIDE and reach > FIRST_REACH and self._rows(read, budget) >= budget:
                reach, budget = (reach + safe) / 2, 2 * budget
                continue
            near = self._near(read)
            inside = sum(1 for _, squared in near if squared <= radius**2)
            if inside >= self.k or radius >= min(enough, furthest):
                last = near[self.k - 1][1] if len(near) >= self.k else radius**2
                return self._cut(read, near), 1.05 * sqrt(max(last - nearest**2, 0.0))
            if len(near) >= self.k:
                enough = sqrt(near[self.k - 1][1] + HAIR)
            safe, reach = reach, reach * _growth(self.k, inside, bool(near))

    def _rows(self, read: Source, limit: int) -> int:
        """How many rows of these weaves and alloys *read* looks at; *limit* where it is more."""
        kinds = self.kinds.driver_sql(self.connection.dialect.paramstyle)
        rows = f"SELECT 1 FROM {read.tables} WHERE {read.where} AND {kinds} LIMIT {limit}"
        found = self.connection.exec_driver_sql(f"{read.ahead}SELECT COUNT(*) FROM ({rows}) x", self.kinds.values)
        return int(found.scalar_one())

    def _near(self, read: Source, most: float | None = None) -> list[Near]:
        """(id, d²), nearest first: a few more than *k*, or all up to a d² of *most*."""
        squared = squared_distance(self.point)
        limit = f" LIMIT {self.k + SPARE}" if most is None else ""
        bound = "" if most is None else f" AND {squared} <= {most!r}"
        conditions = self.conditions.driver_sql(self.connection.dialect.paramstyle)
        sql = (
            f"{read.ahead}SELECT c.id, {squared} AS d2 FROM {read.tables} "
            f"WHERE {read.where} AND {conditions}{bound} ORDER BY d2, c.id{limit}"
        )
        rows = self.connection.exec_driver_sql(sql, self.conditions.values)
        return [(cloth_id, d2) for cloth_id, d2 in rows.cursor.fetchall()]

    def _cut(self, read: Source, near: list[Near]) -> list[str]:
        """Leave out what lies beyond the k-th by more than a hair."""
        if len(near) <= self.k:
            return [cloth_id for cloth_id, _ in near]
        most = near[self.k - 1][1] + HAIR
        if near[-1][1] <= most and len(near) == self.k + SPARE:
            near = self._near(read, most)
        return [cloth_id for cloth_id, squared in near if squared <= most]


def _growth(k: int, inside: int, is_populated: bool) -> float:
    """By how much to widen: as the density seen suggests (on a plane), within limits."""
    return max(1.3, min(3.0 if is_populated else 4.0, 1.15 * sqrt(k / max(inside, 1))))
