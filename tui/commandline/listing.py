"""`list`: the catalogue by figures, with what each limit removed and what falls just short."""

import argparse
import re
from collections.abc import Callable
from typing import TYPE_CHECKING, Any

from catalog.errors import InputError
from tui.commandline.listing_text import cloth_line, list_lines, moved_lines
from tui.commandline.match import weave_of
from tui.commandline.options import Setting
from tui.exit_codes import ExitCode

if TYPE_CHECKING:
    from catalog.cloth import Cloth
    from catalog.search.reader import Filters, Range

SORTS = ("aperture", "wire", "open-area", "mass", "id")
UNITS = {"mm": 1.0, "um": 0.001, "µm": 0.001, "μm": 0.001, "in": 25.4, '"': 25.4, "thou": 0.0254}
NUMBER = r"(\d*[.,]?\d+)"
UNIT_BEFORE_DOTS = re.compile(r"\s*(mm|um|µm|μm|in|\"|thou)\s*\.\.\s*([\d.,]*)\s*(?:mm|um|µm|μm|in|\"|thou)?\s*$")
RANGE = re.compile(rf"^\s*{NUMBER}?\s*(\.\.)?\s*{NUMBER}?\s*(mm|um|µm|μm|in|\"|thou)\s*$")


def add(commands: "argparse._SubParsersAction[argparse.ArgumentParser]", **rest: Any) -> None:
    """Declare the command."""
    parser = commands.add_parser("list", help="the catalogue by figures", **rest)
    parser.add_argument("--aperture", metavar="FROM..TO UNIT", help="'0.1..0.2mm', '..0.8mm', '0.25mm'")
    parser.add_argument("--wire", metavar="FROM..TO UNIT", help="'0.35mm..', written '0.35..mm'")
    parser.add_argument("--thickness", metavar="FROM..TO UNIT")
    parser.add_argument("--min-open-area", type=float, metavar="PCT")
    parser.add_argument("--max-mass", type=float, metavar="KG_M2")
    parser.add_argument("--rating", metavar="FROM..TO UNIT", help="filter cloth by its rating: '30..50um'")
    parser.add_argument("--alloy", metavar="NAME", help="an alloy, a family ('stainless'), several with commas")
    parser.add_argument("--weave", metavar="WEAVE")
    parser.add_argument("--max-price", metavar="PER_M2", help="offered at no more, in the offer's currency: 24.50")
    parser.add_argument("--source", metavar="WORDS", help="comes from a source with these words")
    parser.add_argument("--max-loss", metavar="K", type=float, help="loss coefficient of at most K, with --flow")
    parser.add_argument("--flow", metavar="TEXT", help="fluid and face velocity: 'air 20 C 2 m/s'")
    parser.add_argument("--called", metavar="COUNT", type=int, help="everything that goes by a spoken name: 60")
    parser.add_argument("--in-stock", action="store_true")
    parser.add_argument("--move", metavar="LIMIT=VALUE", help="which lines come and go: 'min-open-area=44'")
    parser.add_argument("--sort", choices=SORTS, default="aperture")
    parser.add_argument("--limit", type=int, metavar="N", help="how many to list (default: all)")
    parser.set_defaults(run=run)


