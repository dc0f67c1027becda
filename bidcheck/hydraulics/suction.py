"""NPSH available, NPSH3 from suction specific speed, and what both depend on."""

import math

from bidcheck.errors import OutOfRange
from bidcheck.hydraulics.constants import STANDARD_AIR_PRESSURE, G
from bidcheck.hydraulics.ranges import require_inside, require_positive


def npsh_available(
    *, pressure: float, vapour_pressure: float, density: float, liquid_level: float, friction_loss: float
) -> float:
    """NPSH available at the datum of the pump.

    Parameters
    ----------
    pressure : float
        Absolute pressure on the liquid surface. [Pa]
    vapour_pressure : float
        Absolute vapour pressure at pumping temperature. [Pa]
    density : float
        Density at pumping temperature. [kg/m³]
    liquid_level : float
        Lowest level above the pump datum, negative for a suction lift. [m]
    friction_loss : float
        Loss of the suction line at the flow asked for, not negative. [m]

    Returns
    -------
    float
        NPSH available; negative where the liquid would boil. [m]

    Raises
    ------
    OutOfRange
        If pressure or density is not positive, or the loss or vapour pressure negative.

    Notes
    -----
    NPSHa = (p − p_vap)/(ρ g) + z − h_f; the velocity head at the surface is nil.
    Source: Hydraulic Institute 9.6.1; definition of NPSH
    Valid for: pressure and density above 0
    Mark: text

    Examples
    --------
    >>> npsh_available(
    ...     pressure=101325, vapour_pressure=2339.2, density=998.16, liquid_level=3.0, friction_loss=1.0
    ... )
    12.112
    """
    require_positive(pressure=pressure, density=density)
    if not (friction_loss >= 0 and vapour_pressure >= 0):
        raise OutOfRange("friction loss and vapour pressure must not be negative")
    return (pressure - vapour_pressure) / (density * G) + liquid_level - friction_loss


def friction_loss_at(friction_loss: float, rated_flow: float, flow: float) -> float:
    """Loss of a line at another flow.

    Parameters
    ----------
    friction_loss : float
        Loss at `rated_flow`. [m]
    rated_flow, flow : float
        Flow the loss is stated for, and the flow asked for. [m³/s]

    Returns
    -------
    float
        Loss at `flow`. [m]

    Raises
    ------
    OutOfRange
        If the rated flow is not positive or the flow negative.

    Notes
    -----
    h = h_rated (Q/Q_rated)².
    Source: common practice for turbulent flow, no source
    Valid for: turbulent flow
    Mark: practice

    Examples
    --------
    >>> friction_loss_at(1.0, rated_flow=0.1, flow=0.12)
    1.44
    """
    require_positive(rated_flow=rated_flow)
    if not flow >= 0:
        raise OutOfRange(f"flow must not be negative, found {flow:.6g}")
    return friction_loss * (flow / rated_flow) ** 2


def npsh3_from_suction_specific_speed(speed_rpm: float, flow_per_eye: float, nss: float) -> float:
    """NPSH3 that a suction specific speed stands for.

    Parameters
    ----------
    speed_rpm : float
        Rotational speed. [1/min]
    flow_per_eye : float
        Flow of one suction eye at best efficiency. [m³/s]
    nss : float
        Suction specific speed, metric. [1/min, m³/s, m]

    Returns
    -------
    float
        NPSH3 at best efficiency. [m]

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    NPSH3 = (n √Q_eye / Nss)^(4/3).
    Source: Hydraulic Institute data library, suction specific speed solved for NPSH3
    Valid for: any positive figures
    Mark: derived

    Examples
    --------
    >>> npsh3_from_suction_specific_speed(2950, flow_per_eye=110 / 3600, nss=226.2)
    3.00
    """
    require_positive(speed=speed_rpm, flow_per_eye=flow_per_eye, suction_specific_speed=nss)
    return math.pow(speed_rpm * math.sqrt(flow_per_eye) / nss, 4.0 / 3.0)


def npsh3_speed_exponent(flow_over_bep: float) -> float:
    """Exponent of speed in the scaling of NPSH3.

    Parameters
    ----------
    flow_over_bep : float
        Flow over best efficiency flow at the same speed, positive.

    Returns
    -------
    float
        1 at half flow, 1.5 at best efficiency, 2 at 1.3 times it, linear between; held at 1 below and 2 above.

    Raises
    ------
    OutOfRange
        If the ratio is not positive.

    Notes
    -----
    Source: published guidance on NPSH3 at reduced speed: 1 at half flow, 1.5 at best efficiency, 2 at 1.3 times it
    Valid for: flow over best efficiency flow above 0; the three readings are joined by straight lines
    Mark: text

    Examples
    --------
    >>> npsh3_speed_exponent(1.0)
    1.5
    """
    require_positive(flow_over_best_efficiency_flow=flow_over_bep)
    if flow_over_bep <= 1.0:
        return max(1.0, 1.0 + (flow_over_bep - 0.5))
    return min(2.0, 1.5 + 0.5 * (flow_over_bep - 1.0) / 0.3)


def air_pressure(altitude: float) -> float:
    """Pressure of the standard atmosphere.

    Parameters
    ----------
    altitude : float
        Height above sea level. [m]

    Returns
    -------
    float
        Absolute pressure. [Pa]

    Raises
    ------
    OutOfRange
        Outside −500 to 11 000 m.

    Notes
    -----
    p = 101 325 (1 − 2.25577·10⁻⁵ h)^5.25588.
    Source: ISO 2533:1975, standard atmosphere, lowest layer
    Valid for: −500 to 11 000 m
    Mark: crossed

    Examples
    --------
    >>> air_pressure(1000.0)
    89874.6
    """
    require_inside("altitude", altitude, -500.0, 11_000.0, unit="m")
    return STANDARD_AIR_PRESSURE * math.pow(1.0 - 2.25577e-5 * altitude, 5.25588)
