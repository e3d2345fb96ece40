"""`tables`: the reference tables, each with its source."""

import argparse
from collections.abc import Iterable, Iterator
from typing import Any

from catalog.errors import NotFoundError
from tui.commandline.options import Setting
from tui.exit_codes import ExitCode

NAMES = ("gauges", "sieves", "alloys", "guards", "equivalents", "lookalikes")


def add(commands: "argparse._SubParsersAction[argparse.ArgumentParser]", **rest: Any) -> None:
    """Declare the command."""
    parser = commands.add_parser("tables", help=f"reference tables: {', '.join(NAMES)}", **rest)
    parser.add_argument("name", metavar="NAME", help=", ".join(NAMES))
    parser.set_defaults(run=run)


def run(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    """Print one table."""
    from catalog.report import tables

    name = arguments.name
    if name in tables.REFERENCE:
        table = tables.REFERENCE[name]()
    elif name == "equivalents":
        return _stream(setting)
    elif name in tables.OVER_STORE:
        with setting.open() as store:
            table = tables.OVER_STORE[name](store)
    else:
        raise NotFoundError(f"No table is called {name!r}: there are {', '.join(NAMES)}.")
    if setting.json:
        setting.write_json({"schema": 1, "name": name, "source": table.source, "rows": table.rows})
    else:
        setting.write(text_table(table))
    return ExitCode.DONE


def _stream(setting: Setting) -> ExitCode:
    """The equivalents row by row: a catalogue of any size begins to answer at once it is read."""
    from catalog.report.tables import EQUIVALENTS_SOURCE, equivalent_rows

    with setting.open() as store:
        rows = equivalent_rows(store)
        if setting.json:
            setting.write_json_rows({"schema": 1, "name": "equivalents", "source": EQUIVALENTS_SOURCE}, rows)
        else:
            setting.write(_equivalent_lines(rows))
            setting.write(["", f"Source: {EQUIVALENTS_SOURCE}"])
    return ExitCode.DONE


def _equivalent_lines(rows: Iterable[dict[str, Any]]) -> Iterator[str]:
    yield "aperture mm  inch            metric          aperture   wire     open area  verdict"
    for row in rows:
        yield (
            f"{row['aperture_mm']:<11.5g}  {row['inch']:<14}  {row['metric']:<14}  {row['aperture_pct']:+7.2f} %"
            f"  {row['wire_pct']:+7.1f} %  {row['open_area_points']:+6.1f} pts  {row['verdict']}"
        )


def text_table(table: Any) -> list[str]:
    """A table in aligned columns, its source beneath."""
    if not table.rows:
        return [f"{table.name}: nothing to list.", f"Source: {table.source}"]
    keys = list(table.rows[0])
    cells = [[_cell(row[key]) for key in keys] for row in table.rows]
    widths = [max(len(key), *(len(row[i]) for row in cells)) for i, key in enumerate(keys)]
    lines = ["  ".join(key.ljust(width) for key, width in zip(keys, widths, strict=True)).rstrip()]
    for row, values in zip(cells, table.rows, strict=True):
        line = [
            text.rjust(width) if isinstance(values[key], int | float) else text.ljust(width)
            for text, width, key in zip(row, widths, keys, strict=True)
        ]
        lines.append("  ".join(line).rstrip())
    return [*lines, "", f"Source: {table.source}"]


def _cell(value: Any) -> str:
    if value is None:
        return "-"
    if isinstance(value, float):
        return f"{value:.6g}"
    return str(value)
