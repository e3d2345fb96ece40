"""The axes along which a catalogue is laid out for searching: logarithms, turned-proof.

A pair of figures (warp, weft) is kept as the mean of their logarithms and half their difference. Turning a
cloth leaves the mean alone and changes the sign of the difference, and
w·Δln(warp)² + w·Δln(weft)² = 2w·Δmean² + 2w·Δdifference² (an identity), so that one window on the mean
serves both ways round.
"""

from dataclasses import dataclass
from math import floor, log

from catalog.cloth import Figures, Rating
from catalog.construction import Construction

BAND = 0.01
"""Width of a band of mean apertures (or pitches), in natural logarithms: about 1 %."""


@dataclass(frozen=True, slots=True)
class Axes:
    """One cloth's place. None where the cloth has no such figure."""

    aperture_band: int | None
    ln_aperture_mean: float | None
    ln_aperture_skew: float | None
    pitch_band: int
    ln_pitch_mean: float
    ln_pitch_skew: float
    ln_wire_mean: float
    ln_wire_skew: float
    ln_open_area: float | None
    """Of the open area in percent."""
    ln_rating: float | None
    """Of the rating in µm."""


def mean_and_skew(warp: float, weft: float) -> tuple[float, float]:
    """Mean of the logarithms and half of ln(warp/weft)."""
    warp_ln, weft_ln = log(warp), log(weft)
    return (warp_ln + weft_ln) / 2, (warp_ln - weft_ln) / 2


def band(mean: float) -> int:
    """The band in which a mean logarithm lies."""
    return floor(mean / BAND)


def axes(construction: Construction, figures: Figures, rating: Rating | None) -> Axes:
    """Place a cloth. Raises ValueError where an aperture or open area isn't above 0."""
    warp, weft = construction.warp, construction.weft
    pitch = mean_and_skew(float(warp.pitch_mm), float(weft.pitch_mm))
    wire = mean_and_skew(float(warp.wire_mm), float(weft.wire_mm))
    aperture: tuple[float, float] | tuple[None, None] = (None, None)
    if figures.warp_aperture_mm is not None and figures.weft_aperture_mm is not None:
        aperture = mean_and_skew(figures.warp_aperture_mm, figures.weft_aperture_mm)
    return Axes(
        aperture_band=None if aperture[0] is None else band(aperture[0]),
        ln_aperture_mean=aperture[0],
        ln_aperture_skew=aperture[1],
        pitch_band=band(pitch[0]),
        ln_pitch_mean=pitch[0],
        ln_pitch_skew=pitch[1],
        ln_wire_mean=wire[0],
        ln_wire_skew=wire[1],
        ln_open_area=None if figures.open_area_pct is None else log(figures.open_area_pct),
        ln_rating=None if rating is None else log(rating.um),
    )
