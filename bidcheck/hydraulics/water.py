"""Saturated liquid water from 5 to 150 °C, IAPWS formulations."""

import math

from bidcheck.errors import OutOfRange

LOWEST, HIGHEST = 278.15, 423.15
"""Range of temperature served, 5 to 150 °C [K]."""

CRITICAL_TEMPERATURE, CRITICAL_DENSITY = 647.096, 322.0
"""Reference constants of IAPWS [K, kg/m³]. Source: IAPWS Release on critical constants."""

_SATURATION = (
    0.11670521452767e4,
    -0.72421316703206e6,
    -0.17073846940092e2,
    0.12020824702470e5,
    -0.32325550322333e7,
    0.14915108613530e2,
    -0.48232657361591e4,
    0.40511340542057e6,
    -0.23855557567849,
    0.65017534844798e3,
)
"""n1 to n10 of the saturation line. Source: IAPWS-IF97, region 4, Table 34."""

_DENSITY = (
    (1.99274064, 1 / 3),
    (1.09965342, 2 / 3),
    (-0.510839303, 5 / 3),
    (-1.75493479, 16 / 3),
    (-45.5170352, 43 / 3),
    (-6.74694450e5, 110 / 3),
)
"""Coefficients and exponents. Source: IAPWS SR1-86(1992), saturated liquid density, equation 2."""

_DILUTE = (1.67752, 2.20462, 0.6366564, -0.241605)
"""Dilute-gas viscosity. Source: IAPWS R12-08, Table 1."""

_DENSE = (
    (0, 0, 0.520094),
    (1, 0, 0.0850895),
    (2, 0, -1.08374),
    (3, 0, -0.289555),
    (0, 1, 0.222531),
    (1, 1, 0.999115),
    (2, 1, 1.88797),
    (3, 1, 1.26613),
    (5, 1, 0.120573),
    (0, 2, -0.281378),
    (1, 2, -0.906851),
    (2, 2, -0.772479),
    (3, 2, -0.489837),
    (4, 2, -0.257040),
    (0, 3, 0.161913),
    (1, 3, 0.257399),
    (0, 4, -0.0325372),
    (3, 4, 0.0698452),
    (4, 5, 0.00872102),
    (3, 6, -0.00435673),
    (5, 6, -0.000593264),
)
"""i, j and H of the finite-density factor of viscosity. Source: IAPWS R12-08, Table 2."""


def _in_range(temperature: float) -> None:
    """Refuse a temperature outside 5 to 150 °C."""
    if not LOWEST - 1e-9 <= temperature <= HIGHEST + 1e-9:
        raise OutOfRange(f"water asked at {temperature - 273.15:.4g} °C; the figures hold from 5 to 150 °C")


def water_vapour_pressure(temperature: float) -> float:
    """Vapour pressure of water.

    Parameters
    ----------
    temperature : float
        [K]

    Returns
    -------
    float
        [Pa absolute]

    Raises
    ------
    OutOfRange
        Outside 5 to 150 °C.

    Notes
    -----
    Saturation line, solved for pressure.
    Valid for: 5 to 150 °C.
    Source: IAPWS-IF97, region 4, equation 30.
    Mark: crossed

    Examples
    --------
    >>> water_vapour_pressure(293.15)
    2339.2
    """
    _in_range(temperature)
    n1, n2, n3, n4, n5, n6, n7, n8, n9, n10 = _SATURATION
    theta = temperature + n9 / (temperature - n10)
    A = theta**2 + n1 * theta + n2
    B = n3 * theta**2 + n4 * theta + n5
    C = n6 * theta**2 + n7 * theta + n8
    return float(1e6 * (2.0 * C / (-B + math.sqrt(B * B - 4.0 * A * C))) ** 4)


def water_density(temperature: float) -> float:
    """Density of saturated liquid water.

    Parameters
    ----------
    temperature : float
        [K]

    Returns
    -------
    float
        [kg/m³]

    Raises
    ------
    OutOfRange
        Outside 5 to 150 °C.

    Notes
    -----
    ρ/ρc = 1 + Σ b τ^e with τ = 1 - T/Tc.
    Valid for: 5 to 150 °C.
    Source: IAPWS SR1-86(1992), equation 2.
    Mark: crossed

    Examples
    --------
    >>> water_density(293.15)
    998.16
    """
    _in_range(temperature)
    tau = 1.0 - temperature / CRITICAL_TEMPERATURE
    return float(CRITICAL_DENSITY * (1.0 + math.fsum(b * tau**exponent for b, exponent in _DENSITY)))


def water_viscosity(temperature: float) -> float:
    """Kinematic viscosity of saturated liquid water.

    Parameters
    ----------
    temperature : float
        [K]

    Returns
    -------
    float
        [m²/s]

    Raises
    ------
    OutOfRange
        Outside 5 to 150 °C.

    Notes
    -----
    Dynamic viscosity at saturated density, without the critical enhancement, over density.
    Valid for: 5 to 150 °C.
    Source: IAPWS R12-08, equations 11 and 12.
    Mark: crossed

    Examples
    --------
    >>> 1e6 * water_viscosity(293.15)
    1.003
    """
    density = water_density(temperature)
    T, rho = temperature / CRITICAL_TEMPERATURE, density / CRITICAL_DENSITY
    dilute = 100.0 * math.sqrt(T) / math.fsum(h / T**i for i, h in enumerate(_DILUTE))
    dense = math.exp(rho * math.fsum(h * (1.0 / T - 1.0) ** i * (rho - 1.0) ** j for i, j, h in _DENSE))
    return float(dilute * dense * 1e-6 / density)
