"""Wire alloys: designations, density with its basis, and the ladder that says what may stand in for what."""

import re
from collections.abc import Mapping
from dataclasses import dataclass
from functools import cache

from catalog.reference.rows import rows_of

SOURCE = "designations and densities as marked in each row; 'memory' wants confirming against the standard"


@dataclass(frozen=True, slots=True)
class Alloy:
    """A wire alloy."""

    id: str
    generic_name: str
    family: str
    uns: str
    en_numbers: tuple[str, ...]
    en_name: str
    jis: str
    density_kg_m3: float
    basis: str
    """Where the density comes from."""
    tensile_mpa: tuple[float, float] | None
    tensile_source: str
    magnetic: str
    """A hint for a magnet held to the wire, with its trap."""


@dataclass(frozen=True, slots=True)
class Gate:
    """Whether one alloy may stand in for another."""

    outcome: str
    """'same', 'accepted', 'ask' or 'blocked'."""
    note: str
    source: str


@cache
def alloys() -> tuple[Alloy, ...]:
    """Every alloy of the table."""
    return tuple(_alloy(row) for row in rows_of("alloys"))


def _alloy(row: Mapping[str, str]) -> Alloy:
    low, high = row["tensile_mpa_least"], row["tensile_mpa_most"]
    return Alloy(
        id=row["id"],
        generic_name=row["generic_name"],
        family=row["family"],
        uns=row["uns"],
        en_numbers=tuple(re.findall(r"\b\d\.\d{4}\b|\bC[WR]?\d{3}[A-Z]\b|\bCW\d{3}[A-Z]\b", row["en_number"])),
        en_name=row["en_name"],
        jis=row["jis"],
        density_kg_m3=float(row["density_kg_m3"]),
        basis=row["basis"],
        tensile_mpa=(float(low), float(high)) if low and high else None,
        tensile_source=row["tensile_source"],
        magnetic=row["magnetic"],
    )


@cache
def _by_id() -> dict[str, Alloy]:
    return {alloy.id: alloy for alloy in alloys()}


def alloy(alloy_id: str) -> Alloy | None:
    """The alloy with this id."""
    return _by_id().get(alloy_id)


def density_kg_m3(alloy_id: str) -> float | None:
    """Density, kg/m³; None where the alloy isn't in the table."""
    known = alloy(alloy_id)
    return known.density_kg_m3 if known else None


PREFIX = re.compile(
    r"^(?:aisi|astm|type|tp|uns|din|werkst(?:off)?|wnr|en|jis|grade|alloy|ss|t|w|x(?=\d\.))+(?=\d|[a-z]\d|n0|x)"
)
SUFFIX = re.compile(r"(?:ss|sst|stainless|steel)+$")


def _key(name: str) -> str:
    return re.sub(r"[\s\-_/]", "", name.casefold())


@cache
def _by_name() -> dict[str, Alloy]:
    found: dict[str, Alloy] = {}
    for one in alloys():
        names = [one.id, one.generic_name, one.en_name, *one.en_numbers]
        for text in (one.uns, one.jis):
            names += re.split(r"[/,]| or ", text)
        for name in names:
            plain = _key(re.sub(r"\(.*?\)", "", name))
            if len(plain) > 1 and plain not in ("as", "ascs"):
                found.setdefault(plain, one)
    return found


def find(name: str) -> Alloy | None:
    """The alloy of any spelling: '304', 'T-304', 'AISI 304', '1.4301', 'W1.4301', 'SUS304', 'S30400', 'X5CrNi18-10'.

    None for a bare family name: 'stainless', 'brass' and 'bronze' name several alloys.
    """
    key = _key(name).strip(".")
    known = _by_name()
    for candidate in (key, SUFFIX.sub("", key), PREFIX.sub("", key), SUFFIX.sub("", PREFIX.sub("", key))):
        if candidate in known:
            return known[candidate]
    return None


@cache
def _ladder() -> dict[tuple[str, str], Gate]:
    return {
        (row["asked"], row["offered"]): Gate(row["outcome"], row["note"], row["source"])
        for row in rows_of("alloy_ladder")
    }


def gate(asked: str, offered: str) -> Gate:
    """Whether *offered* may stand in for *asked*: the ladder's own row, a row with '*', else by family."""
    if asked == offered:
        return Gate("same", "", "")
    ladder = _ladder()
    for pair in ((asked, offered), ("*", offered), (asked, "*")):
        if pair in ladder:
            return ladder[pair]
    one, other = alloy(asked), alloy(offered)
    if one is None or other is None:
        unknown = asked if one is None else offered
        return Gate("ask", f"{unknown} is not in the alloy table", "")
    if one.family == other.family:
        return Gate("ask", f"both are {one.family}; no rule on the ladder for this pair", "house rule")
    return Gate("blocked", f"{one.family} was asked, this is {other.family}", "house rule")
