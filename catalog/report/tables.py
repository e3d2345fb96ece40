"""The reference tables as rows with a source: numbers are numbers, whoever prints them."""

from collections.abc import Callable, Iterator, Mapping
from dataclasses import dataclass
from typing import TYPE_CHECKING, Any

from catalog.reference import alloys, gauges, safety, sieves
from catalog.search.reader import Filters, Reader

if TYPE_CHECKING:
    from catalog.search.lookalikes import Pair

EQUIVALENTS_SOURCE = "computed from this store; alloys left aside"
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
            "family": a.family,
            "tensile_least_mpa": a.tensile_mpa[0] if a.tensile_mpa else None,
            "tensile_most_mpa": a.tensile_mpa[1] if a.tensile_mpa else None,
            "tensile_basis": a.tensile_source or None,
            "magnet": a.magnetic,
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


def equivalent_table(reader: Reader) -> Table:
    """The catalogue inch against metric, by aperture, with differences and verdict."""
    return Table("equivalents", EQUIVALENTS_SOURCE, list(equivalent_rows(reader)))


def equivalent_rows(reader: Reader) -> Iterator[Row]:
    """The same row by row, for whoever streams."""
    from catalog.search.equivalents import equivalents

    for pair in equivalents(reader.select(Filters())):
        yield {
            "inch": pair.inch.id,
            "inch_sold_as": pair.inch.declared,
            "metric": pair.metric.id,
            "metric_sold_as": pair.metric.declared,
            "aperture_mm": round(pair.inch.figures.warp_aperture_mm or 0, 5),
            "aperture_pct": round(pair.aperture_pct, 2),
            "wire_pct": round(pair.wire_pct, 2),
            "open_area_points": round(pair.open_area_points, 2),
            "verdict": pair.judged.verdict.value,
        }


def lookalike_table(reader: Reader) -> Table:
    """Cloths of one spoken name whose openings lie over 5 % apart, and cloth listed twice."""
    from catalog.search.lookalikes import listed_twice, lookalikes, spoken_count

    cloths = list(reader.select(Filters()))
    rows = [_pair_row("look-alike", str(spoken_count(p.one)), p) for p in lookalikes(cloths)]
    rows += [_pair_row("listed twice", "", p) for p in listed_twice(cloths)]
    return Table("lookalikes", "computed from this store; over 5 % apart: house rule", rows)


def _pair_row(kind: str, name: str, pair: "Pair") -> Row:
    return {
        "kind": kind,
        "called": name or None,
        "one": pair.one.id,
        "one_aperture_mm": round(pair.one.figures.warp_aperture_mm or 0, 5),
        "other": pair.other.id,
        "other_aperture_mm": round(pair.other.figures.warp_aperture_mm or 0, 5),
        "apart_pct": round(pair.apart_pct, 2),
    }


OVER_STORE: Mapping[str, Callable[[Reader], Table]] = {
    "equivalents": equivalent_table,
    "lookalikes": lookalike_table,
}
