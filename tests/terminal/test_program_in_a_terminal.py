"""The real program, driven through a pseudo-terminal by keyboard alone."""

import signal
from pathlib import Path

import pytest
from pseudo_terminal import Terminal

ASKED = "0,25/0,16 1.4404 plain"
LEAVES_ALTERNATE_SCREEN = "\x1b[?1049l"
SHOWS_CURSOR = "\x1b[?25h"
MOUSE_OFF = "\x1b[?1000l"


def test_from_a_typed_callout_to_a_substitute_and_where_it_lies(tmp_path: Path) -> None:
    terminal = Terminal(tmp_path)
    terminal.shows("Callout")
    terminal.keys(*ASKED)
    terminal.shows("interchangeable")
    terminal.keys("enter", "L")  # two keys after the callout
    terminal.shows("lots of")
    terminal.until(lambda text: "\n›" in text, "the list of lots")
    terminal.keys("f10")
    assert terminal.ends() == 0


def test_keys_back_to_back_end_in_the_state_they_describe(tmp_path: Path) -> None:
    terminal = Terminal(tmp_path)
    terminal.shows("demo data")
    terminal.keys(*ASKED, "enter", "down", "down", "down", "up", "v")
    terminal.until(lambda text: text.count("›") == 1 and "Taken as:" in text, "the reasons of the third row")
    rows = [line for line in terminal.lines if "interchangeable" in line or "near" in line or "same" in line]
    name = next(line for line in rows if line.startswith("›"))[20:36].strip()
    heading = next(line for line in terminal.lines if "demo" in line and name in line and not line.startswith("›"))
    assert heading
    terminal.keys("q")
    assert terminal.ends() == 0


@pytest.mark.parametrize("number", [signal.SIGTERM, signal.SIGHUP])
def test_a_signal_leaves_the_terminal_clean_and_the_line_kept(tmp_path: Path, number: signal.Signals) -> None:
    terminal = Terminal(tmp_path)
    terminal.shows("demo data")
    terminal.keys(*"77 mesh")
    terminal.shows("77 mesh")
    terminal.child.kill(number)
    assert terminal.ends() == 128 + number
    for sequence in (LEAVES_ALTERNATE_SCREEN, SHOWS_CURSOR, MOUSE_OFF):
        assert terminal.raw.rindex(sequence) > terminal.raw.index("Callout")
    again = Terminal(tmp_path)
    again.shows("77 mesh")
    again.keys("f10")
    assert again.ends() == 0


def test_bytes_that_are_no_text_do_not_end_the_program(tmp_path: Path) -> None:
    terminal = Terminal(tmp_path)
    terminal.shows("Callout")
    terminal.child.delaybeforesend = None
    for _ in range(2):
        terminal.child.write_to_stdout  # noqa: B018  the child takes bytes through its file descriptor
        import os

        os.write(terminal.child.child_fd, b"\xe9\xff")
    terminal.keys(*"60 x")
    terminal.shows("60 x")
    terminal.keys("f10")
    assert terminal.ends() == 0


def test_a_file_that_is_no_store_gives_a_sentence_and_status_three(tmp_path: Path) -> None:
    spoilt = tmp_path / "spoilt.sqlite3"
    spoilt.write_bytes(b"not a database, whatever its name says" * 40)
    terminal = Terminal(tmp_path, "--store", str(spoilt))
    terminal.shows("Press F7 to try again")
    terminal.keys("f10")
    assert terminal.ends() == 3
    assert spoilt.read_bytes().startswith(b"not a database")


def test_nothing_is_written_while_nothing_happens(tmp_path: Path) -> None:
    terminal = Terminal(tmp_path)
    terminal.shows("demo data")
    for _ in range(10):
        terminal.pump(0.1)
    before = len(terminal.raw)
    for _ in range(10):
        terminal.pump(0.1)
    assert len(terminal.raw) == before
    terminal.keys("f10")
    assert terminal.ends() == 0


def test_a_move_of_the_cursor_costs_less_than_a_kilobyte(tmp_path: Path) -> None:
    terminal = Terminal(tmp_path)
    terminal.shows("demo data")
    terminal.keys("f5")
    terminal.shows("[gauges]")
    terminal.keys("down", "down")
    for _ in range(5):
        terminal.pump(0.1)
    before = len(terminal.raw.encode())
    terminal.keys("down")
    terminal.shows("4 of ")
    terminal.pump(0.2)
    assert len(terminal.raw.encode()) - before < 1024
    terminal.keys("f10")
    terminal.ends()


def test_a_dumb_terminal_is_told_of_the_plain_commands(tmp_path: Path) -> None:
    terminal = Terminal(tmp_path, TERM="dumb")
    terminal.shows("crosscloth match")
    assert terminal.ends() == 2
    assert "\x1b" not in terminal.raw
