"""The single mistake that would close a gap between two figures that ought to agree.

A gap is a ratio found / expected. Each mistake leaves its own factor; every mistake whose factor lies within
`CLOSE` of the gap is named, since several lie close together.
"""

from collections.abc import Iterable, Iterator, Mapping, Sequence
from dataclasses import dataclass
from typing import Literal

CLOSE = 0.01
"""How near a factor must be to the gap to explain it. Source: common practice, no source; methods use 1 %."""

CONVERTED = "before it was converted"
"""Said of a mistake that cannot have happened under the heading there is: figures are converted on their way."""

SAME_UNIT = 0.005
"""How near two units are one: metric and other horsepower differ by 1.4 %."""

Quantity = Literal["flow", "head", "power", "efficiency"]


@dataclass(frozen=True, slots=True)
class Mistake:
    """A mistake in stating one quantity: the figure printed over the right one is `factor`."""

    quantity: Quantity
    factor: float
    words: str
    slack: float = 0.0
    """Doubt of the factor itself, relative, beside what counts as close."""
    heading: float = 0.0
    """One unit of the heading it happens under, in SI; 0 where it may happen under any."""


def _both_ways(quantity: Quantity, factor: float, forth: str, back: str) -> tuple[Mistake, Mistake]:
    return Mistake(quantity, factor, forth), Mistake(quantity, 1.0 / factor, back)


KILOWATT, HORSEPOWER_UNIT, METRIC_HORSEPOWER_UNIT = 1000.0, 745.700, 735.499
HORSEPOWER = KILOWATT / HORSEPOWER_UNIT
METRIC_HORSEPOWER = KILOWATT / METRIC_HORSEPOWER_UNIT
US_GALLONS = 4.402868
IMPERIAL_OF_US = 1.20095
CUBIC_METRE_PER_HOUR = 1.0 / 3600.0
US_GPM = CUBIC_METRE_PER_HOUR / US_GALLONS
FOOT = 0.3048
FEET = 1.0 / FOOT

_UNITS: dict[Quantity, tuple[tuple[str, str, float], ...]] = {
    "power": (("a", "kW", KILOWATT), ("a", "hp", HORSEPOWER_UNIT), ("a", "metric hp", METRIC_HORSEPOWER_UNIT)),
    "flow": (
        ("an", "m³/h", CUBIC_METRE_PER_HOUR),
        ("a", "US gpm", US_GPM),
        ("an", "imperial gpm", US_GPM * IMPERIAL_OF_US),
        ("an", "l/s", 1e-3),
        ("an", "m³/s", 1.0),
        ("an", "L/min", 1e-3 / 60.0),
    ),
    "head": (("an", "m", 1.0), ("a", "ft", FOOT)),
}
"""Units that are mixed up: article, name, one of them in SI. Source: factors of the units (NIST SP 811)."""
_PAIRS: dict[Quantity, tuple[tuple[str, str], ...]] = {
    "power": (("hp", "kW"), ("metric hp", "kW")),
    "flow": (
        ("US gpm", "m³/h"),
        ("imperial gpm", "US gpm"),
        ("imperial gpm", "m³/h"),
        ("m³/h", "l/s"),
        ("m³/h", "m³/s"),
        ("l/s", "m³/s"),
        ("L/min", "m³/h"),
    ),
    "head": (("ft", "m"),),
}
"""Pairs that are mixed up, either under the heading of the other."""


def _unit_mistakes() -> Iterator[Mistake]:
    """Every pair both ways."""
    for quantity, pairs in _PAIRS.items():
        units = {name: (article, unit) for article, name, unit in _UNITS[quantity]}
        for one, other in pairs:
            for meant, written in ((one, other), (other, one)):
                article, heading = units[written]
                words = f"{quantity} is in {meant} under {article} {written} heading"
                yield Mistake(quantity, heading / units[meant][1], words, heading=heading)


UNIT_MISTAKES: tuple[Mistake, ...] = tuple(_unit_mistakes())
"""Units put under the wrong heading. Source: factors of the units (NIST SP 811)."""


def possible(mistakes: Iterable[Mistake], headings: Mapping[Quantity, float]) -> tuple[Mistake, ...]:
    """Mistakes that could have happened under the headings there are.

    Parameters
    ----------
    mistakes : iterable of Mistake
    headings : mapping
        One unit of each quantity's heading in SI; 0 or absent where not known, which leaves everything possible.

    Examples
    --------
    >>> [mistake.words for mistake in possible(UNIT_MISTAKES, {"power": 1000.0}) if mistake.quantity == "power"]
    ['power is in hp under a kW heading', 'power is in metric hp under a kW heading']
    """
    return tuple(
        mistake
        for mistake in mistakes
        if not mistake.heading
        or not headings.get(mistake.quantity)
        or abs(headings[mistake.quantity] / mistake.heading - 1.0) <= SAME_UNIT
    )


def closing(
    gap: float, exponents: dict[Quantity, int], others: Iterable[Mistake], headings: Mapping[Quantity, float]
) -> tuple[str, ...]:
    """Name every single mistake that closes a gap: under the headings there are, else before figures were converted.

    Parameters
    ----------
    gap, exponents
        As for `mistakes_that_close`.
    others : iterable of Mistake
        Those that have nothing to do with headings.
    headings : mapping
        As for `possible`.

    Examples
    --------
    >>> closing(0.746, BALANCE, (), {"power": 1000.0})
    ('power is in hp under a kW heading',)
    >>> closing(0.746, BALANCE, (), {"power": 745.7})
    ('power is in hp under a kW heading, before it was converted',)
    """
    here = possible(UNIT_MISTAKES, headings)
    found = mistakes_that_close(gap, exponents, (*here, *others))
    if found:
        return found
    before = mistakes_that_close(gap, exponents, (mistake for mistake in UNIT_MISTAKES if mistake not in here))
    return tuple(f"{words}, {CONVERTED}" for words in before)


