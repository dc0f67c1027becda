"""The command line, one file per command; the only user of click. Commands are loaded when they are asked for."""

from importlib import import_module
from typing import Any

import click

from bidcheck import __version__
from bidcheck.cli.failures import UNREADABLE, survive_any_encoding, tell, tell_our_mistake
from bidcheck.errors import BidcheckError

COMMANDS = {
    "evaluate": "bidcheck.cli.evaluate",
    "curve": "bidcheck.cli.curve",
    "checks": "bidcheck.cli.checks",
}
"""Name of each command → module with a function of that name."""


class Commands(click.Group):
    """A group that loads its commands late and lets no traceback out."""

    def list_commands(self, ctx: click.Context) -> list[str]:
        """Names in the order of work."""
        return list(COMMANDS)

    def get_command(self, ctx: click.Context, cmd_name: str) -> click.Command | None:
        """Load one command."""
        if cmd_name not in COMMANDS:
            return None
        command: click.Command = getattr(import_module(COMMANDS[cmd_name]), cmd_name)
        return command

    def invoke(self, ctx: click.Context) -> Any:
        """Run a command; say what is wrong with inputs, or that the mistake is ours."""
        survive_any_encoding()
        try:
            return super().invoke(ctx)
        except (click.ClickException, click.exceptions.Exit, click.Abort, BrokenPipeError):
            raise
        except BidcheckError as error:
            tell(error)
            ctx.exit(UNREADABLE)
        except Exception as error:
            if ctx.params["trace"]:
                raise
            tell_our_mistake(error)
            ctx.exit(UNREADABLE)


@click.command(cls=Commands, context_settings={"help_option_names": ["-h", "--help"]})
@click.version_option(__version__, prog_name="bidcheck")
@click.option("--trace", is_flag=True, hidden=True, help="Let the traceback of an unexpected error through.")
def main(trace: bool) -> None:  # noqa: ARG001
    """Evaluate centrifugal-pump bids for one duty.

    Exit codes: 0 done, 1 input cannot be read, 2 wrong usage, 3 something stands open that --fail-on asked for.
    """
