"""On which line of a TOML text each table and key stands, which the parser of the standard library does not tell."""

import re
from bisect import bisect_right

Path = tuple[str | int, ...]
Lines = dict[Path, int]

_BLANK = re.compile(r"(?:[ \t\n]+|#[^\n]*)*")
_KEY = re.compile(r"\s*(\"(?:\\.|[^\"\\])*\"|'[^']*'|[A-Za-z0-9_-]+)\s*(\.)?")
_VALUE_PART = re.compile(
    r'"""(?:\\.|[^\\])*?"""+'
    r"|'''.*?'''+"
    r'|"(?:\\.|[^"\\\n])*"'
    r"|'[^'\n]*'"
    r"|\#[^\n]*"
    r"|[\[\]{}\n]"
    r"|[^\[\]{}\n\"'\#]+",
    re.DOTALL,
)


def find_lines(text: str) -> Lines:
    r"""Line of every table header and key of a valid TOML text.

    Parameters
    ----------
    text : str
        Valid TOML with LF line ends.

    Returns
    -------
    dict
        Path of names, with the count from 0 after the name of an array of tables → line, from 1. What stands inside
        an inline table has the line of its key: see `line_of`.

    Examples
    --------
    >>> find_lines('a = 1\n[[curves]]\nfile = "x"\n')
    {('a',): 1, ('curves', 0): 2, ('curves', 0, 'file'): 3}
    """
    starts = [0, *(match.end() for match in re.finditer("\n", text))]
    lines: Lines = {}
    counts: dict[Path, int] = {}
    table: Path = ()
    position = _after(_BLANK, text, 0)
    while position < len(text):
        line = bisect_right(starts, position)
        if text[position] == "[":
            array = text.startswith("[[", position)
            names, position = _names(text, position + (2 if array else 1))
            table = _resolve(names, counts, new_element=array)
            lines.setdefault(table, line)
            position = _end_of_value(text, position, depth=0)
        else:
            names, position = _names(text, position)
            lines.setdefault((*table, *names), line)
            position = _end_of_value(text, position, depth=0)
        position = _after(_BLANK, text, position)
    return lines


def line_of(lines: Lines, path: Path) -> int | None:
    """Line of a path, or of the nearest table or key around it; None where there is none.

    Examples
    --------
    >>> line_of({("limits", "npsh_margin"): 7}, ("limits", "npsh_margin", "at_least"))
    7
    """
    for end in range(len(path), 0, -1):
        if path[:end] in lines:
            return lines[path[:end]]
    return None


def _after(pattern: re.Pattern[str], text: str, position: int) -> int:
    """Position after a pattern that may be empty."""
    match = pattern.match(text, position)
    return match.end() if match else position


def _names(text: str, position: int) -> tuple[tuple[str, ...], int]:
    """Names of a dotted key and the position after it."""
    names: list[str] = []
    while match := _KEY.match(text, position):
        names.append(match[1].strip("\"'"))
        position = match.end()
        if match[2] is None:
            break
    return tuple(names), position


def _resolve(names: tuple[str, ...], counts: dict[Path, int], *, new_element: bool) -> Path:
    """Path of a table header: the latest element of every array of tables on the way, a new one for [[...]]."""
    path: Path = ()
    for depth, name in enumerate(names, start=1):
        path = (*path, name)
        if new_element and depth == len(names):
            counts[path] = counts.get(path, 0) + 1
        if path in counts:
            path = (*path, counts[path] - 1)
    return path


def _end_of_value(text: str, position: int, depth: int) -> int:
    """Position of the line end that closes a value, past strings, comments and nested brackets."""
    while match := _VALUE_PART.match(text, position):
        part = match[0]
        if part == "\n" and depth <= 0:
            break
        depth += (part in ("[", "{")) - (part in ("]", "}"))
        position = match.end()
    return position
