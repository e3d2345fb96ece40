"""Windows as the rows of a statement: what to read, and along which index."""

from collections.abc import Sequence
from dataclasses import dataclass

from catalog.search.window import Layout, Window


@dataclass(frozen=True, slots=True)
class Source:
    """The parts of a statement that say where cloths `c` are read from."""

    ahead: str
    """What stands before SELECT."""
    tables: str
    where: str


EVERYTHING = Source("", "cloth c", "1 = 1")
NOTHING = Source("", "cloth c", "1 = 0")


def source(plan: Layout, cut: Sequence[Window]) -> Source:
    """Read what lies in the windows *cut*.

    The windows drive: CROSS JOIN keeps SQLite from reading the cloths first and looking the windows up.
    """
    if not cut:
        return NOTHING
    if plan.band is None:
        low, high = cut[0].low, cut[0].high
        return Source("", "cloth c", f"c.{plan.lead.column} BETWEEN {low!r} AND {high!r}")
    rows = ", ".join(f"({window.band}, {window.low!r}, {window.high!r})" for window in cut)
    return Source(
        f"WITH span(band, low, high) AS (VALUES {rows}) ",
        "span CROSS JOIN cloth c",
        f"c.{plan.band} = span.band AND c.ln_wire_mean BETWEEN span.low AND span.high",
    )
