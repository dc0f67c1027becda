"""The header of a curve file: which column is which, and in which unit. One closed table of trade spellings."""

import re
from dataclasses import dataclass
from typing import Literal

from bidcheck.numerals import clipped
from bidcheck.quantity import Kind
from bidcheck.read.nearest import nearest
from bidcheck.units import knows, spellings, unknown_unit

Name = Literal["flow", "head", "efficiency", "power", "npsh3"]

COLUMN_SPELLINGS: dict[Name, tuple[str, ...]] = {
    "flow": ("flow", "Q", "capacity", "flow rate", "flowrate", "discharge", "rate of flow", "volume flow"),
    "head": ("head", "H", "TDH", "total head", "differential head", "total dynamic head", "pump head", "delivery head"),
    "efficiency": ("efficiency", "eff", "eta", "η", "pump efficiency", "pump eff"),
    "power": (
        "power",
        "P",
        "P2",
        "shaft power",
        "bhp",
        "absorbed power",
        "brake horsepower",
        "power absorbed",
        "pump power",
        "power at shaft",
        "input power at shaft",
    ),
    "npsh3": ("npsh3", "NPSHr", "NPSH", "NPSH 3 %", "required NPSH", "NPSH required", "NPSHre", "NPSH(R)"),
}
"""Column → accepted spellings; capitals, spaces, points, hyphens and underscores do not matter."""

COLUMN_KINDS: dict[Name, Kind] = {
    "flow": Kind.FLOW,
    "head": Kind.HEAD,
    "efficiency": Kind.SHARE,
    "power": Kind.POWER,
    "npsh3": Kind.NPSH,
}

_OTHER_POWER = ("p1", "inputpower", "motorinput", "motorinputpower", "electricpower", "wirepower")


@dataclass(frozen=True, slots=True)
class Heading:
    """One column of the file: its name (None where it is to be ignored), its unit and its text in the header."""

    name: Name | None
    unit: str | None
    text: str


def _plain(text: str) -> str:
    """A column name without capitals, spaces and marks."""
    return re.sub(r"[\s_.\-]", "", text.casefold())


_BY_SPELLING: dict[str, Name] = {
    _plain(spelling): name for name, names in COLUMN_SPELLINGS.items() for spelling in names
}


def read_headings(cells: list[str]) -> tuple[list[Heading], list[str]]:
    """Read the cells of a header.

    Parameters
    ----------
    cells : list of str

    Returns
    -------
    headings : list of Heading
        One per cell; `unit` is None where the cell names none.
    problems : list of str

    Examples
    --------
    >>> read_headings(["Q [m3/h]", "TDH (ft)", "#remark"])[0][:2]
    [Heading(name='flow', unit='m3/h', text='Q [m3/h]'), Heading(name='head', unit='ft', text='TDH (ft)')]
    """
    headings: list[Heading] = []
    problems: list[str] = []
    for cell in cells:
        heading, fault = _heading(cell.strip())
        if heading is not None:
            headings.append(heading)
        if fault:
            problems.append(fault)
    names = [heading.name for heading in headings if heading.name is not None]
    for name in COLUMN_SPELLINGS:
        same = [heading.text for heading in headings if heading.name == name]
        if len(same) > 1:
            problems.append(f"columns {_quoted(same)} are all {name}; keep one of them")
    if problems:
        return headings, problems
    if "flow" not in names:
        problems.append('there is no column of flow; the header must name it, as in "flow [m3/h]"')
    elif len(names) == 1:
        problems.append("there is no column beside flow; give at least one of head, efficiency, power, npsh3")
    return headings, problems


def _heading(cell: str) -> tuple[Heading | None, str]:
    """One cell of the header, or what is wrong with it."""
    if not cell or cell.startswith("#"):
        return Heading(None, None, cell), ""
    cell = clipped(cell, 80)
    text, unit = _split_heading(cell)
    name = _BY_SPELLING.get(_plain(text))
    if name is None:
        return Heading(None, None, cell), _unknown(cell, text)
    return Heading(name, unit or None, cell), _wrong_unit(cell, name, unit)


