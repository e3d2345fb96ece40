"""A long catalogue is searched through boxes; the roll is named as if every cloth had been looked at.

The expectation is the plain way: every cloth of the catalogue, one by one.
"""

import random
from dataclasses import replace

import pytest
from simulated_rolls import measure, seed_cloths

from catalog.errors import InputError
from catalog.search.evidence import Evidence, evidence_of
from catalog.search.identify import Identification, identify
from catalog.search.list_reader import ListReader
from catalog.search.shortlist import shortlist

CLOTHS = seed_cloths()
READER = ListReader(CLOTHS)


def named(result: Identification) -> dict[str, float]:
    return {one.cloth.id: round(one.odds, 9) for one in result.candidates if one.odds > 0}


def through_boxes(evidence: Evidence, monkeypatch: pytest.MonkeyPatch) -> dict[str, float]:
    monkeypatch.setattr("catalog.search.shortlist.SMALL", 0)
    monkeypatch.setattr("catalog.search.shortlist.PLENTY", 0)
    monkeypatch.setattr("catalog.search.shortlist.ENOUGH", 0)
    return named(identify(shortlist(READER, evidence), evidence, limit=len(CLOTHS)))


@pytest.mark.parametrize("made_within_pct", [0.0, 2.0])
def test_the_boxes_leave_out_no_cloth_that_could_be_named(
    made_within_pct: float, monkeypatch: pytest.MonkeyPatch
) -> None:
    dice = random.Random(1953)
    rolls = [replace(measure(dice.choice(CLOTHS), dice), made_within_pct=made_within_pct) for _ in range(60)]
    for evidence in rolls:
        assert through_boxes(evidence, monkeypatch) == named(identify(CLOTHS, evidence, limit=len(CLOTHS)))


def test_few_spaces_leave_a_wide_and_lopsided_range_of_pitches(monkeypatch: pytest.MonkeyPatch) -> None:
    """One space in 2 mm: anything from 2/1.5 = 1.33 mm to 2/0.5 = 4 mm (arithmetic)."""
    evidence = evidence_of(count="1 in 2 mm")
    found = through_boxes(evidence, monkeypatch)
    expected = {
        c.id
        for c in CLOTHS
        if any(2 / 1.5 <= float(w.pitch_mm) <= 4 for w in (c.construction.warp, c.construction.weft))
    }
    assert set(found) == expected


def test_a_magnet_alone_names_nothing_in_a_long_catalogue(monkeypatch: pytest.MonkeyPatch) -> None:
    monkeypatch.setattr("catalog.search.shortlist.SMALL", 10)
    with pytest.raises(InputError, match="names none"):
        shortlist(READER, evidence_of(magnetic="yes"))
