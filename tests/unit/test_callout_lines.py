"""Callouts of every family, with the readings worked out by hand.

By definition p = 25.4/count, w = p - d, 1 in = 25.4 mm.

Gauge diameters from Machinery's Handbook, sieve openings and wires from ISO 3310-1, grades from memory.
"""

from dataclasses import dataclass

import pytest

from catalog import callout
from catalog.callout.reading import Likelihood, Reading, Side, Status, Understanding

INCH = 25.4
Way = tuple[float | None, float | None, float | None]  # pitch, wire, aperture in mm


@dataclass(frozen=True)
class Cloth:
    """What is expected of one reading."""

    warp: Way
    weft: Way


def counted(n: float, d_mm: float, n_weft: float | None = None, d_weft: float | None = None) -> Cloth:
    """Count per inch and wire in mm."""
    ways = [(INCH / c, d, INCH / c - d) for c, d in ((n, d_mm), (n_weft or n, d_weft or d_mm))]
    return Cloth(ways[0], ways[1])


def inch(n: float, d: float, n_weft: float | None = None, d_weft: float | None = None) -> Cloth:
    """Count per inch and wire in inches."""
    return counted(n, d * INCH, n_weft, d_weft * INCH if d_weft else None)


def opening(w: float, d: float, w_weft: float | None = None) -> Cloth:
    """Opening and wire in mm."""
    ways = [(x + d, d, x) for x in (w, w_weft or w)]
    return Cloth(ways[0], ways[1])


def pitch(p: float, d: float) -> Cloth:
    """Pitch and wire in mm."""
    return Cloth((p, d, p - d), (p, d, p - d))


def dutch(n: float, n_weft: float, d: float, d_weft: float) -> Cloth:
    """Filter cloth: counts per inch, wires in mm, no opening."""
    return Cloth((INCH / n, d, None), (INCH / n_weft, d_weft, None))


def only(p: float | None = None, w: float | None = None) -> Cloth:
    """A pitch or an opening, the wire open."""
    return Cloth((p, None, w), (p, None, w))


def is_near(want: float | None, got: float | None) -> bool:
    if want is None or got is None:
        return want is got
    return abs(want - got) <= 0.001 * abs(want)


def side_fits(want: Way, side: Side) -> bool:
    got = [None if x is None else float(x.mm) for x in (side.pitch, side.wire, side.aperture)]
    return all(is_near(w, g) for w, g in zip(want, got, strict=True))


def fits(want: Cloth, reading: Reading) -> bool:
    return side_fits(want.warp, reading.warp) and side_fits(want.weft, reading.weft)


def sure(understood: Understanding) -> Reading:
    assert understood.status in (Status.CLEAR, Status.NOTED), (understood.problems, understood.question)
    return understood.surviving[0]


