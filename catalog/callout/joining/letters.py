"""The letters of the formulas: w, d, p, n before a number; W, L, WD behind a size."""

from catalog.callout.joining.measuring import peek
from catalog.callout.joining.neighbours import EQUALS
from catalog.callout.text.items import Item

LETTERS = {
    "w": "aperture",
    "d": "wire",
    "p": "pitch",
    "t": "pitch",
    "n": "count",
    "l": "length",
    "b": "width",
    "ø": "wire",
}


def letters(items: list[Item]) -> list[Item]:
    """w, d, p, n before '=' or glued to a number are the symbols of the formulas; W behind a size is its width."""
    for at, item in enumerate(items):
        behind, before = peek(items, at + 1), peek(items, at - 1)
        name = item.text.lower()
        if name not in LETTERS and name != "wd":
            continue
        if item.kind == "term" and not item.has("harmless") and not item.has("unit"):
            continue
        is_size = behind is not None and behind.is_number and behind.glued and name != "wd"
        leads = behind is not None and (behind.text in EQUALS or behind.has("compare") or is_size)
        if leads and name in LETTERS:
            item.kind, item.senses = "term", {"slot": LETTERS[name], "letter": name}
        elif name in ("w", "wd", "l", "d") and before is not None and before.is_number and before.slot is None:
            _letter_behind(item, before, name)
    return items


def _letter_behind(item: Item, size: Item, name: str) -> None:
    """'48" W', '100' L', '36 WD' are sizes; '.0045 WD' is a wire's diameter."""
    assert size.number
    value = float(size.length("in").mm) if size.unit != "gauge" else 0.0
    if name == "wd":
        item.senses = {"slot": "width" if value > 100 else "wire"}
    elif name == "d":
        item.senses = {"slot": "wire"} if value < 20 else {}
    elif value > 100 and item.text.isupper():
        item.senses = {"slot": "width" if name == "w" else "length"}
    item.kind = "term" if item.senses else item.kind
