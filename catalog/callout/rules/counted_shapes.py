"""Unnamed lengths beside a count: the wire, the opening, or both."""

from dataclasses import replace

from catalog.callout.rules.claims import length_claim
from catalog.callout.rules.draft import POSSIBLE, USUAL, Draft, Option
from catalog.callout.rules.gauge_senses import gauge_options
from catalog.callout.rules.shape import knows_wire, states_opening
from catalog.callout.rules.sieve_senses import is_opening_of
from catalog.callout.rules.taking import take
from catalog.callout.rules.unit_senses import unit_options
from catalog.callout.text.items import Item


def is_of_a_new_side(draft: Draft, free: list[Item]) -> bool:
    """'warp 24 x .015 weft 110 x .010': the second product is the other direction's, and counts anew."""
    if not free or free[0].side is None or not free[0].is_count_like:
        return False
    counted = [n.side for n in draft.all_numbers() if n.taken == "count"]
    return free[0].side not in counted and None not in counted


def beside_counts(draft: Draft, free: list[Item], shape: str) -> None:
    """The count is known: one length is the wire (or the opening), two are opening and wire, or the two wires."""
    if len(free) == 1 and shape in "DLF":
        beside_a_count(draft, free[0])
    elif knows_wire(draft):
        return
    elif shape in ("DD", "LL", "FF"):
        _two_beside_counts(draft, free, shape)
    elif shape in ("G", "GG"):
        take(free, "wire")
        draft.choices.append(gauge_options(draft, free))


def _two_beside_counts(draft: Draft, free: list[Item], shape: str) -> None:
    """Beside one count '2,0/0,9' is opening and wire again; beside two counts, and in filter cloth, the two wires."""
    take(free, "wire")
    wires = [Option("", (length_claim("wire", free),))] if shape == "LL" else unit_options(draft, "wire", free)
    if draft.is_dutch or _has_two_counts(draft):
        draft.choices.append(wires)
        return
    free[0].taken = "aperture"
    dropped_zero = any(n.number and n.number.written[0] == "." for n in free)
    units = (None,) if shape == "LL" else ("in", "mm") if dropped_zero or shape == "FF" else ("mm", "in")
    both = [
        Option(
            "opening and wire",
            (length_claim("aperture", free[:1], unit), length_claim("wire", free[1:], unit)),
            rank=int(at > 0),
            is_inferred=unit is not None,
            notes=(f"{free[0].text}/{free[1].text}: no unit; taken as {unit}",) if unit else (),
            sense="wires or opening and wire",
        )
        for at, unit in enumerate(units)
    ]
    named = [replace(w, label="wires of warp and weft", likelihood=POSSIBLE, rank=2) for w in wires]
    draft.choices.append([*both, *named])


def _has_two_counts(draft: Draft) -> bool:
    return any(c.by_count and c.warp and c.weft and c.warp.mm != c.weft.mm for c in draft.claims)


def beside_a_count(draft: Draft, number: Item) -> None:
    """A length beside a count is its wire; micrometres are rather its opening,
    and so is the opening of the sieve of that number.
    """
    if knows_wire(draft):
        if not draft.is_dutch and not states_opening(draft) and (number.is_length or number.number):
            take([number], "aperture")
            draft.choices.append(
                unit_options(draft, "aperture", [number])
                if not number.is_length
                else [Option("", (length_claim("aperture", [number]),))]
            )
        return
    if states_opening(draft):
        take([number], "wire")
        draft.choices.append(
            unit_options(draft, "wire", [number])
            if not number.is_length
            else [Option("", (length_claim("wire", [number]),))]
        )
        return
    take([number], "wire")
    _restatements(draft, number)
    draft.choices.append(_wire_or_opening(draft, number))


def _restatements(draft: Draft, number: Item) -> None:
    for again in number.restated:
        take([again], number.taken)


def _wire_or_opening(draft: Draft, number: Item) -> list[Option]:
    wires = (
        [Option("", (length_claim("wire", [number]),), USUAL)]
        if number.is_length
        else unit_options(draft, "wire", [number])
    )
    wires = [
        replace(w, claims=(*w.claims, *(length_claim("wire", [a]) for a in number.restated if a.is_length)))
        for w in wires
    ]
    unit = None if number.is_length else "mm"
    again = tuple(length_claim("aperture", [a]) for a in number.restated if a.is_length)
    claims = (length_claim("aperture", [number], unit), *again)
    opening = Option(f"opening {number.text}", claims, POSSIBLE, 2, sense="wire or opening")
    if number.unit == "um":
        number.taken = "aperture"
        thin = [
            replace(w, label=f"wire {number.text} µm", likelihood=POSSIBLE, rank=2, sense="wire or opening")
            for w in wires
        ]
        return [replace(opening, likelihood=USUAL, rank=0, label=""), *thin]
    counts = [n for n in draft.all_numbers() if n.taken == "count"]
    if number.is_length and counts and is_opening_of(counts[0], number.length()):
        return [*wires, replace(opening, rank=0)]
    return [*wires, opening] if number.is_length else wires
