"""Two lengths and nothing else: opening and wire, pitch and wire, wire and opening, or a rectangular opening."""

from catalog.callout.rules.claims import length_claim
from catalog.callout.rules.draft import POSSIBLE, USUAL, Draft, Option
from catalog.callout.rules.taking import take
from catalog.callout.text.items import Item

FINE_MM = 4
"""Up to here 'w × d' in millimetres is how metric cloth is named; above, an opening and a pitch are mixed up."""


def two_lengths(draft: Draft, chain: Item, free: list[Item], unit: str) -> None:
    """'0,25 x 0,16 mm', '0.25/0.16': opening and wire, as fine metric cloth is named;
    coarse or in inches also pitch and wire.

    The wire first, and a rectangular opening, are thought of where opening and wire would make no cloth.
    """
    first, second = free[0].length(unit).mm, free[1].length(unit).mm
    rectangular = _rectangular(free, unit, 2 if second <= first else 0)
    take(free, "aperture")
    if draft.is_slotted:
        draft.claims += rectangular.claims
        return
    free[1].taken = "wire"
    by_stroke = bool(chain.joins) and chain.joins[-1] == "/"
    metric = unit != "in" and not any(n.unit in ("in", "thou") for n in free)
    options = [_with_wire("aperture", free, unit)]
    if not (metric and (by_stroke or _is_fine(free, unit))):
        options.append(_with_wire("pitch", free, unit, metric))
    if second > first:
        options.append(_wire_first(free, unit))
    if not by_stroke and first != second:
        options.append(rectangular)
    draft.choices.append(options)


def _is_fine(free: list[Item], unit: str) -> bool:
    """True for fine cloth named in decimals or micrometres; whole millimetres are named as coarse cloth is."""
    whole = all(n.number and n.number.is_integer and n.unit != "um" for n in free)
    return free[0].length(unit).mm <= FINE_MM and not whole


def _with_wire(slot: str, free: list[Item], unit: str, is_sought: bool = False) -> Option:
    name = "opening" if slot == "aperture" else "pitch"
    claims = (length_claim(slot, free[:1], unit), length_claim("wire", free[1:], unit))
    label = f"{name} {free[0].text}, wire {free[1].text}"
    return Option(label, claims, POSSIBLE if is_sought else USUAL, sense="opening or pitch")


def _wire_first(free: list[Item], unit: str) -> Option:
    claims = (length_claim("aperture", free[1:], unit), length_claim("wire", free[:1], unit))
    return Option(f"wire {free[0].text}, opening {free[1].text}", claims, POSSIBLE, sense="order")


def _rectangular(free: list[Item], unit: str, rank: int) -> Option:
    label = f"rectangular opening {' x '.join(n.text for n in free)}"
    claims = (length_claim("aperture", free, unit),)
    return Option(label, claims, POSSIBLE, rank, missing=("wire",), sense="opening x wire or rectangle")
