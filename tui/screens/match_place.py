"""Match: a callout in, the nearest cloths out, each set against what was asked."""

from collections.abc import Callable, Sequence
from typing import TYPE_CHECKING, Any

from textual.app import ComposeResult
from textual.widgets import Input

from tui.commands import MATCH
from tui.presenting import SEALS, Line, fit, harmless, phrases, plain, significant
from tui.screens.place import Place
from tui.widgets.box import Box
from tui.widgets.callout_input import LineInput
from tui.widgets.inks import text_of
from tui.widgets.line_view import LineView
from tui.widgets.paged_table import PagedTable

if TYPE_CHECKING:
    from catalog.callout.reading import Understanding
    from catalog.cloth import Cloth
    from catalog.crossref import Answer, Request
    from catalog.search.candidate import Candidate
    from tui.widgets.plot import Aim, Spot

PURPOSES: tuple[tuple[str, ...], ...] = (
    (), ("retain",), ("pass",), ("size",), ("flow",), ("strength",), ("guard",), ("retain", "flow"),
)  # fmt: skip
TOLERANCES = ("", "1", "2", "3", "5", "10", "e11", "iso3310")
MOST_MARKED = 4
SPOTS = 600


class MatchPlace(Place):
    """The place that the program opens with."""

    where = MATCH
    title = "Match"

    def __init__(self, *, id: str) -> None:  # noqa: A002
        super().__init__(id=id)
        self.answer: Answer | None = None
        self.understanding: Understanding | None = None
        self.taken: int | None = None
        self.view = "figures"
        self.least_open_area: float | None = None
        self.marked: list[str] = []
        self.special = ""
        self.spots: Sequence[Spot] = ()
        self.spot: Spot | None = None
        self._asked = False
        self._is_started = False

    def awaits(self) -> bool:
        """True while an answer for the list is on its way."""
        return self.desk.door.awaits("match")

    def compose(self) -> ComposeResult:
        """The line, the reading, the state of the search, the list and the detail."""
        with Box(classes="typing"):
            yield LineView(lambda width: [((" Callout ", "key"),)], classes="typing-label")
            yield LineInput(self.desk.memory.callout, id="callout")
        yield LineView(self._reading_lines, id="reading")
        yield LineView(self._status_line, id="status", classes="status")
        with Box(id="lower"):
            yield PagedTable(id="candidates", sign=self.spelled("›"))
            yield LineView(self._detail_lines, id="detail", has_band=True)

    def on_mount(self) -> None:
        """Read what was typed last time; the store is asked when it is open."""
        self.say_in_list(("Opening the store…", "muted"))
        self.watch(self.input, "value", self._keep, init=False)
        self.input.select_all()  # what was typed last time stays until something else is typed
        self.call_after_refresh(self._start)

    def _start(self) -> None:
        """The first frame is painted: now read what was typed last time."""
        self._is_started = True
        self._read()

    @property
    def input(self) -> LineInput:
        """The line to type in."""
        return self.query_one("#callout", LineInput)

    @property
    def detail(self) -> LineView:
        """The lower part."""
        return self.query_one("#detail", LineView)

    @property
    def candidate(self) -> "Candidate | None":
        """The highlighted one, as the list stands now."""
        if self.answer is None or not self.table.rows.total:
            return None
        return self.answer.candidates[self.table.cursor]

    @property
    def cloth(self) -> "Cloth | None":
        """The highlighted candidate's cloth."""
        return self.candidate.cloth if self.candidate else None

    def settle(self) -> None:
        """To the line, where there is nothing in the list yet."""
        self.focus_on(self.table if self.answer and self.answer.candidates else self.input)

    def arrive(self, carried: object = None) -> None:
        """A callout may be carried along from another place."""
        if isinstance(carried, str) and carried:
            self.input.value = carried
        self.settle()

    def store_opened(self) -> None:
        """Ask what has been waiting."""
        self._asked = False
        self._ask()

    def on_input_changed(self, event: Input.Changed) -> None:
        """Read again on each change, unless another follows already."""
        event.stop()
        if self._is_started and event.value == self.input.value:
            self.taken = None
            self._read()

    def _keep(self, typed: str) -> None:
        """What is typed is remembered at once, whatever happens next."""
        self.desk.memory.callout = typed

    def line_read(self) -> None:
        """The line may hold letters whose change has not been told yet."""
        self._read()
        super().line_read()

    def _read(self) -> None:
        """Understand what is typed, and ask the store for it."""
        from catalog import callout

        text = harmless(self.input.value, 4000)
        if self.understanding is not None and self.understanding.text == text and self._asked:
            return
        self.understanding = callout.read(text)
        self.query_one("#reading", LineView).show(self._reading_lines)
        self._ask()

    def _ask(self) -> None:
        """Ask the store what is typed now; what was asked before no longer counts."""
        understanding = self.understanding
        if understanding is None:
            return
        if not understanding.text.strip():
            self._withdraw(("Type a callout above: the nearest cloths are listed here as you type.", "muted"))
        elif not understanding.surviving:
            self._withdraw(
                ("Nothing can be matched yet.", "bad"),
                ("See above what is missing or wrong, and change the line.", "muted"),
            )
        elif not self.desk.door.is_open and self.desk.trouble:
            self.store_shut(self.desk.trouble)
        else:
            self._send()

    def _send(self) -> None:
        if self.answer is None:
            words = "Looking…" if self.desk.door.is_open else "Opening the store…"
            self.say_in_list((words, "muted"))
        self._asked = True
        self.desk.door.ask("match", self._work(), self._got, self._failed)

    def _work(self) -> Callable[[Any], Any]:
        """The question as it stands, to be asked off the screen's thread."""
        make = self._request_maker()

        def work(store: Any) -> Any:
            from catalog.crossref import match

            return match(make(), store)

        return work

    def _request_maker(self) -> "Callable[[], Request]":
        memory, understanding = self.desk.memory, self.understanding
        purposes, tolerance = tuple(memory.purposes), memory.tolerance or None
        rule, in_stock, least = memory.alloy_rule, memory.in_stock, self.least_open_area
        text = understanding.text if understanding else ""
        taken = self._taken_label()

        def make() -> "Request":
            from catalog.crossref import Request
            from catalog.target import Purpose

            return Request(
                text=text,
                purposes=tuple(Purpose(p) for p in purposes),
                tolerance=tolerance,
                alloy_rule=rule,
                min_open_area_pct=least,
                in_stock=in_stock,
                reading=taken,
            )

        return make

    def _taken_label(self) -> str | None:
        if self.taken is None or self.understanding is None:
            return None
        alive = self.understanding.surviving
        return alive[self.taken].label if self.taken < len(alive) else None

    def _got(self, answer: "Answer") -> None:
        """Show an answer; where only the limits changed, the highlight stays on its cloth."""
        same = self.answer is not None and self.answer.request.text == answer.request.text
        before = self.candidate.cloth.id if self.candidate and same else None
        self.answer = answer
        if not answer.candidates:
            self._nothing(
                ("Nothing lies within the limits.", "risk"),
                ("Loosen them: s shows more than the rack, a allows any alloy, l the open area, t the tolerance.",
                 "muted"),
                keep_answer=True,
            )  # fmt: skip
            return
        self._list(before)

    def _list(self, highlighted: str | None) -> None:
        from tui.widgets.candidate_rows import CandidateRows, candidate_columns

        if self.answer is None:
            return
        ids = [c.cloth.id for c in self.answer.candidates]
        cursor = ids.index(highlighted) if highlighted in ids else 0
        rows = CandidateRows(self.answer.candidates, self.desk.ascii_only)
        columns = self.chosen(candidate_columns(self.desk.units, self.table.size.width or 80))
        rows.columns = columns
        self.table.marked = frozenset(i for i, cid in enumerate(ids) if cid in self.marked)
        self.table.show(columns, rows, cursor)
        self._redraw()

    def _withdraw(self, *lines: tuple[str, str]) -> None:
        """Nothing is asked now: an answer that is still on its way would be to another question."""
        self.desk.door.drop("match")
        self._nothing(*lines)

    def _failed(self, sentence: str) -> None:
        self._nothing((f"! {sentence}", "bad"), ("Change the line or the limits; F7 asks again.", "muted"))

    def _nothing(self, *lines: tuple[str, str], keep_answer: bool = False) -> None:
        if not keep_answer:
            self.answer = None
        self.special = ""
        if self.is_opened:
            self.close_up()
        self.say_in_list(*lines)
        self._redraw()

    def _redraw(self) -> None:
        self.query_one("#reading", LineView).show(self._reading_lines)
        self.query_one("#status", LineView).show(self._status_line)
        self.detail.show(self._detail_lines)

    def on_paged_table_moved(self, event: PagedTable.Moved) -> None:
        """The detail is about the row that is highlighted now."""
        event.stop()
        self.detail.show(self._detail_lines)

    def on_paged_table_chosen(self, event: PagedTable.Chosen) -> None:
        """One candidate gets the whole place."""
        event.stop()
        self._open("")

    def _open(self, special: str) -> None:
        """Give the whole place to one candidate, the comparison or the plot."""
        self.special = special
        self.open_up()
        self.detail.show(self._detail_lines)
        self.call_after_refresh(self.detail.show, self._detail_lines)

    def leave_inner(self) -> bool:
        """Back to the list."""
        if not self.is_opened:
            return False
        self.special = ""
        self.close_up()
        self.detail.show(self._detail_lines)
        return True

    def look_changed(self) -> None:
        """Other units or colours."""
        self._list(self.candidate.cloth.id if self.candidate else None)
        self._redraw()

    def on_resize(self) -> None:
        """Other columns fit."""
        if self.answer is not None and self.answer.candidates:
            self.call_after_refresh(self._list_again)

    def _list_again(self) -> None:
        """The same list, on the same cloth."""
        self._list(self.candidate.cloth.id if self.candidate else None)

    def _reading_lines(self, width: int) -> Sequence[Line]:
        if self.understanding is None:
            return [((" ", "text"),)]
        from tui.widgets.reading_lines import reading_lines

        # the line to type in begins behind its label
        label = 9
        cautions = self.answer.cautions if self.answer is not None else ()
        offset = self.input.text_offset - label
        lines = reading_lines(self.understanding, width, self.desk.units, offset, self.taken, cautions)
        return self.spelled_lines(lines)

    def _status_line(self, width: int) -> Sequence[Line]:
        memory = self.desk.memory
        purposes = " and ".join(memory.purposes) or "retain and pass"
        said = [f"for {purposes}", self._tolerance_words(), f"alloy {memory.alloy_rule}"]
        if memory.in_stock:
            said.append("on the rack only")
        if self.least_open_area is not None:
            said.append(f"open ≥ {significant(self.least_open_area)} %")
        right = self._count_words()
        parts = phrases([self.spelled(x) for x in said], self.spelled(" · "), width - len(right) - 2)
        first = fit(" " + parts[0], width - len(right) - 1) + right
        return self.spelled_lines([((first, "muted"),), *(((f" {part}", "muted"),) for part in parts[1:2])])

    def _tolerance_words(self) -> str:
        target = self.answer.targets[0] if self.answer and self.answer.targets else None
        if target is None or target.tolerance is None:
            return f"tolerance {self.desk.memory.tolerance or 'house rule'}"
        source = target.tolerance.source.split(":")[0]
        return f"T ±{significant(target.tolerance.warp_mm * 1000, 3)} µm, {harmless(source, 24)}"

    def _count_words(self) -> str:
        if self.answer is None or not self.answer.candidates:
            return ""
        served = sum(1 for c in self.answer.candidates if SEALS[c.verdict].ink in ("good", "near", "risk"))
        return f"{served} of {len(self.answer.candidates)} fit" if served else "none fits"

    def _detail_lines(self, width: int) -> Sequence[Line]:
        candidate, answer = self.candidate, self.answer
        if candidate is None or answer is None:
            return []
        from tui.widgets.detail_lines import view_lines, whole_lines

        if self.special:
            return self.spelled_lines(self._special_lines(answer, width))
        height = max(8, self.detail.size.height)
        units, ascii_only = self.desk.units, self.desk.ascii_only
        if self.is_opened or self.screen.has_class("-wide"):
            lines = whole_lines(answer, candidate, width, height, units, ascii_only)
        else:
            lines = view_lines(self.view, answer, candidate, width, height, units, ascii_only)
        return self.spelled_lines(lines)

    def _special_lines(self, answer: "Answer", width: int) -> Sequence[Line]:
        """The comparison or the plot, where one is open."""
        if self.special == "compare":
            from tui.widgets.compare_lines import compare_lines

            chosen = [c for c in answer.candidates if c.cloth.id in self.marked]
            return compare_lines(answer, chosen, width, self.desk.units, self.desk.ascii_only)
        from tui.widgets.plot import plot_lines

        aim = self._aim(answer)
        if aim is None:
            return [(("No aperture was asked, so there is nothing to plot against.", "muted"),)]
        return plot_lines(aim, self.spots, self.spot, width, self.detail.size.height, self.desk.ascii_only)

    def _aim(self, answer: "Answer") -> "Aim | None":
        from tui.widgets.plot import Aim

        target = answer.targets[0]
        if target.warp.aperture is None or target.reading.is_filter:
            return None
        tolerance = target.tolerance.warp_mm if target.tolerance else 0.0
        return Aim(float(target.warp.aperture.mm), target.reading.open_area_pct, tolerance)

    def action_row_down(self) -> None:
        """Next row, further down in what is open, or down in the plot."""
        if self.special == "plot":
            self._move_spot(0, -1)
        else:
            self._scroll(1) if self.is_opened else super().action_row_down()

    def action_row_up(self) -> None:
        """Row before, further up in what is open, or up in the plot."""
        if self.special == "plot":
            self._move_spot(0, 1)
        else:
            self._scroll(-1) if self.is_opened else super().action_row_up()

    def action_columns_right(self) -> None:
        """Columns further right, or right in the plot."""
        self._move_spot(1, 0) if self.special == "plot" else super().action_columns_right()

    def action_columns_left(self) -> None:
        """Columns further left, or left in the plot."""
        self._move_spot(-1, 0) if self.special == "plot" else super().action_columns_left()

    def action_open(self) -> None:
        """Open the highlighted one, or take the plot's spot."""
        if self.special == "plot":
            self._take_spot()
        elif not self.is_opened:
            super().action_open()

    def _move_spot(self, across: int, up: int) -> None:
        from tui.widgets.plot import FOOT, LEFT, frame_of, next_spot

        aim = self._aim(self.answer) if self.answer else None
        if aim is None:
            return
        size = self.detail.size
        frame = frame_of(aim, self.spots, size.width - LEFT - 1, size.height - FOOT - 1)
        self.spot = next_spot(self.spots, frame, self.spot, across, up)
        self.detail.show(self._detail_lines)

    def _take_spot(self) -> None:
        """Back to the list, on the cloth that was picked."""
        names = [c.cloth.name for c in self.answer.candidates] if self.answer else []
        if self.spot is None:
            return
        if self.spot.name not in names:
            self.desk.say(f"{self.spot.name} lies beyond this list: F3, the catalogue, has it.")
            return
        row = names.index(self.spot.name)
        self.leave_inner()
        self.table.move_to(row)

    def action_page_down(self) -> None:
        """A page down."""
        self._scroll(self.detail.size.height) if self.is_opened else super().action_page_down()

    def action_page_up(self) -> None:
        """A page up."""
        self._scroll(-self.detail.size.height) if self.is_opened else super().action_page_up()

    def _scroll(self, rows: int) -> None:
        self.detail.scroll_to(y=self.detail.scroll_offset.y + rows, animate=False)

    def action_purpose(self) -> None:
        """The next purpose."""
        now = tuple(self.desk.memory.purposes)
        at = PURPOSES.index(now) if now in PURPOSES else -1
        self.desk.memory.purposes = list(PURPOSES[(at + 1) % len(PURPOSES)])
        self._again()

    def action_tolerance(self) -> None:
        """The next tolerance: the house's, percentages, sieve editions."""
        now = self.desk.memory.tolerance
        at = TOLERANCES.index(now) if now in TOLERANCES else -1
        self.desk.memory.tolerance = TOLERANCES[(at + 1) % len(TOLERANCES)]
        self._again()

    def action_alloy(self) -> None:
        """Only the asked alloy by the ladder, or any."""
        self.desk.memory.alloy_rule = "any" if self.desk.memory.alloy_rule == "same" else "same"
        self._again()

    def action_in_stock(self) -> None:
        """Only what lies on the rack, or all."""
        self.desk.memory.in_stock = not self.desk.memory.in_stock
        self._again()

    def action_limit_open_area(self) -> None:
        """Ask for at least so much open area."""
        shown = "" if self.least_open_area is None else significant(self.least_open_area)
        self.desk.ask_line("Open area at least, % (empty: no limit)", shown, self._limit)

    def _limit(self, text: str) -> None:
        value = text.strip().rstrip("%").replace(",", ".").strip()
        try:
            least = float(value) if value else None
        except ValueError:
            least = -1.0
        if least is not None and not 0 < least < 100:
            self.desk.say(f"An open area is a number between 0 and 100, not {text!r}: the limit stays as it was.")
            return
        self.least_open_area = least
        self._again()

    def _again(self) -> None:
        self._redraw()
        self._ask()

    def action_answer(self, number: int) -> None:
        """Take the reading with this number; the same again leaves it open."""
        alive = self.understanding.surviving if self.understanding else ()
        if len(alive) < 2 or number > len(alive):
            self.desk.say("There is no such answer: the numbers stand beside the readings.")
            return
        self.taken = None if self.taken == number - 1 else number - 1
        self._again()

    def action_view(self) -> None:
        """The next view of the lower part."""
        from tui.widgets.detail_lines import VIEWS

        self.view = VIEWS[(VIEWS.index(self.view) + 1) % len(VIEWS)]
        self.detail.show(self._detail_lines)

    def action_mark(self) -> None:
        """Mark or unmark the highlighted one, and go on to the next."""
        if self.candidate is None:
            return
        cloth_id = self.candidate.cloth.id
        if cloth_id in self.marked:
            self.marked.remove(cloth_id)
        elif len(self.marked) < MOST_MARKED:
            self.marked.append(cloth_id)
        else:
            self.desk.say("Four are marked already: unmark one first.")
            return
        ids = [c.cloth.id for c in self.answer.candidates] if self.answer else []
        self.table.mark(frozenset(i for i, cid in enumerate(ids) if cid in self.marked))
        self.table.move(1)

    def action_compare(self) -> None:
        """The marked ones side by side."""
        shown = {c.cloth.id for c in self.answer.candidates} if self.answer else set()
        if len(shown.intersection(self.marked)) < 2:
            self.desk.say("Mark two to four cloths first, with Space.")
            return
        self._open("compare")

    def action_plot(self) -> None:
        """Aperture against open area."""
        if self.answer is None or not self.answer.candidates:
            self.desk.say("There is nothing to plot yet.")
            return
        self.spots = self._lettered()
        self.spot = None
        self._open("plot")
        if (aim := self._aim(self.answer)) is not None:
            work = _nearest_spots(aim.aperture_mm, aim.open_area_pct, {s.name for s in self.spots})
            self.desk.door.ask("plot", work, self._got_spots, self.desk.say)

    def _lettered(self) -> "list[Spot]":
        from tui.widgets.plot import LETTERS, Spot

        spots = []
        for number, each in enumerate(self.answer.candidates if self.answer else ()):
            figures = each.cloth.figures
            if figures.warp_aperture_mm and figures.open_area_pct is not None:
                letter = LETTERS[number] if number < len(LETTERS) else ""
                ink = SEALS[each.verdict].ink
                spots.append(Spot(figures.warp_aperture_mm, figures.open_area_pct, each.cloth.name, letter, ink))
        return spots

    def _got_spots(self, found: "list[Spot]") -> None:
        self.spots = [*self._lettered(), *found]
        self.detail.show(self._detail_lines)

    async def action_lots(self) -> None:
        """To the lots of the highlighted cloth."""
        if self.candidate is not None:
            await self.desk.go("stock", self.candidate.cloth)

    def copied(self) -> str:
        """The highlighted candidate: name, verdict, reason, figures."""
        from tui.widgets.detail_lines import figure_lines, heading

        if self.candidate is None or self.answer is None:
            return ""
        text = text_of([heading(self.candidate), *figure_lines(self.answer, self.candidate, 78, self.desk.units)])
        text = f"{text}\n{harmless(self.candidate.reason)}"
        return plain(text) if self.desk.ascii_only else text

    def written(self) -> list[str]:
        """The callout, how it was read, the list, the highlighted one."""
        lines = [f"Callout: {harmless(self.input.value, 4000)}"]
        lines += text_of(self._reading_lines(100)).splitlines()
        lines += ["", *super().written(), ""]
        if self.candidate is not None and self.answer is not None:
            from tui.widgets.detail_lines import whole_lines

            lines += text_of(
                whole_lines(self.answer, self.candidate, 100, 26, self.desk.units, self.desk.ascii_only)
            ).splitlines()
        return lines


def _nearest_spots(aperture_mm: float, open_area_pct: float | None, but: set[str]) -> Callable[[Any], "list[Spot]"]:
    """A question for the nearest cloths of the catalogue as spots, without those named."""

    def work(store: Any) -> "list[Spot]":
        from catalog.search.reader import Point
        from tui.widgets.plot import Spot

        point = Point(warp_aperture_mm=aperture_mm, weft_aperture_mm=aperture_mm, open_area_pct=open_area_pct)
        return [
            Spot(cloth.figures.warp_aperture_mm, cloth.figures.open_area_pct, cloth.name)
            for cloth, _, _ in store.nearest(point, SPOTS)
            if cloth.name not in but and cloth.figures.warp_aperture_mm and cloth.figures.open_area_pct is not None
        ]

    return work
