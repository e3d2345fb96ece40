"""A substitute with a direction: worked example of a sifter deck, 0.25/0.16 asked, exact sums.

Figures follow from w = p − d and the design's lines (T = 12.5 µm by the house rule: 5 % of 250 µm is wider than
Y = 9.9 µm of ASTM E11-17).
"""

from dataclasses import replace
from fractions import Fraction as F

import pytest

from catalog.aiming import aim, parse_need
from catalog.callout.reading import Reading, Side
from catalog.cloth import Cloth, Rating
from catalog.construction import Construction, Weave, Wires
from catalog.errors import InputError
from catalog.figures import figures
from catalog.search.candidate import Candidate
from catalog.search.judging import judge, rank
from catalog.target import Purpose
from catalog.units import Length

INCH = F(127, 5)


def mm(text: str) -> Length:
    digits = len(text.partition(".")[2])
    return Length(F(text), F(1, 2 * 10**digits), text)


def square(aperture: str, wire: str, alloy: str | None = "316L", weave: Weave | None = Weave.PLAIN) -> Reading:
    side = Side(Length(F(aperture) + F(wire)), mm(wire), mm(aperture))
    derived = ("warp.pitch_mm", "weft.pitch_mm")
    return Reading("aperture/wire", warp=side, weft=side, alloy=alloy, weave=weave, derived=derived)


def cloth(pitch: F, wire: F, alloy: str = "316L", weave: Weave = Weave.PLAIN, name: str = "x", **more: object) -> Cloth:
    wires = Wires(pitch, wire)
    made = Construction(weave, wires, wires, alloy)
    return replace(Cloth(name, name, made, figures(made, 8000.0), name, "inch", "test"), **more)  # type: ignore[arg-type]


def by_count(count: int, wire_in: str, alloy: str = "316L") -> Cloth:
    return cloth(INCH / count, F(wire_in) * INCH, alloy, name=f"{count}x{wire_in}")


def metric(aperture: str, wire: str, alloy: str = "316L") -> Cloth:
    return cloth(F(aperture) + F(wire), F(wire), alloy, name=f"{aperture}/{wire}")


ASKED = square("0.25", "0.16")


def judged(offered: Cloth, *purposes: Purpose, asked: Reading = ASKED, **options: object) -> Candidate:
    return judge(aim(asked, purposes, **options), offered)  # type: ignore[arg-type]


SIFTER = [
    # offered, Δw %, open area %, wire %, section %, retaining (harm side), passing (harm side)
    (by_count(62, "0.0065"), -2.2, 35.6, 3.2, 107, ("interchangeable", False), ("interchangeable", True)),
    (by_count(60, "0.0065"), 3.3, 37.2, 3.2, 103, ("interchangeable", True), ("interchangeable", False)),
    (metric("0.25", "0.14"), 0.0, 41.1, -12.5, 80, ("near-safe", False), ("near-safe", False)),
    (by_count(60, "0.0075"), -6.9, 30.3, 19.0, 137, ("near-safe", False), ("near-risk", True)),
    (by_count(60, "0.0045", "316"), 23.6, 53.3, -29.0, 49, ("not-equivalent", False), ("not-equivalent", False)),
    (metric("0.25", "0.16", "304"), 0.0, 37.2, 0.0, 100, ("not-equivalent", False), ("not-equivalent", False)),
]


@pytest.mark.parametrize("line", SIFTER, ids=lambda line: line[0].name)
def test_a_substitute_for_a_sifter_deck_has_a_direction(line: tuple) -> None:  # type: ignore[type-arg]
    offered, aperture, open_area, wire, section, retaining, passing = line
    for purpose, (verdict, harm_side) in ((Purpose.RETAIN, retaining), (Purpose.PASS, passing)):
        found = judged(offered, purpose)
        assert (found.verdict, found.harm_side) == (verdict, harm_side), found.findings
    deviation = {d.name: d for d in found.deviations}
    assert deviation["warp.aperture"].difference == pytest.approx(aperture, abs=0.05)
    assert deviation["open_area"].found == pytest.approx(open_area, abs=0.0501)
    assert deviation["warp.wire"].difference == pytest.approx(wire, abs=0.5)
    assert deviation["section"].found == pytest.approx(section, abs=0.6)


