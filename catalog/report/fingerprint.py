"""The fingerprint of what was compared, so that a signed sheet can say whether the data have changed since."""

import hashlib
import json
from collections.abc import Mapping
from dataclasses import MISSING, Field, fields, is_dataclass
from enum import Enum
from fractions import Fraction
from typing import Any

from catalog.crossref import Answer
from catalog.errors import InputError
from catalog.search.candidate import Candidate
from catalog.search.comparison import compare
from catalog.search.rules import HOUSE_RULES
from catalog.target import Target

LEAST_DIGITS = 12
WORDING = frozenset({"label", "notes", "span", "likelihood"})
"""Fields that hold the program's own words or places in the text: no data."""


def target_of(answer: Answer, candidate: Candidate) -> Target:
    """The target that *candidate* was judged against: the first whose asked figures its deviations show."""
    for target in answer.targets:
        compared = compare(target, candidate.cloth, candidate.turned, HOUSE_RULES)
        asked = {f"{d.name}.aperture": d.asked_aperture for d in compared.directions}
        asked |= {f"{d.name}.wire": d.asked_wire for d in compared.directions}
        shown = {d.name: d.asked for d in candidate.deviations}
        if all(shown.get(name) == (None if value is None else float(value)) for name, value in asked.items()):
            return target
    return answer.targets[0]


def fingerprint(answer: Answer, candidate: Candidate) -> str:
    """SHA-256, as 64 hexadecimal digits, over the cloth's declared and derived values and the target.

    Stock isn't part of it: rolls come and go while the cloth stays. Derived values count to nine digits, and a
    field at its default isn't written, so that a field that is added later changes nothing by itself.
    """
    compared = {
        "cloth": _plain(candidate.cloth),
        "turned": candidate.turned,
        "target": _plain(target_of(answer, candidate)),
    }
    text = json.dumps(compared, sort_keys=True, ensure_ascii=True, separators=(",", ":"))
    return hashlib.sha256(text.encode("ascii")).hexdigest()


def changed_since(sheet_fingerprint: str, answer: Answer, candidate: Candidate) -> bool:
    """True where the compared data differ from those of the sheet.

    *sheet_fingerprint* is as printed, blanks allowed; its first twelve digits are enough. Raises InputError for
    fewer, or for what isn't hexadecimal.
    """
    digits = "".join(sheet_fingerprint.split()).lower()
    if not LEAST_DIGITS <= len(digits) <= 64 or not set(digits) <= set("0123456789abcdef"):
        raise InputError(
            f"A fingerprint is {LEAST_DIGITS} to 64 hexadecimal digits as printed on the sheet, "
            f"not {sheet_fingerprint[:80]!r}."
        )
    return not fingerprint(answer, candidate).startswith(digits)


def grouped(digits: str) -> str:
    """A fingerprint in groups of eight, to be read off paper."""
    return " ".join(digits[i : i + 8] for i in range(0, len(digits), 8))


def _plain(value: Any) -> Any:
    """A value as JSON holds it, the same on every machine."""
    if isinstance(value, Enum):
        return value.value
    if is_dataclass(value):
        told = [f for f in fields(value) if f.name not in WORDING and not _is_default(f, value)]
        return {f.name: _plain(getattr(value, f.name)) for f in told}
    if isinstance(value, Fraction):
        return f"{value.numerator}/{value.denominator}"
    if isinstance(value, float):
        return f"{value:.9g}"
    if isinstance(value, Mapping):
        return {str(key): _plain(entry) for key, entry in value.items()}
    if isinstance(value, tuple | list):
        return [_plain(entry) for entry in value]
    return value


def _is_default(field: "Field[Any]", value: Any) -> bool:
    held = getattr(value, field.name)
    if field.default_factory is not MISSING:
        return bool(held == field.default_factory())
    return field.default is not MISSING and bool(held == field.default)
