"""Flow against worked values, the fluids library and handbook or IAPWS figures."""

import csv
import re
from itertools import product
from pathlib import Path

import pytest
from fluids.atmosphere import ATMOSPHERE_1976
from fluids.filters import round_edge_screen

from catalog.physics import flow
from catalog.physics.domain import OutOfDomainError
from catalog.physics.flow_bed import dutch_bed, square_bed
from catalog.physics.fluid_properties import Fluid, air, water

TABLE = Path(__file__).with_name("data") / "check_values.csv"
AIR = Fluid("air", 1.204, 1.813e-5)


def worked() -> list[tuple[float, ...]]:
    """w, d, u, K, Re, ε, a, Δp; basis: Armour and Cannon's printed form, worked separately."""
    found = []
    with TABLE.open(encoding="utf-8", newline="") as file:
        for row in csv.DictReader(line for line in file if not line.startswith("#")):
            if row["quantity"] == "armour_cannon_K":
                figures = re.findall(r"(?:w|d|u|Re_AC|eps|a|dP)=([\d.]+)", row["input"] + " " + row["basis"])
                w, d, u, reynolds, eps, a, drop = map(float, figures)
                found.append((w, d, u, float(row["value"]), reynolds, eps, a, drop))
    return found


def test_all_three_worked_rows_are_used() -> None:
    assert len(worked()) == 3


@pytest.mark.parametrize(("w", "d", "u", "loss", "reynolds", "eps", "a", "drop"), worked())
def test_armour_cannon_gives_the_worked_values(
    w: float, d: float, u: float, loss: float, reynolds: float, eps: float, a: float, drop: float
) -> None:
    bed = square_bed(w + d, w + d, d, d)
    assert bed.porosity == pytest.approx(eps, abs=6e-6)
    assert bed.surface_per_m == pytest.approx(a, abs=0.06)
    assert flow.bed_reynolds(bed, u, AIR) == pytest.approx(reynolds, abs=6e-4)
    found = flow.armour_cannon_loss(bed, u, AIR)
    assert found == pytest.approx(loss, abs=6e-5)
    assert found * 1.204 * u * u / 2 == pytest.approx(drop, rel=4e-4)


def test_the_round_wire_relation_is_the_librarys_where_that_is_valid() -> None:
    # fluids 1.3, round_edge_screen: open area 0.05 to 0.8, Re 20 and up; below 20 it is clamped.
    for alpha, reynolds in product((0.05, 0.2, 0.35, 0.5, 0.65, 0.8), (20, 25, 30, 55, 77, 100, 150, 399, 400, 9000)):
        expected = round_edge_screen(alpha, reynolds)
        assert flow.round_wire_screen_loss(alpha, reynolds) == pytest.approx(expected, rel=1e-9)


@pytest.mark.parametrize(("alpha", "reynolds"), [(0.04, 100), (0.81, 100), (0.5, 19.9), (0.5, float("nan"))])
def test_the_round_wire_relation_refuses_what_its_table_does_not_hold(alpha: float, reynolds: float) -> None:
    with pytest.raises(OutOfDomainError):
        flow.round_wire_screen_loss(alpha, reynolds)


def test_both_relations_agree_within_their_uncertainty_where_they_meet() -> None:
    # Independent correlations (AIChE J. 1968; Blevins 1984), each ±30 %.
    for w, d in ((0.25, 0.16), (0.5, 0.25), (1.0, 0.4)):
        bed = square_bed(w + d, w + d, d, d)
        u = 200 * (bed.open_area or 0) * 1.813e-5 / 1.204 / d * 1000
        ratio = flow.armour_cannon_loss(bed, u, AIR) / flow.round_wire_screen_loss(bed.open_area or 0, 200)
        assert 0.7 <= ratio <= 1.3


def test_the_method_follows_the_range() -> None:
    fine, coarse = square_bed(0.125, 0.125, 0.05, 0.05), square_bed(12.0, 12.0, 2.0, 2.0)
    assert flow.flow_loss(fine, 1.0, AIR).method == flow.ARMOUR_CANNON
    assert flow.flow_loss(coarse, 5.0, AIR).method == flow.ROUND_WIRE
    assert flow.flow_loss(coarse, 5.0, AIR).in_range
    assert flow.flow_loss(fine, 60.0, AIR).method == flow.ROUND_WIRE
    assert flow.flow_loss(fine, 15.0, AIR).method == flow.BLENDED


