"""Filter cloth against a closed form and another solver on an even grid, both worked outside the program."""

import csv
import re
from functools import cache
from pathlib import Path

import pytest

from catalog.physics import filter_cloth
from catalog.physics.domain import OutOfDomainError
from catalog.physics.dutch_wires import DutchWeave
from catalog.physics.widest_path import sphere_bounds_mm

DATA = Path(__file__).with_name("data")
CODES = {"plain Dutch": "plain-dutch", "twilled Dutch": "twilled-dutch"}


def rows(name: str) -> list[dict[str, str]]:
    with (DATA / name).open(encoding="utf-8", newline="") as file:
        return list(csv.DictReader(line for line in file if not line.startswith("#")))


CLOTHS = rows("filter_cloth_checks.csv")
PLAIN = [row for row in CLOTHS if row["weave"] == "plain Dutch"]
TWILLED = [row for row in CLOTHS if row["weave"] == "twilled Dutch"]


def sides(row: dict[str, str]) -> tuple[float, float, float, float]:
    pitches = (25.4 / float(row["warp_per_in"]), 25.4 / float(row["weft_per_in"]))
    return (*pitches, float(row["warp_wire_mm"]), float(row["weft_wire_mm"]))


@cache
def twilled_sphere(name: str) -> filter_cloth.SphereEstimate:
    """Our estimate to ±5 %, computed once."""
    return filter_cloth.sphere_twilled_dutch_um(*sides(next(r for r in TWILLED if r["name"] == name)), 5.0)


def test_the_table_holds_seven_plain_and_six_twilled_cloths() -> None:
    assert (len(PLAIN), len(TWILLED)) == (7, 6)


@pytest.mark.parametrize("row", CLOTHS, ids=lambda r: r["name"])
def test_mass_crimp_and_porosity_of_filter_cloth(row: dict[str, str]) -> None:
    # Basis: wire lengths worked separately; printed to three or four digits.
    weave = CODES[row["weave"]]
    mass = filter_cloth.mass_kg_m2(weave, *sides(row), 7900)
    assert mass == pytest.approx(float(row["mass_kg_m2_at_7900"]), abs=6e-4)
    crimp = filter_cloth.fine_wire_crimp(weave, *sides(row))
    assert 100 * crimp == pytest.approx(float(row["weft_crimp_pct"]), abs=0.06)
    thickness = filter_cloth.thickness_mm(weave, sides(row)[2], sides(row)[3])
    porosity = filter_cloth.porosity(mass, thickness, 7900)
    assert porosity == pytest.approx(float(row["porosity_at_T_D_plus_2d"]), abs=6e-4)


@pytest.mark.parametrize("row", PLAIN, ids=lambda r: r["name"])
def test_the_plain_dutch_sphere_is_the_closed_form_and_near_the_other_solver(row: dict[str, str]) -> None:
    # Basis: the closed form worked separately; a solver on an even grid, within its grid.
    sphere = filter_cloth.sphere_plain_dutch_um(*sides(row))
    assert sphere == pytest.approx(float(row["sphere_closed_form_um"]), abs=0.06)
    assert abs(sphere - float(row["sphere_3d_um"])) <= float(row["solver_grid_um"])


@pytest.mark.parametrize("row", [r for r in PLAIN if r["name"] in ("40x200", "80x400")], ids=lambda r: r["name"])
def test_our_solver_encloses_the_closed_form_of_plain_dutch(row: dict[str, str]) -> None:
    # The closed form is independent of the solver: same wires, no boxes.
    least, most = sphere_bounds_mm(DutchWeave(*sides(row), is_twilled=False), 0.03, 60_000)
    assert least <= float(row["sphere_closed_form_um"]) / 1000 <= most
    assert most - least <= 0.03 * (most + least)


@pytest.mark.parametrize("row", TWILLED, ids=lambda r: r["name"])
def test_the_twilled_dutch_sphere_agrees_with_the_other_solver(row: dict[str, str]) -> None:
    # Basis: a solver on an even grid; the answers may differ by its grid and by our resolution.
    found = twilled_sphere(row["name"])
    assert found.converged
    assert found.resolution_um <= 0.0501 * found.sphere_um
    allowed = float(row["solver_grid_um"]) + found.resolution_um
    assert abs(found.sphere_um - float(row["sphere_3d_um"])) <= allowed


