"""How fast callouts are read: lines a minute, the slowest line of 100 characters, and how time grows with length.

Run: python tests/benchmarks/bench_callouts.py. Ratios and rates within one run; no test measures time.
"""

import json
import time
from pathlib import Path

from catalog.callout import reader

DATA = Path(__file__).parents[1] / "published" / "data" / "callouts_from_practice.jsonl"
LINES = [json.loads(line)["text"] for line in DATA.read_text("utf-8").splitlines()]
GROWING = ("60 mesh .0075 304, ", "1/4 x ", "a-", "x", "9", "(", "1.", "EN ", "1 1/2 ", "≥≤", "Ã˜", "O0l", "60x", "-1")


def seconds(text: str) -> float:
    start = time.perf_counter()
    reader.read(text)
    return time.perf_counter() - start


def best(text: str, rounds: int = 5) -> float:
    return min(seconds(text) for _ in range(rounds))


def main() -> None:
    for text in LINES:
        reader.read(text)
    start = time.perf_counter()
    for _ in range(10):
        for text in LINES:
            reader.read(text)
    rate = 10 * len(LINES) / (time.perf_counter() - start) * 60
    hundred = [f"{text} {other} {text}"[:100] for text in LINES for other in LINES[::16]]
    slowest = max(best(text, 3) for text in hundred if len(text) == 100)
    growth = max(best((base * 10_000)[:10_000]) / best((base * 10_000)[:2500]) for base in GROWING)
    print(f"{rate:.0f} lines a minute on one core; slowest line of 100 characters {slowest * 1000:.1f} ms")
    print(f"four times the length takes at most {growth:.1f} times as long")
    figures = {"per_minute": round(rate), "slowest_ms": round(slowest * 1000, 2), "growth_4x": round(growth, 2)}
    print(json.dumps({"benchmark": "callouts"} | figures))


if __name__ == "__main__":
    main()
