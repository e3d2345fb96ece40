"""The substitution sheet as one value: what its PDF, HTML and Markdown show, in the order in which they show it."""

from collections.abc import Iterator, Sequence
from dataclasses import dataclass
from datetime import date
from enum import StrEnum

from catalog.construction import Construction, Weave, Wires
from catalog.crossref import Answer
from catalog.errors import NotFoundError
from catalog.report.drawing_vector import Drawing, draw
from catalog.report.fingerprint import fingerprint, target_of
from catalog.report.outside_text import tame
from catalog.report.sheet_rows import Row, figure_rows, named_rows, need_words
from catalog.report.sheet_words import DEFERENCE, HARM_SIDE, assumptions, verdict_words
from catalog.search.candidate import Candidate, Finding, StockLine
from catalog.search.comparison import compare
from catalog.search.judging import SIDE_BY_SIDE
from catalog.search.rules import HOUSE_RULES
from catalog.target import Target

DEMO = "DEMO DATA: INVENTED. Not to be ordered from."
TO_FILL_IN = "____________________"


class DeviationKind(StrEnum):
    """What is asked of the one who signs (terms of ISO 9000)."""

    PERMIT = "deviation permit"
    CONCESSION = "concession"

    @property
    def words(self) -> str:
        """The term with when it is asked for."""
        return f"{self.value} ({'before' if self is DeviationKind.PERMIT else 'after'} supply)"


@dataclass(frozen=True, slots=True)
class Details:
    """What the comparison doesn't know: who wants how much of it for what, and until when."""

    kind: DeviationKind = DeviationKind.PERMIT
    number: str = ""
    """Number of the sheet."""
    dated: date | None = None
    reference: str = ""
    """Order, drawing or position."""
    use: str = ""
    requested_by: str = ""
    quantity: str = ""
    """'' takes the need of the request."""
    valid_until: date | None = None
    lots: tuple[str, ...] = ()
    """The lots that are offered; () shows every lot of the cloth."""
    catalogue_date: date | None = None
    """When the catalogue was last changed."""


@dataclass(frozen=True, slots=True)
class Line:
    """A name and what is said under it."""

    name: str
    text: str


@dataclass(frozen=True, slots=True)
class Note:
    """A finding in a sentence."""

    stand: str
    """'not met', 'open' or 'met'."""
    text: str
    source: str
    """Where its limit comes from; '' where it has none."""


@dataclass(frozen=True, slots=True)
class LotRow:
    """One lot with its certificate."""

    lot: str
    where: str
    size: str
    heat: str
    certificate: str
    serves: str


@dataclass(frozen=True, slots=True)
class Sheet:
    """The sheet's content. All text is fit to be printed; markup is escaped by whoever writes a format."""

    title: str
    is_demo: bool
    heading: tuple[Line, ...]
    verdict: str
    reason: str
    named: tuple[Row, ...]
    """What has a name and no figure: text as written, weave, alloy, standard."""
    figures: tuple[Row, ...]
    """Figures with their differences."""
    findings: tuple[Note, ...]
    """Not met first, then open, then met."""
    cautions: tuple[str, ...]
    lots: tuple[LotRow, ...]
    order: tuple[Line, ...]
    """Use, requested by, quantity, validity, permit or concession."""
    assumed: tuple[str, ...]
    signatures: tuple[Line, ...]
    drawing: Drawing
    deference: str
    catalogue_date: str
    fingerprint: str


def build_sheet(answer: Answer, candidate: Candidate, details: Details) -> Sheet:
    """Set out *candidate* against what *answer* asked. Raises NotFoundError for a lot that isn't in its stock."""
    target = target_of(answer, candidate)
    compared = compare(target, candidate.cloth, candidate.turned, HOUSE_RULES)
    stock = _offered_lots(candidate.stock, details.lots)
    return Sheet(
        title=f"Substitution sheet: request for a {details.kind.words}",
        is_demo=candidate.cloth.demo or any(line.lot.demo for line in stock),
        heading=tuple(_heading(details)),
        verdict=verdict_words(candidate),
        reason=tame(candidate.reason, 400),
        named=tuple(named_rows(answer.request.text, compared)),
        figures=tuple(figure_rows(compared, candidate, target.purposes or SIDE_BY_SIDE)),
        findings=_notes(candidate.findings),
        cautions=(*(tame(text, 400) for text in answer.cautions), *([HARM_SIDE] if candidate.harm_side else [])),
        lots=tuple(_lot_row(line) for line in stock),
        order=tuple(_order(target, details)),
        assumed=assumptions(answer, target, candidate),
        signatures=tuple(_signatures(details)),
        drawing=draw((("required", asked_construction(target)), ("offered", compared.made))),
        deference=DEFERENCE,
        catalogue_date=_day(details.catalogue_date) or "not recorded",
        fingerprint=fingerprint(answer, candidate),
    )


