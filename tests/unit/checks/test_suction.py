from dataclasses import replace

import pytest

from bidcheck.case import Case
from bidcheck.checks import npsh_margin, suction_specific_speed
from bidcheck.finding import Verdict
from bidcheck.inquiry import Duty
from bidcheck.quantity import Kind
from bidcheck.read.limit_sets import limit_set
from bidcheck.units import from_si
from tests.build import M3H, sound_curve
from tests.unit.checks.judge import judge, sound_case

US = from_si(1.0, "US", Kind.SUCTION_SPECIFIC_SPEED)


def at_npsh(npsh3: float | None, npsha: float | None, nss_us: float | None = 7000.0) -> Case:
    case = sound_case()
    rated = replace(case.operating[0][1], npsh3=npsh3, npsha=npsha)
    estimates = replace(case.estimates, nss=None if nss_us is None else nss_us / US)
    return replace(case, operating=(("rated", rated),), at_duty=rated, estimates=estimates)


@pytest.mark.parametrize(
    ("npsh3", "npsha", "nss", "verdict"),
    [
        (4.0, 4.6, 7500.0, Verdict.PASS),  # difference governs: 0.6 m
        (4.0, 4.59, 7500.0, Verdict.QUERY),
        (8.0, 8.8, 7500.0, Verdict.PASS),  # ratio governs: 1.1
        (8.0, 8.7, 7500.0, Verdict.QUERY),
        (4.0, 5.0, 7501.0, Verdict.PASS),  # raised: 1.0 m
        (4.0, 4.99, 7501.0, Verdict.QUERY),
        (8.0, 9.6, 7501.0, Verdict.PASS),  # raised: 1.2
        (8.0, 9.5, 7501.0, Verdict.QUERY),
        (5.0, 5.0, 7000.0, Verdict.QUERY),  # nothing left, but not below
        (5.0, 4.99, 7000.0, Verdict.FAIL),
        (None, 5.0, 7000.0, Verdict.NO_DATA),
        (5.0, None, 7000.0, Verdict.NO_DATA),
    ],
)
def test_margin_at_rated_flow(npsh3, npsha, nss, verdict):
    assert judge(npsh_margin.CHECK, at_npsh(npsh3, npsha, nss))["rated"].verdict is verdict


def test_missing_npsh3_at_rated_flow_is_decisive_missing_npsha_is_not():
    assert judge(npsh_margin.CHECK, at_npsh(None, 5.0))["rated"].decisive
    ours = judge(npsh_margin.CHECK, at_npsh(5.0, None))["rated"]
    assert not ours.decisive
    assert ours.wording.question == ""


def test_rated_npsha_is_never_reused_at_the_largest_flow():
    duty = Duty(rated_flow=450 * M3H, rated_head=62.0, max_flow=520 * M3H, npsha=6.8)
    findings = judge(npsh_margin.CHECK, sound_case(duty=duty))
    assert findings["rated"].verdict is Verdict.PASS
    assert findings["largest flow"].verdict is Verdict.NO_DATA


def test_process_margin_is_raised_only_outside_the_preferred_region():
    case = at_npsh(4.0, 4.7, 11500.0)
    inquiry = replace(case.inquiry, limits=limit_set("process"))
    inside = replace(case.operating[0][1], flow_over_bep=0.9)
    outside = replace(case.operating[0][1], flow_over_bep=0.6)
    near = replace(case, inquiry=inquiry, operating=(("rated", inside),))
    far = replace(case, inquiry=inquiry, operating=(("rated", outside),))
    assert judge(npsh_margin.CHECK, near)["rated"].verdict is Verdict.PASS
    assert judge(npsh_margin.CHECK, far)["rated"].verdict is Verdict.QUERY


@pytest.mark.parametrize(
    ("npsh3", "npsha", "verdict"),
    [(4.0, 5.5, Verdict.PASS), (4.0, 5.4, Verdict.FAIL), (8.0, 9.5, Verdict.QUERY), (8.0, 9.4, Verdict.FAIL)],
)
def test_a_margin_the_purchaser_sets_holds_at_any_suction_specific_speed(npsh3, npsha, verdict):
    case = at_npsh(npsh3, npsha, 9000.0)
    own = replace(case.inquiry.limits.npsh_margin, at_least=1.5, mark="purchaser", mandatory=True)
    limits = replace(case.inquiry.limits, npsh_margin=own)
    finding = judge(npsh_margin.CHECK, replace(case, inquiry=replace(case.inquiry, limits=limits)))["rated"]
    assert finding.verdict is verdict


@pytest.mark.parametrize(
    ("set_name", "nss", "inducer", "verdict"),
    [
        ("general-water", 11000.0, False, Verdict.PASS),
        ("general-water", 11001.0, False, Verdict.REMARK),
        ("process", 11001.0, False, Verdict.QUERY),
        ("general-water", 13000.0, False, Verdict.REMARK),
        ("general-water", 13001.0, False, Verdict.QUERY),
        ("general-water", 13001.0, True, Verdict.REMARK),
        ("process", 13001.0, False, Verdict.QUERY),
        ("process", None, False, Verdict.NO_DATA),
    ],
)
def test_suction_specific_speed(set_name, nss, inducer, verdict):
    case = at_npsh(4.0, 9.0, nss)
    case = replace(
        case, inquiry=replace(case.inquiry, limits=limit_set(set_name)), bid=replace(case.bid, inducer=inducer)
    )
    assert judge(suction_specific_speed.CHECK, case)["best efficiency"].verdict is verdict


@pytest.mark.parametrize(
    ("npsh3", "npsha", "verdict"),
    [
        (4.0, 5.01, Verdict.PASS),  # the raised margin is kept, whatever the suction specific speed
        (4.0, 4.99, Verdict.NO_DATA),  # only the ordinary one is
        (4.0, 4.59, Verdict.QUERY),  # not even that
    ],
)
def test_an_unknown_suction_specific_speed_is_not_taken_for_a_low_one(npsh3, npsha, verdict):
    assert judge(npsh_margin.CHECK, at_npsh(npsh3, npsha, None))["rated"].verdict is verdict


def test_suction_specific_speed_of_the_rated_curve_serves_where_the_largest_gives_no_npsh3():
    largest = sound_curve(impeller=0.430, npsh3=None)
    case = sound_case({"curves": (sound_curve(), largest)})
    assert case.estimates.nss is not None
    assert case.estimates.nss_basis == "NPSH3 of the rated diameter"
    assert case.estimates.nss == pytest.approx(sound_case().estimates.nss, rel=1e-6)
