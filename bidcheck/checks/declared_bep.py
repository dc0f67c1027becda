"""The best efficiency point a bidder declares is that of the bidder's own points.

Best efficiency decides how near to it the pump is bought, and its specific speed. A declared point away from the
peak of the curve flatters one or the other. A sound bid declares flow within 5 % of the fitted peak, or inside its
uncertainty, and efficiency within a point.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import flow, points, share, whole_share
from bidcheck.checks.request import not_applicable
from bidcheck.curve import BestEfficiency
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import within


def run(case: Case) -> Iterator[Measured]:
    """Compare declared with fitted best efficiency, flow and value."""
    claims = case.bid.claims
    bep = case.fits.bep if case.fits is not None else None
    if claims.bep_flow is None:
        yield not_applicable("flow", "the bid declares no best efficiency flow")
    elif bep is None:
        yield not_applicable("flow", "the points show no best efficiency point to compare with")
    else:
        yield _flow(case, bep, claims.bep_flow.value, claims.bep_flow.half_digit)
    if claims.bep_efficiency is None:
        yield not_applicable("efficiency", "the bid declares no best efficiency")
    elif bep is None:
        yield not_applicable("efficiency", "the points show no best efficiency point to compare with")
    else:
        yield _efficiency(case, bep, claims.bep_efficiency.value, claims.bep_efficiency.half_digit)


def _flow(case: Case, bep: BestEfficiency, declared: float, half_digit: float) -> Measured:
    """Declared flow over fitted flow; inside the interval of the fit it holds."""
    low, high = bep.flow_interval or (bep.flow, bep.flow)
    inside = low - half_digit <= declared <= high + half_digit
    ratio = declared / bep.flow
    evidence = {"declared": flow(declared), "fitted": flow(bep.flow), "ratio": whole_share(ratio)}
    evidence |= {"low": flow(low), "high": flow(high)}
    limit = case.inquiry.limits.declared_bep
    if inside:
        return Measured(subject="flow", verdict=Verdict.PASS, limit=limit, evidence=evidence)
    return Measured(subject="flow", holds=within(ratio, limit, slack=half_digit / bep.flow), evidence=evidence)


def _efficiency(case: Case, bep: BestEfficiency, declared: float, half_digit: float) -> Measured:
    """Declared against fitted efficiency; a careful declaration is a remark at most."""
    fit = case.fits.efficiency if case.fits is not None else None
    doubt = fit.half_width(bep.flow) if fit is not None else 0.0
    slack = half_digit + (doubt if doubt < float("inf") else 0.0)
    limit = case.inquiry.limits.declared_bep_efficiency
    off = declared - bep.efficiency
    compared = within(abs(off), limit, slack=slack)
    evidence = {"declared": share(declared), "fitted": share(bep.efficiency), "difference": points(off)}
    if not compared.holds and off < 0:
        return Measured(
            subject="efficiency", verdict=Verdict.REMARK, limit=limit, evidence=evidence, wording="efficiency"
        )
    return Measured(subject="efficiency", holds=compared, evidence=evidence, wording="efficiency")


CHECK = Check(
    name="declared-bep",
    group="as submitted",
    run=run,
    otherwise=Verdict.QUERY,
    limits=("declared_bep", "declared_bep_efficiency"),
    source="common practice, no source",
    wordings={
        "": Wording(
            "Declared best efficiency flow {declared} is {ratio} of that of the bidder's points, {fitted} (between"
            " {low} and {high}).",
            "You declare best efficiency at {declared}; your points put it at {fitted}. Please say which holds at the"
            " offered diameter.",
        ),
        "efficiency": Wording(
            "Declared best efficiency {declared} against {fitted} of the bidder's points: {difference}.",
            "You declare {declared} at best efficiency; your points peak at {fitted}. Please say which is guaranteed.",
        ),
    },
)
