"""What is said, and with which exit code, when a command cannot do its work."""

import sys
from collections.abc import Iterable

import click

from bidcheck.cli.plain import one_line
from bidcheck.errors import BidcheckError, InputError

UNREADABLE, WRONG_USAGE, STANDS_AGAINST = 1, 2, 3
"""Exit codes: input cannot be read, wrong usage, and what --fail-on asked for."""


def tell(error: BidcheckError, folder: str = "") -> None:
    """Print every problem on standard error, one a line.

    Parameters
    ----------
    error : BidcheckError
    folder : str
        Put before the files' names, where more than one folder is in work.
    """
    for line in _lines(error, folder):
        click.echo(one_line(line), err=True)


def _lines(error: BidcheckError, folder: str) -> Iterable[str]:
    """A line per problem."""
    if not isinstance(error, InputError):
        return [f"{folder}: {error}" if folder else str(error)]
    return [
        f"{folder.rstrip('/')}/{problem}" if folder and problem.file != folder else str(problem)
        for problem in error.problems
    ]


def tell_our_mistake(error: Exception) -> None:
    """Print two lines on an exception that no input should be able to cause."""
    click.echo("this is a mistake in bidcheck, not in your files; please report it", err=True)
    click.echo(one_line(f"{type(error).__name__}: {error}"), err=True)


def survive_any_encoding() -> None:
    """Let a terminal that cannot show a character show another, not stop the program."""
    for stream in (sys.stdout, sys.stderr):
        reconfigure = getattr(stream, "reconfigure", None)
        if reconfigure is not None:
            reconfigure(errors="replace")
