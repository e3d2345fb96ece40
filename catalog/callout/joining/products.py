"""Products: numbers that × or a stroke joins, each with the words beside it."""

from itertools import pairwise

from catalog.callout.joining.measuring import join, peek
from catalog.callout.text.items import Item

SPREADING = ("mm", "um", "in", "thou", "cm", "m", "ft", "%", "gauge", "/in", "/cm")


def is_times(item: Item | None) -> bool:
    """True for ×, which stands between the numbers of a product; 'by', 'auf', 'par' are the same."""
    return item is not None and ((item.kind == "word" and item.text in "xX") or item.has("by"))


def products(items: list[Item]) -> list[Item]:
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
        labels = _labels_at(items, end)
        times = peek(items, end + len(labels))
        if not (is_times(times) or (times and times.text == "/" and times.kind == "sign")):
            return members, joins, end
        behind = end + len(labels) + 1
        inner = _labels_at(items, behind)
        number = peek(items, behind + len(inner))
        if number is None or not number.is_number or number.bound:
            return members, joins, end
        for label in labels:
            name_number(members[-1], label)
        for label in inner:
            name_number(number, label)
        members.append(number)
        joins.append("/" if times and times.text == "/" else "x")
        end = behind + len(inner) + 1


def _labels_at(items: list[Item], at: int) -> list[Item]:
    """Up to two words that name a figure or a direction."""
    found: list[Item] = []
    while len(found) < 2 and at + len(found) < len(items):
        word = items[at + len(found)]
        if not (word.has("slot") or word.has("side")):
            break
        found.append(word)
    return found


def name_number(number: Item, label: Item) -> None:
    """Give a number the figure or the direction that a word beside it names."""
    number.slot = number.slot or label.senses.get("slot")
    number.side = number.side or label.senses.get("side")
    join(min(number, label, key=_start_of), max(number, label, key=_start_of), number)


def _start_of(item: Item) -> int:
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
    _spread_openings(members)
    return chain


def _spread_openings(members: list[Item]) -> None:
    """In '50 x 50 mm opening x 5 mm wire' the word behind the second number is the first one's too."""
    for before, member in pairwise(members):
        is_alike = before.is_count_like or before.unit == member.unit
        if member.slot in ("aperture", "pitch") and before.slot is None and is_alike:
            before.slot, before.unit = member.slot, before.unit or member.unit


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
