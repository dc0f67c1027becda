"""The figures a bidder claims at rated flow lie on the bidder's own curve.

Data sheets and curves are often made by different people. A claim better than the curve is not to be relied on; a
claim more careful than the curve is harmless but worth knowing. A sound bid's claims lie on its curve within
printed digits, the fit and 2 %.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import of_column, share, text, whose_curve
from bidcheck.checks.request import not_applicable
from bidcheck.checks.verdicts import missed
from bidcheck.curve import COLUMN_WORDS, COLUMNS, Column, Fit
from bidcheck.explain import (
    closing,
    density_mistakes,
    frequency_mistakes,
    in_words,
    mistakes_that_close,
    motor_mistakes,
    pump_mistakes,
    stage_mistakes,
)
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import within
from bidcheck.quantity import Stated, unit_of

SPEED_EXPONENT: dict[Column, int] = {"head": 2, "efficiency": 0, "power": 3}
"""How each quantity goes with speed. Source: affinity laws."""
MORE_IS_BETTER: dict[Column, bool] = {"head": True, "efficiency": True, "power": False, "npsh3": False}


def run(case: Case) -> Iterator[Measured]:
    """Compare each claim with the fitted curve, as pumped, at its flow."""
    claims, fits = case.bid.claims, case.pumped
    for column in COLUMNS:
        claim: Stated | None = getattr(claims, column)
        fit = fits.of(column) if fits is not None else None
        flow = case.inquiry.duty.rated_flow
        yield _compared(case, f"{column} at rated flow", column, claim, fit=fit, flow=flow)
    head = fits.head if fits is not None else None
    yield _compared(case, "shutoff head", "head", claims.shutoff_head, fit=head, flow=0.0)


def _compared(
    case: Case, subject: str, column: Column, claim: Stated | None, *, fit: Fit | None, flow: float
) -> Measured:
    """One claim against the curve at one flow."""
    if claim is None:
        return not_applicable(subject, "the bid states no such figure apart from the curve")
    if fit is None or fit.derived or not fit.covers(flow) or fit.at(flow) <= 0:
        return not_applicable(subject, "the bid's own points do not give this figure at this flow")
    curve, limit = fit.at(flow), case.inquiry.limits.claim_on_curve
    gap = claim.value / curve
    slack = (claim.half_digit + _doubt(fit, flow)) / curve
    evidence = {
        "quantity": text(COLUMN_WORDS[column]),
        "claim": of_column(claim.value, column),
        "curve": of_column(curve, column),
        "gap": share(abs(gap - 1)),
    } | whose_curve(case)
    compared = within(abs(gap - 1.0), limit, slack=slack)
    if compared.holds:
        return Measured(subject=subject, holds=compared, evidence=evidence)
    drawn = _at_speed_drawn(case, column, fit, flow)
    if drawn is not None and within(abs(claim.value / drawn - 1.0), limit, slack=slack).holds:
        return Measured(subject=subject, verdict=Verdict.REMARK, limit=limit, evidence=evidence, wording="speed drawn")
    mistakes = _mistakes(case, column, gap, unit_of(claim))
    if mistakes:
        evidence["mistakes"] = text(in_words(mistakes))
        return Measured(
            subject=subject,
            verdict=missed(limit, Verdict.QUERY),
            limit=limit,
            evidence=evidence,
            wording="explained",
        )
    careful = (gap < 1.0) is MORE_IS_BETTER[column]
    return Measured(
        subject=subject,
        verdict=Verdict.REMARK if careful else missed(limit, Verdict.QUERY),
        limit=limit,
        evidence=evidence,
        wording="careful" if careful else "better",
    )


def _at_speed_drawn(case: Case, column: Column, fit: Fit, flow: float) -> float | None:
    """The figure at the speed the curve was drawn for, where that is not the offered speed; None if it cannot be told.

    Catalogue curves drawn at 1450 or 2900 1/min are honest; claims read off them belong to that speed.
    """
    speeds = {curve.speed_rpm for curve in case.bid.curves if case.curve is not None and curve.file == case.curve.file}
    ratio = case.bid.speed_rpm / speeds.pop() if len(speeds) == 1 else 1.0
    if ratio == 1.0 or column == "npsh3" or not fit.covers(flow * ratio):
        return None
    drawn = fit.at(flow * ratio) / ratio ** SPEED_EXPONENT[column]
    return drawn if drawn > 0 else None


def _doubt(fit: Fit, flow: float) -> float:
    """Half the 95 % interval of the fit, or its largest residual where no freedom is left."""
    width = fit.half_width(flow)
    return width if width < float("inf") else fit.largest_residual


def _mistakes(case: Case, column: Column, gap: float, unit: float) -> tuple[str, ...]:
    """The single mistakes, in the claim or a motor's losses in the curve, that would put the claim on the curve."""
    if column == "npsh3":
        return ()
    bid = case.bid
    motor = motor_mistakes(bid.driver.efficiency)
    others = (
        *stage_mistakes(bid.stages),
        *pump_mistakes(case.inquiry.duty.pumps_running),
        *frequency_mistakes(),
        *density_mistakes(case.inquiry.liquid.density, of_water=False),
        *motor,
    )
    in_curve = mistakes_that_close(1.0 / gap, {column: 1}, motor)
    in_claim = closing(gap, {column: 1}, others, {column: unit})
    return (*in_claim, *(f"in the curve {words}" for words in in_curve))


CHECK = Check(
    name="rated-on-curve",
    group="as submitted",
    run=run,
    otherwise=Verdict.QUERY,
    limits=("claim_on_curve",),
    source="common practice, no source; tolerance from printed digits and fit",
    wordings={
        "": Wording("Claimed {quantity} {claim} lies on {whose} ({curve}, off by {gap})."),
        "better": Wording(
            "Claimed {quantity} {claim} is better than {whose} gives, {curve}: off by {gap}.",
            "You claim {quantity} {claim} where {yours} gives {curve}. Which of the two is guaranteed? Please"
            " correct the other.",
        ),
        "careful": Wording("Claimed {quantity} {claim} is more careful than {whose}, {curve}: off by {gap}."),
        "speed drawn": Wording(
            "Claimed {quantity} {claim} belongs to the speed the curve was drawn for; at the offered speed the curve"
            " gives {curve}."
        ),
        "explained": Wording(
            "Claimed {quantity} {claim} is off {whose}, {curve}, by {gap}. One mistake would close the"
            " gap: {mistakes}.",
            "You claim {quantity} {claim} where {yours} gives {curve}. It looks as if {mistakes}. Please"
            " confirm and correct.",
        ),
    },
)
