"""One consistent way to draw: sizes, line styles, labels that do not overlap, SVG that repeats byte for byte."""

import io
import re
from collections.abc import Sequence
from typing import TYPE_CHECKING, Any, NamedTuple

import numpy as np

from bidcheck.curve import Floats
from bidcheck.quantity import Kind, UnitSystem
from bidcheck.units import from_si

if TYPE_CHECKING:
    from matplotlib.axes import Axes
    from matplotlib.figure import Figure

WIDTH, HEIGHT = 9.0, 4.6
"""Size of a figure [in]."""
HALO: Any = {"boxstyle": "square,pad=0.1", "facecolor": "white", "edgecolor": "none", "alpha": 0.8}
"""White behind words, so that a curve beneath does not strike them out."""


class Look(NamedTuple):
    """How one bid is drawn in every figure: told apart by colour, by line and by marker, so in grey as well."""

    colour: str
    line: str
    marker: str


LOOKS = (
    Look("#1b4f72", "-", "o"),
    Look("#b9531a", "--", "s"),
    Look("#1e7a5a", "-.", "^"),
    Look("#7b3f8c", ":", "D"),
    Look("#8a6d00", (0, (5, 1, 1, 1, 1, 1)), "v"),  # type: ignore[arg-type]
    Look("#444444", (0, (8, 2)), "P"),  # type: ignore[arg-type]
    Look("#a02c50", (0, (3, 1)), "X"),  # type: ignore[arg-type]
    Look("#2f6f9f", (0, (1, 1)), "<"),  # type: ignore[arg-type]
)
"""One look per bid, in order; they repeat beyond eight bids."""


def look(index: int) -> Look:
    """The look of the bid at this place."""
    return LOOKS[index % len(LOOKS)]


def converted(values: Floats, kind: Kind, system: UnitSystem) -> Floats:
    """SI values in the unit printed, shares in per cent."""
    if kind in (Kind.SHARE, Kind.WHOLE_SHARE):
        return values * 100.0
    unit = kind.printed(system).unit
    zero, one = from_si(0.0, unit, kind), from_si(1.0, unit, kind)
    return np.asarray(zero + (one - zero) * values, dtype=np.float64)


def one(value: float, kind: Kind, system: UnitSystem) -> float:
    """One SI value in the unit printed."""
    return float(converted(np.array([value]), kind, system)[0])


def axis_label(words: str, kind: Kind, system: UnitSystem) -> str:
    """Name of an axis with its unit."""
    return f"{words} [{kind.printed(system).unit}]"


def new_figure(x_label: str, y_label: str, height: float = HEIGHT) -> "tuple[Figure, Axes]":
    """An empty figure with one pair of axes."""
    from matplotlib.figure import Figure

    figure = Figure(figsize=(WIDTH, height), layout="constrained")
    axes = figure.add_subplot()
    axes.set_xlabel(x_label)
    axes.set_ylabel(y_label)
    axes.grid(True, color="#dddddd", linewidth=0.6)
    axes.set_axisbelow(True)
    for side in ("top", "right"):
        axes.spines[side].set_visible(False)
    return figure, axes


def spread(wanted: Sequence[float], gap: float) -> list[float]:
    """Places near those wanted that keep a gap from one another, in the same order of height.

    Examples
    --------
    >>> spread([10.0, 10.2, 15.0], 1.0)
    [9.6, 10.6, 15.0]
    """
    order = sorted(range(len(wanted)), key=lambda k: wanted[k])
    blocks: list[tuple[float, list[int]]] = []
    for k in order:
        blocks.append((wanted[k], [k]))
        while len(blocks) > 1 and _bottom(blocks[-1], gap) - _top(blocks[-2], gap) < gap - 1e-12:
            (high, upper), (low, lower) = blocks.pop(), blocks.pop()
            members = lower + upper
            blocks.append(((low * len(lower) + high * len(upper)) / len(members), members))
    places = [0.0] * len(wanted)
    for centre, members in blocks:
        for number, k in enumerate(members):
            places[k] = centre + gap * (number - 0.5 * (len(members) - 1))
    return places


def _bottom(block: tuple[float, list[int]], gap: float) -> float:
    return block[0] - 0.5 * gap * (len(block[1]) - 1)


def _top(block: tuple[float, list[int]], gap: float) -> float:
    return block[0] + 0.5 * gap * (len(block[1]) - 1)


def label_ends(axes: "Axes", labels: Sequence[tuple[str, float, float, str]]) -> None:
    """Write names beside the ends of curves: (name, x, y, colour), moved apart where they would overlap."""
    if not labels:
        return
    low, high = axes.get_ylim()
    left, right = axes.get_xlim()
    for group in _neighbours(labels, 0.12 * (right - left)):
        places = spread([y for _, _, y, _ in group], 0.055 * (high - low))
        edge = max(x for _, x, _, _ in group) + 0.015 * (right - left)
        for (name, x, y, colour), place in zip(group, places, strict=True):
            axes.annotate(
                name,
                xy=(x, y),
                xytext=(edge, place),
                color=colour,
                fontsize=9,
                va="center",
                annotation_clip=False,
                parse_math=False,
                bbox=HALO,
                zorder=7,
                arrowprops={"arrowstyle": "-", "color": colour, "linewidth": 0.5, "shrinkA": 0, "shrinkB": 2},
            )


def _neighbours(
    labels: Sequence[tuple[str, float, float, str]], near: float
) -> list[list[tuple[str, float, float, str]]]:
    """Labels in groups whose curves end close to one another."""
    groups: list[list[tuple[str, float, float, str]]] = []
    for label in sorted(labels, key=lambda one: one[1]):
        if groups and label[1] - groups[-1][-1][1] <= near:
            groups[-1].append(label)
        else:
            groups.append([label])
    return groups


def as_svg(figure: "Figure", name: str, description: str) -> str:
    """SVG text of a figure to stand inside a page: the same bytes each time, ids of its own.

    Text stays text, in the page's own typeface, so that it can be searched and read aloud.
    """
    import matplotlib
    from matplotlib.backends.backend_svg import FigureCanvasSVG

    settings: Any = {"svg.hashsalt": f"bidcheck-{name}", "svg.fonttype": "none", "font.family": "sans-serif"}
    out = io.StringIO()
    with matplotlib.rc_context(settings):
        canvas: Any = FigureCanvasSVG(figure)
        canvas.print_svg(out, metadata={"Date": None, "Creator": None})
    text = out.getvalue()
    text = text[text.index("<svg") :]
    ids = re.findall(r'\bid="([^"]+)"', text)
    for identifier in sorted(set(ids), key=len, reverse=True):
        text = re.sub(rf'(id="|href="#|url\(#){re.escape(identifier)}(["\)])', rf"\g<1>{name}-{identifier}\g<2>", text)
    label = description.replace("&", "&amp;").replace('"', "&quot;").replace("<", "&lt;")
    return text.replace("<svg ", f'<svg role="img" aria-label="{label}" ', 1)
