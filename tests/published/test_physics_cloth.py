"""Square and rectangular cloth against values worked outside the program, and Peirce's printed check."""

import csv
import re
from collections.abc import Iterator
from math import degrees, isclose, sqrt
from pathlib import Path

import pytest

from catalog.physics import crimp, geometry, mass
from catalog.physics.domain import OutOfDomainError

DATA = Path(__file__).with_name("data")
PRINTED = 6e-4
"""The tables hold four to six significant digits."""


def rows(name: str) -> list[dict[str, str]]:
    with (DATA / name).open(encoding="utf-8", newline="") as file:
        return list(csv.DictReader(line for line in file if not line.startswith("#")))


def square_cloths() -> Iterator[tuple[str, float, float, float, float]]:
    """Quantity, aperture, wire, density, value: basis named in check_values.csv."""
    for row in rows("check_values.csv"):
        found = re.fullmatch(r"w=([\d.]+) d=([\d.]+) mm(?: rho=(\d+))?", row["input"])
        if found:
            w, d, rho = (float(figure or "nan") for figure in found.groups())
            yield row["quantity"], w, d, rho, float(row["value"])


@pytest.mark.parametrize(("quantity", "w", "d", "rho", "value"), list(square_cloths()))
def test_square_cloth_has_the_figures_worked_by_hand(
    quantity: str, w: float, d: float, rho: float, value: float
) -> None:
    p = w + d
    found = {
        "mass_iso9044": lambda: mass.mass_nominal_kg_m2(p, p, d, d, rho),
        "mass_straight_wire": lambda: mass.mass_straight_kg_m2(p, p, d, d, rho),
        "mass_peirce_plain": lambda: mass.mass_geometric_kg_m2(p, p, d, d, rho),
        "open_area": lambda: geometry.open_area_pct(w, w, p, p),
        "mesh": lambda: geometry.count_per_inch(p),
    }[quantity]()
    assert found == pytest.approx(value, rel=PRINTED / 10, abs=6e-6 if value < 1 else 6e-4)


def test_every_square_row_of_the_check_values_is_used() -> None:
    assert len(list(square_cloths())) == 25


@pytest.mark.parametrize("row", rows("crimp_checks.csv"), ids=lambda r: r["d_over_p"])
def test_crimp_and_mass_follow_peirce_from_thin_to_nearly_jammed(row: dict[str, str]) -> None:
    # Basis: Peirce's equations worked separately; ISO 9044's divisor 618.1 from memory.
    d = float(row["d_over_p"])
    assert geometry.open_area_pct(1 - d, 1 - d, 1, 1) == pytest.approx(float(row["open_area_pct"]), rel=PRINTED)
    nominal = mass.mass_nominal_kg_m2(1, 1, d, d, 7900)
    for is_twilled, name in ((False, "plain"), (True, "twill")):
        for direction in crimp.crimps(1, 1, d, d, is_twilled):
            assert 100 * direction == pytest.approx(float(row[f"{name}_crimp_pct"]), rel=PRINTED)
        geometric = mass.mass_geometric_kg_m2(1, 1, d, d, 7900, is_twilled)
        assert geometric is not None
        assert geometric / nominal == pytest.approx(float(row[f"{name}_mass_over_iso9044"]), rel=PRINTED)


def test_jammed_square_cloth_is_the_one_that_peirce_printed() -> None:
    # Peirce 1937: theta 60 degrees, p/D 0.866, crimp 0.2092.
    pitch = geometry.jam_pitch_mm(1.0, 1.0)
    assert pitch / 2.0 == pytest.approx(0.866, abs=5e-4)
    assert degrees(crimp.weave_angle_rad(pitch, 2.0, 1.0)) == pytest.approx(60.0, abs=1e-6)
    assert crimp.crimp(pitch, 2.0, 1.0) == pytest.approx(0.2092, abs=5e-5)


