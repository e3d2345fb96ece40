"""Numbers that name an article or an order, not the cloth."""

from catalog.callout.joining.measuring import peek, rewrite
from catalog.callout.joining.separators import is_separator
from catalog.callout.text.items import Item

CERTIFICATE_KINDS = ("2.1", "2.2", "3.1", "3.2")


def article_numbers(items: list[Item]) -> list[Item]:
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


def certificate_numbers(items: list[Item]) -> list[Item]:
    """'3.1 cert', 'cert. 3.1': the number beside such a word is a kind of certificate, no figure of the cloth."""

    def rule(items: list[Item], at: int) -> tuple[Item, int] | None:
        first, second = items[at], peek(items, at + 1)
        if _is_kind(first) and second is not None and second.has("certificate word"):
            return _certificate(first, first, second), at + 2
        if first.has("certificate word") and second is not None and second.text in (".", ":", "-"):
            third = peek(items, at + 2)
            return (_certificate(third, first, third), at + 3) if third is not None and _is_kind(third) else None
        if first.has("certificate word") and second is not None and _is_kind(second):
            return _certificate(second, first, second), at + 2
        return None

    return rewrite(items, rule)


def _is_kind(item: Item) -> bool:
    """True for 2.1, 2.2, 3.1 and 3.2, the kinds of EN 10204."""
    return (
        item.is_number and item.unit is None and bool(item.number) and item.text.replace(",", ".") in CERTIFICATE_KINDS
    )


def _certificate(number: Item, first: Item, last: Item) -> Item:
    return Item("certificate", number.text, first.start, last.end, first.glued)
