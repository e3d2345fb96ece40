"""The largest sphere of twilled Dutch cloth: it takes a second each, so it is filled in after loading and kept."""

from collections.abc import Iterator
from typing import TYPE_CHECKING

from sqlalchemy import bindparam, text

from catalog.cloth import Cloth
from catalog.construction import Weave
from catalog.search.duty import twilled_sphere_um
from catalog.search.reader import Filters

if TYPE_CHECKING:
    from catalog.storage.store import Store

UPDATE = text("UPDATE cloth SET sphere_um = :um WHERE id = :id AND sphere_um IS NULL").bindparams(
    bindparam("um"), bindparam("id")
)


def fill_spheres(store: "Store") -> Iterator[tuple[Cloth, float | None]]:
    """Work out and keep every sphere that is missing, one transaction each; yields as it goes.

    None where there is no model or it doesn't converge to ±2 %: the cloth stays as it is. Raises
    ReadOnlyStoreError where the store can't be written.
    """
    twilled = store.select(Filters(weaves=frozenset({Weave.TWILLED_DUTCH})))
    for cloth in twilled:
        if cloth.figures.sphere_um is None:
            yield cloth, keep_sphere(store, cloth)


def keep_sphere(store: "Store", cloth: Cloth) -> float | None:
    """Work out one sphere, µm, and keep it."""
    sphere_um = twilled_sphere_um(cloth.construction.warp, cloth.construction.weft)
    if sphere_um is not None:
        with store.transaction() as connection:
            connection.execute(UPDATE, {"um": round(sphere_um, 3), "id": cloth.id})
    return sphere_um
