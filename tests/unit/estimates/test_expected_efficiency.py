"""Expected efficiency: no step at any edge of a source, and nothing where there is no basis."""

import math

import pytest

from bidcheck.arrangement import ARRANGEMENTS
from bidcheck.estimates.expected import expected_efficiency, market_classes, survey_weight
from bidcheck.estimates.market_surface import ESOB_1450, ESOB_2900, MSS_2900, MSV_2900

M3H = 1 / 3600
STEP = 1.001
LARGEST_JUMP = 0.001


def expected(**changes):
    figures = {"arrangement": "end suction", "nq_eye": 30.0, "flow": 100 * M3H, "speed_rpm": 1450.0, "stages": 1}
    return expected_efficiency(**(figures | changes))


def walk(name, start, end, **fixed):
    """Largest change of c for a step of 0.1 % of one figure from start to end; None counts as a break."""
    largest, value, before = 0.0, start, None
    while value <= end:
        c = expected(**{name: value}, **fixed).value
        if c is not None and before is not None:
            largest = max(largest, abs(c - before))
        before, value = c, value * STEP
    return largest


SINGLE = [("end suction", 1450.0), ("end suction", 2960.0), ("close coupled", 1770.0), ("in-line", 3550.0)]
OTHERS = [("double suction", 990.0), ("vertical multistage", 2950.0), ("horizontal multistage", 1480.0)]


@pytest.mark.parametrize(("arrangement", "speed"), SINGLE + OTHERS)
@pytest.mark.parametrize("nq", [7.5, 8.5, 30.0, 70.0, 95.0])
def test_no_step_along_flow(arrangement, speed, nq):
    assert walk("flow", 5 * M3H, 3000 * M3H, arrangement=arrangement, speed_rpm=speed, nq_eye=nq) < LARGEST_JUMP


@pytest.mark.parametrize(("arrangement", "speed"), SINGLE + OTHERS)
@pytest.mark.parametrize("flow", [8.0, 17.9, 18.1, 21.0, 23.0, 300.0, 900.0, 1300.0])
def test_no_step_along_specific_speed(arrangement, speed, flow):
    assert walk("nq_eye", 6.5, 110.0, arrangement=arrangement, speed_rpm=speed, flow=flow * M3H) < LARGEST_JUMP


def test_no_step_where_a_fast_small_pump_leaves_the_survey():
    assert walk("flow", 18 * M3H, 60 * M3H, speed_rpm=12000.0) < LARGEST_JUMP


def test_the_edges_are_crossed_by_numbers_not_by_gaps():
    at = {flow: expected(flow=flow * M3H).value for flow in (17.0, 19.0, 25.0, 799.0, 900.0, 1000.0, 1001.0, 5000.0)}
    assert all(value is not None for value in at.values())
    assert expected(nq_eye=81.0).value is not None
    assert expected(nq_eye=7.5).value is not None


def test_origin_is_said():
    assert expected().origin == "median of the market survey"
    assert "fading" in expected(flow=900 * M3H).origin
    outside = expected(flow=2000 * M3H)
    assert outside.origin.startswith("Gülich")
    assert outside.median is None
    assert "1000 m³/h" in outside.reason


@pytest.mark.parametrize(
    "changes",
    [
        {"flow": 5.99 * M3H},
        {"flow": 17.0 * M3H, "nq_eye": 85.0},
        {"flow": 20.0 * M3H, "nq_eye": 85.0},
        {"nq_eye": 101.0},
        {"nq_eye": 6.9},
        {"flow": 17.0 * M3H, "arrangement": "double suction"},
    ],
)
def test_nothing_is_expected_without_a_basis(changes):
    found = expected(**changes)
    assert found.value is None
    assert found.origin.startswith("no expected efficiency")


def test_just_inside_the_survey():
    assert expected(flow=6.0 * M3H).value is not None
    assert expected(flow=20.0 * M3H, nq_eye=79.9).value is not None
    assert expected(flow=22.6 * M3H, nq_eye=85.0).value is not None


