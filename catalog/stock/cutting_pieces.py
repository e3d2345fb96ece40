"""What is to be cut: rectangles, which may be bound to the warp, and discs."""

from dataclasses import dataclass
from decimal import Decimal

from catalog.errors import InputError

PI = Decimal("3.14159265358979323846")
UM_PER_MM = 1000
SQUARE_UM_PER_M2 = Decimal(10**12)


@dataclass(frozen=True, slots=True)
class Piece:
    """So many pieces of one size, mm: a width across the warp by a length along it, or a diameter.

    Raises InputError where neither or both are given, or where a size or the quantity isn't above zero.
    """

    quantity: int = 1
    width_mm: float | None = None
    length_mm: float | None = None
    diameter_mm: float | None = None
    warp_bound: bool = False
    """The length must lie along the warp: the piece can't be turned."""
    label: str = ""

    def __post_init__(self) -> None:
        sizes = (self.diameter_mm,) if self.is_disc else (self.width_mm, self.length_mm)
        both = self.is_disc and (self.width_mm is not None or self.length_mm is not None)
        if both or any(size is None for size in sizes):
            raise InputError("A piece has a width and a length, or a diameter: state one or the other.")
        if self.quantity < 1 or any(size is not None and to_um(size) < 1 for size in sizes):
            raise InputError(f"A cut list can't hold {self.text}: state a number and sizes above 0.")

    @property
    def is_disc(self) -> bool:
        """Whether it is a disc."""
        return self.diameter_mm is not None

    @property
    def across_mm(self) -> float:
        """Extent across the warp as it was asked, mm."""
        return self.diameter_mm or self.width_mm or 0.0

    @property
    def along_mm(self) -> float:
        """Extent along the warp as it was asked, mm."""
        return self.diameter_mm or self.length_mm or 0.0

    @property
    def size_text(self) -> str:
        """'Ø 350 mm' or '1200 × 2400 mm'."""
        if self.diameter_mm is not None:
            return f"Ø {mm_text(self.diameter_mm)} mm"
        return f"{mm_text(self.across_mm)} × {mm_text(self.along_mm)} mm"

    @property
    def text(self) -> str:
        """'12 discs Ø 350 mm', '4 pieces 1200 × 2400 mm, warp along the length'."""
        noun = ("disc" if self.is_disc else "piece") + ("" if self.quantity == 1 else "s")
        bound = ", warp along the length" if self.warp_bound and not self.is_disc else ""
        return f"{self.quantity} {noun} {self.size_text}{bound}"

    @property
    def area_m2(self) -> Decimal:
        """Area of one piece, m², exact for rectangles."""
        return area_m2(self)


def area_m2(piece: Piece) -> Decimal:
    """Area of one *piece* from its sides in whole micrometres, m²: w·l, or π/4·D² with twenty decimals of π."""
    across, along = Decimal(to_um(piece.across_mm)), Decimal(to_um(piece.along_mm))
    return across * along * (PI / 4 if piece.is_disc else 1) / SQUARE_UM_PER_M2


def to_um(size_mm: float) -> int:
    """Whole micrometres: plans are worked in integers, so that 3 × 0.1 mm fits into 0.3 mm."""
    return round(size_mm * UM_PER_MM)


def mm_text(size_mm: float) -> str:
    """A length without needless digits: 350, 330.2."""
    return f"{size_mm:.3f}".rstrip("0").rstrip(".")
