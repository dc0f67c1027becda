"""From a bid as read to a case the checks can work on: one basis of speed, stages and liquid, fits, estimates.

Nothing is judged here. Whatever had to be assumed on the way is written down in the case.
"""

from dataclasses import replace

from bidcheck.appraise import SAME_DIAMETER, appraise
from bidcheck.basis import as_pumped, at_offered_basis
from bidcheck.bid import Bid
from bidcheck.case import AtFlow, Case
from bidcheck.curve import COLUMNS, Column, Curve, Fit, Fits
from bidcheck.fit import fit_curve
from bidcheck.hydraulics.suction import friction_loss_at, npsh_available
from bidcheck.inquiry import Inquiry
from bidcheck.quantity import Assumption


def prepare(inquiry: Inquiry, bid: Bid) -> Case:
    """Prepare one bid for the checks.

    Parameters
    ----------
    inquiry : Inquiry
    bid : Bid
        One of its bids.

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
    at_duty = _with_claims(_at_flow(pumped, flow, npsh_available_at(inquiry, flow)), bid)
    estimates, water = appraise(bid, max_curve, max_fits, inquiry.liquid, rated=fits, at_duty=at_duty)
    return Case(
        inquiry=inquiry,
        bid=bid,
        curve=curve,
        fits=fits,
        pumped=pumped,
        max_curve=max_curve,
        max_fits=max_fits,
        estimates=estimates,
        at_duty=at_duty,
        operating=_operating(inquiry, bid, pumped),
        water=water,
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
