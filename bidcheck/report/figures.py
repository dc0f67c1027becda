"""The figures of an evaluation: head, efficiency with the independent band, NPSH3 against what is available."""

from collections.abc import Iterator
from typing import TYPE_CHECKING

import numpy as np

from bidcheck.curve import Column, Curve, Fit, Fits
from bidcheck.evaluation import BidEvaluation, Evaluation
from bidcheck.inquiry import Duty
from bidcheck.quantity import Kind, UnitSystem
from bidcheck.report.drawing import (
    Look,
    as_svg,
    axis_label,
    converted,
    label_ends,
    look,
    new_figure,
    one,
)
from bidcheck.report.format import plain

if TYPE_CHECKING:
    from matplotlib.axes import Axes

ERROR_FLOOR, ERROR_SHARE = 0.025, 0.15
"""Half width of the independent band: the larger of 2.5 points and 0.15 of the losses. Source: derived, see methods."""
STEPS = 120


def head_figure(evaluation: Evaluation, system: UnitSystem) -> str:
    """Head of every bid at its offered diameter, as pumped, with the duty and the operating range. SVG text."""
    figure, axes = new_figure(axis_label("flow", Kind.FLOW, system), axis_label("head", Kind.HEAD, system))
    _draw_all(axes, evaluation, "head", Kind.HEAD, system)
    duty = evaluation.inquiry.duty
    x, y = one(duty.rated_flow, Kind.FLOW, system), one(duty.rated_head, Kind.HEAD, system)
    axes.plot([x], [y], marker="+", markersize=16, markeredgewidth=2.2, color="black", linestyle="none", zorder=6)
    axes.annotate("duty", (x, y), xytext=(7, 9), textcoords="offset points", fontsize=9, weight="bold")
    axes.set_ylim(bottom=0.6 * axes.get_ylim()[0])
    _finish(axes, evaluation, "head", Kind.HEAD, system)
    return as_svg(figure, "head", "Head against flow for every bid, with the duty and the operating range.")


def efficiency_figure(evaluation: Evaluation, system: UnitSystem) -> str:
    """Efficiency of every bid, and at its best efficiency what independent estimates expect. SVG text."""
    figure, axes = new_figure(axis_label("flow", Kind.FLOW, system), axis_label("efficiency", Kind.SHARE, system))
    _draw_all(axes, evaluation, "efficiency", Kind.SHARE, system)
    for index, bid in enumerate(evaluation.bids):
        _draw_estimate(axes, bid, look(index), system)
    axes.set_ylim(bottom=0.0)
    _finish(axes, evaluation, "efficiency", Kind.SHARE, system)
    return as_svg(
        figure,
        "efficiency",
        "Efficiency against flow for every bid. At each best efficiency a bar spans the expected value and its error,"
        " and a short line marks the attainable value.",
    )


def npsh_figure(evaluation: Evaluation, system: UnitSystem) -> str:
    """NPSH3 of every bid against NPSH available at the flows where the inquiry gives it. SVG text."""
    figure, axes = new_figure(axis_label("flow", Kind.FLOW, system), axis_label("NPSH", Kind.NPSH, system))
    _draw_all(axes, evaluation, "npsh3", Kind.NPSH, system)
    _draw_available(axes, evaluation, system)
    axes.set_ylim(bottom=0.0)
    _finish(axes, evaluation, "npsh3", Kind.NPSH, system)
    return as_svg(figure, "npsh", "NPSH3 against flow for every bid, with NPSH available.")


def curve_figure(fits: Fits, curve: Curve, system: UnitSystem) -> str:
    """Head and efficiency of one curve with its points. SVG text."""
    figure, axes = new_figure(axis_label("flow", Kind.FLOW, system), axis_label("head", Kind.HEAD, system))
    _draw_bid(axes, fits, curve, "head", Kind.HEAD, look(0), system)
    axes.set_ylim(bottom=0.0)
    if fits.efficiency is not None:
        right = axes.twinx()
        right.set_ylabel(axis_label("efficiency", Kind.SHARE, system))
        _draw_bid(right, fits, curve, "efficiency", Kind.SHARE, look(1), system)
        right.set_ylim(0.0, 100.0)
        right.spines["top"].set_visible(False)
    axes.set_xlim(left=0.0)
    return as_svg(figure, "curve", "Head and efficiency against flow, points and fit.")


def without(evaluation: Evaluation, column: Column) -> list[str]:
    """Names of the bids that give no curve of this quantity, to be said beneath a figure."""
    return [plain(bid.case.bid.name) for bid in evaluation.bids if _fit(bid, column) is None]


def _fit(bid: BidEvaluation, column: Column) -> Fit | None:
    """Fit of one column as pumped at the rated diameter."""
    return bid.case.pumped.of(column) if bid.case.pumped is not None else None


def _draw_all(axes: "Axes", evaluation: Evaluation, column: Column, kind: Kind, system: UnitSystem) -> None:
    """Curves and points of every bid that gives this quantity."""
    _shade_range(axes, evaluation.inquiry.duty, system)
    for index, bid in enumerate(evaluation.bids):
        if bid.case.pumped is not None:
            _draw_bid(axes, bid.case.pumped, bid.case.curve, column, kind, look(index), system)


