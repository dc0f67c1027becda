"""Water at saturation: density, vapour pressure and viscosity from temperature, 5 to 150 °C.

Pump liquids named "water" take their properties from here. Pressure changes the density of liquid water by about
0.005 % per bar, which no pump test resolves, so the values at saturation serve at any pressure of the trade.
"""

import math

from bidcheck.errors import OutOfRange

LOWEST, HIGHEST = 278.15, 423.15
"""Range of temperature served: 5 to 150 °C [K]."""

CRITICAL_TEMPERATURE, CRITICAL_DENSITY = 647.096, 322.0
"""Critical point of water [K, kg/m³]. Source: IAPWS release on the critical point, 1992."""

# Source: IAPWS-IF97 (2007), region 4, Table 34: coefficients n1 to n10 of the saturation line
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

# Source: IAPWS SR1-86(1992), equation 2: saturated liquid density; (b, three times the exponent of 1 - T/Tc)
_LIQUID_DENSITY = (
    (1.99274064, 1),
    (1.09965342, 2),
    (-0.510839303, 5),
    (-1.75493479, 16),
    (-45.5170352, 43),
    (-6.74694450e5, 110),
)

# Source: IAPWS R12-08 (2008), Table 1: coefficients of the viscosity in the limit of zero density
_DILUTE_VISCOSITY = (1.67752, 2.20462, 0.6366564, -0.241605)

# Source: IAPWS R12-08 (2008), Table 2: (i, j, H_ij) of the contribution of density
_DENSITY_VISCOSITY = (
    (0, 0, 5.20094e-1),
    (1, 0, 8.50895e-2),
    (2, 0, -1.08374),
    (3, 0, -2.89555e-1),
    (0, 1, 2.22531e-1),
    (1, 1, 9.99115e-1),
    (2, 1, 1.88797),
    (3, 1, 1.26613),
    (5, 1, 1.20573e-1),
    (0, 2, -2.81378e-1),
    (1, 2, -9.06851e-1),
    (2, 2, -7.72479e-1),
    (3, 2, -4.89837e-1),
    (4, 2, -2.57040e-1),
    (0, 3, 1.61913e-1),
    (1, 3, 2.57399e-1),
    (0, 4, -3.25372e-2),
    (3, 4, 6.98452e-2),
    (4, 5, 8.72102e-3),
    (3, 6, -4.35673e-3),
    (5, 6, -5.93264e-4),
)


def _check_temperature(temperature: float) -> None:
    """Refuse what is outside 5 to 150 °C, with a hair for conversions."""
    if not LOWEST - 1e-6 <= temperature <= HIGHEST + 1e-6:
        raise OutOfRange(
            f"properties of water are known here from 5 to 150 °C, asked at {temperature - 273.15:.6g} °C; "
            "give density, viscosity and vapour_pressure"
        )


def water_vapour_pressure(temperature: float) -> float:
    """Vapour pressure of water.

    Parameters
    ----------
    temperature : float
        Temperature. [K]

    Returns
    -------
    float
        Absolute pressure at which water boils. [Pa]

    Raises
    ------
    OutOfRange
        Outside 278.15 to 423.15 K.

    Notes
    -----
    p = [2C/(−B + √(B² − 4AC))]⁴ MPa, with A, B, C quadratic in θ = T + n9/(T − n10).
    Source: IAPWS-IF97 (2007), region 4, equation 30 and Table 34
    Valid for: 5 to 150 °C
    Mark: crossed

    Examples
    --------
    >>> water_vapour_pressure(293.15)
    2339.21
    """
    _check_temperature(temperature)
    n1, n2, n3, n4, n5, n6, n7, n8, n9, n10 = _SATURATION
    theta = temperature + n9 / (temperature - n10)
    A = theta**2 + n1 * theta + n2
    B = n3 * theta**2 + n4 * theta + n5
    C = n6 * theta**2 + n7 * theta + n8
    return float(1e6 * (2 * C / (-B + math.sqrt(B**2 - 4 * A * C))) ** 4)


def water_density(temperature: float) -> float:
    """Density of saturated liquid water.

    Parameters
    ----------
    temperature : float
        Temperature. [K]

    Returns
    -------
    float
        Density. [kg/m³]

    Raises
    ------
    OutOfRange
        Outside 278.15 to 423.15 K.

    Notes
    -----
    ρ/ρc = 1 + Σ b (1 − T/Tc)^e, six terms. Agrees with IAPWS-IF97 within 0.003 % from 5 to 150 °C.
    Source: IAPWS SR1-86(1992), saturated liquid density, equation 2 (Wagner and Pruss 1993)
    Valid for: 5 to 150 °C
    Mark: crossed

    Examples
    --------
    >>> water_density(293.15)
    998.16
    """
    _check_temperature(temperature)
    tau = 1.0 - temperature / CRITICAL_TEMPERATURE
    return CRITICAL_DENSITY * (1.0 + sum(b * math.pow(tau, third / 3.0) for b, third in _LIQUID_DENSITY))


def water_viscosity(temperature: float) -> float:
    """Kinematic viscosity of saturated liquid water.

    Parameters
    ----------
    temperature : float
        Temperature. [K]

    Returns
    -------
    float
        Kinematic viscosity. [m²/s]

    Raises
    ------
    OutOfRange
        Outside 278.15 to 423.15 K.

    Notes
    -----
    μ = μ0(T) μ1(T, ρ) in µPa·s at the density of saturation; ν = μ/ρ. The enhancement near the critical point is left
    out: below 150 °C it is nil.
    Source: IAPWS R12-08 (2008), equations 10 to 12, Tables 1 and 2
    Valid for: 5 to 150 °C
    Mark: crossed

    Examples
    --------
    >>> 1e6 * water_viscosity(293.15)
    1.003
    """
    density = water_density(temperature)
    T, rho = temperature / CRITICAL_TEMPERATURE, density / CRITICAL_DENSITY
    dilute = 100.0 * math.sqrt(T) / sum(h / T**i for i, h in enumerate(_DILUTE_VISCOSITY))
    dense = math.exp(rho * sum(h * (1.0 / T - 1.0) ** i * (rho - 1.0) ** j for i, j, h in _DENSITY_VISCOSITY))
    return float(dilute * dense * 1e-6 / density)
