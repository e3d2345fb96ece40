"""The README says what the program does: its commands, its keys and its answer are the program's own."""

import re
import subprocess
import sys
from pathlib import Path

from tui.cli import COMMANDS
from tui.commands import key_table

ROOT = Path(__file__).resolve().parents[2]
README = (ROOT / "README.md").read_text(encoding="utf-8")


def test_the_key_table_is_the_list_of_commands() -> None:
    assert "\n".join(key_table()) in README


def test_every_command_is_in_the_readme_and_no_other() -> None:
    named = set(re.findall(r"^\| `(\w+)", README, re.MULTILINE)) - {"crosscloth"}
    assert set(COMMANDS) <= named


def test_the_two_set_up_commands_are_one_line_each() -> None:
    lines = [line for line in README.splitlines() if line.startswith("python3 -m venv")]
    assert len(lines) == 2
    assert "crosscloth match" in lines[0]
    assert lines[1].endswith("pytest -q")


def test_the_answer_in_the_readme_is_what_the_program_answers(tmp_path: Path) -> None:
    shown = re.search(r"```text\n\$ crosscloth (match .*?)\n(.*?)\n…\n```", README, re.DOTALL)
    assert shown is not None
    words = ["match", "0,25/0,16 1.4404 plain", "--purpose", "retain"]
    assert shown[1] == 'match "0,25/0,16 1.4404 plain" --purpose retain'
    done = subprocess.run(
        [sys.executable, "-m", "tui", "--store", str(tmp_path / "s.sqlite3"), *words],
        capture_output=True,
        encoding="utf-8",
        check=True,
        cwd=ROOT,
    )
    assert done.stdout.startswith(shown[2])
