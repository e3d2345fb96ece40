"""Rules for the metal: alloys, families, and what contradicts itself."""

from catalog.callout.rules.draft import Draft
from catalog.callout.rules.metal_numbers import bare_numbers, brass_splits
from catalog.callout.rules.zinc import family_of, zinc
from catalog.callout.text.designations import alloy_id
from catalog.callout.text.items import Item
from catalog.callout.vocabulary.materials import CLOSED, OPEN_GRADES
from catalog.reference import alloys

DUAL = ({"304", "304L"}, {"316", "316L"})


def metals(draft: Draft) -> None:
    """Find the alloy. One is stated, several contradict each other, a family alone leaves a question."""
    named = [(alloy_id(item.text), item) for item in draft.kinds("alloy")]
    named += brass_splits(draft) + bare_numbers(draft)
    families = [(item.senses["material"], item) for item in draft.terms("material")]
    for _, item in (*named, *families):
        item.taken = "alloy"
    ids = list(dict.fromkeys(name for name, _ in named))
    if len(ids) > 1:
        _several(draft, ids, named)
    elif ids:
        draft.alloy = ids[0]
        _agree(draft, ids[0], families)
        if alloys.alloy(ids[0]) is None:
            draft.note(f"{ids[0]} isn't in the alloy table; taken as written")
    elif families:
        _family_only(draft, families)
    zinc(draft, families)


def _several(draft: Draft, ids: list[str], named: list[tuple[str, Item]]) -> None:
    """Two alloys contradict each other; 316/316L is one wire certified for both."""
    if set(ids) in DUAL:
        draft.alloy = max(ids, key=len)
        draft.note(f"{'/'.join(ids)}: wire certified for both; {draft.alloy} meets either")
        return
    item = next(item for name, item in named if name == ids[1])
    draft.problem("E_MATERIAL", f"The text names {' and '.join(ids)}: which alloy is asked for?", item)


def _agree(draft: Draft, name: str, families: list[tuple[str, Item]]) -> None:
    own = family_of(name)
    known = alloys.alloy(name)
    for family, item in families:
        fits = (
            family == own
            or (family == "CS" and own in ("stainless", "HCS", "duplex"))
            or {family, own} <= {"bronze", "phosphor bronze", "brass"}
        )
        fits = (
            fits
            or (family == "stainless" and own == "duplex")
            or (family in ("nickel", "nickel-copper", "copper") and known is not None and "nickel" in known.family)
        )
        if not fits and known is not None:
            draft.problem("E_MATERIAL", f"'{item.text}' and {name} are two metals: one of the two is wrong.", item)


def _family_only(draft: Draft, families: list[tuple[str, Item]]) -> None:
    """A family's name: steel and copper are one row of the table, brass and stainless are several."""
    names = list(dict.fromkeys(family for family, _ in families))
    if len(names) > 1:
        names = [n for n in names if n != "CS" or not {"stainless", "HCS"} & set(names)]
        names = [n for n in names if n != "bronze" or "phosphor bronze" not in names]
        names = [n for n in names if n != "stainless" or "duplex" not in names]
    if len(names) > 1:
        words = " and ".join(f"'{item.text}'" for _, item in families)
        draft.problem("E_MATERIAL", f"The text names {words}: one of the two is wrong.", families[1][1])
    elif names[0] in CLOSED:
        draft.alloy = CLOSED[names[0]]
        if draft.alloy == "Cu-ETP" or draft.alloy == "CS":
            draft.note(f"'{families[0][1].text}' taken as {draft.alloy}")
    else:
        draft.material = names[0]
        draft.missing.append("material grade")
        draft.questions.append(OPEN_GRADES[names[0]])
        draft.note(f"{names[0]}: the grade isn't said")
