"""How near cloths are: the distance by its formula, both ways round, and what is never compared."""

from fractions import Fraction
from math import log, sqrt

import pytest
from hypothesis import given
from hypothesis import strategies as st

from catalog.cloth import Cloth, Figures, Rating
from catalog.construction import Construction, Weave, Wires
from catalog.search.list_reader import ListReader
from catalog.search.reader import Filters, Point
from catalog.search.window import most_wire_over_aperture


def cloth(cloth_id: str, warp: tuple[str, str], weft: tuple[str, str], rating: float | None = None) -> Cloth:
    """Rectangular cloth by (aperture, wire) each way in mm; filter cloth by (pitch, wire) where it has a rating."""
    is_filter = rating is not None
    (a, d), (b, e) = ((Fraction(x), Fraction(y)) for x, y in (warp, weft))
    if is_filter:
        make = Construction(Weave.PLAIN_DUTCH, Wires(a, d), Wires(b, e))
        figures = Figures(None, None, None, None, None, 1.0)
    else:
        make = Construction(Weave.PLAIN, Wires(a + d, d), Wires(b + e, e))
        open_area = float(100 * a * b / ((a + d) * (b + e)))
        figures = Figures(float(a), float(b), open_area, None, None, float(d + e))
    return Cloth(
        cloth_id,
        cloth_id,
        make,
        figures,
        declared="",
        unit_system="metric",
        source="test",
        rating=Rating(rating, "nominal") if rating else None,
    )


SQUARE = Point(False, 0.25, 0.25, None, None, 0.16, 0.16, 100 * (0.25 / 0.41) ** 2)


def test_the_distance_weighs_an_opening_twice_a_wire() -> None:
    offered = cloth("a", ("0.28", "0.14"), ("0.28", "0.14"))
    opens, wire = log(0.28 / 0.25), log(0.14 / 0.16)
    area = log((0.28 / 0.42) ** 2 / (0.25 / 0.41) ** 2)
    by_formula = sqrt(2 * opens**2 + 2 * opens**2 + wire**2 + wire**2 + area**2)
    ((_, distance, turned),) = ListReader([offered]).nearest(SQUARE, 1)
    assert distance == pytest.approx(by_formula, rel=1e-12)
    assert not turned


def test_the_cloth_itself_lies_at_no_distance() -> None:
    ((_, distance, _),) = ListReader([cloth("a", ("0.25", "0.16"), ("0.25", "0.16"))]).nearest(SQUARE, 1)
    assert distance == pytest.approx(0, abs=1e-12)


def test_sixteen_by_eighteen_is_found_as_eighteen_by_sixteen_turned() -> None:
    wire = Fraction("0.3")
    sixteen, eighteen = (str(Fraction(127, 5) / n - wire) for n in (16, 18))
    offered = cloth("a", (eighteen, "0.3"), (sixteen, "0.3"))
    asked = Point(warp_pitch_mm=25.4 / 16, weft_pitch_mm=25.4 / 18)
    ((_, distance, turned),) = ListReader([offered]).nearest(asked, 1)
    assert turned
    assert distance == pytest.approx(0, abs=1e-12)


def test_mirrored_cloths_lie_equally_far_and_come_by_id() -> None:
    one, other = ("0.31", "0.17"), ("0.47", "0.13")
    pair = [cloth("b", one, other), cloth("a", other, one)]
    first, second = ListReader(pair).nearest(SQUARE, 2)
    assert (first[0].id, second[0].id) == ("a", "b")
    assert first[1] == second[1]
    assert not first[2]
    assert not second[2]


def test_filter_cloth_is_never_compared_with_square_cloth() -> None:
    reader = ListReader([cloth("f", ("1", "0.3"), ("0.2", "0.2"), rating=10.0)])
    assert reader.nearest(SQUARE, 5) == []
    assert len(reader.nearest(Point(True, rating_um=12.0), 5)) == 1


def test_filter_cloth_without_a_rating_comes_after_all_that_have_one() -> None:
    far, near = cloth("far", ("9", "3"), ("2", "2"), rating=300.0), cloth("near", ("1", "0.3"), ("0.2", "0.2"), 10.0)
    unrated = Cloth(**{name: getattr(near, name) for name in Cloth.__slots__} | {"id": "unrated", "rating": None})
    asked = Point(True, None, None, 1.0, 0.2, 0.3, 0.2, rating_um=10.0)
    found = ListReader([unrated, far, near]).nearest(asked, 3)
    assert [one.id for one, _, _ in found] == ["near", "far", "unrated"]


def test_an_unknown_figure_lies_outside_any_bound() -> None:
    reader = ListReader([cloth("a", ("0.25", "0.16"), ("0.25", "0.16"))])
    assert reader.count(Filters(ranges={"mass_kg_m2": (None, 100.0)})) == 0
    assert reader.count(Filters(ranges={"mass_kg_m2": (None, None)})) == 1


sizes = st.floats(0.01, 50.0)


@given(sizes, sizes, sizes, sizes)
def test_no_cloth_exceeds_the_wire_that_its_open_area_allows(a: float, b: float, d: float, e: float) -> None:
    open_area = 100 * a * b / ((a + d) * (b + e))
    assert log(d * e / (a * b)) / 2 <= most_wire_over_aperture(open_area) + 1e-9
