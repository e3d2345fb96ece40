"""The options that state measurements at the bench, and the evidence that they come to."""

import argparse
from math import floor, log10
from typing import TYPE_CHECKING

from catalog.errors import InputError
from tui.commandline.match import weave_of
from tui.exit_codes import one_line

if TYPE_CHECKING:
    from catalog.search.evidence import Evidence
    from catalog.search.measured import Count, Scalar

OPTIONS = (
    ("--count", "TEXT", "spaces over a length: '47 in 20 mm' (±½ space)"),
    ("--count-weft", "TEXT", "the same the other way"),
    ("--wire", "TEXT", "'0.165±0.005 mm', '.0065 in' (± is k = 2)"),
    ("--wire-weft", "TEXT", "the other set's wire"),
    ("--aperture", "TEXT", "measured directly: '0.258±0.002 mm'"),
    ("--aperture-weft", "TEXT", "the same the other way"),
    ("--thickness", "TEXT", "over the knuckles: '0.33 mm'"),
    ("--swatch", "TEXT", "weighed: '1.92 g / 100 cm2'"),
    ("--magnetic", "yes|no", "whether a magnet is attracted"),
    ("--weave", "WEAVE", "as seen: plain, twilled, plain-dutch, …"),
)


def add_measurements(parser: argparse.ArgumentParser) -> None:
    """Declare an option for everything that can be measured."""
    group = parser.add_argument_group(
        "measured", "± is the expanded uncertainty, k = 2; without it the usual one counts"
    )
    for name, metavar, words in OPTIONS:
        group.add_argument(name, metavar=metavar, help=words)


def evidence_from(arguments: argparse.Namespace, made_within_pct: float = 0.0) -> "Evidence":
    """The evidence that the options state. Raises InputError, with the column, for the first that can't be read."""
    from catalog.search.evidence import evidence_of

    if all(getattr(arguments, name[2:].replace("-", "_")) is None for name, _, _ in OPTIONS):
        raise InputError("Nothing was measured: give --count '47 in 20 mm', --wire '0.165±0.005 mm' or what you have.")
    return evidence_of(
        count=arguments.count,
        count_weft=arguments.count_weft,
        wire=arguments.wire,
        wire_weft=arguments.wire_weft,
        aperture=arguments.aperture,
        aperture_weft=arguments.aperture_weft,
        thickness=arguments.thickness,
        swatch=arguments.swatch,
        magnetic=arguments.magnetic,
        weave=weave_of(arguments.weave),
        made_within_pct=made_within_pct,
    )


def measured_lines(evidence: "Evidence") -> list[str]:
    """One line for each thing that was measured: its value, its ±, how it was written."""
    lines = [_measured(name, one) for name, one in evidence.measured.items() if one is not None]
    if evidence.magnetic is not None:
        lines.append(f"magnet: {'attracted' if evidence.magnetic else 'not attracted'}")
    if evidence.weave is not None:
        lines.append(f"weave: {evidence.weave.words}")
    return lines


def _measured(name: str, measured: "Count | Scalar") -> str:
    from catalog.search.measured import Count

    if isinstance(measured, Count):
        value, off, unit, kind = measured.pitch_mm, measured.pitch_limit_mm, "mm", "a limit"
    else:
        value, off = measured.value, measured.plus_minus
        unit = "kg/m²" if measured.instrument == "balance" else "mm"
        kind = "k = 2, assumed" if measured.is_assumed else "k = 2"
    digits = decimals(off)
    words = name.replace("_weft", " of the weft")
    return f"{words} {float(value):.{digits}f} ± {off:.{digits}f} {unit} ({kind}), from {one_line(measured.written)!r}"


def decimals(off: float) -> int:
    """Decimals that show two figures of an uncertainty, at least three, at most seven."""
    return min(7, max(3, 1 - floor(log10(off)))) if off > 0 else 4
