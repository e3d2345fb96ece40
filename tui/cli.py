"""The command line: which command, with what options; the browser where none is named."""

import argparse
import gc
import logging
import os
import sys
from collections.abc import Sequence
from contextlib import suppress
from importlib import import_module
from typing import Any, NoReturn

from catalog.errors import CrossclothError, InputError, StoreError
from catalog.version import VERSION
from tui.commandline.options import Setting, common, setting_of, terminal_is_dumb
from tui.exit_codes import ExitCode, complain, exit_code, say

COMMANDS = ("read", "match", "list", "show", "identify", "receipt", "cut", "sheet", "tables", "audit", "store")
MODULES = {"list": "listing"}


class Parser(argparse.ArgumentParser):
    """A parser whose complaint is one sentence and exit 2."""

    def error(self, message: str) -> Any:
        """Say what is wrong with the options and where help is."""
        raise InputError(f"{message}; '{self.prog} --help' lists what there is.", "E_USAGE")


def parser_for(argv: Sequence[str]) -> argparse.ArgumentParser:
    """The parser; only the command that is named is filled in, so that the others cost nothing."""
    parser = Parser(
        prog="crosscloth",
        description="Finds equivalents of woven wire cloth between inch and metric, on figures that are computed.",
        epilog="Without a command the browser opens. Exit codes: 0 done, 1 nothing within limits, "
        "2 input, 3 store, 130 interrupted.",
        parents=[common(defaults=True)],
        allow_abbrev=False,
    )
    parser.add_argument("--version", action="version", version=f"crosscloth {VERSION}")
    parser.add_argument("--no-mouse", action="store_true", help="the browser leaves the mouse to the terminal")
    commands = parser.add_subparsers(dest="command", metavar="COMMAND", parser_class=Parser)
    shared = common(defaults=False)
    shared.add_argument("--version", action="version", version=f"crosscloth {VERSION}")
    named = [word for word in argv if word in COMMANDS]
    for name in named[:1] or COMMANDS:
        module = import_module(f"tui.commandline.{MODULES.get(name, name)}")
        module.add(commands, parents=[shared], allow_abbrev=False)
    return parser


def main(argv: Sequence[str] | None = None) -> int:
    """Run the program and return its exit code."""
    gc.disable()  # one answer makes no garbage worth a collection; what runs on turns it on again
    try:
        return _answer(list(sys.argv[1:] if argv is None else argv))
    finally:
        gc.enable()


def _answer(words: list[str]) -> int:
    setting: Setting | None = None
    try:
        arguments = parser_for(words).parse_args(words)
        setting = setting_of(arguments)
        if setting.verbose:
            _start_log(words)
        if arguments.command is None:
            return _browse(setting, mouse=not arguments.no_mouse)
        return int(arguments.run(arguments, setting))
    except CrossclothError as error:
        return _fail(error, setting, "--json" in words)
    except KeyboardInterrupt:
        say("crosscloth: interrupted.")
        return ExitCode.INTERRUPTED
    except BrokenPipeError:
        _silence_stdout()
        return ExitCode.DONE
    except Exception as error:  # a fault of ours: one sentence, the whole of it in the log
        if setting is not None and setting.verbose:
            logging.getLogger("crosscloth").exception("unforeseen")
        where = f"{type(error).__name__}: {error}"
        return _fail(
            CrossclothError(f"Something went wrong that was not foreseen ({where}); --verbose logs it."), setting
        )


def _fail(error: CrossclothError, setting: Setting | None, wants_json: bool = False) -> int:
    complain(error)
    if wants_json or (setting is not None and setting.json):
        from catalog.report.documents import error_document

        (setting or Setting(None, True, "both", False, False)).write_json(error_document(error))
    return exit_code(error)


def _silence_stdout() -> None:
    """The reader of our output went away: nothing more to say, and no complaint at exit."""
    os.dup2(os.open(os.devnull, os.O_WRONLY), sys.stdout.fileno())


def _browse(setting: Setting, mouse: bool) -> int:
    if terminal_is_dumb():
        say(
            "crosscloth: the browser needs a terminal; every place of it is a command as well: "
            "crosscloth match, list, show, tables. 'crosscloth --help' lists them."
        )
        return ExitCode.BAD_INPUT
    gc.enable()
    from tui.app import browse
    from tui.places import make_room

    return browse(make_room(setting.location), ascii_only=setting.ascii, units=setting.units, mouse=mouse)


def _start_log(words: list[str]) -> None:
    from tui.places import state_directory

    try:
        logging.basicConfig(
            filename=state_directory() / "crosscloth.log",
            level=logging.INFO,
            format="%(asctime)s %(levelname)s %(name)s: %(message)s",
        )
    except OSError as error:
        raise StoreError(f"The log can't be written: {(error.strerror or str(error)).lower()}.") from None
    logging.getLogger("crosscloth").info("version %s called with %r", VERSION, words)


def run() -> NoReturn:
    """Run as a program, and leave at once: taking the interpreter apart would cost a seventh of a match."""
    code = main()
    logging.shutdown()
    with suppress(BrokenPipeError):
        sys.stdout.flush()
    sys.stderr.flush()
    os._exit(code)
