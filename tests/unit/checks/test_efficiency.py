from dataclasses import replace

import pytest

from bidcheck.bid import Claims, Driver
from bidcheck.case import Case
from bidcheck.checks import efficiency_ceiling, efficiency_claim
from bidcheck.finding import Verdict
from bidcheck.inquiry import Liquid
from bidcheck.quantity import Stated, UnitSystem
from bidcheck.report.words import message, question
from tests.build import sound_curve, stated
from tests.unit.checks.judge import judge, sound_case

LADDER = {
    "expected": 0.80,
    "sigma": 0.04,
    "attainable": 0.87,
    "ceiling": 0.93,
    "implausible_above": 0.9025,
    "remark_above": 0.849,
    "remark_below": 0.7488,
    "query_below": 0.72,
    "lenient_low": False,
    "reason": "",
}


def claimed(efficiency: float | None, **changes: object) -> Case:
    case = sound_case()
    assert case.estimates.efficiency is not None
    estimate = replace(case.estimates.efficiency, **(LADDER | changes))
    estimates = replace(
        case.estimates, efficiency=estimate, offered_efficiency=efficiency, offered_interval=0.004, trim_allowance=0.0
    )
    return replace(case, estimates=estimates)


@pytest.mark.parametrize(
    ("efficiency", "verdict", "word"),
    [
        (0.80, Verdict.PASS, "plausible"),
        (0.849, Verdict.PASS, "plausible"),
        (0.853, Verdict.PASS, "plausible"),  # within the doubt of the fit, 0.4 points
        (0.8531, Verdict.REMARK, "high"),
        (0.874, Verdict.REMARK, "high"),
        (0.8741, Verdict.QUERY, "calls practically attainable"),
        (0.9065, Verdict.QUERY, "surveyed market"),
        (0.9066, Verdict.QUERY, "implausible"),
        (0.7488, Verdict.PASS, "plausible"),
        (0.7487, Verdict.REMARK, "low"),
        (0.72, Verdict.REMARK, "worst tenth"),
        (0.7199, Verdict.QUERY, "very low"),
    ],
)
def test_every_step_of_the_ladder(efficiency, verdict, word):
    finding = judge(efficiency_claim.CHECK, claimed(efficiency))["best efficiency"]
    assert finding.verdict is verdict
    assert word in finding.wording.message
    assert (finding.wording.question != "") is (verdict is Verdict.QUERY)


def test_lenient_arrangements_are_never_queried_for_low_efficiency():
    assert judge(efficiency_claim.CHECK, claimed(0.5, lenient_low=True))["best efficiency"].verdict is Verdict.REMARK


def test_without_expected_value_only_the_high_side_is_judged():
    none = {"expected": None, "sigma": None, "remark_above": None, "remark_below": None, "query_below": None}
    assert judge(efficiency_claim.CHECK, claimed(0.3, **none))["best efficiency"].verdict is Verdict.PASS
    high = judge(efficiency_claim.CHECK, claimed(0.91, **none))["best efficiency"]
    assert high.verdict is Verdict.QUERY
    assert "{expected}" not in high.wording.message


def test_nothing_to_judge_is_never_a_pass():
    refused = judge(efficiency_claim.CHECK, claimed(0.8, reason="below 6 m³/h"))["best efficiency"]
    assert refused.verdict is Verdict.NOT_APPLICABLE
    assert judge(efficiency_claim.CHECK, claimed(None))["best efficiency"].verdict is Verdict.NO_DATA


@pytest.mark.parametrize(
    ("efficiency", "verdict"), [(0.93, Verdict.PASS), (0.934, Verdict.PASS), (0.9341, Verdict.FAIL)]
)
def test_ceiling_is_missed_only_beyond_the_doubt_of_the_fit(efficiency, verdict):
    assert judge(efficiency_ceiling.CHECK, claimed(efficiency))["best efficiency"].verdict is verdict


def test_no_ceiling_is_not_a_pass():
    finding = judge(efficiency_ceiling.CHECK, claimed(0.9, ceiling=None, reason="outside"))["best efficiency"]
    assert finding.verdict is Verdict.NOT_APPLICABLE


