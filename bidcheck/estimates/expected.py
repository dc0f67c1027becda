"""Expected efficiency c of an honest, ordinary pump of a class: the market survey inside its range, Gülich's statistics
less the class's own distance outside it, and a fade between the two so that c has no step.

How the fade is laid: the weight w of the survey is 1 inside, and falls to 0 in the logarithm of the figure over the
last fifth of the range at its ends: from 800 to 1000 m³/h at nominal speed, from nq 64 to 80, from nq 10 to 8. Gülich's
table starts at 18 m³/h; its part grows from nothing there to full at 22.5 m³/h, and outside the survey it serves alone
only from 22.5 m³/h: c may be absent, but never steps from one source to the other.
"""

import math
from typing import NamedTuple

from bidcheck.arrangement import Arrangement
from bidcheck.errors import OutOfRange
from bidcheck.estimates import guelich, market_surface
from bidcheck.estimates.market_surface import (
    ESCC_1450,
    ESCC_2900,
    ESCCI_1450,
    ESCCI_2900,
    ESOB_1450,
    ESOB_2900,
    MSS_2900,
    MSV_2900,
    MarketClass,
    market_median,
    nominal_flow,
)

FADE = 0.8
"""The last fifth of a range: from 0.8 of its upper end, or to 1/0.8 of its lower end."""

# Source: derived: mean distance of the median surface from Gülich's table, points, on an even grid of logarithms over
# nq 12 to 75, 18 to 1000 m³/h; multistage nq 12 to 60, 18 to 200 m³/h
CLASS_OFFSET: dict[MarketClass, float] = {
    ESOB_1450: 0.018,
    ESOB_2900: 0.038,
    ESCC_1450: 0.023,
    ESCC_2900: 0.043,
    ESCCI_1450: 0.061,
    ESCCI_2900: 0.071,
    MSV_2900: 0.069,
    MSS_2900: 0.014,
}

_BY_ARRANGEMENT: dict[Arrangement, tuple[MarketClass, ...]] = {
    "end suction": (ESOB_1450, ESOB_2900),
    "close coupled": (ESCC_1450, ESCC_2900),
    "in-line": (ESCCI_1450, ESCCI_2900),
    "vertical multistage": (MSV_2900,),
    "submersible multistage": (MSS_2900,),
}

MULTISTAGE: tuple[Arrangement, ...] = ("horizontal multistage", "vertical multistage", "submersible multistage")


class Expected(NamedTuple):
    """Expected efficiency and what it rests on.

    Attributes
    ----------
    value : float or None
        Expected efficiency c at best efficiency. [fraction]
    origin : str
        Where c comes from, in words, or why there is none.
    classes : tuple of MarketClass
        Classes of the survey used; two where their mean is taken, empty where none fits.
    median : float or None
        Median of the classes by the survey alone, None outside its range or without a class. [fraction]
    reason : str
        Why the survey gives nothing; empty where it does.
    spread : float or None
        Spread of merit, that of the classes; of end suction at 1450 rpm for double suction. [fraction]
    """

    value: float | None
    origin: str
    classes: tuple[MarketClass, ...]
    median: float | None
    reason: str
    spread: float | None


def market_classes(arrangement: Arrangement, speed_rpm: float, stages: int = 1) -> tuple[MarketClass, ...]:
    """Classes of the market survey a pump belongs to.

    Parameters
    ----------
    arrangement : str
        Arrangement of the bid.
    speed_rpm : float
        Rotational speed, 50 or 60 Hz; the nominal speed nearest by ratio is taken. [1/min]
    stages : int
        Number of stages.

    Returns
    -------
    tuple of MarketClass
        One class; two for horizontal multistage pumps, whose mean is taken; none where the survey holds no such pump.

    Notes
    -----
    Source: Regulation (EU) No 547/2012, Article 2 and Annex III; the mean for horizontal multistage pumps is derived
    Valid for: any arrangement
    Mark: derived

    Examples
    --------
    >>> [market_class.name for market_class in market_classes("end suction", 1770)]
    ['end suction own bearings, 1450 rpm']
    """
    if arrangement == "horizontal multistage":
        return (MSV_2900, MSS_2900)
    if stages > 1 and arrangement not in MULTISTAGE:
        return ()
    classes = _BY_ARRANGEMENT.get(arrangement, ())
    return tuple(sorted(classes, key=lambda one: abs(math.log(speed_rpm / one.nominal_rpm)))[:1])


def table_efficiency(nq_eye: float, flow: float, multistage: bool) -> float:
    """Gülich's efficiency in the form that fits the number of stages.

    Parameters
    ----------
    nq_eye : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]
    flow : float
        Total flow. [m³/s]
    multistage : bool
        Whether the multistage form applies.

    Returns
    -------
    float
        Efficiency. [fraction]

    Raises
    ------
    OutOfRange
        Below 18 m³/h or outside nq 7 to 100.

    Notes
    -----
    Source: Gülich, Centrifugal Pumps, Table 3.9
    Valid for: from 18 m³/h, nq 7 to 100
    Mark: crossed

    Examples
    --------
    >>> table_efficiency(20.0, 0.010, multistage=False)
    0.6870
    """
    form = guelich.guelich_multistage if multistage else guelich.guelich_single_stage
    return form(nq_eye, flow)


def _ramp(value: float, zero: float, one: float) -> float:
    """0 at `zero` and beyond, 1 at `one` and beyond, linear in the logarithm between."""
    return min(1.0, max(0.0, math.log(value / zero) / math.log(one / zero)))


