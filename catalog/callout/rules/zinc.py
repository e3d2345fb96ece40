"""Galvanising, and the metals that it doesn't go with."""

from catalog.callout.rules.draft import Draft
from catalog.callout.text.items import Item
from catalog.callout.vocabulary.materials import CLOSED, FAMILIES, OPEN_GRADES


def family_of(name: str) -> str:
    """The family whose bare name agrees with an alloy's id."""
    return next((family for start, family in FAMILIES.items() if name.startswith(start)), "stainless")


def _family(name: str) -> str:
    """The family of an alloy's id; a family's name stays."""
    return name if name in OPEN_GRADES or name in CLOSED else family_of(name)


def zinc(draft: Draft, families: list[tuple[str, Item]]) -> None:
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
