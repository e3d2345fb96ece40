"""The program that people run: command line and full-screen browser."""
