"""Specific speed lies where pumps of this flow are ordinarily built.

Published efficiency charts end where ordinary impellers end: a narrower impeller than its flow suggests, or one
beyond mixed flow, is unusual and worth a list of like installations. Never more than a remark.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import flow, specific_speed, text
from bidcheck.checks.request import asked_in_water
from bidcheck.estimates.window import specific_speed_window
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import Limit, within
from bidcheck.quantity import Kind


def run(case: Case) -> Iterator[Measured]:
    """Compare specific speed at best efficiency with the window of its flow."""
    nq, best_flow = case.estimates.nq, case.estimates.best_flow
    if nq is None or best_flow is None:
        yield asked_in_water(case, "best efficiency", "best efficiency")
        return
    window = specific_speed_window(best_flow)
    limit = Limit(
        "specific_speed_window",
        Kind.SPECIFIC_SPEED,
        window.low,
        window.high,
        "ends of the curves of the Hydraulic Institute chart of attainable efficiency",
        "text",
    )
    yield Measured(
        subject="best efficiency",
        holds=within(nq, limit),
        evidence={"nq": specific_speed(nq), "flow": flow(best_flow), "basis": text(case.estimates.basis)},
    )


CHECK = Check(
    name="specific-speed-window",
    group="hydraulics",
    run=run,
    otherwise=Verdict.REMARK,
    source="Hydraulic Institute, chart of attainable efficiency, ends of its curves",
    wordings={
        "": Wording(
            "Specific speed is {nq} at best efficiency flow {flow} ({basis}).",
            "Specific speed {nq} is unusual for {flow}. Please send a list of like installations.",
        ),
    },
)
