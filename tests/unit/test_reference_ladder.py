"""The alloy ladder and the order of certificates: common practice of the trade, as the rows say."""

from itertools import product

import pytest

from catalog.reference import alloys, certificates
from catalog.reference.rows import rows_of

IDS = [one.id for one in alloys.alloys()]


@pytest.mark.parametrize("alloy_id", IDS)
def test_an_alloy_stands_in_for_itself(alloy_id: str) -> None:
    assert alloys.gate(alloy_id, alloy_id).outcome == "same"


def test_316l_for_304_is_accepted_with_a_note_on_strength_and_oxidising_acids() -> None:
    gate = alloys.gate("304", "316L")
    assert gate.outcome == "accepted"
    assert "strength" in gate.note
    assert "oxidising acids" in gate.note


@pytest.mark.parametrize(("asked", "offered"), [("316L", "304"), ("316", "304"), ("316L", "304L"), ("316Ti", "304")])
def test_a_grade_without_molybdenum_is_blocked_where_molybdenum_was_asked(asked: str, offered: str) -> None:
    gate = alloys.gate(asked, offered)
    assert gate.outcome == "blocked"
    assert "molybdenum" in gate.note


def test_1_4435_for_1_4404_goes_one_way_only() -> None:
    assert alloys.gate("316L", "1.4435").outcome == "accepted"
    assert alloys.gate("1.4435", "316L").outcome == "blocked"


@pytest.mark.parametrize(("low", "high"), [("304L", "304"), ("316L", "316")])
def test_low_carbon_is_accepted_for_high_and_the_other_way_is_a_question(low: str, high: str) -> None:
    assert alloys.gate(high, low).outcome == "accepted"
    assert alloys.gate(low, high).outcome == "ask"


@pytest.mark.parametrize("stainless", ["304", "316", "316L", "1.4435", "321", "904L"])
def test_duplex_is_a_question_either_way(stainless: str) -> None:
    assert alloys.gate(stainless, "2205").outcome == "ask"
    assert alloys.gate("2205", stainless).outcome == "ask"


def test_duplex_is_no_question_where_brass_was_asked() -> None:
    assert alloys.gate("CuZn30", "2205").outcome == "blocked"


def test_zinc_may_be_added_but_not_left_out() -> None:
    assert alloys.gate("CS", "GALV").outcome == "accepted"
    assert alloys.gate("GALV", "CS").outcome == "blocked"


def test_a_pair_that_nobody_listed_is_a_question_within_a_family_and_blocked_across() -> None:
    assert alloys.gate("304", "310").outcome == "ask"
    across = alloys.gate("316L", "CuSn6")
    assert across.outcome == "blocked"
    assert across.note == "austenitic stainless was asked, this is bronze"


def test_an_alloy_that_the_table_lacks_is_a_question_that_names_it() -> None:
    assert alloys.gate("1.4547", "316L").outcome == "ask"
    assert "1.4529" in alloys.gate("316L", "1.4529").note
    assert alloys.gate("1.4529", "1.4529").outcome == "same"


def test_every_pair_has_an_outcome_with_its_reason_and_source() -> None:
    for asked, offered in product(IDS, IDS):
        gate = alloys.gate(asked, offered)
        assert gate.outcome in alloys.OUTCOMES, (asked, offered)
        assert gate.note and gate.source and "{" not in gate.note, (asked, offered)  # noqa: PT018


def test_no_pair_of_two_families_is_accepted() -> None:
    family = {one.id: one.family for one in alloys.alloys()}
    for asked, offered in product(IDS, IDS):
        if family[asked] != family[offered]:
            assert alloys.gate(asked, offered).outcome in ("ask", "blocked"), (asked, offered)


def test_every_row_of_the_ladder_speaks_of_alloys_and_families_that_exist() -> None:
    names = {*IDS, "*", *(f"family {one.family}" for one in alloys.alloys())}
    for row in rows_of("alloy_ladder"):
        assert row["asked"] in names, row
        assert row["offered"] in names | {"same family"}, row
        assert row["outcome"] in alloys.OUTCOMES, row
    pairs = [(row["asked"], row["offered"]) for row in rows_of("alloy_ladder")]
    assert len(pairs) == len(set(pairs))


@pytest.mark.parametrize("name", ["stainless", "stainless steel", "brass", "bronze", "steel", "duplex", "nickel"])
def test_a_bare_family_is_no_alloy(name: str) -> None:
    assert alloys.find(name) is None


@pytest.mark.parametrize(
    "name", ["SS400", "type 400", "UNS 400", "W 304", "304N", "316LVM", "1.4529", "", " ", "()", "/"]
)
def test_a_name_that_only_looks_like_one_is_not_recognised(name: str) -> None:
    """SS400 is a Japanese structural steel (JIS G 3101), not alloy 400."""
    assert alloys.find(name) is None


@pytest.mark.parametrize(
    ("name", "alloy_id"),
    [
        ("1.4404 (316L)", "316L"),
        ("316L/1.4404", "316L"),
        ("X5CrNi18-10 (1.4301)", "304"),
        ("1.4401 X5CrNiMo17-12-2", "316"),
        ("S32205/S31803", "2205"),
        ("316L / 1.4435", "1.4435"),
        ("304/316", None),
        ("304/304L", None),
        ("304 or 316", None),
        ("316L / unobtainium", None),
    ],
)
def test_two_names_count_where_they_agree(name: str, alloy_id: str | None) -> None:
    found = alloys.find(name)
    assert (found.id if found else None) == alloy_id


@pytest.mark.parametrize("alloy_id", IDS)
def test_every_alloy_is_found_by_its_id_and_by_each_of_its_numbers(alloy_id: str) -> None:
    one = alloys.alloy(alloy_id)
    assert one is not None
    assert alloys.find(alloy_id) is one
    for number in one.en_numbers:
        assert alloys.find(number) is one


def test_a_pull_of_the_magnet_does_not_rule_drawn_304_out() -> None:
    one, other = alloys.alloy("304"), alloys.alloy("430")
    assert one is not None
    assert other is not None
    assert one.attracts_magnet is None
    assert "drawn" in one.magnetic
    assert other.attracts_magnet is True


def test_a_tensile_range_has_a_source_and_its_ends_in_order() -> None:
    ranges = [one for one in alloys.alloys() if one.tensile_mpa]
    assert ranges
    for one in ranges:
        assert one.tensile_mpa is not None
        assert one.tensile_mpa[0] < one.tensile_mpa[1]
        assert "from memory of EN 10088-3" in one.tensile_source


@pytest.mark.parametrize(
    ("offered", "asked", "enough"),  # EN 10204: 2.1 and 2.2 by the maker, 3.1 with test results, 3.2 countersigned
    [("2.2", "3.1", False), ("3.1", "3.1", True), ("3.2", "3.1", True), ("3.1", "2.2", True), ("2.1", "2.2", False)],
)
def test_a_certificate_meets_those_below_it(offered: str, asked: str, enough: bool) -> None:
    assert certificates.meets(offered, asked) is enough


def test_a_certificate_that_is_not_of_the_standard_cannot_be_judged() -> None:
    assert certificates.meets("", "3.1") is None
    assert certificates.meets("3.1", "works letter") is None
