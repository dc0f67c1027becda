"""What is drawn over the curves of the bids: independent estimates of efficiency, NPSH available and the margin."""

from collections.abc import Iterator
from typing import TYPE_CHECKING, NamedTuple

import numpy as np

from bidcheck.evaluation import Evaluation
from bidcheck.inquiry import Duty
from bidcheck.limits import Limits
from bidcheck.prepare import npsh_available_at
from bidcheck.quantity import Kind, UnitSystem
from bidcheck.report.drawing import HALO, Look, converted, look, one, spread

if TYPE_CHECKING:
    from matplotlib.axes import Axes

    from bidcheck.case import EfficiencyEstimate

ERROR_FLOOR, ERROR_SHARE = 0.025, 0.15
"""Half width of the independent band: the larger of 2.5 points and 0.15 of the losses. Source: derived, see methods."""
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
            half = max(ERROR_FLOOR, ERROR_SHARE * (1.0 - estimate.expected))
            low, high = 100 * (estimate.expected - half), 100 * (estimate.expected + half)
            axes.plot([x, x], [low, high], color=how.colour, linewidth=6, alpha=0.35, solid_capstyle="butt", zorder=2)
            axes.plot([x], [high + 1.2], marker=how.marker, markersize=3.5, color=how.colour, zorder=5)
        if estimate.attainable is not None:
            y = 100 * estimate.attainable
            axes.plot([x], [y], marker="_", markersize=8, color=how.colour, markeredgewidth=2.2, zorder=5)


def _estimated(evaluation: Evaluation, system: UnitSystem) -> Iterator[_Estimated]:
    """Estimates at best efficiency flow of the largest diameter given, bids without either left out."""
    for index, bid in enumerate(evaluation.bids):
        estimate, fits = bid.case.estimates.efficiency, bid.case.max_fits
        bep = fits.bep if fits is not None else None
        if estimate is not None and bep is not None:
            yield _Estimated(one(bep.flow, Kind.FLOW, system), estimate, look(index))


def draw_available(axes: "Axes", evaluation: Evaluation, system: UnitSystem) -> None:
    """NPSH available at the flows where the inquiry gives it, and the NPSH3 that still leaves the margin wanted."""
    known = available(evaluation)
    if not known:
        return
    flow, npsha = (np.array(column, dtype=np.float64) for column in zip(*known, strict=True))
    kept = np.array([highest_npsh3(value, evaluation.inquiry.limits) for value in npsha])
    x, y, low = (converted(v, k, system) for v, k in ((flow, Kind.FLOW), (npsha, Kind.NPSH), (kept, Kind.NPSH)))
    axes.plot(x, y, color="black", linewidth=2.2, marker="o", markersize=5, zorder=5)
    axes.plot(x, low, color="black", linewidth=1.0, linestyle="--", marker="_", markersize=9, zorder=5)
    for words, place, above in (("available", y[0], 6), ("less margin wanted", low[0], -10)):
        axes.annotate(
            words,
            (x[0], place),
            xytext=(-6, above),
            textcoords="offset points",
            fontsize=9,
            ha="right",
            va="center",
            weight="bold" if above > 0 else "normal",
            bbox=HALO,
            zorder=6,
        )


def available(evaluation: Evaluation) -> list[tuple[float, float]]:
    """Flow and NPSH available at each flow the inquiry gives it for, smallest flow first [m³/s, m]."""
    duty = evaluation.inquiry.duty
    found = [(flow, npsh_available_at(evaluation.inquiry, flow)) for flow in _flows(duty)]
    return [(flow, npsha) for flow, npsha in found if npsha is not None]


def _flows(duty: Duty) -> list[float]:
    """Flows asked for, each once."""
    return sorted({q for q in (duty.min_flow, duty.normal_flow, duty.rated_flow, duty.max_flow) if q is not None})


def highest_npsh3(npsha: float, limits: Limits) -> float:
    """NPSH3 that just keeps the ordinary margin, by difference and by ratio; the stricter governs. [m]"""
    by_margin = npsha - (limits.npsh_margin.at_least or 0.0)
    by_ratio = npsha / (limits.npsh_ratio.at_least or 1.0)
    return min(by_margin, by_ratio)
