"""A size as it comes together, in millimetres."""

import re
from fractions import Fraction

from catalog.callout.reading import Form
from catalog.callout.rules.draft import Draft
from catalog.callout.text.items import Item
from catalog.units import MM_PER_UNIT

WIDEST_ROLL_MM = 4000
LEAST_SIZE_MM = 100
LEAST_SIDE_MM = 25
THOUSANDS = re.compile(r"[1-9]\d{0,2}[.,]\d{3}")
"""A point or comma before three digits, which in a size divides thousands."""
INCH_WIDTHS = range(10, 121)
FEET_LENGTHS = (25, 30, 50, 75, 100, 150, 200, 300)
FORM_UNITS = ("ft", "m", "M")


class Size:
    """The parts of a form as they come in."""

    def __init__(self) -> None:
        self.kind: str | None = None
        self.width: Fraction | None = None
        self.length: Fraction | None = None
        self.diameter: Fraction | None = None
        self.quantity: int | None = None
        self.area: float | None = None

    def pair(self, one: Fraction, other: Fraction) -> None:
        """Width and length; each only where it isn't known yet."""
        self.width = self.width if self.width is not None else one
        self.length = self.length if self.length is not None else other

    def form(self, draft: Draft) -> Form | None:
        """The form, or None where nothing of it was said."""
        words = draft.terms("form")
        for word in words:
            word.taken = "form"
            self.kind = self.kind or word.senses["form"]
        mm = [None if v is None else round(float(v), 6) for v in (self.width, self.length, self.diameter)]
        if all(v is None for v in (*mm, self.quantity, self.area)):
            return Form(kind=self.kind) if self.kind else None
        return Form(self.kind, mm[0], mm[1], mm[2], self.quantity, self.area)


def size_mm(number: Item, unit: str | None = None) -> Fraction:
    """A size in mm; '1,000 mm' and '1.220 mm' are thousands, since no roll is a millimetre wide."""
    assert number.number
    value = number.number
    own = "m" if number.unit == "M" else number.unit
    scale = MM_PER_UNIT.get(own or unit or "mm", Fraction(1))
    in_thousands = value.kind == "grouped" and number.unit in ("ft", "in")
    if in_thousands or (scale == 1 and value.value < LEAST_SIDE_MM and THOUSANDS.fullmatch(value.written)):
        return value.value * 1000 * scale
    return value.value * scale
