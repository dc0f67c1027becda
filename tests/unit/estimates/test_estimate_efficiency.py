"""The combined estimate: thresholds, refusals, what is listed."""

import math

import pytest

from bidcheck.arrangement import ARRANGEMENTS
from bidcheck.errors import OutOfRange
from bidcheck.estimates.efficiency import claim_thresholds, estimate_efficiency, is_lenient

M3H = 1 / 3600


def estimate(**changes):
    figures = {
        "arrangement": "end suction",
        "nq": 30.0,
        "flow": 100 * M3H,
        "head_per_stage": 20.0,
        "speed_rpm": 1450.0,
        "suction_eyes": 1,
    }
    figures |= changes
    figures.setdefault("nq_eye", figures["nq"] / math.sqrt(figures["suction_eyes"]))
    return estimate_efficiency(**figures)


def test_order_of_the_thresholds():
    found = estimate()
    assert found.query_below < found.remark_below < found.expected < found.remark_above
    assert found.expected < found.attainable < found.implausible_above < found.ceiling
    assert found.reason == ""


def test_thresholds_by_their_definition():
    found = claim_thresholds(0.90, 0.92, 0.04)
    assert found.implausible_above == pytest.approx(0.92 + 0.25 * 0.08)
    assert found.remark_above == pytest.approx(0.90 + 1.64 * 0.025)
    assert found.remark_below == pytest.approx(0.90 - 1.28 * 0.04)
    assert found.query_below == pytest.approx(0.90 - 2 * 0.04)
    assert claim_thresholds(0.60, None, 0.04).remark_above == pytest.approx(0.60 + 1.64 * 0.15 * 0.40)


def test_thresholds_without_a_basis():
    assert claim_thresholds(None, None, None) == (None, None, None, None)
    assert claim_thresholds(None, 0.8, None) == (pytest.approx(0.85), None, None, None)
    assert claim_thresholds(0.8, None, None)[2:] == (None, None)


@pytest.mark.parametrize(("flow", "judged"), [(5.99, False), (6.0, True), (6.01, True)])
def test_nothing_is_judged_below_six_cubic_metres(flow, judged):
    found = estimate(flow=flow * M3H)
    assert (found.ceiling is not None) == judged
    assert (found.expected is not None) == judged
    assert (found.reason == "") == judged
    assert found.sources
    if not judged:
        assert "6 m³/h" in found.reason
        assert found.market_share_below(0.7) is None
        assert [found.implausible_above, found.remark_above, found.remark_below, found.query_below] == [None] * 4


@pytest.mark.parametrize("nq", [6.9, 100.5])
def test_nothing_is_judged_outside_every_source(nq):
    found = estimate(nq=nq)
    assert (found.expected, found.attainable, found.ceiling) == (None, None, None)
    assert "outside every source" in found.reason


@pytest.mark.parametrize(("flow", "known"), [(17.9, False), (18.0, True), (18000.0, True), (18001.0, False)])
def test_attainable_ends_with_its_chart(flow, known):
    found = estimate(flow=flow * M3H)
    assert (found.attainable is not None) == known
    assert (found.implausible_above is not None) == known
    assert found.ceiling is not None


@pytest.mark.parametrize(("nq", "known"), [(9.9, False), (10.0, True), (80.0, True), (80.1, False)])
def test_attainable_ends_with_its_specific_speeds(nq, known):
    assert (estimate(nq=nq).attainable is not None) == known


def test_double_suction_takes_the_more_generous_specific_speed():
    figures = {"arrangement": "double suction", "flow": 2000 * M3H, "suction_eyes": 2}
    eye_inside = estimate(nq=90.0, **figures)
    assert eye_inside.attainable is not None
    narrow = estimate(nq=20.0, **figures)
    by_eye_alone = estimate(nq=20.0 / math.sqrt(2), arrangement="end suction", flow=2000 * M3H)
    assert narrow.attainable > by_eye_alone.attainable


def test_attainable_is_not_below_the_statistics():
    found = estimate(nq=12.0, flow=10000 * M3H)
    statistics = next(source.value for source in found.sources if source.name.startswith("statistics"))
    assert found.attainable >= statistics


def test_larger_diameter_lowers_the_ceiling():
    small, large = estimate(diameter=0.25), estimate(diameter=0.35)
    assert large.ceiling < small.ceiling
    assert large.ceiling_terms["disc friction"] > small.ceiling_terms["disc friction"]
    assert set(small.ceiling_terms) == {"hydraulic", "leakage", "disc friction", "mechanical"}


def test_without_a_diameter_the_ceiling_is_generous():
    from bidcheck.estimates.head_coefficient import diameter_for_head, optimum_head_coefficient

    ordinary = diameter_for_head(20.0, 1450.0, optimum_head_coefficient(30.0))
    assert estimate().ceiling > estimate(diameter=ordinary).ceiling
    smallest = diameter_for_head(20.0, 1450.0, 1.2 * optimum_head_coefficient(30.0))
    assert estimate().ceiling == pytest.approx(estimate(diameter=smallest).ceiling)