def run(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    """List what lies inside the limits; where nothing does, say why and what is near."""
    from catalog.search.limit_report import come_and_go, filters_of, limit_report

    limits, scope = limits_of(arguments), scope_of(arguments)
    moved = moved_limits(arguments)
    if arguments.limit is not None and arguments.limit < 1:
        raise InputError(f"--limit takes 1 or more, not {arguments.limit}.")
    if arguments.called is not None:
        return _called(arguments.called, scope, setting)
    with setting.open() as store:
        filters = filters_of(limits, scope)
        passes = loss_test(arguments)
        if passes is None:
            total, cloths = store.count(filters), store.select(filters, arguments.sort, arguments.limit)
        else:
            every = [c for c in store.select(filters, arguments.sort) if passes(c)]
            total, cloths = len(every), every[: arguments.limit]
        report = limit_report(limits, scope, store) if limits or scope != type(scope)() else None
        lots = store.lots([c.id for c in cloths])
        after = () if moved is None else store.select(filters_of(moved, scope), arguments.sort)
        come, go = ((), ()) if moved is None else come_and_go(store.select(filters, arguments.sort), after)
    if setting.json:
        from catalog.report.documents import list_document

        document = list_document(total, cloths, report, lots)
        if moved is not None:
            document["moved"] = {"come": [c.id for c in come], "go": [c.id for c in go]}
        setting.write_json(document)
    else:
        setting.write(list_lines(total, cloths, report, lots, setting.units))
        setting.write(moved_lines(come, go, setting.units) if moved is not None else ())
    return ExitCode.DONE if cloths else ExitCode.NOTHING_WITHIN_LIMITS


def _called(count: int, scope: "Filters", setting: Setting) -> ExitCode:
    """Everything sold under one spoken count, finest opening first, and how far apart the openings lie."""
    from catalog.search.lookalikes import called

    with setting.open() as store:
        cloths = called(count, store.select(scope))
        lots = store.lots([c.id for c in cloths])
    if setting.json:
        from catalog.report.documents import list_document

        setting.write_json(list_document(len(cloths), cloths, None, lots))
        return ExitCode.DONE if cloths else ExitCode.NOTHING_WITHIN_LIMITS
    setting.write(cloth_line(cloth, len(lots.get(cloth.id, ())), setting.units) for cloth in cloths)
    apertures = sorted(c.figures.warp_aperture_mm or 0 for c in cloths)
    if apertures:
        apart = (apertures[-1] / apertures[0] - 1) * 100
        setting.write([f"{len(cloths)} cloths go by {count}: the widest opening is {apart:.0f} % over the narrowest."])
    else:
        setting.write([f"Nothing here goes by {count}."])
    return ExitCode.DONE if cloths else ExitCode.NOTHING_WITHIN_LIMITS


MOVABLE = ("aperture", "wire", "thickness", "min-open-area", "max-mass")


def moved_limits(arguments: argparse.Namespace) -> "dict[str, Range] | None":
    """The limits with the one that --move names put elsewhere. Raises InputError."""
    if arguments.move is None:
        return None
    name, _, value = arguments.move.partition("=")
    if name not in MOVABLE or not value:
        raise InputError(f"--move takes one of {', '.join(MOVABLE)} and a value, as in min-open-area=44.")
    key = name.replace("-", "_")
    try:
        put = float(value.replace(",", ".")) if name.startswith("m") else value
    except ValueError:
        raise InputError(f"--move {name} takes a number, not {value!r}.") from None
    return limits_of(argparse.Namespace(**{**vars(arguments), key: put}))


def limits_of(arguments: argparse.Namespace) -> "dict[str, Range]":
    """The limits on figures that the options state. Raises InputError."""
    limits: dict[str, Range] = {}
    for name in ("aperture", "wire", "thickness"):
        text = getattr(arguments, name)
        if text is not None:
            limits[f"{name}_mm"] = range_of(text, name)
    if arguments.rating is not None:
        low, high = range_of(arguments.rating, "rating")
        limits["rating_um"] = (None if low is None else low * 1000, None if high is None else high * 1000)
    if arguments.min_open_area is not None:
        limits["open_area_pct"] = (_sensible(arguments.min_open_area, "an open area", 100), None)
    if arguments.max_mass is not None:
        limits["mass_kg_m2"] = (None, _sensible(arguments.max_mass, "a mass", 1000))
    return limits


def _sensible(value: float, what: str, most: float) -> float:
    if not 0 < value < most:
        raise InputError(f"{what.capitalize()} of {value:g} can't be: state more than 0 and less than {most:g}.")
    return value


def range_of(text: str, name: str) -> "Range":
    """Read '0.1..0.2mm', '..0.8mm', '0.35..mm'; one figure alone is met within 0.5 %. mm. Raises InputError."""
    found = RANGE.match(UNIT_BEFORE_DOTS.sub(r"..\2\1", text) if UNIT_BEFORE_DOTS.search(text) else text)
    if not found or (found[1] is None and found[3] is None):
        raise InputError(f"--{name} takes a range with its unit, like 0.1..0.2mm, ..0.8mm or 0.35..mm, not {text!r}.")
    unit = UNITS[found[4]]
    low, high = (float(part.replace(",", ".")) * unit if part else None for part in (found[1], found[3]))
    if found[2] is None:
        if low is None or high is not None:
            raise InputError(f"--{name} {text!r} has two figures and no '..' between them.")
        return (low * 0.995, low * 1.005)
    if low is not None and high is not None and low > high:
        raise InputError(f"--{name} {text!r} runs backwards: the smaller figure comes first.")
    return (low, high)


def scope_of(arguments: argparse.Namespace) -> "Filters":
    """Alloys, weave and stock as filters. Raises InputError."""
    from catalog.search.reader import Filters

    weave = weave_of(arguments.weave)
    return Filters(
        alloys=alloys_of(arguments.alloy) if arguments.alloy else frozenset(),
        weaves=frozenset([weave]) if weave else frozenset(),
        in_stock=arguments.in_stock,
        source=arguments.source,
        most_price_minor_per_m2=_minor(arguments.max_price),
    )


def _minor(price: str | None) -> int | None:
    """A price in the smallest unit, exact. Raises InputError."""
    if price is None:
        return None
    from decimal import Decimal, InvalidOperation

    try:
        amount = Decimal(price.replace(",", "."))
    except InvalidOperation:
        raise InputError(f"--max-price takes an amount like 24.50, not {price!r}.") from None
    if not 0 < amount < 10**7:
        raise InputError(f"--max-price {price} can't be: state more than 0.")
    return int(amount * 100)


def loss_test(arguments: argparse.Namespace) -> "Callable[[Cloth], bool] | None":
    """The test on the loss coefficient that the options state. Raises InputError."""
    if arguments.max_loss is None:
        return None
    from catalog.search.nearest_where import loses_at_most
    from tui.commandline.match import duty_of

    duty = duty_of(arguments.flow)
    if duty is None:
        raise InputError("--max-loss needs --flow: a loss coefficient depends on fluid and velocity.")
    return loses_at_most(_sensible(arguments.max_loss, "a loss coefficient", 1e9), duty)


def alloys_of(text: str) -> frozenset[str]:
    """The ids of the alloys or families named, with commas between. Raises InputError."""
    from catalog.reference import alloys

    found: set[str] = set()
    for name in (part.strip() for part in text.split(",") if part.strip()):
        one = alloys.find(name)
        family = {a.id for a in alloys.alloys() if name.lower() in (a.family, a.family.split()[-1])}
        if one is None and not family:
            raise InputError(f"No alloy or family is called {name!r}: 'crosscloth tables alloys' lists them.")
        found |= family if one is None else {one.id}
    return frozenset(found)
