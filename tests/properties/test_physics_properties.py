"""What holds for every cloth, whatever its figures."""

from math import isclose, pi, sqrt

import pytest
from hypothesis import assume, given, settings
from hypothesis import strategies as st

from catalog.physics import crimp, filter_cloth, flow, geometry, mass, sieving
from catalog.physics.dutch_wires import DutchWeave
from catalog.physics.flow_bed import square_bed
from catalog.physics.fluid_properties import air, water
from catalog.physics.widest_path import sphere_bounds_mm

PITCH = st.floats(0.02, 50.0)
SHARE = st.floats(0.05, 0.57)
"""Wire over pitch that plain weave allows, one for all."""
SCALE = st.floats(0.01, 100.0)
DENSITY = st.floats(1000.0, 20000.0)


@given(PITCH, SHARE, st.floats(1.001, 1.5))
def test_open_area_falls_with_wire(pitch: float, share: float, thicker: float) -> None:
    thin, thick = share * pitch, share * pitch * thicker
    assume(thick < pitch)
    opens = geometry.open_area_pct(pitch - thin, pitch - thin, pitch, pitch)
    assert geometry.open_area_pct(pitch - thick, pitch - thick, pitch, pitch) < opens


@given(PITCH, PITCH, SHARE, SHARE, SCALE)
def test_scaling_all_lengths_leaves_fractions(p1: float, p2: float, s1: float, s2: float, k: float) -> None:
    d1, d2 = s1 * p1, s2 * p2
    opens = geometry.open_area_pct(p1 - d1, p2 - d2, p1, p2)
    assert geometry.open_area_pct(k * (p1 - d1), k * (p2 - d2), k * p1, k * p2) == pytest.approx(opens, rel=1e-9)
    jams = geometry.cannot_be_woven(p1, p2, d1, d2)
    assume(jams == geometry.cannot_be_woven(p1 * (1 + 1e-9), p2 * (1 + 1e-9), d1, d2))
    assert geometry.cannot_be_woven(k * p1, k * p2, k * d1, k * d2) == jams
    if not jams:
        scaled = crimp.crimps(k * p1, k * p2, k * d1, k * d2)
        assert scaled == pytest.approx(crimp.crimps(p1, p2, d1, d2), rel=1e-5, abs=1e-7)
    bed, larger = square_bed(p1, p2, d1, d2), square_bed(k * p1, k * p2, k * d1, k * d2)
    assert larger.porosity == pytest.approx(bed.porosity, rel=1e-9)


@given(PITCH, PITCH, SHARE, SHARE, DENSITY, st.booleans())
def test_turning_a_cloth_changes_nothing_but_which_side_is_which(
    p1: float, p2: float, s1: float, s2: float, rho: float, twilled: bool
) -> None:
    d1, d2 = s1 * p1, s2 * p2
    assert mass.mass_nominal_kg_m2(p1, p2, d1, d2, rho) == pytest.approx(mass.mass_nominal_kg_m2(p2, p1, d2, d1, rho))
    one = mass.mass_geometric_kg_m2(p1, p2, d1, d2, rho, twilled)
    other = mass.mass_geometric_kg_m2(p2, p1, d2, d1, rho, twilled)
    assert (one is None) == (other is None)
    if one is not None:
        assert one == pytest.approx(other, rel=1e-6)
    opens = geometry.open_area_pct(p1 - d1, p2 - d2, p1, p2)
    assert geometry.open_area_pct(p2 - d2, p1 - d1, p2, p1) == pytest.approx(opens)
    assert geometry.thickness_most_mm(d1, d2) == geometry.thickness_most_mm(d2, d1)
    shapes = {geometry.opening_shape(p1 - d1, p2 - d2), geometry.opening_shape(p2 - d2, p1 - d1)}
    assert shapes in ({"square"}, {"oblong", "broad"})


@given(PITCH, SHARE, DENSITY)
def test_turning_a_square_cloth_changes_nothing_at_all(p: float, share: float, rho: float) -> None:
    d = share * p
    warp, weft = crimp.crimps(p, p, d, d)
    assert isclose(warp, weft, rel_tol=1e-9, abs_tol=1e-12)


