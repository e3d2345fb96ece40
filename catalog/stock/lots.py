"""A lot: one roll, remnant, panel or disc, as it lies."""

from dataclasses import dataclass


@dataclass(frozen=True, slots=True)
class Lot:
    """One piece of cloth on the rack. Lengths are whole millimetres."""

    id: str
    cloth: str
    """Id of the cloth."""
    form: str
    """'roll', 'remnant', 'panel' or 'disc'."""
    width_mm: int
    selvedge_mm: int
    """Lost on each side."""
    length_mm: int
    """Left on the piece."""
    reserved_mm: int
    """Of that length, promised to somebody."""
    location: str
    heat: str | None = None
    certificate: str | None = None
    """'2.1', '2.2', '3.1', '3.2' (EN 10204) or None."""
    article: str | None = None
    seams: int = 0
    demo: bool = False

    @property
    def usable_width_mm(self) -> int:
        """Width inside the selvedges, mm."""
        return self.width_mm - 2 * self.selvedge_mm

    @property
    def free_length_mm(self) -> int:
        """Length that nobody has reserved, mm."""
        return self.length_mm - self.reserved_mm

    @property
    def available_m2(self) -> float:
        """Usable and free area, m²."""
        return self.usable_width_mm * self.free_length_mm / 1e6
