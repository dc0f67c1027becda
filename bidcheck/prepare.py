"""From a bid as read to a case the checks can work on: one basis of speed, stages and liquid, fits, estimates.

Nothing is judged here. Whatever had to be assumed on the way is written down in the case.
"""

from dataclasses import replace

from bidcheck.basis import as_pumped, at_offered_basis, viscosity_matters
from bidcheck.bid import Bid
from bidcheck.case import AtFlow, Case, Estimates
from bidcheck.curve import COLUMNS, Column, Curve, Fit, Fits
from bidcheck.estimates.efficiency import estimate_efficiency
from bidcheck.estimates.npsh3_expected import expected_npsh3
from bidcheck.fit import fit_curve
from bidcheck.hydraulics.specific_speed import specific_speed, suction_specific_speed
from bidcheck.hydraulics.suction import friction_loss_at, npsh_available
from bidcheck.inquiry import Inquiry
from bidcheck.quantity import Assumption

SAME_DIAMETER = 0.002
"""Two diameters within 0.2 % are one. Source: common practice, no source; printed diameters are rounded to 1 mm."""
TRIM_COST_VOLUTE, TRIM_COST_DIFFUSER = 0.25, 0.5
"""Efficiency lost over diameter trimmed off, both fractions: a quarter and half a point per per cent of trim.
Source: from memory, the upper ends of 0.15 to 0.25 (volute) and 0.4 to 0.5 (diffuser)."""


def prepare(inquiry: Inquiry, bid: Bid, all_bids: tuple[Bid, ...] = ()) -> Case:
    """Prepare one bid for the checks.

    Parameters
    ----------
    inquiry : Inquiry
    bid : Bid
        One of its bids.
    all_bids : tuple of Bid
        The latest revision of every bid, for comparisons between bids.

    Returns
    -------
    Case
        With None wherever the bid gives no data; never raises for what a bid leaves out.
    """
    assumptions: list[Assumption] = []
    rated = _curve_of(bid, bid.impeller_rated)
    largest = _largest_curve(bid) or rated
    curve = at_offered_basis(rated, bid, assumptions) if rated else None
    max_curve = at_offered_basis(largest, bid, []) if largest and largest is not rated else curve
    flow = inquiry.duty.rated_flow
    fits = fit_curve(curve, check_flow=flow) if curve else None
    max_fits = fit_curve(max_curve) if max_curve and max_curve is not curve else fits
    pumped = as_pumped(curve, fits, inquiry.liquid, bid, assumptions) if curve and fits else None
    water = _why_no_water_curve(inquiry, bid, max_curve, max_fits)
    return Case(
        inquiry=inquiry,
        bid=bid,
        curve=curve,
        fits=fits,
        pumped=pumped,
        max_curve=max_curve,
        max_fits=max_fits,
        estimates=_estimates(bid, max_curve, max_fits, water),
        at_duty=_with_claims(_at_flow(pumped, flow, npsh_available_at(inquiry, flow)), bid),
        operating=_operating(inquiry, bid, pumped),
        water=water,
        all_bids=all_bids,
        assumptions=(*bid.assumptions, *assumptions),
    )


def _curve_of(bid: Bid, diameter: float | None) -> Curve | None:
    """The curve of a diameter; where no diameters are named, the only curve."""
    for curve in bid.curves:
        if curve.impeller is None or diameter is None:
            if len(bid.curves) == 1:
                return curve
        elif abs(curve.impeller / diameter - 1.0) <= SAME_DIAMETER:
            return curve
    return None


def _largest_curve(bid: Bid) -> Curve | None:
    """The curve of the largest diameter named."""
    named = [curve for curve in bid.curves if curve.impeller is not None]
    return max(named, key=lambda curve: curve.impeller or 0.0) if named else None


def _why_no_water_curve(inquiry: Inquiry, bid: Bid, curve: Curve | None, fits: Fits | None) -> str:
    """Say why efficiency and specific speed cannot be judged from the curve; empty where they can."""
    if curve is None or fits is None:
        return "the bid gives no curve of the offered diameter"
    if curve.liquid == "as pumped" and viscosity_matters(inquiry.liquid, bid, fits):
        return "the curve is given as pumped, for a viscous liquid; a water curve is needed"
    return ""


def npsh_available_at(inquiry: Inquiry, flow: float) -> float | None:
    """NPSH available at a flow per pump [m]; None where the inquiry does not give it there.

    The rated figure is never reused at another flow: it follows from the suction data, friction growing with the
    square of flow, or is given.
    """
    duty, suction, liquid = inquiry.duty, inquiry.suction, inquiry.liquid
    if suction is not None and liquid.vapour_pressure is not None:
        return float(
            npsh_available(
                pressure=suction.pressure,
                vapour_pressure=liquid.vapour_pressure,
                density=liquid.density,
                liquid_level=suction.liquid_level,
                friction_loss=friction_loss_at(suction.friction_loss, duty.rated_flow, flow),
            )
        )
    if flow == duty.rated_flow:
        return duty.npsha
    if duty.max_flow is not None and flow == duty.max_flow:
        return duty.npsha_at_max_flow
    return None


