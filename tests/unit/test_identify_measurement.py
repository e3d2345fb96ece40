"""Measurements as they are written. Conversions: 1 in is 25.4 mm (definition); a count's limit: GUM, 4.3.7."""

from math import sqrt

import pytest

from catalog.errors import InputError
from catalog.search.measured import expanded_of_limit, log_density
from catalog.search.measurement import parse_count, parse_length, parse_magnet
from catalog.search.swatch import parse_swatch


def test_a_count_of_47_spaces_in_20_mm_is_a_pitch_of_0_4255_within_0_0045() -> None:
    """Worked example: 20/47 and half a space of it."""
    count = parse_count("47 in 20 mm")
    assert float(count.pitch_mm) == pytest.approx(0.4255, abs=5e-5)
    assert count.pitch_limit_mm == pytest.approx(0.0045, abs=5e-5)


def test_a_rectangular_limit_counts_1_155_times_itself_at_k_2() -> None:
    """U = 2a/√3: JCGM 100:2008 (GUM), 4.3.7."""
    assert expanded_of_limit(1.0) == pytest.approx(1.1547, abs=5e-5)
    count = parse_count("118 in 50 mm")
    assert count.pitch_expanded_mm == pytest.approx(1.1547 * count.pitch_limit_mm, rel=1e-4)


@pytest.mark.parametrize(
    ("text", "pitch_mm"),
    [
        ("60 in 1 in", 25.4 / 60),
        ("60 per inch", 25.4 / 60),
        ("60/in", 25.4 / 60),
        ("10 per cm", 1.0),
        ("47 spaces over 2 cm", 20 / 47),
        ("47,5 in 20 mm", 20 / 47.5),
        ('20 in 1"', 1.27),
        ("120 in 2 in", 50.8 / 120),
    ],
)
def test_a_count_is_over_any_length(text: str, pitch_mm: float) -> None:
    assert float(parse_count(text).pitch_mm) == pytest.approx(pitch_mm)


def test_48_wires_are_47_spaces_and_that_is_said() -> None:
    count = parse_count("48 wires in 20 mm")
    assert count.spaces == 47
    assert "47 spaces" in count.notes[0]


def test_a_steel_rule_adds_its_own_uncertainty_to_the_count() -> None:
    by_glass, by_rule = parse_count("118 in 50 mm"), parse_count("118 in 50 mm by steel rule")
    expected = sqrt(by_glass.pitch_limit_mm**2 + (0.25 / 50 * 50 / 118) ** 2)
    assert by_rule.pitch_limit_mm == pytest.approx(expected)


@pytest.mark.parametrize(
    ("text", "mm", "plus_minus"),
    [
        ("0.165±0.005 mm", 0.165, 0.005),
        ("0,165 ± 0,005 mm", 0.165, 0.005),
        ("0.165 mm ± 5 µm", 0.165, 0.005),
        ("0.165 mm +/- 3 %", 0.165, 0.00495),
        (".0065±.0002 in", 0.1651, 0.00508),
        ("6.5±0.2 thou", 0.1651, 0.00508),
        ("165±5 um", 0.165, 0.005),
        ("1/4 in ± 0.05 mm", 6.35, 0.05),
    ],
)
def test_a_length_is_read_with_its_plus_minus_in_any_unit(text: str, mm: float, plus_minus: float) -> None:
    found = parse_length(text, "wire")
    assert float(found.value) == pytest.approx(mm)
    assert found.plus_minus == pytest.approx(plus_minus)
    assert not found.is_assumed


def test_without_a_plus_minus_the_instrument_decides_and_is_marked_assumed() -> None:
    micrometer, microscope = parse_length(".0065 in", "wire"), parse_length("0.165 mm optical", "wire")
    assert micrometer.is_assumed
    assert microscope.is_assumed
    assert (micrometer.instrument, microscope.instrument) == ("micrometer", "optical")
    assert microscope.plus_minus < micrometer.plus_minus


