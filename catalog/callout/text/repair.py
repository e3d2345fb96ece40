"""The text as it was meant, every character with its place in the text as it came."""

import re
from dataclasses import dataclass

from catalog.callout.text.ocr import DAMAGE, mended
from catalog.callout.text.signs import MOJIBAKE, PLAIN_SIGNS, RAISED_POINTS, VULGAR

STEEL_GOST = r"\d{2}[ХX]\d{1,2}[НH]\d{0,2}[A-ZА-Я]*\d*[A-ZА-Я]*"

REPAIRS = re.compile(
    "|".join(
        (
            f"(?P<keep>{STEEL_GOST})",
            f"(?P<misread>{'|'.join(re.escape(seen) for seen in sorted(MOJIBAKE, key=len, reverse=True))})",
            f"(?P<vulgar>[{''.join(VULGAR)}])",
            rf"(?P<raised>[{RAISED_POINTS}](?=\d))",
            r"(?P<times>(?<=[\d\s\"'])[хХ](?=\s*[\d.,]))",
            r"(?P<star>(?<=[\d\s\"'m])\*(?=\s*[\d.,]))",
            r"(?P<twice>''|‘‘|’’|′′)",
            r"(?P<about>\+\s?/\s?[-−–]|\+-)",
            r"(?P<swiss>(?<=\d)['’](?=\d{3}(?![\d\"'])))",
            r"(?P<control>[\x00-\x08\x0b\x0c\x0e-\x1f\x7f-\x84\x86-\x9f\u2028\u2029\ud800-\udfff])",
            r"(?P<compare>[<>=]=|=[<>])",
            f"(?P<damage>{DAMAGE})",
            f"(?P<sign>[{re.escape(''.join(PLAIN_SIGNS))}])",
        )
    )
)
COMPARE = {">=": "≥", "=>": "≥", "<=": "≤", "=<": "≤", "==": "="}


@dataclass(frozen=True, slots=True)
class Repaired:
    """A text made readable."""

    text: str
    places: tuple[int, ...] | None
    """For each character its offset in the original, and the original's length at the end; None: the same."""
    notes: tuple[str, ...] = ()
    """What was taken for something else, beyond signs that have one meaning."""

    def place(self, offset: int) -> int:
        """The offset in the original text."""
        return offset if self.places is None else self.places[offset]

    def span(self, start: int, end: int) -> tuple[int, int]:
        """The stretch of the original text that [start, end) came from."""
        if self.places is None:
            return start, end
        return self.places[start], max(self.places[end], self.places[max(start, end - 1)] + 1)


def repair(text: str) -> Repaired:
    """Undo wrong encodings, put one sign for each meaning, mend digits that a scanner took for letters."""
    parts: list[str] = []
    places: list[int] = []
    notes: dict[str, None] = {}
    done = 0
    for found in REPAIRS.finditer(text):
        meant = _meant(found, text, notes)
        if meant is None:
            continue
        parts += (text[done : found.start()], meant)
        places += range(done, found.start())
        places += _spread(found.start(), found.end(), len(meant))
        done = found.end()
    if not parts:
        return Repaired(text, None)
    parts.append(text[done:])
    places += range(done, len(text) + 1)
    return Repaired("".join(parts), tuple(places), tuple(notes))


def _spread(start: int, end: int, length: int) -> list[int]:
    """Places for *length* characters that came from [start, end)."""
    return [min(start + i, end - 1) for i in range(length)]


def _meant(found: re.Match[str], text: str, notes: dict[str, None]) -> str | None:
    kind, seen = str(found.lastgroup), found.group()
    if kind == "misread":
        meant = MOJIBAKE[seen]
        notes[f"'{seen}' was read as '{meant}' (wrong encoding)"] = None
        return VULGAR.get(meant) or PLAIN_SIGNS.get(meant, "." if meant == "·" else meant)
    if kind == "damage":
        return _mend(seen, notes)
    if kind == "vulgar":
        before, after = text[found.start() - 1 : found.start()], text[found.end() : found.end() + 1]
        return (" " if before.isdecimal() else "") + VULGAR[seen] + (" " if after.isdecimal() else "")
    if kind == "sign":
        return PLAIN_SIGNS[seen]
    fixed = {"raised": ".", "times": "x", "star": "x", "twice": '"', "about": "±", "swiss": "", "control": " "}
    return COMPARE.get(seen) if kind == "compare" else fixed.get(kind)


def _mend(seen: str, notes: dict[str, None]) -> str | None:
    meant = mended(seen)
    if meant is None or meant == seen:
        return None
    notes[f"'{seen}' was read as '{meant}' (letters and digits look alike)"] = None
    return meant
