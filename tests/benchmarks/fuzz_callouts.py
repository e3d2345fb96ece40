"""Fuzz the reader of callouts: random and mutated lines up to 10,000 characters, none may raise or break a promise.

Usage: python tests/benchmarks/fuzz_callouts.py [LINES] [SEED]      (default 20,000 lines; one process a core)
"""

import json
import random
import sys
import time
from multiprocessing import Pool, cpu_count
from pathlib import Path

from catalog.callout import reader

sys.path.insert(0, str(Path(__file__).parents[1] / "properties"))
from test_callout_robust import PIECES, check

DATA = Path(__file__).parents[1] / "published" / "data" / "callouts_from_practice.jsonl"
SEEDS = [json.loads(line)["text"] for line in DATA.read_text("utf-8").splitlines()]
ALPHABET = "0123456789.,/xX\"'()=±%# mesh wire in mm µm Ø ga SWG abcdefghijklmnopqrstuvwxyz-+*<>≥≤\t\x00é×″ОХ"


def mutated(dice: random.Random) -> str:
    """A line from practice with a few characters, words or lines changed."""
    text = dice.choice(SEEDS)
    for _ in range(dice.randint(1, 6)):
        at = dice.randint(0, len(text))
        kind = dice.random()
        if kind < 0.3:
            text = text[:at] + dice.choice(ALPHABET) + text[at:]
        elif kind < 0.5:
            text = text[:at] + text[at + dice.randint(1, 4) :]
        elif kind < 0.7:
            text = f"{text[:at]} {dice.choice(PIECES)} {text[at:]}"
        elif kind < 0.85:
            words = text.split(" ")
            dice.shuffle(words)
            text = " ".join(words)
        else:
            other = dice.choice(SEEDS)
            text = text[:at] + other[dice.randint(0, len(other)) :]
    return text


def line(dice: random.Random) -> str:
    """One line: mostly mutations, some random, now and then a very long one."""
    kind = dice.random()
    if kind < 0.75:
        return mutated(dice)
    if kind < 0.93:
        return "".join(dice.choice(ALPHABET) for _ in range(dice.randint(0, 120)))
    if kind < 0.999:
        return " ".join(dice.choice(PIECES) for _ in range(dice.randint(1, 25)))
    text = mutated(dice) if dice.random() < 0.5 else "".join(dice.choice(ALPHABET) for _ in range(40))
    return (text * (10_000 // max(1, len(text)) + 1))[: dice.randint(1000, 10_000)]


def run(job: tuple[int, int]) -> tuple[int, float, list[str]]:
    """Read so many lines; the count, the slowest in seconds, what failed."""
    lines, seed = job
    dice = random.Random(seed)
    slowest, failed = 0.0, []
    for _ in range(lines):
        text = line(dice)
        start = time.perf_counter()
        try:
            understood = reader.read(text)
            slowest = max(slowest, time.perf_counter() - start)
            check(text, understood)
        except Exception as error:
            failed.append(f"{type(error).__name__} {error} in {text[:300]!r}")
    return lines, slowest, failed


def main(arguments: list[str]) -> int:
    """Run and say what came of it."""
    total = int(arguments[0]) if arguments else 20_000
    seed = int(arguments[1]) if len(arguments) > 1 else 1
    step = 2_000
    jobs = [(step, seed * 1_000_003 + i) for i in range(max(1, total // step))]
    start, done, slowest, failed = time.perf_counter(), 0, 0.0, []
    with Pool(cpu_count()) as pool:
        for lines, slow, wrong in pool.imap_unordered(run, jobs):
            done, slowest, failed = done + lines, max(slowest, slow), failed + wrong
            if wrong:
                print("\n".join(wrong[:3]), flush=True)
    took = time.perf_counter() - start
    print(f"{done} lines in {took:.0f} s ({done / took * 60:.0f} a minute), slowest {slowest * 1000:.0f} ms")
    print(f"{len(failed)} failures")
    return 1 if failed else 0


if __name__ == "__main__":
    sys.exit(main(sys.argv[1:]))