def _split_heading(cell: str) -> tuple[str, str | None]:
    """Name and unit of a cell: the first way of splitting it in which both are known, else the name."""
    ways: list[tuple[str, str | None]] = [(cell, None)]
    for opening, closing in ("[]", "()"):
        if cell.endswith(closing):
            starts = [n for n, character in enumerate(cell) if character == opening]
            ways += [(cell[:n].strip(), cell[n + 1 : -1].strip()) for n in starts]
    if "," in cell:
        before, _, after = cell.rpartition(",")
        ways.append((before.strip(), after.strip()))
    known = [(text, unit) for text, unit in ways if _plain(text) in _BY_SPELLING]
    for text, unit in known:
        if unit is None or knows(unit, COLUMN_KINDS[_BY_SPELLING[_plain(text)]]):
            return text, unit
    return known[0] if known else ways[min(1, len(ways) - 1)]


def _wrong_unit(cell: str, name: Name, unit: str | None) -> str:
    """What is wrong with a unit, empty where nothing is."""
    if not unit or knows(unit, COLUMN_KINDS[name]):
        return ""
    return f'column "{cell}": {unknown_unit(unit, COLUMN_KINDS[name])}'


def _unknown(cell: str, text: str) -> str:
    """Say that a column is not known, and what to do."""
    if _plain(text) in _OTHER_POWER:
        return f'column "{cell}" is motor input; name it power and write power_at = "motor input" in [[curves]]'
    words = cell.split(None, 1)
    if len(words) == 2 and (name := _BY_SPELLING.get(_plain(words[0]))) and knows(words[1], COLUMN_KINDS[name]):
        return f'column "{cell}" has its unit without brackets; write "{words[0]} [{words[1]}]"'
    if any(knows(text, kind) for kind in COLUMN_KINDS.values()):
        return f'column "{cell}" is a unit without a name; write name and unit in one cell, as in "head [m]"'
    near = nearest(text, [spelling for names in COLUMN_SPELLINGS.values() for spelling in names])
    near = near if near.startswith("nearest") else f"known are {', '.join(COLUMN_SPELLINGS)}"
    return f'column "{cell}" is not known; {near}; delete it, or put # before its name to have it ignored'


def with_unit_row(headings: list[Heading], cells: list[str]) -> tuple[list[Heading], list[str]]:
    """Headings with the units of a row beneath the header.

    Examples
    --------
    >>> headings, _ = read_headings(["Q", "H"])
    >>> [heading.unit for heading in with_unit_row(headings, ["[m3/h]", "ft"])[0]]
    ['m3/h', 'ft']
    """
    units = [cell.strip().strip("[]") for cell in cells] + [""] * len(headings)
    units = [unit[1:-1] if unit.startswith("(") and unit.endswith(")") else unit for unit in units]
    done: list[Heading] = []
    problems: list[str] = []
    for heading, unit in zip(headings, units, strict=False):
        if heading.name is not None and heading.unit and unit and heading.unit != unit:
            problems.append(f'column "{heading.text}" has another unit, "{unit}", in the row beneath')
        elif heading.name is not None and (fault := _wrong_unit(heading.text, heading.name, unit)):
            problems.append(fault)
        done.append(Heading(heading.name, heading.unit or unit or None, heading.text))
    return done, problems


def missing_units(headings: list[Heading]) -> list[str]:
    """What to say of columns that have no unit anywhere."""
    return [
        f'column "{heading.text}" has no unit; write "{heading.text} [{spellings(COLUMN_KINDS[heading.name])[0]}]" '
        "or a row of units beneath the header"
        for heading in headings
        if heading.name is not None and heading.unit is None
    ]


def _quoted(texts: list[str]) -> str:
    """Texts in quotes with "and" between."""
    return " and ".join(f'"{text}"' for text in texts)
