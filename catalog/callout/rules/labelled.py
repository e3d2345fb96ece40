"""Rules for numbers that a word or a unit names: openings, pitches, wires, open area, mass, ratings."""

from catalog.callout.rules.counted import count_figures
from catalog.callout.rules.designated import designation_figures
from catalog.callout.rules.draft import Draft
from catalog.callout.rules.gauge_senses import gauge_figures
from catalog.callout.rules.mesh_words import mesh_figures
from catalog.callout.rules.sieve_openings import sieve_opening
from catalog.callout.rules.taking import said_again, take
from catalog.callout.rules.unit_senses import take_lengths
from catalog.callout.text.items import Item
from catalog.cloth import Rating


def groups(draft: Draft, wanted: str) -> list[list[Item]]:
    """The unclaimed numbers of a slot, those of one product together."""
    found: list[list[Item]] = []
    for item in draft.items:
        members = item.members if item.kind == "chain" else [item] if item.is_number else []
        row = [m for m in members if not m.taken and m.slot == wanted and m.number]
        if row:
            found.append(row[:2])
    return found


def labelled_figures(draft: Draft) -> None:
    """Apply every rule for named figures."""
    for rule in (
        _open_area_and_mass,
        _ratings,
        count_figures,
        mesh_figures,
        designation_figures,
        _pitches,
        _apertures,
        _wires,
        gauge_figures,
    ):
        rule(draft)


def _open_area_and_mass(draft: Draft) -> None:
    """'OA 60.2 %', 'about 0.83 kg/m²': figures that the construction has to agree with."""
    for number in draft.numbers():
        if number.slot == "open_area" or (
            number.unit == "%" and number.slot is None and draft.terms("product") and False
        ):
            number.taken, draft.open_area = "open area", number
        elif number.unit in ("kg/m2", "g/m2", "lb/ft2"):
            number.taken, draft.mass = "mass", number
        elif number.slot == "thickness":
            number.taken = "thickness"
            draft.note(f"thickness {number.text}: stated, not used")


def _ratings(draft: Draft) -> None:
    """'40 µm nominal', '40 µm absolute': what filter cloth holds back, no opening."""
    words = draft.terms("rating")
    lengths = [n for n in draft.numbers() if n.unit == "um" and n.slot in (None, "mesh")]
    for word in words:
        word.taken = "rating"
    if not lengths or not (words or draft.is_dutch):
        return
    kind = next((w.senses["rating"] for w in words if w.senses["rating"] != "unstated"), "unstated")
    number = lengths[0]
    if number.number and (draft.is_dutch or words):
        number.taken = "rating"
        draft.rating = Rating(float(number.number.value), kind)
        draft.is_dutch = True


def _pitches(draft: Draft) -> None:
    """'10 mm pitch', '1/4 in c/c', 'o.c.': centre to centre."""
    for row in groups(draft, "pitch"):
        take(row, "pitch")
        take_lengths(draft, "pitch", row)


def _apertures(draft: Draft) -> None:
    """'0.25 mm aperture', 'maille 0,10', '3/8 sq opg', 'slot 1 x 8 mm': clear openings; of a sieve,
    with the standard's wire.
    """
    for row in groups(draft, "aperture"):
        take(row, "aperture")
        if draft.is_dutch:
            message = f"Filter cloth has no straight opening: is {row[0].text} {row[0].unit or ''} its rating?"
            draft.problem("E_NOT_UNDERSTOOD", message.replace("  ", " "), row[0])
            continue
        if draft.is_sieve and row[0].is_length and sieve_opening(draft, row[0]):
            said_again(draft, "aperture", row)
        else:
            take_lengths(draft, "aperture", row)
    if draft.is_sieve and not any(n.taken == "aperture" for n in draft.all_numbers()):
        for number in draft.numbers():
            if number.slot is None and number.is_length and sieve_opening(draft, number):
                number.taken = "aperture"
                break


def _wires(draft: Draft) -> None:
    """'.0045 wire', 'Ø 0.4', 'fil 0,065', 'warp wire .015': diameters."""
    for row in groups(draft, "wire"):
        if row[0].unit in ("gauge", "aught"):
            continue
        take(row, "wire")
        take_lengths(draft, "wire", row)
