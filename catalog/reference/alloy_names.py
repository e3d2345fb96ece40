"""An alloy by any of its names: trade number, EN, UNS and JIS designations, however they are spelled."""

import re
from collections.abc import Iterator
from functools import cache

from catalog.reference.alloy_rows import Alloy, alloy, alloys

NUMBER_PREFIX = re.compile(r"(?:werkstoff(?:nummer|nr)?|werkst|wnr|w|mat(?:erial)?nr|din|en|uns|jis|astm|x(?=\d\.))+")
"""What may stand before a number of any standard: 'W.-Nr. 1.4301', 'UNS S30400'."""
STAINLESS_PREFIX = re.compile(
    r"(?:aisi|sae|astm|type|typ|tp|grade|gr|t|sus|sst|ss|stainless(?:steel)?|inox|edelstahl|rvs)+"
)
"""What may stand before a stainless number only: 'T304', 'SS 316'. 'SS400' is a structural steel, not alloy 400."""
STAINLESS_SUFFIX = re.compile(r"(?:ss|sst|stainless(?:steel)?|inox)$")
SPLIT = re.compile(r"[()/,;=]|\bor\b|\s(?=X\d)")
UNS = re.compile(r"\b[A-Z]\d{5}\b")
JIS = re.compile(r"\b(?:SU[SH]|NW|NCF|C|A)\d{3,4}[A-Z]{0,2}\d?[A-Z]?\b|\bSWM\b")
EN_NAME = re.compile(r"X\d+[A-Za-z]+[\d-]+|Cu[A-Z][a-z]\d+|Ni[A-Z]\w+|Ti\d|Cu-ETP")


def find(name: str) -> Alloy | None:
    """The alloy of any spelling: '304', 'T-304', 'W1.4301', 'SUS304', 'S30400', 'X5CrNi18-10', '1.4404 (316L)'.

    None for what is not in the table, for a name of several alloys ('stainless', 'brass', 'bronze') and for
    names that disagree ('304/316'); of a wide and a narrow one ('316L / 1.4435') the narrow one counts.
    """
    exact = alloy(name.strip())
    return exact or _single(name) or _agreed([part for part in SPLIT.split(name) if part.strip()])


def _agreed(parts: list[str]) -> Alloy | None:
    found = [_single(part) for part in parts]
    known = {one.id: one for one in found if one}
    if None in found or not known:
        return None
    narrow = [one for one in known.values() if not any(other.within == one.id for other in known.values())]
    return narrow[0] if len(narrow) == 1 else None


def _single(name: str) -> Alloy | None:
    key = _key(name)
    return _by_name().get(key) or _stainless(key) or _numbered(key)


def _stainless(key: str) -> Alloy | None:
    """'t304', 'aisi316l', '304ss': what leads up to a stainless number says nothing of other alloys."""
    plain = STAINLESS_SUFFIX.sub("", STAINLESS_PREFIX.sub("", key, count=1))
    one = _by_name().get(plain if STAINLESS_PREFIX.match(key) else STAINLESS_SUFFIX.sub("", key))
    return one if one and "stainless" in one.family else None


def _numbered(key: str) -> Alloy | None:
    """'uns n04400', 'w1.4301'; a bare trade number follows 'alloy' only: 'UNS 400' is nobody's designation."""
    number = NUMBER_PREFIX.sub("", key, count=1) if NUMBER_PREFIX.match(key) else ""
    if number and not number[:3].isdecimal():
        return _by_name().get(number)
    return _by_name().get(key.removeprefix("alloy")) if key.startswith("alloy") else None


def _key(name: str) -> str:
    """Without spaces, hyphens and case; a point stays within a number only: 'W.-Nr. 1.4301' → 'wnr1.4301'."""
    plain = re.sub(r"[\s\-_]", "", name.casefold())
    return re.sub(r"(?<!\d)\.|\.(?!\d)", "", plain)


@cache
def _by_name() -> dict[str, Alloy]:
    found: dict[str, Alloy] = {}
    for one in alloys():
        for name in _names(one):
            key = _key(name)
            if len(key) > 1:
                found.setdefault(key, one)
    return found


def _names(one: Alloy) -> Iterator[str]:
    yield from (one.id, one.generic_name, *one.en_numbers, *one.also)
    yield from UNS.findall(one.uns if " to " not in one.uns else "")
    yield from JIS.findall(one.jis)
    yield from EN_NAME.findall(one.en_name)
