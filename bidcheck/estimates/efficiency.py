"""The independent picture of efficiency for one best efficiency point: what to expect, what is attainable, what the
losses forbid, and from where on a claim is worth a remark or a query.

Specific speed is taken per suction eye, flow in total, head per stage throughout; the attainable efficiency alone also
looks at the specific speed of total flow and keeps the more generous.
"""

import math
from typing import NamedTuple

from bidcheck.arrangement import Arrangement
from bidcheck.errors import OutOfRange
from bidcheck.estimates.expected import MULTISTAGE, expected_efficiency
from bidcheck.estimates.loss_ceiling import LossBalance
from bidcheck.estimates.shape import Shape, attainable_of, ceiling_of
from bidcheck.estimates.sources import efficiency_sources
from bidcheck.hydraulics.ranges import inside, require_positive
from bidcheck.second_opinion import EfficiencyEstimate

LEAST_FLOW = 6.0
"""Flow below which nothing is judged [m³/h]. Source: scope of Regulation (EU) No 547/2012."""

IMPLAUSIBLE_SHARE = 0.25
"""Share of the losses left at the attainable efficiency beyond which a claim is implausible. Source: common practice,
no source."""

REMARK_HIGH_Z, REMARK_LOW_Z, QUERY_LOW_Z = 1.64, 1.28, 2.0
"""Normal quantiles of one in twenty, one in ten and one in forty-four. Source: normal distribution."""

LEAST_ERROR, ERROR_SHARE = 0.025, 0.15
"""Error of the expected efficiency on the high side: the larger of 2.5 points and 0.15 of 1 − c. Derived from the
scatter of the sources about one another."""

SMALL_FLOW, NARROW_NQ = 18.0, 12.0
"""Below this flow [m³/h] or specific speed a low efficiency is ordinary. Source: common practice, no source."""

_LENIENT: tuple[Arrangement, ...] = ("solids handling", "sealless", "vertical turbine", *MULTISTAGE)


def error_of_estimate(expected: float) -> float:
    """Error of the expected efficiency on one honest pump, on the high side.

    Parameters
    ----------
    expected : float
        c. [fraction]

    Returns
    -------
    float
        The larger of 2.5 points and 0.15 of 1 − c. [fraction]

    Notes
    -----
    Not the spread of merit between the pumps of a market, which is about twice as wide.
    Source: scatter of the published sources about one another
    Valid for: fractions
    Mark: derived

    Examples
    --------
    >>> error_of_estimate(0.80), error_of_estimate(0.88)
    (0.03, 0.025)
    """
    return max(LEAST_ERROR, ERROR_SHARE * (1.0 - expected))


class Thresholds(NamedTuple):
    """From where on an efficiency at best efficiency point is remarkable; None where there is no basis. [fraction]"""

    implausible_above: float | None
    remark_above: float | None
    remark_below: float | None
    query_below: float | None


def claim_thresholds(expected: float | None, attainable: float | None, spread: float | None) -> Thresholds:
    """Thresholds for a claimed efficiency at best efficiency point.

    Parameters
    ----------
    expected, attainable : float or None
        c and A. [fraction]
    spread : float or None
        Spread of merit on the market, σ. [fraction]

    Returns
    -------
    Thresholds
        A + 0.25(1 − A); c + 1.64 max(0.025, 0.15(1 − c)); c − 1.28 σ; c − 2 σ.

    Notes
    -----
    Source: combination of the published sources, see `estimate_efficiency`
    Valid for: fractions
    Mark: derived

    Examples
    --------
    >>> claim_thresholds(0.80, 0.85, 0.05)
    Thresholds(implausible_above=0.8875, remark_above=0.8492, remark_below=0.736, query_below=0.7)
    """
    implausible = None if attainable is None else attainable + IMPLAUSIBLE_SHARE * (1.0 - attainable)
    if expected is None:
        return Thresholds(implausible, None, None, None)
    high = expected + REMARK_HIGH_Z * error_of_estimate(expected)
    if spread is None:
        return Thresholds(implausible, high, None, None)
    return Thresholds(implausible, high, expected - REMARK_LOW_Z * spread, expected - QUERY_LOW_Z * spread)


def is_lenient(arrangement: Arrangement, nq_eye: float, flow: float) -> bool:
    """Whether a low claim is never more than a remark.

    Parameters
    ----------
    arrangement : str
        Arrangement of the bid.
    nq_eye : float
        Specific speed per suction eye. [1/min, m³/s, m per stage]
    flow : float
        Best efficiency flow, total. [m³/s]

    Returns
    -------
    bool
        True for solids-handling, sealless, vertical turbine and multistage pumps, below 18 m³/h and below nq 12.

    Notes
    -----
    Source: common practice, no source
    Valid for: any positive figures
    Mark: practice

    Examples
    --------
    >>> is_lenient("end suction", 30.0, 100 / 3600), is_lenient("end suction", 11.9, 100 / 3600)
    (False, True)
    """
    small = not inside(3600.0 * flow, SMALL_FLOW, math.inf)
    return arrangement in _LENIENT or small or not inside(nq_eye, NARROW_NQ, math.inf)


def _attainable(shape: Shape) -> float | None:
    """Attainable efficiency, None outside the chart."""
    try:
        return attainable_of(shape)
    except OutOfRange:
        return None


def _ceiling(shape: Shape) -> LossBalance | None:
    """Ceiling, None outside its range."""
    try:
        return ceiling_of(shape)
    except OutOfRange:
        return None


