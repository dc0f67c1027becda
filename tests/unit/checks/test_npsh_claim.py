from dataclasses import replace

import pytest

from bidcheck.bid import Claims
from bidcheck.case import Case
from bidcheck.checks import npsh_claim
from bidcheck.finding import Finding, Verdict
from bidcheck.hydraulics.specific_speed import US_PER_METRIC
from bidcheck.hydraulics.suction import npsh3_from_suction_specific_speed
from tests.build import M3H, points, sound_curve, stated
from tests.unit.checks.judge import judge, sound_case

NPSH_FLOWS = (160, 240, 320, 400, 440, 480, 520, 580)


def at_nss(us: float, unit: float = 0.0, **bid: object) -> Case:
    """The sound bid with NPSH3 at best efficiency set so that the suction specific speed is this one, US units."""
    case = sound_case(bid)
    assert case.estimates.suction is not None
    assert case.max_fits is not None
    assert case.max_fits.bep is not None
    offered = npsh3_from_suction_specific_speed(1480.0, case.max_fits.bep.flow, us / US_PER_METRIC)
    suction = replace(case.estimates.suction, offered=offered)
    curve = case.max_curve
    assert curve is not None
    assert curve.npsh3 is not None
    curve = replace(curve, npsh3=replace(curve.npsh3, value_unit=unit))
    estimates = replace(case.estimates, suction=suction, nss=us / US_PER_METRIC)
    return replace(case, estimates=estimates, max_curve=curve)


def claim(case: Case) -> Finding:
    return judge(npsh_claim.CHECK, case)["best efficiency"]


@pytest.mark.parametrize(
    ("nss", "verdict", "words"),
    [
        (9000, Verdict.PASS, "is what ordinary impellers show"),
        (11500, Verdict.PASS, "not beyond belief"),
        (12999, Verdict.PASS, "not beyond belief"),
        (13001, Verdict.QUERY, "hard to believe"),
        (6001, Verdict.PASS, "not beyond belief"),
        (5999, Verdict.REMARK, "poor for this speed"),
    ],
)
def test_the_steps(nss, verdict, words):
    finding = claim(at_nss(nss, unit=0.5))
    assert finding.verdict is verdict
    assert words in finding.wording.message


@pytest.mark.parametrize(
    ("nss", "unit", "named"),
    [
        (22000, 0.3048, "in m under a ft heading"),
        (22000, 1.0, ""),
        (3700, 1.0, "in ft under an m heading"),
        (3700, 0.3048, ""),
        (40000, 1.0, ""),
    ],
)
def test_metres_and_feet(nss, unit, named):
    finding = claim(at_nss(nss, unit))
    assert named in str(finding.evidence["cause"].value if "cause" in finding.evidence else "")
    assert bool(named) == ("cause" in finding.evidence)
    assert finding.verdict is (Verdict.QUERY if named or nss > 13000 else Verdict.REMARK)


def test_an_inducer_is_not_judged():
    assert claim(at_nss(20000, inducer=True)).verdict is Verdict.NOT_APPLICABLE


def test_borehole_pumps_get_a_remark():
    assert claim(at_nss(15000, unit=0.5, arrangement="submersible multistage")).verdict is Verdict.REMARK


def test_npsh3_at_rated_flow_stands_in_where_it_is_near():
    curve = sound_curve(npsh3=None)
    near = sound_case({"curves": (curve,), "claims": Claims(npsh3=stated(1.6, 0.05, "1.6 m"))})
    finding = claim(near)
    assert finding.verdict is Verdict.QUERY
    assert finding.evidence["where"].value == "at rated flow"
    assert case_flow(near) == pytest.approx(450 * M3H, rel=1e-3)


def case_flow(case: Case) -> float:
    """Flow that the suction specific speed of the case belongs to, from its own figures [m³/s]."""
    assert case.estimates.nss is not None
    assert case.estimates.suction is not None
    assert case.estimates.suction.offered is not None
    return (case.estimates.nss * case.estimates.suction.offered**0.75 / 1480.0) ** 2


def test_npsh3_far_from_best_efficiency_does_not():
    short = sound_curve(npsh3=points(NPSH_FLOWS[:3], [2.0, 2.2, 2.5]))
    assert claim(sound_case({"curves": (short,), "claims": Claims()})).verdict is Verdict.NO_DATA
    assert claim(sound_case({"curves": (sound_curve(npsh3=None),), "claims": Claims()})).verdict is Verdict.NO_DATA
