"""Wire cloth as values: read, catalogued, compared. No screen, no printing, no argument parsing."""
