"""Rules for limits: compared figures, ranges, and what a purpose asks of the opening."""

from catalog.callout.rules.bound_values import KEYS, LEAST, MOST, figure_of, figures_of, limit, side_of, unit_without
from catalog.callout.rules.draft import Draft
from catalog.callout.text.items import Item


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


def _bound_product(draft: Draft, chain: Item) -> None:
    """'At least 30 by 30' bounds both directions; of unlike counts each would bound its own, which isn't held."""
    members = [m for m in chain.members if not m.taken and m.bound]
    if not members:
        return
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
    figure = figure_of(number) or _guessed_figure(number)
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


def _guessed_figure(number: Item) -> str | None:
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
    if not ends:
        draft.problem("E_NOT_UNDERSTOOD", f"There is no gauge {number.text}.", number)
        return
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
