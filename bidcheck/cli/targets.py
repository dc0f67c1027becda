"""Where a command may write; what would harm is refused before any work is done."""

from collections.abc import Sequence
from pathlib import Path

from bidcheck.cli.guarded import wrong_usage


def folders_out(out: Path, inquiries: Sequence[Path]) -> dict[Path, Path]:
    """Output folder of each inquiry: `out` itself, with several inquiries a folder of each one's name in it.

    Raises
    ------
    click.UsageError
        If a file is in the way, two inquiries would share a folder, or it lies among the bids of one.
    """
    _refuse_file_in_the_way(out)
    targets = {folder: out / folder.resolve().name if len(inquiries) > 1 else out for folder in inquiries}
    if len(set(targets.values())) < len(inquiries):
        raise wrong_usage(f"--out {out}: two inquiry folders of one name would share a folder in it; run them apart")
    for target in targets.values():
        _refuse_file_in_the_way(target)
        _refuse_among_bids("--out", target, inquiries)
    return targets


def _refuse_file_in_the_way(out: Path) -> None:
    """A folder can be made where `out` says."""
    for place in (out, *out.parents):
        if place.exists():
            if not place.is_dir():
                raise wrong_usage(f"--out {out}: {place} is a file; name a folder")
            return


def refuse_file(option: str, path: Path, inquiries: Sequence[Path] = (), inputs: Sequence[Path] = ()) -> None:
    """Check that a file can be written at `path` and that it is none of the inputs.

    Raises
    ------
    click.UsageError
        If it is a folder, lies in a folder that is not there, or is an input or among the bids.
    """
    if path.is_dir():
        raise wrong_usage(f"{option} {path}: is a folder; name a file in it")
    if not path.parent.is_dir():
        raise wrong_usage(f"{option} {path}: there is no folder {path.parent}")
    for read in (*inputs, *(folder / "inquiry.toml" for folder in inquiries)):
        if path.resolve() == read.resolve():
            raise wrong_usage(f"{option} {path}: is an input and would be overwritten; name another file")
    _refuse_among_bids(option, path, inquiries)


def _refuse_among_bids(option: str, path: Path, inquiries: Sequence[Path]) -> None:
    """Nothing is written where bids are read."""
    for folder in inquiries:
        if path.resolve().is_relative_to((folder / "bids").resolve()):
            raise wrong_usage(f"{option} {path}: lies among the bids; name a place elsewhere")
