"""`python -m tui` is `crosscloth`."""

import sys

from tui.cli import main

sys.exit(main())
