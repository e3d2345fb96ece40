"""Does it cut? The worked example of remnant R-117 (1.195 × 2.40 m, selvedge 15 mm each side, kerf 5), by hand.

Usable 1195 − 2·15 = 1165. Across: 3·350 + 2·5 = 1060 ≤ 1165 < 4·350 + 3·5 = 1415. Rows: 6·350 + 5·5 = 2125 ≤ 2400
< 7·355. Twelve: 4 rows with their cuts, 4·355 = 1420, leave 980.
"""

from decimal import Decimal

import pytest

from catalog.errors import InputError
from catalog.stock.cutting import Cutting, cut_lot
from catalog.stock.cutting_pieces import Piece
from catalog.stock.cutting_summary import capacity, summary
from catalog.stock.layout import LotCut, letter
from catalog.stock.lots import Lot

REMNANT = Lot("R-117", "c", "remnant", 1195, 15, 2400, 0, "B-04-2", heat="H47110", certificate="3.1")
ROLL_48_IN = Lot("L-1004", "c", "roll", 1219, 10, 21300, 0, "B-02-4")
KERF_5 = Cutting(kerf_mm=5)


def twelve() -> LotCut:
    return cut_lot(REMNANT, [Piece(12, diameter_mm=350)], KERF_5)


def test_twelve_discs_take_1420_mm_and_leave_a_piece_of_980_at_full_width() -> None:
    cut = twelve()
    assert (cut.is_complete, cut.taken_mm) == (True, 1420)
    assert [(rest.text, rest.is_full_width) for rest in cut.remnants] == [("1165 × 980 mm", True)]
    assert summary(cut)[:2] == (
        "R-117: yes, 12 discs Ø 350 mm.",
        "They take 1420 mm of its length and leave 1165 × 980 mm.",
    )


def test_three_discs_lie_across_and_six_rows_follow() -> None:
    room = capacity(REMNANT, Piece(diameter_mm=350), KERF_5)
    assert (room.across, room.rows) == (3, 6)


def test_offset_rows_hold_three_more_where_the_straight_ones_run_out() -> None:
    """Rows of three moved to and fro by 1165 − 1060 = 105 stand sqrt(355² − 105²) = 339.1 apart: seven in 2400 mm."""
    cut = cut_lot(REMNANT, [Piece(30, diameter_mm=350)], KERF_5)
    assert len(cut.placements) == 21
    assert all(placement.is_offset for placement in cut.placements)
    assert any("no straight cut parts them" in note for note in cut.notes)


def test_rows_stay_straight_where_offset_ones_would_only_save_length() -> None:
    assert not any(placement.is_offset for placement in twelve().placements)


def test_waste_is_what_the_cut_takes_less_the_discs_themselves() -> None:
    """1165 × 1420 mm less 12·π/4·0.35² = 1.6543 − 1.1545 m²; at 0.83 kg/m² the discs weigh 0.958 kg."""
    cut = twelve()
    assert float(cut.used_m2) == pytest.approx(1.165 * 1.420)
    assert float(cut.waste_m2) == pytest.approx(0.49976, abs=1e-5)
    assert cut.waste_pct == pytest.approx(30.21, abs=0.01)
    assert cut.masses(0.83).pieces_kg == pytest.approx(0.9583, abs=1e-4)
    assert cut.masses(0.83).remnants_kg == pytest.approx(1.165 * 0.98 * 0.83)


def test_a_disc_of_1240_is_21_mm_too_wide_for_a_48_inch_roll_even_with_its_selvedges() -> None:
    cut = cut_lot(ROLL_48_IN, [Piece(1, diameter_mm=1240)], KERF_5)
    assert not cut.placements
    assert cut.why_missing == (
        "No Ø 1240 mm: L-1004 is 1219 mm wide, 21 mm short before its selvedges of 10 mm each side are taken off.",
    )


def test_a_disc_that_only_the_selvedge_prevents_is_told_so() -> None:
    """1219 − 2·10 = 1199: a disc of 1210 is 11 mm too wide between the selvedges."""
    cut = cut_lot(ROLL_48_IN, [Piece(1, diameter_mm=1210)], KERF_5)
    assert cut.why_missing == ("No Ø 1210 mm: L-1004 is 1199 mm wide between its selvedges, 11 mm short.",)


def test_a_panel_bound_to_the_warp_is_not_turned_and_the_words_say_that_it_would_fit_turned() -> None:
    free, bound = Piece(1, 1200, 900), Piece(1, 1200, 900, warp_bound=True)
    assert cut_lot(REMNANT, [free], KERF_5).placements[0].is_turned
    cut = cut_lot(REMNANT, [bound], KERF_5)
    assert not cut.placements
    assert "turned it would come out" in cut.why_missing[0]


