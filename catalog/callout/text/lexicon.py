"""Looks words up: the longest phrase of the trade that stands at a place, with everything it may mean."""

import re
import unicodedata
from dataclasses import dataclass, field
from functools import cache

from catalog.callout.vocabulary import cloth, figures, materials, trade

ATOM = re.compile(r"[^\W\d_]+|\d+|\S")

TABLES: tuple[tuple[str, dict[str, str]], ...] = (
    ("slot", figures.SLOTS), ("side", figures.SIDES), ("unit", figures.UNITS), ("gauge", figures.GAUGES),
    ("weave", cloth.WEAVES), ("crimp", cloth.CRIMPS), ("finish", cloth.FINISHES), ("galvanised", cloth.GALVANISED),
    ("grade", cloth.GRADES), ("not woven", trade.NOT_WOVEN), ("form", trade.FORMS), ("compare", trade.COMPARISONS),
    ("purpose", trade.PURPOSES), ("rating", trade.RATINGS), ("material", materials.MATERIALS),
)  # fmt: skip
LISTS: tuple[tuple[str, str], ...] = (
    ("filter", cloth.FILTERS), ("product", cloth.PRODUCTS), ("hardware", cloth.HARDWARE_CLOTH), ("sieve", cloth.SIEVES),
    ("number sign", cloth.NUMBER_SIGNS), ("not metal", trade.NOT_METAL), ("reference", trade.REFERENCES),
    ("alternative", trade.ALTERNATIVES), ("equal", trade.EQUALS), ("certificate word", trade.CERTIFICATES),
    ("band", trade.BAND), ("range", trade.RANGES), ("between", trade.BETWEEN), ("by", trade.BY),
    ("tolerance word", trade.TOLERANCE), ("negation", trade.NEGATIONS), ("harmless", trade.HARMLESS),
    ("part number", trade.PART_NUMBERS), ("delivery", trade.DELIVERIES),
)  # fmt: skip


@dataclass(slots=True)
class Node:
    """One step of a phrase."""

    onward: dict[str, "Node"] = field(default_factory=dict)
    senses: dict[str, str] = field(default_factory=dict)


@cache
def _folded_char(char: str) -> str:
    """One character without case and accents; always one character."""
    plain = unicodedata.normalize("NFD", char)[0] if char not in "йЙ" else char
    low = plain.lower()
    return low if len(low) == 1 else char


def fold(text: str) -> str:
    """*text* in lower case without accents, character for character."""
    return text.lower() if text.isascii() else "".join(map(_folded_char, text))


def atoms(folded: str) -> list[tuple[str, int, int]]:
    """Words, runs of digits and signs: (key, start, end). Digits glued to a word before them are marked."""
    found: list[tuple[str, int, int]] = []
    for match in ATOM.finditer(folded):
        key, start = match.group(), match.start()
        if key.isdecimal() and found and found[-1][2] == start and found[-1][0][-1:].isalpha():
            key = "~" + key
        found.append((key, start, match.end()))
    return found


@cache
def _by_initial() -> dict[str, list[tuple[str, str, str]]]:
    """(phrase, role, value) by first character: a text needs but few of them, so the rest is never taken apart."""
    found: dict[str, list[tuple[str, str, str]]] = {}
    rows = [(role, value, phrases) for role, table in TABLES for value, phrases in table.items()]
    for role, value, phrases in (*rows, *((role, "", phrases) for role, phrases in LISTS)):
        for phrase in phrases.split(","):
            if bare := phrase.strip():
                found.setdefault(fold(bare[0]), []).append((bare, role, value))
    return found


@cache
def _root(initial: str) -> Node:
    """The phrases that begin with a character, as a tree of their words."""
    root = Node()
    for phrase, role, value in _by_initial().get(initial, ()):
        node = root
        for key, _, _ in atoms(fold(phrase)):
            if key not in ".-":
                node = node.onward.setdefault(key, Node())
        node.senses.setdefault(role, value)
    return root


def is_word(word: str) -> bool:
    """True where *word* alone is in the vocabulary."""
    key = fold(word)
    node = _root(key[:1]).onward.get(key)
    return node is not None and bool(node.senses)


def longest(row: list[tuple[str, int, int]], at: int) -> tuple[int, dict[str, str]] | None:
    """The longest phrase from atom *at* on: (the atom behind it, role → value); None where there is none.

    A point behind a word and a hyphen between two words are passed over: 'ph. bronze', 'hi-carbon', 'o.c.'
    """
    node, best, index = _root(row[at][0][0]), None, at
    while index < len(row) and (step := node.onward.get(row[index][0])):
        node, index = step, index + 1
        if node.senses:
            best = (index, node.senses)
        index = _past_joint(row, index)
    return best


def _past_joint(row: list[tuple[str, int, int]], index: int) -> int:
    """Behind the points and hyphens that are glued to the word before: 'Art.-Nr.', 'hi-carbon'."""
    while _is_joint(row, index):
        index += 1
    return index


def _is_joint(row: list[tuple[str, int, int]], index: int) -> bool:
    if not 0 < index < len(row) or row[index][0] not in ".-" or row[index][1] != row[index - 1][2]:
        return False
    if row[index][0] == ".":
        return row[index - 1][0][-1].isalpha()
    after = row[index + 1] if index + 1 < len(row) else ("", -1, -1)
    return (
        (row[index - 1][0][-1].isalpha() or row[index - 1][0] == ".")
        and after[1] == row[index][2]
        and after[0][0].isalpha()
    )
