"""Claimed best efficiency is not far ahead of what the other bids claim, each against its own expectation.

Each bid on the duty lies some points above or below the efficiency expected of its own size, speed and arrangement. An
error all estimates share moves all bids alike, so a bid far above the middle of the others stands out even where the
estimate itself is doubtful. At least three comparable bids are needed; the middle is the
median of the others, the higher of two, so that one wild bid among three drags nobody into question. Small
numbers decide little: a lone outlier is a remark, and a question only where the claim is also above what is expected by
more than the error of the estimate. Where efficiency-claim already asks for a test, it is not asked for twice.
"""

from collections.abc import Iterator
from statistics import median_high

from bidcheck.case import Case
from bidcheck.checks.evidence import count, points, share
from bidcheck.checks.request import not_applicable
from bidcheck.checks.verdicts import missed
from bidcheck.estimates.efficiency import error_of_estimate
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import within

LEAST_BIDS = 3
"""Comparable bids, this one included. Source: common practice, no source; a median of fewer says nothing."""


def run(case: Case) -> Iterator[Measured]:
    """Compare this bid's distance from its own expectation with those of the others."""
    own = distance(case)
    if own is None:
        yield not_applicable("best efficiency", "there is no claim with an independent expectation to compare")
        return
    others = [found for other in case.bids if other.bid is not case.bid and (found := distance(other)) is not None]
    if len(others) + 1 < LEAST_BIDS:
        yield not_applicable("best efficiency", f"fewer than {LEAST_BIDS} bids can be compared")
        return
    yield _placed(case, own, others)


def distance(case: Case) -> float | None:
    """Best efficiency offered less the expected one [fraction]; None where either is missing."""
    estimates = case.estimates
    estimate, claim = estimates.efficiency, estimates.offered_efficiency
    if estimate is None or estimate.expected is None or claim is None or estimates.corrected or estimates.declared:
        return None
    return claim - estimate.expected


def _placed(case: Case, own: float, others: list[float]) -> Measured:
    """The bid against the middle of the others."""
    estimate, claim = case.estimates.efficiency, case.estimates.offered_efficiency
    assert estimate is not None
    assert estimate.expected is not None
    assert claim is not None
    middle = median_high(others)
    limit = case.inquiry.limits.efficiency_peers
    compared = within(own - middle, limit)
    evidence = {
        "claim": share(claim),
        "expected": share(estimate.expected),
        "distance": points(own),
        "others": points(middle),
        "ahead": points(own - middle),
        "bids": count(len(others)),
    }
    if compared.holds:
        return Measured(subject="best efficiency", holds=compared, evidence=evidence)
    doubtful = own > error_of_estimate(estimate.expected)
    asked_already = estimate.attainable is not None and claim > estimate.attainable
    verdict = Verdict.QUERY if doubtful and not asked_already else Verdict.REMARK
    return Measured(
        subject="best efficiency",
        verdict=missed(limit, verdict),
        limit=limit,
        evidence=evidence,
        wording="ahead",
    )


CHECK = Check(
    name="efficiency-peers",
    group="efficiency",
    run=run,
    otherwise=Verdict.REMARK,
    limits=("efficiency_peers",),
    source="derived: upper median of the other bids' distances from their own independent expectations",
    wordings={
        "": Wording(
            "Best efficiency {claim} is {distance} from its own expectation, {expected}; the middle of {bids} other"
            " bids is {others}."
        ),
        "ahead": Wording(
            "Best efficiency {claim} is {distance} from its own expectation, {expected}, where the middle of {bids}"
            " other bids on this duty is {others}: {ahead} ahead of them.",
            "Your curve peaks at {claim}, where {expected} is expected for this size and specific speed. Please send a"
            " test certificate of this hydraulic, with standard and grade.",
        ),
    },
)
