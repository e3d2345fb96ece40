"""The store's door: one thread opens the store and answers in turn; late answers are dropped.

The screen asks and goes on; an answer comes back as a message that carries its question.
"""

import logging
import threading
from collections import OrderedDict
from collections.abc import Callable
from dataclasses import dataclass
from typing import TYPE_CHECKING, Any, Protocol

from textual.message import Message
from textual.message_pump import MessagePump

from catalog.errors import CrossclothError

if TYPE_CHECKING:
    from catalog.search.reader import Reader

    class OpenStore(Reader, Protocol):
        """What the browser needs of an open store, beside reading."""

        @property
        def has_demo(self) -> bool:
            """True where invented rows are in it."""
            ...

        def close(self) -> None:
            """Let go of it."""
            ...

else:
    OpenStore = Any  # the start needs none of the search


Work = Callable[[Any], Any]
Then = Callable[[Any], None]
Failed = Callable[[str], None]
UNEXPECTED = "Something went wrong that was not foreseen ({kind}: {error}); --verbose writes a log."


@dataclass(frozen=True, slots=True)
class Ticket:
    """A question on its way. Of each kind only the newest counts."""

    kind: str
    number: int
    work: Work
    then: Then
    failed: Failed


class Door:
    """Asks the store off the screen's thread."""

    class Came(Message):
        """An answer, or the sentence that says why there is none."""

        def __init__(self, ticket: Ticket, result: Any, error: str | None) -> None:
            super().__init__()
            self.ticket, self.result, self.error = ticket, result, error

    class Opened(Message):
        """The store is open."""

        def __init__(self, has_demo: bool) -> None:
            super().__init__()
            self.has_demo = has_demo

    class Shut(Message):
        """The store can't be opened; the sentence says why."""

        def __init__(self, sentence: str) -> None:
            super().__init__()
            self.sentence = sentence

    def __init__(
        self, opener: Callable[[], OpenStore], screen: MessagePump, warm_up: Callable[[], object] | None = None
    ) -> None:
        self._opener, self._screen, self._warm_up = opener, screen, warm_up
        self._waiting: OrderedDict[str, Ticket] = OrderedDict()
        self._newest: dict[str, int] = {}
        self._numbers = 0
        self._signal = threading.Condition()
        self._closing = False
        self._thread: threading.Thread | None = None
        self._store: OpenStore | None = None
        self.is_open = False

    @property
    def is_busy(self) -> bool:
        """True while an answer that counts is outstanding."""
        return bool(self._newest)

    def awaits(self, *kinds: str) -> bool:
        """True while an answer of one of these kinds is outstanding, from a store that is open."""
        return self.is_open and any(kind in self._newest for kind in kinds)

    def open(self) -> None:
        """Open the store, again where it failed before. What waits is asked then."""
        if self._thread is not None and self._thread.is_alive():
            return
        self._thread = threading.Thread(target=self._serve, name="store", daemon=True)
        self._thread.start()

    def ask(self, kind: str, work: Work, then: Then, failed: Failed) -> None:
        """Ask; *then* gets the result on the screen's thread unless a newer question of the kind was asked."""
        with self._signal:
            self._numbers += 1
            self._newest[kind] = self._numbers
            self._waiting.pop(kind, None)
            self._waiting[kind] = Ticket(kind, self._numbers, work, then, failed)
            self._signal.notify()

    def stop(self) -> None:
        """Give up on everything that was asked; a running query is interrupted where the store can."""
        with self._signal:
            self._waiting.clear()
            self._newest.clear()
        interrupt = getattr(self._store, "interrupt", None)
        if callable(interrupt):
            interrupt()

    def drop(self, kind: str) -> None:
        """No answer of this kind is wanted any more: the question has been withdrawn."""
        with self._signal:
            self._waiting.pop(kind, None)
            self._newest.pop(kind, None)

    def take(self, came: "Door.Came") -> None:
        """Hand an answer on, unless a newer question has been asked since."""
        ticket = came.ticket
        if self._newest.get(ticket.kind) != ticket.number:
            return
        del self._newest[ticket.kind]
        if came.error is not None:
            ticket.failed(came.error)
        else:
            ticket.then(came.result)

    def close(self) -> None:
        """Leave; the thread ends after what it is doing."""
        with self._signal:
            self._closing = True
            self._signal.notify()

    def _serve(self) -> None:
        try:
            self._store = self._opener()
        except CrossclothError as error:
            self._screen.post_message(self.Shut(error.message))
            return
        except Exception as error:  # any failure has to reach the person as a sentence
            logging.getLogger(__name__).exception("opening the store")
            self._screen.post_message(self.Shut(_unexpected(error)))
            return
        self.is_open = True
        self._screen.post_message(self.Opened(self._store.has_demo))
        if not self._waiting and self._warm_up is not None:
            self._warm_up()
        while (ticket := self._next()) is not None:
            self._answer(ticket)
        self._store.close()

    def _next(self) -> Ticket | None:
        with self._signal:
            while not self._waiting and not self._closing:
                self._signal.wait()
            return None if self._closing else self._waiting.popitem(last=False)[1]

    def _answer(self, ticket: Ticket) -> None:
        result, error = None, None
        try:
            result = ticket.work(self._store)
        except CrossclothError as problem:
            error = problem.message
        except Exception as problem:  # the screen goes on; the log has the rest
            logging.getLogger(__name__).exception("asking the store: %s", ticket.kind)
            error = _unexpected(problem)
        self._screen.post_message(self.Came(ticket, result, error))


def _unexpected(error: Exception) -> str:
    return UNEXPECTED.format(kind=type(error).__name__, error=str(error).splitlines()[0] if str(error) else "")
