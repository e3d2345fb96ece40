"""Contradictions and oddities in a catalogue: rules over every cloth, each naming row, value and repair."""

from bisect import bisect_left
from collections.abc import Callable, Iterable, Iterator
from dataclasses import dataclass
from functools import lru_cache

from catalog.cloth import Cloth
from catalog.construction import Weave
from catalog.physics import geometry
from catalog.reference import gauges, grades, sieves
from catalog.search.lookalikes import listed_twice

AGREE = 0.01
"""Stated and computed figures agree to 1 %."""
KNOWN_WIRE = 0.01
MOST_OPEN_PCT = 95.0
SLIPS = {25.4: "inches read as millimetres, or the other way round", 1000.0: "mm and µm", 10.0: "a decimal place"}
CLOSE_PACKING = {
    Weave.PLAIN_DUTCH: (0.9, 1.35),
    Weave.REVERSE_PLAIN_DUTCH: (0.9, 2.1),
    Weave.TWILLED_DUTCH: (1.5, 2.6),
}
"""Count × wire of the close set, as share of its pitch: common practice, no source."""


@dataclass(frozen=True, slots=True)
class Oddity:
    """One thing that a rule found."""

    cloth: str
    rule: str
    value: str
    repair: str


Rule = Callable[[Cloth], Iterator[Oddity]]


def aperture_rule(cloth: Cloth) -> Iterator[Oddity]:
    """A stated aperture is pitch less wire; where it isn't, say which slip would explain it."""
    stated, found = cloth.stated_aperture_mm, cloth.figures.warp_aperture_mm
    if stated is None or found is None or _agree(stated, found):
        return
    if _agree(stated, float(cloth.construction.warp.wire_mm)):
        yield Oddity(cloth.id, "aperture and wire swapped", f"{stated:g} mm is the wire", "exchange the two")
        return
    value = f"stated {stated:g} mm, p − d = {found:.4g} mm"
    yield Oddity(cloth.id, "p ≠ w + d", value, _slip(stated / found) or "measure pitch and wire")


def count_rule(cloth: Cloth) -> Iterator[Oddity]:
    """A stated count is 25.4 over the pitch; one that is a sieve's number is no count."""
    stated = cloth.stated_count_per_in
    if stated is None:
        return
    found = float(cloth.construction.warp.count_per_in)
    if _agree(stated, found):
        return
    value = f"stated {stated:g} per inch, computed {found:.4g}"
    sieve = sieves.by_number(f"{stated:g}")
    aperture = cloth.figures.warp_aperture_mm
    if sieve is not None and aperture and _agree(float(sieve.opening_mm), aperture):
        yield Oddity(cloth.id, "sieve number as count", value, f"{sieve.e11_name} is a name: clear the count")
        return
    yield Oddity(cloth.id, "count does not follow", value, _slip(stated / found) or "recompute it from the pitch")


def open_area_rule(cloth: Cloth) -> Iterator[Oddity]:
    """A stated open area follows from apertures and pitches; filter cloth has none."""
    stated, found = cloth.stated_open_area_pct, cloth.figures.open_area_pct
    if stated is None:
        return
    if cloth.construction.is_filter:
        yield Oddity(cloth.id, "filter cloth with an open area", f"{stated:g} %", "clear it: no straight opening")
    elif found is not None and abs(stated - found) > 1.0:
        value = f"stated {stated:g} %, computed {found:.1f} %"
        yield Oddity(cloth.id, "open area does not follow", value, "recompute it; else check the wire")


def filter_opening_rule(cloth: Cloth) -> Iterator[Oddity]:
    """Filter cloth has no square opening."""
    if cloth.construction.is_filter and cloth.stated_aperture_mm is not None:
        value = f"{cloth.stated_aperture_mm:g} mm"
        rule = "filter cloth with a square opening"
        yield Oddity(cloth.id, rule, value, "enter it as a rating with its method")


def mass_rule(cloth: Cloth) -> Iterator[Oddity]:
    """A stated mass lies within 10 % of the nominal or the geometric figure."""
    stated = cloth.stated_mass_kg_m2
    computed = [m for m in (cloth.figures.mass_kg_m2, cloth.figures.mass_geometric_kg_m2) if m]
    if stated is None or not computed or any(abs(stated / m - 1) <= 0.1 for m in computed):
        return
    value = f"stated {stated:g} kg/m², computed {computed[0]:.3g}"
    yield Oddity(cloth.id, "mass does not follow", value, _slip(stated / computed[0]) or "check alloy and wire")


