"""What a Fit carries."""

import numpy as np
import pytest

from bidcheck.errors import OutOfRange
from bidcheck.fit import fit_points, solve
from tests.build import points

FLOW = np.array([20.0, 45, 60, 80, 100, 125, 140])
X = FLOW / 100
EFFICIENCY = np.round(0.8 * (2 * X - X**2) - 0.03 * X * (X - 1) ** 2, 3)


def test_efficiency_is_zero_at_zero_flow_though_its_points_begin_later():
    fit = fit_points(points(FLOW, EFFICIENCY, half_digit=0.0005), "efficiency")
    assert fit.polynomial(0.0) == pytest.approx(0.0, abs=1e-12)
    assert fit.domain == (FLOW[0] / 3600, FLOW[-1] / 3600)
    assert len(fit.polynomial.coef) == fit.degree + 1
    with pytest.raises(OutOfRange):
        fit.at(10 / 3600)


def test_efficiency_equals_the_constrained_solution_in_plain_powers():
    fit = fit_points(points(FLOW, EFFICIENCY, half_digit=0.0005), "efficiency")
    plain = solve(X[:, None] ** np.arange(1, fit.degree + 1), EFFICIENCY)
    for x in (0.2, 0.7, 1.1, 1.4):
        row = x ** np.arange(1, fit.degree + 1)
        assert fit.at(x / 36) == pytest.approx(row @ plain.coefficients, rel=1e-9)
        error = np.sqrt(row @ plain.unit_covariance @ row) * max(plain.deviation, 0.0005 / 3**0.5)
        assert fit.half_width(x / 36) == pytest.approx(fit.t95 * error, rel=1e-6)
    assert fit.rms == pytest.approx(plain.deviation, rel=1e-6)


def test_a_zero_point_adds_nothing_to_what_is_known_to_be_zero():
    bare = fit_points(points(FLOW, EFFICIENCY, half_digit=0.0005), "efficiency")
    flow, value = np.concatenate([[0], FLOW]), np.concatenate([[0], EFFICIENCY])
    with_zero = fit_points(points(flow, value, half_digit=0.0005), "efficiency")
    assert with_zero.degree == bare.degree
    assert with_zero.at(1 / 36) == pytest.approx(bare.at(1 / 36), rel=1e-12)
    assert with_zero.points == bare.points == 7
    assert with_zero.covers(0.0)
    assert not bare.covers(0.0)


def test_perfect_points_keep_the_uncertainty_of_their_digits():
    coarse = fit_points(points(FLOW, 50 - 8 * X**2, half_digit=0.05), "head")
    fine = fit_points(points(FLOW, 50 - 8 * X**2, half_digit=0.005), "head")
    assert coarse.rms < 1e-12
    assert coarse.half_width(1 / 36) == pytest.approx(10 * fine.half_width(1 / 36), rel=1e-9)


def test_three_points_leave_one_degree_of_freedom():
    fit = fit_points(points([10, 20, 30], [5.0, 4.0, 3.5]), "head")
    assert fit.degree == 1
    assert fit.t95 == pytest.approx(12.706, abs=0.001)
    assert np.isfinite(fit.half_width(20 / 3600))
