"""Market survey behind Regulation (EU) No 547/2012: efficiency by class, specific speed and flow."""

import math
from dataclasses import dataclass

from bidcheck.hydraulics.ranges import require_inside, require_positive

LOWEST_FLOW, HIGHEST_FLOW = 6.0, 1000.0
"""Range of flow at nominal speed within which the surface serves as an estimate [m³/h]: it peaks near 1030 m³/h (nq 80)
and falls beyond, which pumps do not. Lower end: scope of the regulation."""

LOWEST_NQ, HIGHEST_NQ = 8.0, 80.0
"""Range of specific speed within which the surface serves as an estimate. Upper end: scope of the regulation."""

Z_10, Z_40 = -1.2815516, -0.2533471
"""Quantiles of the normal distribution at 0.10 and 0.40."""

PART_LOAD, OVER_LOAD = 0.947, 0.985
"""Efficiency at 0.75 and 1.10 of best efficiency flow over best efficiency. Source: from memory, (EU) No 547/2012."""


@dataclass(frozen=True, slots=True)
class MarketClass:
    """One row of the regulation's table: a kind of pump at a nominal speed.

    `c10` and `c40` are the constants C published for a minimum efficiency index (MEI) of 0.10 and 0.40, in points.
    """

    name: str
    nominal_rpm: float
    c10: float
    c40: float

    @property
    def sigma(self) -> float:
        """Spread of merit between the pumps surveyed, standard deviation. [fraction]"""
        return (self.c10 - self.c40) / (Z_40 - Z_10) / 100.0

    @property
    def c_median(self) -> float:
        """Constant C of the median pump surveyed. [points]"""
        return self.c40 + 100.0 * Z_40 * self.sigma


# Source: Regulation (EU) No 547/2012, Annex III: nominal speed and C at MEI 0.10 and 0.40
ESOB_1450 = MarketClass("end suction own bearings, 1450 rpm", 1450, 132.58, 128.07)
ESOB_2900 = MarketClass("end suction own bearings, 2900 rpm", 2900, 135.60, 130.27)
ESCC_1450 = MarketClass("end suction close coupled, 1450 rpm", 1450, 132.74, 128.46)
ESCC_2900 = MarketClass("end suction close coupled, 2900 rpm", 2900, 135.93, 130.77)
ESCCI_1450 = MarketClass("end suction close coupled in-line, 1450 rpm", 1450, 136.67, 132.30)
ESCCI_2900 = MarketClass("end suction close coupled in-line, 2900 rpm", 2900, 139.45, 133.69)
MSV_2900 = MarketClass("vertical multistage, 2900 rpm", 2900, 138.19, 133.95)
MSS_2900 = MarketClass("submersible multistage, 2900 rpm", 2900, 134.31, 128.79)

MARKET_CLASSES = (ESOB_1450, ESOB_2900, ESCC_1450, ESCC_2900, ESCCI_1450, ESCCI_2900, MSV_2900, MSS_2900)


def nominal_flow(market_class: MarketClass, flow: float, speed_rpm: float) -> float:
    """Flow of the similar pump at the class's nominal speed.

    Parameters
    ----------
    market_class : MarketClass
    flow : float
        Best efficiency flow at `speed_rpm`. [m³/s]
    speed_rpm : float
        Rotational speed, 50 or 60 Hz. [1/min]

    Returns
    -------
    float
        Q' = Q n_nominal/n, at equal specific speed. [m³/s]

    Raises
    ------
    OutOfRange
        If flow or speed is not positive.

    Notes
    -----
    The same pump at n_nominal: flow in proportion to speed, specific speed unchanged.
    Source: affinity laws
    Valid for: any positive figures
    Mark: derived

    Examples
    --------
    >>> 3600 * nominal_flow(ESOB_1450, 100 / 3600, 1750)
    82.86
    """
    require_positive(flow=flow, speed=speed_rpm)
    return flow * market_class.nominal_rpm / speed_rpm


def _surface(nq: float, flow: float, c: float) -> float:
    """Second-degree surface of the regulation. [fraction]"""
    require_inside("flow at nominal speed", flow, LOWEST_FLOW, HIGHEST_FLOW, unit="m³/h", factor=3600.0)
    require_inside("specific speed nq", nq, LOWEST_NQ, HIGHEST_NQ)
    x, y = math.log(nq), math.log(3600.0 * flow)
    return (88.59 * x + 13.46 * y - 11.48 * x**2 - 0.85 * y**2 - 0.38 * x * y - c) / 100.0


def _quantile(share: float) -> float:
    """Quantile of the normal distribution; the published shares need no import."""
    if share in (0.10, 0.40):
        return Z_10 if share == 0.10 else Z_40
    from statistics import NormalDist

    return NormalDist().inv_cdf(share)


