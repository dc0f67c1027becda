"""Efficiency that the unavoidable losses leave: disc friction, leakage, flow, bearings and seals."""

import math
from collections.abc import Mapping
from typing import NamedTuple

from bidcheck.estimates.disc_friction import disc_friction_power
from bidcheck.hydraulics.power_balance import hydraulic_power
from bidcheck.hydraulics.ranges import require_inside, require_positive

BEST_HYDRAULIC, BEST_MECHANICAL, BEST_LEAKAGE = 0.97, 0.995, 0.5
"""Figures of the ceiling, better than any pump on offer: hydraulic and mechanical efficiency, and leakage as a share of
Gülich's. Source: common practice, no source."""

ORDINARY_MECHANICAL = 0.99
"""Mechanical efficiency of the balance for information. Source: common practice, no source."""


class LossBalance(NamedTuple):
    """An efficiency and the losses behind it.

    `terms`: "hydraulic" and "mechanical" as shares of 1, "leakage" as a share of pump flow, "disc friction" as a share
    of hydraulic power.
    """

    efficiency: float
    terms: Mapping[str, float]


def leakage_share(nq: float, seals: int = 1) -> float:
    """Leakage through the wear rings of the inlet over pump flow.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]
    seals : int
        1, or 2 with balance holes.

    Returns
    -------
    float
        Q_sp/Q.

    Raises
    ------
    OutOfRange
        Outside nq 7 to 100.

    Notes
    -----
    4.1 z/nq^1.6 below nq 27, 0.15 z/nq^0.6 from 27.
    Source: Gülich, Centrifugal Pumps, Table 3.5
    Valid for: nq 7 to 100
    Mark: crossed

    Examples
    --------
    >>> leakage_share(20.0)
    0.0340
    """
    require_inside("specific speed nq", nq, 7.0, 100.0)
    return 4.1 * seals / math.pow(nq, 1.6) if nq < 27.0 else 0.15 * seals / math.pow(nq, 0.6)


def loss_balance(
    *,
    nq: float,
    flow: float,
    head_per_stage: float,
    speed_rpm: float,
    diameter: float,
    viscosity: float,
    density: float,
    hydraulic_efficiency: float,
    leakage: float = 1.0,
    mechanical_efficiency: float = ORDINARY_MECHANICAL,
) -> LossBalance:
    """Efficiency from its losses.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]
    flow, head_per_stage : float
        Best efficiency point: total flow, head of one stage. [m³/s, m]
    speed_rpm : float
        Rotational speed. [1/min]
    diameter : float
        Outer diameter of the impeller. [m]
    viscosity, density : float
        Of the liquid. [m²/s, kg/m³]
    hydraulic_efficiency, mechanical_efficiency : float
        [fraction]
    leakage : float
        Leakage as a share of Gülich's for one seal.

    Returns
    -------
    LossBalance
        Efficiency and terms. [fraction]

    Raises
    ------
    OutOfRange
        Outside nq 7 to 100, or if a figure is not positive.

    Notes
    -----
    η = η_mech/[(1 + leak)/η_h + P_disc/P_hyd].
    Source: balance of power; disc friction Daily and Nece (1960), leakage Gülich Table 3.5
    Valid for: nq 7 to 100
    Mark: crossed

    Examples
    --------
    >>> loss_balance(nq=27.85, flow=130 / 3600, head_per_stage=55.0, speed_rpm=2960, diameter=0.214,
    ...              viscosity=1.0e-6, density=998.2, hydraulic_efficiency=0.9).efficiency
    0.8437
    """
    require_positive(flow=flow, head_per_stage=head_per_stage, hydraulic_efficiency=hydraulic_efficiency)
    leak = leakage * leakage_share(nq)
    useful = hydraulic_power(density, flow, head_per_stage)
    disc = disc_friction_power(density, speed_rpm, diameter, viscosity) / useful
    efficiency = mechanical_efficiency / ((1.0 + leak) / hydraulic_efficiency + disc)
    terms = {
        "hydraulic": 1.0 - hydraulic_efficiency,
        "leakage": leak,
        "disc friction": disc,
        "mechanical": 1.0 - mechanical_efficiency,
    }
    return LossBalance(efficiency, terms)


def loss_ceiling(
    *,
    nq: float,
    flow: float,
    head_per_stage: float,
    speed_rpm: float,
    diameter: float,
    viscosity: float,
    density: float,
) -> LossBalance:
    """Efficiency no pump of this duty and diameter can exceed.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]
    flow, head_per_stage : float
        Best efficiency point: total flow, head of one stage. [m³/s, m]
    speed_rpm : float
        Rotational speed. [1/min]
    diameter : float
        Offered outer diameter of the impeller. [m]
    viscosity, density : float
        Of the liquid. [m²/s, kg/m³]

    Returns
    -------
    LossBalance
        Efficiency and terms. [fraction]

    Raises
    ------
    OutOfRange
        Outside nq 7 to 100, or if a figure is not positive.

    Notes
    -----
    `loss_balance` with hydraulic efficiency 0.97, half the leakage, smooth discs, mechanical efficiency 0.995.
    Source: balance of power; disc friction Daily and Nece (1960), leakage Gülich Table 3.5
    Valid for: nq 7 to 100
    Mark: crossed

    Examples
    --------
    >>> loss_ceiling(nq=27.85, flow=130 / 3600, head_per_stage=55.0, speed_rpm=2960, diameter=0.214,
    ...              viscosity=1.0e-6, density=998.2).efficiency
    0.920
    """
    return loss_balance(
        nq=nq,
        flow=flow,
        head_per_stage=head_per_stage,
        speed_rpm=speed_rpm,
        diameter=diameter,
        viscosity=viscosity,
        density=density,
        hydraulic_efficiency=BEST_HYDRAULIC,
        leakage=BEST_LEAKAGE,
        mechanical_efficiency=BEST_MECHANICAL,
    )
