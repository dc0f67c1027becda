"""Rated flow lies near best efficiency.

A pump bought far from its best efficiency point runs rough, wears seals and bearings and wastes power for its whole
life. A sound bid puts rated flow between 80 and 110 % of best efficiency flow **at the diameter offered**. Where
the limit lies inside the uncertainty of the fitted best efficiency flow, the finding is a remark.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import flow, text, whole_share, whose_curve
from bidcheck.checks.request import asked, asked_for_curve
from bidcheck.checks.verdicts import missed
from bidcheck.curve import BestEfficiency
from bidcheck.finding import Check, Evidence, Measured, Verdict, Wording
from bidcheck.limits import within


def run(case: Case) -> Iterator[Measured]:
    """Compare rated flow with best efficiency flow, as pumped, at the rated diameter."""
    rated, limit = case.inquiry.duty.rated_flow, case.inquiry.limits.rated_over_bep
    bep = case.pumped.bep if case.pumped is not None else None
    if bep is not None:
        compared = within(rated / bep.flow, limit)
        unsure = not compared.holds and any(within(rated / q, limit).holds for q in bep.flow_interval or () if q > 0.0)
        evidence = {"rated_flow": flow(rated), "bep_flow": flow(bep.flow), "ratio": whole_share(rated / bep.flow)}
        evidence |= whose_curve(case)
        if unsure:
            evidence |= _interval(bep, case)
            yield Measured(
                subject="rated", verdict=Verdict.REMARK, limit=limit, evidence=evidence, wording="inside the interval"
            )
        else:
            yield Measured(subject="rated", holds=compared, evidence=evidence)
        return
    if case.pumped is None:
        yield asked_for_curve(case, "rated")
        return
    beyond = case.pumped.bep_beyond
    if beyond is None:
        yield asked("rated", "best efficiency")
        return
    evidence = {"rated_flow": flow(rated), "last_flow": flow(beyond), "ratio": whole_share(rated / beyond)}
    short = limit.at_least is not None and rated / beyond < limit.at_least
    yield Measured(
        subject="rated",
        verdict=missed(limit, Verdict.QUERY) if short else Verdict.NO_DATA,
        limit=limit,
        evidence=evidence,
        wording="beyond the points",
    )


def _interval(bep: BestEfficiency, case: Case) -> dict[str, Evidence]:
    """The interval of best efficiency flow, and what the bidder declares."""
    low, high = bep.flow_interval or (bep.flow, bep.flow)
    declared = case.bid.claims.bep_flow
    return {
        "low": flow(low),
        "high": flow(high),
        "declared": text("not declared") if declared is None else flow(declared.value),
    }


CHECK = Check(
    name="bep-match",
    group="operating region",
    run=run,
    otherwise=Verdict.QUERY,
    limits=("rated_over_bep",),
    source="API 610, rated flow as a share of best efficiency flow, pump as furnished",
    wordings={
        "": Wording(
            "Rated flow {rated_flow} is {ratio} of best efficiency flow {bep_flow} at the offered diameter.",
            "At the offered diameter {yours} puts best efficiency at {bep_flow}, so rated flow {rated_flow} is"
            " {ratio} of it. Please offer a selection within {limit} of it, or show by operating data why this one"
            " will run well.",
        ),
        "inside the interval": Wording(
            "Rated flow {rated_flow} is {ratio} of fitted best efficiency flow {bep_flow}, but the points fix that"
            " only between {low} and {high} (declared: {declared}), and the limit lies inside.",
        ),
        "beyond the points": Wording(
            "Efficiency still rises at the last point, {last_flow}: rated flow is less than {ratio} of best"
            " efficiency flow.",
            "Your curve ends at {last_flow} while efficiency still rises. Please extend it beyond best efficiency,"
            " and state the best efficiency flow at the offered diameter.",
        ),
    },
)
