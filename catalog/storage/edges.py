"""How far the catalogue reaches along its axes: two looks into an index for each weave and axis."""

from collections.abc import Sequence
from math import exp, inf

from sqlalchemy import Connection, text

from catalog.construction import Weave
from catalog.search.axes import BAND
from catalog.search.window import SLACK, Bounds, Layout, Stretch, most_wire_over_aperture


def edges(connection: Connection, plan: Layout, weaves: frozenset[Weave], alloys: frozenset[str]) -> Bounds:
    """The stretches that cloths of these *weaves* (and *alloys*) take up. Empty where there are none."""
    column = plan.band or plan.lead.column
    if plan.band is None:
        (lead,) = _ends(connection, [column], weaves, frozenset())
        return Bounds(lead=(lead[0] - SLACK, lead[1] + SLACK))
    by_alloy = alloys if column == "aperture_band" else frozenset[str]()
    lead, wire, opens = _ends(connection, [column, "ln_wire_mean", "ln_open_area"], weaves, by_alloy)
    return Bounds(
        (lead[0] * BAND - SLACK, (lead[1] + 1) * BAND + SLACK),
        (wire[0] - SLACK, wire[1] + SLACK),
        most_wire_over_aperture(exp(opens[0])) if column == "aperture_band" and opens[0] < inf else inf,
        (opens[0] - SLACK, opens[1] + SLACK) if column == "aperture_band" else (-inf, inf),
    )


def _ends(
    connection: Connection, columns: Sequence[str], weaves: frozenset[Weave], alloys: frozenset[str]
) -> list[Stretch]:
    """Least and most of each column; (∞, −∞) where there is no row. Alloys bound the first column only."""
    values: dict[str, str] = {}
    parts = []
    for column in columns:
        told: list[str | None] = [*sorted(alloys)] if alloys and column == columns[0] else [None]
        for n, weave in enumerate(sorted(weaves)):
            values[f"w{n}"] = weave.value
            for m, alloy in enumerate(told):
                where = f"weave = :w{n}"
                if alloy is not None:
                    values[f"a{m}"] = alloy
                    where += f" AND alloy = :a{m}"
                ends = ", ".join(f"(SELECT {end}({column}) FROM cloth WHERE {where})" for end in ("MIN", "MAX"))
                parts.append(f"SELECT '{column}', {ends}")
    found: dict[str, Stretch] = dict.fromkeys(columns, (inf, -inf))
    for column, low, high in connection.execute(text(" UNION ALL ".join(parts)), values):
        if low is not None:
            found[column] = min(found[column][0], low), max(found[column][1], high)
    return list(found.values())
