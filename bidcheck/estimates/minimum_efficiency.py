"""Where a curve stands against two regulations of efficiency, over the load points both look at."""

from collections.abc import Sequence
from typing import NamedTuple

from bidcheck.estimates.market_surface import OVER_LOAD, PART_LOAD, MarketClass, market_share_below
from bidcheck.hydraulics.ranges import require_positive


class MinimumEfficiencyIndex(NamedTuple):
    """Index of a curve, and the number of load points behind it."""

    value: float
    points: int


def minimum_efficiency_index(
    market_class: MarketClass,
    *,
    nq: float,
    flow: float,
    best: float,
    part_load: float | None = None,
    over_load: float | None = None,
) -> MinimumEfficiencyIndex:
    """Minimum efficiency index (MEI) as far as a curve tells.

    Parameters
    ----------
    market_class : MarketClass
        Class of the regulation.
    nq : float
        Specific speed at best efficiency, full impeller. [1/min, m³/s, m per stage]
    flow : float
        Best efficiency flow at nominal speed. [m³/s]
    best, part_load, over_load : float, or None for the last two
        Efficiency at best efficiency flow, at 0.75 and at 1.10 of it. [fraction]

    Returns
    -------
    MinimumEfficiencyIndex
        The least of the load points given; an estimate where only best efficiency is.

    Raises
    ------
    OutOfRange
        Outside the range below.

    Notes
    -----
    Each load point gives the share of the surveyed market that is worse there, its efficiency divided by 0.947 at part
    load and 0.985 at over load; the pump has the least of them.
    Source: Regulation (EU) No 547/2012, Annex III; the two ratios from memory
    Valid for: 6 to 1000 m³/h at nominal speed, nq 8 to 80
    Mark: crossed

    Examples
    --------
    >>> from bidcheck.estimates.market_surface import ESOB_1450
    >>> round(minimum_efficiency_index(ESOB_1450, nq=30.0, flow=100 / 3600, best=0.7845, part_load=0.7429).value, 2)
    0.4
    """
    loads = ((best, 1.0), (part_load, PART_LOAD), (over_load, OVER_LOAD))
    shares = [market_share_below(market_class, eta / ratio, nq, flow) for eta, ratio in loads if eta is not None]
    return MinimumEfficiencyIndex(min(shares), len(shares))


class LoadPoint(NamedTuple):
    """One load point: flow over best efficiency flow, head over head at best efficiency, efficiency."""

    flow: float
    head: float
    efficiency: float


def power_over_minimum(least: float, loads: Sequence[LoadPoint]) -> float:
    """Shaft power over that of the least efficient pump allowed, mean of the load points.

    Parameters
    ----------
    least : float
        Least efficiency the rule allows at best efficiency. [fraction]
    loads : sequence of LoadPoint
        Load points at 0.75, 1 and 1.10 of best efficiency flow, or fewer where the curve does not reach.

    Returns
    -------
    float
        Above 1: the pump takes more power than the rule allows. The motor, which the rule includes, is left out.

    Raises
    ------
    OutOfRange
        If a figure is not positive.

    Notes
    -----
    Σ QH/η over Σ QH/(α η_least), α 0.947, 1 and 0.985 at 0.75, 1 and 1.10 of best efficiency flow.
    Source: from memory, 10 CFR 431.464 and its test procedure, bare pump, constant load
    Valid for: the classes and range of `us_minimum_efficiency`
    Mark: memory

    Examples
    --------
    >>> loads = [LoadPoint(0.75, 1.1, 0.74), LoadPoint(1.0, 1.0, 0.80), LoadPoint(1.1, 0.93, 0.78)]
    >>> round(power_over_minimum(0.78, loads), 3)
    0.986
    """
    own = allowed = 0.0
    for load in loads:
        require_positive(flow=load.flow, head=load.head, efficiency=load.efficiency)
        alpha = PART_LOAD if load.flow < 0.9 else (OVER_LOAD if load.flow > 1.05 else 1.0)
        own += load.flow * load.head / load.efficiency
        allowed += load.flow * load.head / (alpha * least)
    return own / allowed
