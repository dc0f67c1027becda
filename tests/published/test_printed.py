"""The comparison of figures as printed can fail: just inside and just outside half a digit."""

import pytest

from tests.published.printed import assert_as_printed


# source: definition of rounding to the last printed digit: 73.94 stands for 73.935 to 73.945, 235 for 234.5 to 235.5
@pytest.mark.parametrize(
    ("value", "printed"),
    [(73.945, "73.94"), (73.935, "73.94"), (234.5, "235"), (-0.0049, "0.00"), (0.00353, "3.53e-3")],
)
def test_just_inside(value, printed):
    assert_as_printed(value, printed)


# source: definition of rounding to the last printed digit, as above
@pytest.mark.parametrize(
    ("value", "printed"), [(73.9451, "73.94"), (73.9349, "73.94"), (235.501, "235"), (float("nan"), "1.0")]
)
def test_just_outside(value, printed):
    with pytest.raises(AssertionError):
        assert_as_printed(value, printed)


# source: definition of a printed figure: infinity has no last digit
def test_no_figure():
    with pytest.raises(AssertionError, match="not a number"):
        assert_as_printed(1.0, "inf")
