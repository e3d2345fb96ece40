"""Filling a new store from the tables in seed_data."""

from collections.abc import Iterable

from sqlalchemy import Connection, insert

from catalog.errors import DataError
from catalog.reference import rows as reference
from catalog.storage import seed_rows
from catalog.storage.seed_rows import Row, read_all
from catalog.storage.tables import alias, article
from catalog.storage.writing import Arrival, add_cloths, receive_lots


def seed(connection: Connection, with_demo: bool) -> None:
    """Write cloths, articles, aliases and lots, the invented ones only *with_demo*.

    Raises DataError, in whose *rows* every bad row of the table is named.
    """
    cloths = read_all("cloths", rows_of("cloths", with_demo), seed_rows.cloth_of)
    articles = read_all("articles", rows_of("articles", with_demo), seed_rows.article_of)
    aliases = read_all("aliases", rows_of("aliases", with_demo), seed_rows.alias_of)
    lots = read_all("lots", rows_of("lots", with_demo), seed_rows.lot_of)
    check_references(
        {cloth.id for cloth, _ in cloths},
        [
            *((f"article {row['id']}", row["cloth"]) for row in articles),
            *((f"alias {row['number']}", row["cloth"]) for row in aliases),
            *((f"lot {row['lot'].id}", row["lot"].cloth) for row in lots),
        ],
    )
    add_cloths(connection, cloths)
    for target, rows in ((article, articles), (alias, aliases)):
        if rows:
            connection.execute(insert(target), rows)
    receive_lots(connection, [Arrival(**row) for row in lots], person="seed", note="first stock")


def rows_of(name: str, with_demo: bool) -> list[Row]:
    """The rows of a seed table, the invented ones only *with_demo*."""
    return [row for row in reference.rows_of(name) if with_demo or row["demo"] != "1"]


def check_references(known: set[str], referring: Iterable[tuple[str, str]]) -> None:
    """Raise DataError where something refers to a cloth that isn't there."""
    wrong = tuple(f"{who}: there is no cloth {cloth}." for who, cloth in referring if cloth not in known)
    if wrong:
        raise DataError(f"{len(wrong)} rows of the seed refer to cloths that aren't there.", wrong)
