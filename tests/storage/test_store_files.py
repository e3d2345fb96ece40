"""What may lie where a store is looked for, and what is said of it. Nothing is changed on failure."""

import os
import sqlite3
import subprocess
import sys
from pathlib import Path

import pytest
from store_building import fill_file, make_cloth, make_lot

from catalog.errors import ReadOnlyStoreError, StoreError
from catalog.figures import DERIVATION_VERSION
from catalog.search.reader import Filters, Point
from catalog.storage.inspecting import is_on_shared_folder
from catalog.storage.migrating import DERIVATION, HEAD, configuration
from catalog.storage.opening import open_store

SIXTY = make_cloth("sixty", ("127/300", "1651/10000"))


@pytest.fixture
def path(tmp_path: Path) -> Path:
    return fill_file(tmp_path / "store.db", [SIXTY], [make_lot("R-1", "sixty")])


def refused(path: Path, **options: object) -> str:
    before = path.read_bytes() if path.is_file() else b""
    with pytest.raises(StoreError) as caught:
        open_store(path, **options)  # type: ignore[arg-type]
    if path.is_file():
        assert path.read_bytes() == before
    message = caught.value.message
    assert message.endswith(".")
    assert "\n" not in message
    return message


def test_a_text_file_is_no_store(tmp_path: Path) -> None:
    file = tmp_path / "notes.txt"
    file.write_text("60 mesh .0065, ask on Monday\n" * 50)
    assert "isn't a database" in refused(file)


def test_somebody_elses_database_is_no_store(tmp_path: Path) -> None:
    file = tmp_path / "other.db"
    with sqlite3.connect(file) as other:
        other.execute("CREATE TABLE cloth (id)")
    other.close()
    assert "not a crosscloth store" in refused(file)


def test_an_empty_file_is_no_store(tmp_path: Path) -> None:
    file = tmp_path / "empty.db"
    file.touch()
    assert "is empty" in refused(file)


def test_a_folder_is_no_store(tmp_path: Path) -> None:
    assert "is a folder" in refused(tmp_path)


@pytest.mark.parametrize("left", [0.5, 0.01, 0.0005])
def test_a_store_cut_short_is_called_so(path: Path, left: float) -> None:
    with path.open("r+b") as file:
        file.truncate(int(path.stat().st_size * left))
    assert "cut short" in refused(path)


def test_a_missing_folder_is_named(tmp_path: Path) -> None:
    assert "doesn't exist" in refused(tmp_path / "nowhere" / "store.db")


def test_no_store_is_made_where_none_is_wanted(tmp_path: Path) -> None:
    assert "no store" in refused(tmp_path / "store.db", create=False)
    assert not any(tmp_path.iterdir())


def test_a_newer_store_is_refused(path: Path) -> None:
    with sqlite3.connect(path) as raw:
        raw.execute("UPDATE alembic_version SET version_num = '9001'")
    raw.close()
    assert "newer crosscloth" in refused(path)


def test_a_url_that_names_nothing_is_explained() -> None:
    with pytest.raises(StoreError, match="URL"):
        open_store("nosuchdatabase://somewhere/cloth")
    with pytest.raises(StoreError, match="names no file"):
        open_store("sqlite://")


def test_a_url_of_a_file_opens_the_file(path: Path) -> None:
    with open_store(f"sqlite:///{path}") as store:
        assert store.count(Filters()) == 1


def test_a_locked_store_says_so_and_can_still_be_read(path: Path) -> None:
    with open_store(path, timeout_s=0.05) as store, open_store(path) as other, other.transaction():
        with pytest.raises(StoreError, match="in use by another program"), store.transaction():
            pass
        assert store.count(Filters()) == 1


def can_be_read_only(path: Path) -> None:
    names = sorted(os.listdir(path.parent))
    content = path.read_bytes()
    with open_store(path) as store:
        assert not store.is_writable
        assert [cloth.id for cloth, _, _ in store.nearest(Point(warp_aperture_mm=0.25, weft_aperture_mm=0.25), 5)]
        assert store.lots(["sixty"])["sixty"][0].id == "R-1"
        with pytest.raises(ReadOnlyStoreError, match="only be read"), store.transaction():
            pass
        with pytest.raises(ReadOnlyStoreError):
            store.drop_demo()
    assert sorted(os.listdir(path.parent)) == names
    assert path.read_bytes() == content


