"""A store makes itself on first use: whole, through the migrations, seeded; or not at all."""

import os
import subprocess
import sys
from pathlib import Path

import pytest

from catalog.errors import DataError
from catalog.search.reader import Filters
from catalog.storage import seeding
from catalog.storage.opening import open_store
from catalog.storage.seed_rows import article_of, cloth_of, read_all

SIXTY = {
    "id": "sixty",
    "name": "60 mesh",
    "weave": "plain",
    "warp_text": "60",
    "weft_text": "60",
    "declared_by": "count",
    "unit": "in",
    "warp_wire": "0.0065",
    "weft_wire": "0.0065",
    "wire_unit": "in",
    "alloy": "304",
    "declared": "60 x 60 mesh .0065",
    "unit_system": "inch",
    "source": "common practice",
    "demo": "0",
}


@pytest.fixture(scope="module")
def seeded(tmp_path_factory: pytest.TempPathFactory) -> Path:
    path = tmp_path_factory.mktemp("seeded") / "store.db"
    open_store(path).close()
    return path


def test_first_use_leaves_one_file(seeded: Path) -> None:
    assert os.listdir(seeded.parent) == [seeded.name]


def test_every_row_of_the_seed_is_there(seeded: Path) -> None:
    with open_store(seeded) as store, store.reading() as connection:
        for table in ("cloths", "articles", "aliases", "lots"):
            name = {"aliases": "alias"}.get(table, table.removesuffix("s"))
            held = connection.exec_driver_sql(f"SELECT COUNT(*) FROM {name}").scalar_one()
            assert held == len(seeding.rows_of(table, with_demo=True))
        received = connection.exec_driver_sql("SELECT COUNT(*) FROM movement WHERE kind = 'receive'").scalar_one()
        assert received == len(seeding.rows_of("lots", with_demo=True))


def test_every_seeded_row_names_unit_and_source(seeded: Path) -> None:
    with open_store(seeded) as store, store.reading() as connection:
        bare = "SELECT COUNT(*) FROM cloth WHERE TRIM(source) = '' OR unit = '' OR wire_unit = ''"
        assert connection.exec_driver_sql(bare).scalar_one() == 0


def test_dropping_the_demo_equals_a_store_made_without(seeded: Path, tmp_path: Path) -> None:
    full, bare = tmp_path / "full.db", tmp_path / "bare.db"
    full.write_bytes(seeded.read_bytes())
    with open_store(full) as dropped, open_store(bare, with_demo=False) as never:
        assert dropped.has_demo
        assert dropped.drop_demo() > 0
        assert not dropped.has_demo
        assert not never.has_demo
        assert dropped.select(Filters(), "id") == never.select(Filters(), "id")
        assert not any(cloth.demo for cloth in never.select(Filters()))
        assert never.count(Filters(in_stock=True)) == 0


def test_two_programs_that_make_one_store_at_once_both_open_it(tmp_path: Path) -> None:
    path = tmp_path / "store.db"
    code = (
        "import sys\nfrom catalog.search.reader import Filters\nfrom catalog.storage.opening import open_store\n"
        "with open_store(sys.argv[1]) as store: print(store.count(Filters()))"
    )
    command = [sys.executable, "-c", code, str(path)]
    both = [subprocess.Popen(command, stdout=subprocess.PIPE, text=True) for _ in range(2)]
    counts = [int(process.communicate()[0]) for process in both]
    assert counts == [len(seeding.rows_of("cloths", with_demo=True))] * 2
    assert os.listdir(tmp_path) == [path.name]


def test_a_store_that_can_t_be_filled_isn_t_there(tmp_path: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    monkeypatch.setattr(seeding, "rows_of", lambda name, with_demo: [{**SIXTY, "source": ""}])
    with pytest.raises(DataError):
        open_store(tmp_path / "store.db")
    assert os.listdir(tmp_path) == []


def test_all_bad_rows_are_told_at_once() -> None:
    rows = [
        SIXTY,
        {**SIXTY, "id": "a", "source": " "},
        {**SIXTY, "id": "b", "wire_unit": ""},
        {**SIXTY, "id": "c", "warp_text": "sixty"},
        {**SIXTY, "id": "d", "warp_wire": ".0500", "weft_wire": ".0500"},
        SIXTY,
    ]
    with pytest.raises(DataError, match="5 rows of cloths") as caught:
        read_all("cloths", rows, cloth_of)
    said = caught.value.rows
    expected = ("no source", "no wire_unit", "'sixty' is no number", "leaves no opening", "there already")
    assert [words in row for words, row in zip(expected, said, strict=True)] == [True] * 5
    assert said[1].startswith("cloths row 4 (b)")


def test_a_count_is_kept_exactly_beside_its_spelling() -> None:
    (cloth, declared), *_ = read_all("cloths", [SIXTY], cloth_of)
    assert str(cloth.construction.warp.pitch_mm) == "127/300"  # 25.4/60, by definition of the inch
    assert str(cloth.construction.warp.wire_mm) == "1651/10000"
    assert (declared.warp, declared.unit, declared.warp_wire, declared.wire_unit) == ("60", "in", "0.0065", "in")


def test_a_price_without_a_currency_is_refused() -> None:
    row = dict.fromkeys(("id", "cloth", "part_number", "seller", "roll_sizes_mm", "minimum_m2", "lead_days"), "1")
    row |= {"price_per_m2": "12.50", "currency": "", "source": "test", "demo": "0"}
    with pytest.raises(DataError) as caught:
        read_all("articles", [row], article_of)
    assert "without a currency" in caught.value.rows[0]
    assert article_of({**row, "currency": "EUR"})["price_minor_per_m2"] == 1250
