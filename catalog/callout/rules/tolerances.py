"""What a figure may be off by, as the text states it: a share of the figure, whichever unit it turns out to be in."""

from fractions import Fraction

from catalog.callout.rules.draft import Draft
from catalog.callout.text.items import Item
from catalog.units import MM_PER_UNIT

TOLERABLE = {"aperture": "aperture", "wire": "wire", "pitch": "pitch", "mesh": "count", "count": "count"}


def tolerances(draft: Draft) -> None:
    """'0.25 mm ±5 %', '60 mesh ±1', '.0075 ±.0003': limits beside the figure."""
    for number in draft.all_numbers():
        slot = TOLERABLE.get(number.taken) or TOLERABLE.get(number.slot or "")
        if number.tolerance is None or slot is None or number.number is None or number.number.value <= 0:
            continue
        plus, minus = (_share(off, number) for off in number.tolerance)
        if plus is None or minus is None:
            draft.problem("E_NOT_UNDERSTOOD", f"The tolerance on {number.text} isn't understood.", number)
            continue
        draft.tolerances[slot] = (minus, plus)
        average = "the tolerance on the opening is taken as that of the average, not of single openings"
        draft.note(average if slot == "aperture" else f"tolerance on the {slot} as stated")


def _share(off: Item | None, number: Item) -> Fraction | None:
    """How much of the figure the tolerance is; None where the two can't be compared."""
    if off is None or off.number is None or number.number is None:
        return None
    if off.unit == "%":
        return off.number.value / 100
    if off.unit is None or off.unit == number.unit:
        return off.number.value / number.number.value
    if off.is_length and number.is_length and off.unit and number.unit:
        return off.number.value * MM_PER_UNIT[off.unit] / (number.number.value * MM_PER_UNIT[number.unit])
    return None
