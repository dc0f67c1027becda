"""A curve file to points: separators, decimal marks, comments, header, cells. Nothing ambiguous is guessed."""

import csv
import re
from dataclasses import dataclass

from bidcheck.curve import Column, Points
from bidcheck.numerals import UnreadableNumeral, clipped, looks_like_thousands, read_numeral, split_quantity
from bidcheck.read.curve_columns import Heading, missing_units, read_headings, with_unit_row
from bidcheck.read.curve_points import Cell, read_points
from bidcheck.read.source import Source

MOST_ROWS = 5_000
"""Rows of one curve; a bound against mistakes (no source)."""
_SEPARATOR_LINE = re.compile(r"\"?sep=(.)\"?", re.IGNORECASE)
_DECIMAL_COMMA = re.compile(r"\s*[+\-−]?\d*,\d+\s*")


@dataclass(frozen=True, slots=True)
class _Row:
    """The cells of one line."""

    line: int
    cells: list[str]


def read_curve_csv(text: str, source: Source) -> dict[Column, Points]:
    r"""Read the columns of a curve file.

    Parameters
    ----------
    text : str
        Of the file, with LF line ends.
    source : Source
        Problems are noted here, all of them.

    Returns
    -------
    dict
        Column → points, for the columns that have any. Empty where there are problems.

    Examples
    --------
    >>> text = "flow [m3/h], head [m]\n0, 74.0\n360, 60.5\n"
    >>> read_curve_csv(text, Source("curve.csv"))["head"].value
    array([74. , 60.5])
    """
    lines, separator = _content(text)
    if not lines:
        source.problem("is empty; a header and rows of points are needed")
        return {}
    if len(lines) > MOST_ROWS + 2:
        source.problem(f"has {len(lines)} rows, more than the {MOST_ROWS} read; is it a curve?")
        return {}
    rows = _split(lines, separator or _separator_of(lines[0][1]), source)
    headings, rows = _headings(rows, source)
    if source.problems:
        return {}
    if not rows:
        source.problem("has a header but no points beneath it")
        return {}
    cells = _cells(headings, rows, separator or _separator_of(lines[0][1]), source)
    points = read_points(headings, cells, source)
    return {} if source.problems else points


def _content(text: str) -> tuple[list[tuple[int, str]], str | None]:
    """Lines that are neither blank nor comments, with their numbers, and the separator where a line declares it."""
    lines = [(number, line) for number, line in enumerate(text.split("\n"), start=1) if line.strip().strip(" \t;,")]
    lines = [(number, line) for number, line in lines if not line.lstrip().startswith("#")]
    if lines and (match := _SEPARATOR_LINE.fullmatch(lines[0][1].strip())):
        return lines[1:], match[1]
    return lines, None


def _separator_of(header: str) -> str:
    """Semicolon or tab where the header has one outside quotes, else comma."""
    bare = re.sub(r'"[^"]*"', "", header)
    return next((mark for mark in ";\t" if mark in bare), ",")


def _split(lines: list[tuple[int, str]], separator: str, source: Source) -> list[_Row]:
    """Lines to cells."""
    rows: list[_Row] = []
    for number, line in lines:
        try:
            cells = next(csv.reader([line], delimiter=separator, skipinitialspace=True, strict=True), [])
            if cells:
                rows.append(_Row(number, [cell.strip() for cell in cells]))
        except csv.Error as error:
            too_long = "limit" in str(error)
            text = "has a cell far too long" if too_long else 'has a quotation mark " that is not closed'
            source.problem(text, number)
    return rows


def _headings(rows: list[_Row], source: Source) -> tuple[list[Heading], list[_Row]]:
    """Headings with units from the header or the row beneath, and the rows left."""
    if not rows or source.problems:
        return [], []
    header, rest = rows[0], rows[1:]
    if split_quantity(header.cells[0])[0]:
        source.problem(
            'the first line must be a header with names and units, as in "flow [m3/h], head [m]"', header.line
        )
        return [], []
    headings, problems = read_headings(header.cells)
    for problem in problems:
        source.problem(problem, header.line)
    if problems:
        return headings, rest
    if rest and not any(split_quantity(cell)[0] for cell in rest[0].cells) and missing_units(headings):
        headings, problems = with_unit_row(headings, rest[0].cells)
        for problem in problems:
            source.problem(problem, rest[0].line)
        rest = rest[1:]
    for problem in missing_units(headings):
        source.problem(problem, header.line)
    return headings, rest


