"""The single mapping from errors to exit codes, and the one writer to standard error."""

import sys
from enum import IntEnum

from catalog.errors import (
    CrossclothError,
    DataError,
    InputError,
    NotFoundError,
    StockClashError,
    StoreError,
)

EXCERPT = 72
CONTROL = dict.fromkeys((*range(0x20), 0x7F, *range(0x80, 0xA0)), " ")
STEERING = dict.fromkeys((*range(0x200B, 0x2010), *range(0x202A, 0x202F), *range(0x2060, 0x206A), 0xFEFF))
SURROGATES = dict.fromkeys(range(0xD800, 0xE000), 0xFFFD)
HARMLESS = CONTROL | STEERING | SURROGATES


class ExitCode(IntEnum):
    """What the program's status says to a script."""

    DONE = 0
    NOTHING_WITHIN_LIMITS = 1
    BAD_INPUT = 2
    STORE = 3
    INTERRUPTED = 130


BY_ERROR: tuple[tuple[type[CrossclothError], ExitCode], ...] = (
    (StoreError, ExitCode.STORE),
    (StockClashError, ExitCode.NOTHING_WITHIN_LIMITS),
    (InputError, ExitCode.BAD_INPUT),
    (NotFoundError, ExitCode.BAD_INPUT),
    (DataError, ExitCode.BAD_INPUT),
)


def exit_code(error: CrossclothError) -> ExitCode:
    """The status that *error* ends the program with."""
    return next((code for kind, code in BY_ERROR if isinstance(error, kind)), ExitCode.BAD_INPUT)


def one_line(text: str) -> str:
    """Text from outside as one line: control, direction and zero-width characters made harmless."""
    return text.translate(HARMLESS)


def complain(error: CrossclothError) -> None:
    """Write the whole sentence to standard error; on a terminal, the place under it."""
    column = error.column if isinstance(error, InputError) else None
    text = error.text if isinstance(error, InputError) else ""
    place = f" (column {column})" if column else ""
    lines = [f"crosscloth: {one_line(error.message)}{place}"]
    if column and text and sys.stderr.isatty():
        lines += excerpt(text, column)
    if isinstance(error, DataError):
        lines += [f"  {one_line(row)}" for row in error.rows]
    say(*lines)


def excerpt(text: str, column: int) -> list[str]:
    """At most 72 columns of *text* around *column* (from 1), and a caret under it."""
    start = max(0, min(column - 1 - EXCERPT // 2, len(text) - EXCERPT))
    return [one_line(text[start : start + EXCERPT]), " " * (column - 1 - start) + "^"]


def say(*lines: str) -> None:
    """Write lines to standard error, whatever its encoding."""
    out = "\n".join(lines) + "\n"
    encoding = sys.stderr.encoding or "utf-8"
    sys.stderr.write(out.encode(encoding, "replace").decode(encoding))
    sys.stderr.flush()
