"""The pump makes the head asked for at rated flow.

Everything else is idle if the duty is not met. The head of the bidder's own curve at rated flow, as pumped and at the
offered diameter, is compared with the rated head; the doubt of fit and printed digits is given to the bidder. A head
so low that it must be on another basis, per stage or in another unit, is asked about instead.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import flow, head, share, text, whose_curve
from bidcheck.checks.request import asked
from bidcheck.explain import UNIT_MISTAKES, in_words, possible, stage_mistakes
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import within

OTHER_BASIS = 0.6
"""Share of the rated head below which a head that a unit or the stages explain is on another basis, not short.
Source: common practice, no source."""
MEANT = (0.95, 1.15)
"""Head over rated head, once on the right basis, of a bid that was meant for the duty. Source: common practice, no
source."""


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
    evidence = {
        "head": head(at.head),
        "rated_head": head(duty.rated_head),
        "rated_flow": flow(duty.rated_flow),
        "ratio": share(ratio),
    } | whose_curve(case)
    if (
        case.brought_from_water
        and "head" not in at.from_claims
        and case.fits is not None
        and case.fits.head is not None
    ):
        evidence["in_water"] = head(case.fits.head.at(duty.rated_flow))
    causes = () if floor.holds or ratio > OTHER_BASIS else _other_bases(case, ratio)
    if causes:
        evidence["causes"] = text(in_words(causes))
        yield Measured(
            subject="rated",
            verdict=Verdict.QUERY,
            limit=floor.limit,
            evidence=evidence,
            wording="explained",
        )
        return
    yield Measured(
        subject="rated",
        holds=asked_for if floor.holds else floor,
        evidence=evidence,
        wording="claimed" if "head" in at.from_claims else ("viscous" if "in_water" in evidence else ""),
    )


def _other_bases(case: Case, ratio: float) -> tuple[str, ...]:
    """Mistakes in stating head without which it would be about the rated head."""
    points = case.curve.head if case.curve is not None else None
    mistakes = (
        *possible(UNIT_MISTAKES, {"head": points.value_unit if points is not None else 0.0}),
        *stage_mistakes(case.bid.stages),
    )
    heads = (mistake for mistake in mistakes if mistake.quantity == "head")
    return tuple(one.words for one in heads if MEANT[0] <= ratio / one.factor <= MEANT[1])


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
            "{yours} gives {head} at {rated_flow}; {rated_head} are asked for. Please offer a diameter that meets"
            " the duty.",
        ),
        "viscous": Wording(
            "Head at rated flow {rated_flow} is {head}, {ratio} of the rated head {rated_head}: the bidder's water"
            " curve ({in_water} there), corrected for viscosity by ANSI/HI 9.6.7.",
            "Your water curve gives {in_water} at {rated_flow}; brought to the liquid's viscosity by ANSI/HI 9.6.7 that"
            " is {head}, and {rated_head} are asked for. Please send your own curve for the liquid, and offer a"
            " diameter that meets the duty.",
        ),
        "explained": Wording(
            "Head at rated flow {rated_flow} is {head}, {ratio} of the rated head {rated_head}. It would be explained"
            " if {causes}.",
            "{yours} gives {head} at {rated_flow}; {rated_head} are asked for. It looks as if {causes}. Please"
            " confirm and correct.",
        ),
        "claimed": Wording(
            "Head at rated flow {rated_flow} is claimed as {head}, {ratio} of the rated head {rated_head}; the curve"
            " does not reach it.",
            "You claim {head} at {rated_flow}; {rated_head} are asked for. Please offer a diameter that meets the"
            " duty, with its curve.",
        ),
    },
)
