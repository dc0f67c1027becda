"""Put a supplied curve on one basis: offered speed, all stages, shaft power, the liquid of the inquiry."""

from dataclasses import replace

from bidcheck.bid import Bid
from bidcheck.curve import Curve, Fit, Fits, Points
from bidcheck.errors import OutOfRange
from bidcheck.fit import derived_points, fit_curve
from bidcheck.hydraulics.viscous import needs_correction, viscous_factors, viscous_head_factor, viscous_parameter
from bidcheck.inquiry import Liquid
from bidcheck.quantity import Assumption

NPSH3_UP, NPSH3_DOWN = 2.0, 1.3
"""Exponents of speed for NPSH3, the careful one either way. Source: ISO 9906:2012 lets 1.3 to 2 (from memory)."""


LIKELY_BEST = 0.75
"""Share of the last flow of a curve near which best efficiency is likely. Source: common practice, no source."""


def scaled(points: Points | None, flow: float = 1.0, value: float = 1.0) -> Points | None:
    """Points with flow and value multiplied, printed digits along with them; None stays None."""
    return None if points is None else scaled_points(points, flow, value)


def scaled_points(points: Points, flow: float = 1.0, value: float = 1.0) -> Points:
    """Points with flow and value multiplied, printed digits along with them."""
    return replace(
        points,
        flow=points.flow * flow,
        value=points.value * value,
        flow_half_digit=points.flow_half_digit * flow,
        value_half_digit=points.value_half_digit * value,
    )


def at_offered_basis(curve: Curve, bid: Bid, assumptions: list[Assumption]) -> Curve:
    """Bring a curve to the offered speed, to all stages, and to shaft power.

    Parameters
    ----------
    curve : Curve
    bid : Bid
    assumptions : list of Assumption
        What had to be assumed is appended here.

    Notes
    -----
    Q n, H n², P n³ and NPSH3 n² upwards, n^1.3 downwards. Head given for fewer stages grows in proportion. Power given
    as motor input is multiplied by the efficiency of the motor offered; without one it is left out.
    Source: affinity laws.
    """
    ratio = bid.speed_rpm / curve.speed_rpm
    exponent = NPSH3_UP if ratio > 1.0 else NPSH3_DOWN
    if abs(ratio - 1.0) > 1e-9:
        words = f"from {curve.speed_rpm:.0f} to {bid.speed_rpm:.0f} 1/min by the affinity laws"
        why = f"NPSH3 with exponent {exponent:g}, the careful one of the range 1.3 to 2"
        assumptions.append(Assumption(f"{curve.file}: brought to the offered speed", words, why))
    power, shaft = curve.power, 1.0
    if curve.power_at == "motor input" and power is not None:
        if bid.driver.efficiency is None:
            power = None
            why = "power is motor input and the bid names no motor efficiency"
            assumptions.append(Assumption(f"{curve.file}: shaft power", "left out", why))
        else:
            shaft = bid.driver.efficiency
            words = f"motor input × {100 * shaft:.1f} %"
            why = "efficiency of the motor offered, taken as constant over load"
            assumptions.append(Assumption(f"{curve.file}: shaft power", words, why))
    return replace(
        curve,
        speed_rpm=bid.speed_rpm,
        stages=bid.stages,
        power_at="shaft",
        head=scaled(curve.head, ratio, ratio**2 * bid.stages / curve.stages),
        efficiency=scaled(curve.efficiency, ratio),
        power=scaled(power, ratio, ratio**3 * shaft),
        npsh3=scaled(curve.npsh3, ratio, ratio**exponent),
    )


def viscosity_matters(liquid: Liquid, bid: Bid, fits: Fits) -> bool:
    """Whether viscosity changes what the pump does: B of ANSI/HI 9.6.7 above 1 and no cold water.

    Where the points show no best efficiency, a flow where it is likely stands in.
    """
    bep, curve = fits.bep, fits.head
    if bep is not None:
        flow, head = bep.flow, bep.head
    elif curve is not None:
        flow = LIKELY_BEST * curve.domain[1]
        head = curve.at(flow) if curve.covers(flow) else None
    else:
        return False
    if head is None or head <= 0 or flow <= 0:
        return False
    B = viscous_parameter(liquid.viscosity, flow, head / bid.stages, bid.speed_rpm)
    return needs_correction(liquid.viscosity, B)


def as_pumped(curve: Curve, fits: Fits, liquid: Liquid, bid: Bid, assumptions: list[Assumption]) -> Fits | None:
    """Fits for the liquid of the inquiry, or None where that cannot be said.

    Power goes with density. A water curve of a viscous liquid is corrected by ANSI/HI 9.6.7 inside its limits; outside
    them nothing is known as pumped.
    """
    if curve.liquid == "water" and viscosity_matters(liquid, bid, fits):
        return _viscous_fits(curve, fits, liquid, bid, assumptions)
    if fits.power is None:
        return fits
    return replace(fits, power=_scaled_fit(fits.power, liquid.density / curve.density))


def _scaled_fit(fit: Fit, factor: float) -> Fit:
    """A fit whose values are multiplied; nothing is fitted anew."""
    return replace(
        fit,
        polynomial=fit.polynomial * factor,
        rms=fit.rms * factor,
        largest_residual=fit.largest_residual * factor,
        covariance=fit.covariance * factor**2,
        guard_difference=None if fit.guard_difference is None else fit.guard_difference * factor,
    )


def _viscous_fits(curve: Curve, fits: Fits, liquid: Liquid, bid: Bid, assumptions: list[Assumption]) -> Fits | None:
    """Fits of the water curve corrected for viscosity; None outside the limits of the correction."""
    bep, head, efficiency, what = fits.bep, curve.head, curve.efficiency, f"{curve.file}: as pumped"
    if efficiency is None and head is not None and curve.power is not None:
        efficiency = derived_points(head, curve.power, curve.density)
    if bep is None or bep.head is None or head is None or efficiency is None:
        why = (
            "the viscosity correction starts from head and efficiency at best efficiency, which the points do not show"
        )
        assumptions.append(Assumption(what, "not known", why))
        return None
    try:
        factors = viscous_factors(liquid.viscosity, bep.flow, bep.head / bid.stages, bid.speed_rpm)
    except OutOfRange as error:
        assumptions.append(Assumption(what, "not known", str(error)))
        return None
    words = f"C_Q {factors.flow:.4f}, C_η {factors.efficiency:.4f} (B {factors.parameter:.2f}); NPSH3 left as for water"
    assumptions.append(Assumption(what, words, "water curve corrected by ANSI/HI 9.6.7"))
    C_H = viscous_head_factor(factors.flow, head.flow / bep.flow)
    thick_head = replace(scaled_points(head, factors.flow), value=head.value * C_H)
    thick_efficiency = scaled_points(efficiency, factors.flow, factors.efficiency)
    corrected = replace(
        curve,
        liquid="as pumped",
        density=liquid.density,
        head=thick_head,
        efficiency=thick_efficiency,
        power=None,
        npsh3=scaled(curve.npsh3, factors.flow),
    )
    return fit_curve(corrected)
