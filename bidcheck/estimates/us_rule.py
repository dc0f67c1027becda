"""Minimum efficiency of the US rule for clean water pumps, 10 CFR 431 Subpart Y: a floor, never a centre."""

import math

from bidcheck.errors import OutOfRange

CONSTANTS: dict[str, tuple[float, float]] = {
    "ESCC": (128.47, 130.42),
    "ESFM": (128.85, 130.99),
    "IL": (129.30, 133.84),
    "RSV": (129.63, 133.20),
    "ST": (138.78, 134.85),
}
"""C at nominal 1800 and 3600 rpm by class. Source: 10 CFR 431.465 (80 FR 22939 of 24 April 2015)."""


def us_minimum_efficiency(constant: float, ns_us: float, flow_gpm: float) -> float:
    """Efficiency of a pump that just meets the rule, at best efficiency.

    Parameters
    ----------
    constant : float
        C of the class and nominal speed, of `CONSTANTS`.
    ns_us : float
        Specific speed in US units.
    flow_gpm : float
        Flow at best efficiency and nominal speed. [US gpm]

    Returns
    -------
    float
        [fraction]

    Raises
    ------
    OutOfRange
        Below 25 US gpm.

    Notes
    -----
    η% = -0.85 ln²Q - 0.38 ln Ns ln Q - 11.48 ln²Ns + 17.80 ln Q + 179.80 ln Ns - (C + 555.6).
    Valid for: 25 US gpm and more, head to 459 ft.
    Source: 10 CFR 431.464; one printed copy shows C - 555.6, only the plus sign agrees with the EU surface.
    Mark: text

    Examples
    --------
    >>> us_minimum_efficiency(128.85, 1500.0, 400.0)
    0.75965
    """
    if flow_gpm < 25.0 * (1 - 1e-9) or ns_us <= 0:
        raise OutOfRange(f"asked at {flow_gpm:.4g} US gpm; the US rule covers 25 US gpm and more")
    q, s = math.log(flow_gpm), math.log(ns_us)
    percent = -0.85 * q * q - 0.38 * s * q - 11.48 * s * s + 17.80 * q + 179.80 * s - (constant + 555.6)
    return percent / 100.0
