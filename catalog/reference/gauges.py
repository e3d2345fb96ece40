"""Wire gauges: the same number is another wire in another system."""

from collections.abc import Mapping
from fractions import Fraction
from functools import cache

from catalog.reference.rows import rows_of

SOURCE = "Machinery's Handbook (2012), as in the library fluids 1.3.1; SWG 28 from BS 3737, from memory"
SYSTEMS = ("SWG", "BWG", "AWG", "USSWG", "MUSIC", "STUBS")


@cache
def _table() -> dict[str, dict[str, Fraction]]:
    found: dict[str, dict[str, Fraction]] = {}
    for row in rows_of("gauges"):
        found.setdefault(row["system"], {})[row["gauge"]] = Fraction(row["diameter_in"])
    return found


def system_name(system: str) -> str:
    """The name of a system: 'US steel wire gauge'."""
    return next((row["system_name"] for row in rows_of("gauges") if row["system"] == system), system)


def diameter_in(system: str, gauge: str) -> Fraction | None:
    """Diameter in inches, exact, of *gauge* ('28', '5/0') in *system*; None where it has no such number."""
    return _table().get(system, {}).get(gauge)


def readings(gauge: str) -> Mapping[str, Fraction]:
    """Every system that has this number, with the diameter in inches."""
    return {system: sizes[gauge] for system in SYSTEMS if gauge in (sizes := _table().get(system, {}))}


@cache
def rows() -> tuple[Mapping[str, str | float], ...]:
    """The whole table: system, system_name, gauge, diameter_in, diameter_mm (numbers), source."""
    return tuple(
        {
            "system": row["system"],
            "system_name": row["system_name"],
            "gauge": row["gauge"],
            "diameter_in": float(row["diameter_in"]),
            "diameter_mm": float(row["diameter_mm"]),
            "source": row["source"],
        }
        for row in rows_of("gauges")
    )
