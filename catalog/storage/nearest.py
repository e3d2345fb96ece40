"""The nearest cloths of a store, exactly as search.distance defines them."""

from collections.abc import Iterable, Mapping

from sqlalchemy import Connection, text

from catalog.cloth import Cloth
from catalog.search.distance import nearness, terms
from catalog.search.filtering import turned_ranges
from catalog.search.reader import Filters, Point, Range
from catalog.storage.conditions import Conditions, add_filters, weaves_asked
from catalog.storage.rows import cloth_of_row
from catalog.storage.selecting import CLOTHS

Found = tuple[Cloth, float, bool]


def ranked(point: Point, cloths: Iterable[Cloth]) -> list[Found]:
    """Comparable *cloths* in order, each with its distance and whether it lies turned."""
    summands = terms(point)
    placed = [(cloth, nearness(summands, cloth)) for cloth in cloths]
    placed.sort(key=lambda pair: pair[1].order(pair[0].id))
    return [(cloth, near.distance, near.turned) for cloth, near in placed]


def nearest_cloths(connection: Connection, point: Point, k: int, filters: Filters) -> list[Found]:
    """The *k* nearest inside *filters*."""
    return boxed_cloths(connection, point, {}, filters)[:k]


def boxed_cloths(
    connection: Connection, point: Point, ranges: Mapping[str, Range], filters: Filters
) -> list[Found]:
    """Every comparable cloth inside *ranges*, either way round, and inside *filters*."""
    weaves = weaves_asked(filters, point.is_filter)
    if not weaves:
        return []
    conditions = Conditions()
    add_filters(conditions, filters, weaves)
    ways = [conditions.within(way) for way in (ranges, turned_ranges(ranges))]
    if all(ways):
        conditions.add(f"(({ways[0]}) OR ({ways[1]}))")
    sql = text(f"{CLOTHS} WHERE {conditions.sql}")
    return ranked(point, map(cloth_of_row, connection.execute(sql, conditions.values)))
