"""Rules for numbers that nothing names: their shape says what they can be,
and every sense is kept until one is left.
"""

from catalog.callout.rules.bare_lengths import beside_openings, length_alone, lengths_only
from catalog.callout.rules.counted_shapes import beside_a_count, beside_counts, is_of_a_new_side
from catalog.callout.rules.draft import Draft
from catalog.callout.rules.gauge_senses import gauge_options
from catalog.callout.rules.shape import knows_wire, shape_of, states_opening
from catalog.callout.rules.taking import take
from catalog.callout.rules.unit_senses import hundredths
from catalog.callout.rules.whole_numbers import whole_alone, whole_numbers_first
from catalog.callout.text.items import Item
from catalog.units import MM_PER_INCH


def unnamed_figures(draft: Draft) -> None:
    """Apply the rules for products first, then for single numbers."""
    for item in list(draft.items):
        if item.kind == "chain":
            _product(draft, item)
    for item in list(draft.items):
        if item.is_number and not item.taken and item.slot is None and not item.bound:
            _single(draft, item)


def _free(chain: Item) -> list[Item]:
    return [m for m in chain.members if not m.taken and m.slot is None and not m.bound]


def _product(draft: Draft, chain: Item) -> None:
    free = _free(chain)
    shape = shape_of(free)
    if is_of_a_new_side(draft, free):
        whole_numbers_first(draft, free, shape)
    elif draft.has_count or any(n.taken == "count" for n in draft.all_numbers()):
        beside_counts(draft, free, shape)
    elif draft.has_slot("aperture") or draft.has_slot("pitch"):
        beside_openings(draft, free, shape)
    elif shape in ("WW", "WWD", "WWG", "WD", "WG", "WWDD", "WWL", "WL", "WF", "WWF", "DDG", "DG"):
        whole_numbers_first(draft, free, shape)
    elif shape in (
        "LL",
        "DD",
        "FF",
        "LD",
        "DL",
        "LLL",
        "DDD",
        "FFD",
        "FFF",
        "FD",
        "FW",
        "DW",
        "LG",
        "LLG",
        "FG",
        "FFG",
        "FL",
        "FFL",
        "DDL",
        "LF",
        "LLF",
        "LLD",
        "DDW",
    ):
        lengths_only(draft, chain, free, shape)


def _single(draft: Draft, number: Item) -> None:
    """A number alone, by what is known already: beside a count the wire, beside a wire the count or the opening."""
    shape = shape_of([number])
    if number.unit == "hundredths":
        if not knows_wire(draft) and (draft.has_count or states_opening(draft)):
            hundredths(draft, "wire", [number])
    elif shape == "G" and not knows_wire(draft):
        take([number], "wire")
        draft.choices.append(gauge_options(draft, [number]))
    elif shape == "W" and not draft.has_count and not (draft.has_slot("aperture") or draft.has_slot("pitch")):
        whole_alone(draft, number)
    elif shape in "DLF" and (draft.has_count or any(n.taken == "count" for n in draft.all_numbers())):
        if number.is_length and float(number.length().mm) >= 100:
            return
        if not (knows_wire(draft) and states_opening(draft)):
            beside_a_count(draft, number)
    elif shape in "DLF" and (draft.has_slot("aperture") or draft.has_slot("pitch")):
        if not (number.is_length and float(number.length().mm) >= 100):
            beside_openings(draft, [number], shape)
    elif shape in "DLF":
        length_alone(draft, number)


def inches(value: float) -> str:
    """A length in inches as the trade writes it."""
    return f"{value / float(MM_PER_INCH):.4g}"
