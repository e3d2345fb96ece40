"""Each rule of the audit finds what it is for, names it, and lets sound cloth pass."""

from dataclasses import replace
from fractions import Fraction as F

import pytest

from catalog.cloth import Cloth
from catalog.construction import Construction, Weave, Wires
from catalog.figures import figures
from catalog.search.audit import audit

INCH = F(127, 5)


def cloth(pitch: F, wire: F, name: str = "x", system: str = "inch", **stated: object) -> Cloth:
    made = Construction(Weave.PLAIN, Wires(pitch, wire), Wires(pitch, wire), "304")
    built = Cloth(name, name, made, figures(made, 7900.0), name, system, "test")
    return replace(built, **stated)  # type: ignore[arg-type]


SIXTY = cloth(INCH / 60, F("0.0065") * INCH)  # aperture 0.25823 mm, open area 37.2 %, 0.823 kg/m² at 7900


def rules_of(*cloths: Cloth) -> set[str]:
    return {oddity.rule for oddity in audit(cloths)}


def test_sound_cloth_passes() -> None:
    sound = replace(SIXTY, stated_aperture_mm=0.258, stated_count_per_in=60.0, stated_open_area_pct=37.2)
    assert not rules_of(replace(sound, stated_mass_kg_m2=0.83))


@pytest.mark.parametrize(
    ("odd", "rule"),
    [
        (replace(SIXTY, stated_aperture_mm=0.30), "p ≠ w + d"),
        (replace(SIXTY, stated_aperture_mm=0.1651), "aperture and wire swapped"),
        (replace(SIXTY, stated_count_per_in=50.0), "count does not follow"),
        (replace(SIXTY, stated_open_area_pct=45.0), "open area does not follow"),
        (replace(SIXTY, stated_mass_kg_m2=1.6), "mass does not follow"),
        (cloth(F("0.125"), F("0.050"), stated_count_per_in=200.0), "sieve number as count"),
        (cloth(INCH / 12, F("0.063") * INCH), "can't be woven"),
        (cloth(INCH / 2, F("10")), "gauge number as wire"),
        (cloth(INCH / 60, F("0.0075")), "open area over 95 %"),
        (cloth(F(1), F("0.369")), "wire of no known size"),
    ],
    ids=lambda value: value if isinstance(value, str) else "",
)
def test_an_oddity_is_named(odd: Cloth, rule: str) -> None:
    assert rule in rules_of(odd)


@pytest.mark.parametrize(("factor", "words"), [(25.4, "25.4"), (1000, "1000"), (10, "10")])
def test_a_slipped_unit_is_recognised_by_its_factor(factor: float, words: str) -> None:
    (found,) = audit([replace(SIXTY, stated_aperture_mm=0.25823 * factor)])
    assert f"factor {words}" in found.repair


def test_filter_cloth_has_no_opening_and_no_open_area() -> None:
    made = Construction(Weave.PLAIN_DUTCH, Wires(INCH / 24, F("0.36")), Wires(INCH / 110, F("0.25")), "304")
    built = Cloth("d", "d", made, figures(made, 7900.0), "d", "inch", "test")
    odd = replace(built, stated_open_area_pct=0.0, stated_aperture_mm=0.12)
    assert rules_of(odd) == {"filter cloth with an open area", "filter cloth with a square opening"}
    loose = Construction(Weave.PLAIN_DUTCH, Wires(INCH / 24, F("0.36")), Wires(INCH / 60, F("0.25")), "304")
    assert "close packing out of range" in rules_of(replace(built, construction=loose))


def test_one_cloth_under_two_unit_systems_is_listed_twice() -> None:
    inch = cloth(INCH / 100, F("0.0045") * INCH, "a")
    metric = cloth(F("0.254"), F("0.1143"), "b", "metric")
    assert rules_of(inch, metric) == {"listed twice"}