@given(st.floats(0.1, 10.0), st.floats(0.0, 1.0), st.floats(0.0, 1.0))
def test_a_crimped_wire_is_longer_than_its_chord_and_shorter_than_the_jammed_one(
    wires: float, rise: float, room: float
) -> None:
    height = wires * rise
    jam = sqrt(wires**2 - (wires - height) ** 2)
    pitch = max(jam, 1e-3) * (1.0 + 20.0 * room)
    found = crimp.arc_length_mm(pitch, wires, height)
    assert found >= sqrt(pitch**2 + height**2) * (1 - 1e-9)
    jammed_excess = crimp.arc_length_mm(jam, wires, height) - jam if jam > 0 else 0.0
    assert found - pitch <= jammed_excess + 1e-9 * (pitch + wires)
    assert crimp.weave_angle_rad(pitch, wires, height) <= pi / 2 + 1e-9


@given(PITCH, SHARE, st.floats(1.0, 1.7), DENSITY)
def test_straight_wire_weighs_least_and_twill_less_than_plain(p: float, s: float, other: float, rho: float) -> None:
    sides = (p, p * other, s * p, s * p)
    straight = mass.mass_straight_kg_m2(*sides, rho)
    plain, twill = mass.mass_geometric_kg_m2(*sides, rho), mass.mass_geometric_kg_m2(*sides, rho, True)
    assert plain is not None
    assert twill is not None
    assert straight < twill < plain


@given(st.floats(0.05, 3.0), st.floats(0.05, 0.6), st.floats(0.05, 0.39), st.floats(0.4, 1.5))
def test_a_plain_dutch_sphere_never_exceeds_the_gap_between_warp_wires(
    P: float, warp: float, weft: float, packing: float
) -> None:
    D, d = warp * P, weft * P
    sphere = filter_cloth.sphere_plain_dutch_um(P, packing * d, D, d)
    assert 0.0 <= sphere <= 1000 * (P - D) * (1 + 1e-12)


@settings(max_examples=5, deadline=None)
@given(st.floats(0.3, 0.6), st.floats(0.15, 0.35), st.floats(0.9, 1.3))
def test_a_twilled_dutch_sphere_never_exceeds_the_gap_between_warp_wires(
    warp: float, weft: float, packing: float
) -> None:
    least, most = sphere_bounds_mm(DutchWeave(1.0, packing * weft / 2, warp, weft, is_twilled=True), 0.15, 20_000)
    assert 0.0 <= least <= most
    assert least <= 1.0 - warp


@settings(max_examples=3, deadline=None)
@given(st.floats(0.02, 20.0))
def test_the_solver_knows_no_size(k: float) -> None:
    here = sphere_bounds_mm(DutchWeave(1.0, 0.12, 0.4, 0.25, is_twilled=True), 0.12, 20_000)
    there = sphere_bounds_mm(DutchWeave(k, 0.12 * k, 0.4 * k, 0.25 * k, is_twilled=True), 0.12, 20_000)
    assert here[0] <= there[1] / k * (1 + 1e-9)
    assert there[0] / k <= here[1] * (1 + 1e-9)


@given(st.floats(0.02, 20.0), st.floats(0.1, 0.55), st.floats(1e-3, 30.0), st.floats(1.001, 3.0), st.booleans())
def test_pressure_drop_rises_with_velocity(w: float, share: float, u: float, faster: float, wet: bool) -> None:
    p = w / (1 - share)
    bed, fluid = square_bed(p, p, p - w, p - w), water(20) if wet else air(20)
    slow, fast = flow.flow_loss(bed, u, fluid), flow.flow_loss(bed, u * faster, fluid)
    assert fast.pressure_drop_pa > slow.pressure_drop_pa
    assert (slow.uncertainty_pct is None) == (not slow.in_range)


@given(PITCH, SHARE, st.floats(0.001, 1.2), st.integers(1, 50))
def test_chances_to_pass_are_chances_and_grow_with_trying(p: float, share: float, size: float, tries: int) -> None:
    w = p * (1 - share)
    once = sieving.passing_probability(size * w, w, w, p, p)
    often = sieving.passing_probability(size * w, w, w, p, p, tries)
    assert 0.0 <= once <= often + 1e-12 <= 1.0 + 1e-12


@given(st.floats(20.0, 125_000.0), st.floats(1.0001, 2.0), st.sampled_from(sorted(sieving.EDITIONS)))
def test_tolerances_grow_with_the_opening_and_shrink_against_it(w: float, more: float, edition: str) -> None:
    assume(w * more <= 125_000.0)
    for rule in (sieving.average_tolerance_um, sieving.largest_oversize_um):
        small, large = rule(w, edition), rule(w * more, edition)
        assert small < large < small * more
