"""Every action of the browser, once: bindings, hints, palette, help and the README's key table follow it."""

from collections.abc import Iterable, Mapping
from dataclasses import dataclass

EVERYWHERE = "everywhere"
LIST = "lists"
MATCH = "match"
CATALOGUE = "catalogue"
STOCK = "stock"
TABLES = "tables"
PLACES = (MATCH, CATALOGUE, STOCK, TABLES)


@dataclass(frozen=True, slots=True)
class Command:
    """One action: what it is called, which keys set it off, what it does, where it works."""

    id: str
    keys: tuple[str, ...]
    """Names of keys as the framework spells them; the first is the one that is shown."""
    words: str
    """A word or two for the line of hints."""
    help: str
    """One sentence."""
    where: str
    hinted: bool = False
    """True where the line of hints shows it."""
    while_typing: bool = False
    """True where its keys that are no letters work in an input line as well."""

    @property
    def reads_list(self) -> bool:
        """True where it is about the highlighted row or the list, and so waits for the list that is asked for."""
        return self.where == LIST or self.id in ABOUT_THE_LIST


COMMANDS: tuple[Command, ...] = (
    Command("help", ("f1", "question_mark"), "Help", "Show every key and what it does.", EVERYWHERE, True, True),
    Command("go_match", ("f2", "M"), "Match", "Find cloth for a callout.", EVERYWHERE, while_typing=True),
    Command(
        "go_catalogue", ("f3", "C"), "Catalogue", "Go through all cloths by their figures.", EVERYWHERE,
        while_typing=True,
    ),
    Command("go_stock", ("f4", "S"), "Stock", "See what lies where.", EVERYWHERE, while_typing=True),
    Command(
        "go_tables", ("f5", "T"), "Tables", "Look up gauges, sieves, alloys and safety distances.", EVERYWHERE,
        while_typing=True,
    ),
    Command(
        "back", ("escape",), "Back", "Leave the line, close what is open, or return to where you were.",
        EVERYWHERE, while_typing=True,
    ),
    Command(
        "input", ("slash", "c"), "Type", "Go to the line to type in; Enter goes to the list.", EVERYWHERE, True
    ),
    Command("units", ("u",), "Units", "Show inch and metric, inch only, or metric only.", EVERYWHERE, True),
    Command(
        "copy", ("y",), "Copy", "Copy the highlighted cloth or row, to the terminal's clipboard.", EVERYWHERE, True
    ),
    Command("write", ("w",), "Write", "Write what the place shows to a text file.", EVERYWHERE),
    Command("commands", ("f9", "colon"), "Commands", "Find a command by its name and run it.", EVERYWHERE,
            while_typing=True),
    Command("theme", ("f8", "b"), "Light/dark", "Change between the dark and the light theme.", EVERYWHERE,
            while_typing=True),
    Command("retry", ("f7", "r"), "Try again", "Open the store again after it failed, or read it afresh.", EVERYWHERE,
            while_typing=True),
    Command("quit", ("f10", "q"), "Quit", "Leave; what was typed comes back next time.", EVERYWHERE, True, True),
    Command("row_down", ("down", "j"), "Down", "Go to the next row.", LIST, while_typing=True),
    Command("row_up", ("up", "k"), "Up", "Go to the row before.", LIST, while_typing=True),
    Command("page_down", ("pagedown", "ctrl+f"), "Page down", "Go down by a page.", LIST, while_typing=True),
    Command("page_up", ("pageup", "ctrl+b"), "Page up", "Go up by a page.", LIST, while_typing=True),
    Command("first_row", ("home",), "First", "Go to the first row.", LIST),
    Command("last_row", ("end", "G"), "Last", "Go to the last row.", LIST),
    Command("columns_right", ("right",), "Columns", "Show the columns further right.", LIST),
    Command("columns_left", ("left",), "Columns", "Show the columns further left.", LIST),
    Command("open", ("enter",), "Open", "Give the highlighted row the whole place; Esc returns.", LIST),
    Command("sort", ("o",), "Order", "Order the list by the next figure.", LIST),
    Command("find", ("f",), "Find", "Find a row by a word in it, as you type.", LIST),
    Command("find_next", ("n",), "Next", "Go to the next row with that word.", LIST),
    Command("sums", ("i",), "Sums", "Lay out the sums behind a cloth's figures, with their sources.", LIST),
    Command("columns", ("hash",), "Choose columns", "Choose which columns a list shows.", LIST),
    Command("purpose", ("p",), "Purpose", "Change what the cloth is for, which decides what hurts.", MATCH, True),
    Command("tolerance", ("t",), "Tolerance", "Change what the aperture may be off by.", MATCH, True),
    Command("alloy", ("a",), "Alloy", "Keep to the asked alloy, or allow any.", MATCH, True),
    Command("limit_open_area", ("l",), "Limit", "Ask for at least so much open area.", MATCH),
    Command("in_stock", ("s",), "On the rack", "Show only what lies on the rack, or all.", MATCH),
    Command("view", ("v",), "View", "Change the lower part: differences, stock, drawing.", MATCH, True),
    Command("mark", ("space", "m"), "Mark", "Mark two to four cloths for a comparison.", MATCH),
    Command("compare", ("equals_sign",), "Compare", "Set the marked cloths side by side.", MATCH),
    Command("plot", ("g",), "Plot", "Plot aperture against open area, with the target; pick a point.", MATCH),
    Command("answer", ("1", "2", "3", "4", "5", "6", "7", "8", "9"), "Answer",
            "Answer the question: take that reading; the same key again asks anew.", MATCH),
    Command("lots", ("L",), "Lots", "Go to the lots of the highlighted cloth.", MATCH),
    Command("weave", ("e",), "Weave", "Show all weaves or one of them.", CATALOGUE, True),
    Command("family", ("a",), "Alloy", "Show all alloys or one of them.", CATALOGUE, True),
    Command("stocked", ("s",), "On the rack", "Show only what lies on the rack, or all.", CATALOGUE, True),
    Command("as_callout", ("x",), "Match it", "Take the highlighted cloth as a callout and match it.", CATALOGUE,
            True),
    Command("cloth_lots", ("L",), "Lots", "Go to the lots of the highlighted cloth.", CATALOGUE),
    Command("all_lots", ("x",), "All lots", "Show the lots of every cloth again.", STOCK, True),
    Command("lot_cloth", ("d",), "Its cloth", "Go to the cloth of the highlighted lot.", STOCK, True),
    Command("next_table", ("t", "tab"), "Next table", "Go to the next table.", TABLES, True),
)  # fmt: skip

