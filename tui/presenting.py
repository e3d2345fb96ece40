"""Figures and words on their way to a screen: harmless text, exact widths, units, verdicts by word and symbol."""

import re
import unicodedata
from collections.abc import Mapping, Sequence
from dataclasses import dataclass
from typing import Any

from tui.exit_codes import one_line

Piece = tuple[str, str]
"""(text, ink): the ink's colours are the theme's business."""
Line = Sequence[Piece]

MM_PER_INCH = 25.4
LONGEST = 400
INCH_DECIMALS = 5
FINE_INCH = 0.001
MARKS_KEPT = 2
VARIATIONS = frozenset(map(chr, (*range(0xFE00, 0xFE10), *range(0xE0100, 0xE01F0))))
UNITS = ("both", "inch", "metric")

SHORTER = (
    (r"^([\d.]+) [x×] \1 mesh,? ", r"\1 mesh "),
    (r"^Filter cloth ", ""),
    (r"^Test-sieve cloth ", "sieve "),
    (r" (in|mm), ", " "),
    (r", ", " "),
)
"""What of a name is left out where there is little room, in this order."""

PLAIN: Mapping[int, str] = str.maketrans(
    {
        "×": "x", "²": "2", "³": "3", "±": "+/-", "µ": "u", "μ": "u", "Ø": "dia ", "ø": "dia ", "−": "-", "≈": "~",
        "│": "|", "─": "-", "≥": ">=", "≤": "<=", "″": '"', "′": "'", "½": "1/2", "¼": "1/4", "¾": "3/4",
        "°": " deg", "–": "-",
        "—": "-", "·": "-", "→": "->", "…": "..", "Δ": "d", "√": "sqrt ", "π": "pi", "ρ": "rho",
        "ü": "ue", "ö": "oe", "ä": "ae", "ß": "ss", "›": ">", "▸": ">", "•": "*", "“": '"', "”": '"', "‘": "'",
        "’": "'", "┼": "+", "↑": "^", "↓": "v", "←": "<-", "é": "e", "è": "e", "⁴": "4",
    }
)  # fmt: skip


def harmless(text: str, longest: int = LONGEST) -> str:
    """Text from outside as one line that can't steer a terminal: no control, direction or joining characters.

    At most *longest* characters; at most two combining marks on a letter.
    """
    cut = text if len(text) <= longest else text[: longest - 1] + "…"
    line = one_line(cut)
    if line.isascii():
        return line
    return _few_marks(unicodedata.normalize("NFC", line))


def _few_marks(text: str) -> str:
    kept: list[str] = []
    run = 0
    for char in text:
        is_mark = unicodedata.category(char) in ("Mn", "Me")
        run = run + 1 if is_mark else 0
        if unicodedata.category(char) in ("Cc", "Cf", "Co", "Cs", "Zl", "Zp"):
            kept.append(" ")
        elif run <= MARKS_KEPT and not (is_mark and (not kept or char in VARIATIONS)):
            kept.append(char)
    return "".join(kept)


def shortened(name: str, width: int) -> str:
    """A cloth's name in *width* cells: what goes without saying goes first, then the end."""
    for pattern, shorter in SHORTER:
        if width_of(name) <= width:
            return name
        name = re.sub(pattern, shorter, name)
    return name


def plain(text: str) -> str:
    """The same in ASCII, for terminals and fonts that hold no more."""
    if text.isascii():
        return text
    spelled = text.translate(PLAIN)
    bare = unicodedata.normalize("NFD", spelled)
    return "".join(c for c in bare if not unicodedata.combining(c)).encode("ascii", "replace").decode("ascii")


def width_of(text: str) -> int:
    """Terminal cells that *text* takes."""
    if text.isascii() or max(text) < "\u0300":
        return len(text)
    return sum(_cells(char) for char in text)


def _cells(char: str) -> int:
    if unicodedata.category(char) in ("Mn", "Me"):
        return 0
    return 2 if unicodedata.east_asian_width(char) in ("W", "F") else 1


def fit(text: str, width: int, align: str = "left") -> str:
    """*text* in exactly *width* cells: cut with an ellipsis, or padded left, right or both."""
    if width <= 0:
        return ""
    wide = width_of(text)
    if wide > width:
        text, wide = _cut(text, width - 1) + "…", 0
        wide = width_of(text)
    room = " " * (width - wide)
    if align == "right":
        return room + text
    return text + room


def _cut(text: str, width: int) -> str:
    used = 0
    for index, char in enumerate(text):
        used += _cells(char)
        if used > width:
            return text[:index]
    return text


def wrapped(text: str, width: int, indent: int = 0) -> list[str]:
    """*text* in lines of at most *width* cells, broken at spaces where there are any; later ones indented."""
    lines: list[str] = []
    current = ""
    for word in text.split():
        pad = " " * indent if lines else ""
        room = max(4, width - len(pad))
        while width_of(word) > room:
            if current:
                lines.append(current)
                current = ""
            lines.append((" " * indent if lines else "") + _cut(word, room))
            word = word[len(_cut(word, room)) :]
        if current and width_of(current) + 1 + width_of(word) > width:
            lines.append(current)
            current = " " * indent + word
        else:
            current = f"{current} {word}" if current else (" " * indent if lines else "") + word
    if current.strip():
        lines.append(current)
    return lines or [""]


