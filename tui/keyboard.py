"""Keys in the order in which they were struck: one place decides what each does, and none overtakes another.

A terminal sends keys back to back, while focus moves and answers arrive later. So keys are taken up in the
application's own task, before any widget sees them; and a key whose meaning hangs on something that is still
on its way (typed text that is being read, an answer, a dialogue that opens) waits for it.
"""

from collections import deque
from collections.abc import Awaitable, Callable
from typing import Any, Protocol

from textual.app import App
from textual.events import Event, Key
from textual.message import Message

Forward = Callable[[Event], Awaitable[None]]
ALT = "alt+"


class Dialogue(Protocol):
    """A screen that opens over the others."""

    is_ready: bool
    """True once keys can be typed into it."""


class Desk(Protocol):
    """The screen on which keys set off commands."""

    @property
    def is_typing(self) -> bool:
        """True while keys go into a line."""
        ...

    def must_wait(self, key: str) -> bool:
        """True where what the key is about is still on its way."""
        ...

    async def obey(self, key: str) -> bool:
        """Do what a key sets off; False where it sets off nothing."""
        ...


class Settled(Message):
    """Something that keys were waiting for has come about."""


class Keyboard:
    """Holds keys that have to wait, and hands on the others."""

    def __init__(self, app: App[Any], desk: Desk, forward: Forward) -> None:
        self._app, self._desk, self._forward = app, desk, forward
        self._held: deque[Key] = deque()
        self.is_submitting = False
        """True from the Enter that ends a line until the place has read the line."""

    async def strike(self, event: Key) -> None:
        """Take up a key."""
        if event.key.startswith(ALT) and len(event.key) == len(ALT) + 1:
            # Esc and a quick letter come as one key through some terminals
            await self.strike(Key("escape", None))
            letter = event.key[-1]
            await self.strike(Key(letter, letter))
        elif event.key == "escape" and self._held:
            self._held.clear()
            self.is_submitting = False
            await self._take(event)
        elif self._held or self._must_wait(event):
            self._held.append(event)
        else:
            await self._take(event)

    async def release(self) -> None:
        """Hand on what was held, as far as it goes."""
        while self._held and not self._must_wait(self._held[0]):
            await self._take(self._held.popleft())

    def _must_wait(self, event: Key) -> bool:
        screen: Any = self._app.screen
        desk = self._desk
        if screen is not desk:
            return not getattr(screen, "is_ready", True)
        if self.is_submitting:
            return event.key != "escape"
        return not desk.is_typing and desk.must_wait(event.key)

    async def _take(self, event: Key) -> None:
        desk = self._desk
        screen: Any = self._app.screen
        if screen is not desk:
            await self._forward(event)
        elif desk.is_typing and event.key in ("enter", "escape"):
            # the line gets it behind the letters before it, and says when it has been read
            self.is_submitting = True
            await self._forward(Key("enter", None))
        elif (desk.is_typing and event.is_printable) or not await desk.obey(event.key):
            await self._forward(event)
