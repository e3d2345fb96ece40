"""The pieces of a callout on their way from characters to figures."""

from collections.abc import Iterable
from dataclasses import dataclass, field

from catalog.units import Length, Number

LENGTH_UNITS = ("mm", "um", "in", "thou", "cm", "m", "ft")


@dataclass(slots=True, eq=False)
class Item:
    """A stretch of the text with the part it plays. *start* and *end* are offsets in the repaired text."""

    kind: str
    """'number', 'chain', 'term', 'word', 'sign', 'alloy', 'standard', 'certificate', 'date', 'split', 'code'."""
    text: str
    start: int
    end: int
    glued: bool = False
    """True where no space stands before it."""
    senses: dict[str, str] = field(default_factory=dict)
    """For a term: role → value, as in the vocabulary."""
    number: Number | None = None
    unit: str | None = None
    """Of a number: a length unit, '%', 'kg/m2', '/in', '/cm', 'gauge', 'sieve', 'mesh sign', …"""
    system: str | None = None
    """Of a gauge: the system named, or '?'."""
    slot: str | None = None
    """What a label beside it says that it is: 'mesh', 'aperture', 'pitch', 'wire', 'width', …"""
    side: str | None = None
    """'warp' or 'weft'."""
    bound: str | None = None
    """'least', 'most' or a comparison of the vocabulary."""
    upto: "Item | None" = None
    """The upper end of a range."""
    tolerance: "tuple[Item | None, Item | None] | None" = None
    """(plus, minus) behind a ± sign."""
    restated: "list[Item]" = field(default_factory=list)
    """The same figure in other words: the brackets behind it."""
    members: "list[Item]" = field(default_factory=list)
    """Of a chain: the numbers that × or / join."""
    joins: list[str] = field(default_factory=list)
    at: int = 0
    """Its place among the items of the draft."""
    taken: str = ""
    """The part it plays, once a rule has claimed it: the role shown on the screen."""

    def has(self, role: str) -> bool:
        """True where the vocabulary gives it this role."""
        return role in self.senses

    @property
    def is_length(self) -> bool:
        """True for a number with a unit of length."""
        return self.unit in LENGTH_UNITS

    @property
    def is_bare(self) -> bool:
        """True for a number without unit, label or side."""
        return self.number is not None and self.unit is None and self.slot is None

    @property
    def is_count_like(self) -> bool:
        """True for a whole number without a unit."""
        return self.number is not None and self.unit is None and self.number.is_integer

    @property
    def is_number(self) -> bool:
        """True for a number, alone."""
        return self.kind == "number"

    def length(self, unit: str | None = None) -> Length:
        """Its length, in its own unit or in *unit* where it has none."""
        assert self.number is not None
        return self.number.length(self.unit if self.is_length and self.unit else unit or "mm", (self.start, self.end))


def numbers_of(items: Iterable[Item]) -> list[Item]:
    """Every number that no rule has claimed, those inside chains too."""
    found: list[Item] = []
    for item in items:
        if item.kind == "number" and not item.taken:
            found.append(item)
        elif item.kind == "chain":
            found += [m for m in item.members if not m.taken]
    return found
