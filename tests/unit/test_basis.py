"""A curve on the inquiry's basis: speed, stages, shaft power, liquid."""

from dataclasses import replace

import numpy as np
import pytest

from bidcheck.basis import as_pumped, at_offered_basis, viscosity_matters
from bidcheck.bid import Claims, Driver
from bidcheck.checks import missing_data, rated_on_curve
from bidcheck.finding import Verdict
from bidcheck.fit import fit_curve
from bidcheck.inquiry import Liquid, Suction
from bidcheck.prepare import npsh_available_at, prepare
from bidcheck.quantity import Assumption
from tests.build import M3H, inquiry, points, sound_bid, sound_curve, stated
from tests.unit.checks.judge import judge, sound_case

OIL = Liquid(name="oil", density=900.0, viscosity=120e-6)


def test_affinity_brings_a_curve_to_the_offered_speed():
    notes: list[Assumption] = []
    curve = at_offered_basis(sound_curve(speed_rpm=1450.0), sound_bid(), notes)
    ratio = 1480.0 / 1450.0
    before = sound_curve()
    assert curve.speed_rpm == 1480.0
    np.testing.assert_allclose(curve.head.value, before.head.value * ratio**2)
    np.testing.assert_allclose(curve.head.flow, before.head.flow * ratio)
    np.testing.assert_allclose(curve.power.value, before.power.value * ratio**3)
    np.testing.assert_allclose(curve.npsh3.value, before.npsh3.value * ratio**2)
    np.testing.assert_allclose(curve.efficiency.value, before.efficiency.value)
    np.testing.assert_allclose(curve.head.value_half_digit, before.head.value_half_digit * ratio**2)
    assert any("affinity" in note.value for note in notes)


def test_npsh3_is_brought_down_with_the_careful_exponent():
    curve = at_offered_basis(sound_curve(speed_rpm=1600.0), sound_bid(), [])
    np.testing.assert_allclose(curve.npsh3.value, sound_curve().npsh3.value * (1480 / 1600) ** 1.3)


def test_head_of_fewer_stages_is_that_of_the_whole_pump():
    curve = at_offered_basis(sound_curve(stages=1), sound_bid(stages=3), [])
    np.testing.assert_allclose(curve.head.value, 3.0 * sound_curve().head.value)
    np.testing.assert_allclose(curve.power.value, sound_curve().power.value)


def test_motor_input_becomes_shaft_power_with_the_motors_efficiency_only():
    notes: list[Assumption] = []
    known = at_offered_basis(sound_curve(power_at="motor input"), sound_bid(), notes)
    np.testing.assert_allclose(known.power.value, 0.95 * sound_curve().power.value)
    unknown = at_offered_basis(sound_curve(power_at="motor input"), sound_bid(driver=Driver(rating=110e3)), notes)
    assert unknown.power is None
    assert len(notes) == 2
    asked = sound_case({"curves": (sound_curve(power_at="motor input"),), "driver": Driver(rating=110e3)})
    assert judge(missing_data.CHECK, asked)["motor efficiency"].verdict is Verdict.NO_DATA


def test_power_goes_with_density_and_nothing_else_does():
    bid, curve = sound_bid(), sound_curve()
    fits = fit_curve(curve)
    light = Liquid(name="light", density=748.65, viscosity=0.5e-6)
    pumped = as_pumped(curve, fits, light, bid, [])
    flow = 450 * M3H
    assert pumped.power.at(flow) == pytest.approx(0.75 * fits.power.at(flow))
    assert pumped.head.at(flow) == fits.head.at(flow)
    assert pumped.power.half_width(flow) == pytest.approx(0.75 * fits.power.half_width(flow))


def small_bid():
    flow = [0, 30, 60, 80, 100, 120, 140]
    efficiency = [0, 35.0, 57.0, 64.5, 68.0, 67.5, 62.5]
    curve = sound_curve(
        head=points(flow, [92.0, 91.0, 88.0, 85.0, 80.0, 73.0, 64.0]),
        efficiency=points(flow, efficiency, 0.01),
        power=None,
        npsh3=points(flow[1:], [1.8, 1.9, 2.1, 2.5, 3.1, 4.0]),
        speed_rpm=2950.0,
    )
    return sound_bid(speed_rpm=2950.0, curves=(curve,), claims=Claims())


def test_a_water_curve_of_a_viscous_liquid_is_corrected():
    bid = small_bid()
    case = prepare(inquiry(liquid=OIL), bid)
    assert viscosity_matters(OIL, bid, case.fits)
    water, oil = case.fits, case.pumped
    assert oil.bep.flow < water.bep.flow
    assert oil.bep.efficiency < 0.8 * water.bep.efficiency
    assert oil.head.at(100 * M3H) < water.head.at(100 * M3H)
    assert oil.power.at(90 * M3H) > 0.9 * water.power.at(90 * M3H)
    assert case.estimates.offered_efficiency == water.bep.efficiency  # judged with water
    assert any("9.6.7" in note.why for note in case.assumptions)


def test_outside_the_correction_nothing_is_known_as_pumped_and_the_bid_is_incomplete():
    case = sound_case(liquid=OIL)
    assert case.pumped is None
    assert case.operating[1][1].head is None
    finding = judge(missing_data.CHECK, case)["head curve"]
    assert finding.verdict is Verdict.NO_DATA
    assert finding.decisive


def test_a_curve_as_pumped_of_a_viscous_liquid_is_not_judged_as_water():
    case = prepare(inquiry(liquid=OIL), sound_bid(curves=(sound_curve(liquid="as pumped", density=900.0),)))
    assert case.water
    assert case.estimates.efficiency is None
    assert case.at_duty.head is not None


@pytest.mark.parametrize(("head", "power"), [(62.3, 92400.0)])
def test_claims_at_the_speed_the_curve_was_drawn_for_are_a_remark(head, power):
    claims = Claims(head=stated(head, 0.05), power=stated(power, 50.0))
    case = sound_case({"curves": (sound_curve(speed_rpm=1450.0),), "claims": claims})
    findings = judge(rated_on_curve.CHECK, case)
    assert findings["head at rated flow"].verdict is Verdict.REMARK
    assert findings["power at rated flow"].verdict is Verdict.REMARK
    assert "speed the curve was drawn for" in findings["power at rated flow"].wording.message


def test_maximum_diameter_gives_specific_speed_and_rated_diameter_the_duty():
    large = sound_curve(impeller=0.43, head=replace(sound_curve().head, value=sound_curve().head.value * 1.09))
    case = sound_case({"curves": (sound_curve(), large)})
    assert case.max_fits is not case.fits
    assert case.at_duty.head == pytest.approx(case.fits.head.at(450 * M3H))
    assert case.estimates.basis == "curve of the maximum diameter"
    alone = sound_case({"curves": (large,)})
    assert alone.fits is None
    assert alone.at_duty.from_claims == ("head", "efficiency", "power", "npsh3")


def test_npsh_available_follows_from_suction_data_with_friction_growing_with_flow():
    asked = inquiry(suction=Suction(pressure=101325.0, liquid_level=3.0, friction_loss=1.0))
    rated, double = npsh_available_at(asked, 450 * M3H), npsh_available_at(asked, 900 * M3H)
    assert rated == pytest.approx(12.11, abs=0.01)
    assert rated - double == pytest.approx(3.0)


def test_npsh_available_is_not_known_at_other_flows_without_suction_data():
    assert npsh_available_at(inquiry(), 300 * M3H) is None
    assert npsh_available_at(inquiry(), 520 * M3H) == 6.3
