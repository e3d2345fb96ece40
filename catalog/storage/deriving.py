"""Recomputing the stored figures after a formula has changed."""

from typing import Any

from sqlalchemy import Connection, bindparam, select, update

from catalog.figures import DERIVATION_VERSION, figures
from catalog.reference import alloys
from catalog.storage.rows import CLOTH_COLUMNS, cloth_of_row, derived_columns
from catalog.storage.tables import cloth, meta

BATCH = 1000


def density_kg_m3(alloy: str | None) -> float | None:
    """The alloy table's density, kg/m³; None where the alloy is open or isn't in it."""
    return alloys.density_kg_m3(alloy) if alloy is not None else None


def rederive(connection: Connection) -> int:
    """Recompute the derived columns of every cloth of another derivation; returns how many.

    A sphere that was filled in by the slow solver is dropped, to be filled in again.
    """
    columns = [cloth.c[name] for name in CLOTH_COLUMNS]
    stale = select(*columns).where(cloth.c.derivation != DERIVATION_VERSION).limit(BATCH)
    done = 0
    while rows := connection.execute(stale).all():
        statement = update(cloth).where(cloth.c.id == bindparam("old_id"))
        connection.execute(statement, [_rederived(row) for row in rows])
        done += len(rows)
    version = str(DERIVATION_VERSION)
    connection.execute(update(meta).where(meta.c.name == "derivation").values(value=version))
    return done


def _rederived(row: Any) -> dict[str, Any]:
    old = cloth_of_row(row)
    make = old.construction
    new = figures(make, density_kg_m3(make.alloy))
    return {"old_id": old.id, **derived_columns(make, new, old.rating, DERIVATION_VERSION)}
