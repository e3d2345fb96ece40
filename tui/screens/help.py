"""The help screen: every command of the one list, those of the place in front first."""

from collections.abc import Mapping, Sequence

from tui.commands import EVERYWHERE, LIST, PLACES, at, key_words
from tui.presenting import SEALS, Line, plain, width_of, wrapped
from tui.screens.overlay import Overlay

HEADS = {EVERYWHERE: "Everywhere", LIST: "In lists"}


def help_lines(place: str, keys: Mapping[str, str], width: int, ascii_only: bool) -> list[Line]:
    """Every key and what it does, and what the signs mean."""
    lines: list[Line] = [(("Keys", "title"), ("   Esc closes; arrows and page keys scroll", "muted"))]
    for where in (place, LIST, EVERYWHERE, *(p for p in PLACES if p != place)):
        if not at(where):
            continue
        lines += [(), ((HEADS.get(where, f"In {where}"), "head"),)]
        for command in at(where):
            names = key_words(command, keys)
            column = max(14, width_of(names) + 1)
            parts = wrapped(command.help, max(20, width - column - 2))
            lines.append(((" " + names.ljust(column), "key"), (parts[0], "text")))
            lines += [((" " * (column + 1) + part, "text"),) for part in parts[1:]]
    lines += [(), (("Verdicts", "head"),)]
    for seal in SEALS.values():
        sign = seal.ascii_symbol if ascii_only else seal.symbol
        lines.append(((f" {sign} ", seal.ink), (seal.word, seal.ink)))
    lines += [(), (("In lists * marks a marked row; D marks demo data, which is invented.", "muted"),)]
    return [[(plain(t), ink) for t, ink in line] for line in lines] if ascii_only else lines


class Help(Overlay):
    """Shown for the place in front."""

    def __init__(self, place: str, keys: Mapping[str, str], ascii_only: bool) -> None:
        super().__init__()
        self._place, self._keys, self._ascii = place, keys, ascii_only

    def lines(self, width: int) -> Sequence[Line]:
        """The keys."""
        return help_lines(self._place, self._keys, width, self._ascii)
