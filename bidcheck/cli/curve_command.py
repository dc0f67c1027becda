"""`bidcheck curve`: one curve file, no inquiry."""

from pathlib import Path

import click

from bidcheck.cli.guarded import console, guarded

ANY_SPEED = 1450.0
"""Speed put into the object where none is given [1/min]; nothing printed depends on it."""


@click.command("curve")
@click.argument("file", type=click.Path(path_type=Path), metavar="FILE")
@click.option("--units", type=click.Choice(["SI", "US"]), default="SI", help="Units to print.")
@click.option("--speed", metavar="SPEED", help='Speed of the curve, such as "1480 rpm": adds specific speeds.')
@click.option("--stages", type=click.IntRange(min=1), default=1, help="Stages the head is given for.")
@click.option("--picture", type=click.Path(path_type=Path), metavar="FILE.svg", help="Draw the curve.")
@guarded
def command(file: Path, units: str, speed: str | None, stages: int, picture: Path | None) -> None:
    """Look at one curve FILE: fits, best efficiency, power balance, odd points.

    Power is taken as shaft power with cold water.
    """
    from bidcheck.errors import UnitError
    from bidcheck.fit import fit_curve
    from bidcheck.quantity import Kind, UnitSystem
    from bidcheck.read import read_curve_file
    from bidcheck.report.curve_text import print_curve, specific_speed_lines
    from bidcheck.units import parse

    system = UnitSystem[units.upper()]
    try:
        speed_rpm = None if speed is None else parse(speed, Kind.SPEED).value
    except UnitError as error:
        raise click.BadParameter(str(error), param_hint="--speed") from error
    screen = console()
    for curve in read_curve_file(file, speed_rpm=speed_rpm or ANY_SPEED):
        fits = fit_curve(curve)
        print_curve(fits, curve, screen, system)
        if speed_rpm is not None:
            for line in specific_speed_lines(fits, speed_rpm, stages, system):
                screen.print(line)
        if picture is not None:
            from bidcheck.cli.write import write_atomically
            from bidcheck.report.figures import curve_figure

            write_atomically(picture, curve_figure(fits, curve, system))
