"""Signs that stand for other signs: what drawings, keyboards, scanners and wrong encodings make of a callout.

Numbers are never normalised as text (a raised ½ or a ² would join the digits beside it); each sign has its line.
"""

DIAMETER = "Ø"

PLAIN_SIGNS: dict[str, str] = {
    **dict.fromkeys("×✕✖⨯⨉╳∗", "x"),
    **dict.fromkeys("″“”„˝ʺ〃＂", '"'),
    **dict.fromkeys("′’‘ʹ´`ʼ＇", "'"),
    **dict.fromkeys("–—−‒―‐‑⁃", "-"),
    **dict.fromkeys("µμ", "u"),
    **dict.fromkeys("⁄∕／", "/"),
    **dict.fromkeys("⌀∅øφΦϕ", DIAMETER),
    **dict.fromkeys("≧⩾", "≥"),
    **dict.fromkeys("≦⩽", "≤"),
    **dict.fromkeys("⁰₀", "0"),
    **dict.fromkeys("²₂", "2"),
    **dict.fromkeys("³₃", "3"),
    **dict.fromkeys("\u00a0\u2000\u2001\u2002\u2003\u2004\u2005\u2006\u2007\u2008\u2009\u200a\u202f\u205f\u3000", " "),
    **dict.fromkeys("\u00ad\u200b\u200c\u200d\u2060\ufeff\u200e\u200f", ""),
    **{chr(0xFF01 + i): chr(0x21 + i) for i in range(0x5E) if chr(0xFF01 + i) not in "／＂＇"},
    "ß": "ss", "œ": "oe", "æ": "ae", "㎜": "mm", "㎛": "um", "㎝": "cm", "㎡": "m2", "№": "No.", "≈": "~", "，": ",",
}  # fmt: skip
"""One sign → what it means. Fullwidth letters and digits are plain ones."""

VULGAR: dict[str, str] = {
    "¼": "1/4", "½": "1/2", "¾": "3/4", "⅛": "1/8", "⅜": "3/8", "⅝": "5/8", "⅞": "7/8", "⅓": "1/3", "⅔": "2/3",
}  # fmt: skip
"""Vulgar fractions in one sign. After a digit they make a mixed number: 1½ is 1 1/2."""

RAISED_POINTS = "·∙˙⋅•"
"""A point set high, as British drawings have it; only beside a digit."""

SECOND_HAND = "Ø×µμ½¼¾±²³°–—″′’‘“”≥≤·äöüÄÖÜßéèêàáâíìóòôúùûñçøœ\u00a0⌀"
"""What is repaired where UTF-8 was read as Windows-1252: Ã˜ for Ø, Ã— for ×, Ã¶ for ö."""


def _misread(char: str) -> str | None:
    """How *char* looks once its UTF-8 bytes are read as Windows-1252; None where it looks the same."""
    letters = [_windows(byte) for byte in char.encode("utf-8")]
    return "".join(letters) if len(letters) > 1 else None


def _windows(byte: int) -> str:
    try:
        return bytes([byte]).decode("cp1252")
    except UnicodeDecodeError:
        return chr(byte)


MOJIBAKE: dict[str, str] = {seen: char for char in SECOND_HAND if (seen := _misread(char))}
"""Misread sequence → the sign that was meant."""