def _draw_bid(  # noqa: PLR0917
    axes: "Axes", fits: Fits, curve: Curve | None, column: Column, kind: Kind, how: Look, system: UnitSystem
) -> None:
    """One curve within its points, the points, and what is odd among them."""
    fit = fits.of(column)
    if fit is None:
        return
    flow = np.linspace(*fit.domain, STEPS)
    x, y = converted(flow, Kind.FLOW, system), converted(fit.polynomial(flow), kind, system)
    axes.plot(x, y, color=how.colour, linestyle=how.line, linewidth=1.7)
    points = curve.points(column) if curve is not None else None
    if points is None:
        return
    odd = {item.line: item for item in fits.odd_points if item.column == column}
    sound = np.array([int(line) not in odd for line in points.line])
    axes.plot(
        converted(points.flow[sound], Kind.FLOW, system),
        converted(points.value[sound], kind, system),
        linestyle="none",
        marker=how.marker,
        markersize=4,
        color=how.colour,
        markerfacecolor="white",
    )
    for item in odd.values():
        x0 = one(item.flow, Kind.FLOW, system)
        found, fits_there = one(item.value, kind, system), one(item.would_fit, kind, system)
        axes.plot([x0, x0], [found, fits_there], color=how.colour, linewidth=0.8, linestyle=":")
        axes.plot([x0], [found], marker="x", markersize=9, markeredgewidth=2, color=how.colour, linestyle="none")
        axes.annotate(
            "odd point", (x0, found), xytext=(8, -3), textcoords="offset points", fontsize=8, color=how.colour
        )


def _shade_range(axes: "Axes", duty: Duty, system: UnitSystem) -> None:
    """Shade the operating range and mark rated flow."""
    flows = [q for q in (duty.min_flow, duty.rated_flow, duty.max_flow) if q is not None]
    if len(flows) > 1:
        low, high = one(min(flows), Kind.FLOW, system), one(max(flows), Kind.FLOW, system)
        axes.axvspan(low, high, color="#eef2f5", zorder=0, linewidth=0)
    axes.axvline(one(duty.rated_flow, Kind.FLOW, system), color="#888888", linewidth=0.8, zorder=1)


def _draw_estimate(axes: "Axes", bid: BidEvaluation, how: Look, system: UnitSystem) -> None:
    """Expected band and attainable value at best efficiency flow of the largest diameter given."""
    estimate, fits = bid.case.estimates.efficiency, bid.case.max_fits
    bep = fits.bep if fits is not None else None
    if estimate is None or bep is None:
        return
    x = one(bep.flow, Kind.FLOW, system)
    if estimate.expected is not None:
        half = max(ERROR_FLOOR, ERROR_SHARE * (1.0 - estimate.expected))
        low, high = 100 * (estimate.expected - half), 100 * (estimate.expected + half)
        axes.plot([x, x], [low, high], color=how.colour, linewidth=7, alpha=0.35, solid_capstyle="butt", zorder=2)
    if estimate.attainable is not None:
        axes.plot([x], [100 * estimate.attainable], marker="_", markersize=14, color=how.colour, markeredgewidth=2)


def _draw_available(axes: "Axes", evaluation: Evaluation, system: UnitSystem) -> None:
    """NPSH available at the flows where the inquiry gives it."""
    if not evaluation.bids:
        return
    known = sorted((at.flow, at.npsha) for _, at in evaluation.bids[0].case.operating if at.npsha is not None)
    if not known:
        return
    x = converted(np.array([flow for flow, _ in known]), Kind.FLOW, system)
    y = converted(np.array([npsha for _, npsha in known], dtype=np.float64), Kind.NPSH, system)
    axes.plot(x, y, color="black", linewidth=2.2, marker="o", markersize=5, zorder=5)
    axes.annotate(
        "available", (x[0], y[0]), xytext=(-4, 7), textcoords="offset points", fontsize=9, weight="bold", ha="right"
    )


def _finish(axes: "Axes", evaluation: Evaluation, column: Column, kind: Kind, system: UnitSystem) -> None:
    """Axes from zero, names at the ends of the curves."""
    ends = list(_ends(evaluation, column, kind, system))
    right = max((x for _, x, _, _ in ends), default=1.0)
    axes.set_xlim(0.0, right * 1.02)
    label_ends(axes, ends)


def _ends(
    evaluation: Evaluation, column: Column, kind: Kind, system: UnitSystem
) -> Iterator[tuple[str, float, float, str]]:
    """Name, last point and colour of every curve drawn."""
    for index, bid in enumerate(evaluation.bids):
        fit = _fit(bid, column)
        if fit is not None:
            last = fit.domain[1]
            yield (
                plain(bid.case.bid.name),
                one(last, Kind.FLOW, system),
                one(fit.at(last), kind, system),
                look(index).colour,
            )
