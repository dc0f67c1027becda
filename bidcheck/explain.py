"""The single mistake that would close a gap between two figures that ought to agree.

A gap is a ratio found / expected. Each mistake leaves its own factor; every mistake whose factor lies within
`CLOSE` of the gap is named, since several lie close together.
"""

from collections.abc import Iterable, Sequence
from dataclasses import dataclass
from typing import Literal

CLOSE = 0.01
"""How near a factor must be to the gap to explain it. Source: common practice, no source; methods use 1 %."""

Quantity = Literal["flow", "head", "power", "efficiency"]


@dataclass(frozen=True, slots=True)
class Mistake:
    """A mistake in stating one quantity: the figure printed over the right one is `factor`."""

    quantity: Quantity
    factor: float
    words: str


def _both_ways(quantity: Quantity, factor: float, forth: str, back: str) -> tuple[Mistake, Mistake]:
    return Mistake(quantity, factor, forth), Mistake(quantity, 1.0 / factor, back)


HORSEPOWER = 1.0 / 0.745700
METRIC_HORSEPOWER = 1.0 / 0.735499
US_GALLONS = 4.402868
IMPERIAL_OF_US = 1.20095
FEET = 1.0 / 0.3048

UNIT_MISTAKES: tuple[Mistake, ...] = (
    *_both_ways("power", HORSEPOWER, "power is in hp under a kW heading", "power is in kW under a hp heading"),
    *_both_ways(
        "power",
        METRIC_HORSEPOWER,
        "power is in metric hp under a kW heading",
        "power is in kW under a metric hp heading",
    ),
    *_both_ways(
        "flow", US_GALLONS, "flow is in US gpm under an m³/h heading", "flow is in m³/h under a US gpm heading"
    ),
    *_both_ways(
        "flow",
        1.0 / IMPERIAL_OF_US,
        "flow is in imperial gpm under a US gpm heading",
        "flow is in US gpm under an imperial one",
    ),
    *_both_ways(
        "flow",
        US_GALLONS / IMPERIAL_OF_US,
        "flow is in imperial gpm under an m³/h heading",
        "flow is in m³/h under an imperial gpm heading",
    ),
    *_both_ways("flow", 3.6, "flow is in m³/h under an l/s heading", "flow is in l/s under an m³/h heading"),
    *_both_ways("flow", 3600.0, "flow is in m³/h under an m³/s heading", "flow is in m³/s under an m³/h heading"),
    *_both_ways("flow", 1000.0, "flow is in l/s under an m³/s heading", "flow is in m³/s under an l/s heading"),
    *_both_ways(
        "flow", 1000.0 / 60.0, "flow is in L/min under an m³/h heading", "flow is in m³/h under an L/min heading"
    ),
    *_both_ways("head", FEET, "head is in ft under an m heading", "head is in m under a ft heading"),
)
"""Units put under the wrong heading. Source: factors of the units (NIST SP 811)."""


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


def density_mistakes(density: float) -> tuple[Mistake, ...]:
    """Power stated for water where the liquid is meant, and the other way round."""
    if abs(density / 1000.0 - 1.0) < CLOSE:
        return ()
    return (
        *_both_ways(
            "power",
            1000.0 / density,
            "density is left out of power",
            "power is for the liquid pumped, the rest for water",
        ),
    )


def motor_mistakes(motor_efficiency: float | None) -> tuple[Mistake, ...]:
    """Motor input stated in place of shaft power; only with the efficiency of the motor offered."""
    if motor_efficiency is None:
        return ()
    return (
        Mistake("power", 1.0 / motor_efficiency, "power is motor input, not shaft power"),
        Mistake("efficiency", motor_efficiency, "efficiency is that of pump and motor together"),
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
        if distance <= CLOSE:
            close.append((distance, mistake.words))
    return tuple(words for _, words in sorted(close))


def in_words(mistakes: Sequence[str]) -> str:
    """Join the mistakes found into one phrase: "a, or b"."""
    return ", or ".join(mistakes)
