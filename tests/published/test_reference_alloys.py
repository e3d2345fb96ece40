"""Alloys against outside figures: elements by the library periodictable, designations by EN, UNS and JIS."""

import periodictable
import pytest

from catalog.reference import alloys

# The metal as traded is not the pure element: nickel 200 is 8890, nickel 8908; titanium is given as 4506 to 4540.
ELEMENTS = {
    "Mo": "Mo",
    "W": "W",
    "Cu-ETP": "Cu",
    "Ni200": "Ni",
    "Ni201": "Ni",
    "Al1350": "Al",
    "TiGr1": "Ti",
    "TiGr2": "Ti",
}


@pytest.mark.parametrize(("alloy_id", "element"), ELEMENTS.items())
def test_the_density_of_an_unalloyed_metal_is_that_of_the_element(alloy_id: str, element: str) -> None:
    published = periodictable.elements.symbol(element).density * 1000
    assert alloys.density_kg_m3(alloy_id) == pytest.approx(published, rel=0.007 if element == "Ti" else 0.003)


@pytest.mark.parametrize(
    ("alloy_id", "kg_m3"),  # EN 10088-1 as restated by a secondary page
    [("304", 7900), ("304L", 7900), ("316", 8000), ("316L", 8000), ("321", 7900), ("430", 7700), ("2205", 7800)],
)
def test_stainless_densities_are_those_of_en_10088_1(alloy_id: str, kg_m3: float) -> None:
    assert alloys.density_kg_m3(alloy_id) == kg_m3


def test_brass_is_denser_than_a_mixing_rule_says() -> None:
    """70/30 brass: handbook .308 lb/in³, 8.53 g/cm³; copper and zinc mixed by volume of the elements give 8.32."""
    copper = periodictable.elements.symbol("Cu").density
    zinc = periodictable.elements.symbol("Zn").density
    mixed = 1000 / (0.7 / copper + 0.3 / zinc)
    density = alloys.density_kg_m3("CuZn30")
    assert density == pytest.approx(0.308 * 453.59237 / 2.54**3 * 1000, rel=0.001)
    assert density is not None
    assert density > mixed * 1.02


def test_brasses_get_lighter_with_zinc_and_bronzes_with_tin() -> None:
    """Zinc and tin are lighter than copper (periodictable): the order is certain where figures are from memory."""
    copper = periodictable.elements.symbol("Cu").density
    assert periodictable.elements.symbol("Zn").density < copper > periodictable.elements.symbol("Sn").density
    row = [alloys.density_kg_m3(name) or 0 for name in ("Cu-ETP", "CuZn10", "CuZn20", "CuZn30", "CuZn37")]
    assert row == sorted(row, reverse=True)
    assert (alloys.density_kg_m3("CuSn5") or 0) > (alloys.density_kg_m3("CuSn6") or 0)


@pytest.mark.parametrize(
    ("names", "alloy_id"),  # EN 10088-1, UNS and JIS G 4303 as commonly cross-listed
    [
        ("304, T304, T-304, TYPE 304, AISI 304, SS304, 304 SS, aisi304, 304ss, tp 304, stainless 304", "304"),
        ("1.4301, W1.4301, Werkst. 1.4301, W.-Nr. 1.4301, EN 1.4301, X5CrNi18-10, x5 CrNi 18-10", "304"),
        ("SUS304, SUS 304, S30400, UNS S30400", "304"),
        ("304L, 304 L, 1.4307, 1.4306, S30403, SUS304L, X2CrNi18-9, X2CrNi19-11", "304L"),
        ("316, T316, 1.4401, S31600, SUS316, X5CrNiMo17-12-2", "316"),
        ("316L, 316-L, 1.4404, Werkst. 1.4404, S31603, SUS316L, X2CrNiMo17-12-2", "316L"),
        ("316Ti, 316TI, 1.4571, S31635, X6CrNiMoTi17-12-2", "316Ti"),
        ("302, 1.4310, S30200, SUS302", "302"),
        ("310S, 1.4845, S31008", "310S"),
        ("321, 1.4541, S32100", "321"),
        ("430, 1.4016, S43000, X6Cr17", "430"),
        ("904L, 1.4539, N08904, alloy 904L", "904L"),
        ("2205, duplex 2205, 1.4462, S32205, S31803, X2CrNiMoN22-5-3", "2205"),
        ("alloy 400, 2.4360, N04400, UNS N04400, NiCu30Fe, NW4400", "400"),
        ("alloy 600, 2.4816, N06600, NCF600", "600"),
        ("alloy 625, 2.4856, N06625, UNS N06625", "625"),
        ("C-276, C276, alloy C-276, alloy C276, 2.4819, N10276", "C-276"),
        ("nickel 200, Ni 200, N02200, 2.4060, 2.4066", "Ni200"),
        ("CuZn10, CW501L, C22000, 90/10 brass", "CuZn10"),
        ("CuZn30, CW505L, C26000, brass 70/30, 70/30 brass", "CuZn30"),
        ("CuZn37, CW508L, C27400", "CuZn37"),
        ("CuSn6, CuSn 6, CW452K, C51900", "CuSn6"),
        ("copper, Cu, C11000, CW004A", "Cu-ETP"),
        ("EN AW-5056A, A95056, AlMg5", "Al5056"),
        ("titanium grade 2, Ti grade 2, 3.7035, R50400", "TiGr2"),
        ("65Mn, 65 Mn, 65mn", "65Mn"),
    ],
)
def test_one_alloy_has_many_spellings(names: str, alloy_id: str) -> None:
    found = {name: alloys.find(name) for name in names.split(", ")}
    assert {name: one.id if one else None for name, one in found.items()} == dict.fromkeys(found, alloy_id)
