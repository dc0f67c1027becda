"""Independent estimates of one bid: what a pump of its best efficiency point should show, beside what it offers."""

from math import log
from typing import Literal, NamedTuple

from bidcheck.basis import viscosity_matters
from bidcheck.bid import Bid
from bidcheck.case import AtFlow
from bidcheck.curve import Curve, Fit, Fits
from bidcheck.errors import OutOfRange
from bidcheck.estimates.curve_shape import (
    OVER,
    PART,
    efficiency_shape,
    shutoff_head_shape,
    shutoff_power_shape,
)
from bidcheck.estimates.efficiency import estimate_efficiency
from bidcheck.estimates.expected import MULTISTAGE, market_classes
from bidcheck.estimates.impeller import estimate_impeller
from bidcheck.estimates.market_surface import MSS_2900, nominal_flow, outside_eu_scope
from bidcheck.estimates.minimum_efficiency import LoadPoint, minimum_efficiency_index, power_over_minimum
from bidcheck.estimates.npsh3_expected import estimate_suction
from bidcheck.estimates.us_rule import US_CLASS, outside_us_scope, us_minimum_efficiency, us_nominal_speed
from bidcheck.hydraulics.affinity import flow_at_speed, head_at_speed, power_at_speed
from bidcheck.hydraulics.power_balance import shaft_power
from bidcheck.hydraulics.specific_speed import specific_speed, suction_specific_speed
from bidcheck.hydraulics.viscous import water_point
from bidcheck.inquiry import Liquid
from bidcheck.second_opinion import Estimates, RegulationEstimate, ShapeEstimate, SuctionEstimate

SAME_DIAMETER = 0.002
"""Two diameters within 0.2 % are one. Source: common practice, no source; printed diameters are rounded to 1 mm."""
TRIM_COST_VOLUTE, TRIM_COST_DIFFUSER = 0.25, 0.5
"""Efficiency lost over diameter trimmed off, both fractions: a quarter and half a point per per cent of trim.
Source: from memory, the upper ends of 0.15 to 0.25 (volute) and 0.4 to 0.5 (diffuser)."""
BEYOND = 1.15
"""Share of best efficiency flow the points must reach for the growth of NPSH3 to be told. Source: common practice, no
source."""
TEST_DENSITY = 998.2
"""Density of clean cold water, for shaft power in the scope of a regulation. [kg/m³] Source: water at 20 °C."""


NEAR = (0.85, 1.15)
"""Rated flow over best efficiency flow within which NPSH3 at rated flow may stand for that at best efficiency.
Source: common practice, no source."""
CLAIM_DOUBT = 0.005
"""Doubt of an efficiency that is claimed without a curve, beside its printed digits. Source: common practice, no
source."""


class Best(NamedTuple):
    """Best efficiency point with water, head of one stage; half the 95 % interval of its efficiency.

    `words` say where it comes from if not from the points, `declared` which claim stands in; one at rated flow may be
    below the best.
    """

    flow: float
    head: float
    efficiency: float
    interval: float | None
    corrected: bool = False
    words: str = ""
    declared: Literal["", "best efficiency", "rated flow"] = ""


class Npsh3(NamedTuple):
    """NPSH3 with the flow it belongs to, and where it is taken from. [m, m³/s]"""

    value: float
    flow: float
    words: str


def appraise(
    bid: Bid, curve: Curve | None, fits: Fits | None, liquid: Liquid, *, rated: Fits | None, at_duty: AtFlow
) -> tuple[Estimates, str]:
    """Estimates for the best efficiency point of a curve, and why there are none.

    Parameters
    ----------
    bid : Bid
    curve, fits : Curve and Fits, or None
        Of the largest diameter given, at the offered speed and stages.
    liquid : Liquid
        Of the inquiry.
    rated : Fits or None
        Of the rated diameter.
    at_duty : AtFlow
        What the pump does at rated flow, claims included.

    Returns
    -------
    Estimates, str
        The words say why there is no curve with water to judge by; empty where there is one, or none is needed.

    Notes
    -----
    A curve given as pumped in a viscous liquid is brought back to water by ANSI/HI 9.6.7 inside its limits. Where the
    points show no best efficiency, the one declared or, failing that, the claim at rated flow is placed.
    Source: see the modules of `bidcheck.estimates`
    """
    best, why = _best(bid, curve, fits, liquid)
    if best is None and not why:
        best = _declared(bid, fits, at_duty)
    if curve is None or fits is None:
        why = "the bid gives no curve of the offered diameter"
    if best is None:
        return _nothing(why or "the points show no best efficiency point"), why
    return _estimates(bid, curve, fits, best, _npsh3(best, fits, rated, at_duty)), why