def stage_mistakes(stages: int) -> tuple[Mistake, ...]:
    """Head or power stated per stage where the whole pump is meant, and the other way round."""
    if stages < 2:
        return ()
    return (
        *_both_ways("head", 1.0 / stages, "head is per stage", f"head is that of all {stages} stages, twice counted"),
        Mistake("power", 1.0 / stages, "power is per stage"),
    )


def pump_mistakes(pumps_running: int) -> tuple[Mistake, ...]:
    """Flow or power of all running pumps where one is meant, and the other way round."""
    if pumps_running < 2:
        return ()
    return (
        *_both_ways(
            "flow",
            float(pumps_running),
            f"flow is that of all {pumps_running} pumps",
            f"flow is that of one pump of {pumps_running}, divided twice",
        ),
        Mistake("power", float(pumps_running), f"power is that of all {pumps_running} pumps"),
    )


def frequency_mistakes() -> tuple[Mistake, ...]:
    """Figures taken at 60 Hz where 50 Hz is meant, and the other way round (affinity laws)."""
    found: list[Mistake] = []
    exponents: tuple[tuple[Quantity, int], ...] = (("flow", 1), ("head", 2), ("power", 3))
    for quantity, exponent in exponents:
        factor = 1.2**exponent
        forth, back = (
            f"{quantity} is taken at 60 Hz, the rest at 50 Hz",
            f"{quantity} is taken at 50 Hz, the rest at 60 Hz",
        )
        found.extend(_both_ways(quantity, factor, forth, back))
    return tuple(found)


def density_mistakes(density: float, *, of_water: bool) -> tuple[Mistake, ...]:
    """Power stated for water where the liquid is meant, or for the liquid where the curve is one for water.

    Parameters
    ----------
    density : float
        Of the liquid pumped. [kg/m³]
    of_water : bool
        Whether the figures are meant for water.
    """
    if abs(density / 1000.0 - 1.0) < CLOSE:
        return ()
    if of_water:
        return (Mistake("power", density / 1000.0, "power is for the liquid pumped, the rest for water"),)
    return (Mistake("power", 1000.0 / density, "density is left out of power"),)


MOTOR_PART_LOAD = 0.025
"""How far power at the shaft, taken at a motor's full-load efficiency, may be off at the loads of a curve. Source:
common practice, no source."""
STATED_SPREAD, ORDINARY_SPREAD = 0.005, 0.015
"""How far a motor near its load may be from the efficiency stated, and an ordinary one from the standard's, beside what
counts as close. Source: common practice, no source."""


def motor_mistakes(motor_efficiency: float | None, ordinary: float | None = None) -> tuple[Mistake, ...]:
    """Motor input stated in place of shaft power, or an efficiency with the motor in it.

    Parameters
    ----------
    motor_efficiency : float or None
        Of the motor offered, as stated. [fraction]
    ordinary : float or None
        Of an ordinary motor of that size, where none is stated. [fraction]
    """
    eta = motor_efficiency if motor_efficiency is not None else ordinary
    if eta is None:
        return ()
    slack = STATED_SPREAD if motor_efficiency is not None else ORDINARY_SPREAD
    tail = "" if motor_efficiency is not None else f" (an ordinary motor of this size has {100 * eta:.0f} %)"
    return (
        Mistake("power", 1.0 / eta, f"power is motor input, not shaft power{tail}", slack),
        Mistake("efficiency", eta, f"efficiency is that of pump and motor together{tail}", slack),
    )


BALANCE: dict[Quantity, int] = {"flow": 1, "head": 1, "power": -1, "efficiency": -1}
"""How ρgQH/(Pη) depends on each quantity."""


def mistakes_that_close(gap: float, exponents: dict[Quantity, int], mistakes: Iterable[Mistake]) -> tuple[str, ...]:
    """Name every single mistake that closes a gap.

    Parameters
    ----------
    gap : float
        Figure found over figure expected.
    exponents : dict
        How the gap depends on each quantity: for ρgQH/(Pη) flow +1, head +1, power −1.
    mistakes : iterable of Mistake
        Those that could have been made.

    Returns
    -------
    tuple of str
        Words of each mistake whose factor lies within 1 % of the gap, closest first.

    Examples
    --------
    >>> mistakes_that_close(0.746, {"flow": 1, "head": 1, "power": -1}, UNIT_MISTAKES)
    ('power is in hp under a kW heading',)
    """
    close: list[tuple[float, str]] = []
    for mistake in mistakes:
        exponent = exponents.get(mistake.quantity)
        if exponent is None:
            continue
        distance = abs(gap / mistake.factor**exponent - 1.0)
        if distance <= CLOSE + mistake.slack:
            close.append((distance, mistake.words))
    return tuple(words for _, words in sorted(close))


def in_words(mistakes: Sequence[str]) -> str:
    """Join the mistakes found into one phrase: "a, or b"."""
    return ", or ".join(mistakes)
