"""How a callout was read, as lines: words by role, carets, the cloth in both units, the one question."""

from collections.abc import Sequence

from catalog.callout.reading import Limits, Reading, Side, Status, Understanding
from catalog.units import Length
from tui.presenting import (
    Line,
    Piece,
    alloy_words,
    both,
    figure_words,
    fit,
    harmless,
    role_words,
    significant,
    width_of,
    wrapped,
)

EMPTY_HINT = "Type what the drawing says:  60 x 60 mesh, .0075 wire, 304   or   0,25/0,16 1.4404 plain"
SAID_BY_THEMSELVES = ("mesh", "aperture", "wire", "open_area", "pitch")
"""Parts that a word can name itself: 'opening' needs no label."""
LABEL_ROOM = 24
LIMIT_NAMES = {
    "aperture_mm": "aperture", "wire_mm": "wire", "pitch_mm": "pitch", "count_per_in": "count per inch",
    "open_area_pct": "open area", "mass_kg_m2": "mass per area",
}  # fmt: skip


def reading_lines(
    understanding: Understanding,
    width: int,
    units: str,
    offset: int = 0,
    taken: int | None = None,
    cautions: Sequence[str] = (),
) -> list[Line]:
    """What is shown beneath the line to type in. *offset*: cells that the typed text has moved left."""
    if not understanding.text.strip():
        return [((EMPTY_HINT, "muted"),)]
    lines: list[Line] = []
    if carets := _carets(understanding, width, offset):
        lines.append(carets)
    lines += _problems(understanding, width)
    lines += [((fit(f"! {harmless(said)}", width), "warn"),) for said in cautions]
    if words := _words(understanding, width):
        lines.append(words)
    alive = understanding.surviving
    if understanding.question:
        lines += question_lines(understanding, width, units, taken)
    if alive and (taken is not None or not understanding.question or len(alive) == 1):
        lines += _reading(alive[min(taken or 0, len(alive) - 1)], width, units)
    if understanding.missing:
        lines.append((("Missing: ", "ask"), (harmless(", ".join(understanding.missing)), "text")))
    return lines


def _carets(understanding: Understanding, width: int, offset: int) -> Line:
    """Carets under what was not understood, and under the place of a problem."""
    text = understanding.text
    spots = [(w.start, w.end) for w in understanding.words if w.role == "unknown"]
    spots += [(p.column - 1, p.column) for p in understanding.problems if p.column]
    row = [" "] * width
    for start, end in spots:
        left = width_of(text[:start]) - offset
        for cell in range(left, left + max(1, width_of(text[start:end]))):
            if 0 <= cell < width:
                row[cell] = "^"
    marks = "".join(row).rstrip()
    if not marks:
        return ()
    label = "  not understood" if not understanding.problems else ""
    return ((marks + label, "bad"),)


def _problems(understanding: Understanding, width: int) -> list[Line]:
    alive = bool(understanding.surviving)
    lines: list[Line] = []
    for problem in understanding.problems[:2]:
        for part in wrapped(f"! {harmless(problem.message)}", width, 2)[:2]:
            lines.append(((part, "risk" if alive else "bad"),))
    if not alive and not understanding.problems and understanding.status is Status.OUT_OF_SCOPE:
        lines.append((("! There is no wire cloth in this text.", "bad"),))
    return lines


def _words(understanding: Understanding, width: int) -> Line:
    """Each word with the part it plays: in colour, and in words."""
    pieces: list[Piece] = []
    used = 0
    for word in understanding.words:
        text = harmless(understanding.text[word.start : word.end], 40)
        label, ink = role_words(word.role)
        if word.role in SAID_BY_THEMSELVES and not any(char.isdigit() for char in text):
            label = ""
        cells = width_of(text) + width_of(label) + 1 + (3 if pieces else 0)
        if used + cells > width:
            pieces.append((" …", "muted"))
            break
        if pieces:
            pieces.append(("   ", "muted"))
        pieces += [(f"{label} " if label else "", "muted"), (text, ink)]
        used += cells
    return pieces


def _reading(reading: Reading, width: int, units: str) -> list[Line]:
    lines: list[Line] = []
    for part in wrapped(f"= {reading_words(reading, units)}", width, 2)[:2]:
        lines.append(((part, "strong"),))
    for note in reading.notes[:1]:
        lines.append(((wrapped(f"  {harmless(note)}", width)[0], "muted"),))
    return lines


