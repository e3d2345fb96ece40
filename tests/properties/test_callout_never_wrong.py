"""Callouts put together from a known cloth, in any order and spelling: what is sure of itself is right."""

from dataclasses import dataclass
from fractions import Fraction

from hypothesis import given, settings
from hypothesis import strategies as st

from catalog import callout
from catalog.callout.reading import Reading, Status
from catalog.reference import sieves
from catalog.units import MM_PER_INCH

SURE = (Status.CLEAR, Status.NOTED)
ALLOYS = {
    "304": ["304", "T304", "T-304", "304 SS", "SS304", "AISI 304", "1.4301", "S30400", "SUS304", "type 304"],
    "316L": ["316L", "T316L", "SS 316L", "1.4404", "W1.4404", "X2CrNiMo17-12-2", "AISI 316L"],
    "Cu-ETP": ["copper", "Kupfer", "cuivre"],
    "CS": ["steel", "plain steel", "mild steel"],
    None: ["", "stainless", "inox"],
}
WEAVES = {"plain": ["plain weave", "plain", "PW", "Leinenbindung"], "twilled": ["twill", "TW", "Köper"], None: [""]}
FORMS = [
    "",
    '36" wide',
    "48\" x 100'",
    "1220 mm x 30 m",
    "2 rolls",
    '4 pcs 24" x 36"',
    "1 m breit",
    "36X100",
    "3.1 cert",
]
NOISE = ["", "please quote", "wire cloth", "mesh", "woven wire mesh", "P/N 100234", "trimmed edges", "RR-W-360"]
JOINS = [" ", ", ", "; ", " - "]


@dataclass(frozen=True)
class Known:
    """A cloth and how it is written."""

    text: str
    pitch_mm: Fraction
    wire_mm: Fraction
    alloy: str | None
    weave: str | None


def decimal(value: Fraction, places: int, drop_zero: bool, comma: bool) -> str:
    text = f"{float(value):.{places}f}"
    text = text.removeprefix("0") if drop_zero else text
    return text.replace(".", ",") if comma else text


@st.composite
def count_and_wire(draw: st.DrawFn) -> tuple[str, Fraction, Fraction]:
    """Count per inch with a wire in inches, thou or millimetres, in the ways that people write it."""
    count = draw(st.integers(4, 400))
    share = draw(st.fractions(Fraction(15, 100), Fraction(45, 100)))
    metric = draw(st.booleans())
    if metric:
        wire = max(round(share * MM_PER_INCH / count * 1000), 12)
        mm = Fraction(wire, 1000)
        said = f"{decimal(mm, 3, False, draw(st.booleans()))}{draw(st.sampled_from([' mm', 'mm']))}"
        wires = [f"{said} wire", f"wire {said}", f"Ø {said}", f"d = {said}", f"wire dia {said}"]
    else:
        wire = max(round(share / count * 10_000), 5)
        mm = Fraction(wire, 10_000) * MM_PER_INCH
        bare = decimal(Fraction(wire, 10_000), 4, draw(st.booleans()), False)
        unit = draw(st.sampled_from(["", '"', " in", " inch"]))
        wires = [f"{bare}{unit} wire", f"wire {bare}{unit}", f"{bare}{unit} dia", f"wire dia. {bare}{unit}"]
    counts = [f"{count} mesh", f"mesh {count}", f"{count} x {count} mesh", f"{count}x{count} mesh", f"{count}-mesh"]
    parts = [draw(st.sampled_from(counts)), draw(st.sampled_from(wires))]
    if draw(st.booleans()):
        parts.reverse()
    return draw(st.sampled_from([" ", ", ", "; "])).join(parts), MM_PER_INCH / count, mm


@st.composite
def opening_and_wire(draw: st.DrawFn) -> tuple[str, Fraction, Fraction]:
    """Opening and wire in millimetres or micrometres, in four languages."""
    aperture = Fraction(draw(st.integers(40, 12_000)), 1000)
    wire = max(round(aperture * draw(st.fractions(Fraction(25, 100), Fraction(80, 100))) * 1000), 15)
    d = Fraction(wire, 1000)
    comma = draw(st.booleans())
    w_text, d_text = decimal(aperture, 3, False, comma), decimal(d, 3, False, comma)
    shape = draw(
        st.sampled_from(
            [
                "{w} mm aperture, {d} mm wire",
                "aperture {w} mm wire {d} mm",
                "w = {w} mm, d = {d} mm",
                "Maschenweite {w} mm Draht {d} mm",
                "maille {w} mm fil {d} mm",
                "luz {w} mm hilo {d} mm",
                "luce {w} mm filo {d} mm",
                "wire {d} mm, opening {w} mm",
                "{d} mm wire {w} mm opening",
                "opening {w} mm x wire {d} mm",
            ]
        )
    )
    return shape.format(w=w_text, d=d_text), aperture + d, d


@st.composite
def callouts(draw: st.DrawFn) -> Known:
    """A whole line: cloth, alloy, weave, form and noise, in any order."""
    cloth, pitch, wire = draw(st.one_of(count_and_wire(), opening_and_wire()))
    alloy = draw(st.sampled_from(list(ALLOYS)))
    weave = draw(st.sampled_from(list(WEAVES)))
    parts = [
        cloth,
        draw(st.sampled_from(ALLOYS[alloy])),
        draw(st.sampled_from(WEAVES[weave])),
        draw(st.sampled_from(FORMS)),
        draw(st.sampled_from(NOISE)),
    ]
    order = draw(st.permutations([p for p in parts if p]))
    return Known(draw(st.sampled_from(JOINS)).join(order), pitch, wire, alloy, weave)


def is_near(want: Fraction, got: Fraction) -> bool:
    return abs(want - got) <= Fraction(5, 1000) * want


def is_right(known: Known, reading: Reading) -> bool:
    sides = (reading.warp, reading.weft)
    figures = all(
        s.pitch and s.wire and is_near(known.pitch_mm, s.pitch.mm) and is_near(known.wire_mm, s.wire.mm) for s in sides
    )
    weave = reading.weave.value if reading.weave else None
    return (
        figures and reading.alloy == known.alloy and weave in (known.weave, None)
    )  # 'plain steel' leaves the weave open


@settings(max_examples=300, deadline=None)
@given(callouts())
def test_what_is_sure_of_itself_is_right(known: Known) -> None:
    understood = callout.read(known.text)
    if understood.status in SURE:
        assert is_right(known, understood.surviving[0]), known.text


@settings(max_examples=60, deadline=None)
@given(st.sampled_from([s for s in sieves.sieves() if s.e11_name and s.e11_name.startswith("No.")]), st.booleans())
def test_a_sieve_by_number_opens_what_the_table_says(sieve: sieves.Sieve, named: bool) -> None:
    understood = callout.read(f"US sieve {sieve.e11_name}" if named else f"sieve cloth {sieve.e11_name} 316L")
    assert understood.status in SURE
    aperture = understood.surviving[0].warp.aperture
    assert aperture
    assert aperture.mm == sieve.opening_mm
