"""The usual caution where a use is stated in which geometry never settles a substitution."""

from typing import NamedTuple

from catalog.target import Purpose, Target

DEFER = "Local codes and the licensed engineer responsible decide."


class Caution(NamedTuple):
    """Beginnings of words that state a use, and what has to be said then."""

    rule: str
    stems: tuple[str, ...]
    text: str


CAUTIONS = (
    Caution(
        "guard",
        ("guard", "schutzgitter"),
        "Machine guard: safety distances depend on the largest opening as mounted and deflected, and on who can "
        "reach in; check ISO 13857 in the edition in force.",
    ),
    Caution(
        "flame arrester",
        ("flame", "arrester", "arrestor", "flammendurchschlag", "explosion"),
        "Flame arrester: the element is type-tested as built (ISO/IEC 80079-49); no other cloth may be put in on "
        "geometry.",
    ),
    Caution(
        "certified sieve",
        ("certified", "calibrat", "testsieve", "prüfsieb", "pruefsieb", "3310", "e11", "e-11"),
        "Test sieve: only a sieve certified to ISO 3310-1 or ASTM E11 will do; industrial cloth of the same "
        "figures is no substitute in a test.",
    ),
    Caution(
        "food contact",
        ("food", "dairy", "milk", "pharma", "lebensmittel", "aliment"),
        "Food or pharmaceutical contact: alloy, finish and traceability are prescribed; have the certificate checked.",
    ),
    Caution(
        "pressure",
        ("pressure", "burst", "druckfilter", "druckbehälter"),
        "Pressure: strength, burst and the side that faces the flow are not settled by geometry.",
    ),
)


def cautions(target: Target, text: str) -> tuple[str, ...]:
    """The cautions that a purpose or the text of a callout calls for; each defers to who is responsible."""
    words = text.lower().replace("test sieve", "testsieve").replace("test-sieve", "testsieve")
    called = [c for c in CAUTIONS if any(w.startswith(c.stems) for w in _words(words))]
    if Purpose.GUARD in target.purposes and all(c.rule != "guard" for c in called):
        called.insert(0, CAUTIONS[0])
    return tuple(f"{c.text} {DEFER}" for c in called)


def _words(text: str) -> list[str]:
    """Words and numbers, hyphens kept within."""
    return "".join(sign if sign.isalnum() or sign == "-" else " " for sign in text).split()
