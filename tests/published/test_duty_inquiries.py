"""Four inquiries on disk, one duty each: the whole line reproduces the table of the combined sources."""

import json
import math

import pytest

import bidcheck
from bidcheck.estimates.head_coefficient import diameter_for_head, optimum_head_coefficient
from bidcheck.hydraulics.specific_speed import specific_speed
from bidcheck.report.json_text import evaluation_json

# source: none needed: shares of rated flow at which points are printed
SHARES = (0.0, 0.2, 0.35, 0.5, 0.65, 0.8, 0.9, 1.0, 1.1, 1.2, 1.3)


def write_duty(folder, arrangement, flow, head, *, speed, stages, eyes):
    """An inquiry with one bid whose curve has its best efficiency exactly at the duty, 80 %."""
    nq_eye = specific_speed(speed, flow / 3600 / eyes, head / stages)
    diameter = 1000 * diameter_for_head(head / stages, speed, optimum_head_coefficient(nq_eye))
    (folder / "bids" / "alder").mkdir(parents=True)
    (folder / "inquiry.toml").write_text(
        f'tag = "P-1"\ntitle = "duty"\nunits = "SI"\n[duty]\nrated_flow = "{flow} m3/h"\nrated_head = "{head} m"\n'
        'npsha = "20 m"\n[liquid]\nname = "water"\ntemperature = "20 degC"\n[limits]\nset = "general-water"\n',
        encoding="utf-8",
    )
    (folder / "bids" / "alder" / "bid.toml").write_text(
        f'bidder = "alder"\nrevision = "a"\narrangement = "{arrangement}"\nstages = {stages}\nsuction_eyes = {eyes}\n'
        f'speed = "{speed} rpm"\nimpeller_rated = "{diameter:.2f} mm"\nimpeller_max = "{diameter:.2f} mm"\n'
        '[[curves]]\nfile = "curve.csv"\n',
        encoding="utf-8",
    )
    rows = [f"{x * flow:.3f}, {head * (1.2 - 0.2 * x * x):.4f}, {80 * x * (2 - x):.4f}" for x in SHARES]
    text = "flow [m3/h], head [m], efficiency [%]\n" + "\n".join(rows) + "\n"
    (folder / "bids" / "alder" / "curve.csv").write_text(text, encoding="utf-8")


def estimates(folder):
    """Estimates of the one bid as JSON has them."""
    document = json.loads(evaluation_json(bidcheck.evaluate(bidcheck.read_inquiry(folder))))
    (bid,) = document["bids"]
    return bid["specific_speed"], bid["estimates"]


def source(efficiency, start):
    """Value of a source in per cent."""
    (found,) = (item["value"] for item in efficiency["sources"] if item["name"].startswith(start))
    return None if found is None else 100 * found


# source: derived: combination of the published sources, evaluated outside the project: specific speed on total flow and
# source: per eye, market median, Gülich, attainable, ceiling, implausible above in per cent, diameter in mm by Gülich,
# source: equation 3.26; the ceiling of duty d with disc friction on total flow, 94.4 on the flow of one eye
@pytest.mark.parametrize(
    ("duty", "nq", "nq_eye", "row", "diameter"),
    [
        (("end suction", 130, 55, 2960, 1, 1), 27.85, 27.85, (77.8, 80.8, 85.0, 92.0, 88.7), 214),
        (("end suction", 1000, 60, 1480, 1, 1), 36.18, 36.18, (86.1, 88.1, 90.5, 93.6, 92.8), 463),
        (("vertical multistage", 60, 300, 2950, 6, 1), 20.25, 20.25, (65.8, 73.2, 78.3, 89.2, 83.7), 199),
        (("submersible multistage", 60, 300, 2950, 6, 1), 20.25, 20.25, (71.3, 73.2, 78.3, 89.2, 83.7), 199),
        (("double suction", 5000, 20, 590, 1, 2), 73.52, 51.99, (None, 90.6, 92.2, 95.1, 94.1), 712),
    ],
    ids=["a", "b", "c", "c submersible", "d"],
)
def test_duties_through_the_whole_line(tmp_path, duty, nq, nq_eye, row, diameter):  # noqa: PLR0917
    arrangement, flow, head, speed, stages, eyes = duty
    write_duty(tmp_path, arrangement, flow, head, speed=speed, stages=stages, eyes=eyes)
    speeds, found = estimates(tmp_path)
    assert speeds["nq"] == pytest.approx(nq, abs=0.02)
    assert speeds["nq_per_eye"] == pytest.approx(nq_eye, abs=0.02)
    efficiency = found["efficiency"]
    computed = (
        source(efficiency, "market survey, median"),
        source(efficiency, "statistics"),
        100 * efficiency["attainable"],
        100 * efficiency["ceiling"],
        100 * efficiency["implausible_above"],
    )
    for value, published in zip(computed, row, strict=True):
        assert (value is None) == (published is None)
        if value is not None:
            assert value == pytest.approx(published, abs=0.1)
    assert found["head_coefficient"]["expected_diameter_mm"] == pytest.approx(diameter, abs=1.0)
    assert found["head_coefficient"]["offered_over_expected"] == pytest.approx(1.0, abs=0.005)


# source: derived: head coefficient of the optimum and its diameter agree with the Cordier line (1953) within a few
# source: per cent on the radial duties
@pytest.mark.parametrize(("flow", "head", "speed"), [(130, 55, 2960), (1000, 60, 1480)])
def test_both_diameters_stand_side_by_side(tmp_path, flow, head, speed):
    write_duty(tmp_path, "end suction", flow, head, speed=speed, stages=1, eyes=1)
    _, found = estimates(tmp_path)
    impeller = found["head_coefficient"]
    assert math.isclose(impeller["cordier_diameter_mm"], impeller["expected_diameter_mm"], rel_tol=0.05)
