"""`bidcheck checks`: the list of checks, or one of them explained."""

import click


SETS = ("general-water", "process")


@click.command()
@click.argument("name", required=False)
@click.option(
    "--set", "set_name", type=click.Choice(SETS), default=SETS[0], show_default=True, help="Set of limits to print."
)
def checks(name: str | None, set_name: str) -> None:
    """List the checks, or explain the one of that NAME with its source and limits."""
    from bidcheck.checks import ALL
    from bidcheck.cli.plain import plain
    from bidcheck.read.nearest import nearest
    from bidcheck.report import reference

    if name is None:
        click.echo(plain(reference.checks_list(set_name)))
        return
    known = [check.name for check in ALL]
    if name not in known:
        raise click.UsageError(plain(f'there is no check "{name}"; {nearest(name, known)}'))
    click.echo(plain(reference.check_text(name, set_name)))
