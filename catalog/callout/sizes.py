"""Rules for what is ordered: rolls, panels, discs, width and length, pieces, square metres."""

import re
from fractions import Fraction

from catalog.callout.draft import Draft
from catalog.callout.items import Item
from catalog.callout.measures import peek
from catalog.callout.reading import Form
from catalog.callout.structure import is_times
from catalog.units import MM_PER_UNIT

WIDEST_ROLL_MM = 4000
LEAST_SIZE_MM = 100
LEAST_SIDE_MM = 25
THOUSANDS = re.compile(r"[1-9]\d{0,2}[.,]\d{3}")
"""A point or comma before three digits, which in a size divides thousands."""
INCH_WIDTHS = range(10, 121)
FEET_LENGTHS = (25, 30, 50, 75, 100, 150, 200, 300)
FORM_UNITS = ("ft", "m", "M")
QUANTITY_WORDS = ("qty", "quantity", "menge", "quant", "cantidad", "quantite")
SQUARE_FOOT_M2 = Fraction(9290304, 100000000)


def sizes(draft: Draft) -> None:
    """Take out of the numbers what is a size or a number of pieces."""
    found = _Size()
    for rule in (_quantities, _areas, _named_sizes, _products_of_sizes, _beside_goods, _single_sizes):
        rule(draft, found)
    draft.form = found.form(draft)


class _Size:
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
    scale = MM_PER_UNIT[{"M": "m"}.get(number.unit or "", number.unit) or unit or "mm"]
    in_thousands = value.kind == "grouped" and number.unit in ("ft", "in")
    if in_thousands or (scale == 1 and value.value < LEAST_SIDE_MM and THOUSANDS.fullmatch(value.written)):
        return value.value * 1000 * scale
    return value.value * scale


def _quantities(draft: Draft, size: _Size) -> None:
    """'6 pcs', '2 rolls', '1 off', 'qty 3', '3 x discs': a product behind them is their size."""
    for number in draft.numbers():
        if number.unit == "pieces" and number.number:
            number.taken, size.kind = "form", number.system
            size.quantity = int(number.number.value)
    for word in draft.terms("form"):
        at = word.at
        before = peek(draft.items, at - 1)
        if word.text.lower() in QUANTITY_WORDS:
            _take_quantity(size, next((i for i in draft.items[at + 1 : at + 4] if i.is_number), None))
        elif before is not None and is_times(before) and _take_quantity(size, peek(draft.items, at - 2)):
            before.taken = "form"


def _take_quantity(size: _Size, number: Item | None) -> bool:
    if number is None or not number.is_count_like or not number.number or number.taken or number.slot:
        return False
    number.taken, size.quantity = "form", int(number.number.value)
    return True


def _areas(draft: Draft, size: _Size) -> None:
    """'10 m²' is an amount of cloth."""
    for number in draft.numbers():
        if number.unit in ("m2", "ft2") and number.number:
            number.taken = "form"
            size.area = float(number.number.value * (1 if number.unit == "m2" else SQUARE_FOOT_M2))


def _named_sizes(draft: Draft, size: _Size) -> None:
    """'36\" wide', 'L=1,22 m', '1000 mm breit'; laize and L in French is the width; without a unit by its value."""
    for number in draft.numbers():
        if number.slot not in ("width", "length") or not number.number:
            continue
        unit = number.unit or _guessed_unit(draft, number)
        mm = size_mm(number, unit)
        is_width = number.slot == "width" or (_is_laize(draft, number) and mm <= WIDEST_ROLL_MM)
        number.taken = "form"
        if number.bound:
            draft.note(f"{number.slot} {number.bound}: {float(mm):g} mm")
        if is_width and size.width is None:
            size.width = mm
        elif not is_width and size.length is None:
            size.length = mm


def _is_laize(draft: Draft, number: Item) -> bool:
    """True where L is the French 'laize', the width of the roll."""
    at = next((i for i, item in enumerate(draft.items) if item is number or number in item.members), 0)
    letter = [i for i in draft.items[max(0, at - 3) : at] if i.senses.get("letter") == "l"]
    if letter and draft.is_metric_tongue:
        draft.note("L was taken as the roll width (laize)")
        return True
    return False


