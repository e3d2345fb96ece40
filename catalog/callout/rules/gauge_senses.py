"""Wire gauges: the same number is another wire in another system, and none is picked silently."""

from dataclasses import replace

from catalog.callout.rules.claims import gauge_length, gauge_name, pair, written_agrees
from catalog.callout.rules.draft import POSSIBLE, USUAL, Claim, Draft, Option
from catalog.callout.rules.taking import take
from catalog.callout.text.items import Item
from catalog.reference import gauges
from catalog.units import MM_PER_INCH, Length

SYSTEMS = ("USSWG", "SWG", "BWG", "AWG")
COMMON_SYSTEMS = ("USSWG", "SWG")


def gauge_figures(draft: Draft) -> None:
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
