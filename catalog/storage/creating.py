"""Making a store on first use: whole or not at all, also when two programs do it at once."""

import os
import secrets
from contextlib import suppress
from datetime import UTC, datetime
from pathlib import Path

from sqlalchemy import Connection, Engine, insert

from catalog.errors import StoreError
from catalog.figures import DERIVATION_VERSION
from catalog.storage import engine as engines
from catalog.storage.inspecting import is_on_shared_folder
from catalog.storage.migrating import upgrade


def create_file(path: Path, with_demo: bool) -> None:
    """Make a seeded store at *path*, unless somebody else just did.

    It grows under another name in the same folder and gets its own by a hard link, which never replaces a
    file. Raises StoreError; nothing is left behind then.
    """
    draft = path.with_name(f".{path.name}.{os.getpid()}-{secrets.token_hex(4)}.new")
    try:
        os.close(os.open(draft, os.O_CREAT | os.O_EXCL | os.O_RDWR, 0o666))
    except OSError as error:
        raise StoreError(_why(path, error), str(path)) from error
    try:
        with engines.explained(str(path)):
            _fill(draft, with_demo)
        _publish(draft, path)
    finally:
        for leftover in ("", "-wal", "-shm", "-journal"):
            with suppress(FileNotFoundError):
                os.unlink(f"{draft}{leftover}")


def _why(path: Path, error: OSError) -> str:
    if isinstance(error, FileNotFoundError) and not path.parent.exists():
        return f"The store {path} can't be made: the folder {path.parent} doesn't exist."
    return f"The store {path} can't be made: {(error.strerror or str(error)).lower()}."


def _fill(draft: Path, with_demo: bool) -> None:
    engine = engines.sqlite_engine(draft)
    try:
        fill(engine, with_demo)
        sign(engine, logs_ahead=not is_on_shared_folder(draft))
    finally:
        engine.dispose()


def sign(engine: Engine, logs_ahead: bool) -> None:
    """Write into the file's header whose it is, and how it is journalled. Outside any transaction."""
    raw = engine.raw_connection()
    try:
        raw.cursor().execute(f"PRAGMA application_id={engines.APPLICATION_ID}")
        if logs_ahead:
            raw.cursor().execute("PRAGMA journal_mode=WAL")
    finally:
        raw.close()


def fill(engine: Engine, with_demo: bool) -> None:
    """Make the tables and seed them, in two transactions. Raises the driver's errors, and DataError."""
    upgrade(engine)
    with engine.connect() as bare:
        connection = bare.execution_options(is_writer=True)
        with connection.begin():
            seed_all(connection, with_demo)


def seed_all(connection: Connection, with_demo: bool) -> None:
    """Write what the store says of itself and the rows of the seed."""
    from catalog.storage.seeding import seed

    seed_meta(connection, with_demo)
    seed(connection, with_demo)


def seed_meta(connection: Connection, with_demo: bool) -> None:
    """Write what a new store says of itself."""
    from catalog.storage.tables import meta

    facts = {
        "application": "crosscloth",
        "created": datetime.now(UTC).isoformat(timespec="seconds"),
        "derivation": str(DERIVATION_VERSION),
        "demo": "yes" if with_demo else "no",
    }
    connection.execute(insert(meta), [{"name": name, "value": value} for name, value in facts.items()])


def _publish(draft: Path, path: Path) -> None:
    """Give the finished *draft* its name; whoever came first stays."""
    try:
        os.link(draft, path)
    except FileExistsError:
        return
    except OSError:  # a file system without hard links
        if not path.exists():
            os.rename(draft, path)
