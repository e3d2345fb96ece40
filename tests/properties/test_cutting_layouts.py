"""Any layout can be cut as it says: inside the cloth, a kerf apart, edge to edge, and no worse than straight rows.

The reference is plain geometry written here; nothing is taken from the layout's own tree of cuts.
"""

from collections.abc import Sequence
from math import ceil, hypot

from hypothesis import given, settings
from hypothesis import strategies as st

from catalog.stock.cutting import Cutting, cut_lot
from catalog.stock.cutting_pieces import Piece
from catalog.stock.layout import LotCut, Placement
from catalog.stock.lots import Lot

CLOSE = 1e-6
SIZES = st.integers(60, 900)
RECTANGLES = st.builds(
    lambda n, w, h, bound: Piece(n, w, h, warp_bound=bound), st.integers(1, 6), SIZES, SIZES, st.booleans()
)
DISCS = st.builds(lambda n, d: Piece(n, diameter_mm=d), st.integers(1, 30), st.integers(60, 700))
LISTS = st.lists(RECTANGLES | DISCS, min_size=1, max_size=3)
LOTS = st.builds(
    lambda w, h, edge, held: Lot("L-1", "c", "remnant", w, edge, h, min(held, h - 1), "A"),
    st.integers(300, 1600),
    st.integers(200, 2500),
    st.sampled_from([0, 10, 15]),
    st.sampled_from([0, 0, 150]),
)
KERFS = st.sampled_from([0.0, 2.5, 5.0])
Box = tuple[float, float, float, float]


def made(lot: Lot, pieces: list[Piece], kerf: float) -> LotCut:
    return cut_lot(lot, pieces, Cutting(kerf))


def box(p: Placement) -> Box:
    return p.x_mm, p.y_mm, p.x_mm + p.width_mm, p.y_mm + p.length_mm


def are_apart(a: Placement, b: Placement, kerf: float) -> bool:
    gap_x = max(a.x_mm - b.x_mm - b.width_mm, b.x_mm - a.x_mm - a.width_mm)
    gap_y = max(a.y_mm - b.y_mm - b.length_mm, b.y_mm - a.y_mm - a.length_mm)
    if max(gap_x, gap_y) >= kerf - CLOSE:
        return True
    centres = hypot(
        a.x_mm + a.width_mm / 2 - b.x_mm - b.width_mm / 2, a.y_mm + a.width_mm / 2 - b.y_mm - b.width_mm / 2
    )
    return a.is_offset and b.is_offset and centres >= (a.width_mm + b.width_mm) / 2 + kerf - CLOSE


def can_be_cut(boxes: Sequence[Box]) -> bool:
    """Whether straight cuts from edge to edge part all boxes: some cut parts them in two, and so on."""
    if len(boxes) < 2:
        return True
    for low, high in ((0, 2), (1, 3)):
        for at in sorted({b[low] for b in boxes})[1:]:
            before = [b for b in boxes if b[high] <= at + CLOSE]
            after = [b for b in boxes if b[low] >= at - CLOSE]
            if len(before) + len(after) == len(boxes) and before and after:
                return can_be_cut(before) and can_be_cut(after)
    return False


@settings(max_examples=40, deadline=None)
@given(LOTS, LISTS, KERFS)
def test_pieces_lie_between_the_selvedges_a_kerf_apart_and_never_on_what_is_reserved(
    lot: Lot, pieces: list[Piece], kerf: float
) -> None:
    cut = made(lot, pieces, kerf)
    for p in cut.placements:
        x, y, right, end = box(p)
        assert min(x, y) >= 0
        assert right <= lot.usable_width_mm + CLOSE
        assert end <= lot.free_length_mm + CLOSE
    for i, a in enumerate(cut.placements):
        assert all(are_apart(a, b, kerf) for b in cut.placements[i + 1 :])


