"""Lengths with and without units: what has no unit is thought of in both."""

from catalog.callout.rules.claims import length_claim, pair
from catalog.callout.rules.draft import POSSIBLE, USUAL, Draft, Option
from catalog.callout.rules.taking import said_again, take
from catalog.callout.text.items import Item


def take_lengths(draft: Draft, slot: str, row: list[Item]) -> None:
    """Lengths with a unit are claims; without one both units are thought of, the likelier first."""
    if row[0].unit == "hundredths" or row[-1].unit == "hundredths":
        _hundredths(draft, slot, row)
    elif any(n.is_length for n in row):
        draft.claims.append(length_claim(slot, row, next(n.unit for n in row if n.is_length)))
    else:
        draft.choices.append(unit_options(draft, slot, row))
    said_again(draft, slot, row)


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
    """The unit of the figures beside it; else inches for a dropped zero, a fraction or beside a count;
    else millimetres.
    """
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
