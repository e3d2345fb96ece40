"""Rows of the seed tables → values. A row without unit or source is refused; all bad rows are told together."""

from collections.abc import Callable, Iterable, Mapping
from decimal import Decimal
from fractions import Fraction
from typing import Any, TypeVar

from catalog.cloth import Cloth, Rating
from catalog.construction import Construction, Weave, Wires
from catalog.errors import DataError
from catalog.figures import figures
from catalog.reference import alloys
from catalog.stock.lots import Lot
from catalog.storage.rows import Declared
from catalog.units import MM_PER_UNIT

Row = Mapping[str, str]
Value = TypeVar("Value")
FIRST_ROW = 2
"""The first row below the names, as a spreadsheet counts."""


def read_all(table: str, rows: Iterable[Row], read: Callable[[Row], Value]) -> list[Value]:
    """Read every row of *table*. Raises DataError with one sentence for each bad row."""
    values: list[Value] = []
    wrong: list[str] = []
    seen: set[str] = set()
    for number, row in enumerate(rows, FIRST_ROW):
        try:
            _check_once(row, seen)
            values.append(read(row))
        except (ValueError, KeyError, ZeroDivisionError) as error:
            named = f" ({row['id']})" if row.get("id") else ""
            said = f"{error.args[0]} is missing" if isinstance(error, KeyError) else str(error)
            wrong.append(f"{table} row {number}{named}: {said}.")
    if wrong:
        raise DataError(f"{len(wrong)} rows of {table} can't be used; nothing was loaded.", tuple(wrong))
    return values


def _check_once(row: Row, seen: set[str]) -> None:
    if not (row.get("source") or "").strip():
        raise ValueError("no source")
    if row.get("id") is not None:
        if not row["id"].strip():
            raise ValueError("no id")
        if row["id"] in seen:
            raise ValueError("this id was there already")
        seen.add(row["id"])


def cloth_of(row: Row) -> tuple[Cloth, Declared]:
    """A row of `cloths`. Raises ValueError in words."""
    declared = Declared(
        _one_of(row, "declared_by", ("count", "aperture", "pitch")),
        row["warp_text"],
        row["weft_text"],
        _one_of(row, "unit", ("in", "mm", "cm")),
        row["warp_wire"],
        row["weft_wire"],
        _one_of(row, "wire_unit", ("in", "mm", "um", "thou")),
    )
    make = construction_of(declared, row)
    alloy = make.alloy
    cloth = Cloth(
        id=row["id"],
        name=row["name"],
        construction=make,
        figures=figures(make, alloys.density_kg_m3(alloy) if alloy else None),
        declared=row["declared"],
        unit_system=_one_of(row, "unit_system", ("inch", "metric")),
        source=row["source"],
        rating=_rating(row),
        grade=row.get("grade") or None,
        standard=row.get("standard") or None,
        demo=_is_demo(row),
        **{name: _float(row, name) for name in ("stated_open_area_pct", "stated_mass_kg_m2")},
        **{name: _float(row, name) for name in ("stated_aperture_mm", "stated_count_per_in")},
    )
    return cloth, declared


def construction_of(declared: Declared, row: Row) -> Construction:
    """The exact construction of what is *declared*; weave, alloy, crimp and finish from *row*."""
    weave = Weave(_one_of(row, "weave", tuple(weave.value for weave in Weave)))
    warp = _wires(declared.by, declared.warp, declared.unit, declared.warp_wire, declared.wire_unit)
    weft = _wires(declared.by, declared.weft, declared.unit, declared.weft_wire, declared.wire_unit)
    if not weave.is_filter and min(warp.aperture_mm, weft.aperture_mm) <= 0:
        raise ValueError("the wire leaves no opening")
    names = (row.get(name) or None for name in ("alloy", "crimp", "finish"))
    return Construction(weave, warp, weft, *names)


def _wires(by: str, text: str, unit: str, wire_text: str, wire_unit: str) -> Wires:
    wire = exact(wire_text) * MM_PER_UNIT[wire_unit]
    figure = exact(text)
    if by == "count":
        return Wires(MM_PER_UNIT[unit] / figure, wire)
    length = figure * MM_PER_UNIT[unit]
    return Wires(length + wire if by == "aperture" else length, wire)


def exact(text: str) -> Fraction:
    """A figure above 0 as a decimal or a vulgar fraction. Raises ValueError in words."""
    try:
        value = Fraction(text.strip())
    except (ValueError, ZeroDivisionError):
        raise ValueError(f"{text!r} is no number") from None
    if value <= 0:
        raise ValueError(f"{text!r} isn't above 0")
    return value


def lot_of(row: Row) -> dict[str, Any]:
    """A row of `lots`: the lot with source, day of receipt and cost. Raises ValueError in words."""
    _one_of(row, "unit", ("mm",))
    lot = Lot(
        id=row["id"],
        cloth=row["cloth"],
        form=_one_of(row, "form", ("roll", "remnant", "panel", "disc")),
        width_mm=int(row["width_mm"]),
        selvedge_mm=int(row["selvedge_mm"]),
        length_mm=int(row["length_mm"]),
        reserved_mm=int(row["reserved_mm"]),
        location=row["location"],
        heat=row["heat"] or None,
        certificate=row["certificate"] or None,
        article=row["article"] or None,
        seams=int(row["seams"]),
        demo=_is_demo(row),
    )
    if not 0 <= lot.reserved_mm <= lot.length_mm or lot.usable_width_mm <= 0:
        raise ValueError("more is reserved than there is, or the selvedges leave nothing")
    return {"lot": lot, "source": row["source"], "received": row["received"] or None, **_price(row, "cost")}


def article_of(row: Row) -> dict[str, Any]:
    """A row of `articles`, as the table has it. Raises ValueError in words."""
    return {
        "id": row["id"],
        "cloth": row["cloth"],
        "part_number": row["part_number"],
        "seller": row["seller"],
        **_price(row, "price"),
        "minimum_mm2": int(Decimal(row["minimum_m2"]) * 10**6) if row["minimum_m2"] else None,
        "lead_days": int(row["lead_days"]) if row["lead_days"] else None,
        "roll_sizes_mm": row["roll_sizes_mm"],
        "source": row["source"],
        "demo": _is_demo(row),
    }


def alias_of(row: Row) -> dict[str, Any]:
    """A row of `aliases`, as the table has it."""
    return {**{name: row[name] for name in ("cloth", "whose", "number", "source")}, "demo": _is_demo(row)}


def _price(row: Row, name: str) -> dict[str, Any]:
    """Money as a whole number of hundredths, with its currency."""
    text, currency = row[f"{name}_per_m2"], row["currency"]
    if not text:
        return {f"{name}_minor_per_m2": None, "currency": None}
    if not currency:
        raise ValueError("a price without a currency")
    minor = Decimal(text) * 100
    if minor != minor.to_integral_value():
        raise ValueError(f"the price {text} has more than two decimals")
    return {f"{name}_minor_per_m2": int(minor), "currency": currency}


def _rating(row: Row) -> Rating | None:
    um = _float(row, "rating_um")
    return None if um is None else Rating(um, row["rating_kind"] or "unstated", row["rating_method"])


def _float(row: Row, name: str) -> float | None:
    return float(exact(row[name])) if row.get(name) else None


def _one_of(row: Row, name: str, allowed: tuple[str, ...]) -> str:
    value = row[name]
    if not value:
        raise ValueError(f"no {name}")
    if value not in allowed:
        raise ValueError(f"{name} is {value!r}, expected {' or '.join(allowed)}")
    return value


def _is_demo(row: Row) -> bool:
    return row["demo"] == "1"
