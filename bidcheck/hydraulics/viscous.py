"""Performance with a viscous liquid from performance with water, after ANSI/HI 9.6.7."""

import math
from typing import NamedTuple

import numpy as np
import numpy.typing as npt

from bidcheck.errors import OutOfRange
from bidcheck.hydraulics.power_balance import hydraulic_power
from bidcheck.hydraulics.ranges import require_inside, require_positive
from bidcheck.hydraulics.specific_speed import specific_speed

Floats = npt.NDArray[np.float64]


COLD_WATER_VISCOSITY = 1.75e-6
"""Greatest kinematic viscosity of clean cold water, in which curves are tested [m²/s]. Up to it a water curve holds as
it stands; the formula alone would correct water for being water below about 20 m³/h. Source: from memory, ISO 9906."""


class ViscousFactors(NamedTuple):
    """Parameter B and what flow and efficiency are multiplied by; 1 where no correction is called for."""

    parameter: float
    flow: float
    efficiency: float


class ViscousPoints(NamedTuple):
    """Points of a curve with the viscous liquid, arrays of shape (n,) in SI."""

    flow: Floats
    head: Floats
    efficiency: Floats
    power: Floats


def viscous_parameter(viscosity: float, flow: float, head_per_stage: float, speed_rpm: float) -> float:
    """Parameter B of the viscosity correction.

    Parameters
    ----------
    viscosity : float
        Kinematic viscosity of the liquid pumped. [m²/s]
    flow, head_per_stage : float
        Best efficiency point with water, head of one stage. [m³/s, m]
    speed_rpm : float
        Rotational speed. [1/min]

    Returns
    -------
    float
        B, without a range of its own: `viscous_factors` enforces it.

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    B = 16.5 ν^0.5 H^0.0625 / (Q^0.375 n^0.25), with cSt, m, m³/h, 1/min.
    Source: ANSI/HI 9.6.7, parameter B; ISO/TR 17766
    Valid for: any positive figures
    Mark: crossed

    Examples
    --------
    >>> viscous_parameter(120e-6, flow=110 / 3600, head_per_stage=77.0, speed_rpm=2950)
    5.521
    """
    require_positive(viscosity=viscosity, flow=flow, head_per_stage=head_per_stage, speed=speed_rpm)
    top = 16.5 * math.sqrt(1e6 * viscosity) * math.pow(head_per_stage, 0.0625)
    return top / (math.pow(3600.0 * flow, 0.375) * math.pow(speed_rpm, 0.25))


def needs_correction(viscosity: float, parameter: float) -> bool:
    """Whether a water curve needs a correction for the liquid.

    Parameters
    ----------
    viscosity : float
        Kinematic viscosity of the liquid pumped. [m²/s]
    parameter : float
        B of `viscous_parameter`.

    Returns
    -------
    bool
        True where B is above 1 and the liquid more viscous than clean cold water.

    Notes
    -----
    Source: ANSI/HI 9.6.7, B up to 1; viscosity of clean cold water from memory, ISO 9906
    Valid for: any positive figures
    Mark: memory

    Examples
    --------
    >>> needs_correction(1.0e-6, 2.1), needs_correction(120e-6, 5.5), needs_correction(10e-6, 0.9)
    (False, True, False)
    """
    return viscosity > COLD_WATER_VISCOSITY * (1 + 1e-9) and parameter > 1.0


def viscous_factors(viscosity: float, flow: float, head_per_stage: float, speed_rpm: float) -> ViscousFactors:
    """Factors of flow and efficiency for a viscous liquid.

    Parameters
    ----------
    viscosity : float
        Kinematic viscosity of the liquid pumped. [m²/s]
    flow, head_per_stage : float
        Best efficiency point with water, head of one stage. [m³/s, m]
    speed_rpm : float
        Rotational speed. [1/min]

    Returns
    -------
    ViscousFactors
        B, C_Q and C_η; both factors 1 where `needs_correction` says no, whatever the size of the pump.

    Raises
    ------
    OutOfRange
        If a correction is needed and B is 40 or more, or a figure lies outside the method.

    Notes
    -----
    C_Q = 2.71^(−0.165 (log₁₀B)^3.15), C_η = B^(−0.0547 B^0.69); 2.71 as printed, not e.
    Source: ANSI/HI 9.6.7; ISO/TR 17766; its limits from memory
    Valid for: B below 40, 1 to 3000 cSt, 3 to 260 m³/h, 6 to 130 m per stage, nq up to 60, Newtonian, radial
    Mark: crossed

    Examples
    --------
    >>> viscous_factors(120e-6, flow=110 / 3600, head_per_stage=77.0, speed_rpm=2950).flow
    0.938
    """
    B = viscous_parameter(viscosity, flow, head_per_stage, speed_rpm)
    if not needs_correction(viscosity, B):
        return ViscousFactors(B, 1.0, 1.0)
    if B >= 40.0:
        raise OutOfRange(f"parameter B of the viscosity correction is {B:.3g}, the method ends below 40")
    require_inside("viscosity", viscosity, 1.0, 3000.0, unit="cSt", factor=1e6)
    require_inside("best efficiency flow", flow, 3.0, 260.0, unit="m³/h", factor=3600.0)
    require_inside("head per stage", head_per_stage, 6.0, 130.0, unit="m")
    nq = specific_speed(speed_rpm, flow, head_per_stage)
    require_inside("specific speed nq", nq, 0.0, 60.0)
    C_Q = math.pow(2.71, -0.165 * math.pow(math.log10(B), 3.15))
    C_eta = math.pow(B, -0.0547 * math.pow(B, 0.69))
    return ViscousFactors(B, C_Q, C_eta)


