"""How measured numbers hang together: tolerances, ranges, products, brackets. Each rule returns the items, joined."""

from catalog.callout.items import Item
from catalog.callout.measures import join, peek, rewrite

SEPARATORS = frozenset(",;|_()[]{}\n")
SPREADING = ("mm", "um", "in", "thou", "cm", "m", "ft", "%", "gauge", "/in", "/cm")


def structured(items: list[Item]) -> list[Item]:
    """Apply the rules of structure in order."""
    for rule in (_article_numbers, _signed_numbers, _tolerances, _ranges, _products, _brackets, _equations):
        items = rule(items)
    return items


def _article_numbers(items: list[Item]) -> list[Item]:
    """What stands behind 'P/N', 'art. no.' or 'item' names an article: 'P/N 44-1027', 'item 000123'."""

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        if not items[at].has("part number"):
            return None
        first = at + 1
        while (sign := peek(items, first)) and (sign.text in ".:#-" or sign.has("number sign")):
            first += 1
        if not (head := peek(items, first)) or not _is_article(head, items[at].text):
            return None
        end = first + 1
        while end < len(items) and items[end].glued and not is_separator(items[end]):
            end += 1
        return Item("code", head.text, items[at].start, items[end - 1].end, items[at].glued, taken="code"), end

    return rewrite(items, rule)


def _is_article(head: Item, word: str) -> bool:
    """True for a bare number or code; behind weak words ('item', 'pos') only for one that is no count."""
    if head.kind == "code":
        return True
    number = head.number if head.is_number and head.unit in (None, "designation") else None
    if number is None or not number.is_integer:
        return head.kind == "word" and len(word) > 4
    long = len(number.written) >= 5 or number.written[0] == "0"
    return long or word.lower() not in ("item", "pos", "line", "code", "ref", "part", "po")


def is_separator(item: Item | None) -> bool:
    """True for what ends a clause: a comma, a bracket, a hyphen that stands free."""
    return item is None or (item.kind == "sign" and (item.text in SEPARATORS or (item.text == "-" and not item.glued)))


def is_times(item: Item | None) -> bool:
    """True for ×, which stands between the numbers of a product; 'by', 'auf', 'par' are the same."""
    return item is not None and ((item.kind == "word" and item.text in "xX") or item.has("by"))


def _signed_numbers(items: list[Item]) -> list[Item]:
    """A sign glued before a number and free on its left: '-40+60' says what passes and what is held."""

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        sign, number, before = items[at], peek(items, at + 1), peek(items, at - 1)
        if sign.text not in "+-" or not number or not number.is_number or not number.glued:
            return None
        earlier = peek(items, at - 2) if before is not None and before.text == "/" else before
        follows = earlier is not None and earlier.is_number and earlier.bound in ("passing", "held")
        if (sign.glued and not follows) or (before and before.text == "±"):
            return None
        number.bound = "passing" if sign.text == "-" else "held"
        return join(sign, number, number), at + 2

    return rewrite(items, rule)


def _tolerances(items: list[Item]) -> list[Item]:
    """'0.25 mm ±5%', '.0075 ±.0003', '0.25 +0.02/-0.01 mm': what a figure may be off by; a unit behind serves both."""

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        number, sign, off = items[at], peek(items, at + 1), peek(items, at + 2)
        if not number.is_number or not sign:
            return None
        if sign.text == "±" and off and off.is_number:
            return _tolerance(number, off, off), at + 3
        behind = peek(items, at + 3)
        if sign.has("slot") and off and off.text == "±" and behind and behind.is_number:
            _label(number, sign)
            return _tolerance(number, behind, behind), at + 4
        skip = 3 if off and off.text == "/" else 2
        minus = peek(items, at + skip)
        if sign.is_number and sign.bound == "held" and minus and minus.is_number and minus.bound == "passing":
            return _tolerance(number, sign, minus), at + skip + 1
        return None

    return rewrite(items, rule)


