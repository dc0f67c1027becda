"""The EU market surface and the US rule against their published tables."""

import pytest

from bidcheck.estimates.market_surface import (
    ESCC_1450,
    ESCC_2900,
    ESCCI_1450,
    ESCCI_2900,
    ESOB_1450,
    ESOB_2900,
    MSS_2900,
    MSV_2900,
    OVER_LOAD,
    PART_LOAD,
    market_efficiency,
    market_share_below,
    nominal_flow,
)
from bidcheck.estimates.us_rule import US_CONSTANTS, us_minimum_efficiency
from tests.published.printed import assert_as_printed

M3H = 1 / 3600
GPM = 231 * 0.0254**3 / 60


# source: Regulation (EU) No 547/2012, Annex III: surface evaluated by hand: class, nq, m³/h, MEI 0.10, MEI 0.40
@pytest.mark.parametrize(
    ("market_class", "point", "low", "floor"),
    [
        (ESOB_1450, (30, 100), "73.94", "78.45"),
        (ESOB_2900, (20, 25), "57.62", "62.95"),
        (MSV_2900, (25, 10), "51.69", "55.93"),
    ],
)
def test_market_surface(market_class, point, low, floor):
    nq, flow = point
    assert_as_printed(100 * market_efficiency(market_class, 0.10, nq, flow * M3H), low)
    assert_as_printed(100 * market_efficiency(market_class, 0.40, nq, flow * M3H), floor)


# source: from memory: Regulation (EU) No 547/2012, part load and over load at MEI 0.40, ESOB 1450, nq 30, 100 m³/h
def test_part_load_and_over_load():
    best = 100 * market_efficiency(ESOB_1450, 0.40, 30, 100 * M3H)
    assert_as_printed(PART_LOAD * best, "74.29")
    assert_as_printed(OVER_LOAD * best, "77.27")


# source: Regulation (EU) No 547/2012, Annex III: C at MEI 0.10 and 0.40; spread and median of a normal distribution
# source: through the two, worked by hand: (C10 - C40)/1.0282 and C40 - 0.2533 σ
@pytest.mark.parametrize(
    ("market_class", "c10", "c40", "sigma", "median"),
    [
        (ESOB_1450, 132.58, 128.07, "4.39", "126.96"),
        (ESOB_2900, 135.60, 130.27, "5.18", "128.96"),
        (ESCC_1450, 132.74, 128.46, "4.16", "127.41"),
        (ESCC_2900, 135.93, 130.77, "5.02", "129.50"),
        (ESCCI_1450, 136.67, 132.30, "4.25", "131.22"),
        (ESCCI_2900, 139.45, 133.69, "5.60", "132.27"),
        (MSV_2900, 138.19, 133.95, "4.12", "132.91"),
        (MSS_2900, 134.31, 128.79, "5.37", "127.43"),
    ],
)
def test_classes(market_class, c10, c40, sigma, median):
    assert (market_class.c10, market_class.c40) == (c10, c40)
    assert_as_printed(100 * market_class.sigma, sigma)
    assert_as_printed(market_class.c_median, median)
    assert market_class.nominal_rpm in (1450, 2900)
    assert market_class.name.endswith(f", {market_class.nominal_rpm:g} rpm")


# source: Regulation (EU) No 547/2012, definition of MEI: the share of the market that is worse; benchmark 0.70 lies
# source: 0.52 σ above the median
@pytest.mark.parametrize("mei", [0.10, 0.40, 0.50, 0.70])
def test_share_below_is_the_index(mei):
    efficiency = market_efficiency(ESOB_2900, mei, 25, 60 * M3H)
    assert market_share_below(ESOB_2900, efficiency, 25, 60 * M3H) == pytest.approx(mei, abs=1e-6)
    median = market_efficiency(ESOB_2900, 0.5, 25, 60 * M3H)
    if mei == 0.70:
        assert_as_printed((efficiency - median) / ESOB_2900.sigma, "0.52")


# source: 10 CFR 431.464 and 431.465 (80 FR 22939): surface evaluated by hand: class, Ns US, gpm, per cent
@pytest.mark.parametrize(
    ("us_class", "ns", "gpm", "printed"), [("ESFM", 1500, 400, "75.965"), ("RSV", 1000, 100, "60.850")]
)
def test_us_rule(us_class, ns, gpm, printed):
    assert_as_printed(100 * us_minimum_efficiency(us_class, 1800, ns / 51.645, gpm * GPM), printed)


# source: 10 CFR 431.465: C at 1800 and 3600 rpm
@pytest.mark.parametrize(
    ("us_class", "slow", "fast"),
    [
        ("ESCC", 128.47, 130.42),
        ("ESFM", 128.85, 130.99),
        ("IL", 129.30, 133.84),
        ("RSV", 129.63, 133.20),
        ("ST", 138.78, 134.85),
    ],
)
def test_us_constants(us_class, slow, fast):
    assert (US_CONSTANTS[us_class, 1800], US_CONSTANTS[us_class, 3600]) == (slow, fast)


# source: both rules rest on one surface: Regulation (EU) No 547/2012 at 1450 rpm and 10 CFR 431.464 at 1740 rpm, where
# source: equal C gives equal efficiency to the rounding of the published coefficients, 0.2 points
@pytest.mark.parametrize("nq", [12, 20, 40, 75])
@pytest.mark.parametrize("flow", [10, 60, 300, 800])
def test_eu_surface_agrees_with_the_us_rule(nq, flow):
    mean_c = ESOB_1450.c40 - US_CONSTANTS["ESFM", 1800]
    eu = 100 * market_efficiency(ESOB_1450, 0.40, nq, flow * M3H) + mean_c
    us = 100 * us_minimum_efficiency("ESFM", 1800, nq, 1.2 * flow * M3H)
    assert -0.2 < us - eu < 0.0


# source: affinity laws: a pump of 120 m³/h at 1740 rpm is one of 100 m³/h at 1450 rpm
def test_flow_at_nominal_speed():
    assert_as_printed(3600 * nominal_flow(ESOB_1450, 120 * M3H, 1740), "100")
