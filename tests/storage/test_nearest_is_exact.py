"""The store finds what looking at every cloth finds: same cloths, same order, same distance, same way round."""

import random
from collections.abc import Iterator
from fractions import Fraction

import pytest
from hypothesis import HealthCheck, given, settings
from hypothesis import strategies as st
from store_building import fill_file, make_cloth, make_lot

from catalog.cloth import Cloth
from catalog.construction import Weave
from catalog.search.list_reader import ListReader
from catalog.search.reader import Filters, Point
from catalog.stock.lots import Lot
from catalog.storage import nearest
from catalog.storage.opening import open_store
from catalog.storage.store import Store

COUNTS = (2, 4, 8, 10, 16, 18, 20, 24, 30, 40, 50, 60, 62, 80, 100, 150, 200, 325, 400)
SHARES = (20, 25, 30, 38, 40, 45, 55, 60)
ALLOYS = ("304", "316L", "316L", "C-276", None)


def catalogue(seed: int, size: int, is_smooth: bool) -> tuple[list[Cloth], list[Lot]]:
    """Cloths of every weave; in the clumpy one many are alike, mirrored or without rating."""
    dice = random.Random(seed)
    cloths = [_cloth(dice, f"c{dice.randrange(10**6):06}-{n}", is_smooth) for n in range(size)]
    lots = [
        make_lot(
            f"R-{n}",
            dice.choice(cloths).id,
            dice.choice((0, 500, 10_000)),
            width_mm=dice.choice((600, 1000, 1220)),
            reserved_mm=dice.choice((0, 0)),
        )
        for n in range(size // 3)
    ]
    return cloths, lots


def _cloth(dice: random.Random, cloth_id: str, is_smooth: bool) -> Cloth:
    def side() -> tuple[str, str]:
        pitch = Fraction(254, 10 * dice.choice(COUNTS))
        wire = pitch * Fraction(dice.choice(SHARES), 100)
        if is_smooth:
            pitch, wire = pitch * dice.randint(900, 1100) / 1000, wire * dice.randint(900, 1100) / 1000
        return str(pitch), str(wire)

    warp = side()
    weave = dice.choice((*[Weave.PLAIN] * 5, Weave.TWILLED, Weave.TWILLED, Weave.PLAIN_DUTCH, Weave.TWILLED_DUTCH))
    weft = side() if weave.is_filter or dice.random() < 0.4 else warp
    rating = dice.choice((5.0, 10.0, 25.0, 63.5, None)) if weave.is_filter else None
    return make_cloth(cloth_id, warp, weft, weave, dice.choice(ALLOYS), rating)


@pytest.fixture(scope="module", params=["clumpy", "smooth", "tiny", "read whole"])
def both(
    request: pytest.FixtureRequest, tmp_path_factory: pytest.TempPathFactory
) -> Iterator[tuple[Store, ListReader]]:
    """Small catalogues, searched through windows as a large one is; the last as small ones are, read whole."""
    size = 12 if request.param == "tiny" else 300
    cloths, lots = catalogue(7, size, request.param == "smooth")
    path = fill_file(tmp_path_factory.mktemp("exact") / "store.db", cloths, lots)
    with pytest.MonkeyPatch.context() as patch, open_store(path) as store:
        if request.param != "read whole":
            patch.setattr(nearest, "MANY", 1)
            patch.setattr(nearest, "WIDE", 4)
        yield store, ListReader(cloths, lots)


def lengths(least: float, most: float) -> st.SearchStrategy[float]:
    """Lengths spread evenly over their logarithm, with round ones among them."""
    return st.one_of(
        st.floats(least, most),
        st.sampled_from((0.04, 0.1, 0.25, 25.4 / 60, 1.0, 6.35)),
        st.floats(-9, 5).map(lambda x: float(2.718281828**x)),
    )


sizes = lengths(0.001, 200.0)
maybe = st.none() | sizes


@st.composite
def points(draw: st.DrawFn) -> Point:
    if draw(st.booleans()) and draw(st.booleans()):
        return draw(
            st.builds(
                Point,
                is_filter=st.just(True),
                warp_pitch_mm=maybe,
                weft_pitch_mm=maybe,
                warp_wire_mm=maybe,
                weft_wire_mm=maybe,
                rating_um=st.none() | st.floats(1, 200),
            )
        )
    kind = draw(st.sampled_from(("square", "rectangular", "aperture", "count", "open", "any")))
    a, b, d, e = (draw(sizes) for _ in range(4))
    open_area = draw(st.floats(1, 99))
    if kind == "square":
        return Point(False, a, a, None, None, d, d, 100 * (a / (a + d)) ** 2)
    if kind == "rectangular":
        return Point(False, a, b, None, None, d, e, 100 * a * b / ((a + d) * (b + e)))
    if kind == "aperture":
        return Point(False, a, b)
    if kind == "count":
        return Point(False, warp_pitch_mm=a, weft_pitch_mm=draw(st.sampled_from((a, b))))
    if kind == "open":
        return Point(open_area_pct=open_area)
    return draw(
        st.builds(Point, st.just(False), maybe, maybe, maybe, maybe, maybe, maybe, st.none() | st.just(open_area))
    )


bounds = st.tuples(st.none() | st.floats(0.01, 50), st.none() | st.floats(0.05, 90))
filters = st.builds(
    Filters,
    alloys=st.just(frozenset[str]()) | st.frozensets(st.sampled_from(("304", "316L", "C-276", "nosuch")), min_size=1),
    weaves=st.just(frozenset[Weave]()) | st.frozensets(st.sampled_from(Weave), min_size=1),
    is_filter=st.sampled_from((None, None, None, True, False)),
    ranges=st.dictionaries(
        st.sampled_from(
            (
                *("warp_aperture_mm", "weft_aperture_mm", "warp_wire_mm", "weft_wire_mm", "open_area_pct"),
                *("mass_kg_m2", "thickness_mm", "warp_pitch_mm", "rating_um"),
            )
        ),
        bounds,
        max_size=2,
    ),
    in_stock=st.booleans(),
    least_width_mm=st.none() | st.sampled_from((500, 580, 981)),
    least_area_m2=st.none() | st.sampled_from((0.4, 5.0, 9.8)),
)
thorough = settings(max_examples=50, deadline=None, suppress_health_check=[HealthCheck.function_scoped_fixture])
few = st.sampled_from((1, 2, 5, 50, 600))


def shown(found: object) -> list[tuple[str, float, bool]]:
    return [(cloth.id, distance, turned) for cloth, distance, turned in found]  # type: ignore[attr-defined]


@thorough
@given(point=points(), k=few)
def test_the_nearest_of_all(both: tuple[Store, ListReader], point: Point, k: int) -> None:
    store, plain = both
    assert shown(store.nearest(point, k)) == shown(plain.nearest(point, k))


@thorough
@given(point=points(), k=few, filters=filters)
def test_the_nearest_inside_filters(both: tuple[Store, ListReader], point: Point, k: int, filters: Filters) -> None:
    store, plain = both
    assert shown(store.nearest(point, k, filters)) == shown(plain.nearest(point, k, filters))


@settings(thorough, max_examples=25)
@given(
    point=points(),
    filters=filters,
    low=sizes,
    width=st.floats(1.0, 3.0),
    sides=st.sampled_from(("a", "e", "both")),
)
def test_everything_in_a_box(
    both: tuple[Store, ListReader], point: Point, filters: Filters, low: float, width: float, sides: str
) -> None:
    store, plain = both
    opening = "pitch" if point.is_filter else "aperture"
    ranges = {f"{side}_{opening}_mm": (low, low * width) for side in ("warp", "weft") if sides in ("both", side[1])}
    assert shown(store.box(point, ranges, filters)) == shown(plain.box(point, ranges, filters))


@settings(thorough, max_examples=40)
@given(
    filters=filters,
    sort=st.sampled_from(("aperture", "wire", "open-area", "mass", "id")),
    limit=st.sampled_from((None, 1, 7)),
)
def test_lists_by_figures(both: tuple[Store, ListReader], filters: Filters, sort: str, limit: int | None) -> None:
    store, plain = both
    assert [c.id for c in store.select(filters, sort, limit)] == [c.id for c in plain.select(filters, sort, limit)]
    assert store.count(filters) == plain.count(filters)


def test_a_cloth_comes_back_as_it_was_written(both: tuple[Store, ListReader]) -> None:
    store, plain = both
    written = plain.select(Filters(), "id")
    assert store.select(Filters(), "id") == written
    assert store.cloth(written[0].id) == written[0]
    assert store.cloth("nosuch") is None
    assert store.lots([cloth.id for cloth in written]) == plain.lots([cloth.id for cloth in written])


POINTS = {
    "aperture": Point(False, 0.25, 0.25, None, None, 0.16, 0.16, 37.2),
    "alloy": Point(False, 0.25, 0.25, None, None, 0.16, 0.16, 37.2),
    "count": Point(warp_pitch_mm=0.4233, weft_pitch_mm=0.4233),
    "filter": Point(True, None, None, 1.0, 0.2, 0.3, 0.2, rating_um=10.0),
    "rating": Point(True, rating_um=10.0),
    "open": Point(open_area_pct=40.0),
}


@pytest.mark.parametrize("kind", POINTS)
def test_the_search_reads_along_an_index(both: tuple[Store, ListReader], kind: str) -> None:
    """Every statement of a search seeks in an index by equality or range; none scans a table or makes an index."""
    store, _ = both
    filters = Filters(alloys=frozenset({"316L"})) if kind == "alloy" else Filters()
    said: list[str] = []
    with store.reading() as connection:
        raw = connection.connection.driver_connection
        assert raw is not None
        raw.set_trace_callback(said.append)
        nearest.nearest_cloths(connection, POINTS[kind], 50, filters, nearest.Experience())
        raw.set_trace_callback(None)
        searches = [sql for sql in said if " AS d2 " in sql]
        plans = [row[3] for sql in searches for row in connection.exec_driver_sql(f"EXPLAIN QUERY PLAN {sql}")]
    assert searches
    ways = [plan for plan in plans if plan.startswith(("SEARCH c", "SCAN c"))]
    assert ways
    assert all(way.startswith("SEARCH c USING") and " INDEX ix_cloth_" in way for way in ways), ways
    if kind in ("aperture", "alloy", "count"):
        assert all("COVERING INDEX" in way for way in ways), ways