def _value(fit: Fit | None, flow: float) -> float | None:
    """Value of a fit at a flow, None outside its points."""
    return fit.at(flow) if fit is not None and fit.covers(flow) else None


def _at_flow(pumped: Fits | None, flow: float, npsha: float | None) -> AtFlow:
    """Read the fitted curves, as pumped, at one flow."""
    values: dict[Column, float | None] = dict.fromkeys(COLUMNS)
    if pumped is not None:
        values = {column: _value(pumped.of(column), flow) for column in COLUMNS}
    bep = pumped.bep if pumped is not None else None
    return AtFlow(
        flow=flow,
        head=values["head"],
        efficiency=values["efficiency"],
        power=values["power"],
        npsh3=values["npsh3"],
        npsha=npsha,
        flow_over_bep=flow / bep.flow if bep is not None else None,
    )


def _with_claims(at: AtFlow, bid: Bid) -> AtFlow:
    """Fill what the curve leaves open at rated flow from the claims, and say which."""
    filled: list[Column] = []
    values: dict[Column, float | None] = {}
    for column in COLUMNS:
        claim = getattr(bid.claims, column)
        values[column] = getattr(at, column)
        if values[column] is None and claim is not None:
            values[column] = claim.value
            filled.append(column)
    return replace(
        at,
        head=values["head"],
        efficiency=values["efficiency"],
        power=values["power"],
        npsh3=values["npsh3"],
        from_claims=tuple(filled),
    )


def _operating(inquiry: Inquiry, bid: Bid, pumped: Fits | None) -> tuple[tuple[str, AtFlow], ...]:
    """Every flow the inquiry asks one pump to serve, by name; equal flows once."""
    duty = inquiry.duty
    named = (
        ("rated", duty.rated_flow),
        ("largest flow", duty.max_flow),
        ("normal flow", duty.normal_flow),
        ("smallest flow", duty.min_flow),
    )
    found: dict[float, tuple[str, AtFlow]] = {}
    for name, flow in named:
        if flow is None or flow in found:
            continue
        at = _at_flow(pumped, flow, npsh_available_at(inquiry, flow))
        found[flow] = (name, _with_claims(at, bid) if name == "rated" else at)
    return tuple(found.values())


def _basis(bid: Bid, curve: Curve | None) -> str:
    """Say in words which curve specific speed is taken from."""
    if curve is None or curve.impeller is None:
        return "the one curve of the bid, diameter not named"
    if bid.impeller_max is not None and curve.impeller >= bid.impeller_max * (1.0 - SAME_DIAMETER):
        return "curve of the maximum diameter"
    if bid.impeller_rated is not None and abs(curve.impeller / bid.impeller_rated - 1.0) <= SAME_DIAMETER:
        return "curve of the rated diameter; none of the maximum diameter"
    return "curve of the largest diameter given"


def _trim_allowance(bid: Bid, curve: Curve) -> float:
    """What trimming may have cost the efficiency of a curve below the maximum diameter [fraction]."""
    if curve.impeller is None or bid.impeller_max is None or curve.impeller >= bid.impeller_max:
        return 0.0
    cost = TRIM_COST_DIFFUSER if bid.casing_type == "diffuser" else TRIM_COST_VOLUTE
    return cost * (1.0 - curve.impeller / bid.impeller_max)


def _estimates(bid: Bid, curve: Curve | None, fits: Fits | None, water: str) -> Estimates:
    """Specific speeds at the best efficiency point of the largest diameter, and what is to be expected there."""
    basis = _basis(bid, curve)
    bep = fits.bep if fits is not None else None
    if water or curve is None or fits is None or bep is None or bep.head is None or bep.head <= 0:
        return Estimates(
            nq=None,
            nq_eye=None,
            nss=None,
            basis=water or "the points show no best efficiency point",
            efficiency=None,
            offered_efficiency=None,
            offered_interval=None,
            trim_allowance=0.0,
            npsh3_expected=None,
        )
    head = bep.head / bid.stages
    eye_flow = bep.flow / bid.suction_eyes
    nq = specific_speed(bid.speed_rpm, bep.flow, head)
    nq_eye = specific_speed(bid.speed_rpm, eye_flow, head)
    npsh3 = _value(fits.npsh3, bep.flow)
    efficiency = estimate_efficiency(
        arrangement=bid.arrangement,
        nq=nq,
        nq_eye=nq_eye,
        flow=bep.flow,
        head_per_stage=head,
        speed_rpm=bid.speed_rpm,
        stages=bid.stages,
        suction_eyes=bid.suction_eyes,
        diameter=curve.impeller,
        density=curve.density,
    )
    half_width = fits.efficiency.half_width(bep.flow) if fits.efficiency is not None else None
    return Estimates(
        nq=nq,
        nq_eye=nq_eye,
        nss=suction_specific_speed(bid.speed_rpm, eye_flow, npsh3) if npsh3 is not None and npsh3 > 0 else None,
        basis=basis,
        efficiency=efficiency,
        offered_efficiency=bep.efficiency,
        offered_interval=half_width,
        trim_allowance=_trim_allowance(bid, curve),
        npsh3_expected=expected_npsh3(bid.speed_rpm, eye_flow).ordinary,
    )
