"""Whether a cloth passes filters: the predicate that every reader has to agree with."""

from collections.abc import Mapping, Sequence

from catalog.cloth import Cloth
from catalog.search.distance import FIGURES
from catalog.search.reader import Filters, Range
from catalog.stock.lots import Lot

NO_FILTERS = Filters()
OTHER_WAY = {"warp": "weft", "weft": "warp"}


def passes(cloth: Cloth, lots: Sequence[Lot], filters: Filters) -> bool:
    """True where *cloth*, with its *lots*, lies inside all *filters*. Bounds are inclusive.

    A figure that is unknown lies outside any bound on it; so does an unknown alloy.
    """
    make = cloth.construction
    return (
        (not filters.alloys or make.alloy in filters.alloys)
        and (not filters.weaves or make.weave in filters.weaves)
        and filters.is_filter in (None, make.is_filter)
        and within(cloth, filters.ranges)
        and (filters.source is None or filters.source.lower() in cloth.source.lower())
        and _stock_suffices(lots, filters)
    )


def within(cloth: Cloth, ranges: Mapping[str, Range]) -> bool:
    """True where each named figure lies in its range."""
    return all(_inside(FIGURES[name](cloth), bounds) for name, bounds in ranges.items())


def turned_ranges(ranges: Mapping[str, Range]) -> dict[str, Range]:
    """The same bounds with warp and weft exchanged."""
    return {turned_name(name): bounds for name, bounds in ranges.items()}


def turned_name(figure: str) -> str:
    """The name of the other direction's figure; the same where there is no direction."""
    side, _, rest = figure.partition("_")
    return f"{OTHER_WAY[side]}_{rest}" if side in OTHER_WAY else figure


def _inside(found: float | None, bounds: Range) -> bool:
    low, high = bounds
    if low is None and high is None:
        return True
    return found is not None and (low is None or low <= found) and (high is None or found <= high)


def asks_stock(filters: Filters) -> bool:
    """True where the filters look at lots."""
    return filters.in_stock or filters.least_width_mm is not None or filters.least_area_m2 is not None


def _stock_suffices(lots: Sequence[Lot], filters: Filters) -> bool:
    """In stock is a lot with free length; width is asked of each lot, area of all that are wide enough."""
    if not asks_stock(filters):
        return True
    wide = [lot for lot in lots if lot.free_length_mm > 0 and lot.usable_width_mm >= (filters.least_width_mm or 0)]
    free_mm2 = sum(lot.usable_width_mm * lot.free_length_mm for lot in wide)
    return bool(wide) and free_mm2 >= (filters.least_area_m2 or 0) * 1e6
