"""What every command shares: errors a user can mend are printed without a traceback, ours say they are ours."""

import functools
import os
import sys
import traceback
from collections.abc import Callable
from dataclasses import replace
from pathlib import Path
from typing import ParamSpec, TextIO, TypeVar

import click

from bidcheck.errors import BidcheckError, InputError, Problem

P = ParamSpec("P")
R = TypeVar("R")

READ_ERROR = 1
"""Exit code: an input cannot be read, or the work could not be finished."""
FINDINGS = 3
"""Exit code: `--fail-on` met a finding."""
PACKAGE = Path(__file__).parent.parent


def guarded(command: Callable[P, R]) -> Callable[P, R]:
    """Turn errors of a command into lines on standard error and an exit code."""

    @functools.wraps(command)
    def run(*args: P.args, **kwargs: P.kwargs) -> R:
        try:
            return command(*args, **kwargs)
        except (click.ClickException, click.exceptions.Exit, click.Abort):
            raise
        except BidcheckError as error:
            complain(error)
        except OSError as error:
            say(f"{error.filename or 'file'}: {error.strerror or error}")
        except Exception as error:
            if click.get_current_context().find_root().params.get("trace"):
                raise
            say("this is a mistake in bidcheck, not in your files; please report it with the files that show it")
            say(_in_one_line(error))
        raise click.exceptions.Exit(READ_ERROR)

    return run


def _in_one_line(error: Exception) -> str:
    """Kind and text of an error of ours, and where in the package it arose."""
    ours = [
        frame for frame in traceback.extract_tb(error.__traceback__) if Path(frame.filename).is_relative_to(PACKAGE)
    ]
    place = f" ({Path(ours[-1].filename).relative_to(PACKAGE.parent).as_posix()}:{ours[-1].lineno})" if ours else ""
    return f"{type(error).__name__}: {error}{place}"


def complain(error: BidcheckError, folder: Path | None = None) -> None:
    """Print every problem of an error, one a line; `folder` goes before the files where several folders are read."""
    if not isinstance(error, InputError):
        say(str(error) if folder is None else f"{folder}: {error}")
        return
    for problem in error.problems:
        say(str(problem if folder is None else _below(folder, problem)))


def _below(folder: Path, problem: Problem) -> Problem:
    """A problem whose file is named from the working folder on."""
    return problem if problem.file == str(folder) else replace(problem, file=str(folder / problem.file))


def say(line: str) -> None:
    """One line on standard error, whatever its text holds: control characters and line breaks from inputs are out."""
    emit(clean(line) + "\n", to=sys.stderr)


def clean(text: str) -> str:
    """Text from outside in one line without control characters."""
    from bidcheck.report.format import plain

    return plain(" ".join(text.split()))


def wrong_usage(text: str) -> click.UsageError:
    """Error of exit code 2, its text made safe for a terminal."""
    return click.UsageError(clean(text))


def emit(text: str, to: TextIO | None = None) -> None:
    """Write to standard output or to `to`; a reader that went away ends the output, not the work."""
    stream = sys.stdout if to is None else to
    try:
        click.echo(text, file=stream, nl=False)
    except BrokenPipeError:
        mute(stream)


def mute(stream: TextIO) -> None:
    """Let what is still to be written to a stream vanish, so that the command can finish and give its exit code."""
    nowhere = os.open(os.devnull, os.O_WRONLY)
    os.dup2(nowhere, stream.fileno())
    os.close(nowhere)
