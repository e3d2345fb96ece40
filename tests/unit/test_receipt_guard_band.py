"""A roll measured against an order. Worked example: 60 × .0065 in delivered for 0.25/0.16.

118 in 50 mm and wire ± 0.005 give w = 258.7 ± 5.4 µm: 8.7 + 5.4 = 14.1 > 12.5, not proven; wire ± 0.002 gives ± 2.9:
11.6 ≤ 12.5, conforms. T is 5 % of 250 µm. Rectangular limit: JCGM 100:2008 (GUM), 4.3.7.
"""

from dataclasses import replace
from fractions import Fraction as F

import pytest
from hypothesis import given
from hypothesis import strategies as st

from catalog.aiming import aim
from catalog.callout.reading import Reading, Side
from catalog.construction import Weave
from catalog.errors import InputError
from catalog.report.identify_document import identify_document, receipt_document
from catalog.search.bench_figures import BenchFigure, Part
from catalog.search.evidence import Evidence, evidence_of
from catalog.search.measured import Scalar
from catalog.search.outcome import Outcome
from catalog.search.receipt import Receipt, about, check_receipt
from catalog.target import Target
from catalog.units import Length


def side(aperture: str, wire: str | None = None) -> Side:
    w = F(aperture)
    d = None if wire is None else F(wire)
    return Side(None if d is None else Length(w + d), None if d is None else Length(d), Length(w))


def ordered(warp: Side, weft: Side | None = None, alloy: str | None = "316L") -> Target:
    return aim(Reading("as ordered", weave=Weave.PLAIN, warp=warp, weft=weft or warp, alloy=alloy))


ORDER = ordered(side("0.25", "0.16"))


def received(wire: str, target: Target = ORDER, count: str = "118 in 50 mm") -> Receipt:
    return check_receipt(target, evidence_of(count=count, wire=wire))


def test_a_micrometer_good_to_5_um_proves_nothing_here() -> None:
    receipt = received("0.165±0.005 mm")
    aperture = receipt.checks[0]
    assert receipt.outcome is Outcome.NOT_PROVEN
    assert aperture.figure.value == pytest.approx(0.2587, abs=5e-5)
    assert aperture.figure.expanded == pytest.approx(0.0054, abs=5e-5)
    assert aperture.allowed == pytest.approx(0.0125)
    assert aperture.reach == pytest.approx(0.0141, abs=5e-5)
    assert "8.7 + 5.4 = 14.1 > 12.5" in aperture.message


def test_the_micrometer_is_the_weak_link_and_a_better_one_would_decide() -> None:
    """√((12.5 − 8.73)² − 2.07²) leaves 3.15 µm for the wire: ± 0.003 mm will do."""
    aperture = received("0.165±0.005 mm").checks[0]
    assert aperture.figure.weak_link.quantity == "wire"
    assert aperture.better is not None
    assert [(s.measure, s.resolution_mm) for s in aperture.better.steps] == [("wire", 0.003)]
    assert "weak link is the wire" in aperture.message
    assert "not the count" in aperture.message


def test_an_optical_measurement_good_to_2_um_proves_it_conforms() -> None:
    receipt = received("0.165±0.002 mm")
    assert receipt.outcome is Outcome.CONFORMS
    assert receipt.checks[0].figure.expanded == pytest.approx(0.0029, abs=5e-5)
    assert "8.7 + 2.9 = 11.6 ≤ 12.5" in receipt.checks[0].message


def test_the_promised_improvement_keeps_its_promise() -> None:
    better = received("0.165±0.005 mm").checks[0].better
    assert better is not None
    again = received(f"0.165±{better.steps[0].resolution_mm} mm").checks[0]
    assert again.outcome is Outcome.CONFORMS
    assert again.figure.expanded == pytest.approx(better.expanded or 0)


