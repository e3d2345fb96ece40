"""Rules for the words: weave, crimp, finish, grade, standard, certificate, and goods that are no woven wire."""

import re

from catalog.callout.draft import Draft
from catalog.callout.items import Item
from catalog.callout.measures import peek
from catalog.callout.reading import Problem
from catalog.construction import Weave

FOREIGN = re.compile(
    r"gewebe|masche|draht|bindung|breit|toile|maille|\bfil\b|laize|inox|luz|malla|hilo|tela|maglia|filo|rete|koper|werkst|сетка|tresse|\blarg",
    re.IGNORECASE,
)
OUTSIDE_FINISH = ("calendered", "sintered", "satin", "stranded")
SIEVE_STANDARDS = re.compile(r"3310|E\s?-?\s?11|BS\s?410|ISO\s?565|4188", re.IGNORECASE)
WITHDRAWN = re.compile(r"DIN\s?418[89]|BS\s?410|RR-W-360|DIN\s?1171")


def words(draft: Draft, text: str) -> None:
    """Apply every rule for words."""
    draft.is_metric_tongue = bool(FOREIGN.search(text))
    for item in draft.items:
        if item.has("mended"):
            draft.note(f"'{item.text}' was read as '{item.senses['mended']}'")
    for rule in (
        _certificates,
        _not_woven,
        _not_metal,
        _references,
        _weaves,
        _crimps,
        _finishes,
        _grades,
        _standards,
        _kinds,
    ):
        rule(draft)


def _certificates(draft: Draft) -> None:
    """'3.1 cert', 'EN 10204-3.1', 'Zeugnis 3.1': 2.1, 2.2, 3.1 and 3.2 beside such a word are certificates, no lengths."""
    for item in draft.kinds("certificate"):
        kind = re.search(r"[23][.,][12](?=[ABC]?$)", item.text)
        draft.certificate = kind.group().replace(",", ".") if kind else None
        item.taken = "certificate"
    for word in draft.terms("certificate word"):
        at = word.at
        for near in (at - 1, at + 1, at - 2, at + 2, at + 3):
            number = peek(draft.items, near)
            if (
                number
                and number.is_number
                and number.number
                and number.number.written.replace(",", ".") in ("2.1", "2.2", "3.1", "3.2")
            ):
                draft.certificate = number.number.written.replace(",", ".")
                number.taken = "certificate"
                break
        word.taken = "certificate"


def _negated(draft: Draft, item: Item) -> bool:
    before = peek(draft.items, item.at - 1)
    return before is not None and before.has("negation") and not before.has("number sign")


def _not_woven(draft: Draft) -> None:
    """Welded, knitted, expanded, perforated goods are no woven cloth; 'not welded' says that it is."""
    for item in draft.terms("not woven"):
        kind, at = item.senses["not woven"], item.at
        item.taken = "kind of goods"
        after = peek(draft.items, at + 1)
        if _negated(draft, item):
            draft.items[at - 1].taken = "kind of goods"
            draft.note(f"not {kind}, as the text says")
        elif after is not None and re.match(r"edge|frame|seam|border|selv|ends|rand|naht", after.text, re.IGNORECASE):
            draft.note(f"{item.text} {after.text}: made up after weaving, not part of the cloth")
            after.taken = "finish"
        else:
            message = f"'{item.text}' is no woven wire cloth: {kind} goods aren't in this catalogue."
            draft.outside = draft.outside or Problem("E_NOT_WOVEN", message, item.start)


def _not_metal(draft: Draft) -> None:
    """Nylon, polyester, silk, glass: the cloth isn't of metal. 'PVC coated' is a finish and read as such."""
    for item in draft.terms("not metal"):
        item.taken = "material"
        if _negated(draft, item):
            draft.items[item.at - 1].taken = "material"
        else:
            message = f"'{item.text}' is no metal: only wire cloth is in this catalogue."
            draft.outside = draft.outside or Problem("E_NOT_METAL", message, item.start)


def _references(draft: Draft) -> None:
    """'Same as last time', 'as usual', 'per drawing': what is meant stands elsewhere."""
    for item in draft.terms("reference"):
        if item.text.lower() in ("do", "same", "usual") and draft.numbers():
            continue
        item.taken = "reference"
        draft.note(f"'{item.text}' points to something that isn't in the text")
        if "refers elsewhere" not in draft.missing:
            draft.missing.append("refers elsewhere")


def _weaves(draft: Draft) -> None:
    """Plain, twilled and the Dutch weaves; 'reverse twilled' and the like are known by name and not computed."""
    found: dict[str, Item] = {}
    for item in draft.terms("weave"):
        item.taken = "weave"
        found.setdefault(item.senses["weave"], item)
    for item in draft.terms("filter"):
        item.taken = "kind of goods"
        draft.is_dutch = True
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


def _crimps(draft: Draft) -> None:
    """Lock crimp, double crimp, flat top: how coarse wire was bent before weaving."""
    names = []
    for item in draft.terms("crimp"):
        item.taken = "crimp"
        names.append(item.senses["crimp"])
    draft.crimp = ", ".join(dict.fromkeys(names)) or None


def _finishes(draft: Draft) -> None:
    """Coatings and treatments; cloth coated after weaving opens less, calendered and stranded cloth isn't computed."""
    for item in draft.terms("galvanised"):
        item.taken = "finish"
        draft.finish.append(item.senses["galvanised"])
        if "after" in item.senses["galvanised"]:
            draft.note(
                "galvanised after weaving: published aperture tolerances exclude it, and the zinc closes the opening"
            )
    for item in draft.terms("finish"):
        item.taken = "finish"
        name = item.senses["finish"]
        draft.finish.append(name)
        if name in OUTSIDE_FINISH:
            draft.note(f"{name}: known by name, outside what is computed")
        elif "coated" in name or name == "painted":
            draft.note(f"{name}: whether the wire is stated bare or coated isn't said")
    draft.finish = list(dict.fromkeys(draft.finish))


def _grades(draft: Draft) -> None:
    """Market grade and bolting cloth imply a wire by custom; mill grade is no table that is held here."""
    for item in draft.terms("grade"):
        item.taken = "grade"
        draft.grade = item.senses["grade"]


def _standards(draft: Draft) -> None:
    """Standards by number; sieve standards make the cloth sieve cloth."""
    for item in draft.kinds("standard"):
        item.taken = "standard"
        name = re.sub(r"\s+", " ", item.text)
        draft.standards.append(name)
        draft.is_sieve = draft.is_sieve or bool(SIEVE_STANDARDS.search(name))
        if WITHDRAWN.search(name):
            draft.note(f"{name} is an old standard; check which edition is meant")


def _kinds(draft: Draft) -> None:
    """Sieve, slot, hardware cloth and what else the goods are called."""
    for item in draft.terms("sieve"):
        item.taken = "kind of goods"
        draft.is_sieve = True
    for item in draft.items:
        if item.has("slot") and re.match(r"slot|oblong|rect", item.text, re.IGNORECASE):
            draft.is_slotted = True
            item.taken = item.taken or "kind of goods"
    for item in draft.terms("hardware"):
        item.taken, draft.is_hardware = "kind of goods", True
    for item in draft.terms("product"):
        draft.is_slotted = draft.is_slotted or bool(re.match(r"oblong|rectang", item.text, re.IGNORECASE))
        item.taken = "kind of goods"
