"""The catalogue in lines: a line a cloth, what each limit did, what falls just short, which lines come and go."""

from collections.abc import Iterator, Mapping, Sequence
from typing import TYPE_CHECKING, Any

from tui.exit_codes import one_line

if TYPE_CHECKING:
    from catalog.cloth import Cloth
    from catalog.search.limit_report import LimitReport
    from catalog.stock.lots import Lot

LABELS = {
    "aperture_mm": ("aperture", "mm"),
    "wire_mm": ("wire", "mm"),
    "open_area_pct": ("open area", "points"),
    "mass_kg_m2": ("mass", "kg/m²"),
    "thickness_mm": ("thickness", "mm"),
    "rating_um": ("rating", "µm"),
}


def list_lines(
    total: int,
    cloths: "Sequence[Cloth]",
    report: "LimitReport | None",
    lots: "Mapping[str, Sequence[Lot]]",
    units: str,
) -> Iterator[str]:
    """A line a cloth; then what the limits did."""
    for cloth in cloths:
        yield cloth_line(cloth, len(lots.get(cloth.id, ())), units)
    shown = f"{len(cloths)} of {total}"
    yield f"{shown} cloths inside the limits." if report else f"{shown} cloths."
    if report:
        yield from report_lines(report, bool(cloths))


def cloth_line(cloth: "Cloth", lots: int, units: str) -> str:
    """One cloth on one line."""
    figures, made = cloth.figures, cloth.construction
    if made.is_filter:
        size = f"{float(made.warp.count_per_in):.0f} x {float(made.weft.count_per_in):.0f}/in"
        size += f" rated {cloth.rating.um:g} µm" if cloth.rating else " no rating"
    else:
        size = f"w {_pair(figures.warp_aperture_mm or 0, figures.weft_aperture_mm or 0, units)}"
        size += f"  d {_pair(float(made.warp.wire_mm), float(made.weft.wire_mm), units)}  {figures.open_area_pct:.1f} %"
    stock = f"  {lots} lots" if lots > 1 else "  1 lot" if lots else ""
    return f"{cloth.id:<14} {one_line(cloth.name)}  {size}{stock}" + ("  demo" if cloth.demo else "")


def _pair(one: float, other: float, units: str) -> str:
    values = (one,) if abs(one - other) < 1e-9 else (one, other)
    metric = " x ".join(f"{value:.4g}" for value in values) + " mm"
    inch = " x ".join(f"{value / 25.4:.4f}" for value in values) + " in"
    return {"metric": metric, "inch": inch}.get(units, f"{metric} {inch}")


def report_lines(report: "LimitReport", served: bool) -> Iterator[str]:
    """Which limit removed how many, the near misses with their shortfall, the window that would satisfy."""
    for removed in report.removed:
        name = LABELS.get(removed.limit, (removed.limit, ""))[0]
        yield f"  without the limit on {name}: {removed.removed} more"
    if report.near:
        yield "Just outside:" if served else "Nothing satisfies all limits. Just outside:"
    for miss in report.near:
        short = ", ".join(f"{LABELS[s.limit][0]} by {s.by:.3g} {LABELS[s.limit][1]}" for s in miss.short_of)
        yield f"  {miss.cloth.id:<14} {one_line(miss.cloth.name)}: short of {short}"
    if report.window:
        yield from _window_line(report.window)


def _window_line(window: Any) -> Iterator[str]:
    low, high = window.aperture
    if not low and high is None:
        return  # a limit on the wire alone leaves every aperture
    if window.is_empty:
        yield f"No square cloth satisfies them: the wire asks an aperture of {low:.3f} mm, the limit is {high:.3f} mm."
        return
    aperture = f"{low:.3f} ≤ w ≤ {high:.3f} mm" if high is not None else f"w ≥ {low:.3f} mm"
    most = window.wire[1]
    upper = f" ≤ {window.wire_per_aperture:.4f} w" if window.wire_per_aperture else ""
    upper += f" ≤ {most:g} mm" if most is not None else ""
    yield f"Square cloth satisfies them where {aperture} and {window.wire[0]:g} ≤ d{upper}."


def moved_lines(come: "Sequence[Cloth]", go: "Sequence[Cloth]", units: str) -> Iterator[str]:
    """Which lines come and which go when a limit is moved."""
    if not come and not go:
        yield "Moving it changes nothing."
    for sign, cloths in (("+", come), ("-", go)):
        for cloth in cloths:
            yield f"{sign} {cloth_line(cloth, 0, units)}"
