"""From a combination of senses to a reading."""

from catalog.callout.deciding.combining import Combined
from catalog.callout.reading import Likelihood, Limits, Reading, Side
from catalog.callout.rules.draft import Draft
from catalog.construction import Weave
from catalog.physics.geometry import open_area_pct
from catalog.units import MM_PER_INCH


def figures_of_side(side: Side) -> tuple[object, ...]:
    """Pitch, wire and aperture in mm, to tell readings apart."""
    return tuple(length and length.mm for length in (side.pitch, side.wire, side.aperture))


def make_reading(
    draft: Draft,
    made: Combined,
    label: str,
    likelihood: Likelihood,
    weave: Weave | None = None,
    notes: tuple[str, ...] = (),
) -> Reading:
    """The reading that a combination makes, with everything else that the text says."""
    options = made.options
    weave = weave or draft.weave
    area, derived = _open_area(draft, made, weave)
    form = next((o.form for o in options if o.form), None) or draft.form
    said = dict.fromkeys((*draft.notes, *(n for o in options for n in o.notes if n), *notes))
    return Reading(
        label=label or made.label or "as written",
        likelihood=likelihood,
        weave=weave,
        warp=made.warp,
        weft=made.weft,
        alloy=draft.alloy or next((o.alloy for o in options if o.alloy), None),
        material=draft.material,
        finish=", ".join(draft.finish) or None,
        crimp=draft.crimp,
        grade=next((o.grade for o in options if o.grade), None) or draft.grade,
        standard=next((o.standard for o in options if o.standard), None) or (", ".join(draft.standards) or None),
        certificate=draft.certificate,
        rating=next((o.rating for o in options if o.rating), None) or draft.rating,
        open_area_pct=area,
        mass_kg_m2=_stated_mass(draft),
        limits=_limits(draft, made),
        form=form,
        derived=made.derived + derived,
        notes=tuple(said),
    )


def _open_area(draft: Draft, made: Combined, weave: Weave | None) -> tuple[float | None, tuple[str, ...]]:
    warp, weft = made.warp, made.weft
    whole = warp.pitch and weft.pitch and warp.aperture and weft.aperture
    if whole and not draft.is_dutch and not (weave and weave.is_filter) and min(warp.aperture.mm, weft.aperture.mm) > 0:  # type: ignore[union-attr]
        figures = [float(x.mm) for x in (warp.aperture, weft.aperture, warp.pitch, weft.pitch) if x]
        if figures[0] < figures[2] and figures[1] < figures[3]:
            return round(open_area_pct(*figures), 4), ("open_area_pct",)
    stated = draft.open_area
    return (float(stated.number.value) if stated and stated.number else None), ()


def _limits(draft: Draft, made: Combined) -> Limits:
    """The limits of the text, and those that a tolerance puts around this reading's figures."""
    limits = dict(draft.limits)
    for slot, (minus, plus) in draft.tolerances.items():
        length = made.warp.pitch if slot == "count" else getattr(made.warp, slot)
        if length is None or length.mm <= 0:
            continue
        value = MM_PER_INCH / length.mm if slot == "count" else length.mm
        key = "count_per_in" if slot == "count" else f"{slot}_mm"
        limits[key] = (round(float(value * (1 - minus)), 9), round(float(value * (1 + plus)), 9))
    return limits


def _stated_mass(draft: Draft) -> float | None:
    from catalog.callout.rules.bound_values import figures_of

    return round(float(figures_of(draft.mass, "mass")[0][0]), 6) if draft.mass else None
