"""Rules for numbers that a word or a unit names: counts, openings, pitches, wires, gauges, open area, mass, ratings."""

import re
from collections.abc import Sequence
from dataclasses import replace

from catalog.callout.bounds import MOST, figures_of, limit
from catalog.callout.claims import count_claim, gauge_length, gauge_name, length_claim, pair, written_agrees
from catalog.callout.draft import POSSIBLE, USUAL, Claim, Draft, Option
from catalog.callout.items import Item
from catalog.callout.sieve_senses import (
    count_in_german,
    count_option,
    is_opening_of,
    sieve_claims,
    sieve_near,
    sieve_option,
)
from catalog.callout.vocabulary.materials import BARE_NUMBERS
from catalog.cloth import Rating
from catalog.reference import gauges, grades
from catalog.units import MM_PER_INCH, Length

BRINGS_WIRE = re.compile(r"3310|E\s?-?\s?11|410", re.IGNORECASE)
"""Standards of test sieves, whose cloth has a nominal wire; a list of openings alone has none."""
COUNT_UNITS = ("/in", "/cm", "/in2", "/cm2", "mesh sign", "per length")
SYSTEMS = ("USSWG", "SWG", "BWG", "AWG")
COMMON_SYSTEMS = ("USSWG", "SWG")
KEYS = {"aperture": "aperture_mm", "wire": "wire_mm", "pitch": "pitch_mm", "count": "count_per_in"}
TOLERABLE = {"aperture": "aperture", "wire": "wire", "pitch": "pitch", "mesh": "count", "count": "count"}


def groups(draft: Draft, wanted: str) -> list[list[Item]]:
    """The unclaimed numbers of a slot, those of one product together."""
    found: list[list[Item]] = []
    for item in draft.items:
        members = item.members if item.kind == "chain" else [item] if item.is_number else []
        row = [m for m in members if not m.taken and m.slot == wanted]
        if row:
            found.append(row[:2])
    return found


def take(numbers: Sequence[Item], role: str) -> None:
    """Mark numbers as claimed."""
    for number in numbers:
        number.taken = role


def labelled_figures(draft: Draft) -> None:
    """Apply every rule for named figures."""
    for rule in (_open_area_and_mass, _ratings, _counts, _meshes, _designations, _pitches, _apertures, _wires, _gauges):
        rule(draft)


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


def _open_area_and_mass(draft: Draft) -> None:
    """'OA 60.2 %', 'about 0.83 kg/m²': figures that the construction has to agree with."""
    for number in draft.numbers():
        if number.slot == "open_area" or (
            number.unit == "%" and number.slot is None and draft.terms("product") and False
        ):
            number.taken, draft.open_area = "open area", number
        elif number.unit in ("kg/m2", "g/m2", "lb/ft2"):
            number.taken, draft.mass = "mass", number
        elif number.slot == "thickness":
            number.taken = "thickness"
            draft.note(f"thickness {number.text}: stated, not used")


def _ratings(draft: Draft) -> None:
    """'40 µm nominal', '40 µm absolute': what filter cloth holds back, no opening."""
    words = draft.terms("rating")
    lengths = [n for n in draft.numbers() if n.unit == "um" and n.slot in (None, "mesh")]
    for word in words:
        word.taken = "rating"
    if not lengths or not (words or draft.is_dutch):
        return
    kind = next((w.senses["rating"] for w in words if w.senses["rating"] != "unstated"), "unstated")
    number = lengths[0]
    if number.number and (draft.is_dutch or words):
        number.taken = "rating"
        draft.rating = Rating(float(number.number.value), kind)
        draft.is_dutch = True


def _counts(draft: Draft) -> None:
    """'24/cm', '60#', '47 in 20 mm', 'count 60 x 60', '3600 per square inch': counts, exact."""
    for item in draft.items:
        members = item.members if item.kind == "chain" else [item] if item.is_number else []
        row = [
            m
            for m in members
            if not m.taken and (m.slot == "count" or m.unit in COUNT_UNITS or (m.unit == "M" and not _metres(draft, m)))
        ]
        if not row:
            continue
        if len(row) == 1 and item.kind == "chain":
            row = _with_twin(members, row[0])
        if claim := count_claim(row, row[-1].unit if row[-1].unit != "M" else None):
            take(row, "count")
            draft.claims.append(claim)
            said_again(draft, "count", row)


def _metres(draft: Draft, number: Item) -> bool:
    """'60M' is mesh where no other count stands in the text."""
    return any(n is not number and n.slot in ("mesh", "count") for n in draft.all_numbers()) or not number.is_number


