"""What weave and magnet say of a roll that was ordered: gates beside the measured figures."""

from collections.abc import Iterator

from catalog.reference import alloys
from catalog.search.candidate import Finding
from catalog.search.evidence import Evidence
from catalog.target import Target


def make_findings(target: Target, evidence: Evidence) -> Iterator[Finding]:
    """Weave as seen, magnet as felt, against what was asked."""
    asked = target.weave
    if evidence.weave is not None and asked is not None:
        ok = evidence.weave is asked
        said = f"It is {evidence.weave.words}; {asked.words} was asked."
        assumed = target.origin.get("weave") == "assumed" and not ok
        yield Finding("weave", None if assumed else ok, said + (" The order states no weave." if assumed else ""))
    if evidence.magnetic is not None and target.reading.alloy:
        yield _magnet(target.reading.alloy, evidence.magnetic)


def _magnet(alloy_id: str, attracted: bool) -> Finding:
    """A hint, never a proof of the alloy; it fails where the table is sure of the contrary."""
    known = alloys.alloy(alloy_id)
    source = "alloy table, magnetic hint"
    felt = "A magnet is attracted" if attracted else "No magnet is attracted"
    if known is None or known.attracts_magnet is None:
        hint = f": {known.magnetic}" if known else ""
        return Finding("magnet", None, f"{felt}; for {alloy_id} that decides nothing{hint}.", source)
    ok = known.attracts_magnet is attracted
    said = "which agrees; it doesn't prove the alloy" if ok else f"but {alloy_id} is {known.magnetic}"
    return Finding("magnet", ok, f"{felt}, {said}.", source)
