"""Whatever is typed, reading it ends with an understanding that keeps its promises."""

import random

from hypothesis import example, given, settings
from hypothesis import strategies as st

from catalog import callout
from catalog.callout.reading import Likelihood, Status, Understanding
from catalog.report.reading_document import reading_document

PIECES = [
    "60", "60 mesh", "mesh", ".0075", "0.25", "0,16", "1/4", "1-1/2", "x", "×", "/", "mm", "µm", '"', "'", "in", "wire",
    "opening", "pitch", "304", "316L", "1.4404", "T304", "SWG", "16 ga", "plain", "twill", "PDW", "±", "5 %", "(", ")",
    "min", "max", "≥", "or", "alt.", "No.", "#", "sieve", "E11", "ISO 3310-1", "36", "100 ft", "roll", "pcs", "galv",
    "brass", "welded", "nylon", "16-Mar", "-40+60", "Ø", "Сетка", "х", "24/cm", "per", "25/100", "80/20", "TBC", "=",
    "warp", "weft", "Ã˜", "O", "l", "\x00", "\u202e", "\ud800", "٣", "1e999", "9" * 40, ",", ";", "-", "..",
]  # fmt: skip
SURE = (Status.CLEAR, Status.NOTED)


def check(text: str, understood: Understanding) -> None:
    """The promises of every understanding."""
    assert understood.text == text
    assert reading_document(understood)["status"] == understood.status.value
    alive = [r for r in understood.readings if r.likelihood is not Likelihood.RULED_OUT]
    if understood.status in SURE:
        assert alive
        assert not understood.problems
        assert all(side.pitch and side.wire for side in (alive[0].warp, alive[0].weft))
        assert all(side.wire.mm > 0 for side in (alive[0].warp, alive[0].weft) if side.wire)
    if understood.status is Status.ASK:
        assert understood.question or understood.problems
    if understood.status is Status.OUT_OF_SCOPE:
        assert understood.problems
        assert not alive
    if understood.status is Status.LIMITS:
        assert alive[0].limits
    assert all(problem.message and problem.message[-1] in ".?" for problem in understood.problems)
    assert all(problem.column is None or 1 <= problem.column <= len(text) + 1 for problem in understood.problems)
    last = 0
    for word in understood.words:
        assert last <= word.start < word.end <= len(text)
        last = word.end


@settings(max_examples=150, deadline=None)
@given(st.lists(st.sampled_from(PIECES), max_size=14).map(" ".join))
@example("")
@example("12 mesh .063")
def test_pieces_of_callouts_in_any_order_are_understood_or_asked(text: str) -> None:
    check(text, callout.read(text))


@settings(max_examples=150, deadline=None)
@given(st.text(max_size=200))
def test_any_text_is_understood_or_asked(text: str) -> None:
    check(text, callout.read(text))


@settings(max_examples=60, deadline=None)
@given(st.lists(st.sampled_from(PIECES), max_size=10).map("".join))
def test_pieces_run_together_are_understood_or_asked(text: str) -> None:
    check(text, callout.read(text))


def test_ten_kilobytes_of_noise_are_refused_with_a_sentence() -> None:
    dice = random.Random(7)
    for alphabet in ("abc 123.,x/\"'", "60 mesh .0075 x ", "()[]{}<>=±", "\x00\x07\x1b[31m\u202e"):
        text = "".join(dice.choice(alphabet) for _ in range(10_000))
        understood = callout.read(text)
        check(text, understood)
        assert understood.status in (Status.ASK, Status.OUT_OF_SCOPE)


def test_steps_grow_no_faster_than_the_text() -> None:
    """Twice the text never makes more than about twice the work, counted in calls, not in time."""
    import sys

    def calls(text: str) -> int:
        count = 0

        def tally(*_: object) -> None:
            nonlocal count
            count += 1

        sys.setprofile(tally)
        try:
            callout.read(text)
        finally:
            sys.setprofile(None)
        return count

    callout.read("60 mesh .0075")
    for base in ("60 mesh .0075 304, ", "1/4 x ", "a-", "(", "Ã˜", "60x"):
        short, long = calls((base * 1000)[:2000]), calls((base * 4000)[:8000])
        assert long <= 4.4 * short + 5000, base
