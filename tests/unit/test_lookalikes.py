"""Names that mislead, and one cloth under two unit systems.

Worked example: "60" names market grade (232.8 µm), sieve No. 60 (250 µm) and bolting cloth (309.0 µm); exact sums
from 60 × .0075 in, 0.25/0.16 mm and 60 × .0045 in.
"""

from dataclasses import replace
from fractions import Fraction as F
from math import log

import pytest

from catalog.cloth import Cloth
from catalog.construction import Construction, Weave, Wires
from catalog.figures import figures
from catalog.search.equivalents import equivalents
from catalog.search.lookalikes import by_spoken_name, called, listed_twice, lookalikes, spoken_count

INCH = F(127, 5)


def cloth(name: str, pitch: F, wire: F, system: str, alloy: str = "304", weave: Weave = Weave.PLAIN) -> Cloth:
    made = Construction(weave, Wires(pitch, wire), Wires(pitch, wire), alloy)
    return Cloth(name, name, made, figures(made, 7900.0), name, system, "test")


def inch(count: int, wire: str, alloy: str = "304", weave: Weave = Weave.PLAIN) -> Cloth:
    return cloth(f"{count} x {wire} {alloy}", INCH / count, F(wire) * INCH, "inch", alloy, weave)


def metric(aperture: str, wire: str, alloy: str = "304", weave: Weave = Weave.PLAIN) -> Cloth:
    return cloth(f"{aperture}/{wire} {alloy}", F(aperture) + F(wire), F(wire), "metric", alloy, weave)


MARKET, BOLTING = inch(60, "0.0075"), inch(60, "0.0045")
SIEVE = replace(metric("0.25", "0.16"), name="Test-sieve cloth 0.25 mm (No. 60)", standard="ISO 3310-1 / ASTM E11")


def test_sixty_names_three_cloths() -> None:
    group = next(g for g in by_spoken_name([BOLTING, SIEVE, MARKET, inch(62, "0.0065")]) if g.name == "60")
    apertures_um = [round((c.figures.warp_aperture_mm or 0) * 1000, 1) for c in group.cloths]
    assert apertures_um == [232.8, 250.0, 309.0]
    assert [c.id for c in called(60, [SIEVE, MARKET, BOLTING])] == [c.id for c in group.cloths]


def test_a_sieve_goes_by_its_number_and_not_by_its_count() -> None:
    """0.25/0.16 is 61.95 per inch, and called No. 60."""
    assert float(SIEVE.construction.warp.count_per_in) == pytest.approx(61.95, abs=0.01)
    assert spoken_count(SIEVE) == 60


def test_a_metric_cloth_of_no_whole_count_is_called_by_none() -> None:
    assert spoken_count(metric("0.25", "0.14")) == 65  # 65.13 per inch, within half a percent of 65
    assert spoken_count(metric("2.0", "0.9")) is None  # 8.76 per inch


def test_openings_over_5_percent_apart_under_one_name_are_an_alarm() -> None:
    pairs = {(p.one.id, p.other.id): p.apart_pct for p in lookalikes([MARKET, SIEVE, BOLTING])}
    assert pairs == {
        (MARKET.id, SIEVE.id): pytest.approx(7.4, abs=0.05),
        (MARKET.id, BOLTING.id): pytest.approx(32.7, abs=0.05),
        (SIEVE.id, BOLTING.id): pytest.approx(23.6, abs=0.05),
    }


def test_the_same_opening_in_two_alloys_is_no_alarm() -> None:
    assert list(lookalikes([MARKET, inch(60, "0.0075", "316L")])) == []


def test_openings_5_percent_apart_are_let_pass() -> None:
    """60 × .0065 opens 258.2 µm, 3.3 % over the sieve's 250."""
    assert list(lookalikes([SIEVE, inch(60, "0.0065")])) == []


def test_one_cloth_in_two_unit_systems_is_listed_twice() -> None:
    """10 × .035 in is 1.651/0.889 mm: 0.06 % and 0.1 % from 1.65/0.89."""
    pair = next(listed_twice([inch(10, "0.035"), metric("1.65", "0.89"), MARKET]))
    assert {pair.one.unit_system, pair.other.unit_system} == {"inch", "metric"}
    assert abs(pair.apart_pct) < 0.5


@pytest.mark.parametrize(
    "other", [metric("1.65", "0.89", "316L"), metric("1.65", "0.92"), metric("1.67", "0.89"), inch(10, "0.035")]
)
def test_another_alloy_wire_opening_or_the_same_system_is_not_listed_twice(other: Cloth) -> None:
    assert list(listed_twice([inch(10, "0.035"), other])) == []


def ladder() -> list[Cloth]:
    """A small catalogue in both systems, some of it twilled."""
    found = [inch(n, f"0.{round(3500 / n):04d}") for n in range(8, 90, 3)]
    found += [metric(f"{w / 100}", f"{d / 100}") for w in range(10, 300, 7) for d in (w // 3, w // 2) if d]
    found += [metric("0.25", "0.15", weave=Weave.TWILLED), inch(62, "0.0063", weave=Weave.TWILLED)]
    return found


def test_each_inch_cloth_is_paired_with_the_nearest_metric_one_of_its_weave() -> None:
    """Against looking at every pair with 4 Δln(w)² + 2 Δln(d)² + Δln(A)², the search's distance for square cloth."""

    def distance(a: Cloth, b: Cloth) -> float:
        w = log((b.figures.warp_aperture_mm or 1) / (a.figures.warp_aperture_mm or 1))
        d = log(float(b.construction.warp.wire_mm / a.construction.warp.wire_mm))
        o = log((b.figures.open_area_pct or 1) / (a.figures.open_area_pct or 1))
        return 4 * w * w + 2 * d * d + o * o

    cloths = ladder()
    for pair in equivalents(cloths):
        weave = pair.inch.construction.weave
        others = [c for c in cloths if c.unit_system == "metric" and c.construction.weave is weave]
        assert pair.metric.id == min(others, key=lambda c: (distance(pair.inch, c), c.id)).id


def test_equivalents_come_fine_to_coarse_with_their_differences() -> None:
    """Worked example: 60 × .0065 in against 0.25/0.16 mm: opening −3.2 % of 258.2, wire −3.1 %, 37.2 % both."""
    pairs = list(equivalents([*ladder(), inch(60, "0.0065"), metric("0.25", "0.16")]))
    apertures = [p.inch.figures.warp_aperture_mm or 0 for p in pairs]
    assert apertures == sorted(apertures)
    sixty = next(p for p in pairs if p.inch.id == "60 x 0.0065 304")
    assert sixty.metric.id == "0.25/0.16 304"
    assert (sixty.aperture_pct, sixty.wire_pct) == (pytest.approx(-3.19, abs=0.01), pytest.approx(-3.09, abs=0.01))
    assert sixty.judged.verdict.value == "interchangeable"


def test_a_make_in_two_alloys_has_the_same_equivalent() -> None:
    pairs = list(equivalents([inch(60, "0.0065"), inch(60, "0.0065", "316L"), metric("0.25", "0.16")]))
    assert [p.inch.construction.alloy for p in pairs] == ["304", "316L"]
    assert len({p.metric.id for p in pairs}) == 1


def test_without_metric_cloth_there_is_nothing_to_pair() -> None:
    assert list(equivalents([MARKET, BOLTING])) == []
