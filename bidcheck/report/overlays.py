"""What is drawn over the curves of the bids: independent estimates of efficiency, NPSH available and the margin."""

from collections.abc import Iterator
from typing import TYPE_CHECKING, NamedTuple

import numpy as np

from bidcheck.checks.npsh_margin import is_raised, margins
from bidcheck.estimates.efficiency import error_of_estimate
from bidcheck.evaluation import Evaluation
from bidcheck.inquiry import Duty
from bidcheck.limits import Limits
from bidcheck.prepare import npsh_available_at
from bidcheck.quantity import Kind, UnitSystem
from bidcheck.report.drawing import HALO, Look, converted, look, one, spread

if TYPE_CHECKING:
    from matplotlib.axes import Axes

    from bidcheck.second_opinion import EfficiencyEstimate

BESIDE = 0.016
"""Least distance of two bands, as a share of the axis of flow."""


class _Estimated(NamedTuple):
    """The estimate of one bid and the flow it belongs to, in the unit printed."""

    flow: float
    estimate: "EfficiencyEstimate"
    how: Look


def draw_estimates(axes: "Axes", evaluation: Evaluation, system: UnitSystem) -> None:
    """Expected band and attainable value at each best efficiency; bands of neighbours stand side by side.

    Parameters
    ----------
    axes : Axes
        With its limits of flow set.
    evaluation : Evaluation
    system : UnitSystem
    """
    estimated = list(_estimated(evaluation, system))
    left, right = axes.get_xlim()
    places = spread([item.flow for item in estimated], BESIDE * (right - left))
    for x, (_, estimate, how) in zip(places, estimated, strict=True):
        if estimate.expected is not None:
            half = error_of_estimate(estimate.expected)
            low, high = 100 * (estimate.expected - half), 100 * (estimate.expected + half)
            axes.plot([x, x], [low, high], color=how.colour, linewidth=6, alpha=0.35, solid_capstyle="butt", zorder=2)
            axes.plot([x], [low - 1.4], marker=how.marker, markersize=3.5, color=how.colour, zorder=5)
        if estimate.attainable is not None:
            y = 100 * estimate.attainable
            axes.plot([x], [y], marker="_", markersize=8, color=how.colour, markeredgewidth=2.2, zorder=5)


def _estimated(evaluation: Evaluation, system: UnitSystem) -> Iterator[_Estimated]:
    """Estimates at best efficiency flow of the largest diameter given, bids without either left out."""
    for index, bid in enumerate(evaluation.bids):
        estimate, flow = bid.case.estimates.efficiency, bid.case.estimates.best_flow
        if estimate is not None and flow is not None:
            yield _Estimated(one(flow, Kind.FLOW, system), estimate, look(index))


def draw_available(axes: "Axes", evaluation: Evaluation, system: UnitSystem) -> None:
    """NPSH available at the flows where the inquiry gives it, and the NPSH3 that still leaves the margin wanted."""
    known = available(evaluation)
    if not known:
        return
    flow, npsha = (np.array(column, dtype=np.float64) for column in zip(*known, strict=True))
    x, y = converted(flow, Kind.FLOW, system), converted(npsha, Kind.NPSH, system)
    axes.plot(x, y, color="black", linewidth=2.2, marker="o", markersize=5, zorder=5)
    _name(axes, "available", x[0], y[0], bold=True)
    wanted = margins_wanted(evaluation)
    for raised in wanted:
        kept = np.array([highest_npsh3(value, evaluation.inquiry.limits, raised) for value in npsha])
        low = converted(kept, Kind.NPSH, system)
        style = ":" if raised else "--"
        axes.plot(x, low, color="black", linewidth=1.1, linestyle=style, marker="_", markersize=9, zorder=5)
        _name(axes, "less raised margin" if raised and len(wanted) > 1 else "less margin wanted", x[0], low[0])


def _name(axes: "Axes", words: str, x: float, y: float, bold: bool = False) -> None:
    """Write what a line is at its left end."""
    axes.annotate(
        words,
        (x, y),
        xytext=(-8, 6 if bold else -6),
        textcoords="offset points",
        fontsize=9,
        ha="right",
        va="center",
        weight="bold" if bold else "normal",
        bbox=HALO,
        zorder=6,
    )


def margins_wanted(evaluation: Evaluation) -> list[bool]:
    """Which margins some bid is held against: the ordinary (False), the one raised for suction specific speed (True).

    The ordinary one where no bid is held against any.
    """
    held = {
        is_raised(bid.case, at)
        for bid in evaluation.bids
        for _, at in bid.case.operating
        if at.npsh3 is not None and at.npsha is not None
    }
    return sorted(held) or [False]


def available(evaluation: Evaluation) -> list[tuple[float, float]]:
    """Flow and NPSH available at each flow the inquiry gives it for, smallest flow first [m³/s, m]."""
    duty = evaluation.inquiry.duty
    found = [(flow, npsh_available_at(evaluation.inquiry, flow)) for flow in _flows(duty)]
    return [(flow, npsha) for flow, npsha in found if npsha is not None]


def _flows(duty: Duty) -> list[float]:
    """Flows asked for, each once."""
    return sorted({q for q in (duty.min_flow, duty.normal_flow, duty.rated_flow, duty.max_flow) if q is not None})


def highest_npsh3(npsha: float, limits: Limits, raised: bool) -> float:
    """NPSH3 that just keeps the margin wanted, by difference and by ratio; the stricter governs. [m]"""
    margin, share = margins(limits, raised)
    return min(npsha - (margin.at_least or 0.0), npsha / (share.at_least or 1.0))
