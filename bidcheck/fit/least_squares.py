"""Linear least squares by one orthogonal factorisation that serves all nested designs."""

from dataclasses import dataclass

import numpy as np

from bidcheck.curve import Floats
from bidcheck.errors import OutOfRange


@dataclass(frozen=True, eq=False, slots=True)
class Factors:
    """A design of n rows and m columns, factorised. The first k columns alone are a design as well.

    Attributes
    ----------
    q : array, shape (n, m)
        Orthonormal columns; the first k span the first k columns of the design.
    inverse : array, shape (m, m)
        Upper triangle that takes qᵀy to coefficients.
    leverage : array, shape (n, m)
        Column k - 1: diagonal of the hat matrix of the first k columns.
    """

    q: Floats
    inverse: Floats
    leverage: Floats


@dataclass(frozen=True, eq=False, slots=True)
class Solution:
    """Coefficients with their covariance per unit residual variance, residuals, degrees of freedom, deviation."""

    coefficients: Floats
    unit_covariance: Floats
    residuals: Floats
    freedom: int
    deviation: float
    """Residual standard deviation, n - m degrees of freedom; 0 where none is left."""

    @property
    def standard_errors(self) -> Floats:
        """Standard errors of the coefficients."""
        errors: Floats = self.deviation * np.sqrt(np.diag(self.unit_covariance))
        return errors


def factorise(design: Floats) -> Factors:
    """Factorise a design, each column first brought to length one.

    Parameters
    ----------
    design : array, shape (n, m)
        One row per point, one column per coefficient, n ≥ m. Columns that depend on earlier ones within 1e-10 (a
        guard of double precision, no source) and all after them are left out of the result.

    Returns
    -------
    Factors

    Raises
    ------
    OutOfRange
        If there are fewer rows than columns.

    Notes
    -----
    Source: Golub and Van Loan, Matrix Computations, 4th ed., 5.3 (least squares by QR).

    Examples
    --------
    >>> factorise(np.array([[1.0, -1.0], [1.0, 0.0], [1.0, 1.0]])).leverage[:, 1]
    array([0.833, 0.333, 0.833])
    """
    n, m = design.shape
    if n < m:
        raise OutOfRange(f"{m} coefficients asked from {n} points")
    length = np.sqrt(np.einsum("ij,ij->j", design, design))
    length[length == 0.0] = 1.0
    q, r = np.linalg.qr(design / length)
    dependent = np.abs(np.diagonal(r)) < 1e-10
    if dependent.any():
        keep = int(dependent.argmax())
        q, r, length = q[:, :keep], r[:keep, :keep], length[:keep]
    inverse = np.linalg.inv(r) / length[:, None]
    return Factors(q, inverse, np.cumsum(q * q, axis=1))


def nested_solutions(factors: Factors, root: Floats, values: Floats) -> tuple[Floats, Floats]:
    """Solve for the first column alone, the first two, and so on, in one pass.

    Parameters
    ----------
    factors : Factors
        Of a design with n rows and m columns.
    root : array, shape (p, m)
        Takes qᵀy to the coefficients wanted: `factors.inverse`, or a matrix times it.
    values : array, shape (n,)
        Right-hand side.

    Returns
    -------
    coefficients : array, shape (p, m)
        Column k - 1: coefficients of the first k columns.
    residuals : array, shape (n, m)
        Column k - 1: values minus fit of the first k columns.

    Examples
    --------
    >>> factors = factorise(np.array([[1.0, -1.0], [1.0, 0.0], [1.0, 1.0]]))
    >>> nested_solutions(factors, factors.inverse, np.array([1.0, 2.0, 6.0]))[0]
    array([[3. , 3. ],
           [0. , 2.5]])
    """
    projection = factors.q.T @ values
    coefficients = np.cumsum(root * projection, axis=1)
    residuals = values[:, None] - np.cumsum(factors.q * projection, axis=1)
    return coefficients, residuals


def solve(design: Floats, values: Floats) -> Solution:
    """Least-squares solution of one design, with its uncertainty.

    Parameters
    ----------
    design : array, shape (n, m)
        One row per point, one column per coefficient, n ≥ m, of full rank.
    values : array, shape (n,)
        Right-hand side.

    Returns
    -------
    Solution

    Raises
    ------
    OutOfRange
        If there are fewer rows than columns, or the columns depend on one another.

    Notes
    -----
    Source: Golub and Van Loan, Matrix Computations, 4th ed., 5.3; certified on the NIST Statistical Reference
    Datasets for linear regression (Wampler 1-5, Longley, Filip).

    Examples
    --------
    >>> line = solve(np.array([[1.0, 0.0], [1.0, 1.0], [1.0, 2.0]]), np.array([1.0, 3.0, 5.0]))
    >>> line.coefficients
    array([1.0, 2.0])
    """
    n, m = design.shape
    factors = factorise(design)
    if factors.inverse.shape[0] < m:
        raise OutOfRange("columns of the design depend on one another")
    coefficients = factors.inverse @ (factors.q.T @ values)
    coefficients = coefficients + factors.inverse @ (factors.q.T @ (values - design @ coefficients))
    residuals = values - design @ coefficients
    freedom = n - m
    deviation = float(np.sqrt(residuals @ residuals / freedom)) if freedom else 0.0
    return Solution(coefficients, factors.inverse @ factors.inverse.T, residuals, freedom, deviation)
