"""Text and figures on their way to the screen."""

import pytest

from catalog.search.candidate import Verdict
from tui.commands import COMMANDS, key_table
from tui.presenting import (
    KG_M2_TO_LB_FT2,
    SEALS,
    fit,
    harmless,
    inch,
    mm,
    phrases,
    plain,
    signed,
    significant,
    width_of,
    wrapped,
)
from tui.widgets.inks import DARK, LIGHT


@pytest.mark.parametrize(
    "text",
    [
        "a\x1b[31mred",
        "a\rb",
        "a\u202eb",
        "a\u2066b\u2069",
        "a\u200bb",
        "\x9b31m",
        "a\nb",
        "a\udce9b",
        "\x07\0",
        "a\ufe0fb",
    ],
)
def test_nothing_that_steers_a_terminal_gets_through(text: str) -> None:
    shown = harmless(text)
    assert all(char.isprintable() for char in shown)
    assert not set(shown) & set("\u202e\u2066\u2069\u200b\ufe0f")


def test_a_name_of_ten_thousand_characters_is_cut() -> None:
    assert len(harmless("x" * 10_000)) <= 400


def test_piled_up_accents_are_kept_to_two() -> None:
    assert width_of(harmless("a" + "\u0323" * 50)) == 1
    assert len(harmless("a" + "\u0323" * 50)) <= 3


@pytest.mark.parametrize("text", ["short", "exactly ten", "wide 金網 cloth", "金網金網金網", "e\u0301tamine", ""])
@pytest.mark.parametrize("width", [1, 5, 6, 10, 11])
def test_a_cell_is_exactly_as_wide_as_asked(text: str, width: int) -> None:
    from rich.cells import cell_len

    assert cell_len(fit(text, width)) == width
    assert cell_len(fit(text, width, "right")) == width


def test_lines_are_broken_at_spaces_and_never_too_long() -> None:
    lines = wrapped("aperture 0.2446 mm is within tolerance " + "x" * 50, 20, 2)
    assert all(width_of(line) <= 20 for line in lines)
    assert "".join(lines).replace(" ", "").endswith("x" * 50)


def test_phrases_are_not_broken() -> None:
    words = ["for retain", "alloy same", "on the rack"]
    assert phrases(words, " · ", 24) == ["for retain · alloy same", "on the rack"]


def test_inches_are_written_as_the_trade_writes_them() -> None:
    # 25.4 mm to the inch by definition
    assert inch(0.1651) == ".0065"
    assert inch(25.4) == "1"
    assert inch(0.25) == ".00984"
    assert inch(0.02032) == ".0008"
    assert inch(None) == "–"


def test_lengths_keep_four_digits_and_no_exponent() -> None:
    assert mm(0.0204) == "0.0204"
    assert mm(0.000123456) == "0.0001235"
    assert significant(1234567) == "1234567"
    assert mm(0.25820) == "0.2582"


def test_a_difference_has_a_true_minus_or_an_equals_sign() -> None:
    assert signed(-2.16) == "−2.2%"
    assert signed(3.3) == "+3.3%"
    assert signed(0.01) == "="
    assert signed(-0.04) == "="
    assert signed(None) == ""


def test_a_kilogram_a_square_metre_in_pounds_a_square_foot() -> None:
    # pound 0.45359237 kg and foot 0.3048 m by international agreement (1959)
    assert pytest.approx(0.3048**2 / 0.45359237, rel=1e-12) == KG_M2_TO_LB_FT2


def test_every_verdict_has_its_own_sign_and_word_in_both_alphabets() -> None:
    assert set(SEALS) == {verdict.value for verdict in Verdict}
    for field in ("symbol", "ascii_symbol", "word"):
        assert len({getattr(seal, field) for seal in SEALS.values()}) == len(SEALS)
    assert all(seal.ascii_symbol.isascii() for seal in SEALS.values())


def test_plain_text_is_ascii_whatever_comes_in() -> None:
    assert plain("0,25 µm ± ½ × 3 ″ ≥ Ø 350 Büchse 金") == '0,25 um +/- 1/2 x 3 " >= dia  350 Buechse ?'


def _luminance(colour: str) -> float:
    """Relative luminance, WCAG 2.1."""
    parts = [int(colour[i : i + 2], 16) / 255 for i in (1, 3, 5)]
    linear = [p / 12.92 if p <= 0.04045 else ((p + 0.055) / 1.055) ** 2.4 for p in parts]
    return 0.2126 * linear[0] + 0.7152 * linear[1] + 0.0722 * linear[2]


@pytest.mark.parametrize("table", [DARK, LIGHT], ids=["dark", "light"])
@pytest.mark.parametrize("ground", ["paper", "panel", "cursor"])
def test_every_ink_can_be_read_on_every_ground(table: dict[str, str], ground: str) -> None:
    # contrast of 4.5 : 1, WCAG 2.1 success criterion 1.4.3
    for name, colour in table.items():
        if name in ("paper", "panel", "cursor", "line"):
            continue
        light, dark = sorted((_luminance(colour), _luminance(table[ground])), reverse=True)
        assert (light + 0.05) / (dark + 0.05) >= 4.5, name


def test_no_two_commands_of_a_place_share_a_key() -> None:
    from tui.commands import EVERYWHERE, LIST, PLACES, at

    for place in PLACES:
        keys = [key for command in at(EVERYWHERE, LIST, place) for key in command.keys]
        assert len(keys) == len(set(keys)), sorted(k for k in keys if keys.count(k) > 1)


def test_nothing_is_only_on_ctrl() -> None:
    assert all(any("ctrl" not in key for key in command.keys) for command in COMMANDS)


def test_the_readme_table_has_every_command() -> None:
    table = "\n".join(key_table())
    assert all(command.help in table for command in COMMANDS)
