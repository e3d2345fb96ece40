"""Every cloth inside a box of apertures or pitches, either way round."""

from collections.abc import Mapping
from math import floor, log

from sqlalchemy import Connection, text

from catalog.search.axes import BAND
from catalog.search.filtering import turned_ranges
from catalog.search.reader import Filters, Point, Range
from catalog.storage.conditions import Conditions, add_filters, weaves_asked
from catalog.storage.nearest import Found, ranked
from catalog.storage.rows import cloth_of_row
from catalog.storage.selecting import CLOTHS


def boxed_cloths(connection: Connection, point: Point, ranges: Mapping[str, Range], filters: Filters) -> list[Found]:
    """Every comparable cloth inside *ranges* and *filters*, in the order of nearest."""
    weaves = weaves_asked(filters, point.is_filter)
    if not weaves:
        return []
    conditions = Conditions()
    add_filters(conditions, filters, weaves)
    for quantity in ("aperture", "pitch"):
        conditions.add(_bands(ranges, quantity))
    ways = [conditions.within(way) for way in (ranges, turned_ranges(ranges))]
    if all(ways):
        conditions.add(f"(({ways[0]}) OR ({ways[1]}))")
    sql = text(f"{CLOTHS} WHERE {conditions.sql}")
    return ranked(point, map(cloth_of_row, connection.execute(sql, conditions.values)))


def _bands(ranges: Mapping[str, Range], quantity: str) -> str:
    """The bands of the mean that the box can touch, so that an index serves; '' where a side is open."""
    lows, highs = zip(*(ranges.get(f"{side}_{quantity}_mm", (None, None)) for side in ("warp", "weft")), strict=True)
    if any(bound is None or bound <= 0 for bound in (*lows, *highs)):
        return ""
    low, high = (floor(sum(map(log, bounds)) / 2 / BAND) for bounds in (lows, highs))
    return f"c.{quantity}_band BETWEEN {low - 1} AND {high + 1}"
