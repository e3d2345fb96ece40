"""Rules for what is ordered: pieces, areas, panels and discs."""

from fractions import Fraction

from catalog.callout.joining.measuring import peek
from catalog.callout.joining.products import is_times
from catalog.callout.rules.draft import Draft
from catalog.callout.rules.named_sizes import named_sizes
from catalog.callout.rules.roll_sizes import products_of_sizes, set_pair, single_sizes
from catalog.callout.rules.size import FEET_LENGTHS, INCH_WIDTHS, Size, size_mm
from catalog.callout.text.items import Item
from catalog.units import MM_PER_UNIT

QUANTITY_WORDS = ("qty", "quantity", "menge", "quant", "cantidad", "quantite")
SQUARE_FOOT_M2 = Fraction(9290304, 100000000)


def sizes(draft: Draft) -> None:
    """Take out of the numbers what is a size or a number of pieces."""
    found = Size()
    for rule in (_quantities, _areas, named_sizes, products_of_sizes, _beside_goods, single_sizes):
        rule(draft, found)
    draft.form = found.form(draft)


def _quantities(draft: Draft, size: Size) -> None:
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


def _take_quantity(size: Size, number: Item | None) -> bool:
    if number is None or not number.is_count_like or not number.number or number.taken or number.slot:
        return False
    number.taken, size.quantity = "form", int(number.number.value)
    return True


def _areas(draft: Draft, size: Size) -> None:
    """'10 m²' is an amount of cloth."""
    for number in draft.numbers():
        if number.unit in ("m2", "ft2") and number.number:
            number.taken = "form"
            size.area = float(number.number.value * (1 if number.unit == "m2" else SQUARE_FOOT_M2))


def _beside_goods(draft: Draft, size: Size) -> None:
    """'panel 1200 x 2400', '24 x 36 in panels', 'disc 350 mm', '12 discs Ø 350':
    sizes beside the word for the goods.
    """
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


def _take_disc(size: Size, item: Item) -> bool:
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


def _take_panel(draft: Draft, size: Size, item: Item, kind: str | None) -> bool:
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
        set_pair(draft, size, one, other)
    return True


def _panel_unit(draft: Draft, one: Item, other: Item, kind: str | None) -> str | None:
    assert one.number
    assert other.number
    if one.is_count_like and other.is_count_like and min(one.number.value, other.number.value) >= 150:
        draft.note(f"{one.text} x {other.text}: no unit; taken as mm")
        return "mm"
    if kind == "roll" and one.is_count_like and one.number.value in INCH_WIDTHS and other.number.value in FEET_LENGTHS:
        return "in"
    return None
