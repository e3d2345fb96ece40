"""Cloth in service: what the figures say, by which method, for the fluid that was stated."""

from dataclasses import replace
from fractions import Fraction as F

import pytest
from test_judging import ASKED, by_count, judged, metric

from catalog.errors import InputError
from catalog.report.properties import Service, properties
from catalog.search.duty import breaking_loads, loss_of, parse_duty
from catalog.target import Purpose


@pytest.mark.parametrize(
    ("text", "velocity", "density"),
    [
        ("air 20 C 2 m/s", 2.0, pytest.approx(1.204, rel=2e-3)),  # ICAO standard atmosphere at 20 °C
        ("water at 60°C, 5 cm/s", 0.05, pytest.approx(983.2, rel=1e-3)),  # handbook value for 60 °C
        ("1,2 kg/m3 1.8e-5 Pa.s 1 m/s", 1.0, pytest.approx(1.2)),
        ("air 1 ft/s", 0.3048, pytest.approx(1.204, rel=2e-3)),
    ],
)
def test_a_flow_is_read_with_its_units(text: str, velocity: float, density: object) -> None:
    duty = parse_duty(text)
    assert duty.velocity_m_s == pytest.approx(velocity)
    assert duty.fluid.density_kg_m3 == density


@pytest.mark.parametrize("text", ["air", "2 m/s", "oil 20 C 1 m/s", "air 20 C 0 m/s", "air 5000 C 1 m/s"])
def test_a_flow_that_says_too_little_is_refused(text: str) -> None:
    with pytest.raises(InputError):
        parse_duty(text)


def test_loss_by_armour_and_cannon() -> None:
    """Check value: w 0.075, d 0.05 mm, 1 m/s, 1.204 kg/m³, 1.813e-5 Pa·s: K 46.5685, 28.03 Pa (1968 formula)."""
    loss = loss_of(metric("0.075", "0.05").construction, parse_duty("1.204 kg/m3 1.813e-5 Pa.s 1 m/s"))
    assert loss is not None
    assert pytest.approx(46.5685, rel=1e-4) == loss.K
    assert loss.pressure_drop_pa == pytest.approx(28.03, rel=1e-3)


def test_a_substitute_for_flow_says_what_the_pressure_drop_does() -> None:
    found = judged(by_count(60, "0.0075"), Purpose.FLOW)
    (said,) = [f for f in found.findings if f.rule == "pressure drop"]
    assert "assumed" in said.message
    stated = judged(by_count(60, "0.0075"), Purpose.FLOW, duty=parse_duty("water 20 C 0.1 m/s"))
    (said,) = [f for f in stated.findings if f.rule == "pressure drop"]
    assert "water" in said.message
    assert "assumed" not in said.message


def test_a_substitute_for_strength_says_what_breaks_it_or_that_nobody_knows() -> None:
    found = judged(by_count(60, "0.0075"), Purpose.STRENGTH)
    assert any(f.rule == "breaking load" and "kN/m" in f.message for f in found.findings)
    brass = replace(ASKED, alloy=None)
    unknown = judged(metric("0.25", "0.16", "CuZn30"), Purpose.STRENGTH, asked=brass)
    assert any("No tensile range" in f.message for f in unknown.findings)
    assert breaking_loads(metric("0.25", "0.16", "CuZn30").construction) is None


def named(cloth: object, service: Service) -> dict[str, object]:
    return {p.name: p for p in properties(cloth, service)}  # type: ignore[arg-type]


def test_the_data_sheet_holds_what_the_service_allows() -> None:
    found = named(metric("0.25", "0.16"), Service(particle_mm=0.2, area_m2=12))
    assert found["nearest sieves"].values["sieves"][0] == {"opening_mm": 0.25, "e11": "No. 60"}  # type: ignore[attr-defined]
    chance = found["passing"].values["probability"]  # type: ignore[attr-defined]
    assert chance == pytest.approx((0.05 / 0.41) ** 2)  # Gaudin 1939, from memory
    assert "net mass" in found
    assert "flow" not in found
    assert "coating" not in found


def test_zinc_closes_the_opening_as_the_annulus_says() -> None:
    """8 × .028 in with 0.05 mm a side: aperture −4.1 %, open area 60.2 → 55.4 %, + 0.54 kg/m² (sums by hand)."""
    found = named(by_count(8, "0.028", "CS"), Service(coating_mm=0.05))["coating"]
    assert "−4.1 %" in found.words  # type: ignore[attr-defined]
    assert found.values["open_area_pct"] == pytest.approx(55.4, abs=0.05)  # type: ignore[attr-defined]
    assert found.values["coating_kg_m2"] == pytest.approx(0.54, abs=0.005)  # type: ignore[attr-defined]


def test_a_test_sieve_may_hold_one_much_larger_opening() -> None:
    """Largest single opening of 250 µm test-sieve cloth by ASTM E11-17: 250 + 57.8 = 307.8 µm."""
    sieve = replace(metric("0.25", "0.16"), standard="ISO 3310-1 / ASTM E11")
    found = named(sieve, Service())["sieve tolerance"]
    assert found.values["largest_e11_um"] == pytest.approx(307.8, abs=0.1)  # type: ignore[attr-defined]


def test_a_guard_opening_may_cross_a_step_by_its_oversize() -> None:
    """9.5 mm with 0.7 mm oversize: 25 mm at nominal, 80 mm at the largest (ISO 13857, table 4)."""
    found = named(metric("9.5", "2"), Service(oversize_mm=0.7))["guard"]
    assert (found.values["distance_mm"], found.values["distance_largest_mm"]) == (25, 80)  # type: ignore[attr-defined]


def test_scaling_all_lengths_leaves_the_shares() -> None:
    small, large = metric("0.1", "0.05"), metric("1", "0.5")
    assert small.figures.open_area_pct == pytest.approx(large.figures.open_area_pct)
    assert F(1, 10) * large.construction.warp.pitch_mm == small.construction.warp.pitch_mm
