"""The usual caution where a use is stated in which geometry never settles a substitution."""

import re
from dataclasses import dataclass

from catalog.target import Purpose, Target

DEFER = "Local codes and the licensed engineer responsible decide."


@dataclass(frozen=True, slots=True)
class Caution:
    """Words that state a use, and what has to be said then."""

    rule: str
    pattern: re.Pattern[str]
    text: str


CAUTIONS = (
    Caution(
        "guard",
        re.compile(r"\b(machine )?guard(ing|s)?\b|schutzgitter", re.IGNORECASE),
        "Machine guard: safety distances depend on the largest opening as mounted and deflected, and on who can "
        "reach in; check ISO 13857 in the edition in force.",
    ),
    Caution(
        "flame arrester",
        re.compile(r"flame|arrest[eo]r|flammendurchschlag|explosion", re.IGNORECASE),
        "Flame arrester: the element is type-tested as built (ISO/IEC 80079-49); no other cloth may be put in on "
        "geometry.",
    ),
    Caution(
        "certified sieve",
        re.compile(r"certified|calibrat|test[- ]sieve|pr(ü|ue)fsieb|3310|\bE-?11\b", re.IGNORECASE),
        "Test sieve: only a sieve certified to ISO 3310-1 or ASTM E11 will do; industrial cloth of the same "
        "figures is no substitute in a test.",
    ),
    Caution(
        "food contact",
        re.compile(r"\b(food|dairy|milk|pharma\w*|lebensmittel|aliment\w*)\b", re.IGNORECASE),
        "Food or pharmaceutical contact: alloy, finish and traceability are prescribed; have the certificate checked.",
    ),
    Caution(
        "pressure",
        re.compile(r"\b(pressure|burst|druck(filter)?|bar\(?g?\)?)\b", re.IGNORECASE),
        "Pressure: strength, burst and the side that faces the flow are not settled by geometry.",
    ),
)


def cautions(target: Target, text: str) -> tuple[str, ...]:
    """The cautions that a purpose or the text of a callout calls for; each defers to who is responsible."""
    called = [c for c in CAUTIONS if c.pattern.search(text)]
    if Purpose.GUARD in target.purposes and all(c.rule != "guard" for c in called):
        called.insert(0, CAUTIONS[0])
    return tuple(f"{c.text} {DEFER}" for c in called)
