"""The console tables are printed on. Imports rich, so commands import this when they run."""

import os
import sys
from collections.abc import Iterable

from rich.console import Console, ConsoleOptions, RenderableType
from rich.segment import Segment

from bidcheck.cli.failures import turn_away
from bidcheck.cli.plain import plain

PIPE_WIDTH = 120
"""Columns where standard output is no terminal and COLUMNS is not set."""


class PlainConsole(Console):
    """A console through which no control character of a text reaches the terminal."""

    def render(self, renderable: RenderableType, options: ConsoleOptions | None = None) -> Iterable[Segment]:
        """Render as usual; texts are made harmless, the console's own control codes are kept."""
        for segment in super().render(renderable, options):
            yield segment if segment.control else segment._replace(text=plain(segment.text))

    def on_broken_pipe(self) -> None:
        """Go on in silence when the reader has gone, so that files are written and the exit code holds."""
        turn_away()


def open_console() -> Console:
    """Console on standard output: in a pipe without colour, 120 wide unless COLUMNS says otherwise."""
    if sys.stdout.isatty():
        return PlainConsole(markup=False, highlight=False, emoji=False)
    return PlainConsole(
        force_terminal=False,
        color_system=None,
        width=_columns(),
        markup=False,
        highlight=False,
        emoji=False,
        legacy_windows=False,
    )


def _columns() -> int:
    """COLUMNS where it holds a sensible number, else the width for pipes."""
    text = os.environ.get("COLUMNS", "")
    return int(text) if text.isdecimal() and 20 <= int(text) <= 10_000 else PIPE_WIDTH