def test_a_file_without_write_bits_is_read_and_not_written(path: Path) -> None:
    path.chmod(0o444)
    can_be_read_only(path)


def test_a_file_in_a_folder_without_write_bits_is_read_and_not_written(path: Path) -> None:
    path.parent.chmod(0o555)
    try:
        can_be_read_only(path)
    finally:
        path.parent.chmod(0o755)


def test_network_folders_are_told_from_the_list_of_mounts(tmp_path: Path) -> None:
    mounts = tmp_path / "mounts"
    mounts.write_text("/dev/sda1 / ext4 rw 0 0\nserver:/share /mnt/share nfs4 rw 0 0\n")
    assert is_on_shared_folder(Path("/mnt/share/cloth/store.db"), mounts)
    assert not is_on_shared_folder(Path("/home/store.db"), mounts)


def test_an_opened_store_logs_ahead_and_leaves_one_file_when_closed(path: Path) -> None:
    with open_store(path) as store, store.transaction() as connection:
        assert connection.exec_driver_sql("PRAGMA foreign_keys").scalar() == 1
        assert connection.exec_driver_sql("PRAGMA trusted_schema").scalar() == 0
    assert os.listdir(path.parent) == [path.name]


def test_the_known_derivation_is_that_of_the_figures() -> None:
    assert DERIVATION == DERIVATION_VERSION


def test_the_known_revision_is_the_newest_migration() -> None:
    from alembic.script import ScriptDirectory

    assert ScriptDirectory.from_config(configuration()).get_current_head() == HEAD


def test_the_migrations_make_the_tables_that_the_code_knows(path: Path) -> None:
    from alembic.autogenerate import compare_metadata
    from alembic.migration import MigrationContext

    from catalog.storage.tables import METADATA

    with open_store(path) as store, store.reading() as connection:
        assert compare_metadata(MigrationContext.configure(connection), METADATA) == []


def test_opening_a_store_imports_neither_alembic_nor_the_orm(path: Path) -> None:
    code = (
        "import sys\nfrom catalog.storage.opening import open_store\n"
        "from catalog.search.reader import Point\n"
        f"with open_store({str(path)!r}) as store:\n"
        "    store.nearest(Point(warp_aperture_mm=0.25, weft_aperture_mm=0.25), 50)\n"
        "    store.lots(['sixty'])\n"
        "late = ('alembic', 'sqlalchemy.orm', 'catalog.storage.tables', 'catalog.physics')\n"
        "print([name for name in late if name in sys.modules])"
    )
    done = subprocess.run([sys.executable, "-c", code], capture_output=True, text=True, check=True)
    assert done.stdout.strip() == "[]"


def test_a_failed_upgrade_leaves_the_store_as_it_was(path: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    with open_store(path) as store, store.transaction() as connection:
        connection.exec_driver_sql("UPDATE alembic_version SET version_num = '0000'")
    assert "can't be brought up to date" in _refused_upgrade(path)
    with sqlite3.connect(path) as raw:
        assert raw.execute("SELECT version_num FROM alembic_version").fetchall() == [("0000",)]
    raw.close()


def _refused_upgrade(path: Path) -> str:
    with pytest.raises(StoreError) as caught:
        open_store(path)
    return caught.value.message


def test_figures_of_another_derivation_are_recomputed(path: Path) -> None:
    with open_store(path) as store, store.transaction() as connection:
        connection.exec_driver_sql("UPDATE cloth SET warp_aperture_mm = 9, derivation = 0")
        connection.exec_driver_sql("UPDATE meta SET value = '0' WHERE name = 'derivation'")
    with open_store(path) as store:
        cloth = store.cloth("sixty")
        assert cloth is not None
        assert cloth.figures.warp_aperture_mm == pytest.approx(25.4 / 60 - 0.0065 * 25.4)
