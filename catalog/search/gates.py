"""Gates: each by name, each a small function; a failed one ends the comparison."""

from collections.abc import Callable, Iterator

from catalog.reference import alloys
from catalog.search.candidate import Finding
from catalog.search.comparison import Comparison
from catalog.search.wording import mm, pct

FAMILY_OF_WORD = {"phosphor bronze": "bronze", "duplex": "duplex stainless"}
SIEVE_STANDARDS = ("3310", "E11", "E 11")
AMBIGUOUS = ("brass", "bronze")
"""Names that several metals of different use go by."""
NEEDS_AN_OPENING = ("aperture_mm", "open_area_pct")
Gate = Callable[[Comparison], Finding | None]


def construction_gate(c: Comparison) -> Finding | None:
    """Square, rectangular and filter cloth don't stand in for one another."""
    asked_filter = c.target.reading.is_filter or (c.target.weave is not None and c.target.weave.is_filter)
    asks_rating = c.target.rating is not None and not c.asks_aperture
    asked = "filter cloth" if asked_filter or asks_rating else _asked_kind(c)
    if asked is None or asked == c.made.kind:
        return None
    return Finding("construction", False, f"Asked is {asked}; this is {c.made.kind}.")


def _asked_kind(c: Comparison) -> str | None:
    warp, weft = c.directions
    if warp.asked_aperture is not None and weft.asked_aperture is not None:
        return "square" if warp.asked_aperture == weft.asked_aperture else "rectangular"
    if warp.asked_pitch is not None and weft.asked_pitch is not None:
        return "square" if warp.asked_pitch == weft.asked_pitch else "rectangular"
    return None


def weave_gate(c: Comparison) -> Finding | None:
    """A weave that was stated is kept to; one that was not is assumed plain and said to be."""
    asked, found = c.target.weave, c.made.weave
    if asked is None or asked is found:
        return None
    if c.target.origin.get("weave") == "assumed":
        words = f"Weave was not asked; this is {found.words}, where {asked.words} is customary."
        return None if found.is_filter else Finding("weave", True, words, "common practice")
    return Finding("weave", False, f"Asked weave is {asked.words}; this is {found.words}.")


def alloy_gate(c: Comparison) -> Finding | None:
    """The alloy ladder decides; its 'ask' leaves the verdict open."""
    asked = c.target.reading.alloy if c.target.alloy_rule == "same" else c.target.alloy_rule
    offered = c.made.alloy
    if c.target.alloy_rule == "any":
        return Finding("alloy", True, f"Any alloy was allowed; this is {_named(offered)}.")
    if asked is None and c.target.alloy_is_open:
        return Finding(
            "alloy", None, f"The text contradicts itself on the metal: ask which; this is {_named(offered)}."
        )
    if asked is None and c.target.reading.material is not None:
        return _family_finding(c.target.reading.material, offered)
    if asked is None:
        return Finding("alloy", True, f"No alloy was asked; this is {_named(offered)}.")
    if offered is None:
        return Finding("alloy", None, f"Asked alloy is {_named(asked)}; the alloy of this cloth is not on record.")
    if asked == offered:
        return None
    gate = alloys.gate(asked, offered)
    ok = {"same": True, "accepted": True, "ask": None, "blocked": False}[gate.outcome]
    what = {True: "accepted", None: "ask who specifies it", False: "not accepted"}[ok]
    note = gate.note[:1].upper() + gate.note[1:]
    text = f"Asked alloy is {_named(asked)}, offered {_named(offered)}: {what}. {note}".strip()
    return Finding("alloy", ok, text if text.endswith(".") else text + ".", gate.source)


def _family_finding(material: str, offered: str | None) -> Finding:
    """A family was asked and its grade left open: another family fails; which brass or bronze is a question."""
    known = alloys.alloy(offered) if offered else None
    if known is None:
        return Finding("alloy", None, f"Asked is {material}; the alloy of this cloth is not on record.")
    is_called_bronze = material == "bronze" and known.id == "CuZn10"
    if not is_called_bronze and not known.family.endswith(FAMILY_OF_WORD.get(material, material)):
        return Finding("alloy", False, f"Asked is {material}; this is {known.family}, {_named(offered)}.", "as asked")
    text = f"Asked is {material}, the grade isn't said; this is {_named(offered)}"
    if material in AMBIGUOUS:
        return Finding("alloy", None, f"{text}: ask which {material} is meant.", "as asked")
    return Finding("alloy", True, f"{text}. Ask for the grade if it matters.", "as asked")


def _named(alloy_id: str | None) -> str:
    if alloy_id is None:
        return "not on record"
    known = alloys.alloy(alloy_id)
    number = known.en_numbers[0] if known and known.en_numbers else ""
    is_another_name = number.startswith(("1.", "2.", "3.")) and number != alloy_id
    return f"{alloy_id} ({number})" if is_another_name else alloy_id


