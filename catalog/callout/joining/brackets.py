"""Figures that are said again, in brackets or behind an equals sign."""

from catalog.callout.joining.measuring import join, peek, rewrite
from catalog.callout.text.items import Item


def brackets(items: list[Item]) -> list[Item]:
    """Figures in brackets behind a figure say it again: '.012 in (0.30 mm)', '0.4233 mm (60 per inch,
    23.62 per cm)'.
    """
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


def equations(items: list[Item]) -> list[Item]:
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
