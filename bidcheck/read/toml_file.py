"""A TOML file to a table with its lines."""

import re
import tomllib

from bidcheck.read.source import Source
from bidcheck.read.table import Table
from bidcheck.read.toml_lines import find_lines

_PLACE = re.compile(r"\s*\(at (?:line (\d+), column (\d+)|end of document)\)\s*$")


def read_toml(text: str, file: str) -> tuple[Source, Table | None]:
    """Parse a TOML text.

    Returns
    -------
    source : Source
        With the problem noted where the text is not TOML.
    table : Table or None
        The top table.
    """
    source = Source(file)
    try:
        data = tomllib.loads(text)
    except tomllib.TOMLDecodeError as error:
        message = str(error)
        place = _PLACE.search(message)
        said = _PLACE.sub("", message)
        line, column = (int(place[1]), int(place[2])) if place and place[1] else (text.count("\n") + 1, None)
        source.problem(f"is not valid TOML here: {said[:1].lower()}{said[1:]}", line, column)
        return source, None
    except (RecursionError, ValueError):
        source.problem("is not valid TOML: nested too deeply or with a number that cannot be read")
        return source, None
    source.lines = find_lines(text)
    return source, Table(source, data)