def test_outside_every_range_the_figure_is_flagged_and_has_no_plus_minus() -> None:
    found = flow.flow_loss(square_bed(12.0, 12.0, 2.0, 2.0), 0.01, AIR)
    assert (found.method, found.in_range, found.uncertainty_pct) == (flow.ARMOUR_CANNON, False, None)
    assert any("extrapolation" in note for note in found.notes)


def test_every_loss_is_for_clean_cloth_and_says_so() -> None:
    beds = (square_bed(0.41, 0.41, 0.16, 0.16), dutch_bed("plain-dutch", 25.4 / 24, 25.4 / 110, 0.36, 0.26, 0.14))
    assert all("Clean cloth only." in flow.flow_loss(bed, 0.5, AIR).notes for bed in beds)


def test_filter_cloth_has_a_loss_in_range_without_an_open_area() -> None:
    found = flow.flow_loss(dutch_bed("plain-dutch", 25.4 / 24, 25.4 / 110, 0.36, 0.26, 0.14), 0.1, water(20))
    assert (found.method, found.in_range, found.uncertainty_pct) == (flow.ARMOUR_CANNON, True, 30.0)
    with pytest.raises(OutOfDomainError, match="open area"):
        flow.wire_reynolds(dutch_bed("plain-dutch", 25.4 / 24, 25.4 / 110, 0.36, 0.26, 0.14), 0.1, AIR)


def test_reverse_dutch_is_marked_as_not_measured() -> None:
    bed = dutch_bed("reverse-plain-dutch", 25.4 / 110, 25.4 / 24, 0.26, 0.36, 0.1)
    assert any("Reverse Dutch" in note for note in flow.flow_loss(bed, 0.1, AIR).notes)


def test_loss_ratio_is_offered_over_asked() -> None:
    asked = flow.flow_loss(square_bed(0.41, 0.41, 0.16, 0.16), 0.5, AIR)
    offered = flow.flow_loss(square_bed(0.42333, 0.42333, 0.1905, 0.1905), 0.5, AIR)
    assert flow.loss_ratio(asked, offered) > 1.0


@pytest.mark.parametrize("celsius", [-60, -20, 0, 15, 20, 40, 100])
def test_air_is_the_librarys_standard_atmosphere(celsius: float) -> None:
    # fluids 1.3, ATMOSPHERE_1976: Sutherland viscosity and ideal gas.
    kelvin = celsius + 273.15
    found = air(celsius)
    assert found.viscosity_pa_s == pytest.approx(ATMOSPHERE_1976.viscosity(kelvin), rel=1e-4)
    assert found.density_kg_m3 == pytest.approx(ATMOSPHERE_1976.density(kelvin, 101325), rel=1e-4)


@pytest.mark.parametrize(("celsius", "density"), [(0, 999.84), (4, 999.97), (20, 998.21), (50, 988.04), (100, 958.37)])
def test_water_has_the_density_of_the_handbooks(celsius: float, density: float) -> None:
    # Handbook values, from memory.
    assert water(celsius).density_kg_m3 == pytest.approx(density, rel=2e-5)


def tanaka_kg_m3(t: float) -> float:
    """Tanaka et al., Metrologia 38 (2001) 301, 0 to 40 °C: an independent fit (constants from memory)."""
    return 999.974950 * (1 - (t - 3.983035) ** 2 * (t + 301.797) / (522528.9 * (t + 69.34881)))


@pytest.mark.parametrize("celsius", [0, 5, 10, 20, 30, 40])
def test_two_published_densities_of_water_agree(celsius: float) -> None:
    assert water(celsius).density_kg_m3 == pytest.approx(tanaka_kg_m3(celsius), rel=1e-5)


def test_water_at_25_degrees_has_the_viscosity_of_the_iapws_check_table() -> None:
    # IAPWS R12-08, table 4: 889.735100 µPa·s at 298.15 K and 998 kg/m³ (water at 1 atm: 997 kg/m³).
    assert water(25).viscosity_pa_s * 1e6 == pytest.approx(889.735, rel=5e-4)


@pytest.mark.parametrize("celsius", [0, 10, 20, 40, 60, 80, 100])
def test_two_published_viscosities_of_water_agree(celsius: float) -> None:
    # Laliberté, J. Chem. Eng. Data 52 (2007) 321, equation for water, mPa·s: an independent fit.
    t = celsius
    other = (t + 246) / ((0.05594 * t + 5.2842) * t + 137.37)
    assert water(celsius).viscosity_pa_s * 1e3 == pytest.approx(other, rel=5e-3)


@pytest.mark.parametrize("celsius", [-1, 101, float("nan")])
def test_ice_and_steam_are_refused(celsius: float) -> None:
    with pytest.raises(OutOfDomainError):
        water(celsius)
