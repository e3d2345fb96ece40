"""A catalogue small enough to know by heart: six cloths for a dairy's sifter deck, and what lies of them.

The cloths and what is to be said of them are worked by hand: asked is 0.25 mm aperture, 0.16 mm wire, alloy
316L. 62 per inch of .0065 in wire opens 25.4/62 − 0.1651 = 0.2446 mm, 60 per inch 25.4/60 − 0.1651 = 0.2582 mm.
"""

from fractions import Fraction

from catalog.cloth import Cloth
from catalog.construction import Construction, Weave, Wires
from catalog.figures import figures
from catalog.search.list_reader import ListReader
from catalog.stock.lots import Lot

ASKED = "0,25/0,16 1.4404 plain"
INCH = Fraction(127, 5)
STEEL_KG_M3 = 7950.0


def cloth(cloth_id: str, name: str, pitch: Fraction, wire: str, alloy: str, system: str) -> Cloth:
    """A square plain cloth. *wire* in mm."""
    wires = Wires(pitch, Fraction(wire))
    made = Construction(Weave.PLAIN, wires, wires, alloy)
    return Cloth(
        id=cloth_id,
        name=name,
        construction=made,
        figures=figures(made, STEEL_KG_M3),
        declared=name,
        unit_system=system,
        source="invented for the tests",
        demo=True,
    )


CLOTHS = (
    cloth("sixty-two", "62 × .0065 316L", INCH / 62, "0.1651", "316L", "inch"),
    cloth("sixty", "60 × .0065 316L", INCH / 60, "0.1651", "316L", "inch"),
    cloth("light", "0.25/0.14 1.4404", Fraction("0.39"), "0.14", "316L", "metric"),
    cloth("heavy", "60 × .0075 316L", INCH / 60, "0.1905", "316L", "inch"),
    cloth("open", "60 × .0045 316", INCH / 60, "0.1143", "316", "inch"),
    cloth("other-alloy", "0.25/0.16 1.4301", Fraction("0.41"), "0.16", "304", "metric"),
)


def lot(number: int, cloth_id: str, location: str, length_mm: int) -> Lot:
    """A roll 1220 mm wide with 15 mm selvedges."""
    return Lot(
        id=f"R-{number}",
        cloth=cloth_id,
        form="roll",
        width_mm=1220,
        selvedge_mm=15,
        length_mm=length_mm,
        reserved_mm=0,
        location=location,
        heat=f"H{number}",
        certificate="3.1",
        demo=True,
    )


LOTS = (
    lot(101, "sixty-two", "A-01-2", 30500),
    lot(102, "sixty", "A-02-1", 12000),
    lot(103, "sixty", "B-07-3", 2400),
)


class SmallStore(ListReader):
    """The catalogue in memory, with what the browser asks of an open store."""

    has_demo = True

    def __init__(self) -> None:
        super().__init__(CLOTHS, LOTS)
        self.is_closed = False

    def close(self) -> None:
        """Remember it."""
        self.is_closed = True
