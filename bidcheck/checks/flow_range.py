"""Every flow the inquiry asks for lies in the range the bidder allows.

The pump will be run over the whole range of the plant, not at one point. The smallest flow must not lie below the
minimum continuous flow the bidder states, the largest not above the largest allowable flow, or the end of the curve
where none is stated.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import flow
from bidcheck.checks.request import asked
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import Limit, within
from bidcheck.quantity import Kind


def run(case: Case) -> Iterator[Measured]:
    """Compare the ends of the operating range with what the bidder allows."""
    claims = case.bid.claims
    smallest = min(at.flow for _, at in case.operating)
    largest = max(at.flow for _, at in case.operating)
    if claims.min_continuous_flow is None:
        yield asked("smallest flow", "minimum continuous flow")
    else:
        allowed = claims.min_continuous_flow
        limit = Limit("min_continuous_flow", Kind.FLOW, allowed.value, None, "stated by the bidder", "bidder")
        yield Measured(
            subject="smallest flow",
            holds=within(smallest, limit, slack=allowed.half_digit),
            evidence={"smallest_flow": flow(smallest), "allowed": flow(allowed.value)},
            wording="smallest",
        )
    if claims.max_allowable_flow is not None:
        allowed = claims.max_allowable_flow
        limit = Limit("max_allowable_flow", Kind.FLOW, None, allowed.value, "stated by the bidder", "bidder")
        yield Measured(
            subject="largest flow",
            holds=within(largest, limit, slack=allowed.half_digit),
            evidence={"largest_flow": flow(largest), "allowed": flow(allowed.value)},
        )
    elif case.pumped is None or case.pumped.head is None:
        yield asked("largest flow", "largest allowable flow")
    else:
        end = case.pumped.head.domain[1]
        limit = Limit("end_of_curve", Kind.FLOW, None, end, "last point of the head curve", "bidder")
        yield Measured(
            subject="largest flow",
            holds=within(largest, limit),
            evidence={"largest_flow": flow(largest), "allowed": flow(end)},
            wording="end of curve",
        )


CHECK = Check(
    name="flow-range",
    group="duty",
    run=run,
    otherwise=Verdict.QUERY,
    source="the inquiry against the bidder's own limits",
    wordings={
        "": Wording(
            "Largest flow {largest_flow} against the largest allowable flow the bidder states, {allowed}.",
            "The inquiry asks for {largest_flow}; you allow {allowed}. Please offer a pump for the whole range.",
        ),
        "smallest": Wording(
            "Smallest flow {smallest_flow} against the minimum continuous flow the bidder states, {allowed}.",
            "The inquiry asks for {smallest_flow}; your minimum continuous flow is {allowed}. Please offer a pump for"
            " the whole range, or say what bypass you require.",
        ),
        "end of curve": Wording(
            "Largest flow {largest_flow} against the end of the head curve, {allowed}; the bidder states no largest"
            " allowable flow.",
            "The inquiry asks for {largest_flow}; your curve ends at {allowed}. Please extend it and state the"
            " largest allowable flow.",
        ),
    },
)