def _best(bid: Bid, curve: Curve | None, fits: Fits | None, liquid: Liquid) -> tuple[Best | None, str]:
    """Best efficiency point of the points, with water; why it cannot be told for want of a water curve."""
    if curve is None or fits is None:
        return None, ""
    bep = fits.bep
    viscous = curve.liquid == "as pumped" and viscosity_matters(liquid, bid, fits)
    wanted = "the curve is given as pumped, for a viscous liquid; a water curve is needed" if viscous else ""
    if bep is None or bep.head is None or bep.head <= 0:
        return None, wanted
    interval = fits.efficiency.half_width(bep.flow) if fits.efficiency is not None else None
    if not viscous:
        return Best(bep.flow, bep.head / bid.stages, bep.efficiency, interval), ""
    try:
        point = water_point(liquid.viscosity, bep.flow, bep.head / bid.stages, bep.efficiency, bid.speed_rpm)
    except OutOfRange:
        return None, wanted
    wider = None if interval is None else interval / point.factors.efficiency
    words = "brought from the viscous liquid to water"
    return Best(point.flow, point.head_per_stage, point.efficiency, wider, corrected=True, words=words), wanted


def _declared(bid: Bid, fits: Fits | None, at_duty: AtFlow) -> Best | None:
    """Best efficiency as the bidder declares it, else the claim at rated flow in its place; None without either."""
    flow, efficiency = bid.claims.bep_flow, bid.claims.bep_efficiency
    head = _value(fits.head, flow.value) if fits is not None and flow is not None else None
    if flow is not None and efficiency is not None and head is not None and head > 0:
        doubt = efficiency.half_digit + CLAIM_DOUBT
        words = "best efficiency as declared, the points show none"
        return Best(flow.value, head / bid.stages, efficiency.value, doubt, words=words, declared="best efficiency")
    claim = bid.claims.efficiency
    if claim is None or at_duty.head is None or at_duty.head <= 0:
        return None
    words = "claim at rated flow, taken as best efficiency for want of a curve"
    doubt = claim.half_digit + CLAIM_DOUBT
    return Best(at_duty.flow, at_duty.head / bid.stages, claim.value, doubt, words=words, declared="rated flow")


def _npsh3(best: Best, fits: Fits | None, rated: Fits | None, at_duty: AtFlow) -> Npsh3 | None:
    """NPSH3 at best efficiency: of the largest diameter, of the rated one, or at rated flow where that is near."""
    if best.corrected:
        return None
    for one, words in ((fits, ""), (rated, "NPSH3 of the rated diameter")):
        flow = best.flow if one is fits else (one.bep.flow if one is not None and one.bep is not None else None)
        value = _value(one.npsh3, flow) if one is not None and flow is not None else None
        if value is not None and value > 0 and flow is not None:
            return Npsh3(value, flow, words)
    if best.declared == "rated flow":
        return None
    over = at_duty.flow_over_bep if at_duty.flow_over_bep is not None else at_duty.flow / best.flow
    if at_duty.npsh3 is not None and at_duty.npsh3 > 0 and NEAR[0] <= over <= NEAR[1]:
        return Npsh3(at_duty.npsh3, at_duty.flow, "NPSH3 at rated flow")
    return None


def _nothing(why: str) -> Estimates:
    """No estimates, with the reason."""
    return Estimates(
        nq=None,
        nq_eye=None,
        nss=None,
        nss_basis="",
        basis=why,
        best_flow=None,
        best_head=None,
        declared="",
        efficiency=None,
        offered_efficiency=None,
        offered_interval=None,
        trim_allowance=0.0,
        corrected=False,
        impeller=None,
        shape=None,
        suction=None,
        regulation=None,
    )


