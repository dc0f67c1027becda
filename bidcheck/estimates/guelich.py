"""Statistical efficiency of pumps with radial impellers after Gülich, Centrifugal Pumps, Table 3.9."""

import math

from bidcheck.hydraulics.ranges import require_inside

LOWEST_FLOW = 18.0
"""Least flow of the table [m³/h], 0.005 m³/s."""

LOWEST_NQ, HIGHEST_NQ = 7.0, 100.0
"""Range of specific speed of the table."""

SCATTER = 0.2
"""Scatter of single pumps as a share of 1 − η. Source: from memory, Gülich."""


def _exponent(factor: float, nq: float, flow: float) -> float:
    """Exponent m of the table, and the range of the table."""
    require_inside("flow", flow, LOWEST_FLOW, math.inf, unit="m³/h", factor=3600.0)
    require_inside("specific speed nq", nq, LOWEST_NQ, HIGHEST_NQ)
    a = 1.0 if flow <= 1.0 else 0.5
    return factor * a * math.pow(1.0 / flow, 0.15) * math.pow(45.0 / nq, 0.06)


def guelich_single_stage(nq: float, flow: float) -> float:
    """Efficiency of a single-stage pump.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]
    flow : float
        Best efficiency flow, total. [m³/s]

    Returns
    -------
    float
        Efficiency at best efficiency point. [fraction]

    Raises
    ------
    OutOfRange
        Outside the range below.

    Notes
    -----
    η = 1 − 0.095 (1/Q)^m − 0.3 [0.35 − log₁₀(nq/23)]² (1/Q)^0.05, m = 0.1 a (1/Q)^0.15 (45/nq)^0.06;
    a = 1 up to 1 m³/s, 0.5 above.
    Source: Gülich, Centrifugal Pumps, Table 3.9
    Valid for: from 0.005 m³/s (18 m³/h), nq 7 to 100
    Mark: crossed

    Examples
    --------
    >>> guelich_single_stage(20.0, 0.010)
    0.6870
    """
    m = _exponent(0.1, nq, flow)
    return (
        1.0 - 0.095 * math.pow(1.0 / flow, m) - 0.3 * (0.35 - math.log10(nq / 23.0)) ** 2 * math.pow(1.0 / flow, 0.05)
    )


def guelich_hydraulic(nq: float, flow: float) -> float:
    """Hydraulic efficiency of a pump.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]
    flow : float
        Best efficiency flow, total. [m³/s]

    Returns
    -------
    float
        Hydraulic efficiency at best efficiency point. [fraction]

    Raises
    ------
    OutOfRange
        Outside the range below.

    Notes
    -----
    η_h = 1 − 0.055 (1/Q)^m − 0.2 [0.26 − log₁₀(nq/25)]² (1/Q)^0.1, m = 0.08 a (1/Q)^0.15 (45/nq)^0.06;
    a = 1 up to 1 m³/s, 0.5 above.
    Source: Gülich, Centrifugal Pumps, Table 3.9
    Valid for: from 0.005 m³/s (18 m³/h), nq 7 to 100
    Mark: crossed

    Examples
    --------
    >>> guelich_hydraulic(20.0, 0.010)
    0.8406
    """
    m = _exponent(0.08, nq, flow)
    return 1.0 - 0.055 * math.pow(1.0 / flow, m) - 0.2 * (0.26 - math.log10(nq / 25.0)) ** 2 * math.pow(1.0 / flow, 0.1)


def guelich_multistage(nq: float, flow: float) -> float:
    """Efficiency of a multistage pump.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]
    flow : float
        Best efficiency flow, total. [m³/s]

    Returns
    -------
    float
        Efficiency at best efficiency point. [fraction]

    Raises
    ------
    OutOfRange
        Outside the range below.

    Notes
    -----
    η = 1 − 0.116 (1/Q)^m − 0.4 [0.26 − log₁₀(nq/25)]², m = 0.08 a (1/Q)^0.15 (45/nq)^0.06;
    a = 1 up to 1 m³/s, 0.5 above.
    Source: Gülich, Centrifugal Pumps, Table 3.9
    Valid for: from 0.005 m³/s (18 m³/h), nq 7 to 100
    Mark: memory

    Examples
    --------
    >>> guelich_multistage(20.0, 0.010)
    0.6981
    """
    m = _exponent(0.08, nq, flow)
    return 1.0 - 0.116 * math.pow(1.0 / flow, m) - 0.4 * (0.26 - math.log10(nq / 25.0)) ** 2
