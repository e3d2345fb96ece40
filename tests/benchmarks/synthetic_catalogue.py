"""A synthetic catalogue of any size, the same each time: inch and metric cloth as a stockist's list has it.

Seven in ten are square, one in ten is rectangular, a tenth twilled, a tenth filter cloth. Counts and wires are
round in the system they are sold in, so that many cloths are alike, in several alloys, as in real lists.
"""

import random
from collections.abc import Iterator
from fractions import Fraction
from itertools import islice
from math import exp, log
from pathlib import Path
from typing import Any

from sqlalchemy import insert

from catalog.cloth import Cloth, Figures, Rating
from catalog.construction import Construction, Weave, Wires
from catalog.figures import DERIVATION_VERSION, figures
from catalog.storage.creating import seed_meta, sign
from catalog.storage.engine import sqlite_engine
from catalog.storage.migrating import upgrade
from catalog.storage.rows import Declared, row_of_cloth
from catalog.storage.tables import cloth as cloths

SEED = 20_260
BATCH = 10_000
RARE = "C-276"
ALLOYS = {
    "304": 300,
    "316L": 200,
    "316": 120,
    "carbon steel": 80,
    "galvanized": 60,
    "430": 40,
    "310": 40,
    "321": 30,
    "brass": 30,
    "phosphor bronze": 30,
    "904L": 20,
    "2205": 20,
    "alloy 400": 15,
    "nickel 200": 10,
    "alloy 600": 4.8,
    RARE: 0.2,
}
WEAVES = {
    Weave.PLAIN: 78,
    Weave.TWILLED: 12,
    Weave.PLAIN_DUTCH: 4,
    Weave.TWILLED_DUTCH: 4,
    Weave.REVERSE_PLAIN_DUTCH: 2,
}
THOU_TENTH = Fraction(254, 100_000)
PLAUSIBLE = Figures(None, None, None, 1.5, 1.5, 1.0)
"""Of filter cloth: what can be woven is no question here."""
DECLARED = Declared("pitch", "as in pitch", "as in pitch", "mm", "as in wire", "as in wire", "mm")


def make(path: Path, size: int) -> Path:
    """Write a store of *size* cloths to *path*, unless it is there. Indexes are built at the end."""
    if path.exists():
        return path
    draft = path.with_suffix(".draft")
    draft.unlink(missing_ok=True)
    draft.touch()
    engine = sqlite_engine(draft)
    upgrade(engine)
    with engine.connect() as bare, bare.execution_options(is_writer=True).begin():
        seed_meta(bare, with_demo=False)
        for index in cloths.indexes:
            index.drop(bare)
        rows = synthetic_rows(size)
        while batch := list(islice(rows, BATCH)):
            bare.execute(insert(cloths), batch)
        for index in sorted(cloths.indexes, key=lambda index: str(index.name)):
            index.create(bare)
    sign(engine, logs_ahead=True)
    engine.dispose()
    return draft.rename(path)


def synthetic_rows(size: int) -> Iterator[dict[str, Any]]:
    """The rows; alike makes are computed once, which is what makes a million bearable."""
    dice = random.Random(SEED)
    known: dict[Construction, dict[str, Any]] = {}
    for number in range(size):
        make, rating = _make(dice)
        row = known.get(make)
        if row is None:
            row = known[make] = row_of_cloth(_cloth(make, None), DECLARED, DERIVATION_VERSION)
        yield {
            **row,
            "id": f"S{number * 7919 % 10_000_019:08}",
            "alloy": dice.choices(list(ALLOYS), list(ALLOYS.values()))[0],
            "rating_um": rating,
            "rating_kind": rating and "nominal",
            "rating_method": rating and "",
            "ln_rating": rating and log(rating),
        }
        if len(known) > 200_000:
            known.clear()


def _make(dice: random.Random) -> tuple[Construction, float | None]:
    weave = dice.choices(list(WEAVES), list(WEAVES.values()))[0]
    is_inch = dice.random() < 0.5
    warp = _wires(dice, is_inch, 0.6)
    if not weave.is_filter:
        weft = _wires(dice, is_inch, 0.6, near=warp) if dice.random() < 0.12 else warp
        return Construction(weave, warp, weft), None
    fine = Wires(warp.pitch_mm / dice.choice((4, 5, 6, 8)), warp.wire_mm * Fraction(dice.choice((6, 7, 8)), 10))
    rating = dice.choice((None, 5.0, 10.0, 15.0, 25.0, 40.0, 63.0, 100.0))
    return Construction(weave, warp, fine), rating


def _wires(dice: random.Random, is_inch: bool, spread: float, near: Wires | None = None) -> Wires:
    """Round figures in the system: counts to the half, wires to a tenth of a thou, or mm to three digits."""
    pitch = exp(dice.uniform(log(0.05), log(60.0))) if near is None else float(near.pitch_mm)
    if near is not None:
        pitch *= exp(dice.gauss(0.0, spread))
    share = min(max(exp(dice.gauss(log(0.37), 0.28)), 0.12), 0.62)
    if is_inch:
        count = Fraction(max(1, round(2 * 25.4 / pitch)), 2)
        exact = Fraction(127, 5) / count
        wire = max(1, round(float(exact) * share / float(THOU_TENTH))) * THOU_TENTH
    else:
        exact = _round(pitch)
        wire = _round(float(exact) * share)
    return Wires(exact, wire)


def _round(mm: float) -> Fraction:
    return Fraction(f"{mm:.3g}")


def _cloth(make: Construction, rating: float | None) -> Cloth:
    return Cloth(
        id="",
        name="synthetic",
        construction=make,
        figures=PLAUSIBLE if make.is_filter else figures(make, 7900.0),
        declared="synthetic",
        unit_system="metric",
        source="synthetic, for measuring the search",
        rating=None if rating is None else Rating(rating, "nominal"),
    )
