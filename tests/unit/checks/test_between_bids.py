"""efficiency-peers and same-hydraulics: what only the other bids show."""

from dataclasses import replace

import numpy as np
import pytest

from bidcheck.bid import Bid
from bidcheck.case import Case
from bidcheck.checks import efficiency_peers, same_hydraulics
from bidcheck.curve import Curve
from bidcheck.finding import Finding, Verdict
from bidcheck.hydraulics.affinity import flow_at_speed, head_at_speed
from bidcheck.prepare import prepare
from tests.build import inquiry, sound_bid, sound_curve
from tests.unit.checks.judge import judge


def at_distances(*distances: float | None) -> list[Case]:
    """Bids whose claims lie so far from their own expectation; all see one another."""
    cases = []
    for number, distance in enumerate(distances):
        case = prepare(inquiry(), sound_bid(bidder=f"bid{number}"))
        assert case.estimates.efficiency is not None
        expected = case.estimates.efficiency.expected
        assert expected is not None
        claim = None if distance is None else expected + distance
        cases.append(replace(case, estimates=replace(case.estimates, offered_efficiency=claim)))
    return [replace(case, bids=tuple(cases)) for case in cases]


def peers(case: Case) -> Finding:
    return judge(efficiency_peers.CHECK, case)["best efficiency"]


@pytest.mark.parametrize(
    ("distances", "verdict"),
    [
        ((0.0, 0.0, 0.0), Verdict.PASS),
        ((0.0599, 0.0, 0.0), Verdict.PASS),
        ((0.0601, 0.0, 0.0), Verdict.REMARK),  # above the attainable efficiency, where efficiency-claim asks
        ((0.035, -0.03, -0.03), Verdict.QUERY),
        ((0.01, -0.06, -0.06), Verdict.REMARK),  # not above the error of the estimate
        ((0.0, -0.07, 0.0, -0.08, -0.07), Verdict.REMARK),
    ],
)
def test_ahead_of_the_others(distances, verdict):
    assert peers(at_distances(*distances)[0]).verdict is verdict


def test_the_others_are_not_called_ahead():
    cases = at_distances(0.09, 0.0, 0.0, 0.01)
    assert [peers(case).verdict for case in cases[1:]] == [Verdict.PASS] * 3


def test_fewer_than_three_bids_say_nothing():
    assert peers(at_distances(0.10, 0.0)[0]).verdict is Verdict.NOT_APPLICABLE
    assert peers(at_distances(0.10, 0.0, None)[0]).verdict is Verdict.NOT_APPLICABLE
    assert peers(at_distances(None, 0.0, 0.0)[0]).verdict is Verdict.NOT_APPLICABLE


def together(*bids: Bid) -> list[Case]:
    """Cases of bids that see one another."""
    cases = [prepare(inquiry(bids=bids), bid) for bid in bids]
    return [replace(case, bids=tuple(cases)) for case in cases]


def at_speed(curve: Curve, speed: float, head_factor: float = 1.0, efficiency: float = 0.0) -> Curve:
    """The same pump at another speed, head a little off, efficiency lifted by so much at its best [fraction]."""
    changed = {}
    for column in ("head", "efficiency", "power", "npsh3"):
        one = curve.points(column)
        assert one is not None
        flow = flow_at_speed(one.flow, curve.speed_rpm, speed)
        value = np.array(one.value)
        if column == "head":
            value = head_at_speed(value, curve.speed_rpm, speed) * head_factor
        if column == "npsh3":
            value *= (speed / curve.speed_rpm) ** 2
        if column == "efficiency":
            value *= 1.0 + efficiency / float(value.max())
        changed[column] = replace(one, flow=flow, value=value)
    return replace(curve, speed_rpm=speed, power=None, **{k: v for k, v in changed.items() if k != "power"})


def other(curve: Curve, **changes: object) -> Bid:
    return sound_bid(bidder="birch", speed_rpm=curve.speed_rpm, curves=(curve,), **changes)


def same(case: Case) -> Finding:
    return judge(same_hydraulics.CHECK, case)["other bids"]


