"""The nearest cloths that pass a test no index knows, such as a loss coefficient at a stated flow; still exact."""

from collections.abc import Callable, Sequence

from catalog.cloth import Cloth
from catalog.search.duty import loss_of
from catalog.search.filtering import NO_FILTERS
from catalog.search.reader import Filters, Point, Reader
from catalog.target import Duty

Found = tuple[Cloth, float, bool]
FIRST_LOOK = 4
"""How many times *k* the first look asks for; each further one asks for as many times more."""


def nearest_where(
    reader: Reader, point: Point, k: int, passes: Callable[[Cloth], bool], filters: Filters = NO_FILTERS
) -> Sequence[Found]:
    """The *k* nearest to *point* that *passes* lets through, by distance then id.

    The reader's order is total, so what is found among the nearest so far stays found: looks grow until there
    are enough, or until the reader has no more.
    """
    wanted = k * FIRST_LOOK
    while True:
        seen = reader.nearest(point, wanted, filters)
        kept = [found for found in seen if passes(found[0])]
        if len(kept) >= k or len(seen) < wanted:
            return kept[:k]
        wanted *= FIRST_LOOK


def loses_at_most(most: float, duty: Duty) -> Callable[[Cloth], bool]:
    """A test: loss coefficient K at *duty* of at most *most*. Cloth without a model doesn't pass."""

    def passes(cloth: Cloth) -> bool:
        sphere = cloth.figures.sphere_um
        loss = loss_of(cloth.construction, duty, sphere / 1000 if sphere else None)
        return loss is not None and most >= loss.K

    return passes
