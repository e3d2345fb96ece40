"""Whether there is a store at a place, without making or opening one."""

from pathlib import Path

FILE_URL = "sqlite:///"


def exists(location: str) -> bool:
    """True where the file is there; a database behind another URL counts as there."""
    if "://" in location and not location.startswith(FILE_URL):
        return True
    return Path(location.removeprefix(FILE_URL)).exists()
