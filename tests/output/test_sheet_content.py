"""What a substitution sheet says: required, offered, differences with sign, what hurts, what was assumed, who signs.

Figures are exact sums from w = p − d: 60 per inch with 0.0065 in opens 25.4/60 − 0.1651 = 0.25823 mm, against
0.25 asked +8.2 µm or +3.3 %; T = 12.5 µm (5 % of 250 µm, wider than Y of ASTM E11-17).
"""

from dataclasses import replace
from datetime import date

import pytest
from sheet_making import DECK, DETAILS, REMNANT, ROLL, SIXTY, asked, by_count, sheet

from catalog.errors import InputError, NotFoundError
from catalog.report.fingerprint import changed_since, fingerprint, grouped
from catalog.report.sheet import DEMO, TO_FILL_IN, DeviationKind, Sheet, build_sheet
from catalog.report.sheet_rows import Row
from catalog.target import Purpose


def figure(made: Sheet, name: str) -> Row:
    return next(row for row in made.figures if row.name == name)


def test_a_difference_is_shown_with_its_sign_and_its_limit() -> None:
    aperture = figure(sheet(), "Aperture")
    assert aperture.required.startswith("0.25 mm (0.0098 in)")
    assert aperture.offered.startswith("0.2582 mm (0.0102 in)")
    assert aperture.difference == "+3.3 % (+8.2 µm)"
    assert aperture.limit == "±12.5 µm: within"


def test_a_smaller_opening_has_a_true_minus_sign() -> None:
    # 25.4/62 − 0.1651 = 0.24458 mm: 5.4 µm or 2.2 % less than 0.25
    assert figure(sheet(by_count(62, "0.0065")), "Aperture").difference == "−2.2 % (−5.4 µm)"


@pytest.mark.parametrize(
    ("purpose", "count", "said"),
    [
        (Purpose.RETAIN, 60, "hurts retain"),
        (Purpose.PASS, 60, "to the harmless side"),
        (Purpose.RETAIN, 62, "to the harmless side"),
        (Purpose.PASS, 62, "hurts pass"),
        (Purpose.SIZE, 62, "hurts size"),
    ],
)
def test_the_purpose_decides_which_way_a_difference_hurts(purpose: Purpose, count: int, said: str) -> None:
    made = sheet(by_count(count, "0.0065"), "0,25/0,16 1.4404 plain", purpose)
    assert figure(made, "Aperture").hurts == said


def test_a_thinner_wire_hurts_strength_and_not_retention() -> None:
    thin = by_count(62, "0.0055")
    assert figure(sheet(thin, "0,25/0,16 1.4404 plain", Purpose.STRENGTH), "Wire").hurts == "hurts strength"
    assert figure(sheet(thin, "0,25/0,16 1.4404 plain", Purpose.RETAIN), "Wire").hurts == "to the harmless side"


def test_every_limit_names_where_it_comes_from() -> None:
    aperture = next(note for note in sheet().findings if note.text.startswith("Aperture"))
    assert aperture.source.startswith("house rule")
    assert "5 % of the aperture" in aperture.source


def test_what_is_not_met_is_read_first() -> None:
    stands = [note.stand for note in sheet(by_count(60, "0.0045", "304")).findings]
    assert "not met" in stands
    assert stands == sorted(stands, key=["not met", "open", "met"].index)


def test_a_harm_side_is_cautioned_against_even_within_the_limit() -> None:
    assert any("measure the roll" in text for text in sheet().cautions)
    assert not sheet(by_count(62, "0.0065")).cautions


def test_a_guard_is_cautioned_and_deferred_to_the_engineer() -> None:
    made = sheet(SIXTY, "0,25/0,16 1.4404 plain", Purpose.GUARD)
    assert any("ISO 13857" in text and "engineer" in text for text in made.cautions)


def test_the_wording_defers_to_the_engineer_who_signs() -> None:
    made = sheet()
    assert "approves nothing" in made.deference
    assert "engineer responsible" in made.deference
    assert [line.name.split(":")[0] for line in made.signatures] == ["Requested", "Technical approval", "Quality"]


@pytest.mark.parametrize(
    ("kind", "said"),
    [
        (DeviationKind.PERMIT, "deviation permit (before supply)"),
        (DeviationKind.CONCESSION, "concession (after supply)"),
    ],
)
def test_before_supply_it_is_a_permit_and_after_supply_a_concession(kind: DeviationKind, said: str) -> None:
    made = sheet(kind=kind)
    assert said in made.title
    assert said in [line.text for line in made.order]


