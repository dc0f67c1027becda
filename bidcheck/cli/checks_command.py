"""`bidcheck checks`: the list of checks, or one explained."""

import click

from bidcheck.cli.failures import guarded
from bidcheck.cli.plain import one_line


@click.command("checks")
@click.argument("name", required=False)
@click.option(
    "--set",
    "set_name",
    type=click.Choice(["general-water", "process"]),
    default="general-water",
    show_default=True,
    help="Set of limits to show.",
)
@click.option("--units", type=click.Choice(["SI", "US"]), default="SI", show_default=True, help="Units to print.")
@guarded
def command(name: str | None, set_name: str, units: str) -> None:
    """List the checks, or explain the check NAME with its source and limits."""
    from bidcheck.checks import ALL
    from bidcheck.quantity import UnitSystem
    from bidcheck.read import limit_set
    from bidcheck.read.nearest import nearest
    from bidcheck.report.reference import check_text, checks_list

    if name is None:
        click.echo(checks_list(), nl=False)
        click.echo("\nbidcheck checks NAME explains one, with its source and limits.")
        return
    by_name = {check.name: check for check in ALL}
    if name not in by_name:
        raise click.UsageError(one_line(f'no check is called "{name}"; {nearest(name, by_name)}'))
    click.echo(check_text(by_name[name], limit_set(set_name), UnitSystem(units)), nl=False)
