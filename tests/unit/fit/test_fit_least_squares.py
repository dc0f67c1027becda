"""One factorisation serves all nested designs."""

import numpy as np
import pytest

from bidcheck.errors import OutOfRange
from bidcheck.fit.least_squares import factorise, nested_solutions, solve

U = np.linspace(-1, 1, 9)
DESIGN = U[:, None] ** np.arange(5)
VALUES = np.array([3.0, 3.1, 2.9, 2.5, 2.2, 1.8, 1.0, 0.3, -0.9])


@pytest.mark.parametrize("columns", [1, 2, 3, 4, 5])
def test_each_nested_solution_is_that_of_its_own_design(columns):
    factors = factorise(DESIGN)
    coefficients, residuals = nested_solutions(factors, factors.inverse, VALUES)
    own = solve(DESIGN[:, :columns], VALUES)
    np.testing.assert_allclose(coefficients[:columns, columns - 1], own.coefficients, atol=1e-12)
    np.testing.assert_allclose(residuals[:, columns - 1], own.residuals, atol=1e-12)


def test_left_out_residual_is_that_of_a_fit_without_the_point():
    factors = factorise(DESIGN[:, :3])
    _, residuals = nested_solutions(factors, factors.inverse, VALUES)
    for i in range(len(U)):
        others = np.arange(len(U)) != i
        without = solve(DESIGN[others, :3], VALUES[others])
        expected = VALUES[i] - DESIGN[i, :3] @ without.coefficients
        assert residuals[i, 2] / (1 - factors.leverage[i, 2]) == pytest.approx(expected, rel=1e-9)


def test_dependent_columns_are_left_out_by_factorise_and_refused_by_solve():
    design = np.column_stack([np.ones(4), np.arange(4.0), 2 * np.arange(4.0)])
    assert factorise(design).q.shape == (4, 2)
    with pytest.raises(OutOfRange):
        solve(design, np.arange(4.0))


def test_more_coefficients_than_points():
    with pytest.raises(OutOfRange):
        solve(np.ones((2, 3)), np.ones(2))


def test_no_freedom_left_gives_no_deviation():
    assert solve(np.array([[1.0, 0.0], [1.0, 1.0]]), np.array([1.0, 2.0])).deviation == 0.0