def _refused(shape: Shape, reason: str) -> EfficiencyEstimate:
    """An estimate that judges nothing, with the reason; the sources are still shown."""
    expected = expected_efficiency(
        arrangement=shape.arrangement,
        nq_eye=shape.nq_eye,
        flow=shape.flow,
        speed_rpm=shape.speed_rpm,
        stages=shape.stages,
    )
    return EfficiencyEstimate(
        sources=efficiency_sources(shape, expected),
        market_class="",
        market_median=None,
        expected=None,
        expected_from=f"no expected efficiency: {reason}",
        attainable=None,
        ceiling=None,
        ceiling_terms={},
        sigma=None,
        implausible_above=None,
        remark_above=None,
        remark_below=None,
        query_below=None,
        lenient_low=is_lenient(shape.arrangement, shape.nq_eye, shape.flow),
        reason=reason,
    )


def _checked(shape: Shape, suction_eyes: int) -> None:
    """Refuse figures that are no best efficiency point."""
    figures = {name: getattr(shape, name) for name in ("nq", "nq_eye", "flow", "head_per_stage", "speed_rpm")}
    require_positive(**figures, viscosity=shape.viscosity, density=shape.density, stages=shape.stages)
    if shape.diameter is not None:
        require_positive(diameter=shape.diameter)
    if not math.isclose(shape.nq_eye * math.sqrt(suction_eyes), shape.nq, rel_tol=1e-3):
        raise ValueError(f"nq {shape.nq:g} and nq per eye {shape.nq_eye:g} disagree for {suction_eyes} suction eyes")


def estimate_efficiency(
    *,
    arrangement: Arrangement,
    nq: float,
    nq_eye: float,
    flow: float,
    head_per_stage: float,
    speed_rpm: float,
    stages: int = 1,
    suction_eyes: int = 1,
    diameter: float | None = None,
    viscosity: float = 1.0e-6,
    density: float = 998.2,
) -> EfficiencyEstimate:
    """Independent picture of the efficiency at one best efficiency point.

    Parameters
    ----------
    arrangement : str
        Arrangement of the bid.
    nq, nq_eye : float
        Specific speed on total flow, and per suction eye. [1/min, m³/s, m per stage]
    flow, head_per_stage : float
        Best efficiency point: total flow, head of one stage. [m³/s, m]
    speed_rpm : float
        Rotational speed. [1/min]
    stages, suction_eyes : int
        Number of stages, and of suction eyes of one impeller.
    diameter : float or None
        Outer diameter of the impeller the point belongs to; None where the bid states none. [m]
    viscosity, density : float
        Of the liquid the efficiency is stated for. [m²/s, kg/m³]

    Returns
    -------
    EfficiencyEstimate
        Expected, attainable, ceiling, thresholds, and every source with its value or the reason why it gives none.
        `sigma` and `market_class` are filled only where the survey itself gives a median.

    Raises
    ------
    OutOfRange
        If a figure is not positive.
    ValueError
        If the two specific speeds disagree for the number of eyes.

    Notes
    -----
    c by `expected_efficiency`; A the chart, the more generous of the two specific speeds, not below Gülich; ceiling by
    `loss_ceiling` with the offered diameter, else that of 1.2 times the optimum head coefficient.
    Source: Regulation (EU) No 547/2012; Gülich, Centrifugal Pumps; Hydraulic Institute chart; Daily and Nece (1960)
    Valid for: from 6 m³/h, nq 7 to 100; what a source does not cover is None with its reason
    Mark: derived

    Examples
    --------
    >>> estimate = estimate_efficiency(arrangement="end suction", nq=27.85, nq_eye=27.85, flow=130 / 3600,
    ...                                head_per_stage=55.0, speed_rpm=2960, diameter=0.214)
    >>> round(estimate.expected, 3), round(estimate.attainable, 3), round(estimate.ceiling, 3)
    (0.779, 0.85, 0.92)
    """
    shape = Shape(
        arrangement=arrangement,
        nq=nq,
        nq_eye=nq_eye,
        flow=flow,
        head_per_stage=head_per_stage,
        speed_rpm=speed_rpm,
        stages=stages,
        diameter=diameter,
        viscosity=viscosity,
        density=density,
    )
    _checked(shape, suction_eyes)
    if not inside(3600.0 * flow, LEAST_FLOW, math.inf):
        return _refused(shape, f"flow {3600.0 * flow:.3g} m³/h is below 6 m³/h, the least any source covers")
    expected = expected_efficiency(
        arrangement=arrangement, nq_eye=nq_eye, flow=flow, speed_rpm=speed_rpm, stages=stages
    )
    attainable, balance = _attainable(shape), _ceiling(shape)
    if expected.value is None and attainable is None and balance is None:
        return _refused(shape, f"specific speed nq {nq_eye:.3g} is outside every source")
    thresholds = claim_thresholds(expected.value, attainable, expected.spread)
    surveyed = expected.median is not None
    return EfficiencyEstimate(
        sources=efficiency_sources(shape, expected),
        market_class=" and ".join(one.name for one in expected.classes) if surveyed else "",
        market_median=expected.median,
        expected=expected.value,
        expected_from=expected.origin,
        attainable=attainable,
        ceiling=None if balance is None else balance.efficiency,
        ceiling_terms={} if balance is None else dict(balance.terms),
        sigma=expected.spread if surveyed else None,
        implausible_above=thresholds.implausible_above,
        remark_above=thresholds.remark_above,
        remark_below=thresholds.remark_below,
        query_below=thresholds.query_below,
        lenient_low=is_lenient(arrangement, nq_eye, flow),
        reason="",
    )