@pytest.mark.parametrize("row", CLOTHS, ids=lambda r: r["name"])
def test_spheres_lie_near_glass_bead_ratings_recalled_from_memory(row: dict[str, str]) -> None:
    # Ratings from memory: geometry lies 0 to 40 % above them, give or take a tenth, and bounds nothing.
    low, high = map(float, re.fullmatch(r"(\d+)-(\d+)", row["rating_from_memory_um"]).groups())  # type: ignore[union-attr]
    if row["weave"] == "plain Dutch":
        sphere = filter_cloth.sphere_plain_dutch_um(*sides(row))
    else:
        sphere = twilled_sphere(row["name"]).sphere_um
    assert 0.9 * low <= sphere <= 1.4 * high


def test_a_search_cut_short_says_that_it_has_not_converged() -> None:
    found = filter_cloth.sphere_twilled_dutch_um(*sides(TWILLED[1]), resolution_pct=1.0, most_boxes=600)
    assert not found.converged
    other = float(TWILLED[1]["sphere_3d_um"])
    assert abs(found.sphere_um - other) <= found.resolution_um + float(TWILLED[1]["solver_grid_um"])


def test_a_finer_search_stays_inside_what_the_coarser_one_enclosed() -> None:
    # Property of a bracket: refining never leaves it.
    coarse = filter_cloth.sphere_twilled_dutch_um(*sides(TWILLED[1]), resolution_pct=15.0)
    fine = filter_cloth.sphere_twilled_dutch_um(*sides(TWILLED[1]), resolution_pct=3.0)
    assert abs(coarse.sphere_um - fine.sphere_um) <= coarse.resolution_um
    assert fine.resolution_um < coarse.resolution_um


def test_reverse_dutch_shows_no_sphere_and_says_why() -> None:
    sphere, reason = filter_cloth.sphere_reverse_dutch_um()
    assert sphere is None
    assert "reverse Dutch" in reason


def test_reverse_dutch_weighs_the_same_as_plain_dutch_turned() -> None:
    # Warp and weft exchanged: the same wires lie in the same cloth.
    plain = filter_cloth.mass_kg_m2("plain-dutch", *sides(PLAIN[2]), 7900)
    P, s, D, d = sides(PLAIN[2])
    assert filter_cloth.mass_kg_m2("reverse-plain-dutch", s, P, d, D, 7900) == pytest.approx(plain)
    assert filter_cloth.thickness_mm("reverse-plain-dutch", d, D) == pytest.approx(D + 2 * d)


@pytest.mark.parametrize("row", CLOTHS, ids=lambda r: r["name"])
def test_customary_filter_cloth_is_packed_within_the_range_that_the_audit_allows(row: dict[str, str]) -> None:
    # Counts and wires as commonly quoted.
    low, high = filter_cloth.CLOSE_PACKING_RANGE
    assert low <= filter_cloth.close_packing_ratio(CODES[row["weave"]], *sides(row)) <= high


def test_weft_too_thick_to_pass_between_the_warp_is_refused() -> None:
    with pytest.raises(OutOfDomainError, match="can't pass"):
        filter_cloth.sphere_plain_dutch_um(0.5, 0.2, 0.3, 0.25)
    with pytest.raises(OutOfDomainError, match="plain-dutch"):
        filter_cloth.mass_kg_m2("plain", 1, 1, 0.3, 0.3, 7900)


def check_value(quantity: str, cloth: str) -> float:
    found = [r for r in rows("check_values.csv") if r["quantity"] == quantity and r["input"].startswith(cloth)]
    return float(found[0]["value"])


@pytest.mark.parametrize("name", ["24x110", "50x250"])
def test_the_worked_plain_dutch_values_come_out_to_all_their_digits(name: str) -> None:
    row = next(r for r in PLAIN if r["name"] == name)
    sphere = filter_cloth.sphere_plain_dutch_um(*sides(row))
    assert sphere == pytest.approx(check_value("plain_dutch_sphere", name), abs=0.006)
    mass = filter_cloth.mass_kg_m2("plain-dutch", *sides(row), 7900)
    assert mass == pytest.approx(check_value("plain_dutch_mass", name), abs=6e-5)