def phrases(words: Sequence[str], between: str, width: int) -> list[str]:
    """Short phrases in lines of at most *width* cells, none of them broken."""
    lines: list[str] = []
    for word in words:
        joined = f"{lines[-1]}{between}{word}" if lines else word
        if lines and width_of(joined) <= width:
            lines[-1] = joined
        else:
            lines.append(word)
    return lines or [""]


def mm(value: float | None) -> str:
    """Millimetres, four significant digits: '0.2582'; a dash where there is none."""
    return "–" if value is None else significant(value)


def inch(value_mm: float | None) -> str:
    """The same length in inches as the trade writes it, at most five decimals: '.01017'; finer only below .001."""
    if value_mm is None:
        return "–"
    value = value_mm / MM_PER_INCH
    text = significant(value)
    if abs(value) >= FINE_INCH and len(text.partition(".")[2]) > INCH_DECIMALS:
        text = f"{value:.{INCH_DECIMALS}f}".rstrip("0")
    return text[1:] if text.startswith("0.") else text.replace("-0.", "-.", 1)


def significant(value: float, digits: int = 4) -> str:
    """*value* to so many significant digits, never with an exponent."""
    if value == 0:
        return "0"
    from math import floor, log10

    places = max(0, digits - 1 - floor(log10(abs(value))))
    text = f"{value:.{min(places, 9)}f}"
    return text.rstrip("0").rstrip(".") if "." in text else text


def both(value_mm: float | None, units: str = "both") -> str:
    """A length in the units asked for: '0.2582 mm (.01017 in)'."""
    if value_mm is None:
        return "–"
    if units == "inch":
        return f"{inch(value_mm)} in"
    return f"{mm(value_mm)} mm" + (f" ({inch(value_mm)} in)" if units == "both" else "")


def signed(value: float | None, unit: str = "%", digits: int = 1) -> str:
    """A difference with its sign, a true minus: '−2.2%'; '=' where it rounds to nothing."""
    if value is None:
        return ""
    text = f"{value:+.{digits}f}"
    if float(text) == 0:
        return "="
    return text.replace("-", "−") + unit


def number(value: float | None, digits: int = 1) -> str:
    """A figure with so many decimals; a dash where there is none."""
    return "–" if value is None else f"{value:.{digits}f}"


KG_M2_TO_LB_FT2 = 0.2048161436225217  # 0.3048² / 0.45359237, exact by definition of foot and pound


def mass(value_kg_m2: float | None, units: str = "both") -> str:
    """Mass per area: '0.83 kg/m² (0.170 lb/ft²)'."""
    if value_kg_m2 is None:
        return "–"
    pounds = f"{significant(value_kg_m2 * KG_M2_TO_LB_FT2, 3)} lb/ft²"
    if units == "inch":
        return pounds
    return f"{significant(value_kg_m2, 3)} kg/m²" + (f" ({pounds})" if units == "both" else "")


@dataclass(frozen=True, slots=True)
class Seal:
    """How a verdict shows: symbol, word, ink. Never by colour alone."""

    symbol: str
    ascii_symbol: str
    word: str
    ink: str


# keyed by the verdict's code, so that the start needs none of the search
SEALS: Mapping[str, Seal] = {
    "same": Seal("=", "=", "same", "good"),
    "interchangeable": Seal("≈", "~", "interchangeable", "good"),
    "near-safe": Seal("+", "+", "near, safe side", "near"),
    "near-risk": Seal("!", "!", "near, risk side", "risk"),
    "cannot-say": Seal("?", "?", "cannot say", "ask"),
    "not-equivalent": Seal("×", "x", "not equivalent", "bad"),
}

ROLES: Mapping[str, tuple[str, str]] = {
    "count": ("count", "count"),
    "wire": ("wire", "wire"),
    "aperture": ("aperture", "aperture"),
    "pitch": ("pitch", "count"),
    "alloy": ("alloy", "alloy"),
    "weave": ("weave", "weave"),
    "form": ("size", "form"),
    "limit": ("limit", "limit"),
    "unknown": ("not understood", "bad"),
}


def role_words(role: str) -> Piece:
    """The label of a word's part in a callout, and its ink."""
    return ROLES.get(role, (role.replace("_", " ").replace("-", " "), "other"))


def alloy_words(alloy_id: str | None) -> str:
    """An alloy with its number: '316L (1.4404)'; 'not on record' where there is none."""
    if alloy_id is None:
        return "not on record"
    from catalog.reference import alloys

    known = alloys.alloy(alloy_id)
    numbers = known.en_numbers if known else ()
    return f"{alloy_id} ({numbers[0]})" if numbers else harmless(alloy_id)


def figure_words(key: str, value: Any, units: str) -> str:
    """A limited figure in words, by the key of the JSON contract."""
    if key.endswith("_mm"):
        return both(value, units)
    if key == "open_area_pct":
        return f"{significant(value)} %"
    return mass(value, units) if key == "mass_kg_m2" else significant(value)
