"""Search measured against three others in one run, as ratios: python tests/benchmarks/bench_search.py

Against hand-written sqlite3 that looks at every row of the covering index, numpy brute force over arrays in
memory, and scipy's k-d tree (both ways round; under filters it is asked for more until enough pass). Every
answer is checked against numpy. Figures go to stdout as JSON, progress to stderr.
"""

import argparse
import json
import os
import resource
import sqlite3
import statistics
import subprocess
import sys
import tempfile
from collections.abc import Callable
from dataclasses import dataclass
from pathlib import Path
from time import perf_counter
from typing import Any

os.environ.pop("OPENBLAS_CORETYPE", None)  # a set core type may choose slower kernels for numpy

import numpy as np
from scipy.spatial import cKDTree
from synthetic_catalogue import ALLOYS, RARE, make

from catalog.construction import Weave
from catalog.search.reader import Filters, Point
from catalog.storage.opening import open_store
from catalog.storage.squared import squared_distance

K = 50
WEIGHTS = np.sqrt([2.0, 2.0, 1.0, 1.0, 1.0])
TURNED = [1, 0, 3, 2, 4]
SAME = 1e-9
SLOW = 12
ALLOY_CODES = {alloy: code for code, alloy in enumerate(ALLOYS)}
OPEN_WEAVES = (Weave.PLAIN.value, Weave.TWILLED.value)
KINDS: dict[str, Filters] = {
    "none": Filters(),
    "alloy": Filters(alloys=frozenset({"316L"})),
    "alloy+weave+open": Filters(
        alloys=frozenset({"316L"}), weaves=frozenset({Weave.PLAIN}), ranges={"open_area_pct": (50.0, None)}
    ),
    "weave+open": Filters(weaves=frozenset({Weave.TWILLED}), ranges={"open_area_pct": (50.0, None)}),
    "rare": Filters(alloys=frozenset({RARE})),
    "impossible": Filters(alloys=frozenset({"316L"}), ranges={"open_area_pct": (97.0, None)}),
    "far": Filters(),
}


@dataclass(frozen=True, slots=True)
class Arrays:
    """The catalogue in memory: five weighted logarithms a cloth, and what filters look at."""

    ids: np.ndarray
    place: np.ndarray
    alloy: np.ndarray
    weave: np.ndarray
    open_area: np.ndarray

    def mask(self, filters: Filters) -> "np.ndarray | None":
        parts = []
        if filters.alloys:
            parts.append(_among(self.alloy, [ALLOY_CODES[alloy] for alloy in filters.alloys]))
        if filters.weaves:
            parts.append(_among(self.weave, [OPEN_WEAVES.index(weave) for weave in filters.weaves]))
        for low, _ in filters.ranges.values():
            parts.append(self.open_area >= low)
        return np.logical_and.reduce(parts) if parts else None


def _among(codes: np.ndarray, wanted: list[int]) -> np.ndarray:
    return np.logical_or.reduce([codes == code for code in wanted])


def load(path: Path) -> Arrays:
    """Read what numpy needs."""
    columns = "id, warp_aperture_mm, weft_aperture_mm, warp_wire_mm, weft_wire_mm, open_area_pct, alloy, weave"
    with sqlite3.connect(path) as raw:
        rows = raw.execute(f"SELECT {columns} FROM cloth WHERE weave IN (?, ?) ORDER BY id", OPEN_WEAVES).fetchall()
    raw.close()
    figures = np.array([row[1:6] for row in rows])
    return Arrays(
        np.array([row[0] for row in rows]),
        np.ascontiguousarray(np.log(figures) * WEIGHTS),
        np.array([ALLOY_CODES[row[6]] for row in rows], dtype=np.int8),
        np.array([OPEN_WEAVES.index(row[7]) for row in rows], dtype=np.int8),
        figures[:, 4].copy(),
    )


def targets(arrays: Arrays, number: int, is_far: bool) -> list[Point]:
    """Cloths of the catalogue, a few percent off; or far outside it in aperture, wire, or both."""
    dice = np.random.default_rng(7)
    places = arrays.place[dice.integers(0, len(arrays.ids), number)] / WEIGHTS
    places = places + dice.normal(0, 0.03, places.shape)
    if is_far:
        shifts = np.array([[4, 4, 4, 4], [-4, -4, -4, -4], [0, 0, 3, 3], [5, 5, 0, 0]])
        places[:, :4] += shifts[np.arange(number) % 4]
    points = []
    for a, b, d, e in np.exp(places[:, :4]):
        share = 100 * a * b / ((a + d) * (b + e))
        points.append(Point(False, float(a), float(b), None, None, float(d), float(e), float(share)))
    return points


