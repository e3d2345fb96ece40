"""Rules for numbers that nothing names: their shape says what they can be, and every sense is kept until one is left.

W whole number, D decimal, F vulgar fraction, L length with a unit, G gauge.
"""

from dataclasses import replace

from catalog.callout.claims import count_claim, length_claim
from catalog.callout.draft import POSSIBLE, USUAL, Claim, Draft, Option
from catalog.callout.items import Item
from catalog.callout.labelled import gauge_options, hundredths, preferred_unit, take, unit_options
from catalog.callout.reading import Form
from catalog.callout.sieve_senses import is_opening_of, sieve_option
from catalog.callout.vocabulary.materials import BARE_NUMBERS
from catalog.units import MM_PER_INCH

FINE_MM = 4
"""Up to here 'w × d' in millimetres is how metric cloth is named; above, an opening and a pitch are mixed up."""
LARGEST_COUNT = 3000


def shape_of(numbers: list[Item]) -> str:
    """One letter a number: 'WWD' for 60 x 60 x .0075."""
    return "".join(_letter(n) for n in numbers)


def _letter(number: Item) -> str:
    if number.unit in ("gauge", "aught"):
        return "G"
    if number.is_length:
        return "L"
    if number.unit is not None or number.number is None:
        return "?"
    return {"integer": "W", "fraction": "F"}.get(number.number.kind, "D")


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


def _knows_wire(draft: Draft) -> bool:
    return draft.has_slot("wire")


def _states_opening(draft: Draft) -> bool:
    """True where a number is taken as the opening; a sieve's name alone brings an opening that nobody stated."""
    return any(n.taken == "aperture" for n in draft.all_numbers())


def _product(draft: Draft, chain: Item) -> None:
    free = _free(chain)
    shape = shape_of(free)
    if _is_of_a_new_side(draft, free):
        _whole_numbers_first(draft, free, shape)
    elif draft.has_count or any(n.taken == "count" for n in draft.all_numbers()):
        _beside_counts(draft, free, shape)
    elif draft.has_slot("aperture") or draft.has_slot("pitch"):
        _beside_openings(draft, free, shape)
    elif shape in ("WW", "WWD", "WWG", "WD", "WG", "WWDD", "WWL", "WL", "WF", "WWF", "DDG", "DG"):
        _whole_numbers_first(draft, free, shape)
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
        _lengths_only(draft, chain, free, shape)


def _is_of_a_new_side(draft: Draft, free: list[Item]) -> bool:
    """'warp 24 x .015 weft 110 x .010': the second product is the other direction's, and counts anew."""
    if not free or free[0].side is None or not free[0].is_count_like:
        return False
    counted = [n.side for n in draft.all_numbers() if n.taken == "count"]
    return free[0].side not in counted and None not in counted


def _beside_counts(draft: Draft, free: list[Item], shape: str) -> None:
    """The count is known: one length is the wire (or the opening), two are opening and wire, or the two wires."""
    if len(free) == 1 and shape in "DLF":
        beside_a_count(draft, free[0])
    elif _knows_wire(draft):
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
    """A length beside a count is its wire; micrometres are rather its opening, and so is the opening of the sieve of that number."""
    if _knows_wire(draft):
        if not _states_opening(draft) and (number.is_length or number.number):
            take([number], "aperture")
            draft.choices.append(
                unit_options(draft, "aperture", [number])
                if not number.is_length
                else [Option("", (length_claim("aperture", [number]),))]
            )
        return
    if _states_opening(draft):
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


def _beside_openings(draft: Draft, free: list[Item], shape: str) -> None:
    """The opening or pitch is known: a length left is the wire."""
    if _knows_wire(draft) or not free:
        return
    if shape in ("D", "L", "F", "DD", "LL", "FF", "W"):
        take(free, "wire")
        draft.choices.append(
            [Option("", (length_claim("wire", free),))] if "L" in shape else unit_options(draft, "wire", free)
        )
    elif shape in ("G", "GG"):
        take(free, "wire")
        draft.choices.append(gauge_options(draft, free))


def _has_free_wire(draft: Draft, numbers: list[Item]) -> bool:
    """True where a decimal, a gauge or a named wire stands beside the product."""
    others = [n for n in draft.numbers() if n not in numbers and n.slot is None]
    return _knows_wire(draft) or any(
        shape_of([n]) in "DG" or (n.is_length and n.unit in ("mm", "um", "thou", "in")) for n in others
    )


def _whole_numbers_first(draft: Draft, free: list[Item], shape: str) -> None:
    """'60 x 60', '60 x .0075', '10 x 10 x 24g': whole numbers without a unit before a wire are counts.

    Two alone are counts where a wire, a weave or a grade stands by, else they might be a panel's sides in inches.
    """
    if shape == "WL" and _knows_wire(draft):
        _opening_or_pitch(draft, free, None)
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
    settled = _has_free_wire(draft, free) or draft.is_dutch or draft.weave is not None or draft.grade is not None
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
    """'20 x 0.4', '10 x 10 x 1 mm': count and wire, or opening (pitch) and wire in millimetres where that makes a cloth too."""
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


