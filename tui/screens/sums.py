"""The sums behind a cloth's figures, step by step, with their sources."""

from collections.abc import Sequence

from catalog.cloth import Cloth
from tui.presenting import Line, harmless, plain, wrapped
from tui.screens.overlay import Overlay


def sum_lines(cloth: Cloth, width: int, ascii_only: bool) -> list[Line]:
    """Each figure with its formula, the sum, the result and where the formula is from."""
    from catalog.report.explain import explain

    lines: list[Line] = [(("Sums  ", "title"), (f" {harmless(cloth.name, 60)}", "strong"), ("   Esc closes", "muted"))]
    for step in explain(cloth):
        lines += [(), ((f"{step.quantity}  ", "head"), (step.formula, "text"))]
        lines += [((f"  {part}", "text"),) for part in wrapped(step.sum, width - 4)]
        lines.append(((f"  = {step.result}", "strong"), (f"   [{step.source}]", "muted")))
    return [[(plain(t), ink) for t, ink in line] for line in lines] if ascii_only else lines


class Sums(Overlay):
    """Shown for one cloth."""

    def __init__(self, cloth: Cloth, ascii_only: bool) -> None:
        super().__init__()
        self._cloth, self._ascii = cloth, ascii_only

    def lines(self, width: int) -> Sequence[Line]:
        """The sums."""
        return sum_lines(self._cloth, width, self._ascii)
