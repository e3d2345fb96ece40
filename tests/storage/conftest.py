"""Stores over small catalogues, closed at the end."""

from collections.abc import Iterable
from pathlib import Path

import pytest
from store_building import StoreOf, fill_file

from catalog.cloth import Cloth
from catalog.search.list_reader import ListReader
from catalog.stock.lots import Lot
from catalog.storage.opening import open_store
from catalog.storage.store import Store


@pytest.fixture
def store_of(tmp_path: Path) -> Iterable[StoreOf]:
    """Make a store and a list reader over the same cloths and lots."""
    opened: list[Store] = []

    def make(cloths: Iterable[Cloth], lots: Iterable[Lot] = ()) -> tuple[Store, ListReader]:
        cloths, lots = list(cloths), list(lots)
        store = open_store(fill_file(tmp_path / f"{len(opened)}.db", cloths, lots))
        opened.append(store)
        return store, ListReader(cloths, lots)

    yield make
    for store in opened:
        store.close()
