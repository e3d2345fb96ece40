"""Rules for the words: crimp, finish, grade, standard, certificate."""

import re

from catalog.callout.joining.measuring import peek
from catalog.callout.rules.draft import Draft
from catalog.callout.rules.goods import kinds_of_goods, not_metal, not_woven, references
from catalog.callout.rules.weave_words import weaves

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
        not_woven,
        not_metal,
        references,
        weaves,
        _crimps,
        _finishes,
        _grades,
        _standards,
        kinds_of_goods,
    ):
        rule(draft)


def _certificates(draft: Draft) -> None:
    """'3.1 cert', 'EN 10204-3.1', 'Zeugnis 3.1': 2.1, 2.2, 3.1 and 3.2 beside such a word are certificates,
    no lengths.
    """
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
