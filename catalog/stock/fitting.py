"""Whether one lot serves a need: wide enough, enough of it, with the certificate that was asked for."""

from dataclasses import dataclass
from math import floor

from catalog.reference import certificates
from catalog.stock.lots import Lot

SOFT_CONVERSION = 0.0015
"""A 39.4 in roll is a 1 m roll: widths agree to 0.15 %."""


@dataclass(frozen=True, slots=True)
class Wanted:
    """What a lot has to serve; None where it wasn't stated. mm."""

    pieces: int | None = None
    width_mm: float | None = None
    length_mm: float | None = None
    diameter_mm: float | None = None
    certificate: str | None = None
    kerf_mm: float = 0.0


@dataclass(frozen=True, slots=True)
class LotFit:
    """The answer with its reason; *pieces* is how many a straight layout gives."""

    ok: bool | None
    why: str
    pieces: int | None = None


def fit(lot: Lot, wanted: Wanted) -> LotFit:
    """Judge *lot*. ok is None where neither size nor certificate was stated."""
    if wanted.certificate is not None:
        meets = certificates.meets(lot.certificate, wanted.certificate) if lot.certificate else None
        if not meets:
            held = lot.certificate or "none on record"
            return LotFit(False, f"certificate {wanted.certificate} asked, {held}")
    width, length = wanted.width_mm, wanted.length_mm
    if wanted.diameter_mm is not None:
        width = length = wanted.diameter_mm
    if width is None:
        return LotFit(None, "no size asked") if wanted.certificate is None else LotFit(True, "certificate meets")
    if length is None:
        return _by_width(lot, width)
    return _by_pieces(lot, wanted, width, length)


def _by_width(lot: Lot, width: float) -> LotFit:
    if lot.width_mm >= width * (1 - SOFT_CONVERSION):
        return LotFit(True, f"{lot.width_mm} mm wide")
    return LotFit(False, f"{lot.width_mm} mm wide, {width - lot.width_mm:.0f} mm too narrow")


def _by_pieces(lot: Lot, wanted: Wanted, width: float, length: float) -> LotFit:
    asked = wanted.pieces or 1
    if _is_whole_roll(lot, width, length):
        return LotFit(True, "the roll as it is", 1) if asked == 1 else LotFit(False, f"1 of {asked} rolls", 1)
    rows = {
        "warp along the length": straight_rows(lot, width, length, wanted.kerf_mm),
        "turned": straight_rows(lot, length, width, wanted.kerf_mm),
    }
    way, (across, along) = max(rows.items(), key=lambda item: (item[1][0] * item[1][1], item[0] != "turned"))
    count = across * along
    if not count:
        return LotFit(False, _why_none(lot, min(width, length), max(width, length)), 0)
    words = f"{across} across × {along} rows, {way}"
    if count >= asked:
        return LotFit(True, f"{asked} from {words}", count)
    return LotFit(False, f"{count} of {asked}: {words}", count)


def _is_whole_roll(lot: Lot, width: float, length: float) -> bool:
    """A roll asked at its full width is taken with its selvedges on."""
    fits = lot.width_mm >= width * (1 - SOFT_CONVERSION) and lot.usable_width_mm < width
    return lot.form == "roll" and fits and lot.free_length_mm >= length * (1 - SOFT_CONVERSION)


def straight_rows(lot: Lot, width: float, length: float, kerf: float) -> tuple[int, int]:
    """How many pieces lie side by side and how many rows follow, with *kerf* mm between them."""
    across = floor((lot.usable_width_mm + kerf) / (width + kerf))
    along = floor((lot.free_length_mm + kerf) / (length + kerf))
    return across, along


def _why_none(lot: Lot, short: float, long: float) -> str:
    if lot.usable_width_mm < short:
        return f"usable width {lot.usable_width_mm} mm, {short - lot.usable_width_mm:.0f} mm too narrow"
    return f"{lot.free_length_mm} mm free, too short for {short:g} × {long:g} mm"
