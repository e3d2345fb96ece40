"""Which number a word belongs to: labels before and behind, letters of formulas, warp and weft, comparisons."""

from catalog.callout.items import Item
from catalog.callout.measures import peek
from catalog.callout.structure import is_separator

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
EQUALS = frozenset("=:≤≥<>~")
SIGN_BOUNDS = {"≤": "most", "≥": "least", "<": "under", ">": "over"}
FITS = {
    "open_area": ("%", None),
    "mass": ("kg/m2", "g/m2", "lb/ft2"),
    "width": ("mm", "cm", "m", "in", "ft", "M", None),
    "length": ("mm", "cm", "m", "in", "ft", "M", None),
    "thickness": ("mm", "um", "in", "thou", None),
    "wire": ("mm", "um", "in", "thou", "gauge", "hundredths", "aught", None),
    "aperture": ("mm", "um", "in", "thou", "cm", "hundredths", None),
    "pitch": ("mm", "um", "in", "thou", "cm", None),
    "mesh": ("mm", "um", "in", "cm", "/in", "/cm", "mesh sign", "M", "designation", "hundredths", "/in2", "/cm2", None),
    "count": ("/in", "/cm", "mesh sign", "M", "designation", "per length", "/in2", "/cm2", None),
}
PASSED_OVER = ("material", "harmless", "finish", "galvanised", "tolerance word", "number sign")


def letters(items: list[Item]) -> list[Item]:
    """w, d, p, n before '=' or glued to a number are the symbols of the formulas; W behind a size is its width."""
    for at, item in enumerate(items):
        behind, before = peek(items, at + 1), peek(items, at - 1)
        name = item.text.lower()
        if name not in LETTERS and name != "wd":
            continue
        if item.kind == "term" and not item.has("harmless") and not item.has("unit"):
            continue
        leads = behind is not None and (behind.text in EQUALS or (behind.is_number and behind.glued and name != "wd"))
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


def labelled(items: list[Item]) -> list[Item]:
    """Give every label its number: the one behind '=', the unlabelled one just before it, else the next one."""
    last: Item | None = None
    for at, item in enumerate(items):
        if item.is_number or item.kind == "chain":
            last = item
        elif item.kind == "sign" and (item.text in ":=" or (is_separator(item) and item.text != ")")):
            last = None
        elif item.kind == "term" and not item.taken:
            if item.has("slot"):
                _give(items, at, item, last)
            if item.has("side"):
                _give_side(items, at, item, last)
    return items


def _give(items: list[Item], at: int, label: Item, last: Item | None) -> None:
    slot = label.senses["slot"]
    after = peek(items, at + 1)
    ahead = _ahead(items, at + 1)
    behind_a_number = at > 0 and items[at - 1] is last and slot in ("mesh", "count")
    points_on = after is not None and after.text in EQUALS and not behind_a_number
    if last is not None and not points_on and _accepts(_tail(last), slot) and not _fits_ahead(last, ahead, slot):
        _set(last, slot, backwards=True)
        label.taken = slot
    elif ahead is not None and _accepts(_head(ahead), slot):
        _set(ahead, slot, backwards=False)
        label.taken = slot
        _head(ahead).senses["label before"] = ""


def _fits_ahead(last: Item, ahead: Item | None, slot: str) -> bool:
    """'0.5 mm wire 0.2 mm': between two lengths the wire is the thinner."""
    if slot != "wire" or ahead is None or not ahead.is_number or ahead.slot or not ahead.is_length:
        return False
    return _tail(last).is_length and ahead.length().mm < _tail(last).length().mm


def _tail(item: Item) -> Item:
    return item.members[-1] if item.kind == "chain" else item


def _head(item: Item) -> Item:
    return item.members[0] if item.kind == "chain" else item


def _accepts(number: Item, slot: str) -> bool:
    if number.slot is not None or number.unit not in FITS[slot]:
        return False
    return not (slot == "open_area" and number.unit is None and (number.number is None or number.number.value < 5))


def _set(item: Item, slot: str, backwards: bool) -> None:
    """A label behind a product reaches back over like numbers, one before it reaches on: '3 x 1 mm opening'."""
    if item.kind != "chain":
        item.slot = slot
        return
    row = item.members[::-1] if backwards else item.members
    row[0].slot = slot
    for member, before in zip(row[1:], row, strict=False):
        if member.slot is not None or not _alike(member, before, slot):
            return
        member.slot = slot


