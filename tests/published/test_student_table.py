"""Quantiles of Student's t against the printed table."""

import pytest

from bidcheck.fit import student_quantile


# source: from memory: table of percentiles of Student's t, as in any textbook (two-sided 95 % and 99 %)
@pytest.mark.parametrize(
    ("confidence", "freedom", "t"),
    [
        (0.95, 1, 12.706), (0.95, 2, 4.303), (0.95, 3, 3.182), (0.95, 4, 2.776), (0.95, 5, 2.571), (0.95, 10, 2.228),
        (0.95, 30, 2.042), (0.99, 1, 63.657), (0.99, 5, 4.032), (0.99, 9, 3.250), (0.999, 8, 5.041),
    ],
)  # fmt: skip
def test_printed_table(confidence, freedom, t):
    assert abs(student_quantile(confidence, freedom) - t) <= 0.0005
