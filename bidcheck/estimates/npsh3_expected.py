"""NPSH3 an ordinary impeller needs, from suction specific speed."""

from typing import NamedTuple

from bidcheck.hydraulics.specific_speed import US_PER_METRIC
from bidcheck.hydraulics.suction import npsh3_from_suction_specific_speed
from bidcheck.quantity import Kind
from bidcheck.second_opinion import Source, SuctionEstimate

ORDINARY_NSS = 9000.0 / US_PER_METRIC
"""Ordinary suction specific speed, metric; 9000 US. Source: common practice, no source."""

LOWEST_NSS, HIGHEST_NSS = 7000.0 / US_PER_METRIC, 11_000.0 / US_PER_METRIC
"""Ordinary band, metric; 7000 to 11 000 US. Source: common practice, no source."""


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


def estimate_suction(
    speed_rpm: float, flow_per_eye: float, *, offered: float | None, growth: float | None, inducer: bool = False
) -> SuctionEstimate:
    """NPSH3 at best efficiency, offered and expected.

    Parameters
    ----------
    speed_rpm : float
        Rotational speed. [1/min]
    flow_per_eye : float
        Flow of one suction eye at best efficiency, maximum diameter. [m³/s]
    offered : float or None
        NPSH3 the bidder states there. [m]
    growth : float or None
        Exponent of flow with which it rises beyond best efficiency.
    inducer : bool
        Whether an inducer is offered; then the sources give nothing.

    Returns
    -------
    SuctionEstimate

    Raises
    ------
    OutOfRange
        If speed or flow is not positive.

    Notes
    -----
    As `expected_npsh3`.
    Source: common practice, no source, for the suction specific speeds
    Valid for: any positive figures, no inducer
    Mark: practice

    Examples
    --------
    >>> round(estimate_suction(2950, 110 / 3600, offered=3.0, growth=None).ordinary, 2)
    4.25
    """
    expected = expected_npsh3(speed_rpm, flow_per_eye)
    valid = "impellers without an inducer, best efficiency flow"
    values = (
        ("ordinary suction specific speed, 9000 US", expected.ordinary),
        ("high end of the ordinary band, 11 000 US", expected.low),
        ("low end of the ordinary band, 7000 US", expected.high),
    )
    sources = tuple(
        Source(
            name,
            None if inducer else value,
            valid,
            "an inducer is offered" if inducer else "",
            "practice",
            "common practice, no source",
            kind=Kind.NPSH,
        )
        for name, value in values
    )
    return SuctionEstimate(
        offered=offered,
        ordinary=expected.ordinary,
        low=expected.low,
        high=expected.high,
        growth=growth,
        sources=sources,
    )
