"""The options that stand before or after any command, and what they come to."""

import argparse
import os
import sys
from collections.abc import Iterable
from dataclasses import dataclass
from typing import TYPE_CHECKING, Any

if TYPE_CHECKING:
    from catalog.storage.store import Store

PLAIN = str.maketrans(
    {"×": "x", "²": "2", "³": "3", "±": "+/-", "µ": "u", "Ø": "dia ", "−": "-", "≈": "~", "≥": ">=", "≤": "<=",
     "″": '"', "′": "'", "½": "1/2", "¼": "1/4", "°": " deg", "–": "-", "—": "-", "·": ".", "→": "->", "…": "...",
     "Δ": "d", "√": "sqrt ", "π": "pi", "ρ": "rho", "⁴": "4", "│": "|", "─": "-", "ü": "ue", "ö": "oe", "ä": "ae"}
)  # fmt: skip


@dataclass(frozen=True, slots=True)
class Setting:
    """How the program was called."""

    store: str | None
    json: bool
    units: str
    ascii: bool
    verbose: bool

    @property
    def location(self) -> str:
        """Where the store is: option, environment, or the user's data directory."""
        from tui.places import store_location

        return self.store or store_location()

    def open(self, *, create: bool = True, with_demo: bool = True) -> "Store":
        """Open the store, making it first where there is none and *create* is set. Raises StoreError."""
        from catalog.storage.opening import open_store
        from tui.places import make_room

        return open_store(make_room(self.location), create=create, with_demo=with_demo)

    def write(self, lines: Iterable[str]) -> None:
        """Write lines to standard output in what its encoding (or --ascii) can hold."""
        encoding = sys.stdout.encoding or "utf-8"
        for line in lines:
            text = line.translate(PLAIN) if self.ascii or not _speaks_unicode(encoding) else line
            if self.ascii:
                text = text.encode("ascii", "replace").decode("ascii")
            sys.stdout.write(text.encode(encoding, "replace").decode(encoding) + "\n")

    def write_json_rows(self, head: dict[str, Any], rows: Iterable[dict[str, Any]]) -> None:
        """Write a document whose last key, 'rows', is streamed: a row a line, however many."""
        import json

        opening = json.dumps(head, ensure_ascii=self.ascii)[:-1]
        sys.stdout.write(f'{opening}, "rows": [')
        separator = "\n"
        for row in rows:
            sys.stdout.write(separator + json.dumps(row, ensure_ascii=self.ascii, allow_nan=False))
            separator = ",\n"
        sys.stdout.write("\n]}\n")

    def write_json(self, document: dict[str, Any], indent: int | None = 2) -> None:
        """Write one JSON document; *indent* None puts it on one line."""
        import json

        sys.stdout.write(json.dumps(document, ensure_ascii=self.ascii, indent=indent, allow_nan=False) + "\n")


def _speaks_unicode(encoding: str) -> bool:
    return encoding.lower().replace("-", "").startswith("utf")


def common(defaults: bool) -> argparse.ArgumentParser:
    """The options for everywhere. Only the outer parser sets defaults, so that either place counts."""
    parser = argparse.ArgumentParser(add_help=False, allow_abbrev=False)
    group = parser.add_argument_group("everywhere")

    def add(*names: str, default: Any, **rest: Any) -> None:
        group.add_argument(*names, default=default if defaults else argparse.SUPPRESS, **rest)

    add("--store", default=None, metavar="PATH|URL", help="the store to use (else CROSSCLOTH_STORE, else your own)")
    add("--json", default=False, action="store_true", help="answer as JSON")
    add("--units", default="both", choices=("inch", "metric", "both"), help="units on the screen")
    add("--ascii", default=False, action="store_true", help="no sign beyond ASCII")
    add("--verbose", default=False, action="store_true", help="write a log in the state directory")
    return parser


def setting_of(arguments: argparse.Namespace) -> Setting:
    """What the options come to."""
    return Setting(arguments.store, arguments.json, arguments.units, arguments.ascii, arguments.verbose)


def terminal_is_dumb() -> bool:
    """True where a full-screen program can't run: no terminal, or one that can do nothing."""
    return not (sys.stdin.isatty() and sys.stdout.isatty()) or os.environ.get("TERM", "") in ("", "dumb")
