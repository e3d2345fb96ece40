"""Unnamed whole numbers: counts before a wire, the sides of a panel, or opening and wire in millimetres."""

from catalog.callout.reading import Form
from catalog.callout.rules.bare_lengths import opening_or_pitch
from catalog.callout.rules.claims import count_claim, length_claim
from catalog.callout.rules.draft import POSSIBLE, USUAL, Claim, Draft, Option
from catalog.callout.rules.gauge_senses import gauge_options
from catalog.callout.rules.shape import has_free_wire, knows_wire, shape_of
from catalog.callout.rules.sieve_senses import sieve_option
from catalog.callout.rules.taking import take
from catalog.callout.rules.unit_senses import unit_options
from catalog.callout.text.items import Item
from catalog.callout.vocabulary.materials import BARE_NUMBERS

LARGEST_COUNT = 3000


def whole_numbers_first(draft: Draft, free: list[Item], shape: str) -> None:
    """'60 x 60', '60 x .0075', '10 x 10 x 24g': whole numbers without a unit before a wire are counts.

    Two alone are counts where a wire, a weave or a grade stands by, else they might be a panel's sides in inches.
    """
    if shape == "WL" and knows_wire(draft):
        opening_or_pitch(draft, free, None)
        return
    wholes = [n for n in free if shape_of([n]) in "WD" and n is not free[-1]] if shape != "WW" else free
    if shape == "WWDD":
        wholes = free[:2]
    rest = [n for n in free if n not in wholes]
    if (
        any(n.number and not 0 < n.number.value <= LARGEST_COUNT for n in wholes)
        or (claim := count_claim(wholes)) is None
    ):
        return
    if shape == "WW":
        _two_wholes(draft, free, claim)
        return
    take(wholes, "count")
    if "G" in shape:
        draft.claims.append(claim)
        take(rest, "wire")
        draft.choices.append(gauge_options(draft, rest))
        return
    draft.choices.append(_count_and_wire(draft, wholes, rest, claim))
    take(rest, "wire")


def _two_wholes(draft: Draft, free: list[Item], claim: Claim) -> None:
    settled = has_free_wire(draft, free) or draft.is_dutch or draft.weave is not None or draft.grade is not None
    first = free[0].number.value if free[0].number else 0
    if not settled and (draft.form is not None and draft.form.width_mm is not None):
        settled = True
    take(free, "count")
    written = " x ".join(n.text for n in free)
    if settled or first < 2:
        draft.claims.append(claim)
        return
    sides = [round(float(n.length("in").mm), 6) for n in free]
    count = Option(f"{written} mesh", (claim,), USUAL, sense="count or size")
    size = Option(f"{written} in, a size", (), USUAL, form=Form("panel", sides[0], sides[1]), sense="count or size")
    draft.choices.append([count, size] if first <= 144 else [count])


def _count_and_wire(draft: Draft, wholes: list[Item], rest: list[Item], claim: Claim) -> list[Option]:
    """'20 x 0.4', '10 x 10 x 1 mm': count and wire,
    or opening (pitch) and wire in millimetres where that makes a cloth too.
    """
    written = " x ".join(n.text for n in wholes)
    wire = rest[-1]
    if wire.is_length and wire.unit in ("in", "thou"):
        return [Option(f"{written} per inch", (claim, length_claim("wire", rest)), USUAL)]
    options = [
        Option(
            f"{written} per inch",
            (claim, *option.claims),
            USUAL,
            option.rank if option.rank == 2 else 0,
            option.is_inferred,
            option.notes,
            sense="count or opening",
        )
        for option in (
            [Option("", (length_claim("wire", rest),))] if wire.is_length else unit_options(draft, "wire", rest)
        )
    ]
    if wire.number and (wire.is_length or wire.number.written[0] not in ".,"):
        unit = "mm"
        for slot, name in (("aperture", "opening"), ("pitch", "pitch")):
            claims = (length_claim(slot, wholes, unit), length_claim("wire", rest, unit))
            options.append(Option(f"{written} mm {name}", claims, POSSIBLE, is_inferred=True, sense="count or opening"))
    return options


def whole_alone(draft: Draft, number: Item) -> None:
    """'60 .0075', '60 TBC': a whole number beside a wire or a grade is the count; alone it is a question."""
    claim = count_claim([number])
    if claim is None or number.number is None or number.number.value > LARGEST_COUNT:
        return
    if has_free_wire(draft, [number]) or draft.grade:
        take([number], "count")
        draft.claims.append(claim)
    elif not knows_wire(draft) and len(draft.numbers()) == 1 and draft.form is None:
        take([number], "count")
        options = [Option(f"{number.text} per inch", (claim,), USUAL, sense="sieve or count")]
        if number.number.value in BARE_NUMBERS and draft.alloy is None:
            options.append(
                Option(f"alloy {number.text}, count not said", (), POSSIBLE, alloy=number.text, sense="alloy or count")
            )
        if sieve := sieve_option(draft, number, POSSIBLE):
            options.append(sieve)
        draft.choices.append(options)
