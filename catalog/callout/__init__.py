"""Callouts: text to readings, and back to text."""

from functools import lru_cache

from catalog.callout.reading import Understanding

__all__ = ["read"]


@lru_cache(maxsize=32)
def read(text: str) -> Understanding:
    """Understand a callout: readings, status, question, problems, words by role. Never raises on a text."""
    from catalog.callout.deciding.doubts import doubted
    from catalog.callout.reader import read as read_text

    return doubted(read_text(text))