@pytest.mark.parametrize("speed", [1480.0, 1450.0, 1780.0])
def test_one_pump_in_two_bids_is_remarked_on_in_both(speed):
    first, second = together(sound_bid(), other(at_speed(sound_curve(), speed)))
    assert same(first).verdict is Verdict.REMARK
    assert same(second).verdict is Verdict.REMARK
    assert first.bid.name in str(same(second).evidence["other"].value)
    assert same(second).wording.question == ""


@pytest.mark.parametrize(("factor", "verdict"), [(1.009, Verdict.REMARK), (1.012, Verdict.PASS)])
def test_within_a_per_cent_of_head(factor, verdict):
    first, _ = together(sound_bid(), other(at_speed(sound_curve(), 1480.0, factor)))
    assert same(first).verdict is verdict


def test_the_one_that_claims_more_is_asked_and_the_other_not_named_to_it():
    first, second = together(sound_bid(), other(at_speed(sound_curve(), 1480.0, efficiency=0.04)))
    finding = same(second)
    assert finding.verdict is Verdict.QUERY
    assert "{other}" not in finding.wording.question
    assert same(first).verdict is Verdict.REMARK
    assert "it claims" in same(first).wording.message


def test_one_pump_at_two_stated_diameters_says_so():
    curve = replace(at_speed(sound_curve(), 1480.0), impeller=0.38)
    first, _ = together(sound_bid(), other(curve, impeller_rated=0.38))
    assert same(first).verdict is Verdict.REMARK
    assert "one of the diameters is wrong" in same(first).wording.message


def test_head_and_efficiency_at_a_contradicting_diameter_are_no_finding():
    curve = sound_curve(npsh3=None)
    second = other(replace(curve, impeller=0.38, power=None), impeller_rated=0.38)
    assert same(together(sound_bid(curves=(curve,)), second)[0]).verdict is Verdict.PASS


def test_a_nearer_twin_does_not_hide_one_that_claims_less():
    cases = together(
        sound_bid(),
        other(at_speed(sound_curve(), 1480.0)),
        replace(other(at_speed(sound_curve(), 1480.0, 1.002, efficiency=-0.04)), bidder="cedar"),
    )
    assert same(cases[0]).verdict is Verdict.QUERY


def test_a_like_head_curve_alone_is_no_finding():
    lifted = at_speed(sound_curve(), 1480.0, efficiency=0.03)
    assert lifted.npsh3 is not None
    npsh3 = replace(lifted.npsh3, value=lifted.npsh3.value * 1.3)
    cases = together(sound_bid(), other(replace(lifted, npsh3=npsh3)))
    assert [same(case).verdict for case in cases] == [Verdict.PASS, Verdict.PASS]


def test_another_diameter_that_contradicts_the_curves_is_no_finding():
    curve = replace(at_speed(sound_curve(), 1480.0, efficiency=0.04), impeller=0.38)
    _, second = together(sound_bid(), other(curve, impeller_rated=0.38))
    assert same(second).verdict is Verdict.PASS


def test_alone_there_is_nothing_to_compare():
    (case,) = together(sound_bid())
    assert same(case).verdict is Verdict.NOT_APPLICABLE
    assert same(together(sound_bid(curves=()), sound_bid(bidder="birch"))[0]).verdict is Verdict.NO_DATA


def test_other_eyes_and_specific_speeds_are_not_compared():
    double = other(sound_curve(), arrangement="double suction", suction_eyes=2)
    assert same(together(sound_bid(), double)[0]).verdict is Verdict.PASS
    assert same(together(sound_bid(), other(at_speed(sound_curve(), 1480.0, 1.3)))[0]).verdict is Verdict.PASS


def changed(curve: Curve, column: str, flow: float = 1.0, value: float = 1.0, shift: float = 0.0) -> Curve:
    """The curve with one column's flows and values multiplied, and its values moved."""
    points = curve.points(column)  # type: ignore[arg-type]
    assert points is not None
    new = replace(points, flow=points.flow * flow, value=np.maximum(points.value * value + shift, 0.0))
    return replace(curve, **{column: new})