ABOUT_THE_LIST = frozenset(
    {"copy", "write", "view", "mark", "compare", "plot", "lots", "as_callout", "cloth_lots", "lot_cloth"}
)

GLYPHS: Mapping[str, str] = {
    "question_mark": "?", "slash": "/", "colon": ":", "equals_sign": "=", "hash": "#", "escape": "Esc",
    "enter": "Enter", "space": "Space", "pagedown": "PgDn", "pageup": "PgUp", "home": "Home", "end": "End",
    "up": "Up", "down": "Down", "left": "Left", "right": "Right", "tab": "Tab",
}  # fmt: skip


def by_id(command_id: str) -> Command:
    """The command called *command_id*. Raises KeyError."""
    for command in COMMANDS:
        if command.id == command_id:
            return command
    raise KeyError(command_id)


def at(*where: str) -> list[Command]:
    """The commands of these places, in order."""
    return [command for command in COMMANDS if command.where in where]


def key_words(command: Command, keys: Mapping[str, str] | None = None) -> str:
    """The keys of a command as a person names them: 'F1 or ?'. *keys* holds what a user changed."""
    names = [glyph(key) for key in keys_of(command, keys)]
    if names == [str(n) for n in range(1, 10)]:
        return "1 to 9"
    return " or ".join(names)


def keys_of(command: Command, keys: Mapping[str, str] | None = None) -> tuple[str, ...]:
    """The keys that set a command off, after a user's own choice."""
    own = (keys or {}).get(command.id)
    return tuple(k.strip() for k in own.split(",") if k.strip()) if own else command.keys


def glyph(key: str) -> str:
    """One key as a person names it."""
    if key in GLYPHS:
        return GLYPHS[key]
    return key.upper() if len(key) > 1 and key[0] == "f" and key[1:].isdigit() else key


def groups() -> Iterable[tuple[str, list[Command]]]:
    """The commands by place, for help and README."""
    for where in (EVERYWHERE, LIST, *PLACES):
        commands = at(where)
        if commands:
            yield where, commands


def key_table() -> list[str]:
    """The README's table of keys, as Markdown lines."""
    lines = ["| where | key | does |", "|---|---|---|"]
    for where, commands in groups():
        lines += [f"| {where} | {key_words(c).replace('|', chr(92) + '|')} | {c.help} |" for c in commands]
    return lines
