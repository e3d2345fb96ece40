"""Naming a roll. Worked example: 47 spaces in 20 mm, wire 0.165 ± 0.005 mm, against four lines.

The figures are exact sums: 60 per inch is 0.42333 mm, 62 per inch 0.40968 mm, 0.25/0.16 is 0.41 mm; 20/47 is
0.42553 ± 0.00453 mm.
"""

from fractions import Fraction as F

import pytest

from catalog.cloth import Cloth
from catalog.construction import Construction, Weave, Wires
from catalog.errors import InputError
from catalog.figures import figures
from catalog.search.evidence import evidence_of
from catalog.search.identify import Identification, identify
from catalog.search.list_reader import ListReader
from catalog.search.reader import Filters
from catalog.search.shortlist import ranges_of, shortlist

INCH = F(127, 5)


def cloth(
    name: str,
    pitch: F,
    wire: F,
    alloy: str | None = "316L",
    weft: Wires | None = None,
    weave: Weave = Weave.PLAIN,
    finish: str | None = None,
) -> Cloth:
    made = Construction(weave, Wires(pitch, wire), weft or Wires(pitch, wire), alloy, None, finish)
    return Cloth(name, name, made, figures(made, 7950.0 if alloy else None), name, "inch", "test")


def inch(count: int, wire: str, alloy: str = "316L", finish: str | None = None) -> Cloth:
    return cloth(f"{count} x {wire}", INCH / count, F(wire) * INCH, alloy, finish=finish)


FOUR = [
    inch(60, "0.0065"),
    inch(60, "0.0075"),
    cloth("0.25/0.16", F("0.41"), F("0.16")),
    inch(62, "0.0065"),
]


def misfits(result: Identification) -> dict[str, dict[str, float | None]]:
    return {c.cloth.id: dict(c.misfit) for c in result.candidates}


def test_the_first_line_fits_and_each_other_is_out_by_one_figure() -> None:
    """Worked example: 0.5 and 0; the second out by wire (5), the others by pitch (3.4, 3.5)."""
    result = identify(FOUR, evidence_of(count="47 in 20 mm", wire="0.165±0.005 mm"))
    assert [c.cloth.id for c in result.survivors] == ["60 x 0.0065"]
    found = misfits(result)
    assert found["60 x 0.0065"] == {"pitch": pytest.approx(0.5, abs=0.05), "wire": pytest.approx(0.0, abs=0.05)}
    assert found["60 x 0.0075"]["wire"] == pytest.approx(5, abs=0.2)
    assert found["0.25/0.16"]["pitch"] == pytest.approx(3.4, abs=0.05)
    assert found["62 x 0.0065"]["pitch"] == pytest.approx(3.5, abs=0.05)
    out = {c.cloth.id: c.ruled_out_by for c in result.candidates}
    assert out == {"60 x 0.0065": None, "60 x 0.0075": "wire", "0.25/0.16": "pitch", "62 x 0.0065": "pitch"}
    assert result.candidates[0].odds == pytest.approx(1.0)


def test_118_in_50_mm_puts_the_two_neighbours_at_7_6_and_7_8() -> None:
    """Worked example; the longer count is what is proposed next, with what it would show."""
    found = misfits(identify(FOUR, evidence_of(count="118 in 50 mm", wire="0.165±0.005 mm")))
    assert found["0.25/0.16"]["pitch"] == pytest.approx(7.6, abs=0.05)
    assert found["62 x 0.0065"]["pitch"] == pytest.approx(7.8, abs=0.05)
    step = identify(FOUR, evidence_of(count="47 in 20 mm", wire="0.165±0.005 mm")).next
    assert step is not None
    assert (step.measure, step.over_mm) == ("count", 50)
    assert "118 in 50 mm" in step.why
    assert "7.6" in step.why
    assert "7.8" in step.why


def test_47_spaces_are_48_wires() -> None:
    result = identify(FOUR, evidence_of(count="47 in 20 mm"))
    assert any("48 wires" in line for line in result.warnings)


def test_wires_taken_for_spaces_are_suspected_where_one_fewer_would_fit() -> None:
    result = identify(FOUR, evidence_of(count="48 in 20 mm", wire="0.1905±0.002 mm"))
    assert not result.survivors
    assert any("47 spaces" in line and "60 x 0.0075" in line for line in result.warnings)


def test_two_of_one_count_are_told_apart_by_their_wire_at_a_resolution_that_does_it() -> None:
    """The wires differ by .001 in = 0.0254 mm; ± 0.01 leaves 0.0054 between the intervals, ± 0.02 none."""
    result = identify(FOUR[:2], evidence_of(count="47 in 20 mm"))
    assert len(result.survivors) == 2
    assert result.next is not None
    assert (result.next.measure, result.next.resolution_mm) == ("wire", 0.01)


