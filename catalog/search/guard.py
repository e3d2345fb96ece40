"""Guards: an opening may not grow, a wire not thin, a safety distance not change."""

from fractions import Fraction

from catalog.physics.sieving import largest_oversize_um
from catalog.reference import safety
from catalog.search.candidate import Finding, Verdict
from catalog.search.comparison import Comparison
from catalog.search.rules import HouseRules
from catalog.search.wording import mm

SOURCE = "ISO 13857, table 4 (age 14 and over); check the edition in force and local law"


def is_met(c: Comparison) -> bool:
    """Aperture at most, wire at least as asked, each to rounding."""
    return all(
        d.aperture_off is not None
        and d.wire_off is not None
        and d.aperture_off <= d.aperture_rounding
        and d.wire_off >= -d.wire_rounding
        for d in c.directions
    )


def oversize_mm(c: Comparison) -> float | None:
    """Largest single oversize of an opening: the user's figure, or X of the test-sieve edition.

    None for industrial cloth without a figure: no published tolerance could be confirmed for it.
    """
    if c.target.oversize_mm is not None:
        return c.target.oversize_mm
    standard = c.cloth.standard or ""
    edition = "ISO 3310-1:2016" if "3310" in standard else "E11-17" if "E11" in standard else None
    if edition is None or not c.made.is_square:
        return None
    return largest_oversize_um(float(c.made.warp.aperture_mm) * 1000, edition) / 1000


def distances(c: Comparison, oversize: float) -> tuple[float | None, float | None]:
    """Safety distance, mm, behind the asked and the offered opening, both at nominal plus *oversize*."""
    asked = [d.asked_aperture for d in c.directions if d.asked_aperture is not None]
    found = [d.found.aperture_mm for d in c.directions]
    return _distance(asked, oversize), _distance(found, oversize)


def _distance(apertures: list[Fraction], oversize: float) -> float | None:
    short, long = float(min(apertures)), float(max(apertures))
    if short == long:
        return safety.distance_mm(short + oversize, "square")
    return safety.distance_mm(short + oversize, "slot", long + oversize)


def guard_verdict(c: Comparison, rules: HouseRules) -> Verdict:
    """Met or not; where it is met, down to −T interchangeable, below that the cloth opens less."""
    if not c.asks_wire:
        return Verdict.CANNOT_SAY
    if not is_met(c):
        return Verdict.NOT_EQUIVALENT
    oversize = oversize_mm(c)
    if oversize is None:
        return Verdict.CANNOT_SAY
    asked, found = distances(c, oversize)
    if asked is None or found is None:
        return Verdict.CANNOT_SAY
    if found > asked:
        return Verdict.NOT_EQUIVALENT
    if all(d.is_same for d in c.directions):
        return Verdict.SAME
    low = any(d.aperture_off is not None and d.tolerance is not None and d.aperture_off < -d.tolerance
              for d in c.directions)  # fmt: skip
    return Verdict.NEAR_SAFE if low else Verdict.INTERCHANGEABLE


def guard_on_limits(c: Comparison, held: Verdict) -> Verdict:
    """An asked maximum bounds the largest single opening, so it is held to nominal plus oversize."""
    most = c.target.limits.get("aperture_mm", (None, None))[1]
    if held is not Verdict.INTERCHANGEABLE or most is None:
        return held
    oversize = oversize_mm(c)
    if oversize is None:
        return Verdict.CANNOT_SAY
    return held if _largest_mm(c, oversize) <= most + 1e-9 else Verdict.NOT_EQUIVALENT


def _largest_mm(c: Comparison, oversize: float) -> float:
    return max(float(d.found.aperture_mm) for d in c.directions) + oversize


def _largest_finding(c: Comparison, oversize: float) -> list[Finding]:
    most = c.target.limits.get("aperture_mm", (None, None))[1]
    if most is None:
        return []
    largest = _largest_mm(c, oversize)
    text = f"Largest single opening {mm(largest)} (nominal plus {mm(oversize)}); asked is at most {mm(most)}."
    return [Finding("guard opening", largest <= most + 1e-9, text, "as asked")]


def _not_met(c: Comparison) -> list[Finding]:
    """Why a guard isn't met, where it isn't: each direction's opening and wire."""
    if not c.asks_wire:
        return [Finding("guard", None, "For a guard the wire has to be asked as well as the opening.", "house rule")]
    if is_met(c):
        return []
    text = "For a guard no opening may be larger and no wire thinner than asked: here one of them is."
    return [Finding("guard", False, text, "house rule")]


def guard_findings(c: Comparison) -> list[Finding]:
    """What guards need said: the distance at nominal and at the largest opening, or what is missing."""
    if c.made.is_filter:
        return []
    oversize = oversize_mm(c)
    if oversize is None:
        text = (
            "The largest single oversize of an opening is not known for industrial cloth: "
            "state one (--oversize) to judge the safety distance."
        )
        return [*(_not_met(c) if c.asks_aperture else []), Finding("guard distance", None, text, SOURCE)]
    if not c.asks_aperture:
        return _largest_finding(c, oversize)
    return _not_met(c) + _distance_findings(c, oversize)


def _distance_findings(c: Comparison, oversize: float) -> list[Finding]:
    asked, found = distances(c, oversize)
    if asked is None or found is None:
        return [Finding("guard distance", None, "The table of safety distances ends at 120 mm.", SOURCE)]
    nominal = _distance([d.found.aperture_mm for d in c.directions], 0.0)
    text = (
        f"Safety distance behind the offered opening: {nominal:g} mm at nominal, {found:g} mm with "
        f"{mm(oversize)} oversize; {asked:g} mm behind the asked one with the same oversize."
    )
    if found > asked:
        text += " A step is crossed."
    return [Finding("guard distance", found <= asked, text, SOURCE)]
