"""The house rules hold: import directions, types, style, and what a command may load."""

import re
import subprocess
import sys
from pathlib import Path

import pytest

ROOT = Path(__file__).resolve().parents[2]
FIXED_TOP = {"README.md", "DEVELOPERS.md", "pyproject.toml", "LICENSE", "catalog", "tui", "tests", "seed_data"}


def run(*words: str) -> subprocess.CompletedProcess[str]:
    return subprocess.run([sys.executable, *words], cwd=ROOT, capture_output=True, text=True, check=False)


def test_imports_point_one_way_only() -> None:
    done = run("-c", "from importlinter.cli import lint_imports_command; lint_imports_command()")
    assert done.returncode == 0, done.stdout + done.stderr


def test_types_hold_in_strict_mode() -> None:
    done = run("-m", "mypy")
    assert done.returncode == 0, done.stdout


@pytest.mark.parametrize("what", [["check", "."], ["format", "--check", "."]])
def test_style_is_the_house_style(what: list[str]) -> None:
    done = run("-m", "ruff", *what)
    assert done.returncode == 0, done.stdout + done.stderr


@pytest.mark.parametrize("heavy", ["textual", "sqlalchemy", "rich", "alembic", "openpyxl", "reportlab"])
def test_the_command_line_loads_nothing_heavy_before_a_command_needs_it(heavy: str) -> None:
    done = run("-c", f"import sys, tui.cli; sys.exit({heavy!r} in sys.modules)")
    assert done.returncode == 0, f"importing tui.cli loads {heavy}"


def test_reading_a_callout_needs_no_store_and_no_screen() -> None:
    code = (
        "import sys, tui.cli; tui.cli.main(['read', '60 x 60 mesh, .0075 wire, 304']);"
        "sys.exit(bool({'textual', 'sqlalchemy', 'rich'} & set(sys.modules)))"
    )
    done = run("-c", code)
    assert done.returncode == 0, done.stdout + done.stderr


def test_a_match_loads_no_screen_and_no_migrations_on_a_store_that_is_there(tmp_path: Path) -> None:
    store = str(tmp_path / "s.sqlite3")
    assert run("-m", "tui", "--store", store, "store", "new").returncode == 0
    code = (
        f"import sys, tui.cli; tui.cli.main(['--store', {store!r}, 'match', '60 x .0075 304']);"
        "sys.exit(bool({'textual', 'rich', 'alembic', 'sqlalchemy.orm'} & set(sys.modules)))"
    )
    done = run("-c", code)
    assert done.returncode == 0, done.stdout[-500:] + done.stderr


def test_the_top_level_is_fixed() -> None:
    made = {"build", "dist", "crosscloth.egg-info"}
    top = {path.name for path in ROOT.iterdir() if not path.name.startswith(".")}
    assert top - made == FIXED_TOP


def test_no_module_has_a_name_that_says_nothing() -> None:
    empty = {"utils.py", "helpers.py", "manager.py", "base.py", "common.py"}
    found = [p for folder in ("catalog", "tui") for p in (ROOT / folder).rglob("*.py") if p.name in empty]
    assert not found


def test_the_catalogue_neither_prints_nor_reads_the_environment() -> None:
    calls = re.compile(r"\bprint\(|os\.environ|getenv\(|sys\.argv|input\(")
    found = [str(p) for p in (ROOT / "catalog").rglob("*.py") if calls.search(p.read_text(encoding="utf-8"))]
    assert not found
