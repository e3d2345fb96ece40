"""`show`: one cloth's data sheet, drawn to scale; --explain lays the sums out."""

import argparse
from collections.abc import Iterator, Sequence
from textwrap import wrap
from typing import TYPE_CHECKING, Any

from catalog.errors import InputError, NotFoundError
from tui.commandline.options import Setting
from tui.commandline.reading_text import length_text
from tui.exit_codes import ExitCode, one_line

if TYPE_CHECKING:
    from catalog.cloth import Cloth
    from catalog.report.properties import Property, Service
    from catalog.search.reader import Reader
    from catalog.storage.store import Store


def add(commands: "argparse._SubParsersAction[argparse.ArgumentParser]", **rest: Any) -> None:
    """Declare the command."""
    parser = commands.add_parser("show", help="one cloth's data sheet", **rest)
    parser.add_argument("cloth", metavar="CLOTH", help="the id that match and list show in brackets")
    parser.add_argument("--explain", action="store_true", help="lay out the sums")
    parser.add_argument("--flow", metavar="TEXT", help="loss at a face velocity: 'air 20 C 2 m/s', 'water 60 C 5 cm/s'")
    parser.add_argument("--particle", metavar="MM", type=float, help="chance that a sphere of this size passes")
    parser.add_argument("--zinc", metavar="MM", type=float, help="coating per side")
    parser.add_argument("--zinc-before", action="store_true", help="coated before weaving (default: after)")
    parser.add_argument("--area", metavar="M2", type=float, help="net mass of so much")
    parser.add_argument("--oversize", metavar="MM", type=float, help="safety distance with this largest oversize")
    parser.set_defaults(run=run)