def _guessed_unit(draft: Draft, number: Item) -> str:
    assert number.number
    value = number.number.value
    unit = "mm" if value >= 200 else "m" if value < 10 and not number.number.is_integer else "in"
    draft.note(f"{number.number.written}: no unit; taken as {unit}")
    return unit


def _products_of_sizes(draft: Draft, size: _Size) -> None:
    """'36\" x 100 ft', '1220 mm x 30 m': a product with feet or metres in it is a roll, the longer side its length."""
    for chain in draft.kinds("chain"):
        members = [m for m in chain.members if not m.taken]
        at = next(
            (i for i, m in enumerate(members) if m.unit in ("ft", "m") or (m.unit == "M" and _is_metres(members, m))),
            None,
        )
        if at is None:
            named = [m for m in members if m.taken]
            if named and len(members) == 1 and size_like(members[0]):
                _set_pair(draft, size, named[0], members[0])
            continue
        behind = members[at + 1] if at + 1 < len(members) else None
        other = behind if at == 0 or (behind and behind.unit in FORM_UNITS) else members[at - 1]
        if other is not None and other.slot in (None, "width", "length") and other.unit != "gauge":
            _set_pair(draft, size, *((members[at], other) if other is behind else (other, members[at])))
        elif chain.members.index(members[at]) and chain.members[chain.members.index(members[at]) - 1].taken == "form":
            members[at].taken, size.length = "form", size.length or size_mm(members[at])


def _is_metres(members: list[Item], member: Item) -> bool:
    """True where M stands beside another size: in '60M x .0075 x 1.22M x 30M' the first is the count."""
    at = members.index(member)
    around = (members[at - 1] if at else None, members[at + 1] if at + 1 < len(members) else None)
    return any(m is not None and m.unit in ("M", "m", "mm") for m in around)


def size_like(number: Item) -> bool:
    """True for what can be a side of a roll or a panel."""
    return number.number is not None and number.slot is None and size_mm(number, "in") >= LEAST_SIZE_MM


def _set_pair(draft: Draft, size: _Size, one: Item, other: Item) -> None:
    first, second = (
        size_mm(one, one.unit or _twin_unit(one, other)),
        size_mm(other, other.unit or _twin_unit(other, one)),
    )
    if other.unit in (None, "ft", "m") and first > second and first > WIDEST_ROLL_MM:
        first, second = second, first
        draft.note("length stands before width")
    one.taken = other.taken = "form"
    size.pair(first, second)


def _twin_unit(number: Item, other: Item) -> str:
    assert number.number
    if other.unit in ("m", "M"):
        return "mm" if number.number.value > 100 else "m"
    if other.unit == "ft":
        return "in" if number.number.value > 6 else "ft"
    return other.unit or "in"


def _beside_goods(draft: Draft, size: _Size) -> None:
    """'panel 1200 x 2400', '24 x 36 in panels', 'disc 350 mm', '12 discs Ø 350': sizes beside the word for the goods."""
    for word in (*draft.terms("form"), *(i for i in draft.items if i.is_number and i.unit == "pieces")):
        kind = word.senses.get("form") or word.system
        at = word.at
        near = [
            i
            for n in (at + 1, at - 1, at + 2, at - 2)
            if (i := peek(draft.items, n)) and (i.kind == "chain" or i.is_number)
        ]
        for item in near:
            if kind == "disc" and _take_disc(size, item):
                break
            if kind != "disc" and _take_panel(draft, size, item, kind):
                break


def _take_disc(size: _Size, item: Item) -> bool:
    if (
        not item.is_number
        or item.taken
        or item.slot not in (None, "wire", "diameter")
        or item.unit == "gauge"
        or not item.number
    ):
        return False
    mm = size_mm(item, "mm" if item.number.value > 60 else "in")
    if mm < 10 or size.diameter is not None:
        return False
    item.taken, size.diameter = "form", mm
    return True


