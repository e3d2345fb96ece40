"""The program as a process-like call: what it writes where, and the code it ends with."""

import json
from dataclasses import dataclass
from pathlib import Path
from typing import Any

import pytest

from tui.cli import main


@dataclass(frozen=True)
class Said:
    """What a call came to."""

    code: int
    out: str
    err: str

    @property
    def json(self) -> Any:
        """Standard output as JSON."""
        return json.loads(self.out)

    @property
    def lines(self) -> list[Any]:
        """Standard output as JSON Lines."""
        return [json.loads(line) for line in self.out.splitlines()]


@pytest.fixture(scope="session")
def seeded(tmp_path_factory: pytest.TempPathFactory) -> Path:
    """A store with the reference catalogue and the demo stock, to be read only."""
    path = tmp_path_factory.mktemp("seeded") / "store.sqlite3"
    assert main(["--store", str(path), "store", "new"]) == 0
    return path


class Program:
    """crosscloth, on one store."""

    def __init__(self, store: Path, capsys: pytest.CaptureFixture[str]) -> None:
        self.store, self._capsys = store, capsys

    def __call__(self, *words: str) -> Said:
        self._capsys.readouterr()
        try:
            code = main(["--store", str(self.store), *words])
        except SystemExit as ended:
            code = int(ended.code or 0)
        said = self._capsys.readouterr()
        return Said(int(code), said.out, said.err)


@pytest.fixture
def crosscloth(seeded: Path, capsys: pytest.CaptureFixture[str]) -> Program:
    """The program on the seeded store."""
    return Program(seeded, capsys)
