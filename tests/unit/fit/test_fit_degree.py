"""Degrees offered, degree chosen, shapes refused."""

import numpy as np
import pytest

from bidcheck.fit import fit_points
from bidcheck.fit.candidates import candidates
from bidcheck.fit.degree import choose_degree, shapes_allowed, turns, turns_allowed
from tests.build import points, sound_curve

FLOW = np.linspace(0, 140, 8)


@pytest.mark.parametrize(
    ("column", "n", "lowest", "highest"),
    [
        ("head", 3, 1, 1), ("head", 4, 2, 2), ("head", 5, 2, 3), ("head", 7, 2, 5), ("head", 14, 2, 5),
        ("efficiency", 3, 1, 1), ("efficiency", 4, 2, 2), ("efficiency", 9, 2, 5),
        ("power", 3, 1, 1), ("power", 4, 1, 2), ("power", 9, 1, 4),
        ("npsh3", 3, 1, 1), ("npsh3", 4, 1, 2), ("npsh3", 9, 1, 3),
    ],
)  # fmt: skip
@pytest.mark.parametrize("start", [0.0, 20.0])
def test_degrees_never_above_points_less_two(column, n, lowest, highest, start):
    flow = np.linspace(start, 140, n)
    fits = candidates(points(flow, 0.1 + flow / 300), column)
    assert fits.lowest == lowest
    assert fits.lowest + len(fits.parameters) - 1 == highest
    assert all(fits.freedom(k) >= 1 for k in range(len(fits.parameters)))


@pytest.mark.parametrize("column", ["head", "efficiency", "power", "npsh3"])
def test_two_points_give_no_fit(column):
    assert fit_points(points([10, 20], [5, 4]), column) is None
    assert fit_points(points([10, 20, 30], [5, 4, 3]), column) is not None


@pytest.mark.parametrize("decimals", [0, 1, 2])
def test_rounding_is_not_chased(decimals):
    head = np.round(50 - 0.0008 * FLOW**2, decimals)
    assert fit_points(points(FLOW, head, half_digit=0.5 * 10.0**-decimals), "head").degree == 2


@pytest.mark.parametrize("degree", [2, 3, 4, 5])
def test_exact_polynomial_is_recovered(degree):
    x = FLOW / 100
    head = 50 - 3 * x**2 - (4 * x**degree if degree > 2 else 0)
    fit = fit_points(points(FLOW, head, half_digit=1e-7), "head")
    assert fit.degree == degree
    assert fit.at(77 / 3600) == pytest.approx(50 - 3 * 0.77**2 - (4 * 0.77**degree if degree > 2 else 0), rel=1e-6)
    assert 0 < fit.half_width(77 / 3600) < 1e-5


def test_turns_and_their_tolerance():
    wave = np.array([0.0, 2.0, 1.0, 3.0, 3.0, 2.9])
    assert turns(wave) == 3
    assert turns(wave, 0.1000001) == 2
    assert turns(wave, 1.0) == 0
    assert turns(np.full(5, 7.0)) == 0


def test_a_curve_that_turns_where_its_points_do_not_is_refused():
    head = [60.0, 60.0, 59.9, 59.8, 59.7, 40.0, 20.0]
    fits = candidates(points(np.arange(7) * 20, head), "head")
    assert turns_allowed(fits.value, "head") == 0
    shapes = shapes_allowed(fits)
    assert not all(shapes)
    chosen, _ = choose_degree(fits)
    assert shapes[chosen] or not any(shapes)


def test_all_shapes_refused_keeps_the_lowest_degree():
    fits = candidates(points(np.arange(7) * 20, [100.0, 10.0, 5.0, 3.0, 2.9, 2.8, 2.7]), "head")
    chosen, shapes = choose_degree(fits)
    assert not any(shapes)
    assert chosen == 0


@pytest.mark.parametrize("column", ["head", "efficiency", "power", "npsh3"])
def test_flat_spots_within_rounding_are_allowed(column):
    values = [50.0, 50.0, 50.0, 49.9, 49.8, 49.5, 49.2, 48.8]
    assert any(shapes_allowed(candidates(points(FLOW + 10, values), column)))


def test_sound_curve():
    curve = sound_curve()
    head, npsh3 = fit_points(curve.head, "head"), fit_points(curve.npsh3, "npsh3")
    assert (head.degree, npsh3.degree) == (2, 2)
    assert head.at(460 / 3600) == pytest.approx(61.8, abs=0.05)