def _with_twin(members: list[Item], number: Item) -> list[Item]:
    """The whole number before a count in a product is the other direction's count."""
    at = members.index(number)
    twin = members[at - 1] if at else None
    return (
        [twin, number] if twin is not None and twin.is_count_like and twin.slot is None and not twin.taken else [number]
    )


def _meshes(draft: Draft) -> None:
    """'60 mesh' counts per inch; '1/4 in mesh' and '6 mm mesh' are an opening or a pitch, and nobody can tell which."""
    for item in draft.items:
        members = item.members if item.kind == "chain" else [item] if item.is_number else []
        row = [m for m in members if not m.taken and m.slot == "mesh"][:2]
        if not row:
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
            _mesh_counts(draft, row if len(row) == 2 or item.kind != "chain" else _with_twin(members, row[0]))


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


def _with_custom(counted: Option, wire_in: object) -> Option:
    from fractions import Fraction

    wire = Length(Fraction(str(wire_in)) * MM_PER_INCH)
    note = "wire of the market grade, by custom (from memory)"
    return replace(
        counted, claims=(*counted.claims, Claim("wire", wire, wire, by_custom=True)), likelihood=POSSIBLE, notes=(note,)
    )


def _designations(draft: Draft) -> None:
    """'No. 60' is a sieve's name, unless it is a count; 'Nr. 20' on German lists counts per centimetre."""
    for number in draft.numbers():
        if number.unit != "designation" or number.slot not in (None, "mesh"):
            continue
        number.taken = "count"
        sieve, count = sieve_option(draft, number), count_option(number)
        is_german = (draft.is_metric_tongue or number.system == "Nr") and not draft.standards
        german = count_in_german(draft, number) if is_german else None
        if german and count:
            named = [replace(sieve, likelihood=POSSIBLE)] if draft.is_sieve and sieve else []
            draft.choices.append([german, *named, count])
        elif draft.is_sieve and sieve:
            draft.choices.append([sieve])
        elif sieve and count:
            draft.choices.append(
                [sieve, replace(count, likelihood=POSSIBLE)]
                if number.slot is None
                else [replace(count, likelihood=USUAL), replace(sieve, likelihood=POSSIBLE)]
            )
        elif count and not draft.is_sieve:
            draft.choices.append([replace(count, likelihood=USUAL)])
        else:
            draft.problem("E_NOT_UNDERSTOOD", f"There is no sieve No. {number.text}.", number)
        for again in number.restated:
            _restated_opening(draft, number, again)


def _restated_opening(draft: Draft, number: Item, again: Item) -> None:
    """A length in brackets behind a designation is its opening."""
    again.taken = "aperture"
    if again.is_length:
        length = again.length()
        if is_opening_of(number, length) and draft.is_sieve:
            return
        draft.claims.append(length_claim("aperture", [again]))


def _pitches(draft: Draft) -> None:
    """'10 mm pitch', '1/4 in c/c', 'o.c.': centre to centre."""
    for row in groups(draft, "pitch"):
        take(row, "pitch")
        _lengths(draft, "pitch", row)


def _apertures(draft: Draft) -> None:
    """'0.25 mm aperture', 'maille 0,10', '3/8 sq opg', 'slot 1 x 8 mm': clear openings; of a sieve, with the standard's wire."""
    for row in groups(draft, "aperture"):
        take(row, "aperture")
        if draft.is_sieve and row[0].is_length and _sieve_opening(draft, row[0]):
            said_again(draft, "aperture", row)
        else:
            _lengths(draft, "aperture", row)
    if draft.is_sieve and not any(n.taken == "aperture" for n in draft.all_numbers()):
        for number in draft.numbers():
            if number.slot is None and number.is_length and _sieve_opening(draft, number):
                number.taken = "aperture"
                break


