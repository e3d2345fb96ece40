"""What can be woven, and what is a slip: the reasons for which a reading is ruled out."""

from dataclasses import dataclass
from fractions import Fraction
from math import sqrt

from catalog.callout.deciding.combining import Combined
from catalog.callout.reading import Side
from catalog.construction import Weave
from catalog.units import MM_PER_INCH

PLAIN_JAM = Fraction(3, 4)
"""(p/D)² of jammed square plain cloth, D = d1 + d2: p/D = 0.866, d/p = 0.577 (Peirce 1937)."""
TWILL_JAM_SHARE = Fraction(73, 100)
"""d/p of 2/2 twill whose wires lie paired."""
THIN, CONVINCING = Fraction(3, 100), Fraction(8, 100)
"""d/p below which no cloth is made; below which an inferred unit isn't believed."""
LARGEST_OPENING_MM, LARGEST_WIRE_MM, LEAST_WIRE_MM, LARGEST_COUNT = 150, 26, Fraction(1, 100), 800
CLOSE_PACKED = (Fraction(3, 10), Fraction(32, 10))
"""Count × wire of the closely packed direction of filter cloth: about 1.1 plain, 1.6 to 2.3 twilled."""


@dataclass(frozen=True, slots=True)
class Fault:
    """Why a reading is no cloth."""

    code: str
    message: str
    twill_only: bool = False
    """True where 2/2 twill could be woven so closely."""


def fault_of(made: Combined, weave: Weave | None, is_filter: bool) -> Fault | None:
    """The first reason against a reading; None where nothing speaks against it."""
    sides = (made.warp, made.weft)
    for side in sides:
        if found := _no_length(side):
            return found
    if is_filter:
        return _filter_fault(made, weave)
    for side in sides:
        if found := _no_opening(side) or _too_thin(side, made.is_inferred) or _out_of_range(side):
            return found
    return _jammed(made.warp, made.weft, weave)


def mm(value: Fraction) -> str:
    """A length in a sentence: '0.4233 mm'."""
    return f"{float(value):.4g} mm"


def _no_length(side: Side) -> Fault | None:
    for name, length in (("pitch", side.pitch), ("wire", side.wire), ("opening", side.aperture)):
        if length is not None and length.written and length.mm <= 0:
            article = "An" if name == "opening" else "A"
            return Fault("E_IMPOSSIBLE", f"{article} {name} of {mm(length.mm)} is no {name}.")
    return None


def _no_opening(side: Side) -> Fault | None:
    """Wire as thick as the pitch leaves no opening."""
    pitch, wire, aperture = side.pitch, side.wire, side.aperture
    if pitch and wire and wire.written and wire.mm >= pitch.mm:
        than = "as thick as" if wire.mm == pitch.mm else "thicker than"
        return Fault("E_IMPOSSIBLE", f"Wire {mm(wire.mm)} is {than} the {mm(pitch.mm)} pitch: there is no opening.")
    if pitch and aperture and aperture.mm >= pitch.mm:
        return Fault(
            "E_IMPOSSIBLE",
            f"An opening of {mm(aperture.mm)} does not fit in a pitch of {mm(pitch.mm)}: no wire is left.",
        )
    return None


def _too_thin(side: Side, is_inferred: bool) -> Fault | None:
    """Wire far too thin for its pitch is a slip of the unit."""
    if not (side.pitch and side.wire) or side.pitch.mm <= 0:
        return None
    share = side.wire.mm / side.pitch.mm
    if share < (CONVINCING if is_inferred else THIN):
        open_area = 100 * float(1 - share) ** 2
        return Fault(
            "E_IMPLAUSIBLE",
            f"Wire {mm(side.wire.mm)} on a {mm(side.pitch.mm)} pitch would leave {open_area:.1f} % open: "
            "no such cloth is woven.",
        )
    return None


