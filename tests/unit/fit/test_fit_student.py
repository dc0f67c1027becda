"""Quantiles of Student's t over the range in use."""

import pytest
from scipy.special import stdtrit

from bidcheck.errors import OutOfRange
from bidcheck.fit import student_quantile


@pytest.mark.parametrize("freedom", [1, 2, 3, 4, 7, 8, 25, 100])
@pytest.mark.parametrize("confidence", [0.5, 0.95, 1 - 0.01 / 14, 1 - 0.01 / 56])
def test_agrees_with_scipy(confidence, freedom):
    assert student_quantile(confidence, freedom) == pytest.approx(stdtrit(freedom, 0.5 + confidence / 2), rel=1e-8)


@pytest.mark.parametrize(("confidence", "freedom"), [(0.0, 3), (1.0, 3), (0.95, 0), (0.95, 1001)])
def test_outside_its_range(confidence, freedom):
    with pytest.raises(OutOfRange):
        student_quantile(confidence, freedom)
