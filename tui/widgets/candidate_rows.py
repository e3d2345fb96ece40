"""Candidates as rows of a list: verdict by symbol and word, name, figures with their differences."""

from collections.abc import Sequence

from catalog.search.candidate import Candidate
from tui.presenting import SEALS, Piece, harmless, inch, mm, number, shortened, signed, significant
from tui.widgets.paged_table import Column

FIXED_WIDTH = 42
LENGTHS = {"aperture": "aperture", "wire": "wire"}


def candidate_columns(units: str, width: int) -> tuple[Column, ...]:
    """The columns for these units: lengths in mm, inch or both, each with its difference."""
    name_width = max(16, min(30, width - 60))
    columns = [
        Column("verdict", "verdict", 17, "left", fixed=True),
        Column("name", "cloth", name_width, "left", fixed=True, ink="strong"),
        Column("demo", "", 1, "left", fixed=True),
    ]
    for key in LENGTHS:
        if units != "inch":
            columns.append(Column(f"{key}-mm", f"{key[:5]} mm", 8))
        if units != "metric":
            columns.append(Column(f"{key}-in", "in" if units == "both" else f"{key[:5]} in", 8))
        columns.append(Column(f"{key}-off", "differs", 7))
    columns += [
        Column("open", "open %", 6),
        Column("open-off", "differs", 7),
        Column("mass", "kg/m²", 6),
        Column("mass-off", "differs", 7),
        Column("rack", "m² here", 7),
    ]
    return tuple(columns)


class CandidateRows:
    """An answer's candidates."""

    def __init__(self, candidates: Sequence[Candidate], ascii_only: bool) -> None:
        self._candidates, self._ascii = candidates, ascii_only
        self.total = len(candidates)
        self.columns: tuple[Column, ...] = ()

    def cells(self, row: int) -> Sequence[str | Piece]:
        """One cell for every column, by the columns' keys."""
        candidate = self._candidates[row]
        return [self._cell(candidate, column.key) for column in self.columns]

    def _cell(self, candidate: Candidate, key: str) -> str | Piece:
        if key == "verdict":
            seal = SEALS[candidate.verdict]
            return f"{seal.ascii_symbol if self._ascii else seal.symbol} {seal.word}", seal.ink
        if key == "name":
            width = next(c.width for c in self.columns if c.key == "name")
            return shortened(harmless(candidate.cloth.name, 80), width)
        if key == "demo":
            return ("D", "warn") if candidate.cloth.demo else ""
        if key == "rack":
            free = sum(line.lot.available_m2 for line in candidate.stock)
            return significant(free, 3) if candidate.stock else ("none", "muted")
        return self._figure(candidate, key)

    def _figure(self, candidate: Candidate, key: str) -> str | Piece:
        what, _, part = key.partition("-")
        if what in ("open", "mass"):
            name, unit = ("open_area", "pt") if what == "open" else ("mass", "%")
            deviation = candidate.deviation(name)
            if part == "off":
                return _off(candidate, (name,), unit)
            found = deviation.found if deviation else None
            return number(found) if what == "open" else ("–" if found is None else significant(found, 3))
        names = (f"warp.{what}", f"weft.{what}")
        if part == "off":
            return _off(candidate, names, "%")
        spell = mm if part == "mm" else inch
        return _pair([d.found for name in names if (d := candidate.deviation(name))], spell)


def _pair(values: Sequence[float | None], spell: object) -> str:
    """One figure where both directions agree, else the first with a sign that there is another."""
    texts = [spell(v) for v in values]  # type: ignore[operator]
    if not texts:
        return "–"
    return texts[0] if len(set(texts)) == 1 else f"{texts[0]}*"


def _off(candidate: Candidate, names: Sequence[str], unit: str) -> str | Piece:
    """The larger difference of the two directions; '!' where it lies outside its limit."""
    found = [d for name in names if (d := candidate.deviation(name)) and d.difference is not None]
    if not found:
        return ""
    worst = max(found, key=lambda d: abs(d.difference or 0))
    text = signed(worst.difference, unit)
    if worst.inside is False:
        return f"{text}!", "risk"
    return text, "good" if worst.inside else "muted"
