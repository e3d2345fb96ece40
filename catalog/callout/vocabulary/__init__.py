"""The words of the trade, in the languages that stand on drawings: tables, no grammar."""
