"""Motor efficiency by class, and the index of the European regulation over its three load points."""

import pytest

from bidcheck.estimates.market_surface import ESOB_1450, market_efficiency
from bidcheck.estimates.minimum_efficiency import LoadPoint, minimum_efficiency_index, power_over_minimum
from bidcheck.hydraulics.driver import motor_efficiency


# source: IEC 60034-30-1, nominal efficiencies at 50 Hz for 2, 4 and 6 poles; coefficients of UK SI 2021/745: kW, class
@pytest.mark.parametrize(
    ("rating", "efficiency_class", "printed"),
    [
        (7.5, "IE3", (90.1, 90.4, 89.1)),
        (37.0, "IE3", (93.7, 93.9, 93.3)),
        (110.0, "IE4", (96.0, 96.3, 95.8)),
    ],
)
def test_motor_efficiency(rating, efficiency_class, printed):
    found = [100 * motor_efficiency(1000 * rating, poles, efficiency_class) for poles in (2, 4, 6)]
    assert found == pytest.approx(printed, abs=0.05)


# source: Regulation (EU) No 547/2012, Annex III: a pump exactly at the constant of an index has that index; part load
# source: 0.947 and over load 0.985 of it from memory
@pytest.mark.parametrize("mei", [0.10, 0.40])
def test_a_pump_at_the_constant_has_that_index(mei):
    best = market_efficiency(ESOB_1450, mei, 30.0, 100 / 3600)
    found = minimum_efficiency_index(
        ESOB_1450, nq=30.0, flow=100 / 3600, best=best, part_load=0.947 * best, over_load=0.985 * best
    )
    assert found.value == pytest.approx(mei, abs=1e-4)
    assert found.points == 3


# source: Regulation (EU) No 547/2012, definition of MEI: all three load points together, so the least of them counts
def test_the_least_load_point_counts():
    best = market_efficiency(ESOB_1450, 0.40, 30.0, 100 / 3600)
    found = minimum_efficiency_index(ESOB_1450, nq=30.0, flow=100 / 3600, best=best, part_load=0.93 * best)
    alone = minimum_efficiency_index(ESOB_1450, nq=30.0, flow=100 / 3600, best=best)
    assert found.value < 0.4
    assert alone.value == pytest.approx(0.4, abs=1e-4)


# source: from memory: 10 CFR 431.464 and its test procedure: load points at 75, 100 and 110 %, 0.947 and 0.985
def test_a_pump_at_the_least_efficiency_takes_all_the_power_allowed():
    least = 0.75
    loads = [LoadPoint(0.75, 1.1, 0.947 * least), LoadPoint(1.0, 1.0, least), LoadPoint(1.1, 0.94, 0.985 * least)]
    assert power_over_minimum(least, loads) == pytest.approx(1.0)
