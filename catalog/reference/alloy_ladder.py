"""The ladder: whether one alloy may stand in for another. The rows are data, to be edited to taste."""

from collections.abc import Iterator
from dataclasses import dataclass
from functools import cache

from catalog.reference.alloy_rows import Alloy, alloy
from catalog.reference.rows import rows_of

OUTCOMES = ("same", "accepted", "ask", "blocked")
ANY = "*"
SAME_FAMILY = "same family"


@dataclass(frozen=True, slots=True)
class Gate:
    """Whether one alloy may stand in for another, and why."""

    outcome: str
    """'same', 'accepted', 'ask' or 'blocked'."""
    note: str
    """The reason, in words that stand by themselves."""
    source: str


@cache
def _ladder() -> dict[tuple[str, str], Gate]:
    return {
        (row["asked"], row["offered"]): Gate(row["outcome"], row["note"], row["source"])
        for row in rows_of("alloy_ladder")
    }


def gate(asked: str, offered: str) -> Gate:
    """Whether the alloy *offered* may stand in for the one *asked*, both by id.

    The first row of the ladder that holds, from the narrow to the wide: the pair, one id with the other's family,
    one id with '*', the two families, a family with '*', 'same family', '* *'. An alloy that the table doesn't
    have is 'ask', unless both are spelled alike.
    """
    if asked == offered:
        return Gate("same", "the alloy that was asked", "alloy table")
    one, other = alloy(asked), alloy(offered)
    if one is None or other is None:
        return Gate("ask", f"{asked if one is None else offered} is not in the alloy table", "alloy table")
    found = next((row for pair in _pairs(one, other) if (row := _ladder().get(pair))), None)
    if found is None:
        return Gate("ask", "the ladder has no rule for this pair", "house rule")
    return Gate(found.outcome, _whole(found.note, one, other), found.source)


def _pairs(asked: Alloy, offered: Alloy) -> Iterator[tuple[str, str]]:
    asked_family, offered_family = f"family {asked.family}", f"family {offered.family}"
    yield (asked.id, offered.id)
    yield (asked.id, offered_family)
    yield (asked_family, offered.id)
    yield (asked.id, ANY)
    yield (ANY, offered.id)
    yield (asked_family, offered_family)
    yield (asked_family, ANY)
    yield (ANY, offered_family)
    if asked.family == offered.family:
        yield (ANY, SAME_FAMILY)
    yield (ANY, ANY)


def _whole(note: str, asked: Alloy, offered: Alloy) -> str:
    """The note with the families filled in where it names them."""
    return note.replace("{asked}", asked.family).replace("{offered}", offered.family)
