"""Constructions back to text: one unambiguous sentence in both unit systems, and what each side of the trade writes.

In the sentence an exact figure has fewer digits than the rounded ones beside it: that is how the reader knows it.
"""

from collections.abc import Sequence
from fractions import Fraction
from math import floor, log10

from catalog.construction import Construction, Weave
from catalog.reference import alloys
from catalog.units import MM_PER_INCH, decimal_text

MOST_DECIMALS = 6
LEAST_DIGITS = 4
ALLOY_WORDS = {
    "CS": "carbon steel",
    "GALV": "galvanised steel",
    "HCS": "spring steel",
    "65Mn": "65Mn",
    "904L": "stainless 904L",
}
FAMILY_WORDS = {"brass": "brass", "bronze": "phosphor bronze", "copper": "copper"}


def sentence(construction: Construction, mass_kg_m2: float | None = None) -> str:
    """The construction as one sentence, inch and metric; reading it gives the same construction.

    *mass_kg_m2* is added where it is known. Filter cloth has counts and wires, and no aperture.
    """
    parts = [_goods(construction), _weave(construction)]
    if not construction.is_filter:
        parts.append(construction.kind)
    if not construction.is_square:
        parts.append("warp × weft")
    parts += [words for words in (alloy_words(construction.alloy), construction.crimp, construction.finish) if words]
    figures = _filter_figures(construction) if construction.is_filter else _square_figures(construction)
    if mass_kg_m2 is not None:
        figures.append(f"about {mass_kg_m2:.2g} kg/m²" if mass_kg_m2 < 10 else f"about {mass_kg_m2:.3g} kg/m²")
    return f"{', '.join(parts)}: {', '.join(figures)}."


def compact_inch(construction: Construction) -> str:
    """As inch users write it: '60 × 60 mesh, .0065 in wire, plain, 316L'."""
    warp, weft = construction.warp, construction.weft
    counts = f"{_count(warp.count_per_in)} × {_count(weft.count_per_in)} mesh"
    wires = dict.fromkeys(_inch(w.wire_mm).removeprefix("0") for w in (warp, weft))
    words = (construction.weave.words, construction.alloy)
    return ", ".join([counts, f"{' × '.join(wires)} in wire", *(w for w in words if w)])


def compact_metric(construction: Construction) -> str:
    """As metric users write it: '0.25/0.16 mm, plain, 1.4404'; filter cloth by counts and wires."""
    warp, weft = construction.warp, construction.weft
    wires = "/".join(dict.fromkeys(_mm(w.wire_mm) for w in (warp, weft)))
    if construction.is_filter:
        counts = f"{_count(warp.count_per_in)} × {_count(weft.count_per_in)} per inch"
        figures = f"{counts}, wire {_mm(warp.wire_mm)}/{_mm(weft.wire_mm)} mm"
    elif construction.is_square:
        figures = f"{_mm(warp.aperture_mm)}/{wires} mm"
    else:
        figures = f"aperture {_mm(warp.aperture_mm)} × {_mm(weft.aperture_mm)} mm, wire {wires} mm"
    words = (construction.weave.words, _en_number(construction.alloy))
    return ", ".join([figures, *(w for w in words if w)])


def alloy_words(alloy: str | None) -> str:
    """An alloy in words that are read back as the same: 'stainless 1.4404 (316L)'."""
    known = alloys.alloy(alloy) if alloy else None
    if known is None or alloy is None:
        return alloy or ""
    if alloy in ALLOY_WORDS:
        return ALLOY_WORDS[alloy]
    if "stainless" in known.family and known.en_numbers:
        return f"stainless {known.en_numbers[0]} ({alloy})"
    return (
        f"{FAMILY_WORDS[known.family]} {alloy}"
        if known.family in FAMILY_WORDS
        else known.generic_name.partition(" (")[0]
    )


def _en_number(alloy: str | None) -> str:
    known = alloys.alloy(alloy) if alloy else None
    return known.en_numbers[0] if known and known.en_numbers else alloy or ""