@pytest.mark.parametrize(
    ("allowance", "verdict"), [(0.0, Verdict.QUERY), (0.0101, Verdict.REMARK), (0.04, Verdict.PASS)]
)
def test_what_trimming_may_have_cost_is_given_on_the_low_side_only(allowance, verdict):
    case = claimed(0.71)
    case = replace(case, estimates=replace(case.estimates, trim_allowance=allowance))
    assert judge(efficiency_claim.CHECK, case)["best efficiency"].verdict is verdict
    high = claimed(0.91)
    high = replace(high, estimates=replace(high.estimates, trim_allowance=allowance))
    assert judge(efficiency_claim.CHECK, high)["best efficiency"].verdict is Verdict.QUERY


def test_trim_allowance_follows_from_the_diameters():
    trimmed = sound_case({"impeller_max": 0.4577777778})  # 10 % off
    assert trimmed.estimates.trim_allowance == pytest.approx(0.025, abs=1e-6)
    diffuser = sound_case({"impeller_max": 0.4577777778, "casing_type": "diffuser"})
    assert diffuser.estimates.trim_allowance == pytest.approx(0.05, abs=1e-6)
    assert sound_case({"impeller_max": None}).estimates.trim_allowance == 0.0


def test_a_ceiling_without_a_diameter_does_not_speak_of_one():
    case = claimed(0.95)
    assert case.max_curve is not None
    bare = replace(case, max_curve=replace(case.max_curve, impeller=None))
    finding = judge(efficiency_ceiling.CHECK, bare)["best efficiency"]
    assert finding.verdict is Verdict.FAIL
    assert "your own impeller" not in finding.wording.question


@pytest.mark.parametrize(
    ("efficiency", "driver", "drive", "named"),
    [
        (0.73, Driver(efficiency=0.95), "fixed", ("the motor offered, 95.0 %",)),
        (0.73, Driver(rating=110e3), "fixed", ("an ordinary motor of this size, 95.4 %",)),
        (0.70, Driver(efficiency=0.95), "variable", ("wire to water",)),
        (0.65, Driver(efficiency=0.95), "fixed", ()),
        (0.73, Driver(efficiency=0.95), "variable", ("the motor offered", "wire to water")),
    ],
)
def test_losses_of_the_motor_are_named_where_they_explain_a_low_claim(efficiency, driver, drive, named):
    finding = judge(efficiency_claim.CHECK, low_claim(efficiency, driver, drive))["best efficiency"]
    causes = str(finding.evidence["causes"].value) if "causes" in finding.evidence else ""
    assert all(words in causes for words in named)
    assert bool(causes) is bool(named)
    assert ("Likely cause" in finding.wording.message or "would explain" in finding.wording.message) is bool(named)


def low_claim(efficiency: float, driver: Driver, drive: str) -> Case:
    """A low claim of a bid with this driver."""
    case = claimed(efficiency)
    return replace(case, bid=replace(case.bid, driver=driver, drive=drive))


def test_a_plausible_claim_is_not_explained():
    finding = judge(efficiency_claim.CHECK, low_claim(0.76, Driver(efficiency=0.95), "fixed"))["best efficiency"]
    assert finding.verdict is Verdict.PASS
    assert "causes" not in finding.evidence


def viscous(efficiency: float, viscosity: float = 60e-6) -> Case:
    """The sound curve at a fifth of its size, as pumped in a viscous liquid, its efficiency multiplied."""
    curve = sound_curve(liquid="as pumped", power=None)
    assert curve.efficiency is not None
    assert curve.head is not None
    assert curve.npsh3 is not None
    small = {
        "head": replace(curve.head, flow=curve.head.flow * 0.3),
        "efficiency": replace(
            curve.efficiency, flow=curve.efficiency.flow * 0.3, value=curve.efficiency.value * efficiency
        ),
        "npsh3": replace(curve.npsh3, flow=curve.npsh3.flow * 0.3),
    }
    oil = Liquid(name="oil", density=880.0, viscosity=viscosity)
    return sound_case({"curves": (replace(curve, **small),)}, liquid=oil)


