"""The independent picture of efficiency at best efficiency: how the sources are combined.

nq per eye, flow total, head per stage throughout. Two spreads must not be confused: sigma is the spread of merit
between pumps on the market; the error of the estimate on one honest pump is about 1.6 to 2.7 points above 60 m³/h.
"""

import math

from bidcheck.case import EfficiencyEstimate, Source
from bidcheck.errors import OutOfRange
from bidcheck.estimates.efficiency_sources import (
    MULTISTAGE,
    Pump,
    chart_source,
    classes_of,
    context_sources,
    guelich_source,
    market_source,
)
from bidcheck.estimates.head_coefficient import best_head_coefficient, impeller_diameter
from bidcheck.estimates.loss_ceiling import LossBalance, efficiency_ceiling
from bidcheck.estimates.market_surface import (
    ESOB_1450,
    HIGHEST_FLOW,
    HIGHEST_NQ,
    LOWEST_FLOW,
    LOWEST_NQ,
    nominal_flow,
)

NO_EXPECTATION = ("solids handling", "vertical turbine", "sealless")
"""Arrangements of which nothing is said on the low side."""

FADE = 0.2
"""Share of the (logarithmic) range of the survey over which it gives way to Gülich's formula."""
FADE_IN = 0.3
"""Span of ln Q above 18 m³/h over which Gülich's formula comes in."""
LEAST_FLOW = 6.0 / 3600.0
"""Below this nothing is judged [m³/s]."""
SMALL_FLOW = 18.0 / 3600.0
NARROW_NQ = 12.0


def _edge(value: float, low: float, high: float, lower_edge: bool) -> float:
    """1 inside a range, falling to 0 over its last fifth (logarithmic) at the upper and, if asked, the lower edge."""
    span = FADE * math.log(high / low)
    top = math.log(high / value) / span
    bottom = math.log(value / low) / span if lower_edge else math.inf
    return min(max(min(top, bottom), 0.0), 1.0)


def _ceiling(pump: Pump) -> LossBalance | None:
    """Loss ceiling at the offered diameter, else at the diameter of 1.2 times the usual head coefficient."""
    try:
        diameter = pump.diameter or impeller_diameter(
            pump.head_per_stage, pump.speed_rpm, 1.2 * best_head_coefficient(pump.nq_eye)
        )
        return efficiency_ceiling(
            nq=pump.nq_eye,
            flow=pump.flow,
            head_per_stage=pump.head_per_stage,
            speed_rpm=pump.speed_rpm,
            diameter=diameter,
            viscosity=pump.viscosity,
        )
    except OutOfRange:
        return None


def _survey_weight(pump: Pump) -> float:
    """How much the survey counts against Gülich's formula, 1 inside its range and 0 at its edges."""
    weights = []
    for one in classes_of(pump):
        flow = nominal_flow(pump.flow, pump.speed_rpm, one.nominal_speed_rpm)
        if not LOWEST_FLOW <= flow <= HIGHEST_FLOW or not LOWEST_NQ <= pump.nq_eye <= HIGHEST_NQ:
            return 0.0
        by_flow = _edge(flow, LOWEST_FLOW, HIGHEST_FLOW, lower_edge=False)
        weights.append(min(by_flow, _edge(pump.nq_eye, LOWEST_NQ, HIGHEST_NQ, lower_edge=True)))
    return min(weights, default=0.0)


def _offset(pump: Pump) -> float:
    """How far the class lies below Gülich's formula [fraction]; double suction as end suction of 1450 1/min."""
    classes = classes_of(pump) or (ESOB_1450,)
    return math.fsum(one.offset for one in classes) / len(classes) / 100.0


def _expected(pump: Pump, market: Source, guelich: Source) -> tuple[float | None, str, float]:
    """Expected value, where it comes from, and the weight of the survey in it."""
    if pump.arrangement in NO_EXPECTATION:
        return None, "", 0.0
    shifted = None if guelich.value is None else guelich.value - _offset(pump)
    if market.value is None:
        if shifted is None:
            return None, "", 0.0
        return shifted, f"{guelich.name}, less the mean distance of the class", 0.0
    if shifted is None:
        return market.value, market.name, 1.0
    weight = _survey_weight(pump)
    arrived = min(max(math.log(pump.flow / SMALL_FLOW) / FADE_IN, 0.0), 1.0)
    share = 1.0 - arrived * (1.0 - weight)
    value = share * market.value + (1.0 - share) * shifted
    if share == 1.0:
        return value, market.name, 1.0
    return value, f"{market.name}, giving way to {guelich.name} near the edge of the survey", share


