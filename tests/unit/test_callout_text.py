"""Numbers exact as written, and texts repaired with every character's place kept."""

from fractions import Fraction

import pytest

from catalog.callout.text.repair import repair
from catalog.units import MM_PER_INCH, Length, decimal_text, parse_number


@pytest.mark.parametrize(
    ("text", "value", "half"),
    [
        ("60", Fraction(60), Fraction(1, 2)),
        (".0075", Fraction(75, 10_000), Fraction(1, 20_000)),
        ("0.0075", Fraction(75, 10_000), Fraction(1, 20_000)),
        ("0,25", Fraction(1, 4), Fraction(1, 200)),
        ("1/4", Fraction(1, 4), Fraction(0)),
        ("1-1/2", Fraction(3, 2), Fraction(0)),
        ("2 1/2", Fraction(5, 2), Fraction(0)),
        ("5E-02", Fraction(1, 20), Fraction(1, 200)),
        ("1,234.5", Fraction(12_345, 10), Fraction(1, 20)),
        ("1.234,5", Fraction(12_345, 10), Fraction(1, 20)),
    ],
)
def test_a_number_is_exact_and_knows_its_last_unit(text: str, value: Fraction, half: Fraction) -> None:
    number = parse_number(text)
    assert number is not None
    assert (number.value, number.half_unit) == (value, half)


@pytest.mark.parametrize("text", ["", "x", "1/0", "1.2.3", "--1", "1e999", "9" * 40, "0x10", "½"])
def test_what_is_no_number_is_none(text: str) -> None:
    assert parse_number(text) is None


def test_an_inch_is_exactly_25_4_millimetres() -> None:
    number = parse_number("0.0065")
    assert number is not None
    assert number.length("in").mm == Fraction(1651, 10_000)
    assert Fraction(254, 10) == MM_PER_INCH


def test_a_written_decimal_stands_for_half_its_last_unit_but_at_most_two_and_a_half_percent() -> None:
    assert Length(Fraction(1, 4), Fraction(1, 200)).rounding_mm == Fraction(1, 200)
    assert Length(Fraction(1, 10), Fraction(1, 20)).rounding_mm == Fraction(25, 10_000)


def test_an_exact_spelling_has_no_more_decimals_than_it_needs() -> None:
    assert decimal_text(Fraction(1651, 10_000), 5) == "0.1651"
    assert decimal_text(Fraction(60), 5) == "60"
    assert decimal_text(MM_PER_INCH / 60, 6) is None


@pytest.mark.parametrize(
    ("text", "meant"),
    [
        ("60 rnesh .OO75 SS", "60 rnesh .0075 SS"),
        ("6O mesh x .0075 3l6", "60 mesh x .0075 316"),
        ("l0 mesh .025 T3O4", "10 mesh .025 T304"),
        ("lOO mesh", "100 mesh"),
        ("316l", "316l"),
        ("10 off", "10 off"),
        ("3.1B", "3.1B"),
        ("Ã˜ 0.4 20Ã—20", "Ø 0.4 20×20"),
        ("1¼'' x ⅜″", '1 1/4" x 3/8"'),
        ("250 µm / 160 μm", "250 um / 160 um"),
        ("0·0075 ·25", "0.0075 .25"),
        ("12Х18Н10Т 20х20", "12Х18Н10Т 20x20"),
        ("1'220 mm", "1220 mm"),
        ("60 >= 5 +/- 1", "60 ≥ 5 ± 1"),
        ("a\x00b\x1b[31m", "a b [31m"),
    ],
)
def test_a_text_is_mended_sign_by_sign(text: str, meant: str) -> None:
    repaired = repair(text)
    assert repaired.text.replace("×", "x") == meant.replace("×", "x")
    for at in range(len(repaired.text) + 1):
        assert 0 <= repaired.place(at) <= len(text)
