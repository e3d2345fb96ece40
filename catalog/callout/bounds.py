"""Rules for limits: which way each comparison bounds which figure. Finer cloth has the higher count, heavier wire the lower gauge."""

from fractions import Fraction

from catalog.callout.draft import Draft
from catalog.callout.items import Item
from catalog.reference import gauges
from catalog.units import MM_PER_INCH, MM_PER_UNIT

Range = tuple[float | None, float | None]
LEAST, MOST = "least", "most"

SIDE_OF: dict[str, dict[str, str]] = {
    "count": {"finer": LEAST, "coarser": MOST, "not finer": MOST, "not coarser": LEAST, "over": LEAST, "under": MOST, "not larger": MOST, "not smaller": LEAST},
    "wire": {
        "heavier": LEAST, "lighter": MOST, "not heavier": MOST, "not lighter": LEAST, "over": LEAST, "under": MOST, "finer": MOST, "coarser": LEAST,
        "not finer": LEAST, "not coarser": MOST, "not larger": MOST, "not smaller": LEAST,
    },
    "aperture": {"over": LEAST, "under": MOST, "not larger": MOST, "not smaller": LEAST, "finer": MOST, "coarser": LEAST, "not finer": LEAST, "not coarser": MOST},
    "": {"over": LEAST, "under": MOST, "not larger": MOST, "not smaller": LEAST, "heavier": LEAST, "lighter": MOST, "not heavier": MOST, "not lighter": LEAST},
}  # fmt: skip
"""Figure → comparison → the side that it bounds."""

KEYS = {
    "count": "count_per_in",
    "wire": "wire_mm",
    "aperture": "aperture_mm",
    "pitch": "pitch_mm",
    "open_area": "open_area_pct",
    "mass": "mass_kg_m2",
}
MASS_UNITS = {
    "kg/m2": Fraction(1),
    "g/m2": Fraction(1, 1000),
    "lb/ft2": Fraction(45359237, 100000000) / Fraction(9290304, 100000000),
}


def bounds(draft: Draft) -> None:
    """Turn compared figures, ranges and tolerances into limits, and the purpose of a single opening too."""
    for item in draft.items:
        if item.kind == "chain" and item.members[0].bound and not item.taken:
            _bound_product(draft, item)
    for number in draft.numbers():
        if number.bound in ("passing", "held"):
            continue
        if number.bound:
            _bound_one(draft, number)
        elif number.upto is not None:
            _bound_range(draft, number)
    _purposes(draft)


def figure_of(number: Item) -> str | None:
    """What a compared number is of: its label, else what its unit tells."""
    if number.slot in ("mesh", "count"):
        return "count" if not number.is_length else "aperture"
    if number.slot in KEYS:
        return number.slot
    if number.unit in ("/in", "/cm", "mesh sign", "per length", "designation", "M"):
        return "count"
    if number.unit in MASS_UNITS:
        return "mass"
    return {"gauge": "wire", "%": "open_area", "um": "aperture"}.get(number.unit or "")


def figures_of(number: Item, figure: str) -> tuple[list[Fraction], str]:
    """The values in the limit's unit, several where a gauge's system is open, and the system's note."""
    assert number.number or number.unit == "aught" or number.unit == "gauge"
    if number.unit == "gauge":
        name = number.number.written if number.number else number.text
        sizes = gauges.readings(name)
        systems = ("SWG", "USSWG", "BWG", "AWG") if number.system == "?" else (number.system or "",)
        return [sizes[s] * MM_PER_INCH for s in systems if s in sizes], "/".join(systems)
    assert number.number
    value = number.number.value
    if figure == "count":
        if number.unit == "per length":
            return [value * MM_PER_INCH / Fraction(number.system or 1)], ""
        return [value * (MM_PER_INCH / 10 if number.unit == "/cm" else 1)], ""
    if figure == "mass":
        return [value * MASS_UNITS.get(number.unit or "", Fraction(1))], ""
    if figure == "open_area":
        return [value], ""
    return [value * MM_PER_UNIT[number.unit if number.is_length and number.unit else unit_without(number)]], ""


