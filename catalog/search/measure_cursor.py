"""Where one stands in a written measurement: takes numbers, units, ±, instruments, or complains with the column."""

import re
from dataclasses import dataclass
from fractions import Fraction

from catalog.errors import InputError
from catalog.units import Number, parse_number

SPELLINGS = {
    "mm": "mm", "cm": "cm", "m": "m", "µm": "um", "μm": "um", "um": "um", "micron": "um", "microns": "um",
    "in": "in", "in.": "in", "inch": "in", "inches": "in", '"': "in", "″": "in", "''": "in",
    "thou": "thou", "mil": "thou", "mils": "thou",
}  # fmt: skip
TOOLS = {
    "micrometer": "micrometer", "micrometre": "micrometer", "mic": "micrometer", "optical": "optical",
    "microscope": "optical", "calliper": "calliper", "callipers": "calliper", "caliper": "calliper",
    "calipers": "calliper", "steel rule": "steel rule", "rule": "steel rule", "ruler": "steel rule",
}  # fmt: skip

NUMBER = re.compile(r"\d+[ -]\d+/\d+|\d+/\d+|(?:\d+(?:[.,]\d+)*|[.,]\d+)(?:[eE][-+]?\d{1,3})?")
PLUS_MINUS = re.compile(r"±|\+/-|\+-|\+/−")
PERCENT = re.compile(r"%")
UNIT = re.compile(r"(?:mm|cm|µm|μm|um|microns?|inch(?:es)?|in\.|in|thou|mils?|m|\"|″|'')(?![a-z²2])", re.IGNORECASE)
TOOL = re.compile(rf"(?:by\s+|with\s+)?\(?\s*(?:a\s+)?({'|'.join(sorted(TOOLS, key=len, reverse=True))})\b\s*\)?", re.I)
LEAST, MOST = Fraction(1, 10**9), Fraction(10**9)


@dataclass(frozen=True, slots=True)
class PlusMinus:
    """What was written behind ±."""

    number: Number | None
    is_percent: bool = False
    unit: str | None = None

    def of(self, value: Fraction, scale: Fraction) -> Fraction | None:
        """The ± of *value*, in the value's unit; *scale* is the unit that a bare number counts in."""
        if self.number is None:
            return None
        return value * self.number.value / 100 if self.is_percent else self.number.value * scale


class Cursor:
    """A place in a text; takes what comes next, or complains about where it stands."""

    def __init__(self, text: str, what: str, example: str) -> None:
        self.text, self.what, self.example, self.at = text, what, example, 0
        self._skip()

    def _skip(self) -> None:
        while self.at < len(self.text) and self.text[self.at].isspace():
            self.at += 1

    def take(self, pattern: re.Pattern[str]) -> str | None:
        """What *pattern* finds here, else None."""
        found = pattern.match(self.text, self.at)
        if not found:
            return None
        self.at = found.end()
        self._skip()
        return found[0]

    def number(self) -> Number:
        """A number above 0."""
        start = self.at
        written = self.take(NUMBER)
        number = parse_number(written) if written else None
        if number is None:
            raise self.complaint("a number was expected here", start)
        if number.kind == "grouped":
            raise self.complaint(f"{number.written} may be one or a thousand: write 1000 or 1.0", start)
        if number.value <= 0:
            raise self.complaint("a number above 0 was expected here", start)
        if not LEAST <= number.value <= MOST:
            raise self.complaint("nobody measures such a figure", start)
        return number

    def unit(self) -> str | None:
        """A unit of length, by its key in the table of units."""
        written = self.take(UNIT)
        return SPELLINGS[written.lower()] if written else None

    def plus_minus(self) -> "PlusMinus":
        """What stands behind ±; nothing where there is no such sign."""
        if self.take(PLUS_MINUS) is None:
            return PlusMinus(None)
        number = self.number()
        return PlusMinus(number, True) if self.take(PERCENT) else PlusMinus(number, False, self.unit())

    def tool(self) -> str | None:
        """An instrument, by its house name."""
        found = TOOL.match(self.text, self.at)
        if not found or not self.take(TOOL):
            return None
        return TOOLS[" ".join(found[1].lower().split())]

    def end(self) -> None:
        """Complain about anything that is left."""
        if self.at < len(self.text):
            raise self.complaint(f"{self.text[self.at :]!r} isn't understood")

    def complaint(self, why: str, at: int | None = None) -> InputError:
        """The error that quotes the text, says what was expected, and gives an example."""
        column = (self.at if at is None else at) + 1
        message = f"The {self.what} {self.text!r}: {why}. Written like {self.example}."
        return InputError(message, "E_NOT_UNDERSTOOD", column, self.text)
