"""From claims to readings: every combination of senses, each completed by arithmetic and tried against the loom."""

from collections.abc import Iterable, Iterator, Sequence
from dataclasses import dataclass, field, replace
from fractions import Fraction
from itertools import islice, product

from catalog.callout.reading import Likelihood, Side
from catalog.callout.rules.claims import written_agrees
from catalog.callout.rules.draft import USUAL, Claim, Draft, Option
from catalog.units import Length

MOST_READINGS = 64


@dataclass(frozen=True, slots=True)
class Clash:
    """Figures that contradict each other."""

    kind: str
    """'sum' where pitch isn't aperture and wire, 'spelling' where one figure is said in two ways."""
    slot: str
    lengths: tuple[Length, ...]


@dataclass(frozen=True, slots=True)
class Combined:
    """One combination of senses, completed."""

    options: tuple[Option, ...]
    warp: Side
    weft: Side
    derived: tuple[str, ...] = ()
    clashes: tuple[Clash, ...] = ()
    claims: tuple[Claim, ...] = field(default=())
    by_custom: bool = False

    @property
    def rank(self) -> int:
        """How far the senses had to be sought."""
        return max((o.rank for o in self.options), default=0)

    @property
    def is_inferred(self) -> bool:
        """True where a unit was inferred."""
        return any(o.is_inferred for o in self.options)

    @property
    def likelihood(self) -> Likelihood:
        """Usual only where every sense is."""
        return Likelihood.USUAL if all(o.likelihood is USUAL for o in self.options) else Likelihood.POSSIBLE

    @property
    def label(self) -> str:
        """The senses in words."""
        return ", ".join(o.label for o in self.options if o.label)


def combinations(draft: Draft) -> list[Combined]:
    """Every combination of the open senses, at most 64."""
    rows: Iterator[tuple[Option, ...]] = islice(product(*filter(None, draft.choices)), MOST_READINGS)
    return [combine(draft.claims, options, draft.is_dutch) for options in rows]


def combine(fixed: Sequence[Claim], options: tuple[Option, ...], is_filter: bool = False) -> Combined:
    """Put claims together and complete both directions; filter cloth gets no opening."""
    claims = (*fixed, *(c for o in options for c in o.claims))
    sides, derived, clashes = [], [], []
    custom = False
    for name in ("warp", "weft"):
        side, done, wrong, by_custom = complete(claims, name, is_filter)
        custom = custom or by_custom
        sides.append(side)
        derived += [f"{name}.{key}_mm" for key in done]
        clashes += [w for w in wrong if w not in clashes]
    return Combined(options, sides[0], sides[1], tuple(derived), tuple(clashes), claims, custom)


def _of(claims: Iterable[Claim], slot: str, name: str) -> list[tuple[Length, Claim]]:
    found = [
        (length, c) for c in claims if c.slot == slot and (length := c.warp if name == "warp" else c.weft) is not None
    ]
    stated = [pair for pair in found if not pair[1].by_custom]
    return stated or found


def complete(claims: Sequence[Claim], name: str, is_filter: bool) -> tuple[Side, list[str], list[Clash], bool]:
    """One direction: of pitch, wire and aperture the third follows from two; what disagrees beyond rounding clashes."""
    picked: dict[str, Length] = {}
    clashes: list[Clash] = []
    by_count = custom = False
    for slot in ("pitch", "wire", "aperture"):
        found = _of(claims, slot, name)
        if not found:
            continue
        best = min(found, key=lambda pair: (not pair[1].by_count or pair[0].half_unit_mm > 0, _digits(pair[0])))
        picked[slot] = best[0]
        clashes += [
            Clash("spelling", slot, (found[0][0], other))
            for other, _ in found[1:]
            if not written_agrees(found[0][0], other)
        ]
        by_count = by_count or (slot == "pitch" and best[1].by_count)
        custom = custom or best[1].by_custom
    pitch, wire, aperture = (picked.get(slot) for slot in ("pitch", "wire", "aperture"))
    if is_filter:
        return Side(pitch, wire, None, by_count), [], clashes, custom
    if pitch and wire and aperture:
        clashes += _sum_clash(pitch, wire, aperture)
        return _of_three(pitch, wire, aperture, by_count, bool(clashes)), [], clashes, custom
    side, derived = _of_two(pitch, wire, aperture, by_count)
    return side, derived, clashes, custom


def _digits(length: Length) -> int:
    """Significant digits of the spelling: of several that agree, the roundest was declared,
    the rest are conversions.
    """
    if not length.written:
        return 9
    digits = "".join(c for c in length.written if c.isdecimal()).lstrip("0")
    is_decimal = "." in length.written or "," in length.written
    return len(digits if is_decimal else digits.rstrip("0")) or 1


def _sum_clash(pitch: Length, wire: Length, aperture: Length) -> list[Clash]:
    """Figures agree when their mismatch is at most the sum of their roundings, inclusive."""
    mismatch = abs(pitch.mm - wire.mm - aperture.mm)
    allowed = pitch.rounding_mm + wire.rounding_mm + aperture.rounding_mm
    return [Clash("sum", "pitch", (pitch, wire, aperture))] if mismatch > allowed else []


def _of_three(pitch: Length, wire: Length, aperture: Length, by_count: bool, clash: bool) -> Side:
    """All three are stated: the count, which is exact, goes before a rounded opening,
    a round opening before a rounded pitch.
    """
    exact_count = by_count and pitch.half_unit_mm == 0
    if clash or not (exact_count or _digits(pitch) < _digits(aperture)):
        return Side(replace(pitch, mm=aperture.mm + wire.mm), wire, aperture, by_count)
    return Side(pitch, wire, replace(aperture, mm=pitch.mm - wire.mm), by_count)


def _of_two(
    pitch: Length | None, wire: Length | None, aperture: Length | None, by_count: bool
) -> tuple[Side, list[str]]:
    if pitch and wire and not aperture:
        return Side(pitch, wire, _made(pitch.mm - wire.mm, pitch, wire), by_count), ["aperture"]
    if aperture and wire and not pitch:
        return Side(_made(aperture.mm + wire.mm, aperture, wire), wire, aperture, by_count), ["pitch"]
    if pitch and aperture and not wire:
        return Side(pitch, _made(pitch.mm - aperture.mm, pitch, aperture), aperture, by_count), ["wire"]
    return Side(pitch, wire, aperture, by_count), []


def _made(mm: Fraction, one: Length, other: Length) -> Length:
    return Length(mm, one.rounding_mm + other.rounding_mm)