def unit_without(number: Item) -> str:
    """The unit of a bare length: a dropped zero or a vulgar fraction is of the inch, all else of the millimetre."""
    assert number.number
    return "in" if number.number.written[0] == "." or number.number.kind == "fraction" else "mm"


def limit(draft: Draft, key: str, side: str, value: float) -> None:
    """Narrow a limit."""
    low, high = draft.limits.get(key, (None, None))
    if side == LEAST:
        low = value if low is None else max(low, value)
    else:
        high = value if high is None else min(high, value)
    draft.limits[key] = (low, high)


def side_of(bound: str, figure: str) -> str:
    """'least' or 'most' for a comparison of a figure."""
    return SIDE_OF.get(figure, {}).get(bound) or SIDE_OF[""].get(bound) or bound


def _bound_product(draft: Draft, chain: Item) -> None:
    """'At least 30 by 30' bounds both directions; of unlike counts each would bound its own, which isn't held."""
    members = [m for m in chain.members if not m.taken]
    if all(m.is_count_like for m in members):
        for member in members:
            member.slot = member.slot or "mesh"
    if len({m.number.value for m in members if m.number}) > 1:
        draft.problem(
            "E_NOT_UNDERSTOOD",
            "A limit on two unlike figures isn't understood: state one limit for warp and one for weft.",
            chain,
        )
        return
    _bound_one(draft, members[0])
    for member in members:
        member.taken = "limit"


def _bound_one(draft: Draft, number: Item) -> None:
    figure = figure_of(number) or _guess(number)
    if figure is None:
        draft.problem(
            "E_NOT_UNDERSTOOD",
            f"It isn't said of what {number.number.written if number.number else number.text} is a limit.",
            number,
        )
        number.taken = "limit"
        return
    values, systems = figures_of(number, figure)
    number.taken = "limit"
    if not values or number.bound is None:
        draft.problem("E_NOT_UNDERSTOOD", f"There is no gauge {number.text}.", number)
        return
    side = side_of(number.bound, figure)
    value = min(values) if side == LEAST else max(values)
    limit(draft, KEYS[figure], side, float(value))
    if number.unit is None and figure in ("wire", "aperture", "pitch"):
        draft.note(f"{number.number.written if number.number else ''}: no unit; taken as {unit_without(number)}")
    if len(set(values)) > 1:
        draft.questions.append(f"Gauge {number.text} in which system ({systems})? The widest limit is used.")
        draft.note(f"gauge system of the limit open: {', '.join(f'{float(v):.4g} mm' for v in values)}")
    if number.bound in ("over", "under", "finer", "coarser", "heavier", "lighter"):
        draft.note(f"'{number.bound}' is taken as inclusive")


def _guess(number: Item) -> str | None:
    if number.is_count_like and number.number and 2 <= number.number.value <= 700:
        return "count"
    return None


def _bound_range(draft: Draft, number: Item) -> None:
    """'40-60 mesh', '0.1 to 0.2 mm': both ends bound."""
    upper = number.upto
    figure = figure_of(number) or (figure_of(upper) if upper else None)
    number.taken = "limit"
    if figure is None or upper is None:
        draft.problem("E_NOT_UNDERSTOOD", f"It isn't said of what {number.text} is a range.", number)
        return
    upper.unit, upper.system = upper.unit or number.unit, upper.system or number.system
    ends = sorted(v for n in (number, upper) for v in figures_of(n, figure)[0])
    limit(draft, KEYS[figure], LEAST, float(ends[0]))
    limit(draft, KEYS[figure], MOST, float(ends[-1]))


def _purposes(draft: Draft) -> None:
    """'Retain 250 µm' asks for openings no larger, 'pass 250 µm' for openings no smaller."""
    for word in draft.terms("purpose"):
        at = word.at
        word.taken = "limit"
        number = next((i for i in draft.items[at + 1 : at + 5] if i.is_number and not i.taken and i.is_length), None)
        if number is None:
            continue
        value = float(figures_of(number, "aperture")[0][0])
        limit(draft, "aperture_mm", MOST if word.senses["purpose"] == "retain" else LEAST, value)
        number.taken = "limit"
        draft.note(f"'{word.text} {number.text}' bounds the opening")
