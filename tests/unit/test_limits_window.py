"""The window that limits leave to square cloth, against scanning pairs of aperture and wire through the definitions."""

from itertools import product

import pytest

from catalog.search.limit_report import window

APERTURES = [w / 50 for w in range(1, 80)]
WIRES = [d / 50 for d in range(1, 60)]


def satisfies(w: float, d: float, limits: dict[str, tuple[float | None, float | None]]) -> bool:
    """Open area 100·(w/(w+d))², thickness 2d: definitions."""
    figures = {"aperture_mm": w, "wire_mm": d, "open_area_pct": 100 * (w / (w + d)) ** 2, "thickness_mm": 2 * d}
    return all(
        (low is None or figures[name] >= low) and (high is None or figures[name] <= high)
        for name, (low, high) in limits.items()
    )


@pytest.mark.parametrize(
    "limits",
    [
        {"aperture_mm": (None, 0.801), "open_area_pct": (45.0, None), "wire_mm": (0.351, None)},
        {"aperture_mm": (0.3, 1.0), "thickness_mm": (None, 0.81)},
        {"wire_mm": (0.1, 0.5), "thickness_mm": (0.41, None), "open_area_pct": (30.3, None)},
        {"open_area_pct": (36.3, None)},
    ],
)
def test_a_pair_satisfies_the_limits_exactly_where_the_window_says(
    limits: dict[str, tuple[float | None, float | None]],
) -> None:
    found = window(limits)
    assert found is not None
    for w, d in product(APERTURES, WIRES):
        inside = (
            found.aperture[0] <= w <= (found.aperture[1] or 1e9)
            and found.wire[0] <= d <= (found.wire[1] or 1e9)
            and (found.wire_per_aperture is None or d <= found.wire_per_aperture * w)
        )
        assert inside == satisfies(w, d, limits), (w, d)


def test_no_window_is_promised_where_a_mass_limit_cuts_into_it() -> None:
    limits = {"aperture_mm": (None, 0.8), "mass_kg_m2": (None, 0.5)}
    assert window(limits) is None
    assert window({"mass_kg_m2": (None, 0.5)}) is None


def test_an_empty_window_stays_empty_whatever_else_is_limited() -> None:
    """0.35 mm of wire at 45 % open area asks 0.713 mm of aperture: worked example."""
    limits = {
        "aperture_mm": (None, 0.70),
        "wire_mm": (0.35, None),
        "open_area_pct": (45.0, None),
        "mass_kg_m2": (None, 5),
    }
    found = window(limits)
    assert found is not None
    assert found.is_empty
