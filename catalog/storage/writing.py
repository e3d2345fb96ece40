"""Adding cloths and lots, within a transaction of the caller."""

from collections.abc import Iterable
from datetime import UTC, datetime

from sqlalchemy import Connection, insert

from catalog.cloth import Cloth
from catalog.figures import DERIVATION_VERSION
from catalog.stock.lots import Lot
from catalog.storage.rows import Declared, row_of_cloth, row_of_lot
from catalog.storage.tables import cloth as cloths
from catalog.storage.tables import lot as lots
from catalog.storage.tables import movement as movements


def add_cloths(connection: Connection, new: Iterable[tuple[Cloth, Declared]]) -> int:
    """Write cloths with their derived columns; returns how many.

    Raises ValueError where a figure can't be placed (an aperture of 0), the driver's error for an id that
    is there already.
    """
    rows = [row_of_cloth(cloth, declared, DERIVATION_VERSION) for cloth, declared in new]
    if rows:
        connection.execute(insert(cloths), rows)
    return len(rows)


def receive_lots(
    connection: Connection, new: Iterable[tuple[Lot, str]], person: str, note: str, at: datetime | None = None
) -> int:
    """Write lots, each with its source, and the movement by which it came in; returns how many."""
    arrived = list(new)
    if not arrived:
        return 0
    moment = (at or datetime.now(UTC)).isoformat(timespec="seconds")
    connection.execute(insert(lots), [dict(row_of_lot(lot, source)) for lot, source in arrived])
    received = [
        {
            "lot": lot.id,
            "at": moment,
            "kind": "receive",
            "length_change_mm": lot.length_mm,
            "reserved_change_mm": lot.reserved_mm,
            "length_after_mm": lot.length_mm,
            "reserved_after_mm": lot.reserved_mm,
            "location": lot.location,
            "person": person,
            "note": note,
        }
        for lot, _ in arrived
    ]
    connection.execute(insert(movements), received)
    return len(arrived)
