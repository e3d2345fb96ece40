"""Rolls: products with feet or metres in them."""

from catalog.callout.rules.draft import Draft
from catalog.callout.rules.size import FORM_UNITS, LEAST_SIZE_MM, WIDEST_ROLL_MM, Size, size_mm
from catalog.callout.text.items import Item


def products_of_sizes(draft: Draft, size: Size) -> None:
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
                set_pair(draft, size, named[0], members[0])
            continue
        behind = members[at + 1] if at + 1 < len(members) else None
        other = behind if at == 0 or (behind and behind.unit in FORM_UNITS) else members[at - 1]
        if other is not None and other.slot in (None, "width", "length") and _is_side(other):
            set_pair(draft, size, *((members[at], other) if other is behind else (other, members[at])))
        elif chain.members.index(members[at]) and chain.members[chain.members.index(members[at]) - 1].taken == "form":
            members[at].taken, size.length = "form", size.length or size_mm(members[at])


def _is_metres(members: list[Item], member: Item) -> bool:
    """True where M stands beside another size: in '60M x .0075 x 1.22M x 30M' the first is the count."""
    at = members.index(member)
    around = (members[at - 1] if at else None, members[at + 1] if at + 1 < len(members) else None)
    return any(m is not None and m.unit in ("M", "m", "mm") for m in around)


def _is_side(number: Item) -> bool:
    """True for a bare number or one with a unit of length."""
    return number.number is not None and (number.unit in (None, "M") or number.is_length)


def size_like(number: Item) -> bool:
    """True for what can be a side of a roll or a panel."""
    return _is_side(number) and number.slot is None and size_mm(number, "in") >= LEAST_SIZE_MM


def set_pair(draft: Draft, size: Size, one: Item, other: Item) -> None:
    """Take two numbers as width and length, the shorter first where one is beyond any roll."""
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


def single_sizes(draft: Draft, size: Size) -> None:
    """'4ft', '30 m roll': one size in feet or metres alone is a width up to 2.5 m, else a length."""
    for item in draft.items:
        if item.is_number and not item.taken and item.slot is None and item.unit in ("ft", "m") and item.number:
            mm = size_mm(item)
            item.taken = "form"
            if mm <= 2500 and size.width is None:
                size.width = mm
            elif size.length is None:
                size.length = mm
