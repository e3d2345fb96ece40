"""The application: themes, the one screen, manners towards the terminal."""

import gc
import logging
import signal
from collections.abc import Callable, Mapping
from pathlib import Path
from typing import Any

from textual.app import App
from textual.events import Event, Key
from textual.theme import Theme

from tui.door import OpenStore
from tui.keyboard import Keyboard, Settled
from tui.memory import Memory
from tui.presenting import UNITS, harmless
from tui.screens.desk import Desk
from tui.widgets.inks import ink_table

COLLECTING_FROM_S = 3.0


def _theme(name: str, is_dark: bool) -> Theme:
    ink = ink_table(is_dark)
    return Theme(
        name=name,
        primary=ink["head"],
        secondary=ink["line"],
        warning=ink["risk"],
        error=ink["bad"],
        success=ink["good"],
        accent=ink["head"],
        foreground=ink["text"],
        background=ink["paper"],
        surface=ink["panel"],
        panel=ink["panel"],
        dark=is_dark,
    )


def _collect() -> None:
    """Collect garbage from now on; what the start has made stays anyway and need not be looked through."""
    gc.freeze()
    gc.enable()


class CrossclothApp(App[None]):
    """The browser."""

    CSS_PATH = "styles.tcss"
    TITLE = "crosscloth"
    ENABLE_COMMAND_PALETTE = False

    def __init__(
        self,
        opener: Callable[[], OpenStore],
        *,
        units: str = "",
        ascii_only: bool = False,
        directory: Path | None = None,
        keys: Mapping[str, str] | None = None,
        **rest: Any,
    ) -> None:
        super().__init__(**rest)
        self.animation_level = "none"
        self.memory = Memory.load(directory)
        self._directory = directory
        remembered = self.memory.units if self.memory.units in UNITS else "both"
        self.desk = Desk(
            opener, self.memory, units if units in UNITS else remembered, ascii_only, keys or {}, directory
        )
        self.keyboard = Keyboard(self, self.desk, super().on_event)
        self._dress(ascii_only)

    def _dress(self, ascii_only: bool) -> None:
        """Themes; and where asked for, no colour and no sign beyond ASCII."""
        from tui.terminal import AsciiOnly, Colourless

        self.register_theme(_theme("crosscloth-dark", True))
        self.register_theme(_theme("crosscloth-light", False))
        self.theme = "crosscloth-dark" if self.memory.dark else "crosscloth-light"
        if self.no_color:
            self._filters.append(Colourless())
        if ascii_only:
            self._filters.append(AsciiOnly())

    def get_default_screen(self) -> Desk:
        """The desk."""
        return self.desk

    async def on_event(self, event: Event) -> None:
        """Keys go by way of the keyboard."""
        if isinstance(event, Key) and not event.is_forwarded:
            await self.keyboard.strike(event)
        else:
            await super().on_event(event)

    async def on_settled(self, event: Settled) -> None:
        """Hand on the keys that waited."""
        await self.keyboard.release()

    def on_mount(self) -> None:
        """Leave a clean terminal when told to end."""
        if not self.is_headless:
            self._mind_signals()
        self.set_timer(COLLECTING_FROM_S, _collect)

    def _mind_signals(self) -> None:
        import asyncio

        loop = asyncio.get_running_loop()
        for number in (signal.SIGTERM, signal.SIGHUP):
            loop.add_signal_handler(number, self.exit, None, 128 + number)

    def _handle_exception(self, error: Exception) -> None:
        """What was not foreseen ends the program with a sentence; the log has the rest."""
        if self.is_headless:
            super()._handle_exception(error)
            return
        logging.getLogger(__name__).error("not foreseen", exc_info=error)
        said = f"{type(error).__name__}: {error}".splitlines()[0]
        self.exit(
            return_code=1,
            message=f"crosscloth: something went wrong that was not foreseen ({harmless(said)}). "
            "What you typed is kept; --verbose writes a log.",
        )

    def action_help_quit(self) -> None:
        """Ctrl+C says how to leave instead of doing it by mistake."""
        self.desk.say("F10 leaves, or q outside the line.")

    async def action_quit(self) -> None:
        """Leave."""
        self.desk.action_quit()

    def on_unmount(self) -> None:
        """Keep what is remembered."""
        self.memory.save(self._directory)
        self.desk.door.close()


def browse(
    location: str,
    *,
    ascii_only: bool = False,
    units: str = "both",
    mouse: bool = True,
    directory: Path | None = None,
) -> int:
    """Run the browser on the store at *location*; the exit status comes back.

    *units* 'inch' or 'metric' are kept to; 'both' leaves it to what was used last. *directory* holds what is
    remembered and the user's own keys; without it that is the user's state directory.
    """
    from tui.memory import own_keys
    from tui.places import state_directory
    from tui.terminal import forgiving_driver

    kept = directory or state_directory()

    def opener() -> OpenStore:
        from catalog.storage.opening import open_store

        return open_store(location)

    gc.disable()  # until the first frame: collecting while importing costs a tenth of the start
    app = CrossclothApp(
        opener,
        units="" if units == "both" else units,
        ascii_only=ascii_only,
        directory=kept,
        keys=own_keys(kept),
        driver_class=forgiving_driver(),
    )
    app.run(mouse=mouse)
    return app.return_code or 0
