from dataclasses import replace

import pytest

from bidcheck.bid import Claims
from bidcheck.case import Case
from bidcheck.checks import curve_stability, duty_head, flow_range, missing_data, specific_speed_window
from bidcheck.finding import Verdict
from bidcheck.inquiry import Duty, Liquid
from bidcheck.quantity import UnitSystem
from bidcheck.report.words import question
from tests.build import M3H, points, sound_curve, stated
from tests.unit.checks.judge import judge, sound_case


def duty(rated_head: float = 62.0, running: int = 1) -> Duty:
    return Duty(rated_flow=450 * M3H, rated_head=rated_head, pumps_running=running, pumps_installed=running)


@pytest.mark.parametrize(
    ("rated_head", "verdict"),
    [(62.0, Verdict.PASS), (62.3, Verdict.PASS), (64.0, Verdict.QUERY), (70.0, Verdict.FAIL)],
)
def test_head_at_rated_flow(rated_head, verdict):
    assert judge(duty_head.CHECK, sound_case(duty=duty(rated_head)))["rated"].verdict is verdict


def test_head_not_reached_by_the_curve_comes_from_the_claim_or_is_no_data():
    head = points([0, 100, 200, 300, 400], [74.0, 73.6, 71.9, 69.0, 64.9])
    bid = {"curves": (sound_curve(head=head),)}
    claimed = judge(duty_head.CHECK, sound_case(bid))["rated"]
    assert claimed.verdict is Verdict.PASS
    assert "claimed" in claimed.wording.message
    silent = judge(duty_head.CHECK, sound_case(bid | {"claims": Claims()}))["rated"]
    assert silent.verdict is Verdict.NO_DATA


@pytest.mark.parametrize(
    ("claims", "smallest", "largest"),
    [
        (Claims(min_continuous_flow=stated(300 * M3H, 0.0)), Verdict.PASS, Verdict.PASS),
        (Claims(min_continuous_flow=stated(301 * M3H, 0.0)), Verdict.QUERY, Verdict.PASS),
        (Claims(max_allowable_flow=stated(520 * M3H, 0.0)), Verdict.NO_DATA, Verdict.PASS),
        (Claims(max_allowable_flow=stated(519 * M3H, 0.0)), Verdict.NO_DATA, Verdict.QUERY),
    ],
)
def test_flow_range(claims, smallest, largest):
    findings = judge(flow_range.CHECK, sound_case({"claims": claims}))
    assert findings["smallest flow"].verdict is smallest
    assert findings["largest flow"].verdict is largest


def test_flow_range_ends_with_the_curve():
    asked = Duty(rated_flow=450 * M3H, rated_head=62.0, max_flow=581 * M3H)
    assert judge(flow_range.CHECK, sound_case(duty=asked))["largest flow"].verdict is Verdict.QUERY


def drooping(shutoff: float) -> dict[str, object]:
    flow = [0, 60, 120, 180, 240, 300, 360, 420, 480, 540, 580]
    values = [
        round(shutoff + (76.0 - shutoff) * (1 - (1 - q / 150) ** 2) if q < 150 else 76.0 - 1.05e-4 * (q - 150) ** 2, 1)
        for q in flow
    ]
    return {"curves": (sound_curve(head=points(flow, values)),)}


@pytest.mark.parametrize(
    ("shutoff", "running", "verdict"),
    [
        (75.9, 2, Verdict.PASS),
        (72.0, 1, Verdict.REMARK),
        (72.0, 2, Verdict.QUERY),
    ],
)
def test_droop_towards_shutoff(shutoff, running, verdict):
    case = sound_case(drooping(shutoff), duty=duty(running=running))
    assert judge(curve_stability.CHECK, case)["towards shutoff"].verdict is verdict


def test_stability_without_shutoff_is_no_data():
    head = points([200, 300, 400, 500, 560], [71.9, 69.0, 64.9, 59.5, 55.7])
    case = sound_case({"curves": (sound_curve(head=head),)})
    assert judge(curve_stability.CHECK, case)["towards shutoff"].verdict is Verdict.NO_DATA


