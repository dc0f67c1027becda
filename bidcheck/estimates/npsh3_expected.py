"""NPSH3 to be expected at ordinary suction specific speed."""

from bidcheck.hydraulics.constants import NS_PER_NQ
from bidcheck.hydraulics.suction import npsh3_of_suction_specific_speed

ORDINARY_NSS = 9000.0 / NS_PER_NQ
"""Ordinary suction specific speed, metric: 9000 US. Source: common practice, no source."""
BAND = (7000.0 / NS_PER_NQ, 11000.0 / NS_PER_NQ)
"""Ordinary band, 7000 to 11 000 US. Source: common practice, no source."""


def expected_npsh3(speed_rpm: float, flow_per_eye: float) -> float:
    """NPSH3 at best efficiency at ordinary suction specific speed.

    Parameters
    ----------
    speed_rpm, flow_per_eye : float
        [1/min, m³/s]

    Returns
    -------
    float
        [m]

    Notes
    -----
    NPSH3 = (n √Q / 9000 US)^(4/3).
    Source: common practice, no source.
    Mark: practice

    Examples
    --------
    >>> expected_npsh3(2950, 110 / 3600)
    4.25
    """
    return npsh3_of_suction_specific_speed(speed_rpm, flow_per_eye, ORDINARY_NSS)
