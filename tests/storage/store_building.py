"""Small stores for the tests, made through the migrations and filled with cloths named by their make."""

from collections.abc import Callable, Iterable
from fractions import Fraction
from pathlib import Path

from catalog.cloth import Cloth, Figures, Rating
from catalog.construction import Construction, Weave, Wires
from catalog.figures import figures
from catalog.search.list_reader import ListReader
from catalog.stock.lots import Lot
from catalog.storage.creating import seed_meta, sign
from catalog.storage.engine import sqlite_engine
from catalog.storage.migrating import upgrade
from catalog.storage.rows import Declared
from catalog.storage.store import Store
from catalog.storage.writing import Arrival, add_cloths, receive_lots

MM = "mm"
StoreOf = Callable[..., tuple[Store, ListReader]]


def make_cloth(
    cloth_id: str,
    warp: tuple[str, str],
    weft: tuple[str, str] | None = None,
    weave: Weave = Weave.PLAIN,
    alloy: str | None = "316L",
    rating: float | None = None,
    demo: bool = False,
    density_kg_m3: float | None = 7950.0,
) -> Cloth:
    """A cloth by (pitch, wire) in mm, each way."""
    weft = weft or warp
    make = Construction(weave, Wires(*map(Fraction, warp)), Wires(*map(Fraction, weft)), alloy)
    return Cloth(
        id=cloth_id,
        name=cloth_id,
        construction=make,
        figures=_plausible(make) if weave.is_filter else figures(make, density_kg_m3),
        declared=f"pitch {warp[0]} × {weft[0]} mm",
        unit_system="metric",
        source="made for a test",
        rating=None if rating is None else Rating(rating, "nominal"),
        demo=demo,
    )


def _plausible(make: Construction) -> Figures:
    """Figures for filter cloth of any make: what can be woven is no question here."""
    return Figures(None, None, None, 1.5, 1.5, float(make.warp.wire_mm + 2 * make.weft.wire_mm), 0.4)


def declared_of(cloth: Cloth) -> Declared:
    """The cloth's figures, written in mm."""
    make = cloth.construction
    texts = [str(x) for x in (make.warp.pitch_mm, make.weft.pitch_mm, make.warp.wire_mm, make.weft.wire_mm)]
    return Declared("pitch", texts[0], texts[1], MM, texts[2], texts[3], MM)


def make_lot(lot_id: str, cloth: str, length_mm: int = 10_000, **more: object) -> Lot:
    """A roll of *cloth*, 1 m wide."""
    facts: dict[str, object] = {"width_mm": 1000, "selvedge_mm": 10, "reserved_mm": 0, "location": "A1", **more}
    return Lot(id=lot_id, cloth=cloth, form="roll", length_mm=length_mm, **facts)  # type: ignore[arg-type]


def fill_file(path: Path, cloths: Iterable[Cloth], lots: Iterable[Lot] = ()) -> Path:
    """Make a store at *path* that holds just these."""
    path.touch()
    engine = sqlite_engine(path)
    sign(engine, logs_ahead=True)
    upgrade(engine)
    with engine.connect() as bare, bare.execution_options(is_writer=True).begin():
        seed_meta(bare, with_demo=True)
        add_cloths(bare, [(cloth, declared_of(cloth)) for cloth in cloths])
        receive_lots(bare, [Arrival(lot, "made for a test") for lot in lots], "test", "")
    engine.dispose()
    return path
