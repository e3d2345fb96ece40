"""Stated open area and mass have to agree with the construction."""

from catalog.callout.reading import Reading
from catalog.callout.rules.bound_values import figures_of
from catalog.callout.rules.draft import Draft
from catalog.physics.mass import mass_nominal_kg_m2
from catalog.reference import alloys

MASS_SHARE = 0.10
"""A stated mass may be off the nominal one by so much: densities and crimp differ."""
COMMON_METALS = ("304", "CS", "CuZn30", "CuSn6", "Cu-ETP", "Al5056", "400", "TiGr2")


def is_whole(reading: Reading) -> bool:
    """True where warp and weft are both known: pitch and wire,
    for square and rectangular cloth the opening by itself.
    """
    return all(side.pitch and side.wire for side in (reading.warp, reading.weft))


def check_open_area(draft: Draft, reading: Reading) -> None:
    """A stated open area has to agree with the construction, rounding for rounding."""
    stated = draft.open_area
    if (
        stated is None
        or stated.number is None
        or reading.open_area_pct is None
        or "open_area_pct" not in reading.derived
    ):
        return
    warp, pitch = reading.warp.wire, reading.warp.pitch
    slack = float(stated.number.half_unit)
    if warp and pitch:
        slack += 2 * float(warp.rounding_mm / pitch.mm) * 100
    off = abs(reading.open_area_pct - float(stated.number.value))
    if off > max(slack, 0.1):
        draft.problem(
            "E_INCONSISTENT",
            f"Open area is stated as {stated.text} %, but the construction has {reading.open_area_pct:.1f} %.",
            stated,
        )


def check_mass(draft: Draft, reading: Reading) -> None:
    """A stated mass has to fit the alloy, or some common metal where none is named."""
    if draft.mass is None or draft.is_dutch or not is_whole(reading) or draft.mass.number is None:
        return
    if any(side.pitch and side.wire and side.wire.mm >= side.pitch.mm for side in (reading.warp, reading.weft)):
        return
    stated = float(figures_of(draft.mass, "mass")[0][0])
    slack = float(draft.mass.number.half_unit / draft.mass.number.value) if draft.mass.number.value else 0.0
    names = (draft.alloy,) if draft.alloy and alloys.density_kg_m3(draft.alloy) else COMMON_METALS
    masses = {name: _mass(reading, alloys.density_kg_m3(name) or 0.0) for name in names}
    if any(abs(stated / m - 1) <= max(MASS_SHARE, slack) for m in masses.values() if m):
        return
    shown = ", ".join(f"{m:.2g} in {name}" for name, m in list(masses.items())[:1] if m)
    draft.problem(
        "E_INCONSISTENT",
        f"A mass of {stated:.3g} kg/m² fits no {'cloth of the alloy' if draft.alloy else 'common metal'}: "
        f"this construction weighs {shown}.",
        draft.mass,
    )


def _mass(reading: Reading, density: float) -> float:
    warp, weft = reading.warp, reading.weft
    assert warp.pitch
    assert weft.pitch
    assert warp.wire
    assert weft.wire
    return mass_nominal_kg_m2(
        float(warp.pitch.mm), float(weft.pitch.mm), float(warp.wire.mm), float(weft.wire.mm), density
    )
