"""Estimates of efficiency shown beside the others for context; they decide nothing."""

import math

from bidcheck.hydraulics.ranges import require_inside, require_positive
from bidcheck.hydraulics.specific_speed import US_GALLON


def corripio_efficiency(flow: float) -> float:
    """Efficiency by flow alone, used for cost estimates of process plants.

    Parameters
    ----------
    flow : float
        Flow. [m³/s]

    Returns
    -------
    float
        Efficiency. [fraction]

    Raises
    ------
    OutOfRange
        Outside 50 to 5000 US gpm.

    Notes
    -----
    η = −0.316 + 0.24015 ln Q − 0.01199 ln²Q, US gpm.
    Source: Corripio, Chrien and Evans (1982), Chemical Engineering
    Valid for: 50 to 5000 US gpm
    Mark: crossed

    Examples
    --------
    >>> corripio_efficiency(461 * 231 * 0.0254**3 / 60)
    0.70589
    """
    gpm = flow * 60.0 / US_GALLON
    require_inside("flow", gpm, 50.0, 5000.0, unit="US gpm")
    return -0.316 + 0.24015 * math.log(gpm) - 0.01199 * math.log(gpm) ** 2


def anderson_efficiency(nq: float, flow: float) -> float:
    """Efficiency from a statistical comparison of pumps.

    Parameters
    ----------
    nq : float
        Specific speed. [1/min, m³/s, m per stage]
    flow : float
        Best efficiency flow. [m³/s]

    Returns
    -------
    float
        Efficiency. [fraction]

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    η = 0.94 − 0.048 Q^−0.32 − 0.29 [log₁₀(nq/44)]², m³/s.
    Source: from memory, Anderson, as printed in the Pump Handbook
    Valid for: not stated by the source as recalled; any positive figures
    Mark: memory

    Examples
    --------
    >>> anderson_efficiency(44.0, 1.0)
    0.892
    """
    require_positive(specific_speed=nq, flow=flow)
    return 0.94 - 0.048 * math.pow(flow, -0.32) - 0.29 * math.log10(nq / 44.0) ** 2