def survey_weight(nq: float, flow: float) -> float:
    """Weight of the market survey in the expected efficiency.

    Parameters
    ----------
    nq : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]
    flow : float
        Flow at nominal speed. [m³/s]

    Returns
    -------
    float
        1 inside the survey, 0 outside, between over the last fifth of its range.

    Notes
    -----
    Product of ramps in the logarithm: 6 to 7.5 and 1000 to 800 m³/h, nq 8 to 10 and 80 to 64.
    Source: the rule that the expected efficiency has no step
    Valid for: any positive figures
    Mark: derived

    Examples
    --------
    >>> survey_weight(30.0, 100 / 3600), survey_weight(30.0, 1000 / 3600)
    (1.0, 0.0)
    """
    low, high = market_surface.LOWEST_FLOW, market_surface.HIGHEST_FLOW
    least, most = market_surface.LOWEST_NQ, market_surface.HIGHEST_NQ
    flow_part = _ramp(3600.0 * flow, low, low / FADE) * _ramp(3600.0 * flow, high, high * FADE)
    return flow_part * _ramp(nq, least, least / FADE) * _ramp(nq, most, most * FADE)


def _mean(values: list[float]) -> float:
    """Arithmetic mean."""
    return sum(values) / len(values)


def _no_class(arrangement: Arrangement, nq_eye: float, flow: float, stages: int) -> Expected:
    """Expected efficiency where the survey holds no such pump."""
    if arrangement != "double suction" or stages > 1:
        what = f"{arrangement} pumps" if stages == 1 else f"{arrangement} pumps of {stages} stages"
        return Expected(None, f"no expected efficiency for {what}", (), None, f"the survey holds no {what}", None)
    reason = "the survey holds no double suction pumps"
    try:
        table = table_efficiency(nq_eye, flow, multistage=False)
    except OutOfRange as error:
        return Expected(None, f"no expected efficiency: {error}", (), None, reason, None)
    origin = "Gülich, Table 3.9, per suction eye, less the mean distance of end suction pumps at 1450 rpm (1.8 points)"
    return Expected(table - CLASS_OFFSET[ESOB_1450], origin, (), None, reason, ESOB_1450.sigma)


def _median(classes: tuple[MarketClass, ...], nq: float, flow: float, speed_rpm: float) -> tuple[float | None, str]:
    """Median of the survey, or None with the reason."""
    try:
        return _mean([market_median(one, nq, nominal_flow(one, flow, speed_rpm)) for one in classes]), ""
    except OutOfRange as error:
        return None, str(error)


def _outside(classes: tuple[MarketClass, ...], nq: float, flow: float, multistage: bool) -> tuple[float | None, str]:
    """Gülich less the distance of the classes, or None with the reason."""
    try:
        return table_efficiency(nq, flow, multistage) - _mean([CLASS_OFFSET[one] for one in classes]), ""
    except OutOfRange as error:
        return None, str(error)


def expected_efficiency(
    *, arrangement: Arrangement, nq_eye: float, flow: float, speed_rpm: float, stages: int = 1
) -> Expected:
    """Efficiency expected of an honest, ordinary pump of this arrangement, size and speed.

    Parameters
    ----------
    arrangement : str
        Arrangement of the bid.
    nq_eye : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]
    flow : float
        Best efficiency flow, total. [m³/s]
    speed_rpm : float
        Rotational speed. [1/min]
    stages : int
        Number of stages.

    Returns
    -------
    Expected
        The value, or None with the reason.

    Notes
    -----
    c = w·median + (1 − w)·(Gülich − distance of the class) with the weight w of `survey_weight`; for double suction
    pumps Gülich per eye less the distance of end suction pumps at 1450 rpm throughout.
    Source: Regulation (EU) No 547/2012, Annex III, and Gülich, Centrifugal Pumps, Table 3.9
    Valid for: from 6 m³/h at nominal speed inside nq 8 to 80; above 1000 m³/h and to nq 7 and 100 from 22.5 m³/h
    Mark: derived

    Examples
    --------
    >>> expected_efficiency(arrangement="end suction", nq_eye=27.85, flow=130 / 3600, speed_rpm=2960).value
    0.778
    """
    classes = market_classes(arrangement, speed_rpm, stages)
    if not classes:
        return _no_class(arrangement, nq_eye, flow, stages)
    spread = _mean([one.sigma for one in classes])
    median, reason = _median(classes, nq_eye, flow, speed_rpm)
    table, table_reason = _outside(classes, nq_eye, flow, arrangement in MULTISTAGE)
    weight = survey_weight(nq_eye, nominal_flow(classes[0], flow, speed_rpm)) if median is not None else 0.0
    start = guelich.LOWEST_FLOW
    part = _ramp(3600.0 * flow, start, start / FADE) if table is not None else 0.0
    less = 100.0 * _mean([CLASS_OFFSET[one] for one in classes])
    beyond = f"Gülich, Table 3.9, less the mean distance of the class ({less:.1f} points)"
    if median is None:
        if table is None or part < 1.0:
            why = table_reason or "between 18 and 22.5 m³/h Gülich's table serves only beside the survey"
            return Expected(None, f"no expected efficiency: {reason}; {why}", classes, None, reason, None)
        return Expected(table, beyond, classes, None, reason, spread)
    if table is None or weight == 1.0 or part == 0.0:
        return Expected(median, "median of the market survey", classes, median, "", spread)
    blend = (1.0 - weight) * part
    origin = f"median of the market survey ({100 * (1 - blend):.0f} %) fading into {beyond}"
    return Expected((1.0 - blend) * median + blend * table, origin, classes, median, "", spread)
