"""Specific speed, type number and suction specific speed."""

import math

from bidcheck.hydraulics.constants import G
from bidcheck.hydraulics.ranges import require_positive

US_GALLON = 231 * 0.0254**3
"""US gallon, 231 cubic inches [m³]. Source: definition."""

FOOT = 0.3048
"""Foot [m]. Source: definition."""

US_PER_METRIC = math.sqrt(60.0 / US_GALLON) / math.pow(1.0 / FOOT, 0.75)
"""Ns (rpm, US gpm, ft) over nq (1/min, m³/s, m) = √15850.3 / 3.28084^0.75 = 51.645. Derived from the definitions."""

NQ_PER_TYPE_NUMBER = 60.0 / (2.0 * math.pi) * math.pow(G, 0.75)
"""nq over type number K = 60/(2π) g^0.75 = 52.919. Derived from the definitions."""


def specific_speed(speed_rpm: float, flow: float, head_per_stage: float) -> float:
    """Specific speed nq.

    Parameters
    ----------
    speed_rpm : float
        Rotational speed. [1/min]
    flow : float
        Flow at best efficiency, total or per suction eye: the basis of the result, to be printed with it. [m³/s]
    head_per_stage : float
        Head of one stage at best efficiency. [m]

    Returns
    -------
    float
        nq in 1/min, m³/s, m.

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    nq = n √Q / H^0.75, at best efficiency and maximum diameter.
    Source: Hydraulic Institute data library, specific speed
    Valid for: any positive figures
    Mark: text

    Examples
    --------
    >>> specific_speed(3550, flow=0.0402, head_per_stage=100.0)
    22.508
    """
    require_positive(speed=speed_rpm, flow=flow, head_per_stage=head_per_stage)
    return speed_rpm * math.sqrt(flow) / math.pow(head_per_stage, 0.75)


def specific_speed_us(nq: float) -> float:
    """Specific speed, or suction specific speed, in US units.

    Parameters
    ----------
    nq : float
        Metric figure. [1/min, m³/s, m]

    Returns
    -------
    float
        The same in rpm, US gpm, ft.

    Notes
    -----
    1 m³/s = 60/(231·0.0254³) = 15 850.3 US gpm and 1 m = 1/0.3048 = 3.28084 ft, so that
    Ns = √15850.3/3.28084^0.75 nq = 51.645 nq.
    Source: definitions of the US gallon (231 cubic inches) and of the foot (0.3048 m)
    Valid for: any figure
    Mark: derived

    Examples
    --------
    >>> specific_speed_us(20.0)
    1032.9
    """
    return US_PER_METRIC * nq


def type_number(nq: float) -> float:
    """Type number K, specific speed without dimension.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m]

    Returns
    -------
    float
        K, also written Ω_s.

    Notes
    -----
    K = ω √Q / (g H)^0.75 = nq/52.919.
    Source: ISO 9906:2012, type number K
    Valid for: any figure
    Mark: derived

    Examples
    --------
    >>> type_number(52.919)
    1.0000
    """
    return nq / NQ_PER_TYPE_NUMBER


def suction_specific_speed(speed_rpm: float, flow_per_eye: float, npsh3: float) -> float:
    """Suction specific speed, metric.

    Parameters
    ----------
    speed_rpm : float
        Rotational speed. [1/min]
    flow_per_eye : float
        Flow of one suction eye at best efficiency, maximum diameter. [m³/s]
    npsh3 : float
        NPSH3 at that flow. [m]

    Returns
    -------
    float
        Nss in 1/min, m³/s, m; `specific_speed_us` gives it in US units.

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    Nss = n √Q_eye / NPSH3^0.75.
    Source: Hydraulic Institute data library, suction specific speed
    Valid for: any positive figures
    Mark: text

    Examples
    --------
    >>> suction_specific_speed(2950, flow_per_eye=110 / 3600, npsh3=3.0)
    226.2
    """
    require_positive(speed=speed_rpm, flow_per_eye=flow_per_eye, npsh3=npsh3)
    return speed_rpm * math.sqrt(flow_per_eye) / math.pow(npsh3, 0.75)
