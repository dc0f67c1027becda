"""The bid gives what is needed to judge it.

Head, efficiency or power, NPSH3 at rated flow and the driver rating decide: without them a bid is incomplete. The
rest is asked for without holding the bid up. What is missing is never taken as passed.
"""

from collections.abc import Iterator

from bidcheck.bid import Bid
from bidcheck.case import Case
from bidcheck.checks.request import Item, asked, asked_for_curve
from bidcheck.finding import Check, Measured, Verdict, Wording


def run(case: Case) -> Iterator[Measured]:
    """Go through what a bid ought to give."""
    at, bid = case.at_duty, case.bid
    yield from _need("head", "head at rated flow", at.head is not None, decisive=True)
    if case.pumped is None or case.pumped.head is None:
        yield asked_for_curve(case, "head curve", decisive=True)
    else:
        yield Measured(subject="head curve", verdict=Verdict.PASS)
    if case.brought_from_water:
        yield asked("curve as pumped", "curve for the liquid as pumped")
    efficiency_or_power = at.efficiency is not None or at.power is not None
    yield from _need("efficiency or power", "efficiency or power", efficiency_or_power, decisive=True)
    yield from _need("NPSH3", "NPSH3 at rated flow", at.npsh3 is not None and at.npsh3 > 0.0, decisive=True)
    yield from _need("driver rating", "driver rating", bid.driver.rating is not None, decisive=True)
    if any(curve.power_at == "motor input" for curve in bid.curves):
        yield from _need("motor efficiency", "motor efficiency", bid.driver.efficiency is not None)
    yield from _need("minimum flow", "minimum continuous flow", bid.claims.min_continuous_flow is not None)
    yield from _diameters(bid)
    yield from _need("guarantee", "guarantee", bid.guarantee.standard is not None or bid.guarantee.grade is not None)
    yield from _need("casing rating", "casing rating", bid.casing.max_pressure is not None)


def _diameters(bid: Bid) -> Iterator[Measured]:
    """Rated and maximum diameter, asked for as they are missing."""
    rated, largest = bid.impeller_rated is not None, bid.impeller_max is not None
    request: Item = "impeller diameters" if not rated and not largest else "rated impeller diameter"
    if rated:
        request = "maximum impeller diameter"
    yield from _need("impeller diameters", request, rated and largest)


def _need(subject: str, request: Item, given: bool, *, decisive: bool = False) -> Iterator[Measured]:
    """One item: given, or asked for."""
    if given:
        yield Measured(subject=subject, verdict=Verdict.PASS)
    else:
        yield asked(subject, request, decisive=decisive)


CHECK = Check(
    name="missing-data",
    group="as submitted",
    run=run,
    otherwise=Verdict.NO_DATA,
    source="common practice, no source",
    wordings={"": Wording("Given.")},
)