def coordinates(point: Point) -> np.ndarray:
    """The point among the arrays' places."""
    mm = (point.warp_aperture_mm, point.weft_aperture_mm, point.warp_wire_mm, point.weft_wire_mm)
    return np.log(np.array([*mm, point.open_area_pct], dtype=float)) * WEIGHTS


def brute(arrays: Arrays, point: Point, filters: Filters) -> list[tuple[str, float]]:
    """numpy over everything: the columns of what passes, both ways round, the least K."""
    asked = coordinates(point)
    mask = arrays.mask(filters)
    place = arrays.place if mask is None else arrays.place[mask]
    ids = arrays.ids if mask is None else arrays.ids[mask]
    squared = np.minimum(_squared(place, asked), _squared(place, asked[TURNED]))
    if len(squared) > K:
        last = np.partition(squared, K - 1)[K - 1]
        near = np.flatnonzero(squared <= last + 1e-12)
    else:
        near = np.arange(len(squared))
    order = near[np.lexsort((ids[near], np.round(squared[near], 13)))][:K]
    return [(str(ids[n]), float(np.sqrt(squared[n]))) for n in order]


def _squared(place: np.ndarray, asked: np.ndarray) -> np.ndarray:
    delta = place - asked
    return np.einsum("ij,ij->i", delta, delta)


class Tree:
    """scipy's k-d tree, asked both ways round."""

    def __init__(self, arrays: Arrays) -> None:
        self.arrays = arrays
        self.tree = cKDTree(arrays.place)

    def ask(self, point: Point, filters: Filters) -> list[tuple[str, float]]:
        mask = self.arrays.mask(filters)
        asked = coordinates(point)
        wanted = K
        while True:
            found: dict[int, float] = {}
            for way in (asked, asked[TURNED]):
                distances, places = self.tree.query(way, k=min(wanted, len(self.arrays.ids)))
                for distance, place in zip(distances.tolist(), places.tolist(), strict=True):
                    if mask is None or mask[place]:
                        found[place] = min(distance, found.get(place, distance))
            if len(found) >= K or wanted >= len(self.arrays.ids):
                nearest = sorted(found.items(), key=lambda item: item[1])[:K]
                return [(str(self.arrays.ids[place]), distance) for place, distance in nearest]
            wanted *= 8


def full_scan(raw: sqlite3.Connection, point: Point, filters: Filters) -> list[tuple[str, float]]:
    """One hand-written statement, no window: every row of the covering index is looked at."""
    weaves = sorted(w.value for w in filters.weaves) or list(OPEN_WEAVES)
    conditions = [f"c.weave IN ({', '.join('?' * len(weaves))})"]
    values: list[Any] = list(weaves)
    if filters.alloys:
        conditions.append(f"c.alloy IN ({', '.join('?' * len(filters.alloys))})")
        values += sorted(filters.alloys)
    for low, _ in filters.ranges.values():
        conditions.append("c.open_area_pct >= ?")
        values.append(low)
    index = "ix_cloth_alloy_apertures" if filters.alloys else "ix_cloth_apertures"
    squared = squared_distance(point)
    sql = (
        f"SELECT c.id, {squared} AS d2 FROM cloth c INDEXED BY {index} "
        f"WHERE {' AND '.join(conditions)} ORDER BY d2, c.id LIMIT {K}"
    )
    return [(cid, max(d2, 0.0) ** 0.5) for cid, d2 in raw.execute(sql, values)]


Ask = Callable[[Point, Filters], Any]


def timed(ask: Ask, points: list[Point], filters: Filters) -> tuple[list[float], list[Any]]:
    """Milliseconds and answer for each point."""
    times, answers = [], []
    for point in points:
        start = perf_counter()
        answers.append(ask(point, filters))
        times.append((perf_counter() - start) * 1000)
    return times, answers


def agrees(ours: list[tuple[str, float]], theirs: list[tuple[str, float]]) -> bool:
    """Same distances; the same cloths wherever the distance tells them apart; ties by id."""
    if len(ours) != len(theirs) or any(abs(a[1] - b[1]) > SAME for a, b in zip(ours, theirs, strict=True)):
        return False
    return {cid for cid, _ in ours} == {cid for cid, _ in theirs} and ours == sorted(ours, key=lambda x: (x[1], x[0]))


