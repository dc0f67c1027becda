"""The whole inquiry folder to an Inquiry with its bids: every problem of every file at once."""

from collections.abc import Sequence
from dataclasses import replace
from pathlib import Path

from bidcheck.bid import Bid
from bidcheck.curve import Curve
from bidcheck.errors import InputError, Problem
from bidcheck.inquiry import InputFile, Inquiry, UnreadableBid
from bidcheck.read.bid_curves import Basis, read_curves
from bidcheck.read.bid_file import Place, read_bid_table
from bidcheck.read.bid_folders import Found, find_bids
from bidcheck.read.inquiry_file import read_inquiry_table
from bidcheck.read.source import Source, capped, read_text
from bidcheck.read.table import Table
from bidcheck.read.toml_file import read_toml


def read_inquiry(folder: str | Path, *, skip_unreadable: bool = False) -> Inquiry:
    """Read an inquiry folder: inquiry.toml and every revision of every bid.

    Parameters
    ----------
    folder : str or Path
    skip_unreadable : bool
        Leave out bids that cannot be read and list them in `unreadable`. A bidder whose latest revision cannot be read
        is left out whole. Problems of inquiry.toml are raised all the same.

    Returns
    -------
    Inquiry
        With bids in order of bidder and revision, and the hash of every file read.

    Raises
    ------
    InputError
        With every problem of every file; files are named from `folder` on.
    """
    root = Path(folder)
    _check_folder(root, str(folder))
    inputs: list[InputFile] = []
    inquiry, problems = _read_inquiry_file(root, inputs)
    places, folder_problems, general = _find_bids(root)
    problems += general
    density = None if inquiry is None else inquiry.liquid.density
    bids: list[Bid] = []
    unreadable: list[UnreadableBid] = []
    for bidder, revisions in places.items():
        read = [_read_bid(root, place, density, inputs) for place in revisions]
        good, bad = _sort_out(bidder, revisions, read, folder_problems[bidder])
        bids += good
        unreadable += bad
    if not skip_unreadable or not bids:
        problems += [problem for bid in unreadable for problem in bid.problems]
    if problems or inquiry is None:
        raise InputError(problems)
    ordered = tuple(sorted(inputs, key=lambda item: (item.file != "inquiry.toml", item.file)))
    return replace(inquiry, bids=tuple(bids), unreadable=tuple(unreadable), inputs=ordered)


def _check_folder(root: Path, shown: str) -> None:
    """The folder is there and holds an inquiry."""
    try:
        is_file, is_folder = root.is_file(), root.is_dir()
        holds_inquiry = is_folder and (root / "inquiry.toml").exists()
    except (OSError, ValueError):
        raise InputError([Problem(shown, "cannot be opened")]) from None
    if is_file:
        raise InputError([Problem(shown, "is a file; give the folder that holds inquiry.toml")])
    if not is_folder:
        raise InputError([Problem(shown, "there is no such folder")])
    if not holds_inquiry:
        raise InputError([Problem(shown, "holds no inquiry.toml, so it is not the folder of an inquiry")])


def _find_bids(root: Path) -> Found:
    """`find_bids` where the folders can be listed."""
    try:
        return find_bids(root)
    except OSError as error:
        return {}, {}, [Problem("bids", f"cannot be listed: {error.strerror}")]


def _read_inquiry_file(root: Path, inputs: list[InputFile]) -> tuple[Inquiry | None, list[Problem]]:
    """inquiry.toml without bids, and its problems."""
    try:
        text = read_text(root / "inquiry.toml", "inquiry.toml", inputs)
    except InputError as error:
        return None, list(error.problems)
    source, top = read_toml(text, "inquiry.toml")
    inquiry = None if top is None else read_inquiry_table(top)
    return inquiry, capped(source.problems)


def _read_bid(root: Path, place: Place, density: float | None, inputs: list[InputFile]) -> Bid | list[Problem]:
    """One revision of one bid, or its problems."""
    file = f"{place.folder}/bid.toml"
    try:
        text = read_text(root / place.folder / "bid.toml", file, inputs)
    except InputError as error:
        return list(error.problems)
    source, top = read_toml(text, file)
    if top is None:
        return source.problems
    curve_sources: list[Source] = []

    def curves_of(tables: Sequence[Table], basis: Basis) -> tuple[Curve, ...]:
        curves, sources = read_curves(tables, basis, root, place.folder, inputs)
        curve_sources.extend(sources)
        return curves

    bid = read_bid_table(top, place, density, curves_of)
    problems = capped(source.problems)
    for curve_source in curve_sources:
        problems += capped(curve_source.problems)
    return problems if problems or bid is None else bid


def _sort_out(
    bidder: str, revisions: list[Place], read: list[Bid | list[Problem]], folder_problems: list[Problem]
) -> tuple[list[Bid], list[UnreadableBid]]:
    """Bids that can be used and those that cannot: without its latest revision a bidder is left out whole."""
    if folder_problems:
        return [], [UnreadableBid(bidder, tuple(folder_problems))]
    bids = [item for item in read if isinstance(item, Bid)]
    faults = [(place, item) for place, item in zip(revisions, read, strict=True) if not isinstance(item, Bid)]
    if not isinstance(read[-1], Bid):
        return [], [UnreadableBid(bidder, tuple(problem for _, problems in faults for problem in problems))]
    return bids, [UnreadableBid(f"{bidder} {place.revision}", tuple(problems)) for place, problems in faults]