def _goods(construction: Construction) -> str:
    return "Woven wire filter cloth" if construction.is_filter else "Woven wire cloth"


def _weave(construction: Construction) -> str:
    words = construction.weave.words
    return f"2/2 {words} weave" if construction.weave is Weave.TWILLED else f"{words} weave"


def _square_figures(construction: Construction) -> list[str]:
    sides = (construction.warp, construction.weft)
    apertures, wires = [s.aperture_mm for s in sides], [s.wire_mm for s in sides]
    least = max(_fewest_digits(s.pitch_mm) for s in sides) + 1
    area = 100 * apertures[0] * apertures[1] / (sides[0].pitch_mm * sides[1].pitch_mm)
    return [
        f"aperture {_twice(apertures, least=least)}",
        f"wire {_twice(wires)}",
        f"pitch {_pitches([s.pitch_mm for s in sides])}",
        f"open area {float(area):.1f} %",
    ]


def _filter_figures(construction: Construction) -> list[str]:
    sides = (construction.warp, construction.weft)
    return [
        f"pitch {_pitches([s.pitch_mm for s in sides])}",
        f"wire {_twice([s.wire_mm for s in sides], always_two=True)}",
    ]


def _twice(lengths: Sequence[Fraction], always_two: bool = False, least: int = LEAST_DIGITS) -> str:
    """'0.1651 mm (0.0065 in)', or for two unlike '0.36 × 0.26 mm (0.01417 × 0.01024 in)'."""
    shown = lengths if always_two or len(set(lengths)) > 1 else lengths[:1]
    rows = [spelled([mm, mm / MM_PER_INCH], least) for mm in shown]
    metric, inch = (" × ".join(row[at] for row in rows) for at in (0, 1))
    return f"{metric} mm ({inch} in)"


def _pitches(pitches: Sequence[Fraction]) -> str:
    """'0.4233 mm (60 per inch, 23.62 per cm)'."""
    shown = pitches if len(set(pitches)) > 1 else pitches[:1]
    rows = [spelled([p, MM_PER_INCH / p, 10 / p]) for p in shown]
    metric, per_inch, per_cm = (" × ".join(row[at] for row in rows) for at in (0, 1, 2))
    return f"{metric} mm ({per_inch} per inch, {per_cm} per cm)"


def _fewest_digits(pitch_mm: Fraction) -> int:
    """Digits of the roundest exact spelling of a pitch; many where it has none."""
    exact = (decimal_text(v, MOST_DECIMALS) for v in (pitch_mm, MM_PER_INCH / pitch_mm, 10 / pitch_mm))
    return min((_digits(text) for text in exact if text), default=8)


def spelled(values: Sequence[Fraction], least: int = LEAST_DIGITS) -> list[str]:
    """One quantity in several units: the exact spellings as they are, the others rounded to more digits than those."""
    exact = [decimal_text(value, MOST_DECIMALS) for value in values]
    fewest = min((_digits(text) for text in exact if text), default=0)
    return [
        text or _rounded(value, max(LEAST_DIGITS, least, fewest + 1)) for text, value in zip(exact, values, strict=True)
    ]


def _digits(text: str) -> int:
    return len(text.replace(".", "").strip("0")) or 1


def _rounded(value: Fraction, digits: int) -> str:
    """*value* to so many significant digits, with a decimal always: a whole count would be taken as exact."""
    decimals = max(1, digits - 1 - floor(log10(abs(float(value))))) if value else digits
    return f"{float(value):.{decimals}f}"


def _count(count: Fraction) -> str:
    return decimal_text(count, 2) or f"{float(count):.4g}"


def _mm(mm: Fraction) -> str:
    return decimal_text(mm, MOST_DECIMALS) or f"{float(mm):.4g}"


def _inch(mm: Fraction) -> str:
    inches = mm / MM_PER_INCH
    return decimal_text(inches, 5) or _rounded(inches, 3)
