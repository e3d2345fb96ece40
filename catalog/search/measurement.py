"""Lengths and counts as people write them: '47 in 20 mm', '0.165±0.005 mm', '.0065 in'."""

import re
from fractions import Fraction

from catalog.errors import InputError
from catalog.search.measure_cursor import PLUS_MINUS, Cursor
from catalog.search.measured import Count, Scalar, expanded_of_limit
from catalog.units import MM_PER_UNIT

INSTRUMENTS_MM = {"micrometer": 0.005, "optical": 0.002, "calliper": 0.05, "steel rule": 0.25}
"""Expanded uncertainty (k = 2) taken where none is written, mm: common practice, no source."""
USUAL_INSTRUMENT = {"wire": "micrometer", "thickness": "micrometer", "aperture": "optical"}
COARSE_APERTURE_MM = Fraction(2)
"""From here an aperture is taken to be measured with a calliper."""

OVER = re.compile(r"(?:in|on|over|per|auf|je|/)(?=[\s\d.,/])|/", re.IGNORECASE)
SPACES = re.compile(r"(?:spaces?|openings?|pitches|pitch)\b", re.IGNORECASE)
WIRES = re.compile(r"wires?\b", re.IGNORECASE)


def parse_length(text: str, quantity: str) -> Scalar:
    """Read a measured 'wire', 'aperture' or 'thickness'. ± is k = 2; without one the instrument's default counts.

    The unit must be written; one serves value and ±. Raises InputError with the column.
    """
    here = Cursor(text, quantity, "'0.165±0.005 mm', '.0065 in' or '0.165 mm by micrometer'")
    number = here.number()
    unit, start = here.unit(), here.at
    error = here.plus_minus()
    tool = here.tool()
    here.end()
    known = unit or error.unit
    if known is None:
        raise here.complaint("the unit is missing: write mm, µm, in or thou", len(text))
    mm = number.value * MM_PER_UNIT[known]
    stated = error.of(mm, MM_PER_UNIT[error.unit or known])
    if stated is not None and stated >= mm:
        raise here.complaint("the uncertainty isn't smaller than the value", start)
    half_unit = expanded_of_limit(float(number.length(known).rounding_mm))
    return _scalar(mm, None if stated is None else float(stated), half_unit, tool or "", quantity, text)


def _scalar(mm: Fraction, stated: float | None, half_unit: float, tool: str, quantity: str, text: str) -> Scalar:
    """The stated ±, else the wider of the instrument's and what the last written digit leaves open."""
    if stated is not None:
        return Scalar(mm, stated, text.strip(), tool)
    usual = "calliper" if quantity == "aperture" and mm >= COARSE_APERTURE_MM else USUAL_INSTRUMENT[quantity]
    instrument = tool or usual
    return Scalar(mm, max(INSTRUMENTS_MM[instrument], half_unit), text.strip(), instrument, True)


def parse_count(text: str) -> Count:
    """Read spaces over a length: '47 in 20 mm', '47±1 in 20±0.1 mm', '48 wires in 20 mm', '60 per inch'.

    Without ± the true number lies within ±½ space (a rectangular limit) and the length counts as exact,
    but ±0.25 mm (k = 2) by steel rule. Wires are one more than spaces. Raises InputError with the column.
    """
    here = Cursor(text, "count", "'47 in 20 mm' or '118 spaces in 50 mm'")
    spaces = here.number().value
    limit = here.number().value if here.take(PLUS_MINUS) else Fraction(1, 2)
    notes: tuple[str, ...] = ()
    if here.take(SPACES) is None and here.take(WIRES):
        notes = (f"{float(spaces):g} wires, first and last counted, are {float(spaces - 1):g} spaces.",)
        spaces -= 1
    if here.take(OVER) is None:
        raise here.complaint("over what length? 'in' and a length were expected here")
    length, error = _length(here)
    if here.tool() == "steel rule" and error == 0:
        error = INSTRUMENTS_MM["steel rule"]
    here.end()
    _check_count(here, spaces, limit, length, error)
    return Count(spaces, length, limit, error, text.strip(), notes)


def _length(here: Cursor) -> tuple[Fraction, float]:
    """A length and its ±, mm; a unit alone is one of it."""
    alone = here.unit()
    if alone is not None:
        return MM_PER_UNIT[alone], 0.0
    number, unit = here.number(), here.unit()
    error = here.plus_minus()
    known = unit or error.unit
    if known is None:
        raise here.complaint("the unit of the length is missing: write mm, cm or in")
    mm = number.value * MM_PER_UNIT[known]
    return mm, float(error.of(mm, MM_PER_UNIT[error.unit or known]) or 0)


def _check_count(here: Cursor, spaces: Fraction, limit: Fraction, length: Fraction, error: float) -> None:
    if spaces < 1:
        raise here.complaint("count at least one space", 0)
    if limit >= spaces:
        raise here.complaint("the limit isn't smaller than the count", 0)
    if error >= length:
        raise here.complaint("the uncertainty isn't smaller than the length")


def parse_magnet(text: str) -> bool:
    """Read 'yes' or 'no': whether a magnet was attracted. Raises InputError."""
    said = {"yes": True, "y": True, "no": False, "n": False}.get(text.strip().lower())
    if said is None:
        raise InputError(f"A magnet is attracted or not: write yes or no, not {text!r}.", text=text)
    return said
