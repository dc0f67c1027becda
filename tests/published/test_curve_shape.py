"""Shape of curves against the published sketch and the published example curve."""

import numpy as np
import pytest

from bidcheck.curve import Curve, Points
from bidcheck.estimates.curve_shape import (
    efficiency_shape,
    shutoff_head_ratio,
    sketch_efficiency,
    sketch_shutoff_head,
    sketch_shutoff_power,
)
from bidcheck.fit import fit_curve
from tests.published.printed import assert_as_printed


# source: Hydraulic Institute, sketch of curve shapes by specific speed, read by pixel, "approximate": nq, shutoff head
# source: and shutoff power over those at best efficiency
@pytest.mark.parametrize(("nq", "head", "power"), [(20, "1.15", "0.36"), (60, "1.41", "0.64"), (200, "2.82", "2.04")])
def test_shutoff_of_the_sketch(nq, head, power):
    assert_as_printed(sketch_shutoff_head(nq), head)
    assert_as_printed(sketch_shutoff_power(nq), power)


# source: Hydraulic Institute, sketch of curve shapes by specific speed, read by pixel, "approximate": efficiency over
# source: the best at 0.25, 0.5, 0.75, 1.1 and 1.25 of best efficiency flow
@pytest.mark.parametrize(
    ("nq", "row"),
    [
        (20, ("0.41", "0.73", "0.93", "0.99", "0.93")),
        (60, ("0.36", "0.67", "0.90", "0.98", "0.82")),
        (200, ("0.31", "0.63", "0.86", "0.90", "0.50")),
    ],
)
def test_efficiency_of_the_sketch(nq, row):
    for share, printed in zip((0.25, 0.5, 0.75, 1.1, 1.25), row, strict=True):
        assert_as_printed(sketch_efficiency(nq, share), printed)


# source: derived: H₀/H_BEP = 1.083 e^(0.47 nq/100), worked by hand
@pytest.mark.parametrize(("nq", "ratio"), [(20, "1.190"), (40, "1.307"), (60, "1.436")])
def test_shutoff_head_from_the_head_coefficients(nq, ratio):
    assert shutoff_head_ratio(nq) == pytest.approx(float(ratio), abs=0.002)


# source: Hydraulic Institute data library, example curve: gpm, ft, per cent; efficiency at 0.75 and 1.1 of best
# source: efficiency flow over the best as tabulated, 0.949 and 0.977, which the expected ranges cover with 6 points
def test_the_example_curve_is_not_out_of_shape():
    flow = np.arange(0.0, 1300.0, 100.0) * 231 * 0.0254**3 / 60
    efficiency = np.array([0, 25, 40, 50, 58, 65, 71, 75, 77, 78, 76, 72, 65]) / 100.0
    head = np.array([200, 199, 196, 192, 190, 186, 180, 175, 165, 155, 140, 125, 100]) * 0.3048
    line, half = np.arange(2, 15), np.full(13, 0.5)
    points = [
        Points(flow.copy(), values, half * 1e-5, half * scale, line.copy())
        for values, scale in ((head, 0.3048), (efficiency, 0.01))
    ]
    fits = fit_curve(Curve("curve.csv", None, 1770.0, 1, "water", 998.2, "shaft", *points, None, None))
    assert fits.bep is not None
    for share, tabulated in ((0.75, 0.949), (1.1, 0.977)):
        ratio = fits.efficiency.at(share * fits.bep.flow) / fits.bep.efficiency
        assert ratio == pytest.approx(tabulated, abs=0.02)
        low, high = efficiency_shape(30.0, share, ratio).expected
        assert low - 0.06 <= ratio <= high + 0.06
