"""Points that lie off their own curve, likely misread or mistyped."""

from dataclasses import dataclass, replace

import numpy as np

from bidcheck.curve import COLUMNS, Column, Floats, OddPoint, Points
from bidcheck.fit.candidates import Candidates, candidates, select, without
from bidcheck.fit.degree import choose_degree
from bidcheck.fit.student import student_quantile

RISK = 0.01
"""Chance of accusing any point of a curve of four columns with Gaussian scatter (Bonferroni over all points)."""
FLOOR = 0.01
"""A point closer to the curve than this share of the curve's largest value is never odd; common practice, no source."""
END_FLOOR = 0.1
"""As `FLOOR`, for the first and the last point, which are held against extrapolation; common practice, no source."""
SEEN = 0.25
"""Share of a displaced point's jumps of slope that must show at it and its neighbours; common practice, no source."""
FEWEST_POINTS = 6
"""A cubic and two points more; with fewer points nothing is called odd."""
MANY_POINTS = 10
"""From so many points on two odd points per column are looked for, else one; common practice, no source."""


@dataclass(frozen=True, slots=True)
class _Suspect:
    """Position of a point, distance from the curve of the others, and how far beyond the bound (1 = at it)."""

    index: int
    deviation: float
    excess: float


def odd_points(points: Points, column: Column) -> tuple[tuple[OddPoint, ...], Points]:
    """Find the points that lie off the curve through the others.

    Parameters
    ----------
    points : Points
        Of one column.
    column : str
        Which column.

    Returns
    -------
    odd : tuple of OddPoint
        At most one, or two from 10 points on; in order of flow.
    others : Points
        The points that remain.

    Notes
    -----
    Valid for 6 points and more; with fewer nothing is found, since the freedom left proves nothing. An efficiency
    stated at zero flow is odd with any number of points, if it differs from zero by more than 1 % of the largest.
    A point is odd if its externally studentised residual exceeds Student's t at 1 % spread over all points of four
    columns (Bonferroni) and its distance from the curve through the others exceeds 1 % of the curve's largest value.
    The degree is that chosen without the point; every higher degree with freedom left and the cubic through the four
    nearest points must put it beyond the same 1 % on the same side (10 % for the first and last point, which are held
    against extrapolation), and the slope must jump at the point and jump back at its neighbours. So a sharp knee of
    an honest curve is not taken for a mistyped figure. Where no single point is odd, two are looked for, three places
    or more apart, that are each odd without the other.
    On simulated honest curves (four columns, 7 to 14 points, nq 12 to 80, 0 to 0.5 % scatter) 0.3 to 0.6 % of curves
    are accused. Of inner heads 10 % off, 95 % are found among 9 to 11 points and half among 8 or fewer.
    Source: Cook and Weisberg (1982), Residuals and Influence in Regression, 2.2.2.

    Examples
    --------
    >>> q = np.linspace(0.0, 0.16, 9)
    >>> digit = np.full(9, 0.05)
    >>> head = np.round(50 - 800 * q**2, 1)
    >>> head[4] = 54.9
    >>> odd, others = odd_points(Points(q, head, digit, digit, np.arange(2, 11)), "head")
    >>> odd[0].line, round(odd[0].would_fit, 1), len(others)
    (6, 44.9, 8)
    """
    odd, others, _ = set_apart(points, column)
    return odd, others


def set_apart(points: Points, column: Column) -> tuple[tuple[OddPoint, ...], Points, Candidates | None]:
    """Odd points, the others, and the candidate fits through those."""
    found: list[OddPoint] = []
    most = 2 if len(points) >= MANY_POINTS else 1
    at_rest = _efficiency_at_rest(points) if column == "efficiency" else None
    if at_rest is not None:
        found, points = [at_rest], without(points, 0)
    fits = candidates(points, column)
    while fits is not None and len(found) < most and len(points) >= FEWEST_POINTS:
        suspects = _suspects(points, fits, most - len(found))
        if not suspects:
            break
        found += [_odd(points, column, suspect) for suspect in suspects]
        keep = ~np.isin(np.arange(len(points)), [suspect.index for suspect in suspects])
        points = select(points, keep)
        fits = candidates(points, column)
    return tuple(sorted(found, key=lambda odd: odd.flow)), points, fits


def _odd(points: Points, column: Column, suspect: _Suspect) -> OddPoint:
    """Tell of a suspect."""
    i, value = suspect.index, float(points.value[suspect.index])
    share = suspect.deviation / float(np.abs(without(points, i).value).max())
    return OddPoint(column, int(points.line[i]), float(points.flow[i]), value, value - suspect.deviation, share)


def _suspects(points: Points, fits: Candidates, most: int) -> list[_Suspect]:
    """The point furthest beyond its bound; or, where two hide each other, both."""
    single = _most_suspect(points, fits)
    if single is not None:
        return [single]
    displaced = _displaced(points) if most > 1 else []
    if len(displaced) < 2:
        return []
    partner = {i: _partner(points, fits.column, i) for i in displaced}
    pairs = []
    for i, found in partner.items():
        back = partner.get(found.index) if found is not None else None
        if found is not None and back is not None and back.index == i:
            pairs.append([back, found])
    return max(pairs, key=lambda pair: min(pair[0].excess, pair[1].excess), default=[])


