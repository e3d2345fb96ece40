"""Removing the invented stockist, without touching what is real."""

from sqlalchemy import Connection, delete, exists, select, update

from catalog.storage.tables import alias, article, cloth, lot, meta, movement


def drop(connection: Connection) -> int:
    """Delete demo lots with their movements, articles, aliases, and the cloths nothing real refers to.

    Returns the number of cloths deleted. Runs in the caller's transaction.
    """
    invented = select(lot.c.id).where(lot.c.demo)
    connection.execute(delete(movement).where(movement.c.lot.in_(invented)))
    connection.execute(delete(lot).where(lot.c.demo))
    used = exists().where(lot.c.article == article.c.id)
    connection.execute(delete(article).where(article.c.demo, ~used))
    connection.execute(delete(alias).where(alias.c.demo))
    unused = [~exists().where(table.c.cloth == cloth.c.id) for table in (lot, article, alias)]
    gone = connection.execute(delete(cloth).where(cloth.c.demo, *unused)).rowcount
    kept = connection.execute(select(exists().where(cloth.c.demo))).scalar_one()
    connection.execute(update(meta).where(meta.c.name == "demo").values(value="yes" if kept else "no"))
    return int(gone)