def test_reserved_length_is_not_cut() -> None:
    held = Lot("R-118", "c", "remnant", 1195, 15, 2400, 1100, "B")
    cut = cut_lot(held, [Piece(12, diameter_mm=350)], KERF_5)
    assert len(cut.placements) < 12
    assert max(p.y_mm + p.length_mm for p in cut.placements) <= 1300
    assert "1100 mm of R-118 are reserved and taken to lie at its far end." in cut.notes


def test_a_piece_as_wide_as_the_usable_width_needs_no_cut_beside_it() -> None:
    cut = cut_lot(REMNANT, [Piece(2, 1165, 1197.5)], KERF_5)
    assert (cut.is_complete, cut.remnants, cut.scraps) == (True, (), ())
    assert cut.steps == ("The cloth: cut across into 2 strips of 1197.5 mm: 2 × A, 1165 × 1197.5.",)


def test_the_cuts_are_told_in_the_order_in_which_they_are_made() -> None:
    assert twelve().steps == (
        "The cloth: cut across at 1415 mm: part 1 1165 × 1415; part 2 1165 × 980, left over.",
        "Part 1: cut along at 1060 mm: part 3 1060 × 1415; part 4 100 × 1415, left over.",
        "Part 3: cut across into 4 strips of 350, each of them along into 3 of 350 mm: 12 × A, 350 × 350; "
        "cut a disc Ø 350 mm out of each.",
    )


def test_upright_and_turned_panels_share_a_cloth_that_either_way_alone_would_waste() -> None:
    """1200 × 1000 without kerf: 600 × 400 gives 2·2 upright (600 across) or 3·1 turned; five by 2 rows of 2 … by hand:
    two rows of three turned would need 1200 mm; one row of three turned (600) and one of two upright (400) use 1000."""
    lot = Lot("R-1", "c", "remnant", 1200, 0, 1000, 0, "A")
    assert len(cut_lot(lot, [Piece(9, 600, 400)]).placements) == 5
    assert len(cut_lot(lot, [Piece(9, 600, 400, warp_bound=True)]).placements) == 4


def test_a_disc_gives_the_disc_and_the_square_that_lie_inside_it() -> None:
    """The square inside a circle of 1000 has sides of 1000/√2 = 707.1."""
    disc = Lot("D-1", "c", "disc", 1000, 0, 1000, 0, "A")
    assert cut_lot(disc, [Piece(1, diameter_mm=990)]).is_complete
    assert cut_lot(disc, [Piece(1, 707, 707)]).is_complete
    assert cut_lot(disc, [Piece(1, 300, 950)]).is_complete
    assert not cut_lot(disc, [Piece(1, 708, 708)]).is_complete


def test_a_seam_is_something_to_look_at_before_cutting() -> None:
    lot = Lot("L-9", "c", "roll", 1219, 10, 9000, 0, "A", seams=2)
    assert any("2 seams whose place isn't on record" in note for note in cut_lot(lot, [Piece(1, 500, 500)]).notes)


def test_areas_are_exact_decimals() -> None:
    assert Piece(1, 330.2, 12.5).area_m2 == Decimal("0.0041275")


@pytest.mark.parametrize(
    "sizes",
    [{}, {"width_mm": 3}, {"width_mm": 3, "length_mm": 0}, {"diameter_mm": 3, "width_mm": 3}, {"diameter_mm": -1}],
)
def test_a_piece_without_one_clear_size_is_refused(sizes: dict[str, float]) -> None:
    with pytest.raises(InputError):
        Piece(1, **sizes)  # type: ignore[arg-type]


def test_an_empty_cut_list_and_a_kerf_below_zero_are_refused() -> None:
    with pytest.raises(InputError):
        cut_lot(REMNANT, [])
    with pytest.raises(InputError):
        Cutting(kerf_mm=-1)


def test_pieces_after_the_26th_are_marked_by_two_letters() -> None:
    assert [letter(index) for index in (0, 25, 26, 51, 52)] == ["A", "Z", "AA", "AZ", "BA"]


def test_two_hundred_sizes_and_thousands_of_pieces_are_laid_out_and_told() -> None:
    """By hand: 1199 // 20 = 59 across by 9000 // 31 = 290 rows hold more than the 9000 that are asked."""
    roll = Lot("L-1", "c", "roll", 1219, 10, 30480, 0, "A")
    sizes = [Piece(1, 100 + index, 300 + 2 * index) for index in range(200)]
    assert len(cut_lot(roll, sizes, KERF_5).placements) == 200
    many = cut_lot(Lot("L-2", "c", "roll", 1219, 10, 9000, 0, "A"), [Piece(9000, 20, 31)])
    assert many.is_complete
    assert len(many.steps) < 10
