"""`bidcheck evaluate`: the main job."""

import sys
from pathlib import Path
from typing import TYPE_CHECKING, BinaryIO

import click

from bidcheck.cli.failures import STANDS_OPEN, UNREADABLE, guarded, say, tell
from bidcheck.cli.outputs import out_folders, refuse_bad_file, refuse_bad_folder, write_all, write_one
from bidcheck.errors import BidcheckError

if TYPE_CHECKING:
    from bidcheck.evaluation import Evaluation
    from bidcheck.quantity import UnitSystem


@click.command("evaluate")
@click.argument("folders", nargs=-1, required=True, type=click.Path(path_type=Path), metavar="FOLDER...")
@click.option(
    "--out",
    type=click.Path(path_type=Path),
    metavar="DIR",
    help="Write report.html and evaluation.json; of several folders, into DIR/<name of the folder>.",
)
@click.option("--json", "json_file", metavar="FILE", help="Write JSON to FILE; - prints it in place of the table.")
@click.option("--units", type=click.Choice(["SI", "US"]), help="Units to print; else those the inquiry names.")
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
    question to send. Nothing is written into FOLDER unless asked for.

    Exit codes: 0 done, 1 an input cannot be read, 2 wrong usage, 3 only with --fail-on.
    """
    _refuse_bad_outputs(folders, out, json_file)
    from bidcheck.line import evaluate
    from bidcheck.read import read_inquiry

    targets = out_folders(out, folders) if out is not None else (None,) * len(folders)
    unread = open_finding = False
    for number, (folder, target) in enumerate(zip(folders, targets, strict=True)):
        try:
            evaluation = evaluate(read_inquiry(folder, skip_unreadable=skip_unreadable))
        except BidcheckError as error:
            tell(error, str(folder) if len(folders) > 1 else "")
            unread = True
            continue
        _print(evaluation, as_json=json_file == "-", system=_system(units, evaluation), after_another=number > 0)
        _write(evaluation, target, json_file, _system(units, evaluation))
        open_finding = open_finding or _stands_open(evaluation, fail_on)
    if unread or open_finding:
        raise click.exceptions.Exit(UNREADABLE if unread else STANDS_OPEN)


def _refuse_bad_outputs(folders: tuple[Path, ...], out: Path | None, json_file: str | None) -> None:
    """Refuse places where nothing should be written, before any work is done."""
    if json_file is not None and len(folders) > 1:
        raise click.UsageError("--json takes one folder")
    if out is not None:
        refuse_bad_folder(out, folders)
    if json_file not in (None, "-"):
        refuse_bad_file("--json", Path(str(json_file)), folders)


def _system(units: str | None, evaluation: "Evaluation") -> "UnitSystem":
    """Units asked for, else those of the inquiry."""
    from bidcheck.quantity import UnitSystem

    return evaluation.inquiry.units if units is None else UnitSystem(units)


def _print(evaluation: "Evaluation", *, as_json: bool, system: "UnitSystem", after_another: bool) -> None:
    """Print the table, or the JSON in its place."""
    if as_json:
        from bidcheck.report.json_text import evaluation_json

        stream: BinaryIO = click.get_binary_stream("stdout")
        stream.write(evaluation_json(evaluation).encode("utf-8"))
        stream.flush()
        return
    from bidcheck.cli.console import open_console
    from bidcheck.report.terminal import print_evaluation

    console = open_console()
    if after_another:
        console.print()
    print_evaluation(evaluation, console, system)
    sys.stdout.flush()


def _write(evaluation: "Evaluation", out: Path | None, json_file: str | None, system: "UnitSystem") -> None:
    """Write the files asked for; every text is complete before the first is written."""
    if out is None and json_file in (None, "-"):
        return
    from bidcheck.report.json_text import evaluation_json

    document = evaluation_json(evaluation)
    if json_file not in (None, "-"):
        write_one(Path(str(json_file)), document)
    if out is not None:
        from bidcheck.report.page import evaluation_page

        page = evaluation_page(evaluation, system=system)
        write_all(out, {"report.html": page, "evaluation.json": document})
        say(f"written: {out / 'report.html'}, {out / 'evaluation.json'}")


def _stands_open(evaluation: "Evaluation", fail_on: str | None) -> bool:
    """Whether an open finding of the verdict asked for, or a graver one, stands against any bid."""
    from bidcheck.finding import Verdict

    if fail_on is None:
        return False
    verdicts = (Verdict.FAIL,) if fail_on == "fail" else (Verdict.FAIL, Verdict.QUERY)
    return any(
        finding.verdict in verdicts and finding.accepted is None for bid in evaluation.bids for finding in bid.findings
    )
