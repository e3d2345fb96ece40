"""The tables of seed_data as rows of text, read once."""

import csv
from collections.abc import Mapping
from functools import cache
from types import MappingProxyType

from seed_data import table


@cache
def rows_of(name: str) -> tuple[Mapping[str, str], ...]:
    """The rows of the table called *name*, as text by column."""
    lines = table(name).read_text(encoding="utf-8").splitlines(keepends=True)
    return tuple(MappingProxyType(row) for row in csv.DictReader(lines))
