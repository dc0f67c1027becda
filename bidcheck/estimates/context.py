"""Estimates shown for context; they never decide a verdict."""

import math

from bidcheck.errors import OutOfRange


def corripio_efficiency(flow_gpm: float) -> float:
    """Efficiency by flow alone.

    Parameters
    ----------
    flow_gpm : float
        [US gpm]

    Returns
    -------
    float
        [fraction]

    Raises
    ------
    OutOfRange
        Outside 50 to 5000 US gpm.

    Notes
    -----
    η = -0.316 + 0.24015 ln Q - 0.01199 ln²Q.
    Valid for: 50 to 5000 US gpm.
    Source: Corripio, Chrien and Evans, Chemical Engineering 89 (1982).
    Mark: crossed

    Examples
    --------
    >>> corripio_efficiency(461.0)
    0.70589
    """
    if not 50.0 <= flow_gpm <= 5000.0:
        raise OutOfRange(f"asked at {flow_gpm:.4g} US gpm; holds from 50 to 5000 US gpm")
    q = math.log(flow_gpm)
    return -0.316 + 0.24015 * q - 0.01199 * q * q


def anderson_efficiency(nq: float, flow: float) -> float:
    """Statistical efficiency by flow and specific speed.

    Parameters
    ----------
    nq : float
    flow : float
        [m³/s]

    Returns
    -------
    float
        [fraction]

    Raises
    ------
    OutOfRange
        Outside 0.001 to 10 m³/s or nq 7 to 100, where others of its kind hold.

    Notes
    -----
    η = 0.94 - 0.048 Q^-0.32 - 0.29 [log10(nq/44)]².
    Valid for: 0.001 to 10 m³/s, nq 7 to 100 (range by common practice, no source).
    Source: Anderson, as printed in the Pump Handbook (from memory).
    Mark: memory

    Examples
    --------
    >>> anderson_efficiency(36.2, 0.2778)
    0.866
    """
    if not 0.001 <= flow <= 10.0 or not 7.0 <= nq <= 100.0:
        raise OutOfRange(f"asked at {3600 * flow:.4g} m³/h and nq {nq:.3g}")
    return float(0.94 - 0.048 * flow**-0.32 - 0.29 * math.log10(nq / 44.0) ** 2)
