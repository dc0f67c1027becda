"""Correction of a water curve for a viscous liquid, ANSI/HI 9.6.7 (ISO/TR 17766)."""

import math
from typing import NamedTuple

import numpy as np
import numpy.typing as npt

from bidcheck.errors import OutOfRange
from bidcheck.hydraulics.specific_speed import specific_speed

Floats = npt.NDArray[np.float64]


class ViscousFactors(NamedTuple):
    """Correction factors at best efficiency: of flow (and of head there), of efficiency, and the parameter B."""

    parameter: float
    flow: float
    efficiency: float


def viscosity_parameter(viscosity: float, head_per_stage: float, bep_flow: float, speed_rpm: float) -> float:
    """Parameter B of the correction.

    Parameters
    ----------
    viscosity : float
        Kinematic. [m²/s]
    head_per_stage, bep_flow : float
        At best efficiency with water. [m, m³/s]
    speed_rpm : float
        [1/min]

    Returns
    -------
    float
        B; up to 1 no correction is needed.

    Notes
    -----
    B = 16.5 ν^0.5 H^0.0625 / (Q^0.375 n^0.25), ν in cSt, Q in m³/h.
    Source: ANSI/HI 9.6.7, ISO/TR 17766.
    Mark: crossed

    Examples
    --------
    >>> viscosity_parameter(120e-6, 77.0, 110 / 3600, 2950)
    5.521
    """
    nu, Q = viscosity * 1e6, bep_flow * 3600.0
    return float(16.5 * nu**0.5 * head_per_stage**0.0625 / (Q**0.375 * speed_rpm**0.25))


def viscous_factors(viscosity: float, head_per_stage: float, bep_flow: float, speed_rpm: float) -> ViscousFactors:
    """Correction factors at best efficiency.

    Parameters
    ----------
    viscosity, head_per_stage, bep_flow, speed_rpm : float
        As for `viscosity_parameter`.

    Returns
    -------
    ViscousFactors

    Raises
    ------
    OutOfRange
        Outside the limits of the method.

    Notes
    -----
    C_Q = 2.71^(-0.165 (log10 B)^3.15), C_η = B^(-0.0547 B^0.69); C_H = C_Q at best efficiency.
    Valid for: 1 to 3000 cSt, 3 to 260 m³/h, 6 to 130 m per stage, nq up to 60, Newtonian liquids, 1 < B < 40
    (limits from memory).
    Source: ANSI/HI 9.6.7, ISO/TR 17766.
    Mark: crossed

    Examples
    --------
    >>> viscous_factors(120e-6, 77.0, 110 / 3600, 2950)
    ViscousFactors(parameter=5.521, flow=0.9378, efficiency=0.7380)
    """
    B = viscosity_parameter(viscosity, head_per_stage, bep_flow, speed_rpm)
    if B <= 1.0:
        return ViscousFactors(B, 1.0, 1.0)
    inside = (
        1e-6 <= viscosity <= 3000e-6
        and 3.0 <= bep_flow * 3600.0 <= 260.0
        and 6.0 <= head_per_stage <= 130.0
        and specific_speed(speed_rpm, bep_flow, head_per_stage) <= 60.0
        and B < 40.0
    )
    if not inside:
        raise OutOfRange("the viscous correction of ANSI/HI 9.6.7 does not reach this pump and liquid")
    return ViscousFactors(B, float(2.71 ** (-0.165 * math.log10(B) ** 3.15)), float(B ** (-0.0547 * B**0.69)))


def viscous_head_factor(flow_over_bep: Floats, flow_factor: float) -> Floats:
    """Correction factor of head along the curve.

    Parameters
    ----------
    flow_over_bep : array, shape (n,)
        Water flow over best efficiency flow.
    flow_factor : float
        C_Q.

    Returns
    -------
    array, shape (n,)

    Notes
    -----
    C_H = 1 - (1 - C_Q) (Q/Q_bep)^0.75.
    Source: ANSI/HI 9.6.7, ISO/TR 17766.
    Mark: crossed

    Examples
    --------
    >>> viscous_head_factor(np.array([0.0, 1.0]), 0.9378).tolist()
    [1.0, 0.9378]
    """
    return np.asarray(1.0 - (1.0 - flow_factor) * flow_over_bep**0.75, dtype=np.float64)