def test_two_of_one_wire_are_told_apart_by_a_count_long_enough() -> None:
    """60 and 62 per inch differ by a whole space from 12.7 mm on, so 10 mm won't do and 20 mm will."""
    result = identify([FOUR[0], FOUR[3]], evidence_of(wire="0.165±0.005 mm"))
    assert len(result.survivors) == 2
    assert result.next is not None
    assert (result.next.measure, result.next.over_mm) == ("count", 20)


def test_cloths_that_differ_in_alloy_only_send_for_a_certificate_where_a_magnet_cannot_tell() -> None:
    count = evidence_of(count="60 in 1 in")
    steel = identify([inch(60, "0.0075", "304"), cloth("other", INCH / 60, F("0.0075") * INCH, "430")], count)
    brass = identify([inch(60, "0.0075", "CuZn20"), cloth("other", INCH / 60, F("0.0075") * INCH, "CuZn37")], count)
    assert steel.next is not None
    assert brass.next is not None
    assert brass.next.measure == "alloy"
    assert steel.next.measure == "alloy"  # 304 may pull as well, so that a magnet can't tell


def test_a_magnet_parts_brass_from_carbon_steel() -> None:
    pair = [cloth("brass", INCH / 16, F("0.02") * INCH, "CuZn37"), cloth("steel", INCH / 16, F("0.02") * INCH, "CS")]
    first = identify(pair, evidence_of(count="32 in 2 in"))
    assert first.next is not None
    assert first.next.measure == "magnet"
    pulled = identify(pair, evidence_of(count="32 in 2 in", magnetic="yes"))
    assert [c.cloth.id for c in pulled.survivors] == ["steel"]
    assert next(c.ruled_out_by for c in pulled.candidates if c.cloth.id == "brass") == "magnet"


def test_a_pull_does_not_rule_out_drawn_austenitic_wire() -> None:
    result = identify(FOUR[:1], evidence_of(count="47 in 20 mm", magnetic="yes"))
    assert result.survivors
    assert any("doesn't rule it out" in line for line in result.warnings)


def test_a_micrometer_on_a_knuckle_reads_both_wires() -> None:
    """0.0065 in twice is 0.330 mm."""
    result = identify(FOUR, evidence_of(count="47 in 20 mm", wire="0.330±0.005 mm"))
    assert not result.survivors
    assert any("knuckle" in line and "60 x 0.0065" in line for line in result.warnings)


def test_a_wire_too_thick_to_be_woven_at_its_pitch_is_a_knuckle_too() -> None:
    """d/p of 0.635 is past the jam of plain weave at 0.577 (Peirce 1937)."""
    result = identify(FOUR, evidence_of(count="47 in 20 mm", wire="0.270±0.002 mm"))
    assert any("can't be woven plain" in line for line in result.warnings)


def test_zinc_counts_as_wire() -> None:
    """0.05 mm of zinc a side on .028 in wire: 0.811 mm under the micrometer."""
    bare = inch(8, "0.028", "CS")
    result = identify([bare], evidence_of(count="16 in 2 in", wire="0.811±0.005 mm"))
    assert not result.survivors
    assert any("zinc" in line for line in result.warnings)
    coated = inch(8, "0.028", "GALV", "galvanised before weaving")
    fitting = identify([coated], evidence_of(count="16 in 2 in", wire="0.711±0.005 mm"))
    assert any("Zinc counts as wire" in line for line in fitting.warnings)


def test_stainless_is_not_suspected_of_zinc() -> None:
    result = identify([inch(8, "0.028", "304")], evidence_of(count="16 in 2 in", wire="0.811±0.005 mm"))
    assert not any("inc" in line and "galvanised" in line for line in result.warnings)


def test_a_count_too_fine_for_the_glass_is_said() -> None:
    result = identify([inch(325, "0.0014")], evidence_of(count="64 in 5 mm"))
    assert any("too fine" in line for line in result.warnings)
    assert not any("too fine" in line for line in identify(FOUR, evidence_of(count="47 in 20 mm")).warnings)


def test_a_stated_weave_narrows_what_is_looked_at() -> None:
    twilled = cloth("twilled", INCH / 60, F("0.0065") * INCH, weave=Weave.TWILLED)
    result = identify([*FOUR, twilled], evidence_of(count="47 in 20 mm", weave=Weave.TWILLED))
    assert [c.cloth.id for c in result.candidates] == ["twilled"]
    open_ = identify([FOUR[0], twilled], evidence_of(count="47 in 20 mm", wire="0.165±0.005 mm"))
    assert open_.next is not None
    assert open_.next.measure == "weave"


