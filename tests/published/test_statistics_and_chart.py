"""Gülich's table, the chart of attainable efficiency and the estimates shown for context."""

import fluids
import pytest

from bidcheck.estimates.attainable import chart_efficiency
from bidcheck.estimates.context import anderson_efficiency, corripio_efficiency
from bidcheck.estimates.guelich import guelich_hydraulic, guelich_multistage, guelich_single_stage
from tests.published.printed import assert_as_printed

M3H = 1 / 3600
GPM = 231 * 0.0254**3 / 60


# source: Gülich, Centrifugal Pumps, Table 3.9, two independent quotations worked by hand (multistage from memory):
# source: nq, m³/s, single stage, hydraulic, multistage
@pytest.mark.parametrize(
    ("nq", "flow", "single", "hydraulic", "multistage"),
    [
        (20, 0.010, "0.6870", "0.8406", "0.6981"),
        (36.2, 0.2778, "0.8813", "0.9354", "0.8645"),
        (25, 2.0, "0.8795", "0.9338", "0.8599"),
    ],
)
def test_table_of_efficiencies(nq, flow, single, hydraulic, multistage):
    assert_as_printed(guelich_single_stage(nq, flow), single)
    assert_as_printed(guelich_hydraulic(nq, flow), hydraulic)
    assert_as_printed(guelich_multistage(nq, flow), multistage)


# source: Hydraulic Institute, chart of maximum practically attainable efficiency, read by pixel to 0.3: nq, m³/h, per
# source: cent; the fit keeps within 0.8 of the readings
@pytest.mark.parametrize(
    ("nq", "flow", "reading"),
    [
        (20, 1800, 84.4),
        (20, 360, 82.6),
        (20, 72, 79.0),
        (20, 18, 71.3),
        (30, 18000, 91.0),
        (30, 720, 89.0),
        (30, 180, 86.5),
        (30, 36, 80.5),
        (40, 1800, 91.3),
        (40, 360, 89.5),
        (40, 72, 85.0),
        (40, 18, 77.2),
        (60, 18000, 93.0),
        (60, 720, 89.8),
        (60, 36, 80.0),
    ],
)
def test_chart_readings(nq, flow, reading):
    assert 100 * chart_efficiency(nq, flow * M3H) == pytest.approx(reading, abs=0.8)


# source: derived: fit to 81 readings of the Hydraulic Institute chart, evaluated outside the project
@pytest.mark.parametrize(("nq", "flow", "printed"), [(25, 100, "83.05"), (40, 180, "87.93"), (50, 1800, "91.46")])
def test_chart_fit(nq, flow, printed):
    assert_as_printed(100 * chart_efficiency(nq, flow * M3H), printed)


# source: PyPI `fluids` 1.3.1, Corripio_pump_efficiency at 461 US gpm
def test_efficiency_by_flow_alone():
    assert corripio_efficiency(461 * GPM) == pytest.approx(0.705888867, abs=2e-6)


# source: PyPI `fluids` 1.3.1, Corripio_pump_efficiency, evaluated side by side (it rounds the gallon)
@pytest.mark.parametrize("gpm", [51, 200, 1000, 4990])
def test_efficiency_by_flow_beside_an_independent_implementation(gpm):
    assert corripio_efficiency(gpm * GPM) == pytest.approx(fluids.Corripio_pump_efficiency(gpm * GPM), abs=1e-5)


# source: from memory: Anderson, as printed in the Pump Handbook, worked by hand: nq, m³/s
@pytest.mark.parametrize(
    ("nq", "flow", "printed"),
    [(44.0, 1.0, "0.8920"), (20.0, 0.05, "0.7808"), (75.0, 0.5, "0.8645"), (20.0, 1.0, "0.8580")],
)
def test_statistical_comparison(nq, flow, printed):
    assert_as_printed(anderson_efficiency(nq, flow), printed)
