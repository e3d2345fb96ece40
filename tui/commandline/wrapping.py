"""Text in lines of at most 80 columns, with a hanging margin."""

import textwrap

WIDTH = 80


def wrapped(text: str, first: str, rest: str) -> list[str]:
    """*text* behind the margin *first*; further lines behind *rest*. A single line keeps its own spacing."""
    if len(first) + len(text) <= WIDTH:
        return [first + text]
    lines = textwrap.wrap(text, WIDTH, initial_indent=first, subsequent_indent=rest, break_on_hyphens=False)
    return lines or [first]
