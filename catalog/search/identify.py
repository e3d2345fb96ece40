"""What is this roll? Every cloth against what was measured: odds, misfits, what rules it out, what to measure next."""

from collections.abc import Iterable, Mapping
from dataclasses import dataclass

from catalog.cloth import Cloth
from catalog.errors import InputError
from catalog.search.evidence import Evidence, Stand, stand
from catalog.search.measured import DOUBTFUL, odds_of
from catalog.search.misreadings import warnings_about
from catalog.search.separating import Next, next_measurement
from catalog.search.suspicion import Suspect, reason_of

SET_SHARE = 0.95
TIE = 1e-9


@dataclass(frozen=True, slots=True)
class Identified:
    """One cloth and how it fits."""

    cloth: Cloth
    odds: float
    """Share of 1 among the cloths that nothing rules out, all held alike before the measurement."""
    misfit: Mapping[str, float | None]
    """Quantity → difference in units of the ± shown; None where the cloth's figure is unknown or no number."""
    ruled_out_by: str | None
    """The quantity that speaks most against it, for cloth outside the 95 % set."""
    is_in_set: bool
    """True inside the smallest set that holds 95 % of the odds."""
    turned: bool
    """True where it fits with warp and weft exchanged."""
    reason: str


@dataclass(frozen=True, slots=True)
class Identification:
    """What the measurements say."""

    evidence: Evidence
    candidates: tuple[Identified, ...]
    """The 95 % set first, by odds; then what is ruled out, nearest first."""
    next: Next | None
    """What to measure next; None where nothing is left open."""
    looked_at: int
    """How many cloths were set against the evidence."""
    notes: tuple[str, ...] = ()
    """What was taken for granted."""
    warnings: tuple[str, ...] = ()
    """Slips that are likely here."""

    @property
    def survivors(self) -> tuple[Identified, ...]:
        """The 95 % set; empty where no cloth fits."""
        return tuple(c for c in self.candidates if c.is_in_set)


def identify(cloths: Iterable[Cloth], evidence: Evidence, limit: int = 50) -> Identification:
    """Name an unknown roll among *cloths*; at least the 95 % set is returned, and up to *limit* in all.

    Raises InputError where nothing was measured.
    """
    if evidence.is_empty:
        raise InputError("Nothing was measured: state a count, a wire, an aperture, a thickness, a swatch or a magnet.")
    eligible = [c for c in cloths if evidence.weave in (None, c.construction.weave)]
    ranked = _ranked([stand(cloth, evidence) for cloth in eligible])
    inside = _set_of(ranked)
    suspects = [Suspect(one, odds, number < inside) for number, (one, odds) in enumerate(ranked)]
    shown = suspects[: max(limit, inside)]
    return Identification(
        evidence=evidence,
        candidates=tuple(_identified(suspect, evidence) for suspect in shown),
        next=next_measurement(suspects[: max(inside, 50)], evidence),
        looked_at=len(eligible),
        notes=_notes(evidence, len(eligible)),
        warnings=warnings_about(evidence, suspects[:200]),
    )


Ranked = list[tuple[Stand, float]]


def _ranked(stands: list[Stand]) -> Ranked:
    """With odds, the likeliest first; cloth that is ruled out has none and follows by its misfits; ties by id."""
    alive = [one for one in stands if not one.is_out]
    odds = odds_of([one.log_likelihood for one in alive])
    likely = sorted(zip(alive, odds, strict=True), key=lambda pair: (-pair[1], pair[0].roughness, pair[0].cloth.id))
    out = sorted((one for one in stands if one.is_out), key=lambda one: (one.roughness, one.cloth.id))
    return likely + [(one, 0.0) for one in out]


def _set_of(ranked: Ranked) -> int:
    """How many from the top hold 95 % of the odds; what ties with the last of them is in as well."""
    held, last = 0.0, 0.0
    for number, (_, odds) in enumerate(ranked):
        if odds == 0 or (held >= SET_SHARE and odds < last * (1 - TIE)):
            return number
        held, last = held + odds, odds
    return len(ranked)


def _identified(suspect: Suspect, evidence: Evidence) -> Identified:
    one = suspect.stand
    worst = one.worst
    against = worst if worst and not suspect.is_in_set and one.fits[worst].drop > DOUBTFUL else None
    return Identified(
        cloth=one.cloth,
        odds=suspect.odds,
        misfit={name: fit.misfit for name, fit in one.fits.items()},
        ruled_out_by=against,
        is_in_set=suspect.is_in_set,
        turned=one.turned,
        reason=reason_of(suspect, against, evidence),
    )


def _notes(evidence: Evidence, looked_at: int) -> tuple[str, ...]:
    """What was taken for granted."""
    said = [f"Set against {looked_at} cloths; only what is in the catalogue can be named."]
    if evidence.weave:
        said.append(f"Only {evidence.weave.words} cloth was looked at.")
    if evidence.made_within_pct == 0:
        said.append("Nominal pitch and wire are taken as exact; a roll made off them wants a stated spread.")
    if evidence.is_one_way and looked_at:
        said.append("One direction was measured: each cloth was tried both ways round, its other direction left open.")
    for name, measured in evidence.measured.items():
        if getattr(measured, "is_assumed", False):
            said.append(f"± of the {name.replace('_', ' ')} is assumed: the usual figure for {_tool(measured)}.")
        said.extend(getattr(measured, "notes", ()))
    return tuple(said)


def _tool(measured: object) -> str:
    name = str(getattr(measured, "instrument", ""))
    if name == "balance":
        return "a balance and a hand-cut swatch"
    return f"measuring by {name}, or half the last written digit where that is more"
