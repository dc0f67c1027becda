"""Efficiency falls away from best efficiency as it does on pumps of this specific speed.

At three quarters of best efficiency flow an ordinary pump still has 90 to 95 % of its best efficiency, at 110 % of it
98 to 99 %. A curve much more peaked has its best value lifted, or is read wrongly; one much flatter is drawn rather
than tested. Power over a year of part load hangs on it. Honest curves differ by some points from the published shapes,
and the doubt of the fit is given to the bidder; solids-handling, sealless, borehole and vertical turbine pumps get a
remark at most.
"""

from collections.abc import Iterator

from bidcheck.case import Case
from bidcheck.checks.evidence import points, share, text, whole_share
from bidcheck.checks.request import asked, asked_in_water, not_applicable
from bidcheck.checks.unlike import at_most_remark
from bidcheck.checks.verdicts import missed
from bidcheck.estimates.curve_shape import OVER, PART
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import within
from bidcheck.second_opinion import ShapeRatio


def run(case: Case) -> Iterator[Measured]:
    """Compare efficiency at part load and over load with the shapes published."""
    shape = case.estimates.shape
    for subject, flow_over_bep in (("part load", PART), ("over load", OVER)):
        if shape is None:
            yield asked_in_water(case, subject, "best efficiency")
        else:
            ratio = shape.part_load if flow_over_bep < 1 else shape.over_load
            yield _compared(case, subject, flow_over_bep, ratio)


def _compared(case: Case, subject: str, flow_over_bep: float, ratio: ShapeRatio) -> Measured:
    """One ratio against the range of the sources."""
    if ratio.offered is None:
        return asked(subject, "efficiency beside best efficiency")
    if ratio.expected is None:
        return not_applicable(subject, ratio.sources[0].reason)
    low, high = ratio.expected
    beyond = max(low - ratio.offered, ratio.offered - high, 0.0)
    limits, doubt = case.inquiry.limits, _doubt(case, flow_over_bep)
    compared = within(beyond, limits.efficiency_shape, slack=doubt)
    evidence = {
        "flow_over_bep": whole_share(flow_over_bep),
        "ratio": share(ratio.offered),
        "expected_from": share(low),
        "expected_to": share(high),
        "beyond": points(beyond),
        "form": text("more peaked" if ratio.offered < low else "flatter"),
    }
    if compared.holds:
        return Measured(subject=subject, holds=compared, evidence=evidence)
    far = within(beyond, limits.efficiency_shape_far, slack=doubt)
    limit, verdict = (limits.efficiency_shape, Verdict.REMARK) if far.holds else (far.limit, Verdict.QUERY)
    return Measured(
        subject=subject,
        verdict=at_most_remark(case.bid, missed(limit, verdict)),
        limit=limit,
        evidence=evidence,
        wording="unlike",
    )


def _doubt(case: Case, flow_over_bep: float) -> float:
    """Half the 95 % interval of the ratio, from that of the fitted efficiency there."""
    fits, best = case.max_fits, case.estimates.offered_efficiency
    if fits is None or fits.efficiency is None or fits.bep is None or best is None or best <= 0:
        return 0.0
    width = fits.efficiency.half_width(flow_over_bep * fits.bep.flow) / best
    return width if width < float("inf") else 0.0


CHECK = Check(
    name="efficiency-shape",
    group="efficiency",
    run=run,
    otherwise=Verdict.REMARK,
    limits=("efficiency_shape", "efficiency_shape_far"),
    source=(
        "Hydraulic Institute, sketch of curve shapes by specific speed; load points of Regulation (EU) 547/2012 (from"
        " memory)"
    ),
    wordings={
        "": Wording(
            "Efficiency at {flow_over_bep} of best efficiency flow is {ratio} of the best; {expected_from} to"
            " {expected_to} is expected for this specific speed."
        ),
        "unlike": Wording(
            "Efficiency at {flow_over_bep} of best efficiency flow is {ratio} of the best, {form} than expected for"
            " this specific speed, {expected_from} to {expected_to}.",
            "At {flow_over_bep} of best efficiency flow your efficiency is {ratio} of the best, {form} than pumps of"
            " this specific speed show. Please confirm the efficiency curve by a test of this hydraulic.",
        ),
    },
)
