"""Sound bids are not accused, overstated ones are; seeded, so the shares are the same each time."""

from collections import Counter
from dataclasses import replace

import numpy as np
import pytest

import bidcheck
from bidcheck import Outcome, Verdict
from bidcheck.inquiry import Inquiry
from tests.sound_bids import UNLIKE, sound_inquiry, unlike_inquiry


def verdicts(inquiry: Inquiry) -> dict[str, Verdict]:
    """The gravest verdict of each check."""
    (bid,) = bidcheck.evaluate(inquiry).bids
    order = list(Verdict)
    found: dict[str, Verdict] = {}
    for finding in bid.findings:
        before = found.get(finding.check, Verdict.PASS)
        found[finding.check] = max(before, finding.verdict, key=order.index)
    return found


def test_sound_bids_are_not_accused():
    rng = np.random.default_rng(11)
    outcomes: Counter[Outcome] = Counter()
    for _ in range(250):
        outcomes[bidcheck.evaluate(sound_inquiry(rng)).bids[0].outcome] += 1
    assert outcomes[Outcome.NOT_ACCEPTABLE] == 0
    assert outcomes[Outcome.INCOMPLETE] == 0
    assert outcomes[Outcome.ACCEPTABLE_AFTER_QUERIES] <= 5  # 2 %


def overstated(inquiry: Inquiry, points: float) -> Inquiry:
    """The inquiry with efficiency raised by so many points and power lowered to agree."""
    (bid,) = inquiry.bids
    (curve,) = bid.curves
    assert curve.efficiency is not None
    assert curve.power is not None
    factor = 1.0 + points / 100.0 / float(curve.efficiency.value.max())
    efficiency = replace(curve.efficiency, value=curve.efficiency.value * factor)
    power = replace(curve.power, value=curve.power.value / factor)
    claims = replace(bid.claims, bep_efficiency=None)
    return replace(
        inquiry, bids=(replace(bid, claims=claims, curves=(replace(curve, efficiency=efficiency, power=power),)),)
    )


@pytest.mark.parametrize(("points", "at_least"), [(8.0, 7 / 9), (10.0, 8 / 9)])
def test_large_overstatements_are_asked_about(points, at_least):
    rng = np.random.default_rng(12)
    found = [verdicts(overstated(sound_inquiry(rng), points)) for _ in range(90)]
    caught = sum(item["efficiency-claim"] is Verdict.QUERY for item in found)
    assert caught / len(found) >= at_least
    assert all(item["power-balance"] not in (Verdict.QUERY, Verdict.FAIL) for item in found)


def test_a_small_overstatement_cannot_be_shown_and_is_not_claimed_to_be():
    rng = np.random.default_rng(13)
    found = [verdicts(overstated(sound_inquiry(rng), 3.0)) for _ in range(60)]
    assert sum(item["efficiency-claim"] is Verdict.QUERY for item in found) < 30


@pytest.mark.parametrize(
    ("column", "factor", "check", "verdict"),
    [
        ("power", 1.341, "power-balance", Verdict.QUERY),
        ("power", 1.12, "power-balance", Verdict.FAIL),
        ("head", 0.955, "duty-head", Verdict.QUERY),
        ("head", 0.90, "duty-head", Verdict.FAIL),
        ("npsh3", 4.0, "npsh-margin", Verdict.FAIL),
        ("npsh3", 0.42, "suction-specific-speed", Verdict.QUERY),
    ],
)
def test_planted_defects_are_caught_by_the_check_meant_for_them(column, factor, check, verdict):
    rng = np.random.default_rng(14)
    for _ in range(20):
        inquiry = sound_inquiry(rng)
        (bid,) = inquiry.bids
        (curve,) = bid.curves
        points = curve.points(column)
        changed = {column: replace(points, value=points.value * factor)}
        if column == "head":  # power goes with it, so that only the head is wrong
            changed["power"] = replace(curve.power, value=curve.power.value * factor)
        found = verdicts(replace(inquiry, bids=(replace(bid, curves=(replace(curve, **changed),)),)))
        assert found[check] is verdict
        assert all(one is not Verdict.FAIL for name, one in found.items() if name != check)


@pytest.mark.parametrize("arrangement", UNLIKE)
def test_honest_wastewater_borehole_and_sealless_pumps_get_nothing_above_a_remark(arrangement):
    rng = np.random.default_rng(15)
    for _ in range(40):
        found = verdicts(unlike_inquiry(rng, arrangement))
        assert [name for name, verdict in found.items() if verdict in (Verdict.QUERY, Verdict.FAIL)] == []


@pytest.mark.parametrize(("drive", "kept", "words"), [("fixed", 0.93, "pump and motor"), ("variable", 0.90, "wire")])
def test_losses_of_motor_and_converter_are_named_where_efficiency_is_low(drive, kept, words):
    rng = np.random.default_rng(16)
    low = 0
    for _ in range(60):
        inquiry = sound_inquiry(rng)
        (bid,) = inquiry.bids
        (curve,) = bid.curves
        lowered = replace(curve, efficiency=replace(curve.efficiency, value=curve.efficiency.value * kept), power=None)
        driver = replace(bid.driver, efficiency=0.93)
        bid = replace(
            bid, drive=drive, driver=driver, claims=replace(bid.claims, bep_efficiency=None), curves=(lowered,)
        )
        (judged,) = bidcheck.evaluate(replace(inquiry, bids=(bid,))).bids
        (claim,) = (f for f in judged.findings if (f.check, f.subject) == ("efficiency-claim", "best efficiency"))
        if claim.verdict in (Verdict.REMARK, Verdict.QUERY):
            low += 1
            assert words in str(claim.evidence["causes"].value)
    assert low >= 10
