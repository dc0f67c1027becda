"""Flow, head, power and efficiency held against one another. Floats or arrays of one shape (n,)."""

from typing import TypeVar

import numpy as np
import numpy.typing as npt

from bidcheck.hydraulics.constants import GRAVITY

F = TypeVar("F", float, npt.NDArray[np.float64])


def shaft_power(density: float, flow: F, head: F, efficiency: F) -> F:
    """Shaft power from efficiency.

    Parameters
    ----------
    density : float
        [kg/m³]
    flow, head, efficiency : float or array, shape (n,)
        [m³/s, m, fraction]

    Returns
    -------
    float or array, shape (n,)
        [W]

    Notes
    -----
    P = ρ g Q H / η.
    Source: definition of pump efficiency, ISO 17769-1.
    Mark: text

    Examples
    --------
    >>> shaft_power(1000.0, 0.125, 62.0, 0.825)
    92123.0
    """
    return density * GRAVITY * flow * head / efficiency


def efficiency_from_power(density: float, flow: F, head: F, power: F) -> F:
    """Efficiency from shaft power, the reverse of `shaft_power`.

    Notes
    -----
    η = ρ g Q H / P.
    Source: definition of pump efficiency, ISO 17769-1.
    Mark: text

    Examples
    --------
    >>> efficiency_from_power(1000.0, 0.125, 62.0, 92123.0)
    0.825
    """
    return density * GRAVITY * flow * head / power


def balance_tolerance(flow: F, head: F, efficiency: F, power: F) -> F:
    """How far the balance may be off because its figures were rounded when printed.

    Parameters
    ----------
    flow, head, efficiency, power : float or array, shape (n,)
        Half a unit in the last printed place over the value, of each figure.

    Returns
    -------
    float or array, shape (n,)
        Largest relative error of ρ g Q H / (P η).

    Notes
    -----
    Sum of the relative half digits: the worst case, not the likely one.
    Source: derived.
    Mark: derived

    Examples
    --------
    >>> balance_tolerance(0.001, 0.001, 0.0006, 0.0005)
    0.0031
    """
    return flow + head + efficiency + power
