"""From a reading and what the user wants to a target: every field with its origin."""

import re
from fractions import Fraction

from catalog import tolerance
from catalog.callout.reading import Form, Limits, Reading
from catalog.construction import Weave
from catalog.errors import InputError
from catalog.reference import alloys
from catalog.target import Duty, Need, Purpose, Target, Tolerance

EDITIONS = {"e11": tolerance.E11, "iso3310": tolerance.ISO_3310_1}
HOUSE_SHARE = Fraction(5, 100)


def aim(
    reading: Reading,
    purposes: tuple[Purpose, ...] = (),
    stated_tolerance: str | None = None,
    alloy_rule: str = "same",
    weave: Weave | None = None,
    min_open_area_pct: float | None = None,
    need: Need | None = None,
    particle_is_sphere: bool | None = None,
    oversize_mm: float | None = None,
    duty: Duty | None = None,
    house_share: Fraction = HOUSE_SHARE,
) -> Target:
    """Make the target of one *reading*.

    *stated_tolerance* is a percentage, 'e11' or 'iso3310'. Raises InputError for a name that isn't known.
    """
    allowed, limits = _tolerance(reading, stated_tolerance, house_share)
    if min_open_area_pct is not None:
        limits = {**limits, "open_area_pct": (min_open_area_pct, None)}
    asked_weave, weave_origin = _weave(reading, weave)
    origin = _origins(reading)
    if asked_weave is not None:
        origin["weave"] = weave_origin
    origin["tolerance"] = "stated" if allowed and not allowed.source.startswith("house") else "assumed"
    origin["purpose"] = "stated" if purposes else "assumed"
    return Target(
        reading=reading,
        purposes=purposes,
        tolerance=allowed,
        alloy_rule=alloy_rule if alloy_rule in ("same", "any") else _alloy_id(alloy_rule),
        weave=asked_weave,
        limits=limits,
        need=need or need_of_form(reading.form),
        certificate=reading.certificate,
        particle_is_sphere=particle_is_sphere,
        oversize_mm=oversize_mm,
        duty=duty,
        origin=origin,
    )


def _weave(reading: Reading, stated: Weave | None) -> tuple[Weave | None, str]:
    if stated is not None or reading.weave is not None:
        return stated or reading.weave, "stated"
    has_make = reading.warp.wire is not None or reading.warp.aperture is not None
    return (Weave.PLAIN, "assumed") if has_make and reading.rating is None else (None, "assumed")


def _alloy_id(name: str) -> str:
    known = alloys.find(name)
    if known is None:
        raise InputError(f"No alloy is called {name!r}: 'crosscloth tables alloys' lists them.")
    return known.id


def _tolerance(reading: Reading, stated: str | None, share: Fraction) -> tuple[Tolerance | None, Limits]:
    sides = (reading.warp.aperture, reading.weft.aperture)
    limits = dict(reading.limits)
    if sides[0] is None or sides[1] is None or reading.is_filter:
        return None, limits
    if drawn := _drawn(limits.get("aperture_mm"), sides[0].mm, sides[1].mm):
        del limits["aperture_mm"]
        if stated is None:
            return drawn, limits
    if stated in EDITIONS:
        _check_scope(reading, sides[0].mm == sides[1].mm)
    allowed = [_allowance(side.mm, stated, reading.standard, share) for side in sides if side]
    return Tolerance(float(allowed[0].mm), float(allowed[1].mm), allowed[0].source), limits


def _check_scope(reading: Reading, is_square: bool) -> None:
    """A sieve edition speaks of square test-sieve cloth alone. Raises InputError for any other."""
    coated = reading.finish is not None and "after" in reading.finish
    what = (
        "rectangular cloth" if not is_square else reading.crimp if reading.crimp else reading.finish if coated else None
    )
    if what:
        raise InputError(f"A test-sieve edition has no tolerance for {what}: state a percentage instead.")


def _drawn(bounds: tuple[float | None, float | None] | None, warp: Fraction, weft: Fraction) -> Tolerance | None:
    """A tolerance that the text gives: bounds on both sides of the asked aperture."""
    low, high = bounds or (None, None)
    if low is None or high is None or warp != weft or not low < warp < high:
        return None
    least = min(float(warp) - low, high - float(warp))
    return Tolerance(least, least, "stated in the callout")