def _sieve_opening(draft: Draft, number: Item) -> bool:
    """'250 µm ISO 3310-1': the opening of a sieve brings the standard's nominal wire; a stated wire goes before it."""
    if any("sieve" in (o.standard or "") or "mesh number" in (o.standard or "") for c in draft.choices for o in c):
        return False
    sieve = sieve_near(number.length())
    if sieve is None:
        draft.problem(
            "E_NOT_UNDERSTOOD",
            f"{number.text} {number.unit} is no opening of the standard's series; say whether a test sieve is meant.",
            number,
        )
        return False
    if not any(BRINGS_WIRE.search(s) for s in draft.standards) and not any(
        n.slot == "wire" for n in draft.all_numbers()
    ):
        opening = length_claim("aperture", [number])
        claims = sieve_claims(sieve, number)
        draft.choices.append(
            [
                Option("sieve cloth with the standard's nominal wire", claims, USUAL, sense="sieve or opening"),
                Option("opening only, wire open", (opening,), POSSIBLE, sense="sieve or opening"),
            ]
        )
        return True
    draft.claims += sieve_claims(sieve, number)
    draft.note(
        f"opening of the sieve series; wire {float(sieve.wire_mm):g} mm is the standard's nominal one"
        if not any(n.slot == "wire" for n in draft.all_numbers())
        else "opening of the sieve series"
    )
    return True


def _wires(draft: Draft) -> None:
    """'.0045 wire', 'Ø 0.4', 'fil 0,065', 'warp wire .015': diameters."""
    for row in groups(draft, "wire"):
        if row[0].unit in ("gauge", "aught"):
            continue
        take(row, "wire")
        _lengths(draft, "wire", row)


def _lengths(draft: Draft, slot: str, row: list[Item]) -> None:
    """Lengths with a unit are claims; without one both units are thought of, the likelier first."""
    if row[0].unit == "hundredths" or row[-1].unit == "hundredths":
        _hundredths(draft, slot, row)
    elif any(n.is_length for n in row):
        draft.claims.append(length_claim(slot, row, next(n.unit for n in row if n.is_length)))
    else:
        draft.choices.append(unit_options(draft, slot, row))
    said_again(draft, slot, row)


def said_again(draft: Draft, slot: str, row: list[Item]) -> None:
    """What stands in brackets behind figures: the same in another unit; behind a count or a sieve's number, its opening."""
    pairs = list(zip(*(n.restated for n in row), strict=False)) if len(row) > 1 else [(a,) for a in row[0].restated]
    if len(row) > 1 and not pairs:
        pairs = [(again,) for again in row[-1].restated]
    for numbers in pairs:
        again = list(numbers)
        take(again, "pitch" if slot == "count" else slot)
        _claim_again(draft, slot, row, again)


def _claim_again(draft: Draft, slot: str, row: list[Item], again: list[Item]) -> None:
    first = again[0]
    if first.is_length:
        draft.claims.append(length_claim("aperture" if slot == "count" else slot, again))
    elif slot == "aperture" and first.unit == "designation":
        if row[0].is_length and not is_opening_of(first, row[0].length()):
            message = f"No. {first.text} doesn't open {row[0].text} {row[0].unit}."
            draft.problem("E_INCONSISTENT", message, first)
    elif slot in ("pitch", "count") and (claim := count_claim(again)):
        draft.claims.append(claim)
    elif first.unit != "gauge":
        message = f"What {first.text} in brackets says of {row[0].text} isn't understood."
        draft.problem("E_NOT_UNDERSTOOD", message, first)


def hundredths(draft: Draft, slot: str, row: list[Item]) -> None:
    """A stroke and 100 behind a number, without a label: see the rule for labelled ones."""
    take(row, slot)
    _hundredths(draft, slot, row)


def _hundredths(draft: Draft, slot: str, row: list[Item]) -> None:
    """'fil 25/100' is 25 hundredths of a millimetre; of an inch where nothing French or metric stands by."""
    lengths = [n.length("mm") for n in row]
    draft.note(f"{row[0].text}: hundredths of a millimetre")
    options = [Option(f"{row[0].text} mm", (pair(slot, row, lengths),), USUAL, sense="unit")]
    if not draft.is_metric_tongue:
        inch = [n.length("in") for n in row]
        options.append(Option(f"{row[0].text} in", (pair(slot, row, inch),), POSSIBLE, is_inferred=True, sense="unit"))
    draft.choices.append(options)


def unit_options(draft: Draft, slot: str, row: list[Item]) -> list[Option]:
    """A length without a unit: inches and millimetres, the preferred one first."""
    first = preferred_unit(draft, row)
    other = "mm" if first == "in" else "in"
    last = 2 if other == "mm" and not draft.is_dutch else 1
    dropped_zero = any(n.number and n.number.written[0] == "." for n in row)
    written = "/".join(n.text for n in row)
    return [
        Option(
            "",
            (length_claim(slot, row, unit),),
            USUAL,
            rank,
            rank > 0,
            (f"{written}: no unit; taken as {unit}",) if rank or unit == "mm" or not dropped_zero else (),
            sense="unit" if rank < 2 else "unit dropped zero",
        )
        for unit, rank in ((first, 0), (other, last if dropped_zero else 1))
    ]


