from dataclasses import replace

import pytest

from bidcheck.checks.bep_match import CHECK
from bidcheck.finding import Verdict
from tests.unit.checks.judge import judge, sound_case, with_bep


@pytest.mark.parametrize(
    ("bep_flow", "verdict"),
    [
        (460.0, Verdict.PASS),
        (450 / 0.80, Verdict.PASS),
        (450 / 0.799, Verdict.QUERY),
        (450 / 1.10, Verdict.PASS),
        (450 / 1.101, Verdict.QUERY),
    ],
)
def test_rated_flow_against_best_efficiency(bep_flow, verdict):
    finding = judge(CHECK, with_bep(sound_case(), bep_flow))["rated"]
    assert finding.verdict is verdict
    assert finding.limit is not None
    assert finding.limit.name == "rated_over_bep"


def test_limit_inside_the_interval_is_a_remark():
    case = with_bep(sound_case(), 450 / 0.78, interval_m3h=(450 / 0.81, 450 / 0.75))
    assert judge(CHECK, case)["rated"].verdict is Verdict.REMARK


def test_limit_outside_the_interval_stays_a_query():
    case = with_bep(sound_case(), 450 / 0.70, interval_m3h=(450 / 0.72, 450 / 0.68))
    assert judge(CHECK, case)["rated"].verdict is Verdict.QUERY


def test_best_efficiency_beyond_the_points():
    case = sound_case()
    assert case.pumped is not None
    far = replace(case.pumped, bep=None, bep_beyond=450 / 0.7 / 3600)
    near = replace(case.pumped, bep=None, bep_beyond=450 / 0.9 / 3600)
    assert judge(CHECK, replace(case, pumped=far))["rated"].verdict is Verdict.QUERY
    assert judge(CHECK, replace(case, pumped=near))["rated"].verdict is Verdict.NO_DATA


def test_no_efficiency_is_no_data():
    case = sound_case()
    assert case.pumped is not None
    none = replace(case.pumped, bep=None, bep_beyond=None)
    assert judge(CHECK, replace(case, pumped=none))["rated"].verdict is Verdict.NO_DATA
    assert judge(CHECK, replace(case, pumped=None))["rated"].verdict is Verdict.NO_DATA
