"""The exceptions of the product; each carries its facts as fields.

A message is one whole sentence: what was wrong, where, what was expected, what to do.
"""


class CrossclothError(Exception):
    """Anything that the program can explain to the person at the keyboard."""

    def __init__(self, message: str) -> None:
        super().__init__(message)
        self.message = message


class InputError(CrossclothError):
    """Something that was typed can't be used.

    *code* is a problem code of the JSON contract; *column* counts from 1 within *text*.
    """

    def __init__(self, message: str, code: str = "E_NOT_UNDERSTOOD", column: int | None = None, text: str = "") -> None:
        super().__init__(message)
        self.code = code
        self.column = column
        self.text = text


class NotFoundError(CrossclothError):
    """Something named (a cloth, a lot, a table) isn't there; *nearest* holds close names."""

    def __init__(self, message: str, nearest: tuple[str, ...] = ()) -> None:
        super().__init__(message)
        self.nearest = nearest


class DataError(CrossclothError):
    """Rows of a table can't be used; *rows* holds one sentence for each."""

    def __init__(self, message: str, rows: tuple[str, ...] = ()) -> None:
        super().__init__(message)
        self.rows = rows


class StoreError(CrossclothError):
    """The store is missing, unreadable, not ours, newer, locked, or can't be written."""

    def __init__(self, message: str, path: str = "") -> None:
        super().__init__(message)
        self.path = path


class ReadOnlyStoreError(StoreError):
    """A write was asked of a store that can only be read."""


class StockClashError(CrossclothError):
    """A movement can't be made on the balance as it is; *available_mm* is the present balance."""

    def __init__(self, message: str, available_mm: int | None = None) -> None:
        super().__init__(message)
        self.available_mm = available_mm