def _lengths_only(draft: Draft, chain: Item, free: list[Item], shape: str) -> None:
    """Lengths alone: 'w x d', 'w/d', or two sides of an opening (or two pitches) and a wire."""
    if shape[-1] == "G":
        openings, wires = free[:-1], free[-1:]
        take(wires, "wire")
        draft.choices.append(gauge_options(draft, wires))
        _opening_or_pitch(draft, openings, None)
    elif len(free) == 3:
        _opening_or_pitch(draft, free[:2], free[2:])
    elif _has_free_wire(draft, free):
        _opening_or_pitch(draft, free, None)
    else:
        _two_lengths(draft, chain, free)


def _unit(draft: Draft, numbers: list[Item]) -> str:
    unit = preferred_unit(draft, numbers)
    if not all(n.is_length for n in numbers) and unit == "mm":
        draft.note(f"{' x '.join(n.text for n in numbers)}: no unit; taken as mm")
    return unit


def _opening_or_pitch(draft: Draft, openings: list[Item], wires: list[Item] | None) -> None:
    """'1/4\" x 1/4\" x .047\"', '12.7 x 12.7 x 1.6 mm': the openings or the pitches, and nobody can tell which."""
    unit = _unit(draft, openings + (wires or []))
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


def _two_lengths(draft: Draft, chain: Item, free: list[Item]) -> None:
    """'0,25 x 0,16 mm', '0.25/0.16': opening and wire, as fine metric cloth is named; coarse or in inches also pitch and wire.

    A rectangular opening stays possible; the wire first is thought of where opening and wire would make no cloth.
    """
    unit = _unit(draft, free)
    first, second = free[0].length(unit), free[1].length(unit)
    written = " x ".join(n.text for n in free)
    rectangular = Option(
        f"rectangular opening {written}",
        (length_claim("aperture", free, unit),),
        POSSIBLE,
        2 if second.mm <= first.mm else 0,
        missing=("wire",),
        sense="opening x wire or rectangle",
    )
    take(free, "aperture")
    if draft.is_slotted:
        draft.claims += rectangular.claims
        return
    free[1].taken = "wire"
    by_stroke = chain.joins and chain.joins[-1] == "/"
    metric = not any(n.unit in ("in", "thou") for n in free) and unit not in ("in",)
    options = [
        Option(
            f"opening {free[0].text}, wire {free[1].text}",
            (length_claim("aperture", free[:1], unit), length_claim("wire", free[1:], unit)),
            USUAL,
            sense="opening or pitch",
        )
    ]
    fine = metric and (
        by_stroke
        or (first.mm <= FINE_MM and not all(n.number and n.number.is_integer and n.unit != "um" for n in free))
    )
    if not fine:
        options.append(
            Option(
                f"pitch {free[0].text}, wire {free[1].text}",
                (length_claim("pitch", free[:1], unit), length_claim("wire", free[1:], unit)),
                USUAL if not metric else POSSIBLE,
                sense="opening or pitch",
            )
        )
    if second.mm > first.mm:
        options.append(
            Option(
                f"wire {free[0].text}, opening {free[1].text}",
                (length_claim("aperture", free[1:], unit), length_claim("wire", free[:1], unit)),
                POSSIBLE,
                0,
                sense="order",
            )
        )
    if not by_stroke and first.mm != second.mm:
        options.append(rectangular)
    draft.choices.append(options)


def _single(draft: Draft, number: Item) -> None:
    """A number alone, by what is known already: beside a count the wire, beside a wire the count or the opening."""
    shape = shape_of([number])
    if number.unit == "hundredths":
        if not _knows_wire(draft) and (draft.has_count or _states_opening(draft)):
            hundredths(draft, "wire", [number])
    elif shape == "G" and not _knows_wire(draft):
        take([number], "wire")
        draft.choices.append(gauge_options(draft, [number]))
    elif shape == "W" and not draft.has_count and not (draft.has_slot("aperture") or draft.has_slot("pitch")):
        _whole_alone(draft, number)
    elif shape in "DLF" and draft.has_count:
        if number.is_length and float(number.length().mm) >= 100:
            return
        if not (_knows_wire(draft) and _states_opening(draft)):
            beside_a_count(draft, number)
    elif shape in "DLF" and (draft.has_slot("aperture") or draft.has_slot("pitch")):
        if not (number.is_length and float(number.length().mm) >= 100):
            _beside_openings(draft, [number], shape)
    elif shape in "DLF":
        _length_alone(draft, number)


def _whole_alone(draft: Draft, number: Item) -> None:
    """'60 .0075', '60 TBC': a whole number beside a wire or a grade is the count; alone it is a question."""
    claim = count_claim([number])
    if claim is None or number.number is None or number.number.value > LARGEST_COUNT:
        return
    if _has_free_wire(draft, [number]) or draft.grade:
        take([number], "count")
        draft.claims.append(claim)
    elif not _knows_wire(draft) and len(draft.numbers()) == 1 and draft.form is None:
        take([number], "count")
        options = [Option(f"{number.text} per inch", (claim,), USUAL, sense="sieve or count")]
        if number.number.value in BARE_NUMBERS and draft.alloy is None:
            options.append(
                Option(f"alloy {number.text}, count not said", (), POSSIBLE, alloy=number.text, sense="alloy or count")
            )
        if sieve := sieve_option(draft, number, POSSIBLE):
            options.append(sieve)
        draft.choices.append(options)


def _length_alone(draft: Draft, number: Item) -> None:
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
    draft.choices.append([opening, pitch] if _knows_wire(draft) else [opening, pitch, wire])


def inches(value: float) -> str:
    """A length in inches as the trade writes it."""
    return f"{value / float(MM_PER_INCH):.4g}"
