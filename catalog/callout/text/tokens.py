"""From characters to items: names, numbers, phrases of the trade, signs, each with its place. One pass, no way back."""

import re
from dataclasses import dataclass

from catalog.callout.text.designations import DESIGNATION, capitals, code_at
from catalog.callout.text.items import Item
from catalog.callout.text.lexicon import atoms, fold, is_word, longest
from catalog.callout.text.numerals import numeral
from catalog.callout.text.ocr import likely_word

POINTED = re.compile(r"(?<![\w.])0?\.\d")
"""A decimal point: a comma between digits then parts the items of a list,
unless decimals with a comma are there too.
"""
PARTED = re.compile(r"[^\W\d],[^\W_]|,\.\d")
COMMAED = re.compile(r"(?<![\d.,])0,\d")
BARE_STEEL = re.compile(r"\d\.\d{4}")
STEEL_GROUPS = re.compile(r"1\.4|2\.4|1\.0313|1\.1260|3\.70")
MEASURED = re.compile(r"\s?(?:[muc]m\b|in\b|inch|\"|thou|x\s?\d|per\b|je\b|/\s?(?:cm|in)|mesh|%|kg)", re.IGNORECASE)
LETTERS = re.compile(r"[^\W\d_]+")


def is_list(text: str) -> bool:
    """True where commas part items without a space, and decimals have points: 'SST,304,40X40,.010'."""
    return bool(POINTED.search(text) and PARTED.search(text)) and not COMMAED.search(text)


@dataclass(frozen=True, slots=True)
class Line:
    """A text on its way through the scanner."""

    text: str
    upper: str
    """The same in capitals, letter for letter."""
    row: list[tuple[str, int, int]]
    """Its words, runs of digits and signs."""
    has_lists: bool
    """True where a comma between digits parts items, since decimals have points."""


def tokenize(text: str) -> list[Item]:
    """Cut repaired *text* into items."""
    row = atoms(fold(text))
    line = Line(text, capitals(text), row, is_list(text))
    items: list[Item] = []
    index = 0
    while index < len(row):
        start = row[index][1]
        item = _item_at(line, index)
        item.glued = start > 0 and not text[start - 1].isspace()
        items.append(item)
        end = item.end
        while index < len(row) and row[index][2] <= end:
            index += 1
        if index < len(row) and row[index][1] < end:
            row[index] = (text[end : row[index][2]].lower(), end, row[index][2])
    return items


def _item_at(line: Line, index: int) -> Item:
    """What stands at one place: a name before a number, a number before a word, the longest phrase of all."""
    key, start, end = line.row[index]
    if (start == 0 or not (line.text[start - 1].isalnum() or line.text[start - 1] == "_")) and (
        name := _name(line, start)
    ):
        return name
    phrase = longest(line.row, index)
    if phrase and key.isdecimal() and line.row[phrase[0] - 1][0].isalpha():
        return _term(line, start, phrase)
    if (key[-1:].isdecimal() or key in ".,") and (item := numeral(line.text, start, line.has_lists)):
        return item
    return _term(line, start, phrase) if phrase else _word(line.text, start, end)


def _term(line: Line, start: int, phrase: tuple[int, dict[str, str]]) -> Item:
    stop = line.row[phrase[0] - 1][2]
    return Item("term", line.text[start:stop], start, stop, senses=dict(phrase[1]))


def _name(line: Line, start: int) -> Item | None:
    """A part number or a designation that begins here."""
    code = code_at(line.upper, start)
    if code and not _is_spoken(code.group()):
        return Item("code", line.text[start : code.end()], start, code.end())
    named = DESIGNATION.match(line.upper, start)
    if not named or _is_measured(line.text, named):
        return None
    kind = next(k for k in ("certificate", "date", "standard", "split", "alloy") if named.group(k))
    return Item(kind, line.text[start : named.end()], start, named.end())


def _is_measured(text: str, named: re.Match[str]) -> bool:
    """True for a length that looks like a steel's number: 1.4375 in, 1.3081 x 1.1317 mm."""
    if not BARE_STEEL.fullmatch(named.group()):
        return False
    return bool(MEASURED.match(text, named.end())) or not STEEL_GROUPS.match(named.group())


def _is_spoken(code: str) -> bool:
    """True where a hyphenated string holds words of the trade: 'lock-crimp', '60-mesh-304'."""
    return any(len(word) > 2 and is_word(word) for word in LETTERS.findall(code))


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
