"""The tables as a whole: sources, units, ids, and what refers to what."""

from collections.abc import Mapping
from fractions import Fraction
from importlib.resources import files

import pytest

from catalog.reference import alloys, grades, sieves
from catalog.reference.rows import rows_of

TABLES = sorted(path.name.removesuffix(".csv") for path in files("seed_data").iterdir() if path.name.endswith(".csv"))
UNITS = ("_mm", "_in", "_um", "_pct", "_kg_m2", "_kg_m3", "_mpa", "_m2", "_days", "_per_m2", "_least", "_most")
TEXT = {"gauge", "heat", "location", "certificate", "seams", "demo", "in_e11", "received", "series", "minimum_m2"}
MM = {"mm": Fraction(1), "cm": Fraction(10), "in": Fraction("25.4")}
STAINLESS = {one.id for one in alloys.alloys() if "stainless" in one.family}
Row = Mapping[str, str]


def apertures_and_wires_mm(row: Row) -> list[tuple[Fraction, Fraction]]:
    """The openings of a row by definition: w = p − d, p = 25.4/n."""
    sides = []
    for figure, wire_text in ((row["warp_text"], row["warp_wire"]), (row["weft_text"], row["weft_wire"])):
        wire = Fraction(wire_text) * MM[row["wire_unit"]]
        if row["declared_by"] == "count":
            sides.append((MM[row["unit"]] / Fraction(figure) - wire, wire))
        else:
            sides.append((Fraction(figure) * MM[row["unit"]], wire))
    return sides


def open_area(row: Row) -> Fraction:
    (w1, d1), (w2, d2) = apertures_and_wires_mm(row)
    return w1 * w2 / ((w1 + d1) * (w2 + d2))


def is_square_or_rectangular(row: Row) -> bool:
    return row["weave"] in ("plain", "twilled")


CLOTHS = {row["id"]: row for row in rows_of("cloths")}
RACK = {row["cloth"] for row in rows_of("lots")}


@pytest.mark.parametrize("table", TABLES)
def test_every_row_has_a_source(table: str) -> None:
    assert rows_of(table)
    assert all(row["source"].strip() for row in rows_of(table))


@pytest.mark.parametrize("table", TABLES)
def test_every_row_has_all_columns_and_no_more(table: str) -> None:
    assert all(None not in row and None not in row.values() for row in rows_of(table))


@pytest.mark.parametrize("table", TABLES)
def test_a_figure_has_its_unit_in_a_column_or_in_the_columns_name(table: str) -> None:
    for row in rows_of(table):
        has_unit = bool(row.get("unit")) and bool(row.get("wire_unit", "mm"))
        figures = {name for name, text in row.items() if text.replace(".", "", 1).isdecimal()} - TEXT
        ids = {"id", "asked", "offered", "en_number", "cloth", "number"}
        bare = {name for name in figures - ids if not name.endswith(UNITS) and not has_unit}
        assert bare == set(), row


@pytest.mark.parametrize("table", ["cloths", "articles", "lots", "alloys"])
def test_an_id_is_there_once(table: str) -> None:
    ids = [row["id"] for row in rows_of(table)]
    assert len(ids) == len(set(ids))


@pytest.mark.parametrize("table", ["articles", "aliases", "lots"])
def test_what_is_sold_named_and_stored_is_a_cloth_of_the_catalogue(table: str) -> None:
    assert {row["cloth"] for row in rows_of(table)} <= set(CLOTHS)


def test_a_lot_belongs_to_an_article_of_its_own_cloth() -> None:
    cloth_of = {row["id"]: row["cloth"] for row in rows_of("articles")}
    assert all(cloth_of[row["article"]] == row["cloth"] for row in rows_of("lots"))


def test_every_cloth_is_of_an_alloy_in_the_table() -> None:
    assert {row["alloy"] for row in CLOTHS.values()} <= {one.id for one in alloys.alloys()}


def test_invented_rows_say_that_they_are() -> None:
    for table in ("cloths", "articles", "aliases", "lots"):
        for row in rows_of(table):
            assert (row["demo"] == "1") == row["source"].startswith("invented"), row


def test_nothing_is_stored_or_sold_that_is_not_invented() -> None:
    for table in ("articles", "aliases", "lots"):
        assert all(row["demo"] == "1" for row in rows_of(table))


def test_the_catalogue_has_every_test_sieve_and_every_inch_grade() -> None:
    sieve_cloth = {
        (Fraction(row["warp_text"]), Fraction(row["warp_wire"]))
        for row in CLOTHS.values()
        if row["standard"].startswith("ISO 3310-1")
    }
    assert sieve_cloth == {(sieve.opening_mm, sieve.wire_mm) for sieve in sieves.sieves()}
    for row in grades.rows():
        assert any(
            c["grade"] == row["grade"] and c["warp_text"] == row["mesh_per_in"] and c["warp_wire"] == row["wire_in"]
            for c in CLOTHS.values()
        ), row


def test_every_square_or_rectangular_cloth_can_be_woven() -> None:
    """A plain square weave jams at d/p = 1/√3 (Peirce 1937)."""
    for row in filter(is_square_or_rectangular, CLOTHS.values()):
        for aperture, wire in apertures_and_wires_mm(row):
            assert aperture > 0, row["id"]
            assert float(wire / (aperture + wire)) < 3**-0.5, row["id"]


