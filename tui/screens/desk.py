"""The screen that all places lie on: the line of places, the place in front, the line of hints."""

from collections.abc import Callable, Mapping
from pathlib import Path

from textual.app import ComposeResult
from textual.events import Click, Resize
from textual.screen import Screen
from textual.widgets import Input

from tui.commands import EVERYWHERE, LIST, PLACES, Command, at, by_id, glyph, keys_of
from tui.door import Door, OpenStore
from tui.keyboard import Settled
from tui.memory import Memory
from tui.presenting import UNITS, Line, Piece, harmless, plain, wrapped
from tui.screens.place import Place
from tui.widgets.box import Box
from tui.widgets.line_view import LineView

WIDE_FROM = 112
TITLES: Mapping[str, str] = {
    "match": "Match", "catalogue": "Catalogue", "stock": "Stock", "tables": "Tables",
}  # fmt: skip


def warm_up() -> None:
    """Load what the first key would otherwise wait for: the tables behind the reading of callouts."""
    import catalog.crossref  # noqa: F401  its import is what takes the time
    from catalog import callout

    callout.read("60 x 60 mesh, .0065 in, 304")


def _make(place: str) -> Place:
    """A place by its name; each is loaded when it is first gone to."""
    if place == "catalogue":
        from tui.screens.catalogue_place import CataloguePlace

        return CataloguePlace(id=place)
    if place == "stock":
        from tui.screens.stock_place import StockPlace

        return StockPlace(id=place)
    if place == "tables":
        from tui.screens.tables_place import TablesPlace

        return TablesPlace(id=place)
    from tui.screens.match_place import MatchPlace

    return MatchPlace(id="match")


