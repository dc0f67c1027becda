"""Where a command prints its tables: plain text of a fixed width in a pipe, colours on a terminal that wants them."""

import os
import sys

from rich.console import Console

from bidcheck.cli.encoding import keep_readable
from bidcheck.cli.guarded import mute

PIPE_WIDTH = 120
"""Columns where the output is not a terminal."""


class Screen(Console):
    """A console whose reader may go away: the output ends, the command goes on to its exit code."""

    def on_broken_pipe(self) -> None:
        """Let the rest of the output vanish."""
        mute(sys.stdout)


def screen() -> Screen:
    """Standard output as a console; NO_COLOR, COLUMNS and FORCE_COLOR are respected."""
    keep_readable(sys.stdout)
    width = None if sys.stdout.isatty() or "COLUMNS" in os.environ else PIPE_WIDTH
    return Screen(file=sys.stdout, width=width, highlight=False, markup=False, emoji=False, legacy_windows=False)