def finish_gate(c: Comparison) -> Finding | None:
    """A finish that was stated has to be there; one that nobody asked for is said."""
    asked, found = c.target.reading.finish, c.made.finish
    if asked is None:
        return Finding("finish", True, f"This cloth is {found}; no finish was asked.") if found else None
    if found is not None and (asked in found or found in asked):
        return None
    return Finding("finish", False, f"Asked finish is {asked}; this cloth is {found or 'uncoated'}.")


def crimp_gate(c: Comparison) -> Finding | None:
    """A crimp that was stated has to be there; one that isn't on record is a question."""
    asked, found = c.target.reading.crimp, c.made.crimp
    if asked is None or asked == found:
        return None
    if found is None:
        return Finding("crimp", None, f"Asked is {asked}; the crimp of this cloth is not on record: ask.", "as asked")
    return Finding("crimp", False, f"Asked is {asked}; this cloth has {found}.", "as asked")


def sieve_gate(c: Comparison) -> Finding | None:
    """Where a test-sieve standard is asked, industrial cloth of the same figures is for its owner to accept."""
    asked, found = c.target.reading.standard or "", c.cloth.standard or ""
    named = next((name for name in SIEVE_STANDARDS if name in asked), None)
    if named is None or any(name in found for name in SIEVE_STANDARDS):
        return None
    text = f"Asked is test-sieve cloth to {asked}; this is industrial cloth: ask whether it will do."
    return Finding("sieve standard", None, text, "certified sieves: geometry never settles it")


def data_gate(c: Comparison) -> Finding | None:
    """Figures that can't be true are not compared."""
    if c.made.is_filter or all(d.found.aperture_mm > 0 for d in c.directions):
        return None
    return Finding("sound data", False, "The figures on record leave no opening between the wires.")


def limit_gates(c: Comparison) -> Iterator[Finding]:
    """Stated limits, each inclusive, each with what it is short by."""
    for key, (least, most) in c.target.limits.items():
        if c.made.is_filter and key in NEEDS_AN_OPENING:
            yield Finding(f"limit {key}", False, f"{_label(key)} has no meaning in filter cloth.", "as asked")
            continue
        found = limited_figure(c, key)
        if found is None:
            yield Finding(f"limit {key}", None, f"{_label(key)} of this cloth is not on record.", "as asked")
            continue
        yield _limit_finding(key, least, most, found)


def _limit_finding(key: str, least: float | None, most: float | None, found: list[tuple[float, float]]) -> Finding:
    for low, high in found:
        short = (least is not None and low < least) or (most is not None and high > most)
        side, bound = ("least", least) if least is not None and low < least else ("most", most)
        if short and bound is not None:
            value = low if side == "least" else high
            text = f"{_label(key)} is {_figure(key, value)}; asked is at {side} {_figure(key, bound)}."
            return Finding(f"limit {key}", False, text, "as asked")
    values = " and ".join(dict.fromkeys(_figure(key, low) for low, _ in found))
    bounds = " and ".join(
        f"at {side} {_figure(key, bound)}" for side, bound in (("least", least), ("most", most)) if bound is not None
    )
    return Finding(f"limit {key}", True, f"{_label(key)} {values} is inside the limit, {bounds}.", "as asked")


def limited_figure(c: Comparison, key: str) -> list[tuple[float, float]] | None:
    """The figures of the cloth that a limit called *key* bounds, as (low, high) pairs."""
    sides = (c.made.warp, c.made.weft)
    figures = c.cloth.figures
    if key == "aperture_mm" and not c.made.is_filter:
        values = [float(s.aperture_mm) for s in sides]
    elif key in ("wire_mm", "pitch_mm"):
        values = [float(getattr(s, key)) for s in sides]
    elif key == "count_per_in":
        values = [float(s.count_per_in) for s in sides]
    else:
        value = {"open_area_pct": figures.open_area_pct, "mass_kg_m2": figures.mass_kg_m2}.get(key)
        if value is None:
            return None
        values = [value]
    return [(round(v, 9), round(v, 9)) for v in values]


def _label(key: str) -> str:
    return {
        "aperture_mm": "Aperture",
        "wire_mm": "Wire",
        "pitch_mm": "Pitch",
        "count_per_in": "Count per inch",
        "open_area_pct": "Open area",
        "mass_kg_m2": "Mass per area",
    }.get(key, key)


def _figure(key: str, value: float) -> str:
    if key.endswith("_mm"):
        return mm(value)
    if key == "open_area_pct":
        return pct(value)
    return f"{value:.4g} kg/m²" if key == "mass_kg_m2" else f"{value:.4g}"


GATES: tuple[Gate, ...] = (construction_gate, weave_gate, alloy_gate, finish_gate, crimp_gate, sieve_gate, data_gate)


def gate_findings(c: Comparison) -> list[Finding]:
    """Every gate's word, in order."""
    found = [finding for gate in GATES if (finding := gate(c)) is not None]
    return found + list(limit_gates(c))
