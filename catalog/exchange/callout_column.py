"""One column of a CSV or XLSX file, row by row."""

import csv
from collections.abc import Iterator
from pathlib import Path

from catalog.errors import InputError


def rows_of(name: str, column: str) -> Iterator[tuple[int, str]]:
    """Yield (row number, text) of *column*; the first row holds the names. Raises InputError."""
    try:
        rows = _xlsx_rows(name) if Path(name).suffix.lower() == ".xlsx" else _csv_rows(name)
        header = next(rows, (0, []))[1]
    except (OSError, UnicodeError, csv.Error) as error:
        raise InputError(f"{name} can't be read as a table: {error}.") from None
    wanted = [i for i, title in enumerate(header) if title.strip().casefold() == column.strip().casefold()]
    if not wanted:
        named = ", ".join(title for title in header if title)[:200] or "nothing"
        raise InputError(f"{name} has no column called {column!r}; its first row holds: {named}.")
    at = wanted[0]
    for number, row in rows:
        if at < len(row) and row[at].strip():
            yield number, row[at]


def _csv_rows(name: str) -> Iterator[tuple[int, list[str]]]:
    path = Path(name)
    with path.open("rb") as raw:
        head = raw.read(4096)
    encoding = "utf-16" if head[:2] in (b"\xff\xfe", b"\xfe\xff") else "utf-8-sig"
    first = head.decode(encoding, "replace").splitlines()[:1] or [""]
    delimiter = max(",;\t", key=first[0].count)
    with path.open(encoding=encoding, newline="", errors="replace") as stream:
        reader = csv.reader(stream, delimiter=delimiter)
        for row in reader:
            yield reader.line_num, row


def _xlsx_rows(name: str) -> Iterator[tuple[int, list[str]]]:
    from zipfile import BadZipFile

    from openpyxl import load_workbook
    from openpyxl.utils.exceptions import InvalidFileException

    try:
        book = load_workbook(name, read_only=True, data_only=True)
    except (BadZipFile, InvalidFileException, KeyError) as error:
        raise InputError(f"{name} is no XLSX workbook: {error}.") from None
    try:
        for number, row in enumerate(book.worksheets[0].iter_rows(values_only=True), 1):
            yield number, ["" if cell is None else str(cell) for cell in row]
    finally:
        book.close()
