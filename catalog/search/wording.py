"""Figures in sentences: one place for digits, signs and units."""

from fractions import Fraction

from catalog.units import MM_PER_INCH

Number = Fraction | float


def mm(value: Number) -> str:
    """Millimetres with four significant digits, at least to 0.1 µm where small: '0.2446 mm'."""
    return f"{float(value):.4g} mm"


def both(value: Number) -> str:
    """Millimetres and inches: '0.2446 mm (0.00963 in)'."""
    inches = f"{float(value / float(MM_PER_INCH)):.4f}"
    return f"{mm(value)} ({inches} in)"


def um(value: Number) -> str:
    """Micrometres of a value in mm, to 0.1: '12.5 µm'."""
    return f"{float(value) * 1000:.1f} µm".replace(".0 µm", " µm")


def signed_pct(share: Number) -> str:
    """A share as signed percent: '−2.2 %'."""
    return f"{float(share) * 100:+.1f} %".replace("-", "−")


def pct(value: Number) -> str:
    """A percentage: '35.6 %'."""
    return f"{float(value):.1f} %"


def points(value: Number) -> str:
    """Signed percentage points: '−1.6 points'."""
    return f"{float(value):+.1f} points".replace("-", "−")
