"""From characters to items: names, numbers, phrases of the trade, signs, each with its place. One pass, no way back."""

import re
from math import gcd

from catalog.callout.text.designations import DESIGNATION, code_at
from catalog.callout.text.items import Item
from catalog.callout.text.lexicon import atoms, fold, is_word, longest
from catalog.callout.text.ocr import likely_word
from catalog.units import Number, parse_number

POINTED = re.compile(r"(?<![\w.])0?\.\d")
"""A decimal point: a comma between digits then parts the items of a list,
unless decimals with a comma are there too.
"""
COMMAED = re.compile(r"(?<![\d.,])0,\d")
GROUP = re.compile(r"\d{1,3}(?:,\d{3})+(?:\.\d+)?")
SIZE_UNIT = re.compile(r"\s?(?:mm|lbs?|pcs|m|ft)\b", re.IGNORECASE)
BARE_STEEL = re.compile(r"\d\.\d{4}")
STEEL_GROUPS = re.compile(r"1\.4|2\.4|1\.0313|1\.1260|3\.70")
MEASURED = re.compile(r"\s?(?:[muc]m\b|in\b|inch|\"|thou|x\s?\d|per\b|je\b|/\s?(?:cm|in)|mesh|%|kg)", re.IGNORECASE)
INCH_PARTS = (2, 4, 8, 16, 32, 64)
NUMBER = re.compile(
    r"""(?:(?P<mixed>\d{1,2}(?:[ ]|-)\d{1,2}/(?:2|4|8|16|32|64)(?![\d.,]\d|\d))
    |(?P<vulgar>\d{1,2}/(?:2|4|8|16|32|64)(?![\d.,]\d|\d|/))
    |(?P<thirds>[12]/3(?![\d.,/]))
    |(?P<hundredths>\d{1,3}/100?(?![\d.,/]))
    |(?P<aught>\d/0(?!\d))
    |[1-9]\d{0,2}(?:,\d{3})++(?:\.\d+)?(?![\d,])
    |[1-9]\d{0,2}(?:\.\d{3})++,\d++(?![\d.])
    |\d++\.\d++(?:[eE][-+]?\d{1,3}(?!\w))?
    |\d++,\d++(?!\.\d)(?:[eE][-+]?\d{1,3}(?!\w))?
    |\d++[eE][-+]\d{1,3}(?!\w)
    |[.,]\d++(?:[eE][-+]?\d{1,3}(?!\w))?
    |\d++)""",
    re.VERBOSE,
)
FEET_INCHES = re.compile(r"(\d{1,3})\s?(?:'|ft\.?)\s?-?\s?(\d{1,2})\s?(?:\"|in\b)")
LETTERS = re.compile(r"[^\W\d_]+")


def tokenize(text: str) -> list[Item]:
    """Cut repaired *text* into items."""
    row = atoms(fold(text))
    lists = bool(POINTED.search(text)) and not COMMAED.search(text)
    items: list[Item] = []
    index = 0
    while index < len(row):
        start = row[index][1]
        item = _item_at(text, row, index, lists)
        item.glued = start > 0 and not text[start - 1].isspace()
        items.append(item)
        end = item.end
        while index < len(row) and row[index][2] <= end:
            index += 1
        if index < len(row) and row[index][1] < end:
            row[index] = (text[end : row[index][2]].lower(), end, row[index][2])
    return items


def _item_at(text: str, row: list[tuple[str, int, int]], index: int, lists: bool) -> Item:
    """What stands at one place: a name before a number, a number before a word, the longest phrase of all."""
    key, start, end = row[index]
    at_edge = start == 0 or not (text[start - 1].isalnum() or text[start - 1] == "_")
    if at_edge and (code := code_at(text, start)) and not _is_spoken(code.group()):
        return Item("code", code.group(), start, code.end())
    if at_edge and (named := DESIGNATION.match(text, start)) and not _is_measured(text, named):
        return _designation(named)
    phrase = longest(row, index)
    if phrase and key.isdecimal() and row[phrase[0] - 1][0].isalpha():
        stop = row[phrase[0] - 1][2]
        return Item("term", text[start:stop], start, stop, senses=dict(phrase[1]))
    if (key[-1:].isdecimal() or key in ".,") and (item := _number(text, start, lists)):
        return item
    if phrase:
        stop = row[phrase[0] - 1][2]
        return Item("term", text[start:stop], start, stop, senses=dict(phrase[1]))
    return _word(text, start, end)


