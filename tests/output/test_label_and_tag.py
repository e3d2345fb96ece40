"""A roll's tag and label: forty columns, both unit systems, a number that scanners read.

Conversions: 25.4 mm to the inch, 304.8 mm to the foot, 1 kg/m² = 0.2048 lb/ft² (by the definitions of foot and pound).
"""

import re
from dataclasses import replace
from fractions import Fraction as F

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from sheet_making import REMNANT, SIXTY, inside, pages, shown

from catalog.cloth import Rating
from catalog.construction import Construction, Weave, Wires
from catalog.figures import figures
from catalog.report.label_pdf import label_codes, label_pdf
from catalog.report.roll_tag import columns_of, folded, roll_tag

MM = 72 / 25.4


def rectangles(pdf: bytes) -> list[tuple[float, ...]]:
    """Left, foot, width, height of every rectangle drawn, points."""
    found = re.findall(r"([-\d.]+) ([-\d.]+) ([-\d.]+) ([-\d.]+) re", inside(pdf))
    return [tuple(map(float, one)) for one in found]


def tag(**lot: object) -> list[str]:
    return roll_tag(replace(REMNANT, **lot), SIXTY)  # type: ignore[arg-type]


def line(lines: list[str], name: str) -> list[str]:
    return re.split(r"\s{2,}", next(one for one in lines if one.startswith(name)))


def test_a_tag_says_everything_in_both_unit_systems() -> None:
    lines = tag(reserved_mm=400)
    assert line(lines, "Opening")[1:] == ["0.2582 mm", "0.0102 in"]
    assert line(lines, "Wire")[1:] == ["0.1651 mm", "0.0065 in"]
    assert line(lines, "Count")[1:] == ["23.62 per cm", "60 per in"]
    assert line(lines, "Width")[1:] == ["1195 mm", "47.05 in"]
    assert line(lines, "Usable")[1:] == ["1165 mm", "45.87 in"]
    assert line(lines, "Length")[1:] == ["2.400 m", "7.87 ft"]
    assert line(lines, "Reserved")[1:] == ["0.400 m", "1.31 ft"]


def test_a_tag_carries_lot_heat_certificate_and_location() -> None:
    lines = tag(seams=2)
    assert "LOT R-117" in lines
    assert line(lines, "Heat")[1] == "H47110"
    assert line(lines, "Certificate")[0] == "Certificate EN 10204 3.1"
    assert line(lines, "Location")[1] == "B-04-2"
    assert line(lines, "Seams")[1] == "2"


def test_a_missing_certificate_is_said_and_not_left_blank() -> None:
    lines = tag(heat=None, certificate=None)
    assert "not on record" in line(lines, "Heat")[1]
    assert "none on record" in line(lines, "Certificate")[0]


def test_an_invented_roll_says_so() -> None:
    assert "DEMO DATA: INVENTED" in tag(demo=True)
    assert "DEMO DATA: INVENTED" not in tag()
    assert "DEMO DATA: INVENTED" in shown(label_pdf(replace(REMNANT, demo=True), SIXTY))


def test_filter_cloth_has_counts_and_a_rating_and_no_opening() -> None:
    made = Construction(Weave.PLAIN_DUTCH, Wires(F(127, 120), F("0.27")), Wires(F(127, 550), F("0.2")), "316L")
    filter_cloth = replace(SIXTY, construction=made, figures=figures(made, 8000.0), rating=Rating(100.0, "nominal"))
    lines = roll_tag(REMNANT, filter_cloth)
    assert not [one for one in lines if "pening" in one or "Open area" in one]
    # 120 / 127 mm pitch: 24 per inch; 127/550: 110 per inch
    assert line(lines, "Warp count")[-1] == "24 per in"
    assert line(lines, "Weft count")[-1] == "110 per in"
    assert line(lines, "Rating")[1] == "100 um nominal"


