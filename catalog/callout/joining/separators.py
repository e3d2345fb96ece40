"""What ends a clause."""

from catalog.callout.text.items import Item

SEPARATORS = frozenset(",;|_()[]{}\n")


def is_separator(item: Item | None) -> bool:
    """True for what ends a clause: a comma, a bracket, a hyphen that stands free."""
    return item is None or (item.kind == "sign" and (item.text in SEPARATORS or (item.text == "-" and not item.glued)))