def spread(times: list[float]) -> dict[str, float]:
    """Median and 95th percentile, ms."""
    ordered = sorted(times)
    return {
        "median_ms": round(statistics.median(ordered), 3),
        "p95_ms": round(ordered[min(len(ordered) - 1, int(0.95 * len(ordered)))], 3),
    }


def measure(path: Path, number: int) -> dict[str, Any]:
    """All kinds on one catalogue. The slow ones answer fewer targets."""
    arrays = load(path)
    tree = Tree(arrays)
    raw = sqlite3.connect(path)
    result: dict[str, Any] = {}
    with open_store(path) as store:
        for kind, filters in KINDS.items():
            points = targets(arrays, number, kind == "far")
            store.nearest(points[0], K, filters)
            ours, found = timed(lambda point, bounds: store.nearest(point, K, bounds), points, filters)
            numpys, expected = timed(lambda point, bounds: brute(arrays, point, bounds), points, filters)
            trees, _ = timed(tree.ask, points[:SLOW], filters)
            scans, _ = timed(lambda point, bounds: full_scan(raw, point, bounds), points[:SLOW], filters)
            told = [[(cloth.id, distance) for cloth, distance, _ in answer] for answer in found]
            wrong = sum(not agrees(*pair) for pair in zip(told, expected, strict=True))
            result[kind] = compared(*map(spread, (ours, numpys, trees, scans)), wrong, len(points))
            print(path.name, kind, result[kind], file=sys.stderr, flush=True)
    raw.close()
    return result


def compared(
    ours: dict[str, float],
    numpys: dict[str, float],
    trees: dict[str, float],
    scans: dict[str, float],
    wrong: int,
    number: int,
) -> dict[str, Any]:
    """Times and the ratios that are asked of them."""
    return {
        "targets": number,
        "wrong": wrong,
        "store": ours,
        "numpy": numpys,
        "kdtree": trees,
        "full_scan": scans,
        "median_over_numpy": round(ours["median_ms"] / numpys["median_ms"], 3),
        "p95_over_numpy_p95": round(ours["p95_ms"] / numpys["p95_ms"], 3),
        "median_over_kdtree": round(ours["median_ms"] / trees["median_ms"], 3),
        "full_scan_over_median": round(scans["median_ms"] / ours["median_ms"], 1),
    }


MEMORY = """
import sys
from catalog.search.reader import Filters, Point
from catalog.storage.opening import open_store
with open_store(sys.argv[1]) as store:
    for n in range(60):
        a = 0.03 * 1.12**n
        store.nearest(Point(False, a, a, None, None, a * 0.6, a * 0.6, 100 / 1.6**2), 50)
status = open("/proc/self/status").read().split()
print(int(status[status.index("VmHWM:") + 1]) / 1024)
"""


def memory_mb(path: Path) -> float:
    """Peak of a process of its own that searches 60 times (VmHWM: maxrss would count this parent's pages)."""
    done = subprocess.run([sys.executable, "-c", MEMORY, str(path)], capture_output=True, text=True, check=True)
    return round(float(done.stdout), 1)


def main() -> None:
    """Measure and print."""
    parser = argparse.ArgumentParser(description=__doc__)
    parser.add_argument("--sizes", default="10000,100000,1000000")
    parser.add_argument("--targets", type=int, default=80, help="for each of the seven kinds of filter")
    parser.add_argument("--keep", type=Path, help="folder for the catalogues; made there once")
    options = parser.parse_args()
    with tempfile.TemporaryDirectory() as scratch:
        folder = options.keep or Path(scratch)
        folder.mkdir(parents=True, exist_ok=True)
        sizes = [int(size) for size in options.sizes.split(",")]
        report: dict[str, Any] = {"k": K, "sizes": {}}
        for size in sizes:
            path = make(folder / f"{size}.db", size)
            report["sizes"][size] = {"kinds": measure(path, options.targets), "memory_mb": memory_mb(path)}
        medians = [report["sizes"][size]["kinds"]["none"]["store"]["median_ms"] for size in sizes]
        report["median_largest_over_smallest"] = round(medians[-1] / medians[0], 2)
        report["own_peak_mb"] = round(resource.getrusage(resource.RUSAGE_SELF).ru_maxrss / 1024)
    print(json.dumps(report, indent=2))


if __name__ == "__main__":
    main()
