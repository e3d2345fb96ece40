"""The real program in a pseudo-terminal: what stands on the screen, and with what status it ends."""

import os
import re
import sys
import time
from collections.abc import Callable, Mapping
from pathlib import Path

import pexpect
import pyte

PATIENCE_S = 30.0
# key protocol and mode requests that the screen emulator would print instead of obeying
UNKNOWN = re.compile(r"\x1b\[[<>=?][0-9;]*u|\x1b\[>[0-9;]*[a-zA-Z]|\x1b\[\?[0-9;]*\$p|\x1bP[^\x1b]*\x1b\\")
KEYS = {
    "enter": "\r", "escape": "\x1b", "down": "\x1b[B", "up": "\x1b[A", "f1": "\x1bOP", "f2": "\x1bOQ", "f3": "\x1bOR",
    "f4": "\x1bOS", "f5": "\x1b[15~", "f10": "\x1b[21~", "page down": "\x1b[6~",
}  # fmt: skip


class Terminal:
    """One run of the program."""

    def __init__(self, home: Path, *arguments: str, columns: int = 80, rows: int = 24, **environment: str) -> None:
        self.columns, self.rows = columns, rows
        self.raw = ""
        self.screen = pyte.Screen(columns, rows)
        self.stream = pyte.Stream(self.screen)
        self.child = pexpect.spawn(
            sys.executable,
            ["-c", "import sys; from tui.cli import main; sys.exit(main())", *arguments],
            env=_environment(home, environment),
            cwd=home,
            dimensions=(rows, columns),
            encoding="utf-8",
            codec_errors="replace",
            timeout=PATIENCE_S,
        )

    @property
    def lines(self) -> list[str]:
        """What stands on the screen."""
        return [line.rstrip() for line in self.screen.display]

    @property
    def text(self) -> str:
        """What stands on the screen, as one text."""
        return "\n".join(self.lines)

    def pump(self, seconds: float = 0.05) -> None:
        """Take in what the program has written."""
        try:
            part = self.child.read_nonblocking(65536, timeout=seconds)
        except (pexpect.TIMEOUT, pexpect.EOF):
            return
        self.raw += part
        self.stream.feed(UNKNOWN.sub("", part))

    def until(self, holds: Callable[[str], bool], what: str = "") -> None:
        """Wait till the screen fulfils something; fail, with the screen, where it never does."""
        end = time.monotonic() + PATIENCE_S
        while not holds(self.text):
            self.pump()
            if time.monotonic() > end:
                raise AssertionError(f"never came about: {what}\n{self.text}")

    def shows(self, words: str) -> None:
        """Wait till these words stand on the screen."""
        self.until(lambda text: words in text, words)

    def keys(self, *names: str) -> None:
        """Send keys back to back, as fast as a terminal does."""
        self.child.send("".join(KEYS.get(name, name) for name in names))

    def ends(self) -> int:
        """Wait till the program has ended; its exit status (128 + the signal where a signal ended it)."""
        end = time.monotonic() + PATIENCE_S
        while self.child.isalive() and time.monotonic() < end:
            self.pump()
        self.pump()
        self.child.close()
        if self.child.exitstatus is not None:
            return int(self.child.exitstatus)
        return 128 + int(self.child.signalstatus or 0)


def _environment(home: Path, extra: Mapping[str, str]) -> dict[str, str]:
    kept = {name: os.environ[name] for name in ("PATH", "VIRTUAL_ENV", "PYTHONPATH", "LANG") if name in os.environ}
    return {
        **kept,
        "HOME": str(home),
        "XDG_DATA_HOME": str(home / "data"),
        "XDG_STATE_HOME": str(home / "state"),
        "TERM": "xterm-256color",
        "COLORTERM": "truecolor",
        "LC_ALL": "C.UTF-8",
        **extra,
    }
