"""Efficiency of the market surveyed for Regulation (EU) 547/2012, by class, specific speed and flow.

The regulation publishes for each class the constant C that 10 % and 40 % of the surveyed pumps do not reach; the
two define a normal distribution of efficiency points about the surface. The survey is older than the floor of 2015.
"""

import math
from dataclasses import dataclass

from bidcheck.errors import OutOfRange

Z_10, Z_40 = -1.2815515655446004, -0.2533471031357997
"""Standard normal quantiles of 10 and 40 %."""


@dataclass(frozen=True, slots=True)
class MarketClass:
    """One class of the survey: published constants, in points. Speed is the nominal one [1/min]."""

    name: str
    nominal_speed_rpm: float
    c_10: float
    c_40: float
    offset: float
    """Mean distance of Gülich's efficiency above this class's median [points]; derived, used outside the survey."""

    @property
    def sigma(self) -> float:
        """Spread of the market about the surface [points]; derived from the two constants."""
        return (self.c_10 - self.c_40) / (Z_40 - Z_10)

    def constant(self, mei: float) -> float:
        """C of a minimum efficiency index between 0 and 1: the share of the market that is worse."""
        if not 0.0 < mei < 1.0:
            raise OutOfRange(f"minimum efficiency index {mei} asked, it lies between 0 and 1")
        from scipy.special import ndtri

        if mei in (0.1, 0.4):
            return self.c_10 if mei == 0.1 else self.c_40
        return self.c_40 - (float(ndtri(mei)) - Z_40) * self.sigma

    @property
    def median(self) -> float:
        """C of the middle of the market; derived."""
        return self.c_40 + Z_40 * self.sigma


ESOB_1450 = MarketClass("end suction own bearings, 1450 1/min", 1450.0, 132.58, 128.07, 1.8)
ESOB_2900 = MarketClass("end suction own bearings, 2900 1/min", 2900.0, 135.60, 130.27, 3.8)
ESCC_1450 = MarketClass("end suction close coupled, 1450 1/min", 1450.0, 132.74, 128.46, 2.3)
ESCC_2900 = MarketClass("end suction close coupled, 2900 1/min", 2900.0, 135.93, 130.77, 4.3)
ESCCI_1450 = MarketClass("end suction close coupled in-line, 1450 1/min", 1450.0, 136.67, 132.30, 6.1)
ESCCI_2900 = MarketClass("end suction close coupled in-line, 2900 1/min", 2900.0, 139.45, 133.69, 7.1)
MSV_2900 = MarketClass("vertical multistage, 2900 1/min", 2900.0, 138.19, 133.95, 6.9)
MSS_2900 = MarketClass("submersible multistage, 2900 1/min", 2900.0, 134.31, 128.79, 1.4)
CLASSES = (ESOB_1450, ESOB_2900, ESCC_1450, ESCC_2900, ESCCI_1450, ESCCI_2900, MSV_2900, MSS_2900)
"""Source: Regulation (EU) No 547/2012, Annex III, C-values at MEI 0.10 and 0.40; offsets derived."""

LOWEST_FLOW, HIGHEST_FLOW = 6.0 / 3600.0, 1000.0 / 3600.0
"""Flow at nominal speed in which the surface is used [m³/s]; above it the surface peaks and falls, pumps do not."""
LOWEST_NQ, HIGHEST_NQ = 8.0, 80.0
"""Specific speed in which the surface is used."""

PART_LOAD, OVER_LOAD = 0.947, 0.985
"""Efficiency at 75 and 110 % of best efficiency flow over that at best efficiency. Source: from memory."""


def nominal_flow(flow: float, speed_rpm: float, nominal_speed_rpm: float) -> float:
    """Flow of the same pump at nominal speed, at constant specific speed. [m³/s]

    Notes
    -----
    Q' = Q n_nominal / n.
    Source: affinity laws.
    Mark: derived

    Examples
    --------
    >>> 3600 * nominal_flow(1000 / 3600, 1480, 1450)
    979.7
    """
    return flow * nominal_speed_rpm / speed_rpm


def market_efficiency(market_class: MarketClass, mei: float, nq: float, flow: float) -> float:
    """Best efficiency that a share `mei` of the surveyed market does not reach.

    Parameters
    ----------
    market_class : MarketClass
    mei : float
        Minimum efficiency index; 0.5 is the middle of the market.
    nq : float
        Specific speed per stage and eye.
    flow : float
        Flow at best efficiency, at nominal speed. [m³/s]

    Returns
    -------
    float
        [fraction]

    Raises
    ------
    OutOfRange
        Outside the range.

    Notes
    -----
    η% = 88.59 x + 13.46 y - 11.48 x² - 0.85 y² - 0.38 x y - C, x = ln nq, y = ln Q in m³/h.
    Valid for: 6 to 1000 m³/h at nominal speed, nq 8 to 80, full impeller, clean cold water.
    Source: Regulation (EU) No 547/2012, Annex III.
    Mark: text

    Examples
    --------
    >>> market_efficiency(ESOB_1450, 0.40, 30.0, 100 / 3600)
    0.7845
    """
    hair = 1e-9
    inside = LOWEST_FLOW * (1 - hair) <= flow <= HIGHEST_FLOW * (1 + hair)
    if not inside or not LOWEST_NQ * (1 - hair) <= nq <= HIGHEST_NQ * (1 + hair):
        raise OutOfRange(
            f"market survey asked at {3600 * flow:.4g} m³/h and nq {nq:.3g}; it is used for 6 to 1000 m³/h, nq 8 to 80"
        )
    C = market_class.median if mei == 0.5 else market_class.constant(mei)
    return surface(nq, flow) - C / 100.0


def surface(nq: float, flow: float) -> float:
    """The common surface before C is taken off, no range checked. [fraction]"""
    x, y = math.log(nq), math.log(3600.0 * flow)
    return (88.59 * x + 13.46 * y - 11.48 * x**2 - 0.85 * y**2 - 0.38 * x * y) / 100.0