@pytest.mark.parametrize(
    ("column", "value", "shift", "verdict"),
    [
        ("efficiency", 1.0, 0.007, Verdict.REMARK),
        ("efficiency", 1.0, 0.012, Verdict.PASS),
        ("efficiency", 1.0, -0.012, Verdict.PASS),
        ("npsh3", 1.045, 0.0, Verdict.REMARK),
        ("npsh3", 1.06, 0.0, Verdict.PASS),
        ("npsh3", 0.93, 0.0, Verdict.PASS),
    ],
)
def test_every_curve_both_bids_give_must_agree(column, value, shift, verdict):
    second = changed(at_speed(sound_curve(), 1480.0), column, value=value, shift=shift)
    cases = together(sound_bid(), other(second))
    assert same(cases[0]).verdict is verdict
    assert same(cases[1]).verdict is verdict


def test_head_alone_does_not_make_one_pump_of_two():
    bare = sound_curve(efficiency=None, power=None, npsh3=None)
    cases = together(sound_bid(curves=(bare,)), other(bare))
    assert [same(case).verdict for case in cases] == [Verdict.PASS, Verdict.PASS]
    with_npsh3 = sound_curve(efficiency=None, power=None)
    assert same(together(sound_bid(curves=(with_npsh3,)), other(with_npsh3))[0]).verdict is Verdict.REMARK


def test_the_same_stage_in_another_number_is_one_pump():
    curve = at_speed(sound_curve(), 1480.0)
    two = replace(changed(curve, "head", value=2.0), stages=2)
    assert same(together(sound_bid(), other(two, stages=2))[0]).verdict is Verdict.REMARK
    assert same(together(sound_bid(), other(replace(two, stages=1), stages=1))[0]).verdict is Verdict.PASS


@pytest.mark.parametrize(("stated", "verdict"), [(0.412 * 1.06, Verdict.REMARK), (None, Verdict.PASS)])
def test_another_diameter_is_brought_to_one_where_both_state_it(stated, verdict):
    curve = at_speed(sound_curve(), 1480.0)
    for column, value in (("head", 1.06**2), ("efficiency", 1.0)):
        curve = changed(curve, column, flow=1.06, value=value)  # a trim leaves NPSH3 as it is
    curve = replace(curve, impeller=stated)
    finding = same(together(sound_bid(), other(curve, impeller_rated=stated, impeller_max=None))[0])
    assert finding.verdict is verdict
    if verdict is Verdict.REMARK:
        assert "one of the diameters is wrong" not in finding.wording.message


def test_curves_that_share_too_little_are_not_compared():
    curve = at_speed(sound_curve(), 1480.0)
    head = curve.head
    assert head is not None
    few = replace(
        head,
        flow=head.flow[:6],
        value=head.value[:6],
        flow_half_digit=head.flow_half_digit[:6],
        value_half_digit=head.value_half_digit[:6],
        line=head.line[:6],
    )
    cases = together(sound_bid(), other(replace(curve, head=few)))
    assert same(cases[0]).verdict is Verdict.PASS
    assert "No other bid" in same(cases[0]).wording.message


@pytest.mark.parametrize(("factor", "verdict"), [(1.004, Verdict.QUERY), (1.007, Verdict.PASS)])
def test_claiming_more_is_asked_about_only_where_heads_are_nearly_one(factor, verdict):
    lifted = at_speed(sound_curve(), 1480.0, factor, efficiency=0.04)
    assert same(together(sound_bid(), other(lifted))[1]).verdict is verdict


@pytest.mark.parametrize(("more", "verdict"), [(0.018, Verdict.PASS), (0.024, Verdict.QUERY)])
def test_two_points_more_on_one_pump_are_asked_about(more, verdict):
    lifted = at_speed(sound_curve(), 1480.0, efficiency=more)
    assert same(together(sound_bid(), other(lifted))[1]).verdict is verdict