SURE = [
    # count and wire, inch
    ("50 mesh .009 304", inch(50, 0.009), "304", None),
    ("50 x 50 mesh, 0.0090 in wire, T316", inch(50, 0.009), "316", None),
    ("80M .0055 SS 304 48\" W x 50' L", inch(80, 0.0055), "304", None),
    ("120 mesh x 0.0037\" wire 316L plain weave 1m x 30m", inch(120, 0.0037), "316L", "plain"),
    ("150 X 150 MESH .0026\" WIRE DIA 304 SS WOVEN WIRE CLOTH 40\" WIDE", inch(150, 0.0026), "304", None),
    ("wire 7.5 thou, 60 mesh", inch(60, 0.0075), None, None),
    ("60 mesh 7.5 mil wire", inch(60, 0.0075), None, None),
    ("2.5 mesh .092 wire", inch(2.5, 0.092), None, None),
    ("1 mesh .120 wire", inch(1, 0.120), None, None),
    ("60 x .0075", inch(60, 0.0075), None, None),
    ("100 .0045", inch(100, 0.0045), None, None),
    ("16 x 16 x .011", inch(16, 0.011), None, None),
    ("40 meshes to the inch .010 wire", inch(40, 0.010), None, None),
    ("mesh count 30, wire .012 in", inch(30, 0.012), None, None),
    ("wire dia .010, mesh 40 x 40", inch(40, 0.010), None, None),
    # count and wire, metric
    ("12 mesh 0.5mm wire", counted(12, 0.5), None, None),
    ("mesh 12 wire 0.5 mm 1.4301", counted(12, 0.5), "304", None),
    ("30 mesh 0.28mm", counted(30, 0.28), None, None),
    ("40x40/0.25mm 1.4301", counted(40, 0.25), "304", None),
    ("20x20x0.4mm", counted(20, 0.4), None, None),
    ("20 mesh 0.4 wire", counted(20, 0.4), None, None),
    ("16/0.4", counted(16, 0.4), None, None),
    ("60 mesh 190 micron wire", counted(60, 0.19), None, None),
    ("200 mesh 5E-02 mm wire", counted(200, 0.05), None, None),
    ("mesh: 20 x 20; wire: 0.4 mm; material: 1.4301", counted(20, 0.4), "304", None),
    # counts per cm, per area, over a length
    ("24 Maschen/cm Draht 0,16", pitch(10 / 24, 0.16), None, None),
    ("n=10/cm d=0,4 1.4301", pitch(1.0, 0.4), "304", None),
    ("20 per cm, wire 0.2 mm", pitch(0.5, 0.2), None, None),
    ("47 in 20 mm, wire 0.165 mm", pitch(20 / 47, 0.165), None, None),
    ("wire 0.5 mm, 5 openings per cm", pitch(2.0, 0.5), None, None),
    ("3600 meshes per square inch, wire .0065", inch(60, 0.0065), None, None),
    ("576 openings per cm2 wire 0.16 mm", pitch(10 / 24, 0.16), None, None),
    # opening and wire
    ("0.5/0.2 mm 1.4401", opening(0.5, 0.2), "316", None),
    ("0,4 x 0,2 mm Köper 1.4404", opening(0.4, 0.2), "316L", "twilled"),
    ("0,4x0,2 1.4571", opening(0.4, 0.2), "316Ti", None),
    ("w = 0,4 mm; d = 0,2 mm; 1.4301", opening(0.4, 0.2), "304", None),
    ("250 µm opening, 160 µm wire", opening(0.25, 0.16), None, None),
    ("opening 0.25 mm x wire 0.16 mm", opening(0.25, 0.16), None, None),
    ("1/4\" opening .047\" wire T304", opening(6.35, 0.047 * INCH), "304", None),
    ("3/4 clear .148 wire HC", opening(19.05, 0.148 * INCH), "HCS", None),
    ("1-1/4\" opng x .250 wire spring steel", opening(31.75, 6.35), "HCS", None),
    ("2 1/2\" opening 3/8\" wire", opening(63.5, 9.525), None, None),
    ("¾″ opening × ⅛″ wire", opening(19.05, 3.175), None, None),
    ("6.3/2.0 mm 65Mn", opening(6.3, 2.0), "65Mn", None),
    ("1,250 mm aperture 0,4 mm wire", opening(1.25, 0.4), None, None),
    # pitch
    ("1/4 o.c. .063 wire", pitch(6.35, 0.063 * INCH), None, None),
    ("1/2\" c/c x .105 wire galv", pitch(12.7, 0.105 * INCH), "GALV", None),
    ("w=0.25mm d=0.16mm p=0.41mm", opening(0.25, 0.16), None, None),
    # German, French, Spanish, Italian
    ("MW 1,0 mm Draht 0,4 mm verzinkt", opening(1.0, 0.4), "GALV", None),
    ("Maschenweite 2,5 mm, Drahtdurchmesser 0,9 mm, Edelstahl 1.4301, 1 m breit", opening(2.5, 0.9), "304", None),
    ("Edelstahlgewebe Maschenweite 0,315 mm, Drahtstärke 0,2 mm", opening(0.315, 0.2), None, None),
    ("Gewebe 20 mesh Draht 0,4 1.4301 Leinenbindung", counted(20, 0.4), "304", "plain"),
    ("maille 0,5 mm fil 0,25 mm inox 304L", opening(0.5, 0.25), "304L", None),
    ("ouverture 250 µm, fil 160 µm, 316L, largeur 1 m", opening(0.25, 0.16), "316L", None),
    ("toile croisée 325 mesh fil 0,035 316L", counted(325, 0.035), "316L", "twilled"),
    ("toile métallique 20 mesh fil 0,4 mm inox 304 armure toile", counted(20, 0.4), "304", "plain"),
    ("tela metálica luz de malla 0,5 mm hilo 0,25 mm AISI 304", opening(0.5, 0.25), "304", None),
    ("malla 60 hilo 0,19 mm inox 304", counted(60, 0.19), "304", None),
    ("luz 1,5 mm alambre 0,5 mm acero galvanizado", opening(1.5, 0.5), "GALV", None),
    ("rete luce 2 mm filo 0,8 mm AISI 316", opening(2.0, 0.8), "316", None),
    ("luce netta 0,25 mm filo 0,16 mm inox 1.4404 tela liscia", opening(0.25, 0.16), "316L", "plain"),
    ("ottone maglia 60 filo 0,19 mm", counted(60, 0.19), None, None),
    ("maille 40/100 fil 25/100", opening(0.40, 0.25), None, None),
    ("fil 25/100 maille 0,5 inox", opening(0.5, 0.25), None, None),
    ("Сетка 1-1-04 12Х18Н10Т", opening(1.0, 0.4), "12Х18Н10Т", None),
    ("20х20 0,4 мм 12Х18Н10Т", counted(20, 0.4), "12Х18Н10Т", None),
    # gauges by name
    ("10 mesh 22 SWG galv", inch(10, 0.028), "GALV", None),
    ("28 SWG 20 mesh", inch(20, 0.0148), None, None),
    ("SWG 28, 20 mesh", inch(20, 0.0148), None, None),
    ("28 BWG 20 mesh", inch(20, 0.014), None, None),
    ("28 AWG 20 mesh copper", inch(20, 0.0126), "Cu-ETP", None),
    ("14 gauge (.080\") 2 mesh", inch(2, 0.080), None, None),
    ("14 gauge (.083\") 2 mesh", inch(2, 0.083), None, None),
    # alloys
    ("EN 1.4301 20 mesh .016", inch(20, 0.016), "304", None),
    ("X5CrNi18-10 0,5/0,25", opening(0.5, 0.25), "304", None),
    ("X2CrNiMo17-12-2 (1.4404) 0,5/0,25", opening(0.5, 0.25), "316L", None),
    ("W1.4301 0,5/0,25", opening(0.5, 0.25), "304", None),
    ("SUS 316L 100 mesh 0.1 mm", counted(100, 0.1), "316L", None),
    ("S31603 100 mesh .0045", inch(100, 0.0045), "316L", None),
    ("316/316L 40 mesh .010", inch(40, 0.010), "316L", None),
    ("310S 10 mesh .025", inch(10, 0.025), "310S", None),
    ("2205 duplex 20 mesh .020", inch(20, 0.020), "2205", None),
    ("alloy 400 60 mesh .0075", inch(60, 0.0075), "400", None),
    ("nickel 200 40 mesh .010", inch(40, 0.010), "Ni200", None),
    ("titanium grade 2 40 mesh .010", inch(40, 0.010), "TiGr2", None),
    ("C-276 40 mesh .010", inch(40, 0.010), "C-276", None),
    ("80/20 brass 60 mesh .0075", inch(60, 0.0075), "CuZn20", None),
    ("60 mesh .0075 brass 70/30", inch(60, 0.0075), "CuZn30", None),
    ("100 mesh .0045 phosphor bronze C51000", inch(100, 0.0045), "CuSn5", None),
    ("430 stainless 20 mesh .016", inch(20, 0.016), "430", None),
    ("430 mesh .0009 316", inch(430, 0.0009), "316", None),
    ("316 mesh 100 .0045", inch(100, 0.0045), "316", None),
    # rectangular
    ("18x14 mesh bronze .011 insect screening 30\" wide", inch(18, 0.011, 14), None, None),
    ("3 x 1 mm opening 0.8 mm wire 304", opening(3.0, 0.8, 1.0), "304", None),
    ("8 x 1 mm slot, 1.2 mm wire", opening(8.0, 1.2, 1.0), None, None),
    ("1/8 x 3/4 slot .080 wire 304", opening(3.175, 0.080 * INCH, 19.05), "304", None),
    ("oblong mesh 2 x 10 mm, wire 1 mm", opening(2.0, 1.0, 10.0), None, None),
    ("20 mesh, warp wire .016, weft wire .014, 304", inch(20, 0.016, 20, 0.014), "304", None),
    ("16 warp x 18 weft mesh .011 bronze", inch(16, 0.011, 18), None, None),
    # filter cloth
    ("24x110 PDW 0.36/0.26", dutch(24, 110, 0.36, 0.26), None, "plain-dutch"),
    ("plain dutch weave 12x64, wire 0.60/0.40 mm, 304", dutch(12, 64, 0.6, 0.4), "304", "plain-dutch"),
    ("200x1400 TDW .0028/.0016 316L 12 micron absolute", dutch(200, 1400, 0.07112, 0.04064), "316L", "twilled-dutch"),
    ("Köpertresse 165x1400 0,07/0,04 1.4404", dutch(165, 1400, 0.07, 0.04), "316L", "twilled-dutch"),
    ("Panzertresse 130x35 0,20/0,40", dutch(130, 35, 0.2, 0.4), None, "reverse-plain-dutch"),
    ("reps lisse 24x110 0,36/0,26 inox 316", dutch(24, 110, 0.36, 0.26), "316", "plain-dutch"),
    ("Kette 24 / Schuss 110, Draht 0,36/0,26, glatte Tresse", dutch(24, 110, 0.36, 0.26), None, "plain-dutch"),
    # sieves
    ("No. 100 sieve", opening(0.150, 0.100), None, None),
    ("US sieve #40", opening(0.425, 0.280), None, None),
    ("ASTM E11 No. 18", opening(1.0, 0.56), None, None),
    ("BS 410 52 mesh", opening(0.300, 0.200), None, None),
    ("ISO 3310-1, 0.5 mm", opening(0.5, 0.315), None, None),
    ("sieve No. 10 2.0/0.9", opening(2.0, 0.9), None, None),
    ("test sieve No. 200, 75µm, ISO 3310-1", opening(0.075, 0.050), None, None),
    ("mesh 100 sieve 150 micron", opening(0.150, 0.100), None, None),
    ("20 mesh .016 304 disc 12\" dia", inch(20, 0.016), "304", None),
    ("60 mesh 250 micron", counted(60, INCH / 60 - 0.25), None, None),
    ("150 mesh 100 micron", counted(150, INCH / 150 - 0.1), None, None),
    # grades, from memory
    ("100 mesh market grade 316", inch(100, 0.0045), "316", None),
    ("60 mesh tensile bolting cloth 304", inch(60, 0.0045), "304", None),
    # forms and ERP strings
    ("12 discs Ø 350, 0,25/0,16 1.4404 plain", opening(0.25, 0.16), "316L", "plain"),
    ("3 off panels 1000 x 2000 mm, 5 mm aperture, 1.6 mm wire, 316", opening(5.0, 1.6), "316", None),
    ("qty 5 rolls 24 mesh .014 304 48 x 100", inch(24, 0.014), "304", None),
    ("WIRE MESH; 60MESH; 0.0075IN; SS304; 36IN WIDE", inch(60, 0.0075), "304", None),
    ("CLOTH WIRE SS 304 20X20MESH .016WIRE 36INX100FT", inch(20, 0.016), "304", None),
    ("MESH,WIRE,SST,304,100X100,.0045,48\"", inch(100, 0.0045), "304", None),
    ("60_MESH_0.0075_304", inch(60, 0.0075), "304", None),
    ("30M x .012 x 1.22M x 30M", inch(30, 0.012), None, None),
    ("P/N 44-1027, 60 mesh .0075 304", inch(60, 0.0075), "304", None),
    ("Art.-Nr. 000123 Gewebe 0,25/0,16 1.4404", opening(0.25, 0.16), "316L", None),
    ("MESH WIRE BRASS 60X60 .0075 36\"", inch(60, 0.0075), None, None),
    ("GEWEBE 1.4404 0,25X0,16 1000MM", opening(0.25, 0.16), "316L", None),
    ("WIRE CLOTH|SS316|40X40|.010|48IN|PLAIN", inch(40, 0.010), "316", "plain"),
    ("60 mesh +/- 2 mesh .0075 wire", inch(60, 0.0075), None, None),
    # scanner's and encoding's damage
    ("8O mesh .OO55 3O4", inch(80, 0.0055), "304", None),
    ("1OO rnesh .0O45 T3l6", inch(100, 0.0045), "316", None),
    ("2O mesh O.4 mm wire", counted(20, 0.4), None, None),
    ("stee1 c1oth 20 mesh .016", inch(20, 0.016), "CS", None),
    ("plain vveave 40 mesh .010 316l", inch(40, 0.010), "316L", "plain"),
    ("20Ã—20 mesh Ã˜ 0,4 mm", counted(20, 0.4), None, None),
    ("50 x 50 mm opening x 5 mm wire", opening(50.0, 5.0), None, None),
    ("80-mesh, 0.0055-inch wire", inch(80, 0.0055), None, None),
    ("1.6mm x 0.8mm stainless mesh", opening(1.6, 0.8), None, None),
    ("30x250 PDW .010/.008 316 75µ", dutch(30, 250, 0.254, 0.2032), "316", "plain-dutch"),
    ("60mesh0.0075wire304", inch(60, 0.0075), "304", None),
    ("24 mesh/0.014\"", inch(24, 0.014), None, None),
    ("#10 mesh .025", inch(10, 0.025), None, None),
    ("20×20×0·4 mm", counted(20, 0.4), None, None),
    ("20 mesh ∅0.4", counted(20, 0.4), None, None),
    # one figure said twice, agreeing
    ("60 mesh .0075 (0.19 mm) 304", inch(60, 0.0075), "304", None),
    ("0.0075\"/0.19 mm wire 60 mesh", inch(60, 0.0075), None, None),
    ("100 mesh 0.15 mm opening 0.1 mm wire", counted(100, 0.1), None, None),
    ("60 mesh .0075 open area 30.3%", inch(60, 0.0075), None, None),
    ("60 mesh .0075 316L 1.05 kg/m2", inch(60, 0.0075), "316L", None),
    # finishes, certificates, dates that don't change the cloth
    ("60 mesh .0075 304 calendered", inch(60, 0.0075), "304", None),
    ("60 mesh .0075 304 not welded", inch(60, 0.0075), "304", None),
    ("60 mesh .0075 304 with welded edges", inch(60, 0.0075), "304", None),
    ("EN 10204-3.1, 20 mesh .016, 1.4404", inch(20, 0.016), "316L", None),
    ("delivery 16-Mar, 20 mesh .016 304", inch(20, 0.016), "304", None),
    ("60 mesh .0075 316L or equal", inch(60, 0.0075), "316L", None),
]  # fmt: skip


