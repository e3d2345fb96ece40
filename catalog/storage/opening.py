"""Opening a store by its path or URL; making it first where there is none."""

import os
from pathlib import Path

from sqlalchemy import Engine, text
from sqlalchemy.exc import ProgrammingError

from catalog.errors import StoreError
from catalog.storage.engine import TIMEOUT_S, explained, sqlite_engine, url_engine
from catalog.storage.inspecting import access, check_file
from catalog.storage.migrating import DERIVATION, HEAD
from catalog.storage.store import Store

SQLITE_URL = "sqlite:///"
STATE = "SELECT v.version_num, m.value FROM alembic_version v, meta m WHERE m.name = 'derivation'"


def open_store(
    location: "str | os.PathLike[str]",
    *,
    create: bool = True,
    with_demo: bool = True,
    timeout_s: float = TIMEOUT_S,
) -> Store:
    """Open the store at *location*: a path, or a URL as SQLAlchemy writes it.

    Where there is none and *create* is set, it is made and seeded, *with_demo* rows or without; its folder
    must exist. A store that can't be written opens for reading. An older one is brought up to date where it
    may be written. Raises StoreError in one sentence; nothing is changed then.
    """
    written = os.fspath(location)
    if written.startswith("sqlite") and "://" in written and not written.startswith(SQLITE_URL):
        raise StoreError(f"The URL {written} names no file: write {SQLITE_URL} and the path.", written)
    if "://" in written and not written.startswith(SQLITE_URL):
        return _open_url(written, create, with_demo)
    return _open_file(Path(written.removeprefix(SQLITE_URL)), create, with_demo, timeout_s)


def _open_file(written: Path, create: bool, with_demo: bool, timeout_s: float) -> Store:
    path = Path(os.path.realpath(written))
    if not path.exists():
        if not create:
            raise StoreError(f"There is no store at {written}.", str(written))
        from catalog.storage.creating import create_file

        create_file(path, with_demo)
    check_file(path)
    way = access(path)
    engine = sqlite_engine(path, way.mode, timeout_s)
    return _checked(Store(engine, str(written), way.is_writable), engine)


def _open_url(url: str, create: bool, with_demo: bool) -> Store:
    try:
        engine = url_engine(url)
    except Exception as error:  # a URL or a driver that SQLAlchemy doesn't know: many kinds
        said = str(error).splitlines()[0]
        raise StoreError(f"The store's URL can't be used: {said}.") from error
    location = engine.url.render_as_string(hide_password=True)
    if create and not _has_tables(engine, location):
        from catalog.storage.creating import fill

        with explained(location):
            fill(engine, with_demo)
    return _checked(Store(engine, location, is_writable=True), engine)


def _has_tables(engine: Engine, location: str) -> bool:
    from sqlalchemy import inspect

    with explained(location):
        return bool(inspect(engine).get_table_names())


def _checked(store: Store, engine: Engine) -> Store:
    """Refuse a newer store; bring an older one up to date, where it may be written."""
    try:
        revision, derivation = _state(store)
        if revision > HEAD:
            raise StoreError(
                f"The store {store.location} was made by a newer crosscloth (its tables are revision "
                f"{revision}, this program knows {HEAD}): update the program.",
                store.location,
            )
        if revision < HEAD or derivation != str(DERIVATION):
            _bring_up_to_date(store, engine, revision)
    except BaseException:
        store.close()
        raise
    return store


def _state(store: Store) -> tuple[str, str]:
    try:
        with store.reading() as connection:
            found = connection.execute(text(STATE)).one_or_none()
    except StoreError as error:
        if isinstance(error.__cause__, ProgrammingError) or "no such table" in error.message:
            found = None
        else:
            raise
    if found is None:
        raise StoreError(f"{store.location} is a database, but not a crosscloth store.", store.location)
    return str(found[0]), str(found[1])


def _bring_up_to_date(store: Store, engine: Engine, revision: str) -> None:
    if not store.is_writable:
        if revision < HEAD:
            raise StoreError(
                f"The store {store.location} is of an older crosscloth (revision {revision}, this program "
                f"needs {HEAD}) and can't be written: allow writing to it once.",
                store.location,
            )
        return  # figures of an earlier derivation can still be read
    from catalog.storage.deriving import rederive
    from catalog.storage.migrating import upgrade

    with explained(store.location):
        if revision < HEAD:
            upgrade(engine)
        with store.transaction() as connection:
            rederive(connection)
