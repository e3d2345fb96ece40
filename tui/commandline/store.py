"""`store`: where it is, a new one, without the invented demo."""

import argparse
from typing import Any

from catalog.errors import InputError
from tui.commandline.options import Setting
from tui.exit_codes import ExitCode, one_line


def add(commands: "argparse._SubParsersAction[argparse.ArgumentParser]", **rest: Any) -> None:
    """Declare the command."""
    parser = commands.add_parser("store", help="the file that holds catalogue and stock", **rest)
    actions = parser.add_subparsers(dest="action", metavar="ACTION", required=True)
    actions.add_parser("where", help="where it is and what it holds", **rest)
    new = actions.add_parser("new", help="make one with the reference catalogue", **rest)
    new.add_argument("--without-demo", action="store_true", help="leave out the invented stockist")
    actions.add_parser("drop-demo", help="take the invented stockist's cloths and lots out", **rest)
    actions.add_parser("spheres", help="fill in the largest sphere of twilled Dutch cloth (a second each)", **rest)
    parser.set_defaults(run=run)


def run(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    """Do what the action says."""
    return {"where": where, "new": new, "drop-demo": drop_demo, "spheres": spheres}[arguments.action](
        arguments, setting
    )


def where(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    """Say where the store is, whether it exists and can be written, and what it holds. Makes nothing."""
    from catalog.search.reader import Filters
    from catalog.storage.existing import exists

    location = setting.location
    document: dict[str, Any] = {"schema": 1, "store": location, "exists": exists(location)}
    if document["exists"]:
        with setting.open(create=False) as store:
            document |= {
                "writable": store.is_writable,
                "demo": store.has_demo,
                "cloths": store.count(Filters()),
            }
    if setting.json:
        setting.write_json(document)
        return ExitCode.DONE
    setting.write(_where_lines(document))
    return ExitCode.DONE


def _where_lines(document: dict[str, Any]) -> list[str]:
    lines = [one_line(document["store"])]
    if not document["exists"]:
        return [*lines, "Not there yet: the first command that needs it makes it, with the demo stock."]
    access = "can be written" if document["writable"] else "can only be read"
    demo = "holds invented demo lines" if document["demo"] else "no demo lines"
    return [*lines, f"{document['cloths']} cloths; {access}; {demo}."]


def new(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    """Make a store. One that is there is never written over."""
    from catalog.storage.existing import exists

    location = setting.location
    if exists(location):
        raise InputError(f"{location} is there already; nothing was changed. Move it aside or name another --store.")
    with setting.open(with_demo=not arguments.without_demo):
        pass
    return where(arguments, setting)


def drop_demo(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    """Take out everything that is marked demo, in one transaction."""

    with setting.open(create=False) as store:
        gone = store.drop_demo()
    if setting.json:
        setting.write_json({"schema": 1, "dropped": {"cloths": gone}})
    else:
        setting.write([f"Taken out: {gone} invented cloths with their lots, offers and numbers."])
    return ExitCode.DONE


def spheres(arguments: argparse.Namespace, setting: Setting) -> ExitCode:
    """Fill in every sphere that is missing, saying each as it comes."""
    from catalog.storage.spheres import fill_spheres

    found = []
    with setting.open(create=False) as store:
        for cloth, um in fill_spheres(store):
            found.append({"cloth": cloth.id, "sphere_um": um})
            if not setting.json:
                words = "no estimate" if um is None else f"{um:.1f} µm ± 2 %, a geometric estimate"
                setting.write([f"{cloth.id:<16} {words}"])
    if setting.json:
        setting.write_json({"schema": 1, "filled": found})
    else:
        setting.write([f"{len(found)} worked out."])
    return ExitCode.DONE
