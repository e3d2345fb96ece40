"""A Reader over a list in memory: for whoever has no store, and the yardstick for the one that has."""

from collections import defaultdict
from collections.abc import Iterable, Mapping, Sequence

from catalog.cloth import Cloth
from catalog.search.axes import mean_and_skew
from catalog.search.distance import FIGURES, Yardstick, is_comparable
from catalog.search.filtering import NO_FILTERS, passes, turned_ranges, within
from catalog.search.reader import Filters, Point, Range
from catalog.stock.lots import Lot

Found = tuple[Cloth, float, bool]
SORTS: Mapping[str, tuple[str, ...]] = {
    "aperture": ("warp_aperture_mm", "weft_aperture_mm"),
    "wire": ("warp_wire_mm", "weft_wire_mm"),
    "open-area": ("open_area_pct",),
    "mass": ("mass_kg_m2",),
    "id": (),
}
"""Sort name → the figures whose geometric mean it goes by."""


class ListReader:
    """Answers by looking at every cloth."""

    def __init__(
        self, cloths: Iterable[Cloth], lots: Iterable[Lot] = (), prices: Mapping[str, int] | None = None
    ) -> None:
        """*prices*: cloth id → least price per m² that anybody asks, in the smallest unit."""
        self._prices = prices or {}
        self._cloths = {cloth.id: cloth for cloth in cloths}
        self._lots: dict[str, list[Lot]] = defaultdict(list)
        for lot in sorted(lots, key=lambda lot: (lot.location, lot.id)):
            self._lots[lot.cloth].append(lot)

    def nearest(self, point: Point, k: int, filters: Filters = NO_FILTERS) -> Sequence[Found]:
        """Return the *k* nearest as (cloth, distance, turned); see search.distance for the order."""
        return self._ranked(point, self._passing(filters))[:k]

    def box(self, point: Point, ranges: Mapping[str, Range], filters: Filters = NO_FILTERS) -> Sequence[Found]:
        """Return every comparable cloth inside *ranges*, either way round, in the order of nearest."""
        other = turned_ranges(ranges)
        inside = (c for c in self._passing(filters) if within(c, ranges) or within(c, other))
        return self._ranked(point, inside)

    def select(self, filters: Filters, sort: str = "aperture", limit: int | None = None) -> Sequence[Cloth]:
        """Return the cloths inside *filters*, ascending, those without the figure last, ties by id."""
        return sorted(self._passing(filters), key=lambda cloth: _sort_key(cloth, sort))[:limit]

    def count(self, filters: Filters) -> int:
        """How many cloths lie inside all filters."""
        return sum(1 for _ in self._passing(filters))

    def cloth(self, cloth_id: str) -> Cloth | None:
        """The cloth with this id."""
        return self._cloths.get(cloth_id)

    def lots(self, cloth_ids: Iterable[str]) -> Mapping[str, Sequence[Lot]]:
        """The lots of each cloth that have any length left, by location then id."""
        found = {cid: [lot for lot in self._lots.get(cid, ()) if lot.length_mm > 0] for cid in cloth_ids}
        return {cid: lots for cid, lots in found.items() if lots}

    def _passing(self, filters: Filters) -> Iterable[Cloth]:
        return (
            c
            for c in self._cloths.values()
            if passes(c, self._lots.get(c.id, ()), filters) and self._is_cheap_enough(c, filters)
        )

    def _is_cheap_enough(self, cloth: Cloth, filters: Filters) -> bool:
        most, price = filters.most_price_minor_per_m2, self._prices.get(cloth.id)
        return most is None or (price is not None and price <= most)

    def _ranked(self, point: Point, cloths: Iterable[Cloth]) -> list[Found]:
        yardstick = Yardstick(point)
        placed = [(c, yardstick.place(c)) for c in cloths if is_comparable(point, c)]
        placed.sort(key=lambda pair: pair[1].order(pair[0].id))
        return [(cloth, near.distance, near.turned) for cloth, near in placed]


def _sort_key(cloth: Cloth, sort: str) -> tuple[bool, float, str]:
    figures = [FIGURES[name](cloth) for name in SORTS[sort]]
    known = [figure for figure in figures if figure is not None]
    if len(known) < len(figures) or not known:
        return bool(figures), 0.0, cloth.id
    value = known[0] if len(known) == 1 else mean_and_skew(known[0], known[1])[0]
    return False, value, cloth.id
