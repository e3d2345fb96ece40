"""Where a use is stated that geometry never settles, the usual caution stands, and defers."""

import pytest

from catalog.aiming import aim
from catalog.callout.reading import Reading
from catalog.search.cautions import cautions
from catalog.target import Purpose

CLOTH = Reading("cloth")


@pytest.mark.parametrize(
    ("text", "says"),
    [
        ("10 mesh .025 304 for machine guarding", "Machine guard"),
        ("Schutzgitter 10/2 1.4301", "Machine guard"),
        ("60 x .0065 flame arrestor element", "type-tested"),
        ("250 µm ISO 3310-1", "certified to ISO 3310-1"),
        ("No. 60 test sieve, certified", "certified to ISO 3310-1"),
        ("0,25/0,16 1.4404 food contact", "prescribed"),
        ("24 x 110 PDW pressure filter 10 bar", "Pressure"),
    ],
)
def test_a_stated_use_calls_for_its_caution(text: str, says: str) -> None:
    said = cautions(aim(CLOTH), text)
    assert any(says in line for line in said)
    assert all("Local codes" in line for line in said)


def test_no_use_no_caution() -> None:
    assert cautions(aim(CLOTH), "60 x 60 mesh .0075 304 wire cloth, 36 in wide") == ()


def test_a_guard_as_purpose_is_enough() -> None:
    assert "Machine guard" in cautions(aim(CLOTH, (Purpose.GUARD,)), "10 mesh")[0]
