"""The window of specific speed by flow as a map, with each bid's best efficiency point on it."""

from collections.abc import Iterator
from math import log10
from typing import TYPE_CHECKING, NamedTuple

import numpy as np

from bidcheck.curve import Floats
from bidcheck.errors import OutOfRange
from bidcheck.estimates.attainable import chart_efficiency
from bidcheck.estimates.window import specific_speed_window
from bidcheck.evaluation import Evaluation
from bidcheck.quantity import Kind, UnitSystem
from bidcheck.report.drawing import Look, as_svg, label_ends, look, new_figure, one
from bidcheck.report.format import plain

if TYPE_CHECKING:
    from matplotlib.axes import Axes

LOWEST, HIGHEST = 7.0, 130.0
"""Specific speeds drawn."""
AROUND = 4.0
"""Flows drawn: so many times below the smallest and above the largest best efficiency flow."""
STEPS = 70
TICKS = (1.0, 2.0, 5.0)
LINES = tuple(range(60, 96, 5))
"""Attainable efficiencies drawn as lines, per cent."""
INK = "#8a949c"


class _Placed(NamedTuple):
    """A bid on the map: flow [m³/s] and specific speed of total flow at best efficiency, and its look."""

    name: str
    flow: float
    nq: float
    how: Look


def window_figure(evaluation: Evaluation, system: UnitSystem) -> str:
    """Specific speed against best efficiency flow of every bid, over the ordinary window. SVG text; empty if no bid."""
    placed = list(_placed(evaluation))
    if not placed:
        return ""
    unit = Kind.FLOW.printed(system).unit
    speed = "specific speed, total flow" + (" [US]" if system is UnitSystem.US else " nq")
    figure, axes = new_figure(f"best efficiency flow [{unit}]", speed)
    flows = _flows(placed)
    _draw_window(axes, flows, system)
    _draw_attainable(axes, flows, system)
    for bid in placed:
        axes.plot(*_at(bid.flow, bid.nq, system), marker=bid.how.marker, markersize=8, color=bid.how.colour, zorder=6)
    axes.set_xlim(_log_flow(flows[0], system), _log_flow(flows[-1], system))
    axes.set_ylim(_log_speed(LOWEST, system), _log_speed(HIGHEST, system))
    _ticks(axes)
    label_ends(axes, [(bid.name, *_at(bid.flow, bid.nq, system), bid.how.colour) for bid in placed])
    return as_svg(figure, "window", "Specific speed of each bid at its best efficiency flow, over the ordinary window.")


def off_the_map(evaluation: Evaluation) -> list[str]:
    """Names of the bids without a best efficiency point or outside the speeds drawn, to be said beneath the map."""
    drawn = {bid.name for bid in _placed(evaluation)}
    return [plain(bid.case.bid.name) for bid in evaluation.bids if plain(bid.case.bid.name) not in drawn]


def _placed(evaluation: Evaluation) -> Iterator[_Placed]:
    """Bids with a specific speed that the map reaches."""
    for index, bid in enumerate(evaluation.bids):
        flow, nq = bid.case.estimates.best_flow, bid.case.estimates.nq
        if flow is not None and nq is not None and LOWEST <= nq <= HIGHEST:
            yield _Placed(plain(bid.case.bid.name), flow, nq, look(index))


def _flows(placed: list[_Placed]) -> Floats:
    """Flows across the map [m³/s]."""
    flows = [bid.flow for bid in placed]
    return np.geomspace(min(flows) / AROUND, max(flows) * AROUND, STEPS)


def _log_flow(flow: float, system: UnitSystem) -> float:
    return log10(one(flow, Kind.FLOW, system))


def _log_speed(nq: float, system: UnitSystem) -> float:
    return log10(one(nq, Kind.SPECIFIC_SPEED, system) if system is UnitSystem.US else nq)


def _at(flow: float, nq: float, system: UnitSystem) -> tuple[float, float]:
    """Place on the map."""
    return _log_flow(flow, system), _log_speed(nq, system)


def _draw_window(axes: "Axes", flows: Floats, system: UnitSystem) -> None:
    """Shade the ordinary window; dashed where the nearest reading is held."""
    windows = [specific_speed_window(float(flow)) for flow in flows]
    x = [_log_flow(float(flow), system) for flow in flows]
    low = [_log_speed(window.low, system) for window in windows]
    high = [_log_speed(window.high, system) for window in windows]
    axes.fill_between(x, low, high, color="#eef2f5", linewidth=0, zorder=0)
    held = np.array([window.held for window in windows])
    for edge, words, above in ((low, "narrower is unusual", False), (high, "beyond is unusual", True)):
        inside = np.where(held, np.nan, edge)
        axes.plot(x, edge, color="#444444", linewidth=1.0, linestyle="--", zorder=2)
        axes.plot(x, inside, color="#444444", linewidth=1.4, zorder=2)
        axes.annotate(
            words,
            (x[STEPS // 3], edge[STEPS // 3]),
            xytext=(0, 5 if above else -5),
            textcoords="offset points",
            fontsize=8,
            va="bottom" if above else "top",
            color="#444444",
        )


def _draw_attainable(axes: "Axes", flows: Floats, system: UnitSystem) -> None:
    """Lines of equal attainable efficiency inside the window, where the chart reaches."""
    speeds = np.geomspace(10.0, 80.0, STEPS)
    grid = np.full((STEPS, STEPS), np.nan)
    for column, flow in enumerate(flows):
        low = specific_speed_window(float(flow)).low
        for row, nq in enumerate(speeds):
            if nq < low:
                continue
            try:
                grid[row, column] = 100.0 * chart_efficiency(float(nq), float(flow))
            except OutOfRange:
                continue
    if np.isnan(grid).all() or np.nanmax(grid) < LINES[0]:
        return
    x = [_log_flow(float(flow), system) for flow in flows]
    y = [_log_speed(float(nq), system) for nq in speeds]
    lines = axes.contour(x, y, np.ma.masked_invalid(grid), levels=LINES, colors=INK, linewidths=0.8, zorder=1)
    places = [place for level in LINES if (place := _label_place(grid, level)) is not None]
    spots = [(x[column], y[row]) for row, column in places]
    axes.clabel(lines, fmt="%d %%", fontsize=8, colors=INK, manual=spots)


def _label_place(grid: Floats, level: float) -> tuple[int, int] | None:
    """Row and column where a line is labelled: near the right edge, else near the left; None where it is at neither."""
    for column in (STEPS - 6, 5):
        values = grid[:, column]
        crossed = np.flatnonzero((values[:-1] < level) & (values[1:] >= level))
        if crossed.size:
            return int(crossed[0]), column
    return None


def _ticks(axes: "Axes") -> None:
    """Ordinary numbers on both logarithmic axes."""
    for axis, limits in ((axes.xaxis, axes.get_xlim()), (axes.yaxis, axes.get_ylim())):
        decades = range(int(np.floor(limits[0])), int(np.ceil(limits[1])) + 1)
        values = [factor * 10.0**decade for decade in decades for factor in TICKS]
        shown = [value for value in values if limits[0] <= log10(value) <= limits[1]]
        axis.set_ticks([log10(value) for value in shown], [f"{value:g}" for value in shown])
