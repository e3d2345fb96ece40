"""The word mesh: a count beside a whole number, an opening or a pitch beside a length."""

import re
from dataclasses import replace

from catalog.callout.rules.claims import count_claim, length_claim
from catalog.callout.rules.draft import POSSIBLE, USUAL, Claim, Draft, Option
from catalog.callout.rules.sieve_senses import (
    sieve_option,
)
from catalog.callout.rules.taking import said_again, take, with_twin
from catalog.callout.text.items import Item
from catalog.callout.vocabulary.materials import BARE_NUMBERS
from catalog.cloth import Rating
from catalog.reference import grades
from catalog.units import MM_PER_INCH, Length

SOUTHERN = re.compile(r"mall|magli", re.IGNORECASE)


def mesh_figures(draft: Draft) -> None:
    """'60 mesh' counts per inch; '1/4 in mesh' and '6 mm mesh' are an opening or a pitch, and nobody can tell which."""
    for item in draft.items:
        members = item.members if item.kind == "chain" else [item] if item.is_number else []
        row = [m for m in members if not m.taken and m.slot == "mesh" and m.number][:2]
        if not row:
            continue
        if draft.is_slotted and (pair := _slot_sides(item, row)):
            take(pair, "aperture")
            draft.claims.append(length_claim("aperture", pair, pair[1].unit))
            continue
        if row[0].unit == "hundredths":
            take(row, "unknown")
            message = f"{row[0].text} mesh may be two counts, a band of particles or hundredths of a millimetre: which?"
            draft.problem("E_NOT_UNDERSTOOD", message, row[0])
        elif row[0].is_length or (row[0].number and row[0].number.kind == "fraction"):
            _mesh_lengths(draft, row)
        elif row[0].number and row[0].number.value < 1:
            _small_mesh(draft, row)
        else:
            _mesh_counts(draft, row if len(row) == 2 or item.kind != "chain" else with_twin(members, row[0]))


def _slot_sides(item: Item, row: list[Item]) -> list[Item]:
    """'Oblong mesh 2 x 10 mm': the two sides of the opening; the unit stands behind the second."""
    free = [m for m in item.members if not m.taken]
    is_pair = len(free) == 2 and row[0] is free[0] and free[0].is_count_like and free[1].is_length
    return free if is_pair else []


def _mesh_lengths(draft: Draft, row: list[Item]) -> None:
    take(row, "aperture")
    if row[0].unit == "um" and not draft.has_count:
        draft.choices.append(_micron_mesh(draft, row))
        return
    unit = "in" if row[0].unit is None else None
    written = " x ".join(n.text + (" in" if unit or n.unit == "in" else "") for n in row)
    options = [
        Option(f"{written} pitch", (length_claim("pitch", row, unit),), USUAL, sense="opening or pitch"),
        Option(f"{written} opening", (length_claim("aperture", row, unit),), USUAL, sense="opening or pitch"),
    ]
    if unit and row[0].number and row[0].number.value > 1 and (claim := count_claim(row, "/in")):
        options.append(Option(f"{row[0].text} per inch", (claim,), USUAL, sense="opening or pitch"))
    draft.choices.append(options)


def _micron_mesh(draft: Draft, row: list[Item]) -> list[Option]:
    number = row[0]
    um = float(number.number.value) if number.number else 0.0
    options = [Option(f"aperture {number.text} µm", (length_claim("aperture", row),), USUAL, sense="opening or rating")]
    if not any(n.slot == "wire" or n.unit == "gauge" for n in draft.all_numbers()):
        options.append(
            Option(
                f"filter rating {number.text} µm",
                (),
                POSSIBLE,
                rating=Rating(um, "unstated"),
                sense="opening or rating",
            )
        )
    return options


def _small_mesh(draft: Draft, row: list[Item]) -> None:
    """'0.25 mesh' is no count: an opening or a pitch, in a unit that isn't written."""
    take(row, "aperture")
    unit = "in" if row[0].number and row[0].number.written[0] == "." else "mm"
    options = [
        Option(f"{row[0].text} {unit} {name}", (length_claim(slot, row, unit),), USUAL, sense="opening or pitch")
        for slot, name in (("aperture", "opening"), ("pitch", "pitch"))
    ]
    draft.note(f"{row[0].text}: no unit; taken as {unit}")
    draft.choices.append(options)


def _mesh_counts(draft: Draft, row: list[Item]) -> None:
    claim = count_claim(row)
    if claim is None:
        return
    take(row, "count")
    said_again(draft, "count", row)
    number = row[0]
    label = f"{' x '.join(n.text for n in row)} per inch"
    if _is_southern(draft):
        draft.choices.append(_count_or_opening(row, label, claim))
        return
    counted = Option(label, (claim,), USUAL, sense="sieve or count")
    sieve = sieve_option(draft, number) if len(row) == 1 else None
    if (
        draft.is_sieve
        and sieve is not None
        and draft.standards
        and any("11" in s or "410" in s for s in draft.standards)
    ):
        draft.choices.append([sieve])
    elif draft.is_sieve and sieve is not None:
        custom = grades.wire_in("market grade", number.number.value) if number.number else None
        draft.choices.append(
            [sieve, _with_custom(counted, custom) if custom else replace(counted, likelihood=POSSIBLE)]
        )
    elif len(row) == 1 and number.number and number.number.value in BARE_NUMBERS and draft.alloy is None:
        draft.choices.append(
            [
                counted,
                Option(f"alloy {number.text}, count not said", (), POSSIBLE, alloy=number.text, sense="alloy or count"),
            ]
        )
    else:
        draft.claims.append(claim)


def _is_southern(draft: Draft) -> bool:
    """True where the mesh is 'malla' or 'maglia', which counts per inch or is an opening in millimetres."""
    return any(SOUTHERN.match(item.text) for item in draft.items if item.has("slot"))


def _count_or_opening(row: list[Item], label: str, claim: Claim) -> list[Option]:
    options = [Option(label, (claim,), USUAL, sense="count or opening")]
    for slot, name in (("aperture", "opening"), ("pitch", "pitch")):
        written = " x ".join(n.text for n in row)
        claims = (length_claim(slot, row, "mm"),)
        options.append(Option(f"{written} mm {name}", claims, POSSIBLE, is_inferred=True, sense="count or opening"))
    return options


def _with_custom(counted: Option, wire_in: object) -> Option:
    from fractions import Fraction

    wire = Length(Fraction(str(wire_in)) * MM_PER_INCH)
    note = "wire of the market grade, by custom (from memory)"
    return replace(
        counted, claims=(*counted.claims, Claim("wire", wire, wire, by_custom=True)), likelihood=POSSIBLE, notes=(note,)
    )