def _tolerance(number: Item, plus: Item, minus: Item) -> Item:
    unit = minus.unit or plus.unit
    if number.unit is None and unit != "%":
        number.unit = unit
    for off in (plus, minus):
        off.unit, off.bound = off.unit or unit, None
    number.tolerance = (plus, minus)
    return join(number, minus, number)


def _ranges(items: list[Item]) -> list[Item]:
    """'40-60 mesh', '0.1 to 0.2 mm', '0.5..0.8 mm', 'between 0.5 and 0.8 mm': from the lower to the higher figure."""

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        if items[at].has("between") and _joined(peek(items, at + 2), ("and", "und", "et", "y", "e", "-", "to", "bis")):
            return _range(items, at, peek(items, at + 1), peek(items, at + 3), at + 4)
        low, middle = items[at], peek(items, at + 1)
        if not low.is_number or middle is None or is_times(peek(items, at - 1)):
            return None
        if middle.text == "." and peek(items, at + 2) and items[at + 2].text == ".":
            return _range(items, at, low, peek(items, at + 3), at + 4)
        if (
            middle.has("range")
            or middle.text == "…"
            or (middle.text == "-" and (middle.glued or _labelled(items, at + 3)))
        ):
            return _range(items, at, low, peek(items, at + 2), at + 3)
        return None

    return rewrite(items, rule)


def _joined(item: Item | None, words: tuple[str, ...]) -> bool:
    return item is not None and item.text.lower() in words


def _labelled(items: list[Item], at: int) -> bool:
    item = peek(items, at)
    return item is not None and item.has("slot")


def _range(items: list[Item], at: int, low: Item | None, high: Item | None, end: int) -> tuple[Item, int] | None:
    if not (low and high and low.is_number and high.is_number and low.number and high.number):
        return None
    if low.unit not in (None, high.unit) or high.bound or high.unit in ("pieces", "designation"):
        return None
    low.unit, low.system = high.unit, high.system
    if not low.number.value < high.number.value or is_times(peek(items, end)):
        return None
    low.upto = high
    return join(items[at], high, low), end


def _products(items: list[Item]) -> list[Item]:
    """'60 x 60 x .0075', '0.25/0.16', '3 mesh x 10 mesh', '30 by 30': numbers with × or a stroke between.

    A label may stand behind each number, or between × and the number.
    """
    out: list[Item] = []
    at = 0
    while at < len(items):
        if not items[at].is_number:
            out.append(items[at])
            at += 1
            continue
        members, joins, end = _members(items, at)
        if joins == ["/"] and _is_said_twice(*members):
            members[0].restated.append(members[1])
            out.append(join(members[0], members[1], members[0]))
        else:
            out.append(_chain(members, joins) if joins else items[at])
        at = end if joins else at + 1
    return out


def _is_said_twice(one: Item, other: Item) -> bool:
    """'.0075\"/0.19 mm' is one length in two units."""
    if not (one.is_length and other.is_length) or (one.unit in ("in", "thou")) == (other.unit in ("in", "thou")):
        return False
    first, second = one.length().mm, other.length().mm
    return first > 0 and 94 * first < 100 * second < 106 * first


def _members(items: list[Item], at: int) -> tuple[list[Item], list[str], int]:
    members, end = [items[at]], at + 1
    joins: list[str] = []
    while True:
        labels = _labels(items, end)
        times = peek(items, end + len(labels))
        if not (is_times(times) or (times and times.text == "/" and times.kind == "sign")):
            return members, joins, end
        behind = end + len(labels) + 1
        inner = _labels(items, behind)
        number = peek(items, behind + len(inner))
        if number is None or not number.is_number or number.bound:
            return members, joins, end
        for label in labels:
            _label(members[-1], label)
        for label in inner:
            _label(number, label)
        members.append(number)
        joins.append("/" if times and times.text == "/" else "x")
        end = behind + len(inner) + 1


