"""Filters as conditions of a WHERE clause on cloth `c`: the same as search.filtering.passes says in Python."""

import re
from collections.abc import Iterable, Mapping
from typing import Any

from catalog.construction import Weave
from catalog.search.distance import FIGURES
from catalog.search.filtering import asks_stock
from catalog.search.reader import Filters, Range

FILTER_WEAVES = frozenset(weave for weave in Weave if weave.is_filter)
OPEN_WEAVES = frozenset(Weave) - FILTER_WEAVES


class Conditions:
    """Conditions with the values that go with them, gathered as they come."""

    def __init__(self) -> None:
        self.parts: list[str] = []
        self.values: dict[str, Any] = {}

    def bind(self, value: Any) -> str:
        """Keep *value* and return the placeholder that stands for it."""
        name = f"v{len(self.values)}"
        self.values[name] = value
        return f":{name}"

    def one_of(self, column: str, values: Iterable[str]) -> None:
        """Bound *column* to *values*."""
        self.parts.append(f"{column} IN ({', '.join(self.bind(str(v)) for v in sorted(values))})")

    def within(self, ranges: Mapping[str, Range]) -> str:
        """The condition that each figure lies in its range; '' where nothing is bounded."""
        parts = []
        for name, (low, high) in ranges.items():
            column = f"c.{_column(name)}"
            parts += [] if low is None else [f"{column} >= {self.bind(low)}"]
            parts += [] if high is None else [f"{column} <= {self.bind(high)}"]
        return " AND ".join(parts)

    def add(self, part: str) -> None:
        """Add a condition, where there is one."""
        if part:
            self.parts.append(part)

    @property
    def sql(self) -> str:
        """All of them joined, with :names for sqlalchemy.text."""
        return " AND ".join(self.parts) or "1 = 1"

    def driver_sql(self, paramstyle: str) -> str:
        """The same with the names as the driver wants them: text() is slow over a long statement."""
        return self.sql if paramstyle in ("qmark", "named") else re.sub(r":(v\d+)", r"%(\1)s", self.sql)


def weaves_asked(filters: Filters, is_filter: bool | None = None) -> frozenset[Weave]:
    """The weaves that *filters* leave, of the kind *is_filter* where it is stated. May be empty."""
    left = filters.weaves or frozenset(Weave)
    for kind in (filters.is_filter, is_filter):
        if kind is not None:
            left &= FILTER_WEAVES if kind else OPEN_WEAVES
    return left


def add_filters(conditions: Conditions, filters: Filters, weaves: frozenset[Weave]) -> None:
    """Add every condition of *filters*; *weaves* are those that are left of all."""
    add_kinds(conditions, filters, weaves)
    conditions.add(conditions.within(filters.ranges))
    conditions.add(_stock(conditions, filters))
    conditions.add(_trade(conditions, filters))


def add_kinds(conditions: Conditions, filters: Filters, weaves: frozenset[Weave]) -> None:
    """Add the conditions that indexes lead with: weave and alloy."""
    if len(weaves) < len(Weave):
        conditions.one_of("c.weave", frozenset(weaves))
    if filters.alloys:
        conditions.one_of("c.alloy", filters.alloys)


def _stock(conditions: Conditions, filters: Filters) -> str:
    if not asks_stock(filters):
        return ""
    wide = "SELECT {what} FROM lot l WHERE l.cloth = c.id AND l.length_mm > l.reserved_mm"
    if filters.least_width_mm is not None:
        wide += f" AND l.width_mm - 2 * l.selvedge_mm >= {conditions.bind(filters.least_width_mm)}"
    if filters.least_area_m2 is None:
        return f"EXISTS ({wide.format(what='1')})"
    area = "SUM((l.width_mm - 2 * l.selvedge_mm) * (l.length_mm - l.reserved_mm))"
    return f"({wide.format(what=area)}) >= {conditions.bind(filters.least_area_m2 * 1e6)}"


def _trade(conditions: Conditions, filters: Filters) -> str:
    """Source and price. A source's words are compared with capitals aside, signs taken as they are."""
    parts = []
    if filters.source is not None:
        words = re.sub(r"([!%_])", r"!\1", filters.source.lower())
        parts.append(f"LOWER(c.source) LIKE {conditions.bind(f'%{words}%')} ESCAPE '!'")
    if filters.most_price_minor_per_m2 is not None:
        price = conditions.bind(filters.most_price_minor_per_m2)
        parts.append(f"EXISTS (SELECT 1 FROM article a WHERE a.cloth = c.id AND a.price_minor_per_m2 <= {price})")
    return " AND ".join(parts)


def _column(name: str) -> str:
    """The column of a figure. Raises KeyError: a name goes into the statement only when it is known."""
    if name not in FIGURES:
        raise KeyError(name)
    return name
