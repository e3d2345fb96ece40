"""What a figure may be off by, as the text states it: limits beside the figure."""

from dataclasses import replace

from catalog.callout.rules.bound_values import MOST, figures_of, limit
from catalog.callout.rules.draft import Draft

KEYS = {"aperture": "aperture_mm", "wire": "wire_mm", "pitch": "pitch_mm", "count": "count_per_in"}
TOLERABLE = {"aperture": "aperture", "wire": "wire", "pitch": "pitch", "mesh": "count", "count": "count"}


def tolerances(draft: Draft) -> None:
    """'0.25 mm ±5 %' and '60 mesh ±1' are limits beside the figure."""
    for number in draft.all_numbers():
        slot = TOLERABLE.get(number.taken) or TOLERABLE.get(number.slot or "")
        if number.tolerance is None or slot is None or number.number is None:
            continue
        plus, minus = number.tolerance
        for off, sign in ((minus, -1), (plus, +1)):
            if off is None or off.number is None:
                continue
            share = off.unit == "%"
            value = float(figures_of(number, slot)[0][0])
            step = (
                value * float(off.number.value) / 100
                if share
                else float(figures_of(replace(off, unit=off.unit or number.unit), slot)[0][0])
            )
            limit(draft, KEYS[slot], MOST if sign > 0 else "least", round(value + sign * step, 9))
        draft.note(
            f"the tolerance on {slot} is taken as that of the average, not of single openings"
            if slot == "aperture"
            else f"tolerance on {slot} as stated"
        )
