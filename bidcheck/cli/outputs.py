"""Where output may go: never onto an input, never among the bids, never two evaluations into one place."""

from pathlib import Path

import click

from bidcheck.cli.failures import CannotWrite
from bidcheck.cli.plain import one_line
from bidcheck.cli.write import write_atomically


def refuse_bad_folder(out: Path, folders: tuple[Path, ...]) -> None:
    """Refuse an output folder that is a file or lies among the bids, and folders whose outputs would share a name."""
    if out.exists() and not out.is_dir():
        raise click.UsageError(one_line(f"--out {out} is a file; name a folder"))
    names = [folder.resolve().name for folder in folders]
    if len(set(names)) < len(names):
        raise click.UsageError("two of the folders have one name, so their files would overwrite each other in --out")
    for target in out_folders(out, folders):
        _refuse_among_bids("--out", target, folders)


def out_folders(out: Path, folders: tuple[Path, ...]) -> tuple[Path, ...]:
    """The output folder of each inquiry: `out` itself for one, a folder of its name below it for several."""
    return (out,) if len(folders) == 1 else tuple(out / folder.resolve().name for folder in folders)


def refuse_bad_file(option: str, file: Path, folders: tuple[Path, ...]) -> None:
    """Refuse an output file that is a folder, lies among the bids or is the inquiry itself."""
    if file.is_dir():
        raise click.UsageError(one_line(f"{option} {file} is a folder; name a file"))
    _refuse_among_bids(option, file, folders)
    if any(file.resolve() == (folder / "inquiry.toml").resolve() for folder in folders):
        raise click.UsageError(one_line(f"{option} {file} is the inquiry; name another file"))


def _refuse_among_bids(option: str, path: Path, folders: tuple[Path, ...]) -> None:
    """Nothing is written where the bids are."""
    for folder in folders:
        if path.resolve().is_relative_to((folder / "bids").resolve()):
            raise click.UsageError(one_line(f"{option} {path} lies among the bids; name a place elsewhere"))


def write_all(folder: Path, texts: dict[str, str]) -> None:
    """Write files into a folder, which is made where it is not there.

    Raises
    ------
    CannotWrite
        With the place and the reason.
    """
    try:
        folder.mkdir(parents=True, exist_ok=True)
        for name, text in texts.items():
            write_atomically(folder / name, text)
    except OSError as error:
        raise CannotWrite(one_line(f"{folder} cannot be written to: {error.strerror or error}")) from None


def write_one(file: Path, text: str) -> None:
    """Write one file into a folder that is there.

    Raises
    ------
    CannotWrite
        With the file and the reason.
    """
    try:
        write_atomically(file, text)
    except OSError as error:
        raise CannotWrite(one_line(f"{file} cannot be written: {error.strerror or error}")) from None
