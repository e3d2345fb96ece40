"""Unnamed lengths without a count: opening and wire, pitch and wire, two sides and a wire."""

from catalog.callout.rules.claims import length_claim
from catalog.callout.rules.draft import POSSIBLE, USUAL, Draft, Option
from catalog.callout.rules.gauge_senses import gauge_options
from catalog.callout.rules.shape import has_free_wire, knows_wire
from catalog.callout.rules.taking import take
from catalog.callout.rules.two_lengths import two_lengths
from catalog.callout.rules.unit_senses import preferred_unit, unit_options
from catalog.callout.text.items import Item


def beside_openings(draft: Draft, free: list[Item], shape: str) -> None:
    """The opening or pitch is known: a length left is the wire."""
    if knows_wire(draft) or not free:
        return
    if shape in ("D", "L", "F", "DD", "LL", "FF", "W"):
        take(free, "wire")
        draft.choices.append(
            [Option("", (length_claim("wire", free),))] if "L" in shape else unit_options(draft, "wire", free)
        )
    elif shape in ("G", "GG"):
        take(free, "wire")
        draft.choices.append(gauge_options(draft, free))


def lengths_only(draft: Draft, chain: Item, free: list[Item], shape: str) -> None:
    """Lengths alone: 'w x d', 'w/d', or two sides of an opening (or two pitches) and a wire."""
    if shape[-1] == "G":
        openings, wires = free[:-1], free[-1:]
        take(wires, "wire")
        draft.choices.append(gauge_options(draft, wires))
        opening_or_pitch(draft, openings, None)
    elif len(free) == 3:
        opening_or_pitch(draft, free[:2], free[2:])
    elif has_free_wire(draft, free):
        opening_or_pitch(draft, free, None)
    else:
        two_lengths(draft, chain, free, _unit_for(draft, free))


def _unit_for(draft: Draft, numbers: list[Item]) -> str:
    unit = preferred_unit(draft, numbers)
    if not all(n.is_length for n in numbers) and unit == "mm":
        draft.note(f"{' x '.join(n.text for n in numbers)}: no unit; taken as mm")
    return unit


def opening_or_pitch(draft: Draft, openings: list[Item], wires: list[Item] | None) -> None:
    """'1/4\" x 1/4\" x .047\"', '12.7 x 12.7 x 1.6 mm': the openings or the pitches, and nobody can tell which."""
    unit = _unit_for(draft, openings + (wires or []))
    take(openings, "aperture")
    take(wires or [], "wire")
    wire = () if wires is None else (length_claim("wire", wires, unit),)
    written = " x ".join(n.text for n in openings)
    if draft.is_slotted or draft.is_sieve:
        draft.claims += [length_claim("aperture", openings, unit), *wire]
        return
    draft.choices.append(
        [
            Option(f"{written} {name}", (length_claim(slot, openings, unit), *wire), USUAL, sense="opening or pitch")
            for slot, name in (("aperture", "opening"), ("pitch", "pitch"))
        ]
    )


def length_alone(draft: Draft, number: Item) -> None:
    """A length and nothing else: the opening, with the wire open; beside a wire, the opening or the pitch."""
    unit = None if number.is_length else preferred_unit(draft, [number])
    length = number.length(unit)
    if length.mm > 150 or length.mm <= 0:
        return
    take([number], "aperture")
    opening = Option(
        f"opening {number.text}", (length_claim("aperture", [number], unit),), USUAL, sense="opening or pitch"
    )
    if number.unit == "um" or draft.is_sieve:
        draft.claims += opening.claims
        return
    pitch = Option(f"pitch {number.text}", (length_claim("pitch", [number], unit),), POSSIBLE, sense="opening or pitch")
    wire = Option(f"wire {number.text}", (length_claim("wire", [number], unit),), POSSIBLE, sense="opening or wire")
    draft.choices.append([opening, pitch] if knows_wire(draft) else [opening, pitch, wire])
