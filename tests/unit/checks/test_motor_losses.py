from dataclasses import replace

import pytest

from bidcheck.bid import Driver
from bidcheck.case import Case
from bidcheck.checks.motor_losses import ordinary_motor
from bidcheck.hydraulics.driver import motor_efficiency
from tests.unit.checks.judge import sound_case


def driven(driver: Driver, speed: float = 1480.0, power: float | None = 92e3) -> Case:
    """The sound bid with this driver, at this speed, taking this power at rated flow."""
    case = sound_case({"driver": driver})
    return replace(case, bid=replace(case.bid, speed_rpm=speed), at_duty=replace(case.at_duty, power=power))


@pytest.mark.parametrize(
    ("driver", "speed", "rating", "poles"),
    [
        (Driver(rating=110e3, poles=4), 1480.0, 110e3, 4),
        (Driver(rating=110e3, poles=2), 1480.0, 110e3, 2),  # stated poles count
        (Driver(rating=110e3), 2960.0, 110e3, 2),
        (Driver(rating=110e3), 3550.0, 110e3, 2),
        (Driver(rating=110e3), 1770.0, 110e3, 4),
        (Driver(rating=110e3), 985.0, 110e3, 6),
        (Driver(rating=110e3, poles=8), 740.0, 110e3, 6),  # beyond the standard, the nearest
        (Driver(), 1480.0, 1.1 * 92e3, 4),
        (Driver(rating=500.0), 1480.0, 750.0, 4),
        (Driver(rating=900e3), 1480.0, 200e3, 4),
    ],
)
def test_an_ordinary_motor_of_the_size(driver, speed, rating, poles):
    assert ordinary_motor(driven(driver, speed)) == pytest.approx(motor_efficiency(rating, poles), rel=1e-9)


def test_no_motor_without_rating_or_power():
    assert ordinary_motor(driven(Driver(), power=None)) is None
