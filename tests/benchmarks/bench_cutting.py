"""Cutting measured: python tests/benchmarks/bench_cutting.py [--lists 200] [--seeds 3]

How near the exact optimum of small lists the layouts come (the exhaustive search of the tests), and how long 200 pieces
over 50 lots take, for lists of one size up to 200 sizes and racks of one heat up to 50. Figures go to stdout as JSON.
"""

import argparse
import json
import statistics
import sys
from pathlib import Path
from random import Random
from time import perf_counter

sys.path.insert(0, str(Path(__file__).resolve().parents[1] / "properties"))

from test_cutting_against_the_optimum import most_pieces, placed, small_case

from catalog.stock.cutting import Cutting
from catalog.stock.cutting_pieces import Piece
from catalog.stock.lots import Lot
from catalog.stock.plan import plan

RACKS = [(sizes, heats, rolls) for sizes in (1, 5, 20, 200) for heats in (1, 7, 50) for rolls in (0.0, 0.2)]


def against_the_optimum(lists: int, seed: int) -> dict[str, float]:
    """Pieces placed as a share of the optimum's, and the slowest layout."""
    rng, ours, optimum, slowest = Random(seed), 0, 0, 0.0
    for _ in range(lists):
        case = small_case(rng)
        begun = perf_counter()
        ours += placed(*case)
        slowest = max(slowest, perf_counter() - begun)
        optimum += most_pieces(*case)
    return {"seed": seed, "placed": ours, "optimum": optimum, "share_pct": 100 * ours / optimum, "slowest_s": slowest}


def rack(rng: Random, heats: int, rolls: float) -> list[Lot]:
    """Fifty lots, remnants of 0.3 to 2.4 m and rolls five times as long."""
    made = []
    for i in range(50):
        form = "roll" if rng.random() < rolls else "remnant"
        length = rng.randint(300, 2400) * (5 if form == "roll" else 1)
        made.append(
            Lot(
                f"L-{i}", "c", form, rng.choice((914, 1000, 1219, 1500)), 15, length, 0, "A", f"H{rng.randrange(heats)}"
            )
        )
    return made


def cut_list(rng: Random, sizes: int) -> list[Piece]:
    """Two hundred pieces of so many sizes, a third of them discs."""
    number, made = 200 // sizes, []
    for _ in range(sizes):
        if rng.random() < 0.33:
            made.append(Piece(number, diameter_mm=rng.randint(80, 500)))
        else:
            made.append(Piece(number, rng.randint(100, 600), rng.randint(100, 600), warp_bound=rng.random() < 0.3))
    return made


def over_the_rack(sizes: int, heats: int, rolls: float, seed: int) -> dict[str, float]:
    """One plan, timed."""
    rng = Random(seed)
    lots, pieces = rack(rng, heats, rolls), cut_list(rng, sizes)
    begun = perf_counter()
    made = plan(lots, pieces, Cutting(kerf_mm=5))
    seconds = perf_counter() - begun
    return {
        "sizes": sizes,
        "heats_on_rack": heats,
        "rolls_share": rolls,
        "seconds": seconds,
        "lots": len(made.cuts),
        "heats": len(made.heats),
        "missing": sum(made.missing),
    }


def main() -> None:
    """Measure and write."""
    options = argparse.ArgumentParser(description=__doc__)
    options.add_argument("--lists", type=int, default=200)
    options.add_argument("--seeds", type=int, default=3)
    asked = options.parse_args()
    small = [against_the_optimum(asked.lists, seed) for seed in range(asked.seeds)]
    large = [over_the_rack(*kind, seed) for kind in RACKS for seed in range(asked.seeds)]
    seconds = [row["seconds"] for row in large]
    totals = {"median_s": statistics.median(seconds), "slowest_s": max(seconds)}
    print(json.dumps({"optimum": small, "two_hundred_pieces_fifty_lots": totals, "plans": large}, indent=1))


if __name__ == "__main__":
    main()
