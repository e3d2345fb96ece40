"""The straight cuts of a layout in words, in an order in which they can be made."""

from collections.abc import Sequence

from catalog.stock.cutting_cells import Cell, Grid, Stagger
from catalog.stock.cutting_pieces import UM_PER_MM, Piece, mm_text
from catalog.stock.layout import letter


def steps(root: Cell, pieces: Sequence[Piece], kerf: int) -> tuple[str, ...]:
    """One sentence a cut or a row of equal cuts. Sizes in *root* and *kerf* are micrometres; in words mm.

    "Across" is across the warp, from side to side; "along" is with the warp, from end to end.
    """
    said: list[str] = []
    _tell(root, "the cloth", "", pieces, kerf, said)
    return tuple(said)


def _tell(cell: Cell, name: str, number: str, pieces: Sequence[Piece], kerf: int, said: list[str]) -> None:
    if cell.parts is None:
        if cell.content is not None:
            said.append(_sentence(name, _content(cell.content, cell, pieces, kerf)))
        return
    parts = _flat(cell, cell.is_cut_across)
    numbers = [f"{number}.{i}" if number else str(i) for i in range(1, len(parts) + 1)]
    places = ", ".join(_mm(_end(part, cell) - kerf) for part in parts[:-1])
    list_of = "; ".join(_part(part, no, kerf) for part, no in zip(parts, numbers, strict=True))
    way = "across" if cell.is_cut_across else "along"
    said.append(_sentence(name, f"cut {way} at {places} mm: {list_of}."))
    for part, no in zip(parts, numbers, strict=True):
        _tell(part, f"part {no}", no, pieces, kerf, said)


def _flat(cell: Cell, is_across: bool) -> list[Cell]:
    """Parts that successive cuts in one direction make."""
    if cell.parts is None or cell.is_cut_across != is_across:
        return [cell]
    return [part for half in cell.parts for part in _flat(half, is_across)]


def _end(part: Cell, of: Cell) -> int:
    return part.y + part.length - of.y if of.is_cut_across else part.x + part.width - of.x


def _part(part: Cell, number: str, kerf: int) -> str:
    width, length = part.width - kerf, part.length - kerf
    if width <= 0 or length <= 0:
        return "a trim within the kerf"
    left = ", left over" if part.parts is None and part.content is None else ""
    return f"part {number} {_mm(width)} × {_mm(length)}{left}"


def _content(content: Grid | Stagger, cell: Cell, pieces: Sequence[Piece], kerf: int) -> str:
    piece = pieces[content.kind]
    if isinstance(content, Stagger):
        return _offset(content, letter(content.kind), piece)
    made = f"{content.count} × {letter(content.kind)}"
    turned = ", turned" if content.is_turned else ""
    disc = f"; cut a disc {piece.size_text} out of {'it' if content.count == 1 else 'each'}" if piece.is_disc else ""
    size = f"{_mm(content.width - kerf)} × {_mm(content.length - kerf)}"
    if content.count == 1:
        return f"is {letter(content.kind)}, {size}{turned}{disc}."
    cuts = []
    if content.rows > 1:
        cuts.append(f"across into {content.rows} strips of {_mm(content.length - kerf)}")
    if content.columns > 1:
        each = "each of them " if cuts else ""
        cuts.append(f"{each}along into {content.columns} of {_mm(content.width - kerf)}")
    return f"cut {', '.join(cuts)} mm: {made}, {size}{turned}{disc}."


def _offset(content: Stagger, mark: str, piece: Piece) -> str:
    way = "across" if content.is_along else "along"
    return (
        f"cut {content.count} × {mark}, discs {piece.size_text}, out of it one by one: centres {_mm(content.pitch)} mm "
        f"apart in a row, rows {_mm(content.rise)} mm apart {way} the cloth, every other row moved aside by "
        f"{_mm(content.offset)} mm."
    )


def _sentence(name: str, rest: str) -> str:
    return f"{name[0].upper()}{name[1:]}{' ' if rest.startswith('is ') else ': '}{rest}"


def _mm(size: int) -> str:
    return mm_text(size / UM_PER_MM)
