"""NPSH3 an ordinary impeller needs, from suction specific speed."""

from typing import NamedTuple

from bidcheck.hydraulics.specific_speed import US_PER_METRIC
from bidcheck.hydraulics.suction import npsh3_from_suction_specific_speed

ORDINARY_NSS = 9000.0 / US_PER_METRIC
"""Ordinary suction specific speed, metric; 9000 US. Source: common practice, no source."""

LOWEST_NSS, HIGHEST_NSS = 7000.0 / US_PER_METRIC, 11_000.0 / US_PER_METRIC
"""Ordinary band, metric; 7000 to 11 000 US. Source: common practice, no source."""

SUSPICIOUS_NSS, POOR_NSS = 13_000.0 / US_PER_METRIC, 6000.0 / US_PER_METRIC
"""Above the first a claim is suspicious, below the second poor or wrong, metric; 13 000 and 6000 US.
Source: common practice, no source."""


class ExpectedNpsh3(NamedTuple):
    """NPSH3 at best efficiency [m]: ordinary, and the ordinary band from its low to its high end."""

    ordinary: float
    low: float
    high: float


def expected_npsh3(speed_rpm: float, flow_per_eye: float) -> ExpectedNpsh3:
    """NPSH3 at best efficiency of a pump with an ordinary impeller eye, without an inducer.

    Parameters
    ----------
    speed_rpm : float
        Rotational speed. [1/min]
    flow_per_eye : float
        Flow of one suction eye at best efficiency, maximum diameter. [m³/s]

    Returns
    -------
    ExpectedNpsh3
        At 9000 US, and at the ends of the ordinary band, 11 000 and 7000 US.

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    NPSH3 = (n √Q_eye/Nss)^(4/3).
    Source: common practice, no source, for the suction specific speeds
    Valid for: any positive figures
    Mark: practice

    Examples
    --------
    >>> expected_npsh3(2950, flow_per_eye=110 / 3600).ordinary
    4.25
    """
    return ExpectedNpsh3(
        npsh3_from_suction_specific_speed(speed_rpm, flow_per_eye, ORDINARY_NSS),
        npsh3_from_suction_specific_speed(speed_rpm, flow_per_eye, HIGHEST_NSS),
        npsh3_from_suction_specific_speed(speed_rpm, flow_per_eye, LOWEST_NSS),
    )
