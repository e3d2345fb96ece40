"""What is easily turned round is asked, never answered: worked out by hand."""

import pytest

from catalog.callout import read
from catalog.callout.reading import Status


@pytest.mark.parametrize(
    "text",
    [
        "no opening greater than 6 mm",
        "without openings larger than 2 mm",
        "no wire thinner than 0.3 mm",
        "shall not be coarser than 20 mesh",
        "at least 100 holes per square inch",
        "max 144 holes/cm²",
        "larger than 20 mesh",
        "60 mesh .0065 304 max 1 kg/m2",
        "14 mesh .020 warp .018 weft 304",
    ],
)
def test_a_text_that_is_easily_turned_round_is_matched_with_nothing(text: str) -> None:
    understood = read(text)
    assert understood.status is Status.ASK
    assert understood.problems
    assert not understood.surviving


@pytest.mark.parametrize("text", ["1 x 5 mm 304", "800 x 165 dutch twill 0.07/0.05 mm 316L"])
def test_one_way_to_take_it_is_asked(text: str) -> None:
    understood = read(text)
    assert understood.status is Status.ASK
    assert understood.question


@pytest.mark.parametrize(
    ("text", "bound"),
    [
        ("not finer than 40 mesh", (None, 40.0)),
        ("no finer than 40 mesh", (None, 40.0)),
        ("at least 30 by 30", (30.0, None)),
    ],
)
def test_the_plain_forms_are_read(text: str, bound: tuple[float | None, float | None]) -> None:
    understood = read(text)
    assert understood.status is Status.LIMITS
    assert understood.surviving[0].limits["count_per_in"] == bound
