"""A count and nothing else: a count, a sieve's number, or millimetres by habit."""

from dataclasses import replace
from fractions import Fraction

from catalog.callout.reading import Likelihood, Reading, Side
from catalog.callout.rules.draft import Draft
from catalog.callout.rules.sieve_senses import sieve_claims
from catalog.reference import sieves
from catalog.units import MM_PER_INCH, Length


def bare_count(draft: Draft, readings: list[Reading], alive: list[Reading]) -> tuple[list[Reading], bool]:
    """'4 mesh' and nothing else: a count, a sieve's number, or millimetres by metric habit."""
    if len(alive) != 1 or not _is_count_only(alive[0]) or draft.limits or draft.grade or draft.weave:
        return readings, False
    pitch = alive[0].warp.pitch
    number = MM_PER_INCH / pitch.mm if pitch else Fraction(0)
    sieve = sieves.by_number(str(number)) if number.denominator == 1 else None
    if sieve is None or alive[0].warp != alive[0].weft:
        return readings, False
    if draft.alloy or draft.form or draft.terms("material") or any(i.taken == "alloy" for i in draft.items):
        note = f"{number} is a sieve's number too: No. {number} opens {float(sieve.opening_mm):.4g} mm"
        return [replace(r, notes=(*r.notes, note)) if r is alive[0] else r for r in readings], False
    aperture, wire = sieve_claims(sieve)
    side = Side(Length(sieve.opening_mm + sieve.wire_mm), wire.warp, aperture.warp)
    named = replace(
        alive[0],
        label=f"sieve No. {number}",
        likelihood=Likelihood.POSSIBLE,
        warp=side,
        weft=side,
        standard=f"sieve designation No. {number}",
        derived=("warp.pitch_mm", "weft.pitch_mm"),
    )
    extra = [named]
    if number <= 25:
        opening = Side(aperture=Length(number))
        extra.append(
            replace(
                alive[0],
                label=f"{number} mm mesh, by metric habit",
                likelihood=Likelihood.POSSIBLE,
                warp=opening,
                weft=opening,
            )
        )
    return [*readings, *extra], True


def _is_count_only(reading: Reading) -> bool:
    return reading.warp.by_count and not any(
        (reading.warp.wire, reading.warp.aperture, reading.weft.wire, reading.weft.aperture)
    )