class Desk(Screen[None]):
    """Holds the store's door, what is remembered, the units; and the place in front."""

    def __init__(
        self,
        opener: Callable[[], OpenStore],
        memory: Memory,
        units: str,
        ascii_only: bool,
        keys: Mapping[str, str],
        directory: Path | None,
    ) -> None:
        super().__init__(id="desk")
        self.door = Door(opener, self, warm_up)
        self.memory, self.units, self.ascii_only = memory, units, ascii_only
        self.own_keys, self.directory = keys, directory
        self.finding = ""
        self.trouble = ""
        self.has_demo = False
        self._message = ""
        self._history: list[str] = []
        self.place_id = memory.place if memory.place in PLACES else "match"
        self._spans: dict[str, tuple[int, int]] = {}

    def compose(self) -> ComposeResult:
        """The three parts."""
        yield LineView(self._places_line, id="places")
        with Box(id="room"):
            yield _make(self.place_id)
        yield LineView(self._hints_line, id="hints")

    def on_mount(self) -> None:
        """Paint first; open the store after that."""
        self.place.settle()
        self.watch(self, "focused", self._draw_hints, init=False)
        self.call_after_refresh(self.door.open)

    def _draw_hints(self) -> None:
        """Other hints for other things."""
        self.query_one("#hints", LineView).show(self._hints_line)

    @property
    def place(self) -> Place:
        """The place in front."""
        return self.query_one(f"#{self.place_id}", Place)

    def _places_line(self, width: int) -> list[Line]:
        pieces: list[Piece] = [(" ", "text")]
        tight = width < 80
        for place in PLACES:
            start = sum(len(text) for text, _ in pieces)
            key = glyph(keys_of(by_id(f"go_{place}"), self.own_keys)[0])
            self._spans[place] = (start, start + len(key) + len(TITLES[place]) + 2)
            pieces.append((f"{key} ", "key"))
            here = place == self.place_id
            pieces.append((f"[{TITLES[place]}]", "here") if here else (TITLES[place], "text"))
            pieces.append((" " if tight else "  ", "text"))
        used = sum(len(text) for text, _ in pieces)
        right = " demo data " if self.has_demo else ""
        if right and used + len(right) <= width:
            pieces += [(" " * (width - used - len(right)), "text"), (right, "demo")]
        return [pieces]

    def _hints_line(self, width: int) -> list[Line]:
        if self._message:
            return [((self._spelled(wrapped(self._message, width)[0]), "warn"),)]
        pieces: list[Piece] = []
        used = 0
        for command in self._hinted():
            key = glyph(keys_of(command, self.own_keys)[0])
            length = len(key) + len(command.words) + 3
            if used + length > width:
                break
            pieces += [(f" {key}", "key"), (f" {command.words} ", "muted")]
            used += length
        return [pieces]

    def _hinted(self) -> list[Command]:
        """The commands worth a hint here: other ones while typing."""
        if isinstance(self.focused, Input):
            enter = Command("enter", ("enter",), "List", "", "")
            leave = Command("leave", ("escape",), "Leave the line", "", "")
            move = Command("move", ("down",), "Next row", "", "")
            return [enter, leave, move, *(c for c in at(EVERYWHERE) if c.hinted and c.while_typing)]
        return [c for c in at(self.place_id) if c.hinted] + [c for c in at(EVERYWHERE) if c.hinted]

    def _spelled(self, text: str) -> str:
        return plain(text) if self.ascii_only else text

    @property
    def is_typing(self) -> bool:
        """True while keys go into a line."""
        return isinstance(self.focused, Input)

    def command_of(self, key: str) -> Command | None:
        """What a key sets off in the place in front."""
        here = [command for where in (self.place_id, LIST, EVERYWHERE) for command in at(where)]
        here.sort(key=lambda command: command.id not in self.own_keys)  # a user's own keys come first
        return next((c for c in here if key in keys_of(c, self.own_keys)), None)

    def must_wait(self, key: str) -> bool:
        """True where a key is about the list, and what the list is to show is on its way."""
        command = self.command_of(key)
        return command is not None and command.reads_list and self.place.awaits()

    async def obey(self, key: str) -> bool:
        """Do what a key sets off here; False where it sets off nothing."""
        if self._message:
            self._message = ""
            self._draw_frame()
        command = self.command_of(key)
        if command is None or (self.is_typing and not command.while_typing):
            return False
        await self.run_command(command.id, key)
        return True

    async def run_command(self, command_id: str, key: str = "1") -> None:
        """Do a command by its id; *key* says which answer is meant."""
        name = f"action_{command_id}"
        action = getattr(self.place, name, None) or getattr(self, name)
        done = action(int(key)) if command_id == "answer" else action()
        if done is not None:
            await done

    def line_was_read(self) -> None:
        """Keys that waited for the line may go on."""
        self.app.keyboard.is_submitting = False  # type: ignore[attr-defined]
        self.app.post_message(Settled())

    def say(self, sentence: str) -> None:
        """Say something in the line of hints, until the next key."""
        self._message = harmless(sentence)
        self._draw_frame()

    def _draw_frame(self) -> None:
        self.query_one("#places", LineView).show(self._places_line)
        self.query_one("#hints", LineView).show(self._hints_line)

    async def on_click(self, event: Click) -> None:
        """A click on the name of a place goes there."""
        if event.widget is not None and event.widget.id == "places":
            for place, (start, end) in self._spans.items():
                if start <= event.x < end:
                    await self.go(place)
                    return

    def on_resize(self, event: Resize) -> None:
        """Side by side where there is room."""
        self.set_class(event.size.width >= WIDE_FROM, "-wide")

    async def go(self, place: str, carried: object = None, remember: bool = True) -> None:
        """Bring a place to the front, with what is carried along."""
        if place != self.place_id and remember:
            self._history.append(self.place_id)
        self.place.display = False
        self.place_id = self.memory.place = place
        if not self.query(f"#{place}"):
            await self.query_one("#room").mount(_make(place))
            if self.trouble:
                self.place.store_shut(self.trouble)
        self.place.display = True
        self._draw_frame()
        self.place.arrive(carried)

    def ask_line(self, label: str, value: str, then: Callable[[str], None]) -> None:
        """Ask for one line of text."""
        from tui.screens.prompt import Prompt

        def got(text: str | None) -> None:
            if text is not None:
                then(text)

        self.app.push_screen(Prompt(label, value, self.ascii_only), got)

    def on_door_opened(self, message: Door.Opened) -> None:
        """The store is open: places may ask."""
        self.trouble = ""
        self.has_demo = message.has_demo
        self._draw_frame()
        for place in self.query(Place):
            place.store_opened()

    def on_door_shut(self, message: Door.Shut) -> None:
        """The store can't be opened: every place says so, and nothing typed is lost."""
        self.trouble = message.sentence
        for place in self.query(Place):
            place.store_shut(message.sentence)

    def on_door_came(self, message: Door.Came) -> None:
        """An answer: handed on unless a newer question was asked."""
        self.door.take(message)
        self.app.post_message(Settled())

    async def action_go_match(self) -> None:
        """To the match place."""
        await self.go("match")

    async def action_go_catalogue(self) -> None:
        """To the catalogue."""
        await self.go("catalogue")

    async def action_go_stock(self) -> None:
        """To the stock."""
        await self.go("stock")

    async def action_go_tables(self) -> None:
        """To the tables."""
        await self.go("tables")

    async def action_back(self) -> None:
        """Leave the line, close what is open, return to where one was; stop what runs."""
        place = self.place
        if place.leave_inner():
            return
        if isinstance(self.focused, Input):
            self.set_focus(place.table)
        elif self.door.is_open and self.door.is_busy:
            self.door.stop()
            self.say("Stopped. Change anything to ask again.")
        elif self._history:
            await self.go(self._history.pop(), remember=False)

    def action_input(self) -> None:
        """To the line to type in."""
        if (line := self.place.line) is not None:
            self.set_focus(line)
        else:
            self.place.action_find()

    def action_units(self) -> None:
        """The next way to show units."""
        self.units = UNITS[(UNITS.index(self.units) + 1) % len(UNITS)]
        self.memory.units = self.units
        for place in self.query(Place):
            place.look_changed()
        self.say({"both": "Inch and metric.", "inch": "Inch.", "metric": "Metric."}[self.units])

    def action_theme(self) -> None:
        """Dark or light."""
        self.memory.dark = not self.memory.dark
        self.app.theme = "crosscloth-dark" if self.memory.dark else "crosscloth-light"
        self.call_after_refresh(self._theme_changed)

    def _theme_changed(self) -> None:
        for place in self.query(Place):
            place.look_changed()
        self._draw_frame()
        for view in self.query(LineView):
            view.refresh()

    def action_copy(self) -> None:
        """Copy the highlighted thing to the terminal's clipboard."""
        text = self.place.copied()
        if not text:
            self.say("There is nothing to copy here.")
            return
        self.app.copy_to_clipboard(text)
        self.say(f"Copied: {text.splitlines()[0]}")

    def action_write(self) -> None:
        """Write what the place shows to a file."""
        self.ask_line("Write to file", f"crosscloth-{self.place_id}.txt", self._write)

    def _write(self, name: str) -> None:
        path = Path(name).expanduser()
        if path.exists():
            self.say(f"{name} is there already: nothing written. Press w and give another name.")
            return
        try:
            path.write_text("\n".join(self._spelled(line) for line in self.place.written()) + "\n", "utf-8")
        except OSError as error:
            self.say(f"{name} can't be written: {(error.strerror or str(error)).lower()}.")
            return
        self.say(f"Written to {path}.")

    def action_help(self) -> None:
        """Every key."""
        from tui.screens.help import Help

        self.app.push_screen(Help(self.place_id, self.own_keys, self.ascii_only))

    def action_commands(self) -> None:
        """Every command by name."""
        from tui.screens.palette import Palette

        self.app.push_screen(Palette(self.place_id, self.own_keys, self.ascii_only), self._run)

    async def _run(self, command_id: str | None) -> None:
        """Run what was chosen by name."""
        if command_id is None:
            return
        await self.run_command(command_id)

    def action_retry(self) -> None:
        """Open the store again, or ask again."""
        if self.door.is_open:
            self.place.store_opened()
            return
        self.say("Opening the store again…")
        self.door.open()

    def action_quit(self) -> None:
        """Leave."""
        self.app.exit(return_code=3 if self.trouble and not self.door.is_open else 0)