def _alike(member: Item, before: Item, slot: str) -> bool:
    whole = member.is_count_like or before.is_count_like
    if member.unit != before.unit and not (slot == "aperture" and whole):
        return False
    if slot in ("mesh", "count"):
        return member.is_count_like == before.is_count_like
    if slot == "wire":
        return member.unit == "gauge" or (member.is_count_like == before.is_count_like and _close(member, before))
    return slot in ("aperture", "pitch") and (
        member.is_count_like == before.is_count_like or member.is_length or before.is_length
    )


def _close(member: Item, before: Item) -> bool:
    """True where two wires of one cloth may stand side by side: less than fourfold apart."""
    if not member.number or not before.number or not before.number.value:
        return False
    return 1 / 4 < member.number.value / before.number.value < 4


def _ahead(items: list[Item], at: int) -> Item | None:
    """The next number of the clause, over '=', 'of', comparisons and words that don't count."""
    while at < len(items):
        item = items[at]
        if item.is_number or item.kind == "chain":
            return item
        if (
            item.text in EQUALS
            or item.text == "."
            or item.has("compare")
            or item.has("side")
            or any(map(item.has, PASSED_OVER))
        ):
            at += 1
            continue
        return None
    return None


def _give_side(items: list[Item], at: int, word: Item, last: Item | None) -> None:
    side = word.senses["side"]
    holder = (
        last
        if last is not None and _tail(last).side is None and not _points_on(items, at)
        else _ahead_over_labels(items, at + 1)
    )
    if holder is None:
        return
    for number in holder.members or [holder]:
        number.side = number.side or side
    word.taken = word.taken or "direction"
    if holder is not last and not word.has("slot"):
        word.senses["leads"] = ""


def sided(items: list[Item]) -> list[Item]:
    """What stands in a clause that names warp or weft is of that direction: 'weft 110/in wire .010'."""
    side: str | None = None
    for item in items:
        if is_separator(item):
            side = None
        elif item.has("side"):
            side = item.senses["side"] if item.has("leads") else None
        elif side is not None:
            both = item.kind == "chain" and all(m.is_count_like for m in item.members)
            for number in [] if both else item.members or ([item] if item.is_number else []):
                number.side = number.side or side
    return items


def _points_on(items: list[Item], at: int) -> bool:
    """True where the word leads its number: '=' or a label behind it, or a clause that begins with it."""
    after, before = peek(items, at + 1), peek(items, at - 1)
    return (after is not None and (after.text in EQUALS or after.senses.get("slot") == "wire")) or is_separator(before)


def _ahead_over_labels(items: list[Item], at: int) -> Item | None:
    while (item := peek(items, at)) and item.has("slot"):
        at += 1
    return _ahead(items, at)


def bounded(items: list[Item]) -> list[Item]:
    """Give every comparison its number: '≥ 40 %' the next, '0.8 mm max' the one before, 'or finer' always the one before."""
    for at, item in enumerate(items):
        bound = SIGN_BOUNDS.get(item.text) if item.kind == "sign" else item.senses.get("compare")
        if bound is None or item.taken:
            continue
        before, after = _near(items, at, -1), _near(items, at, +1)
        holder = _bound_holder(items, at, item, before, after)
        if holder is not None:
            for number in holder.members or [holder]:
                number.bound = bound
            item.taken = "limit"
    return items


def _bound_holder(items: list[Item], at: int, item: Item, before: int | None, after: int | None) -> Item | None:
    earlier = None if before is None else items[before]
    later = None if after is None else items[after]
    if item.text.lower().startswith(("or ", "and ", "oder ")) or later is None:
        return earlier
    if item.kind == "sign" or earlier is None or earlier.bound:
        return later
    own = peek(items, (after or 0) + 1)
    leads = "label before" in _head(later).senses and not (own is not None and own.has("compare"))
    return later if leads or item.senses["compare"] not in ("least", "most") else earlier


def _near(items: list[Item], at: int, step: int) -> int | None:
    """The place of the nearest number on one side, within the clause."""
    at += step
    while 0 <= at < len(items) and not is_separator(items[at]):
        item = items[at]
        if item.is_number or item.kind == "chain":
            return at
        if item.has("compare") or (item.kind == "sign" and item.text in "≤≥<>"):
            return None
        at += step
    return None
