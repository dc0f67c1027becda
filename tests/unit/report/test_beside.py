import pytest

import bidcheck
from bidcheck.bid import Claims
from bidcheck.evaluation import Evaluation
from bidcheck.quantity import UnitSystem
from bidcheck.report.beside import beside, source_in_words, sources_of
from tests.build import EXAMPLES, inquiry, sound_bid, sound_curve


@pytest.fixture(scope="module")
def example() -> Evaluation:
    return bidcheck.evaluate(bidcheck.read_inquiry(EXAMPLES / "cooling_water"))


def pairs(evaluation: Evaluation, start: str, system: UnitSystem = UnitSystem.SI) -> list[tuple[str, str]]:
    (row,) = [row for row in beside(evaluation, system) if row.item.startswith(start)]
    return row.pairs


def test_offered_and_expected_stand_beside_one_another(example):
    offered, expected = pairs(example, "impeller diameter, by head")[0]
    assert offered == "465 mm"
    assert 440 <= int(expected.split()[0]) <= 480
    ratio, between = pairs(example, "efficiency at 75 %")[0]
    assert ratio.endswith("%")
    assert between == "92.5 % to 94.7 %"
    npsh3, ordinary = pairs(example, "NPSH3", UnitSystem.US)[0]
    assert npsh3.endswith("ft")
    assert " to " in ordinary


def test_every_bid_has_a_pair_of_every_item(example):
    assert all(len(row.pairs) == len(example.bids) for row in beside(example, UnitSystem.SI))


def test_a_bid_without_a_curve_has_dashes():
    evaluation = bidcheck.evaluate(inquiry(bids=(sound_bid(curves=(), claims=Claims()),)))
    assert all(row.pairs == [("–", "–")] for row in beside(evaluation, UnitSystem.SI))
    assert sources_of(evaluation.bids[0].case.estimates) == []


def test_what_a_regulation_does_not_cover_is_said():
    evaluation = bidcheck.evaluate(inquiry(bids=(sound_bid(arrangement="solids handling"),)))
    assert pairs(evaluation, "minimum efficiency index")[0][1].startswith("not covered: the regulation holds no class")


def test_every_source_is_listed_with_its_unit(example):
    found = sources_of(example.bids[0].case.estimates)
    words = [source_in_words(quantity, source, UnitSystem.SI) for quantity, source in found]
    kinds = {item["quantity"] for item in words}
    assert {"best efficiency", "impeller", "shutoff head over best", "NPSH3 at best efficiency"} <= kinds
    assert any(item["value"].endswith("mm") for item in words)
    assert all(item["value"] == "–" or not item["reason"] for item in words)
    assert all(item["valid"] and item["origin"] and item["mark"] for item in words)


def test_a_curve_without_npsh3_leaves_the_expectation():
    evaluation = bidcheck.evaluate(inquiry(bids=(sound_bid(curves=(sound_curve(npsh3=None),), claims=Claims()),)))
    offered, expected = pairs(evaluation, "NPSH3")[0]
    assert offered == "–"
    assert " to " in expected
