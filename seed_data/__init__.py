"""Reference tables and the invented demo catalogue, as CSV with a source in each row."""

from importlib.resources import files
from importlib.resources.abc import Traversable


def table(name: str) -> Traversable:
    """Return the CSV file called *name* (without ending)."""
    return files(__name__) / f"{name}.csv"
