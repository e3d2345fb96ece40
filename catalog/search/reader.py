"""What the search asks of a store; a list in memory answers as well as a database."""

from collections.abc import Iterable, Mapping, Sequence
from dataclasses import dataclass, field
from typing import Protocol

from catalog.cloth import Cloth
from catalog.construction import Weave
from catalog.stock.lots import Lot

Range = tuple[float | None, float | None]
"""(least, most), inclusive; None is open."""


@dataclass(frozen=True, slots=True)
class Point:
    """Where the target lies; a field that is None plays no part. mm, %, µm.

    Square and rectangular cloth is compared by apertures, wires and open area, or by pitches where only
    counts were asked; filter cloth by pitches, wires and rating.
    """

    is_filter: bool = False
    warp_aperture_mm: float | None = None
    weft_aperture_mm: float | None = None
    warp_pitch_mm: float | None = None
    weft_pitch_mm: float | None = None
    warp_wire_mm: float | None = None
    weft_wire_mm: float | None = None
    open_area_pct: float | None = None
    rating_um: float | None = None


@dataclass(frozen=True, slots=True)
class Filters:
    """Bounds on what a search may return. Empty means no bound. Inclusive.

    *ranges* has keys 'warp_aperture_mm', 'weft_aperture_mm', 'warp_wire_mm', 'weft_wire_mm',
    'open_area_pct', 'mass_kg_m2', 'thickness_mm'.
    """

    alloys: frozenset[str] = frozenset()
    weaves: frozenset[Weave] = frozenset()
    is_filter: bool | None = None
    ranges: Mapping[str, Range] = field(default_factory=dict)
    in_stock: bool = False
    least_width_mm: int | None = None
    """In stock in a lot with so much usable width."""
    least_area_m2: float | None = None
    """In stock in lots with so much free area in all."""
    source: str | None = None
    """Comes from a source whose words hold these, capitals aside."""
    most_price_minor_per_m2: int | None = None
    """Offered by somebody at no more than this, in the smallest unit of the offer's currency."""


class Reader(Protocol):
    """Reading access to a catalogue and its stock."""

    def nearest(self, point: Point, k: int, filters: Filters = Filters()) -> Sequence[tuple[Cloth, float, bool]]:
        """Return the *k* nearest as (cloth, distance, turned), by distance then id.

        Each cloth lies at its smaller distance of the two ways round; *turned* says that this is the turned one.
        """
        ...

    def box(
        self, point: Point, ranges: Mapping[str, Range], filters: Filters = Filters()
    ) -> Sequence[tuple[Cloth, float, bool]]:
        """Return every cloth whose apertures lie in *ranges*, either way round, with distance to *point*."""
        ...

    def select(self, filters: Filters, sort: str = "aperture", limit: int | None = None) -> Sequence[Cloth]:
        """Return the cloths inside all filters, sorted by 'aperture', 'wire', 'open-area', 'mass' or 'id'."""
        ...

    def count(self, filters: Filters) -> int:
        """How many cloths lie inside all filters."""
        ...

    def cloth(self, cloth_id: str) -> Cloth | None:
        """The cloth with this id."""
        ...

    def lots(self, cloth_ids: Iterable[str]) -> Mapping[str, Sequence[Lot]]:
        """The lots of each cloth that have any length left, by location then id."""
        ...
