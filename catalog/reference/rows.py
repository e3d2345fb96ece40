"""The tables of seed_data as rows of text, read once."""

import csv
from functools import cache
from types import MappingProxyType
from collections.abc import Mapping

from seed_data import table


@cache
def rows_of(name: str) -> tuple[Mapping[str, str], ...]:
    """The rows of the table called *name*, as text by column."""
    with table(name).open(encoding="utf-8", newline="") as stream:
        return tuple(MappingProxyType(row) for row in csv.DictReader(stream))
