"""Odds that mean what they say: the true cloth lies in the 95 % set at least 93 % of the time.

The long form, 2,000 rolls over the whole seed catalogue, is tests/benchmarks/calibrate_identify.py.
"""

from fractions import Fraction

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from simulated_rolls import calibrate, seed_cloths

from catalog.search.evidence import Evidence
from catalog.search.identify import identify
from catalog.search.measured import Count, Scalar

CLOTHS = seed_cloths()[::2]


def test_the_true_cloth_is_in_the_95_percent_set_as_often_as_that_says() -> None:
    found = calibrate(CLOTHS, 200, 7)
    assert found.share >= 0.93
    assert found.mean_set < 6, "a set that holds everything says nothing"


def test_errors_four_times_as_large_as_stated_would_be_noticed() -> None:
    assert calibrate(CLOTHS, 100, 7, worse=4.0).share < 0.93


@settings(max_examples=40, deadline=None)
@given(st.integers(2, 400), st.integers(5, 60), st.floats(0.01, 2.0), st.floats(0.001, 0.05))
def test_odds_are_shares_of_one_and_the_set_comes_first(spaces: int, length: int, wire: float, error: float) -> None:
    evidence = Evidence(
        count=Count(Fraction(spaces), Fraction(length)), wire=Scalar(Fraction(wire), min(error, wire / 2))
    )
    result = identify(CLOTHS[:60], evidence, limit=100)
    odds = [c.odds for c in result.candidates]
    assert sum(odds) == pytest.approx(1.0 if result.survivors else 0.0)
    assert odds == sorted(odds, reverse=True)
    flags = [c.is_in_set for c in result.candidates]
    assert flags == sorted(flags, reverse=True)
    assert all(c.ruled_out_by is None for c in result.survivors)
