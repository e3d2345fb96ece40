"""How measured numbers hang together: the rules of structure in their order."""

from catalog.callout.joining.articles import article_numbers, certificate_numbers
from catalog.callout.joining.brackets import brackets, equations
from catalog.callout.joining.products import products
from catalog.callout.joining.ranges import ranges
from catalog.callout.joining.tolerance_signs import signed_numbers, tolerances
from catalog.callout.text.items import Item

RULES = (article_numbers, certificate_numbers, signed_numbers, tolerances, ranges, products, brackets, equations)


def structured(items: list[Item]) -> list[Item]:
    """Apply the rules of structure in order."""
    for rule in (
        article_numbers,
        certificate_numbers,
        signed_numbers,
        tolerances,
        ranges,
        products,
        brackets,
        equations,
    ):
        items = rule(items)
    return items