def preferred_unit(draft: Draft, row: list[Item]) -> str:
    """The unit of the figures beside it; else inches for a dropped zero, a fraction or beside a count; else millimetres."""
    cloth = [
        n
        for n in draft.all_numbers()
        if n.is_length
        and n.taken not in ("form", "rating", "limit")
        and n not in row
        and n.unit not in ("m", "ft", "cm")
    ]
    if cloth:
        return "in" if cloth[0].unit in ("in", "thou") else "mm"
    spelled = [n.number.written for n in draft.all_numbers() if n.number and n.unit is None and not n.number.is_integer]
    if any(s[0] == "." for s in spelled) or any(n.number and n.number.kind == "fraction" for n in draft.all_numbers()):
        return "in"
    if any("," in s for s in spelled) or any(n.unit == "/cm" for n in draft.all_numbers()):
        return "mm"
    return "in" if draft.has_count else "mm"


def _gauges(draft: Draft) -> None:
    """'28 SWG' names its system; of '16 ga' every system is a reading, unless a diameter in brackets settles it."""
    for item in draft.items:
        members = item.members if item.kind == "chain" else [item] if item.is_number else []
        row = [m for m in members if not m.taken and m.unit == "gauge"][:2]
        if row:
            take(row, "wire")
            draft.choices.append(gauge_options(draft, row))


def gauge_options(draft: Draft, row: list[Item]) -> list[Option]:
    """The senses of a gauge, by system."""
    named = row[-1].system or "?"
    systems = [named] if named != "?" else [s for s in SYSTEMS if all(gauge_length(n, s) for n in row)]
    stated = [again.length() for n in row for again in n.restated if again.is_length]
    options = []
    for system in systems:
        lengths = [gauge_length(n, system) for n in row]
        known = [x for x in lengths if x is not None]
        if len(known) < len(row):
            draft.problem(
                "E_NOT_UNDERSTOOD", f"{gauges.system_name(system)} has no number {gauge_name(row[0])}.", row[0]
            )
            continue
        options.append(_gauge_option(row, system, known))
    if named == "SWG" and (steel := gauge_length(row[0], "USSWG")) and options:
        inches = float(steel.mm / MM_PER_INCH)
        draft.note(f"SWG taken as the British standard; the US steel wire gauge of that number is {inches:.4f} in")
    for n in row:
        take(n.restated, "wire")
    return _settled(draft, row, options, stated) if stated else _merged(options)


def _gauge_option(row: list[Item], system: str, lengths: list[Length]) -> Option:
    name = "/".join(gauge_name(n) for n in row)
    inches = "/".join(f"{float(x.mm / MM_PER_INCH):.4f}".lstrip("0") for x in lengths)
    likelihood = USUAL if system in COMMON_SYSTEMS or row[-1].system != "?" else POSSIBLE
    label = f"gauge {name} {gauges.system_name(system)} ({inches} in)"
    return Option(label, (pair("wire", row, lengths),), likelihood, notes=(label,), sense="gauge system")


def _settled(draft: Draft, row: list[Item], options: list[Option], stated: list[Length]) -> list[Option]:
    """The systems that agree with the diameter beside the number; none: the two contradict each other."""
    agreeing = [o for o in options if o.claims[0].warp and written_agrees(o.claims[0].warp, stated[0])]
    if agreeing:
        return [
            replace(
                agreeing[0],
                likelihood=USUAL,
                label=f"gauge {gauge_name(row[0])}, settled by the diameter beside it",
                notes=("the diameter beside the gauge settles its system",),
            )
        ]
    claim = Claim("wire", stated[0], stated[0])
    draft.problem(
        "E_INCONSISTENT",
        f"Gauge {gauge_name(row[0])} is no wire of {float(stated[0].mm):.4g} mm in any system named.",
        row[0],
    )
    return [
        Option(f"wire {float(stated[0].mm):.4g} mm as stated", (claim,), USUAL, sense="gauge or diameter"),
        *_merged(options),
    ]


def _merged(options: list[Option]) -> list[Option]:
    """Systems that give the same wire are one reading."""
    kept: dict[tuple[object, object], Option] = {}
    for option in options:
        claim = option.claims[0]
        key = (claim.warp and claim.warp.mm, claim.weft and claim.weft.mm)
        kept.setdefault(key, option)
    return list(kept.values())
