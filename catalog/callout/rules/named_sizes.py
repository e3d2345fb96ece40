"""Sizes that a word names: width, length, laize."""

from catalog.callout.rules.draft import Draft
from catalog.callout.rules.size import WIDEST_ROLL_MM, Size, size_mm
from catalog.callout.text.items import Item


def named_sizes(draft: Draft, size: Size) -> None:
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