def test_plain_square_cloth_jams_at_wire_over_pitch_0_577_and_open_area_17_9_percent() -> None:
    # 1/√3 after Peirce 1937; (1 − 0.577)² = 17.9 % by hand.
    assert not geometry.is_jammed(1.0, 0.577, 0.577)
    assert geometry.is_jammed(1.0, 0.578, 0.578)
    least = 1.0 / sqrt(3.0)
    assert geometry.open_area_pct(1 - least, 1 - least, 1, 1) == pytest.approx(17.9, abs=0.05)


def test_a_two_two_twill_takes_thicker_wire_than_plain_weave() -> None:
    # 2/(1 + √3) = 0.732: wires in touching pairs (derived by hand).
    assert not geometry.is_jammed(1.0, 0.73, 0.73, twilled=True)
    assert geometry.is_jammed(1.0, 0.74, 0.74, twilled=True)
    assert not geometry.cannot_be_woven(1.0, 1.0, 0.73, 0.73, is_twilled=True)
    assert geometry.cannot_be_woven(1.0, 1.0, 0.74, 0.74, is_twilled=True)


def test_12_mesh_of_063_wire_has_an_opening_but_cannot_be_woven_plain() -> None:
    # d/p = 0.756 by hand.
    pitch, wire = 25.4 / 12, 0.063 * 25.4
    assert pitch > wire
    assert geometry.is_jammed(pitch, wire, wire)
    assert geometry.cannot_be_woven(pitch, pitch, wire, wire)
    assert mass.mass_geometric_kg_m2(pitch, pitch, wire, wire, 7900) is None
    with pytest.raises(OutOfDomainError, match="jammed"):
        crimp.crimps(pitch, pitch, wire, wire)


def test_100_mesh_of_0045_wire_is_called_140_micrometres() -> None:
    # Common practice: 0.0055 in = 0.1397 mm.
    assert isclose(25.4 / 100 - 0.0045 * 25.4, 0.1397, abs_tol=1e-9)
    assert geometry.longest_sphere_mm(0.1397, 0.1397) == 0.1397


def test_the_nominal_mass_of_steel_is_half_wire_squared_times_mesh() -> None:
    # Old rule of the trade (common practice): kg/m² = d²·mesh/2 for steel at 7850 kg/m³, d in mm.
    for mesh, wire in ((10, 0.9), (60, 0.16), (4, 1.6)):
        assert mass.mass_nominal_kg_m2(25.4 / mesh, 25.4 / mesh, wire, wire, 7850) == pytest.approx(
            wire**2 * mesh / 2, rel=2e-4
        )


def test_longer_than_wide_is_oblong_and_wider_than_long_is_broad() -> None:
    # Common practice.
    assert geometry.opening_shape(2.0, 6.0) == "oblong"
    assert geometry.opening_shape(6.0, 2.0) == "broad"
    assert geometry.opening_shape(2.0, 2.0) == "square"


def test_cloth_is_two_wires_thick_flush_and_three_with_one_set_straight() -> None:
    # Sums by hand.
    assert geometry.thickness_least_mm(0.5, 0.3) == pytest.approx(0.8)
    assert geometry.thickness_most_mm(0.5, 0.3) == pytest.approx(1.3)


def test_net_mass_is_a_band_over_all_estimates() -> None:
    # 30 m², 2.0 and 2.1 kg/m², ±5 %: 57.0 to 66.15 kg by hand.
    assert mass.net_mass_band_kg(30, (2.0, 2.1), 5) == pytest.approx((57.0, 66.15))


@pytest.mark.parametrize("bad", [0.0, -1.0, float("nan"), float("inf")])
def test_figures_that_are_no_lengths_are_refused_by_name(bad: float) -> None:
    with pytest.raises(OutOfDomainError, match="pitch_mm"):
        geometry.count_per_inch(bad)
    with pytest.raises(ValueError, match="above 0"):
        mass.mass_nominal_kg_m2(1, 1, 0.5, 0.5, bad)
