"""The one question, with the numbers of the readings that are left."""

from collections.abc import Sequence

from catalog.callout.reading import Likelihood, Reading


def question(readings: Sequence[Reading]) -> str | None:
    """One question with the numbers of the readings that are left."""
    alive = [r for r in readings if r.likelihood is not Likelihood.RULED_OUT]
    if len(alive) < 2:
        return None
    said = [f"{r.label}{_numbers(r)}" for r in alive[:4]]
    more = f" (and {len(alive) - 4} more)" if len(alive) > 4 else ""
    return f"Which is meant: {'; or '.join(said)}{more}?"


def _numbers(reading: Reading) -> str:
    """The figures that tell readings apart: opening and wire, else pitch."""
    side, other = reading.warp, reading.weft
    parts: list[str] = []
    for name, one, two in (
        ("opening", side.aperture, other.aperture),
        ("wire", side.wire, other.wire),
        ("pitch", side.pitch, other.pitch),
    ):
        if one and (name != "pitch" or not parts):
            twice = f" x {float(two.mm):.4g}" if two and two.mm != one.mm else ""
            parts.append(f"{name} {float(one.mm):.4g}{twice} mm")
    return f" ({', '.join(parts)})" if parts else ""
