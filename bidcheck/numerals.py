"""Numbers as people print them: value, how far the last printed digit reaches, and what cannot be told apart.

A decimal comma is read where it can be nothing else. Thousands marks are never read: the same text means a number a
thousand times smaller elsewhere.
"""

import re
from typing import NamedTuple

_NUMBER = (
    r"[+\-−]?(?:\d{1,3}(?:[\s'’]\d{3})+(?!\d)(?:[.,]\d+)?|[.,]*\d[\d.,]*)(?:[eE][+\-−]?\d+)?"  # 1 200.5 | 1200.5e3
)
_QUANTITY = re.compile(rf"\s*(?P<number>{_NUMBER})(?P<rest>.*)", re.DOTALL)
_WHOLE = re.compile(rf"\s*(?P<number>{_NUMBER})\s*")
_MOST_DIGITS = 30
"""Digits of one number; a bound against mistakes (no source)."""
_EXPONENT = re.compile(r"[eE]")
_COMMA_OR_THOUSANDS = re.compile(r"[+-]?[1-9]\d{0,2},\d{3}")
_GROUPS = re.compile(r"[+-]?\d{1,3}([.,])\d{3}(?:\1\d{3})+")
_GROUPED_WITH_DECIMALS = re.compile(r"[+-]?\d{1,3}(?:([.,])\d{3})(?:\1\d{3})*([.,])\d*")


class Numeral(NamedTuple):
    """A printed number and half a unit in its last printed place."""

    value: float
    half_digit: float


class UnreadableNumeral(ValueError):  # noqa: N818 - a kind of text, not a failure of the program
    """A text that is not one number. `fault` says what is wrong with it, `cures` which numbers may be meant."""

    def __init__(self, fault: str, cures: tuple[str, ...] = ()) -> None:
        self.fault = fault
        self.cures = cures
        super().__init__(fault)


def clipped(text: str, most: int = 60) -> str:
    """Text fit for a message: short, without control characters.

    Examples
    --------
    >>> clipped("1" * 100)
    '111111111111111111111111111111111111111111111111111111111...'
    """
    short = text if len(text) <= most else f"{text[: most - 3]}..."
    return "".join(c if c.isprintable() else " " if c.isspace() else "?" for c in short)


def split_quantity(text: str) -> tuple[str, str]:
    """Split `"450 m3/h"` into number and unit, each stripped; number empty where the text does not start with one.

    Examples
    --------
    >>> split_quantity("1480 1/min")
    ('1480', '1/min')
    >>> split_quantity("1 200 m3/h")
    ('1 200', 'm3/h')
    """
    match = _QUANTITY.fullmatch(text)
    if match is None:
        return "", text.strip()
    return match["number"].strip(), match["rest"].strip()


def read_numeral(text: str, *, comma_is_decimal: bool = False) -> Numeral:
    """Read one printed number.

    Parameters
    ----------
    text : str
        Such as "84", "0.825", "4,5", "1.2e3".
    comma_is_decimal : bool
        Known from elsewhere, such as the other cells of a file, that a comma is a decimal comma. Otherwise "1,200"
        is refused, since it may mean 1200 or 1.2.

    Raises
    ------
    UnreadableNumeral
        With what is wrong and how it may be written.

    Examples
    --------
    >>> read_numeral("1.2e3")
    Numeral(value=1200.0, half_digit=50.0)
    >>> read_numeral("4,5").value
    4.5
    """
    match = _WHOLE.fullmatch(text)
    if match is None:
        raise UnreadableNumeral("is not a number")
    printed = match["number"].replace("−", "-")
    mantissa, _, exponent = _EXPONENT.sub("e", printed).partition("e")
    digits = _without_thousands_fault(mantissa, comma_is_decimal).replace(",", ".")
    exponent = exponent.replace("−", "-") or "0"
    if len(exponent.lstrip("+-")) > 2 or len(digits) > _MOST_DIGITS:
        raise UnreadableNumeral("is not a number of ordinary size")
    value = float(f"{digits}e{exponent}")
    places = len(digits.partition(".")[2])
    return Numeral(value, 0.5 * 10.0 ** (int(exponent) - places))


def _without_thousands_fault(mantissa: str, comma_is_decimal: bool) -> str:
    """Mantissa with at most one decimal mark, or the fault that it has more."""
    joined = re.sub(r"[\s'’]", "", mantissa)
    if joined != mantissa:
        raise UnreadableNumeral("has a thousands mark", (joined.replace(",", "."),))
    marks = [character for character in mantissa if character in ".,"]
    if len(marks) > 1:
        raise _many_marks(mantissa)
    if marks == [","] and not comma_is_decimal and _COMMA_OR_THOUSANDS.fullmatch(mantissa):
        whole, _, decimals = mantissa.partition(",")
        raise UnreadableNumeral("can be read in two ways", (whole + decimals, f"{whole}.{decimals}"))
    return mantissa


def _many_marks(mantissa: str) -> UnreadableNumeral:
    """Name the fault of a number with several points or commas."""
    if match := _GROUPS.fullmatch(mantissa):
        return UnreadableNumeral("has thousands marks", (mantissa.replace(match[1], ""),))
    match = _GROUPED_WITH_DECIMALS.fullmatch(mantissa)
    if match and match[1] != match[2]:
        return UnreadableNumeral("has a thousands mark", (mantissa.replace(match[1], "").replace(",", "."),))
    return UnreadableNumeral("is not a number")


def looks_like_thousands(cells: list[str]) -> bool:
    """Whether a mark in these cells of one column may be a thousands mark: "800", "1.000", "1.200".

    So it is when every mark is followed by exactly three digits and a cell of three digits or more has none.

    Examples
    --------
    >>> looks_like_thousands(["0", "500", "1.000"]), looks_like_thousands(["0.000", "0.500", "1.000"])
    (True, False)
    """
    marked = [cell for cell in cells if "." in cell or "," in cell]
    plain = [cell for cell in cells if re.fullmatch(r"\d{3,}", cell)]
    return bool(marked and plain) and all(re.fullmatch(r"[1-9]\d{0,2}[.,]\d{3}", cell) for cell in marked)
