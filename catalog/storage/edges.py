"""How far the catalogue reaches along an axis: two looks into an index for each weave."""

from math import inf

from sqlalchemy import Connection, text

from catalog.construction import Weave
from catalog.search.axes import BAND
from catalog.search.window import SLACK, Bounds, Layout, Stretch


def edges(connection: Connection, plan: Layout, weaves: frozenset[Weave], alloys: frozenset[str]) -> Bounds:
    """The stretches that cloths of these *weaves* (and *alloys*) take up. Empty where there are none."""
    column = plan.band or plan.lead.column
    lead = _ends(connection, column, weaves, alloys if column == "aperture_band" else frozenset())
    if plan.band is None or lead[0] > lead[1]:
        return Bounds(lead=(lead[0] - SLACK, lead[1] + SLACK))
    wire = _ends(connection, "ln_wire_mean", weaves, frozenset())
    return Bounds(
        (lead[0] * BAND - SLACK, (lead[1] + 1) * BAND + SLACK),
        (wire[0] - SLACK, wire[1] + SLACK),
    )


def _ends(connection: Connection, column: str, weaves: frozenset[Weave], alloys: frozenset[str]) -> Stretch:
    """Least and most of *column*; (∞, −∞) where there is no row."""
    told: list[str | None] = sorted(alloys) or [None]
    groups = [(weave.value, alloy) for weave in sorted(weaves) for alloy in told]
    values: dict[str, str] = {}
    parts = []
    for n, (weave, alloy) in enumerate(groups):
        where = f"weave = :w{n}"
        values[f"w{n}"] = weave
        if alloy is not None:
            where += f" AND alloy = :a{n}"
            values[f"a{n}"] = alloy
        low, high = (f"(SELECT {end}({column}) FROM cloth WHERE {where})" for end in ("MIN", "MAX"))
        parts.append(f"SELECT {low}, {high}")
    rows = connection.execute(text(" UNION ALL ".join(parts)), values).all()
    found = [(low, high) for low, high in rows if low is not None]
    return min((low for low, _ in found), default=inf), max((high for _, high in found), default=-inf)
