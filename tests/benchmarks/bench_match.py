"""A bare `match` as a whole process against `python -c "import sqlalchemy"`, in turn, in one run.

Run: python tests/benchmarks/bench_match.py [ROUNDS]. Prints the medians' ratio and a line of JSON.
"""

import json
import statistics
import subprocess
import sys
import tempfile
import time
from pathlib import Path

MOST = 1.6
CALLOUT = "0,25/0,16 1.4404 plain"


def seconds(words: list[str]) -> float:
    start = time.perf_counter()
    subprocess.run(words, check=True, stdout=subprocess.DEVNULL)
    return time.perf_counter() - start


def main(rounds: int = 15) -> int:
    with tempfile.TemporaryDirectory() as folder:
        store = str(Path(folder) / "bench.sqlite3")
        program = str(Path(sys.executable).with_name("crosscloth"))
        match = [program, "--store", store, "match", CALLOUT]
        bare = [sys.executable, "-c", "import sqlalchemy"]
        subprocess.run(match, check=True, stdout=subprocess.DEVNULL)
        subprocess.run(bare, check=True)
        taken = [(seconds(match), seconds(bare)) for _ in range(rounds)]
    medians = [statistics.median(column) for column in zip(*taken, strict=True)]
    ratio = medians[0] / medians[1]
    print(f"match {medians[0] * 1000:.0f} ms, import sqlalchemy {medians[1] * 1000:.0f} ms: ratio {ratio:.2f}")
    print(json.dumps({"benchmark": "match", "ratio": round(ratio, 3), "most": MOST, "rounds": rounds}))
    return 0 if ratio <= MOST else 1


if __name__ == "__main__":
    sys.exit(main(*map(int, sys.argv[1:2])))