@settings(max_examples=40, deadline=None)
@given(LOTS, LISTS, KERFS)
def test_sizes_and_numbers_are_those_of_the_cut_list(lot: Lot, pieces: list[Piece], kerf: float) -> None:
    cut = made(lot, pieces, kerf)
    assert all(0 <= n <= piece.quantity for n, piece in zip(cut.placed, pieces, strict=True))
    for p in cut.placements:
        asked = pieces[p.piece].across_mm, pieces[p.piece].along_mm
        assert (p.width_mm, p.length_mm) in ((asked,) if pieces[p.piece].warp_bound else (asked, asked[::-1]))


@settings(max_examples=40, deadline=None)
@given(LOTS, LISTS, KERFS)
def test_straight_cuts_from_edge_to_edge_part_the_pieces_and_what_is_left(
    lot: Lot, pieces: list[Piece], kerf: float
) -> None:
    cut = made(lot, pieces, kerf)
    rests = [(r.x_mm, r.y_mm, r.x_mm + r.width_mm, r.y_mm + r.length_mm) for r in (*cut.remnants, *cut.scraps)]
    straight = [box(p) for p in cut.placements if not p.is_offset]
    blocks = [[box(p) for p in cut.placements if p.block == n] for n in {p.block for p in cut.placements if p.block}]
    assert can_be_cut([*straight, *rests, *(round_all(block) for block in blocks)])


def round_all(boxes: Sequence[Box]) -> Box:
    left, start, right, end = zip(*boxes, strict=True)
    return min(left), min(start), max(right), max(end)


def rows_of(piece: Piece, across: float, along: float, width: float, length: float, kerf: float) -> tuple[int, float]:
    """How many come out of straight rows, and the length that they take with their last cut."""
    columns = int((width + kerf) // (across + kerf))
    rows = min(int((length + kerf) // (along + kerf)), ceil(piece.quantity / columns)) if columns else 0
    return min(piece.quantity, columns * rows), rows * (along + kerf)


def straight_count(pieces: Sequence[Piece], lot: Lot, kerf: float) -> int:
    """One size after the other in straight rows from side to side, each the way that gives more or takes less."""
    count, length = 0, float(lot.free_length_mm)
    for piece in pieces:
        ways = [(piece.across_mm, piece.along_mm)] + ([] if piece.warp_bound else [(piece.along_mm, piece.across_mm)])
        found = [rows_of(piece, *way, lot.usable_width_mm, length, kerf) for way in ways]
        number, taken = max(found, key=lambda item: (item[0], -item[1]))
        count, length = count + number, length - taken
    return count


@settings(max_examples=80, deadline=None)
@given(LOTS, LISTS, KERFS)
def test_no_list_comes_out_worse_than_in_straight_rows(lot: Lot, pieces: list[Piece], kerf: float) -> None:
    assert len(made(lot, pieces, kerf).placements) >= straight_count(pieces, lot, kerf)


@settings(max_examples=40, deadline=None)
@given(LOTS, RECTANGLES | DISCS, KERFS)
def test_one_size_takes_no_more_length_than_in_straight_rows(lot: Lot, piece: Piece, kerf: float) -> None:
    ways = [(piece.across_mm, piece.along_mm)] + ([] if piece.warp_bound else [(piece.along_mm, piece.across_mm)])
    found = [rows_of(piece, *way, lot.usable_width_mm, lot.free_length_mm, kerf) for way in ways]
    whole = [length for number, length in found if number == piece.quantity]
    if whole:
        ends = [p.y_mm + p.length_mm for p in made(lot, [piece], kerf).placements]
        assert max(ends) <= min(whole) - kerf + CLOSE


@settings(max_examples=40, deadline=None)
@given(LOTS, LISTS, KERFS)
def test_what_is_left_lies_clear_of_every_piece(lot: Lot, pieces: list[Piece], kerf: float) -> None:
    cut = made(lot, pieces, kerf)
    left = [Placement(0, r.x_mm, r.y_mm, r.width_mm, r.length_mm) for r in (*cut.remnants, *cut.scraps)]
    assert all(are_apart(rest, p, kerf) for rest in left for p in cut.placements)
    assert cut.waste_m2 >= 0