@pytest.mark.parametrize(("nq", "verdict"), [(25.0, Verdict.PASS), (6.0, Verdict.REMARK), (95.0, Verdict.REMARK)])
def test_specific_speed_window(nq, verdict):
    case = sound_case()
    case = replace(case, estimates=replace(case.estimates, nq=nq))
    assert judge(specific_speed_window.CHECK, case)["best efficiency"].verdict is verdict


def test_specific_speed_without_best_efficiency_is_no_data():
    case = sound_case()
    case = replace(case, estimates=replace(case.estimates, nq=None))
    assert judge(specific_speed_window.CHECK, case)["best efficiency"].verdict is Verdict.NO_DATA


@pytest.mark.parametrize("running", [1, 2])
def test_a_mandatory_limit_missed_is_a_fail_whatever_the_step(running):
    case = sound_case(drooping(72.0), duty=duty(running=running))
    own = replace(case.inquiry.limits.shutoff_droop, mandatory=True, mark="purchaser")
    case = replace(case, inquiry=replace(case.inquiry, limits=replace(case.inquiry.limits, shutoff_droop=own)))
    assert judge(curve_stability.CHECK, case)["towards shutoff"].verdict is Verdict.FAIL


def test_a_head_that_rises_with_flow_all_the_way_droops_towards_shutoff():
    q = [0, 80, 160, 240, 320, 400, 440, 480, 520, 580]
    rising = sound_curve(head=points(q, [60.0 + 0.005 * x for x in q]))
    finding = judge(curve_stability.CHECK, sound_case({"curves": (rising,)}))["towards shutoff"]
    assert finding.verdict is Verdict.REMARK
    assert float(finding.evidence["droop"].value) == pytest.approx(2.9 / 60.0, abs=0.002)


@pytest.mark.parametrize(
    ("factor", "stages", "verdict"),
    [(1 / 6, 6, Verdict.QUERY), (0.3048, 1, Verdict.QUERY), (0.5, 1, Verdict.FAIL), (0.9, 6, Verdict.FAIL)],
)
def test_a_head_on_another_basis_is_asked_about_not_failed(factor, stages, verdict):
    curve = sound_curve()
    assert curve.head is not None
    changed = replace(curve, head=replace(curve.head, value=curve.head.value * factor), stages=stages, power=None)
    bid = {"curves": (changed,), "stages": stages, "arrangement": "vertical multistage"}
    finding = judge(duty_head.CHECK, sound_case(bid))["rated"]
    assert finding.verdict is verdict
    assert ("causes" in finding.evidence) is (verdict is Verdict.QUERY)


def thick(**curve: object) -> Case:
    """A small pump whose water curve is brought to a viscous liquid."""
    base = sound_curve(**curve)
    small = {
        column: replace(one, flow=one.flow * 0.3)
        for column in ("head", "efficiency", "power", "npsh3")
        if (one := base.points(column)) is not None  # type: ignore[arg-type]
    }
    oil = Liquid(name="oil", density=880.0, viscosity=120e-6)
    asked = Duty(rated_flow=130 * M3H, rated_head=62.0)
    return sound_case({"curves": (replace(base, **small),), "claims": Claims()}, liquid=oil, duty=asked)


def test_a_head_corrected_for_viscosity_is_not_called_the_bidders_curve():
    case = thick(power=None)
    assert case.brought_from_water
    finding = judge(duty_head.CHECK, case)["rated"]
    assert finding.verdict in (Verdict.QUERY, Verdict.FAIL)
    assert float(finding.evidence["in_water"].value) > float(finding.evidence["head"].value)
    assert question(finding, UnitSystem.SI).startswith("Your water curve gives")
    assert judge(missing_data.CHECK, case)["curve as pumped"].verdict is Verdict.NO_DATA
    assert not sound_case().brought_from_water
    assert "curve as pumped" not in judge(missing_data.CHECK, sound_case())


def test_power_alone_is_enough_for_the_correction():
    case = thick(efficiency=None)
    assert case.pumped is not None
    assert case.at_duty.head is not None


def test_a_head_curve_alone_is_not_taken_for_one_of_a_viscous_liquid():
    case = thick(efficiency=None, power=None)
    assert case.pumped is None
    assert any("the points do not show" in item.why for item in case.assumptions)
    assert judge(duty_head.CHECK, case)["rated"].verdict is Verdict.NO_DATA
    assert judge(curve_stability.CHECK, case)["towards shutoff"].verdict is Verdict.NO_DATA