def test_a_figure_with_one_digit_can_not_be_surer_than_its_rounding() -> None:
    """Half of 0.1 mm would be 25 % of 0.2 mm; a written decimal stands for at most 2.5 % of itself: 0.005 · 1.155."""
    assert parse_length("0.2 mm", "wire").plus_minus == pytest.approx(0.00577, abs=1e-5)


@pytest.mark.parametrize(
    ("text", "kg_m2"),
    [
        ("1.92 g / 100 cm2", 0.192),
        ("1.92 g per 10 x 10 cm", 0.192),
        ("1.92 g / 100 mm x 100 mm", 0.192),
        ("192 g/m²", 0.192),
        ("0.192 kg/m2", 0.192),
        ("1 g / 1 in2", 0.001 / 0.0254**2),
    ],
)
def test_a_swatch_is_mass_over_area(text: str, kg_m2: float) -> None:
    assert float(parse_swatch(text).value) == pytest.approx(kg_m2)


def test_a_swatch_combines_balance_and_area() -> None:
    """Root of the sum of squares of the relative figures: GUM, 5.1.6."""
    found = parse_swatch("2.00±0.02 g / 100±2 cm2")
    assert found.plus_minus == pytest.approx(0.2 * sqrt(0.01**2 + 0.02**2))
    assert not found.is_assumed


@pytest.mark.parametrize(
    ("text", "column", "words"),
    [
        ("47", 3, "over what length"),
        ("47 in 20", 9, "unit of the length"),
        ("60 mesh", 4, "over what length"),
        ("1,000 in 20 mm", 1, "one or a thousand"),
        ("47 in 20 mm or so", 13, "isn't understood"),
        ("0 in 20 mm", 1, "above 0"),
        ("47 in 1e999 mm", 7, "a number was expected"),
    ],
)
def test_a_count_that_cannot_be_read_says_where_and_why(text: str, column: int, words: str) -> None:
    with pytest.raises(InputError, match=words) as caught:
        parse_count(text)
    assert caught.value.column == column
    assert caught.value.text == text


@pytest.mark.parametrize(
    ("text", "column", "words"),
    [("0.165", 6, "unit is missing"), ("thick", 1, "number"), ("0.1±0.2 mm", 4, "isn't smaller"), ("", 1, "number")],
)
def test_a_wire_that_cannot_be_read_says_where_and_why(text: str, column: int, words: str) -> None:
    with pytest.raises(InputError, match=words) as caught:
        parse_length(text, "wire")
    assert caught.value.column == column


@pytest.mark.parametrize("text", ["1.92 / 100 cm2", "1.92 g", "1.92 g / 100 cm", "1.92 g / 10 cm x 100 mm", "g/m2"])
def test_a_swatch_without_mass_or_area_is_refused(text: str) -> None:
    with pytest.raises(InputError):
        parse_swatch(text)


def test_a_magnet_is_yes_or_no() -> None:
    assert parse_magnet("Yes")
    assert not parse_magnet("no")
    with pytest.raises(InputError):
        parse_magnet("a bit")


@pytest.mark.parametrize(
    ("off", "limit", "sigma"), [(0.3, 0.5, 0.1), (0.7, 0.5, 0.1), (0.1, 0.5, 2.0), (2.5, 0.5, 0.2)]
)
def test_the_density_is_the_convolution_of_the_two(off: float, limit: float, sigma: float) -> None:
    """Against numerical integration by scipy.integrate.quad of scipy.stats.norm over the limit."""
    from scipy.integrate import quad
    from scipy.stats import norm

    expected, _ = quad(lambda t: norm.pdf(off - t, scale=sigma) / (2 * limit), -limit, limit, epsabs=0, epsrel=1e-10)
    assert 2.718281828459045 ** log_density(off, limit, sigma) == pytest.approx(expected, rel=1e-6)


def test_far_out_the_density_still_orders_the_cloths() -> None:
    far, farther = log_density(50.0, 0.5, 0.1), log_density(60.0, 0.5, 0.1)
    assert far > farther > float("-inf")