def test_where_the_count_is_the_weak_link_a_longer_one_is_asked_for() -> None:
    """47 in 20 mm: ± 5.2 µm from the count beside ± 2 from the wire; 10.5 off leaves 2.0, so both must get better."""
    aperture = received("0.165±0.002 mm", count="47 in 20 mm").checks[0]
    assert aperture.figure.weak_link.quantity == "count"
    assert aperture.better is not None
    assert "count" in {step.measure for step in aperture.better.steps}


def test_a_thin_wire_fails_because_the_opening_is_far_too_large() -> None:
    receipt = received("0.14±0.005 mm")
    assert receipt.outcome is Outcome.FAILS
    assert receipt.checks[0].outcome is Outcome.FAILS
    assert receipt.checks[0].better is None


def test_a_direct_aperture_counts_where_it_is_the_more_certain() -> None:
    evidence = evidence_of(count="118 in 50 mm", wire="0.165±0.005 mm", aperture="0.2585±0.002 mm")
    receipt = check_receipt(ORDER, evidence)
    assert [part.quantity for part in receipt.checks[0].figure.parts] == ["aperture"]
    assert receipt.outcome is Outcome.CONFORMS


def test_a_value_on_the_limit_is_beyond_deciding() -> None:
    check = check_receipt(ORDER, evidence_of(aperture="0.2625±0.002 mm")).checks[0]
    assert check.outcome is Outcome.NOT_PROVEN
    assert check.better is not None
    assert check.better.steps == ()


def test_a_roll_of_the_wrong_wire_fails_though_its_opening_is_right() -> None:
    """0.12 mm for 0.16 is 25 % off; the house allows 10 %."""
    target = ordered(side("0.25", "0.16"))
    receipt = check_receipt(target, evidence_of(aperture="0.25±0.002 mm", wire="0.12±0.002 mm"))
    assert receipt.outcome is Outcome.FAILS
    assert [c.outcome for c in receipt.checks] == [Outcome.CONFORMS, Outcome.FAILS]


def test_rectangular_cloth_measured_one_way_is_not_proven() -> None:
    target = ordered(side("3", "1"), side("12", "1"))
    one = check_receipt(target, evidence_of(aperture="3.00±0.02 mm"))
    both = check_receipt(target, evidence_of(aperture="3.00±0.02 mm", aperture_weft="12.0±0.05 mm"))
    assert one.outcome is Outcome.NOT_PROVEN
    assert any("weft" in note for note in one.notes)
    assert both.outcome is Outcome.CONFORMS


def test_limits_are_judged_with_the_same_guard_band() -> None:
    """60 × .0065 opens (0.25823/0.42333)² = 37.2 % (exact sum)."""
    bounds = replace(
        ordered(side("0.25")), tolerance=None, limits={"aperture_mm": (None, 0.27), "open_area_pct": (40, None)}
    )
    receipt = check_receipt(bounds, evidence_of(count="118 in 50 mm", wire="0.165±0.002 mm"))
    found = {check.figure.quantity: check for check in receipt.checks}
    assert found["warp.aperture"].outcome is Outcome.CONFORMS
    assert found["open_area"].outcome is Outcome.FAILS
    assert found["open_area"].figure.value == pytest.approx(37.2, abs=0.2)


def test_open_area_is_as_uncertain_as_shifting_each_measurement_says() -> None:
    """Central differences of 100·(1 − d/p)² over half of each ±, root of the sum of squares (GUM, 5.1.3, note 2)."""
    evidence = evidence_of(count="118 in 50 mm", wire="0.165±0.005 mm")
    assert evidence.count is not None
    p, d = 50 / 118, 0.165
    du, pu = 0.005, evidence.count.pitch_expanded_mm

    def area(pitch: float, wire: float) -> float:
        return 100 * (1 - wire / pitch) ** 2

    by_wire = (area(p, d + du / 2) - area(p, d - du / 2)) ** 2
    by_count = (area(p + pu / 2, d) - area(p - pu / 2, d)) ** 2
    bounds = replace(ordered(side("0.25")), tolerance=None, limits={"open_area_pct": (40, None)})
    figure = check_receipt(bounds, evidence).checks[0].figure
    assert figure.expanded == pytest.approx((by_wire + by_count) ** 0.5, rel=1e-3)


