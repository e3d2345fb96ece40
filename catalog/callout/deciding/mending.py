"""What is offered where figures contradict each other or make no cloth: each with its numbers, none chosen."""

from dataclasses import dataclass, replace
from fractions import Fraction

from catalog.callout.deciding.combining import Clash, Combined, combine
from catalog.callout.deciding.feasible import fault_of, mm
from catalog.callout.reading import Side
from catalog.callout.rules.draft import USUAL, Claim, Draft, Option
from catalog.reference import sieves
from catalog.units import MM_PER_INCH, Length

NAMES = {"pitch": "count", "wire": "wire", "aperture": "opening"}
SLIPS: tuple[tuple[Fraction, str], ...] = (
    (MM_PER_INCH, "inches meant"),
    (1 / MM_PER_INCH, "millimetres meant"),
    (Fraction(1000), "millimetres meant, not micrometres"),
    (Fraction(1, 1000), "micrometres meant"),
)
CONVINCING = (Fraction(1, 10), Fraction(577, 1000))


@dataclass(frozen=True, slots=True)
class Mended:
    """A repair: the reading that it makes, and what it is called."""

    made: Combined
    label: str
    standard: str | None = None
    notes: tuple[str, ...] = ()


def _name(slot: str, side: Side) -> str:
    """What a figure is called: a pitch that was counted is a count."""
    return "pitch" if slot == "pitch" and not side.by_count else NAMES[slot]


def clash_message(clash: Clash) -> str:
    """The contradiction in one sentence with its numbers."""
    if clash.kind == "spelling":
        one, other = clash.lengths
        off = abs(other.mm / one.mm - 1) * 100 if one.mm else Fraction(0)
        said = f"{mm(one.mm)} and {mm(other.mm)}, {float(off):.2g} % apart"
        return f"Two figures for the {NAMES[clash.slot]} disagree: {said}."
    pitch, wire, aperture = clash.lengths
    if pitch.mm <= 0:
        return f"A count or pitch of {pitch.written} is none."
    said = f"{float(MM_PER_INCH / pitch.mm):.4g} per inch is {mm(pitch.mm)}"
    return f"{mm(aperture.mm)} opening + {mm(wire.mm)} wire = {mm(aperture.mm + wire.mm)} pitch, but {said}."


def mend_clash(draft: Draft, made: Combined) -> list[Mended]:
    """Each pair of the three figures, or each spelling of the one; and the sieve with which all agree."""
    clash = made.clashes[0]
    found: list[Mended] = []
    if clash.kind == "spelling":
        for length in clash.lengths:
            claims = [c for c in made.claims if c.slot != clash.slot or length in (c.warp, c.weft)]
            found.append(_mended(draft, made, claims, f"{_name(clash.slot, made.warp)} {mm(length.mm)}"))
    else:
        for dropped in ("aperture", "pitch", "wire"):
            claims = [c for c in made.claims if c.slot != dropped]
            kept = " and ".join(_name(s, made.warp) for s in ("pitch", "aperture", "wire") if s != dropped)
            found.append(_mended(draft, made, claims, kept))
        found = _with_sieve(made, found)
    return [m for m in found if not m.made.clashes and fault_of(m.made, draft.weave, draft.is_dutch) is None]


def _mended(draft: Draft, made: Combined, claims: list[Claim], label: str) -> Mended:
    option = Option("", tuple(claims), USUAL)
    again = combine((), (option,), draft.is_dutch)
    return Mended(replace(again, options=tuple(replace(o, claims=()) for o in made.options)), label)


def _with_sieve(made: Combined, found: list[Mended]) -> list[Mended]:
    """Where the count is a sieve's number and opening and wire are that sieve's, say so first."""
    side = made.warp
    _, wire, aperture = made.clashes[0].lengths
    if not side.by_count:
        return found
    pitch = made.clashes[0].lengths[0]
    count = MM_PER_INCH / pitch.mm
    sieve = sieves.by_number(str(count)) if count.denominator == 1 else None
    if (
        sieve is None
        or abs(sieve.opening_mm - aperture.mm) > aperture.rounding_mm
        or not sieve.wire_min_mm <= wire.mm <= sieve.wire_max_mm
    ):
        return found
    named = next(m for m in found if m.label == "opening and wire")
    rest = [m for m in found if m is not named]
    note = f"as sieve No. {count} all figures agree"
    return [
        replace(named, label=f"as sieve No. {count}", standard=f"sieve designation No. {count}", notes=(note,)),
        *rest,
    ]


def mend_unit(draft: Draft, made: Combined) -> list[Mended]:
    """The unit slips that would explain a reading that makes no cloth: factor 25.4 or 1000 in one figure."""
    if made.clashes or any(o.sense.startswith("unit") for o in made.options):
        return []
    found = []
    for slot in ("wire", "aperture"):
        stated = [c for c in made.claims if c.slot == slot and not c.by_custom]
        for factor, meaning in SLIPS if stated else ():
            claims = [c if c not in stated else _scaled(c, factor) for c in made.claims]
            again = _mended(draft, made, claims, "")
            length = again.made.warp.wire if slot == "wire" else again.made.warp.aperture
            if (
                length is not None
                and _is_convincing(again.made)
                and fault_of(again.made, draft.weave, draft.is_dutch) is None
            ):
                found.append(replace(again, label=f"{NAMES[slot]} {mm(length.mm)}, {meaning}"))
    return found


def _scaled(claim: Claim, factor: Fraction) -> Claim:
    def times(length: Length | None) -> Length | None:
        return (
            None
            if length is None
            else replace(length, mm=length.mm * factor, half_unit_mm=length.half_unit_mm * factor)
        )

    return replace(claim, warp=times(claim.warp), weft=times(claim.weft))


def _is_convincing(made: Combined) -> bool:
    return all(
        side.pitch is not None
        and side.wire is not None
        and side.pitch.mm > 0
        and CONVINCING[0] <= side.wire.mm / side.pitch.mm <= CONVINCING[1]
        for side in (made.warp, made.weft)
    )
