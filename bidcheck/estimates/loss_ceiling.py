"""A ceiling of efficiency from the losses no pump escapes: disc friction, leakage, hydraulic and mechanical loss."""

import math
from typing import NamedTuple

from bidcheck.errors import OutOfRange
from bidcheck.hydraulics.constants import GRAVITY

GAP_OVER_RADIUS = 0.05
"""Side room of the impeller over its radius, a usual value. Source: Gülich, Centrifugal Pumps, 3.6 (from memory)."""


class LossBalance(NamedTuple):
    """Efficiency and the losses it leaves: leakage over flow, disc friction over useful power, and the two assumed."""

    efficiency: float
    leakage: float
    disc_friction: float
    hydraulic_efficiency: float
    mechanical_efficiency: float


def disc_friction_coefficient(reynolds: float, gap_over_radius: float) -> float:
    """Moment coefficient C_M of a smooth disc in a casing, both sides: the largest of the four regimes.

    Parameters
    ----------
    reynolds : float
        ω r² / ν.
    gap_over_radius : float
        Axial gap over radius.

    Returns
    -------
    float

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    I 2π/(s Re), II 3.70 s^0.1/Re^0.5, III 0.080/(s^(1/6) Re^0.25), IV 0.102 s^0.1/Re^0.2.
    Source: Daily and Nece, Journal of Basic Engineering 82 (1960).
    Mark: crossed

    Examples
    --------
    >>> disc_friction_coefficient(3e6, 0.05)
    0.00383
    """
    if reynolds <= 0 or gap_over_radius <= 0:
        raise OutOfRange("disc friction needs positive Reynolds number and gap")
    s, Re = gap_over_radius, reynolds
    regimes: tuple[float, ...] = (
        2.0 * math.pi / (s * Re),
        3.70 * s**0.1 / Re**0.5,
        0.080 / (s ** (1.0 / 6.0) * Re**0.25),
        0.102 * s**0.1 / Re**0.2,
    )
    return max(regimes)


def leakage_share(nq: float, seals: float = 1.0) -> float:
    """Leakage through the impeller's neck rings over flow.

    Parameters
    ----------
    nq : float
        Per eye.
    seals : float
        1 for the inlet seal, 2 with balance holes.

    Notes
    -----
    4.1 z/nq^1.6 below nq 27, 0.15 z/nq^0.6 from 27.
    Source: Gülich, Centrifugal Pumps, Table 3.5.
    Mark: crossed

    Examples
    --------
    >>> leakage_share(20.0)
    0.034
    """
    if nq <= 0:
        raise OutOfRange("leakage needs a positive specific speed")
    return float(seals * (4.1 / nq**1.6 if nq < 27.0 else 0.15 / nq**0.6))


def loss_balance(
    *,
    nq: float,
    flow: float,
    head_per_stage: float,
    speed_rpm: float,
    diameter: float,
    viscosity: float,
    hydraulic_efficiency: float,
    leakage: float,
    mechanical_efficiency: float,
) -> LossBalance:
    """Efficiency that given losses leave.

    Parameters
    ----------
    nq : float
        Per eye, kept for the record of the caller.
    flow, head_per_stage, speed_rpm, diameter, viscosity : float
        [m³/s, m, 1/min, m, m²/s]
    hydraulic_efficiency, leakage, mechanical_efficiency : float
        [fraction]

    Returns
    -------
    LossBalance

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    η = η_mech / [(1 + leak)/η_h + P_disc/P_hyd], P_disc = 0.5 C_M ρ ω³ r⁵ for both sides, P_hyd = ρ g Q H per stage.
    Source: loss balance of Gülich, Centrifugal Pumps, chapter 3; disc friction Daily and Nece 1960.
    Mark: crossed

    Examples
    --------
    >>> loss_balance(
    ...     nq=27.85, flow=130 / 3600, head_per_stage=55.0, speed_rpm=2960, diameter=0.214, viscosity=1e-6,
    ...     hydraulic_efficiency=0.97, leakage=0.0102, mechanical_efficiency=0.995,
    ... ).efficiency
    0.920
    """
    if min(nq, flow, head_per_stage, speed_rpm, diameter, viscosity) <= 0:
        raise OutOfRange("the loss balance needs positive figures")
    omega, r = speed_rpm * math.pi / 30.0, diameter / 2.0
    C_M = disc_friction_coefficient(omega * r * r / viscosity, GAP_OVER_RADIUS)
    disc = 0.5 * C_M * omega**3 * r**5 / (GRAVITY * flow * head_per_stage)
    efficiency = mechanical_efficiency / ((1.0 + leakage) / hydraulic_efficiency + disc)
    return LossBalance(efficiency, leakage, disc, hydraulic_efficiency, mechanical_efficiency)


def efficiency_ceiling(
    *, nq: float, flow: float, head_per_stage: float, speed_rpm: float, diameter: float, viscosity: float
) -> LossBalance:
    """Efficiency no pump of this diameter, speed and flow exceeds.

    Parameters
    ----------
    nq : float
        Per eye.
    flow, head_per_stage, speed_rpm, diameter, viscosity : float
        At best efficiency; flow total, head per stage. [m³/s, m, 1/min, m, m²/s]

    Returns
    -------
    LossBalance

    Notes
    -----
    Hydraulic efficiency 0.97, half the leakage of one inlet seal, smooth discs, mechanical efficiency 0.995.
    Source: derived, `loss_balance` with losses smaller than any known pump's.
    Mark: crossed

    Examples
    --------
    >>> efficiency_ceiling(
    ...     nq=27.85, flow=130 / 3600, head_per_stage=55.0, speed_rpm=2960, diameter=0.214, viscosity=1e-6
    ... ).efficiency
    0.920
    """
    return loss_balance(
        nq=nq,
        flow=flow,
        head_per_stage=head_per_stage,
        speed_rpm=speed_rpm,
        diameter=diameter,
        viscosity=viscosity,
        hydraulic_efficiency=0.97,
        leakage=0.5 * leakage_share(nq),
        mechanical_efficiency=0.995,
    )
