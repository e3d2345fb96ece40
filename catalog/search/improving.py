"""Which better measurement would decide: the weak link first, then the other part, at settings that can be had."""

from collections.abc import Iterator
from dataclasses import dataclass

from catalog.search.bench_figures import BenchFigure, Part
from catalog.search.measured import Count, combined, expanded_of_limit

RESOLUTIONS = (0.01, 0.005, 0.004, 0.003, 0.002, 0.001)
"""Expanded uncertainties (k = 2), mm, from coarse to fine: common practice."""
LENGTHS_MM = (20, 25, 50, 100, 200, 300, 500)
MOST_SPACES = 500


@dataclass(frozen=True, slots=True)
class Step:
    """One measurement made better."""

    measure: str
    over_mm: float | None
    """Length to count over."""
    resolution_mm: float | None
    """Expanded uncertainty (k = 2) that is needed."""
    expanded: float
    """What it would then contribute."""

    @property
    def words(self) -> str:
        """'the count over 100 mm', 'the wire to ±0.003 mm'."""
        name = self.measure.replace("_weft", " of the weft")
        setting = f"over {self.over_mm:g} mm" if self.over_mm else f"to ±{self.resolution_mm:g} mm"
        return f"the {name} {setting}"


@dataclass(frozen=True, slots=True)
class Better:
    """What would decide, if the value stays where it is; no steps where nothing that can be had would."""

    steps: tuple[Step, ...]
    needed: float
    """The expanded uncertainty to get down to, in the figure's unit."""
    expanded: float | None
    """What the steps come to."""


def improvement(figure: BenchFigure, needed: float) -> Better:
    """The least that brings the expanded uncertainty of *figure*, in mm, to *needed* or below."""
    weak = figure.weak_link
    rest = [part for part in figure.parts if part is not weak]
    fixed = combined(*(part.expanded for part in rest))
    for step in _steps(weak):
        if combined(step.expanded, fixed) <= needed:
            return Better((step,), needed, combined(step.expanded, fixed))
    return _both(weak, rest, needed)


def _both(weak: Part, rest: list[Part], needed: float) -> Better:
    """The coarsest pair of settings; two parts at most come from one direction."""
    pairs = [
        (one, other, combined(one.expanded, other.expanded))
        for part in rest[:1]
        for one in _steps(weak)
        for other in _steps(part)
    ]
    enough = [pair for pair in pairs if pair[2] <= needed]
    if len(rest) != 1 or not enough:
        return Better((), needed, None)
    one, other, expanded = max(enough, key=lambda pair: pair[2])
    return Better((one, other), needed, expanded)


def _steps(part: Part) -> Iterator[Step]:
    """The better settings of one measurement, the easiest first."""
    measured = part.measured
    if isinstance(measured, Count):
        pitch = float(measured.pitch_mm)
        for length in LENGTHS_MM:
            if length > measured.length_mm and length / pitch <= MOST_SPACES:
                limit = expanded_of_limit(pitch * pitch * float(measured.limit) / length)
                yield Step(part.quantity, length, None, limit)
        return
    for resolution in RESOLUTIONS:
        if resolution < measured.plus_minus:
            yield Step(part.quantity, None, resolution, resolution)
