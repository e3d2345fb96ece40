"""What a receipt check can say."""

from collections.abc import Sequence
from enum import StrEnum


class Outcome(StrEnum):
    """From good to bad."""

    CONFORMS = "conforms"
    NOT_PROVEN = "not-proven"
    FAILS = "fails"

    @property
    def words(self) -> str:
        """For a sentence."""
        return self.value.replace("-", " ")


def worst(outcomes: Sequence[Outcome]) -> Outcome:
    """The one that decides: any failure, else anything that isn't proven."""
    return max(outcomes, key=list(Outcome).index)