def market_efficiency(market_class: MarketClass, mei: float, nq: float, flow: float) -> float:
    """Efficiency below which a share `mei` of the surveyed market lies.

    Parameters
    ----------
    market_class : MarketClass
    mei : float
        Share of the market that is worse, which is the meaning of the minimum efficiency index; 0.01 to 0.99.
    nq : float
        Specific speed at best efficiency, full impeller. [1/min, m³/s, m per stage]
    flow : float
        Best efficiency flow at nominal speed, see `nominal_flow`. [m³/s]

    Returns
    -------
    float
        Efficiency at best efficiency point, clean cold water. [fraction]

    Raises
    ------
    OutOfRange
        Outside the range below.

    Notes
    -----
    η = 88.59 x + 13.46 y − 11.48 x² − 0.85 y² − 0.38 x y − C in per cent, x = ln nq, y = ln Q in m³/h;
    C at other shares than 0.10 and 0.40 from the normal distribution through these two.
    Source: Regulation (EU) No 547/2012, Annex III
    Valid for: 6 to 1000 m³/h at nominal speed, nq 8 to 80, share 0.01 to 0.99
    Mark: text

    Examples
    --------
    >>> market_efficiency(ESOB_1450, 0.40, nq=30.0, flow=100 / 3600)
    0.7845
    """
    require_inside("share of the market", mei, 0.01, 0.99)
    c = market_class.c40 + 100.0 * market_class.sigma * (Z_40 - _quantile(mei))
    return _surface(nq, flow, c)


def market_median(market_class: MarketClass, nq: float, flow: float) -> float:
    """Efficiency of the median pump of the surveyed market.

    Parameters
    ----------
    market_class : MarketClass
    nq : float
        Specific speed at best efficiency, full impeller. [1/min, m³/s, m per stage]
    flow : float
        Best efficiency flow at nominal speed. [m³/s]

    Returns
    -------
    float
        Efficiency at best efficiency point. [fraction]

    Raises
    ------
    OutOfRange
        Outside the range below.

    Notes
    -----
    `market_efficiency` at a share of 0.5. The survey is older than the floor of 2015.
    Source: Regulation (EU) No 547/2012, Annex III, with C of the median from the two published ones
    Valid for: 6 to 1000 m³/h at nominal speed, nq 8 to 80
    Mark: derived

    Examples
    --------
    >>> market_median(ESOB_1450, nq=30.0, flow=100 / 3600)
    0.7956
    """
    return _surface(nq, flow, market_class.c_median)


def market_share_below(market_class: MarketClass, efficiency: float, nq: float, flow: float) -> float:
    """Share of the surveyed market with a lower efficiency at the same specific speed and flow.

    Parameters
    ----------
    market_class : MarketClass
    efficiency : float
        Efficiency at best efficiency point. [fraction]
    nq : float
        Specific speed. [1/min, m³/s, m per stage]
    flow : float
        Best efficiency flow at nominal speed. [m³/s]

    Returns
    -------
    float
        Share; an estimate of the minimum efficiency index, which is defined on three load points together. [fraction]

    Raises
    ------
    OutOfRange
        Outside the range below.

    Notes
    -----
    Φ((η − median)/σ).
    Source: Regulation (EU) No 547/2012, Annex III, normal distribution through the two published C
    Valid for: 6 to 1000 m³/h at nominal speed, nq 8 to 80
    Mark: derived

    Examples
    --------
    >>> market_share_below(ESOB_1450, 0.7845, nq=30.0, flow=100 / 3600)
    0.40
    """
    z = (efficiency - market_median(market_class, nq, flow)) / market_class.sigma
    return 0.5 * (1.0 + math.erf(z / math.sqrt(2.0)))


def outside_eu_scope(market_class: MarketClass, *, nq: float, flow: float, head: float, power: float) -> str:
    """Reason why the regulation does not cover a water pump of this class; empty where it does.

    Parameters
    ----------
    market_class : MarketClass
    nq : float
        Specific speed, full impeller. [1/min, m³/s, m per stage]
    flow, head : float
        Best efficiency point at nominal speed. [m³/s, m]
    power : float
        Shaft power there. [W]

    Returns
    -------
    str
        The reason in words, or an empty string. The liquid, clean water from −10 to 120 °C, is not looked at here.

    Notes
    -----
    Source: Regulation (EU) No 547/2012, Articles 1 and 2; vertical multistage to 100 m³/h from memory
    Valid for: the classes of `MARKET_CLASSES`
    Mark: text

    Examples
    --------
    >>> outside_eu_scope(ESOB_1450, nq=30.0, flow=100 / 3600, head=30.0, power=11e3)
    ''
    """
    highest_head = 90.0 if market_class.nominal_rpm < 2000 else 140.0
    end_suction = market_class not in (MSV_2900, MSS_2900)
    reasons = {
        "specific speed is outside nq 6 to 80": not 6.0 <= nq <= 80.0,
        "flow is below 6 m³/h": 3600.0 * flow < 6.0,
        "flow is above 100 m³/h": market_class is MSV_2900 and 3600.0 * flow > 100.0,
        "shaft power is above 150 kW": power > 150e3,
        f"head is above {highest_head:g} m": end_suction and head > highest_head,
    }
    return "; ".join(reason for reason, holds in reasons.items() if holds)
