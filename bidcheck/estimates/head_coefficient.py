"""Head coefficient and impeller diameter to be expected."""

import math

from bidcheck.errors import OutOfRange
from bidcheck.hydraulics.constants import GRAVITY


def best_head_coefficient(nq: float) -> float:
    """Head coefficient ψ at best efficiency to be expected.

    Parameters
    ----------
    nq : float
        Per eye and stage.

    Returns
    -------
    float
        ψ = 2 g H / u2².

    Raises
    ------
    OutOfRange
        If nq is not positive.

    Notes
    -----
    ψ = 1.21 e^(-0.77 nq/100).
    Source: Gülich, Centrifugal Pumps, eq. 3.26.
    Mark: crossed

    Examples
    --------
    >>> best_head_coefficient(27.85)
    0.976
    """
    if nq <= 0:
        raise OutOfRange("head coefficient needs a positive specific speed")
    return 1.21 * math.exp(-0.77 * nq / 100.0)


def impeller_diameter(head_per_stage: float, speed_rpm: float, head_coefficient: float) -> float:
    """Impeller diameter that makes a head with a head coefficient.

    Parameters
    ----------
    head_per_stage, speed_rpm, head_coefficient : float
        [m, 1/min, -]

    Returns
    -------
    float
        [m]

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    D2 = 60/(π n) √(2 g H / ψ).
    Source: definition of the head coefficient.
    Mark: derived

    Examples
    --------
    >>> impeller_diameter(55.0, 2960.0, 0.976)
    0.2145
    """
    if min(head_per_stage, speed_rpm, head_coefficient) <= 0:
        raise OutOfRange("impeller diameter needs positive figures")
    return 60.0 / (math.pi * speed_rpm) * math.sqrt(2.0 * GRAVITY * head_per_stage / head_coefficient)


def offered_head_coefficient(head_per_stage: float, speed_rpm: float, diameter: float) -> float:
    """Head coefficient of an offered diameter.

    Notes
    -----
    ψ = 2 g H / u2², u2 = π D n / 60.
    Source: definition of the head coefficient.
    Mark: derived

    Examples
    --------
    >>> offered_head_coefficient(55.0, 2960.0, 0.2145)
    0.976
    """
    if min(head_per_stage, speed_rpm, diameter) <= 0:
        raise OutOfRange("head coefficient needs positive figures")
    return 2.0 * GRAVITY * head_per_stage / (math.pi * diameter * speed_rpm / 60.0) ** 2
