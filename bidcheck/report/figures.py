"""The figures of an evaluation: head, efficiency with the independent band, NPSH3 against what is available."""

from collections.abc import Iterator
from typing import TYPE_CHECKING

import numpy as np

from bidcheck.curve import Column, Curve, Fit, Fits
from bidcheck.evaluation import BidEvaluation, Evaluation
from bidcheck.inquiry import Duty
from bidcheck.quantity import Kind, UnitSystem
from bidcheck.report.drawing import (
    HALO,
    Look,
    as_svg,
    axis_label,
    converted,
    label_ends,
    look,
    new_figure,
    one,
)
from bidcheck.report.format import bare, plain
from bidcheck.report.overlays import draw_available, draw_estimates

if TYPE_CHECKING:
    from matplotlib.axes import Axes
    from matplotlib.figure import Figure

STEPS = 120


def head_figure(evaluation: Evaluation, system: UnitSystem) -> str:
    """Head of every bid at its offered diameter, as pumped, with the duty and the operating range. SVG text."""
    figure = drawn_head(evaluation, system)
    return as_svg(figure, "head", "Head against flow for every bid, with the duty and the operating range.")


def drawn_head(evaluation: Evaluation, system: UnitSystem) -> "Figure":
    """The figure behind `head_figure`, axes in the units printed."""
    figure, axes = new_figure(axis_label("flow", Kind.FLOW, system), axis_label("head", Kind.HEAD, system))
    _draw_all(axes, evaluation, "head", Kind.HEAD, system)
    duty = evaluation.inquiry.duty
    x, y = one(duty.rated_flow, Kind.FLOW, system), one(duty.rated_head, Kind.HEAD, system)
    axes.plot([x], [y], marker="+", markersize=16, markeredgewidth=2.2, color="black", linestyle="none", zorder=6)
    axes.annotate("duty", (x, y), xytext=(7, 9), textcoords="offset points", fontsize=9, weight="bold", bbox=HALO)
    low, high = axes.get_ylim()
    axes.set_ylim(bottom=max(0.0, low - 0.25 * (high - low)))
    _finish(axes, evaluation, "head", Kind.HEAD, system)
    return figure


def efficiency_figure(evaluation: Evaluation, system: UnitSystem) -> str:
    """Efficiency of every bid, and at its best efficiency what independent estimates expect. SVG text."""
    figure, axes = new_figure(
        axis_label("flow", Kind.FLOW, system), axis_label("efficiency", Kind.SHARE, system), height=6.0
    )
    _draw_all(axes, evaluation, "efficiency", Kind.SHARE, system)
    axes.set_ylim(0.0, min(100.0, max(60.0, axes.get_ylim()[1] + 5.0)))
    _finish(axes, evaluation, "efficiency", Kind.SHARE, system)
    draw_estimates(axes, evaluation, system)
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
    draw_available(axes, evaluation, system)
    axes.set_ylim(0.0, 1.06 * axes.get_ylim()[1])
    _finish(axes, evaluation, "npsh3", Kind.NPSH, system)
    return as_svg(figure, "npsh", "NPSH3 against flow for every bid, with NPSH available and the margin wanted.")


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
        words = f"odd point, {bare(item.would_fit, kind, system)} would fit"
        axes.annotate(
            words, (x0, found), xytext=(8, -3), textcoords="offset points", fontsize=8, color=how.colour, bbox=HALO
        )


def _shade_range(axes: "Axes", duty: Duty, system: UnitSystem) -> None:
    """Shade the operating range and mark rated flow."""
    flows = [q for q in (duty.min_flow, duty.rated_flow, duty.max_flow) if q is not None]
    if len(flows) > 1:
        low, high = one(min(flows), Kind.FLOW, system), one(max(flows), Kind.FLOW, system)
        axes.axvspan(low, high, color="#eef2f5", zorder=0, linewidth=0)
    axes.axvline(one(duty.rated_flow, Kind.FLOW, system), color="#888888", linewidth=0.8, zorder=1)


def _finish(axes: "Axes", evaluation: Evaluation, column: Column, kind: Kind, system: UnitSystem) -> None:
    """Flow from zero to the last of curves and duty, names at the ends of the curves."""
    ends = list(_ends(evaluation, column, kind, system))
    duty = evaluation.inquiry.duty
    largest = one(max(duty.rated_flow, duty.max_flow or 0.0), Kind.FLOW, system)
    axes.set_xlim(0.0, max([largest, *(x for _, x, _, _ in ends)]) * 1.02)
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