def test_without_a_purpose_retaining_and_passing_stand_side_by_side_and_the_worse_counts() -> None:
    found = judged(by_count(60, "0.0075"))
    assert found.by_purpose == {"retain": "near-safe", "pass": "near-risk"}
    assert found.verdict == "near-risk"


def test_the_cloth_itself_is_the_same() -> None:
    assert judged(metric("0.25", "0.16")).verdict == "same"


def test_the_alloy_gate_says_its_name() -> None:
    found = judged(metric("0.25", "0.16", "304"))
    assert any(f.rule == "alloy" and f.ok is False for f in found.findings)
    assert judged(metric("0.25", "0.16", "304"), alloy_rule="any").verdict == "same"
    assert judged(metric("0.25", "0.16", "2205")).verdict == "cannot-say"


def test_a_value_on_the_line_lies_inside() -> None:
    """0.4 − 0.3 <= 0.1 is false in floats; lines are inclusive here."""
    asked = square("0.4", "0.2")
    at_tolerance = metric("0.42", "0.2")
    assert judged(at_tolerance, Purpose.PASS, asked=asked).verdict == "interchangeable"
    beyond = metric("0.421", "0.2")
    assert judged(beyond, Purpose.RETAIN, asked=asked).verdict == "near-risk"
    assert judged(metric("0.44", "0.2"), Purpose.RETAIN, asked=asked).verdict == "near-risk"
    assert judged(metric("0.441", "0.2"), Purpose.RETAIN, asked=asked).verdict == "not-equivalent"


def test_flow_counts_open_area_against_its_own_line() -> None:
    """Lines: 95 % interchangeable, 90 % near-risk, below that not equivalent."""
    asked = square("0.5", "0.25")  # 44.44 %
    assert judged(metric("0.5", "0.26"), Purpose.FLOW, asked=asked).verdict == "interchangeable"  # 97.4 %
    assert judged(metric("0.49", "0.26"), Purpose.FLOW, asked=asked).verdict == "interchangeable"  # 96.0 %
    assert judged(metric("0.48", "0.27"), Purpose.FLOW, asked=asked).verdict == "near-risk"  # 92.2 %
    assert judged(metric("0.475", "0.29"), Purpose.FLOW, asked=asked).verdict == "not-equivalent"  # 86.8 %


def test_strength_counts_section_against_its_own_line() -> None:
    """d²/p of 0.5/0.25 is 0.08333; 0.5/0.245 gives 96.7 %, 0.5/0.24 gives 93.4 %, 0.5/0.22 gives 80.7 %."""
    asked = square("0.5", "0.25")
    assert judged(metric("0.5", "0.245"), Purpose.STRENGTH, asked=asked).verdict == "interchangeable"
    assert judged(metric("0.5", "0.24"), Purpose.STRENGTH, asked=asked).verdict == "near-risk"
    assert judged(metric("0.5", "0.22"), Purpose.STRENGTH, asked=asked).verdict == "not-equivalent"


def test_several_purposes_count_as_their_worst() -> None:
    asked = square("0.5", "0.25")
    found = judged(metric("0.5", "0.24"), Purpose.RETAIN, Purpose.STRENGTH, asked=asked)
    assert found.verdict == "near-risk"
    assert found.by_purpose["retain"] == "interchangeable"


def test_a_guard_may_not_open_further_nor_have_thinner_wire() -> None:
    asked = square("9.0", "2.0")
    assert judged(metric("9.5", "2.0"), Purpose.GUARD, asked=asked).verdict == "not-equivalent"
    assert judged(metric("8.8", "1.9"), Purpose.GUARD, asked=asked).verdict == "not-equivalent"
    assert judged(metric("8.8", "2.0"), Purpose.GUARD, asked=asked).verdict == "cannot-say"  # oversize not known
    known = judged(metric("8.8", "2.0"), Purpose.GUARD, asked=asked, oversize_mm=0.3)
    assert known.verdict == "interchangeable"
    assert judged(metric("8.0", "2.0"), Purpose.GUARD, asked=asked, oversize_mm=0.3).verdict == "near-safe"


