"""Wire gauges against the library fluids 1.3.1, which cites Machinery's Handbook (2012).

Its keys are traps: its 'SWG' is the US steel wire gauge, its 'BSWG' is what the UK calls SWG, and its 'SSWG' is the
gauge of drill rod. Its BSWG 28 reads .0149; BS 3737 has .0148 (from memory): the one exception.
"""

from fractions import Fraction

import pytest
from fluids.piping import wire_schedules

from catalog.reference import gauges

LIBRARY_KEY = {"SWG": "BSWG", "BWG": "BWG", "AWG": "AWG", "USSWG": "SWG", "MUSIC": "MWG", "STUBS": "SSWG"}
ZEROS = {0.143: "7/0", 0.167: "6/0", 0.2: "5/0", 0.25: "4/0", 0.33: "3/0", 0.5: "2/0"}
"""The library writes 7/0 as 1/7, rounded."""
EXCEPTION = ("SWG", "28")


def library_rows() -> list[tuple[str, str, float]]:
    return [
        (ours, ZEROS.get(number, f"{number:g}"), inches)
        for ours, theirs in LIBRARY_KEY.items()
        for number, inches in zip(*wire_schedules[theirs][:2], strict=True)
    ]


def test_every_gauge_of_the_library_has_the_same_diameter() -> None:
    wrong = [
        (system, gauge, inches, gauges.diameter_in(system, gauge))
        for system, gauge, inches in library_rows()
        if (system, gauge) != EXCEPTION and float(gauges.diameter_in(system, gauge) or 0) != inches
    ]
    assert wrong == []


def test_we_hold_no_gauge_that_the_library_lacks() -> None:
    ours = {(row["system"], row["gauge"]) for row in gauges.rows()}
    assert ours == {(system, gauge) for system, gauge, _ in library_rows()}
    assert len(ours) == 342


def test_number_28_imperial_is_a_tenth_of_a_thou_below_the_librarys_slip() -> None:
    assert gauges.diameter_in(*EXCEPTION) == Fraction("0.0148")  # BS 3737, from memory
    assert wire_schedules["BSWG"][1][wire_schedules["BSWG"][0].index(28.0)] == 0.0149


@pytest.mark.parametrize(
    ("system", "inches"),  # Machinery's Handbook (2012)
    [("USSWG", "0.0140"), ("SWG", "0.0124"), ("BWG", "0.0120"), ("AWG", "0.0100")],
)
def test_number_30_is_another_wire_in_each_of_four_systems(system: str, inches: str) -> None:
    assert abs(gauges.readings("30")[system] - Fraction(inches)) < Fraction(1, 20000)


def test_american_gauge_follows_its_defining_progression() -> None:
    """Definition (ASTM B258): No. 36 is .005 in, 4/0 is .46 in, 39 equal steps between; listed to a tenth of a thou."""
    for number in range(41):
        defined = 0.005 * 92 ** ((36 - number) / 39)
        assert float(gauges.diameter_in("AWG", str(number)) or 0) == pytest.approx(defined, abs=6e-5)


@pytest.mark.parametrize("system", ["SWG", "BWG", "AWG", "USSWG", "STUBS"])
def test_a_higher_number_is_a_thinner_wire(system: str) -> None:
    inches = [row["diameter_in"] for row in gauges.rows() if row["system"] == system]
    assert inches == sorted(inches, reverse=True)


def test_music_wire_counts_the_other_way() -> None:
    thin, thick = gauges.diameter_in("MUSIC", "5"), gauges.diameter_in("MUSIC", "40")
    assert thin is not None
    assert thick is not None
    assert thin < thick


def test_millimetres_are_the_inches_times_25_4() -> None:
    for row in gauges.rows():
        assert Fraction(str(row["diameter_mm"])) == Fraction(str(row["diameter_in"])) * Fraction("25.4")
