"""Driving the browser without a terminal: open it on the small catalogue, wait till it has answered, read it."""

from collections.abc import AsyncIterator, Callable
from contextlib import asynccontextmanager
from pathlib import Path
from typing import Any

from small_catalogue import ASKED, SmallStore
from textual.pilot import Pilot

from tui.app import CrossclothApp
from tui.screens.desk import Desk

PATIENCE = 400


class Driver:
    """A browser under test."""

    def __init__(self, app: CrossclothApp, pilot: Pilot[None]) -> None:
        self.app, self.pilot = app, pilot

    @property
    def desk(self) -> Desk:
        """The screen of places."""
        return self.app.desk

    async def press(self, *keys: str) -> None:
        """Press keys and wait until everything that was asked has been answered."""
        await self.pilot.press(*keys)
        await self.settle()

    async def type(self, text: str) -> None:
        """Type text where the focus is."""
        for char in text:
            await self.pilot.press("space" if char == " " else char)
        await self.settle()

    async def settle(self) -> None:
        """Wait until the store has answered."""
        for _ in range(PATIENCE):
            await self.pilot.pause()
            if self.desk.trouble or (self.desk.door.is_open and not self.desk.door.is_busy):
                break
        await self.pilot.pause()

    async def until(self, holds: Callable[[], bool]) -> None:
        """Wait until something holds; fail where it never does."""
        for _ in range(PATIENCE):
            if holds():
                return
            await self.pilot.pause(0.005)
        raise AssertionError(f"never came about; the screen:\n{self.text}")

    @property
    def lines(self) -> list[str]:
        """What the screen in front shows, as lines of text."""
        strips = self.app.screen._compositor.render_strips()
        return [strip.text.rstrip() for strip in strips]

    @property
    def text(self) -> str:
        """What the screen in front shows."""
        return "\n".join(self.lines)

    @property
    def highlighted(self) -> str:
        """The highlighted row's cells in one line."""
        table = self.desk.place.table
        cells = table.rows.cells(table.cursor) or ()
        return "  ".join(c if isinstance(c, str) else c[0] for c in cells)


@asynccontextmanager
async def browser(
    callout: str = ASKED,
    size: tuple[int, int] = (80, 24),
    opener: Callable[[], Any] = SmallStore,
    directory: Path | None = None,
    **rest: Any,
) -> AsyncIterator[Driver]:
    """The browser on the small catalogue, with *callout* typed and the focus in the list."""
    app = CrossclothApp(opener, directory=directory, **rest)
    if callout:
        app.memory.callout = callout
    async with app.run_test(size=size) as pilot:
        driver = Driver(app, pilot)
        await driver.settle()
        if callout:
            await driver.press("enter")
        yield driver