def reading_words(reading: Reading, units: str) -> str:
    """One reading in a sentence, with every length in the units asked for."""
    parts: list[str] = []
    made = reading.weave.words if reading.weave else ""
    parts.append(" ".join(x for x in (made, "cloth" if made else "") if x))
    if reading.alloy:
        parts.append(alloy_words(reading.alloy))
    parts += _sides(reading, units)
    if reading.rating:
        parts.append(f"{significant(reading.rating.um)} µm {harmless(reading.rating.kind)}")
    if reading.open_area_pct is not None:
        parts.append(f"open {reading.open_area_pct:.1f} %")
    parts += [harmless(x) for x in (reading.finish, reading.crimp, reading.standard, reading.certificate) if x]
    parts += limit_words(reading.limits, units)
    if reading.form:
        parts.append(_form(reading))
    return ", ".join(part for part in parts if part) or harmless(reading.label)


def _form(reading: Reading) -> str:
    form = reading.form
    if form is None:
        return ""
    sizes = [f"{v:g}" for v in (form.width_mm, form.length_mm) if v is not None]
    size = f"{' × '.join(sizes)} mm" if sizes else f"Ø {form.diameter_mm:g} mm" if form.diameter_mm else ""
    number = f"{form.quantity} × " if form.quantity else ""
    return f"{number}{harmless(form.kind or '')} {size}".strip()


def _sides(reading: Reading, units: str) -> list[str]:
    if reading.warp == reading.weft or _alike(reading.warp, reading.weft):
        return _side(reading.warp, units)
    parts = []
    for name, side in (("warp", reading.warp), ("weft", reading.weft)):
        words = _side(side, units)
        if words:
            parts.append(f"{name} " + " ".join(words))
    return parts


def _alike(one: Side, other: Side) -> bool:
    def values(side: Side) -> tuple[object, ...]:
        return tuple(x.mm if x else None for x in (side.pitch, side.wire, side.aperture))

    return values(one) == values(other)


def _side(side: Side, units: str) -> list[str]:
    parts = []
    if side.aperture and side.aperture.mm > 0:
        parts.append(f"aperture {_length(side.aperture, units)}")
    if side.wire:
        parts.append(f"wire {_length(side.wire, units)}")
    if side.pitch:
        parts.append(f"{significant(float(side.count_per_in or 0))} per in")
    return parts


def _length(length: Length, units: str) -> str:
    return both(float(length.mm), units)


def limit_words(limits: Limits, units: str) -> list[str]:
    """Stated limits in words: 'open area at least 40 %'."""
    words = []
    for key, (least, most) in limits.items():
        name = LIMIT_NAMES.get(key, key)
        if least is not None and most is not None:
            words.append(f"{name} {figure_words(key, least, units)} to {figure_words(key, most, units)}")
        elif least is not None:
            words.append(f"{name} at least {figure_words(key, least, units)}")
        elif most is not None:
            words.append(f"{name} at most {figure_words(key, most, units)}")
    return words


def question_lines(understanding: Understanding, width: int, units: str, taken: int | None) -> list[Line]:
    """The question, and each answer behind its key."""
    question = harmless(understanding.question or "")
    alive: Sequence[Reading] = understanding.surviving
    if len(alive) < 2:
        return [((part, "ask"),) for part in wrapped(f"? {question}", width, 2)[:2]]
    asked = question.partition(":")[0]
    lines: list[Line] = [((fit(f"? {asked}: answer with its number, outside the line.", width).rstrip(), "ask"),)]
    words = [answer_words(reading, units) for reading in alive[:9]]
    room = min(max(map(width_of, words)), max(20, width - LABEL_ROOM))
    for number, (reading, said) in enumerate(zip(alive, words, strict=False), 1):
        sign = ">" if taken == number - 1 else " "
        text = fit(f"{fit(said, room)}  {harmless(reading.label, 90)}", width - 3).rstrip()
        lines.append(((f"{sign}{number} ", "key"), (text, "strong" if sign == ">" else "text")))
    return lines


def answer_words(reading: Reading, units: str) -> str:
    """What sets a reading apart, in few words: 'opens 0.6147 mm .0242 in, wire 0.6553 mm .0258 in'."""
    parts = []
    for name, length in (("opens", reading.warp.aperture), ("wire", reading.warp.wire)):
        if length is not None:
            parts.append(f"{name} {both(float(length.mm), units).replace('(', '').replace(')', '')}")
    return ", ".join(parts) or reading_words(reading, units)
