"""A reading in words, for the plain output."""

from collections.abc import Iterator
from fractions import Fraction

from catalog.callout.reading import Likelihood, Reading, Side, Status, Understanding
from catalog.units import MM_PER_INCH
from tui.exit_codes import excerpt, one_line

STATUS_WORDS = {
    Status.CLEAR: "clear",
    Status.NOTED: "read, with notes",
    Status.ASK: "needs an answer",
    Status.INCOMPLETE: "incomplete",
    Status.LIMITS: "limits, not a cloth",
    Status.OUT_OF_SCOPE: "no woven cloth that can be read",
}
LIMIT_WORDS = {
    "aperture_mm": ("aperture", "mm"),
    "wire_mm": ("wire", "mm"),
    "pitch_mm": ("pitch", "mm"),
    "count_per_in": ("count", "per inch"),
    "open_area_pct": ("open area", "%"),
    "mass_kg_m2": ("mass", "kg/m²"),
}


def reading_lines(understanding: Understanding, units: str = "both") -> Iterator[str]:
    """How a text was understood: status, each reading, what is missing, problems with a caret, the question."""
    yield f"Status   {STATUS_WORDS[understanding.status]}"
    for reading in understanding.readings:
        yield ""
        yield from one_reading(reading, units)
    if understanding.readings:
        yield ""
    if understanding.missing:
        yield f"Missing  {', '.join(word.replace('_', ' ') for word in understanding.missing)}"
    for problem in understanding.problems:
        yield f"Problem  {one_line(problem.message)}"
        if problem.column:
            yield from (f"         {line}" for line in excerpt(understanding.text, problem.column))
    if understanding.question:
        yield f"Question {one_line(understanding.question)}"


def one_reading(reading: Reading, units: str) -> Iterator[str]:
    """A reading in a few lines."""
    likely = "" if reading.likelihood is Likelihood.USUAL else f"  ({reading.likelihood.value})"
    yield f"Read as  {one_line(reading.label)}{likely}"
    make = describe(reading, units)
    if make:
        yield f"         {make}"
    words = [
        reading.weave.words if reading.weave else "",
        reading.alloy or "",
        reading.finish or "",
        reading.crimp or "",
        reading.grade or "",
        reading.standard or "",
        f"certificate {reading.certificate}" if reading.certificate else "",
        f"rating {reading.rating.um:g} µm {reading.rating.kind}" if reading.rating else "",
    ]
    if any(words):
        yield f"         {one_line(', '.join(word for word in words if word))}"
    for key, bounds in reading.limits.items():
        yield f"         {limit_words(key, bounds)}"
    if reading.form:
        yield f"         {form_words(reading)}"
    if reading.derived:
        yield f"         computed: {', '.join(reading.derived)}"
    for note in reading.notes:
        yield f"         note: {one_line(note)}"


def describe(reading: Reading, units: str) -> str:
    """Apertures, wires and pitches of a reading on one line."""
    sides = (reading.warp, reading.weft)
    if _alike(*sides):
        return _side(sides[0], units)
    said = ((name, _side(side, units)) for name, side in zip(("warp", "weft"), sides, strict=True))
    return "; ".join(f"{name} {text}" for name, text in said if text)


def _alike(one: Side, other: Side) -> bool:
    def figures(side: Side) -> list[Fraction | None]:
        return [length.mm if length else None for length in (side.pitch, side.wire, side.aperture)]

    return figures(one) == figures(other)


def _side(side: Side, units: str) -> str:
    parts = []
    if side.aperture:
        parts.append(f"aperture {length_text(side.aperture.mm, units)}")
    if side.wire:
        parts.append(f"wire {length_text(side.wire.mm, units)}")
    if side.pitch:
        count = float(MM_PER_INCH / side.pitch.mm)
        parts.append(f"pitch {length_text(side.pitch.mm, units)}, {count:.4g} per inch")
    return ", ".join(parts)


def length_text(mm: Fraction | float, units: str) -> str:
    """A length in the units that were asked for: '0.2582 mm (0.01017 in)'."""
    metric = f"{float(mm):.4g} mm"
    inch = f"{float(mm) / float(MM_PER_INCH):.4g} in"
    return {"metric": metric, "inch": inch}.get(units, f"{metric} ({inch})")


def limit_words(key: str, bounds: tuple[float | None, float | None]) -> str:
    """A limit: 'open area at least 40 %'."""
    name, unit = LIMIT_WORDS.get(key, (key, ""))
    low, high = bounds
    if low is not None and high is not None:
        return f"{name} {low:.4g} to {high:.4g} {unit}"
    return f"{name} at least {low:.4g} {unit}" if low is not None else f"{name} at most {high:.4g} {unit}"


def form_words(reading: Reading) -> str:
    """The size and number in the text."""
    form = reading.form
    if form is None:
        return ""
    size = " × ".join(f"{value:.6g}" for value in (form.width_mm, form.length_mm) if value is not None)
    parts = [
        f"{form.quantity} ×" if form.quantity else "",
        form.kind or "",
        f"{size} mm" if size else "",
        f"Ø {form.diameter_mm:g} mm" if form.diameter_mm else "",
        f"{form.area_m2:g} m²" if form.area_m2 else "",
    ]
    return " ".join(part for part in parts if part)
