"""Rewrite an example inquiry in US units: same figures, same mistakes, other units. Test support.

A transformation of text with its own factors and a closed list of keys and units, so that it shares nothing with the
readers it helps to test. Keys, order, comments, blank cells, separators and decimal commas stay as they are.
"""

import re
import shutil
from math import ceil, floor, log10
from pathlib import Path
from typing import NamedTuple

FOOT = 0.3048
INCH = FOOT / 12
GALLON = 231 * INCH**3
POUND_FORCE = 0.45359237 * 9.80665
HORSEPOWER = 550 * FOOT * POUND_FORCE / 1000
PSI = POUND_FORCE / INCH**2


class Rewritten(NamedTuple):
    """new value = old value * factor + offset, in `unit`."""

    factor: float
    unit: str
    offset: float = 0.0


GPM_PER_M3H = 1 / (60 * GALLON)
TO_US = {
    "m3/h": Rewritten(GPM_PER_M3H, "US gpm"),
    "m³/h": Rewritten(GPM_PER_M3H, "US gpm"),
    "m3/s": Rewritten(3600 * GPM_PER_M3H, "US gpm"),
    "l/s": Rewritten(3.6 * GPM_PER_M3H, "US gpm"),
    "m": Rewritten(1 / FOOT, "ft"),
    "mm": Rewritten(0.001 / INCH, "in"),
    "kW": Rewritten(1 / HORSEPOWER, "hp"),
    "bar": Rewritten(1e5 / PSI, "psi"),
    "bar(a)": Rewritten(1e5 / PSI, "psi(a)"),
    "bar(g)": Rewritten(1e5 / PSI, "psi(g)"),
    "kPa": Rewritten(1e3 / PSI, "psi"),
    "kPa(a)": Rewritten(1e3 / PSI, "psi(a)"),
    "degC": Rewritten(1.8, "degF", 32.0),
    "°C": Rewritten(1.8, "degF", 32.0),
    "kg/m3": Rewritten(0.001, "SG"),
}
LEFT_ALONE = {"US gpm", "ft", "in", "hp", "psi", "psi(a)", "psi(g)", "degF", "SG", "lb/ft3", "%", "US", ""}
KEYS = (
    *("rated_flow", "min_flow", "normal_flow", "max_flow", "flow", "bep_flow", "min_continuous_flow"),
    *("max_allowable_flow", "rated_head", "head", "shutoff_head", "static_head", "npsha", "npsha_at_max_flow", "npsh3"),
    *("liquid_level", "friction_loss", "altitude", "impeller", "impeller_rated", "impeller_max", "impeller_min"),
    *("power", "max_power", "rating", "pressure", "max_pressure", "vapour_pressure", "temperature", "ambient"),
    *("density", "at_least", "at_most"),
)
QUANTITY = re.compile(
    rf'(?<![\w"])(?P<key>{"|".join(KEYS)})(?P<equals>\s*=\s*)"(?P<number>[-+\d.]+)\s*(?P<unit>[^"]*)"'
)
UNITS = re.compile(r'^(units\s*=\s*)"SI"', re.MULTILINE)
HEADING = re.compile(r"[\[(](?P<bracketed>[^\])]+)[\])]\s*$|,\s*(?P<after_comma>[^,]+?)\s*$")


def rewrite_in_us_units(source: Path, target: Path, *, digits: int | None = 6) -> None:
    """Write the inquiry folder `source` to the new folder `target` in US gpm, ft, in, hp, psi and °F.

    With `digits` every figure gets that many significant digits. With None the bids' figures are printed about as
    finely as they were (never coarser, less than ten times finer), while the purchaser's keep six digits: those are
    requirements, not readings.
    """
    shutil.copytree(source, target)
    for path in sorted(target.rglob("*.toml")):
        path.write_bytes(_toml(_text(path), 6 if path.name == "inquiry.toml" else digits).encode())
    for path in sorted(target.rglob("curve*.csv")):
        path.write_bytes(_csv(_text(path), digits).encode())


def _text(path: Path) -> str:
    """Text with its byte order mark and line ends as they are."""
    return path.read_bytes().decode("utf-8")


def _rule(unit: str) -> Rewritten | None:
    """How a unit is rewritten, None where it stays; an unlisted one is an error of the test support."""
    if unit not in TO_US and unit not in LEFT_ALONE:
        raise ValueError(f'unit "{unit}" is neither to be rewritten nor to be left alone')
    return TO_US.get(unit)


def _number(printed: str, rule: Rewritten, digits: int | None, comma: bool = False) -> str:
    """One figure in its new unit; decimal mark as it was, or a comma where the rest of the file has one."""
    comma = comma or "," in printed
    plain = printed.replace(",", ".")
    value = float(plain) * rule.factor + rule.offset
    if digits is None:
        last_place = 10.0 ** -len(plain.partition(".")[2]) * rule.factor
        decimals = max(0, ceil(-log10(last_place)))
    else:
        decimals = max(0, digits - 1 - floor(log10(abs(value)))) if value else 0
    text = f"{value:.{decimals}f}"
    return text.replace(".", ",") if comma else text


def _toml(text: str, digits: int | None) -> str:
    """inquiry.toml or bid.toml in US units."""

    def rewrite(match: re.Match[str]) -> str:
        rule = _rule(match["unit"])
        if rule is None:
            return match[0]
        return f'{match["key"]}{match["equals"]}"{_number(match["number"], rule, digits)} {rule.unit}"'

    return UNITS.sub(r'\1"US"', QUANTITY.sub(rewrite, text))


def _csv(text: str, digits: int | None) -> str:
    """A curve in US units."""
    lines = text.splitlines(keepends=True)
    table = [i for i, line in enumerate(lines) if line.strip() and not line.lstrip("\ufeff").startswith("#")]
    separator = next((mark for mark in "\t;" if mark in lines[table[0]]), ",")
    units, rows = _units_of_columns(lines, table, separator)
    rules = [_rule(unit) for unit in units]
    comma = separator != "," and any("," in lines[i] for i in rows)
    for i in rows:
        cells = lines[i].rstrip("\r\n").split(separator)
        end = lines[i][len(lines[i].rstrip("\r\n")) :]
        cells = [_cell(cell, rule, digits, comma) for cell, rule in zip(cells, rules, strict=True)]
        lines[i] = separator.join(cells) + end
    return "".join(lines)


def _cell(cell: str, rule: Rewritten | None, digits: int | None, comma: bool) -> str:
    """A cell in its new unit, spaces kept; blank ones stay blank."""
    printed = cell.strip()
    return cell if rule is None or not printed else cell.replace(printed, _number(printed, rule, digits, comma))


def _units_of_columns(lines: list[str], table: list[int], separator: str) -> tuple[list[str], list[int]]:
    """Units as they were, from the header or the row beneath, which is rewritten in place; and the rows of figures."""
    head, *rows = table
    in_header = all(HEADING.search(cell) for cell in lines[head].split(separator))
    place = head if in_header else rows.pop(0)
    end = lines[place][len(lines[place].rstrip("\r\n")) :]
    units, cells = [], []
    for cell in lines[place].rstrip("\r\n").split(separator):
        match = HEADING.search(cell) if in_header else None
        unit = (match["bracketed"] or match["after_comma"]).strip() if match else cell.strip()
        start = match.start() if match else 0
        rule = _rule(unit)
        units.append(unit)
        cells.append(cell[:start] + cell[start:].replace(unit, rule.unit) if rule else cell)
    lines[place] = separator.join(cells) + end
    return units, rows
