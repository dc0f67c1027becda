"""The nearest known name to one that is not known."""

from collections.abc import Iterable
from difflib import get_close_matches


def nearest(name: str, known: Iterable[str]) -> str:
    """Say which known name is nearest, or list the known ones.

    Examples
    --------
    >>> nearest("rated_flw", ["rated_flow", "rated_head"])
    'nearest is "rated_flow"'
    >>> nearest("colour", ["set", "mark"])
    'known are mark, set'
    """
    names = sorted(set(known))
    by_fold = {other.casefold(): other for other in reversed(names)}
    near = get_close_matches(name.casefold(), list(by_fold), n=1, cutoff=0.6)
    if near:
        return f'nearest is "{by_fold[near[0]]}"'
    return f"known are {', '.join(names)}" if names else "none is known here"
