"""The drawing is to scale: what is measured on it is what the construction says."""

from fractions import Fraction

import pytest

from catalog.construction import Construction, Weave, Wires
from tui.widgets.cloth_drawing import OPENING, WARP, WEFT, draw, figure, plan_raster, section_raster

F = Fraction
SQUARE = Construction(Weave.PLAIN, Wires(F("0.41"), F("0.16")), Wires(F("0.41"), F("0.16")))
TWILL = Construction(Weave.TWILLED, Wires(F("0.17"), F("0.08")), Wires(F("0.17"), F("0.08")))
OBLONG = Construction(Weave.PLAIN, Wires(F("0.4"), F("0.1")), Wires(F("0.8"), F("0.1")))
PLAIN_DUTCH = Construction(Weave.PLAIN_DUTCH, Wires(F(254, 240), F("0.36")), Wires(F(254, 1100), F("0.25")))
TWILLED_DUTCH = Construction(Weave.TWILLED_DUTCH, Wires(F(254, 1650), F("0.07")), Wires(F(254, 14000), F("0.04")))
REVERSE = Construction(Weave.REVERSE_PLAIN_DUTCH, Wires(F(254, 1320), F("0.20")), Wires(F(254, 170), F("0.4")))
ALL = (SQUARE, TWILL, OBLONG, PLAIN_DUTCH, TWILLED_DUTCH, REVERSE)


def kinds(raster: list[list[tuple[int, int]]]) -> list[int]:
    return [kind for row in raster for kind, _ in row]


@pytest.mark.parametrize(("cloth", "dots"), [(SQUARE, 82), (TWILL, 170), (OBLONG, 40)])
def test_the_share_of_opening_is_the_open_area(cloth: Construction, dots: int) -> None:
    # open area by definition: product of aperture over pitch in each direction; a whole pitch is drawn,
    # in a number of dots in which wires and apertures are whole
    scale = float(cloth.warp.pitch_mm) / dots
    raster = plan_raster(figure(cloth), dots, round(float(cloth.weft.pitch_mm) / scale), scale)
    share = kinds(raster).count(OPENING) / len(kinds(raster))
    asked = (cloth.warp.aperture_mm * cloth.weft.aperture_mm) / (cloth.warp.pitch_mm * cloth.weft.pitch_mm)
    assert share == pytest.approx(float(asked), abs=0.005)


@pytest.mark.parametrize("cloth", [PLAIN_DUTCH, TWILLED_DUTCH, REVERSE])
def test_filter_cloth_shows_no_straight_opening(cloth: Construction) -> None:
    scale = float(max(cloth.warp.pitch_mm, cloth.weft.pitch_mm)) / 60
    raster = plan_raster(figure(cloth), 120, 120, scale)
    assert kinds(raster).count(OPENING) == 0


def test_an_oblong_opening_is_longer_along_the_warp() -> None:
    raster = plan_raster(figure(OBLONG), 160, 160, 0.01)
    middle = [row[40][0] for row in raster]  # 0.4 mm: half a pitch past the first wire, in the opening
    across = [kind for kind, _ in raster[80]]
    assert _longest(middle, OPENING) == pytest.approx(70, abs=1)  # 0.8 − 0.1 mm
    assert _longest(across, OPENING) == pytest.approx(30, abs=1)  # 0.4 − 0.1 mm


def _longest(values: list[int], wanted: int) -> int:
    best = run = 0
    for value in values:
        run = run + 1 if value == wanted else 0
        best = max(best, run)
    return best


def test_plain_weave_goes_over_one_and_under_one() -> None:
    assert [_top_at(SQUARE, i, 0) for i in range(4)] == [WEFT, WARP, WEFT, WARP]
    assert [_top_at(SQUARE, i, 1) for i in range(4)] == [WARP, WEFT, WARP, WEFT]


def test_twill_goes_over_two_and_under_two_stepping_by_one() -> None:
    rows = [[_top_at(TWILL, i, j) for i in range(8)] for j in range(4)]
    assert rows[0] == [WEFT, WEFT, WARP, WARP] * 2
    assert rows[1] == [*rows[0][-1:], *rows[0][:-1]]


