"""Figures as a person prints them: trade units, the digits they deserve. The only place where anything is rounded."""

import math
import re
import unicodedata

from bidcheck.quantity import KINDS, Kind, UnitSystem
from bidcheck.units import from_si

NOTHING = "–"
NARROW_SPACE = "\u202f"
SHARES = (Kind.SHARE, Kind.WHOLE_SHARE)
THREE_DIGITS = (Kind.FLOW, Kind.POWER)
"""Kinds printed with three digits at least: small pumps have small flows and powers."""

_UNITS = {printed.unit for kind in KINDS.values() for printed in (kind.si, kind.us)} - {""}
_BEFORE_UNIT = re.compile(rf"(?<=\d) (?=(?:{'|'.join(map(re.escape, sorted(_UNITS, reverse=True)))})(?!\w))")
_THOUSANDS = re.compile(r"(?<=\b\d) (?=\d{3}\b)|(?<=\b\d{2}) (?=\d{3}\b)")
MANY_TIMES = 10.0
"""A ratio from which it is printed as so many times, not in per cent."""


def number(value: float, decimals: int) -> str:
    """A number with a real minus sign and narrow spaces between thousands from 10 000 on.

    Examples
    --------
    >>> number(-0.31, 1), number(1234.0, 0), number(-0.001, 1)
    ('−0.3', '1234', '0.0')
    """
    text = f"{abs(value):.{decimals}f}"
    whole, point, rest = text.partition(".")
    if len(whole) > 4:
        whole = f"{int(whole):,}".replace(",", NARROW_SPACE)
    sign = "−" if value < 0 and float(text) != 0.0 else ""
    return sign + whole + point + rest


def _decimals(value: float, kind: Kind, decimals: int) -> int:
    """Decimals for this size: more for small flows and powers, none beyond a thousand."""
    size = abs(value)
    if size >= 999.5:
        return 0
    if kind is Kind.RATIO and size >= MANY_TIMES:
        return 0 if size >= 10.0 * MANY_TIMES else 1
    if kind in THREE_DIGITS and 0.0 < size < 99.95:
        return max(decimals, 2 - max(math.floor(math.log10(size)), 0))
    return decimals


def bare(value: float, kind: Kind, system: UnitSystem) -> str:
    """A figure without its unit, for tables that name the unit at the head.

    Examples
    --------
    >>> bare(0.125, Kind.FLOW, UnitSystem.SI)
    '450'
    """
    unit, decimals = kind.printed(system)
    if kind in SHARES:
        return number(100.0 * value, decimals)
    converted = from_si(value, "%" if kind is Kind.POINTS else unit or kind.json_unit, kind)
    return number(converted, _decimals(converted, kind, decimals))


def figure(value: float | str | None, kind: Kind, system: UnitSystem) -> str:
    """A figure with its unit.

    Parameters
    ----------
    value : float, str or None
        In SI; None prints as a dash, text as it is, control characters taken out.
    kind : Kind
    system : UnitSystem

    Returns
    -------
    str

    Examples
    --------
    >>> figure(0.125, Kind.FLOW, UnitSystem.SI), figure(62.0, Kind.HEAD, UnitSystem.US)
    ('450 m³/h', '203.4 ft')
    >>> figure(0.826, Kind.SHARE, UnitSystem.SI), figure(None, Kind.HEAD, UnitSystem.SI)
    ('82.6 %', '–')
    >>> figure(174.3, Kind.SUCTION_SPECIFIC_SPEED, UnitSystem.SI)
    '174 (9000 US)'
    """
    if value is None:
        return NOTHING
    if isinstance(value, str):
        return plain(value)
    if kind is Kind.SPECIFIC_SPEED:
        return f"nq {number(value, 1)}" if system is UnitSystem.SI else f"Ns {number(_rounded_us(value, kind), 0)}"
    if kind is Kind.SUCTION_SPECIFIC_SPEED:
        us = f"{number(_rounded_us(value, kind), 0)} US"
        return f"{number(value, 0)} ({us})" if system is UnitSystem.SI else us
    if kind in SHARES:
        return f"{number(value, 0)} times" if abs(value) >= MANY_TIMES else f"{bare(value, kind, system)} %"
    unit = kind.printed(system).unit
    return f"{bare(value, kind, system)} {unit}".rstrip()


def _rounded_us(value: float, kind: Kind) -> float:
    """US specific speeds to the nearest ten."""
    return round(from_si(value, "US", kind), -1)


def plain(text: str) -> str:
    r"""Text from outside without control characters, so that it can neither colour nor move a terminal.

    Examples
    --------
    >>> plain("alder\x1b[31m")
    'alder[31m'
    """
    return "".join(c for c in text if c in "\n\t" or unicodedata.category(c) not in ("Cc", "Cf"))


def tied(text: str) -> str:
    r"""Text in which no line breaks inside a figure or between it and its unit.

    Examples
    --------
    >>> tied("at 520 m³/h for 3 more"), tied("7 000 to 11 000")
    ('at 520\xa0m³/h for 3 more', '7\u202f000 to 11\u202f000')
    """
    whole = _THOUSANDS.sub(NARROW_SPACE, text)
    return _BEFORE_UNIT.sub("\u00a0", whole).replace("US gpm", "US\u00a0gpm")
