"""What a cut list costs: sums by hand. Twelve discs Ø 350 with kerf 5: four rows of three, 1415 mm of 1.219 m."""

from dataclasses import replace
from decimal import Decimal as D

import pytest

from catalog.errors import InputError
from catalog.stock.cutting import Cutting
from catalog.stock.cutting_pieces import Piece
from catalog.stock.offers import Offer, Quote, RollSize, quotes

DISCS = [Piece(12, diameter_mm=350)]
KERF_5 = Cutting(kerf_mm=5)
BY_LENGTH = RollSize(1219, 30480, is_cut_to_length=True, selvedge_mm=10)
NEAR = Offer("TH-1", "Thornwick Wire Cloth", "TW-0403", D("40.00"), "EUR", (BY_LENGTH,), lead_days=5)


def worked(*offers: Offer, ranks: dict[str, int] | None = None) -> dict[str, Quote]:
    return {quote.offer.article: quote for quote in quotes(offers, DISCS, KERF_5, ranks)}


def test_cloth_cut_to_length_is_bought_over_its_whole_width() -> None:
    """1.42 m × 1.219 m = 1.73098 m² at 40 are 69.24; by 12·π/4·0.35² = 1.15454 m² of discs 59.97; by disc 5.77."""
    quote = worked(NEAR)["TH-1"]
    assert (quote.bought_m2, quote.cost) == (D("1.73098"), D("69.24"))
    assert (quote.per_usable_m2, quote.per_piece) == (D("59.97"), D("5.77"))


def test_the_minimum_is_paid_where_less_is_needed() -> None:
    quote = worked(replace(NEAR, minimum_m2=D(5)))["TH-1"]
    assert quote.cost == D("200.00")
    assert "the minimum is 5.000 m²" in quote.words


def test_whole_rolls_are_bought_whole_and_as_many_as_the_list_needs() -> None:
    """A roll of 1 m holds two rows of three: two rolls of 1.219 m², 2.438 m² at 40 are 97.52."""
    quote = worked(replace(NEAR, sizes=(RollSize(1219, 1000),)))["TH-1"]
    assert (quote.bought_m2, quote.cost) == (D("2.438"), D("97.52"))
    assert quote.words.startswith("TH-1: 2 rolls 1219 mm × 1 m, 2.438 m²;")


def test_of_several_sizes_the_one_that_takes_least_is_bought() -> None:
    """0.75 m wide: two across, six rows of 355 less a kerf are 2125 mm, 2.13 m × 0.75 = 1.5975 m² < 1.731 m²."""
    quote = worked(replace(NEAR, sizes=(BY_LENGTH, replace(BY_LENGTH, width_mm=750))))["TH-1"]
    assert quote.bought_m2 == D("1.5975")


def test_an_offer_too_narrow_has_no_price_and_says_why() -> None:
    quote = worked(replace(NEAR, sizes=(RollSize(300, 30000),)))["TH-1"]
    assert quote.cost is None
    assert "300 mm wide, 50 mm short" in quote.words


def test_an_offer_that_is_dearer_and_later_for_the_same_cloth_is_marked_with_the_one_that_outdoes_it() -> None:
    late = replace(NEAR, article="HA-1", seller="Halvering Screens", price_per_m2=D("41.00"), lead_days=21)
    found = worked(NEAR, late)
    assert found["TH-1"].outdone_by is None
    assert found["HA-1"].outdone_by == "TH-1"
    assert found["HA-1"].why_outdone == (
        "Outdone by TH-1 of Thornwick Wire Cloth: it costs 69.24 instead of 70.97 EUR, comes in 5 instead of 21 days, "
        "and is the same cloth."
    )


def other(**changes: object) -> Offer:
    return replace(NEAR, article="HA-1", price_per_m2=D("41.00"), **changes)  # type: ignore[arg-type]


@pytest.mark.parametrize(
    ("dearer", "ranks"),
    [
        (other(lead_days=2), {}),
        (other(lead_days=None), {}),
        (other(currency="USD"), {}),
        (other(cloth="TW-0404"), {}),
        (other(cloth="TW-0404"), {"TW-0404": 0, "TW-0403": 1}),
        (replace(NEAR, article="HA-1"), {}),
    ],
    ids=["sooner", "lead time unstated", "another currency", "cloth without a rank", "better cloth", "alike"],
)
def test_an_offer_that_is_better_in_something_or_cannot_be_compared_is_not_marked(
    dearer: Offer, ranks: dict[str, int]
) -> None:
    assert all(quote.outdone_by is None for quote in worked(NEAR, dearer, ranks=ranks).values())


def test_a_better_cloth_at_the_same_price_and_time_outdoes() -> None:
    found = worked(NEAR, replace(NEAR, article="B", cloth="TW-9"), ranks={"TW-0403": 0, "TW-9": 2})
    assert found["B"].outdone_by == "TH-1"
    assert "its cloth serves no worse" in (found["B"].why_outdone or "")


def test_cheapest_come_first_and_those_without_a_price_last() -> None:
    dear, narrow = other(), replace(NEAR, article="N", sizes=(RollSize(300, 30000),))
    assert [quote.offer.article for quote in quotes([narrow, dear, NEAR], DISCS, KERF_5)] == ["TH-1", "HA-1", "N"]


def test_binary_fractions_are_no_money() -> None:
    with pytest.raises(InputError):
        replace(NEAR, price_per_m2=40.39)  # type: ignore[arg-type]
