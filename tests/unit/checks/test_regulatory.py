from dataclasses import replace

import pytest

from bidcheck.bid import Claims
from bidcheck.case import Case
from bidcheck.checks import regulatory_efficiency
from bidcheck.checks.regulatory_efficiency import EU, US
from bidcheck.finding import Verdict
from bidcheck.inquiry import Liquid, Site
from tests.unit.checks.judge import judge, sound_case

WATER = Liquid(name="water", density=998.2, viscosity=1e-6, temperature=293.15, vapour_pressure=2339.0)


def regulated(*names: str, liquid: Liquid = WATER, bid: dict[str, object] | None = None, **found: object) -> Case:
    """The sound bid under regulations, figures of its standing replaced; no doubt of fit or trim."""
    case = sound_case(bid, site=Site(frequency=50.0, regulations=names), liquid=liquid)
    assert case.estimates.regulation is not None
    estimates = replace(
        case.estimates,
        regulation=replace(case.estimates.regulation, **found),
        offered_interval=0.0,
        trim_allowance=0.0,
    )
    return replace(case, estimates=estimates)


@pytest.mark.parametrize(
    ("index", "verdict"), [(0.55, Verdict.PASS), (0.40, Verdict.PASS), (0.399, Verdict.QUERY), (0.05, Verdict.QUERY)]
)
def test_the_index(index, verdict):
    assert judge(regulatory_efficiency.CHECK, regulated(EU, eu_index=index))[EU].verdict is verdict


@pytest.mark.parametrize(("ratio", "verdict"), [(0.97, Verdict.PASS), (1.0, Verdict.PASS), (1.001, Verdict.REMARK)])
def test_the_power_allowed(ratio, verdict):
    assert judge(regulatory_efficiency.CHECK, regulated(US, us_ratio=ratio))[US].verdict is verdict


def test_trimming_and_the_fit_are_given_to_the_bidder():
    case = regulated(EU, eu_index=0.35)
    given = replace(case, estimates=replace(case.estimates, trim_allowance=0.01))
    finding = judge(regulatory_efficiency.CHECK, given)[EU]
    assert finding.verdict is Verdict.REMARK
    assert "trimming" in finding.wording.message
    assert judge(regulatory_efficiency.CHECK, case)[EU].verdict is Verdict.QUERY


def test_regulations_the_inquiry_does_not_name_do_not_apply():
    found = judge(regulatory_efficiency.CHECK, regulated(EU, us_ratio=1.2))
    assert found[US].verdict is Verdict.NOT_APPLICABLE
    assert found[EU].verdict is not Verdict.NOT_APPLICABLE


@pytest.mark.parametrize(
    "liquid",
    [
        replace(WATER, name="gas oil"),
        replace(WATER, name="wastewater"),
        replace(WATER, name="sea water"),
        replace(WATER, solids="sand, 2 %"),
        replace(WATER, temperature=400.0),
    ],
)
def test_clean_cold_water_only(liquid):
    assert judge(regulatory_efficiency.CHECK, regulated(EU, US, liquid=liquid))[EU].verdict is Verdict.NOT_APPLICABLE


@pytest.mark.parametrize(
    ("bid", "reason"),
    [
        ({"arrangement": "double suction", "suction_eyes": 2}, "no class"),
        ({"arrangement": "solids handling"}, "no class"),
        ({"arrangement": "submersible multistage", "stages": 1}, "bore"),
    ],
)
def test_pumps_outside_the_scope_are_not_judged(bid, reason):
    finding = judge(regulatory_efficiency.CHECK, regulated(EU, bid=bid))[EU]
    assert finding.verdict is Verdict.NOT_APPLICABLE
    assert reason in str(finding.evidence["reason"].value)


def test_three_load_points_are_looked_at_where_the_curve_reaches():
    regulation = sound_case().estimates.regulation
    assert regulation is not None
    assert regulation.eu_points == 3
    assert regulation.eu_class == "end suction own bearings, 1450 rpm"
    assert 0.0 < (regulation.eu_index or 0.0) < 1.0
    assert regulation.us_class == "ESFM"
    assert 0.8 < (regulation.us_ratio or 0.0) < 1.1


def test_without_an_efficiency_it_is_asked_for():
    bare = sound_case({"curves": (), "claims": Claims()}, site=Site(regulations=(EU,)))
    assert judge(regulatory_efficiency.CHECK, bare)[EU].verdict is Verdict.NO_DATA


def doubtful(case: Case, interval: float, trim: float = 0.0) -> Case:
    """The case with a doubt of its efficiency, spread of the market 4 points, offered 80 %."""
    assert case.estimates.efficiency is not None
    efficiency = replace(case.estimates.efficiency, sigma=0.04)
    changed = {
        "efficiency": efficiency,
        "offered_efficiency": 0.8,
        "offered_interval": interval,
        "trim_allowance": trim,
    }
    return replace(case, estimates=replace(case.estimates, **changed))


@pytest.mark.parametrize(
    ("index", "interval", "trim", "verdict"),
    [
        (0.351, 0.005, 0.0, Verdict.REMARK),  # 0.4 × 0.5 points over 4 points of spread: 0.05
        (0.349, 0.005, 0.0, Verdict.QUERY),
        (0.301, 0.005, 0.005, Verdict.REMARK),
        (0.299, 0.005, 0.005, Verdict.QUERY),
        (0.39, float("inf"), 0.0, Verdict.QUERY),
    ],
)
def test_the_doubt_of_the_index(index, interval, trim, verdict):
    case = doubtful(regulated(EU, eu_index=index), interval, trim)
    assert judge(regulatory_efficiency.CHECK, case)[EU].verdict is verdict


@pytest.mark.parametrize(("temperature", "covered"), [(263.15, True), (393.15, True), (263.0, False), (393.3, False)])
def test_the_range_of_temperature(temperature, covered):
    case = regulated(EU, eu_index=0.5, liquid=replace(WATER, temperature=temperature))
    verdict = judge(regulatory_efficiency.CHECK, case)[EU].verdict
    assert verdict is (Verdict.PASS if covered else Verdict.NOT_APPLICABLE)


def test_one_load_point_is_called_an_estimate():
    case = regulated(EU, eu_index=0.5, eu_points=1)
    assert "from best efficiency alone" in judge(regulatory_efficiency.CHECK, case)[EU].wording.message