def jam_rule(cloth: Cloth) -> Iterator[Oddity]:
    """A square or rectangular cloth that can't be woven."""
    made = cloth.construction
    if made.is_filter:
        return
    twilled = made.weave is Weave.TWILLED
    for name, side, other in (("warp", made.warp, made.weft), ("weft", made.weft, made.warp)):
        p, d = float(side.pitch_mm), float(side.wire_mm)
        if geometry.is_jammed(p, d, float(other.wire_mm), twilled):
            rule = "gauge number as wire" if _is_gauge_number(d) else "can't be woven"
            yield Oddity(cloth.id, rule, f"{name} d/p = {d / p:.3f}", "check the wire, its unit, or the weave")


def open_rule(cloth: Cloth) -> Iterator[Oddity]:
    """So open a cloth is more likely a unit slip in the wire."""
    share = cloth.figures.open_area_pct
    if share is not None and share > MOST_OPEN_PCT:
        yield Oddity(cloth.id, "open area over 95 %", f"{share:.1f} %", "is the wire in inches, written as mm?")


def wire_rule(cloth: Cloth) -> Iterator[Oddity]:
    """A wire that is no size of any gauge, no sieve wire and no preferred number within 1 %."""
    made = cloth.construction
    for wire in sorted({float(made.warp.wire_mm), float(made.weft.wire_mm)}):
        if not _is_known_size(wire):
            yield Oddity(cloth.id, "wire of no known size", f"{wire:.5g} mm", "measure it with a micrometer")


def packing_rule(cloth: Cloth) -> Iterator[Oddity]:
    """The close set of filter cloth lies wire to wire."""
    made = cloth.construction
    bounds = CLOSE_PACKING.get(made.weave)
    if bounds is None:
        return
    close = made.warp if made.weave is Weave.REVERSE_PLAIN_DUTCH else made.weft
    ratio = float(close.wire_mm / close.pitch_mm)
    if not bounds[0] <= ratio <= bounds[1]:
        value = f"count × wire = {ratio:.2f} of the pitch, customary {bounds[0]:g} to {bounds[1]:g}"
        yield Oddity(cloth.id, "close packing out of range", value, "are warp and weft the right way round?")


RULES: tuple[Rule, ...] = (
    aperture_rule,
    count_rule,
    open_area_rule,
    filter_opening_rule,
    mass_rule,
    jam_rule,
    open_rule,
    wire_rule,
    packing_rule,
)


def audit(cloths: Iterable[Cloth]) -> Iterator[Oddity]:
    """Run every rule over every cloth, then look for cloth that is listed twice."""
    seen = list(cloths)
    for cloth in seen:
        for rule in RULES:
            yield from rule(cloth)
    for pair in listed_twice(seen):
        yield Oddity(pair.one.id, "listed twice", f"the same as {pair.other.id}", "make one an alias of the other")


def _agree(one: float, other: float) -> bool:
    return abs(one - other) <= AGREE * abs(other)


def _slip(ratio: float) -> str | None:
    """The factor that explains a ratio of stated to computed."""
    for factor, words in SLIPS.items():
        if _agree(ratio, factor) or _agree(ratio, 1 / factor):
            return f"a factor {factor:g}: {words}"
    return None


@lru_cache(maxsize=1)
def _known_sizes_mm() -> tuple[float, ...]:
    """Gauge sizes, sieve wires, the inch grades' wires, R 20 preferred numbers (ISO 3), and customary drawn steps.

    Drawn steps, common practice: .0001 in below .004 in, 0.01 mm from 0.05 to 0.3 mm, 0.05 mm from there to 1 mm.
    """
    sizes = {float(row["diameter_mm"]) for row in gauges.rows()}
    sizes |= {float(sieve.wire_mm) for sieve in sieves.sieves()}
    sizes |= {float(row["wire_in"]) * 25.4 for row in grades.rows()}
    sizes |= {round(10 ** (step / 20), 2) * 10**decade for step in range(20) for decade in range(-2, 2)}
    sizes |= {tenth / 10_000 * 25.4 for tenth in range(6, 40)}
    sizes |= {step / 100 for step in range(5, 30)} | {step / 20 for step in range(6, 21)}
    return tuple(sorted(sizes))


def _is_known_size(wire_mm: float) -> bool:
    sizes = _known_sizes_mm()
    at = bisect_left(sizes, wire_mm)
    return any(abs(wire_mm / size - 1) <= KNOWN_WIRE for size in sizes[max(0, at - 1) : at + 1])


def _is_gauge_number(wire_mm: float) -> bool:
    """A whole number of mm or inches that some gauge system knows as a number."""
    return any(abs(n - round(n)) < 1e-9 and gauges.readings(str(round(n))) for n in (wire_mm, wire_mm / 25.4))