def test_a_viscous_curve_is_brought_to_water_and_a_remark_at_most():
    case = viscous(0.8)
    assert case.estimates.corrected
    offered = case.estimates.offered_efficiency
    assert offered is not None
    assert offered > 0.8 * 0.825  # the correction gives back what viscosity cost
    assert "brought from the viscous liquid to water" in case.estimates.basis
    found = judge(efficiency_claim.CHECK, viscous(0.9))
    assert found["best efficiency"].verdict is Verdict.REMARK
    assert found["water curve"].verdict is Verdict.NO_DATA


def test_outside_the_limits_of_the_correction_nothing_is_judged():
    case = viscous(0.9, viscosity=4e-3)
    assert case.estimates.nq is None
    assert judge(efficiency_claim.CHECK, case)["best efficiency"].verdict is Verdict.NO_DATA


@pytest.mark.parametrize(("gain", "verdict"), [(-2.0, Verdict.PASS), (0.9, Verdict.PASS), (2.5, Verdict.QUERY)])
def test_a_trimmed_impeller_is_not_better_than_the_full_one(gain, verdict):
    full = sound_curve(impeller=0.430, power=None)
    trimmed = sound_curve(power=None)
    assert trimmed.efficiency is not None
    lifted = replace(trimmed.efficiency, value=trimmed.efficiency.value * (1 + gain / 82.5))
    case = sound_case({"curves": (replace(trimmed, efficiency=lifted), full)})
    finding = judge(efficiency_claim.CHECK, case)["rated diameter"]
    assert finding.verdict is verdict
    assert (finding.wording.question != "") is (verdict is Verdict.QUERY)


def test_one_diameter_alone_is_not_compared():
    assert judge(efficiency_claim.CHECK, sound_case())["rated diameter"].verdict is Verdict.NOT_APPLICABLE


def declared(**claims: Stated) -> Case:
    """The sound bid without an efficiency curve, these figures claimed."""
    bare = sound_curve(efficiency=None, power=None)
    return sound_case({"curves": (bare,), "claims": Claims(**claims)})


def test_a_declared_best_efficiency_is_placed_and_the_curve_asked_for():
    figures = {"bep_flow": stated(460 / 3600, 0.5 / 3600), "bep_efficiency": stated(0.93, 0.0005)}
    found = judge(efficiency_claim.CHECK, declared(**figures))
    assert found["best efficiency"].verdict is Verdict.QUERY
    assert found["efficiency curve"].verdict is Verdict.NO_DATA
    case = declared(**figures)
    assert case.estimates.declared == "best efficiency"
    assert "as declared" in case.estimates.basis
    assert message(found["best efficiency"], UnitSystem.SI).startswith("Declared best efficiency 93.0 % is")
    assert question(found["best efficiency"], UnitSystem.SI).startswith("You declare as best efficiency 93.0 %")


def test_a_claim_at_rated_flow_is_judged_on_the_high_side_only():
    assert judge(efficiency_claim.CHECK, declared(efficiency=stated(0.93, 0.0005)))["best efficiency"].verdict is (
        Verdict.QUERY
    )
    low = judge(efficiency_claim.CHECK, declared(efficiency=stated(0.60, 0.0005)))["best efficiency"]
    assert low.verdict is Verdict.NO_DATA
    ordinary = judge(efficiency_claim.CHECK, declared(efficiency=stated(0.81, 0.0005)))["best efficiency"]
    assert ordinary.verdict is Verdict.PASS
    assert message(ordinary, UnitSystem.SI).startswith("Efficiency claimed at rated flow 81.0 %")
    assert declared(efficiency=stated(0.81, 0.0005)).estimates.regulation is None
    nothing = judge(efficiency_claim.CHECK, declared())
    assert nothing["best efficiency"].verdict is Verdict.NO_DATA


def test_an_efficiency_that_follows_from_power_is_not_called_a_claim():
    curve = sound_curve(efficiency=None)
    assert curve.power is not None
    less = replace(curve, power=replace(curve.power, value=curve.power.value * 0.92))
    case = sound_case({"curves": (less,), "claims": Claims()})
    finding = judge(efficiency_claim.CHECK, case)["best efficiency"]
    assert finding.verdict is Verdict.QUERY
    assert message(finding, UnitSystem.SI).startswith("Best efficiency that follows from flow, head and power,")
    assert question(finding, UnitSystem.SI).startswith("Your flow, head and power give")
