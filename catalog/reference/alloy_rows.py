"""The alloy table: one wire alloy a row, each figure with its basis."""

import re
from collections.abc import Mapping
from dataclasses import dataclass
from functools import cache

from catalog.reference.rows import rows_of

EN_NUMBER = re.compile(r"\b[1-3]\.\d{4}\b|\bC[WR]\d{3}[A-Z]\b|\bEN AW-\d{4}[A-Z]?\b")
MAGNET = {"yes": True, "no": False, "": None}


@dataclass(frozen=True, slots=True)
class Alloy:
    """A wire alloy."""

    id: str
    generic_name: str
    family: str
    """'austenitic stainless', 'brass', …: what the ladder falls back on."""
    uns: str
    en_numbers: tuple[str, ...]
    """The customary number first: ('1.4307', '1.4306')."""
    en_name: str
    jis: str
    density_kg_m3: float
    basis: str
    """Where the density comes from."""
    tensile_mpa: tuple[float, float] | None
    """Least and most, MPa; None where there is no basis for a figure."""
    tensile_source: str
    magnetic: str
    """A hint for a magnet held to the wire, with its trap."""
    attracts_magnet: bool | None = None
    """None where a magnet can't tell: drawn austenitic wire may pull, annealed wire hardly does."""
    within: str = ""
    """Id of the wider designation that this one lies in: 1.4435 is a 316L; not every 316L is a 1.4435."""
    also: tuple[str, ...] = ()
    """Further spellings."""


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
        en_numbers=tuple(EN_NUMBER.findall(row["en_number"])),
        en_name=row["en_name"],
        jis=row["jis"],
        density_kg_m3=float(row["density_kg_m3"]),
        basis=row["basis"],
        tensile_mpa=(float(low), float(high)) if low and high else None,
        tensile_source=row["tensile_source"],
        magnetic=row["magnetic"],
        attracts_magnet=MAGNET[row["attracts_magnet"]],
        within=row["within"],
        also=tuple(name.strip() for name in row["also"].split(";") if name.strip()),
    )


@cache
def _by_id() -> dict[str, Alloy]:
    return {one.id: one for one in alloys()}


def alloy(alloy_id: str) -> Alloy | None:
    """The alloy with this id."""
    return _by_id().get(alloy_id)
