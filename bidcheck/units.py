"""Units: one closed table of accepted spellings per kind of quantity, and conversion to SI. The only user of pint.

Absolute and gauge pressure are never guessed: a field that needs an absolute pressure refuses a bare "bar". The
currency of money is kept beside the number, not converted.
"""

import math
import re
from difflib import get_close_matches
from functools import cache, lru_cache
from typing import TYPE_CHECKING, NamedTuple

from bidcheck.errors import UnitError
from bidcheck.numerals import Numeral, UnreadableNumeral, clipped, read_numeral, split_quantity
from bidcheck.quantity import Kind, Stated
from bidcheck.unit_refusals import refuse_bare_share, refuse_other_pressure
from bidcheck.unit_table import CASE_MATTERS, EXAMPLE_NUMBER, NEED_NO_UNIT, SHARES, SI, TABLE, plain_spelling

if TYPE_CHECKING:
    import pint

_CURRENCY_LAST = re.compile(r"(?P<number>.*?\d[.,]?)\s*(?P<currency>[A-Z]{3})(?P<per>\s*(?:/|per\s).*)?")
_CURRENCY_FIRST = re.compile(r"(?P<currency>[A-Z]{3})\s*(?P<number>[-+−\d.,].*\d|\d)(?P<per>\s*(?:/|per\s).*)?")


@lru_cache(maxsize=1)
def _registry() -> "pint.UnitRegistry[float]":
    """Build the registry late and once: it takes most of a second."""
    import pint

    return pint.UnitRegistry()


class _Scale(NamedTuple):
    """SI = value * factor / divisor + offset; a whole divisor keeps 450 m3/h at 0.125 m³/s."""

    factor: float
    divisor: float
    offset: float


@cache
def _scale(expression: str, si: str) -> _Scale:
    """Scale from a pint expression to SI."""
    if expression == si:
        return _Scale(1.0, 1.0, 0.0)
    registry = _registry()
    if expression in ("degC", "degF"):
        zero, hundred = (float(registry.Quantity(value, expression).to(si).magnitude) for value in (0.0, 100.0))
        return _Scale(float(f"{hundred - zero:.12g}"), 100.0, zero)
    factor = float((1.0 * registry.parse_expression(expression)).to(si).magnitude)
    divisor = round(1.0 / factor)
    if divisor > 0 and math.isclose(factor * divisor, 1.0, rel_tol=1e-14):
        return _Scale(1.0, float(divisor), 0.0)
    return _Scale(float(f"{factor:.15g}"), 1.0, 0.0)


@cache
def _lookup(kind: Kind) -> tuple[dict[str, str], dict[str, str]]:
    """Plain spelling → pint expression, exact and with case folded."""
    exact = {plain_spelling(spelling): expression for spelling, expression in TABLE[kind].items()}
    folded = {plain.casefold(): expression for plain, expression in exact.items() if plain not in CASE_MATTERS}
    return exact, folded


def _expression(spelling: str, kind: Kind) -> str | None:
    """Pint expression of a spelling, None where the kind does not know it."""
    exact, folded = _lookup(kind)
    plain = plain_spelling(spelling)
    return exact.get(plain, folded.get(plain.casefold()))


def spellings(kind: Kind) -> tuple[str, ...]:
    """Spellings accepted for a kind, the usual one first.

    Examples
    --------
    >>> spellings(Kind.SPEED)[:2]
    ('rpm', '1/min')
    """
    return tuple(spelling for spelling in TABLE[kind] if spelling)


def knows(spelling: str, kind: Kind) -> bool:
    """Whether `spelling` is a unit of `kind`."""
    return _expression(spelling, kind) is not None


def to_si(value: float, spelling: str, kind: Kind) -> float:
    """Convert a number in the unit spelled to SI (rotational speed: 1/min; money per energy: per joule).

    Parameters
    ----------
    value : float
        In the unit `spelling`.
    spelling : str
        One of `spellings(kind)`; empty for a bare number where the kind allows it.
    kind : Kind

    Returns
    -------
    float
        In SI.

    Raises
    ------
    UnitError
        If the kind does not know the unit.

    Examples
    --------
    >>> to_si(100.0, "US gpm", Kind.FLOW)
    0.00630902
    >>> to_si(68.0, "°F", Kind.TEMPERATURE)
    293.15
    """
    factor, divisor, offset = _scale_of(spelling, kind)
    return value * factor / divisor + offset


def from_si(value: float, spelling: str, kind: Kind) -> float:
    """Convert SI to the unit spelled, the reverse of `to_si`.

    Examples
    --------
    >>> from_si(0.125, "m³/h", Kind.FLOW)
    450.0
    """
    factor, divisor, offset = _scale_of(spelling, kind)
    return (value - offset) * divisor / factor


def _scale_of(spelling: str, kind: Kind) -> _Scale:
    """Scale of a spelling, or a UnitError."""
    expression = _expression(spelling, kind)
    if expression is None:
        raise UnitError(unknown_unit(spelling, kind))
    return _scale(expression, SI[kind])


def half_digit_to_si(half_digit: float, spelling: str, kind: Kind) -> float:
    """Convert a difference, so without the offset of a temperature scale."""
    factor, divisor, _ = _scale_of(spelling, kind)
    return half_digit * factor / divisor


