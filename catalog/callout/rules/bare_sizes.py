"""What is left of a size once the cloth is known."""

from fractions import Fraction

from catalog.callout.reading import Form
from catalog.callout.rules.draft import Draft
from catalog.callout.rules.roll_sizes import size_like
from catalog.callout.rules.size import FEET_LENGTHS, INCH_WIDTHS, LEAST_SIZE_MM, size_mm
from catalog.callout.text.items import Item
from catalog.units import MM_PER_UNIT


def bare_sizes(draft: Draft) -> None:
    """Once the cloth is known, what is left of a size: '36X100' is inches by feet, '1.0x30' metres,
    '1220 x 30' both.
    """
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
    assert one.number
    assert other.number
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
