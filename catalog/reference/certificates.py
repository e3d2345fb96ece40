"""Inspection certificates of EN 10204, in order of what they prove."""

ORDER = ("2.1", "2.2", "3.1", "3.2")


def meets(offered: str, asked: str) -> bool | None:
    """True where an *offered* certificate proves at least what is *asked*; None where either isn't known.

    A 2.2 doesn't meet a 3.1. Source: EN 10204:2004, the order is common practice.
    """
    if offered not in ORDER or asked not in ORDER:
        return None
    return ORDER.index(offered) >= ORDER.index(asked)