def _top_at(cloth: Construction, warp: int, weft: int) -> int:
    """What lies on top where these two wires cross."""
    scale = float(cloth.warp.pitch_mm) / 20
    raster = plan_raster(figure(cloth), 20 * (warp + 1), 20 * (weft + 1), scale)
    return raster[20 * weft + 10][20 * warp + 10][0]


@pytest.mark.parametrize("cloth", [SQUARE, OBLONG])
def test_a_section_is_two_wires_thick(cloth: Construction) -> None:
    # crowns flush: the thickness is the sum of both diameters
    scale = 0.005
    raster = section_raster(figure(cloth), 300, 200, scale)
    rows = [i for i, row in enumerate(raster) if any(kind != OPENING for kind, _ in row)]
    thickness = float(cloth.warp.wire_mm + cloth.weft.wire_mm)
    assert (rows[-1] - rows[0] + 1) * scale == pytest.approx(thickness, rel=0.05)


def test_plain_dutch_is_a_warp_and_two_wefts_thick() -> None:
    # straight warp, weft over and under it: D + 2d
    raster = section_raster(figure(PLAIN_DUTCH), 400, 200, 0.01)
    rows = [i for i, row in enumerate(raster) if any(kind != OPENING for kind, _ in row)]
    assert (rows[-1] - rows[0] + 1) * 0.01 == pytest.approx(0.36 + 2 * 0.25, rel=0.05)


@pytest.mark.parametrize("cloth", ALL, ids=lambda c: c.weave.value)
@pytest.mark.parametrize("size", [(78, 20), (40, 10), (110, 26)])
@pytest.mark.parametrize("ascii_only", [False, True])
def test_a_drawing_keeps_to_its_size(cloth: Construction, size: tuple[int, int], ascii_only: bool) -> None:
    lines = draw([("asked", SQUARE), ("offered", cloth)], *size, ascii_only=ascii_only)
    assert 0 < len(lines) <= size[1]
    assert max(map(len, lines)) <= size[0]
    assert lines[0].split() == ["asked", "offered"]
    assert " mm (" in lines[-1]
    if ascii_only:
        assert "".join(lines).isascii()


def test_asked_and_offered_are_drawn_to_one_scale() -> None:
    twice = Construction(Weave.PLAIN, Wires(F("0.82"), F("0.32")), Wires(F("0.82"), F("0.32")))
    lines = draw([("a", SQUARE), ("b", twice)], 123, 40, ascii_only=True)
    row = max(lines[1:15], key=lambda line: line.count("|"))
    left, right = row[:60], row[63:]
    assert _longest([ord(c) for c in right.strip()], ord(" ")) == pytest.approx(
        2 * _longest([ord(c) for c in left.strip()], ord(" ")), abs=1
    )


def test_the_bar_is_as_long_as_it_says() -> None:
    # a pitch of 0.41 mm in the drawing and the bar's length have to agree
    lines = draw([("a", SQUARE)], 120, 40, ascii_only=True)
    row = next(line for line in lines[1:] if line.count("|") > 4 and "=" not in line)
    starts = [i for i in range(1, len(row)) if row[i] == "|" and row[i - 1] != "|"]
    columns_a_mm = (starts[-1] - starts[0]) / (len(starts) - 1) / 0.41
    bar, length = lines[-1].split(" ", 1)
    assert len(bar) / columns_a_mm == pytest.approx(float(length.split()[0]), rel=0.05)


def test_a_particle_is_drawn_at_its_size() -> None:
    lines = draw([("a", SQUARE)], 120, 40, ascii_only=True, particle_mm=0.2)
    ring = [line for line in lines if "o" in line[2:] and "|" in line]
    assert ring
    assert max(line.rfind("o") - line.find("o") for line in ring) > 4


def test_no_room_gives_no_drawing() -> None:
    assert draw([("a", SQUARE)], 8, 4) == []