_POINT_OR_THOUSANDS = re.compile(r"[1-9]\d{0,2}\.\d{3}")
"""A point before three digits: with semicolons or tabs between columns it may as well divide thousands."""


def _cells(headings: list[Heading], rows: list[_Row], separator: str, source: Source) -> list[list[Cell | None]]:
    """Cells as numbers, a list per row in the order of the headings; None for blank and ignored ones."""
    comma_is_decimal = False
    if separator != ",":
        comma_is_decimal = _decimal_comma(headings, rows, source)
    read: list[list[Cell | None]] = []
    for row in rows:
        cells = row.cells + [""] * (len(headings) - len(row.cells))
        if any(cells[len(headings) :]):
            source.problem(_too_many(cells, headings, separator), row.line)
            continue
        pairs = zip(headings, cells, strict=False)
        read.append(
            [
                _cell(heading, cell, separator, comma_is_decimal=comma_is_decimal, line=row.line, source=source)
                for heading, cell in pairs
            ]
        )
    return read


def _decimal_comma(headings: list[Heading], rows: list[_Row], source: Source) -> bool:
    """Whether the file has decimal commas; a file with both marks is refused, so are marks that may mean thousands."""
    used = [
        (h, row.line, row.cells[n]) for n, h in enumerate(headings) for row in rows if h.name and n < len(row.cells)
    ]
    commas = [item for item in used if _DECIMAL_COMMA.fullmatch(item[2])]
    points = [item for item in used if re.fullmatch(r"\s*[+\-−]?\d*\.\d+\s*", item[2])]
    if commas and points:
        first, second = commas[0], points[0]
        source.problem(
            f'has a decimal comma in "{first[2]}" (line {first[1]}) and a decimal point in "{second[2]}"; use one mark',
            second[1],
        )
    nowhere_else = not commas and bool(points) and all(_POINT_OR_THOUSANDS.fullmatch(cell) for _, _, cell in points)
    for heading in headings:
        cells = [item for item in used if item[0] is heading]
        marked = any("." in cell or "," in cell for _, _, cell in cells)
        if looks_like_thousands([cell for _, _, cell in cells]) or (nowhere_else and marked):
            line, cell = next((line, cell) for _, line, cell in cells if "." in cell or "," in cell)
            plain = cell.replace(".", "").replace(",", "")
            point = cell.replace(",", ".")
            cure = f"write {plain} or {point}0"
            source.problem(f'{heading.name} "{cell}" may be {plain} or {point}; {cure}', line)
    return bool(commas) and any(not re.fullmatch(r"[1-9]\d{0,2},\d{3}", cell) for _, _, cell in commas)


def _too_many(cells: list[str], headings: list[Heading], separator: str) -> str:
    """A row longer than the header."""
    text = f"has {len(cells)} cells, the header {len(headings)}"
    if separator == ",":
        return f"{text}; if it has decimal commas, separate the columns with ; or write decimal points"
    return f"{text}; delete what has no heading"


def _cell(
    heading: Heading, text: str, separator: str, *, comma_is_decimal: bool, line: int, source: Source
) -> Cell | None:
    """One cell as a number, None where it is blank, ignored or wrong."""
    if heading.name is None or not text:
        if text and not heading.text:
            source.problem(
                f'cell "{clipped(text)}" stands in a column without a heading; name the column or delete it', line
            )
        return None
    shown = f'{heading.name} "{clipped(text)}"'
    if separator == "," and _DECIMAL_COMMA.fullmatch(text):
        cure = f"separate the columns with ; or write {text.replace(',', '.').strip()}"
        source.problem(f"{shown} has a decimal comma but columns are also separated by commas; {cure}", line)
        return None
    try:
        numeral = read_numeral(text, comma_is_decimal=comma_is_decimal)
    except UnreadableNumeral as fault:
        source.problem(f"{shown} {fault.fault}{_cure(text, fault)}", line)
        return None
    if numeral.value < 0.0:
        source.problem(f"{shown} is negative", line)
        return None
    return Cell(line, text, numeral.value, numeral.half_digit)


def _cure(text: str, fault: UnreadableNumeral) -> str:
    """How to write a cell that is not a number."""
    if fault.cures:
        return f"; write {' or '.join(fault.cures)}"
    number, rest = split_quantity(text)
    if number and rest:
        return "; a cell holds the number only, the unit stands in the header"
    return "; leave the cell blank where there is no figure"
