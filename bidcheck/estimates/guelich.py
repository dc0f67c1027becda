"""Efficiency at best efficiency by Gülich, Centrifugal Pumps, Table 3.9."""

import math

from bidcheck.errors import OutOfRange


def _exponent(flow: float, nq: float, factor: float) -> float:
    a = 1.0 if flow <= 1.0 else 0.5
    return float(factor * a * (1.0 / flow) ** 0.15 * (45.0 / nq) ** 0.06)


def _in_range(flow: float, nq: float) -> None:
    if flow < 0.005 * (1 - 1e-9) or not 7.0 * (1 - 1e-9) <= nq <= 100.0 * (1 + 1e-9):
        raise OutOfRange(f"asked at {3600 * flow:.4g} m³/h and nq {nq:.3g}; holds from 18 m³/h, nq 7 to 100")


def single_stage_efficiency(nq: float, flow: float) -> float:
    """Best efficiency of a single-stage pump.

    Parameters
    ----------
    nq : float
        Specific speed per eye.
    flow : float
        Flow at best efficiency. [m³/s]

    Returns
    -------
    float
        [fraction]

    Raises
    ------
    OutOfRange
        Below 18 m³/h or outside nq 7 to 100.

    Notes
    -----
    η = 1 - 0.095 (1/Q)^m - 0.3 [0.35 - log10(nq/23)]² (1/Q)^0.05, m = 0.1 a (1/Q)^0.15 (45/nq)^0.06,
    a = 1 up to 1 m³/s and 0.5 above.
    Valid for: 0.005 m³/s and more, nq 7 to 100.
    Source: Gülich, Centrifugal Pumps, Table 3.9.
    Mark: crossed

    Examples
    --------
    >>> single_stage_efficiency(20.0, 0.010)
    0.6870
    """
    _in_range(flow, nq)
    m = _exponent(flow, nq, 0.1)
    return float(1.0 - 0.095 * (1.0 / flow) ** m - 0.3 * (0.35 - math.log10(nq / 23.0)) ** 2 * (1.0 / flow) ** 0.05)


def hydraulic_efficiency(nq: float, flow: float) -> float:
    """Hydraulic efficiency of a single-stage pump.

    Notes
    -----
    η_h = 1 - 0.055 (1/Q)^m - 0.2 [0.26 - log10(nq/25)]² (1/Q)^0.1, with 0.08 in m.
    Valid for: 0.005 m³/s and more, nq 7 to 100.
    Source: Gülich, Centrifugal Pumps, Table 3.9.
    Mark: crossed

    Examples
    --------
    >>> hydraulic_efficiency(20.0, 0.010)
    0.8406
    """
    _in_range(flow, nq)
    m = _exponent(flow, nq, 0.08)
    return float(1.0 - 0.055 * (1.0 / flow) ** m - 0.2 * (0.26 - math.log10(nq / 25.0)) ** 2 * (1.0 / flow) ** 0.1)


def multistage_efficiency(nq: float, flow: float) -> float:
    """Best efficiency of a multistage pump.

    Notes
    -----
    η = 1 - 0.116 (1/Q)^m - 0.4 [0.26 - log10(nq/25)]², with 0.08 in m.
    Valid for: 0.005 m³/s and more, nq 7 to 100.
    Source: Gülich, Centrifugal Pumps, Table 3.9 (from memory).
    Mark: memory

    Examples
    --------
    >>> multistage_efficiency(20.0, 0.010)
    0.6981
    """
    _in_range(flow, nq)
    m = _exponent(flow, nq, 0.08)
    return float(1.0 - 0.116 * (1.0 / flow) ** m - 0.4 * (0.26 - math.log10(nq / 25.0)) ** 2)
