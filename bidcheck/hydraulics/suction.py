"""NPSH available, and how NPSH3 goes with suction specific speed and altitude."""

from bidcheck.errors import OutOfRange
from bidcheck.hydraulics.constants import GRAVITY


def npsh_available(
    *, pressure: float, vapour_pressure: float, density: float, liquid_level: float, friction_loss: float
) -> float:
    """NPSH available at the pump datum.

    Parameters
    ----------
    pressure, vapour_pressure : float
        On the liquid in the suction vessel, and of the liquid. [Pa absolute]
    density : float
        [kg/m³]
    liquid_level : float
        Above the pump datum, negative below. [m]
    friction_loss : float
        In the suction line, at the flow asked. [m]

    Returns
    -------
    float
        [m]

    Notes
    -----
    NPSHA = (p - p_v) / (ρ g) + z - h_f.
    Source: definition of NPSH, ISO 17769-1.
    Mark: text

    Examples
    --------
    >>> npsh_available(
    ...     pressure=101325, vapour_pressure=2339.2, density=998.16, liquid_level=3.0, friction_loss=1.0
    ... )
    12.112
    """
    return (pressure - vapour_pressure) / (density * GRAVITY) + liquid_level - friction_loss


def npsh3_of_suction_specific_speed(speed_rpm: float, flow_per_eye: float, nss: float) -> float:
    """NPSH3 that a suction specific speed implies.

    Parameters
    ----------
    speed_rpm, flow_per_eye : float
        [1/min, m³/s]
    nss : float
        Metric suction specific speed.

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
    NPSH3 = (n √Q / Nss)^(4/3).
    Source: derived from the definition of suction specific speed.
    Mark: derived

    Examples
    --------
    >>> npsh3_of_suction_specific_speed(2950, 110 / 3600, 9000 / 51.645)
    4.25
    """
    if speed_rpm <= 0 or flow_per_eye <= 0 or nss <= 0:
        raise OutOfRange("NPSH3 needs positive speed, flow and suction specific speed")
    return float((speed_rpm * flow_per_eye**0.5 / nss) ** (4.0 / 3.0))


def air_pressure(altitude: float) -> float:
    """Air pressure of the standard atmosphere.

    Parameters
    ----------
    altitude : float
        Above sea level. [m]

    Returns
    -------
    float
        [Pa absolute]

    Raises
    ------
    OutOfRange
        Above the troposphere.

    Notes
    -----
    p = 101 325 (1 - 2.25577e-5 h)^5.25588.
    Valid for: -500 to 11 000 m.
    Source: ISO 2533 standard atmosphere.
    Mark: text

    Examples
    --------
    >>> air_pressure(1000.0)
    89874.6
    """
    if not -500.0 <= altitude <= 11000.0:
        raise OutOfRange(f"air pressure asked at {altitude:.0f} m; the formula holds from -500 to 11 000 m")
    return float(101325.0 * (1.0 - 2.25577e-5 * altitude) ** 5.25588)
