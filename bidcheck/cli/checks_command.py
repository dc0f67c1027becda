"""`bidcheck checks`: the list of checks, or one explained."""

import sys

import click

from bidcheck.cli.encoding import keep_readable
from bidcheck.cli.guarded import emit, guarded, wrong_usage


@click.command("checks")
@click.argument("name", required=False)
@click.option(
    "--set",
    "set_name",
    type=click.Choice(["general-water", "process"]),
    default="general-water",
    help="Set of limits to show.",
)
@click.option("--units", type=click.Choice(["SI", "US"]), default="SI", help="Units to print.")
@guarded
def command(name: str | None, set_name: str, units: str) -> None:
    """List the checks, or explain the check NAME with its source and limits."""
    from bidcheck.checks import ALL
    from bidcheck.quantity import UnitSystem
    from bidcheck.read import limit_set
    from bidcheck.report.reference import check_text, checks_list

    keep_readable(sys.stdout)
    if name is None:
        emit(checks_list() + "\nbidcheck checks NAME explains one, with its source and limits.\n")
        return
    by_name = {check.name: check for check in ALL}
    if name not in by_name:
        from difflib import get_close_matches

        near = get_close_matches(name, by_name, n=1)
        hint = f'; nearest is "{near[0]}"' if near else "; bidcheck checks lists them"
        raise wrong_usage(f'no check is called "{name}"{hint}')
    emit(check_text(by_name[name], limit_set(set_name), UnitSystem(units)))
