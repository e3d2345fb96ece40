"""Sieving against worked values and the fluids library's tables of E11-17 and ISO 3310-1:2016."""

import csv
import re
from pathlib import Path

import pytest
from fluids import particle_size_distribution as library

from catalog.physics import sieving
from catalog.physics.domain import OutOfDomainError

TABLE = Path(__file__).with_name("data") / "check_values.csv"


def worked() -> list[tuple[str, float, float, float]]:
    """Edition, opening, Y, X in µm; basis named in check_values.csv."""
    found = []
    with TABLE.open(encoding="utf-8", newline="") as file:
        for row in csv.DictReader(line for line in file if not line.startswith("#")):
            if row["quantity"].startswith("sieve_Y_X"):
                opening = float(re.fullmatch(r"w=([\d.]+) um", row["input"]).group(1))  # type: ignore[union-attr]
                edition = "ISO 3310-1:2016" if row["quantity"].endswith("2016") else "E11-17"
                found.append((edition, opening, *map(float, row["value"].split("/"))))
    return found  # type: ignore[return-value]


@pytest.mark.parametrize(("edition", "opening", "y", "x"), worked())
def test_tolerances_are_the_worked_ones(edition: str, opening: float, y: float, x: float) -> None:
    assert sieving.average_tolerance_um(opening, edition) == pytest.approx(y, abs=6e-4)
    assert sieving.largest_oversize_um(opening, edition) == pytest.approx(x, abs=6e-4)


def test_all_twelve_worked_rows_are_used() -> None:
    assert len(worked()) == 12


def printed_step(opening_um: float, edition: str, letter: str) -> float:
    """The digit to which the library's tables are rounded, µm."""
    if letter == "X":
        return 1.0 if opening_um < 1000 else 10.0
    fine, middle = (1000.0, 37_000.0) if edition == "E11-17" else (280.0, 1000.0)
    return 0.1 if opening_um < fine else 1.0 if opening_um < middle else 10.0


@pytest.mark.parametrize(
    ("edition", "table", "count"),
    [("E11-17", library.ASTM_E11_sieves, 56), ("ISO 3310-1:2016", library.ISO_3310_1_sieves, 99)],
)
def test_every_row_of_the_librarys_tables_agrees_to_its_last_digit(
    edition: str, table: dict[str, library.Sieve], count: int
) -> None:
    # Source: fluids 1.3, particle_size_distribution (a single source for the 2016 edition).
    assert len(table) == count
    for sieve in table.values():
        opening = sieve.opening * 1e6
        y, x = sieve.Y_variation_avg * 1e6, sieve.X_variation_max * 1e6
        half_y = printed_step(opening, edition, "Y") / 2 + 1e-6
        half_x = printed_step(opening, edition, "X") / 2 + 1e-6
        assert abs(sieving.average_tolerance_um(opening, edition) - y) <= half_y, sieve.designation
        assert abs(sieving.largest_oversize_um(opening, edition) - x) <= half_x, sieve.designation


def test_a_250_um_test_sieve_may_hold_one_opening_of_308_um() -> None:
    # 250 + X of E11-17 by hand; the library prints X as 58 µm.
    assert round(sieving.largest_opening_um(250, "E11-17")) == 308


def test_the_editions_differ_so_an_edition_has_to_be_named() -> None:
    assert sieving.average_tolerance_um(75, "ISO 3310-1:2000") == sieving.average_tolerance_um(75, "E11-17")
    assert sieving.average_tolerance_um(75, "ISO 3310-1:2016") < sieving.average_tolerance_um(75, "E11-17")
    with pytest.raises(OutOfDomainError, match="ISO 9044"):
        sieving.average_tolerance_um(75, "ISO 9044")


@pytest.mark.parametrize("opening", [19.9, 125_001.0, -1.0, float("nan")])
def test_no_tolerance_is_made_up_beyond_the_sieves_of_the_standard(opening: float) -> None:
    with pytest.raises(OutOfDomainError, match="20 to 125000"):
        sieving.largest_oversize_um(opening, "E11-17")


def test_a_half_size_sphere_passes_one_time_in_nine() -> None:
    # Gaudin 1939 (from memory): ((1 − 0.5)/1.5)² = 1/9 by hand; twice: 1 − (8/9)² = 17/81.
    assert sieving.passing_probability(0.5, 1, 1, 1.5, 1.5) == pytest.approx(1 / 9)
    assert sieving.passing_probability(0.5, 1, 1, 1.5, 1.5, presentations=2) == pytest.approx(17 / 81)


def test_a_sphere_as_large_as_the_opening_never_passes_and_a_speck_passes_by_open_area() -> None:
    assert sieving.passing_probability(1.0, 1, 1, 1.5, 1.5) == 0.0
    assert sieving.passing_probability(3.0, 1, 4, 1.5, 4.5, presentations=1000) == 0.0
    assert sieving.passing_probability(1e-9, 1, 1, 1.5, 1.5) == pytest.approx(1 / 2.25, rel=1e-6)


def test_at_a_slot_spheres_meet_the_short_side_and_flakes_go_by_thickness() -> None:
    # Derived by hand from which shadow fits.
    assert sieving.governing_dimension(2, 6, "sphere").aperture_mm == 2
    assert sieving.governing_dimension(6, 2, "needle").particle_measure == "diameter"
    assert sieving.governing_dimension(2, 6, "flake").particle_measure == "thickness"
    assert sieving.governing_dimension(2, 2, "flake").particle_measure == "width"
    with pytest.raises(OutOfDomainError, match="sphere, flake or needle"):
        sieving.governing_dimension(2, 6, "dust")


def test_a_flake_wider_than_the_square_slips_through_its_diagonal() -> None:
    # The diagonal of a 1 mm square is 1.414 mm.
    assert sieving.does_flake_pass(1.41, 0.001, 1, 1)
    assert not sieving.does_flake_pass(1.42, 0.001, 1, 1)
    assert sieving.does_flake_pass(5.9, 1.9, 2, 6)
    assert not sieving.does_flake_pass(5.9, 2.1, 2, 6)
