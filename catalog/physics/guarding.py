"""Guards: the opening that decides a safety distance is the nominal one plus its largest single oversize."""

from collections.abc import Callable
from dataclasses import dataclass

from catalog.physics.domain import OutOfDomainError, require_positive

Step = tuple[float, float]
"""A step of a table of safety distances: the opening lies above the first and up to the second figure, mm."""


@dataclass(frozen=True, slots=True)
class GoverningOpening:
    """The opening that a guard is judged by. mm."""

    nominal_mm: float
    largest_mm: float
    nominal_step: Step | None
    """None where the table does not reach."""
    largest_step: Step | None

    @property
    def crosses_step(self) -> bool:
        """Whether the oversize alone puts the opening into another step."""
        return self.nominal_step != self.largest_step


def governing_opening(
    nominal_mm: float, largest_oversize_mm: float, step_of: Callable[[float], Step | None]
) -> GoverningOpening:
    """Opening by which a guard of woven cloth is judged: nominal plus largest oversize.

    e = w + X

    Parameters:
        nominal_mm: nominal opening, w; in rectangular cloth the short side [mm], above 0
        largest_oversize_mm: largest single oversize, X; known for test sieves only, else the user's figure
            [mm], 0 or more
        step_of: looks up the step of a table of safety distances, given an opening [mm]; None beyond its end
    Returns: both openings with their steps [mm]. Scalars only.
    Raises: OutOfDomainError where the opening isn't above 0 or the oversize is below 0.
    Valid: cloth that does not deflect; what deflects is measured deflected.
    **Source**: ISO 13857, table 4 puts distances against openings as they are; adding the oversize is derived.
    **Check value**: 9.0 mm with 0.7 mm stays in 8–10, 9.5 mm with 0.7 mm moves to 10–12, where the distance
        behind a square opening goes from 25 to 80 mm (source: ISO 13857, table 4).

    >>> steps = lambda e: (8.0, 10.0) if e <= 10 else (10.0, 12.0)
    >>> governing_opening(9.0, 0.7, steps).crosses_step, governing_opening(9.5, 0.7, steps).crosses_step
    (False, True)
    """
    require_positive(nominal_mm=nominal_mm)
    if not largest_oversize_mm >= 0.0:
        raise OutOfDomainError(f"An oversize of {largest_oversize_mm:g} mm was given; 0 or more was expected.")
    largest = nominal_mm + largest_oversize_mm
    return GoverningOpening(nominal_mm, largest, step_of(nominal_mm), step_of(largest))


def does_substitute_cross(
    asked_mm: float, offered_mm: float, largest_oversize_mm: float, step_of: Callable[[float], Step | None]
) -> bool:
    """Whether an offered cloth at its largest opening falls into a higher step than the asked one at its own.

    Parameters:
        asked_mm: nominal opening asked for [mm], above 0
        offered_mm: nominal opening offered [mm], above 0
        largest_oversize_mm: largest single oversize of either [mm], 0 or more
        step_of: looks up the step of a table of safety distances, given an opening [mm]; None beyond its end
    Returns: True where the step is higher or the table no longer applies [-]. Scalars only.
    Raises: OutOfDomainError as governing_opening.
    Valid: as governing_opening.
    **Source**: as governing_opening.
    **Check value**: 9.5 mm for 9.0 mm with 0.7 mm oversize crosses (source: ISO 13857, table 4).

    >>> steps = lambda e: (8.0, 10.0) if e <= 10 else (10.0, 12.0)
    >>> does_substitute_cross(9.0, 9.5, 0.7, steps)
    True
    """
    asked = governing_opening(asked_mm, largest_oversize_mm, step_of).largest_step
    offered = governing_opening(offered_mm, largest_oversize_mm, step_of).largest_step
    if asked is None or offered is None:
        return offered is None and asked is not None
    return offered[0] > asked[0]