@pytest.mark.parametrize(("text", "cloth", "alloy", "weave"), SURE, ids=[row[0] for row in SURE])
def test_a_line_that_says_enough_is_read_without_a_question(
    text: str, cloth: Cloth, alloy: str | None, weave: str | None
) -> None:
    reading = sure(callout.read(text))
    assert fits(cloth, reading), reading
    assert reading.alloy == alloy
    assert (reading.weave.value if reading.weave else None) == weave


ASKED = [
    # gauges without a system: every system that differs is there
    ("10 mesh 22 gauge brass", [inch(10, 0.0286), inch(10, 0.028), inch(10, 0.0253)]),
    ("20 mesh 28 ga 304", [inch(20, 0.0162), inch(20, 0.0148), inch(20, 0.014), inch(20, 0.0126)]),
    ("3/8\" opening x 14 ga galv", [opening(9.525, 0.080 * INCH), opening(9.525, 0.083 * INCH)]),
    # opening or pitch
    ("1/4 inch mesh .047 wire", [pitch(6.35, 0.047 * INCH), opening(6.35, 0.047 * INCH)]),
    ("6mm x 6mm x 1.6mm", [pitch(6.0, 1.6), opening(6.0, 1.6)]),
    ("1/4 x 1/4 x .063", [pitch(6.35, 0.063 * INCH), opening(6.35, 0.063 * INCH)]),
    ("10 x 2 mm", [pitch(10.0, 2.0), opening(10.0, 2.0)]),
    ("20/4 mm 65Mn", [pitch(20.0, 4.0), opening(20.0, 4.0)]),
    ("malla 0,5 mm hilo 0,25 mm", [pitch(0.5, 0.25), opening(0.5, 0.25)]),
    ("1/2\" mesh", [only(p=12.7), only(w=12.7)]),
    ("0.5 x 0.5 mm wire 0.25 mm", [pitch(0.5, 0.25), opening(0.5, 0.25)]),
    # count or opening
    ("10 x 10 x 1 mm", [counted(10, 1.0), opening(10.0, 1.0), pitch(10.0, 1.0)]),
    ("6 x 6 x 1.6 mm", [counted(6, 1.6), opening(6.0, 1.6), pitch(6.0, 1.6)]),
    # sieve or count
    ("No. 100", [opening(0.150, 0.100), only(p=0.254)]),
    ("#100", [opening(0.150, 0.100), only(p=0.254)]),
    ("60", [only(p=INCH / 60), opening(0.25, 0.16)]),
    ("80 mesh sieve cloth 316L", [opening(0.18, 0.125), inch(80, 0.0055)]),
    ("Siebgewebe Nr. 20", [only(p=0.5), opening(0.85, 0.5)]),
    # count or size, warp or weft, gauge or count
    ("12 x 12", [only(p=INCH / 12)]),
    ("110x24 PDW .010/.015", [dutch(24, 110, 0.381, 0.254), dutch(110, 24, 0.254, 0.381)]),
    ("304 mesh .0014", [inch(304, 0.0014)]),
    ("Tresse 24x110 0,36/0,26 1.4401", [dutch(24, 110, 0.36, 0.26)]),
    ("635 mesh .0008 twilled dutch", [dutch(635, 635, 0.0008 * INCH, 0.0008 * INCH)]),
    # per inch or per centimetre
    ("n=20 d=0,2", [counted(20, 0.2), pitch(0.5, 0.2)]),
    ("Maschenzahl 24, Draht 0,16", [counted(24, 0.16), pitch(10 / 24, 0.16)]),
    ("maglia 2x2 filo 0,5 inox", [counted(2, 0.5), opening(2.0, 0.5), pitch(2.0, 0.5)]),
    # order of opening and wire
    ("0.16 x 0.25", [opening(0.25, 0.16)]),
    # contradictions: each pair of the three
    ("20 mesh 1.0 mm opening 0.4 mm wire", [counted(20, 0.4), opening(1.0, 0.4), counted(20, INCH / 20 - 1.0)]),
    ("18 mesh 1 mm opening 0.56 mm wire", [opening(1.0, 0.56), counted(18, 0.56)]),
    ("10 mesh 2,0/0,9", [opening(2.0, 0.9), counted(10, 0.9)]),
    ("60 mesh .0075 in (0.25 mm) 304", [inch(60, 0.0075)]),
    ("w=0.25mm d=0.16mm p=0.45mm", [opening(0.25, 0.16), pitch(0.45, 0.16)]),
    ("4 mesh 1/4 opening .047 wire", [inch(4, 0.047), opening(6.35, 0.047 * INCH)]),
    # slips of the unit
    ("60 mesh .0075 mm wire", [inch(60, 0.0075)]),
    ("60 mesh 0.19 in wire", [counted(60, 0.19)]),
    ("0.25 mm aperture 0.16 in wire", [opening(0.25, 0.16)]),
    # words and numbers that aren't understood keep the status from being sure
    ("60 mesh .0075 304 xyzzy", [inch(60, 0.0075)]),
    ("20 mesh .016 36", [inch(20, 0.016)]),
    ("60 mesh .0075 304 reverse twill", [inch(60, 0.0075)]),
    ("20 mesh .4 wire", [counted(20, 0.4)]),
    ("60 mesh .0075 open area 36%", [inch(60, 0.0075)]),
    ("60 mesh .0075 316L 2 kg/m2", [inch(60, 0.0075)]),
    ("20 mesh .016 304 galvanized", [inch(20, 0.016)]),
    ("304 or 316, 20 mesh .016", [inch(20, 0.016)]),
]  # fmt: skip


