"""What looks like something else: steel numbers, certificates, sizes, commas, fractions, dates. Worked out by hand."""

from fractions import Fraction

import pytest

from catalog import callout
from catalog.callout.reading import Form, Likelihood, Reading, Status

INCH = 25.4


def first(text: str) -> Reading:
    return callout.read(text).surviving[0]


def form(text: str) -> Form:
    found = first(text).form
    assert found is not None
    return found


def test_a_steel_number_is_no_length() -> None:
    reading = first("1.4404 0,25/0,16")
    assert reading.alloy == "316L"
    assert reading.warp.aperture
    assert reading.warp.aperture.mm == Fraction(1, 4)


def test_a_length_that_looks_like_a_steel_number_is_a_length() -> None:
    reading = first("1.4375 in opening 1/4 in wire")
    assert reading.alloy is None
    assert reading.warp.aperture
    assert float(reading.warp.aperture.mm) == pytest.approx(1.4375 * INCH)


def test_304_mesh_may_be_the_steel_or_the_count() -> None:
    understood = callout.read("304 mesh")
    assert understood.status is Status.ASK
    assert {r.alloy for r in understood.surviving} == {None, "304"}


def test_316_mesh_100_is_a_hundred_mesh_of_316() -> None:
    reading = first("316 mesh 100 .0045")
    assert reading.alloy == "316"
    assert reading.warp.count_per_in == 100


@pytest.mark.parametrize(
    "text", ["3.1 cert", "with 3.1 certificate", "EN 10204 3.1", "Zeugnis 3.1", "cert. 3.1", "3.1B"]
)
def test_a_certificate_is_no_length(text: str) -> None:
    reading = first(f"20 mesh .016 1.4404, {text}")
    assert reading.certificate == "3.1"
    assert reading.warp.count_per_in == 20


def test_80_20_is_a_brass_beside_the_word_and_two_numbers_without() -> None:
    assert first("60 mesh .0075 80/20 brass").alloy == "CuZn20"
    assert callout.read("60 mesh .0075 80/20").status is Status.ASK


def test_a_bare_brass_or_bronze_leaves_a_question() -> None:
    for metal in ("brass", "bronze", "Messing", "laiton"):
        understood = callout.read(f"60 mesh .0075 {metal}")
        assert understood.question is not None
        assert understood.surviving[0].alloy is None


def test_tbc_is_bolting_cloth_or_to_be_confirmed() -> None:
    understood = callout.read("60 TBC 304")
    assert understood.status is Status.ASK
    wires = [r.warp.wire for r in understood.surviving]
    assert wires[1] is None
    assert wires[0]
    assert float(wires[0].mm) == pytest.approx(0.0045 * INCH)


def test_m_is_mesh_behind_the_count_and_metres_behind_a_size() -> None:
    assert first("60M x .0075").warp.count_per_in == 60
    found = form("60 mesh .0075 1.22M X 30M")
    assert (found.width_mm, found.length_mm) == (1220.0, 30000.0)


def test_wd_is_wide_behind_a_size_and_the_wire_behind_a_decimal() -> None:
    assert form("100 mesh .0045 36 WD").width_mm == pytest.approx(36 * INCH)
    wire = first("100 mesh .0045 WD").warp.wire
    assert wire
    assert float(wire.mm) == pytest.approx(0.0045 * INCH)


def test_l_is_the_width_in_french_and_a_length_elsewhere() -> None:
    assert form("toile inox maille 0,10 fil 0,065 L=1,22 m").width_mm == 1220.0
    assert form("60 mesh .0075 304 L = 30 m").length_mm == 30000.0


def test_25_100_is_a_quarter_of_a_millimetre_on_a_french_drawing() -> None:
    wire = first("maille 0,5 fil 25/100 inox").warp.wire
    assert wire
    assert wire.mm == Fraction(1, 4)


def test_a_roll_of_39_4_inches_is_a_width() -> None:
    assert form("400 x 400 x .001 316 39.4 in wide").width_mm == pytest.approx(39.4 * INCH)


@pytest.mark.parametrize("width", ["1,000 mm wide", "1.000 mm wide", "1000 mm wide", "1'000 mm wide", "1,0 m wide"])
def test_a_roll_of_a_metre_in_any_spelling(width: str) -> None:
    assert form(f"0.5 mm aperture 0.2 mm wire {width}").width_mm == 1000.0


def test_a_comma_is_a_decimal_in_an_opening_and_a_thousand_in_a_roll() -> None:
    reading = first("1,250 mm aperture 0,4 mm wire 1,220 mm wide")
    assert reading.warp.aperture
    assert reading.warp.aperture.mm == Fraction(5, 4)
    assert reading.form
    assert reading.form.width_mm == 1220.0


