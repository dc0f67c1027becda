"""Specific speed and suction specific speed."""

import math

from bidcheck.errors import OutOfRange
from bidcheck.hydraulics.constants import NQ_PER_TYPE_NUMBER, NS_PER_NQ


def specific_speed(speed_rpm: float, flow: float, head_per_stage: float) -> float:
    """Specific speed nq.

    Parameters
    ----------
    speed_rpm : float
        Rotational speed. [1/min]
    flow : float
        Flow at best efficiency; of the pump, or of one suction eye: say which. [m³/s]
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
    Source: Hydraulic Institute data library, specific speed.
    Mark: text

    Examples
    --------
    >>> specific_speed(3550, 0.0402, 100.0)
    22.508
    """
    if speed_rpm <= 0 or flow <= 0 or head_per_stage <= 0:
        raise OutOfRange("specific speed needs positive speed, flow and head")
    return float(speed_rpm * math.sqrt(flow) / head_per_stage**0.75)


def specific_speed_us(nq: float) -> float:
    """US specific speed Ns (rpm, US gpm, ft) of nq.

    Notes
    -----
    Ns = 51.645 nq.
    Source: derived from the units.
    Mark: derived

    Examples
    --------
    >>> specific_speed_us(22.508)
    1162.4
    """
    return NS_PER_NQ * nq


def type_number(nq: float) -> float:
    """Type number K of nq.

    Notes
    -----
    K = nq / 52.919.
    Source: ISO 9906:2012, definition of the type number; derived.
    Mark: derived

    Examples
    --------
    >>> type_number(52.919)
    1.0
    """
    return nq / NQ_PER_TYPE_NUMBER


def suction_specific_speed(speed_rpm: float, flow_per_eye: float, npsh3: float) -> float:
    """Suction specific speed, metric.

    Parameters
    ----------
    speed_rpm : float
        Rotational speed. [1/min]
    flow_per_eye : float
        Flow at best efficiency through one suction eye. [m³/s]
    npsh3 : float
        NPSH3 there, at maximum diameter. [m]

    Returns
    -------
    float
        In 1/min, m³/s, m; times 51.645 in US units.

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    Nss = n √Q / NPSH3^0.75.
    Source: Hydraulic Institute data library, suction specific speed.
    Mark: text

    Examples
    --------
    >>> suction_specific_speed(2950, 110 / 3600, 3.0)
    226.2
    """
    if speed_rpm <= 0 or flow_per_eye <= 0 or npsh3 <= 0:
        raise OutOfRange("suction specific speed needs positive speed, flow and NPSH3")
    return float(speed_rpm * math.sqrt(flow_per_eye) / npsh3**0.75)
