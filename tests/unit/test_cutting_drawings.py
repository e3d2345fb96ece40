"""A layout drawn in text: within its columns, whole in plain ASCII, every piece marked."""

import pytest

from catalog.stock.cut_drawing import drawing
from catalog.stock.cutting import Cutting, cut_lot
from catalog.stock.cutting_pieces import Piece
from catalog.stock.lots import Lot

REMNANT = Lot("R-117", "c", "remnant", 1195, 15, 2400, 0, "B")
LISTS = [
    [Piece(12, diameter_mm=350)],
    [Piece(30, diameter_mm=350)],
    [Piece(2, 500, 900), Piece(3, 350, 420, warp_bound=True, label="a label " * 20), Piece(9, diameter_mm=60)],
]


@pytest.mark.parametrize("pieces", LISTS)
@pytest.mark.parametrize("length_mm", [2400, 30000])
@pytest.mark.parametrize("is_ascii", [False, True])
def test_no_line_is_longer_than_80_columns(pieces: list[Piece], length_mm: int, is_ascii: bool) -> None:
    lot = Lot("L-1", "c", "roll", 1195, 15, length_mm, 0, "B")
    lines = drawing(cut_lot(lot, pieces, Cutting(5)), is_ascii=is_ascii)
    assert max(map(len, lines)) <= 80
    assert all(line.isascii() for line in lines) or not is_ascii


@pytest.mark.parametrize("is_ascii", [False, True])
def test_twelve_discs_are_twelve_marks_beside_the_rest_with_its_size(is_ascii: bool) -> None:
    text = "\n".join(drawing(cut_lot(REMNANT, LISTS[0], Cutting(5)), is_ascii=is_ascii))
    assert text.count("(A)") == 12
    assert ("rest 1165 x 980 mm" if is_ascii else "rest 1165 × 980 mm") in text


def test_the_picture_is_to_scale_and_says_what_a_character_stands_for() -> None:
    """2400 mm over 79 steps are 30.4 mm a column; a line is twice that. The rest begins at 1420/30.38 = 47 columns."""
    lines = drawing(cut_lot(REMNANT, LISTS[0], Cutting(5)))
    assert "One column is 30.4 mm along the cloth, one line 60.8 mm across it." in lines
    assert lines[0].rindex("┬") in (46, 47)


def test_a_cloth_from_which_nothing_comes_out_is_not_drawn() -> None:
    cut = cut_lot(REMNANT, [Piece(1, diameter_mm=1240)], Cutting(5))
    assert drawing(cut) == ("R-117: nothing to draw.",)