def unknown_unit(spelling: str, kind: Kind) -> str:
    """Say that a unit is not one of `kind`, with the nearest known ones or the kind it belongs to.

    Examples
    --------
    >>> unknown_unit("kWatt", Kind.POWER)
    'unit "kWatt" is not known for power; nearest is "kW"'
    """
    known = spellings(kind)
    elsewhere = next(
        (other.value for other in TABLE if other is not kind and spelling and knows(spelling, other)), None
    )
    if not known:
        return f'{kind.value} is written without a unit, found "{clipped(spelling)}"'
    if elsewhere is not None:
        return (
            f'unit "{clipped(spelling)}" belongs to {elsewhere}, not to {kind.value}; known are {", ".join(known[:4])}'
        )
    folded = {plain_spelling(name).casefold(): name for name in reversed(known)}
    near = get_close_matches(plain_spelling(spelling).casefold(), list(folded), n=1, cutoff=0.5)
    hint = f'nearest is "{folded[near[0]]}"' if near else f"known are {', '.join(known[:4])}"
    return f'unit "{clipped(spelling)}" is not known for {kind.value}; {hint}'


def parse(text: str, kind: Kind, *, absolute: bool | None = None) -> Stated:
    """Read a quantity with its unit.

    Parameters
    ----------
    text : str
        Such as "450 m3/h", "84 %", "2.3 kPa(a)".
    kind : Kind
        What it must be.
    absolute : bool, optional
        For pressures: True where an absolute pressure is needed ("bar(a)" and the like only), False where a gauge
        pressure or a difference is (no absolute spelling), None where either will do.

    Returns
    -------
    Stated
        Value and half a unit of the last printed place, both in SI.

    Raises
    ------
    UnitError
        Naming what was found and how to write it.

    Examples
    --------
    >>> parse("84 %", Kind.SHARE)
    Stated(value=0.84, half_digit=0.005, text='84 %')
    >>> parse("62", Kind.HEAD)
    Traceback (most recent call last):
    bidcheck.errors.UnitError: found "62", which has no unit; write "62 m"
    """
    number, unit = split_quantity(text)
    numeral = _numeral(text, number, unit, kind)
    if not unit and kind in SHARES:
        refuse_bare_share(text, number, numeral)
    elif not unit and kind not in NEED_NO_UNIT:
        usual = _usual(kind, absolute)
        raise UnitError(f'found "{clipped(text)}", which has no unit; write "{number} {usual}"')
    if not knows(unit, kind):
        raise UnitError(f'found "{clipped(text)}": {unknown_unit(unit, kind)}')
    if kind is Kind.PRESSURE and absolute is not None:
        refuse_other_pressure(text, number, unit, absolute)
    half_digit = half_digit_to_si(numeral.half_digit, unit, kind)
    return Stated(to_si(numeral.value, unit, kind), half_digit, text)


def parse_money(text: str, kind: Kind = Kind.MONEY) -> tuple[Stated, str]:
    """Read an amount of money, or a price of energy, with its currency.

    Parameters
    ----------
    text : str
        "182000 EUR", "EUR 182000"; with `Kind.MONEY_PER_ENERGY` "0.11 EUR/kWh". The currency is a code of three
        capital letters.

    Returns
    -------
    stated : Stated
        The amount; for a price of energy per joule.
    currency : str

    Raises
    ------
    UnitError

    Examples
    --------
    >>> parse_money("182000 EUR")[0].value, parse_money("182000 EUR")[1]
    (182000.0, 'EUR')
    >>> parse_money("0.36 EUR/kWh", Kind.MONEY_PER_ENERGY)[0].value
    1e-07
    """
    example = "0.11 EUR/kWh" if kind is Kind.MONEY_PER_ENERGY else "182000 EUR"
    match = _CURRENCY_LAST.fullmatch(text.strip()) or _CURRENCY_FIRST.fullmatch(text.strip())
    if match is None:
        raise UnitError(
            f'found "{clipped(text)}", which is not {kind.value} with a currency code; write it as "{example}"'
        )
    per = plain_spelling(match["per"] or "").replace("per", "/", 1)
    number = _numeral(text, match["number"].strip(), match["currency"] + per, kind)
    if not knows(per, kind):
        raise UnitError(f'found "{clipped(text)}", which is not {kind.value}; write it as "{example}"')
    return Stated(to_si(number.value, per, kind), half_digit_to_si(number.half_digit, per, kind), text), match[
        "currency"
    ]


def _numeral(text: str, number: str, unit: str, kind: Kind) -> Numeral:
    """The number of a quantity; its faults become a UnitError with the quantity written right."""
    try:
        return read_numeral(number)
    except UnreadableNumeral as fault:
        if not number:
            example = f"{EXAMPLE_NUMBER.get(kind, '12')} {_usual(kind, None)}".strip()
            raise UnitError(
                f'found "{clipped(text)}", which does not start with a number; write it as "{example}"'
            ) from None
        cures = " or ".join(f'"{f"{cure} {unit}".strip()}"' for cure in fault.cures)
        cure = f"; write {cures}" if cures else ""
        raise UnitError(f'found "{clipped(text)}", whose number {fault.fault}{cure}') from None


def _usual(kind: Kind, absolute: bool | None) -> str:
    """Spelling to propose."""
    if kind is Kind.PRESSURE and absolute:
        return "bar(a)"
    known = spellings(kind)
    return known[0] if known else ""
