"""Limits that leave nothing, explained: what each removed, what falls just short, the window that is left."""

from collections.abc import Iterator

from catalog.search.limit_report import LimitReport, Window
from tui.presenting import Piece, both, harmless, significant

NAMES = {
    "aperture_mm": ("aperture", "mm"), "wire_mm": ("wire", "mm"), "open_area_pct": ("open area", "points"),
    "mass_kg_m2": ("mass", "kg/m²"), "thickness_mm": ("thickness", "mm"),
}  # fmt: skip


def limit_lines(report: LimitReport, units: str) -> Iterator[Piece]:
    """One piece of text a line."""
    yield "No cloth lies inside all of these limits.", "risk"
    for removed in report.removed:
        name = NAMES.get(removed.limit, (removed.limit, ""))[0]
        yield f"Without the limit on {name}: {removed.removed}", "text"
    if report.near:
        yield "Just outside:", "head"
    for miss in report.near:
        short = ", ".join(f"{NAMES[s.limit][0]} by {significant(s.by, 3)} {NAMES[s.limit][1]}" for s in miss.short_of)
        demo = " (demo)" if miss.cloth.demo else ""
        yield f"{harmless(miss.cloth.name, 40)}{demo}: short of {short}", "near"
    if report.window is not None:
        yield _window(report.window, units), "muted"


def _window(window: Window, units: str) -> str:
    low, high = window.aperture
    if window.is_empty:
        return (
            f"No square cloth can: the wire asks an aperture of {both(low, units)}, the limit is {both(high, units)}."
        )
    aperture = f"{significant(low)} ≤ w ≤ {significant(high)} mm" if high is not None else f"w ≥ {significant(low)} mm"
    upper = f" ≤ {significant(window.wire_per_aperture)} w" if window.wire_per_aperture else ""
    most = window.wire[1]
    upper += f" ≤ {significant(most)} mm" if most is not None else ""
    return f"Square cloth can where {aperture} and {significant(window.wire[0])} ≤ d{upper}."
