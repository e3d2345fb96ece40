"""`cut`: will the pieces come out of this lot, or of the lots of a cloth together; drawn and in words."""

import argparse
from collections.abc import Iterator, Sequence
from typing import TYPE_CHECKING, Any

from catalog.errors import InputError, NotFoundError
from tui.commandline.options import Setting
from tui.exit_codes import ExitCode, one_line

if TYPE_CHECKING:
    from catalog.stock.cutting_pieces import Piece
    from catalog.stock.layout import LotCut
    from catalog.stock.plan import Plan

MOST_KERF_MM = 100


def add(commands: "argparse._SubParsersAction[argparse.ArgumentParser]", **rest: Any) -> None:
    """Declare the command."""
    parser = commands.add_parser("cut", help="will these pieces come out of a cloth's lots", **rest)
    parser.add_argument("cloth", metavar="CLOTH", help="the id that match shows in brackets")
    parser.add_argument("--need", action="append", required=True, metavar="TEXT", help="'12 discs 350 mm'; repeatable")
    parser.add_argument("--lot", metavar="LOT", help="out of this lot alone")
    parser.add_argument("--kerf", type=float, default=0.0, metavar="MM", help="what a cut takes (default 0)")
    parser.add_argument("--warp-bound", action="store_true", help="pieces keep the warp along their length")
    parser.set_defaults(run=run)


def run(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    """Lay the pieces out in one lot, or in the fewest heats and lots that hold them."""
    from catalog.stock.cutting import Cutting, cut_lot
    from catalog.stock.plan import plan
    from tui.commandline.show import find_cloth

    if not 0 <= arguments.kerf <= MOST_KERF_MM:
        raise InputError(f"A kerf of {arguments.kerf:g} mm can't be: state 0 to {MOST_KERF_MM}.")
    pieces = [piece_of(text, arguments.warp_bound) for text in arguments.need]
    how: Cutting = Cutting(kerf_mm=arguments.kerf)
    with setting.open() as store:
        cloth = find_cloth(store, arguments.cloth)
        lots = store.lots([cloth.id]).get(cloth.id, ())
    mass = cloth.figures.mass_kg_m2
    if arguments.lot is not None:
        lot = next((one for one in lots if one.id == arguments.lot), None)
        if lot is None:
            held = ", ".join(one.id for one in lots) or "none"
            raise NotFoundError(f"{cloth.id} has no lot {arguments.lot!r}; its lots are: {held}.")
        cuts: Sequence[LotCut] = [cut_lot(lot, pieces, how)]
        why: Sequence[str] = ()
        is_complete = cuts[0].is_complete
    else:
        made: Plan = plan(lots, pieces, how)
        cuts, why, is_complete = made.cuts, made.why, made.is_complete
    if setting.json:
        setting.write_json(document_of(cloth.id, cuts, why, is_complete))
    else:
        setting.write(lines_of(cuts, why, is_complete, mass, setting.ascii))
    return ExitCode.DONE if is_complete else ExitCode.NOTHING_WITHIN_LIMITS


def piece_of(text: str, is_warp_bound: bool) -> "Piece":
    """A piece as the cutter knows it. Raises InputError."""
    from catalog.aiming import parse_need
    from catalog.stock.cutting_pieces import Piece

    need = parse_need(text)
    return Piece(
        quantity=need.pieces,
        width_mm=need.width_mm,
        length_mm=need.length_mm,
        diameter_mm=need.diameter_mm,
        warp_bound=is_warp_bound,
    )


def document_of(cloth: str, cuts: "Sequence[LotCut]", why: Sequence[str], is_complete: bool) -> dict[str, Any]:
    """The answer for scripts."""
    return {
        "schema": 1,
        "cloth": cloth,
        "complete": is_complete,
        "why": list(why),
        "cuts": [
            {
                "lot": cut.lot.id,
                "placed": list(cut.placed),
                "missing": list(cut.missing),
                "taken_mm": float(cut.taken_mm),
                "waste_m2": float(cut.waste_m2),
                "remnants": [
                    {"width_mm": float(rest.width_mm), "length_mm": float(rest.length_mm)} for rest in cut.remnants
                ],
                "steps": list(cut.steps),
                "notes": list(cut.notes),
            }
            for cut in cuts
        ],
    }


def lines_of(
    cuts: "Sequence[LotCut]", why: Sequence[str], is_complete: bool, mass_kg_m2: float | None, is_ascii: bool
) -> Iterator[str]:
    """Each lot's layout, drawn and in words."""
    from textwrap import wrap

    from catalog.stock.cut_drawing import drawing
    from catalog.stock.cutting_summary import summary

    for text in why:
        yield from wrap(one_line(text), 80)
    for cut in cuts:
        yield ""
        yield f"{cut.lot.id} at {one_line(cut.lot.location)}" + ("  demo" if cut.lot.demo else "")
        for text in summary(cut, mass_kg_m2):
            yield from wrap(one_line(text), 80, subsequent_indent="  ")
        yield from drawing(cut, 80, 20, is_ascii)
    yield ""
    yield "All pieces come out." if is_complete else "Not all pieces come out."
