"""A roll's tag in forty columns of text, in both unit systems."""

import unicodedata
from collections.abc import Iterator
from dataclasses import dataclass

from catalog.cloth import Cloth
from catalog.construction import Wires
from catalog.report.outside_text import tame
from catalog.stock.lots import Lot

COLUMNS = 40
NAME, METRIC = 12, 14
MOST_LINES = 3
"""Of one text; what is longer is cut, and ends in '…'."""
LB_FT2 = 0.3048**2 / 0.45359237
"""Pounds per square foot in a kilogram per square metre (exact by definition of foot and pound)."""
DEMO = "DEMO DATA: INVENTED"


@dataclass(frozen=True, slots=True)
class TagRow:
    """One fact of a roll: the same in metric and in inch units; *inch* is '' where it has no unit."""

    name: str
    metric: str
    inch: str = ""


def roll_tag(lot: Lot, cloth: Cloth) -> list[str]:
    """The tag of *lot* as lines of at most forty columns."""
    lines = ["=" * COLUMNS]
    if is_demo(lot, cloth):
        lines.append(DEMO)
    lines += folded(f"LOT {tame(lot.id)}")
    lines += folded(tame(cloth.name))
    lines += folded(f"sold as {tame(cloth.declared)}")
    lines.append("-" * COLUMNS)
    for row in tag_rows(lot, cloth):
        lines += _row_lines(row)
    return [*(line.rstrip() for line in lines), "=" * COLUMNS]


def is_demo(lot: Lot, cloth: Cloth) -> bool:
    """True where the roll or its cloth is invented."""
    return lot.demo or cloth.demo


def tag_rows(lot: Lot, cloth: Cloth) -> tuple[TagRow, ...]:
    """What a tag says of cloth and roll, in order."""
    return (*_cloth_rows(cloth), *_lot_rows(lot))


def columns_of(text: str) -> int:
    """How many columns *text* takes on a terminal or tag: wide East Asian signs two, combining marks none."""
    return sum(_columns(char) for char in text)


def folded(text: str, width: int = COLUMNS, most: int = MOST_LINES) -> list[str]:
    """*text* in at most *most* lines of *width* columns; ends in '…' where something is cut."""
    lines = [""]
    for word in text.split():
        for part in _parts(word, width):
            longer = f"{lines[-1]} {part}" if lines[-1] else part
            if columns_of(longer) <= width:
                lines[-1] = longer
            else:
                lines.append(part)
    if len(lines) <= most:
        return lines
    last = lines[most - 1]
    while columns_of(last) > width - 1:
        last = last[:-1]
    return [*lines[: most - 1], f"{last}…"]


def _columns(char: str) -> int:
    if unicodedata.combining(char):
        return 0
    return 2 if unicodedata.east_asian_width(char) in "WF" else 1


def _parts(word: str, width: int) -> Iterator[str]:
    part = ""
    for char in word:
        if columns_of(part + char) > width:
            yield part
            part = ""
        part += char
    yield part


def _row_lines(row: TagRow) -> Iterator[str]:
    room = COLUMNS - NAME
    lines = [row.metric.ljust(METRIC) + row.inch] if row.inch else folded(row.metric, room)
    if columns_of(lines[0]) > room:
        lines = [*folded(row.metric, room), *folded(row.inch, room)]
    names = (row.name, *[""] * (len(lines) - 1))
    yield from (name.ljust(NAME) + line for name, line in zip(names, lines, strict=True))


def _cloth_rows(cloth: Cloth) -> Iterator[TagRow]:
    made = cloth.construction
    yield TagRow("Weave", made.weave.words)
    finish = f", {tame(made.finish)}" if made.finish else ""
    yield TagRow("Alloy", f"{tame(made.alloy or 'not on record')}{finish}")
    if made.warp == made.weft:
        yield from _wires("", made.warp, made.is_filter)
    else:
        yield from _wires("Warp ", made.warp, made.is_filter)
        yield from _wires("Weft ", made.weft, made.is_filter)
    figures = cloth.figures
    if figures.open_area_pct is not None:
        yield TagRow("Open area", f"{figures.open_area_pct:.1f} %")
    if cloth.rating:
        yield TagRow("Rating", f"{cloth.rating.um:g} um {cloth.rating.kind}")
    if figures.mass_kg_m2 is not None:
        yield TagRow("Mass", f"{figures.mass_kg_m2:.3g} kg/m2", f"{figures.mass_kg_m2 * LB_FT2:.3g} lb/ft2")


def _wires(side: str, wires: Wires, is_filter: bool) -> Iterator[TagRow]:
    def named(noun: str) -> str:
        return f"{side}{noun}".capitalize()

    if not is_filter:
        aperture = float(wires.aperture_mm)
        yield TagRow(named("opening"), f"{aperture:.4g} mm", f"{aperture / 25.4:.4f} in")
    wire, pitch = float(wires.wire_mm), float(wires.pitch_mm)
    yield TagRow(named("wire"), f"{wire:.4g} mm", f"{wire / 25.4:.4f} in")
    yield TagRow(named("count"), f"{10 / pitch:.4g} per cm", f"{25.4 / pitch:.4g} per in")


def _lot_rows(lot: Lot) -> Iterator[TagRow]:
    yield TagRow("Form", tame(lot.form))
    yield TagRow("Width", f"{lot.width_mm} mm", f"{lot.width_mm / 25.4:.2f} in")
    yield TagRow("Usable", f"{lot.usable_width_mm} mm", f"{lot.usable_width_mm / 25.4:.2f} in")
    yield TagRow("Length", f"{lot.length_mm / 1000:.3f} m", f"{lot.length_mm / 304.8:.2f} ft")
    if lot.reserved_mm:
        yield TagRow("Reserved", f"{lot.reserved_mm / 1000:.3f} m", f"{lot.reserved_mm / 304.8:.2f} ft")
    yield TagRow("Heat", tame(lot.heat or "not on record"))
    yield TagRow("Certificate", f"EN 10204 {tame(lot.certificate)}" if lot.certificate else "none on record")
    if lot.seams:
        yield TagRow("Seams", str(lot.seams))
    yield TagRow("Location", tame(lot.location))
