"""`bidcheck curve`: one curve file, no inquiry."""

import sys
from pathlib import Path

import click

from bidcheck.cli.failures import guarded
from bidcheck.cli.outputs import write_one
from bidcheck.cli.plain import one_line

ANY_SPEED = 1450.0
"""Speed put into the object where none is given [1/min]; nothing printed depends on it."""


@click.command("curve")
@click.argument("file", type=click.Path(path_type=Path), metavar="FILE")
@click.option("--units", type=click.Choice(["SI", "US"]), default="SI", show_default=True, help="Units to print.")
@click.option("--speed", metavar="SPEED", help='Speed of the curve, such as "1480 rpm": adds specific speeds.')
@click.option(
    "--stages", type=click.IntRange(min=1), default=1, show_default=True, help="Stages the head is given for."
)
@click.option("--picture", type=click.Path(path_type=Path), metavar="FILE.svg", help="Draw the curve.")
@guarded
def command(file: Path, units: str, speed: str | None, stages: int, picture: Path | None) -> None:
    """Look at one curve FILE: fits, best efficiency, power balance, odd points.

    Power is taken as shaft power with cold water.
    """
    _refuse_bad_picture(picture, file)
    speed_rpm = _speed(speed)
    from bidcheck.cli.console import open_console
    from bidcheck.fit import fit_curve
    from bidcheck.quantity import UnitSystem
    from bidcheck.read import read_curve_file
    from bidcheck.report.curve_text import print_curve, specific_speed_lines

    console = open_console()
    for curve in read_curve_file(file, speed_rpm=speed_rpm or ANY_SPEED):
        fits = fit_curve(curve)
        print_curve(fits, curve, console, UnitSystem(units))
        if speed_rpm is None:
            console.print("specific speeds are left out: give --speed")
        else:
            for line in specific_speed_lines(fits, speed_rpm, stages, UnitSystem(units)):
                console.print(line)
        sys.stdout.flush()
        if picture is not None:
            from bidcheck.report.figures import curve_figure

            write_one(picture, curve_figure(fits, curve, UnitSystem(units)))


def _speed(text: str | None) -> float | None:
    """Speed asked for, above zero. [1/min]"""
    if text is None:
        return None
    from bidcheck.errors import UnitError
    from bidcheck.quantity import Kind
    from bidcheck.units import parse

    try:
        value = parse(text, Kind.SPEED).value
    except UnitError as error:
        raise click.BadParameter(one_line(str(error)), param_hint="--speed") from None
    if not value > 0.0:
        raise click.BadParameter(one_line(f'"{text}" is not above zero'), param_hint="--speed")
    return value


def _refuse_bad_picture(picture: Path | None, file: Path) -> None:
    """A picture is an SVG file and never the curve itself."""
    if picture is None:
        return
    if picture.suffix.lower() != ".svg":
        raise click.BadParameter(
            one_line(f'"{picture}" is not the name of an SVG file; write one ending in .svg'), param_hint="--picture"
        )
    if picture.is_dir() or picture.resolve() == file.resolve():
        raise click.BadParameter(one_line(f'"{picture}" is in use; name another file'), param_hint="--picture")
