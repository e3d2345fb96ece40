"""Rules for the metal: numbers and names of alloys, families, zinc; what contradicts itself is asked."""

from catalog.callout.designations import alloy_id
from catalog.callout.draft import Draft
from catalog.callout.items import Item
from catalog.callout.measures import peek
from catalog.callout.vocabulary.materials import BARE_NUMBERS, BRASS_SPLITS, CLOSED, FAMILIES, OPEN_GRADES
from catalog.reference import alloys

DUAL = ({"304", "304L"}, {"316", "316L"})
STEELS = ("CS", "stainless")


def metals(draft: Draft) -> None:
    """Find the alloy. One is stated, several contradict each other, a family alone leaves a question."""
    named = [(alloy_id(item.text), item) for item in draft.kinds("alloy")]
    named += _brass_splits(draft) + _bare_numbers(draft)
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
    _zinc(draft, families)


def family_of(name: str) -> str:
    """The family whose bare name agrees with an alloy's id."""
    return next((family for start, family in FAMILIES.items() if name.startswith(start)), "stainless")


def _family(name: str) -> str:
    """The family of an alloy's id; a family's name stays."""
    return name if name in OPEN_GRADES or name in CLOSED else family_of(name)


def _brass_splits(draft: Draft) -> list[tuple[str, Item]]:
    """'80/20' beside brass is copper and zinc: CuZn20; without brass it is two numbers."""
    found = []
    has_brass = any(i.senses.get("material") in ("brass", "bronze") for i in draft.terms("material"))
    for item in draft.kinds("split"):
        copper, zinc = (int(part) for part in item.text.replace(" ", "").split("/"))
        name = BRASS_SPLITS.get((copper, zinc))
        if name and has_brass:
            found.append((name, item))
    return found


def _bare_numbers(draft: Draft) -> list[tuple[str, Item]]:
    """304, 316 … alone are steels where something else is the count; '316 mesh 100' is 100 mesh of 316."""
    found = []
    for item in list(draft.items):
        if item.taken or not item.is_number or not item.number or item.unit is not None or item.bound or item.tolerance:
            continue
        if not item.number.is_integer or item.number.value not in BARE_NUMBERS or item.slot not in (None, "mesh"):
            continue
        if item.slot == "mesh" and not _yields_the_count(draft, item):
            continue
        if item.slot is None and not (_other_count(draft, item) or _beside_steel(draft, item)):
            continue
        found.append((item.number.written, item))
    for chain in draft.kinds("chain"):
        if (
            all(
                m.is_count_like and m.slot is None and m.number and m.number.value in BARE_NUMBERS
                for m in chain.members
            )
            and chain.joins[0] == "/"
        ):
            found += [(m.number.written, m) for m in chain.members if m.number]
    return found


def _yields_the_count(draft: Draft, item: Item) -> bool:
    """True where the word mesh behind 316 belongs to another number, which then is the count."""
    at = item.at
    after = [i for i in draft.items[at + 1 : at + 3] if i.is_count_like and i.slot is None]
    if after and after[0].number and after[0].number.value not in BARE_NUMBERS:
        after[0].slot = "mesh"
        return True
    return any(_is_count(i) for i in draft.all_numbers() if i is not item)


def _is_count(item: Item) -> bool:
    return item.slot in ("mesh", "count") or item.unit in ("mesh sign", "/in", "/cm", "M", "designation", "per length")


def _other_count(draft: Draft, item: Item) -> bool:
    """True where another number is, or can be, the count or the opening."""
    others = [n for n in draft.all_numbers() if n is not item and n.unit != "pieces"]
    return len(others) > 1 or any(n.slot or n.unit or n.is_count_like for n in others)


def _beside_steel(draft: Draft, item: Item) -> bool:
    at = item.at
    around = (peek(draft.items, at - 1), peek(draft.items, at + 1))
    return any(i is not None and i.senses.get("material") in STEELS for i in around)


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


def _zinc(draft: Draft, families: list[tuple[str, Item]]) -> None:
    """Galvanised cloth is of plain or spring steel; stainless and brass aren't galvanised."""
    if not any(f.startswith("galvanised") for f in draft.finish):
        if draft.is_hardware and draft.alloy is None and not families:
            draft.alloy = "GALV"
            draft.note("hardware cloth taken as galvanised steel; much of it is welded: say that it is woven")
        return
    if draft.alloy in ("HCS", "65Mn"):
        return
    other = (
        draft.alloy
        if draft.alloy not in (None, "CS", "GALV")
        else next((f for f, _ in families if f not in ("CS", "HCS")), None)
    )
    if other:
        word = next(i for i in draft.items if i.has("galvanised"))
        draft.problem(
            "E_MATERIAL",
            f"{_family(other).capitalize()} is not galvanised: one of the two words is wrong.",
            word,
        )
    else:
        draft.alloy = "GALV"
