"""Where things are kept: the one reader of the environment."""

import os
from contextlib import suppress
from pathlib import Path


def store_location() -> str:
    """CROSSCLOTH_STORE where set, else the file in the user's data directory."""
    named = os.environ.get("CROSSCLOTH_STORE")
    if named:
        return named
    from platformdirs import user_data_path

    return str(user_data_path("crosscloth", appauthor=False) / "crosscloth.sqlite3")


def make_room(location: str) -> str:
    """Make the folder of the user's own store, and no other: a folder that somebody names has to be there."""
    if "://" not in location and location == store_location() and "CROSSCLOTH_STORE" not in os.environ:
        # a folder that can't be made is told of when the store is opened
        with suppress(OSError):
            Path(location).parent.mkdir(parents=True, exist_ok=True)
    return location


def state_directory() -> Path:
    """Where the log and what the browser remembers are kept; made where missing."""
    from platformdirs import user_state_path

    path = user_state_path("crosscloth", appauthor=False)
    path.mkdir(parents=True, exist_ok=True)
    return path