@pytest.mark.parametrize("arrangement", ["vertical turbine", "solids handling", "sealless"])
def test_arrangements_without_an_expectation(arrangement):
    found = expected(arrangement=arrangement)
    assert (found.value, found.spread, found.classes) == (None, None, ())
    assert arrangement in found.reason


@pytest.mark.parametrize("arrangement", ["end suction", "double suction", "in-line"])
def test_several_stages_of_a_single_stage_arrangement_have_no_class(arrangement):
    assert expected(arrangement=arrangement, stages=2).value is None


def test_double_suction_rests_on_the_table_alone():
    found = expected(arrangement="double suction", flow=500 * M3H)
    assert (found.median, found.classes) == (None, ())
    assert found.value is not None
    assert found.spread == ESOB_1450.sigma


def test_horizontal_multistage_is_the_mean_of_two_classes():
    figures = {"flow": 60 * M3H, "nq_eye": 20.0, "speed_rpm": 2950.0, "stages": 5}
    horizontal = expected(arrangement="horizontal multistage", **figures)
    vertical = expected(arrangement="vertical multistage", **figures)
    submersible = expected(arrangement="submersible multistage", **figures)
    assert horizontal.value == pytest.approx((vertical.value + submersible.value) / 2)
    assert horizontal.classes == (MSV_2900, MSS_2900)


def test_class_follows_the_nearest_nominal_speed_by_ratio():
    boundary = math.sqrt(1450 * 2900)
    assert market_classes("end suction", boundary * 0.999) == (ESOB_1450,)
    assert market_classes("end suction", boundary * 1.001) == (ESOB_2900,)
    assert market_classes("end suction", 590) == (ESOB_1450,)
    assert market_classes("end suction", 5000) == (ESOB_2900,)


def test_sixty_hertz_is_converted_at_equal_specific_speed():
    assert expected(flow=120 * M3H, speed_rpm=1740.0).value == pytest.approx(expected(flow=100 * M3H).value)


def test_weight_of_the_survey():
    assert survey_weight(30.0, 6.0 * M3H) == 0.0
    assert survey_weight(30.0, 7.5 * M3H) == pytest.approx(1.0)
    assert survey_weight(30.0, 800 * M3H) == pytest.approx(1.0)
    assert 0 < survey_weight(30.0, 900 * M3H) < 1
    assert survey_weight(80.0, 100 * M3H) == 0.0
    assert survey_weight(8.0, 100 * M3H) == 0.0


@pytest.mark.parametrize(
    ("flow", "nq", "weight", "part"),
    [
        (900.0, 30.0, math.log(1000 / 900) / math.log(1000 / 800), 1.0),
        (300.0, 70.0, math.log(80 / 70) / math.log(80 / 64), 1.0),
        (300.0, 9.0, math.log(9 / 8) / math.log(10 / 8), 1.0),
        (20.0, 9.0, math.log(9 / 8) / math.log(10 / 8), math.log(20 / 18) / math.log(1 / 0.8)),
        (300.0, 30.0, 1.0, 1.0),
        (300.0, 85.0, 0.0, 1.0),
    ],
)
def test_value_in_the_fade_by_its_definition(flow, nq, weight, part):
    from bidcheck.estimates.guelich import guelich_single_stage
    from bidcheck.estimates.market_surface import market_median

    table = guelich_single_stage(nq, flow * M3H) - 0.018
    median = market_median(ESOB_1450, nq, flow * M3H) if weight > 0 else 0.0
    share = (1 - weight) * part
    found = expected(flow=flow * M3H, nq_eye=nq)
    assert found.value == pytest.approx((1 - share) * median + share * table, abs=1e-9)
    if 0 < share < 1:
        assert f"({100 * (1 - share):.0f} %)" in found.origin
    if weight < 1:
        assert "(1.8 points)" in found.origin


@pytest.mark.parametrize("arrangement", ARRANGEMENTS)
def test_every_arrangement_is_answered(arrangement):
    found = expected(arrangement=arrangement)
    assert found.value is None or 0.5 < found.value < 0.95
