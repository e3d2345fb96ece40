"""Strength, stiffness, coating and guards against sums done by hand and ISO 13857."""

from itertools import pairwise
from math import pi

import periodictable
import pytest

from catalog.physics import coating, guarding, strength
from catalog.physics.domain import OutOfDomainError
from catalog.physics.geometry import section_mm2_per_mm


def test_8_per_inch_028_with_zinc_of_0_05_mm_loses_4_percent_of_its_aperture() -> None:
    # Sums by hand: aperture 2.4638 to 2.3638, open area 60.2 to 55.4 %, ring of zinc 0.54 kg/m², not 0.50.
    found = coating.coated(25.4 / 8, 25.4 / 8, 0.028 * 25.4, 0.028 * 25.4, 0.05, is_after_weaving=True)
    assert found.warp_aperture_mm == pytest.approx(2.3638)
    assert found.warp_aperture_change_pct == pytest.approx(-4.1, abs=0.05)
    assert found.open_area_pct == pytest.approx(55.4, abs=0.05)
    assert found.coating_kg_m2 == pytest.approx(0.538, abs=5e-4)
    assert found.mass_change_kg_m2 == pytest.approx(found.coating_kg_m2)


def test_wire_coated_before_weaving_keeps_the_aperture_and_has_a_thinner_core() -> None:
    # The stated wire is the coated one: zinc (7140) takes the place of steel (7850), by hand −9.04 % of the ring.
    found = coating.coated(3.175, 3.175, 0.7112, 0.7112, 0.05, is_after_weaving=False)
    assert found.warp_aperture_mm == pytest.approx(2.4638)
    assert found.warp_aperture_change_pct == 0.0
    assert found.mass_change_kg_m2 == pytest.approx(found.coating_kg_m2 * (1 - 7850 / 7140))


def test_the_density_of_zinc_is_the_librarys() -> None:
    # periodictable: 7.133 g/cm³.
    assert abs(coating.ZINC_KG_M3 / (1000 * periodictable.Zn.density) - 1) < 2e-3


def test_a_coating_that_closes_the_openings_or_eats_the_core_is_refused() -> None:
    with pytest.raises(OutOfDomainError, match="no opening"):
        coating.coated(1.0, 1.0, 0.8, 0.8, 0.1, is_after_weaving=True)
    with pytest.raises(OutOfDomainError, match="no wire"):
        coating.coated(1.0, 1.0, 0.2, 0.2, 0.1, is_after_weaving=False)


def test_metal_section_is_wire_circles_per_width() -> None:
    # π/24 by hand.
    assert section_mm2_per_mm(1.5, 0.5) == pytest.approx(pi / 24)


def test_breaking_load_is_a_range_in_newton_per_millimetre() -> None:
    # 600 and 800 MPa times π/24: 78.5 and 104.7 N/mm by hand.
    assert strength.breaking_load_n_per_mm(1.5, 0.5, 600, 800) == pytest.approx((78.54, 104.72), abs=0.01)
    with pytest.raises(OutOfDomainError, match="backwards"):
        strength.breaking_load_n_per_mm(1.5, 0.5, 800, 600)


@pytest.mark.parametrize(
    ("count", "wire_in", "percent"), [(62, 0.0065, 107), (60, 0.0065, 103), (60, 0.0075, 137), (60, 0.0045, 49)]
)
def test_inch_cloths_offered_for_0_25_over_0_16_have_these_sections(count: int, wire_in: float, percent: int) -> None:
    # (d²/p offered) / (0.16²/0.41), sums by hand.
    ratio = strength.section_ratio(0.41, 0.16, 25.4 / count, wire_in * 25.4)
    assert round(100 * ratio) == percent


def test_stiffness_goes_with_the_fourth_power_of_the_wire() -> None:
    # 1.1⁴ = 1.4641; half the pitch doubles it.
    assert strength.stiffness_ratio(1.0, 0.1, 1.0, 0.11) == pytest.approx(1.4641)
    assert strength.stiffness_ratio(1.0, 0.1, 0.5, 0.1) == pytest.approx(2.0)


def iso_13857_step(opening: float) -> tuple[float, float] | None:
    """Steps of ISO 13857, table 4."""
    ends = (0, 4, 6, 8, 10, 12, 20, 30, 40, 120)
    return next(((a, b) for a, b in pairwise(ends) if a < opening <= b), None)


def test_9_5_mm_for_9_mm_square_crosses_a_step_once_0_7_mm_oversize_is_counted() -> None:
    # ISO 13857, table 4: 25 mm behind 8–10, 80 mm behind 10–12.
    assert guarding.does_substitute_cross(9.0, 9.5, 0.7, iso_13857_step)
    assert not guarding.does_substitute_cross(9.0, 9.5, 0.0, iso_13857_step)
    found = guarding.governing_opening(9.5, 0.7, iso_13857_step)
    assert found.largest_mm == pytest.approx(10.2)
    assert found.crosses_step
    assert (found.nominal_step, found.largest_step) == ((8, 10), (10, 12))


def test_steps_include_their_upper_end() -> None:
    # ISO 13857: a < e ≤ b.
    assert not guarding.governing_opening(9.5, 0.5, iso_13857_step).crosses_step


def test_beyond_the_table_counts_as_crossing() -> None:
    assert guarding.does_substitute_cross(119.0, 119.9, 0.5, iso_13857_step)
    with pytest.raises(OutOfDomainError, match="oversize"):
        guarding.governing_opening(9.0, -0.1, iso_13857_step)
