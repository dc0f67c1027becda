"""The pump makes the head asked for at rated flow.

Everything else is idle if the duty is not met. The head of the bidder's own curve at rated flow, as pumped and at the
offered diameter, is compared with the rated head; the doubt of fit and printed digits is given to the bidder.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import flow, head, share
from bidcheck.checks.request import asked
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import within


def run(case: Case) -> Iterator[Measured]:
    """Compare head at rated flow with rated head."""
    duty, limits, at = case.inquiry.duty, case.inquiry.limits, case.at_duty
    if at.head is None:
        yield asked("rated", "head at rated flow")
        return
    fit = case.pumped.head if case.pumped is not None else None
    doubt = 0.0
    if fit is not None and fit.covers(duty.rated_flow):
        width = fit.half_width(duty.rated_flow)
        doubt = width if width < float("inf") else fit.largest_residual
    ratio = at.head / duty.rated_head
    floor = within(ratio, limits.duty_head_floor, slack=doubt / duty.rated_head)
    asked_for = within(ratio, limits.duty_head, slack=doubt / duty.rated_head)
    yield Measured(
        subject="rated",
        holds=asked_for if floor.holds else floor,
        evidence={
            "head": head(at.head),
            "rated_head": head(duty.rated_head),
            "rated_flow": flow(duty.rated_flow),
            "ratio": share(ratio),
        },
        wording="claimed" if "head" in at.from_claims else "",
    )


CHECK = Check(
    name="duty-head",
    group="duty",
    run=run,
    otherwise=Verdict.QUERY,
    limits=("duty_head", "duty_head_floor"),
    source="the inquiry",
    wordings={
        "": Wording(
            "Head at rated flow {rated_flow} is {head}, {ratio} of the rated head {rated_head}.",
            "Your curve gives {head} at {rated_flow}; {rated_head} are asked for. Please offer a diameter that meets"
            " the duty.",
        ),
        "claimed": Wording(
            "Head at rated flow {rated_flow} is claimed as {head}, {ratio} of the rated head {rated_head}; the curve"
            " does not reach it.",
            "You claim {head} at {rated_flow}; {rated_head} are asked for. Please offer a diameter that meets the"
            " duty, with its curve.",
        ),
    },
)
