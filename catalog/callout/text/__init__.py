"""From characters to items: repair, words of the trade, names that look like numbers, numbers."""