def _displaced(points: Points) -> list[int]:
    """Points where the slope jumps and jumps back on either side, off their neighbours by more than the floor."""
    jump = np.diff(np.diff(points.value) / np.diff(points.flow))
    alone = (jump[1:-1] * jump[:-2] < 0.0) & (jump[1:-1] * jump[2:] < 0.0)
    floor = FLOOR * float(np.abs(points.value).max())
    return [i + 2 for i in np.flatnonzero(alone).tolist() if abs(_local_deviation(points, i + 2)) > floor]


def _partner(points: Points, column: Column, i: int) -> _Suspect | None:
    """The point most suspect once point `i` is left out."""
    fits = candidates(without(points, i), column)
    found = None if fits is None else _most_suspect(without(points, i), fits)
    return None if found is None else replace(found, index=found.index + (found.index >= i))


def _efficiency_at_rest(points: Points) -> OddPoint | None:
    """The point at zero flow if it claims an efficiency there, where none can be."""
    value, largest = float(points.value[0]), float(np.abs(points.value).max())
    if points.flow[0] != 0.0 or abs(value) <= max(FLOOR * largest, float(points.value_half_digit[0])):
        return None
    return OddPoint("efficiency", int(points.line[0]), 0.0, value, 0.0, value / largest)


def _most_suspect(points: Points, fits: Candidates) -> _Suspect | None:
    """The point furthest beyond its bound, None if all lie within."""
    score = _scores(fits)
    start = len(points) - len(fits.flow)
    far = np.abs(fits.left_out) > FLOOR * float(np.abs(fits.value).max())
    suspects = []
    for i in np.flatnonzero(((score > 1.0) & far).any(axis=1)).tolist():
        suspect = _suspect(points, fits, score, i, start)
        if suspect is not None:
            suspects.append(suspect)
    return max(suspects, key=lambda suspect: suspect.excess, default=None)


def _scores(fits: Candidates) -> Floats:
    """Externally studentised residual over its bound, shape (n, d); zero where no freedom is left without a point."""
    n = len(fits.flow)
    unexplained = np.maximum(1.0 - fits.leverage, 1e-12)
    squares = fits.residuals**2
    rest = squares.sum(axis=0) - squares / unexplained
    freedom = [n - 1 - parameters for parameters in fits.parameters]
    bound = [student_quantile(1.0 - RISK / (len(COLUMNS) * n), nu) if nu > 0 else np.inf for nu in freedom]
    variance = np.maximum(rest / np.maximum(freedom, 1), fits.rounding_variance)
    score: Floats = np.sqrt(squares / (unexplained * variance)) / bound
    return score


def _suspect(points: Points, fits: Candidates, score: Floats, i: int, start: int) -> _Suspect | None:
    """Judge point `i` of the fit by the degrees that the other points alone would choose."""
    others = without(points, i + start)
    rest = candidates(others, fits.column)
    if rest is None:
        return None
    k, _ = choose_degree(rest)
    k += rest.lowest - fits.lowest
    higher = [j for j in range(k, len(fits.parameters)) if len(fits.flow) - 1 - fits.parameters[j] >= 1]
    if not higher or score[i, k] <= 1.0:
        return None
    floor = FLOOR * float(np.abs(others.value).max())
    missed = fits.left_out[i, higher]
    if (np.abs(missed) <= floor).any() or (np.sign(missed) != np.sign(missed[0])).any():
        return None
    nearby = _local_deviation(points, i + start)
    at_end = i + start in (0, len(points) - 1)
    if not _agrees(nearby, float(missed[0]), END_FLOOR / FLOOR * floor if at_end else floor):
        return None
    if not _breaks_the_line(points, i + start, float(missed[0])):
        return None
    return _Suspect(i + start, float(missed[0]), float(score[i, k]))


def _breaks_the_line(points: Points, i: int, missed: float) -> bool:
    """Whether the slope jumps at point `i` and jumps back at its neighbours, which a knee does not.

    A point displaced by d changes the jump of slope at a neighbour at distance a by d/a, and its own by -d(1/a + 1/b).
    """
    step = np.diff(points.flow)
    jump = np.diff(np.diff(points.value) / step)  # jump[j - 1] at point j
    for j in (i - 1, i, i + 1):
        if 1 <= j <= len(points) - 2:
            whole = -(1 / step[i - 1] + 1 / step[i]) if j == i else 1 / abs(points.flow[i] - points.flow[j])
            if jump[j - 1] / (whole * missed) < SEEN:
                return False
    return True


def _agrees(nearby: float, missed: float, floor: float) -> bool:
    """Whether the neighbours, too, put the point beyond `floor`, on the same side and at least half as far."""
    return nearby * missed > 0.0 and min(abs(nearby), abs(missed)) > floor and abs(nearby) >= 0.5 * abs(missed)


def _local_deviation(points: Points, i: int) -> float:
    """Value less the cubic through the four points nearest in order, two on each side where there are two."""
    first = min(max(i - 2, 0), len(points) - 5)
    near = [j for j in range(first, first + 5) if j != i]
    flow, value = points.flow.tolist(), points.value.tolist()
    expected = 0.0
    for j in near:
        weight = 1.0
        for k in near:
            if k != j:
                weight *= (flow[i] - flow[k]) / (flow[j] - flow[k])
        expected += weight * value[j]
    return float(value[i] - expected)
