"""`bidcheck evaluate`: the main job."""

import io
import sys
from pathlib import Path
from typing import TYPE_CHECKING

import click

from bidcheck.cli.guarded import FINDINGS, READ_ERROR, complain, emit, guarded, say, wrong_usage
from bidcheck.cli.targets import folders_out, refuse_file
from bidcheck.errors import BidcheckError

if TYPE_CHECKING:
    from bidcheck.evaluation import Evaluation
    from bidcheck.quantity import UnitSystem

STANDARD_OUTPUT = "-"


@click.command("evaluate")
@click.argument("folders", nargs=-1, required=True, type=click.Path(path_type=Path), metavar="FOLDER...")
@click.option(
    "--out",
    type=click.Path(path_type=Path),
    metavar="DIR",
    help="Write report.html and evaluation.json into DIR; with several folders into a folder of each one's name in it.",
)
@click.option("--json", "json_file", metavar="FILE", help="Write JSON to FILE; - prints it in place of the table.")
@click.option("--units", type=click.Choice(["SI", "US"]), help="Units to print; those of the inquiry if not given.")
@click.option("--skip-unreadable", is_flag=True, help="Leave out bids that cannot be read, and say so.")
@click.option(
    "--fail-on",
    type=click.Choice(["query", "fail"]),
    help="Exit with 3 if an open finding of this verdict or a graver one stands against a bid; an incomplete bid counts"
    " as a query.",
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
        raise wrong_usage("--json takes one folder")
    if json_file not in (None, STANDARD_OUTPUT):
        refuse_file("--json", Path(json_file), folders)
    targets = {} if out is None else folders_out(out, folders)
    from bidcheck.line import evaluate
    from bidcheck.read import read_inquiry

    several, unread, met = len(folders) > 1, False, False
    for number, folder in enumerate(folders):
        if several and sys.stderr.isatty():
            say(f"{number + 1} of {len(folders)}: {folder}")
        try:
            evaluation = evaluate(read_inquiry(folder, skip_unreadable=skip_unreadable))
        except BidcheckError as error:
            complain(error, folder if several else None)
            unread = True
            continue
        system = _system(units, evaluation)
        _write(evaluation, targets.get(folder), json_file, system)
        _print(evaluation, json_file, system, more=number > 0)
        met = met or _meets(evaluation, fail_on)
    if unread or met:
        raise click.exceptions.Exit(READ_ERROR if unread else FINDINGS)


def _system(units: str | None, evaluation: "Evaluation") -> "UnitSystem":
    """Units asked for, else those of the inquiry."""
    from bidcheck.quantity import UnitSystem

    return evaluation.inquiry.units if units is None else UnitSystem(units)


def _write(evaluation: "Evaluation", out: Path | None, json_file: str | None, system: "UnitSystem") -> None:
    """Write the files asked for, once the text of every one is ready."""
    files: dict[Path, str] = {}
    if json_file not in (None, STANDARD_OUTPUT):
        from bidcheck.report.json_text import evaluation_json

        files[Path(json_file)] = evaluation_json(evaluation)
    if out is not None:
        from bidcheck.report.json_text import evaluation_json
        from bidcheck.report.page import evaluation_page

        files[out / "report.html"] = evaluation_page(evaluation, system=system)
        files[out / "evaluation.json"] = evaluation_json(evaluation)
        out.mkdir(parents=True, exist_ok=True)
    if files:
        from bidcheck.cli.write import write_atomically

        for path, text in files.items():
            write_atomically(path, text)
        say(f"written: {', '.join(map(str, files))}")


def _print(evaluation: "Evaluation", json_file: str | None, system: "UnitSystem", *, more: bool) -> None:
    """Print the table, or the JSON in place of it."""
    if json_file == STANDARD_OUTPUT:
        from bidcheck.report.json_text import evaluation_json

        if isinstance(sys.stdout, io.TextIOWrapper):
            sys.stdout.reconfigure(encoding="utf-8", newline="\n")
        emit(evaluation_json(evaluation))
        return
    from bidcheck.cli.screen import screen
    from bidcheck.report.terminal import print_evaluation

    console = screen()
    if more:
        console.print()
    print_evaluation(evaluation, console, system)


def _meets(evaluation: "Evaluation", fail_on: str | None) -> bool:
    """Whether something as grave as asked for is open; missing data that makes a bid incomplete counts as a query."""
    if fail_on is None:
        return False
    verdicts = ("fail",) if fail_on == "fail" else ("fail", "query")
    return any(
        (finding.verdict in verdicts or (fail_on == "query" and finding.verdict == "no-data" and finding.decisive))
        and finding.accepted is None
        for bid in evaluation.bids
        for finding in bid.findings
    )
