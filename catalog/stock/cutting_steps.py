"""The straight cuts of a layout in words, in an order in which they can be made."""

from collections.abc import Sequence
from itertools import count

from catalog.stock.cutting_cells import Cell, Grid, Stagger
from catalog.stock.cutting_pieces import UM_PER_MM, Piece, mm_text
from catalog.stock.layout import letter


def steps(root: Cell, pieces: Sequence[Piece], kerf: int) -> tuple[str, ...]:
    """One sentence a cut or a row of equal cuts. Sizes in *root* and *kerf* are micrometres; in words mm.

    "Across" is across the warp, from side to side; "along" is with the warp, from end to end.
    """
    said: list[str] = []
    to_tell = [(root, "the cloth")]
    numbers = count(1)
    while to_tell:
        cell, name = to_tell.pop()
        if cell.parts is None:
            said += [] if cell.content is None else [_sentence(name, _content(cell.content, pieces, kerf))]
            continue
        parts = _flat(cell)
        names = [f"part {next(numbers)}" if min(part.width, part.length) > kerf else "" for part in parts]
        said.append(_sentence(name, _cuts(cell, parts, names, kerf)))
        to_tell += reversed(list(zip(parts, names, strict=True)))
    return tuple(said)


def _cuts(cell: Cell, parts: Sequence[Cell], names: Sequence[str], kerf: int) -> str:
    places = ", ".join(_mm(_end(part, cell) - kerf) for part in parts[:-1])
    made = "; ".join(_part(part, name, kerf) for part, name in zip(parts, names, strict=True))
    return f"cut {'across' if cell.is_cut_across else 'along'} at {places} mm: {made}."


def _flat(cell: Cell) -> list[Cell]:
    """Parts that successive cuts in one direction make."""
    found: list[Cell] = []
    to_see = [cell]
    while to_see:
        part = to_see.pop()
        if part.parts is not None and part.is_cut_across == cell.is_cut_across:
            to_see.extend(reversed(part.parts))
        else:
            found.append(part)
    return found


def _end(part: Cell, of: Cell) -> int:
    return part.y + part.length - of.y if of.is_cut_across else part.x + part.width - of.x


def _part(part: Cell, name: str, kerf: int) -> str:
    if not name:
        return "a trim within the kerf"
    left = ", left over" if part.parts is None and part.content is None else ""
    return f"{name} {_mm(part.width - kerf)} × {_mm(part.length - kerf)}{left}"


def _content(content: Grid | Stagger, pieces: Sequence[Piece], kerf: int) -> str:
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
