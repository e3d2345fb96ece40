"""A second cloth that the text accepts."""

from collections.abc import Sequence
from dataclasses import replace

from catalog.callout.reading import Likelihood, Problem, Reading, Status, Understanding
from catalog.callout.text.items import Item


def alternatives(items: list[Item]) -> list[list[Item]]:
    """'… / alt. 40 mesh .0095': a second cloth, where both sides hold the figures of one."""
    for at, item in enumerate(items):
        if item.has("equal"):
            item.taken = "kind of goods"
        elif item.has("alternative") and _has_cloth(items[:at]) and _has_cloth(items[at:]):
            item.taken = "alternative"
            return [items[: at + 1], items[at + 1 :]]
    return [items]


def _has_cloth(items: Sequence[Item]) -> bool:
    numbers = [n for i in items for n in (i.members if i.kind == "chain" else [i] if i.is_number else [])]
    named = any(
        n.slot in ("mesh", "count", "aperture", "pitch") or n.unit in ("mesh sign", "/in", "/cm", "M") for n in numbers
    )
    return named or any(i.kind == "chain" for i in items)


def with_alternative(first: Understanding, other: Understanding) -> Understanding:
    """The first choice, and the alternative that the text accepts;
    what the alternative leaves out is as in the first.
    """
    mains = [r for r in first.readings if r.likelihood is not Likelihood.RULED_OUT]
    extra = [_inherit(mains[0], r) for r in other.surviving[:1]] if mains else []
    mains = (
        [replace(r, alloy=r.alloy or extra[0].alloy, weave=r.weave or extra[0].weave) for r in mains]
        if extra
        else mains
    )
    asks = (
        Status.ASK in (first.status, other.status)
        or not extra
        or other.status in (Status.OUT_OF_SCOPE, Status.INCOMPLETE)
    )
    status = Status.ASK if asks else Status.NOTED if first.status is Status.CLEAR else first.status
    problems = first.problems + tuple(p for p in other.problems if p not in first.problems)
    if not extra and not problems:
        problems = (Problem("E_NOT_UNDERSTOOD", "The alternative isn't understood.", None),)
    words = tuple(sorted((*first.words, *other.words), key=lambda w: w.start))
    asked = first.question or other.question
    if status is Status.ASK and asked is None and not problems:
        asked = f"What is left open of the cloth or of its alternative: {', '.join(other.missing or first.missing)}?"
    readings = (*mains, *extra, *(r for r in first.readings if r.likelihood is Likelihood.RULED_OUT))
    return replace(
        first,
        status=status,
        readings=readings,
        problems=problems,
        words=words,
        question=asked,
    )


def _inherit(main: Reading, other: Reading) -> Reading:
    filled = {
        key: getattr(main, key)
        for key in ("weave", "alloy", "finish", "crimp", "certificate", "form")
        if getattr(other, key) is None
    }
    return replace(other, label=f"stated alternative: {other.label}", likelihood=Likelihood.USUAL, **filled)