class WaterPoint(NamedTuple):
    """Best efficiency point with water: flow [m³/s], head of one stage [m], efficiency; and the factors behind it."""

    flow: float
    head_per_stage: float
    efficiency: float
    factors: ViscousFactors


def water_point(
    viscosity: float, flow: float, head_per_stage: float, efficiency: float, speed_rpm: float
) -> WaterPoint:
    """Best efficiency point with water from that with a viscous liquid.

    Parameters
    ----------
    viscosity : float
        Kinematic viscosity of the liquid pumped. [m²/s]
    flow, head_per_stage, efficiency : float
        Best efficiency point as pumped, head of one stage. [m³/s, m, fraction]
    speed_rpm : float
        Rotational speed. [1/min]

    Returns
    -------
    WaterPoint

    Raises
    ------
    OutOfRange
        Outside the limits of `viscous_factors`, or where water would need an efficiency of 1 or more.

    Notes
    -----
    The factors belong to the point with water, so they are found by repetition: Q_w = Q/C_Q, H_w = H/C_Q, η_w = η/C_η.
    Source: ANSI/HI 9.6.7, used backwards
    Valid for: as `viscous_factors`
    Mark: derived

    Examples
    --------
    >>> point = water_point(120e-6, 103.15 / 3600, 72.21, 0.5018, speed_rpm=2950)
    >>> round(3600 * point.flow), round(point.head_per_stage), round(point.efficiency, 2)
    (110, 77, 0.68)
    """
    Q, H = flow, head_per_stage
    factors = viscous_factors(viscosity, Q, H, speed_rpm)
    for _ in range(60):
        Q, H = flow / factors.flow, head_per_stage / factors.flow
        factors = viscous_factors(viscosity, Q, H, speed_rpm)
    if efficiency >= factors.efficiency:
        raise OutOfRange(f"efficiency {efficiency:.3g} as pumped would need more than 100 % with water")
    return WaterPoint(Q, H, efficiency / factors.efficiency, factors)


def viscous_head_factor(flow_factor: float, flow_over_bep: Floats) -> Floats:
    """Factor of head along the curve.

    Parameters
    ----------
    flow_factor : float
        C_Q of `viscous_factors`. [fraction]
    flow_over_bep : array, shape (n,)
        Flow with water over best efficiency flow with water.

    Returns
    -------
    array, shape (n,)
        C_H; equal to C_Q at best efficiency, 1 at shutoff.

    Notes
    -----
    C_H = 1 − (1 − C_Q)(Q/Q_BEP)^0.75.
    Source: ANSI/HI 9.6.7; ISO/TR 17766
    Valid for: as `viscous_factors`
    Mark: crossed

    Examples
    --------
    >>> viscous_head_factor(0.938, np.array([0.0, 1.0]))
    array([1.   , 0.938])
    """
    factor: Floats = 1.0 - (1.0 - flow_factor) * np.power(flow_over_bep, 0.75)
    return factor


def viscous_points(
    flow: Floats,
    head: Floats,
    efficiency: Floats,
    *,
    bep_flow: float,
    bep_head: float,
    speed_rpm: float,
    viscosity: float,
    density: float,
    stages: int = 1,
) -> ViscousPoints:
    """Correct points of a water curve for a viscous liquid.

    Parameters
    ----------
    flow, head, efficiency : array, shape (n,)
        Points with water, efficiency above 0: leave shutoff out. [m³/s, m, fraction]
    bep_flow, bep_head : float
        Best efficiency point with water, head of all stages. [m³/s, m]
    speed_rpm : float
        Rotational speed. [1/min]
    viscosity, density : float
        Of the liquid pumped. [m²/s, kg/m³]
    stages : int
        Number of stages the heads are of.

    Returns
    -------
    ViscousPoints
        Flow, head, efficiency, and shaft power with the liquid pumped.

    Raises
    ------
    OutOfRange
        As `viscous_factors`, or if an efficiency is not positive.

    Notes
    -----
    Q' = C_Q Q, H' = C_H H, η' = C_η η, P' = ρ g Q' H'/η'.
    Source: ANSI/HI 9.6.7; ISO/TR 17766
    Valid for: as `viscous_factors`
    Mark: crossed

    Examples
    --------
    >>> points = viscous_points(
    ...     np.array([110 / 3600]), np.array([77.0]), np.array([0.68]), bep_flow=110 / 3600, bep_head=77.0,
    ...     speed_rpm=2950, viscosity=120e-6, density=900.0)
    >>> round(float(points.power[0]), -1)
    36390.0
    """
    if not bool((efficiency > 0).all()):
        raise OutOfRange("points to correct for viscosity need an efficiency above 0; leave shutoff out")
    factors = viscous_factors(viscosity, bep_flow, bep_head / stages, speed_rpm)
    new_flow: Floats = factors.flow * flow
    new_head: Floats = head * viscous_head_factor(factors.flow, flow / bep_flow)
    new_efficiency: Floats = factors.efficiency * efficiency
    power: Floats = hydraulic_power(density, new_flow, new_head) / new_efficiency
    return ViscousPoints(new_flow, new_head, new_efficiency, power)
