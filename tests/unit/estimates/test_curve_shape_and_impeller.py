"""Ranges of the sources of shape, impeller and suction: each refuses outside its own, with the reason."""

import pytest

from bidcheck.errors import OutOfRange
from bidcheck.estimates.curve_shape import (
    efficiency_shape,
    shutoff_head_shape,
    shutoff_power_shape,
    sketch_efficiency,
    sketch_shutoff_head,
)
from bidcheck.estimates.impeller import cordier_diameter, estimate_impeller, tip_speed
from bidcheck.estimates.npsh3_expected import estimate_suction
from bidcheck.hydraulics.driver import motor_efficiency
from bidcheck.hydraulics.viscous import viscous_factors, water_point


@pytest.mark.parametrize("nq", [9.9, 200.1])
def test_the_sketch_refuses_outside_its_range(nq):
    with pytest.raises(OutOfRange):
        sketch_shutoff_head(nq)


@pytest.mark.parametrize("share", [0.24, 1.26])
def test_the_sketch_refuses_other_shares_of_flow(share):
    with pytest.raises(OutOfRange):
        sketch_efficiency(30.0, share)


def test_below_20_the_reading_at_20_is_held():
    assert sketch_shutoff_head(10.0) == sketch_shutoff_head(20.0)


@pytest.mark.parametrize(("nq", "given"), [(5.0, 0), (8.0, 1), (30.0, 2), (90.0, 1), (250.0, 0)])
def test_each_source_of_efficiency_shape_says_where_it_holds(nq, given):
    ratio = efficiency_shape(nq, 0.75, 0.9)
    assert sum(source.value is not None for source in ratio.sources) == given
    assert all((source.value is None) == bool(source.reason) for source in ratio.sources)
    assert (ratio.expected is None) is (given == 0)


def test_shutoff_rises_with_specific_speed():
    heads = [shutoff_head_shape(nq, None).expected for nq in (20.0, 40.0, 60.0, 90.0)]
    powers = [shutoff_power_shape(nq, None).expected for nq in (20.0, 40.0, 60.0, 90.0)]
    assert heads == sorted(heads)
    assert powers == sorted(powers)


def test_a_source_of_the_impeller_that_does_not_reach_says_why():
    wide = estimate_impeller(nq_eye=120.0, flow_per_eye=1.0, head_per_stage=8.0, speed_rpm=590.0, diameter=0.8)
    assert wide.expected is None
    assert wide.ratio is None
    assert wide.cordier_diameter is not None
    assert all((source.value is None) == bool(source.reason) for source in wide.sources)
    narrow = estimate_impeller(nq_eye=12.0, flow_per_eye=0.01, head_per_stage=60.0, speed_rpm=2950.0)
    assert narrow.expected is not None
    assert narrow.cordier_diameter is None
    assert narrow.tip_speed is None


def test_the_cordier_diameter_scales_with_the_pump():
    one = cordier_diameter(0.05, head_per_stage=40.0, speed_rpm=1480.0)
    twice = cordier_diameter(0.05 * 8, head_per_stage=40.0 * 4, speed_rpm=1480.0)  # D 2, Q D³, H D²
    assert twice == pytest.approx(2 * one, rel=1e-9)


@pytest.mark.parametrize(("diameter", "speed"), [(0.0, 1480.0), (0.4, 0.0), (-0.4, 1480.0)])
def test_no_tip_speed_of_nothing(diameter, speed):
    with pytest.raises(OutOfRange):
        tip_speed(diameter, speed)


def test_an_inducer_leaves_no_ordinary_npsh3():
    found = estimate_suction(2950.0, 0.03, offered=2.0, growth=None, inducer=True)
    assert {source.reason for source in found.sources} == {"an inducer is offered"}
    assert all(source.value is None for source in found.sources)


@pytest.mark.parametrize(("rating", "poles"), [(0.74e3, 4), (201e3, 4), (37e3, 8)])
def test_motor_efficiency_refuses_outside_the_standard(rating, poles):
    with pytest.raises(OutOfRange):
        motor_efficiency(rating, poles)


@pytest.mark.parametrize("viscosity", [1e-6, 20e-6, 120e-6, 400e-6])
def test_to_water_and_back_again(viscosity):
    factors = viscous_factors(viscosity, 0.03, 60.0, 2950.0)
    point = water_point(viscosity, 0.03 * factors.flow, 60.0 * factors.flow, 0.7 * factors.efficiency, 2950.0)
    assert point.flow == pytest.approx(0.03, rel=1e-6)
    assert point.head_per_stage == pytest.approx(60.0, rel=1e-6)
    assert point.efficiency == pytest.approx(0.7, rel=1e-6)


def test_no_water_point_above_all_efficiency():
    with pytest.raises(OutOfRange, match="more than 100 %"):
        water_point(400e-6, 0.03, 60.0, 0.9, 2950.0)