def _take_panel(draft: Draft, size: _Size, item: Item, kind: str | None) -> bool:
    members = [m for m in item.members if not m.taken]
    if item.kind != "chain" or len(members) != 2 or size.width is not None or any(m.slot for m in members):
        return False
    one, other = members
    unit = one.unit or other.unit or _panel_unit(draft, one, other, kind)
    if unit is None or unit not in MM_PER_UNIT or min(size_mm(one, unit), size_mm(other, unit)) < 25:
        return False
    if kind == "roll" and one.unit is None and other.unit is None and unit == "in":
        size.pair(size_mm(one, "in"), size_mm(other, "ft"))
        one.taken = other.taken = "form"
        draft.note(f"{one.text} x {other.text}: no unit; taken as inches by feet")
    else:
        one.unit, other.unit = one.unit or unit, other.unit or unit
        _set_pair(draft, size, one, other)
    return True


def _panel_unit(draft: Draft, one: Item, other: Item, kind: str | None) -> str | None:
    assert one.number and other.number
    if one.is_count_like and other.is_count_like and min(one.number.value, other.number.value) >= 150:
        draft.note(f"{one.text} x {other.text}: no unit; taken as mm")
        return "mm"
    if kind == "roll" and one.is_count_like and one.number.value in INCH_WIDTHS and other.number.value in FEET_LENGTHS:
        return "in"
    return None


def _single_sizes(draft: Draft, size: _Size) -> None:
    """'4ft', '30 m roll': one size in feet or metres alone is a width up to 2.5 m, else a length."""
    for item in draft.items:
        if item.is_number and not item.taken and item.slot is None and item.unit in ("ft", "m") and item.number:
            mm = size_mm(item)
            item.taken = "form"
            if mm <= 2500 and size.width is None:
                size.width = mm
            elif size.length is None:
                size.length = mm


def bare_sizes(draft: Draft) -> None:
    """Once the cloth is known, what is left of a size: '36X100' is inches by feet, '1.0x30' metres, '1220 x 30' both."""
    for chain in draft.kinds("chain"):
        members = [m for m in chain.members if not m.taken]
        if len(members) != 2 or any(m.slot or (m.unit and not m.is_length) for m in members):
            continue
        if pair := _bare_pair(draft, *members):
            members[0].taken = members[1].taken = "form"
            _put(draft, *pair)
    for item in draft.items:
        if (
            item.is_number
            and not item.taken
            and item.slot is None
            and item.unit in ("mm", "in", "cm")
            and size_like(item)
        ):
            item.taken = "form"
            _put(draft, size_mm(item), None)
            draft.note(f"{item.number.written if item.number else ''} {item.unit}: taken as the width")


def _bare_pair(draft: Draft, one: Item, other: Item) -> tuple[Fraction, Fraction] | None:
    assert one.number and other.number
    a, b = one.number.value, other.number.value
    if one.unit or other.unit:
        sides = size_mm(one, other.unit), size_mm(other, one.unit)
        return sides if min(sides) >= LEAST_SIZE_MM else None
    units = _units_of_pair(a, b, one.is_count_like and other.is_count_like)
    if units is None:
        return None
    draft.note(f"{one.number.written} x {other.number.written}: no unit; taken as {units[0]} by {units[1]}")
    return a * MM_PER_UNIT[units[0]], b * MM_PER_UNIT[units[1]]


def _units_of_pair(a: Fraction, b: Fraction, whole: bool) -> tuple[str, str] | None:
    if whole and a in INCH_WIDTHS and b in FEET_LENGTHS:
        return "in", "ft"
    if whole and 500 <= a <= 3000 and b >= 500:
        return "mm", "mm"
    if whole and 500 <= a <= 3000 and 5 <= b <= 100:
        return "mm", "m"
    if Fraction(1, 2) <= a <= 3 and 5 <= b <= 100 and not whole:
        return "m", "m"
    return None


def _put(draft: Draft, width: Fraction, length: Fraction | None) -> None:
    old = draft.form or Form()
    if old.width_mm is None:
        far = old.length_mm if length is None else round(float(length), 6)
        draft.form = Form(old.kind, round(float(width), 6), far, old.diameter_mm, old.quantity, old.area_m2)
