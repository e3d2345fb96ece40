"""Test sieves against the tables of ISO 3310-1:2016 and ASTM E11-17 in the library fluids 1.3.1, its slips known."""

from fractions import Fraction

import pytest
from fluids.particle_size_distribution import (
    ISO_3310_1_R10,
    ISO_3310_1_R20,
    ISO_3310_1_R20_3,
    ISO_3310_1_R40_3,
    ASTM_E11_sieves,
    ISO_3310_1_sieves,
)

from catalog.reference import sieves

SLIPPED_WIRE_MIN = ["0.02", "0.025", "0.032", "0.036", "0.038", "0.04", "0.045", "0.05", "0.053", "0.056", "0.063"]
"""Eleven rows at and below 63 µm where the library's least wire equals its greatest."""


def mm(metres: float) -> Fraction:
    return Fraction(str(round(metres * 1000, 6)))


@pytest.mark.parametrize("designation", ISO_3310_1_sieves)
def test_opening_and_wires_are_those_of_iso_3310_1(designation: str) -> None:
    theirs = ISO_3310_1_sieves[designation]
    ours = sieves.by_opening(mm(theirs.opening))
    assert ours is not None
    assert ours.opening_mm == Fraction(designation)
    assert ours.wire_mm == mm(theirs.d_wire)
    assert ours.wire_max_mm == mm(theirs.d_wire_max)
    if designation not in SLIPPED_WIRE_MIN:
        assert ours.wire_min_mm == mm(theirs.d_wire_min)


@pytest.mark.parametrize("designation", ASTM_E11_sieves)
def test_opening_and_name_are_those_of_astm_e11(designation: str) -> None:
    theirs = ASTM_E11_sieves[designation]
    ours = sieves.by_opening(mm(theirs.opening))
    assert ours is not None
    assert ours.in_e11
    assert ours.e11_name == theirs.old_designation
    assert sieves.by_name(theirs.old_designation) is ours


def test_we_hold_neither_more_nor_fewer() -> None:
    assert {s.opening_mm for s in sieves.sieves()} == {Fraction(name) for name in ISO_3310_1_sieves}
    assert {s.opening_mm for s in sieves.sieves() if s.in_e11} == {Fraction(name) for name in ASTM_E11_sieves}


@pytest.mark.parametrize(
    ("series", "members"),
    [("R10", ISO_3310_1_R10), ("R20", ISO_3310_1_R20), ("R20/3", ISO_3310_1_R20_3), ("R40/3", ISO_3310_1_R40_3)],
)
def test_each_series_holds_the_openings_of_iso_565(series: str, members: list[object]) -> None:
    theirs = {mm(sieve.opening) for sieve in members}
    assert {s.opening_mm for s in sieves.sieves() if series in s.series.split("+")} == theirs


def test_the_eleven_slipped_least_wires_are_marked_unverified() -> None:
    unverified = {s.opening_mm for s in sieves.sieves() if not s.wire_min_is_verified}
    assert unverified == {Fraction(name) for name in SLIPPED_WIRE_MIN}
    for name in SLIPPED_WIRE_MIN:
        theirs = ISO_3310_1_sieves[name]
        assert theirs.d_wire_min == theirs.d_wire_max, "the library has been repaired: take its figure"


@pytest.mark.parametrize("sieve", sieves.sieves(), ids=lambda s: str(float(s.opening_mm)))
def test_a_nominal_wire_lies_between_its_limits(sieve: sieves.Sieve) -> None:
    assert sieve.wire_min_mm < sieve.wire_mm < sieve.wire_max_mm


@pytest.mark.parametrize(
    ("number", "opening", "per_inch"),  # ISO 3310-1: 75 µm with 50 µm wire, 1 mm with 0.56 mm: sums by 25.4/(w + d)
    [("200", "0.075", 203), ("18", "1", 16.3), ("60", "0.25", 62)],
)
def test_a_sieve_number_is_a_name_and_no_count(number: str, opening: str, per_inch: float) -> None:
    sieve = sieves.by_number(number)
    assert sieve is not None
    assert sieve.opening_mm == Fraction(opening)
    assert float(Fraction("25.4") / (sieve.opening_mm + sieve.wire_mm)) == pytest.approx(per_inch, rel=0.002)
