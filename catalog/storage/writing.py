"""Adding cloths and lots, within a transaction of the caller."""

from collections.abc import Iterable
from dataclasses import dataclass
from datetime import UTC, datetime
from typing import Any

from sqlalchemy import Connection, insert

from catalog.cloth import Cloth
from catalog.figures import DERIVATION_VERSION
from catalog.stock.lots import Lot
from catalog.storage.rows import Declared, row_of_cloth, row_of_lot
from catalog.storage.tables import cloth as cloths
from catalog.storage.tables import lot as lots
from catalog.storage.tables import movement as movements


@dataclass(frozen=True, slots=True)
class Arrival:
    """A lot that comes in, with what else is known of it."""

    lot: Lot
    source: str
    received: str | None = None
    """Day of receipt, ISO 8601; None: now."""
    cost_minor_per_m2: int | None = None
    """In hundredths of *currency*."""
    currency: str | None = None


def add_cloths(connection: Connection, new: Iterable[tuple[Cloth, Declared]]) -> int:
    """Write cloths with their derived columns; returns how many.

    Raises ValueError where a figure can't be placed (an aperture of 0), the driver's error for an id that
    is there already.
    """
    rows = [row_of_cloth(cloth, declared, DERIVATION_VERSION) for cloth, declared in new]
    if rows:
        connection.execute(insert(cloths), rows)
    return len(rows)


def receive_lots(connection: Connection, new: Iterable[Arrival], person: str, note: str) -> int:
    """Write lots and for each the movement by which it came in; returns how many."""
    arrived = list(new)
    if arrived:
        now = datetime.now(UTC).isoformat(timespec="seconds")
        connection.execute(insert(lots), [_lot_row(arrival) for arrival in arrived])
        connection.execute(insert(movements), [_receipt(arrival, now, person, note) for arrival in arrived])
    return len(arrived)


def _lot_row(arrival: Arrival) -> dict[str, Any]:
    return {
        **row_of_lot(arrival.lot, arrival.source),
        "received": arrival.received,
        "cost_minor_per_m2": arrival.cost_minor_per_m2,
        "currency": arrival.currency,
    }


def _receipt(arrival: Arrival, now: str, person: str, note: str) -> dict[str, Any]:
    lot = arrival.lot
    return {
        "lot": lot.id,
        "at": arrival.received or now,
        "kind": "receive",
        "length_change_mm": lot.length_mm,
        "reserved_change_mm": lot.reserved_mm,
        "length_after_mm": lot.length_mm,
        "reserved_after_mm": lot.reserved_mm,
        "location": lot.location,
        "person": person,
        "note": note,
    }
