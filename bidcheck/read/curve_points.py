"""Numbers of a curve file to points in SI: equal flows, order, physical sense."""

from collections.abc import Sequence
from dataclasses import dataclass

import numpy as np

from bidcheck.curve import COLUMNS, Column, Points
from bidcheck.quantity import Kind
from bidcheck.read.curve_columns import COLUMN_KINDS, Heading
from bidcheck.read.source import Source
from bidcheck.units import half_digit_to_si, to_si

FEWEST_POINTS = 2
"""Points below which no line can be drawn (arithmetic)."""


@dataclass(frozen=True, slots=True)
class Cell:
    """A number of the file in its column's unit."""

    line: int
    text: str
    value: float
    half_digit: float


Rows = Sequence[Sequence[Cell | None]]


def read_points(headings: list[Heading], rows: Rows, source: Source) -> dict[Column, Points]:
    """Points of every column that has any; problems are noted in `source`."""
    by_name = {heading.name: n for n, heading in enumerate(headings) if heading.name is not None}
    flow_heading = headings[by_name["flow"]]
    pairs_of: dict[Column, list[tuple[Cell, Cell]]] = {}
    for row in rows:
        _check_flow(row, by_name["flow"], source)
    for column in COLUMNS:
        if column not in by_name:
            continue
        heading = headings[by_name[column]]
        pairs = [(row[by_name["flow"]], row[by_name[column]]) for row in rows]
        given = [(flow, value) for flow, value in pairs if flow is not None and value is not None]
        if column == "efficiency":
            _check_efficiency(heading, [value for _, value in given], source)
        if given and all(value.value <= 0.0 for _, value in given):
            text = f"{column} is nowhere above zero; leave the column blank where it is not given"
            source.problem(text, given[0][1].line)
        pairs_of[column] = _in_order(column, given, flow_heading.unit or "", source)
    if not source.problems and not any(pairs_of.values()):
        source.problem("has no figures beneath its header")
    points: dict[Column, Points] = {}
    for column, given in pairs_of.items():
        if not given:
            continue
        if len(given) < FEWEST_POINTS and not source.problems:
            text = f"column {column} has one point at one flow only; no curve can be drawn through it"
            source.problem(f"{text}: give two or more, or leave the column blank", given[0][1].line)
        points[column] = _points(given, flow_heading, headings[by_name[column]], COLUMN_KINDS[column])
    return points


def _check_flow(row: Sequence[Cell | None], flow: int, source: Source) -> None:
    """A row with figures but no flow is a mistake."""
    figures = [cell for cell in row if cell is not None]
    if row[flow] is None and figures and not any(problem.line == figures[0].line for problem in source.problems):
        source.problem("flow is blank but other figures are given; write the flow or delete the row", figures[0].line)


def _check_efficiency(heading: Heading, cells: list[Cell], source: Source) -> None:
    """Above 100 % is impossible; per cent that never exceed 1 are probably fractions under a wrong heading."""
    unit = heading.unit or ""
    above = [cell for cell in cells if to_si(cell.value, unit, Kind.SHARE) > 1.0]
    if above and to_si(1.0, unit, Kind.SHARE) == 1.0:
        cell = above[0]
        source.problem(
            f'efficiency "{cell.text}" is above 1 but the column is headed as a fraction; write "efficiency [%]"',
            cell.line,
        )
        return
    for cell in above:
        source.problem(f'efficiency "{cell.text}" is above 100 %', cell.line)
    largest = max((cell.value for cell in cells), default=0.0)
    if 0.0 < largest <= 1.0 and to_si(1.0, unit, Kind.SHARE) != 1.0:
        text = "efficiency is headed per cent but never exceeds 1; "
        source.problem(f'{text}if these are fractions, write "efficiency [fraction]"', cells[0].line)


def _in_order(
    column: Column, given: list[tuple[Cell, Cell]], flow_unit: str, source: Source
) -> list[tuple[Cell, Cell]]:
    """Rows by flow; equal flows with equal values collapse, with different values are an error."""
    ordered = sorted(given, key=lambda pair: (pair[0].value, pair[0].line))
    kept: list[tuple[Cell, Cell]] = []
    for flow, value in ordered:
        same = kept and to_si(flow.value, flow_unit, Kind.FLOW) == to_si(kept[-1][0].value, flow_unit, Kind.FLOW)
        if not same:
            kept.append((flow, value))
            continue
        first = kept[-1][1]
        if first.value != value.value:
            text = f'{column} is "{value.text}" here and "{first.text}" in line {first.line}, both at flow {flow.text}'
            source.problem(f"{text}; keep one of them", value.line)
    return kept


def _points(given: list[tuple[Cell, Cell]], flow: Heading, column: Heading, kind: Kind) -> Points:
    """Points in SI."""
    flow_unit, unit = flow.unit or "", column.unit or ""
    return Points(
        flow=np.array([to_si(cell.value, flow_unit, Kind.FLOW) for cell, _ in given]),
        value=np.array([to_si(cell.value, unit, kind) for _, cell in given]),
        flow_half_digit=np.array([half_digit_to_si(cell.half_digit, flow_unit, Kind.FLOW) for cell, _ in given]),
        value_half_digit=np.array([half_digit_to_si(cell.half_digit, unit, kind) for _, cell in given]),
        line=np.array([value.line for _, value in given], dtype=np.int64),
        flow_unit=to_si(1.0, flow_unit, Kind.FLOW),
        value_unit=to_si(1.0, unit, kind),
    )
