"""A construction written as a sentence reads back as the same construction, to the fraction."""

from fractions import Fraction

from hypothesis import given, settings
from hypothesis import strategies as st

from catalog import callout
from catalog.callout.reading import Reading, Side, Status
from catalog.callout.writing import compact_inch, compact_metric, sentence
from catalog.construction import Construction, Weave, Wires
from catalog.figures import figures
from catalog.reference import alloys
from catalog.units import MM_PER_INCH

SHARE = st.fractions(Fraction(12, 100), Fraction(45, 100))
ALLOYS = st.sampled_from([None, *(alloy.id for alloy in alloys.alloys())])
OPEN_WEAVES = st.sampled_from([Weave.PLAIN, Weave.TWILLED])


def rounded(value: Fraction, unit: Fraction) -> Fraction:
    return max(unit, round(value / unit) * unit)


@st.composite
def inch_wires(draw: st.DrawFn) -> Wires:
    """Declared by count per inch (halves too) and a wire of four decimals of an inch."""
    count = Fraction(draw(st.integers(4, 1270)), 2)
    wire = rounded(draw(SHARE) / count, Fraction(1, 10_000))
    return Wires(MM_PER_INCH / count, wire * MM_PER_INCH)


@st.composite
def metric_wires(draw: st.DrawFn) -> Wires:
    """Declared by opening and wire in whole micrometres."""
    pitch = Fraction(draw(st.integers(40, 30_000)), 1000)
    wire = max(rounded(draw(SHARE) * pitch, Fraction(1, 1000)), Fraction(1, 100))
    return Wires(pitch, wire)


@st.composite
def per_cm_wires(draw: st.DrawFn) -> Wires:
    """Declared by whole counts per centimetre and a wire in hundredths of a millimetre."""
    pitch = Fraction(10, draw(st.integers(1, 60)))
    return Wires(pitch, max(rounded(draw(SHARE) * pitch, Fraction(1, 100)), Fraction(2, 100)))


def is_open(wires: Wires) -> bool:
    return Fraction(1, 10) <= wires.wire_mm / wires.pitch_mm <= Fraction(1, 2) and wires.wire_mm >= Fraction(1, 100)


DIRECTION = st.one_of(inch_wires(), metric_wires(), per_cm_wires()).filter(is_open)


@st.composite
def open_cloths(draw: st.DrawFn) -> Construction:
    """Square and rectangular, plain and twilled, in every alloy of the table."""
    warp = draw(DIRECTION)
    weft = warp if draw(st.booleans()) else draw(st.one_of(inch_wires(), metric_wires()).filter(is_open))
    ratio = weft.pitch_mm / warp.pitch_mm
    if not Fraction(1, 4) <= ratio <= 4 or not Fraction(1, 2) <= weft.wire_mm / warp.wire_mm <= 2:
        weft = warp
    return Construction(draw(OPEN_WEAVES), warp, weft, draw(ALLOYS))


@st.composite
def filter_cloths(draw: st.DrawFn) -> Construction:
    """Plain, twilled and reverse Dutch, wires in µm or in ten-thousandths of an inch, packed as such cloth is."""
    weave, packing = draw(
        st.sampled_from([(Weave.PLAIN_DUTCH, 110), (Weave.TWILLED_DUTCH, 200), (Weave.REVERSE_PLAIN_DUTCH, 180)])
    )
    wide = Fraction(draw(st.integers(8, 300)))
    close = wide * draw(st.integers(4, 10)) + draw(st.integers(0, 7))
    unit = draw(st.sampled_from([Fraction(1, 1000), MM_PER_INCH / 10_000]))
    thick = rounded(Fraction(35, 100) * MM_PER_INCH / wide, unit)
    thin = rounded(Fraction(packing, 100) * MM_PER_INCH / close, unit)
    first, second = Wires(MM_PER_INCH / wide, thick), Wires(MM_PER_INCH / close, thin)
    if weave is Weave.REVERSE_PLAIN_DUTCH:
        first, second = second, first
    return Construction(weave, first, second, draw(ALLOYS))


def same(side: Side, wires: Wires) -> bool:
    return (
        side.pitch is not None
        and side.wire is not None
        and (side.pitch.mm, side.wire.mm) == (wires.pitch_mm, wires.wire_mm)
    )


def only_reading(text: str) -> Reading:
    understood = callout.read(text)
    assert understood.status in (Status.CLEAR, Status.NOTED), (text, understood.problems, understood.question)
    return understood.surviving[0]


def assert_same(construction: Construction, reading: Reading) -> None:
    assert same(reading.warp, construction.warp)
    assert same(reading.weft, construction.weft)
    assert reading.weave is construction.weave
    assert reading.alloy == construction.alloy


@settings(max_examples=150, deadline=None)
@given(open_cloths())
def test_the_sentence_of_an_open_cloth_reads_back_as_the_same_construction(construction: Construction) -> None:
    known = alloys.alloy(construction.alloy) if construction.alloy else None
    mass = figures(construction, known.density_kg_m3).mass_kg_m2 if known else None
    reading = only_reading(sentence(construction, mass))
    assert_same(construction, reading)
    assert reading.warp.aperture is not None
    assert reading.warp.aperture.mm == construction.warp.aperture_mm


@settings(max_examples=80, deadline=None)
@given(filter_cloths())
def test_the_sentence_of_filter_cloth_reads_back_as_the_same_construction(construction: Construction) -> None:
    assert_same(construction, only_reading(sentence(construction)))


@settings(max_examples=60, deadline=None)
@given(inch_wires().filter(is_open), OPEN_WEAVES)
def test_what_inch_users_write_reads_back_as_the_same_cloth(wires: Wires, weave: Weave) -> None:
    construction = Construction(weave, wires, wires, "316L")
    assert_same(construction, only_reading(compact_inch(construction)))


@settings(max_examples=60, deadline=None)
@given(metric_wires().filter(is_open), OPEN_WEAVES)
def test_what_metric_users_write_reads_back_as_the_same_cloth(wires: Wires, weave: Weave) -> None:
    construction = Construction(weave, wires, wires, "316L")
    assert_same(construction, only_reading(compact_metric(construction)))


def test_one_sentence_to_order_by() -> None:
    wires = Wires(MM_PER_INCH / 60, Fraction("0.0065") * MM_PER_INCH)
    assert sentence(Construction(Weave.PLAIN, wires, wires, "316L"), 0.83) == (
        "Woven wire cloth, plain weave, square, stainless 1.4404 (316L): aperture 0.2582 mm (0.01017 in), "
        "wire 0.1651 mm (0.0065 in), pitch 0.4233 mm (60 per inch, 23.62 per cm), open area 37.2 %, about 0.83 kg/m²."
    )