def test_quantity_and_validity_are_limited_or_left_to_be_filled_in() -> None:
    order = {line.name: line.text for line in sheet().order}
    # 350 mm = 350/25.4 = 13.78 in
    assert order["Quantity"] == "12 discs Ø 350 mm (13.78 in); no more than this"
    assert order["Valid until"] == "2027-03-31"
    bare = {line.name: line.text for line in sheet(text="0,25/0,16 1.4404 plain", valid_until=None).order}
    assert bare["Quantity"] == bare["Valid until"] == TO_FILL_IN


def test_stock_comes_with_heat_certificate_and_what_is_free() -> None:
    by_lot = {row.lot: row for row in sheet().lots}
    remnant, roll = by_lot["R-117"], by_lot["L-9"]
    assert (remnant.heat, remnant.certificate) == ("H47110", "EN 10204 3.1")
    # 1195 − 2·15 = 1165 mm = 45.9 in; 2400 mm = 7.9 ft
    assert remnant.size == "1165 mm × 2.40 m (45.9 in × 7.9 ft)"
    assert remnant.serves.startswith("serves: 12")
    # 21 m on the roll less 5 m reserved
    assert "16.00 m" in roll.size
    assert (roll.heat, roll.certificate) == ("not on record", "none on record")


def test_only_the_lots_that_are_offered_are_listed() -> None:
    assert [row.lot for row in sheet(lots=("L-9",)).lots] == ["L-9"]


def test_a_lot_of_another_cloth_is_refused() -> None:
    with pytest.raises(NotFoundError, match="X-1"):
        sheet(lots=("X-1",))


def test_what_was_assumed_is_said() -> None:
    answer, candidate = asked(SIXTY, "0.25 mm aperture, 0.16 mm wire")
    made = build_sheet(replace(answer, targets=(replace(answer.targets[0], purposes=()),)), candidate, DETAILS)
    said = " ".join(made.assumed)
    for words in (
        "Weave not stated: plain",
        "Tolerance not stated: ±12.5 µm",
        "Purpose not stated",
        "Alloy not stated",
    ):
        assert words in said


def test_a_figure_nobody_asked_for_is_shown_and_said_not_to_be_asked() -> None:
    wire = figure(sheet(SIXTY, "aperture 0.25 mm, plain weave, 316L"), "Wire")
    assert (wire.required, wire.difference, wire.hurts) == ("not asked", "", "")
    assert wire.offered == "0.1651 mm (0.0065 in)"


def test_invented_cloth_and_invented_rolls_make_a_demo_sheet() -> None:
    answer, candidate = asked(SIXTY, lots=(replace(REMNANT, demo=True), ROLL))
    assert build_sheet(answer, candidate, DETAILS).is_demo
    assert not build_sheet(answer, candidate, replace(DETAILS, lots=("L-9",))).is_demo
    assert sheet(replace(SIXTY, demo=True)).is_demo
    assert "INVENTED" in DEMO


def test_a_fingerprint_stays_while_the_data_stay() -> None:
    again = fingerprint(*asked(by_count(60, "0.0065")))
    assert fingerprint(*asked()) == again
    assert len(again) == 64


def test_rolls_that_come_and_go_leave_the_fingerprint_alone() -> None:
    assert not changed_since(fingerprint(*asked()), *asked(lots=(ROLL,)))


@pytest.mark.parametrize(
    "changed",
    [
        by_count(60, "0.0066"),
        replace(SIXTY, declared="60 mesh"),
        replace(SIXTY, source="another list"),
        replace(SIXTY, construction=replace(SIXTY.construction, alloy="316")),
        replace(SIXTY, figures=replace(SIXTY.figures, mass_kg_m2=0.9)),
    ],
    ids=["wire", "as sold", "source", "alloy", "mass"],
)
def test_a_sheet_notices_that_its_cloth_has_changed(changed: object) -> None:
    assert changed_since(fingerprint(*asked()), *asked(changed))  # type: ignore[arg-type]


@pytest.mark.parametrize(
    ("text", "purpose"), [("0,25/0,17 1.4404 plain, 12 discs Ø 350", Purpose.RETAIN), (DECK, Purpose.PASS)]
)
def test_a_sheet_notices_that_something_else_is_asked(text: str, purpose: Purpose) -> None:
    assert changed_since(fingerprint(*asked()), *asked(SIXTY, text, purpose))


def test_a_fingerprint_can_be_typed_from_paper() -> None:
    printed = grouped(fingerprint(*asked()))
    assert not changed_since(printed.upper(), *asked())
    assert not changed_since(printed[:13], *asked())
    with pytest.raises(InputError, match="12"):
        changed_since(printed[:8], *asked())
    with pytest.raises(InputError, match="hexadecimal"):
        changed_since("no fingerprint at all", *asked())


def test_dates_are_written_so_that_nobody_turns_day_and_month_round() -> None:
    assert sheet(dated=date(2026, 3, 4)).heading[1].text == "2026-03-04"
