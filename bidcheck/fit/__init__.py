"""Polynomial fits of curve points: degree, odd points, best efficiency, uncertainty."""

from bidcheck.fit.column import fit_points
from bidcheck.fit.derived_columns import derived_points
from bidcheck.fit.guard import guard
from bidcheck.fit.least_squares import Solution, solve
from bidcheck.fit.odd_points import odd_points
from bidcheck.fit.student import student_quantile
from bidcheck.fit.whole_curve import fit_curve

__all__ = [
    "Solution",
    "derived_points",
    "fit_curve",
    "fit_points",
    "guard",
    "odd_points",
    "solve",
    "student_quantile",
]
