"""Shutoff head and shutoff power stand to best efficiency as on pumps of this specific speed.

The steeper the curve, the higher the specific speed. A shutoff head or power that fits no pump of this specific speed
means a curve read wrongly, a best efficiency flow stated wrongly, or a curve put together from two pumps. What honest
curves of all kinds show is never remarked on: shutoff head 1.1 to 1.5 times, shutoff power 0.14 to 1.06 times that at
best efficiency. A droop towards shutoff is another check.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import ratio, text
from bidcheck.checks.request import asked, asked_in_water, not_applicable
from bidcheck.checks.verdicts import missed
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import Limit, within
from bidcheck.second_opinion import ShapeRatio


def run(case: Case) -> Iterator[Measured]:
    """Compare shutoff head and power with the shapes published."""
    shape, limits = case.estimates.shape, case.inquiry.limits
    if shape is None:
        yield asked_in_water(case, "shutoff head", "best efficiency")
        yield asked_in_water(case, "shutoff power", "best efficiency")
        return
    if shape.shutoff_head.offered is None:
        yield asked("shutoff head", "shutoff head")
    else:
        limit = limits.shutoff_head_shape
        yield _compared("shutoff head", "head", shape.shutoff_head, limits.shutoff_head_ordinary, limit)
    if shape.shutoff_power.offered is None:
        yield not_applicable("shutoff power", "the points give no shaft power at shutoff")
    else:
        limit = limits.shutoff_power_shape
        yield _compared("shutoff power", "power", shape.shutoff_power, limits.shutoff_power_ordinary, limit)


def _compared(subject: str, quantity: str, found: ShapeRatio, ordinary: Limit, expected: Limit) -> Measured:
    """In order where it is ordinary, or near what the sources expect."""
    assert found.offered is not None
    evidence = {"quantity": text(quantity), "ratio": ratio(found.offered)}
    if found.expected is None:
        held = within(found.offered, ordinary)
        verdict = Verdict.PASS if held.holds else missed(ordinary, Verdict.REMARK)
        return Measured(subject=subject, verdict=verdict, limit=ordinary, evidence=evidence, wording="no source")
    low, high = found.expected
    evidence |= {"expected_from": ratio(low), "expected_to": ratio(high)}
    nearest = min(max(found.offered, low), high)
    near = within(found.offered / nearest, expected)
    in_order = near.holds or within(found.offered, ordinary).holds
    return Measured(
        subject=subject,
        verdict=Verdict.PASS if in_order else missed(expected, Verdict.REMARK),
        limit=ordinary,
        evidence=evidence,
        wording="" if in_order else "unlike",
    )


CHECK = Check(
    name="curve-shape",
    group="curve form",
    run=run,
    otherwise=Verdict.REMARK,
    limits=("shutoff_head_ordinary", "shutoff_head_shape", "shutoff_power_ordinary", "shutoff_power_shape"),
    source="Hydraulic Institute, sketch of curve shapes by specific speed; head coefficients of Gülich (from memory)",
    wordings={
        "": Wording(
            "At shutoff {quantity} is {ratio} times that at best efficiency; {expected_from} to {expected_to} is"
            " expected for this specific speed."
        ),
        "unlike": Wording(
            "At shutoff {quantity} is {ratio} times that at best efficiency, unlike pumps of this specific speed"
            " ({expected_from} to {expected_to}): look at the shutoff point, best efficiency flow and units.",
            "At shutoff your {quantity} is {ratio} times that at best efficiency, where {expected_from} to"
            " {expected_to} is usual for this specific speed. Please confirm the curve.",
        ),
        "no source": Wording(
            "At shutoff {quantity} is {ratio} times that at best efficiency; no published shape covers this specific"
            " speed."
        ),
    },
)
