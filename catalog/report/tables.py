"""The reference tables as rows with a source: numbers are numbers, whoever prints them."""

from collections.abc import Callable, Mapping
from dataclasses import dataclass
from typing import Any

from catalog.reference import alloys, gauges, safety, sieves
from catalog.search.reader import Filters, Reader

Row = dict[str, Any]


@dataclass(frozen=True, slots=True)
class Table:
    """Rows of one shape and where they come from."""

    name: str
    source: str
    rows: list[Row]


def gauge_table() -> Table:
    """Wire diameters per gauge number and system."""
    rows = [
        {"system": r["system"], "gauge": r["gauge"], "diameter_mm": r["diameter_mm"], "diameter_in": r["diameter_in"]}
        for r in gauges.rows()
    ]
    return Table("gauges", gauges.SOURCE, rows)


def sieve_table() -> Table:
    """Test-sieve openings with their designations, nominal wires and tolerances by edition."""
    from catalog.physics.sieving import average_tolerance_um, largest_oversize_um

    rows = []
    for sieve in sieves.sieves():
        um = float(sieve.opening_mm) * 1000
        row: Row = {
            "opening_mm": float(sieve.opening_mm),
            "series": sieve.series,
            "e11": sieve.e11_name,
            "wire_mm": float(sieve.wire_mm),
            "wire_min_mm": float(sieve.wire_min_mm),
            "wire_max_mm": float(sieve.wire_max_mm),
        }
        for key, edition in (("e11_17", "E11-17"), ("iso_2016", "ISO 3310-1:2016")):
            row[f"y_um_{key}"] = round(average_tolerance_um(um, edition), 1)
            row[f"x_um_{key}"] = round(largest_oversize_um(um, edition), 1)
        rows.append(row)
    return Table("sieves", sieves.SOURCE, rows)


def alloy_table() -> Table:
    """Alloys with their designations, density and the basis of it."""
    rows = [
        {
            "id": a.id,
            "name": a.generic_name,
            "uns": a.uns,
            "en": ", ".join(a.en_numbers),
            "en_name": a.en_name,
            "jis": a.jis,
            "density_kg_m3": a.density_kg_m3,
            "basis": a.basis,
        }
        for a in alloys.alloys()
    ]
    return Table("alloys", alloys.SOURCE, rows)


def guard_table() -> Table:
    """Safety distances behind an opening."""
    return Table("guards", safety.SOURCE, [dict(row) for row in safety.rows()])


REFERENCE: Mapping[str, Callable[[], Table]] = {
    "gauges": gauge_table,
    "sieves": sieve_table,
    "alloys": alloy_table,
    "guards": guard_table,
}


def every_cloth(reader: Reader) -> list[Any]:
    """The whole catalogue, by aperture."""
    return list(reader.select(Filters()))
