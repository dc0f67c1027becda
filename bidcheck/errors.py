"""The errors a user can cause. Any other exception is a mistake of ours."""

from collections.abc import Sequence
from dataclasses import dataclass


class BidcheckError(Exception):
    """Base of every error the program raises on purpose."""


@dataclass(frozen=True, slots=True)
class Problem:
    """One thing wrong with an input: where it stands, what was found and how to write it.

    `file` is relative to the folder as given on the command line; `line` and `column` count from 1, None where
    the problem belongs to the file as a whole.
    """

    file: str
    text: str
    line: int | None = None
    column: int | None = None

    def __str__(self) -> str:
        place = self.file
        if self.line is not None:
            place += f":{self.line}"
            if self.column is not None:
                place += f":{self.column}"
        return f"{place}: {self.text}"


class InputError(BidcheckError):
    """One or more problems in the files read; all of them at once."""

    def __init__(self, problems: Sequence[Problem]) -> None:
        self.problems: tuple[Problem, ...] = tuple(problems)
        super().__init__("\n".join(str(problem) for problem in self.problems))


class UnitError(BidcheckError):
    """A quantity whose unit is missing, unknown or of the wrong kind; the text names the cure."""


class NotSupplied(BidcheckError):  # noqa: N818
    """A figure that is needed and was not given."""


class OutOfRange(BidcheckError):  # noqa: N818
    """A formula asked outside the range it is valid for, or a curve outside its points."""
