"""Odd points: found, left alone, said so."""

import numpy as np
import pytest

from bidcheck.fit import fit_curve, odd_points
from tests.build import points, sound_curve
from tests.synthetic_curves import mistyped

FLOW = np.linspace(0, 160, 9)
HEAD = np.round(50 - 0.0008 * FLOW**2, 1)


@pytest.mark.parametrize("index", range(1, 8))
@pytest.mark.parametrize("factor", [0.9, 1.1])
def test_a_mistyped_head_is_found_and_told_what_would_fit(index, factor):
    odd, others = odd_points(mistyped(points(FLOW, HEAD), index, factor), "head")
    assert [point.line for point in odd] == [index + 2]
    assert odd[0].would_fit == pytest.approx(HEAD[index], abs=0.2)
    assert odd[0].deviation == pytest.approx((factor - 1) * HEAD[index] / 50, abs=0.005)
    assert len(others) == 8


@pytest.mark.parametrize(("offset", "count"), [(0.4, 0), (0.6, 1)])
def test_one_per_cent_of_the_largest_value_is_the_floor(offset, count):
    head = 50 - 0.0002 * FLOW**2
    head[4] += offset
    odd, _ = odd_points(points(FLOW, head, half_digit=0.005), "head")
    assert len(odd) == count


def test_within_rounding_nothing_is_odd():
    head = HEAD.copy()
    head[4] += 1
    assert len(odd_points(points(FLOW, head, half_digit=0.05), "head")[0]) == 1
    assert odd_points(points(FLOW, head, half_digit=0.5), "head")[0] == ()


def test_a_knee_is_not_odd():
    efficiency = [0.0, 0.155, 0.302, 0.440, 0.566, 0.677, 0.768, 0.833, 0.866, 0.851, 0.742, 0.584]
    flow = [0, 12, 24, 37, 49, 61, 73, 85, 98, 110, 122, 134]
    assert odd_points(points(flow, efficiency, half_digit=0.0005), "efficiency")[0] == ()


@pytest.mark.parametrize("index", [0, 8])
@pytest.mark.parametrize(("factor", "count"), [(1.05, 0), (1.6, 1)])
def test_ends_are_held_against_extrapolation(index, factor, count):
    assert len(odd_points(mistyped(points(FLOW, HEAD), index, factor), "head")[0]) == count


@pytest.mark.parametrize(("n", "count"), [(9, 1), (12, 2)])
def test_two_odd_points_only_among_ten(n, count):
    flow = np.linspace(0, 160, n)
    value = 50 - 0.0008 * flow**2
    value[2] += 8
    value[n - 3] += 5
    odd, others = odd_points(points(flow, value, half_digit=0.05), "head")
    assert len(odd) <= count
    assert len(odd) == count or n < 10
    assert len(others) == n - len(odd)


@pytest.mark.parametrize("distance", [3, 4, 5])
def test_two_odd_points_do_not_hide_each_other(distance):
    flow = np.linspace(0, 160, 14)
    value = np.round(50 - 0.0008 * flow**2, 1)
    value[3] += 6
    value[3 + distance] -= 5
    odd, _ = odd_points(points(flow, value), "head")
    assert [point.line for point in odd] == [5, 5 + distance]


@pytest.mark.parametrize("n", [3, 4, 5])
def test_few_points_prove_nothing(n):
    flow = np.linspace(0, 160, n)
    value = 50 - 0.0008 * flow**2
    value[1] *= 1.5
    assert odd_points(points(flow, value), "head")[0] == ()


@pytest.mark.parametrize(("at_rest", "count"), [(0.0, 0), (0.008, 0), (0.05, 1)])
def test_efficiency_without_flow_is_odd(at_rest, count):
    x = FLOW / 100
    efficiency = 0.8 * (2 * x - x**2)
    efficiency[0] = at_rest
    odd, _ = odd_points(points(FLOW, efficiency, half_digit=0.0005), "efficiency")
    assert len(odd) == count
    assert all(point.would_fit == 0.0 and point.line == 2 for point in odd)


def test_the_fit_leaves_an_odd_point_out_and_lists_it():
    sound = sound_curve()
    fits = fit_curve(sound_curve(head=mistyped(sound.head, 4, 1.1)))
    assert [(point.column, point.line) for point in fits.odd_points] == [("head", 6)]
    flow = 450 / 3600
    assert fits.head.at(flow) == pytest.approx(fit_curve(sound).head.at(flow), abs=0.05)
    assert fits.head.points == len(sound.head) - 1


def test_sound_curve_has_none():
    assert fit_curve(sound_curve()).odd_points == ()
