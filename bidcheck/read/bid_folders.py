"""Which bids an inquiry folder holds: bids/NAME/bid.toml (revision a) or bids/NAME/REVISION/bid.toml."""

import re
from pathlib import Path

from bidcheck.errors import Problem
from bidcheck.read.bid_file import Place

Found = tuple[dict[str, list[Place]], dict[str, list[Problem]], list[Problem]]
_REVISION = re.compile(r"[a-z]")
_LOOKS_LIKE_INPUT = (".toml", ".csv")


def find_bids(root: Path) -> Found:
    """Look for bids.

    Parameters
    ----------
    root : Path
        The inquiry folder.

    Returns
    -------
    places : dict
        Bidder → revisions in order; both dicts in order of bidder.
    problems : dict
        Bidder → what is wrong with its folder.
    general : list of Problem
        What belongs to no bidder.
    """
    folder = root / "bids"
    if not folder.is_dir():
        cure = "put each bid into bids/NAME/bid.toml"
        return {}, {}, [Problem("bids", f"there is no folder of bids; {cure}")]
    places: dict[str, list[Place]] = {}
    problems: dict[str, list[Problem]] = {}
    general: list[Problem] = []
    for entry in sorted(folder.iterdir(), key=lambda path: path.name):
        if entry.name.startswith("."):
            continue
        if entry.is_dir():
            places[entry.name], problems[entry.name] = _revisions(entry)
        elif entry.suffix.lower() in _LOOKS_LIKE_INPUT:
            general.append(Problem(f"bids/{entry.name}", "lies outside the folder of a bid; put it into bids/NAME/"))
    if not places and not general:
        general.append(Problem("bids", "holds no bid; put each bid into bids/NAME/bid.toml"))
    return places, problems, general


def _revisions(folder: Path) -> tuple[list[Place], list[Problem]]:
    """Revisions of one bidder."""
    name, shown = folder.name, f"bids/{folder.name}"
    subfolders = sorted(path for path in folder.iterdir() if path.is_dir() and not path.name.startswith("."))
    revisions = [path for path in subfolders if _REVISION.fullmatch(path.name)]
    problems = [
        Problem(f"{shown}/{path.name}", "holds a bid.toml but is not named by revision; name it a, b, c ...")
        for path in subfolders
        if path not in revisions and (path / "bid.toml").exists()
    ]
    plain = (folder / "bid.toml").exists()
    if plain and revisions:
        listed = ", ".join(path.name for path in revisions)
        text = f"holds a bid.toml and folders of revisions ({listed}) as well; move bid.toml and its curves into one"
        problems.append(Problem(shown, text))
    if not plain and not revisions and not problems:
        problems.append(Problem(shown, "holds neither bid.toml nor folders of revisions a, b, c ..."))
    if problems:
        return [], problems
    if plain:
        return [Place(name, "a", shown)], []
    return [Place(name, path.name, f"{shown}/{path.name}") for path in revisions], []
