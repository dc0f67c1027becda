"""`bidcheck curve`: one curve file, no inquiry."""

from pathlib import Path

import click

from bidcheck.cli.guarded import guarded, wrong_usage
from bidcheck.cli.targets import refuse_file

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
    if picture is not None:
        if picture.suffix.lower() != ".svg":
            raise wrong_usage(f"--picture {picture}: the picture is SVG; give a name that ends in .svg")
        refuse_file("--picture", picture, inputs=(file,))
    speed_rpm = None if speed is None else _speed(speed)
    from bidcheck.cli.screen import screen
    from bidcheck.fit import fit_curve
    from bidcheck.quantity import UnitSystem
    from bidcheck.read import read_curve_file
    from bidcheck.report.curve_text import print_curve, specific_speed_lines

    system, console = UnitSystem(units), screen()
    (curve,) = read_curve_file(file, speed_rpm=speed_rpm or ANY_SPEED)
    fits = fit_curve(curve)
    if picture is not None:
        from bidcheck.cli.write import write_atomically
        from bidcheck.report.figures import curve_figure

        write_atomically(picture, curve_figure(fits, curve, system))
    print_curve(fits, curve, console, system)
    console.print()
    if speed_rpm is None:
        console.print("specific speeds are left out: the file names no speed, give --speed")
    else:
        for line in specific_speed_lines(fits, speed_rpm, stages, system):
            console.print(line)


def _speed(text: str) -> float:
    """Speed as written on the command line. [1/min]"""
    from bidcheck.errors import UnitError
    from bidcheck.quantity import Kind
    from bidcheck.units import parse

    try:
        speed_rpm = parse(text, Kind.SPEED).value
    except UnitError as error:
        raise wrong_usage(f"--speed: {error}") from error
    if speed_rpm <= 0.0:
        raise wrong_usage(f'--speed: "{text}" is not above zero')
    return speed_rpm
