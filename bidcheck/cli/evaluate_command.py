"""`bidcheck evaluate`: the main job."""

import sys
from pathlib import Path
from typing import TYPE_CHECKING

import click

from bidcheck.cli.guarded import FINDINGS, READ_ERROR, complain, console, guarded, say
from bidcheck.errors import BidcheckError

if TYPE_CHECKING:
    from bidcheck.evaluation import Evaluation
    from bidcheck.quantity import UnitSystem


@click.command("evaluate")
@click.argument("folders", nargs=-1, required=True, type=click.Path(path_type=Path), metavar="FOLDER...")
@click.option("--out", type=click.Path(path_type=Path), metavar="DIR", help="Write report.html and evaluation.json.")
@click.option("--json", "json_file", metavar="FILE", help="Write JSON to FILE; - prints it in place of the table.")
@click.option("--units", type=click.Choice(["SI", "US"]), help="Units to print.")
@click.option("--skip-unreadable", is_flag=True, help="Leave out bids that cannot be read, and say so.")
@click.option(
    "--fail-on",
    type=click.Choice(["query", "fail"]),
    help="Exit with 3 if an open finding of this verdict or a graver one stands against a bid.",
)
@guarded
def command(  # noqa: PLR0917
    folders: tuple[Path, ...],
    out: Path | None,
    json_file: str | None,
    units: str | None,
    skip_unreadable: bool,
    fail_on: str | None,
) -> None:
    """Evaluate the bids of each inquiry FOLDER.

    Prints one table of the bids and then what stands against each, with its limit, where the limit comes from and the
    question to send. Nothing is written into FOLDER.

    Exit codes: 0 done, 1 an input cannot be read, 2 wrong usage, 3 only with --fail-on.
    """
    if json_file is not None and len(folders) > 1:
        raise click.UsageError("--json takes one folder")
    _refuse_output_among_bids(folders, out)
    from bidcheck.line import evaluate
    from bidcheck.read import read_inquiry

    unread, met = False, False
    for number, folder in enumerate(folders):
        if len(folders) > 1 and sys.stderr.isatty():
            click.echo(f"{number + 1} of {len(folders)}: {folder}", err=True)
        try:
            evaluation = evaluate(read_inquiry(folder, skip_unreadable=skip_unreadable))
        except BidcheckError as error:
            complain(error)
            unread = True
            continue
        target = None if out is None else out / folder.resolve().name if len(folders) > 1 else out
        _give(evaluation, target, json_file, _system(units, evaluation), more=number > 0)
        met = met or _meets(evaluation, fail_on)
    if unread:
        raise click.exceptions.Exit(READ_ERROR)
    if met:
        raise click.exceptions.Exit(FINDINGS)


def _refuse_output_among_bids(folders: tuple[Path, ...], out: Path | None) -> None:
    """Refuse an output folder that is a file or lies among the bids."""
    if out is None:
        return
    if out.exists() and not out.is_dir():
        raise click.UsageError(f"--out {out}: is a file; name a folder")
    for folder in folders:
        if out.resolve().is_relative_to((folder / "bids").resolve()):
            raise click.UsageError(f"--out {out}: lies among the bids; name a folder elsewhere")


def _system(units: str | None, evaluation: "Evaluation") -> "UnitSystem":
    """Units asked for, else those of the inquiry."""
    from bidcheck.quantity import UnitSystem

    return evaluation.inquiry.units if units is None else UnitSystem[units.upper()]


def _give(
    evaluation: "Evaluation", out: Path | None, json_file: str | None, system: "UnitSystem", *, more: bool
) -> None:
    """Print the table or the JSON, and write the files asked for."""
    from bidcheck.cli.write import write_atomically
    from bidcheck.report.json_text import evaluation_json

    if json_file == "-":
        sys.stdout.reconfigure(encoding="utf-8", newline="\n")  # type: ignore[union-attr]
        click.echo(evaluation_json(evaluation), nl=False)
    else:
        from bidcheck.report.terminal import print_evaluation

        screen = console()
        if more:
            screen.print()
        print_evaluation(evaluation, screen, system)
    if json_file not in (None, "-"):
        write_atomically(Path(json_file), evaluation_json(evaluation))
    if out is not None:
        from bidcheck.report.page import evaluation_page

        out.mkdir(parents=True, exist_ok=True)
        write_atomically(out / "report.html", evaluation_page(evaluation, system=system))
        write_atomically(out / "evaluation.json", evaluation_json(evaluation))
        say(f"written: {out / 'report.html'}, {out / 'evaluation.json'}")


def _meets(evaluation: "Evaluation", fail_on: str | None) -> bool:
    """Whether an open finding of the verdict asked for, or a graver one, stands."""
    if fail_on is None:
        return False
    verdicts = ("fail",) if fail_on == "fail" else ("fail", "query")
    return any(
        finding.verdict in verdicts and finding.accepted is None for bid in evaluation.bids for finding in bid.findings
    )
