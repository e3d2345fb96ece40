"""What has been understood so far: claims, senses still open, trade words, notes, problems."""

from collections.abc import Sequence
from dataclasses import dataclass, field
from fractions import Fraction

from catalog.callout.reading import Form, Likelihood, Problem
from catalog.callout.text.items import Item
from catalog.cloth import Rating
from catalog.construction import Weave
from catalog.units import Length

USUAL, POSSIBLE = Likelihood.USUAL, Likelihood.POSSIBLE


@dataclass(frozen=True, slots=True)
class Claim:
    """One figure in one sense: what it says of warp and weft."""

    slot: str
    """'pitch', 'wire' or 'aperture'."""
    warp: Length | None
    weft: Length | None
    by_count: bool = False
    """True for a count, which is exact."""
    by_custom: bool = False
    """True for a wire that a grade or a sieve edition brings: a stated wire goes before it."""


@dataclass(frozen=True, slots=True)
class Option:
    """One sense of a figure or a word."""

    label: str
    claims: tuple[Claim, ...] = ()
    likelihood: Likelihood = USUAL
    rank: int = 0
    """0: thought of at once; 1: a unit thought of only where the usual one makes no cloth; 2: a sense of that kind."""
    is_inferred: bool = False
    """True where the unit isn't written: the cloth must then be a convincing one."""
    notes: tuple[str, ...] = ()
    weave: Weave | None = None
    standard: str | None = None
    grade: str | None = None
    form: Form | None = None
    rating: Rating | None = None
    alloy: str | None = None
    missing: tuple[str, ...] = ()
    sense: str = ""
    """The kind of question that this choice raises: 'opening or pitch', 'gauge system', …"""


@dataclass(slots=True)
class Draft:
    """The working sheet of one callout."""

    items: list[Item]
    claims: list[Claim] = field(default_factory=list)
    choices: list[Sequence[Option]] = field(default_factory=list)
    notes: list[str] = field(default_factory=list)
    problems: list[Problem] = field(default_factory=list)
    missing: list[str] = field(default_factory=list)
    questions: list[str] = field(default_factory=list)
    """Questions that don't bear on the numbers: which brass."""
    tolerances: dict[str, tuple[Fraction, Fraction]] = field(default_factory=dict)
    """Figure → (minus, plus), as shares of it."""
    limits: dict[str, tuple[float | None, float | None]] = field(default_factory=dict)
    alloy: str | None = None
    material: str | None = None
    """A family whose grade the text leaves open."""
    weave: Weave | None = None
    is_dutch: bool = False
    """True where the text names a Dutch weave or filter cloth."""
    weave_words: str = ""
    crimp: str | None = None
    finish: list[str] = field(default_factory=list)
    grade: str | None = None
    standards: list[str] = field(default_factory=list)
    certificate: str | None = None
    rating: Rating | None = None
    form: Form | None = None
    open_area: Item | None = None
    mass: Item | None = None
    outside: Problem | None = None
    """Why the text is no woven wire cloth."""
    is_sieve: bool = False
    is_slotted: bool = False
    is_hardware: bool = False
    is_metric_tongue: bool = False
    """True where the words are not English: numbers without unit are rather millimetres."""

    def __post_init__(self) -> None:
        for at, item in enumerate(self.items):
            item.at = at
            for member in item.members:
                member.at = at

    def note(self, text: str) -> None:
        """Say something once."""
        if text not in self.notes:
            self.notes.append(text)

    def problem(self, code: str, message: str, item: Item | None = None) -> None:
        """Say what is wrong and where (the place is within the repaired text, until the end)."""
        self.problem_at(code, message, None if item is None else item.start)

    def problem_at(self, code: str, message: str, place: int | None) -> None:
        """Say what is wrong at a place in the repaired text."""
        if all(p.message != message for p in self.problems):
            self.problems.append(Problem(code, message, place))

    def terms(self, role: str) -> list[Item]:
        """The words with a role that no rule has claimed."""
        return [i for i in self.items if i.kind == "term" and not i.taken and i.has(role)]

    def kinds(self, kind: str) -> list[Item]:
        """The items of a kind that no rule has claimed."""
        return [i for i in self.items if i.kind == kind and not i.taken]

    def numbers(self) -> list[Item]:
        """Every number that no rule has claimed, those inside products too."""
        found: list[Item] = []
        for item in self.items:
            if item.kind == "chain":
                found += [m for m in item.members if not m.taken]
            elif item.is_number and not item.taken:
                found.append(item)
        return found

    def all_numbers(self) -> list[Item]:
        """Every number, claimed or not."""
        return [n for i in self.items for n in (i.members if i.kind == "chain" else [i] if i.is_number else [])]

    @property
    def has_count(self) -> bool:
        """True where a number is named as a count."""
        return any(c.by_count for c in self.claims) or any(
            any(x.by_count for x in o.claims) for ch in self.choices for o in ch
        )

    def has_slot(self, slot: str) -> bool:
        """True where a figure for *slot* is claimed, in some sense."""
        every = [
            *self.claims,
            *(c for choice in self.choices for option in choice for c in option.claims if not c.by_custom),
        ]
        return any(c.slot == slot for c in every)
