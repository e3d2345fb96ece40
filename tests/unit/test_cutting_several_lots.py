"""Which lots together: fewest heats, then fewest lots, then remnants before rolls, then least waste.

Counted by hand.
"""

import pytest

from catalog.errors import InputError
from catalog.stock.cutting import Cutting
from catalog.stock.cutting_pieces import Piece
from catalog.stock.lots import Lot
from catalog.stock.plan import Plan, plan


def lot(name: str, length_mm: int, heat: str | None, form: str = "remnant", width_mm: int = 1000) -> Lot:
    return Lot(name, "c", form, width_mm, 0, length_mm, 0, "A", heat=heat)


def used(made: Plan) -> set[str]:
    return {cut.lot.id for cut in made.cuts}


SQUARES = [Piece(8, 500, 500)]
"""Two across a metre: eight take 2 m."""


def test_one_heat_in_two_lots_goes_before_two_heats_in_larger_lots() -> None:
    stock = [lot("A", 1500, "H1"), lot("B", 1500, "H2"), lot("C", 1000, "H3"), lot("D", 1000, "H3")]
    made = plan(stock, SQUARES)
    assert (used(made), made.heats, made.is_complete) == ({"C", "D"}, ("H3",), True)
    assert "All of one heat: H3." in made.why


def test_one_lot_goes_before_two_of_the_same_heat() -> None:
    stock = [lot("A", 1000, "H1"), lot("B", 1000, "H1"), lot("C", 2000, "H1")]
    assert used(plan(stock, SQUARES)) == {"C"}


def test_a_remnant_goes_before_a_roll_and_the_words_say_so() -> None:
    stock = [lot("ROLL", 30000, "H1", "roll"), lot("REST", 2400, "H1")]
    made = plan(stock, SQUARES)
    assert used(made) == {"REST"}
    assert "No roll is broken: remnants and panels are enough." in made.why


def test_where_a_roll_is_broken_to_save_a_lot_the_way_without_it_is_named() -> None:
    stock = [lot("ROLL", 30000, "H1", "roll"), lot("A", 1000, "H1"), lot("B", 1000, "H1")]
    made = plan(stock, SQUARES)
    assert used(made) == {"ROLL"}
    assert any("without breaking one, 2 lots of one heat would do it" in why for why in made.why)


def test_of_lots_alike_the_one_with_less_waste_is_taken() -> None:
    """Eight squares of 500: a metre wide, nothing is lost; 1100 wide, 100 mm over 2 m are."""
    stock = [lot("WIDE", 2000, "H1", width_mm=1100), lot("FITS", 2000, "H1")]
    assert used(plan(stock, SQUARES)) == {"FITS"}


def test_two_heats_are_proven_by_area_or_said_to_be_what_was_found() -> None:
    stock = [lot("A", 1000, "H1"), lot("B", 1000, "H2")]
    made = plan(stock, SQUARES)
    assert made.is_complete
    assert "2 heats, H1, H2: fewer can't do it, their area is too small." in made.why


def test_lots_without_a_heat_on_record_are_not_taken_for_one_heat() -> None:
    stock = [lot("A", 1000, None), lot("B", 1000, None), lot("C", 1000, "H1"), lot("D", 1000, "H1")]
    assert used(plan(stock, SQUARES)) == {"C", "D"}
    made = plan(stock[:2], SQUARES)
    assert len(made.heats) == 2
    assert "No heat is on record for A, B: each counts as a heat of its own." in made.why


def test_what_the_stock_does_not_give_is_counted_and_explained() -> None:
    made = plan([lot("A", 1000, "H1")], [Piece(8, 500, 500), Piece(1, 1200, 1300)])
    assert made.missing == (4, 1)
    assert made.why[0] == "Not all: 4 of 9 pieces come out of 1 lot: A (4)."
    assert "4 × 500 × 500 mm missing: the lots are full." in made.why
    assert any("A is 1000 mm wide, 200 mm short" in why for why in made.why)


def test_an_empty_rack_gives_nothing_and_says_so() -> None:
    made = plan([], SQUARES)
    assert (made.cuts, made.missing) == ((), (8,))
    assert made.why[0] == "No: none of the 8 pieces comes out of these lots."


def test_lots_of_several_cloths_are_not_mixed() -> None:
    with pytest.raises(InputError, match="several cloths"):
        plan([lot("A", 1000, "H1"), Lot("B", "other", "roll", 1000, 0, 1000, 0, "A")], SQUARES)


def test_fifty_lots_give_two_hundred_pieces_each_once() -> None:
    stock = [lot(f"L-{i}", 600 + 37 * i % 1900, f"H{i % 7}", width_mm=(914, 1000, 1219)[i % 3]) for i in range(50)]
    pieces = [Piece(60, 300, 420), Piece(80, diameter_mm=180), Piece(60, 150, 610, warp_bound=True)]
    made = plan(stock, pieces, Cutting(kerf_mm=5))
    assert [sum(counts) for counts in zip(*(cut.placed for cut in made.cuts), strict=True)] == [60, 80, 60]
    assert len(used(made)) == len(made.cuts)
