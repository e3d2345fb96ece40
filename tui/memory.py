"""What the browser remembers from one start to the next: one small file in the state directory."""

import json
from dataclasses import asdict, dataclass, field, fields
from pathlib import Path
from typing import Any

NAME = "browser.json"
KEYS = "keys.json"


@dataclass(slots=True)
class Memory:
    """The last callout, place, units and the like. Whatever can't be read counts as not remembered."""

    callout: str = ""
    place: str = "match"
    units: str = ""
    dark: bool = True
    purposes: list[str] = field(default_factory=list)
    tolerance: str = ""
    alloy_rule: str = "same"
    in_stock: bool = False
    sort: str = "aperture"
    columns: dict[str, list[str]] = field(default_factory=dict)

    @classmethod
    def load(cls, directory: Path | None) -> "Memory":
        """Read what was kept; defaults where there is nothing or nonsense."""
        if directory is None:
            return cls()
        try:
            kept = json.loads((directory / NAME).read_text("utf-8"))
        except (OSError, ValueError):
            return cls()
        return cls._of(kept) if isinstance(kept, dict) else cls()

    @classmethod
    def _of(cls, kept: dict[str, Any]) -> "Memory":
        plain = cls()
        for known in fields(cls):
            value = kept.get(known.name)
            if isinstance(value, type(getattr(plain, known.name))):
                setattr(plain, known.name, value)
        return plain

    def save(self, directory: Path | None) -> None:
        """Write it, whole or not at all. A directory that can't be written is no reason to stop."""
        if directory is None:
            return
        part = directory / f"{NAME}.part"
        try:
            directory.mkdir(parents=True, exist_ok=True)
            part.write_text(json.dumps(asdict(self), ensure_ascii=False, indent=1), "utf-8")
            part.replace(directory / NAME)
        except OSError:
            return


def own_keys(directory: Path | None) -> dict[str, str]:
    """The user's own keys: a file keys.json with command ids and keys, as {"purpose": "f7,P"}.

    What can't be read, and commands that don't exist, count for nothing.
    """
    from tui.commands import COMMANDS

    if directory is None:
        return {}
    try:
        kept = json.loads((directory / KEYS).read_text("utf-8"))
    except (OSError, ValueError):
        return {}
    known = {command.id for command in COMMANDS}
    pairs = kept.items() if isinstance(kept, dict) else ()
    return {name: keys for name, keys in pairs if name in known and isinstance(keys, str) and keys.strip()}
