"""Engines: everything that is SQLite's own, and the error sentences for what a database driver says.

Transactions: the driver's own are switched off, ours begin on SQLAlchemy's begin event. Writers begin with
BEGIN IMMEDIATE: a transaction that reads first and is upgraded to a writer loses the race at once (the busy
time-out doesn't cover it), and the driver's default loses updates in silence.
"""

import sqlite3
from collections.abc import Callable, Iterator
from contextlib import contextmanager
from pathlib import Path
from typing import Any
from urllib.parse import quote

from sqlalchemy import Connection, Engine, create_engine, event
from sqlalchemy.exc import DBAPIError
from sqlalchemy.pool import QueuePool

from catalog.errors import StoreError

APPLICATION_ID = 0x77697265  # 'wire', in the file's header
TIMEOUT_S = 10.0
SETTINGS = """
PRAGMA foreign_keys=ON;
PRAGMA trusted_schema=OFF;
PRAGMA synchronous=FULL;
PRAGMA cache_size=-16000;
PRAGMA automatic_index=OFF;
"""
# automatic_index: given many windows, SQLite would rather index the whole catalogue anew for one search


def sqlite_engine(path: Path, mode: str = "rw", timeout_s: float = TIMEOUT_S) -> Engine:
    """Engine over the file *path*; *mode* is 'rw', 'ro' or 'immutable' (no lock, no file beside it)."""
    query = "mode=ro&immutable=1" if mode == "immutable" else f"mode={mode}"
    uri = f"file:{quote(str(path.absolute()))}?{query}"
    engine = create_engine("sqlite://", creator=_connector(uri, timeout_s), poolclass=QueuePool)
    event.listen(engine, "begin", _begin)
    return engine


def url_engine(url: str) -> Engine:
    """Engine over another database; its own isolation, with locks taken by the statements."""
    return create_engine(url)


def _connector(uri: str, timeout_s: float) -> Callable[[], sqlite3.Connection]:
    def connect() -> sqlite3.Connection:
        raw = sqlite3.connect(
            uri,
            uri=True,
            timeout=timeout_s,
            isolation_level=None,
            check_same_thread=False,
            cached_statements=32,
        )
        raw.executescript(SETTINGS)
        return raw

    return connect


def _begin(connection: Connection) -> None:
    options = connection.get_execution_options()
    if options.get("foreign_keys_off"):  # before the transaction: inside one SQLite ignores it
        connection.exec_driver_sql("PRAGMA foreign_keys=OFF")
    connection.exec_driver_sql("BEGIN IMMEDIATE" if options.get("is_writer") else "BEGIN")


@contextmanager
def explained(location: str) -> Iterator[None]:
    """Turn a driver's error into a StoreError of one sentence."""
    try:
        yield
    except DBAPIError as error:
        raise StoreError(_sentence(location, error.orig), location) from error
    except sqlite3.Error as error:
        raise StoreError(_sentence(location, error), location) from error


def _sentence(location: str, error: Any) -> str:
    said = str(error).strip().splitlines()[0] if str(error).strip() else type(error).__name__
    if "locked" in said or "busy" in said:
        return (
            f"The store {location} has been in use by another program for more than "
            f"{TIMEOUT_S:g} seconds: try again when that has finished."
        )
    if "not a database" in said:
        return f"{location} is not a crosscloth store: it isn't a database."
    if "malformed" in said or "disk I/O" in said:
        return f"The store {location} is damaged ({said}): restore it from a backup."
    if "unable to open" in said:
        return f"The store {location} can't be opened: see that its folder exists and may be read."
    if "readonly" in said:
        return f"The store {location} can only be read."
    if "full" in said:
        return f"The store {location} can't grow: the disk is full."
    return f"The store {location} can't be used: {said}."
