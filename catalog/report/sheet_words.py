"""What a sheet says beside its figures: verdict, assumptions, deference; whole sentences."""

import re
from collections.abc import Iterator, Mapping

from catalog.crossref import Answer
from catalog.report.outside_text import tame
from catalog.search.candidate import Candidate, Verdict
from catalog.target import Target

VERDICTS: Mapping[Verdict, str] = {
    Verdict.SAME: "equal to rounding in every figure asked",
    Verdict.INTERCHANGEABLE: "every difference lies within its limit, on the figures asked",
    Verdict.NEAR_SAFE: "near: differs to the harmless side, or in what the purpose isn't about",
    Verdict.NEAR_RISK: "near: differs to the side that hurts",
    Verdict.CANNOT_SAY: "can't be said on what is known: see what has to be asked",
    Verdict.NOT_EQUIVALENT: "not equivalent",
}
DEFERENCE = (
    "This sheet compares catalogue figures; it approves nothing. Whether the offered cloth may be used is decided by "
    "the engineer responsible for the equipment, who signs for it; measure the roll before use. Local codes and the "
    "customer's specification come first."
)
UNIT = re.compile(r"_(mm|pct|kg_m2)$")
HARM_SIDE = "The aperture lies to the side that hurts, within its limit: measure the roll."


def verdict_words(candidate: Candidate) -> str:
    """The verdict's code and what it means, with the verdict of each purpose where they differ."""
    said = f"{candidate.verdict.value}: {VERDICTS[candidate.verdict]}"
    by_purpose = dict(candidate.by_purpose)
    if len(set(by_purpose.values())) > 1:
        said += f" ({'; '.join(f'{name}: {verdict.value}' for name, verdict in by_purpose.items())})"
    return said


def assumptions(answer: Answer, target: Target, candidate: Candidate) -> tuple[str, ...]:
    """What nobody stated and was taken all the same, one sentence each."""
    return tuple(dict.fromkeys((*_assumed(target), *_read(answer, target), *_of_cloth(candidate))))


def _assumed(target: Target) -> Iterator[str]:
    if target.origin.get("weave") == "assumed" and target.weave is not None:
        yield f"Weave not stated: {target.weave.words} assumed, as is customary."
    if target.tolerance is not None and target.origin.get("tolerance") != "stated":
        limits = dict.fromkeys((target.tolerance.warp_mm, target.tolerance.weft_mm))
        allowed = " / ".join(f"±{mm * 1000:.4g} µm" for mm in limits)
        yield f"Tolerance not stated: {allowed} on the aperture, {tame(target.tolerance.source)}."
    if not target.purposes:
        yield "Purpose not stated: retaining and passing are judged side by side, the worse one counts."
    if target.reading.alloy is None:
        yield "Alloy not stated: not judged."
    warp, weft = target.warp.aperture, target.weft.aperture
    if warp and weft and warp.mm != weft.mm and target.particle_is_sphere is None:
        yield "Particle shape not stated: the worse direction counts."
    if target.oversize_mm is not None:
        yield f"Largest oversize of an opening, vouched for by the asker: {target.oversize_mm:g} mm."


def _read(answer: Answer, target: Target) -> Iterator[str]:
    yield from (f"Read: {tame(note)}." for note in target.reading.notes)
    if target.reading.derived:
        names = ", ".join(UNIT.sub("", name).replace("_", " ").replace(".", " ") for name in target.reading.derived)
        yield f"Completed by arithmetic: {names}."
    others = [tame(other.reading.label) for other in answer.targets if other is not target]
    if others:
        yield f"Read here as {tame(target.reading.label)}; the text may also mean {'; '.join(others)}."
    if answer.question:
        yield f"Open question: {tame(answer.question, 400)}"


def _of_cloth(candidate: Candidate) -> Iterator[str]:
    yield f"Figures of the offered cloth: {tame(candidate.cloth.source)}."
