"""One module a revision, numbered in order; a later number is a newer store."""