@pytest.mark.parametrize(("text", "cloths"), ASKED, ids=[row[0] for row in ASKED])
def test_a_line_that_can_be_taken_two_ways_is_asked_with_every_way(text: str, cloths: list[Cloth]) -> None:
    understood = callout.read(text)
    assert understood.status is Status.ASK
    assert understood.question or understood.problems
    for cloth in cloths:
        assert any(fits(cloth, reading) for reading in understood.surviving), cloth


WHY = [
    ("60 mesh wire 0.5 mm", "E_IMPOSSIBLE"),
    ("100 mesh .010", "E_IMPOSSIBLE"),
    ("8 mesh 1/8\" opening", "E_IMPOSSIBLE"),
    ("60 mesh 0 wire", "E_IMPOSSIBLE"),
    ("30 x 150 mesh .009 x .007", "E_IMPOSSIBLE"),
    ("12 mesh .063", "E_JAMMED"),
    ("12 mesh .05", "E_JAMMED"),
    ("12 mesh 0.065 wire", "E_JAMMED"),
    ("50 mesh 50 micron", "E_JAMMED"),
    ("16. Mrz", "E_DATE"),
    ("01. Apr", "E_DATE"),
    ("2024-03-16", "E_DATE"),
    ("500 mesh 500 mm wire", "E_IMPOSSIBLE"),
    ("60 mesh .0001 wire", "E_IMPLAUSIBLE"),
    ("2000 mesh 304", "E_IMPLAUSIBLE"),
    ("1.4301 316 0.5/0.25", "E_MATERIAL"),
    ("20 mesh .016 brass galvanised", "E_MATERIAL"),
    ("WM-316-100-0045-36", "E_NOT_UNDERSTOOD"),
    ("SS304-60-0075-48", "E_NOT_UNDERSTOOD"),
    ("25/100", "E_NOT_UNDERSTOOD"),
    ("14 ga (0.1 in) 2 mesh", "E_INCONSISTENT"),
]  # fmt: skip


