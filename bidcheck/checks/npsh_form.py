"""NPSH3 rises with flow as it must.

From about 60 % of best efficiency flow upwards NPSH3 does not fall with rising flow, and beyond best efficiency it
grows about with flow or its square. A curve that falls there is misread or put together; one that stays flat is drawn,
not tested, and hides what the pump needs at the largest flow. Below 60 % honest curves may fall and are not looked at.
Misread points that odd-point names are left out.
"""

from collections.abc import Iterator

import numpy as np

from bidcheck.case import Case
from bidcheck.checks.evidence import flow, npsh, ratio, share
from bidcheck.checks.request import asked, not_applicable
from bidcheck.checks.unlike import at_most_remark
from bidcheck.checks.verdicts import missed
from bidcheck.curve import Points
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import within

FROM = 0.6
"""Share of best efficiency flow from which NPSH3 must not fall. Source: common practice, no source."""
BEYOND = 1.15
"""Share of best efficiency flow the points must reach for growth to be told. Source: common practice, no source."""
LEAST_POINTS = 3
"""Points above that share needed to speak of a fall. Source: common practice, no source."""


def run(case: Case) -> Iterator[Measured]:
    """Look for a fall above 60 % of best efficiency flow, and for growth beyond best efficiency."""
    points = case.curve.npsh3 if case.curve is not None else None
    best = case.fits.bep if case.fits is not None else None
    if points is None:
        yield asked("fall", "NPSH3 at best efficiency")
        return
    if best is None:
        yield asked("fall", "best efficiency")
        return
    odd = {item.line for item in case.fits.odd_points if item.column == "npsh3"} if case.fits is not None else set()
    keep = (points.flow >= FROM * best.flow) & ~np.isin(points.line, list(odd))
    if int(keep.sum()) < LEAST_POINTS:
        yield asked("fall", "NPSH3 at best efficiency")
        return
    yield _fall(case, points, keep)
    yield _growth(case, points)


def _fall(case: Case, points: Points, keep: "np.typing.NDArray[np.bool_]") -> Measured:
    """The greatest fall from a point to a later one, beyond printed digits."""
    values, half, flows = points.value[keep], points.value_half_digit[keep], points.flow[keep]
    tops = np.maximum.accumulate(values)
    falls = np.where(tops > 0, (tops - values) / np.where(tops > 0, tops, 1.0), 0.0)
    k = int(np.argmax(falls))
    top = int(np.argmax(values[: k + 1]))
    slack = float((half[k] + half[top]) / tops[k]) if tops[k] > 0 else 0.0
    limit = case.inquiry.limits.npsh_fall
    compared = within(float(falls[k]), limit, slack=slack)
    evidence = {
        "high": npsh(float(values[top])),
        "at_high": flow(float(flows[top])),
        "low": npsh(float(values[k])),
        "at_low": flow(float(flows[k])),
        "fall": share(float(falls[k])),
    }
    if compared.holds:
        return Measured(subject="fall", holds=compared, evidence=evidence)
    verdict = at_most_remark(case.bid, missed(limit, Verdict.QUERY))
    return Measured(subject="fall", verdict=verdict, limit=limit, evidence=evidence, wording="falls")


def _growth(case: Case, points: Points) -> Measured:
    """Exponent of growth beyond best efficiency at the rated diameter, against one that stays flat."""
    fits = case.fits
    if fits is None or fits.bep is None or fits.npsh3 is None or not fits.npsh3.covers(fits.bep.flow):
        return not_applicable("growth", "the points of NPSH3 do not reach best efficiency flow")
    best, last = fits.bep.flow, fits.npsh3.domain[1]
    start, end = fits.npsh3.at(best), fits.npsh3.at(last)
    if last < BEYOND * best or start <= 0 or end <= 0:
        return not_applicable("growth", "the points of NPSH3 do not reach 15 % beyond best efficiency flow")
    width = float(np.log(last / best))
    growth = float(np.log(end / start)) / width
    slack = 2.0 * float(points.value_half_digit[-1]) / end / width
    compared = within(growth, case.inquiry.limits.npsh_growth, slack=slack)
    wording = "growth" if compared.holds else "flat"
    return Measured(subject="growth", holds=compared, evidence={"exponent": ratio(growth)}, wording=wording)


CHECK = Check(
    name="npsh-form",
    group="suction",
    run=run,
    otherwise=Verdict.QUERY,
    limits=("npsh_fall", "npsh_growth"),
    source="common practice, no source",
    wordings={
        "": Wording("NPSH3 rises with flow above 60 % of best efficiency flow; the greatest fall is {fall}."),
        "falls": Wording(
            "NPSH3 falls with rising flow, from {high} at {at_high} to {low} at {at_low}: pumps do not show that above"
            " 60 % of best efficiency flow.",
            "Your NPSH3 falls from {high} at {at_high} to {low} at {at_low}. Please correct the curve or send the NPSH"
            " test behind it.",
        ),
        "growth": Wording("Beyond best efficiency NPSH3 rises with flow to the power {exponent}."),
        "flat": Wording(
            "Beyond best efficiency NPSH3 hardly rises, or falls (it goes with flow to the power {exponent}): it looks"
            " drawn rather than tested, and the margin at the largest flow rests on it.",
            "Your NPSH3 hardly rises beyond best efficiency. Please send the NPSH test behind it.",
        ),
    },
)
