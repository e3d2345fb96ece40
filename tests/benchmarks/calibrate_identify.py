"""How often the 95 % set of `identify` holds the true cloth, over simulated measurements of the seed catalogue.

Run: python tests/benchmarks/calibrate_identify.py [ROLLS] [SEED]. Prints the share and JSON; fails below 93 %.
"""

import json
import sys
from pathlib import Path

sys.path.insert(0, str(Path(__file__).resolve().parents[1] / "properties"))

from simulated_rolls import calibrate, seed_cloths

LEAST = 0.93


def main(rolls: int = 2000, seed: int = 20_261) -> int:
    found = calibrate(seed_cloths(), rolls, seed)
    print(
        f"{found.inside} of {found.rolls} inside: {found.share:.1%}; {found.mean_set:.1f} cloths in the set on average"
    )
    print(json.dumps({"benchmark": "identify", "share": round(found.share, 4), "least": LEAST, "rolls": rolls}))
    return 0 if found.share >= LEAST else 1


if __name__ == "__main__":
    sys.exit(main(*map(int, sys.argv[1:3])))
