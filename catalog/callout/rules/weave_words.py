"""Rules for the weave: plain, twilled, the Dutch weaves, and those that are known by name only."""

from catalog.callout.rules.draft import Draft
from catalog.callout.text.items import Item
from catalog.construction import Weave


def weaves(draft: Draft) -> None:
    """Plain, twilled and the Dutch weaves; 'reverse twilled' and the like are known by name and not computed."""
    found: dict[str, Item] = {}
    for item in draft.terms("weave"):
        item.taken = "weave"
        found.setdefault(item.senses["weave"], item)
    for item in draft.terms("filter"):
        item.taken = "kind of goods"
        draft.is_dutch = draft.is_dutch or not _looks_square(draft)
    if any("dutch" in name for name in found):
        draft.is_dutch = True
    if "dutch" in found and len(found) == 2:
        found = _combined(draft, found)
    known = [name for name in found if name in set(Weave)]
    if len(known) == 1 and len(found) == 1:
        draft.weave = Weave(known[0])
    elif found and not (len(found) == 1 and "dutch" in found):
        _odd_weave(draft, found, known)
    draft.weave_words = ", ".join(item.text for item in found.values())


def _looks_square(draft: Draft) -> bool:
    """True where a filter's cloth has an opening, or one count: then it is square cloth, whatever it is used for."""
    numbers = draft.all_numbers()
    if any(n.slot in ("aperture", "pitch") for n in numbers):
        return True
    chains = [i for i in draft.items if i.kind == "chain" and all(m.is_count_like for m in i.members[:2])]
    if chains:
        return all(c.members[0].number and c.members[0].number == c.members[1].number for c in chains)
    return any(n.slot in ("mesh", "count") and not n.is_length for n in numbers)


def _combined(draft: Draft, found: dict[str, Item]) -> dict[str, Item]:
    """'Dutch' and 'twilled' apart in a text are one weave: twilled Dutch."""
    other = next(name for name in found if name != "dutch")
    if other in ("plain", "twilled"):
        return {f"{other}-dutch": found[other]}
    return {name: item for name, item in found.items() if name != "dutch"}


def _odd_weave(draft: Draft, found: dict[str, Item], known: list[str]) -> None:
    first = next(iter(found.values()))
    if len(known) > 1:
        names = " and ".join(f"'{item.text}'" for item in found.values())
        draft.problem("E_INCONSISTENT", f"The text names two weaves, {names}: which is it?", first)
        return
    odd = next(name for name in found if name not in known)
    draft.note(f"{found[odd].text}: known by name, outside what is computed")
    draft.missing.append("weave not computed")
    draft.problem(
        "E_NOT_UNDERSTOOD",
        f"'{found[odd].text}' is a weave that isn't computed here: only its counts and wires are read.",
        found[odd],
    )