def test_filter_cloth_has_a_rating_with_its_method_or_none_at_all() -> None:
    for row in CLOTHS.values():
        assert bool(row["rating_um"]) == bool(row["rating_kind"]) == bool(row["rating_method"]), row["id"]
        assert not (row["rating_um"] and is_square_or_rectangular(row)), row["id"]
        assert not (row["rating_um"] and row["weave"] == "reverse-plain-dutch"), row["id"]


def test_dutch_cloth_is_written_with_the_fewer_wires_in_the_warp_and_reverse_dutch_the_other_way() -> None:
    for row in CLOTHS.values():
        warp, weft = (Fraction(row[name]) for name in ("warp_text", "weft_text"))
        if row["weave"] in ("plain-dutch", "twilled-dutch"):
            assert warp < weft, row["id"]
        if row["weave"] == "reverse-plain-dutch":
            assert warp > weft, row["id"]


@pytest.mark.parametrize(
    ("count_or_mm", "wire", "alloy"),
    [
        ("62", "0.0065", "316L"),
        ("60", "0.0065", "316L"),
        ("0.25", "0.14", "316L"),
        ("60", "0.0075", "316L"),
        ("60", "0.0045", "316"),
        ("0.25", "0.16", "304"),
        ("24", "0.014", "304"),
        ("0.8", "0.32", "304"),
        ("20", "0.016", "304"),
    ],
)
def test_the_rack_holds_the_cloths_of_the_worked_examples(count_or_mm: str, wire: str, alloy: str) -> None:
    wanted = (count_or_mm, count_or_mm, wire, wire, alloy, "plain")
    names = ("warp_text", "weft_text", "warp_wire", "weft_wire", "alloy", "weave")
    assert any(tuple(CLOTHS[i][name] for name in names) == wanted for i in RACK)


def test_the_rack_does_not_hold_0_25_by_0_16_in_1_4404() -> None:
    for cloth in RACK:
        row = CLOTHS[cloth]
        if row["alloy"] == "316L" and is_square_or_rectangular(row):
            assert apertures_and_wires_mm(row) != [(Fraction("0.25"), Fraction("0.16"))] * 2


def test_no_stainless_cloth_on_the_rack_opens_at_most_0_8_at_45_percent_with_0_35_wire() -> None:
    def satisfies(row: Row) -> bool:
        sides = apertures_and_wires_mm(row)
        fits = all(w <= Fraction("0.8") and d >= Fraction("0.35") for w, d in sides)
        return fits and open_area(row) >= Fraction("0.45")

    rows = [CLOTHS[i] for i in RACK if is_square_or_rectangular(CLOTHS[i]) and CLOTHS[i]["alloy"] in STAINLESS]
    assert len(rows) > 50
    assert [row["id"] for row in rows if satisfies(row)] == []


def test_a_piece_on_the_rack_has_a_place_and_a_size() -> None:
    for row in rows_of("lots"):
        assert row["unit"] == "mm"
        assert int(row["width_mm"]) > 2 * int(row["selvedge_mm"]), row["id"]
        assert 0 <= int(row["reserved_mm"]) <= int(row["length_mm"]), row["id"]
        assert row["location"], row["id"]
        assert row["certificate"] in ("", "2.1", "2.2", "3.1", "3.2"), row["id"]


def test_remnant_r_117_is_there_as_it_lies() -> None:
    row = next(row for row in rows_of("lots") if row["id"] == "R-117")
    assert (row["width_mm"], row["length_mm"], row["selvedge_mm"], row["form"]) == ("1195", "2400", "15", "remnant")
    assert CLOTHS[row["cloth"]]["declared"].startswith("60 x 60 mesh .0065 316L")
    assert sum(row["id"].startswith("R-117") for row in rows_of("lots")) == 1


def test_what_lies_there_cost_less_than_it_sells_for() -> None:
    price = {row["id"]: Fraction(row["price_per_m2"]) for row in rows_of("articles")}
    assert all(Fraction(row["cost_per_m2"]) < price[row["article"]] for row in rows_of("lots"))


def test_customary_wire_of_an_inch_grade() -> None:
    """As commonly tabulated, from memory: market grade 60 is .0075, bolting cloth 60 is .0045."""
    assert grades.wire_in("market grade", 60) == Fraction("0.0075")
    assert grades.wire_in("tensile bolting cloth", 60) == Fraction("0.0045")
    assert grades.grades_of(60) == {
        "market grade": Fraction("0.0075"),
        "tensile bolting cloth": Fraction("0.0045"),
    }
    assert grades.wire_in("market grade", 61) is None
    assert all("from memory" in row["source"] for row in grades.rows())


@pytest.mark.parametrize(
    ("opening", "name"), [("0.258", "No. 60"), ("0.25", "No. 60"), ("200", "5 in."), ("0.001", "No. 635")]
)
def test_the_nearest_sieves_to_an_opening(opening: str, name: str) -> None:
    def ratio(sieve: sieves.Sieve) -> Fraction:
        share = sieve.opening_mm / Fraction(opening)
        return max(share, 1 / share)

    near = sieves.nearest(Fraction(opening))
    assert near[0].e11_name == name
    assert [s.opening_mm for s in near] == [s.opening_mm for s in sorted(sieves.sieves(), key=ratio)[:2]]
