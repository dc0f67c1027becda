"""Head rises steadily towards shutoff.

A head curve that droops towards shutoff meets some heads at two flows: pumps in parallel can hunt or be pushed off
the line, and a throttled pump can swing. Preferred everywhere, needed in parallel. A droop of up to 1 % of shutoff
head is within the accuracy of the points. Both the fit and the points themselves must show it.
"""

from collections.abc import Iterator

import numpy as np

from bidcheck.case import Case
from bidcheck.checks.evidence import flow, head, share
from bidcheck.checks.request import asked, asked_for_curve
from bidcheck.checks.verdicts import missed
from bidcheck.curve import Fit, Points
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.limits import within


def run(case: Case) -> Iterator[Measured]:
    """Look for heads above shutoff head between shutoff and the end of the curve."""
    fit = case.pumped.head if case.pumped is not None else None
    points = case.curve.head if case.curve is not None else None
    if fit is None or points is None:
        yield asked_for_curve(case, "towards shutoff")
        return
    if not fit.covers(0.0) or fit.at(0.0) <= 0.0:
        yield asked("towards shutoff", "shutoff head")
        return
    odd = {point.line for point in case.fits.odd_points if point.column == "head"} if case.fits is not None else set()
    peak_flow, fit_droop = _fit_droop(fit)
    droop = min(fit_droop, _points_droop(points, odd))
    limit = case.inquiry.limits.shutoff_droop
    compared = within(droop, limit)
    parallel = case.inquiry.duty.pumps_running > 1
    evidence = {
        "shutoff_head": head(fit.at(0.0)),
        "highest": head(fit.at(peak_flow)),
        "peak_flow": flow(peak_flow),
        "droop": share(droop),
    }
    if compared.holds:
        yield Measured(subject="towards shutoff", holds=compared, evidence=evidence, wording="steady")
    elif parallel:
        yield Measured(
            subject="towards shutoff",
            verdict=missed(limit, Verdict.QUERY),
            limit=limit,
            evidence=evidence,
            wording="parallel",
        )
    else:
        yield Measured(subject="towards shutoff", verdict=missed(limit, Verdict.REMARK), limit=limit, evidence=evidence)


def _fit_droop(fit: Fit) -> tuple[float, float]:
    """Flow of the highest head of the fit, and how far shutoff head lies below it as a share of shutoff head."""
    lo, hi = fit.domain
    turns = fit.polynomial.deriv().roots()
    real = np.real(turns[np.abs(np.imag(turns)) < 1e-12])
    candidates = [lo, *(float(q) for q in real if lo < q < hi), hi]
    peak = max(candidates, key=lambda q: float(fit.polynomial(q)))
    shutoff = float(fit.polynomial(lo))
    return peak, max(float(fit.polynomial(peak)) / shutoff - 1.0, 0.0)


def _points_droop(points: Points, leave_out: set[int]) -> float:
    """How far the first point lies below the highest one, as a share of it."""
    keep = ~np.isin(points.line, list(leave_out))
    values = points.value[keep]
    return max(float(values.max() / values[0]) - 1.0, 0.0) if values[0] > 0 else 1.0


CHECK = Check(
    name="curve-stability",
    group="curve form",
    run=run,
    otherwise=Verdict.REMARK,
    limits=("shutoff_droop",),
    source="API 610, stable curves, rising to shutoff in parallel operation",
    wordings={
        "": Wording(
            "Head droops towards shutoff by {droop}: {shutoff_head} there against {highest} at {peak_flow}.",
            "Please state the flow below which the pump must not be throttled.",
        ),
        "parallel": Wording(
            "Head droops towards shutoff by {droop}: {shutoff_head} there against {highest} at {peak_flow}, and pumps"
            " run in parallel.",
            "Your head curve droops towards shutoff by {droop}. Pumps run in parallel here: please offer a curve that"
            " rises to shutoff.",
        ),
        "steady": Wording("Head rises towards shutoff ({shutoff_head}); droop {droop}."),
    },
)