def _allowance(aperture: Fraction, stated: str | None, standard: str | None, share: Fraction) -> tolerance.Allowance:
    edition = EDITIONS.get(stated or "") or (_edition(standard) if stated is None else None)
    if edition and Fraction(20, 1000) <= aperture <= 125:
        return tolerance.by_edition(aperture, edition)
    if stated is not None and edition is None:
        return tolerance.by_percent(aperture, _percent(stated))
    return tolerance.by_house_rule(aperture, share)


def _edition(standard: str | None) -> str | None:
    """The sieve edition that the text's standard stands for; none for industrial cloth."""
    if standard is None:
        return None
    if "3310" in standard:
        return tolerance.ISO_3310_1
    return tolerance.E11 if re.search(r"\bE\s?-?11\b|sieve", standard) else None


def _percent(text: str) -> Fraction:
    try:
        percent = Fraction(text.strip().rstrip("%").strip().replace(",", "."))
    except (ValueError, ZeroDivisionError):
        raise InputError(f"A tolerance is a percentage, e11 or iso3310, not {text!r}.") from None
    if not 0 < percent < 100:
        raise InputError(f"A tolerance of {text} % makes no sense: state more than 0 and less than 100.")
    return percent


def _origins(reading: Reading) -> dict[str, str]:
    found: dict[str, str] = {}
    for name, side in (("warp", reading.warp), ("weft", reading.weft)):
        for key in ("pitch", "wire", "aperture"):
            if getattr(side, key) is not None:
                field = f"{name}.{key}_mm"
                found[field] = "derived" if field in reading.derived else "stated"
    for key in ("alloy", "finish", "crimp", "rating", "certificate", "standard", "grade"):
        if getattr(reading, key) is not None:
            found[key] = "stated"
    return found


def need_of_form(form: Form | None) -> Need | None:
    """What a form in the text asks for; None where it says nothing of size or number."""
    if form is None or (form.width_mm is None and form.length_mm is None and form.diameter_mm is None):
        return None
    return Need(form.quantity or 1, form.width_mm, form.length_mm, form.diameter_mm, "as in the callout")


NEED = re.compile(
    r"""^\s*(?:(?P<n>\d+)\s*(?:x(?=\s*(?:disc|ø|dia))|pcs?|pieces?|panels?|off|discs?|rolls?|stk|stück)?\.?\s+)?
        (?:discs?\s+)?(?P<dia>ø|dia\.?\s*)?(?P<a>\d+(?:[.,]\d+)?)\s*(?P<ua>mm|m|in|"|ft|')?
        (?:\s*[x×]\s*(?P<b>\d+(?:[.,]\d+)?)\s*(?P<ub>mm|m|in|"|ft|')?)?\s*$""",
    re.VERBOSE | re.IGNORECASE,
)
UNITS = {"mm": 1.0, "m": 1000.0, "in": 25.4, '"': 25.4, "ft": 304.8, "'": 304.8}


def parse_need(text: str) -> Need:
    """Read '4 pcs 1200x2400 mm', '12 discs 350 mm', '3 Ø 350', '1 x 48 in x 50 ft'.

    The unit must be written; one unit at the end serves both figures. Raises InputError.
    """
    found = NEED.match(text)
    if not found:
        raise InputError(f"A need is written like '4 pcs 1200x2400 mm' or '12 discs 350 mm', not {text!r}.")
    unit_b = found["ub"]
    unit_a = found["ua"] or unit_b
    if unit_a is None or (found["b"] and unit_b is None):
        raise InputError(f"The need {text!r} has no unit: write mm, m, in or ft behind the size.")
    a = float(found["a"].replace(",", ".")) * UNITS[unit_a.lower()]
    pieces = int(found["n"] or 1)
    if pieces < 1 or a <= 0:
        raise InputError(f"The need {text!r} asks for nothing: state a number and a size above 0.")
    if found["b"] is None:
        if not found["dia"] and "disc" not in text.lower():
            raise InputError(f"The need {text!r} has one size only: write 'discs' before it, or width x length.")
        return Need(pieces, diameter_mm=a, written=text)
    b = float(found["b"].replace(",", ".")) * UNITS[unit_b.lower()]
    return Need(pieces, a, b, None, text)
