"""The domain of a formula: figures outside it are refused, never computed with."""

from math import isfinite

from catalog.errors import InputError


class OutOfDomainError(InputError, ValueError):
    """A figure lies outside what a formula holds for; the message names it, its value and what was expected."""


def require_positive(**figures: float) -> None:
    """Refuse figures that aren't finite numbers above 0; names carry their unit, as 'pitch_mm'."""
    for name, value in figures.items():
        if not (isfinite(value) and value > 0):
            raise OutOfDomainError(f"{name} is {value:g}: a number above 0 was expected.")


def require_between(least: float, most: float, **figures: float) -> None:
    """Refuse figures outside *least* to *most*, both ends allowed."""
    for name, value in figures.items():
        if not least <= value <= most:
            raise OutOfDomainError(f"{name} is {value:g}: {least:g} to {most:g} was expected.")


def require_wire_below_pitch(pitch_mm: float, wire_mm: float) -> None:
    """Refuse wires that would leave no opening between them."""
    require_positive(pitch_mm=pitch_mm, wire_mm=wire_mm)
    if wire_mm >= pitch_mm:
        raise OutOfDomainError(
            f"A wire of {wire_mm:g} mm at a pitch of {pitch_mm:g} mm leaves no opening: "
            "the wire has to be thinner than the pitch."
        )
