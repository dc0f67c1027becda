"""Friction of the outer sides of an impeller, as of a disc turning in a casing."""

import math

from bidcheck.hydraulics.ranges import require_positive

GAP_RATIO = 0.05
"""Gap between shroud and casing over impeller radius. Source: common practice, no source."""


def moment_coefficient(reynolds: float, gap_ratio: float = GAP_RATIO) -> float:
    """Moment coefficient of a smooth disc in a casing, both sides.

    Parameters
    ----------
    reynolds : float
        Re = ω r²/ν.
    gap_ratio : float
        Axial gap of one side over radius.

    Returns
    -------
    float
        C_M, the largest of the four regimes.

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    I 2π/(s Re), II 3.70 s^0.1/Re^0.5, III 0.080/(s^(1/6) Re^0.25), IV 0.102 s^0.1/Re^0.2.
    Source: Daily and Nece (1960), chamber dimension effects on induced flow and frictional resistance of enclosed discs
    Valid for: positive figures; smooth discs
    Mark: crossed

    Examples
    --------
    >>> moment_coefficient(3e6)
    0.00383
    """
    require_positive(Reynolds_number=reynolds, gap_ratio=gap_ratio)
    return max(
        2.0 * math.pi / (gap_ratio * reynolds),
        3.70 * math.pow(gap_ratio, 0.1) / math.sqrt(reynolds),
        0.080 / (math.pow(gap_ratio, 1.0 / 6.0) * math.pow(reynolds, 0.25)),
        0.102 * math.pow(gap_ratio, 0.1) / math.pow(reynolds, 0.2),
    )


def disc_friction_power(density: float, speed_rpm: float, diameter: float, viscosity: float) -> float:
    """Power lost in friction of the outer sides of one impeller.

    Parameters
    ----------
    density : float
        Density of the liquid. [kg/m³]
    speed_rpm : float
        Rotational speed. [1/min]
    diameter : float
        Outer diameter of the impeller. [m]
    viscosity : float
        Kinematic viscosity. [m²/s]

    Returns
    -------
    float
        Power of both sides together. [W]

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    P = 0.5 C_M ρ ω³ r⁵, gap 0.05 of the radius, smooth discs.
    Source: Daily and Nece (1960)
    Valid for: positive figures; smooth discs
    Mark: crossed

    Examples
    --------
    >>> disc_friction_power(998.2, speed_rpm=2960, diameter=0.214, viscosity=1.0e-6)
    771.9
    """
    require_positive(density=density, speed=speed_rpm, diameter=diameter, viscosity=viscosity)
    omega, radius = speed_rpm * math.pi / 30.0, diameter / 2.0
    coefficient = moment_coefficient(omega * radius**2 / viscosity)
    return 0.5 * coefficient * density * omega**3 * radius**5


def disc_friction_share(moment: float, head_coefficient: float, type_number: float) -> float:
    """Disc friction over hydraulic power in similarity numbers.

    Parameters
    ----------
    moment : float
        C_M of `moment_coefficient`.
    head_coefficient : float
        ψ of one stage.
    type_number : float
        Ω_s on total flow of the impeller.

    Returns
    -------
    float
        P_disc/P_hyd.

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    P_disc/P_hyd = 0.5 C_M (2/ψ)^2.5/Ω_s².
    Source: from Daily and Nece (1960) and the definitions of ψ and Ω_s
    Valid for: positive figures
    Mark: derived

    Examples
    --------
    >>> disc_friction_share(0.00383, head_coefficient=1.037, type_number=0.378)
    0.0692
    """
    require_positive(moment_coefficient=moment, head_coefficient=head_coefficient, type_number=type_number)
    return 0.5 * moment * math.pow(2.0 / head_coefficient, 2.5) / type_number**2