def asked_construction(target: Target) -> Construction | None:
    """What is asked as a construction, to be drawn; None unless pitch and wire are known both ways."""
    sides = []
    for side in (target.warp, target.weft):
        if side.pitch is None or side.wire is None:
            return None
        sides.append(Wires(side.pitch.mm, side.wire.mm))
    return Construction(target.weave or Weave.PLAIN, sides[0], sides[1], target.reading.alloy)


def _day(day: date | None) -> str:
    return day.isoformat() if day else ""


def _heading(details: Details) -> Iterator[Line]:
    yield Line("Sheet no.", tame(details.number) or TO_FILL_IN)
    yield Line("Date", _day(details.dated) or TO_FILL_IN)
    if details.reference:
        yield Line("Reference", tame(details.reference))


def _order(target: Target, details: Details) -> Iterator[Line]:
    quantity = tame(details.quantity) or (need_words(target.need) if target.need else TO_FILL_IN)
    purposes = ", ".join(purpose.value for purpose in target.purposes)
    yield Line("Use", tame(details.use) or TO_FILL_IN)
    yield Line("Purpose", purposes or "not stated: retain and pass side by side")
    yield Line("Quantity", quantity if quantity == TO_FILL_IN else f"{quantity}; no more than this")
    yield Line("Valid until", _day(details.valid_until) or TO_FILL_IN)
    yield Line("Asked for", details.kind.words)
    if target.certificate:
        yield Line("Certificate asked", f"EN 10204 type {tame(target.certificate)}")


def _signatures(details: Details) -> Iterator[Line]:
    yield Line("Requested", tame(details.requested_by))
    yield Line("Technical approval: engineer responsible", "")
    yield Line("Quality", "")


def _notes(findings: Sequence[Finding]) -> tuple[Note, ...]:
    order = (False, None, True)
    stands = {False: "not met", None: "open", True: "met"}
    ranked = sorted(findings, key=lambda finding: order.index(finding.ok))
    return tuple(Note(stands[f.ok], tame(f.message, 400), tame(f.source)) for f in ranked)


def _offered_lots(stock: Sequence[StockLine], wanted: tuple[str, ...]) -> list[StockLine]:
    if not wanted:
        return list(stock)
    by_id = {line.lot.id: line for line in stock}
    missing = [tame(name, 40) for name in wanted if name not in by_id]
    if missing:
        near = tuple(by_id)[:3]
        raise NotFoundError(f"No lot of this cloth is called {', '.join(missing)}.", near)
    return [by_id[name] for name in wanted]


def _lot_row(line: StockLine) -> LotRow:
    lot = line.lot
    size = f"{lot.usable_width_mm} mm × {lot.free_length_mm / 1000:.2f} m"
    inches = f"{lot.usable_width_mm / 25.4:.1f} in × {lot.free_length_mm / 304.8:.1f} ft"
    serves = {True: "serves: ", False: "does not serve: ", None: ""}[line.fit.ok] + tame(line.fit.why)
    seams = "" if not lot.seams else f", {lot.seams} seam{'s' if lot.seams > 1 else ''}"
    return LotRow(
        lot=f"{tame(lot.id, 40)}{' (demo)' if lot.demo else ''}",
        where=f"{tame(lot.form, 40)} at {tame(lot.location, 40)}{seams}",
        size=f"{size} ({inches})",
        heat=tame(lot.heat or "not on record", 40),
        certificate=f"EN 10204 {tame(lot.certificate, 40)}" if lot.certificate else "none on record",
        serves=serves,
    )
