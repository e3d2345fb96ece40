"""Filters on source, price and loss, in memory and in the store alike."""

from pathlib import Path

import pytest

from catalog.search.duty import loss_of, parse_duty
from catalog.search.list_reader import ListReader
from catalog.search.nearest_where import loses_at_most, nearest_where
from catalog.search.reader import Filters, Point
from catalog.storage.opening import open_store
from catalog.storage.store import Store

ASKED = Point(warp_aperture_mm=0.25, weft_aperture_mm=0.25, warp_wire_mm=0.16, weft_wire_mm=0.16, open_area_pct=37.18)


@pytest.fixture(scope="module")
def store(tmp_path_factory: pytest.TempPathFactory) -> Store:
    return open_store(tmp_path_factory.mktemp("trade") / "s.sqlite3")


def test_a_source_is_found_by_its_words_whatever_the_capitals(store: Store) -> None:
    found = store.select(Filters(source="iso 3310-1"))
    assert found
    assert all("iso 3310-1" in c.source.lower() for c in found)
    listed = ListReader(store.select(Filters()))
    assert [c.id for c in listed.select(Filters(source="iso 3310-1"))] == [c.id for c in found]


@pytest.mark.parametrize("words", ["100%", "a_b", "!", "'; DROP TABLE cloth; --"])
def test_signs_in_a_source_are_signs(store: Store, words: str) -> None:
    assert store.count(Filters(source=words)) == sum(words in c.source for c in store.select(Filters()))


def test_a_price_is_somebodys_offer(store: Store) -> None:
    cheap, dear = (store.count(Filters(most_price_minor_per_m2=price)) for price in (3000, 1_000_000))
    assert 0 < cheap < dear
    assert all(c.demo for c in store.select(Filters(most_price_minor_per_m2=1_000_000)))  # only the stockist sells
    assert len(store.nearest(ASKED, 5, Filters(most_price_minor_per_m2=1_000_000))) == 5


def test_the_nearest_that_lose_little_are_those_of_a_look_at_every_cloth(store: Store) -> None:
    duty = parse_duty("air 20 C 2 m/s")
    passes = loses_at_most(5.0, duty)
    found = nearest_where(store, ASKED, 7, passes)
    everything = ListReader(store.select(Filters())).nearest(ASKED, 10_000)
    assert [c.id for c, *_ in found] == [c.id for c, *_ in everything if passes(c)][:7]
    for cloth, *_ in found:
        loss = loss_of(cloth.construction, duty)
        assert loss is not None
        assert loss.K <= 5.0


def test_where_too_few_pass_all_of_them_are_told(store: Store, tmp_path: Path) -> None:
    passes = loses_at_most(0.05, parse_duty("air 20 C 2 m/s"))
    everything = ListReader(store.select(Filters())).nearest(ASKED, 10_000)
    assert len(nearest_where(store, ASKED, 500, passes)) == sum(passes(c) for c, *_ in everything)
