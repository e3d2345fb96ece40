"""Whatever the rack holds: no piece is made twice or out of nothing, and no plan is worse than one lot or one heat."""

from hypothesis import given, settings
from hypothesis import strategies as st

from catalog.stock.cutting import Cutting
from catalog.stock.cutting_pieces import Piece
from catalog.stock.lots import Lot
from catalog.stock.plan import plan

SIZES = st.integers(150, 700)
PIECES = st.lists(
    st.builds(lambda n, w, h: Piece(n, w, h), st.integers(1, 5), SIZES, SIZES)
    | st.builds(lambda n, d: Piece(n, diameter_mm=d), st.integers(1, 8), SIZES),
    min_size=1,
    max_size=3,
)
RACKS = st.lists(
    st.tuples(
        st.sampled_from(["roll", "remnant", "panel"]),
        st.integers(400, 1300),
        st.integers(300, 3000),
        st.sampled_from(["H1", "H2", "H3", None]),
    ),
    max_size=6,
).map(lambda rows: [Lot(f"L-{i}", "c", f, w, 10, n, 0, "A", heat=h) for i, (f, w, n, h) in enumerate(rows)])


@settings(max_examples=50, deadline=None)
@given(RACKS, PIECES)
def test_every_piece_is_made_once_or_counted_as_missing(rack: list[Lot], pieces: list[Piece]) -> None:
    made = plan(rack, pieces, Cutting(kerf_mm=5))
    for index, piece in enumerate(pieces):
        placed = sum(placement.piece == index for cut in made.cuts for placement in cut.placements)
        assert placed + made.missing[index] == piece.quantity
    names = [cut.lot.id for cut in made.cuts]
    assert len(names) == len(set(names))
    assert all(cut.placements for cut in made.cuts)


def in_straight_rows(lot: Lot, piece: Piece, kerf: float) -> int:
    ways = {(piece.across_mm, piece.along_mm), (piece.along_mm, piece.across_mm)}
    return max(
        int((lot.usable_width_mm + kerf) // (w + kerf)) * int((lot.free_length_mm + kerf) // (h + kerf))
        for w, h in ways
    )


@settings(max_examples=60, deadline=None)
@given(RACKS, PIECES.map(lambda pieces: pieces[:1]))
def test_where_straight_rows_in_one_lot_do_it_the_plan_takes_one_lot(rack: list[Lot], pieces: list[Piece]) -> None:
    if any(in_straight_rows(lot, pieces[0], 5) >= pieces[0].quantity for lot in rack):
        made = plan(rack, pieces, Cutting(kerf_mm=5))
        assert (made.is_complete, len(made.cuts)) == (True, 1)


@settings(max_examples=30, deadline=None)
@given(RACKS, PIECES)
def test_a_plan_within_one_heat_is_found_where_the_plan_of_that_heat_alone_is_complete(
    rack: list[Lot], pieces: list[Piece]
) -> None:
    alone = [plan([lot for lot in rack if lot.heat == heat], pieces, Cutting(kerf_mm=5)) for heat in ("H1", "H2", "H3")]
    complete = [made for made in alone if made.is_complete]
    if complete:
        made = plan(rack, pieces, Cutting(kerf_mm=5))
        assert (made.is_complete, len(made.heats)) == (True, 1)
        assert len(made.cuts) <= min(len(other.cuts) for other in complete)
