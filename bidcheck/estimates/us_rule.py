"""Minimum efficiency of clean-water pumps in the United States: 10 CFR 431 Subpart Y."""

import math
from collections.abc import Mapping
from typing import Literal

from bidcheck.arrangement import Arrangement
from bidcheck.hydraulics.ranges import require_inside
from bidcheck.hydraulics.specific_speed import FOOT, US_GALLON, specific_speed_us

UsClass = Literal["ESCC", "ESFM", "IL", "RSV", "ST"]
"""End suction close coupled, end suction frame mounted, in-line, radially split vertical, submersible turbine."""

# Source: 10 CFR 431.465: C by class and nominal speed
US_CONSTANTS: dict[tuple[UsClass, int], float] = {
    ("ESCC", 1800): 128.47,
    ("ESCC", 3600): 130.42,
    ("ESFM", 1800): 128.85,
    ("ESFM", 3600): 130.99,
    ("IL", 1800): 129.30,
    ("IL", 3600): 133.84,
    ("RSV", 1800): 129.63,
    ("RSV", 3600): 133.20,
    ("ST", 1800): 138.78,
    ("ST", 3600): 134.85,
}

US_CLASS: Mapping[Arrangement, UsClass] = {
    "end suction": "ESFM",
    "close coupled": "ESCC",
    "in-line": "IL",
    "vertical multistage": "RSV",
    "submersible multistage": "ST",
}
"""Class of the rule by arrangement. Source: 10 CFR 431.462, definitions."""

HORSEPOWER = 745.7
"""One horsepower [W]. Source: NIST SP 811."""

M3S_PER_GPM = US_GALLON / 60.0
"""US gallon per minute [m³/s]. Derived from the definition of the US gallon."""


def us_nominal_speed(speed_rpm: float) -> int:
    """Nominal speed of the rule, 1800 or 3600, nearest by ratio.

    Parameters
    ----------
    speed_rpm : float
        Rotational speed. [1/min]

    Returns
    -------
    int
        1800 or 3600.

    Notes
    -----
    Source: 10 CFR 431.464, nominal speeds
    Valid for: any positive speed
    Mark: text

    Examples
    --------
    >>> us_nominal_speed(1770), us_nominal_speed(2950)
    (1800, 3600)
    """
    return 1800 if speed_rpm < math.sqrt(1800.0 * 3600.0) else 3600


def us_minimum_efficiency(us_class: UsClass, nominal_rpm: int, nq: float, flow: float) -> float:
    """Efficiency at best efficiency point that the US rule takes as the least.

    Parameters
    ----------
    us_class : str
        Class of the rule.
    nominal_rpm : int
        1800 or 3600.
    nq : float
        Specific speed at nominal speed. [1/min, m³/s, m per stage]
    flow : float
        Best efficiency flow at nominal speed, from 25 US gpm. [m³/s]

    Returns
    -------
    float
        Efficiency; the rule itself judges a weighted index of three load points. [fraction]

    Raises
    ------
    OutOfRange
        Below 25 US gpm, or outside nq 8 to 80 and above 4403 US gpm, where this surface is that of the EU survey.

    Notes
    -----
    η = −0.85 ln²Q − 0.38 lnNs lnQ − 11.48 ln²Ns + 17.80 lnQ + 179.80 lnNs − (C + 555.6), per cent, US gpm, US Ns.
    Source: 80 FR 22939 of 24 April 2015; 10 CFR 431.464 and 431.465
    Valid for: 25 to 4403 US gpm (1000 m³/h), nq 8 to 80
    Mark: text

    Examples
    --------
    >>> us_minimum_efficiency("ESFM", 1800, nq=1500 / 51.645, flow=400 * M3S_PER_GPM)
    0.75965
    """
    require_inside("flow", flow / M3S_PER_GPM, 25.0, 1000.0 / 3600.0 / M3S_PER_GPM, unit="US gpm")
    require_inside("specific speed nq", nq, 8.0, 80.0)
    Q, Ns = math.log(flow / M3S_PER_GPM), math.log(specific_speed_us(nq))
    C = US_CONSTANTS[us_class, nominal_rpm]
    return (-0.85 * Q**2 - 0.38 * Ns * Q - 11.48 * Ns**2 + 17.80 * Q + 179.80 * Ns - (C + 555.6)) / 100.0


def outside_us_scope(
    us_class: UsClass,
    *,
    nq: float,
    flow: float,
    head: float,
    power: float | None = None,
    speed_rpm: float | None = None,
) -> str:
    """Reason why the US rule does not cover a clean-water pump of this class; empty where it does.

    Parameters
    ----------
    us_class : str
        Class of the rule.
    nq : float
        Specific speed. [1/min, m³/s, m per stage]
    flow, head : float
        Best efficiency point at nominal speed and full impeller. [m³/s, m]
    power : float or None
        Shaft power there. [W]
    speed_rpm : float or None
        Speed the pump is offered at. [1/min]

    Returns
    -------
    str
        The reason in words, or an empty string.

    Notes
    -----
    Source: 10 CFR 431.464: from 25 US gpm, to 459 ft, end suction to Ns 5000 US; 1 to 200 hp and speeds from memory
    Valid for: the classes of `US_CONSTANTS`
    Mark: text

    Examples
    --------
    >>> outside_us_scope("ESFM", nq=30.0, flow=1 / 3600, head=30.0)
    'flow is below 25 US gpm'
    """
    reasons = {
        "flow is below 25 US gpm": flow / M3S_PER_GPM < 25.0,
        "head is above 459 ft": head / FOOT > 459.0,
        "specific speed is above 5000 US": us_class in ("ESCC", "ESFM") and specific_speed_us(nq) > 5000.0,
    }
    if power is not None:
        reasons["shaft power is outside 1 to 200 hp"] = not HORSEPOWER <= power <= 200.0 * HORSEPOWER
    if speed_rpm is not None:
        reasons["speed is outside 1440 to 2160 and 2880 to 4320 1/min"] = not (
            1440.0 <= speed_rpm <= 2160.0 or 2880.0 <= speed_rpm <= 4320.0
        )
    return "; ".join(reason for reason, holds in reasons.items() if holds)