@pytest.mark.parametrize(("text", "code"), WHY, ids=[row[0] for row in WHY])
def test_a_line_that_is_no_cloth_as_written_says_why(text: str, code: str) -> None:
    understood = callout.read(text)
    assert understood.status is Status.ASK
    assert code in [problem.code for problem in understood.problems]


OUTSIDE = [
    ("", "E_NO_CLOTH"), ("   ", "E_NO_CLOTH"), ("hello world", "E_NO_CLOTH"), ("same as last time", "E_NO_CLOTH"),
    ("1.4404", "E_NO_CLOTH"), ("stainless steel wire mesh", "E_NO_CLOTH"), ("-200 mesh", "E_NO_CLOTH"),
    ("-20+40", "E_NO_CLOTH"), ("passing 40 mesh retained on 60 mesh", "E_NO_CLOTH"),
    ("welded mesh 50 x 50 x 4 mm", "E_NOT_WOVEN"), ("expanded metal 10 x 5", "E_NOT_WOVEN"),
    ("perforated 3 mm holes", "E_NOT_WOVEN"), ("knitted mesh 0.28 wire", "E_NOT_WOVEN"),
    ("Schweißgitter 12,7 x 12,7 x 1,6", "E_NOT_WOVEN"), ("treillis soudé 50 x 50 fil 4", "E_NOT_WOVEN"),
    ("malla electrosoldada 10 x 10", "E_NOT_WOVEN"), ("hexagonal netting 1/2 in", "E_NOT_WOVEN"),
    ("nylon mesh 100 micron", "E_NOT_METAL"), ("60 mesh polyester", "E_NOT_METAL"),
    ("PA 66 Gewebe 50 µm", "E_NOT_METAL"),
]  # fmt: skip


