"""What no other rule has claimed: numbers and words that aren't understood, said with their place."""

from catalog.callout.joining.measuring import peek
from catalog.callout.rules.draft import Draft
from catalog.callout.text.items import Item
from catalog.units import Length

MOST_PROBLEMS = 5
IGNORED = ("harmless", "number sign", "range", "between", "by", "delivery", "part number", "equal", "negation", "band")
ROLES = {
    "slot": "label", "side": "direction", "unit": "unit", "compare": "limit", "tolerance word": "limit",
    "purpose": "limit", "form": "form", **dict.fromkeys(IGNORED, "ignored"),
}  # fmt: skip


def leftovers(draft: Draft) -> None:
    """Every number has to play a part and every word to be known; what doesn't is said with its place."""
    for at, item in enumerate(draft.items):
        for part in item.members or [item]:
            if not part.taken:
                _leftover(draft, part, at)


def _leftover(draft: Draft, item: Item, at: int) -> None:
    if item.kind == "sign" or (item.kind == "word" and item.text in "xX"):
        return
    if item.is_number:
        item.taken = "unknown"
        _unclear(draft, item, f"The figure {_shown(item)} has no part in a cloth that is understood.")
    elif item.kind == "term":
        _loose_term(draft, item, at)
    elif item.kind in ("word", "split"):
        item.taken = "unknown"
        _unclear(draft, item, f"'{item.text[:40]}' isn't understood.")
    else:
        item.taken = item.kind


def _shown(item: Item) -> str:
    unit = {"gauge": "gauge", None: "", "mesh sign": "#"}.get(item.unit, item.unit or "")
    return f"{item.text} {unit}".strip()


def _loose_term(draft: Draft, item: Item, at: int) -> None:
    """A word of the trade that nothing could be done with: a limit without figure and a lone 'not' carry meaning."""
    role = next((r for r in ROLES if item.has(r)), "unknown")
    item.taken = ROLES.get(role, "unknown")
    after = peek(draft.items, at + 1)
    unit = item.senses.get("unit", "")
    if unit.startswith("/") or (len(item.text) > 2 and unit and not item.has("harmless")):
        _unclear(draft, item, f"'{item.text}' has no figure before it.")
    elif item.has("compare") and not item.has("harmless"):
        _unclear(draft, item, f"'{item.text}' has no figure that it limits.")
    elif item.has("gauge") and not item.has("unit") and len(item.text) > 1:
        _unclear(draft, item, f"'{item.text}' has no number.")
    elif item.has("alternative") and not item.has("harmless") and len(item.text) > 1:
        _unclear(draft, item, f"What '{item.text}' offers as an alternative isn't understood.")
    elif (
        item.text.lower() in ("not", "nicht", "kein", "keine", "never", "instead of")
        and after is not None
        and not after.has("harmless")
    ):
        _unclear(draft, item, f"What '{item.text}' excludes isn't understood.")
    elif item.has("band") and draft.numbers():
        _unclear(draft, item, f"'{item.text}' speaks of particles, not of a cloth.")
    elif item.taken == "unknown":
        _unclear(draft, item, f"'{item.text}' isn't understood here.")


def _unclear(draft: Draft, item: Item, message: str) -> None:
    if sum(p.code == "E_NOT_UNDERSTOOD" for p in draft.problems) < MOST_PROBLEMS:
        draft.problem("E_NOT_UNDERSTOOD", message, item)


def has_length(length: Length | None) -> bool:
    """True where there is a length."""
    return length is not None
