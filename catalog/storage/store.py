"""The store: reading through the Reader's questions, writing in transactions begun as a writer."""

from collections.abc import Iterable, Iterator, Mapping, Sequence
from contextlib import contextmanager
from types import TracebackType

from sqlalchemy import Connection, Engine, text

from catalog.cloth import Cloth
from catalog.errors import ReadOnlyStoreError
from catalog.search.filtering import NO_FILTERS
from catalog.search.reader import Filters, Point, Range
from catalog.stock.lots import Lot
from catalog.storage import boxing, nearest, selecting
from catalog.storage.engine import explained

Found = tuple[Cloth, float, bool]


class Store:
    """A catalogue and its stock in a database. Thread-safe; every question is answered from one snapshot.

    Everything raises StoreError, in one sentence, where the database fails.
    """

    def __init__(self, engine: Engine, location: str, is_writable: bool) -> None:
        self._engine = engine
        self._experience = nearest.Experience()
        self.location = location
        """Path or URL, as the person would write it."""
        self.is_writable = is_writable

    def __enter__(self) -> "Store":
        return self

    def __exit__(
        self, kind: type[BaseException] | None, error: BaseException | None, trace: TracebackType | None
    ) -> None:
        self.close()

    def close(self) -> None:
        """Let go of the database."""
        self._engine.dispose()

    def nearest(self, point: Point, k: int, filters: Filters = NO_FILTERS) -> Sequence[Found]:
        """Return the *k* nearest as (cloth, distance, turned); see search.distance for the order."""
        with self.reading() as connection:
            return nearest.nearest_cloths(connection, point, k, filters, self._experience)

    def box(self, point: Point, ranges: Mapping[str, Range], filters: Filters = NO_FILTERS) -> Sequence[Found]:
        """Return every comparable cloth inside *ranges*, either way round, in the order of nearest."""
        with self.reading() as connection:
            return boxing.boxed_cloths(connection, point, ranges, filters)

    def select(self, filters: Filters, sort: str = "aperture", limit: int | None = None) -> Sequence[Cloth]:
        """Return the cloths inside *filters*, ascending, those without the figure last, ties by id."""
        with self.reading() as connection:
            return selecting.select_cloths(connection, filters, sort, limit)

    def count(self, filters: Filters) -> int:
        """How many cloths lie inside all filters."""
        with self.reading() as connection:
            return selecting.count_cloths(connection, filters)

    def cloth(self, cloth_id: str) -> Cloth | None:
        """The cloth with this id."""
        with self.reading() as connection:
            return next(iter(selecting.cloths_by_id(connection, (cloth_id,))), None)

    def lots(self, cloth_ids: Iterable[str]) -> Mapping[str, Sequence[Lot]]:
        """The lots of each cloth that have any length left, by location then id."""
        with self.reading() as connection:
            return selecting.lots_of_cloths(connection, cloth_ids)

    @property
    def has_demo(self) -> bool:
        """True while invented rows are among the real ones."""
        with self.reading() as connection:
            value = connection.execute(text("SELECT value FROM meta WHERE name = 'demo'")).scalar()
        return bool(value == "yes")

    def drop_demo(self) -> int:
        """Remove the invented rows; returns how many cloths went. See storage.demo."""
        from catalog.storage import demo

        with self.transaction() as connection:
            return demo.drop(connection)

    @contextmanager
    def reading(self) -> Iterator[Connection]:
        """A snapshot to read from."""
        with explained(self.location), self._engine.connect() as connection:
            yield connection

    @contextmanager
    def transaction(self) -> Iterator[Connection]:
        """A transaction begun as a writer: all of it or nothing. Raises ReadOnlyStoreError."""
        if not self.is_writable:
            raise ReadOnlyStoreError(
                f"The store {self.location} can only be read: nothing was written. "
                "Choose another with --store, or allow writing to it.",
                self.location,
            )
        with explained(self.location), self._engine.connect() as bare:
            connection = bare.execution_options(is_writer=True)
            with connection.begin():
                yield connection
