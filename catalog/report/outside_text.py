"""Text from outside, made fit to be printed: one line that can't steer a screen, a printer or a reader's eye."""

import unicodedata

LONGEST = 200
MARKS_KEPT = 2
"""Combining marks on one letter; more of them only smear over their neighbours."""
UNPRINTABLE = ("Cc", "Cf", "Cs", "Co", "Cn", "Zl", "Zp")


def tame(text: str, longest: int = LONGEST) -> str:
    """One line of *text*: white space becomes a blank, what can't be printed is spelled by its code.

    Control characters, marks of writing direction, joiners and surrogates become '[U+202E]': seen, not obeyed.
    Letters are composed (NFC; never NFKC, which turns '1½' into '11⁄2'). What exceeds *longest* characters is cut
    and says by how much.
    """
    line = unicodedata.normalize("NFC", " ".join(text.split()))
    if len(line) > longest:
        line = f"{line[:longest].rstrip()}… [{len(line) - longest} more characters]"
    return line if line.isascii() and line.isprintable() else "".join(_spelled(line))


def code_of(char: str) -> str:
    """How a sign is named that can't be shown: '[U+202E]'."""
    return f"[U+{ord(char):04X}]"


def _spelled(line: str) -> list[str]:
    spelled: list[str] = []
    marks = 0
    for char in line:
        category = unicodedata.category(char)
        marks = marks + 1 if category in ("Mn", "Me") else 0
        if category in UNPRINTABLE or marks > MARKS_KEPT:
            spelled.append(code_of(char))
        else:
            spelled.append(char)
    return spelled