def _out_of_range(side: Side) -> Fault | None:
    if side.aperture and side.aperture.mm > LARGEST_OPENING_MM:
        return Fault("E_IMPLAUSIBLE", f"An opening of {mm(side.aperture.mm)} is beyond wire cloth.")
    if side.wire and not LEAST_WIRE_MM <= side.wire.mm <= LARGEST_WIRE_MM:
        return Fault("E_IMPLAUSIBLE", f"A wire of {mm(side.wire.mm)} is beyond wire cloth.")
    if side.pitch and side.by_count and MM_PER_INCH / side.pitch.mm > LARGEST_COUNT:
        return Fault("E_IMPLAUSIBLE", f"{float(MM_PER_INCH / side.pitch.mm):.4g} per inch is beyond square-mesh cloth.")
    return None


def _jammed(warp: Side, weft: Side, weave: Weave | None) -> Fault | None:
    """Wires that can't pass each other: plain cloth beyond d/p 0.577, 2/2 twill beyond 0.73."""
    if not (warp.pitch and warp.wire and weft.pitch and weft.wire):
        return None
    both = warp.wire.mm + weft.wire.mm
    if not _is_jammed(warp.pitch.mm, weft.pitch.mm, both):
        return None
    worst = max((warp, weft), key=_closeness)
    assert worst.pitch
    assert worst.wire
    share = worst.wire.mm / worst.pitch.mm
    twill = all(s.pitch and s.wire and s.wire.mm / s.pitch.mm <= TWILL_JAM_SHARE for s in (warp, weft))
    if weave is Weave.TWILLED and twill:
        return None
    limit = "2/2 twill 0.73" if not twill else "plain weave 0.577"
    return Fault(
        "E_JAMMED",
        f"Wire {mm(worst.wire.mm)} on a {mm(worst.pitch.mm)} pitch is {float(share):.3f} of it: "
        f"jammed beyond {limit}, it can't be woven{' plain' if twill else ''}.",
        twill,
    )


def _closeness(side: Side) -> Fraction:
    return side.wire.mm / side.pitch.mm if side.wire and side.pitch else Fraction(0)


def _is_jammed(warp_pitch: Fraction, weft_pitch: Fraction, both: Fraction) -> bool:
    """Peirce: cos θ1 + cos θ2 = 1 at the limit, with sin θ = p/D; square cloth: p/D = 0.866, kept exact."""
    if warp_pitch == weft_pitch:
        return (warp_pitch / both) ** 2 < PLAIN_JAM
    bends = [sqrt(max(0.0, 1 - float(p / both) ** 2)) for p in (warp_pitch, weft_pitch)]
    return sum(bends) > 1 + 1e-12


def _filter_fault(made: Combined, weave: Weave | None) -> Fault | None:
    """Filter cloth is packed closely in one direction, and its wires are those of that packing."""
    close, wide = (made.warp, made.weft) if weave is Weave.REVERSE_PLAIN_DUTCH else (made.weft, made.warp)
    if wide.pitch and wide.wire and wide.wire.mm >= wide.pitch.mm:
        return Fault("E_IMPOSSIBLE", f"Wire {mm(wide.wire.mm)} does not fit in a {mm(wide.pitch.mm)} pitch.")
    if wide.pitch and wide.wire and wide.wire.mm < wide.pitch.mm / 20:
        return Fault(
            "E_IMPLAUSIBLE", f"Wire {mm(wide.wire.mm)} on a {mm(wide.pitch.mm)} pitch carries no filter cloth."
        )
    if close.pitch and close.wire:
        packing = close.wire.mm / close.pitch.mm
        if not CLOSE_PACKED[0] <= packing <= CLOSE_PACKED[1]:
            return Fault(
                "E_IMPLAUSIBLE",
                f"Wire {mm(close.wire.mm)} on a {mm(close.pitch.mm)} pitch packs {float(packing):.2g} to one: "
                "no filter cloth is woven so.",
            )
    return None