@pytest.mark.parametrize(
    ("written", "inches"),
    [("1/4", 0.25), ("¼", 0.25), ("1⁄4", 0.25), ("1-1/2", 1.5), ("1 1/2", 1.5), ("1½", 1.5), ("3/16", 0.1875)],
)
def test_fractions_of_the_inch_in_any_spelling(written: str, inches: float) -> None:
    aperture = first(f'{written}" opening .047" wire').warp.aperture
    assert aperture
    assert float(aperture.mm) == pytest.approx(inches * INCH)


@pytest.mark.parametrize("sign", ['"', "″", "”", "''", "’’", " in", " in.", " inch", " Zoll", " pouces"])
def test_the_inch_in_any_sign(sign: str) -> None:
    wire = first(f"20 mesh 0.016{sign} wire").warp.wire
    assert wire
    assert float(wire.mm) == pytest.approx(0.016 * INCH)


@pytest.mark.parametrize("times", ["x", "X", "×", "*", "х", "✕", " x ", " × ", " by "])
def test_the_sign_of_multiplication_in_any_shape(times: str) -> None:
    reading = first(f"20{times}18 mesh .011")
    assert (reading.warp.count_per_in, reading.weft.count_per_in) == (20, 18)


def test_a_date_that_was_a_fraction_is_never_used_without_asking() -> None:
    understood = callout.read("16-Mar")
    assert understood.status is Status.ASK
    assert understood.problems[0].code == "E_DATE"
    assert "3/16" in understood.problems[0].message


def test_a_sieve_number_is_never_computed() -> None:
    # ISO 3310-1 and ASTM E11: No. 200 is 75 µm with 50 µm wire, which would be 203 per inch
    reading = first("US sieve No. 200")
    assert reading.warp.aperture
    assert reading.warp.aperture.mm == Fraction(75, 1000)
    assert reading.warp.count_per_in == Fraction(2032, 10)


def test_swg_says_which_standard_was_taken() -> None:
    notes = " ".join(first("30 mesh 30 SWG").notes)
    assert "British" in notes
    assert "0.0140 in" in notes  # US steel wire gauge 30, Machinery's Handbook


def test_the_column_of_a_problem_counts_in_the_text_as_it_came() -> None:
    understood = callout.read("20Ã—20 mesh Ã˜ 0,4 mm xyzzy")
    assert understood.problems[0].column == "20Ã—20 mesh Ã˜ 0,4 mm xyzzy".index("xyzzy") + 1


def test_words_are_given_with_the_part_they_play() -> None:
    text = "60 mesh .0075 wire T304 plain 36 in wide xyzzy"
    roles = {text[w.start : w.end]: w.role for w in callout.read(text).words}
    assert roles["60"] == "count"
    assert roles[".0075"] == "wire"
    assert roles["T304"] == "alloy"
    assert roles["plain"] == "weave"
    assert roles["36 in"] == "form"
    assert roles["xyzzy"] == "unknown"


def test_rounding_agrees_to_the_last_unit_inclusive() -> None:
    # 25.4/200 - 0.053 = 0.074; 75 ± 0.5 µm and 0.053 ± 0.0005 leave 0.001: agrees, and just so
    assert callout.read("200 mesh 75 micron 0.053 mm wire").status is Status.NOTED
    # 25.4/200 - 0.0535 = 0.0735, now 0.0015 off with 0.00055 allowed
    assert callout.read("200 mesh 75 micron 0.0535 mm wire").status is Status.ASK


def test_a_jammed_cloth_is_told_from_a_close_one() -> None:
    # Peirce 1937: plain cloth jams at d/p = 1/sqrt(3) = 0.57735
    assert callout.read("10 mesh wire .0577 in").status is Status.NOTED
    understood = callout.read("10 mesh wire .0578 in")
    assert understood.status is Status.ASK
    assert understood.problems[0].code == "E_JAMMED"
    assert [r.weave for r in understood.surviving] == ["twilled"]
    assert callout.read("10 mesh wire .0578 in twill").status in (Status.CLEAR, Status.NOTED)


def test_zinc_on_stainless_is_a_contradiction() -> None:
    understood = callout.read("60 mesh .0075 304 SS galvanised")
    assert [p.code for p in understood.problems] == ["E_MATERIAL"]


def test_an_alternative_is_a_second_reading_of_equal_standing() -> None:
    understood = callout.read('40 mesh 0.010" 304 / alt. 40 mesh 0.0095" acceptable')
    assert [r.likelihood for r in understood.surviving] == [Likelihood.USUAL, Likelihood.USUAL]
    assert "alternative" in understood.surviving[1].label
    assert understood.surviving[1].alloy == "304"


def test_a_tolerance_is_a_limit_around_the_figure() -> None:
    limits = first("60 mesh ±1, wire 0.0075 ±.0003, 304").limits
    assert limits["count_per_in"] == pytest.approx((59, 61))
    assert limits["wire_mm"] == pytest.approx((0.0072 * INCH, 0.0078 * INCH))
