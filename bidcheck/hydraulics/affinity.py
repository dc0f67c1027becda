"""Affinity laws: what a change of speed does, at equal diameter and negligible effect of viscosity."""

from typing import TypeVar

import numpy as np
import numpy.typing as npt

F = TypeVar("F", float, npt.NDArray[np.float64])


def flow_at_speed(flow: F, speed_rpm: float, new_speed_rpm: float) -> F:
    """Scale flow to a new speed.

    Parameters
    ----------
    flow : float or array, shape (n,)
        At `speed_rpm`. [m³/s]
    speed_rpm, new_speed_rpm : float
        [1/min]

    Notes
    -----
    Q2 = Q1 n2 / n1.
    Source: affinity laws; ISO 9906:2012, conversion to specified speed.
    Mark: text

    Examples
    --------
    >>> flow_at_speed(200.0, 1700, 2000)
    235.3
    """
    return flow * (new_speed_rpm / speed_rpm)


def head_at_speed(head: F, speed_rpm: float, new_speed_rpm: float) -> F:
    """Scale head to a new speed.

    Notes
    -----
    H2 = H1 (n2 / n1)².
    Source: affinity laws; ISO 9906:2012, conversion to specified speed.
    Mark: text

    Examples
    --------
    >>> head_at_speed(40.0, 1500, 1200)
    25.6
    """
    return head * (new_speed_rpm / speed_rpm) ** 2


def power_at_speed(power: F, speed_rpm: float, new_speed_rpm: float) -> F:
    """Scale power to a new speed.

    Notes
    -----
    P2 = P1 (n2 / n1)³.
    Source: affinity laws; ISO 9906:2012, conversion to specified speed.
    Mark: text

    Examples
    --------
    >>> power_at_speed(5.0, 1700, 2000)
    8.14
    """
    return power * (new_speed_rpm / speed_rpm) ** 3


def npsh3_at_speed(npsh3: F, speed_rpm: float, new_speed_rpm: float, exponent: float) -> F:
    """Scale NPSH3 to a new speed.

    Parameters
    ----------
    exponent : float
        About 1.5 at best efficiency; 1.3 to 2 are allowed.

    Notes
    -----
    NPSH3 goes with n^x.
    Source: ISO 9906:2012 lets x be 1.3 to 2 (from memory); the exponent by flow, Hydraulic Institute data library.
    Mark: memory

    Examples
    --------
    >>> npsh3_at_speed(14.0, 3550, 1750, 1.5)
    4.85
    """
    factor: float = (new_speed_rpm / speed_rpm) ** exponent
    return npsh3 * factor
