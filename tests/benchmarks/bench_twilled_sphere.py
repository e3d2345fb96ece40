"""Time and convergence of the twilled Dutch sphere: python tests/benchmarks/bench_twilled_sphere.py."""

import csv
import time
from pathlib import Path

from catalog.physics.filter_cloth import sphere_twilled_dutch_um

TABLE = Path(__file__).parents[1] / "published" / "data" / "filter_cloth_checks.csv"
RESOLUTIONS_PCT = (10.0, 5.0, 2.0, 1.0)


def main() -> None:
    """One line per cloth and resolution: the estimate with its ±, the other solver's figure, processor time."""
    with TABLE.open(encoding="utf-8", newline="") as file:
        rows = list(csv.DictReader(line for line in file if not line.startswith("#")))
    print("cloth      wanted ±    sphere µm      ± µm   converged   even grid µm      time")
    for row in rows:
        if row["weave"] != "twilled Dutch":
            continue
        pitches = (25.4 / float(row["warp_per_in"]), 25.4 / float(row["weft_per_in"]))
        for wanted in RESOLUTIONS_PCT:
            start = time.process_time()
            found = sphere_twilled_dutch_um(
                *pitches, float(row["warp_wire_mm"]), float(row["weft_wire_mm"]), resolution_pct=wanted
            )
            spent = time.process_time() - start
            print(
                f"{row['name']:<10}{wanted:>7.0f} %{found.sphere_um:>13.2f}{found.resolution_um:>10.2f}"
                f"{found.converged!s:>12}{row['sphere_3d_um']:>9} ± {row['solver_grid_um']}{spent:>9.2f} s"
            )


if __name__ == "__main__":
    main()
