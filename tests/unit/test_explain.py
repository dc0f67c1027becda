import pytest

from bidcheck.explain import (
    UNIT_MISTAKES,
    closing,
    density_mistakes,
    frequency_mistakes,
    mistakes_that_close,
    motor_mistakes,
    possible,
    pump_mistakes,
    stage_mistakes,
)

BALANCE = {"flow": 1, "head": 1, "power": -1}


@pytest.mark.parametrize(
    ("gap", "words"),
    [
        (1 / 1.341, "power is in hp under a kW heading"),
        (1 / 1.36, "power is in metric hp under a kW heading"),
        (4.403, "flow is in US gpm under an m³/h heading"),
        (3.281, "head is in ft under an m heading"),
        (1 / 3.6, "flow is in l/s under an m³/h heading"),
        (1.201, "flow is in US gpm under an imperial gpm heading"),
        (3600.0, "flow is in m³/h under an m³/s heading"),
        (1000.0, "flow is in l/s under an m³/s heading"),
        (1000 / 60, "flow is in L/min under an m³/h heading"),
    ],
)
def test_units_under_the_wrong_heading(gap, words):
    assert words in mistakes_that_close(gap, BALANCE, UNIT_MISTAKES)


def test_every_mistake_that_closes_is_named():
    found = mistakes_that_close(1 / 1.2, BALANCE, (*UNIT_MISTAKES, *frequency_mistakes()))
    assert len(found) >= 2
    assert any("60 Hz" in words for words in found)
    assert any("imperial" in words for words in found)


@pytest.mark.parametrize("gap", [1 / 1.341 * 1.0098, 1 / 1.341 / 1.0098])
def test_within_a_per_cent_closes(gap):
    assert mistakes_that_close(gap, BALANCE, UNIT_MISTAKES)


@pytest.mark.parametrize("gap", [0.65, 0.90, 0.97, 1.08])
def test_a_gap_nothing_explains(gap):
    assert mistakes_that_close(gap, BALANCE, (*UNIT_MISTAKES, *frequency_mistakes())) == ()


def test_stages_pumps_density_and_motor():
    assert mistakes_that_close(1 / 6, BALANCE, stage_mistakes(6)) == ("head is per stage",)
    assert mistakes_that_close(6.0, BALANCE, stage_mistakes(6))[0].startswith("head is that of all 6 stages")
    assert mistakes_that_close(0.5, {"flow": 1}, pump_mistakes(2)) != ()
    assert mistakes_that_close(0.75, BALANCE, density_mistakes(750.0, of_water=False)) == (
        "density is left out of power",
    )
    assert mistakes_that_close(1 / 0.75, BALANCE, density_mistakes(750.0, of_water=True)) == (
        "power is for the liquid pumped, the rest for water",
    )
    assert mistakes_that_close(0.95, BALANCE, motor_mistakes(0.95)) == ("power is motor input, not shaft power",)
    with_efficiency = BALANCE | {"efficiency": -1}
    assert mistakes_that_close(1 / 0.95, with_efficiency, motor_mistakes(0.95)) == (
        "efficiency is that of pump and motor together",
    )


def test_what_cannot_have_happened_is_not_offered():
    assert stage_mistakes(1) == ()
    assert pump_mistakes(1) == ()
    assert density_mistakes(998.2, of_water=True) == ()
    assert motor_mistakes(None) == ()


def test_a_mistake_needs_the_heading_it_happens_under():
    gap = 1.341  # power too small: kW under a hp heading, and nothing else
    words = "power is in kW under a hp heading"
    assert words in mistakes_that_close(gap, BALANCE, possible(UNIT_MISTAKES, {"power": 745.6999}))
    assert mistakes_that_close(gap, BALANCE, possible(UNIT_MISTAKES, {"power": 1000.0})) == ()
    assert words in mistakes_that_close(gap, BALANCE, possible(UNIT_MISTAKES, {"power": 0.0}))
    assert words not in mistakes_that_close(gap, BALANCE, possible(UNIT_MISTAKES, {"power": 735.49875}))


def test_what_cannot_have_happened_under_the_heading_happened_before():
    power = {"power": 1000.0}
    (words,) = closing(1.341, BALANCE, (), power)
    assert words == "power is in kW under a hp heading, before it was converted"
    assert closing(1 / 1.341, BALANCE, (), power) == ("power is in hp under a kW heading",)
    assert closing(1.0, BALANCE, (), power) == ()
