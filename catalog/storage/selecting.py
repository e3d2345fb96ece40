"""Plain reading: cloths by figures, one by its id, lots; portable SQL."""

from collections.abc import Iterable, Mapping, Sequence
from itertools import islice
from typing import Any

from sqlalchemy import Connection, text

from catalog.cloth import Cloth
from catalog.search.reader import Filters
from catalog.stock.lots import Lot
from catalog.storage.conditions import Conditions, add_filters, weaves_asked
from catalog.storage.rows import CLOTH_COLUMNS, LOT_COLUMNS, cloth_of_row, lot_of_row

CLOTHS = f"SELECT {', '.join(f'c.{name}' for name in CLOTH_COLUMNS)} FROM cloth c"
LOTS = f"SELECT {', '.join(LOT_COLUMNS)} FROM lot"
SORT_COLUMNS = {
    "aperture": "c.ln_aperture_mean",
    "wire": "c.ln_wire_mean",
    "open-area": "c.open_area_pct",
    "mass": "c.mass_kg_m2",
}
BATCH = 500
"""Ids per statement, below every driver's limit."""


def select_cloths(
    connection: Connection, filters: Filters, sort: str = "aperture", limit: int | None = None
) -> list[Cloth]:
    """The cloths inside *filters*, ascending, those without the figure last, ties by id."""
    conditions = Conditions()
    weaves = weaves_asked(filters)
    if not weaves:
        return []
    add_filters(conditions, filters, weaves)
    sql = f"{CLOTHS} WHERE {conditions.sql} ORDER BY {_order(sort)}"
    if limit is not None:
        sql += f" LIMIT {conditions.bind(limit)}"
    return [cloth_of_row(row) for row in connection.execute(text(sql), conditions.values)]


def _order(sort: str) -> str:
    if sort == "id":
        return "c.id"
    column = SORT_COLUMNS[sort]
    return f"CASE WHEN {column} IS NULL THEN 1 ELSE 0 END, {column}, c.id"


def count_cloths(connection: Connection, filters: Filters) -> int:
    """How many cloths lie inside *filters*."""
    conditions = Conditions()
    weaves = weaves_asked(filters)
    if not weaves:
        return 0
    add_filters(conditions, filters, weaves)
    found = connection.execute(text(f"SELECT COUNT(*) FROM cloth c WHERE {conditions.sql}"), conditions.values)
    return int(found.scalar_one())


def cloths_by_id(connection: Connection, ids: Iterable[str]) -> list[Cloth]:
    """The cloths with these ids, in no order."""
    rows = _by_ids(connection, f"{CLOTHS} WHERE c.id", ids)
    return [cloth_of_row(row) for row in rows]


def lots_of_cloths(connection: Connection, ids: Iterable[str]) -> Mapping[str, Sequence[Lot]]:
    """The lots that have any length left, by cloth; by location then id."""
    rows = _by_ids(connection, f"{LOTS} WHERE length_mm > 0 AND cloth", ids)
    found: dict[str, list[Lot]] = {}
    for lot in sorted(map(lot_of_row, rows), key=lambda lot: (lot.location, lot.id)):
        found.setdefault(lot.cloth, []).append(lot)
    return found


def _by_ids(connection: Connection, sql: str, ids: Iterable[str]) -> list[Sequence[Any]]:
    """Rows of the statement *sql*, which ends in the column of the ids."""
    rows: list[Sequence[Any]] = []
    left = iter(dict.fromkeys(ids))
    while batch := list(islice(left, BATCH)):
        conditions = Conditions()
        conditions.one_of(sql, batch)
        found = connection.exec_driver_sql(conditions.driver_sql(connection.dialect.paramstyle), conditions.values)
        rows.extend(found.cursor.fetchall())
    return rows
