"""What a cut list costs from each seller: how much has to be bought, per usable square metre, and who is outdone."""

from collections.abc import Mapping, Sequence
from dataclasses import dataclass
from decimal import ROUND_CEILING, ROUND_HALF_UP, Decimal

from catalog.errors import InputError
from catalog.stock.buying import Purchase, least_purchase
from catalog.stock.cutting import Cutting
from catalog.stock.cutting_pieces import Piece
from catalog.stock.cutting_search import Effort
from catalog.stock.offer_dominance import outdone

CENT = Decimal("0.01")
LOOKING = Effort(40, 4)


@dataclass(frozen=True, slots=True)
class RollSize:
    """How an article is sold, mm."""

    width_mm: int
    length_mm: int
    """Of a whole roll; the longest that is supplied in one piece where it is cut to length."""
    is_cut_to_length: bool = False
    selvedge_mm: int = 0

    @property
    def text(self) -> str:
        """'1219 mm × 30.48 m'."""
        long = f"{Decimal(self.length_mm) / 1000:f}".rstrip("0").rstrip(".")
        return f"{self.width_mm} mm × {'up to ' if self.is_cut_to_length else ''}{long} m"


@dataclass(frozen=True, slots=True)
class Offer:
    """An article as a seller offers it. Amounts are Decimal. Raises InputError for a price that can't be."""

    article: str
    seller: str
    cloth: str
    price_per_m2: Decimal
    currency: str
    sizes: tuple[RollSize, ...]
    minimum_m2: Decimal = Decimal(0)
    lead_days: int | None = None

    def __post_init__(self) -> None:
        if not isinstance(self.price_per_m2, Decimal) or not isinstance(self.minimum_m2, Decimal):
            raise InputError(f"The amounts of {self.article} must be exact decimals, not binary fractions.")
        if self.price_per_m2 <= 0 or self.minimum_m2 < 0 or not self.sizes:
            raise InputError(f"{self.article} needs a price above 0, a minimum not below 0 and a roll size.")


@dataclass(frozen=True, slots=True)
class Quote:
    """One offer worked out for a cut list."""

    offer: Offer
    purchase: Purchase | None
    """None where the list can't be cut out of what is sold."""
    bought_m2: Decimal
    """Paid for: what is needed, or the minimum."""
    cost: Decimal | None
    per_usable_m2: Decimal | None
    """Cost by square metre of the pieces themselves."""
    per_piece: Decimal | None
    words: str
    """How the cost comes about, or why there is none."""
    outdone_by: str | None = None
    """Article that is no dearer, no later and no worse."""
    why_outdone: str | None = None


def quotes(
    offers: Sequence[Offer],
    pieces: Sequence[Piece],
    how: Cutting | None = None,
    ranks: Mapping[str, int] | None = None,
) -> tuple[Quote, ...]:
    """Every offer for *pieces*, the cheapest per usable square metre of each currency first.

    *ranks* orders cloths (0 is best), as their verdicts do; a cloth without a rank is compared with itself only.
    Raises InputError for an empty list.
    """
    if not pieces:
        raise InputError("The cut list is empty: state what is to be cut.")
    how = (how or Cutting()).within(LOOKING)
    found = [_quote(offer, pieces, how) for offer in offers]
    marked = outdone(found, ranks or {})
    return tuple(sorted(marked, key=lambda q: (q.cost is None, q.offer.currency, q.cost or 0, q.offer.article)))


def _quote(offer: Offer, pieces: Sequence[Piece], how: Cutting) -> Quote:
    purchase, why_not = least_purchase(offer.sizes, pieces, how)
    if purchase is None:
        return Quote(offer, None, Decimal(0), None, None, None, f"{offer.article}: {why_not}")
    bought = max(purchase.area_m2, offer.minimum_m2)
    cost = (bought * offer.price_per_m2).quantize(CENT, ROUND_HALF_UP)
    usable = sum((piece.area_m2 * piece.quantity for piece in pieces), Decimal(0))
    number = sum(piece.quantity for piece in pieces)
    per_usable, per_piece = ((cost / by).quantize(CENT, ROUND_HALF_UP) for by in (usable, Decimal(number)))
    return Quote(offer, purchase, bought, cost, per_usable, per_piece, _words(offer, purchase, bought, cost, usable))


def _words(offer: Offer, purchase: Purchase, bought: Decimal, cost: Decimal, usable: Decimal) -> str:
    said = f"{offer.article}: {purchase.text}, {_m2(purchase.area_m2)}"
    if bought > purchase.area_m2:
        said += f"; the minimum is {_m2(bought)}"
    said += f"; {_m2(bought)} at {offer.price_per_m2} {offer.currency}/m² are {cost} {offer.currency}"
    return f"{said} for {_m2(usable)} of pieces. {_selvedge(purchase.size.selvedge_mm)}"


def _selvedge(selvedge_mm: int) -> str:
    if not selvedge_mm:
        return "No selvedge is stated: the whole width is taken as usable."
    return f"Selvedges of {selvedge_mm} mm each side are paid for, not used."


def _m2(area: Decimal) -> str:
    return f"{area.quantize(Decimal('0.001'), ROUND_CEILING):f} m²"