@pytest.mark.parametrize(("text", "code"), OUTSIDE, ids=[row[0] or "nothing" for row in OUTSIDE])
def test_a_line_without_woven_wire_is_out_of_scope(text: str, code: str) -> None:
    understood = callout.read(text)
    assert understood.status is Status.OUT_OF_SCOPE
    assert not understood.surviving
    assert understood.problems[0].code == code


INCOMPLETE = [
    ("60 mesh T304", only(p=INCH / 60)),
    ("120 micron opening", only(w=0.12)),
    ("20 mesh mill grade", only(p=INCH / 20)),
    ("filter cloth 24 x 110", Cloth((INCH / 24, None, None), (INCH / 110, None, None))),
    ("18 x 14 mesh", Cloth((INCH / 18, None, None), (INCH / 14, None, None))),
]


@pytest.mark.parametrize(("text", "cloth"), INCOMPLETE, ids=[row[0] for row in INCOMPLETE])
def test_a_line_that_leaves_the_wire_open_says_what_is_missing(text: str, cloth: Cloth) -> None:
    understood = callout.read(text)
    assert understood.status is Status.INCOMPLETE
    assert "wire" in understood.missing
    assert fits(cloth, understood.surviving[0])


LIMITS = [
    ("at least 30 by 30 mesh, wire not less than 28 SWG", {"count_per_in": (30, None), "wire_mm": (0.37592, None)}),
    ("not finer than 30 mesh", {"count_per_in": (None, 30)}),
    ("not coarser than 30 mesh", {"count_per_in": (30, None)}),
    ("less than 18 by 18 mesh", {"count_per_in": (None, 18)}),
    ("not less than 28 SWG", {"wire_mm": (0.0148 * INCH, None)}),
    ("100 mesh or finer", {"count_per_in": (100, None)}),
    ("30 mesh or coarser, wire 24 SWG or heavier", {"count_per_in": (None, 30), "wire_mm": (0.022 * INCH, None)}),
    ("finer than 40 mesh", {"count_per_in": (40, None)}),
    ("40-60 mesh", {"count_per_in": (40, 60)}),
    ("between 0.5 and 0.8 mm aperture", {"aperture_mm": (0.5, 0.8)}),
    ("w ≤ 0.80 mm, open area ≥ 45 %, wire ≥ 0.35 mm, stainless",
     {"aperture_mm": (None, 0.8), "open_area_pct": (45, None), "wire_mm": (0.35, None)}),
    ("max opening 2 mm, min wire 0.5 mm", {"aperture_mm": (None, 2), "wire_mm": (0.5, None)}),
    ("2 mm max opening", {"aperture_mm": (None, 2)}),
    ("Maschenweite max. 0,5 mm, Draht mind. 0,2 mm", {"aperture_mm": (None, 0.5), "wire_mm": (0.2, None)}),
    ("ouverture maxi 2 mm, fil mini 0,5 mm", {"aperture_mm": (None, 2), "wire_mm": (0.5, None)}),
    ("retain 100 micron", {"aperture_mm": (None, 0.1)}),
    ("must pass 2 mm", {"aperture_mm": (2, None)}),
    ("mass max 1.5 kg/m2, open area at least 40%", {"mass_kg_m2": (None, 1.5), "open_area_pct": (40, None)}),
    ("w max 0,5 mm", {"aperture_mm": (None, 0.5)}),
    ("20 mesh minimum", {"count_per_in": (20, None)}),
    ("opening between 1 and 2 mm, wire at least 0.5", {"aperture_mm": (1, 2), "wire_mm": (0.5, None)}),
    ("at least 10 per cm", {"count_per_in": (INCH, None)}),
]  # fmt: skip


@pytest.mark.parametrize(("text", "bounds"), LIMITS, ids=[row[0] for row in LIMITS])
def test_limits_bound_the_right_side(text: str, bounds: dict[str, tuple[float | None, float | None]]) -> None:
    understood = callout.read(text)
    assert understood.status is Status.LIMITS
    limits = understood.surviving[0].limits
    assert set(limits) == set(bounds)
    for key, wanted in bounds.items():
        assert all(is_near(w, g) for w, g in zip(wanted, limits[key], strict=True)), key


def test_a_ruled_out_reading_keeps_its_reason() -> None:
    understood = callout.read("0.5 mm mesh 0.5 mm wire")
    assert sure(understood).warp.aperture is not None
    lost = [r for r in understood.readings if r.likelihood is Likelihood.RULED_OUT]
    assert lost
    assert "no opening" in lost[0].notes[-1]
