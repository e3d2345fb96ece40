"""The sums behind a cloth's figures, laid out step by step with exact fractions, units and source."""

from collections.abc import Iterator
from dataclasses import dataclass
from fractions import Fraction

from catalog.cloth import Cloth
from catalog.construction import Weave, Wires
from catalog.reference import alloys

DEFINITION = "definition"
ISO_9044 = "ISO 9044 (formula from memory)"
PEIRCE = "Peirce 1937, flexible-thread geometry"


@dataclass(frozen=True, slots=True)
class Step:
    """One line of the sum."""

    quantity: str
    formula: str
    sum: str
    result: str
    source: str


def explain(cloth: Cloth) -> tuple[Step, ...]:
    """Lay out pitch, aperture, count, open area and masses of *cloth*; filter cloth by counts, mass, porosity."""
    made = cloth.construction
    alike = made.warp == made.weft
    steps = list(_direction("", made.warp, made.is_filter))
    if not alike:
        steps = [*_direction("warp ", made.warp, made.is_filter), *_direction("weft ", made.weft, made.is_filter)]
    if not made.is_filter:
        steps.append(_open_area(made.warp, made.weft))
    steps += _masses(cloth)
    steps.append(_thickness(cloth))
    return tuple(steps)


def fraction_text(value: Fraction) -> str:
    """'127/300', or the decimal where it is short and exact."""
    for digits in range(5):
        if value * 10**digits == int(value * 10**digits):
            return f"{float(value):.{digits}f}"
    return f"{value.numerator}/{value.denominator}"


def _direction(prefix: str, wires: Wires, is_filter: bool) -> Iterator[Step]:
    p, d = wires.pitch_mm, wires.wire_mm
    count = f"{float(wires.count_per_in):.5g} per inch"
    yield Step(f"{prefix}count", "25.4 / p", f"127/5 ÷ {fraction_text(p)}", count, DEFINITION)
    if is_filter:
        return
    w = wires.aperture_mm
    sums = f"{fraction_text(p)} − {fraction_text(d)} = {fraction_text(w)}"
    yield Step(f"{prefix}aperture", "w = p − d", sums, f"{float(w):.5g} mm", DEFINITION)


def _open_area(warp: Wires, weft: Wires) -> Step:
    share = warp.aperture_mm * weft.aperture_mm / (warp.pitch_mm * weft.pitch_mm)
    w1, w2, p1, p2 = map(fraction_text, (warp.aperture_mm, weft.aperture_mm, warp.pitch_mm, weft.pitch_mm))
    sums = f"100 × ({w1} × {w2}) / ({p1} × {p2}) = 100 × {share.numerator}/{share.denominator}"
    return Step("open area", "100 · w1·w2 / (p1·p2)", sums, f"{float(share * 100):.4g} %", "ISO 9044, definition")


def _masses(cloth: Cloth) -> Iterator[Step]:
    made, figures = cloth.construction, cloth.figures
    alloy = alloys.alloy(made.alloy) if made.alloy else None
    if alloy is None or figures.mass_kg_m2 is None:
        yield Step("mass", "", "no density on record for this alloy", "not computed", "")
        return
    density = f"ρ = {alloy.density_kg_m3:g} kg/m³ ({alloy.id}; {alloy.basis})"
    if made.is_filter:
        formula = "ρ·π/4·(D²/P + d²·L/(s·P)) / 1000"
        yield Step("mass, geometric", formula, density, f"{figures.mass_kg_m2:.4g} kg/m²", "derived: wire lengths")
        return
    terms = " + ".join(f"{fraction_text(s.wire_mm)}²/{fraction_text(s.pitch_mm)}" for s in (made.warp, made.weft))
    sums = f"{density}; ρ/1236.2 × ({terms})"
    yield Step("mass, nominal", "ρ/1236.2 · (d1²/p1 + d2²/p2)", sums, f"{figures.mass_kg_m2:.4g} kg/m²", ISO_9044)
    if figures.mass_geometric_kg_m2 is not None:
        half = ", half the crimp (2/2 twill)" if made.weave is Weave.TWILLED else ""
        straight = sum(float(s.wire_mm**2 / s.pitch_mm) for s in (made.warp, made.weft)) * 0.785398 / 1000
        straight *= alloy.density_kg_m3
        sums = f"straight wire {straight:.4g} kg/m² × (1 + crimp){half}"
        result = f"{figures.mass_geometric_kg_m2:.4g} kg/m²"
        yield Step("mass, geometric", "straight-wire mass × (1 + crimp)", sums, result, PEIRCE)


def _thickness(cloth: Cloth) -> Step:
    d1, d2 = (fraction_text(s.wire_mm) for s in (cloth.construction.warp, cloth.construction.weft))
    formula = "D + 2d" if cloth.construction.is_filter else "d1 + d2 (crowns flush, the least)"
    sums = f"{d1} + 2 × {d2}" if cloth.construction.is_filter else f"{d1} + {d2}"
    return Step("thickness", formula, sums, f"{cloth.figures.thickness_mm:.4g} mm", "derived")