def test_rectangular_cloth_is_found_whichever_way_the_remnant_lies() -> None:
    oblong = cloth("16 x 18", INCH / 16, F("0.011") * INCH, weft=Wires(INCH / 18, F("0.011") * INCH))
    upright = identify([oblong, *FOUR], evidence_of(count="32 in 2 in", count_weft="36 in 2 in"))
    across = identify([oblong, *FOUR], evidence_of(count="36 in 2 in", count_weft="32 in 2 in"))
    assert [(c.cloth.id, c.turned) for c in upright.survivors] == [("16 x 18", False)]
    assert [(c.cloth.id, c.turned) for c in across.survivors] == [("16 x 18", True)]


def test_filter_cloth_has_no_aperture_that_could_have_been_measured() -> None:
    dutch = cloth(
        "24 x 110", INCH / 24, F("0.015") * INCH, "304", Wires(INCH / 110, F("0.01") * INCH), Weave.PLAIN_DUTCH
    )
    result = identify([dutch, *FOUR], evidence_of(aperture="0.258±0.005 mm"))
    assert next(c.ruled_out_by for c in result.candidates if c.cloth is dutch) == "aperture"
    by_count = identify([dutch, *FOUR], evidence_of(count="48 in 2 in", count_weft="110 in 1 in"))
    assert [c.cloth.id for c in by_count.survivors] == ["24 x 110"]


def test_a_thickness_anywhere_from_flush_to_one_set_straight_fits() -> None:
    """d1 + d2 = 0.330 mm, and half as much again where one set lies straight: 0.495 mm (derived)."""
    for thickness in ("0.330±0.005 mm", "0.40±0.005 mm", "0.495±0.005 mm"):
        assert identify(FOUR[:1], evidence_of(thickness=thickness)).survivors
    for thickness in ("0.31±0.005 mm", "0.51±0.005 mm"):
        assert not identify(FOUR[:1], evidence_of(thickness=thickness)).survivors


def test_a_swatch_weighs_in_and_an_unknown_density_rules_nothing_out() -> None:
    """ISO 9044, from memory: 7950 · 0.1651²/(618.1 · 0.42333) = 0.828 kg/m²."""
    heavier = identify(FOUR[:2], evidence_of(count="47 in 20 mm", swatch="8.28 g / 100 cm2"))
    assert [c.cloth.id for c in heavier.survivors] == ["60 x 0.0065"]
    nameless = cloth("nameless", INCH / 60, F("0.0065") * INCH, None)
    result = identify([nameless], evidence_of(count="47 in 20 mm", swatch="8.28 g / 100 cm2"))
    assert [c.cloth.id for c in result.survivors] == ["nameless"]
    assert result.candidates[0].misfit["mass"] is None


def test_a_roll_made_off_its_nominal_wants_a_stated_spread() -> None:
    """46 in 20 mm is 0.4348 ± 0.0047 mm: 2.4 times its limit from 60 per inch."""
    exact = identify(FOUR, evidence_of(count="46 in 20 mm", wire="0.165±0.005 mm"))
    loose = identify(FOUR, evidence_of(count="46 in 20 mm", wire="0.165±0.005 mm", made_within_pct=3.0))
    assert not exact.survivors
    assert any("No cloth fits" in line for line in exact.warnings)
    assert [c.cloth.id for c in loose.survivors] == ["60 x 0.0065"]


def test_one_cloth_listed_twice_is_told_as_such() -> None:
    twin = cloth("twin", INCH / 60, F("0.0065") * INCH)
    result = identify([FOUR[0], twin], evidence_of(count="47 in 20 mm"))
    assert [c.odds for c in result.survivors] == [pytest.approx(0.5), pytest.approx(0.5)]
    assert result.next is not None
    assert result.next.measure == "none"
    assert "listed more than once" in result.next.why


def test_nothing_measured_is_refused() -> None:
    with pytest.raises(InputError, match="Nothing was measured"):
        identify(FOUR, evidence_of())


def test_an_empty_catalogue_names_nothing() -> None:
    result = identify([], evidence_of(count="47 in 20 mm"))
    assert result.candidates == ()
    assert result.next is None


def test_the_shortlist_of_a_large_store_leaves_out_nothing_that_could_be_named(monkeypatch: pytest.MonkeyPatch) -> None:
    monkeypatch.setattr("catalog.search.shortlist.SMALL", 0)
    monkeypatch.setattr("catalog.search.shortlist.ENOUGH", 2)
    far = [inch(count, "0.0065") for count in range(20, 56)]
    evidence = evidence_of(count="47 in 20 mm", wire="0.165±0.005 mm")
    short = shortlist(ListReader([*FOUR, *far]), evidence, Filters(alloys=frozenset({"316L"})))
    assert {c.id for c in FOUR} <= {c.id for c in short}
    assert len(short) < len(far)
    low, high = ranges_of(evidence)["warp_wire_mm"]
    assert low is not None
    assert low < 0.0825 < 0.165 < (high or 0)