def _sigma(pump: Pump) -> float | None:
    """Spread of merit on the market [fraction]; double suction is given that of end suction."""
    if pump.arrangement in NO_EXPECTATION:
        return None
    classes = classes_of(pump) or (ESOB_1450,)
    return math.fsum(one.sigma for one in classes) / len(classes) / 100.0


def estimate_efficiency(
    *,
    arrangement: str,
    nq: float,
    nq_eye: float,
    flow: float,
    head_per_stage: float,
    speed_rpm: float,
    diameter: float | None = None,
    viscosity: float = 1.0e-6,
) -> EfficiencyEstimate:
    """Combine the independent sources into one picture of efficiency at best efficiency.

    Parameters
    ----------
    arrangement : str
        One of `bidcheck.bid.ARRANGEMENTS`.
    nq, nq_eye : float
        Specific speed for total flow and per suction eye, head per stage.
    flow : float
        Total flow at best efficiency. [m³/s]
    head_per_stage, speed_rpm : float
        [m, 1/min]
    diameter : float, optional
        Impeller diameter the curve belongs to. [m]
    viscosity : float
        Kinematic viscosity of the liquid the curve is for. [m²/s]

    Returns
    -------
    EfficiencyEstimate
        Every source with its range, and the thresholds; a reason where nothing can be judged.

    Notes
    -----
    Expected c: middle of the surveyed market inside its range, outside it Gülich less the mean distance of the class.
    Attainable A: the chart, never below Gülich. Implausible above A + 0.25 (1 - A); remark above
    c + 1.64 max(0.025, 0.15 (1 - c)); remark below c - 1.28 σ, query below c - 2 σ.
    Valid for: 6 m³/h and more.
    Source: Regulation (EU) 547/2012; Gülich Table 3.9; Hydraulic Institute chart; combination derived.
    Mark: derived

    Examples
    --------
    >>> estimate = estimate_efficiency(
    ...     arrangement="end suction", nq=27.85, nq_eye=27.85, flow=130 / 3600, head_per_stage=55.0, speed_rpm=2960
    ... )
    >>> round(estimate.expected, 4), round(estimate.attainable, 4)
    (0.7785, 0.85)
    """
    pump = Pump(arrangement, nq, nq_eye, flow, head_per_stage, speed_rpm, diameter, viscosity)
    market, guelich, chart = market_source(pump), guelich_source(pump), chart_source(pump)
    sources = (market, guelich, chart, *context_sources(pump))
    if flow < LEAST_FLOW:
        return _nothing(sources, f"best efficiency flow {3600 * flow:.3g} m³/h is below 6 m³/h, where no source holds")
    c, origin, weight = _expected(pump, market, guelich)
    attainable = None if chart.value is None else max(chart.value, guelich.value or 0.0)
    balance = _ceiling(pump)
    if c is None and attainable is None and balance is None:
        return _nothing(sources, "flow and specific speed lie outside the range of every source")
    sigma = _sigma(pump) if c is not None else None
    classes = classes_of(pump)
    return EfficiencyEstimate(
        sources=sources,
        market_class=" and ".join(one.name for one in classes) if weight > 0.0 else "",
        expected=c,
        expected_from=origin,
        attainable=attainable,
        ceiling=None if balance is None else balance.efficiency,
        ceiling_terms={} if balance is None else {"leakage": balance.leakage, "disc_friction": balance.disc_friction},
        sigma=sigma,
        implausible_above=None if attainable is None else attainable + 0.25 * (1.0 - attainable),
        remark_above=None if c is None else c + 1.64 * max(0.025, 0.15 * (1.0 - c)),
        remark_below=None if c is None or sigma is None else c - 1.28 * sigma,
        query_below=None if c is None or sigma is None else c - 2.0 * sigma,
        lenient_low=flow < SMALL_FLOW or nq_eye < NARROW_NQ or arrangement in (*MULTISTAGE, *NO_EXPECTATION),
        reason="",
    )


def _nothing(sources: tuple[Source, ...], reason: str) -> EfficiencyEstimate:
    """An estimate that refuses to judge."""
    return EfficiencyEstimate(
        sources=sources,
        market_class="",
        expected=None,
        expected_from="",
        attainable=None,
        ceiling=None,
        ceiling_terms={},
        sigma=None,
        implausible_above=None,
        remark_above=None,
        remark_below=None,
        query_below=None,
        lenient_low=True,
        reason=reason,
    )
