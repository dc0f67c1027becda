from dataclasses import replace

import pytest

from bidcheck.checks import efficiency_ceiling, efficiency_claim
from bidcheck.checks.runner import run_checks
from bidcheck.finding import Check, Measured, Verdict, Wording
from bidcheck.quantity import Kind, UnitSystem
from bidcheck.report.words import message
from tests.unit.checks.judge import judge, sound_case


def check(*measured: Measured) -> Check:
    return Check(
        name="example",
        group="duty",
        run=lambda _case: measured,
        otherwise=Verdict.QUERY,
        source="common practice, no source",
        wordings={"": Wording("Said.")},
    )


def test_a_comparison_without_verdict_or_limit_is_our_mistake():
    with pytest.raises(ValueError, match="needs a verdict"):
        run_checks(sound_case(), [check(Measured(subject="rated"))])


def test_a_subject_is_spoken_of_once():
    twice = Measured(subject="rated", verdict=Verdict.PASS)
    with pytest.raises(ValueError, match="speaks twice"):
        run_checks(sound_case(), [check(twice, twice)])


def test_a_curve_that_is_not_for_water_is_asked_for_again():
    case = replace(sound_case(), water="the curve is given as pumped, for a viscous liquid; a water curve is needed")
    for one in (efficiency_claim.CHECK, efficiency_ceiling.CHECK):
        finding = judge(one, case)["best efficiency"]
        assert finding.verdict is Verdict.NO_DATA
        assert "water curve" in message(finding, UnitSystem.SI)


def test_no_best_efficiency_is_no_data_for_the_ceiling_too():
    case = sound_case()
    case = replace(case, estimates=replace(case.estimates, efficiency=None))
    assert judge(efficiency_ceiling.CHECK, case)["best efficiency"].verdict is Verdict.NO_DATA


def test_kinds_of_limits_are_those_of_the_register():
    for limit in sound_case().inquiry.limits.all():
        assert isinstance(limit.kind, Kind)
        assert limit.origin