def test_a_count_alone_leaves_the_opening_open() -> None:
    side = Side(pitch=Length(INCH / 60), by_count=True)
    asked = Reading("60 per inch", warp=side, weft=side)
    assert judged(by_count(60, "0.0065"), asked=asked).verdict == "cannot-say"


def test_an_aperture_alone_is_at_best_interchangeable() -> None:
    side = Side(aperture=mm("0.250"))
    found = judged(metric("0.25", "0.16"), Purpose.RETAIN, asked=Reading("aperture", warp=side, weft=side))
    assert found.verdict == "interchangeable"
    assert any("not asked, not judged" in f.message for f in found.findings)


def test_limits_alone_are_kept_or_not() -> None:
    asked = Reading("limits", limits={"aperture_mm": (None, 0.25), "open_area_pct": (36.0, None)})
    assert judged(metric("0.25", "0.16"), asked=asked).verdict == "interchangeable"
    assert judged(by_count(60, "0.0075"), asked=asked).verdict == "not-equivalent"
    dutch = Construction(Weave.PLAIN_DUTCH, Wires(INCH / 24, F("0.36")), Wires(INCH / 110, F("0.26")), "316L")
    filter_cloth = Cloth("d", "24 x 110", dutch, figures(dutch, 8000.0), "24 x 110", "inch", "test")
    assert judged(filter_cloth, asked=asked).verdict == "not-equivalent"


def test_rectangular_cloth_is_judged_on_its_worse_direction_unless_spheres_meet_it() -> None:
    warp, weft = Side(Length(F(2)), mm("1.0"), mm("1.00")), Side(Length(F(5)), mm("1.0"), mm("4.00"))
    asked = Reading("slot", warp=warp, weft=weft, alloy="316L")
    made = Construction(Weave.PLAIN, Wires(F(2), F(1)), Wires(F("5.3"), F(1)), "316L")
    longer = Cloth("s", "slot", made, figures(made, 8000.0), "slot", "metric", "test")
    assert judged(longer, Purpose.RETAIN, asked=asked).verdict == "near-risk"  # 4.3 is 7.5 % longer, T is 5 %
    assert judged(longer, Purpose.RETAIN, asked=asked, particle_is_sphere=True).verdict == "interchangeable"


def test_filter_cloth_is_compared_with_filter_cloth_only() -> None:
    warp = Side(pitch=Length(INCH / 24), wire=Length(F("0.36"), F("0.005"), "0.36"), by_count=True)
    weft = Side(pitch=Length(INCH / 110), wire=Length(F("0.26"), F("0.005"), "0.26"), by_count=True)
    asked = Reading(
        "Dutch", weave=Weave.PLAIN_DUTCH, warp=warp, weft=weft, rating=Rating(120, "absolute", "glass bead")
    )
    made = Construction(Weave.PLAIN_DUTCH, Wires(INCH / 24, F("0.36")), Wires(INCH / 110, F("0.26")), "316L")
    there = Cloth("d", "24 x 110", made, figures(made, 8000.0), "24 x 110", "inch", "test")
    rated = replace(there, rating=Rating(120, "absolute", "glass bead"))
    assert judged(rated, asked=asked).verdict == "same"
    assert judged(there, asked=asked).verdict == "cannot-say"
    assert judged(replace(there, rating=Rating(150, "absolute", "glass bead")), asked=asked).verdict == "not-equivalent"
    assert judged(replace(there, rating=Rating(120, "nominal", "glass bead")), asked=asked).verdict == "cannot-say"
    assert judged(metric("0.25", "0.16"), asked=asked).verdict == "not-equivalent"
    assert rated.figures.open_area_pct is None
    assert rated.figures.warp_aperture_mm is None


def test_candidates_stand_best_first_then_by_penalty_then_by_id() -> None:
    lines = [judged(offered, Purpose.RETAIN) for offered, *_ in SIFTER]
    assert [c.cloth.name for c in sorted(lines, key=rank)][:4] == ["62x0.0065", "60x0.0065", "0.25/0.14", "60x0.0075"]


