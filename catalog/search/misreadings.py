"""Slips at the bench that the figures give away: zinc, knuckles, too fine a count, wires taken for spaces, magnets."""

from collections.abc import Callable, Iterator, Sequence
from dataclasses import replace

from catalog.reference import alloys
from catalog.search.evidence import Evidence, stand
from catalog.search.measured import Scalar
from catalog.search.suspicion import Suspect

JAMMED = 1 / 3**0.5
"""d/p at which a plain square weave jams: 0.577. Source: Peirce 1937, jammed square cloth."""
FINEST_BY_GLASS_MM = 0.1
"""Pitch that a ×10 glass shows 1 mm apart; finer wants a microscope: common practice."""
MANY_SPACES = 200
ZINC_MM = (0.02, 0.25)
"""What zinc on both sides of a wire may add to its diameter, mm: common practice, no source."""
STEELS = ("carbon steel", "high-carbon steel")
MOST_NAMED = 3

Rule = Callable[[Evidence, Sequence[Suspect]], Iterator[str]]


def warnings_about(evidence: Evidence, suspects: Sequence[Suspect]) -> tuple[str, ...]:
    """Every slip that is likely; *suspects* are the nearest cloths, the likeliest first."""
    return tuple(said for rule in RULES for said in rule(evidence, suspects))


def _nothing_fits(evidence: Evidence, suspects: Sequence[Suspect]) -> Iterator[str]:
    if suspects and not _alive(suspects):
        nearest = suspects[0].cloth.id
        yield (
            f"No cloth fits; the nearest is {nearest}. Another cloth, one made off its nominal figures, or a slip: "
            "measure again before you trust it."
        )


def _wires_for_spaces(evidence: Evidence, suspects: Sequence[Suspect]) -> Iterator[str]:
    """47 spaces lie between 48 wires."""
    count = evidence.count
    if count is None or count.notes:
        return
    spaces = float(count.spaces)
    yield f"{spaces:g} spaces are {spaces + 1:g} wires: the wire that you start from counts as none."
    if count.spaces <= 1 or _alive(suspects):
        return
    fewer = replace(evidence, count=replace(count, spaces=count.spaces - 1))
    named = [s.cloth.id for s in suspects if not stand(s.cloth, fewer).is_out][:MOST_NAMED]
    if named:
        yield f"If {spaces:g} was the number of wires, they are {spaces - 1:g} spaces, and {_list(named)} fits."


def _too_fine(evidence: Evidence, suspects: Sequence[Suspect]) -> Iterator[str]:
    for count in (evidence.count, evidence.count_weft):
        if count is None:
            continue
        if float(count.pitch_mm) < FINEST_BY_GLASS_MM:
            yield (
                f"A pitch of {float(count.pitch_mm):.3g} mm is too fine for a ×10 counting glass: "
                "count under a microscope."
            )
        elif count.spaces > MANY_SPACES:
            yield f"{float(count.spaces):g} spaces are easily miscounted by one: mark tens, or count twice."


def _knuckle(evidence: Evidence, suspects: Sequence[Suspect]) -> Iterator[str]:
    """A micrometer closed on a crossing reads both wires."""
    wire = evidence.wire
    if wire is None or _alive(suspects):
        return
    named = [s.cloth.id for s in suspects if _is_knuckle_of(wire, s)][:MOST_NAMED]
    if named:
        yield (
            f"{float(wire.value):.4g} mm is about warp plus weft wire of {_list(named)}: was the micrometer set on a "
            "knuckle? Unravel a wire and measure it alone."
        )
    elif evidence.count and float(wire.value) >= JAMMED * float(evidence.count.pitch_mm):
        yield (
            f"A wire of {float(wire.value):.4g} mm at a pitch of {float(evidence.count.pitch_mm):.4g} mm can't be "
            "woven plain: was the micrometer set on a knuckle?"
        )


def _is_knuckle_of(wire: Scalar, suspect: Suspect) -> bool:
    made = suspect.made
    both = float(made.warp.wire_mm + made.weft.wire_mm)
    return _out_by_wire_alone(suspect) and abs(float(wire.value) - both) <= max(wire.plus_minus, 0.1 * both)


def _zinc(evidence: Evidence, suspects: Sequence[Suspect]) -> Iterator[str]:
    """Zinc counts as wire under the micrometer."""
    if evidence.wire is None:
        return
    coated = [s.cloth.id for s in _alive(suspects) if _is_zinced(s)][:MOST_NAMED]
    if coated:
        yield (
            f"Zinc counts as wire: on {_list(coated)} the micrometer reads the wire with its coating. "
            "Strip a piece, or take off twice the coating."
        )
    if _alive(suspects):
        return
    under = [s.cloth.id for s in suspects if _fits_under_zinc(evidence.wire, s)][:MOST_NAMED]
    if under:
        yield f"With zinc on the wire {_list(under)} would fit: is it galvanised? Strip a piece and measure again."


def _is_zinced(suspect: Suspect) -> bool:
    return suspect.made.alloy == "GALV" or "galvanised" in (suspect.made.finish or "")


def _fits_under_zinc(wire: Scalar, suspect: Suspect) -> bool:
    known = alloys.alloy(suspect.made.alloy) if suspect.made.alloy else None
    over = float(wire.value - suspect.made.warp.wire_mm)
    is_steel = known is not None and known.family in STEELS
    return is_steel and _out_by_wire_alone(suspect) and ZINC_MM[0] <= over <= ZINC_MM[1]


def _magnet(evidence: Evidence, suspects: Sequence[Suspect]) -> Iterator[str]:
    """A pull is a hint with a trap."""
    if evidence.magnetic is None:
        return
    drawn = [s for s in _alive(suspects) if s.stand.fits["magnet"].drop == 0 and _hint(s)]
    for text in dict.fromkeys(_hint(s) for s in drawn[:MOST_NAMED]):
        names = [s.cloth.id for s in drawn if _hint(s) == text][:MOST_NAMED]
        yield f"Magnet, for {_list(names)}: {text}."
    if not drawn:
        yield "A magnet gives a hint, not the alloy: drawn austenitic wire can pull, and zinc or nickel may hide it."


def _hint(suspect: Suspect) -> str:
    """The alloy table's word, where a magnet can't decide."""
    known = alloys.alloy(suspect.made.alloy) if suspect.made.alloy else None
    return known.magnetic if known and known.attracts_magnet is None else ""


def _alive(suspects: Sequence[Suspect]) -> list[Suspect]:
    return [s for s in suspects if s.is_in_set]


def _out_by_wire_alone(suspect: Suspect) -> bool:
    """Everything fits but the wire."""
    others = [fit for name, fit in suspect.stand.fits.items() if name != "wire"]
    return suspect.stand.fits["wire"].is_out and all(fit.is_within for fit in others)


def _list(names: Sequence[str]) -> str:
    return " or ".join(names)


RULES: tuple[Rule, ...] = (_nothing_fits, _wires_for_spaces, _too_fine, _knuckle, _zinc, _magnet)
