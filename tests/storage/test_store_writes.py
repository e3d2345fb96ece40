"""Transactions that lose nothing, keys that hold, the invented rows that go when told to."""

import subprocess
import sys
from pathlib import Path

import pytest
from store_building import StoreOf, fill_file, make_cloth, make_lot

from catalog.errors import StoreError
from catalog.search.reader import Filters
from catalog.storage.opening import open_store
from catalog.storage.writing import Arrival, receive_lots

WORKER = """
import sys
from sqlalchemy import select, update
from catalog.storage.opening import open_store
from catalog.storage.tables import lot
with open_store(sys.argv[1]) as store:
    for _ in range(100):
        with store.transaction() as connection:
            question = select(lot.c.length_mm).where(lot.c.id == "R-1").with_for_update()
            left = connection.execute(question).scalar_one()
            connection.execute(update(lot).where(lot.c.id == "R-1").values(length_mm=left - 1))
"""


def test_four_programs_taking_from_one_roll_lose_no_millimetre(tmp_path: Path) -> None:
    path = fill_file(tmp_path / "s.db", [make_cloth("a", ("0.41", "0.16"))], [make_lot("R-1", "a", 1000)])
    command = [sys.executable, "-c", WORKER, str(path)]
    workers = [subprocess.Popen(command, stderr=subprocess.PIPE, text=True) for _ in range(4)]
    assert [(worker.communicate()[1], worker.returncode) for worker in workers] == [("", 0)] * 4
    with open_store(path) as store, store.reading() as connection:
        assert connection.exec_driver_sql("SELECT length_mm FROM lot").scalar_one() == 1000 - 4 * 100


def test_a_lot_of_no_cloth_is_refused(store_of: StoreOf) -> None:
    store, _ = store_of([make_cloth("a", ("0.41", "0.16"))])
    with pytest.raises(StoreError, match="FOREIGN KEY"), store.transaction() as connection:
        receive_lots(connection, [Arrival(make_lot("R-9", "nosuch"), "test")], "test", "")
    assert store.lots(["nosuch"]) == {}


def test_more_than_is_there_can_t_be_reserved(store_of: StoreOf) -> None:
    store, _ = store_of([make_cloth("a", ("0.41", "0.16"))], [make_lot("R-1", "a", 1000)])
    with pytest.raises(StoreError, match="balance_holds"), store.transaction() as connection:
        connection.exec_driver_sql("UPDATE lot SET reserved_mm = 1001")


def test_a_transaction_that_fails_leaves_nothing_behind(store_of: StoreOf) -> None:
    store, _ = store_of([make_cloth("a", ("0.41", "0.16"))])
    good, bad = make_lot("R-1", "a"), make_lot("R-2", "nosuch")
    with pytest.raises(StoreError), store.transaction() as connection:
        receive_lots(connection, [Arrival(good, "test"), Arrival(bad, "test")], "test", "")
    assert store.lots(["a"]) == {}


def test_a_lot_comes_in_by_a_movement(store_of: StoreOf) -> None:
    store, _ = store_of([make_cloth("a", ("0.41", "0.16"))], [make_lot("R-1", "a", 30_000)])
    with store.reading() as connection:
        moved = connection.exec_driver_sql("SELECT lot, kind, length_change_mm, length_after_mm FROM movement")
        assert moved.all() == [("R-1", "receive", 30_000, 30_000)]


def test_dropping_the_demo_leaves_what_is_real_and_what_it_lies_on(store_of: StoreOf) -> None:
    cloths = [
        make_cloth("real", ("0.41", "0.16")),
        make_cloth("invented", ("0.41", "0.16"), demo=True),
        make_cloth("invented-used", ("0.5", "0.2"), demo=True),
    ]
    lots = [
        make_lot("D-1", "invented", demo=True),
        make_lot("D-2", "invented-used", demo=True),
        make_lot("D-3", "real", demo=True),
        make_lot("R-1", "invented-used"),
    ]
    store, _ = store_of(cloths, lots)
    assert store.has_demo
    assert store.drop_demo() == 1
    assert [cloth.id for cloth in store.select(Filters(), "id")] == ["invented-used", "real"]
    held = store.lots(["real", "invented", "invented-used"])
    assert [lot.id for found in held.values() for lot in found] == ["R-1"]
    assert store.has_demo  # one invented cloth has real stock on it
