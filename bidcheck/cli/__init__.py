"""The command line, one file per command; the only user of click. Heavy modules are loaded inside the commands."""

from importlib import import_module

import click

from bidcheck import __version__

COMMANDS = {
    "evaluate": "evaluate the bids of an inquiry: the main job",
    "curve": "look at one curve file, without an inquiry",
    "checks": "list the checks, or explain one with its source and limits",
}
"""Commands in the order of the help; each lives in the module of its name."""


class Commands(click.Group):
    """A group that loads a command only when it is called."""

    def list_commands(self, _ctx: click.Context) -> list[str]:
        """Names in the order of the job."""
        return list(COMMANDS)

    def get_command(self, _ctx: click.Context, name: str) -> click.Command | None:
        """The command of a name."""
        if name not in COMMANDS:
            return None
        command: click.Command = import_module(f"bidcheck.cli.{name}_command").command
        return command

    def resolve_command(
        self, ctx: click.Context, args: list[str]
    ) -> tuple[str | None, click.Command | None, list[str]]:
        """The command called; one that does not exist is refused with the nearest there is."""
        if args[0] not in COMMANDS and not args[0].startswith("-"):
            from difflib import get_close_matches

            near = get_close_matches(args[0], COMMANDS, n=1)
            ctx.fail(f"no command is called {args[0]!r}; " + (f'nearest is "{near[0]}"' if near else "see --help"))
        return super().resolve_command(ctx, args)

    def format_commands(self, _ctx: click.Context, formatter: click.HelpFormatter) -> None:
        """List the commands without loading them."""
        with formatter.section("Commands"):
            formatter.write_dl(list(COMMANDS.items()))


@click.command(cls=Commands, context_settings={"help_option_names": ["-h", "--help"], "max_content_width": 100})
@click.version_option(__version__, prog_name="bidcheck")
@click.option("--trace", is_flag=True, hidden=True, help="Let the traceback of an unexpected error through.")
def main(trace: bool) -> None:
    """Evaluate centrifugal-pump bids for one duty.

    Puts the bids on one basis, holds each bid's figures against one another and against estimates that do not come
    from the bidder, and writes down what stands against each bid and what to ask.
    """