OUTSIDE = st.text(max_size=120) | st.just("漢字" * 40) | st.just("W" * 250)


@settings(max_examples=60, deadline=None)
@given(lot=OUTSIDE, location=OUTSIDE, heat=OUTSIDE, name=OUTSIDE, alloy=OUTSIDE)
def test_no_line_is_wider_than_forty_columns(lot: str, location: str, heat: str, name: str, alloy: str) -> None:
    cloth = replace(SIXTY, name=name, declared=name, construction=replace(SIXTY.construction, alloy=alloy))
    for one in roll_tag(replace(REMNANT, id=lot, location=location, heat=heat, form=name), cloth):
        assert columns_of(one) <= 40
        assert one.isprintable()


def test_a_figure_of_many_digits_keeps_its_unit() -> None:
    lines = tag(width_mm=123456789012, length_mm=987654321098765)
    flat = " ".join(lines)
    assert "123456789012 mm" in flat
    assert all(columns_of(one) <= 40 for one in lines)


def test_a_cut_text_ends_in_dots() -> None:
    assert folded("word " * 60)[-1].endswith("…")
    assert len(folded("word " * 60)) == 3
    assert folded("one line") == ["one line"]


def test_both_codes_hold_the_lot_number_as_it_is_typed() -> None:
    codes = label_codes(REMNANT)
    assert (codes.qr, codes.bars) == ("R-117", "R-117")


def test_a_number_beyond_ascii_is_a_qr_code_alone() -> None:
    # Code 128 holds ASCII (ISO/IEC 15417)
    assert label_codes(replace(REMNANT, id="Ж-117")) == type(label_codes(REMNANT))("Ж-117", None)


def test_bars_that_no_scanner_could_tell_apart_are_left_out() -> None:
    assert label_codes(replace(REMNANT, id="ROLL-" + "7A" * 40)).bars is None


def test_the_bars_are_those_of_code_128() -> None:
    # ISO/IEC 15417: start, data, check of 11 modules and 3 bars each, stop of 13 modules and 4 bars;
    # R-117 in code set B: (1 + 5 + 1) × 11 + 13 = 90 modules, 25 bars
    bars = rectangles(label_pdf(REMNANT, SIXTY))
    tall = [bar for bar in bars if bar[3] == pytest.approx(9 * MM, abs=0.01)]
    module = min(bar[2] for bar in tall)
    assert len(tall) == 25
    assert (tall[-1][0] + tall[-1][2] - tall[0][0]) / module == pytest.approx(90, abs=0.1)
    assert module >= 7.5 * 0.0254 * MM - 0.001


def test_the_qr_code_is_of_the_smallest_version_with_its_quiet_zone() -> None:
    # ISO/IEC 18004: version 1 has 21 modules a side and holds 14 bytes at level M; four blank modules around
    squares = rectangles(label_pdf(REMNANT, SIXTY))
    dark = [one for one in squares if one[2] == pytest.approx(one[3], abs=0.001)]
    side = dark[0][2]
    width = max(one[0] for one in dark) + side - min(one[0] for one in dark)
    assert width / side == pytest.approx(21, abs=0.05)
    assert side * 29 == pytest.approx(30 * MM, abs=0.05)


def test_a_label_is_one_page_with_the_longest_names_and_the_same_each_time() -> None:
    lot = replace(REMNANT, location="Größe " * 40, heat="H" * 200, id="R-117" * 30)
    made = label_pdf(lot, replace(SIXTY, name="W" * 200))
    assert pages(made) == 1
    assert made == label_pdf(lot, replace(SIXTY, name="W" * 200))
    left, top, width, height = (float(v) for v in re.findall(rb"/MediaBox \[ (\S+) (\S+) (\S+) (\S+) \]", made)[0])
    places = re.findall(r"BT 1 0 0 1 (\S+) (\S+) Tm", inside(made))
    assert all(left <= float(x) <= width and top <= float(y) <= height for x, y in places)
