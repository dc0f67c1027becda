"""Flow, head, power and NPSH3 of one pump at another speed."""

import math

from bidcheck.hydraulics.ranges import Numbers, require_inside, require_positive


def _ratio(speed_rpm: float, new_speed_rpm: float) -> float:
    """New speed over old."""
    require_positive(speed=speed_rpm, new_speed=new_speed_rpm)
    return new_speed_rpm / speed_rpm


def flow_at_speed(flow: Numbers, speed_rpm: float, new_speed_rpm: float) -> Numbers:
    """Scale flow to a new speed.

    Parameters
    ----------
    flow : float or array, shape (n,)
        Flow at `speed_rpm`. [m³/s]
    speed_rpm, new_speed_rpm : float
        Rotational speeds, positive. [1/min]

    Returns
    -------
    float or array, shape (n,)
        Flow at `new_speed_rpm`. [m³/s]

    Raises
    ------
    OutOfRange
        If a speed is not positive.

    Notes
    -----
    Q2 = Q1 n2/n1, for equal diameter and negligible effect of viscosity.
    Source: affinity laws; ISO 9906:2012, conversion to specified speed
    Valid for: any positive speeds; standards convert test results from 50 to 120 % of the speed
    Mark: text

    Examples
    --------
    >>> flow_at_speed(0.100, speed_rpm=1500, new_speed_rpm=1200)
    0.080
    """
    return flow * _ratio(speed_rpm, new_speed_rpm)


def head_at_speed(head: Numbers, speed_rpm: float, new_speed_rpm: float) -> Numbers:
    """Scale head to a new speed.

    Parameters
    ----------
    head : float or array, shape (n,)
        Head at `speed_rpm`. [m]
    speed_rpm, new_speed_rpm : float
        Rotational speeds, positive. [1/min]

    Returns
    -------
    float or array, shape (n,)
        Head at `new_speed_rpm`. [m]

    Raises
    ------
    OutOfRange
        If a speed is not positive.

    Notes
    -----
    H2 = H1 (n2/n1)², for equal diameter and negligible effect of viscosity.
    Source: affinity laws; ISO 9906:2012, conversion to specified speed
    Valid for: any positive speeds; standards convert test results from 50 to 120 % of the speed
    Mark: text

    Examples
    --------
    >>> head_at_speed(40.0, speed_rpm=1500, new_speed_rpm=1200)
    25.6
    """
    return head * _ratio(speed_rpm, new_speed_rpm) ** 2


def power_at_speed(power: Numbers, speed_rpm: float, new_speed_rpm: float) -> Numbers:
    """Scale power to a new speed.

    Parameters
    ----------
    power : float or array, shape (n,)
        Power at `speed_rpm`. [W]
    speed_rpm, new_speed_rpm : float
        Rotational speeds, positive. [1/min]

    Returns
    -------
    float or array, shape (n,)
        Power at `new_speed_rpm`. [W]

    Raises
    ------
    OutOfRange
        If a speed is not positive.

    Notes
    -----
    P2 = P1 (n2/n1)³, for equal efficiency and density.
    Source: affinity laws; ISO 9906:2012, conversion to specified speed
    Valid for: any positive speeds; standards convert test results from 50 to 120 % of the speed
    Mark: text

    Examples
    --------
    >>> power_at_speed(1000.0, speed_rpm=1500, new_speed_rpm=1200)
    512.0
    """
    return power * _ratio(speed_rpm, new_speed_rpm) ** 3


def npsh3_at_speed(npsh3: Numbers, speed_rpm: float, new_speed_rpm: float, exponent: float = 2.0) -> Numbers:
    """Scale NPSH3 to a new speed.

    Parameters
    ----------
    npsh3 : float or array, shape (n,)
        NPSH3 at `speed_rpm`. [m]
    speed_rpm, new_speed_rpm : float
        Rotational speeds, positive. [1/min]
    exponent : float
        1 to 2; `bidcheck.hydraulics.suction.npsh3_speed_exponent` gives it from flow over best efficiency flow.

    Returns
    -------
    float or array, shape (n,)
        NPSH3 at `new_speed_rpm`. [m]

    Raises
    ------
    OutOfRange
        If a speed is not positive or the exponent outside 1 to 2.

    Notes
    -----
    NPSH3 at the new speed = NPSH3 (n2/n1)^x, x = 2 for strict similarity, smaller in most tests.
    Source: affinity laws; ISO 9906:2012 lets x be 1.3 to 2 (from memory)
    Valid for: exponent 1 to 2
    Mark: memory

    Examples
    --------
    >>> npsh3_at_speed(4.0, speed_rpm=1500, new_speed_rpm=1200)
    2.56
    """
    require_inside("exponent of speed for NPSH3", exponent, 1.0, 2.0)
    factor: float = math.pow(_ratio(speed_rpm, new_speed_rpm), exponent)
    return npsh3 * factor
