"""Grades imply a wire: market grade and bolting cloth by custom, each count its own.
TBC is bolting cloth or 'to be confirmed'.
"""

from fractions import Fraction

from catalog.callout.rules.draft import POSSIBLE, USUAL, Claim, Draft, Option
from catalog.reference import grades
from catalog.units import MM_PER_INCH, Length

BOLTING = "tensile bolting cloth"
TABLED = ("market grade", BOLTING)


def grade_wires(draft: Draft) -> None:
    """Bring the grade's wire where the text states none; a grade without a table brings nothing."""
    if draft.grade is None:
        return
    count = _count(draft)
    wire_stated = draft.has_slot("wire")
    name = BOLTING if draft.grade == "TBC" else draft.grade
    inches = grades.wire_in(name, count) if count is not None and name in TABLED else None
    if draft.grade == "TBC":
        _to_be_confirmed(draft, inches, wire_stated)
    elif wire_stated:
        return
    elif inches is None:
        draft.note(f"{draft.grade}: its wire isn't in the tables held here")
    else:
        draft.claims.append(_custom_wire(inches))
        draft.note(_said(draft.grade, inches))


def _count(draft: Draft) -> Fraction | None:
    pitch = next((c.warp for c in draft.claims if c.by_count and c.warp and c.weft and c.warp.mm == c.weft.mm), None)
    return MM_PER_INCH / pitch.mm if pitch else None


def _custom_wire(inches: Fraction) -> Claim:
    wire = Length(inches * MM_PER_INCH)
    return Claim("wire", wire, wire, by_custom=True)


def _said(grade: str, inches: Fraction) -> str:
    return f"{grade}: wire {float(inches):.4f} in by custom (from memory; check against the grade table in force)"


def _to_be_confirmed(draft: Draft, inches: Fraction | None, wire_stated: bool) -> None:
    """'60 TBC' is bolting cloth, whose wire custom knows, or something that is to be confirmed."""
    draft.grade = None
    open_option = Option("'to be confirmed'", (), POSSIBLE, missing=("what is to be confirmed",), sense="abbreviation")
    claims = () if wire_stated or inches is None else (_custom_wire(inches),)
    notes = (_said(BOLTING, inches),) if inches is not None and not wire_stated else ()
    draft.choices.append(
        [Option(BOLTING, claims, USUAL, notes=notes, grade=BOLTING, sense="abbreviation"), open_option]
    )
