"""Which number a word belongs to: the one behind '=', the unlabelled one just before, else the next."""

from catalog.callout.joining.directions import give_side
from catalog.callout.joining.measuring import peek
from catalog.callout.joining.neighbours import EQUALS, first_of, last_of, next_figure
from catalog.callout.joining.separators import is_separator
from catalog.callout.text.items import Item

LARGEST_MM = {"wire": 30, "thickness": 60, "aperture": 150, "pitch": 180, "mesh": 150}
"""Beyond these a length is a size, not a figure of the cloth."""
ROLL_WIDTHS_IN, ROLL_LENGTHS_FT = range(10, 121), (25, 30, 50, 75, 100, 150, 200, 300)
FITS = {
    "open_area": ("%", None),
    "mass": ("kg/m2", "g/m2", "lb/ft2"),
    "width": ("mm", "cm", "m", "in", "ft", "M", None),
    "length": ("mm", "cm", "m", "in", "ft", "M", None),
    "thickness": ("mm", "um", "in", "thou", None),
    "wire": ("mm", "um", "in", "thou", "gauge", "hundredths", "aught", None),
    "aperture": ("mm", "um", "in", "thou", "cm", "hundredths", None),
    "pitch": ("mm", "um", "in", "thou", "cm", None),
    "mesh": ("mm", "um", "in", "cm", "/in", "/cm", "mesh sign", "M", "designation", "hundredths", "/in2", "/cm2", None),
    "count": ("/in", "/cm", "mesh sign", "M", "designation", "per length", "/in2", "/cm2", None),
}


def labelled(items: list[Item]) -> list[Item]:
    """Give every label its number: the one behind '=', the unlabelled one just before it, else the next one."""
    last: Item | None = None
    for at, item in enumerate(items):
        if item.is_number or item.kind == "chain":
            last = item
        elif item.kind == "sign" and (item.text in ":=" or (is_separator(item) and item.text != ")")):
            last = None
        elif item.kind == "term" and not item.taken:
            if item.has("slot"):
                _give(items, at, item, last)
            if item.has("side"):
                give_side(items, at, item, last)
    return items


def _give(items: list[Item], at: int, label: Item, last: Item | None) -> None:
    slot = label.senses["slot"]
    after = peek(items, at + 1)
    ahead = next_figure(items, at + 1)
    behind_a_number = at > 0 and items[at - 1] is last and slot in ("mesh", "count")
    points_on = after is not None and after.text in EQUALS and not behind_a_number
    if last is not None and (_is_opening_and_wire(last, slot) or _is_repeated(items, at, last, slot)):
        label.taken = "kind of goods"
    elif last is not None and not points_on and _accepts(last_of(last), slot) and not _fits_ahead(last, ahead, slot):
        _set(last, slot, backwards=True)
        label.taken = slot
        last_of(last).senses["named"] = label.text.lower()
    elif ahead is not None and _accepts(first_of(ahead), slot) and _may_lead(items, ahead, slot):
        _set(ahead, slot, backwards=False)
        label.taken = slot
        first_of(ahead).senses |= {"label before": "", "named": label.text.lower()}


def _is_repeated(items: list[Item], at: int, last: Item, slot: str) -> bool:
    """'60 mesh ±2 mesh': the word stands behind its own number again."""
    return items[at - 1] is last and last_of(last).slot == slot and last_of(last).tolerance is not None


def _may_lead(items: list[Item], ahead: Item, slot: str) -> bool:
    """'mesh .0075' and 'wire 60 x 60' name no figures: a count isn't below one, and a wire isn't a pair of counts.

    In 'mesh 0.05 mm wire' the length has its own word.
    """
    first = first_of(ahead)
    behind = peek(items, items.index(ahead) + 1)
    if slot == "mesh" and first.is_length and behind is not None and behind.has("slot"):
        return False
    if (
        slot == "mesh"
        and is_roll_like(ahead)
        and any(i.senses.get("slot") == "mesh" for i in items[items.index(ahead) :])
    ):
        return False
    if slot == "mesh":
        return first.is_length or first.number is None or first.number.value >= 1 or first.number.kind == "fraction"
    return not (slot == "wire" and len(ahead.members) > 1 and all(m.is_count_like for m in ahead.members[:2]))


def _is_opening_and_wire(last: Item, slot: str) -> bool:
    """'1.6 mm x 0.8 mm mesh': of two unlike lengths 'mesh' says but what the goods are."""
    row = last.members
    if slot != "mesh" or len(row) != 2 or not all(m.is_length and m.number and m.slot is None for m in row):
        return False
    return row[0].length().mm != row[1].length().mm


def _fits_ahead(last: Item, ahead: Item | None, slot: str) -> bool:
    """True where the number behind a label is its number, though one without label stands before it.

    '0.5 mm wire 0.2 mm': between two lengths the wire is the thinner; '36X100 opening 2 mm': a roll is no opening.
    """
    if ahead is None or slot not in LARGEST_MM or first_of(ahead).slot or not _accepts(first_of(ahead), slot):
        return False
    first, before = first_of(ahead), last_of(last)
    if _is_a_size(before, slot) and not _is_a_size(first, slot):
        return True
    if slot not in ("wire", "aperture", "pitch"):
        return False
    if is_roll_like(last) or (before.is_count_like and first.is_length):
        return True
    if slot != "wire" or not ahead.is_number or not ahead.is_length:
        return False
    return before.is_length and ahead.length().mm < before.length().mm


def _is_a_size(number: Item, slot: str) -> bool:
    """True for a length beyond what the figure can be."""
    return number.is_length and number.length().mm > LARGEST_MM[slot]


def is_roll_like(item: Item) -> bool:
    """True for '36X100' and '48 x 50': inches by feet, as rolls are sold."""
    if len(item.members) != 2 or not all(m.is_count_like and m.number for m in item.members):
        return False
    width, length = (m.number.value for m in item.members if m.number)
    return width in ROLL_WIDTHS_IN and length in ROLL_LENGTHS_FT


def _accepts(number: Item, slot: str) -> bool:
    if number.slot is not None or number.unit not in FITS[slot]:
        return False
    return not (slot == "open_area" and number.unit is None and (number.number is None or number.number.value < 5))


def _set(item: Item, slot: str, backwards: bool) -> None:
    """A label behind a product reaches back over like numbers, one before it reaches on: '3 x 1 mm opening'."""
    if item.kind != "chain":
        item.slot = slot
        return
    row = item.members[::-1] if backwards else item.members
    row[0].slot = slot
    for member, before in zip(row[1:], row, strict=False):
        if member.slot is not None or not _alike(member, before, slot, backwards):
            return
        member.slot = slot


def _alike(member: Item, before: Item, slot: str, backwards: bool) -> bool:
    """True where a label reaches on: to another count, to another length; a unit behind the last serves a bare one."""
    if slot in ("mesh", "count"):
        return member.unit == before.unit and member.is_count_like == before.is_count_like
    if slot == "wire" and backwards and member.is_count_like != before.is_count_like:
        return False
    if slot == "wire":
        return member.unit == "gauge" or (_same_unit(member, before) and _close(member, before, 4 if backwards else 20))
    return slot in ("aperture", "pitch") and _same_unit(member, before)


def _same_unit(member: Item, before: Item) -> bool:
    return member.unit == before.unit or member.is_count_like or before.is_count_like


def _close(member: Item, before: Item, times: int) -> bool:
    """True where two wires of one cloth may stand side by side: less than so many times apart."""
    if not member.number or not before.number or not before.number.value:
        return False
    return 1 / times < member.number.value / before.number.value < times
