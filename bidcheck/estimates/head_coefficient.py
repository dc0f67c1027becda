"""Head coefficient and impeller diameter a duty calls for."""

import math

import numpy as np

from bidcheck.hydraulics.constants import G
from bidcheck.hydraulics.ranges import require_inside, require_positive

LOWEST_NQ, HIGHEST_NQ = 7.0, 100.0
"""Range of specific speed for radial impellers, that of Gülich's Table 3.9."""

# Source: Cordier (1953) as quoted in the literature: type number, specific diameter of the best pumps
_CORDIER = (
    (0.3, 9.66),
    (0.4, 6.98),
    (0.5, 5.65),
    (0.6, 4.70),
    (0.7, 4.05),
    (0.8, 3.57),
    (0.9, 3.25),
    (1.0, 3.01),
    (2.0, 1.89),
    (3.0, 1.57),
    (4.0, 1.40),
    (5.0, 1.26),
)


def head_coefficient(head_per_stage: float, speed_rpm: float, diameter: float) -> float:
    """Head coefficient of an impeller.

    Parameters
    ----------
    head_per_stage : float
        Head of one stage. [m]
    speed_rpm : float
        Rotational speed. [1/min]
    diameter : float
        Outer diameter of the impeller. [m]

    Returns
    -------
    float
        ψ.

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    ψ = 2 g H/u₂², u₂ = π D n/60.
    Source: Gülich, Centrifugal Pumps, definition of the head coefficient
    Valid for: any positive figures
    Mark: crossed

    Examples
    --------
    >>> head_coefficient(55.0, speed_rpm=2960, diameter=0.2142)
    0.979
    """
    require_positive(head_per_stage=head_per_stage, speed=speed_rpm, diameter=diameter)
    return 2.0 * G * head_per_stage / (math.pi * diameter * speed_rpm / 60.0) ** 2


def optimum_head_coefficient(nq: float) -> float:
    """Head coefficient at best efficiency of an ordinary pump.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]

    Returns
    -------
    float
        ψ; 0.80 to 1.20 of it is plausible.

    Raises
    ------
    OutOfRange
        Outside nq 7 to 100.

    Notes
    -----
    ψ_opt = 1.21 e^(−0.77 nq/100).
    Source: Gülich, Centrifugal Pumps, equation 3.26
    Valid for: nq 7 to 100
    Mark: crossed

    Examples
    --------
    >>> optimum_head_coefficient(27.85)
    0.976
    """
    require_inside("specific speed nq", nq, LOWEST_NQ, HIGHEST_NQ)
    return 1.21 * math.exp(-0.77 * nq / 100.0)


def shutoff_head_coefficient(nq: float) -> float:
    """Head coefficient at shutoff of an ordinary pump.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]

    Returns
    -------
    float
        ψ at shutoff.

    Raises
    ------
    OutOfRange
        Outside nq 7 to 100.

    Notes
    -----
    ψ₀ = 1.31 e^(−0.3 nq/100).
    Source: from memory, Gülich, Centrifugal Pumps, chapter 3
    Valid for: nq 7 to 100
    Mark: memory

    Examples
    --------
    >>> shutoff_head_coefficient(30.0)
    1.197
    """
    require_inside("specific speed nq", nq, LOWEST_NQ, HIGHEST_NQ)
    return 1.31 * math.exp(-0.3 * nq / 100.0)


def diameter_for_head(head_per_stage: float, speed_rpm: float, coefficient: float) -> float:
    """Impeller diameter that gives a head at a head coefficient.

    Parameters
    ----------
    head_per_stage : float
        Head of one stage. [m]
    speed_rpm : float
        Rotational speed. [1/min]
    coefficient : float
        Head coefficient ψ.

    Returns
    -------
    float
        Outer diameter. [m]

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    D₂ = 60/(π n) √(2 g H/ψ).
    Source: Gülich, Centrifugal Pumps, definition of the head coefficient
    Valid for: any positive figures
    Mark: derived

    Examples
    --------
    >>> diameter_for_head(55.0, speed_rpm=2960, coefficient=0.976)
    0.2145
    """
    require_positive(head_per_stage=head_per_stage, speed=speed_rpm, head_coefficient=coefficient)
    return 60.0 / (math.pi * speed_rpm) * math.sqrt(2.0 * G * head_per_stage / coefficient)


def specific_diameter(diameter: float, head_per_stage: float, flow: float) -> float:
    """Specific diameter without dimension.

    Parameters
    ----------
    diameter : float
        Outer diameter of the impeller. [m]
    head_per_stage : float
        Head of one stage. [m]
    flow : float
        Flow at best efficiency. [m³/s]

    Returns
    -------
    float
        D_s.

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    D_s = D (g H)^0.25/√Q.
    Source: Cordier (1953), definition
    Valid for: any positive figures
    Mark: crossed

    Examples
    --------
    >>> specific_diameter(0.2144, head_per_stage=55.0, flow=130 / 3600)
    5.44
    """
    require_positive(diameter=diameter, head_per_stage=head_per_stage, flow=flow)
    return diameter * math.pow(G * head_per_stage, 0.25) / math.sqrt(flow)


def cordier_specific_diameter(type_number: float) -> float:
    """Specific diameter on the Cordier line.

    Parameters
    ----------
    type_number : float
        Type number Ω_s, without dimension.

    Returns
    -------
    float
        D_s of the best machines of that type number; for a comparison of ratios only.

    Raises
    ------
    OutOfRange
        Outside 0.3 to 5.

    Notes
    -----
    Straight lines between twelve readings in logarithms of both.
    Source: Cordier (1953), readings as quoted in the literature
    Valid for: type number 0.3 to 5
    Mark: crossed

    Examples
    --------
    >>> cordier_specific_diameter(0.5)
    5.65
    """
    require_inside("type number", type_number, 0.3, 5.0)
    numbers, diameters = np.log(_CORDIER).T
    return math.exp(float(np.interp(math.log(type_number), numbers, diameters)))


def cordier_ratio(diameter: float, head_per_stage: float, flow: float, speed_rpm: float) -> float:
    """Offered diameter over the diameter on the Cordier line.

    Parameters
    ----------
    diameter : float
        Outer diameter of the impeller. [m]
    head_per_stage : float
        Head of one stage. [m]
    flow : float
        Flow at best efficiency. [m³/s]
    speed_rpm : float
        Rotational speed. [1/min]

    Returns
    -------
    float
        Ratio; for information.

    Raises
    ------
    OutOfRange
        If a figure is not positive or the type number outside 0.3 to 5.

    Notes
    -----
    D_s/D_s(Cordier) at Ω_s = ω √Q/(g H)^0.75.
    Source: Cordier (1953)
    Valid for: type number 0.3 to 5
    Mark: crossed

    Examples
    --------
    >>> cordier_ratio(0.2144, head_per_stage=55.0, flow=130 / 3600, speed_rpm=2960)
    1.01
    """
    omega = speed_rpm * math.pi / 30.0
    number = omega * math.sqrt(flow) / math.pow(G * head_per_stage, 0.75)
    return specific_diameter(diameter, head_per_stage, flow) / cordier_specific_diameter(number)
