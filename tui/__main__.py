"""`python -m tui` is `crosscloth`."""

from tui.cli import run

run()
