"""Hydraulic power, shaft power, the efficiency they give, and how closely printed figures can agree."""

import math

from bidcheck.hydraulics.constants import G
from bidcheck.hydraulics.ranges import Numbers, require_positive


def hydraulic_power(density: float, flow: Numbers, head: Numbers) -> Numbers:
    """Power the liquid takes up, water horsepower in the trade.

    Parameters
    ----------
    density : float
        Density of the liquid. [kg/m³]
    flow : float or array, shape (n,)
        Flow. [m³/s]
    head : float or array, shape (n,)
        Head. [m]

    Returns
    -------
    float or array, shape (n,)
        Hydraulic power. [W]

    Raises
    ------
    OutOfRange
        If the density is not positive.

    Notes
    -----
    P = ρ g Q H.
    Source: ISO 9906:2012, pump power output
    Valid for: any figures
    Mark: text

    Examples
    --------
    >>> hydraulic_power(1000.0, flow=0.1, head=50.0)
    49033.25
    """
    require_positive(density=density)
    return density * G * flow * head


def shaft_power(density: float, flow: float, head: float, efficiency: float) -> float:
    """Power at the pump shaft.

    Parameters
    ----------
    density : float
        Density of the liquid. [kg/m³]
    flow : float
        Flow. [m³/s]
    head : float
        Head. [m]
    efficiency : float
        Pump efficiency, above 0. [fraction]

    Returns
    -------
    float
        Shaft power. [W]

    Raises
    ------
    OutOfRange
        If density or efficiency is not positive.

    Notes
    -----
    P = ρ g Q H / η.
    Source: ISO 9906:2012, pump efficiency
    Valid for: efficiency above 0
    Mark: text

    Examples
    --------
    >>> shaft_power(1000.0, flow=0.1, head=50.0, efficiency=0.8)
    61291.6
    """
    require_positive(efficiency=efficiency)
    return hydraulic_power(density, flow, head) / efficiency


def efficiency_from_power(density: float, flow: float, head: float, power: float) -> float:
    """Efficiency that flow, head and shaft power give.

    Parameters
    ----------
    density : float
        Density of the liquid the power is stated for. [kg/m³]
    flow : float
        Flow. [m³/s]
    head : float
        Head. [m]
    power : float
        Shaft power. [W]

    Returns
    -------
    float
        Efficiency; above 1 where the figures contradict physics. [fraction]

    Raises
    ------
    OutOfRange
        If density or power is not positive.

    Notes
    -----
    η = ρ g Q H / P.
    Source: ISO 9906:2012, pump efficiency
    Valid for: power above 0
    Mark: text

    Examples
    --------
    >>> efficiency_from_power(1000.0, flow=0.1, head=50.0, power=61291.6)
    0.8000
    """
    require_positive(power=power)
    return hydraulic_power(density, flow, head) / power


def printed_digits_tolerance(
    *,
    flow: tuple[float, float],
    head: tuple[float, float],
    power: tuple[float, float],
    efficiency: tuple[float, float],
) -> float:
    """How far ρgQH/(Pη) may lie from 1 by the rounding of the printed figures alone.

    Parameters
    ----------
    flow, head, power, efficiency : (float, float)
        Each figure and half a unit in its last printed place, in one unit.

    Returns
    -------
    float
        Largest relative departure upwards; infinite where a half digit reaches power or efficiency itself.

    Raises
    ------
    OutOfRange
        If a figure is not positive or a half digit negative.

    Notes
    -----
    (1 + q)(1 + h) / ((1 − p)(1 − e)) − 1, with q, h, p, e the relative half digits: the worst case, not the likely one,
    so that rounding alone never accuses.
    Source: interval arithmetic on the printed figures
    Valid for: positive figures
    Mark: derived

    Examples
    --------
    >>> printed_digits_tolerance(flow=(100, 0.5), head=(50, 0.05), power=(17.0, 0.05), efficiency=(0.80, 0.005))
    0.0154
    """
    shares = []
    for name, (value, half_digit) in {"flow": flow, "head": head, "power": power, "efficiency": efficiency}.items():
        require_positive(**{name: value})
        if half_digit != 0.0:
            require_positive(**{f"half digit of {name}": half_digit})
        shares.append(half_digit / value)
    q, h, p, e = shares
    if p >= 1.0 or e >= 1.0:
        return math.inf
    return (1.0 + q) * (1.0 + h) / ((1.0 - p) * (1.0 - e)) - 1.0