def run(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    """Print the sheet of one cloth."""
    from catalog.report.documents import cloth_document, lot_document
    from catalog.report.explain import explain
    from catalog.report.properties import properties

    with setting.open() as store:
        cloth = with_sphere(find_cloth(store, arguments.cloth), store)
        lots = store.lots([cloth.id]).get(cloth.id, ())
    steps = explain(cloth) if arguments.explain else ()
    found = properties(cloth, service_of(arguments))
    if setting.json:
        document = {"schema": 1} | cloth_document(cloth) | {"stock": [lot_document(lot) for lot in lots]}
        document["properties"] = [{"name": p.name, "words": p.words, "source": p.source} | p.values for p in found]
        if arguments.explain:
            names = ("quantity", "formula", "sum", "result", "source")
            document["explain"] = [{name: getattr(step, name) for name in names} for step in steps]
        setting.write_json(document)
        return ExitCode.DONE
    setting.write(sheet_lines(cloth, setting.units))
    setting.write(property_lines(found))
    setting.write(_drawing(cloth, setting.ascii))
    for step in steps:
        source = f"   [{step.source}]" if step.source else ""
        setting.write(["", f"{step.quantity}: {step.formula}", f"  {step.sum}", f"  = {step.result}{source}"])
    setting.write(_lot_lines(lots))
    return ExitCode.DONE


def with_sphere(cloth: "Cloth", store: "Store") -> "Cloth":
    """Twilled Dutch cloth with its sphere, which is worked out now where it isn't kept yet."""
    from dataclasses import replace

    from catalog.construction import Weave

    if cloth.construction.weave is not Weave.TWILLED_DUTCH or cloth.figures.sphere_um is not None:
        return cloth
    if not store.is_writable:
        return cloth
    from catalog.storage.spheres import keep_sphere

    return replace(cloth, figures=replace(cloth.figures, sphere_um=keep_sphere(store, cloth)))


def service_of(arguments: argparse.Namespace) -> "Service":
    """What the options say of the service. Raises InputError for figures that can't be."""
    from catalog.report.properties import Service
    from tui.commandline.match import duty_of

    for name in ("particle", "zinc", "area"):
        value = getattr(arguments, name)
        if value is not None and not 0 < value < 1e6:
            raise InputError(f"--{name} {value:g} can't be: state more than 0.")
    return Service(
        duty=duty_of(arguments.flow),
        particle_mm=arguments.particle,
        coating_mm=arguments.zinc,
        coated_after_weaving=not arguments.zinc_before,
        area_m2=arguments.area,
        oversize_mm=arguments.oversize,
    )


def property_lines(found: "Sequence[Property]") -> Iterator[str]:
    """Figures in service, each on lines of at most 80 columns."""
    for one in found:
        yield from wrap(one_line(one.words), 80, initial_indent=f"{one.name:<16}", subsequent_indent=" " * 16)


def find_cloth(store: "Reader", cloth_id: str) -> "Cloth":
    """The cloth with this id. Raises NotFoundError, with the nearest ids."""
    cloth = store.cloth(cloth_id)
    if cloth is not None:
        return cloth
    from difflib import get_close_matches

    from catalog.search.reader import Filters

    ids = [c.id for c in store.select(Filters(), "id", 5000)]
    near = tuple(get_close_matches(cloth_id, ids, 3))
    hint = f" Near it: {', '.join(near)}." if near else ""
    raise NotFoundError(f"No cloth has the id {cloth_id!r}.{hint}", near)


def sheet_lines(cloth: "Cloth", units: str) -> Iterator[str]:
    """The data sheet: every figure with its unit and where it comes from."""
    from catalog.callout.writing import sentence

    made, figures = cloth.construction, cloth.figures
    demo = "   DEMO: invented" if cloth.demo else ""
    yield f"{one_line(cloth.name)}  [{cloth.id}]{demo}"
    yield f"sold as     {one_line(cloth.declared)}"
    yield f"weave       {made.weave.words}, {made.kind}"
    for name, wires in (("warp", made.warp), ("weft", made.weft)):
        parts = [f"{float(wires.count_per_in):.4g} per inch", f"pitch {length_text(wires.pitch_mm, units)}"]
        parts.append(f"wire {length_text(wires.wire_mm, units)}")
        yield f"{name}        {', '.join(parts)}"
        if not made.is_filter:
            yield f"            aperture {length_text(wires.aperture_mm, units)}"
    if figures.open_area_pct is not None:
        yield f"open area   {figures.open_area_pct:.2f} %"
    if figures.mass_kg_m2 is not None and not made.is_filter:
        yield f"mass        {figures.mass_kg_m2:.4g} kg/m² nominal (ISO 9044)"
    if figures.mass_geometric_kg_m2 is not None:
        yield f"            {figures.mass_geometric_kg_m2:.4g} kg/m² geometric estimate"
    yield f"thickness   {length_text(figures.thickness_mm, units)}, at least"
    if figures.porosity is not None:
        yield f"porosity    {figures.porosity:.3f} (at thickness D + 2d)"
    yield from _filter_lines(cloth)
    finish = f", {one_line(made.finish)}" if made.finish else ""
    yield f"alloy       {one_line(made.alloy or 'not on record')}{finish}"
    yield f"source      {one_line(cloth.source)}"
    yield from wrap(sentence(made, figures.mass_kg_m2), 80, initial_indent="in a line   ", subsequent_indent=" " * 12)


def _filter_lines(cloth: "Cloth") -> Iterator[str]:
    if not cloth.construction.is_filter:
        return
    rating = cloth.rating
    if rating:
        method = f", {one_line(rating.method)}" if rating.method else ", method not stated"
        yield f"rating      {rating.um:g} µm {rating.kind}{method}"
    else:
        yield "rating      none on record"
    if cloth.figures.sphere_um is not None:
        yield f"            {cloth.figures.sphere_um:.1f} µm largest rigid sphere: a geometric estimate, no rating"


def _drawing(cloth: "Cloth", ascii_only: bool) -> list[str]:
    from tui.widgets.cloth_drawing import draw

    return ["", *draw([(one_line(cloth.declared), cloth.construction)], 78, 16, ascii_only=ascii_only)]


def _lot_lines(lots: Any) -> Iterator[str]:
    yield ""
    if not lots:
        yield "none on the rack"
    for lot in lots:
        demo = " demo" if lot.demo else ""
        certificate = f", certificate {lot.certificate}" if lot.certificate else ""
        heat = f", heat {one_line(lot.heat)}" if lot.heat else ""
        yield (
            f"lot {lot.id} at {lot.location}: {lot.form}, {lot.usable_width_mm} mm usable × "
            f"{lot.free_length_mm / 1000:.2f} m = {lot.available_m2:.2f} m²{certificate}{heat}{demo}"
        )
