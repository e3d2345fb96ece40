"""Limits that explain themselves: worked example w ≤ 0.80 mm, open area ≥ 45 %, wire ≥ 0.35 mm, stainless.

Exact sums: 24 × .014 in opens 44.09 %, 0.8/0.32 has 0.03 mm too little wire, 20 × .016 in is 0.0636 mm too coarse.
"""

from fractions import Fraction as F

import pytest

from catalog.cloth import Cloth
from catalog.construction import Construction, Weave, Wires
from catalog.figures import figures
from catalog.search.limit_report import come_and_go, filters_of, limit_report, window
from catalog.search.list_reader import ListReader
from catalog.search.reader import Filters

INCH = F(127, 5)
LIMITS = {"aperture_mm": (None, 0.80), "open_area_pct": (45.0, None), "wire_mm": (0.35, None)}


def cloth(name: str, pitch: F, wire: F, alloy: str = "304") -> Cloth:
    made = Construction(Weave.PLAIN, Wires(pitch, wire), Wires(pitch, wire), alloy)
    return Cloth(name, name, made, figures(made, 7900.0), name, "inch", "test")


RACK = [
    cloth("24 x .014", INCH / 24, F("0.014") * INCH),
    cloth("0.8/0.32", F("1.12"), F("0.32")),
    cloth("20 x .016", INCH / 20, F("0.016") * INCH),
    cloth("60 x .0065", INCH / 60, F("0.0065") * INCH),
    cloth("brass 0.8/0.4", F("1.2"), F("0.4"), "CuZn30"),
]
STAINLESS = Filters(alloys=frozenset({"304", "316L"}))


def test_nothing_satisfies_and_each_near_miss_says_what_it_is_short_of() -> None:
    reader = ListReader(RACK)
    assert reader.count(filters_of(LIMITS, STAINLESS)) == 0
    report = limit_report(LIMITS, STAINLESS, reader)
    short = {miss.cloth.id: {s.limit: s.by for s in miss.short_of} for miss in report.near}
    assert short == {
        "24 x .014": {"open_area_pct": pytest.approx(0.91, abs=0.01)},
        "0.8/0.32": {"wire_mm": pytest.approx(0.03)},
        "20 x .016": {"aperture_mm": pytest.approx(0.0636)},
    }


def test_each_limit_says_how_many_it_alone_keeps_out() -> None:
    report = limit_report(LIMITS, STAINLESS, ListReader(RACK))
    assert {r.limit: r.removed for r in report.removed} == {
        "aperture_mm": 1,
        "open_area_pct": 1,
        "wire_mm": 1,
        "alloy": 0,
    }


def test_the_window_that_would_satisfy_is_told() -> None:
    """d ≤ w (1/√0.45 − 1) = 0.4907 w, so 0.35 mm of wire asks 0.713 mm of aperture."""
    found = window(LIMITS)
    assert found is not None
    assert found.aperture == (pytest.approx(0.7133, abs=5e-4), 0.80)
    assert found.wire_per_aperture == pytest.approx(0.4907, abs=5e-5)
    assert not found.is_empty
    tight = window({**LIMITS, "aperture_mm": (None, 0.70)})
    assert tight is not None
    assert tight.is_empty


def test_moving_one_limit_says_which_lines_come_and_go() -> None:
    reader = ListReader(RACK)
    wider = {**LIMITS, "open_area_pct": (44.0, None)}
    before, after = (reader.select(filters_of(limits, STAINLESS)) for limits in (LIMITS, wider))
    came, went = come_and_go(before, after)
    assert [c.id for c in came] == ["24 x .014"]
    assert went == ()