def test_a_tolerance_is_named_for_what_it_is() -> None:
    assert aim(ASKED).tolerance is not None
    house, stated, edition = aim(ASKED), aim(ASKED, stated_tolerance="3"), aim(ASKED, stated_tolerance="e11")
    assert house.tolerance
    assert stated.tolerance
    assert edition.tolerance
    assert house.tolerance.warp_mm == pytest.approx(0.0125)
    assert "house rule" in house.tolerance.source
    assert stated.tolerance.warp_mm == pytest.approx(0.0075)
    assert edition.tolerance.warp_mm == pytest.approx(0.0099, abs=5e-5)  # Y at 250 µm, ASTM E11-17
    assert "E11" in edition.tolerance.source


@pytest.mark.parametrize(
    ("text", "pieces", "size"),
    [
        ("4 pcs 1200x2400 mm", 4, (1200, 2400, None)),
        ("12 discs 350 mm", 12, (None, None, 350)),
        ("2 rolls 48 in x 50 ft", 2, (pytest.approx(1219.2), pytest.approx(15240), None)),
        ("1.2 x 2,4 m", 1, (1200, 2400, None)),
    ],
)
def test_a_need_is_read_with_its_unit(text: str, pieces: int, size: tuple) -> None:  # type: ignore[type-arg]
    need = parse_need(text)
    assert need.pieces == pieces
    assert (need.width_mm, need.length_mm, need.diameter_mm) == size


@pytest.mark.parametrize("text", ["1200x2400", "some", "0 pcs 1200x2400 mm", "350 mm"])
def test_a_need_without_unit_or_sense_is_refused(text: str) -> None:
    with pytest.raises(InputError):
        parse_need(text)


def test_a_guard_asked_by_a_maximum_is_held_to_its_largest_opening() -> None:
    asked = Reading("limits", limits={"aperture_mm": (None, 9.0)})
    assert judged(metric("8.8", "2.0"), Purpose.GUARD, asked=asked).verdict == "cannot-say"
    assert judged(metric("8.8", "2.0"), Purpose.GUARD, asked=asked, oversize_mm=0.3).verdict == "not-equivalent"
    assert judged(metric("8.5", "2.0"), Purpose.GUARD, asked=asked, oversize_mm=0.3).verdict == "interchangeable"


def test_a_guard_that_is_not_met_says_why() -> None:
    found = judged(metric("9.0", "1.9"), Purpose.GUARD, asked=square("9.0", "2.0"), oversize_mm=0.3)
    assert found.verdict == "not-equivalent"
    assert any(f.rule == "guard" and f.ok is False for f in found.findings)


def test_test_sieve_cloth_is_not_industrial_cloth_of_the_same_figures() -> None:
    asked = replace(ASKED, standard="ISO 3310-1")
    assert judged(metric("0.25", "0.16"), asked=asked).verdict == "cannot-say"
    certified = replace(metric("0.25", "0.16"), standard="ISO 3310-1")
    assert judged(certified, asked=asked).verdict == "same"


def test_a_crimp_that_was_asked_and_is_not_on_record_is_a_question() -> None:
    assert judged(metric("0.25", "0.16"), asked=replace(ASKED, crimp="lock crimp")).verdict == "cannot-say"


def test_a_stated_open_area_counts_where_no_wire_was_asked() -> None:
    """0.25/0.16 opens 37.18 %; 45 % was asked, 7.8 points more."""
    side = Side(aperture=mm("0.250"))
    asked = Reading("aperture", warp=side, weft=side, open_area_pct=45.0)
    assert judged(metric("0.25", "0.16"), Purpose.RETAIN, asked=asked).verdict == "near-safe"


def test_a_tolerance_of_the_users_replaces_the_drawings() -> None:
    asked = replace(ASKED, limits={"aperture_mm": (0.2475, 0.2525)})
    tight, loose = (
        judged(by_count(62, "0.0065"), Purpose.RETAIN, asked=asked, stated_tolerance=t) for t in (None, "3")
    )
    assert (tight.verdict, loose.verdict) == ("near-safe", "interchangeable")


def test_a_sieve_edition_is_not_quoted_for_cloth_outside_its_scope() -> None:
    with pytest.raises(InputError):
        aim(replace(ASKED, crimp="lock crimp"), stated_tolerance="e11")
    with pytest.raises(InputError):
        aim(replace(ASKED, finish="galvanised after weaving"), stated_tolerance="iso3310")