def _designation(named: re.Match[str]) -> Item:
    kind = next(k for k in ("certificate", "date", "standard", "split", "alloy") if named.group(k))
    return Item(kind, named.group(), named.start(), named.end())


def _is_measured(text: str, named: re.Match[str]) -> bool:
    """True for a length that looks like a steel's number: 1.4375 in, 1.3081 x 1.1317 mm."""
    if not BARE_STEEL.fullmatch(named.group()):
        return False
    return bool(MEASURED.match(text, named.end())) or not STEEL_GROUPS.match(named.group())


def _is_spoken(code: str) -> bool:
    """True where a hyphenated string holds words of the trade: 'lock-crimp', '60-mesh-304'."""
    return any(len(word) > 2 and is_word(word) for word in LETTERS.findall(code))


def _number(text: str, start: int, lists: bool) -> Item | None:
    found = NUMBER.match(text, start)
    if not found or (found.group()[0] in ".," and start and not _may_lead(found.group()[0], text[start - 1])):
        return None
    if both := FEET_INCHES.match(text, start):
        return _feet(both)
    written, kind = found.group(), found.lastgroup
    if kind in ("mixed", "vulgar") and not _is_inch_part(written):
        written = re.match(r"\d+", written).group()  # type: ignore[union-attr]
    if lists and "," in written[1:] and not (GROUP.fullmatch(written) and SIZE_UNIT.match(text, found.end())):
        written = written.partition(",")[0]
    if kind == "aught":
        return Item("number", written, start, found.end(), unit="aught")
    number = parse_number(written)
    if number is None:
        return Item("word", written, start, start + len(written))
    item = Item("number", written, start, start + len(written), number=number)
    if kind == "hundredths":
        item.unit = "hundredths"
    return item


def _may_lead(point: str, before: str) -> bool:
    """A point may stand for '0.' behind a letter, a comma only behind a space or sign: ',304' in a list is 304."""
    return not before.isdecimal() and before != "." and (point == "." or not before.isalpha())


def _is_inch_part(written: str) -> bool:
    """True for the fractions of an inch: 3/16, 1-1/2; 16/18 and 2/4 are pairs of numbers."""
    top, bottom = (int(part) for part in re.split(r"[ -]", written)[-1].split("/"))
    return bottom in INCH_PARTS and top < bottom and gcd(top, bottom) == 1


def _feet(found: re.Match[str]) -> Item:
    """Feet and inches: 3' 6\" is 42 in."""
    inches = int(found[1]) * 12 + int(found[2])
    number = parse_number(str(inches))
    assert isinstance(number, Number)
    return Item("number", found.group(), found.start(), found.end(), number=number, unit="in")


def _word(text: str, start: int, end: int) -> Item:
    """A word that isn't in the vocabulary, unless one slip of a scanner explains it."""
    damaged = re.match(r"[^\W_]+", text[start : start + 24])
    whole = damaged.group() if damaged else text[start:end]
    for seen in dict.fromkeys((whole, text[start:end])):
        if len(seen) > 2 and seen[0].isalpha() and (meant := likely_word(fold(seen), is_word)):
            found = longest(atoms(meant), 0)
            assert found
            return Item("term", seen, start, start + len(seen), senses=found[1] | {"mended": meant})
    if text[end - 1] in "xX" and text[end : end + 2].strip(".")[:1].isdecimal() and is_word(text[start : end - 1]):
        found = longest(atoms(fold(text[start : end - 1])), 0)
        assert found
        return Item("term", text[start : end - 1], start, end - 1, senses=dict(found[1]))
    if LETTERS.fullmatch(text[start:end]):
        return Item("word", text[start:end], start, end)
    return Item("sign", text[start:end], start, end)
