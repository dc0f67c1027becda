"""The generated tables of docs/files.md: spellings of units and columns, names of limits. A test keeps them current."""

import re

from bidcheck.limits import Limit, limit_names
from bidcheck.quantity import Kind, UnitSystem
from bidcheck.read.curve_columns import COLUMN_SPELLINGS
from bidcheck.read.limit_sets import LIMIT_SETS, limit_set
from bidcheck.units import from_si, spellings

_NOT_READ = (Kind.TEXT, Kind.TIP_SPEED, Kind.COUNT, Kind.MONEY, Kind.RATIO, Kind.WHOLE_SHARE, Kind.POINTS)
_MARKED = re.compile(r"(<!-- table: (?P<name>[a-z]+) -->\n).*?(<!-- end of table -->)", re.DOTALL)


def files_tables() -> dict[str, str]:
    """Markdown tables by name: "units", "columns", "limits".

    Examples
    --------
    >>> sorted(files_tables())
    ['columns', 'limits', 'units']
    """
    return {"units": _units(), "columns": _columns(), "limits": _limits()}


def with_tables(document: str) -> str:
    """Put the tables between the markers of a document, `<!-- table: NAME -->` and `<!-- end of table -->`."""
    tables = files_tables()
    return _MARKED.sub(lambda match: f"{match[1]}\n{tables[match['name']]}\n{match[3]}", document)


def _table(header: list[str], rows: list[list[str]]) -> str:
    """A Markdown table."""
    lines = [header, ["---"] * len(header), *rows]
    return "".join(f"| {' | '.join(cell.replace('|', ' ') for cell in line)} |\n" for line in lines)


def _units() -> str:
    """Kind and accepted spellings; kinds with the same ones share a row."""
    names: dict[tuple[str, ...], list[str]] = {}
    for kind in Kind:
        if kind not in _NOT_READ:
            names.setdefault(spellings(kind), []).append(kind.value)
    rows = [[", ".join(kinds), " · ".join(f"`{unit}`" for unit in units)] for units, kinds in names.items()]
    return _table(["quantity", "units"], rows)


def _columns() -> str:
    """Column and accepted spellings."""
    rows = [[f"`{name}`", " · ".join(f"`{text}`" for text in texts)] for name, texts in COLUMN_SPELLINGS.items()]
    return _table(["column", "also written"], rows)


def _limits() -> str:
    """Name and meaning of every limit, with its value in each shipped set."""
    rows = [
        [f"`{name}`", meaning, *(_value(getattr(limit_set(set_name), name)) for set_name in LIMIT_SETS)]
        for name, (_, meaning) in limit_names().items()
    ]
    return _table(["limit", "what it limits", *LIMIT_SETS], rows)


def _value(limit: Limit) -> str:
    """A limit in words, in SI units; suction specific speed in US units as in its sources."""
    unit = limit.kind.printed(UnitSystem.SI).unit
    if limit.kind in (Kind.SPECIFIC_SPEED, Kind.SUCTION_SPECIFIC_SPEED):
        unit = "US"
    ends = (("at least", limit.at_least), ("at most", limit.at_most))
    words = [
        f"{word} {from_si(value, unit, limit.kind):.6g} {unit}".strip() for word, value in ends if value is not None
    ]
    return ", ".join(words) + (", mandatory" if limit.mandatory else "")
