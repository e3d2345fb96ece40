"""One cloth as lines: its figures in both units, its lots, its picture; and as cells of a list."""

from collections.abc import Sequence

from catalog.cloth import Cloth
from catalog.stock.lots import Lot
from tui.presenting import (
    Line,
    Piece,
    alloy_words,
    both,
    fit,
    harmless,
    inch,
    mass,
    mm,
    number,
    shortened,
    significant,
    wrapped,
)
from tui.widgets.cloth_drawing import draw
from tui.widgets.paged_table import Column

Lines = list[Line]
FIGURES_WIDTH = 46


def cloth_columns(units: str) -> tuple[Column, ...]:
    """The columns of the catalogue."""
    columns = [
        Column("name", "cloth", 22, "left", fixed=True, ink="strong"),
        Column("demo", "", 1, "left", fixed=True),
    ]
    for key in ("apert", "wire"):
        if units != "inch":
            columns.append(Column(f"{key}-mm", f"{key} mm", 9))
        if units != "metric":
            columns.append(Column(f"{key}-in", "in" if units == "both" else f"{key} in", 8 if key == "apert" else 11))
    columns += [
        Column("open", "open %", 6),
        Column("mass", "kg/m²", 6),
        Column("alloy", "alloy", 8, "left"),
        Column("weave", "weave", 13, "left"),
        Column("count", "per in", 11),
        Column("thick", "thick mm", 8),
        Column("id", "id", 18, "left"),
        Column("source", "source", 30, "left"),
    ]
    return tuple(columns)


def cloth_cells(cloth: Cloth, columns: Sequence[Column]) -> list[str | Piece]:
    """A cloth's cells by the columns' keys."""
    return [_cell(cloth, column.key, column.width) for column in columns]


def _cell(cloth: Cloth, key: str, width: int) -> str | Piece:
    made, figures = cloth.construction, cloth.figures
    if key == "name":
        return shortened(harmless(cloth.name, 80), width)
    if key == "source":
        return harmless(cloth.source, 200)
    if key == "demo":
        return ("D", "warn") if cloth.demo else ""
    what, _, unit = key.partition("-")
    if what == "apert":
        values = [figures.warp_aperture_mm, figures.weft_aperture_mm]
        return _pair(values, unit)
    if what == "wire":
        return _pair([float(made.warp.wire_mm), float(made.weft.wire_mm)], unit)
    simple = {
        "open": number(figures.open_area_pct),
        "mass": "–" if figures.mass_kg_m2 is None else significant(figures.mass_kg_m2, 3),
        "alloy": harmless(made.alloy or "–", 20),
        "weave": made.weave.words,
        "count": _counts(cloth),
        "thick": significant(figures.thickness_mm, 3),
        "id": harmless(cloth.id, 40),
    }
    return simple[key]


def _pair(values: Sequence[float | None], unit: str) -> str:
    spell = mm if unit == "mm" else inch
    texts = [spell(v) for v in values]
    return texts[0] if texts[0] == texts[1] else "/".join(t if len(t) <= 4 else t[:5] for t in texts)


def _counts(cloth: Cloth) -> str:
    warp, weft = (float(s.count_per_in) for s in (cloth.construction.warp, cloth.construction.weft))
    return significant(warp) if warp == weft else f"{significant(warp)} × {significant(weft)}"


def cloth_heading(cloth: Cloth) -> Line:
    """The name, and that a cloth is of the demo."""
    head: list[Piece] = [(harmless(cloth.name, 80), "strong")]
    return [*head, ("  ", "text"), (" demo ", "demo")] if cloth.demo else head


def figure_lines(cloth: Cloth, units: str, width: int) -> Lines:
    """Every figure of a cloth."""
    made, figures = cloth.construction, cloth.figures
    rows = [("weave, alloy", f"{made.weave.words}, {alloy_words(made.alloy)}")]
    alike = made.warp == made.weft
    for side, wires in (("warp", made.warp), ("weft", made.weft))[: 1 if alike else 2]:
        prefix = "" if alike else f"{side} "
        if not made.is_filter:
            rows.append((f"{prefix}aperture", both(float(wires.aperture_mm), units)))
        rows.append((f"{prefix}wire", both(float(wires.wire_mm), units)))
        count = float(wires.count_per_in)
        rows.append((f"{prefix}count", f"{significant(count)} per in, {significant(count / 2.54)} per cm"))
    if figures.open_area_pct is not None:
        rows.append(("open area", f"{number(figures.open_area_pct)} %"))
    label = "mass, geometric" if made.is_filter else "mass, ISO 9044"
    rows.append((label, mass(figures.mass_kg_m2, units)))
    rows.append(("thickness", f"{both(figures.thickness_mm, units)}, crowns flush, the least"))
    if cloth.rating:
        rows.append(("rating", f"{significant(cloth.rating.um)} µm {harmless(cloth.rating.kind)}"))
    rows += [("sold as", harmless(cloth.declared)), ("source", harmless(cloth.source))]
    return [((fit(name, 16), "muted"), (fit(words, max(8, width - 16)).rstrip(), "text")) for name, words in rows]


def lot_lines(lots: Sequence[Lot], width: int, units: str) -> Lines:
    """The lots of a cloth."""
    if not lots:
        return [(("on the rack", "head"),), (("Nothing lies on the rack.", "muted"),)]
    total = sum(lot.available_m2 for lot in lots)
    count = f"{len(lots)} lot{'s' if len(lots) > 1 else ''}"
    lines: Lines = [((f"on the rack: {count}, {significant(total, 3)} m²", "head"),)]
    for lot in lots:
        lines.append(((fit(f"{harmless(lot.location, 12)}  {lot_size(lot, units)}", width).rstrip(), "text"),))
    return lines


def lot_size(lot: Lot, units: str) -> str:
    """Usable width and free length."""
    if units == "inch":
        return f"{lot.usable_width_mm / 25.4:.1f} in × {lot.free_length_mm / 304.8:.1f} ft"
    return f"{lot.usable_width_mm} mm × {lot.free_length_mm / 1000:.2f} m"


def sheet_lines(
    cloth: Cloth, lots: Sequence[Lot] | None, width: int, height: int, units: str, ascii_only: bool
) -> Lines:
    """The data sheet: name, figures, lots, drawing."""
    lines: Lines = [cloth_heading(cloth)]
    lines += figure_lines(cloth, units, width)
    lines.append(())
    lines += lot_lines(lots, width, units) if lots is not None else [(("Looking for lots…", "muted"),)]
    rows = max(14, min(24, height))
    drawn = draw([("to scale", cloth.construction)], min(width, 76), rows, ascii_only=ascii_only)
    return [*lines, (), *(((line, "text"),) for line in drawn)]


def limits_said(lines: Sequence[str], width: int) -> Lines:
    """Sentences as muted lines."""
    return [((part, "muted"),) for line in lines for part in wrapped(line, width)]