def _estimates(bid: Bid, curve: Curve | None, fits: Fits | None, best: Best, npsh3: Npsh3 | None) -> Estimates:
    """Everything the sources say of one best efficiency point."""
    eyes, diameter = bid.suction_eyes, curve.impeller if curve is not None else bid.impeller_rated
    nq = specific_speed(bid.speed_rpm, best.flow, best.head)
    nq_eye = specific_speed(bid.speed_rpm, best.flow / eyes, best.head)
    of_points = fits if not best.words else None
    shutoff = _value(of_points.head, 0.0) if of_points is not None else None
    shape = _shape(nq_eye, of_points, best.flow) if of_points is not None else None
    basis = ", ".join(words for words in (_basis(bid, curve), best.words) if words)
    return Estimates(
        nq=nq,
        nq_eye=nq_eye,
        nss=None if npsh3 is None else suction_specific_speed(bid.speed_rpm, npsh3.flow / eyes, npsh3.value),
        nss_basis="" if npsh3 is None else (npsh3.words or basis),
        basis=basis,
        best_flow=best.flow,
        best_head=best.head,
        declared=best.declared,
        efficiency=estimate_efficiency(
            arrangement=bid.arrangement,
            nq=nq,
            nq_eye=nq_eye,
            flow=best.flow,
            head_per_stage=best.head,
            speed_rpm=bid.speed_rpm,
            stages=bid.stages,
            suction_eyes=eyes,
            diameter=diameter,
        ),
        offered_efficiency=best.efficiency,
        offered_interval=best.interval,
        trim_allowance=_trim_allowance(bid, curve) if best.declared != "rated flow" else 1.0,
        corrected=best.corrected,
        impeller=estimate_impeller(
            nq_eye=nq_eye,
            flow_per_eye=best.flow / eyes,
            head_per_stage=best.head,
            speed_rpm=bid.speed_rpm,
            diameter=diameter,
            shutoff_head_per_stage=None if shutoff is None else shutoff / bid.stages,
        ),
        shape=shape,
        suction=_suction(bid, of_points, best, npsh3),
        regulation=None
        if best.declared == "rated flow"
        else _regulation(bid, nq_eye, best, shape, of_points.head if of_points is not None else None),
    )


def _suction(bid: Bid, fits: Fits | None, best: Best, npsh3: Npsh3 | None) -> SuctionEstimate:
    """NPSH3 offered beside that of an ordinary eye, at the flow where it is offered."""
    flow = npsh3.flow if npsh3 is not None else best.flow
    return estimate_suction(
        bid.speed_rpm,
        flow / bid.suction_eyes,
        offered=npsh3.value if npsh3 is not None else None,
        growth=_growth(fits.npsh3, best.flow) if fits is not None else None,
        inducer=bid.inducer,
    )


def _value(fit: Fit | None, flow: float) -> float | None:
    """Value of a fit at a flow, None outside its points."""
    return fit.at(flow) if fit is not None and fit.covers(flow) else None


def _over(fit: Fit | None, flow: float, best_flow: float) -> float | None:
    """Value at a flow over that at best efficiency; None outside the points."""
    there, best = _value(fit, flow), _value(fit, best_flow)
    return None if there is None or best is None or best <= 0 else there / best


def _shape(nq_eye: float, fits: Fits, best_flow: float) -> ShapeEstimate:
    """Ratios of the curve's shape, offered and expected."""
    return ShapeEstimate(
        shutoff_head=shutoff_head_shape(nq_eye, _over(fits.head, 0.0, best_flow)),
        shutoff_power=shutoff_power_shape(nq_eye, _over(fits.power, 0.0, best_flow)),
        part_load=efficiency_shape(nq_eye, PART, _over(fits.efficiency, PART * best_flow, best_flow)),
        over_load=efficiency_shape(nq_eye, OVER, _over(fits.efficiency, OVER * best_flow, best_flow)),
    )


def _growth(npsh3: Fit | None, best_flow: float) -> float | None:
    """Exponent of flow with which NPSH3 rises from best efficiency to the last point; None where it cannot be told."""
    if npsh3 is None or not npsh3.covers(best_flow) or npsh3.domain[1] < BEYOND * best_flow:
        return None
    start, end = npsh3.at(best_flow), npsh3.at(npsh3.domain[1])
    return log(end / start) / log(npsh3.domain[1] / best_flow) if start > 0 and end > 0 else None


def _basis(bid: Bid, curve: Curve | None) -> str:
    """Say in words which curve specific speed is taken from; empty without a curve."""
    if curve is None:
        return ""
    if curve.impeller is None:
        return "the one curve of the bid, diameter not named"
    if bid.impeller_max is not None and curve.impeller >= bid.impeller_max * (1.0 - SAME_DIAMETER):
        return "curve of the maximum diameter"
    if bid.impeller_rated is not None and abs(curve.impeller / bid.impeller_rated - 1.0) <= SAME_DIAMETER:
        return "curve of the rated diameter; none of the maximum diameter"
    return "curve of the largest diameter given"


