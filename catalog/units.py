"""Lengths as written: exact in millimetres, beside the spelling they came from."""

import re
from dataclasses import dataclass
from fractions import Fraction

MM_PER_INCH = Fraction(127, 5)
MM_PER_UNIT: dict[str, Fraction] = {
    "mm": Fraction(1),
    "cm": Fraction(10),
    "m": Fraction(1000),
    "um": Fraction(1, 1000),
    "in": MM_PER_INCH,
    "ft": 12 * MM_PER_INCH,
    "thou": MM_PER_INCH / 1000,
}
LARGEST_ROUNDING = Fraction(25, 1000)  # a written decimal stands for at most ±2.5 % of itself
LARGEST_POWER = 12
LONGEST_NUMBER = 24  # digits; what is longer is no measure of anything


@dataclass(frozen=True, slots=True)
class Length:
    """A length, exact, with the spelling that it came from."""

    mm: Fraction
    """The value in millimetres."""
    half_unit_mm: Fraction = Fraction(0)
    """Half of the last written unit, in millimetres; 0 where counts or vulgar fractions are exact."""
    written: str = ""
    """The spelling, as in the text."""
    span: tuple[int, int] | None = None
    """Where it stands in the text, as offsets [from, to)."""

    @property
    def rounding_mm(self) -> Fraction:
        """What the spelling may be off by, in millimetres: half its last unit, at most 2.5 %."""
        return min(self.half_unit_mm, abs(self.mm) * LARGEST_ROUNDING)


@dataclass(frozen=True, slots=True)
class Number:
    """A number as written, exact."""

    value: Fraction
    half_unit: Fraction
    """Half of the last written unit; 0 for a vulgar fraction."""
    kind: str
    """'integer', 'decimal', 'fraction' or 'grouped': '1,000', a decimal comma or a thousands comma."""
    written: str

    @property
    def digits(self) -> int:
        """Significant digits of the spelling: 2 in '0.0075', 1 in '60', 4 in '0.2582'."""
        plain = re.sub(r"[^\d].*$" if self.kind == "fraction" else r"\D", "", self.written).lstrip("0")
        return len(plain.rstrip("0")) or 1

    @property
    def is_integer(self) -> bool:
        """True where it was written as a whole number."""
        return self.kind == "integer"

    def length(self, unit: str, span: tuple[int, int] | None = None) -> Length:
        """The length of so many of a unit ('mm', 'um', 'in', 'thou', 'cm', 'm', 'ft')."""
        scale = MM_PER_UNIT[unit]
        return Length(self.value * scale, self.half_unit * scale, self.written, span)


MIXED = re.compile(r"(\d+)[ -](\d+)/(\d+)")
VULGAR = re.compile(r"(\d+)/(\d+)")
DECIMAL = re.compile(r"(\d*)[.,](\d+)(?:[eE]([-+]?\d{1,3}))?")
GROUPED = re.compile(r"[1-9]\d{0,2},\d{3}")
THOUSANDS = re.compile(r"[1-9]\d{0,2}(?:,\d{3})+(?:\.\d+)?|[1-9]\d{0,2}(?:\.\d{3})+,\d+")


def parse_number(text: str) -> Number | None:
    """Read '60', '.0075', '0,25', '1/4', '1-1/2', '1 1/2', '5E-02', '1,234.5'; None for anything else.

    '1,000' alone may be one or a thousand: it comes back as 'grouped', with the decimal value.
    """
    if len(text) > LONGEST_NUMBER:
        return None
    if text.isdecimal():
        return Number(Fraction(int(text)), Fraction(1, 2), "integer", text)
    if found := MIXED.fullmatch(text) or VULGAR.fullmatch(text):
        return _vulgar(found, text)
    if GROUPED.fullmatch(text):
        return Number(Fraction(text.replace(",", ".")), Fraction(1, 2000), "grouped", text)
    if THOUSANDS.fullmatch(text):
        return _thousands(text)
    return _decimal(text)


def _vulgar(found: re.Match[str], text: str) -> Number | None:
    *whole, top, bottom = (int(part) for part in found.groups())
    if bottom == 0:
        return None
    return Number(sum(whole) + Fraction(top, bottom), Fraction(0), "fraction", text)


def _thousands(text: str) -> Number:
    point = "." if text.rfind(".") > text.rfind(",") or "." not in text else ","
    plain = text.replace("," if point == "." else ".", "").replace(",", ".")
    decimals = len(plain.partition(".")[2])
    return Number(Fraction(plain), Fraction(1, 2 * 10**decimals), "decimal" if decimals else "integer", text)


def _decimal(text: str) -> Number | None:
    found = DECIMAL.fullmatch(text) or re.fullmatch(r"(\d+)()[eE]([-+]?\d{1,3})", text)
    if not found:
        return None
    whole, decimals, power = found.groups()
    if abs(int(power or 0)) > LARGEST_POWER:
        return None
    scale = Fraction(10) ** (int(power or 0) - len(decimals))
    return Number(int(f"{whole}{decimals}" or 0) * scale, scale / 2, "decimal", text)


def as_thousands(number: Number) -> Number:
    """A grouped number taken with a thousands comma: '1,000' → 1000."""
    return Number(Fraction(number.written.replace(",", "")), Fraction(1, 2), "integer", number.written)


def decimal_text(value: Fraction, most_decimals: int) -> str | None:
    """The exact decimal spelling of *value*, without trailing zeros; None where it needs more decimals."""
    scaled = value * 10**most_decimals
    if scaled.denominator != 1:
        return None
    sign, digits = ("-" if scaled < 0 else ""), f"{abs(int(scaled)):0{most_decimals + 1}d}"
    whole, rest = digits[: len(digits) - most_decimals], digits[len(digits) - most_decimals :].rstrip("0")
    return f"{sign}{whole}.{rest}" if rest else f"{sign}{whole}"
