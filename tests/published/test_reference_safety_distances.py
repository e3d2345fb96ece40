"""Safety distances behind an opening: ISO 13857, table 4, for persons of 14 and over."""

import pytest

from catalog.reference import safety

TABLE_4 = [
    # e over, e up to, slot, square, round: mm
    (0, 4, 2, 2, 2),
    (4, 6, 10, 5, 5),
    (6, 8, 20, 15, 5),
    (8, 10, 80, 25, 20),
    (10, 12, 100, 80, 80),
    (12, 20, 120, 120, 120),
    (20, 30, 850, 120, 120),
    (30, 40, 850, 200, 120),
    (40, 120, 850, 850, 850),
]


@pytest.mark.parametrize(("over", "to", "slot", "square", "round_"), TABLE_4)
def test_a_step_holds_from_just_over_its_lower_edge_up_to_its_upper_edge(
    over: float, to: float, slot: float, square: float, round_: float
) -> None:
    for opening in (over + 0.001, (over + to) / 2, to):
        assert safety.distance_mm(opening, "slot") == slot
        assert safety.distance_mm(opening, "square") == square
        assert safety.distance_mm(opening, "round") == round_
        assert safety.step(opening) == (over, to)


def test_a_short_slot_of_20_to_30_mm_needs_200_mm_only() -> None:
    assert safety.distance_mm(25, "slot", slot_length_mm=65) == 200
    assert safety.distance_mm(25, "slot", slot_length_mm=65.1) == 850
    assert safety.distance_mm(25, "square", slot_length_mm=65) == 120
    assert safety.distance_mm(35, "slot", slot_length_mm=60) == 850


def test_a_little_coarser_can_cross_a_step() -> None:
    """9.0 mm square needs 25 mm; 9.5 mm with 0.7 mm oversize is 10.2 mm and needs 80 mm."""
    assert safety.distance_mm(9.0, "square") == 25
    assert safety.distance_mm(9.5 + 0.7, "square") == 80


def test_the_table_ends_at_120_mm() -> None:
    assert safety.distance_mm(120, "square") == 850
    assert safety.distance_mm(120.01, "square") is None
    assert safety.step(120.01) is None


def test_another_shape_is_refused() -> None:
    with pytest.raises(ValueError, match="slot, square or round"):
        safety.distance_mm(5, "triangle")
