"""Letters for PDF pages: an embedded font, and what is printed where it has no glyph, so that nothing goes black.

The font ships within the PDF library and covers Latin with the signs of the trade (µ × ± ² Ø ≤ ≥ −).
"""

import unicodedata
from collections.abc import Mapping
from functools import cache
from itertools import groupby
from pathlib import Path

REGULAR, BOLD = "Vera", "VeraBd"
SUBSTITUTES: Mapping[str, str] = {
    "μ": "µ", "Δ": "∆", "″": '"', "′": "'", "→": "->", "←": "<-", "⌀": "Ø", "∅": "Ø", "‐": "-", "‑": "-", "‒": "–",
    "ρ": "rho", "⅛": "1/8", "⅜": "3/8", "⅝": "5/8", "⅞": "7/8", "Σ": "∑",
}  # fmt: skip
CYRILLIC = (
    "а:a б:b в:v г:g д:d е:e ё:yo ж:zh з:z и:i й:y к:k л:l м:m н:n о:o п:p р:r с:s т:t у:u ф:f х:kh ц:ts ч:ch "
    "ш:sh щ:shch ъ:” ы:y ь:’ э:e ю:yu я:ya і:i ї:yi є:ye ґ:g"
)
PAIRS = [pair.split(":") for pair in CYRILLIC.split()]
LATIN: Mapping[str, str] = {**dict(PAIRS), **{one.upper(): latin.capitalize() for one, latin in PAIRS}}
"""Cyrillic letters in Latin ones, as is customary in English."""
NOTE = (
    "Letters that this page's font lacks are transliterated or spelled by their code; the sheet as HTML or Markdown "
    "carries them as they are."
)


def register() -> None:
    """Make the two fonts known to the PDF library; again is harmless."""
    from reportlab.pdfbase import pdfmetrics  # type: ignore[import-untyped]
    from reportlab.pdfbase.ttfonts import TTFont  # type: ignore[import-untyped]

    for name in (REGULAR, BOLD):
        if name not in pdfmetrics.getRegisteredFontNames():
            pdfmetrics.registerFont(TTFont(name, _file(name)))


@cache
def covered() -> frozenset[str]:
    """The signs that both fonts have a glyph for."""
    from reportlab.pdfbase.ttfonts import TTFont

    glyphs = [TTFont(name, _file(name)).face.charToGlyph for name in (REGULAR, BOLD)]
    return frozenset(chr(code) for code in glyphs[0] if code in glyphs[1] and code >= 0x20)


def printable(text: str) -> str:
    """*text* in letters that the font has: as it is, else a plain twin, else Latin letters, else '[U+6F22 U+5B57]'."""
    if text.isascii():
        return text
    known = covered()
    parts = [(char, _in_latin(char, known)) for char in unicodedata.normalize("NFC", text)]
    printed = []
    for is_known, run in groupby(parts, key=lambda part: part[1] is not None):
        members = list(run)
        if is_known:
            printed.append("".join(latin or "" for _, latin in members))
        else:
            printed.append(f"[{' '.join(f'U+{ord(char):04X}' for char, _ in members)}]")
    return "".join(printed)


def _in_latin(char: str, known: frozenset[str]) -> str | None:
    if char in known:
        return char
    if twin := SUBSTITUTES.get(char) or LATIN.get(char):
        return twin
    plain = unicodedata.normalize("NFKD", char) if unicodedata.category(char)[0] in "LN" else char
    letters = "".join(part for part in plain if not unicodedata.combining(part))
    return letters if letters != char and letters and all(part in known for part in letters) else None


@cache
def _file(name: str) -> str:
    """Where the font lies within the library, whatever the search path says."""
    import reportlab  # type: ignore[import-untyped]

    return str(Path(reportlab.__file__).parent / "fonts" / f"{name}.ttf")
