"""Whole screens as text, a few: a change of layout shows as a readable difference.

CROSSCLOTH_REDRAW=1 writes them afresh; look at each before it is kept.
"""

import os
from pathlib import Path

import pytest
from piloting import browser

PICTURES = Path(__file__).parent / "pictures"
SCENES: dict[str, tuple[tuple[int, int], bool, tuple[str, ...]]] = {
    "match_80x24": ((80, 24), False, ()),
    "match_140x40": ((140, 40), False, ("down",)),
    "match_ascii_80x24": ((80, 24), True, ("v", "v", "v")),
    "compare_80x24": ((80, 24), False, ("space", "space", "space", "equals_sign")),
    "plot_80x24": ((80, 24), False, ("g", "right", "right")),
    "stock_80x24": ((80, 24), False, ("f4",)),
}


@pytest.mark.parametrize("name", SCENES)
async def test_a_screen_looks_as_it_was_agreed(name: str) -> None:
    size, ascii_only, keys = SCENES[name]
    async with browser(size=size, ascii_only=ascii_only) as d:
        for key in keys:
            await d.press(key)
        shown = d.text + "\n"
    picture = PICTURES / f"{name}.txt"
    if os.environ.get("CROSSCLOTH_REDRAW"):
        picture.parent.mkdir(exist_ok=True)
        picture.write_text(shown, "utf-8")
    assert shown == picture.read_text("utf-8")
