"""Bringing a store's tables up to date. Alembic is imported here only, when there is something to do."""

from typing import TYPE_CHECKING

from sqlalchemy import Connection, Engine

from catalog.errors import StoreError

if TYPE_CHECKING:
    from alembic.config import Config

HEAD = "0001"
"""The newest revision; a test holds it against the migrations."""
DERIVATION = 1
"""The version of catalog.figures, repeated so that opening need not import the physics; a test compares."""


def upgrade(engine: Engine) -> None:
    """Apply what is missing, all or nothing; on SQLite with foreign keys checked at the end.

    Raises StoreError, or the driver's errors; the store stays as it was then.
    """
    with engine.connect() as bare:
        connection = bare.execution_options(is_writer=True, foreign_keys_off=True)
        with connection.begin():
            run_migrations(connection)
            check_foreign_keys(connection)
    engine.dispose()  # its connections still have foreign keys off


def run_migrations(connection: Connection) -> None:
    """Apply what is missing within the open transaction. Raises StoreError for an unknown revision."""
    from alembic import command
    from alembic.util import CommandError

    try:
        command.upgrade(configuration(connection), "head")
    except CommandError as error:
        raise StoreError(f"The store can't be brought up to date: {str(error).rstrip('.')}.") from error


def configuration(connection: Connection | None = None) -> "Config":
    """Alembic's configuration, without a file."""
    from alembic.config import Config

    config = Config()
    config.set_main_option("script_location", "catalog.storage:migrations")
    config.attributes["connection"] = connection
    return config


def check_foreign_keys(connection: Connection) -> None:
    """Raise StoreError where a row refers to one that isn't there (SQLite checks nothing meanwhile)."""
    if connection.dialect.name == "sqlite":
        broken = connection.exec_driver_sql("PRAGMA foreign_key_check").all()
        if broken:
            raise StoreError(f"The store can't be brought up to date: {len(broken)} rows refer to missing rows.")