def test_thicker_liquid_lowers_the_ceiling_and_density_does_not_matter():
    assert estimate(viscosity=50e-6).ceiling < estimate().ceiling
    assert estimate(density=700.0).ceiling == pytest.approx(estimate().ceiling)


def test_market_is_named_only_where_it_speaks():
    inside = estimate()
    assert inside.market_class == "end suction own bearings, 1450 rpm"
    assert inside.market_share_below(inside.expected) == pytest.approx(0.5)
    outside = estimate(flow=3000 * M3H)
    assert (outside.market_class, outside.sigma) == ("", None)
    assert outside.expected is not None
    assert outside.remark_below is not None
    assert outside.market_share_below(0.8) is None


@pytest.mark.parametrize("arrangement", ["vertical turbine", "solids handling", "sealless"])
def test_high_side_alone_is_judged_without_an_expectation(arrangement):
    found = estimate(arrangement=arrangement)
    assert (found.expected, found.remark_above, found.remark_below, found.query_below) == (None,) * 4
    assert found.implausible_above is not None
    assert found.ceiling is not None
    assert found.lenient_low
    assert found.reason == ""


@pytest.mark.parametrize("arrangement", ARRANGEMENTS)
@pytest.mark.parametrize(("nq", "flow"), [(30.0, 100.0), (7.5, 7.0), (95.0, 50000.0), (30.0, 1.0)])
def test_every_source_has_a_value_or_a_reason(arrangement, nq, flow):
    found = estimate(arrangement=arrangement, nq=nq, flow=flow * M3H)
    names = [source.name for source in found.sources]
    assert len(set(names)) == len(names) >= 7
    for source in found.sources:
        assert (source.value is None) == bool(source.reason)
        assert source.valid
        assert source.origin
        assert source.mark in {"text", "crossed", "memory", "practice", "derived"}


@pytest.mark.parametrize(
    ("arrangement", "nq", "flow", "lenient"),
    [
        ("end suction", 30.0, 100.0, False),
        ("end suction", 12.0, 18.0, False),
        ("end suction", 11.99, 100.0, True),
        ("end suction", 30.0, 17.99, True),
        ("horizontal multistage", 30.0, 100.0, True),
        ("double suction", 30.0, 100.0, False),
        ("sealless", 30.0, 100.0, True),
    ],
)
def test_leniency(arrangement, nq, flow, lenient):
    assert is_lenient(arrangement, nq, flow * M3H) is lenient


@pytest.mark.parametrize("changes", [{"flow": 0.0}, {"head_per_stage": -1.0}, {"diameter": 0.0}, {"nq": math.nan}])
def test_figures_that_are_no_best_efficiency_point(changes):
    with pytest.raises(OutOfRange):
        estimate(**changes)


def test_specific_speeds_must_agree_with_the_eyes():
    with pytest.raises(ValueError, match="disagree"):
        estimate(suction_eyes=2, nq_eye=30.0)


@pytest.mark.parametrize("nq", [10.0, 15.0, 25.0, 44.0, 80.0])
@pytest.mark.parametrize("flow", [18.0, 150.0, 1500.0, 18000.0])
@pytest.mark.parametrize("share_of_optimum", [0.8, 1.0, 1.2])
def test_ceiling_never_forbids_what_the_chart_calls_attainable(nq, flow, share_of_optimum):
    from bidcheck.estimates.head_coefficient import diameter_for_head, optimum_head_coefficient

    speed = 590.0 if flow > 1000 else 1480.0
    head = (speed * math.sqrt(flow * M3H) / nq) ** (4 / 3)
    diameter = diameter_for_head(head, speed, share_of_optimum * optimum_head_coefficient(nq))
    found = estimate(nq=nq, flow=flow * M3H, head_per_stage=head, speed_rpm=speed, diameter=diameter)
    assert found.ceiling > found.attainable


@pytest.mark.parametrize(("nq", "flow"), [(30.0, 100.0), (70.0, 300.0), (60.0, 990.0), (20.0, 990.0)])
def test_place_in_the_market_is_that_of_the_survey_where_the_expected_value_fades(nq, flow):
    from bidcheck.estimates.market_surface import ESOB_1450, market_share_below

    found = estimate(nq=nq, flow=flow * M3H)
    for efficiency in (0.70, 0.80, 0.85):
        by_survey = market_share_below(ESOB_1450, efficiency, nq, flow * M3H)
        assert found.market_share_below(efficiency) == pytest.approx(by_survey, abs=1e-9)


@pytest.mark.parametrize(
    ("feet", "speed", "covered"), [(458.0, 3600.0, True), (460.0, 3600.0, False), (458.0, 3550.0, False)]
)
def test_the_us_minimum_ends_at_its_head_at_nominal_speed(feet, speed, covered):
    found = estimate(nq=20.0, head_per_stage=feet * 0.3048, speed_rpm=speed)
    rule = next(source for source in found.sources if source.name.startswith("US minimum"))
    assert (rule.value is not None) == covered
    assert covered or "459 ft" in rule.reason
