"""Every arrangement over the ordinary sizes: the parts of the estimate stand in their order."""

import math

import pytest

from bidcheck.arrangement import ARRANGEMENTS
from bidcheck.estimates.efficiency import estimate_efficiency
from bidcheck.estimates.expected import MULTISTAGE
from bidcheck.estimates.market_surface import HIGHEST_FLOW, HIGHEST_NQ, LOWEST_NQ, MARKET_CLASSES, market_median

M3H = 1 / 3600
SILENT = ("solids handling", "vertical turbine", "sealless")


def estimate(arrangement, nq_eye, flow):
    """The estimate for a pump at an ordinary speed for its size [m³/h], its head following from specific speed."""
    eyes = 2 if arrangement == "double suction" else 1
    speed = 2950.0 if flow < 300 else 1480.0 if flow < 1500 else 740.0
    head = (speed * math.sqrt(flow * M3H / eyes) / nq_eye) ** (4 / 3)
    return estimate_efficiency(
        arrangement=arrangement,
        nq=nq_eye * math.sqrt(eyes),
        nq_eye=nq_eye,
        flow=flow * M3H,
        head_per_stage=head,
        speed_rpm=speed,
        stages=4 if arrangement in MULTISTAGE else 1,
        suction_eyes=eyes,
    )


@pytest.mark.parametrize("arrangement", ARRANGEMENTS)
@pytest.mark.parametrize("nq_eye", [15.0, 20.0, 30.0, 45.0, 60.0])
@pytest.mark.parametrize("flow", [60.0, 100.0, 299.0, 500.0, 999.0, 1001.0, 2000.0, 5000.0])
def test_order_over_the_ordinary_sizes(arrangement, nq_eye, flow):
    found = estimate(arrangement, nq_eye, flow)
    assert 0.6 < found.attainable < found.implausible_above < 0.97
    assert found.attainable < found.ceiling < 0.97
    assert found.implausible_above < found.ceiling + 0.02
    assert all(0.0 <= term < 0.2 for term in found.ceiling_terms.values())
    if arrangement in SILENT:
        assert found.expected is None
    else:
        assert 0.45 < found.query_below < found.remark_below < found.expected < found.attainable


@pytest.mark.parametrize("arrangement", [one for one in ARRANGEMENTS if one not in SILENT])
def test_larger_pumps_are_expected_to_be_better(arrangement):
    along = [estimate(arrangement, 30.0, flow).expected for flow in (20.0, 60.0, 250.0, 299.0)]
    assert along == sorted(along)


def test_the_survey_still_rises_at_the_end_of_its_use():
    for nq in (LOWEST_NQ, 15.0, 40.0, HIGHEST_NQ):
        near, end = (market_median(MARKET_CLASSES[0], nq, share * HIGHEST_FLOW * M3H) for share in (0.99, 1.0))
        assert near < end


def test_several_eyes_share_leakage_and_disc_friction():
    single, double = estimate("end suction", 30.0, 1000.0), estimate("double suction", 30.0, 2000.0)
    assert double.ceiling_terms["leakage"] == pytest.approx(single.ceiling_terms["leakage"])
    assert double.ceiling_terms["disc friction"] < single.ceiling_terms["disc friction"]


def test_spreads_the_sources_are_shown_with():
    found = {source.name: source for source in estimate("end suction", 30.0, 100.0).sources}
    statistics = found["statistics by size and specific speed, single stage"]
    assert statistics.spread == pytest.approx(0.2 * (1 - statistics.value))
    survey = next(source for name, source in found.items() if name.startswith("market survey, median"))
    assert survey.spread == pytest.approx(0.0518, abs=5e-5)


def test_losses_of_the_ceiling():
    terms = estimate("end suction", 20.0, 100.0).ceiling_terms
    assert terms["hydraulic"] == pytest.approx(0.03)
    assert terms["mechanical"] == pytest.approx(0.005)
    assert terms["leakage"] == pytest.approx(0.5 * 4.1 / 20**1.6, rel=1e-6)


def test_the_floor_shown_is_that_of_an_index_of_four_tenths():
    found = estimate("close coupled", 30.0, 100.0)
    median, floor = (source.value for source in found.sources if source.name.startswith("market survey"))
    assert median - floor == pytest.approx(0.2533 * found.sigma, rel=1e-3)


@pytest.mark.parametrize(("stages", "form"), [(1, "single stage"), (2, "multistage")])
def test_two_stages_call_for_the_multistage_form(stages, form):
    found = estimate_efficiency(
        arrangement="vertical turbine", nq=30.0, nq_eye=30.0, flow=0.03, head_per_stage=20.0, speed_rpm=1450.0,
        stages=stages,
    )  # fmt: skip
    assert [source.name for source in found.sources if source.name.endswith(form)]
