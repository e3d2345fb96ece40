"""Rows of the store, read a page at a time as the list is scrolled."""

from collections import OrderedDict
from collections.abc import Callable, Sequence
from typing import TYPE_CHECKING, Any

from tui.door import Door
from tui.presenting import Piece

if TYPE_CHECKING:
    from catalog.cloth import Cloth
    from catalog.search.reader import Filters

PAGE = 100
PAGES_KEPT = 12


class StorePages:
    """The cloths inside some filters, in some order, as rows of a list."""

    def __init__(
        self,
        door: Door,
        filters: "Filters",
        sort: str,
        total: int,
        cells: Callable[["Cloth"], Sequence[str | Piece]],
        arrived: Callable[[], None],
        failed: Callable[[str], None],
    ) -> None:
        self._door, self._filters, self._sort = door, filters, sort
        self.total = total
        self._make, self._arrived, self._failed = cells, arrived, failed
        self._pages: OrderedDict[int, Sequence[Cloth]] = OrderedDict()
        self._on_their_way: set[int] = set()

    def cloth(self, row: int) -> "Cloth | None":
        """The cloth of a row, or None while its page is on its way."""
        number, offset = divmod(row, PAGE)
        page = self._pages.get(number)
        if page is None:
            if 0 <= row < self.total:
                self._fetch(number)
            return None
        self._pages.move_to_end(number)
        return page[offset] if offset < len(page) else None

    def cells(self, row: int) -> Sequence[str | Piece] | None:
        """A row's cells."""
        cloth = self.cloth(row)
        return None if cloth is None else self._make(cloth)

    def keep(self, number: int, page: "Sequence[Cloth]") -> None:
        """Put a page in; the one that was used longest ago goes."""
        self._on_their_way.discard(number)
        self._pages[number] = page
        if len(self._pages) > PAGES_KEPT:
            self._pages.popitem(last=False)
        self._arrived()

    def _fetch(self, number: int) -> None:
        if number in self._on_their_way:
            return
        self._on_their_way.add(number)
        filters, sort = self._filters, self._sort

        def work(store: Any) -> "Sequence[Cloth]":
            return read_page(store, filters, sort, number * PAGE, PAGE)

        def failed(sentence: str) -> None:
            self._on_their_way.discard(number)
            self._failed(sentence)

        # neighbouring pages may both be on the screen: they are questions of two kinds
        kind = f"page {number % 2}"
        self._on_their_way = {n for n in self._on_their_way if n % 2 != number % 2 or n == number}
        self._door.ask(kind, work, lambda page: self.keep(number, page), failed)


def read_page(store: Any, filters: "Filters", sort: str, offset: int, limit: int) -> "Sequence[Cloth]":
    """So many cloths from *offset* on; without a way to begin there, what comes before is left out."""
    if hasattr(store, "page"):
        page: Sequence[Cloth] = store.page(filters, sort, offset, limit)
        return page
    head: Sequence[Cloth] = store.select(filters, sort, offset + limit)
    return head[offset:]
