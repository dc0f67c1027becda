"""What is said, and with which exit code, when a command cannot do its work."""

import functools
import os
import sys
from collections.abc import Callable, Iterable
from typing import ParamSpec

import click

from bidcheck.cli.plain import one_line
from bidcheck.errors import BidcheckError, InputError

P = ParamSpec("P")

UNREADABLE = 1
"""Exit code: an input cannot be read."""
WRONG_USAGE = 2
"""Exit code: wrong usage, also a place where nothing can be written."""
STANDS_OPEN = 3
"""Exit code: a finding of the kind --fail-on names stands open."""


class CannotWrite(click.ClickException):
    """An output that cannot be written where it was asked for."""

    exit_code = WRONG_USAGE


def guarded(command: Callable[P, None]) -> Callable[P, None]:
    """Let no traceback out of a command: say what is wrong with the inputs, or that the mistake is ours."""

    @functools.wraps(command)
    def run(*args: P.args, **kwargs: P.kwargs) -> None:
        survive_any_encoding()
        try:
            command(*args, **kwargs)
        except (click.ClickException, click.exceptions.Exit, click.Abort):
            raise
        except BrokenPipeError:
            turn_away()
        except BidcheckError as error:
            tell(error)
            raise click.exceptions.Exit(UNREADABLE) from None
        except Exception as error:
            if click.get_current_context().find_root().params.get("trace"):
                raise
            say("this is a mistake in bidcheck, not in your files; please report it")
            say(f"{type(error).__name__}: {error}")
            raise click.exceptions.Exit(UNREADABLE) from None

    return run


def say(line: str) -> None:
    """One line on standard error, without control characters from inputs."""
    click.echo(one_line(line), err=True)


def tell(error: BidcheckError, folder: str = "") -> None:
    """Print every problem on standard error, one a line.

    Parameters
    ----------
    error : BidcheckError
    folder : str
        Put before the files' names, where more than one folder is in work.
    """
    for line in _lines(error, folder):
        say(line)


def _lines(error: BidcheckError, folder: str) -> Iterable[str]:
    """A line per problem."""
    if not isinstance(error, InputError):
        return [f"{folder}: {error}" if folder else str(error)]
    return [
        f"{folder.rstrip('/')}/{problem}" if folder and problem.file != folder else str(problem)
        for problem in error.problems
    ]


def turn_away() -> None:
    """Send standard output nowhere, once its reader has gone."""
    nowhere = os.open(os.devnull, os.O_WRONLY)
    os.dup2(nowhere, sys.stdout.fileno())


def survive_any_encoding() -> None:
    """Let a terminal that cannot show a character show another, not stop the program."""
    for stream in (sys.stdout, sys.stderr):
        reconfigure = getattr(stream, "reconfigure", None)
        if reconfigure is not None:
            reconfigure(errors="replace")
