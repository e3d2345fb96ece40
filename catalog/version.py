"""The version of the program, stated once."""

VERSION = "0.1.0"
