"""Both cloths drawn to one scale: what is measured on paper is what the cloth is.

Geometry from the definitions (p = w + d) and from crowns flush in plain cloth, where the thickness is d1 + d2.
"""

from collections.abc import Sequence
from fractions import Fraction as F
from math import hypot
from xml.etree import ElementTree

import pytest

from catalog.construction import Construction, Weave, Wires
from catalog.report.drawing_svg import to_svg
from catalog.report.drawing_vector import Bar, Disc, Drawing, Panel, Ribbon, draw


def cloth(pitch: str, wire: str, weave: Weave = Weave.PLAIN) -> Construction:
    wires = Wires(F(pitch), F(wire))
    return Construction(weave, wires, wires)


ASKED, OFFERED = cloth("0.41", "0.16"), cloth("0.4233", "0.1651")
DUTCH = Construction(Weave.PLAIN_DUTCH, Wires(F("1.058"), F("0.27")), Wires(F("0.185"), F("0.18")))


def drawing(*made: Construction | None) -> Drawing:
    return draw(tuple((str(number), one) for number, one in enumerate(made)))


def warps(panel: Panel) -> list[Bar]:
    return [shape for shape in panel.shapes if isinstance(shape, Bar) and shape.part == "warp"]


def cuts(panel: Panel) -> list[Disc]:
    return [shape for shape in panel.shapes if isinstance(shape, Disc)]


def middles(bars: Sequence[Bar]) -> list[float]:
    return [bar.x + bar.width / 2 for bar in bars]


@pytest.mark.parametrize(("number", "made"), [(0, ASKED), (1, OFFERED)])
def test_pitch_and_wire_on_paper_are_those_of_the_cloth_times_the_scale(number: int, made: Construction) -> None:
    drawn = drawing(ASKED, OFFERED)
    bars = warps(drawn.plans[number])
    places = middles(bars)
    assert places[1] - places[0] == pytest.approx(float(made.warp.pitch_mm) * drawn.scale)
    assert bars[0].width == pytest.approx(float(made.warp.wire_mm) * drawn.scale)


def test_the_scale_is_a_preferred_one_and_the_bar_says_so_in_both_units() -> None:
    drawn = drawing(ASKED, OFFERED)
    assert drawn.scale == 20
    assert drawn.bar_on_paper == pytest.approx(drawn.bar_mm * 20)
    # 1 mm = 0.0394 in
    assert drawn.scale_words.startswith("Scale 20 : 1, bar 1 mm (0.0394 in)")


def test_a_coarse_cloth_is_drawn_smaller_than_it_is() -> None:
    drawn = drawing(cloth("127", "10"))
    assert drawn.scale < 1
    assert "1 : " in drawn.scale_words


def tops(panel: Panel) -> list[list[bool]]:
    """Per weft, whether it lies on top at each whole crossing, from what is painted last."""
    bars = [shape for shape in panel.shapes if isinstance(shape, Bar)]
    upright, across = middles(warps(panel)), sorted({b.y + b.height / 2 for b in bars if b.part == "weft"})

    def is_weft(x: float, y: float) -> bool:
        seen = [b for b in bars if b.x <= x <= b.x + b.width and b.y <= y <= b.y + b.height]
        return seen[-1].part == "weft"

    inside = [x for x in upright if x < panel.width - 5]
    return [[is_weft(x, y) for x in inside] for y in across if y < panel.height - 3]


def runs(row: list[bool]) -> set[int]:
    """Lengths of the floats of one weft, the broken ones at the edges left aside."""
    words = "".join("ou"[not over] for over in row)
    return {len(run) for run in words.replace("ou", "o u").replace("uo", "u o").split()[1:-1]}


def test_plain_weave_goes_over_one_and_under_one() -> None:
    rows = tops(drawing(ASKED).plans[0])
    assert all(runs(row) == {1} for row in rows)
    assert rows[0] != rows[1]


def test_twilled_weave_goes_over_two_and_under_two_and_steps_by_one() -> None:
    rows = tops(drawing(cloth("0.2", "0.08", Weave.TWILLED), cloth("0.3", "0.08")).plans[0])
    assert all(runs(row) == {2} for row in rows)
    assert rows[0][:-1] == rows[1][1:]


def test_in_section_the_wires_touch_and_the_crowns_are_flush() -> None:
    drawn = drawing(ASKED)
    section = drawn.sections[0]
    ribbon = next(shape for shape in section.shapes if isinstance(shape, Ribbon))
    d = 0.16 * drawn.scale
    for disc in cuts(section)[1:-1]:
        nearest = min(hypot(disc.x - x, disc.y - y) for x, y in ribbon.points)
        assert nearest == pytest.approx(d, rel=0.02)
    ys = [disc.y for disc in cuts(section)]
    assert max(ys) - min(ys) + d == pytest.approx(2 * d)


def test_plain_dutch_has_straight_warp_and_weft_side_by_side() -> None:
    drawn = drawing(DUTCH)
    assert len({disc.y for disc in cuts(drawn.sections[0])}) == 1
    assert "warp" in drawn.sections[0].title
    reverse = Construction(Weave.REVERSE_PLAIN_DUTCH, DUTCH.weft, DUTCH.warp)
    assert "weft" in drawing(reverse).sections[0].title


def test_too_little_asked_is_not_drawn_by_guess() -> None:
    drawn = drawing(None, OFFERED)
    assert not drawn.plans[0].shapes
    assert "not asked" in drawn.plans[0].note
    assert drawn.plans[1].shapes
    assert drawing(None, None).scale_words == "Nothing to draw"


def test_a_cloth_that_is_far_finer_says_that_it_cant_be_drawn() -> None:
    drawn = drawing(cloth("12.7", "2"), cloth("0.05", "0.02"))
    assert drawn.plans[0].shapes
    assert "too fine" in drawn.plans[1].note


def test_the_svg_is_in_true_millimetres() -> None:
    drawn = drawing(ASKED, OFFERED)
    root = ElementTree.fromstring(to_svg(drawn))
    box = [float(side) for side in root.attrib["viewBox"].split()]
    assert root.attrib["width"] == f"{box[2]:g}mm"
    assert root.attrib["height"] == f"{box[3]:g}mm"
    circles = list(root.iter("{http://www.w3.org/2000/svg}circle"))
    assert len(circles) == sum(len(cuts(panel)) for panel in drawn.sections)
