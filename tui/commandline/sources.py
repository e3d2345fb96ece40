"""Callouts out of files, a line or a row at a time, with progress on a terminal."""

import gc
import sys
from collections.abc import Iterator
from pathlib import Path

from catalog.errors import InputError

STEP = 500


def callouts_from(name: str, column: str | None) -> Iterator[tuple[int, str]]:
    """Yield (line number, callout). A .txt line is a callout whatever it holds; empty lines are only counted.

    CSV and XLSX need the column's name. Raises InputError with the reason.
    """
    gc.enable()
    kind = Path(name).suffix.lower()
    if kind in (".csv", ".xlsx"):
        from catalog.exchange.callout_column import rows_of

        if not column:
            raise InputError(f"{name} has columns: say which holds the callouts with --column NAME.")
        return _watched(rows_of(name, column))
    return _watched(_lines(name))


def _lines(name: str) -> Iterator[tuple[int, str]]:
    try:
        stream = sys.stdin.buffer if name == "-" else Path(name).open("rb")  # noqa: SIM115, closed by the with below
    except OSError as error:
        raise InputError(f"{name} can't be read: {(error.strerror or str(error)).lower()}.") from None
    with stream:
        for number, line in enumerate(stream, 1):
            text = line.decode("utf-8-sig" if number == 1 else "utf-8", "replace").rstrip("\r\n")
            if text.strip():
                yield number, text


def _watched(lines: Iterator[tuple[int, str]]) -> Iterator[tuple[int, str]]:
    """Say on a terminal how far the reading has come."""
    on_terminal = sys.stderr.isatty() and not sys.stdout.isatty()
    done = 0
    for done, item in enumerate(lines, 1):
        if on_terminal and done % STEP == 0:
            sys.stderr.write(f"\r{done} callouts read")
            sys.stderr.flush()
        yield item
    if on_terminal and done >= STEP:
        sys.stderr.write(f"\r{done} callouts read\n")
