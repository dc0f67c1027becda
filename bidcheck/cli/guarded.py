"""What every command shares: errors a user can mend are printed without a traceback, ours say they are ours."""

import functools
import os
import sys
from collections.abc import Callable
from typing import TYPE_CHECKING, ParamSpec, TypeVar

import click

from bidcheck.errors import BidcheckError

if TYPE_CHECKING:
    from rich.console import Console

P = ParamSpec("P")
R = TypeVar("R")

READ_ERROR = 1
"""Exit code: an input cannot be read."""
FINDINGS = 3
"""Exit code: `--fail-on` met a finding."""
PIPE_WIDTH = 120
"""Columns where the output is not a terminal."""


def guarded(command: Callable[P, R]) -> Callable[P, R]:
    """Turn errors of a command into lines on standard error and an exit code."""

    @functools.wraps(command)
    def run(*args: P.args, **kwargs: P.kwargs) -> R:
        try:
            return command(*args, **kwargs)
        except BidcheckError as error:
            complain(error)
        except BrokenPipeError:
            # the reader went away; keep the interpreter from complaining while it closes
            os.dup2(os.open(os.devnull, os.O_WRONLY), sys.stdout.fileno())
            raise click.exceptions.Exit(0) from None
        except (click.ClickException, click.exceptions.Exit, click.Abort):
            raise
        except OSError as error:
            say(f"{error.filename or 'file'}: {error.strerror or error}")
        except Exception as error:
            say("this is a mistake in bidcheck, not in your files; please report it with the files that show it:")
            say(f"{type(error).__name__}: {error}")
        raise click.exceptions.Exit(READ_ERROR)

    return run


def complain(error: BidcheckError) -> None:
    """Print every problem of an error, one a line."""
    for line in str(error).splitlines():
        say(line)


def say(line: str) -> None:
    """A line on standard error, without control characters from inputs."""
    from bidcheck.report.format import plain

    click.echo(plain(line), err=True)


def console(width: int | None = None) -> "Console":
    """Where a command prints: plain text of a fixed width in a pipe, colours only on a terminal that wants them."""
    from rich.console import Console

    out = sys.stdout
    if width is None and not out.isatty() and "COLUMNS" not in os.environ:
        width = PIPE_WIDTH
    return Console(file=out, width=width, highlight=False, markup=False, emoji=False, legacy_windows=False)
