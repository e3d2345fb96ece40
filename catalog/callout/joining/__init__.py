"""From items to figures: numbers with their units, products, brackets, and the words that name them."""
