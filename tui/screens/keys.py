"""Bindings made of the one list of commands."""

from textual.binding import Binding

from tui.commands import Command, at


def bindings(*where: str) -> list[Binding]:
    """The bindings of the commands that work in these places. None shows by the framework's own means."""
    return [binding for command in at(*where) for binding in _of(command)]


def _of(command: Command) -> list[Binding]:
    if command.id == "answer":
        return [Binding(key, f"answer({key})", command.words, show=False) for key in command.keys]
    return [Binding(",".join(command.keys), command.id, command.words, show=False, id=command.id)]