def test_a_magnet_that_contradicts_the_alloy_fails_and_one_that_cannot_tell_is_said() -> None:
    brass = check_receipt(
        ordered(side("0.25", "0.16"), alloy="CuZn37"), evidence_of(aperture="0.25 mm", magnetic="yes")
    )
    steel = check_receipt(ORDER, evidence_of(aperture="0.25±0.002 mm", magnetic="yes"))
    assert brass.outcome is Outcome.FAILS
    assert steel.outcome is Outcome.CONFORMS
    assert [finding.ok for finding in steel.findings] == [None]


def test_the_wrong_weave_fails() -> None:
    evidence = evidence_of(aperture="0.25±0.002 mm", weave=Weave.TWILLED)
    assert check_receipt(ORDER, evidence).outcome is Outcome.FAILS


def test_what_cannot_be_judged_says_what_to_measure() -> None:
    with pytest.raises(InputError, match="a count and the wire"):
        check_receipt(ORDER, evidence_of(count="118 in 50 mm"))
    with pytest.raises(InputError, match="no aperture"):
        check_receipt(replace(ORDER, reading=Reading("60 mesh"), tolerance=None), evidence_of(count="118 in 50 mm"))


def figure(value: float, u: float) -> BenchFigure:
    return BenchFigure("warp.aperture", value, (Part("aperture", u, Scalar(F(value), u)),))


@given(st.floats(0.5, 1.5), st.floats(0.001, 0.3), st.floats(0.001, 0.3))
def test_the_three_outcomes_are_the_guard_band_rule(value: float, u: float, allowed: float) -> None:
    off = abs(value - 1.0)
    outcome = about(figure(value, u), 1.0, allowed, "test").outcome
    if off + u < allowed - 1e-9:
        assert outcome is Outcome.CONFORMS
    elif off - u > allowed + 1e-9:
        assert outcome is Outcome.FAILS
    elif off + u > allowed + 1e-9 and off - u < allowed - 1e-9:
        assert outcome is Outcome.NOT_PROVEN


def test_exactly_at_the_edge_conforms() -> None:
    assert about(figure(0.3, 0.1), 0.4, 0.2, "test").outcome is Outcome.CONFORMS


def test_the_document_has_the_sum_in_numbers() -> None:
    document = receipt_document(received("0.165±0.005 mm"), "0,25/0,16 1.4404 plain")
    check = document["checks"][0]
    assert (document["schema"], document["verdict"]) == (1, "not-proven")
    assert check["reach"] == pytest.approx(0.0141, abs=5e-5)
    assert check["weak_link"] == "wire"
    assert check["better"]["steps"] == [{"measure": "wire", "over_mm": None, "resolution_mm": 0.003}]


def test_the_identify_document_has_the_keys_that_scripts_rely_on() -> None:
    from catalog.cloth import Cloth
    from catalog.construction import Construction, Wires
    from catalog.figures import figures
    from catalog.search.identify import identify

    made = Construction(Weave.PLAIN, *[Wires(F(127, 300), F("0.1651"))] * 2, "316L")
    one = Cloth("a", "a", made, figures(made, 7950.0), "60 x .0065", "inch", "test")
    evidence: Evidence = evidence_of(count="47 in 20 mm", wire="0.165±0.005 mm")
    document = identify_document(identify([one, replace(one, id="b")], evidence))
    first = document["candidates"][0]
    assert {"cloth", "odds", "misfit", "ruled_out_by"} <= set(first)
    assert first["misfit"] == {"pitch": pytest.approx(0.486, abs=1e-3), "wire": pytest.approx(0.02, abs=1e-3)}
    assert {"measure", "over_mm", "resolution_mm", "why"} <= set(document["next"])