def _labels(items: list[Item], at: int) -> list[Item]:
    """Up to two words that name a figure or a direction."""
    found: list[Item] = []
    while len(found) < 2 and at + len(found) < len(items):
        word = items[at + len(found)]
        if not (word.has("slot") or word.has("side")):
            break
        found.append(word)
    return found


def _label(number: Item, label: Item) -> None:
    number.slot = number.slot or label.senses.get("slot")
    number.side = number.side or label.senses.get("side")
    join(min(number, label, key=_start), max(number, label, key=_start), number)


def _start(item: Item) -> int:
    return item.start


def _chain(members: list[Item], joins: list[str]) -> Item:
    chain = Item("chain", "", members[0].start, members[-1].end, members[0].glued, members=members, joins=joins)
    last = members[-1]
    for member in reversed(members[:-1]):
        if member.unit is not None or last.unit not in SPREADING or member.slot:
            break
        if last.unit in ("gauge", "m", "ft", "/in", "/cm", "%") or not member.is_count_like:
            if last.unit == "gauge" and not _is_pair_of_gauges(members, member):
                break
            member.unit, member.system = last.unit, last.system
    _spread_right(members)
    return chain


def _is_pair_of_gauges(members: list[Item], member: Item) -> bool:
    """'16/18 ga' are two gauges; in '10 x 10 x 24g' only the last number is one."""
    return (
        len(members) == 2 and member is members[0] and abs(member.start - members[1].start) < 5 and member.is_count_like
    )


def _spread_right(members: list[Item]) -> None:
    """In '20 mm x 4' and '1/4\" x .047' the unit of the first serves the others, where they are lengths."""
    first = members[0]
    if first.is_length and first.unit in ("mm", "um", "in") and all(m.unit is None for m in members[1:]):
        for member in members[1:]:
            if member.slot in (None, "wire", "aperture", "pitch"):
                member.unit = first.unit


def _brackets(items: list[Item]) -> list[Item]:
    """Figures in brackets behind a figure say it again: '.012 in (0.30 mm)', '0.4233 mm (60 per inch, 23.62 per cm)'."""
    out: list[Item] = []
    at = 0
    while at < len(items):
        said, end = _bracketed(items, at)
        if said and out and _restate(out[-1], said):
            out[-1].end = items[end - 1].end
            at = end
        else:
            out.append(items[at])
            at += 1
    return out


def _bracketed(items: list[Item], at: int) -> tuple[list[Item], int]:
    """The figures between brackets, where there is nothing else between them."""
    if items[at].text not in ("(", "["):
        return [], at
    said, end = [], at + 1
    while end < len(items) and (_is_figure(items[end]) or items[end].text in (",", "/", "=", "~")):
        if _is_figure(items[end]):
            said.append(items[end])
        end += 1
    closed = end < len(items) and items[end].text in (")", "]")
    return (said, end + 1) if closed else ([], at)


def _is_figure(item: Item) -> bool:
    return item.is_number or item.kind == "chain"


def _restate(holder: Item, said: list[Item]) -> bool:
    """Hang figures on the ones that they say again; a product on a product number for number."""
    if not _is_figure(holder) or any(m.slot for item in said for m in item.members or [item]):
        return False
    rows = [item.members or [item] for item in said]
    members = holder.members or [holder]
    if any(len(row) not in (1, len(members)) for row in rows):
        return False
    last = members[-1]
    for row in rows:
        for number, again in zip(members, row, strict=False) if len(row) > 1 else ((last, row[0]),):
            number.restated.append(again)
    last.end = max(last.end, said[-1].end)
    return True


def _equations(items: list[Item]) -> list[Item]:
    """'.0075 in = 0.19 mm' says one length twice, in two units."""

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        first, sign, other = items[at], peek(items, at + 1), peek(items, at + 2)
        if not (first.is_number and sign and sign.text in "=~" and other and other.is_number):
            return None
        if not (first.is_length and other.is_length and first.unit != other.unit):
            return None
        first.restated.append(other)
        return join(first, other, first), at + 3

    return rewrite(items, rule)