def _trim_allowance(bid: Bid, curve: Curve | None) -> float:
    """What trimming may have cost the efficiency of a curve below the maximum diameter [fraction]."""
    if curve is None or curve.impeller is None or bid.impeller_max is None or curve.impeller >= bid.impeller_max:
        return 0.0
    cost = TRIM_COST_DIFFUSER if bid.casing_type == "diffuser" else TRIM_COST_VOLUTE
    return cost * (1.0 - curve.impeller / bid.impeller_max)


def _regulation(bid: Bid, nq: float, best: Best, shape: ShapeEstimate | None, head: Fit | None) -> RegulationEstimate:
    """Where the curve stands against the two regulations, or why they do not cover it."""
    eu_class, eu_index, eu_points, eu_reason = _eu(bid, nq, best, shape)
    us_class, us_ratio, us_reason = _us(bid, nq, best, shape, head)
    return RegulationEstimate(
        eu_class=eu_class,
        eu_index=eu_index,
        eu_points=eu_points,
        eu_reason=eu_reason,
        us_class=us_class,
        us_ratio=us_ratio,
        us_reason=us_reason,
    )


def _loads(shape: ShapeEstimate | None, best: Best) -> tuple[float | None, float | None]:
    """Efficiency at part load and at over load."""
    ratios = (None, None) if shape is None else (shape.part_load.offered, shape.over_load.offered)
    part, over = (None if ratio is None else ratio * best.efficiency for ratio in ratios)
    return part, over


def _eu(bid: Bid, nq: float, best: Best, shape: ShapeEstimate | None) -> tuple[str, float | None, int, str]:
    """Class, index, load points and reason under Regulation (EU) No 547/2012."""
    classes = market_classes(bid.arrangement, bid.speed_rpm, bid.stages)
    if len(classes) != 1 or bid.suction_eyes != 1:
        return "", None, 0, f"the regulation holds no class for {bid.arrangement} pumps"
    (one,) = classes
    if one is MSS_2900:
        return one.name, None, 0, "it covers bores of 4 and 6 inch only, and the bid does not state the bore"
    flow = nominal_flow(one, best.flow, bid.speed_rpm)
    head = head_at_speed(best.head, bid.speed_rpm, one.nominal_rpm)
    power = shaft_power(TEST_DENSITY, best.flow, best.head * bid.stages, best.efficiency)
    outside = outside_eu_scope(
        one, nq=nq, flow=flow, head=head, power=power_at_speed(power, bid.speed_rpm, one.nominal_rpm)
    )
    if outside:
        return one.name, None, 0, f"{outside} at {one.nominal_rpm:g} 1/min"
    part, over = _loads(shape, best)
    try:
        found = minimum_efficiency_index(one, nq=nq, flow=flow, best=best.efficiency, part_load=part, over_load=over)
    except OutOfRange as error:
        return one.name, None, 0, str(error)
    return one.name, found.value, found.points, ""


def _us(
    bid: Bid, nq: float, best: Best, shape: ShapeEstimate | None, head: Fit | None
) -> tuple[str, float | None, str]:
    """Class, power over the greatest allowed and reason under 10 CFR 431 Subpart Y."""
    us_class = US_CLASS.get(bid.arrangement)
    if us_class is None or bid.suction_eyes != 1 or (bid.stages > 1 and bid.arrangement not in MULTISTAGE):
        return "", None, f"the rule holds no class for {bid.arrangement} pumps"
    nominal = us_nominal_speed(bid.speed_rpm)
    flow = flow_at_speed(best.flow, bid.speed_rpm, nominal)
    outside = outside_us_scope(
        us_class,
        nq=nq,
        flow=flow,
        head=head_at_speed(best.head, bid.speed_rpm, nominal) * bid.stages,
        power=shaft_power(TEST_DENSITY, best.flow, best.head * bid.stages, best.efficiency),
        speed_rpm=bid.speed_rpm,
    )
    if outside:
        return us_class, None, f"{outside} at {nominal} 1/min"
    try:
        least = us_minimum_efficiency(us_class, nominal, nq, flow)
    except OutOfRange as error:
        return us_class, None, str(error)
    part, over = _loads(shape, best)
    loads = [LoadPoint(1.0, 1.0, best.efficiency)]
    for share, efficiency in ((PART, part), (OVER, over)):
        ratio = _over(head, share * best.flow, best.flow)
        if efficiency is not None and ratio is not None and ratio > 0 and efficiency > 0:
            loads.append(LoadPoint(share, ratio, efficiency))
    return us_class, power_over_minimum(least, loads), ""
